/**
 * `npm run dev`: the same local database, the server restarted as its files change, the client reloaded in place.
 * The browser talks to the client's server; it hands `/api` on.
 */
import { spawn } from 'node:child_process';
import { checkout, inCheckout } from './checkout.mjs';
import { chosenEnvironment } from './environment.mjs';
import { claimInstance, releaseInstance } from './instance.mjs';
import { openLocalDatabase } from './local-database.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { freePort } from './ports.mjs';
import { stopCluster } from './postgres-cluster.mjs';
import { endProcess, runOrFail } from './processes.mjs';
import { main, say } from './say.mjs';
import { childEnvironment } from './server-process.mjs';
import { Stopped, checkStop, isStopping, listenForStop, stopAsked } from './stopping.mjs';

const tsx = inCheckout('node_modules', 'tsx', 'dist', 'cli.mjs');

await main(async () => {
  checkNodeVersion();
  listenForStop();
  /** @type {(() => Promise<void> | void)[]} */
  const undo = [];
  try {
    return await develop(undo);
  } catch (error) {
    if (error instanceof Stopped || isStopping()) return 0;
    throw error;
  } finally {
    for (const step of undo.reverse()) await step();
  }
});

/** @param {(() => Promise<void> | void)[]} undo */
async function develop(undo) {
  await ensurePackages();
  const database = process.env.DATABASE_URL ? null : await openLocalDatabase({ announce: true });
  if (database) {
    await claimInstance(database.dataFolder);
    undo.push(() => stopCluster(database.cluster), () => releaseInstance(database.dataFolder));
  }
  const settings = chosenEnvironment(database);
  const address = `http://${settings.HOST}:${settings.PORT}`;
  const apiPort = await freePort(Number(settings.PORT) + 100, settings.HOST);
  const env = childEnvironment({ ...settings, NODE_ENV: 'development', PORT: String(apiPort), PUBLIC_URL: process.env.PUBLIC_URL || address });
  for (const [what, file] of [['Bringing the database up to date', 'server/commands/migrate.ts'], ['Loading the data', 'server/commands/seed.ts']]) {
    await runOrFail(`${what}`, process.execPath, [tsx, `${file}`], { cwd: checkout, env });
    checkStop();
  }
  const server = spawn(process.execPath, [tsx, 'watch', '--clear-screen=false', 'server/index.ts'], { cwd: checkout, env, detached: true, stdio: ['ignore', 'inherit', 'inherit'] });
  undo.push(() => (server.pid === undefined ? undefined : endProcess(server.pid, 6000)));
  const { createServer } = await import('vite');
  const client = await createServer({
    root: inCheckout('client'),
    configFile: inCheckout('vite.config.ts'),
    server: { host: settings.HOST, port: Number(settings.PORT), strictPort: true, proxy: { '/api': { target: `http://${settings.HOST}:${apiPort}` } } },
  });
  await client.listen();
  undo.push(() => client.close());
  say(`Open ${address} (the server alone answers on port ${apiPort}).`);
  await stopAsked();
  return 0;
}
