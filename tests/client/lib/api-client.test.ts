import * as z from 'zod';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { endpoint } from '#shared/contracts/endpoint.ts';
import { addressOf, call, callForAnswer } from '#client/lib/api-client.ts';
import { ApiError } from '#client/lib/api-error.ts';
import { shouldRetry } from '#client/app/query-client.ts';

const read = endpoint({
  method: 'GET', path: '/things/:name', access: 'visitor', summary: 'Read', params: z.object({ name: z.string() }),
  query: z.object({ metal: z.array(z.string()).optional(), q: z.string().optional() }), response: z.object({ n: z.number() }),
});
const write = endpoint({ method: 'POST', path: '/things', access: 'reader', summary: 'Write', body: z.object({ a: z.number() }), response: z.object({ n: z.number() }) });

const json = (body: unknown, status = 200, headers: Record<string, string> = {}) =>
  new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json', ...headers } });
const problem = (status: number, code: string, more: object = {}) =>
  json({ type: 'about:blank', title: 'Title', status, detail: 'Detail', code, requestId: 'r1', ...more }, status);

const fetched = vi.fn<(url: string, init: RequestInit) => Promise<Response>>();
const headersOf = (index: number) => fetched.mock.calls[index]?.[1].headers as Record<string, string>;

beforeEach(() => {
  fetched.mockReset();
  vi.stubGlobal('fetch', fetched);
});
afterEach(() => {
  vi.unstubAllGlobals();
});

const failure = async (promise: Promise<unknown>): Promise<ApiError> => {
  const error: unknown = await promise.then(() => null, (reason: unknown) => reason);
  if (!(error instanceof ApiError)) throw new Error(`no ApiError: ${String(error)}`);
  return error;
};

describe('api client', () => {
  it('fills in the address: parameters escaped, a repeated name for a list, empty parts left out', () => {
    expect(addressOf(read, { params: { name: '10.5555/a b' }, query: { metal: ['Ru', 'Ni'], q: '' } })).toBe('/api/v1/things/10.5555%2Fa%20b?metal=Ru&metal=Ni');
  });

  it('gives the parsed answer and its ETag', async () => {
    fetched.mockResolvedValueOnce(json({ n: 1, extra: true }, 200, { ETag: '"2"' }));
    expect(await callForAnswer(read, { params: { name: 'x' } })).toEqual({ data: { n: 1 }, etag: '"2"' });
  });

  it('fetches the form token once, sends it with each write, and renews it once when it has expired', async () => {
    fetched
      .mockResolvedValueOnce(json({ token: 'one' }))
      .mockResolvedValueOnce(json({ n: 1 }))
      .mockResolvedValueOnce(problem(403, 'csrf-invalid'))
      .mockResolvedValueOnce(json({ token: 'two' }))
      .mockResolvedValueOnce(json({ n: 2 }));
    await call(write, { body: { a: 1 } });
    expect(await call(write, { body: { a: 2 }, ifMatch: '"7"' })).toEqual({ n: 2 });
    expect(fetched.mock.calls.map(([url]) => url)).toEqual(['/api/v1/auth/csrf', '/api/v1/things', '/api/v1/things', '/api/v1/auth/csrf', '/api/v1/things']);
    expect([1, 2, 4].map((index) => headersOf(index)['X-CSRF-Token'])).toEqual(['one', 'one', 'two']);
    expect(headersOf(4)['If-Match']).toBe('"7"');
  });

  it('throws a problem document with its code and the place of each fault', async () => {
    fetched.mockResolvedValueOnce(problem(422, 'invalid-input', { errors: [{ path: 'q', message: 'too long' }] }));
    const error = await failure(call(read, { params: { name: 'x' } }));
    expect(error).toMatchObject({ status: 422, code: 'invalid-input', title: 'Title', requestId: 'r1' });
    expect(error.messageAt('q')).toBe('too long');
    expect(error.messageAt('metal')).toBeUndefined();
  });

  it.each([
    ['no answer', () => Promise.reject(new TypeError('Failed to fetch')), 0, 'network'],
    ['a page of a proxy', () => Promise.resolve(new Response('<html>', { status: 502 })), 502, 'unreadable-answer'],
    ['an answer of another form', () => Promise.resolve(json({ n: 'one' })), 200, 'unreadable-answer'],
    ['an empty answer', () => Promise.resolve(new Response('', { status: 200 })), 200, 'unreadable-answer'],
    ['a code that is not known', () => Promise.resolve(problem(400, 'made-up')), 400, 'unreadable-answer'],
  ])('says so on %s', async (_, answer, status, code) => {
    fetched.mockImplementationOnce(answer);
    expect(await failure(call(read, { params: { name: 'x' } }))).toMatchObject({ status, code });
  });

  it.each([
    [404, 'not-found', 0, false], [422, 'invalid-input', 0, false], [429, 'too-many-requests', 0, false],
    [503, 'busy', 0, true], [503, 'busy', 2, false], [0, 'network', 1, true], [200, 'unreadable-answer', 0, false],
  ] as const)('status %s (%s) after %s failures is tried again: %s', (status, code, failures, again) => {
    expect(shouldRetry(failures, new ApiError({ status, code, title: '', detail: '' }))).toBe(again);
  });
});
