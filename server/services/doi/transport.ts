import { lookup } from 'node:dns/promises';
import http from 'node:http';
import https from 'node:https';

/** An IP address with its family, as name resolution gives it. */
export type HostAddress = { address: string; family: number };

/** Finds the addresses of a host name. */
export type ResolveHost = (hostname: string) => Promise<HostAddress[]>;

/** One answer of the other side, its body not yet read. */
export type TransportResponse = { status: number; headers: Readonly<Record<string, string | undefined>>; body: AsyncIterable<Uint8Array>; discard(): void };

/** Sends one GET request to exactly the given IP address, so that the name can't mean another machine by then. */
export type Transport = (url: URL, to: HostAddress, headers: Readonly<Record<string, string>>, signal: AbortSignal) => Promise<TransportResponse>;

/** Name resolution by the system. */
export const resolveHost: ResolveHost = (hostname) => lookup(hostname.replace(/^\[|\]$/g, ''), { all: true, verbatim: true });

/** HTTP or HTTPS by Node's own client; no connection is kept. */
export const sendRequest: Transport = (url, to, headers, signal) => new Promise((resolve, reject) => {
  const client = url.protocol === 'https:' ? https : http;
  const request = client.request(url, {
    method: 'GET',
    agent: false,
    headers,
    signal,
    maxHeaderSize: 16_384,
    lookup: (_hostname, options, callback) => {
      if (options.all) callback(null, [to]);
      else callback(null, to.address, to.family);
    },
  });
  request.once('error', reject);
  request.once('response', (response) => {
    // An error while the body is discarded has no reader; it must not end the process.
    response.on('error', () => undefined);
    const plain: Record<string, string | undefined> = {};
    for (const [name, value] of Object.entries(response.headers)) plain[name] = Array.isArray(value) ? value.join(', ') : value;
    resolve({ status: response.statusCode ?? 0, headers: plain, body: response, discard: () => request.destroy() });
  });
  request.on('error', () => undefined);
  request.end();
});
