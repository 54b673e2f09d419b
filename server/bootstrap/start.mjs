/**
 * `npm start`: from a fresh clone to an answering server.
 *
 * Node.js checked, packages installed, PostgreSQL found or installed and started, what is stale built, the database
 * brought up to date and filled, the server started. Stopping goes the other way: the server first, the database last.
 */
import { checkNodeVersion } from './node-version.mjs';
import { buildWhatIsStale } from './build.mjs';
import { claimInstance, releaseInstance, rememberServer } from './instance.mjs';
import { openLocalDatabase } from './local-database.mjs';
import { chosenEnvironment } from './environment.mjs';
import { ensurePackages } from './packages.mjs';
import { isPortFree } from './ports.mjs';
import { stopCluster } from './postgres-cluster.mjs';
import { prepareDatabase } from './preparation.mjs';
import { endProcess } from './processes.mjs';
import { prepareRunningFolder } from './running-copy.mjs';
import { SetupError, main, say } from './say.mjs';
import { childEnvironment, startServer } from './server-process.mjs';
import { Stopped, checkStop, isStopping, listenForStop, stopAsked } from './stopping.mjs';

const serverStopMs = 6000;

await main(async () => {
  checkNodeVersion();
  listenForStop();
  /** @type {(() => Promise<void> | void)[]} what to undo, the last first */
  const undo = [];
  try {
    return await start(undo);
  } catch (error) {
    if (error instanceof Stopped || isStopping()) return 0;
    throw error;
  } finally {
    for (const step of undo.reverse()) await step();
  }
});

/** @param {(() => Promise<void> | void)[]} undo */
async function start(undo) {
  await ensurePackages();
  checkStop();
  const { settings, database } = await openDatabase(undo);
  checkStop();
  await buildWhatIsStale();
  checkStop();
  if (!(await isPortFree(Number(settings.PORT), settings.HOST))) {
    throw new SetupError(`Port ${settings.PORT} of ${settings.HOST} is in use. Stop what uses it, or choose another: PORT=4300 npm start`);
  }
  const place = await prepareRunningFolder();
  const withOwner = childEnvironment(settings);
  if (settings.DATABASE_OWNER_URL) {
    await prepareDatabase(place, withOwner, database?.cluster.directory ?? null);
  } else {
    say('DATABASE_OWNER_URL is not set, so the database is taken as it is: not migrated, nothing loaded.');
  }
  // The server itself never sees the owner's address: a fault in it can do only what the application's role may.
  const { DATABASE_OWNER_URL: _owner, ...withoutOwner } = withOwner;
  const server = startServer(place, { ...withoutOwner, NODE_ENV: 'production' });
  if (database) rememberServer(database.dataFolder, server.pid);
  undo.push(() => endProcess(server.pid, serverStopMs));
  const code = await Promise.race([server.ended, stopAsked()]);
  if (isStopping()) return 0;
  say(`The server ended by itself (${code}).`);
  return code || 1;
}

/**
 * The database to use: the one of DATABASE_URL, else our own.
 * @param {(() => Promise<void> | void)[]} undo
 */
async function openDatabase(undo) {
  if (process.env.DATABASE_URL) return { settings: chosenEnvironment(null), database: null };
  const database = await openLocalDatabase({ announce: true });
  undo.push(() => stopCluster(database.cluster));
  await claimInstance(database.dataFolder).catch((/** @type {unknown} */ error) => {
    // It belongs to another start of this checkout: leave it running.
    undo.pop();
    throw error;
  });
  undo.push(() => releaseInstance(database.dataFolder));
  return { settings: chosenEnvironment(database), database };
}
