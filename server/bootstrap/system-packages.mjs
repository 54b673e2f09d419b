/**
 * Installs what comes from the operating system: PostgreSQL, and a browser for the tests.
 * Only Debian's package tool is known; elsewhere the sentence says what to install.
 * Never asks for a password: without root or a password-free sudo the exact command is printed instead.
 */
import { existsSync, mkdirSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { isRoot } from './accounts.mjs';
import { run } from './processes.mjs';
import { SetupError, say } from './say.mjs';

const lists = '/var/lib/apt/lists';
const listsTooOldMs = 7 * 24 * 3600 * 1000;
const options = ['-o', 'DPkg::Lock::Timeout=180', '-o', 'Acquire::Retries=3'];

/**
 * The first program of that name on the search path, or null.
 * @param {string} name
 */
export function onPath(name) {
  for (const folder of (process.env.PATH ?? '').split(delimiter)) {
    if (folder && existsSync(join(folder, name))) return join(folder, name);
  }
  return null;
}

/**
 * Installs Debian packages.
 * @param {string[]} names
 * @param {string} purpose such as `the database`
 */
export async function installPackages(names, purpose) {
  const byHand = `apt-get update && apt-get install -y --no-install-recommends ${names.join(' ')}`;
  if (!onPath('apt-get')) {
    throw new SetupError(`${names.join(', ')} is needed for ${purpose} and is not on this machine. Install it with the system's own package tool, then run the same command again.`);
  }
  if (!isRoot && !(onPath('sudo') && (await run('sudo', ['-n', 'true'], { together: true })).code === 0)) {
    throw new SetupError(`${names.join(', ')} is needed for ${purpose} and installing it needs root. Run this, then the same command again:\n\n  sudo sh -c '${byHand}'\n`);
  }
  say(`Installing ${names.join(', ')} for ${purpose} ...`);
  if (listsAreOld()) await apt(['update', '-qq', ...options]);
  const install = ['install', '-y', '-qq', '--no-install-recommends', ...options, ...names];
  let outcome = await apt(install);
  if (outcome.code !== 0) {
    await apt(['update', '-qq', ...options]);
    outcome = await apt(install);
  }
  if (outcome.code !== 0) {
    throw new SetupError(`Installing ${names.join(', ')} failed:\n${`${outcome.stdout}\n${outcome.stderr}`.trim().split('\n').slice(-12).join('\n')}\nInstall it by hand, then run the same command again:\n\n  ${byHand}\n`);
  }
}

/** Keeps Debian's scripts from making and starting a database of their own beside ours. */
export async function preventMainCluster() {
  const folder = '/etc/postgresql-common/createcluster.d';
  const line = 'create_main_cluster = false';
  if (isRoot) {
    mkdirSync(folder, { recursive: true });
    writeFileSync(join(folder, 'sillstone.conf'), `${line}\n`);
  } else if (onPath('sudo')) {
    // Failing here is met again, with a sentence, when the package itself is installed.
    await run('sudo', ['-n', 'sh', '-c', `mkdir -p ${folder} && echo '${line}' > ${folder}/sillstone.conf`], { together: true });
  }
}

/** @param {string[]} args */
function apt(args) {
  const env = ['env', 'DEBIAN_FRONTEND=noninteractive', 'LC_ALL=C'];
  // A package tool cut short leaves the machine half-configured, so a stop waits for it.
  return isRoot
    ? run('env', [...env.slice(1), 'apt-get', ...args], { finish: true })
    : run('sudo', ['-n', ...env, 'apt-get', ...args], { finish: true, together: true });
}

function listsAreOld() {
  if (!existsSync(lists)) return true;
  const files = readdirSync(lists).filter((name) => /_Packages(\.\w+)?$/.test(name));
  return files.length === 0 || Date.now() - statSync(lists).mtimeMs > listsTooOldMs;
}
