import pg from 'pg';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { useApp } from '#tests/factories/app.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let superuser: pg.Client;
let role: pg.Client;

beforeAll(async () => {
  const [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  const lives = new Lives(app.services, contributor.actor, reviewer.actor);
  for (const state of ['superseded', 'retracted', 'returned', 'withdrawn'] as const) await lives.inState(state);
  [superuser, role] = [new pg.Client({ connectionString: app.database?.adminUrl }), new pg.Client({ connectionString: app.database?.appUrl })];
  await Promise.all([superuser.connect(), role.connect()]);
});
afterEach(() => superuser.query('rollback'));
afterAll(() => Promise.all([superuser.end(), role.end()]));

const broken = async (client: pg.Client): Promise<{ seq: string; fault: string }[]> => (await client.query<{ seq: string; fault: string }>('select seq, fault from broken_event()')).rows;

/** What somebody with every right over the database could do, undone after each test. */
async function tamper(statement: string): Promise<{ seq: string; fault: string }[]> {
  await superuser.query('begin');
  await superuser.query("set local session_replication_role = 'replica'");
  const { rowCount } = await superuser.query(statement);
  expect(rowCount).toBe(1);
  return broken(superuser);
}

describe('the event log', () => {
  it('holds from the first row to the last after a busy life', async () => {
    const [{ n } = { n: '0' }] = await app.sql<{ n: string }>('select count(*) as n from events');
    expect(Number(n)).toBeGreaterThanOrEqual(20);
    expect(await broken(role)).toEqual([]);
  });

  it.each([
    ['an actor', "update events set actor_id = '00000000-0000-0000-0000-000000000000' where seq = 7", '7', 'hash'],
    ['an action', "update events set action = 'submission.accept' where seq = 8", '8', 'hash'],
    ['a time', "update events set at = at - interval '1 day' where seq = 9", '9', 'hash'],
    ['the time of writing by a microsecond', "update events set recorded_at = recorded_at + interval '1 microsecond' where seq = 9", '9', 'hash'],
    ['a payload', `update events set payload = payload || '{"round": 9}' where seq = 10`, '10', 'hash'],
    ['a subject', "update events set subject_id = gen_random_uuid() where seq = 11", '11', 'hash'],
    ['a hash', "update events set hash = decode(repeat('ab', 32), 'hex') where seq = 12", '12', 'hash'],
    ['a row and its own hash', "update events e set action = 'x', hash = event_hash(row(e.seq, e.at, e.recorded_at, e.actor_id, 'x', e.subject_type, e.subject_id, e.payload, e.previous_hash, e.hash)::events) where seq = 13", '14', 'link'],
    ['a deleted row in the middle', 'delete from events where seq = 6', '7', 'number'],
    ['a deleted first row', 'delete from events where seq = 1', '2', 'number'],
  ])('names the row when %s was changed past the triggers', async (_what, statement, seq, fault) => {
    expect(await tamper(statement)).toEqual([{ seq, fault }]);
  });

  it.each([
    ['update', "update events set action = 'x' where seq = 1"], ['delete', 'delete from events where seq = 1'], ['truncate', 'truncate events cascade'],
  ])('refuses %s even to its owner', async (_what, statement) => {
    await expect(app.sql(statement)).rejects.toMatchObject({ constraint: 'rows_are_permanent' });
  });

  it.each([
    ['quantities', "update quantities set as_printed = '1'"], ['conversions', "update conversions set core_version = 'x'"], ['converted quantities', 'update converted_quantities set value = 0'],
    ['raised checks', "update raised_checks set message = 'x'"], ['pinned conversions', 'update accepted_conversions set conversion_id = conversion_id'],
    ['decisions', "update decisions set comment = 'x'"], ['entries', "update entries set accession = 'x'"], ['quantities by deletion', 'delete from quantities'], ['decisions by deletion', 'delete from decisions'],
    ['submissions by deletion', 'delete from submissions'], ['revisions by deletion', 'delete from revisions'], ['what was handed in', "update submissions set round = round + 10"],
    ['search rows', 'update search_rows set energy_kj_per_mol = 0'],
  ])('and the owner cannot change %s', async (_what, statement) => {
    const refused = await app.sql(statement).then(() => 'done', (error: pg.DatabaseError) => error.constraint);
    expect(refused).toBe('rows_are_permanent');
  });

  it('numbers rows itself, whatever it is given', async () => {
    await role.query('begin');
    const { rows } = await role.query<{ seq: string; right: boolean }>(
      `insert into events (seq, at, action, subject_type, subject_id, payload, previous_hash, hash) values (1, now(), 'a.b', 'user', gen_random_uuid(), '{}', '', '')
       returning seq, seq = (select max(seq) + 1 from events) as right`,
    );
    expect(rows[0]?.right).toBe(true);
    expect(await broken(role)).toEqual([]);
    await role.query('rollback');
  });

  it('takes no event of the future', async () => {
    await expect(role.query(`insert into events (seq, at, action, subject_type, subject_id, payload, previous_hash, hash) values (1, now() + interval '1 hour', 'a.b', 'user', gen_random_uuid(), '{}', '', '')`))
      .rejects.toMatchObject({ constraint: 'events_not_in_future' });
  });

  it('stays without gaps when many write at once and some give up', async () => {
    const people = await Promise.all(Array.from({ length: 12 }, () => app.person('contributor')));
    await Promise.all(people.map(async ({ actor }, index) => {
      const { accession } = await app.services.entries.create(actor, {});
      if (index % 3 === 0) await app.services.entries.submit(actor, accession, null).catch(() => undefined);
      else await app.services.entries.withdraw(actor, accession);
    }));
    expect(await broken(role)).toEqual([]);
  });

  it('holds no name, address or text of a person', async () => {
    const rows = await app.sql<{ payload: string }>('select payload::text from events');
    const people = await app.sql<{ name: string; email: string }>('select name, email from users');
    const text = rows.map(({ payload }) => payload).join('\n');
    for (const { name, email } of people) {
      expect(text).not.toContain(name);
      expect(text).not.toContain(email);
    }
    expect(text).not.toContain('withdrawn by its authors');
  });
});
