import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { states, transitions, type State } from '#shared/domain/states.ts';
import { useApp } from '#tests/factories/app.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let client: pg.Client;
let lives: Lives;
let reviewerId = '';
let contributorId = '';

/** Everything as the application's own role: what the service cannot do by mistake. */
const tried = async (text: string, values: unknown[] = []): Promise<string> => {
  await client.query('begin');
  try {
    await client.query(text, values);
    return 'done';
  } catch (error) {
    const { constraint, code } = error as pg.DatabaseError;
    return constraint ?? code ?? 'unknown';
  } finally {
    await client.query('rollback');
  }
};

async function revisionOf(accession: string): Promise<{ id: string; entry: string; state: State }> {
  const [row] = await app.sql<{ id: string; entry: string; state: State }>('select r.id, r.entry_id as entry, r.state from revisions r join entries e on e.id = r.entry_id where e.accession = $1 order by r.number limit 1', [accession]);
  if (!row) throw new Error('No such revision.');
  return row;
}

beforeAll(async () => {
  const [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  [contributorId, reviewerId] = [contributor.actor.userId, reviewer.actor.userId];
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
  client = new pg.Client({ connectionString: app.database?.appUrl });
  await client.connect();
});
afterAll(() => client.end());

describe('the state machine, held by the database', () => {
  const revisions = new Map<State, string>();
  beforeAll(async () => {
    for (const state of states) revisions.set(state, (await revisionOf((await lives.inState(state)).accession)).id);
  });

  it.each(states)('begins where the test left it: %s', async (state) => {
    expect(await app.sql('select state from revisions where id = $1', [revisions.get(state)])).toEqual([{ state }]);
  });

  const pairs = states.flatMap((from) => states.filter((to) => to !== from).map((to) => [from, to] as const));
  it.each(pairs)('%s to %s is allowed exactly when the domain lists it', async (from, to) => {
    const listed = Object.values(transitions[from]).includes(to);
    const version = ['accepted', 'superseded', 'retracted'].includes(to) ? 'coalesce(version, 1000)' : 'null';
    // A revision becomes accepted through a decision, so one is made first where the move is allowed.
    const withDecision = listed && to === 'accepted';
    const made = withDecision
      ? `with d as (insert into decisions (submission_id, decision, comment, checklist, decided_by, decided_at) select id, 'accept', '', '{}', $2, now() from submissions where revision_id = $1 returning 1) select count(*) from d`
      : null;
    await client.query('begin');
    try {
      if (made) await client.query(made, [revisions.get(from), reviewerId]);
      // Leaving a draft needs the columns that submitting fills: without them another constraint speaks, which the state machine has let through.
      const outcome = await client.query(`update revisions set state = '${to}', version = ${version}, lock = lock + 1 where id = $1`, [revisions.get(from)]).then(() => 'done', (error: pg.DatabaseError) => error.constraint ?? error.code);
      if (listed) expect(['done', 'revisions_complete_check']).toContain(outcome);
      else expect(['revisions_transition', 'revisions_are_frozen']).toContain(outcome);
      if (listed && from !== 'draft') expect(outcome).toBe('done');
    } finally {
      await client.query('rollback');
    }
  });

  it('asks the function itself, over every pair', async () => {
    const { rows } = await client.query<{ old: State; new: State }>('select a as old, b as new from unnest($1::text[]) a cross join unnest($1::text[]) b where state_allows(a, b)', [[...states]]);
    const allowed = states.flatMap((from) => [...new Set(Object.values(transitions[from]))].filter((to) => to !== from).map((to) => `${from} ${to}`));
    expect(rows.map((row) => `${row.old} ${row.new}`).sort()).toEqual(allowed.sort());
  });
});

describe('what a revision is held to', () => {
  const insert = (state: string, version: string) =>
    `insert into revisions (entry_id, number, state, version, author_id, author_name, input, input_hash) values ($1, 99, '${state}', ${version}, $2, 'A', '{}', 'h')`;

  it.each([...states.filter((state) => state !== 'draft').map((state) => [state, 'null'] as const), ['draft', '1'] as const])('it begins as a draft, not as %s with version %s', async (state, version) => {
    const { entry } = await revisionOf((await lives.inState('withdrawn')).accession);
    expect(await tried(insert(state, version), [entry, contributorId])).toBe('revisions_begin_as_draft');
  });

  it('an entry has one open revision', async () => {
    const { entry } = await revisionOf((await lives.submitted()).accession);
    expect(await tried(insert('draft', 'null'), [entry, contributorId])).toBe('revisions_one_open_per_entry');
  });

  it('acceptance needs a decision', async () => {
    const { id } = await revisionOf((await lives.submitted()).accession);
    expect(await tried("update revisions set state = 'accepted', version = 1, lock = lock + 1 where id = $1", [id])).toBe('revisions_accepted_by_decision');
  });

  it('a decision to return is no acceptance', async () => {
    const { id } = await revisionOf((await lives.submitted()).accession);
    await client.query('begin');
    await client.query(`insert into decisions (submission_id, decision, reason, comment, checklist, decided_by, decided_at) select id, 'return', 'other', 'x', '{}', $2, now() from submissions where revision_id = $1`, [id, reviewerId]);
    await expect(client.query("update revisions set state = 'accepted', version = 1, lock = lock + 1 where id = $1", [id])).rejects.toMatchObject({ constraint: 'revisions_accepted_by_decision' });
    await client.query('rollback');
  });

  it.each(['lock', 'lock - 1', '0'])('the lock rises: %s is refused', async (lock) => {
    const { id } = await revisionOf((await lives.draft()).accession);
    expect(await tried(`update revisions set author_name = 'B', lock = ${lock} where id = $1`, [id])).toBe('revisions_lock_rises');
  });

  it.each([
    ['input', `'{"note": "changed"}'`], ['input_hash', "'changed'"], ['author_name', "'Somebody Else'"], ['kind', "'barrier'"], ['scope', "'apparent'"], ['provenance', "'estimated'"],
    ['method_class', "'computed'"], ['technique', "'changed'"], ['valid_min_k', '1'], ['valid_max_k', '4000'], ['step_id', 'null'], ['surface_id', 'null'], ['source_id', 'null'],
  ])('%s is frozen once submitted, in every later state', async (column, value) => {
    for (const state of states.filter((other) => other !== 'draft')) {
      const [row] = await app.sql<{ id: string }>('select id from revisions where state = $1 limit 1', [state]);
      expect(await tried(`update revisions set ${column} = ${value}, lock = lock + 1 where id = $1`, [row?.id]), state).toBe('revisions_are_frozen');
    }
  });

  it.each([['version', 'version + 1'], ['accepted_at', "accepted_at + interval '1 second'"]])('%s never changes', async (column, value) => {
    const { id } = await revisionOf((await lives.accepted()).accession);
    expect(await tried(`update revisions set ${column} = ${value}, lock = lock + 1 where id = $1`, [id])).toBe('revisions_are_frozen');
  });

  it('a submitted one takes no further quantity', async () => {
    const { id } = await revisionOf((await lives.submitted()).accession);
    expect(await tried("insert into quantities (revision_id, position, symbol, as_printed, unit_as_printed, bound, uncertainty_kind, uncertainty_scale) values ($1, 9, 'energy', '1', 'eV', '=', 'none', 'linear')", [id])).toBe('revisions_are_frozen');
  });

  it('its valid range runs upwards', async () => {
    const { id } = await revisionOf((await lives.draft()).accession);
    expect(await tried('update revisions set valid_min_k = 800, valid_max_k = 600, lock = lock + 1 where id = $1', [id])).toBe('revisions_valid_range_check');
  });
});

describe('the rule of two people, held by the database', () => {
  const decide = `insert into decisions (submission_id, decision, comment, checklist, decided_by, decided_at) select id, 'accept', '', '{}', $2, now() from submissions where revision_id = $1`;

  it('nobody decides on what they wrote, handed in or first contributed, whatever their role', async () => {
    const author = await app.person('curator');
    const reviewer = await app.person('reviewer');
    const own = new Lives(app.services, author.actor, reviewer.actor);
    const { id } = await revisionOf((await own.submitted()).accession);
    expect(await tried(decide, [id, author.actor.userId])).toBe('decisions_not_on_own');
    expect(await tried(decide, [id, reviewer.actor.userId])).toBe('done');
    // Revised by another, the entry is still its first contributor's.
    const { accession } = await own.accepted(entryInputOf({ locator: 'p. 1' }));
    const other = await app.person('reviewer');
    await app.services.entries.revise(other.actor, accession, 'Read again.');
    await app.services.entries.submit(other.actor, accession, null);
    const [second] = await app.sql<{ id: string }>('select r.id from revisions r join entries e on e.id = r.entry_id where e.accession = $1 order by number desc limit 1', [accession]);
    expect(await tried(decide, [second?.id, author.actor.userId])).toBe('decisions_not_on_own');
    expect(await tried(decide, [second?.id, other.actor.userId])).toBe('decisions_not_on_own');
    expect(await tried(decide, [second?.id, reviewer.actor.userId])).toBe('done');
  });

  it.each(['reader', 'contributor'] as const)('a %s decides nothing', async (role) => {
    const { id } = await revisionOf((await lives.submitted()).accession);
    expect(await tried(decide, [id, (await app.person(role)).actor.userId])).toBe('decisions_by_reviewers');
  });

  it('one submission has one decision', async () => {
    const { id } = await revisionOf((await lives.accepted()).accession);
    expect(await tried(decide, [id, (await app.person('reviewer')).actor.userId])).toBe('decisions_submission_key');
  });

  it('a return or rejection names a reason', async () => {
    const { id } = await revisionOf((await lives.submitted()).accession);
    expect(await tried(decide.replace("'accept'", "'reject'"), [id, reviewerId])).toBe('decisions_reason_needed_check');
  });
});
