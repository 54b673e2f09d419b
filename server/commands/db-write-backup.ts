import { chmod, rename, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import { BackupError, fileHash, listTables, manifestPath, readContents, type BackupManifest } from './db-manifest.ts';
import { runDatabaseProgram } from './db-programs.ts';

/**
 * Writes a backup and, beside it, its manifest. Both show the database at one moment, however busy it is: the copy reads the
 * snapshot in which the rows are counted.
 * @param programs folder of PostgreSQL's own programs
 */
export async function writeBackup({ ownerUrl, programs, file }: { ownerUrl: string; programs: string; file: string }): Promise<BackupManifest> {
  const client = new pg.Client({ connectionString: ownerUrl, connectionTimeoutMillis: 10_000 });
  await client.connect();
  const unfinished = `${file}.unfinished`;
  try {
    await client.query('begin isolation level repeatable read read only');
    const { rows } = await client.query<{ snapshot: string; version: string }>("select pg_export_snapshot() as snapshot, current_setting('server_version') as version");
    const snapshot = rows[0]?.snapshot ?? '';
    if ((await listTables(client)).length === 0) throw new BackupError('The database is empty: there is nothing to back up.');
    await runDatabaseProgram(programs, 'pg_dump', ownerUrl, ['--format=custom', `--snapshot=${snapshot}`, `--file=${unfinished}`]);
    // It holds addresses and password hashes.
    await chmod(unfinished, 0o600);
    const manifest: BackupManifest = {
      format: 1,
      madeAt: new Date().toISOString(),
      postgresVersion: rows[0]?.version ?? '',
      file: path.basename(file),
      bytes: (await stat(unfinished)).size,
      sha256: await fileHash(unfinished),
      tables: await readContents(client),
      eventLogHead: await readHead(client),
    };
    await writeFile(manifestPath(file), `${JSON.stringify(manifest, null, 2)}\n`, { mode: 0o600 });
    await rename(unfinished, file);
    return manifest;
  } finally {
    await rm(unfinished, { force: true });
    await client.end();
  }
}

async function readHead(client: pg.Client): Promise<BackupManifest['eventLogHead']> {
  if (!(await listTables(client)).includes('public.events')) return null;
  const { rows } = await client.query<{ seq: string; hash: string }>("select seq, encode(hash, 'hex') as hash from public.events order by seq desc limit 1");
  return rows[0] ? { seq: Number(rows[0].seq), hash: rows[0].hash } : null;
}
