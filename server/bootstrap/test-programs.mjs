/** Finds the programs that only the tests need, or installs them. */
import { SetupError } from './say.mjs';
import { installPackages, onPath } from './system-packages.mjs';

const browsers = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome'];

/**
 * What a test drives, under any of its names, and Debian's packages that bring it.
 * @type {{ names: string[], packages: string[] }[]}
 */
const needed = [
  { names: browsers, packages: ['chromium'] },
  { names: ['bibtex'], packages: ['texlive-binaries', 'texlive-base'] },
  { names: ['biber'], packages: ['biber'] },
];

/** The browser's program, or null. */
export function findBrowser() {
  return browsers.map(onPath).find((path) => path !== null) ?? null;
}

/** Installs what is missing, all at once. */
export async function ensureTestPrograms() {
  const missing = () => needed.filter(({ names }) => !names.some((name) => onPath(name)));
  if (missing().length === 0) return;
  await installPackages(missing().flatMap(({ packages }) => packages), 'the tests');
  const still = missing().map(({ names }) => names[0]);
  if (still.length > 0) throw new SetupError(`Installed, but not found on the PATH: ${still.join(', ')}.`);
}
