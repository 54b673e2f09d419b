import { readCsl } from '#shared/citations/csl.ts';
import { encodeDoi, normaliseDoi } from '#shared/citations/doi.ts';
import { readNotice } from '#shared/citations/notice.ts';
import type { DoiAnswer, DoiFailure, DoiService } from './doi-service.ts';
import { isLoopbackHost, isPublicAddress } from './public-address.ts';
import { resolveHost, sendRequest, type HostAddress, type ResolveHost, type Transport, type TransportResponse } from './transport.ts';

/** Settings of the client; all but the resolver's address have defaults. */
export type DoiClientOptions = {
  /** Address of the resolver, for instance https://doi.org. */
  resolverUrl: string;
  /** Time for a whole look-up, redirects included [ms]. */
  timeoutMs?: number;
  maxRedirects?: number;
  /** Largest answer read [bytes]. */
  maxBytes?: number;
  /** Look-ups at one time; more are answered "busy" at once. */
  maxConcurrent?: number;
  userAgent?: string;
  resolve?: ResolveHost;
  send?: Transport;
};

/** Content negotiation by the DOI registration agencies (crosscite.org/docs, from memory). */
export const cslMediaType = 'application/vnd.citationstyles.csl+json';

const sentences: Readonly<Record<DoiFailure, string>> = {
  'switched-off': 'no DOI service is configured',
  busy: 'it is busy, or too many look-ups run at once',
  timeout: 'it took too long',
  network: 'it could not be reached',
  'refused-address': 'it pointed to an address that is not allowed',
  'too-many-redirects': 'it redirected too often',
  'too-large': 'its answer was too large',
  'server-error': 'it reported an error of its own',
  'wrong-content': 'its answer was not readable',
  'no-record': 'it has no citation record for this DOI',
};

/** Carries the code of a failure out of the steps of one look-up; it never leaves this module. */
class LookupFailure extends Error {
  readonly code: DoiFailure;

  constructor(code: DoiFailure) {
    super(code);
    this.code = code;
  }
}

async function readBody(response: TransportResponse, limit: number): Promise<string> {
  if (Number(response.headers['content-length'] ?? '0') > limit) {
    response.discard();
    throw new LookupFailure('too-large');
  }
  const chunks: Uint8Array[] = [];
  let size = 0;
  for await (const chunk of response.body) {
    size += chunk.length;
    if (size > limit) {
      response.discard();
      throw new LookupFailure('too-large');
    }
    chunks.push(chunk);
  }
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks));
  } catch {
    throw new LookupFailure('wrong-content');
  }
}

/** Deep nesting or a broken text makes the parser throw; both are an unreadable answer. */
function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    throw new LookupFailure('wrong-content');
  }
}

function failureOf(status: number): DoiFailure {
  if (status === 429 || status === 503) return 'busy';
  if (status === 204 || status === 406) return 'no-record';
  return status >= 500 ? 'server-error' : 'wrong-content';
}

/**
 * Makes the client of a DOI resolver: content negotiation for CSL-JSON, with redirects followed by our own rules.
 *
 * It asks the configured resolver only, and from there follows redirects to https addresses on the public internet; a resolver
 * on this machine is followed on its own origin only. Addresses are checked after name resolution and the connection goes to
 * the address that was checked.
 */
export function createDoiClient(options: DoiClientOptions): DoiService {
  const { timeoutMs = 10_000, maxRedirects = 5, maxBytes = 1_000_000, maxConcurrent = 20, resolve = resolveHost, send = sendRequest } = options;
  const resolver = new URL(options.resolverUrl);
  const base = resolver.href.replace(/[?#].*$/, '').replace(/\/+$/, '');
  const local = isLoopbackHost(resolver.hostname);
  const headers = { accept: cslMediaType, 'accept-encoding': 'identity', 'user-agent': options.userAgent ?? 'Sillstone' };
  let running = 0;

  function checkUrl(url: URL): void {
    if (url.origin === resolver.origin && url.username === '' && url.password === '') return;
    const allowed = !local && url.protocol === 'https:' && url.port === '' && url.username === '' && url.password === '' && !isLoopbackHost(url.hostname);
    if (!allowed) throw new LookupFailure('refused-address');
  }

  async function addressOf(url: URL): Promise<HostAddress> {
    const addresses = await resolve(url.hostname);
    const first = addresses[0];
    if (first === undefined) throw new LookupFailure('network');
    // One private address among several is enough to refuse: which one is used must not be left to chance.
    const allowed = local && url.origin === resolver.origin ? ({ address }: HostAddress) => isLoopbackHost(address) : ({ address }: HostAddress) => isPublicAddress(address);
    if (!addresses.every(allowed)) throw new LookupFailure('refused-address');
    return first;
  }

  async function ask(doi: string, signal: AbortSignal): Promise<DoiAnswer> {
    let url = new URL(`${base}/${encodeDoi(doi)}`);
    for (let hop = 0; hop <= maxRedirects; hop += 1) {
      checkUrl(url);
      const response = await send(url, await addressOf(url), headers, signal);
      const location = response.headers['location'];
      if (response.status >= 300 && response.status < 400 && location !== undefined) {
        response.discard();
        if (!URL.canParse(location, url.href)) throw new LookupFailure('wrong-content');
        const next = new URL(location, url);
        next.hash = '';
        url = next;
        continue;
      }
      if (response.status === 404 || response.status === 410) {
        response.discard();
        return { kind: 'not-found' };
      }
      if (response.status !== 200) {
        response.discard();
        throw new LookupFailure(failureOf(response.status));
      }
      const type = (response.headers['content-type'] ?? '').split(';')[0]?.trim().toLowerCase() ?? '';
      const encoding = response.headers['content-encoding'] ?? 'identity';
      if ((type !== cslMediaType && type !== 'application/json') || encoding !== 'identity') {
        response.discard();
        throw new LookupFailure(type === 'text/html' ? 'no-record' : 'wrong-content');
      }
      return answerFrom(parseJson(await readBody(response, maxBytes)), doi);
    }
    throw new LookupFailure('too-many-redirects');
  }

  return {
    async lookup(text) {
      const doi = normaliseDoi(text);
      if (doi === null) return { kind: 'not-found' };
      if (running >= maxConcurrent) return unavailable('busy');
      running += 1;
      const stop = new AbortController();
      let timer: NodeJS.Timeout | undefined;
      // The race covers steps that do not heed the signal, such as name resolution.
      const tooLate = new Promise<DoiAnswer>((done) => {
        timer = setTimeout(() => {
          done(unavailable('timeout'));
          stop.abort();
        }, timeoutMs);
      });
      try {
        return await Promise.race([ask(doi, stop.signal).catch((error: unknown) => unavailable(codeOf(error))), tooLate]);
      } finally {
        clearTimeout(timer);
        stop.abort();
        running -= 1;
      }
    },
  };
}

function codeOf(error: unknown): DoiFailure {
  return error instanceof LookupFailure ? error.code : 'network';
}

function unavailable(code: DoiFailure): DoiAnswer {
  return { kind: 'unavailable', code, reason: sentences[code] };
}

function answerFrom(record: unknown, doi: string): DoiAnswer {
  const reading = readCsl(record);
  if (!reading.ok) throw new LookupFailure('wrong-content');
  return { kind: 'found', csl: { ...reading.csl, DOI: doi }, notice: readNotice(record) };
}
