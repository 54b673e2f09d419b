/** Installs the packages of the lock file when they are missing or the lock file has changed. */
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { checkout, inCheckout } from './checkout.mjs';
import { run } from './processes.mjs';
import { SetupError, say } from './say.mjs';

const stamp = inCheckout('node_modules', '.sillstone-lock');

/**
 * @typedef {{ version?: string, dev?: boolean, optional?: boolean, devOptional?: boolean, peer?: boolean, link?: boolean }} LockedPackage
 */

/**
 * The packages the lock file names, by folder.
 * @param {string} file
 * @returns {Record<string, LockedPackage>}
 */
export function lockedPackages(file = inCheckout('package-lock.json')) {
  return JSON.parse(readFileSync(file, 'utf8')).packages;
}

/** Makes `node_modules` what the lock file says; does nothing when it is already. */
export async function ensurePackages() {
  const wanted = lockMark();
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  if (!installedAsLocked()) await install();
  writeFileSync(stamp, wanted);
}

async function install() {
  say('Installing packages ...');
  const npm = process.env.npm_execpath;
  const [command, first] = npm && /npm-cli\.c?js$/.test(npm) ? [process.execPath, [npm]] : ['npm', []];
  // Development packages are needed to build, whatever NODE_ENV says.
  const args = [...first, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  let outcome = await run(command, args, { cwd: checkout });
  if (outcome.code !== 0 && outcome.code !== 128) outcome = await run(command, args, { cwd: checkout });
  if (outcome.code !== 0) {
    throw new SetupError(`Installing the packages failed:\n${`${outcome.stdout}\n${outcome.stderr}`.trim().split('\n').slice(-12).join('\n')}`);
  }
}

function lockMark() {
  const hash = createHash('sha256').update(readFileSync(inCheckout('package-lock.json')));
  return hash.update(`${process.platform} ${process.arch} ${process.versions.modules}`).digest('hex');
}

/** Whether somebody ran npm by hand and everything is there already. */
function installedAsLocked() {
  const hidden = inCheckout('node_modules', '.package-lock.json');
  if (!existsSync(hidden)) return false;
  const there = lockedPackages(hidden);
  return Object.entries(lockedPackages()).every(([folder, { version, optional, devOptional, peer }]) =>
    folder === '' || (there[folder] ? there[folder].version === version : Boolean(optional || devOptional || peer)),
  );
}
