/**
 * Where the local database and what belongs to it are kept.
 *
 * Usually `.data` in the checkout. A checkout under a home folder that only its owner may enter (root's, as a rule) is
 * out of reach for the account PostgreSQL runs as; then it is a folder under /var/lib named after the checkout's path.
 */
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { isRoot, mayUse } from './accounts.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { SetupError, say } from './say.mjs';

/** The folder asked for, before anybody looked whether it can be reached. */
export const wantedDataFolder = process.env.SILLSTONE_DATA_DIR ? resolve(checkout, process.env.SILLSTONE_DATA_DIR) : inCheckout('.data');

/** The folder used instead when the checkout cannot be reached. */
export const remoteDataFolder = join('/var/lib/sillstone', createHash('sha256').update(checkout).digest('hex').slice(0, 12));

/**
 * Chooses the data folder, makes it, and says so when it is not the usual one.
 * @param {import('./accounts.mjs').Account | null} account whom PostgreSQL runs as
 * @param {{ announce?: boolean }} [options] say where the data is although it was there before
 */
export function chooseDataFolder(account, { announce = false } = {}) {
  if (!isRoot || !account || mayUse(account, nearestExisting(wantedDataFolder))) {
    mkdirSync(wantedDataFolder, { recursive: true });
    return wantedDataFolder;
  }
  if (process.env.SILLSTONE_DATA_DIR) {
    throw new SetupError(`SILLSTONE_DATA_DIR is ${wantedDataFolder}, which the account "${account.name}" that runs PostgreSQL cannot enter. Name a folder it can reach.`);
  }
  if (announce || !existsSync(join(remoteDataFolder, 'postgres'))) {
    say(`The account "${account.name}" that runs PostgreSQL cannot enter ${checkout}, so the data is kept in ${remoteDataFolder}.`);
  }
  mkdirSync(remoteDataFolder, { recursive: true, mode: 0o755 });
  const note = join(remoteDataFolder, 'checkout.txt');
  if (!existsSync(note)) writeFileSync(note, `${checkout}\n`);
  return remoteDataFolder;
}

/** @param {string} path */
function nearestExisting(path) {
  let folder = path;
  while (!existsSync(folder)) folder = dirname(folder);
  return folder;
}
