/** `npm run build`: the client for the browser and the server for Node.js, into `dist`. */
import { existsSync, mkdirSync, rmSync } from 'node:fs';
import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { forgetBuilt, hashInputs, isStale, parts, rememberBuilt } from './build-state.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { runOrFail } from './processes.mjs';
import { main, say } from './say.mjs';

/** The programs of the compiled server, by name; those that do not exist are left out. */
const programs = {
  index: 'server/index.ts',
  migrate: 'server/commands/migrate.ts',
  seed: 'server/commands/seed.ts',
  admin: 'server/commands/admin.ts',
  'db-backup': 'server/commands/db-backup.ts',
  'db-restore': 'server/commands/db-restore.ts',
};

/**
 * Builds the parts that are older than their sources.
 * @param {{ always?: boolean }} [options]
 */
export async function buildWhatIsStale({ always = false } = {}) {
  for (const part of /** @type {const} */ (['server', 'client'])) {
    if (!always && !isStale(part)) continue;
    say(`Building the ${part} ...`);
    const hash = hashInputs(part);
    mkdirSync(inCheckout('dist'), { recursive: true });
    forgetBuilt(part);
    await (part === 'server' ? buildServer() : buildClient());
    rememberBuilt(part, hash);
  }
}

async function buildServer() {
  const { build, stop } = await import('esbuild');
  const outdir = inCheckout(parts.server.output);
  rmSync(outdir, { recursive: true, force: true });
  await build({
    absWorkingDir: checkout,
    entryPoints: Object.fromEntries(Object.entries(programs).filter(([, file]) => existsSync(inCheckout(file)))),
    outdir,
    bundle: true,
    splitting: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    sourcemap: true,
    packages: 'external',
    logLevel: 'warning',
    plugins: [
      {
        name: 'own-aliases',
        // The product's own `#...` names look like packages to the bundler; they are files of this checkout.
        setup: ({ onResolve }) => onResolve({ filter: /^#/ }, ({ path }) => ({ path: resolve(checkout, path.slice(1)) })),
      },
    ],
  });
  await stop();
}

/** In a process of its own: it frees its memory before the server starts, and a stop can cut it short. */
async function buildClient() {
  const vite = inCheckout('node_modules', 'vite', 'bin', 'vite.js');
  await runOrFail('Building the client', process.execPath, [vite, 'build', '--logLevel', 'warn'], { cwd: checkout, env: { ...process.env, NODE_ENV: 'production' } });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await main(async () => {
    checkNodeVersion();
    await ensurePackages();
    await buildWhatIsStale({ always: true });
  });
}
