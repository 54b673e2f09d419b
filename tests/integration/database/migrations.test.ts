import pg from 'pg';
import { afterAll, describe, expect, inject, it } from 'vitest';
import { readContents } from '#server/commands/db-manifest.ts';
import { migrateDatabase } from '#server/db/migrate.ts';
import { asSuperuser, createEmptyDatabase, databaseUrl } from '#tests/setup/test-server.ts';
import { useDatabase } from '#tests/setup/database.ts';

const migrated = useDatabase();
const appRole = 'sillstone_app';
const made: string[] = [];

async function ask<Row extends pg.QueryResultRow>(url: string, text: string): Promise<Row[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Row>(text)).rows;
  } finally {
    await client.end();
  }
}

async function emptyDatabase(name: string): Promise<string> {
  await createEmptyDatabase(inject('adminUrl'), name);
  made.push(name);
  return databaseUrl(inject('adminUrl'), name, 'owner');
}

/** Tables, columns, constraints, functions, triggers and rights, as one text each. */
const shape = (url: string) => ask<{ part: string }>(url, `
  select 'column ' || table_name || '.' || column_name || ' ' || data_type || ' ' || is_nullable || coalesce(' ' || column_default, '') as part from information_schema.columns where table_schema = 'public'
  union all select 'constraint ' || conname || ' ' || pg_get_constraintdef(oid) from pg_constraint where connamespace = 'public'::regnamespace
  union all select 'index ' || indexdef from pg_indexes where schemaname = 'public'
  union all select 'trigger ' || pg_get_triggerdef(oid) from pg_trigger where not tgisinternal
  union all select 'right ' || table_name || '.' || column_name || ' ' || privilege_type from information_schema.column_privileges where grantee = '${appRole}'
  order by 1`);

afterAll(() => asSuperuser(inject('adminUrl'), made.map((name) => `drop database if exists ${name} with (force)`)));

describe('migrations', () => {
  it('change nothing when run again', async () => {
    const before = await shape(migrated.ownerUrl);
    const applied = await ask(migrated.ownerUrl, 'select * from drizzle.__drizzle_migrations');
    await migrateDatabase({ ownerUrl: migrated.ownerUrl, appRole });
    expect(await shape(migrated.ownerUrl)).toEqual(before);
    expect(await ask(migrated.ownerUrl, 'select * from drizzle.__drizzle_migrations')).toEqual(applied);
  });

  it('run by four processes at once leave one complete database', async () => {
    const ownerUrl = await emptyDatabase('migrated_at_once');
    await Promise.all([1, 2, 3, 4].map(() => migrateDatabase({ ownerUrl, appRole })));
    expect(await shape(ownerUrl)).toEqual(await shape(migrated.ownerUrl));
    const client = new pg.Client({ connectionString: ownerUrl });
    await client.connect();
    await client.query('begin');
    expect(await readContents(client)).toBeDefined();
    await client.end();
  });

  it('take back what was granted by hand', async () => {
    const ownerUrl = await emptyDatabase('granted_by_hand');
    await migrateDatabase({ ownerUrl, appRole });
    await ask(ownerUrl, `grant delete, truncate on events to ${appRole}`);
    await migrateDatabase({ ownerUrl, appRole });
    expect(await shape(ownerUrl)).toEqual(await shape(migrated.ownerUrl));
  });
});
