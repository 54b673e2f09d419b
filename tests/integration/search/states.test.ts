import { beforeAll, describe, expect, it } from 'vitest';
import type { Entry } from '#shared/contracts/entries.ts';
import { states, type State } from '#shared/domain/states.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Body, type Client } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
const clients = new Map<string, Client>();
/** Accessions by the contributor and the state they were brought to. */
const entries = new Map<string, string>();

const frozen = states.filter((state) => state !== 'draft');
/** What is accepted in the end is on ruthenium; everything else is on nickel and has a word of its own. */
const isOpen = (state: State) => state === 'accepted' || state === 'superseded';
const inputFor = (state: State) => entryInputOf({ note: isOpen(state) ? 'openly' : 'hidden xylophone', surface: isOpen(state) ? { metal: 'Ru', facet: '0001' } : { metal: 'Ni', facet: '111' } });

beforeAll(async () => {
  clients.set('visitor', await app.visitor());
  const people = new Map<string, Awaited<ReturnType<typeof app.person>>>();
  for (const [name, role] of [['reader', 'reader'], ['first', 'contributor'], ['second', 'contributor'], ['reviewer', 'reviewer'], ['curator', 'curator']] as const) {
    const person = await app.person(role, `States ${name}`);
    people.set(name, person);
    clients.set(name, person.client);
  }
  for (const name of ['first', 'second']) {
    const lives = new Lives(app.services, people.get(name)?.actor as Parameters<typeof app.services.entries.create>[0], people.get('reviewer')?.actor as Parameters<typeof app.services.entries.create>[0]);
    for (const state of states) entries.set(`${name} ${state}`, (await lives.inState(state, inputFor(state))).accession);
  }
}, 120_000);

const ask = async (who: string, query: string): Promise<Body> => okBody(await (clients.get(who) as Client).get(`/entries?limit=200&${query}`));
const found = (answer: Body): string[] => (answer.items as Entry[]).map(({ accession, state }) => `${accession} ${state}`).sort();
/** A superseded entry has an accepted revision, too. */
const rowsIn = (owner: string, state: State): string[] => [
  ...(state === 'draft' ? [] : [`${entries.get(`${owner} ${state}`)} ${state}`]), ...(state === 'accepted' ? [`${entries.get(`${owner} superseded`)} accepted`] : []),
];
const accepted = () => ['first', 'second'].flatMap((owner) => rowsIn(owner, 'accepted')).sort();

const mayFind: Record<string, (owner: string) => boolean> = { visitor: () => false, reader: () => false, first: (owner) => owner === 'first', second: (owner) => owner === 'second', reviewer: () => true, curator: () => true };

describe('a search by state', () => {
  it.each(Object.keys(mayFind).flatMap((who) => states.map((state) => [who, state] as const)))('%s asking for %s finds what they may know of, and nothing else', async (who, state) => {
    const answer = await ask(who, `state=${state}&counts=true`);
    const wanted = ['first', 'second'].filter((owner) => state === 'accepted' || mayFind[who]?.(owner)).flatMap((owner) => rowsIn(owner, state)).sort();
    expect(found(answer)).toEqual(wanted);
    expect(answer.total).toBe(wanted.length);
    const { metal } = answer.counts as { metal: { count: number }[] };
    expect(metal.reduce((sum, { count }) => sum + count, 0)).toBe(wanted.length);
    expect(answer.all).toBe(accepted().length);
    const summary = okBody(await (clients.get(who) as Client).get(`/entries/summary?state=${state}`));
    expect((summary.measured as number) + (summary.computed as number)).toBe(wanted.length);
    const groups = okBody(await (clients.get(who) as Client).get(`/entries/groups?state=${state}&groupBy=surface`));
    expect((groups.items as { count: number }[]).reduce((sum, { count }) => sum + count, 0)).toBe(wanted.length);
  });

  it.each(Object.keys(mayFind))('%s asking for nothing finds accepted entries only', async (who) => {
    const answer = await ask(who, 'counts=true');
    expect(found(answer)).toEqual(accepted());
    expect(answer.states).toEqual(['accepted']);
    const counted = (answer.counts as { state?: { value: string; count: number }[] }).state;
    if (mayFind[who]?.('first') || mayFind[who]?.('second')) {
      const owners = ['first', 'second'].filter((owner) => mayFind[who]?.(owner));
      const wanted = Object.fromEntries(frozen.map((state) => [state, (state === 'accepted' ? ['first', 'second'] : owners).reduce((sum, owner) => sum + rowsIn(owner, state).length, 0)]));
      expect(Object.fromEntries((counted ?? []).map(({ value, count }) => [value, count]))).toEqual(wanted);
    } else expect(counted).toBeUndefined();
  });

  it.each(['visitor', 'reader', 'second'])('%s learns nothing of what others have handed in: not by counts, near misses, near spellings or sorting', async (who) => {
    const own = who === 'second';
    for (const query of ['q=xylophone', 'q=xylophon', 'metal=Ni', 'metal=Ni&facet=100', 'contributor=States first&metal=Ni', `q=${entries.get('first submitted')}`, 'state=submitted&q=openly']) {
      const answer = await ask(who, `counts=true&sort=-accepted&${query}`);
      const others = (answer.items as Entry[]).filter(({ accession }) => ![...entries].some(([key, value]) => value === accession && (key.startsWith('second') || key.endsWith('accepted') || key.endsWith('superseded'))));
      expect(others, query).toEqual([]);
      const emptied = (answer.emptiedBy ?? []) as { totalWithout: number }[];
      for (const { totalWithout } of emptied) expect(totalWithout, query).toBeLessThanOrEqual(accepted().length);
      expect(answer.nearMisses ?? [], query).toEqual([]);
      if (!own) expect(answer.showingResultsFor, query).toBeNull();
    }
  });

  it('several states at once are found together', async () => {
    expect(found(await ask('reviewer', 'state=submitted&state=accepted'))).toEqual([...accepted(), ...['first', 'second'].flatMap((owner) => rowsIn(owner, 'submitted'))].sort());
    const paged: string[] = [];
    for (let cursor: string | null = '', page = 0; cursor !== null && page < 20; page += 1) {
      const answer: Body = okBody(await (clients.get('reviewer') as Client).get(`/entries?limit=3&sort=accession&${frozen.map((state) => `state=${state}`).join('&')}${cursor ? `&cursor=${cursor}` : ''}`));
      paged.push(...(answer.items as Entry[]).map(({ accession, state }) => `${accession} ${state}`));
      cursor = answer.nextCursor as string | null;
    }
    expect(paged.length).toBe(new Set(paged).size);
    expect([...paged].sort()).toEqual(['first', 'second'].flatMap((owner) => frozen.flatMap((state) => rowsIn(owner, state))).sort());
  });

  it('a page marker of one person does not open what another may not see', async () => {
    const { nextCursor } = okBody(await (clients.get('reviewer') as Client).get('/entries?limit=1&state=submitted')) as { nextCursor: string };
    const answer = await (clients.get('visitor') as Client).get(`/entries?limit=200&state=submitted&cursor=${nextCursor}`);
    expect((okBody(answer).items as Entry[])).toEqual([]);
  });

  it('an export holds accepted entries only, whoever asks', async () => {
    const reviewer = clients.get('reviewer') as Client;
    expect(refusalOf(await reviewer.get('/entries/export?format=csv&state=submitted'))).toEqual([422, 'invalid-input']);
    const csv = (await reviewer.get('/entries/export?format=csv')).text;
    for (const [key, accession] of entries) expect(csv.includes(accession), key).toBe(/accepted|superseded/.test(key));
  });

  it('an unknown state is refused', async () => {
    expect(refusalOf(await (clients.get('curator') as Client).get('/entries?state=published'))).toEqual([422, 'invalid-input']);
  });
});

describe('search rows', () => {
  it('follow their revision in the same transaction', async () => {
    const rows = await app.sql<{ n: number }>(`select count(*)::int as n from revisions r left join search_rows s on s.revision_id = r.id where r.state <> 'draft' and (s.revision_id is null or s.state <> r.state or s.listed <> (r.state = 'accepted') or s.accepted_at is distinct from r.accepted_at)`);
    expect(rows).toEqual([{ n: 0 }]);
  });

  it('follow their source: a name confirmed later is found, the old one no more', async () => {
    const visitor = clients.get('visitor') as Client;
    const [source] = await app.sql<{ id: string; title: string }>(`select id, title from sources where doi = '10.5555/test.1'`);
    await app.sql(`update sources set title = 'Zirconocene, <i>an invented</i> study', label = 'Quirrenbach 1994', csl = jsonb_set(csl, '{author,0,family}', '"Quirrenbächer"') where id = $1`, [source?.id]);
    for (const query of ['q=zirconocene', 'author=quirrenbacher', 'q=zircanocene']) expect((await ask('visitor', query)).total, query).toBe(accepted().length);
    expect((await ask('visitor', 'author=Ambrosetti')).total).toBe(0);
    expect(okBody(await visitor.get('/entries?limit=1&groupBy=source')).groups).toMatchObject([{ label: 'Quirrenbach 1994', count: accepted().length }]);
    await app.sql('update sources set title = $2 where id = $1', [source?.id, source?.title]);
  });

  it('are made anew when an older maker made them, and when they are missing', async () => {
    const before = await app.sql('select * from search_rows order by revision_id');
    await app.sql(`alter table search_rows disable trigger guard_search_row`);
    await app.sql(`update search_rows set made_by = 1, species = '{}', support = 'wrong' where state in ('accepted', 'submitted')`);
    await app.sql(`alter table search_rows enable trigger guard_search_row`);
    await app.sql(`delete from search_rows where state = 'returned'`);
    const [{ n: taken } = { n: 0 }] = await app.sql<{ n: number }>(`select count(*)::int as n from search_rows where made_by = 1`);
    expect(await app.services.search.renew()).toBe(taken + 2);
    expect(await app.sql('select * from search_rows order by revision_id')).toEqual(before);
    expect(await app.services.search.renew()).toBe(0);
  });
});
