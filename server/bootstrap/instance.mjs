/** Which start of this checkout is running, so that two do not meet and what a kill left behind is ended first. */
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { endProcess, isAlive, startMark } from './processes.mjs';
import { SetupError } from './say.mjs';

/**
 * @typedef {{ pid: number, mark: string | null }} Known
 * @typedef {{ starter?: Known, server?: Known }} Instance
 */

/**
 * Claims the data folder for this start; ends a server whose starter was killed.
 * @param {string} dataFolder
 */
export async function claimInstance(dataFolder) {
  const before = read(dataFolder);
  if (isSame(before.starter)) {
    throw new SetupError(`Sillstone is already running from this checkout (process ${before.starter?.pid}). Stop it first.`);
  }
  if (before.server && isSame(before.server)) await endProcess(before.server.pid, 6000);
  write(dataFolder, { starter: { pid: process.pid, mark: startMark(process.pid) } });
}

/**
 * Remembers the server's process, for a start after a kill.
 * @param {string} dataFolder
 * @param {number} pid
 */
export function rememberServer(dataFolder, pid) {
  write(dataFolder, { ...read(dataFolder), server: { pid, mark: startMark(pid) } });
}

/**
 * Gives the data folder back.
 * @param {string} dataFolder
 */
export function releaseInstance(dataFolder) {
  if (read(dataFolder).starter?.pid === process.pid) rmSync(file(dataFolder), { force: true });
}

/**
 * Whether a start of this checkout is running now.
 * @param {string} dataFolder
 */
export function isInstanceRunning(dataFolder) {
  return isSame(read(dataFolder).starter);
}

/** @param {Known | undefined} known */
function isSame(known) {
  return known !== undefined && known.pid !== process.pid && isAlive(known.pid) && startMark(known.pid) === known.mark;
}

/** @param {string} dataFolder */
const file = (dataFolder) => join(dataFolder, 'running.json');

/**
 * @param {string} dataFolder
 * @returns {Instance}
 */
function read(dataFolder) {
  try {
    return existsSync(file(dataFolder)) ? JSON.parse(readFileSync(file(dataFolder), 'utf8')) : {};
  } catch {
    // Cut short by a kill while it was written: it tells nothing.
    return {};
  }
}

/**
 * @param {string} dataFolder
 * @param {Instance} instance
 */
function write(dataFolder, instance) {
  writeFileSync(file(dataFolder), JSON.stringify(instance));
}
