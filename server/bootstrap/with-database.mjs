/** For commands that need the database for a moment: it is started when it does not run, and left as it was found. */
import { chosenEnvironment } from './environment.mjs';
import { findLocalDatabase, openLocalDatabase } from './local-database.mjs';
import { stopCluster } from './postgres-cluster.mjs';
import { SetupError } from './say.mjs';

/**
 * Runs the work with the settings of the database; DATABASE_URL with DATABASE_OWNER_URL, or our own.
 * @template T
 * @param {(context: { settings: Record<string, string | undefined>, database: import('./local-database.mjs').LocalDatabase | null }) => Promise<T>} work
 * @param {{ asOwner?: boolean }} [options] whether the work needs the owner's rights
 * @returns {Promise<T>}
 */
export async function withDatabase(work, { asOwner = true } = {}) {
  if (process.env.DATABASE_URL) {
    if (asOwner && !process.env.DATABASE_OWNER_URL) throw new SetupError('DATABASE_URL is set and DATABASE_OWNER_URL is not. This command works as the owner of the database: set both.');
    return work({ settings: { DATABASE_URL: process.env.DATABASE_URL, DATABASE_OWNER_URL: process.env.DATABASE_OWNER_URL, ...chosenEnvironment(null) }, database: null });
  }
  const wasRunning = (await findLocalDatabase()) !== null;
  const database = await openLocalDatabase();
  try {
    return await work({ settings: chosenEnvironment(database), database });
  } finally {
    if (!wasRunning) await stopCluster(database.cluster);
  }
}
