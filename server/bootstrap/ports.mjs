/** Which ports of this machine are free. */
import { connect, createServer } from 'node:net';
import { SetupError } from './say.mjs';

/**
 * Whether nobody listens on that port.
 * @param {number} port
 * @param {string} host
 * @returns {Promise<boolean>}
 */
export function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', () => resolve(false));
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * The first free port at or after the given one.
 * @param {number} first
 * @param {string} host
 * @returns {Promise<number>}
 */
export async function freePort(first, host = '127.0.0.1') {
  for (let port = first; port < first + 200; port += 1) {
    if (await isPortFree(port, host)) return port;
  }
  throw new SetupError(`No free port between ${first} and ${first + 199}.`);
}

/**
 * Whether somebody takes connections on that port.
 * @param {number} port
 * @param {string} host
 * @returns {Promise<boolean>}
 */
export function answers(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = connect({ port, host, timeout: 2000 });
    const settle = (/** @type {boolean} */ result) => {
      probe.destroy();
      resolve(result);
    };
    probe.once('connect', () => settle(true)).once('error', () => settle(false)).once('timeout', () => settle(false));
  });
}
