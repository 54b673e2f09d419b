/** Finds PostgreSQL's own programs, or installs them. */
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { SetupError } from './say.mjs';
import { installPackages, onPath, preventMainCluster } from './system-packages.mjs';

const debianFolder = '/usr/lib/postgresql';
const oldestMajor = 15;

/**
 * The folder with `initdb`, `pg_ctl` and `postgres`; installs PostgreSQL when there is none.
 * @param {string | null} dataDirectory its major version is the one needed, when it holds a database already
 * @returns {Promise<string>}
 */
export async function ensurePostgresPrograms(dataDirectory = null) {
  const major = dataDirectory ? majorOf(dataDirectory) : null;
  const found = findPostgresPrograms(major);
  if (found) return found;
  await preventMainCluster();
  await installPackages([major === null ? 'postgresql' : `postgresql-${major}`], 'the database');
  const installed = findPostgresPrograms(major);
  if (installed) return installed;
  throw new SetupError(`PostgreSQL ${major ?? oldestMajor} or newer is needed, and the one this system offers is older. Install a newer one and put its programs on the PATH, or set DATABASE_URL.`);
}

/**
 * The folder with PostgreSQL's programs, the newest first, or null.
 * @param {number | null} major only this version will do
 * @returns {string | null}
 */
export function findPostgresPrograms(major = null) {
  const versions = existsSync(debianFolder) ? readdirSync(debianFolder).map(Number).filter(Number.isFinite) : [];
  for (const version of versions.sort((a, b) => b - a)) {
    const folder = join(debianFolder, String(version), 'bin');
    const fits = major === null ? version >= oldestMajor : version === major;
    if (fits && existsSync(join(folder, 'initdb')) && existsSync(join(folder, 'postgres'))) return folder;
  }
  const command = onPath('initdb');
  return command && existsSync(join(dirname(command), 'postgres')) ? dirname(command) : null;
}

/**
 * The major version that made a data directory, or null when it holds nothing yet.
 * @param {string} dataDirectory
 */
export function majorOf(dataDirectory) {
  const file = join(dataDirectory, 'PG_VERSION');
  return existsSync(file) ? Number.parseInt(readFileSync(file, 'utf8'), 10) : null;
}
