import { beforeAll, describe, expect, it } from 'vitest';
import * as accounts from '#shared/contracts/accounts.ts';
import { calculatorEndpoints } from '#shared/contracts/calculators.ts';
import * as citations from '#shared/contracts/citations.ts';
import * as collections from '#shared/contracts/collections.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import * as entries from '#shared/contracts/entries.ts';
import * as search from '#shared/contracts/entry-search.ts';
import * as reviews from '#shared/contracts/reviews.ts';
import * as service from '#shared/contracts/service.ts';
import * as sources from '#shared/contracts/sources.ts';
import * as vocabulary from '#shared/contracts/vocabulary.ts';
import { hasRole, roles, type Role } from '#shared/domain/roles.ts';
import { readdirSync } from 'node:fs';
import { useApp } from '#tests/factories/app.ts';
import { problemOf, type Client } from '#tests/factories/client.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();

const isEndpoint = (value: unknown): value is Endpoint => typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'access' in value;
const calculators = Object.fromEntries(calculatorEndpoints.map(({ calculator, endpoint }) => [calculator.name, endpoint]));
const contracts = { accounts, calculators, citations, collections, entries, 'entry-search': search, reviews, service, sources, vocabulary };
const endpoints: Endpoint[] = Object.values(contracts).flatMap((module) => Object.values(module as Record<string, unknown>)).flatMap((value) => {
  if (isEndpoint(value)) return [value];
  const inner = typeof value === 'object' && value !== null && 'endpoint' in value ? value.endpoint : null;
  return isEndpoint(inner) ? [inner] : [];
});
const nameOf = ({ method, path }: Endpoint): string => `${method} ${path}`;

const clients = new Map<Role, Client>();
let accession = '';
let submission = '';
let sourceId = '';

beforeAll(async () => {
  clients.set('visitor', await app.visitor());
  const people = new Map<Role, Awaited<ReturnType<typeof app.person>>>();
  for (const role of ['reader', 'contributor', 'reviewer', 'curator'] as const) {
    const person = await app.person(role);
    people.set(role, person);
    clients.set(role, person.client);
  }
  const [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  const lives = new Lives(app.services, contributor.actor, reviewer.actor);
  ({ accession } = await lives.accepted());
  ({ submission } = await lives.submitted());
  sourceId = String((await app.sql<{ id: string }>('select id from sources'))[0]?.id);
});

/** An address that exists, so that only the role can be what is refused. */
const addressOf = ({ path }: Endpoint): string => path
  .replace(':accession', accession).replace(':submission', submission).replace(':version', '1').replace(':id', sourceId).replace('*doi', '10.5555/test.1');

/** What somebody without any right gets; the form token is sent, so that it is never what is refused. */
async function call(endpoint: Endpoint, role: Role): Promise<{ status: number; code: string }> {
  const client = clients.get(role);
  if (!client) throw new Error(`Nobody is a ${role}.`);
  const answer = await client.send(endpoint.method, addressOf(endpoint), endpoint.body ? {} : undefined);
  // A new form token replaces the one before.
  if (endpoint.path === '/auth/csrf') client.token = (answer.body as { token: string }).token;
  // A file is not JSON; anything from 400 on must be a problem document.
  return { status: answer.status, code: answer.status < 400 ? 'ok' : problemOf(answer).code };
}

const expected = (endpoint: Endpoint, role: Role): string => {
  if (hasRole(role === 'visitor' ? [] : [role], endpoint.access)) return 'let in';
  return role === 'visitor' ? '401 sign-in-required' : '403 forbidden';
};

describe('every endpoint as every role', () => {
  it('is read from every contract there is', () => {
    const files = readdirSync('shared/contracts').map((name) => name.replace(/\.ts$/, ''));
    const withoutEndpoints = ['calculator-endpoint', 'endpoint', 'entry-search-answers', 'problem', 'quantities'];
    expect(files.filter((name) => !withoutEndpoints.includes(name)).sort()).toEqual(Object.keys(contracts).sort());
    expect(endpoints.length).toBeGreaterThan(25);
    expect(new Set(endpoints.map(nameOf)).size).toBe(endpoints.length);
  });

  it('the matrix is what the contracts say', async () => {
    const wrong: string[] = [];
    const lines: string[] = [];
    // Signing out comes last of a role, since it ends what the others need.
    const ordered = [...endpoints].sort((a, b) => Number(a.path === '/auth/sign-out') - Number(b.path === '/auth/sign-out'));
    for (const endpoint of ordered) {
      const cells: string[] = [];
      for (const role of roles) {
        const { status, code } = await call(endpoint, role);
        const refusedByRole = code === 'sign-in-required' || (code === 'forbidden' && !hasRole([role], endpoint.access));
        const got = refusedByRole ? `${status} ${code}` : 'let in';
        cells.push(`${role}: ${status} ${code}`);
        if (got !== expected(endpoint, role) || status >= 500) wrong.push(`${nameOf(endpoint)} as ${role}: ${status} ${code}, expected ${expected(endpoint, role)}`);
      }
      lines.push(`${nameOf(endpoint).padEnd(44)} ${endpoint.access.padEnd(12)} ${cells.join(' | ')}`);
    }
    expect(wrong, `\n${lines.join('\n')}\n`).toEqual([]);
  });

  it('each is mounted: none answers that there is no such address', async () => {
    const absent: string[] = [];
    const curator = await app.person('curator');
    for (const endpoint of endpoints) {
      const answer = await curator.client.send(endpoint.method, addressOf(endpoint), endpoint.body ? {} : undefined);
      if (answer.status === 404 && /no such address/.test(answer.text)) absent.push(nameOf(endpoint));
      if (endpoint.path === '/auth/sign-out' || endpoint.path === '/auth/csrf') await curator.client.signIn(curator.email, 'a long enough test password');
    }
    expect(absent).toEqual([]);
  });

  it.each(endpoints.filter(({ method }) => method !== 'GET').map((endpoint) => [nameOf(endpoint), endpoint] as const))('%s needs the form token, unless it says that it does not', async (_name, endpoint) => {
    const { client } = await app.person('curator');
    client.token = '';
    const answer = await client.send(endpoint.method, addressOf(endpoint), endpoint.body ? {} : undefined);
    if (endpoint.csrf === false) expect(answer.text).not.toContain('csrf-invalid');
    else expect([answer.status, problemOf(answer).code]).toEqual([403, 'csrf-invalid']);
  });

  it.each(endpoints.filter(({ access }) => access !== 'visitor').map((endpoint) => [nameOf(endpoint), endpoint] as const))('%s looks at the role before it looks at the input', async (_name, endpoint) => {
    const client = await app.visitor();
    const mangled = addressOf(endpoint).replace(accession, 'x'.repeat(400)).replace(submission, 'not-an-id');
    const answer = await client.send(endpoint.method, mangled, endpoint.body ? { nonsense: true } : undefined);
    expect([answer.status, problemOf(answer).code]).toEqual([401, 'sign-in-required']);
  });
});
