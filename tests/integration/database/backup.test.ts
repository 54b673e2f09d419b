import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { findPostgresPrograms } from '#server/bootstrap/postgres-programs.mjs';
import { loadBackup } from '#server/commands/db-load-backup.ts';
import { readContents, readManifest } from '#server/commands/db-manifest.ts';
import { writeBackup } from '#server/commands/db-write-backup.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { asSuperuser, createEmptyDatabase, databaseUrl } from '#tests/setup/test-server.ts';

const original = useDatabase();
const occupied = useDatabase();
const programs = findPostgresPrograms() ?? '';
const appRole = 'sillstone_app';
const emptyName = 'restored_backup';
let folder = '';
let file = '';
let emptyUrl = '';

async function withClient<T>(url: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

const contents = (url: string): Promise<unknown> =>
  withClient(url, async (client) => {
    await client.query('begin');
    return readContents(client);
  });

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sillstone-backup-'));
  file = path.join(folder, 'all.dump');
  await createEmptyDatabase(inject('adminUrl'), emptyName);
  emptyUrl = databaseUrl(inject('adminUrl'), emptyName, 'owner');
  // A row of its own, with a number that does not survive a careless copy and a text that is not ASCII.
  await withClient(original.ownerUrl, (client) => client.query("create table kept (n float8, t text); insert into kept values (1e13 / 3, 'N₂ + 2* → 2 N*'), (-0.1, null)"));
  await writeBackup({ ownerUrl: original.ownerUrl, programs, file });
});

afterAll(async () => {
  await asSuperuser(inject('adminUrl'), [`drop database if exists ${emptyName} with (force)`]);
  await rm(folder, { recursive: true, force: true });
});

describe('a backup', () => {
  it('restores into an empty database with the same contents, table by table', async () => {
    await loadBackup({ ownerUrl: emptyUrl, appRole, programs, file });
    expect(await contents(emptyUrl)).toEqual(await contents(original.ownerUrl));
    const kept = await withClient(emptyUrl, (client) => client.query<{ n: number; t: string | null }>('select n, t from kept order by n'));
    expect(kept.rows).toEqual([{ n: -0.1, t: null }, { n: 1e13 / 3, t: 'N₂ + 2* → 2 N*' }]);
  });

  it('gives the application its role and nothing more', async () => {
    const appUrl = databaseUrl(inject('adminUrl'), emptyName, 'application');
    await expect(withClient(appUrl, (client) => client.query('select count(*) from entries'))).resolves.toBeDefined();
    await expect(withClient(appUrl, (client) => client.query('delete from events'))).rejects.toMatchObject({ code: '42501' });
    await expect(withClient(appUrl, (client) => client.query('select * from kept'))).rejects.toMatchObject({ code: '42501' });
  });

  it('is not loaded over something, unless told to', async () => {
    await expect(loadBackup({ ownerUrl: occupied.ownerUrl, appRole, programs, file })).rejects.toThrow('not empty');
    await loadBackup({ ownerUrl: occupied.ownerUrl, appRole, programs, file, force: true });
    expect(await contents(occupied.ownerUrl)).toEqual(await contents(original.ownerUrl));
  });

  it('is not loaded while somebody uses the database', async () => {
    await withClient(occupied.appUrl, async () => {
      await expect(loadBackup({ ownerUrl: occupied.ownerUrl, appRole, programs, file, force: true })).rejects.toThrow('other connections');
    });
  });

  it('is refused when a byte has changed, before anything is touched', async () => {
    const damaged = path.join(folder, 'damaged.dump');
    const bytes = await readFile(file);
    bytes.writeUInt8(bytes.readUInt8(2000) ^ 1, 2000);
    await writeFile(damaged, bytes);
    await writeFile(`${damaged}.json`, JSON.stringify(await readManifest(file)));
    await expect(loadBackup({ ownerUrl: occupied.ownerUrl, appRole, programs, file: damaged, force: true })).rejects.toThrow('damaged');
    expect(await contents(occupied.ownerUrl)).toEqual(await contents(original.ownerUrl));
  });

  it.each([
    ['missing.dump', 'cannot be read'],
    ['alone.dump', 'keep them together'],
  ])('says what is wrong with %s', async (name, message) => {
    if (name === 'alone.dump') await writeFile(path.join(folder, name), 'x');
    await expect(loadBackup({ ownerUrl: emptyUrl, appRole, programs, file: path.join(folder, name) })).rejects.toThrow(message);
  });
});
