import { spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import path from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { databaseAccount } from '#server/bootstrap/accounts.mjs';
import { ensureCluster, findRunning, startCluster, stopCluster, type Cluster } from '#server/bootstrap/postgres-cluster.mjs';
import { findPostgresPrograms } from '#server/bootstrap/postgres-programs.mjs';

let folder = '';
let cluster: Cluster;
const pidFile = (): string => path.join(cluster.directory, 'postmaster.pid');
const postmaster = (): number => Number(readFileSync(pidFile(), 'utf8').split('\n')[0]);

async function ask(port: number, sql: string): Promise<unknown> {
  const client = new pg.Client({ host: '127.0.0.1', port, user: 'postgres', password: cluster.password, database: 'postgres' });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows[0];
  } finally {
    await client.end();
  }
}

/** Kills a process and waits until it is gone, or waits only to be collected by its parent. */
async function kill(pid: number): Promise<void> {
  process.kill(pid, 'SIGKILL');
  await vi.waitFor(() => expect(existsSync(`/proc/${pid}`) && !/^State:\s+Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'))).toBe(false));
}

beforeAll(async () => {
  folder = mkdtempSync('/tmp/sillstone-cluster-');
  chmodSync(folder, 0o755);
  cluster = { programs: findPostgresPrograms() ?? '', directory: path.join(folder, 'postgres'), account: databaseAccount('/nonexistent'), password: 'kept' };
  vi.spyOn(process.stdout, 'write').mockReturnValue(true);
  await ensureCluster(cluster);
  const { port } = await startCluster(cluster);
  await ask(port, 'create table kept (n int)');
});

afterAll(async () => {
  await stopCluster(cluster);
  rmSync(folder, { recursive: true, force: true });
});

it('takes over a server that runs already', async () => {
  const before = postmaster();
  expect(await startCluster(cluster)).toMatchObject({ adopted: true });
  expect(postmaster()).toBe(before);
});

it('listens on loopback only and wants a password', async () => {
  const running = await startCluster(cluster);
  expect(await ask(running.port, "select current_setting('listen_addresses') as a, current_setting('unix_socket_directories') as s")).toEqual({ a: '127.0.0.1', s: '' });
  const stranger = new pg.Client({ host: '127.0.0.1', port: running.port, user: 'postgres', password: 'wrong', database: 'postgres' });
  await expect(stranger.connect()).rejects.toMatchObject({ code: '28P01' });
});

it('keeps what was committed when it is killed, and starts again on the same port', async () => {
  const running = await startCluster(cluster);
  await ask(running.port, 'insert into kept values (7)');
  await kill(postmaster());
  const again = await startCluster(cluster);
  expect(again).toMatchObject({ port: running.port, adopted: false });
  expect(await ask(again.port, 'select n from kept')).toEqual({ n: 7 });
});

it('is not misled by a process that took over the number of a killed server', async () => {
  const running = await startCluster(cluster);
  const lines = readFileSync(pidFile(), 'utf8').split('\n');
  await stopCluster(running);
  const stranger = spawn('sleep', ['60'], { stdio: 'ignore' });
  writeFileSync(pidFile(), [stranger.pid, ...lines.slice(1)].join('\n'));
  expect(await findRunning(cluster)).toBeNull();
  expect(await startCluster(cluster)).toMatchObject({ adopted: false });
  stranger.kill();
});

it('moves to another port when its own was taken meanwhile', async () => {
  const running = await startCluster(cluster);
  await stopCluster(running);
  const squatter = createServer().listen(running.port, '127.0.0.1');
  const again = await startCluster(cluster);
  squatter.close();
  expect(again.port).not.toBe(running.port);
  expect(await ask(again.port, 'select n from kept')).toEqual({ n: 7 });
});
