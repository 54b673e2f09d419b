/** Checks that this Node.js can run the product, before anything else is tried. */
import { SetupError } from './say.mjs';

const oldest = [20, 19];

/**
 * Throws when Node.js is older than the pinned packages allow.
 * @param {string} version such as `20.19.4`
 */
export function checkNodeVersion(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  const [needMajor = 0, needMinor = 0] = oldest;
  if (major > needMajor || (major === needMajor && minor >= needMinor)) return;
  throw new SetupError(`Node.js ${version} is too old. Install Node.js ${oldest.join('.')} or newer, then run the same command again.`);
}
