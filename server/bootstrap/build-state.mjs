/** Tells whether what was built still fits the sources, by a hash of everything that goes in. */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { inCheckout } from './checkout.mjs';

/**
 * What each part is made from and where its mark is kept.
 * @type {Record<'client' | 'server', { inputs: string[], output: string }>}
 */
export const parts = {
  client: { inputs: ['client', 'shared', 'vite.config.ts', 'package.json', 'package-lock.json'], output: 'dist/client' },
  server: { inputs: ['server', 'shared', 'seeds', 'package.json', 'package-lock.json'], output: 'dist/server' },
};

/**
 * Whether a part must be built.
 * @param {'client' | 'server'} part
 */
export function isStale(part) {
  const mark = markFile(part);
  return !existsSync(mark) || !existsSync(inCheckout(parts[part].output)) || readFileSync(mark, 'utf8') !== hashInputs(part);
}

/**
 * Forgets that a part was built; the first act of building it.
 * @param {'client' | 'server'} part
 */
export function forgetBuilt(part) {
  rmSync(markFile(part), { force: true });
}

/**
 * Remembers what a part was built from; the last act of building it.
 * @param {'client' | 'server'} part
 * @param {string} hash of the inputs, taken before building began
 */
export function rememberBuilt(part, hash) {
  writeFileSync(markFile(part), hash);
}

/** Hashes taken by this program; the sources do not change under a start. @type {Map<string, string>} */
const taken = new Map();

/**
 * The hash of a part's inputs: names and contents.
 * @param {'client' | 'server'} part
 */
export function hashInputs(part) {
  const known = taken.get(part);
  if (known) return known;
  const hash = createHash('sha256');
  for (const input of parts[part].inputs) {
    for (const file of filesUnder(input)) hash.update(`${file}\0`).update(readFileSync(inCheckout(file))).update('\0');
  }
  const result = hash.digest('hex');
  taken.set(part, result);
  return result;
}

/**
 * The files under a path of the checkout, in a fixed order.
 * @param {string} path
 * @returns {string[]}
 */
export function filesUnder(path) {
  if (!existsSync(inCheckout(path))) return [];
  const entries = (() => {
    try {
      return readdirSync(inCheckout(path), { withFileTypes: true });
    } catch {
      return null;
    }
  })();
  if (!entries) return [path];
  return entries
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => (entry.isDirectory() ? filesUnder(join(path, entry.name)) : entry.isFile() ? [join(path, entry.name)] : []));
}

/** @param {'client' | 'server'} part */
function markFile(part) {
  return inCheckout('dist', `.${part}-built-from`);
}
