import { beforeAll, describe, expect, it } from 'vitest';
import { mostCollections } from '#shared/contracts/collections.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Client } from '#tests/factories/client.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let reader: Person;
let other: Person;
let visitor: Client;
let lives: Lives;
let accepted: string[] = [];

beforeAll(async () => {
  [reader, other, visitor] = [await app.person('reader'), await app.person('reader'), await app.visitor()];
  const [contributor, reviewer] = [await app.person('contributor'), await app.person('reviewer')];
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
  accepted = [(await lives.accepted()).accession, (await lives.accepted()).accession, (await lives.accepted()).accession];
});

const started = async (body: object): Promise<{ id: string; entries: number; items: { accession: string; state: string }[] }> => okBody(await reader.client.post('/collections', body), 201);
const anId = '00000000-0000-4000-8000-000000000000';

describe('a collection', () => {
  it('is started with entries, in any spelling of their accession, each once', async () => {
    const [first = '', second = ''] = accepted;
    const made = await started({ name: '  Ammonia on Ru ', accessions: [first.toLowerCase(), first.replaceAll('-', ' '), second] });
    expect(made).toMatchObject({ name: 'Ammonia on Ru', description: '', entries: 2 });
    expect(made.items.map(({ accession }) => accession).sort()).toEqual([first, second].sort());
  });

  it('takes entries once and says how many it held already', async () => {
    const { id } = await started({ name: 'twice', accessions: accepted.slice(0, 1) });
    const answer = okBody(await reader.client.post(`/collections/${id}/entries`, { accessions: accepted }));
    expect(answer).toMatchObject({ added: 2, already: 1, collection: { entries: 3 } });
    const taken = okBody(await reader.client.post(`/collections/${id}/entries/remove`, { accessions: accepted.slice(0, 2) }));
    expect(taken).toMatchObject({ removed: 2, collection: { entries: 1 } });
    expect(okBody(await reader.client.get(`/collections/${id}`))).toMatchObject({ entries: 1, items: [{ accession: accepted[2], state: 'accepted' }] });
  });

  it('is renamed, discarded and brought back with all it held', async () => {
    const { id } = await started({ name: 'before', accessions: accepted });
    expect(okBody(await reader.client.patch(`/collections/${id}`, { name: 'after', description: 'For the reactor model.' }))).toMatchObject({ name: 'after', description: 'For the reactor model.' });
    expect((await reader.client.post(`/collections/${id}/discard`)).status).toBe(204);
    expect(refusalOf(await reader.client.get(`/collections/${id}`))).toEqual([404, 'not-found']);
    expect(okBody(await reader.client.get('/collections')).items.map((item: { id: string }) => item.id)).not.toContain(id);
    expect(okBody(await reader.client.post(`/collections/${id}/restore`))).toMatchObject({ name: 'after', entries: 3 });
  });

  it('keeps a retracted entry and says that it is', async () => {
    const { accession } = await lives.inState('retracted');
    const { items } = await started({ name: 'retracted', accessions: [accession] });
    expect(items).toMatchObject([{ accession, state: 'retracted' }]);
  });

  it('is listed with the one changed last first', async () => {
    const first = await started({ name: 'older' });
    app.clock.advance(1);
    const second = await started({ name: 'newer' });
    app.clock.advance(1);
    await reader.client.post(`/collections/${first.id}/entries`, { accessions: accepted.slice(0, 1) });
    const { items } = okBody(await reader.client.get('/collections')) as { items: { id: string; entries: number }[] };
    expect(items.slice(0, 2)).toMatchObject([{ id: first.id, entries: 1 }, { id: second.id, entries: 0 }]);
  });

  it('leaves its trail in the event log without its name', async () => {
    const { id } = await started({ name: 'a private name' });
    const rows = await app.sql<{ action: string; payload: unknown }>('select action, payload from events where subject_id = $1', [id]);
    expect(rows.map(({ action }) => action)).toEqual(['collection.created']);
    expect(JSON.stringify(rows)).not.toContain('private');
  });
});

describe('a collection as a search', () => {
  const found = async (client: Client, query: string) => (okBody(await client.get(`/entries?${query}`)).items as { accession: string }[]).map(({ accession }) => accession).sort();

  it('finds, counts, summarises and exports what it holds, and what further filters leave of it', async () => {
    const { id } = await started({ name: 'searched', accessions: accepted.slice(0, 2) });
    expect(await found(reader.client, `collection=${id}`)).toEqual(accepted.slice(0, 2).sort());
    expect(await found(reader.client, `collection=${id}&metal=Au`)).toEqual([]);
    expect(okBody(await reader.client.get(`/entries?collection=${id}&metal=Au`)).emptiedBy).toEqual([{ filter: 'metal', totalWithout: 2 }, { filter: 'collection', totalWithout: 0 }].filter(({ totalWithout }) => totalWithout > 0));
    expect(okBody(await reader.client.get(`/entries/summary?collection=${id}`)).points).toHaveLength(2);
    const csv = await reader.client.get(`/entries/export?format=csv&collection=${id}`);
    expect(csv.text.trim().split('\r\n')).toHaveLength(3);
  });

  it('finds nothing for anybody else, nor when it is discarded', async () => {
    const { id } = await started({ name: 'private', accessions: accepted });
    for (const client of [other.client, visitor]) expect(await found(client, `collection=${id}`)).toEqual([]);
    await reader.client.post(`/collections/${id}/discard`);
    expect(await found(reader.client, `collection=${id}`)).toEqual([]);
    expect(await found(reader.client, 'collection=not-an-id')).toEqual([]);
  });
});

describe('what is refused', () => {
  it.each<[string, object, string]>([
    ['no name', { name: ' ' }, 'invalid-input'],
    ['a name of 121 characters', { name: 'x'.repeat(121) }, 'invalid-input'],
    ['an entry that does not exist', { name: 'a', accessions: ['222-222-2'] }, 'invalid-input'],
    ['what is no accession', { name: 'a', accessions: ['Ru(0001)'] }, 'invalid-input'],
    ['501 entries at once', { name: 'a', accessions: Array.from({ length: 501 }, () => '222-222-2') }, 'invalid-input'],
  ])('%s', async (_name, body, code) => {
    const before = okBody(await reader.client.get('/collections')).total as number;
    expect(refusalOf(await reader.client.post('/collections', body))).toEqual([422, code]);
    expect(okBody(await reader.client.get('/collections')).total).toBe(before);
  });

  it('an entry that is not public yet, in the words for one that does not exist', async () => {
    const { accession } = await lives.submitted();
    const answer = await reader.client.post('/collections', { name: 'a', accessions: [accession] });
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(answer.text).toContain(`There is no public entry ${accession}.`);
  });

  it.each(['GET /collections/:id', 'PATCH /collections/:id', 'POST /collections/:id/entries', 'POST /collections/:id/entries/remove', 'POST /collections/:id/discard', 'POST /collections/:id/restore'])(
    '%s of somebody else, of nobody, and of what is no id, all in the same words', async (route) => {
      const { id } = await started({ name: 'mine', accessions: accepted });
      const [method = '', path = ''] = route.split(' ');
      const body = path.includes('entries') ? { accessions: accepted } : method === 'PATCH' ? { name: 'theirs' } : undefined;
      const texts = await Promise.all([id, anId, 'not-an-id'].map(async (one) => {
        const answer = await other.client.send(method, path.replace(':id', one), body);
        expect(refusalOf(answer)).toEqual([404, 'not-found']);
        return String((answer.body as { detail: string }).detail);
      }));
      expect(new Set(texts).size).toBe(1);
      expect(okBody(await reader.client.get(`/collections/${id}`))).toMatchObject({ name: 'mine', entries: 3 });
    },
  );

  it('a visitor', async () => {
    expect(refusalOf(await visitor.get('/collections'))).toEqual([401, 'sign-in-required']);
  });

  it(`more than ${mostCollections}, until one is discarded`, async () => {
    const { client } = await app.person('reader');
    let last = '';
    for (let i = 0; i < mostCollections; i += 1) last = okBody(await client.post('/collections', { name: `list ${i}` }), 201).id as string;
    expect(refusalOf(await client.post('/collections', { name: 'one more' }))).toEqual([422, 'invalid-input']);
    await client.post(`/collections/${last}/discard`);
    expect((await client.post('/collections', { name: 'one more' })).status).toBe(201);
    expect(refusalOf(await client.post(`/collections/${last}/restore`))).toEqual([422, 'invalid-input']);
  });
});

describe('two at once', () => {
  it('add to one list without losing either', async () => {
    const { id } = await started({ name: 'both' });
    await Promise.all(accepted.map((accession) => reader.client.post(`/collections/${id}/entries`, { accessions: [accession] })));
    expect(okBody(await reader.client.get(`/collections/${id}`)).entries).toBe(3);
  });
});
