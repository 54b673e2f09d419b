/**
 * Child processes: run to the end, started to stay, found again, ended in order.
 *
 * Every child gets its own process group, so that a Ctrl-C at the terminal reaches this program alone and it decides
 * what stops first.
 */
import { spawn } from 'node:child_process';
import { readFileSync, readlinkSync } from 'node:fs';
import { setTimeout as wait } from 'node:timers/promises';
import { SetupError } from './say.mjs';

/**
 * @typedef {object} RunOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {import('./accounts.mjs').Account | null} [account] whom to run as (root only)
 * @property {string} [input] text for its standard input
 * @property {boolean} [show] let its output through to the terminal
 * @property {boolean} [together] stay in this process group (for programs that ask the terminal)
 * @property {boolean} [finish] let it finish when a stop is asked for
 *
 * @typedef {{ code: number, stdout: string, stderr: string }} Outcome
 */

/** Children that may be ended when a stop is asked for. @type {Set<import('node:child_process').ChildProcess>} */
const interruptible = new Set();

/** Ends what runs now and may be cut short. */
export function interruptChildren() {
  for (const child of interruptible) signalGroup(child.pid, 'SIGTERM');
}

/**
 * Runs a program to its end and gives what it printed.
 * @param {string} command
 * @param {string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<Outcome>}
 */
export function run(command, args, options = {}) {
  const { account, show = false } = options;
  const output = show ? 'inherit' : 'pipe';
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd: options.cwd ?? (account ? '/' : undefined),
      env: { ...(options.env ?? process.env), ...(account ? { HOME: '/' } : {}) },
      detached: !options.together,
      stdio: [options.input === undefined ? (options.together ? 'inherit' : 'ignore') : 'pipe', output, output],
      ...(account ? { uid: account.uid, gid: account.gid } : {}),
    });
    let stdout = '';
    let stderr = '';
    child.stdout?.setEncoding('utf8').on('data', (/** @type {string} */ text) => (stdout += text));
    child.stderr?.setEncoding('utf8').on('data', (/** @type {string} */ text) => (stderr += text));
    child.stdin?.on('error', () => undefined).end(options.input);
    if (!options.finish) interruptible.add(child);
    child.on('error', (error) => {
      interruptible.delete(child);
      reject(error);
    });
    child.on('close', (code, signal) => {
      interruptible.delete(child);
      resolve({ code: code ?? (signal ? 128 : 1), stdout, stderr });
    });
  });
}

/**
 * Runs a program that must succeed; says what it printed when it does not.
 * @param {string} what for the message, such as `Making the database's files`
 * @param {string} command
 * @param {string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<Outcome>}
 */
export async function runOrFail(what, command, args, options = {}) {
  const outcome = await run(command, args, options).catch((/** @type {Error} */ error) => ({ code: 127, stdout: '', stderr: error.message }));
  if (outcome.code === 0) return outcome;
  const tail = `${outcome.stdout}\n${outcome.stderr}`.trim().split('\n').slice(-15).join('\n');
  throw new SetupError(`${what} failed (${command} ended with ${outcome.code}).${tail ? `\n${tail}` : ''}`);
}

/**
 * Sends a signal to a process group; a group that is gone is no error.
 * @param {number | undefined} pid
 * @param {NodeJS.Signals} signal
 */
export function signalGroup(pid, signal) {
  if (pid === undefined) return;
  for (const target of [-pid, pid]) {
    try {
      process.kill(target, signal);
      return;
    } catch {
      // Not a group leader, or gone: try the process alone, then give up.
    }
  }
}

/**
 * Whether a process with that number exists.
 * @param {number} pid
 */
export function isAlive(pid) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
  return !/^State:\s+[ZX]/m.test(readProc(pid, 'status') ?? '');
}

/**
 * When a process started, as the system counts; with the number it names one process and no later one.
 * @param {number} pid
 * @returns {string | null}
 */
export function startMark(pid) {
  const stat = readProc(pid, 'stat');
  return stat ? stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? null : null;
}

/**
 * The folder a process works in, or null when that cannot be told.
 * @param {number} pid
 * @returns {string | null}
 */
export function workingFolder(pid) {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch {
    return null;
  }
}

/**
 * Asks a process group to end, and ends it when the time is up.
 * @param {number} pid
 * @param {number} limitMs
 */
export async function endProcess(pid, limitMs) {
  signalGroup(pid, 'SIGTERM');
  const deadline = Date.now() + limitMs;
  while (isAlive(pid) && Date.now() < deadline) await wait(30);
  if (!isAlive(pid)) return;
  signalGroup(pid, 'SIGKILL');
  while (isAlive(pid) && Date.now() < deadline + 2000) await wait(30);
}

/**
 * @param {number} pid
 * @param {string} file
 */
function readProc(pid, file) {
  try {
    return readFileSync(`/proc/${pid}/${file}`, 'utf8');
  } catch {
    return null;
  }
}
