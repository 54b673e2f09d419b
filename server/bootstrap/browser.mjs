/** Finds the browser the tests drive, or installs it. */
import { SetupError } from './say.mjs';
import { installPackages, onPath } from './system-packages.mjs';

const names = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome'];

/** The browser's program, or null. */
export function findBrowser() {
  return names.map(onPath).find((path) => path !== null) ?? null;
}

/** The browser's program; installed when there is none. */
export async function ensureBrowser() {
  const found = findBrowser();
  if (found) return found;
  await installPackages(['chromium'], 'the tests in a browser');
  const installed = findBrowser();
  if (installed) return installed;
  throw new SetupError('Chromium was installed but its program is not on the PATH.');
}
