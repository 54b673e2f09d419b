/**
 * One PostgreSQL server on loopback: its files made, started in a session of its own, found again after a kill, stopped.
 *
 * It listens on 127.0.0.1 only and has no socket file, so there is no path to keep short and nothing to clean up.
 */
import { appendFileSync, chmodSync, chownSync, existsSync, mkdirSync, readFileSync, realpathSync, renameSync, rmSync, statSync, truncateSync, unlinkSync, writeFileSync } from 'node:fs';
import { totalmem } from 'node:os';
import { dirname, join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { answers, freePort, isPortFree } from './ports.mjs';
import { isAlive, run, runOrFail, workingFolder } from './processes.mjs';
import { SetupError, say } from './say.mjs';

const firstPort = 54329;
const logLimit = 5_000_000;

/**
 * @typedef {object} Cluster
 * @property {string} programs folder of PostgreSQL's programs
 * @property {string} directory the data directory
 * @property {import('./accounts.mjs').Account | null} account whom it runs as, null for the present account
 * @property {string} password of the superuser `postgres`
 * @property {Record<string, string>} [settings] what this server needs beyond the usual
 *
 * @typedef {Cluster & { port: number, adopted: boolean }} RunningCluster
 */

/**
 * Makes the data directory unless it is there. An unfinished one (a kill in between) is begun again.
 * @param {Cluster} cluster
 */
export async function ensureCluster(cluster) {
  const { programs, directory, account, password } = cluster;
  if (existsSync(join(directory, 'PG_VERSION'))) return;
  say('Making the database ...');
  const unfinished = `${directory}.new`;
  const passwordFile = `${directory}.password`;
  mkdirSync(dirname(directory), { recursive: true });
  rmSync(unfinished, { recursive: true, force: true });
  mkdirSync(unfinished, { mode: 0o700 });
  writeFileSync(passwordFile, password, { mode: 0o600 });
  if (account) for (const path of [unfinished, passwordFile]) chownSync(path, account.uid, account.gid);
  const args = ['-D', unfinished, '-U', 'postgres', '-E', 'UTF8', '-A', 'scram-sha-256', `--pwfile=${passwordFile}`];
  try {
    // Not every system has C.UTF-8; every column names its own collation, so plain C does as well.
    const first = await run(join(programs, 'initdb'), [...args, '--locale=C.UTF-8'], { account });
    if (first.code !== 0) await runOrFail('Making the database', join(programs, 'initdb'), [...args, '--no-locale'], { account });
  } finally {
    unlinkSync(passwordFile);
  }
  appendFileSync(join(unfinished, 'postgresql.conf'), "\ninclude_if_exists = 'sillstone.conf'\n");
  renameSync(unfinished, directory);
}

/**
 * Starts the server, or takes over the one that still runs on that data directory.
 * @param {Cluster} cluster
 * @returns {Promise<RunningCluster>}
 */
export async function startCluster(cluster) {
  const running = await findRunning(cluster);
  if (running) return running;
  let port = await rememberedPort(cluster.directory);
  for (let attempt = 0; ; attempt += 1) {
    writeSettings(cluster, port);
    const log = prepareLog(cluster);
    const started = await run(join(cluster.programs, 'pg_ctl'), ['start', '-D', cluster.directory, '-l', log, '-w', '-t', '90', '-s'], { account: cluster.account, finish: true });
    if (started.code === 0) return { ...cluster, port, adopted: false };
    const said = readFileSync(log, 'utf8').slice(-2000);
    if (attempt < 40 && /Address already in use|could not create any TCP\/IP sockets/.test(said) && !(await isPortFree(port))) {
      port = await freePort(port + 1);
    } else if (attempt < 40 && /shared memory block .* is still in use|lock file .* already exists/.test(said)) {
      // The children of a killed server take a moment to notice and leave.
      await wait(250);
    } else {
      throw new SetupError(`The database did not start:\n${`${said}\n${started.stderr}`.trim().split('\n').slice(-12).join('\n')}`);
    }
    truncateSync(log);
  }
}

/**
 * Stops the server: connections are closed, everything is written.
 * @param {Cluster} cluster
 */
export async function stopCluster(cluster) {
  if (postmasterOf(cluster.directory) === null) return;
  const stop = (/** @type {string} */ mode, /** @type {number} */ seconds) =>
    run(join(cluster.programs, 'pg_ctl'), ['stop', '-D', cluster.directory, '-m', mode, '-w', '-t', String(seconds), '-s'], { account: cluster.account, finish: true });
  if ((await stop('fast', 20)).code !== 0) await stop('immediate', 10);
}

/**
 * The server that runs on this data directory, waited for until it answers; null when none does.
 * @param {Cluster} cluster
 * @returns {Promise<RunningCluster | null>}
 */
export async function findRunning(cluster) {
  const pidFile = join(cluster.directory, 'postmaster.pid');
  const deadline = Date.now() + 60_000;
  while (Date.now() < deadline) {
    const postmaster = postmasterOf(cluster.directory);
    if (postmaster === null) {
      // Left behind by a kill. PostgreSQL would refuse to start if the number belongs to another process by now.
      rmSync(pidFile, { force: true });
      return null;
    }
    // What the file says may be the last word of a server that is being killed: it must answer, too.
    if (postmaster.status === 'ready' && (await answers(postmaster.port))) return { ...cluster, port: postmaster.port, adopted: true };
    await wait(100);
  }
  throw new SetupError(`A database server is running on ${cluster.directory} but does not answer. Its log is ${join(cluster.directory, 'server.log')}.`);
}

/**
 * What `postmaster.pid` says, when its process lives and is the one of this data directory.
 * @param {string} directory
 */
function postmasterOf(directory) {
  const file = join(directory, 'postmaster.pid');
  if (!existsSync(file)) return null;
  const lines = readFileSync(file, 'utf8').split('\n');
  const pid = Math.abs(Number(lines[0]));
  if (!pid || !isAlive(pid)) return null;
  const folder = workingFolder(pid);
  if (folder !== null && folder !== realpathSync(directory)) return null;
  return { pid, port: Number(lines[3]), status: (lines[7] ?? '').trim() };
}

/**
 * The port used before when it is still free, else the next free one.
 * @param {string} directory
 */
async function rememberedPort(directory) {
  const file = join(directory, 'sillstone.conf');
  const before = existsSync(file) ? Number(/^port = (\d+)$/m.exec(readFileSync(file, 'utf8'))?.[1]) : Number.NaN;
  return Number.isFinite(before) && (await isPortFree(before)) ? before : freePort(firstPort);
}

/**
 * @param {Cluster} cluster
 * @param {number} port
 */
function writeSettings({ directory, account, settings = {} }, port) {
  const megabytes = Math.floor(totalmem() / 2 ** 20);
  const all = {
    port: String(port),
    listen_addresses: "'127.0.0.1'",
    unix_socket_directories: "''",
    max_connections: '120',
    password_encryption: "'scram-sha-256'",
    timezone: "'UTC'",
    log_timezone: "'UTC'",
    lc_messages: "'C'",
    // The searches are short; compiling a plan costs more than it saves.
    jit: 'off',
    random_page_cost: '1.1',
    shared_buffers: `'${Math.max(64, Math.min(1024, Math.floor(megabytes / 8)))}MB'`,
    effective_cache_size: `'${Math.max(128, Math.floor(megabytes / 2))}MB'`,
    ...settings,
  };
  const file = join(directory, 'sillstone.conf');
  const text = Object.entries(all).map(([name, value]) => `${name} = ${value}\n`).join('');
  writeFileSync(file, `# Written at each start.\n${text}`);
  chmodSync(file, 0o600);
  if (account) chownSync(file, account.uid, account.gid);
}

/** @param {Cluster} cluster */
function prepareLog({ directory, account }) {
  const log = join(directory, 'server.log');
  if ((statSync(log, { throwIfNoEntry: false })?.size ?? logLimit) >= logLimit) writeFileSync(log, '', { mode: 0o600 });
  if (account) chownSync(log, account.uid, account.gid);
  return log;
}
