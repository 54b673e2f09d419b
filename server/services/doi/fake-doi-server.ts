import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { readCsl } from '#shared/citations/csl.ts';
import { encodeDoi, normaliseDoi } from '#shared/citations/doi.ts';
import { titleText } from '#shared/citations/citation-text.ts';
import { cslMediaType } from './resolver-client.ts';

/** A record the fake serves: CSL-JSON with a DOI; `updated-by` may carry a retraction or correction notice as the real service's does. */
export type FakeDoiRecord = Readonly<Record<string, unknown>>;

/** A running fake. */
export type FakeDoiServer = { url: string; port: number; close(): Promise<void> };

/** DOIs at which the fake misbehaves on purpose, with what each does. */
export const misbehaviours = {
  '10.5555/slow': 'answers after a long wait',
  '10.5555/failing': 'answers 500',
  '10.5555/busy': 'answers 503 with Retry-After',
  '10.5555/garbage': 'answers text that is not JSON under the right content type',
  '10.5555/nonsense': 'answers JSON that is no citation',
  '10.5555/page': 'answers a web page whatever is asked for',
  '10.5555/no-record': 'answers 406: the DOI exists, without a citation record',
  '10.5555/loop': 'redirects for ever',
  '10.5555/away': 'redirects to another host',
  '10.5555/inside': 'redirects to a private address',
  '10.5555/huge': 'answers more than a megabyte',
  '10.5555/hang-up': 'closes the connection without an answer',
} as const;

const notice = (kind: string, label: string, doi: string) => ({ 'updated-by': [{ type: kind, label, DOI: doi, updated: { 'date-parts': [[2019, 4, 2]] } }] });
const invented = { type: 'article-journal', 'container-title': 'Invented Journal of Surface Kinetics', author: [{ family: 'Example', given: 'Ida' }], issued: { 'date-parts': [[2017]] } };

/** Two invented records every fake has, so that notices can be tried whatever the demonstration holds. */
const noticeRecords: readonly FakeDoiRecord[] = [
  { ...invented, DOI: '10.5555/retracted', title: 'An invented paper that was retracted', ...notice('retraction', 'Retraction', '10.5555/retracted.notice') },
  { ...invented, DOI: '10.5555/corrected', title: 'An invented paper that was corrected', ...notice('correction', 'Erratum', '10.5555/corrected.notice') },
];

function html(title: string): string {
  return `<!doctype html><title>Invented work</title><p>${title.replace(/[&<>]/g, ' ')}</p><p>This work is invented.</p>`;
}

/**
 * Starts a local stand-in for the DOI service: a real HTTP server that speaks the same protocol (a redirect from the DOI to a landing
 * address, content negotiation there, 404 for a DOI it does not know). For the demonstration and for tests only.
 */
export async function startFakeDoiServer(options: { port?: number; records: readonly FakeDoiRecord[]; slowMs?: number }): Promise<FakeDoiServer> {
  const { port = 0, slowMs = 30_000 } = options;
  const records = new Map<string, FakeDoiRecord>();
  for (const record of [...noticeRecords, ...options.records]) {
    const doi = normaliseDoi(typeof record['DOI'] === 'string' ? record['DOI'] : '');
    if (doi !== null) records.set(doi, record);
  }
  const timers = new Set<NodeJS.Timeout>();

  function serveRecord(doi: string, accept: string, response: http.ServerResponse): void {
    const record = records.get(doi);
    if (record === undefined) {
      response.writeHead(404, { 'content-type': 'text/html; charset=utf-8' }).end(html('DOI not found'));
    } else if (accept.includes(cslMediaType) || accept.includes('application/json')) {
      response.writeHead(200, { 'content-type': cslMediaType }).end(JSON.stringify(record));
    } else {
      const reading = readCsl(record);
      response.writeHead(200, { 'content-type': 'text/html; charset=utf-8' }).end(html(reading.ok ? titleText(reading.csl) : doi));
    }
  }

  function misbehave(doi: keyof typeof misbehaviours, path: string, response: http.ServerResponse): void {
    const json = { 'content-type': cslMediaType };
    switch (doi) {
      case '10.5555/slow': {
        const timer = setTimeout(() => {
          timers.delete(timer);
          response.writeHead(200, json).end(JSON.stringify({ ...invented, DOI: doi, title: 'An invented paper that came late' }));
        }, slowMs);
        timers.add(timer);
        return;
      }
      case '10.5555/failing': response.writeHead(500, { 'content-type': 'text/plain' }).end('Invented failure'); return;
      case '10.5555/busy': response.writeHead(503, { 'retry-after': '60' }).end(); return;
      case '10.5555/garbage': response.writeHead(200, json).end('{"type": "article-journal", "title": '); return;
      case '10.5555/nonsense': response.writeHead(200, json).end('[[{"title":{}}],null]'); return;
      case '10.5555/page': response.writeHead(200, { 'content-type': 'text/html' }).end(html('A page')); return;
      case '10.5555/no-record': response.writeHead(406).end(); return;
      case '10.5555/loop': response.writeHead(302, { location: `${path}x` }).end(); return;
      case '10.5555/away': response.writeHead(302, { location: 'https://elsewhere.example/10.5555/away' }).end(); return;
      case '10.5555/inside': response.writeHead(302, { location: 'http://10.0.0.1/internal' }).end(); return;
      case '10.5555/huge': response.writeHead(200, json).end(`{"type":"article-journal","title":"${'x'.repeat(1_500_000)}"}`); return;
      case '10.5555/hang-up': response.destroy(); return;
    }
  }

  const server = http.createServer((request, response) => {
    response.on('error', () => undefined);
    const path = (request.url ?? '/').replace(/[?#].*$/, '');
    const landing = path.startsWith('/landing/');
    const doi = normaliseDoi(path.replace(/^\/(?:landing\/)?/, ''));
    if (request.method !== 'GET' && request.method !== 'HEAD') response.writeHead(405, { allow: 'GET, HEAD' }).end();
    else if (doi === null) response.writeHead(404, { 'content-type': 'text/html; charset=utf-8' }).end(html('Not a DOI'));
    else if (doi in misbehaviours) misbehave(doi as keyof typeof misbehaviours, path, response);
    else if (/^10\.5555\/loopx+$/.test(doi)) misbehave('10.5555/loop', path, response);
    else if (landing || !records.has(doi)) serveRecord(doi, request.headers.accept ?? '', response);
    else response.writeHead(302, { location: `/landing/${encodeDoi(doi)}` }).end();
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', resolve);
  });
  const bound = (server.address() as AddressInfo).port;
  return {
    port: bound,
    url: `http://127.0.0.1:${bound}`,
    close: () => new Promise((resolve) => {
      for (const timer of timers) clearTimeout(timer);
      server.close(() => resolve());
      server.closeAllConnections();
    }),
  };
}
