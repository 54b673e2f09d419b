import { describe, expect, it } from 'vitest';
import { useApp } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf } from '#tests/factories/client.ts';

const app = useApp();

describe('problem documents', () => {
  it.each<[string, string, number, string]>([
    ['GET', '/nothing', 404, 'not-found'], ['GET', '/entries/222-222-2', 404, 'not-found'], ['GET', '/sources/nobody1999', 404, 'not-found'], ['GET', `/sources/${'-'.repeat(36)}`, 404, 'not-found'],
    ['GET', '/sources/00000000-0000-4000-8000-000000000000', 404, 'not-found'], ['GET', '/entries?limit=0', 422, 'invalid-input'], ['GET', '/contributions', 401, 'sign-in-required'],
    ['GET', '/entries/%E0%A4%A', 400, 'bad-request'], ['GET', `/entries/${'x'.repeat(30)}`, 422, 'invalid-input'], ['GET', '/entries/../../etc/passwd', 404, 'not-found'],
    ['GET', '/entries?cursor=x', 400, 'cursor-invalid'], ['POST', '/nothing', 404, 'not-found'], ['POST', '/calc/nothing', 404, 'not-found'], ['PATCH', '/calc/energy', 404, 'not-found'],
  ])('%s %s', async (method, path, status, code) => {
    const visitor = await app.visitor();
    const answer = await visitor.send(method, path, method === 'GET' ? undefined : {});
    const problem = problemOf(answer);
    expect([problem.status, problem.code]).toEqual([status, code]);
    expect(problem.requestId).toBe(answer.headers['x-request-id']);
    expect(answer.headers['cache-control']).toBe('no-store');
    expect(answer.text).not.toMatch(/node_modules|at \w+ \(|select |sillstone_app/i);
  });

  it.each<[string, string, string | Buffer, number, string]>([
    ['half an object', 'application/json', '{"kind": ', 400, 'malformed-json'],
    ['a bare word', 'application/json', 'kind', 400, 'malformed-json'],
    ['a number', 'application/json', '7', 400, 'malformed-json'],
    ['a list', 'application/json', '[]', 422, 'invalid-input'],
    ['more than a megabyte', 'application/json', JSON.stringify({ note: 'x'.repeat(1_100_000) }), 413, 'payload-too-large'],
    ['a foreign character set', 'application/json; charset=ebcdic', '{}', 400, 'bad-request'],
    ['plain text', 'text/plain', '{"kind": "kie"}', 400, 'bad-request'],
    ['a form', 'application/x-www-form-urlencoded', 'kind=kie', 400, 'bad-request'],
    ['a hundred thousand brackets', 'application/json', `{"source":{"csl":${'['.repeat(100_000)}${']'.repeat(100_000)}}}`, 422, 'invalid-input'],
    ['a null character in a text', 'application/json', '{"note":"a\\u0000b"}', 400, 'bad-request'],
    ['half a surrogate pair', 'application/json', '{"note":"\\ud800"}', 400, 'bad-request'],
  ])('%s as a body of %s', async (_what, type, body, status, code) => {
    const { client } = await app.person('contributor');
    const before = await app.sql('select count(*) from entries');
    const answer = await client.agent.post('/api/v1/entries').set({ 'X-CSRF-Token': client.token, 'Content-Type': type }).send(body);
    expect(refusalOf(answer)).toEqual([status, code]);
    expect(await app.sql('select count(*) from entries')).toEqual(before);
  });

  it('an address outside the interface answers so as well', async () => {
    const visitor = await app.visitor();
    for (const path of ['/api', '/api/v2/entries', '/api/v1']) expect(problemOf(await visitor.agent.get(path)).code, path).toBe('not-found');
  });
});

describe('headers', () => {
  it.each(['/api/v1/health', '/api/v1/entries', '/api/v1/nothing', '/', '/search'])('%s is sent with a strict policy', async (path) => {
    const { headers } = await (await app.visitor()).agent.get(path);
    expect(headers['content-security-policy']).toContain("default-src 'self'");
    expect(headers['content-security-policy']).toContain("script-src 'self'");
    expect(headers['content-security-policy']).toContain("frame-ancestors 'none'");
    expect(headers['content-security-policy']).not.toMatch(/unsafe-eval|script-src[^;]*unsafe-inline/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
    expect(headers['access-control-allow-origin']).toBeUndefined();
  });

  it('health and readiness answer without a session, and set none', async () => {
    for (const path of ['/health', '/ready']) {
      const answer = await (await app.visitor()).get(path);
      expect(answer.status).toBe(200);
      expect(answer.headers['set-cookie']).toBeUndefined();
    }
    expect(okBody(await (await app.visitor()).get('/health'))).toEqual({ status: 'ok', database: 'ok', version: '0.0.0-test' });
  });

  it('a method of another kind changes nothing', async () => {
    const visitor = await app.visitor();
    expect((await visitor.agent.delete('/api/v1/entries/222-222-2').set('X-CSRF-Token', visitor.token)).status).toBe(404);
    expect((await visitor.agent.put('/api/v1/entries').set('X-CSRF-Token', visitor.token).send({})).status).toBe(404);
    expect((await visitor.agent.head('/api/v1/entries')).status).toBe(200);
  });
});
