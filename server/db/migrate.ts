import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';
import { privilegeStatements } from './privileges.ts';

/** Any number, the same in every process: only one of them migrates at a time. */
const migrationLock = 715_516;

/**
 * Brings the database to the newest schema and makes the application role's privileges what `privileges.ts` says.
 * Runs as the owner; safe to run again and from several processes at once.
 * @param appRole the application's database role; it must exist.
 */
export async function migrateDatabase({ ownerUrl, appRole, folder = 'drizzle' }: { ownerUrl: string; appRole: string; folder?: string }): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl, connectionTimeoutMillis: 10_000 });
  client.on('error', () => undefined);
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [migrationLock]);
    await migrate(drizzle(client), { migrationsFolder: folder });
    await client.query('begin');
    for (const statement of privilegeStatements(appRole)) await client.query(statement);
    await client.query('commit');
  } finally {
    await client.end();
  }
}
