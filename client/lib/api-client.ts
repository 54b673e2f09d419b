import type * as z from 'zod';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { getCsrf } from '#shared/contracts/accounts.ts';
import { problem } from '#shared/contracts/problem.ts';
import { ApiError } from './api-error.ts';
import { askToSignIn, noteSignedOut } from './sign-in-again.ts';

const base = '/api/v1';

type Part<Name extends string, Schema extends z.ZodType> = unknown extends z.input<Schema>
  ? { [K in Name]?: undefined }
  : undefined extends z.input<Schema> ? { [K in Name]?: z.input<Schema> } : { [K in Name]: z.input<Schema> };

/** The parts of a request that an endpoint declares, as its schemas take them. */
export type RequestParts<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> =
  Part<'params', P> & Partial<Part<'query', Q>> & Part<'body', B> & {
    signal?: AbortSignal;
    /** The ETag that was seen, for a change that must not overwrite another. */
    ifMatch?: string;
  };

/** An answer with its ETag, which a later change sends back. */
export interface Answer<T> {
  data: T;
  etag: string | null;
}

/**
 * Calls an endpoint and gives its parsed answer.
 * @throws ApiError when the answer is a problem document, unreadable, or there is none.
 */
export async function call<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>, parts: RequestParts<P, Q, B>,
): Promise<z.output<R>> {
  return (await callForAnswer(endpoint, parts)).data;
}

/** Calls an endpoint and gives its parsed answer together with its ETag. */
export async function callForAnswer<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>, parts: RequestParts<P, Q, B>,
): Promise<Answer<z.output<R>>> {
  const url = addressOf(endpoint, parts);
  let response = await send(endpoint, url, parts);
  if (response.status === 403 && needsToken(endpoint)) {
    const refused = await problemOf(response);
    if (refused.code !== 'csrf-invalid') throw refused;
    forgetToken();
    response = await send(endpoint, url, parts);
  }
  if (response.status === 401 && !endpoint.path.startsWith('/auth/sign-')) {
    const refused = await problemOf(response);
    if (refused.code !== 'sign-in-required' || !(await askToSignIn())) throw refused;
    response = await send(endpoint, url, parts);
  }
  if (!response.ok) throw await problemOf(response);
  if (endpoint.path.startsWith('/auth/sign-')) noteSignedOut(endpoint.path === '/auth/sign-out');
  // A sign-in or sign-out starts another session, to which the old token does not belong.
  if (endpoint.path.startsWith('/auth/sign-')) forgetToken();
  return { data: await dataOf(endpoint, response), etag: response.headers.get('ETag') };
}

/** The address of an endpoint with its parameters and query filled in, for links to files. */
export function addressOf<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  endpoint: Endpoint<P, Q, B, R>, parts: { params?: unknown; query?: unknown } = {},
): string {
  const params = (parts.params ?? {}) as Record<string, unknown>;
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries((parts.query ?? {}) as Record<string, unknown>)) {
    for (const one of Array.isArray(value) ? value : [value]) {
      if (one !== undefined && one !== null && one !== '') search.append(name, String(one));
    }
  }
  const query = search.toString();
  return `${base}${path}${query && `?${query}`}`;
}

function needsToken(endpoint: { method: string; csrf?: boolean }): boolean {
  return endpoint.method !== 'GET' && endpoint.csrf !== false;
}

async function send(
  endpoint: { method: string; csrf?: boolean }, url: string, parts: { body?: unknown; signal?: AbortSignal; ifMatch?: string },
): Promise<Response> {
  const headers: Record<string, string> = { Accept: 'application/json, application/problem+json' };
  if (parts.body !== undefined) headers['Content-Type'] = 'application/json';
  if (parts.ifMatch) headers['If-Match'] = parts.ifMatch;
  if (needsToken(endpoint)) headers['X-CSRF-Token'] = await csrfToken();
  try {
    return await fetch(url, {
      method: endpoint.method,
      headers,
      credentials: 'same-origin',
      ...(parts.body === undefined ? {} : { body: JSON.stringify(parts.body) }),
      ...(parts.signal ? { signal: parts.signal } : {}),
    });
  } catch (cause) {
    if (cause instanceof DOMException && cause.name === 'AbortError') throw cause;
    throw new ApiError({
      status: 0, code: 'network', title: 'The server does not answer',
      detail: 'Check the connection and try again; nothing was changed that was not confirmed.',
    });
  }
}

let token: Promise<string> | null = null;

function forgetToken(): void {
  token = null;
}

async function csrfToken(): Promise<string> {
  token ??= call(getCsrf, {}).then((answer) => answer.token);
  try {
    return await token;
  } catch (error) {
    forgetToken();
    throw error;
  }
}

async function dataOf<R extends z.ZodType>(endpoint: { response?: R; path: string }, response: Response): Promise<z.output<R>> {
  if (!endpoint.response) return undefined as z.output<R>;
  const parsed = endpoint.response.safeParse(await response.json().catch(() => undefined));
  if (parsed.success) return parsed.data;
  const [first] = parsed.error.issues;
  throw new ApiError({
    status: response.status, code: 'unreadable-answer', title: 'The answer could not be read',
    detail: `${endpoint.path}: ${first ? `${first.path.join('.') || 'whole answer'}: ${first.message}` : 'unknown form'}. Reload the page; it may be older than the server.`,
    requestId: response.headers.get('X-Request-Id'),
  });
}

async function problemOf(response: Response): Promise<ApiError> {
  const retryAfter = Number(response.headers.get('Retry-After') ?? Number.NaN);
  const retryAfterS = Number.isFinite(retryAfter) ? retryAfter : null;
  const parsed = problem.safeParse(await response.json().catch(() => undefined));
  if (parsed.success) return new ApiError({ ...parsed.data, retryAfterS });
  return new ApiError({
    status: response.status, code: 'unreadable-answer', title: 'The server answered with an error',
    detail: `Status ${response.status}, without an explanation this page can read. Try again in a moment.`,
    requestId: response.headers.get('X-Request-Id'), retryAfterS,
  });
}
