import { access } from 'node:fs/promises';
import pg from 'pg';
import { migrateDatabase } from '#server/db/migrate.ts';
import { BackupError, compareContents, fileHash, listTables, readContents, readManifest, type BackupManifest } from './db-manifest.ts';
import { runDatabaseProgram } from './db-programs.ts';

/** Where a backup is loaded from and to. */
export interface RestoreRequest {
  ownerUrl: string;
  /** The application's database role; it must exist, and gets its privileges from this version of the product. */
  appRole: string;
  /** Folder of PostgreSQL's own programs. */
  programs: string;
  file: string;
  /** Empty a database that holds something first. */
  force?: boolean;
}

/**
 * Loads a backup: its checksum is compared first, its contents after, and then the schema is brought up to this version.
 * Privileges are not taken from the file; the migrations grant them anew, to the role this installation uses.
 */
export async function loadBackup(request: RestoreRequest): Promise<BackupManifest> {
  const manifest = await checkedManifest(request.file);
  const client = new pg.Client({ connectionString: request.ownerUrl, connectionTimeoutMillis: 10_000 });
  await client.connect();
  try {
    await ensureRole(client, request.appRole);
    await refuseCompany(client);
    if ((await listTables(client)).length > 0) {
      if (!request.force) throw new BackupError('The database is not empty. Restore into an empty one, or add --force to delete what it holds.');
      await emptyDatabase(client);
    }
    await runDatabaseProgram(request.programs, 'pg_restore', request.ownerUrl, [
      '--single-transaction', '--exit-on-error', '--no-owner', '--no-privileges', '--no-comments', request.file,
    ]);
    await client.query('begin isolation level repeatable read read only');
    const differences = compareContents(manifest.tables, await readContents(client));
    await client.query('commit');
    if (differences.length > 0) throw new BackupError(`What was loaded is not what was backed up:\n${differences.join('\n')}`);
  } finally {
    await client.end();
  }
  await migrateDatabase({ ownerUrl: request.ownerUrl, appRole: request.appRole });
  return manifest;
}

async function checkedManifest(file: string): Promise<BackupManifest> {
  await access(file).catch(() => {
    throw new BackupError(`${file} cannot be read.`);
  });
  const manifest = await readManifest(file);
  if ((await fileHash(file)) !== manifest.sha256) throw new BackupError(`${file} is damaged: its checksum is not the one in the manifest. Nothing was changed.`);
  return manifest;
}

async function ensureRole(client: pg.Client, role: string): Promise<void> {
  const { rowCount } = await client.query('select from pg_roles where rolname = $1', [role]);
  if (rowCount) return;
  try {
    await client.query(`create role ${client.escapeIdentifier(role)} login`);
  } catch {
    throw new BackupError(`The application's role "${role}" does not exist and the owner may not make it. Make it first: CREATE ROLE ${role} LOGIN PASSWORD '...'`);
  }
}

/** A program that reads or writes meanwhile would see half a database. */
async function refuseCompany(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ others: string }>(
    'select count(*) as others from pg_stat_activity where datname = current_database() and usename is not null and pid <> pg_backend_pid()',
  );
  const others = Number(rows[0]?.others ?? 0);
  if (others > 0) throw new BackupError(`${others} other connections use the database. Stop the server, then restore.`);
}

async function emptyDatabase(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ name: string }>(
    "select quote_ident(nspname) as name from pg_namespace where nspname <> 'information_schema' and nspname !~ '^pg_'",
  );
  await client.query('begin');
  for (const { name } of rows) await client.query(`drop schema ${name} cascade`);
  await client.query('create schema public');
  await client.query('grant usage on schema public to public');
  await client.query('commit');
}
