/**
 * Migrates the database and loads the vocabulary and, in demonstration mode, the invented data.
 *
 * Both commands do nothing when there is nothing to do, but take a second to find that out. For the local database the
 * answer is kept in its data directory, so that it goes where the data goes, and is asked again when any input changes.
 */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { filesUnder, hashInputs } from './build-state.mjs';
import { inCheckout } from './checkout.mjs';
import { runCommand } from './server-process.mjs';

/** @param {string} directory the data directory */
const markFile = (directory) => join(directory, 'sillstone.prepared');

/**
 * Brings the database to the state this version needs.
 * @param {import('./server-process.mjs').Place} place
 * @param {NodeJS.ProcessEnv} env with the owner's address
 * @param {string | null} directory of the local database; null for one elsewhere
 */
export async function prepareDatabase(place, env, directory) {
  const wanted = mark(env.SILLSTONE_DEMO ?? '');
  if (directory && existsSync(markFile(directory)) && readFileSync(markFile(directory), 'utf8') === wanted) return;
  await runCommand(place, 'migrate', env);
  await runCommand(place, 'seed', env);
  if (directory) writeFileSync(markFile(directory), wanted);
}

/**
 * Makes the next start look again, after the database was changed by hand.
 * @param {string} directory
 */
export function forgetPreparation(directory) {
  rmSync(markFile(directory), { force: true });
}

/** @param {string} demonstration */
function mark(demonstration) {
  const hash = createHash('sha256').update(`${demonstration}\0${hashInputs('server')}`);
  for (const file of filesUnder('drizzle')) hash.update(readFileSync(inCheckout(file)));
  return hash.digest('hex');
}
