import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { readFile } from 'node:fs/promises';
import type pg from 'pg';
import * as z from 'zod';

const manifestSchema = z.object({
  format: z.literal(1),
  madeAt: z.string(),
  postgresVersion: z.string(),
  file: z.string(),
  bytes: z.number(),
  sha256: z.string(),
  /** Rows and a checksum that does not depend on their order, by table. */
  tables: z.record(z.string(), z.object({ rows: z.number(), checksum: z.string() })),
  /** Where the event log ended: a chain alone cannot show that its tail was cut off. */
  eventLogHead: z.object({ seq: z.number(), hash: z.string() }).nullable(),
});

/** What is known of a backup besides the file itself; kept beside it as `<file>.json`. */
export type BackupManifest = z.infer<typeof manifestSchema>;
export type TableContents = BackupManifest['tables'];

/** A failure with a sentence for whoever runs the command. */
export class BackupError extends Error {}

/** Where the manifest of a backup is kept. */
export function manifestPath(file: string): string {
  return `${file}.json`;
}

/** Reads and checks the manifest of a backup. */
export async function readManifest(file: string): Promise<BackupManifest> {
  const path = manifestPath(file);
  const text = await readFile(path, 'utf8').catch(() => {
    throw new BackupError(`${path} cannot be read. A backup is two files, the data and its manifest: keep them together.`);
  });
  try {
    return manifestSchema.parse(JSON.parse(text));
  } catch {
    throw new BackupError(`${path} is not the manifest of a backup.`);
  }
}

/** SHA-256 of a file, in hexadecimal. */
export async function fileHash(file: string): Promise<string> {
  const hash = createHash('sha256');
  for await (const chunk of createReadStream(file)) hash.update(chunk as Buffer);
  return hash.digest('hex');
}

/** The tables of the product: `schema.table`, without PostgreSQL's own. */
export async function listTables(client: pg.Client): Promise<string[]> {
  const { rows } = await client.query<{ name: string }>(
    `select format('%I.%I', schemaname, tablename) as name from pg_tables
     where schemaname <> 'information_schema' and schemaname !~ '^pg_' order by 1`,
  );
  return rows.map(({ name }) => name);
}

/** Rows and checksum of every table, as the client's transaction sees them. */
export async function readContents(client: pg.Client): Promise<TableContents> {
  // Text of a time depends on the zone; both sides use the same one.
  await client.query("set local timezone to 'UTC'");
  const contents: TableContents = {};
  for (const table of await listTables(client)) {
    const { rows } = await client.query<{ rows: string; checksum: string }>(
      `select count(*) as rows, coalesce(sum(('x' || substr(md5(t::text), 1, 16))::bit(64)::bigint::numeric), 0)::text as checksum from ${table} t`,
    );
    contents[table] = { rows: Number(rows[0]?.rows ?? 0), checksum: rows[0]?.checksum ?? '0' };
  }
  return contents;
}

/** Tables whose contents differ, with what was expected and what is there. */
export function compareContents(expected: TableContents, found: TableContents): string[] {
  const names = [...new Set([...Object.keys(expected), ...Object.keys(found)])].sort();
  return names.flatMap((name) => {
    const [before, after] = [expected[name], found[name]];
    if (before && after && before.rows === after.rows && before.checksum === after.checksum) return [];
    if (before && after) return [`${name}: ${before.rows} rows expected, ${after.rows} found${before.rows === after.rows ? ', with other contents' : ''}`];
    return [`${name}: ${before ? 'missing' : 'not in the backup'}`];
  });
}
