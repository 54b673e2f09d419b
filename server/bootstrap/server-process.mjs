/** The compiled programs of the server as child processes: migrate, seed, and the server itself. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';
import { run } from './processes.mjs';
import { SetupError } from './say.mjs';
import { checkStop } from './stopping.mjs';

/**
 * @typedef {{ folder: string, account: import('./accounts.mjs').Account | null }} Place
 */

/**
 * The environment without what npm adds for its own use.
 * @param {NodeJS.ProcessEnv} extra
 * @returns {NodeJS.ProcessEnv}
 */
export function childEnvironment(extra = {}) {
  const own = Object.entries(process.env).filter(([name]) => !/^npm_/i.test(name));
  return { ...Object.fromEntries(own), ...extra };
}

/**
 * Runs one of the compiled commands to its end.
 * @param {Place} place
 * @param {'migrate' | 'seed'} name
 * @param {NodeJS.ProcessEnv} env
 */
export async function runCommand(place, name, env) {
  const { code } = await run(process.execPath, ['--enable-source-maps', join('dist', 'server', `${name}.js`)], {
    cwd: place.folder,
    account: place.account,
    env,
    show: true,
  });
  checkStop();
  if (code !== 0) throw new SetupError(`${name === 'migrate' ? 'Bringing the database up to date' : 'Loading the vocabulary and the data'} failed; what it said is above.`);
}

/**
 * Starts the server in a process group of its own.
 * @param {Place} place
 * @param {NodeJS.ProcessEnv} env
 * @returns {{ pid: number, ended: Promise<number> }}
 */
export function startServer(place, env) {
  const { account } = place;
  const child = spawn(process.execPath, ['--enable-source-maps', join('dist', 'server', 'index.js')], {
    cwd: place.folder,
    env: { ...env, ...(account ? { HOME: '/' } : {}) },
    detached: true,
    stdio: ['ignore', 'inherit', 'inherit'],
    ...(account ? { uid: account.uid, gid: account.gid } : {}),
  });
  const ended = new Promise((/** @type {(code: number) => void} */ resolve, reject) => {
    child.on('error', reject);
    child.on('exit', (code, signal) => resolve(code ?? (signal ? 128 : 1)));
  });
  if (child.pid === undefined) throw new SetupError('The server could not be started.');
  return { pid: child.pid, ended };
}
