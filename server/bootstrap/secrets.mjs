/** Passwords and the session secret of a local database, made once and readable by their owner alone. */
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * @typedef {{ superuser: string, owner: string, application: string, session: string }} Secrets
 */

const random = () => randomBytes(32).toString('base64url');

/**
 * The secrets kept in a data folder, or null when none have been made there.
 * @param {string} folder
 * @returns {Secrets | null}
 */
export function readSecrets(folder) {
  const file = join(folder, 'secrets.json');
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null;
}

/**
 * The secrets of a data folder, made on first use.
 * @param {string} folder
 * @returns {Secrets}
 */
export function ensureSecrets(folder) {
  const known = readSecrets(folder);
  if (known) return known;
  mkdirSync(folder, { recursive: true });
  const made = { superuser: random(), owner: random(), application: random(), session: random() };
  const file = join(folder, 'secrets.json');
  writeFileSync(`${file}.new`, `${JSON.stringify(made, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return made;
}
