import http from 'node:http';
import type { AddressInfo } from 'node:net';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startFakeDoiServer, type FakeDoiServer, type misbehaviours } from '#server/services/doi/fake-doi-server.ts';
import { demonstrationDoiService } from '#server/services/doi/demonstration-doi.ts';
import { isLoopbackHost, isPublicAddress } from '#server/services/doi/public-address.ts';
import { createDoiClient, cslMediaType } from '#server/services/doi/resolver-client.ts';
import type { HostAddress, Transport } from '#server/services/doi/transport.ts';
import { switchedOffDoiService } from '#server/services/doi/doi-service.ts';
import { encodeDoi } from '#shared/citations/doi.ts';
import { referenceCases } from './reference-cases.ts';

const sici = '10.5555/(sici)1096(1998)1:1<1::aid-abc_1>3.0.co;2-#';
let fake: FakeDoiServer;

beforeAll(async () => {
  const records = [...referenceCases.map(({ input }) => input.csl), { type: 'article-journal', title: 'An odd name', DOI: sici }];
  fake = await startFakeDoiServer({ records, slowMs: 60_000 });
});
afterAll(() => fake.close());

describe('the client against the fake over HTTP', () => {
  test.each(referenceCases)('$id is found', async ({ input: { csl } }) => {
    const answer = await createDoiClient({ resolverUrl: fake.url }).lookup(csl.DOI ?? '');
    expect(answer).toEqual({ kind: 'found', csl, notice: { status: 'current' } });
  });

  test('a DOI full of signs is found, whatever form it is asked in', async () => {
    const client = createDoiClient({ resolverUrl: `${fake.url}/` });
    for (const form of [sici, sici.toUpperCase(), `https://doi.org/${encodeDoi(sici)}`]) expect((await client.lookup(form)).kind).toBe('found');
  });

  test.each([['10.5555/retracted', 'retracted'], ['10.5555/corrected', 'corrected']])('%s comes with its notice', async (doi, status) => {
    const answer = await createDoiClient({ resolverUrl: fake.url }).lookup(doi);
    expect(answer.kind === 'found' && answer.notice.status).toBe(status);
    expect(answer.kind === 'found' && answer.notice.notice?.doi).toBe(`${doi}.notice`);
  });

  test.each(['10.5555/unknown', 'not a doi', ''])('%j is not found', async (doi) => {
    expect(await createDoiClient({ resolverUrl: fake.url }).lookup(doi)).toEqual({ kind: 'not-found' });
  });

  test.each<[keyof typeof misbehaviours, string]>([
    ['10.5555/slow', 'timeout'], ['10.5555/failing', 'server-error'], ['10.5555/busy', 'busy'], ['10.5555/garbage', 'wrong-content'], ['10.5555/nonsense', 'wrong-content'], ['10.5555/page', 'no-record'],
    ['10.5555/no-record', 'no-record'], ['10.5555/loop', 'too-many-redirects'], ['10.5555/away', 'refused-address'], ['10.5555/inside', 'refused-address'], ['10.5555/huge', 'too-large'], ['10.5555/hang-up', 'network'],
  ])('%s is unavailable: %s', async (doi, code) => {
    const answer = await createDoiClient({ resolverUrl: fake.url, timeoutMs: code === 'timeout' ? 200 : 10_000 }).lookup(doi);
    expect(answer).toMatchObject({ kind: 'unavailable', code, reason: expect.stringMatching(/^[a-z].+[^.]$/) });
  });

  test('a resolver that is not there, and one that is switched off, are unavailable', async () => {
    const gone = await startFakeDoiServer({ records: [] });
    await gone.close();
    expect(await createDoiClient({ resolverUrl: gone.url }).lookup('10.5555/x')).toMatchObject({ kind: 'unavailable', code: 'network' });
    expect(await switchedOffDoiService.lookup('10.5555/x')).toMatchObject({ kind: 'unavailable', code: 'switched-off' });
  });

  test('an answer that comes byte by byte ends with the time limit', async () => {
    const server = http.createServer((_request, response) => {
      response.writeHead(200, { 'content-type': cslMediaType });
      const timer = setInterval(() => response.write(' '), 20);
      response.on('close', () => clearInterval(timer));
    });
    await new Promise<void>((done) => {
      server.listen(0, '127.0.0.1', done);
    });
    try {
      const client = createDoiClient({ resolverUrl: `http://127.0.0.1:${(server.address() as AddressInfo).port}`, timeoutMs: 300 });
      expect(await client.lookup('10.5555/x')).toMatchObject({ kind: 'unavailable', code: 'timeout' });
    } finally {
      server.closeAllConnections();
      server.close();
    }
  });

  test('more look-ups at once than allowed are answered busy, and the places are given back', async () => {
    const client = createDoiClient({ resolverUrl: fake.url, maxConcurrent: 2, timeoutMs: 300 });
    const answers = await Promise.all(['10.5555/slow', '10.5555/slow', '10.5555/test.0001'].map((doi) => client.lookup(doi)));
    expect(answers.map((answer) => (answer.kind === 'unavailable' ? answer.code : answer.kind))).toEqual(['timeout', 'timeout', 'busy']);
    expect((await client.lookup('10.5555/test.0001')).kind).toBe('found');
  });

  test('the landing address answers a browser with a page that says the work is invented', async () => {
    const response = await fetch(`${fake.url}/10.5555/test.0001`, { headers: { accept: 'text/html' } });
    expect(response.url).toBe(`${fake.url}/landing/10.5555/test.0001`);
    expect(await response.text()).toContain('invented');
    expect((await fetch(`${fake.url}/10.5555/x`, { method: 'POST' })).status).toBe(405);
    expect((await fetch(`${fake.url}/favicon.ico`)).status).toBe(404);
  });
});

describe('the demonstration\'s DOI service', () => {
  test('starts its stand-in with the first look-up, answers from the records, and stops', async () => {
    let reads = 0;
    const service = demonstrationDoiService(() => {
      reads += 1;
      return Promise.resolve([{ type: 'book', title: 'An invented book', DOI: '10.5555/book' }]);
    });
    expect(reads).toBe(0);
    expect((await service.lookup('10.5555/BOOK')).kind).toBe('found');
    expect((await service.lookup('10.5555/none')).kind).toBe('not-found');
    expect(reads).toBe(1);
    await service.close();
  });

  test('records that can not be read make it unavailable, and it tries again', async () => {
    let broken = true;
    const service = demonstrationDoiService(() => (broken ? Promise.reject(new Error('unreadable')) : Promise.resolve([])));
    expect(await service.lookup('10.5555/x')).toMatchObject({ kind: 'unavailable', code: 'network' });
    broken = false;
    expect((await service.lookup('10.5555/x')).kind).toBe('not-found');
    await service.close();
  });
});

type Hop = { status?: number; location?: string; body?: string; type?: string; headers?: Record<string, string> };

/** A network played from a table: what each address answers, and to which IP address the client went. */
function network(hops: Record<string, Hop>, hosts: Record<string, string[]>) {
  const visited: string[] = [];
  const send: Transport = (url, to) => {
    visited.push(`${url.href} at ${to.address}`);
    const hop = hops[url.href] ?? { status: 404 };
    const body = new TextEncoder().encode(hop.body ?? '');
    return Promise.resolve({
      status: hop.status ?? (hop.location === undefined ? 200 : 302),
      headers: { 'content-type': hop.type ?? cslMediaType, ...(hop.location === undefined ? {} : { location: hop.location }), ...hop.headers },
      body: (async function* chunks() { yield await Promise.resolve(body); })(),
      discard: () => undefined,
    });
  };
  const resolve = (hostname: string): Promise<HostAddress[]> => Promise.resolve((hosts[hostname] ?? []).map((address) => ({ address, family: address.includes(':') ? 6 : 4 })));
  return { visited, send, resolve };
}

const record = JSON.stringify({ type: 'article-journal', title: 'T' });
const start = 'https://resolver.example/10.5555/x';
// Addresses that the registries keep free for nobody are not public, so two well-known public ones stand for the internet.
const hosts = { 'resolver.example': ['8.8.8.8'], 'agency.example': ['9.9.9.9'], 'inside.example': ['10.1.2.3'], 'mixed.example': ['9.9.9.9', '127.0.0.1'], 'six.example': ['::ffff:10.0.0.1'] };

describe('where the client may go', () => {
  test.each<[string, Record<string, Hop>, string]>([
    ['the answer of the resolver itself', { [start]: { body: record } }, 'found'],
    ['an https address on the public internet', { [start]: { location: 'https://agency.example/v1/x' }, 'https://agency.example/v1/x': { body: record } }, 'found'],
    ['a relative address', { [start]: { location: '/other' }, 'https://resolver.example/other': { body: record, type: 'application/json; charset=utf-8' } }, 'found'],
    ['plain http elsewhere', { [start]: { location: 'http://agency.example/' } }, 'refused-address'],
    ['another port', { [start]: { location: 'https://agency.example:8443/' } }, 'refused-address'],
    ['a password in the address', { [start]: { location: 'https://a:b@agency.example/' } }, 'refused-address'],
    ['this machine by name', { [start]: { location: 'https://localhost/' } }, 'refused-address'],
    ['this machine by number', { [start]: { location: 'https://127.0.0.1/' } }, 'refused-address'],
    ['this machine by an odd number', { [start]: { location: 'https://2130706433/' } }, 'refused-address'],
    ['a private host', { [start]: { location: 'https://inside.example/' } }, 'refused-address'],
    ['a host with one private address', { [start]: { location: 'https://mixed.example/' } }, 'refused-address'],
    ['a private address in IPv6 clothes', { [start]: { location: 'https://six.example/' } }, 'refused-address'],
    ['a file', { [start]: { location: 'file:///etc/passwd' } }, 'refused-address'],
    ['a host that has no address', { [start]: { location: 'https://nowhere.example/' } }, 'network'],
    ['no address at all', { [start]: { location: 'https://[' } }, 'wrong-content'],
    ['a redirect without an address', { [start]: { status: 302 } }, 'wrong-content'],
    ['a record that is gone', { [start]: { status: 410 } }, 'not-found'],
    ['a compressed answer', { [start]: { body: record, headers: { 'content-encoding': 'gzip' } } }, 'wrong-content'],
    ['an image', { [start]: { body: record, type: 'image/png' } }, 'wrong-content'],
    ['a length beyond the limit', { [start]: { body: record, headers: { 'content-length': '99999999' } } }, 'too-large'],
    ['deep nesting', { [start]: { body: '['.repeat(200_000) } }, 'wrong-content'],
    ['the wrong thing', { [start]: { body: '42' } }, 'wrong-content'],
  ])('%s', async (_name, hops, outcome) => {
    const { send, resolve, visited } = network(hops, { ...hosts, 'localhost': ['127.0.0.1'], '127.0.0.1': ['127.0.0.1'] });
    const answer = await createDoiClient({ resolverUrl: 'https://resolver.example', send, resolve }).lookup('10.5555/x');
    expect(answer.kind === 'unavailable' ? answer.code : answer.kind).toBe(outcome);
    expect(visited.filter((visit) => !/ at (8\.8\.8\.8|9\.9\.9\.9)$/.test(visit))).toEqual([]);
  });

  test('five redirects are followed and a sixth is not', async () => {
    for (const [count, kind] of [[5, 'found'], [6, 'unavailable']] as const) {
      const hops: Record<string, Hop> = Object.fromEntries(Array.from({ length: count }, (_, index) => [index === 0 ? start : `https://agency.example/${index}`, { location: `https://agency.example/${index + 1}` }]));
      hops[`https://agency.example/${count}`] = { body: record };
      expect((await createDoiClient({ resolverUrl: 'https://resolver.example', ...network(hops, hosts) }).lookup('10.5555/x')).kind).toBe(kind);
    }
  });

  test('a resolver that means a private address is refused', async () => {
    const { send, resolve, visited } = network({}, { 'resolver.example': ['192.168.1.1'] });
    expect(await createDoiClient({ resolverUrl: 'https://resolver.example', send, resolve }).lookup('10.5555/x')).toMatchObject({ code: 'refused-address' });
    expect(visited).toEqual([]);
  });

  test('a name that never resolves ends with the time limit', async () => {
    const client = createDoiClient({ resolverUrl: 'https://resolver.example', timeoutMs: 50, resolve: () => new Promise(() => undefined) });
    expect(await client.lookup('10.5555/x')).toMatchObject({ kind: 'unavailable', code: 'timeout' });
  });

  test('whatever the other side answers, the look-up gives one of its three answers', async () => {
    await fc.assert(fc.asyncProperty(fc.integer({ min: 100, max: 599 }), fc.string({ unit: 'binary' }), fc.boolean(), fc.option(fc.string({ unit: 'binary' })), fc.oneof(fc.string(), fc.json()), async (status, type, isCsl, location, body) => {
      const { send, resolve } = network({ [start]: { status, type: isCsl ? cslMediaType : type, location: location ?? undefined, body } }, hosts);
      expect(['found', 'not-found', 'unavailable']).toContain((await createDoiClient({ resolverUrl: 'https://resolver.example', send, resolve }).lookup('10.5555/x')).kind);
    }), { numRuns: 300 });
  });
});

describe('addresses', () => {
  // Blocks of the IANA special-purpose address registries (from memory).
  test.each(['127.0.0.1', '10.0.0.1', '172.16.0.1', '172.31.255.255', '192.168.0.1', '169.254.169.254', '100.64.0.1', '0.0.0.0', '224.0.0.1', '255.255.255.255', '198.18.0.1', '192.0.2.1', '::1', '::', 'fe80::1%eth0', 'fc00::1',
    'fd12:3456::1', 'ff02::1', '::ffff:127.0.0.1', '::ffff:7f00:1', '64:ff9b::10.0.0.1', '2001:db8::1', '2002:7f00:1::', '[::1]', 'example.org', ''])('%s is not public', (address) => {
    expect(isPublicAddress(address)).toBe(false);
  });
  test.each(['8.8.8.8', '172.32.0.1', '100.128.0.1', '2606:4700::1111', '::ffff:8.8.8.8', '64:ff9b::808:808'])('%s is public', (address) => {
    expect(isPublicAddress(address)).toBe(true);
  });
  test('this machine has several names', () => {
    expect(['localhost', '127.0.0.1', '127.9.9.9', '[::1]'].every(isLoopbackHost)).toBe(true);
    expect(['doi.org', '128.0.0.1', '127.example.org'].some(isLoopbackHost)).toBe(false);
  });
});
