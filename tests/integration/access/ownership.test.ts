import { beforeAll, describe, expect, it } from 'vitest';
import { states, type State } from '#shared/domain/states.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Client } from '#tests/factories/client.ts';
import { answers } from '#tests/factories/entry-input.ts';
import { Lives, type Life } from '#tests/factories/lives.ts';

const app = useApp();
type Viewer = 'visitor' | 'reader' | 'another contributor' | 'its contributor' | 'a reviewer' | 'a curator';
const viewers: readonly Viewer[] = ['visitor', 'reader', 'another contributor', 'its contributor', 'a reviewer', 'a curator'];
const clients = {} as Record<Viewer, Client>;
const lives = {} as Record<State, Life>;
let contributor: Person;

beforeAll(async () => {
  contributor = await app.person('contributor');
  const reviewer = await app.person('reviewer');
  clients['visitor'] = await app.visitor();
  clients['reader'] = (await app.person('reader')).client;
  clients['another contributor'] = (await app.person('contributor')).client;
  clients['its contributor'] = contributor.client;
  clients['a reviewer'] = reviewer.client;
  clients['a curator'] = (await app.person('curator')).client;
  const made = new Lives(app.services, contributor.actor, reviewer.actor);
  for (const state of states) lives[state] = await made.inState(state);
});

const everPublic: readonly State[] = ['accepted', 'superseded', 'retracted'];
const seesAll: readonly Viewer[] = ['its contributor', 'a reviewer', 'a curator'];

describe('who may read an entry', () => {
  it.each(states.flatMap((state) => viewers.map((viewer) => [viewer, state] as const)))('%s, one that is %s', async (viewer, state) => {
    const answer = await clients[viewer].get(`/entries/${lives[state].accession}`);
    if (everPublic.includes(state) || seesAll.includes(viewer)) expect(okBody(answer).accession).toBe(lives[state].accession);
    else expect(refusalOf(answer)).toEqual([404, 'not-found']);
  });

  it.each(['XXX-XXX-X', '222-222-3', 'unheard of', '222-222-2'])('what does not exist and what may not be seen answer alike: %s', async (accession) => {
    const absent = await clients.visitor.get(`/entries/${accession}`);
    const hidden = await clients.visitor.get(`/entries/${lives.draft.accession}`);
    const plain = (text: string, name: string) => text.replace(name, 'X').replace(/"requestId":"[^"]+"/, '');
    expect(plain(absent.text, accession)).toBe(plain(hidden.text, lives.draft.accession));
  });

  it('says in the actions exactly what its contributor may do', async () => {
    const seen: Partial<Record<State, string[]>> = {};
    for (const state of states) seen[state] = okBody(await clients['its contributor'].get(`/entries/${lives[state].accession}`)).actions as string[];
    expect(seen).toEqual({
      'draft': ['edit', 'submit', 'withdraw'], 'submitted': ['withdraw'], 'under-review': ['withdraw'], 'returned': ['withdraw', 'revise'], 'accepted': ['revise', 'export'],
      'rejected': [], 'withdrawn': ['revise'], 'superseded': ['revise', 'export'], 'retracted': [],
    });
  });

  it('offers a visitor nothing but the export of what is accepted', async () => {
    for (const state of everPublic) expect(okBody(await clients.visitor.get(`/entries/${lives[state].accession}`)).actions).toEqual(state === 'retracted' ? [] : ['export']);
  });

  it("names nobody's unpublished drafts in lists", async () => {
    const mine = okBody(await clients['its contributor'].get('/contributions?limit=200'));
    expect((mine.items as { accession: string }[]).map(({ accession }) => accession).sort()).toEqual(states.map((state) => lives[state].accession).sort());
    expect(okBody(await clients['another contributor'].get('/contributions')).items).toEqual([]);
    const found = okBody(await clients.visitor.get('/entries?limit=200'));
    expect((found.items as { accession: string }[]).map(({ accession }) => accession).sort()).toEqual([lives.accepted.accession, lives.superseded.accession].sort());
    const doi = okBody(await clients['another contributor'].get('/doi/10.5555/test.1'));
    expect((doi.entries as { accession: string }[]).map(({ accession }) => accession).sort()).toEqual([lives.accepted.accession, lives.superseded.accession].sort());
  });
});

describe('who may write an entry', () => {
  const writes: [string, (client: Client, life: Life) => Promise<unknown>, string][] = [
    ['patch', (client, life) => client.patch(`/entries/${life.accession}`, { note: 'mine now' }, { 'If-Match': `"${life.tag}"` }), 'edit'],
    ['submit', (client, life) => client.post(`/entries/${life.accession}/submit`), 'submit'],
    ['withdraw', (client, life) => client.post(`/entries/${life.accession}/withdraw`), 'withdraw'],
    ['draft', (client, life) => client.get(`/entries/${life.accession}/draft`), 'draft'],
  ];
  const others: readonly Viewer[] = ['another contributor', 'a reviewer', 'a curator'];

  it.each(writes.flatMap(([name, write]) => others.flatMap((viewer) => states.map((state) => [name, viewer, state, write] as const))))('%s by %s of one that is %s is refused', async (_name, viewer, state, write) => {
    const answer = await write(clients[viewer], lives[state]) as Parameters<typeof refusalOf>[0];
    const visible = everPublic.includes(state) || seesAll.includes(viewer);
    expect(refusalOf(answer)).toEqual(visible ? [403, 'forbidden'] : [404, 'not-found']);
    expect(await app.sql("select count(*)::int as n from revisions where input ->> 'note' = 'mine now'")).toEqual([{ n: 0 }]);
  });

  it('another contributor revises what is accepted with a reason, and only that', async () => {
    const client = clients['another contributor'];
    for (const state of states.filter((other) => other !== 'accepted' && other !== 'superseded')) {
      expect(refusalOf(await client.post(`/entries/${lives[state].accession}/revise`, { reason: 'Read again.' })), state).toEqual(state === 'retracted' ? [409, 'state-conflict'] : [404, 'not-found']);
    }
    expect(refusalOf(await client.post(`/entries/${lives.accepted.accession}/revise`, {}))).toEqual([422, 'invalid-input']);
    okBody(await client.post(`/entries/${lives.accepted.accession}/revise`, { reason: 'The table has a misprint.' }), 201);
    expect(refusalOf(await clients['its contributor'].post(`/entries/${lives.accepted.accession}/revise`, {}))).toEqual([409, 'revision-open']);
    // The first contributor now meets another's revision, which they may not see or touch.
    expect(refusalOf(await clients['its contributor'].get(`/entries/${lives.accepted.accession}/draft`))).toEqual([403, 'forbidden']);
  });
});

describe('who may take part in a review', () => {
  it.each(['claim', 'release', 'comments', 'decision'] as const)('%s of a submission that does not exist is a 404', async (action) => {
    const body = action === 'comments' ? { body: 'x' } : { decision: 'accept', checklist: answers(), seen: '1.1' };
    expect(refusalOf(await clients['a reviewer'].post(`/reviews/00000000-0000-4000-8000-000000000000/${action}`, body))).toEqual([404, 'not-found']);
  });

  it('the discussion is for its contributor and reviewers', async () => {
    const path = `/reviews/${lives.submitted.submission}/comments`;
    expect(refusalOf(await clients['another contributor'].post(path, { body: 'Let me see' }))).toEqual([404, 'not-found']);
    expect((await clients['its contributor'].post(path, { body: 'Page 104 it is.' })).status).toBe(201);
    app.clock.advance(0.1);
    expect((await clients['a curator'].post(path, { body: 'Thank you.' })).status).toBe(201);
    const view = okBody(await clients['a reviewer'].get(`/reviews/${lives.submitted.submission}`));
    expect((view.comments as { body: string }[]).map(({ body }) => body)).toEqual(['Page 104 it is.', 'Thank you.']);
  });
});
