import { vi } from 'vitest';
import type { Me } from '#shared/contracts/accounts.ts';

export const visitor: Me = { user: null, preferences: null, reviewsWaiting: null, demonstration: true, version: '0.1.0' };
export const contributor: Me = {
  ...visitor, user: { id: 'u2', name: 'T. Adeyemi-Holt', roles: ['contributor'] }, preferences: { energyUnit: 'kJ/mol', temperatureK: 700, theme: 'system', hiddenColumns: null, rows: 'comfortable' },
};

export const json = (body: unknown, status = 200, headers: Record<string, string> = {}) =>
  Promise.resolve(new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json', ...headers } }));

export const refusal = (status: number, code: string, title: string, detail: string, more: Record<string, unknown> = {}) =>
  json({ type: 'about:blank', title, status, detail, code, requestId: 'r1', ...more }, status);

export interface Asked {
  method: string;
  path: string;
  body: unknown;
  headers: Record<string, string>;
}

/** A stand-in for the server: `answer` gives what a request gets, or nothing for the usual; it keeps what was asked. */
export function standIn(answer: (asked: Asked) => Promise<Response> | undefined, me: () => Me = () => visitor): Asked[] {
  const log: Asked[] = [];
  vi.stubGlobal('fetch', vi.fn((address: string, init: RequestInit = {}) => {
    const url = new URL(address, 'http://sillstone.test');
    const asked: Asked = {
      method: init.method ?? 'GET', path: url.pathname.replace('/api/v1', '') + url.search,
      body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined, headers: { ...(init.headers as Record<string, string>) },
    };
    log.push(asked);
    const given = answer(asked);
    if (given) return given;
    if (asked.path === '/auth/me') return json(me());
    if (asked.path === '/auth/csrf') return json({ token: 't' });
    if (asked.path === '/auth/demo-accounts') {
      return json({ accounts: [{ email: 'contributor@demo.sillstone.example', name: 'T. Adeyemi-Holt', role: 'contributor' }], password: 'stepping-stone' });
    }
    if (asked.path === '/vocabulary') return json({ metals: [], facets: [], techniques: [], supports: [], stepClasses: [], steps: [] });
    return refusal(404, 'not-found', 'There is nothing here', `${asked.method} ${asked.path} is not in this test.`);
  }));
  return log;
}
