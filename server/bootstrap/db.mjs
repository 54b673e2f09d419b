/** `npm run db -- start | stop | psql | backup | restore`: the database by hand. */
import { spawn } from 'node:child_process';
import { join, resolve } from 'node:path';
import { buildWhatIsStale } from './build.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { isInstanceRunning } from './instance.mjs';
import { findLocalDatabase, openLocalDatabase } from './local-database.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { stopCluster } from './postgres-cluster.mjs';
import { ensurePostgresPrograms } from './postgres-programs.mjs';
import { forgetPreparation } from './preparation.mjs';
import { run } from './processes.mjs';
import { SetupError, main, say } from './say.mjs';
import { childEnvironment } from './server-process.mjs';
import { withDatabase } from './with-database.mjs';

const usage = `npm run db -- COMMAND
  start                    start the local database and leave it running
  stop                     stop it
  psql [--app] [-c SQL]    PostgreSQL's own prompt, as the owner, or as the application's role
  backup [FILE]            write a backup and, beside it, a manifest with its checksum and row counts
  restore FILE [--force]   load a backup into the database; --force empties one that holds something`;

/** @type {Record<string, (args: string[]) => Promise<number | void>>} */
const commands = { start, stop, psql, backup, restore };

await main(async () => {
  checkNodeVersion();
  const [name = '', ...args] = process.argv.slice(2);
  const command = commands[name];
  if (!command) throw new SetupError(name ? `There is no command "${name}".\n${usage}` : usage);
  return command(args);
});

async function start() {
  const { cluster } = await openLocalDatabase();
  say(`The database runs on port ${cluster.port} (${cluster.directory}).`);
}

async function stop() {
  const running = await findLocalDatabase();
  if (!running) return say('The local database is not running.');
  if (isInstanceRunning(join(running.directory, '..'))) throw new SetupError('The server is using the database. Stop it first (Ctrl-C where npm start runs).');
  await stopCluster(running);
  say('The database is stopped.');
}

/** @param {string[]} args */
async function psql(args) {
  const asApplication = args[0] === '--app';
  return withDatabase(async ({ settings, database }) => {
    const url = new URL((asApplication ? settings.DATABASE_URL : settings.DATABASE_OWNER_URL) ?? '');
    const program = join(database?.cluster.programs ?? (await ensurePostgresPrograms()), 'psql');
    const env = { ...process.env, PGPASSWORD: decodeURIComponent(url.password) };
    url.password = '';
    const child = spawn(program, ['-X', url.href, ...args.slice(asApplication ? 1 : 0)], { env, stdio: 'inherit' });
    // Ctrl-C cancels a statement there; it must not end this program under it.
    process.on('SIGINT', () => undefined);
    return new Promise((/** @type {(code: number) => void} */ done, reject) => {
      child.on('error', reject);
      child.on('exit', (code) => done(code ?? 1));
    });
  });
}

/** @param {string[]} args */
async function backup(args) {
  const [file] = args;
  const stamp = new Date().toISOString().replace(/[-:]/g, '').replace(/\.\d+Z$/, 'Z');
  return ownerCommand('db-backup', [resolve(process.env.INIT_CWD ?? process.cwd(), file ?? `sillstone-${stamp}.dump`)]);
}

/** @param {string[]} args */
async function restore(args) {
  const [file] = args.filter((arg) => !arg.startsWith('--'));
  if (!file) throw new SetupError(`Which backup?\n${usage}`);
  // The roles a backup grants to exist by now: opening the local database makes them.
  return ownerCommand('db-restore', [resolve(process.env.INIT_CWD ?? process.cwd(), file), ...(args.includes('--force') ? ['--force'] : [])]);
}

/**
 * Runs a compiled command with the owner's rights. It runs as the present account: it reads and writes the person's files.
 * @param {'db-backup' | 'db-restore'} name
 * @param {string[]} args
 */
async function ownerCommand(name, args) {
  await ensurePackages();
  await buildWhatIsStale();
  return withDatabase(async ({ settings, database }) => {
    const programs = database?.cluster.programs ?? (await ensurePostgresPrograms());
    if (database && name === 'db-restore') forgetPreparation(database.cluster.directory);
    const { code } = await run(process.execPath, ['--enable-source-maps', inCheckout('dist', 'server', `${name}.js`), programs, ...args], {
      cwd: checkout,
      env: childEnvironment({ SESSION_SECRET: 'not used by this command, but asked for', ...settings }),
      show: true,
      finish: true,
    });
    return code;
  });
}
