/**
 * The folder the server runs in.
 *
 * Usually the checkout. Started by root, the server runs as an account without rights; when that account cannot enter
 * the checkout (a clone under root's home folder), what the server needs at run time is laid out beside the data:
 * run-time packages as hard links, the rest copied. So the server never holds root's rights, not even while it starts,
 * and may load a file late without having to think of it.
 */
import { cpSync, existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { mayUse, serverAccount } from './accounts.mjs';
import { filesUnder } from './build-state.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { remoteDataFolder } from './data-folder.mjs';
import { lockedPackages } from './packages.mjs';
import { run, runOrFail } from './processes.mjs';

const copied = ['package.json', 'dist', 'drizzle', 'seeds'];

/**
 * The folder to start the server in and the account to run it as.
 * @returns {Promise<{ folder: string, account: import('./accounts.mjs').Account | null }>}
 */
export async function prepareRunningFolder() {
  const account = serverAccount();
  if (!account || serverCanRead(account)) return { folder: checkout, account };
  const folder = join(remoteDataFolder, 'server');
  await linkPackages(folder);
  copyProduct(folder);
  return { folder, account };
}

/** @param {import('./accounts.mjs').Account} account */
function serverCanRead(account) {
  const samples = ['package.json', 'dist/server/index.js', 'node_modules/express/package.json'];
  return samples.every((sample) => mayUse(account, inCheckout(sample), '-r'));
}

/** @param {string} folder */
async function linkPackages(folder) {
  const mark = join(folder, '.packages');
  const wanted = readFileSync(inCheckout('node_modules', '.sillstone-lock'), 'utf8');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === wanted) return;
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true, mode: 0o755 });
  const names = Object.entries(lockedPackages())
    .filter(([path, { dev }]) => /^node_modules\/(@[^/]+\/)?[^/]+$/.test(path) && !dev && existsSync(inCheckout(path)))
    .map(([path]) => path);
  const linked = await run('cp', ['-al', '--parents', ...names, folder], { cwd: checkout });
  if (linked.code !== 0) {
    // Another file system: links cannot cross.
    rmSync(join(folder, 'node_modules'), { recursive: true, force: true });
    await runOrFail('Copying the packages', 'cp', ['-a', '--parents', ...names, folder], { cwd: checkout });
  }
  await runOrFail('Making the packages readable', 'chmod', ['-R', 'a+rX', folder]);
  writeFileSync(mark, wanted);
}

/** @param {string} folder */
function copyProduct(folder) {
  const mark = join(folder, '.product');
  const hash = createHash('sha256');
  for (const path of copied) for (const file of filesUnder(path)) hash.update(`${file}\0`).update(readFileSync(inCheckout(file)));
  const wanted = hash.digest('hex');
  if (existsSync(mark) && readFileSync(mark, 'utf8') === wanted) return;
  for (const path of copied) {
    rmSync(join(folder, path), { recursive: true, force: true });
    if (existsSync(inCheckout(path))) cpSync(inCheckout(path), join(folder, path), { recursive: true });
  }
  writeFileSync(mark, wanted);
}
