import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { privileges } from '#server/db/privileges.ts';
import { useDatabase } from '#tests/setup/database.ts';

const database = useDatabase();
let app: pg.Client;
let owner: pg.Client;

beforeAll(async () => {
  [app, owner] = [new pg.Client({ connectionString: database.appUrl }), new pg.Client({ connectionString: database.ownerUrl })];
  await Promise.all([app.connect(), owner.connect()]);
});
afterAll(() => Promise.all([app.end(), owner.end()]));

const columnsOf = async (): Promise<Map<string, string[]>> => {
  const { rows } = await owner.query<{ table: string; columns: string[] }>(
    `select table_name as table, array_agg(column_name::text order by column_name) as columns from information_schema.columns where table_schema = 'public' group by 1`,
  );
  return new Map(rows.map(({ table, columns }) => [table, columns]));
};

const tables = Object.entries(privileges);

describe('what the application may do', () => {
  it('is written down for every table there is', async () => {
    expect([...(await columnsOf()).keys()].sort()).toEqual(Object.keys(privileges).sort());
  });

  it('is what the database grants, to the column', async () => {
    const { rows } = await owner.query<{ table: string; privilege: string }>(
      `select table_name as table, lower(privilege_type) as privilege from information_schema.role_table_grants where grantee = 'sillstone_app' and table_schema = 'public'`,
    );
    const { rows: byColumn } = await owner.query<{ table: string; column: string }>(
      `select table_name as table, column_name as column from information_schema.role_column_grants where grantee = 'sillstone_app' and table_schema = 'public' and privilege_type = 'UPDATE'`,
    );
    const columns = await columnsOf();
    const granted = Object.fromEntries(tables.map(([name]) => [name, {
      whole: rows.filter(({ table }) => table === name).map(({ privilege }) => privilege).sort(),
      update: byColumn.filter(({ table }) => table === name).map(({ column }) => column).sort(),
    }]));
    const written = Object.fromEntries(tables.map(([name, may]) => [name, {
      whole: [...(['select', 'insert', 'delete'] as const).filter((privilege) => may[privilege]), ...(may.update === 'all' ? ['update'] : [])].sort(),
      update: may.update === 'all' ? columns.get(name) : [...(may.update ?? [])].sort(),
    }]));
    expect(granted).toEqual(written);
  });

  it('includes nothing granted to everybody, and no ownership', async () => {
    const { rows } = await owner.query(`select 1 from information_schema.role_table_grants where grantee = 'PUBLIC' and table_schema = 'public'`);
    expect(rows).toEqual([]);
    const { rows: owned } = await owner.query(`select relname from pg_class c join pg_roles r on r.oid = c.relowner where r.rolname = 'sillstone_app'`);
    expect(owned).toEqual([]);
    const { rows: member } = await owner.query(`select 1 from pg_auth_members m join pg_roles r on r.oid = m.member where r.rolname = 'sillstone_app'`);
    expect(member).toEqual([]);
  });
});

describe('what the database refuses the application', () => {
  it.each(tables.map(([name]) => name))('to change the table %s itself', async (name) => {
    for (const statement of [`alter table ${name} add column intruder int`, `drop table ${name}`, `create index on ${name} ((1))`, `alter table ${name} disable trigger all`, `create trigger t before insert on ${name} for each row execute function refuse_change()`]) {
      await expect(app.query(statement), statement).rejects.toMatchObject({ code: '42501' });
    }
  });

  it.each(tables.map(([name]) => name))('to empty %s', async (name) => {
    await expect(app.query(`truncate ${name} cascade`)).rejects.toMatchObject({ code: '42501' });
  });

  it.each(tables.filter(([, may]) => !may.delete).map(([name]) => name))('to delete from %s', async (name) => {
    await expect(app.query(`delete from ${name}`)).rejects.toMatchObject({ code: '42501' });
  });

  it('to update any column that is not named', async () => {
    const refused: string[] = [];
    const wanted: string[] = [];
    for (const [table, columns] of await columnsOf()) {
      const may = privileges[table]?.update;
      for (const column of columns) {
        if (may === 'all' || may?.includes(column)) continue;
        wanted.push(`${table}.${column}`);
        const code = await app.query(`update ${table} set "${column}" = null where false`).then(() => 'done', (error: pg.DatabaseError) => error.code);
        // 428C9: a column that the database computes, which nobody can set.
        if (code === '42501' || code === '428C9') refused.push(`${table}.${column}`);
      }
    }
    expect(wanted.length).toBeGreaterThan(100);
    expect(refused).toEqual(wanted);
  });

  it.each([
    ['a function', 'create function f() returns int language sql as $$ select 1 $$'],
    ["another's function", 'create or replace function event_hash(e events) returns bytea language sql as $$ select null::bytea $$'],
    ['the migrations', 'select * from drizzle.__drizzle_migrations'],
    ['triggers off for its session', "set session_replication_role = 'replica'"],
    ["the owner's role", 'set role sillstone_owner'],
    ['a file', "copy users to '/tmp/users'"],
    ['a program', "copy users to program 'true'"],
    ['a grant to itself', 'grant delete on events to sillstone_app'],
    ['the passwords of roles', 'select rolpassword from pg_authid'],
  ])('%s', async (_what, sql) => {
    const attempt = app.query(sql);
    if (sql.startsWith('grant')) {
      // PostgreSQL answers a grant by somebody without the right to grant with a refusal or a warning; what counts is that nothing is granted.
      await attempt.catch(() => undefined);
      await expect(app.query('delete from events')).rejects.toMatchObject({ code: '42501' });
    } else {
      await expect(attempt).rejects.toMatchObject({ code: '42501' });
    }
  });
});
