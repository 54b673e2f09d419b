import pino from 'pino';
import packageJson from '../package.json' with { type: 'json' };
import { createApp, usualLimits } from './app.ts';
import type { Context } from './context.ts';
import { openPools } from './db/pool.ts';
import { environmentOrExit } from './env.ts';
import { startJobs } from './jobs/run-jobs.ts';
import { createServices } from './services.ts';
import { demonstrationDoiService } from './services/doi/demonstration-doi.ts';
import { createDoiClient } from './services/doi/resolver-client.ts';

const publicResolver = 'https://doi.org';
const stopLimitMs = 5000;

const env = environmentOrExit();
const log = pino({ level: env.logLevel });
const pools = openPools(env.databaseUrl, (error) => log.warn({ err: error }, 'a database connection was lost'));
const demonstrationDoi = env.demonstration && !env.doiResolverUrl
  ? demonstrationDoiService(async () => (await import('#seeds/demo/doi-records.ts')).readDoiRecords('seeds/demo')) : null;
const publicUrl = (env.publicUrl ?? `http://${env.host}:${env.port}`).replace(/\/$/, '');
const context: Context = {
  db: pools.db, exportPool: pools.exportPool, clock: () => new Date(),
  doi: demonstrationDoi ?? createDoiClient({ resolverUrl: env.doiResolverUrl ?? publicResolver }),
  demonstration: env.demonstration, publicUrl, version: packageJson.version, log,
};
const services = createServices(context);
const app = createApp(context, services, {
  sessionSecret: env.sessionSecret, secureCookies: publicUrl.startsWith('https:'), clientDir: env.clientDir, limits: usualLimits,
});
const stopJobs = startJobs(pools.db.$client, services, log);

const server = app.listen(env.port, env.host, (error?: Error) => {
  if (error) {
    process.stderr.write(`Sillstone cannot listen on ${env.host}:${env.port}: ${error.message}\n`);
    process.exit(1);
  }
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : env.port;
  process.stdout.write(`Sillstone is ready at http://${env.host.includes(':') ? `[${env.host}]` : env.host}:${port}\n`);
});

let stopping = false;
/** Finishes the requests under way, then closes the database; a request that takes longer than five seconds is cut off. */
function stop(): void {
  if (stopping) return;
  stopping = true;
  const limit = setTimeout(() => server.closeAllConnections(), stopLimitMs);
  server.close(() => {
    clearTimeout(limit);
    void Promise.allSettled([stopJobs(), demonstrationDoi?.close()]).then(() => pools.close()).then(() => process.exit(0));
  });
  server.closeIdleConnections();
}
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
