/**
 * One orderly stop. Ctrl-C at a terminal reaches every process of the group, npm included, and npm passes it on, so the
 * same wish arrives twice; a person who asks again after five seconds means it.
 */
import { interruptChildren } from './processes.mjs';
import { say } from './say.mjs';

const repeatedWishMs = 5000;
const lookMs = 500;
/** @type {number | null} */
let askedAt = null;
/** @type {(() => void)[]} */
const listeners = [];

/** Thrown between two steps of a start when a stop was asked for. */
export class Stopped extends Error {}

/** Begins to listen for the wish to stop. */
export function listenForStop() {
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) process.on(signal, askToStop);
  // npm killed or ended by a signal of its own leaves its child behind without a word: then nobody is there to stop us.
  if (process.env.npm_lifecycle_event) {
    const parent = process.ppid;
    const watch = setInterval(() => {
      if (process.ppid === parent) return;
      clearInterval(watch);
      askToStop();
    }, lookMs);
    watch.unref();
  }
}

/** Whether a stop was asked for. */
export const isStopping = () => askedAt !== null;

/** Throws when a stop was asked for. */
export function checkStop() {
  if (isStopping()) throw new Stopped('Stopped.');
}

/**
 * Resolves when a stop is asked for.
 * @returns {Promise<void>}
 */
export function stopAsked() {
  return isStopping() ? Promise.resolve() : new Promise((resolve) => listeners.push(resolve));
}

function askToStop() {
  if (askedAt === null) {
    askedAt = Date.now();
    say('Stopping ...');
    interruptChildren();
    for (const listener of listeners) listener();
  } else if (Date.now() - askedAt > repeatedWishMs) {
    process.exit(1);
  }
}
