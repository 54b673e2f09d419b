/** The product's own database on this machine, from nothing to an address to connect to. */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { databaseAccount } from './accounts.mjs';
import { chooseDataFolder, remoteDataFolder, wantedDataFolder } from './data-folder.mjs';
import { ensureCluster, findRunning, startCluster } from './postgres-cluster.mjs';
import { ensurePostgresPrograms, findPostgresPrograms, majorOf } from './postgres-programs.mjs';
import { applicationRole, connectionUrl, ensureRolesAndDatabase, ownerRole } from './postgres-roles.mjs';
import { SetupError } from './say.mjs';
import { ensureSecrets, readSecrets } from './secrets.mjs';

/**
 * @typedef {object} LocalDatabase
 * @property {import('./postgres-cluster.mjs').RunningCluster} cluster
 * @property {string} dataFolder
 * @property {string} applicationUrl
 * @property {string} ownerUrl
 * @property {string} sessionSecret
 */

/**
 * Starts the local database, installing and making what is missing.
 * @param {{ announce?: boolean }} [options] say where the data is when that is not the usual place
 * @returns {Promise<LocalDatabase>}
 */
export async function openLocalDatabase(options = {}) {
  const programs = await ensurePostgresPrograms(existingDirectory());
  const account = databaseAccount(existingDirectory() ?? join(wantedDataFolder, 'postgres'));
  const dataFolder = chooseDataFolder(account, options);
  const directory = join(dataFolder, 'postgres');
  if (existsSync(directory) && !readSecrets(dataFolder)) {
    throw new SetupError(`The database in ${directory} is there but its passwords (secrets.json beside it) are gone. Put the file back, or move the folder away to begin with an empty database.`);
  }
  const secrets = ensureSecrets(dataFolder);
  const settings = { programs, directory, account, password: secrets.superuser };
  await ensureCluster(settings);
  const cluster = await startCluster(settings);
  await ensureRolesAndDatabase(cluster, secrets);
  return {
    cluster,
    dataFolder,
    applicationUrl: connectionUrl(cluster, applicationRole, secrets.application),
    ownerUrl: connectionUrl(cluster, ownerRole, secrets.owner),
    sessionSecret: secrets.session,
  };
}

/**
 * The local database when it is running already; null when it is not, or has never been made.
 * @returns {Promise<import('./postgres-cluster.mjs').RunningCluster | null>}
 */
export async function findLocalDatabase() {
  const directory = existingDirectory();
  const programs = directory && findPostgresPrograms(majorOf(directory));
  if (!directory || !programs) return null;
  const secrets = readSecrets(join(directory, '..'));
  return findRunning({ programs, directory, account: databaseAccount(directory), password: secrets?.superuser ?? '' });
}

/** The data directory of an earlier start, wherever it was put. */
function existingDirectory() {
  const places = process.env.SILLSTONE_DATA_DIR ? [wantedDataFolder] : [wantedDataFolder, remoteDataFolder];
  return places.map((place) => join(place, 'postgres')).find((directory) => existsSync(join(directory, 'PG_VERSION'))) ?? null;
}
