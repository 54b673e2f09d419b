import pg from 'pg';
import { expect, it } from 'vitest';
import { useDatabase } from '#tests/setup/database.ts';

const database = useDatabase();

async function ask(url: string, sql: string): Promise<unknown[][]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<unknown[]>({ text: sql, rowMode: 'array' })).rows;
  } finally {
    await client.end();
  }
}

it('connects as the application role, which has no rights beyond signing in', async () => {
  const [role] = await ask(database.appUrl, 'select rolname, rolsuper, rolcreatedb, rolcreaterole, rolbypassrls, rolreplication from pg_roles where rolname = current_user');
  expect(role).toEqual(['sillstone_app', false, false, false, false, false]);
});

it.each([
  ['a table', 'create table intruder (n int)'],
  ['a schema', 'create schema intruder'],
  ['a temporary table', 'create temporary table intruder (n int)'],
  ['an extension', 'create extension hstore'],
])('refuses %s made by the application role', async (_what, sql) => {
  await expect(ask(database.appUrl, sql)).rejects.toMatchObject({ code: '42501' });
});

it('is a copy of its own, brought up to date by the owner', async () => {
  const [row] = await ask(database.ownerUrl, 'select current_user, current_database(), (select count(*) > 0 from pg_tables where tableowner = current_user)');
  expect(row).toEqual(['sillstone_owner', database.name, true]);
});
