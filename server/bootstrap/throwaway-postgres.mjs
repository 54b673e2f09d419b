/** A PostgreSQL server for one test run: nothing in it outlives the run, and nothing is written with care. */
import { chmodSync, existsSync, mkdtempSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { databaseAccount, mayUse } from './accounts.mjs';
import { ensureCluster, startCluster, stopCluster } from './postgres-cluster.mjs';
import { ensurePostgresPrograms, findPostgresPrograms, majorOf } from './postgres-programs.mjs';
import { connectionUrl } from './postgres-roles.mjs';
import { isAlive, startMark } from './processes.mjs';

const prefix = 'sillstone-test-';
const password = 'throwaway';
const settings = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off', max_connections: '200', shared_buffers: "'128MB'", autovacuum_naptime: "'20s'" };

/**
 * Starts a server with an empty `postgres` database.
 * @param {{ settings?: Record<string, string> }} [options] `settings` are added to postgresql.conf
 */
export async function startThrowawayPostgres(options = {}) {
  const programs = await ensurePostgresPrograms();
  const account = databaseAccount('/nonexistent');
  const base = [tmpdir(), '/tmp', '/var/tmp'].find((folder) => existsSync(folder) && mayUse(account, folder)) ?? tmpdir();
  await removeAbandoned(base);
  const folder = mkdtempSync(join(base, prefix));
  chmodSync(folder, 0o755);
  writeFileSync(join(folder, 'starter.json'), JSON.stringify({ pid: process.pid, mark: startMark(process.pid) }));
  const cluster = { programs, directory: join(folder, 'postgres'), account, password, settings: { ...settings, ...options.settings } };
  await ensureCluster(cluster);
  const running = await startCluster(cluster);
  return {
    adminUrl: connectionUrl(running, 'postgres', password, 'postgres'),
    port: running.port,
    programs,
    directory: cluster.directory,
    stop: async () => {
      await stopCluster(running);
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/**
 * Ends and removes the servers of test runs that were killed.
 * @param {string} base
 */
async function removeAbandoned(base) {
  for (const name of readdirSync(base).filter((entry) => entry.startsWith(prefix))) {
    const folder = join(base, name);
    const directory = join(folder, 'postgres');
    try {
      const { pid, mark } = JSON.parse(readFileSync(join(folder, 'starter.json'), 'utf8'));
      if (isAlive(pid) && startMark(pid) === mark) continue;
      const programs = findPostgresPrograms(majorOf(directory));
      if (programs) await stopCluster({ programs, directory, account: databaseAccount(directory), password });
      rmSync(folder, { recursive: true, force: true });
    } catch {
      // Somebody else's, or being made or removed this moment: leave it.
    }
  }
}
