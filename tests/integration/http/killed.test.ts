import { setTimeout as pause } from 'node:timers/promises';
import { describe, expect, it } from 'vitest';
import { testPassword, useApp } from '#tests/factories/app.ts';
import { Client, type Body } from '#tests/factories/client.ts';
import { answers, entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';
import { useServerProcess, type ServerProcess } from '#tests/factories/server-process.ts';

const app = useApp();
const start = useServerProcess();

/** Everything that a request cut off in the middle could have left behind; each query must find nothing. */
const halfDone: Record<string, string> = {
  'a submitted revision without its submission': `select r.id from revisions r where r.state not in ('draft', 'withdrawn') and not exists (select 1 from submissions s where s.revision_id = r.id)`,
  'a submission of a draft': `select s.id from submissions s join revisions r on r.id = s.revision_id where r.state = 'draft'`,
  'quantities of a draft': `select q.id from quantities q join revisions r on r.id = q.revision_id where r.state = 'draft'`,
  'a conversion of a draft': `select c.id from conversions c join revisions r on r.id = c.revision_id where r.state = 'draft'`,
  'a submission without all its quantities': `select s.id from submissions s join revisions r on r.id = s.revision_id where (select count(*) from quantities q where q.revision_id = r.id) <> jsonb_array_length(r.input -> 'quantities')`,
  'a submission without its conversion': `select s.id from submissions s where (select count(*) from conversions c where c.revision_id = s.revision_id) <> 1`,
  'a conversion without all its values': `select c.id from conversions c where (select count(*) from converted_quantities v where v.conversion_id = c.id) <> (select count(*) from quantities q where q.revision_id = c.revision_id)`,
  'a submission that the log does not know': `select s.id from submissions s where not exists (select 1 from events e where e.action = 'revision.submitted' and e.subject_id = s.revision_id)`,
  'a submission that only the log knows': `select e.seq from events e where e.action = 'revision.submitted' and not exists (select 1 from submissions s where s.revision_id = e.subject_id)`,
  'an accepted version without its decision': `select r.id from revisions r where r.version is not null and not exists (select 1 from submissions s join decisions d on d.submission_id = s.id where s.revision_id = r.id and d.decision = 'accept')`,
  'a decision whose revision has not moved': `select d.id from decisions d join submissions s on s.id = d.submission_id join revisions r on r.id = s.revision_id where (d.decision = 'accept') <> (r.version is not null) or r.state in ('draft', 'submitted', 'under-review')`,
  'a decision that the log does not know': `select d.id from decisions d where not exists (select 1 from events e where e.action = 'submission.' || d.decision and e.subject_id = d.submission_id)`,
  'an accepted version without its search row': `select r.id from revisions r left join search_rows s on s.revision_id = r.id where r.version is not null and (s.revision_id is null or s.listed <> (r.state = 'accepted'))`,
  'an accepted version without its pinned conversion': `select r.id from revisions r where r.version is not null and not exists (select 1 from accepted_conversions a where a.revision_id = r.id)`,
  'a search row of a draft, or one that does not follow its revision': `select s.revision_id from search_rows s join revisions r on r.id = s.revision_id where r.state = 'draft' or s.state <> r.state`,
  'a submission without its search row': `select s.revision_id from submissions s where not exists (select 1 from search_rows w where w.revision_id = s.revision_id)`,
  'a superseded version without a successor': `select r.id from revisions r where r.state = 'superseded' and not exists (select 1 from revisions n where n.entry_id = r.entry_id and n.version = r.version + 1)`,
  'an entry without a revision': `select e.id from entries e where not exists (select 1 from revisions r where r.entry_id = e.id)`,
  'a revision that the log does not know': `select r.id from revisions r where not exists (select 1 from events e where e.action = 'revision.drafted' and e.subject_id = r.id)`,
  'a broken event log': 'select seq from broken_event()',
};

interface Acknowledged {
  /** Revisions that the server said were submitted, by accession and number. */
  submitted: [string, number][];
  accepted: [string, number][];
}

/** People at work until the server is gone: drafts, submissions, decisions, revisions of what was accepted. */
async function work(contributor: Client, reviewer: Client, done: Acknowledged, round: number): Promise<void> {
  const body = async (sent: Promise<{ status: number; body: Body }>): Promise<Body> => {
    const { status, body: answer } = await sent;
    if (status >= 300) throw new Error(`answered ${status}: ${JSON.stringify(answer)}`);
    return answer as Body;
  };
  for (let n = 0; ; n += 1) {
    const { accession } = await body(contributor.post('/entries', entryInputOf({ locator: `round ${round}, ${n}` }))) as { accession: string };
    for (let revision = 1; revision <= 1 + (n % 2); revision += 1) {
      if (revision > 1) await body(contributor.post(`/entries/${accession}/revise`, { reason: 'Read again.' }));
      const { submission } = await body(contributor.post(`/entries/${accession}/submit`)) as { submission: string };
      done.submitted.push([accession, revision]);
      const { seen } = await body(reviewer.get(`/reviews/${submission}`)) as { seen: string };
      await body(reviewer.post(`/reviews/${submission}/decision`, { decision: 'accept', checklist: answers(), seen }));
      done.accepted.push([accession, revision]);
    }
  }
}

async function checkWhole(): Promise<void> {
  for (const [what, query] of Object.entries(halfDone)) expect(await app.sql(query), what).toEqual([]);
}

describe('a server that is killed', () => {
  it('fifteen times at random moments: nothing half-done, nothing lost that was acknowledged', async () => {
    const [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
    // The source is in the store beforehand, so that the work is all submissions and decisions.
    await new Lives(app.services, contributor.actor, reviewer.actor).accepted();
    const done: Acknowledged = { submitted: [], accepted: [] };
    const unexpected: string[] = [];
    for (let round = 0; round < 15; round += 1) {
      const server = await start(app.database?.appUrl ?? '');
      const clients = await Promise.all([contributor, reviewer].map(async ({ email }) => {
        const client = new Client(server.url, email);
        if ((await client.signIn(email, testPassword)).status !== 200) throw new Error('Signing in after a kill failed.');
        return client;
      }));
      const [writer, decider] = clients as [Client, Client];
      let killed = false;
      const workers = [1, 2, 3].map((n) => work(writer, decider, done, round * 10 + n).catch((error: unknown) => {
        if (!killed) unexpected.push(String(error));
      }));
      // Once the work is under way, at any moment of it.
      const had = done.submitted.length;
      for (let tries = 0; tries < 500 && done.submitted.length === had; tries += 1) await pause(10);
      await pause(Math.random() * 900);
      killed = true;
      await server.kill();
      await Promise.all(workers);
      await settled();
      await checkWhole();
    }
    expect(unexpected).toEqual([]);
    expect(done.submitted.length).toBeGreaterThanOrEqual(15);
    expect(done.accepted.length).toBeGreaterThan(5);
    const stored = new Map((await app.sql<{ key: string; state: string }>("select e.accession || ' ' || r.number as key, r.state from revisions r join entries e on e.id = r.entry_id")).map(({ key, state }) => [key, state]));
    for (const [accession, number] of done.submitted) expect(stored.get(`${accession} ${number}`)).toMatch(/submitted|accepted|superseded/);
    for (const [accession, number] of done.accepted) expect(stored.get(`${accession} ${number}`)).toMatch(/accepted|superseded/);
  }, 180_000);

  /** The database notices by itself that a client is gone and undoes what it was at; this waits for that. */
  async function settled(): Promise<void> {
    for (let tries = 0; tries < 100; tries += 1) {
      const [row] = await app.sql<{ n: number }>("select count(*)::int as n from pg_stat_activity where datname = current_database() and usename = 'sillstone_app' and state <> 'idle'");
      if (row?.n === 0) return;
      await pause(20);
    }
    throw new Error('A transaction of the killed server is still open.');
  }
});

describe('a server that is told to stop', () => {
  it('finishes the requests under way, takes no more, and ends well', async () => {
    const server: ServerProcess = await start(app.database?.appUrl ?? '');
    const { email } = await app.person('contributor');
    const client = new Client(server.url, email);
    await client.signIn(email, testPassword);
    const before = await app.sql<{ n: number }>('select count(*)::int as n from entries');
    const under = Array.from({ length: 8 }, () => client.post('/entries', {}).then(({ status }) => status, () => 0));
    await pause(30);
    const ended = server.stop();
    const statuses = await Promise.all(under);
    expect(await ended).toBe(0);
    const after = await app.sql<{ n: number }>('select count(*)::int as n from entries');
    expect((after[0]?.n ?? 0) - (before[0]?.n ?? 0)).toBe(statuses.filter((status) => status === 201).length);
    await expect(client.get('/health')).rejects.toThrow(/ECONNREFUSED/);
  });
});
