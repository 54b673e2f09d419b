import { beforeAll, describe, expect, it } from 'vitest';
import type { EntryChanges, EntryDetail } from '#shared/contracts/entries.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, refusalOf, type Client } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let contributor: Person;
let other: Person;
let reviewer: Person;
let visitor: Client;
let lives: Lives;
let accession = '';

/** The next revision of an entry, with a change to what was typed; still a draft. */
async function revise(change: object): Promise<void> {
  okBody(await contributor.client.post(`/entries/${accession}/revise`, { reason: 'The figure was misread.' }), 201);
  const tag = String((await contributor.client.get(`/entries/${accession}/draft`)).headers['etag']);
  okBody(await contributor.client.patch(`/entries/${accession}`, change, { 'If-Match': tag }));
}

beforeAll(async () => {
  [contributor, other, reviewer] = [await app.person('contributor'), await app.person('contributor'), await app.person('reviewer')];
  visitor = await app.visitor();
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
  ({ accession } = await lives.accepted());
  await revise({
    locator: 'Table 3, p. 105', surface: { site: 'step-edge' }, conditions: { promoter: 'Cs' },
    quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '45.4 ± 1.4', unitAsPrinted: 'kcal/mol', uncertaintyKind: 'expanded', coverageFactor: 2 }],
  });
  await lives.decide(await lives.submit(accession), 'accept');
  await revise({ note: 'Read once more.' });
});

const ask = async (client: Client, query: string) => okBody(await client.get(`/entries/${accession}/changes?${query}`)) as EntryChanges;

describe('what differs between two versions', () => {
  it('is told part by part, as typed and as converted', async () => {
    const answer = await ask(visitor, 'from=1&to=2');
    expect(answer.from).toMatchObject({ version: 1, revision: 1, state: 'superseded' });
    expect(answer.to).toMatchObject({ version: 2, revision: 2, state: 'accepted' });
    expect(answer.changes).toEqual([
      { field: 'Surface, site', before: 'terrace', after: 'step-edge' },
      { field: 'Where in the source', before: 'Table 2, p. 104', after: 'Table 3, p. 105' },
      { field: 'Conditions, promoter', before: 'not reported', after: 'Cs' },
      { field: 'Activation energy', before: '44.5 ± 1.4 kcal/mol (Arrhenius activation energy, ± is standard uncertainty)', after: '45.4 ± 1.4 kcal/mol (Arrhenius activation energy, ± is expanded uncertainty, k = 2)' },
      { field: 'Pre-exponential factor', before: '10^13 s-1', after: 'not given' },
    ]);
    const [energy, factor] = answer.quantities;
    // 44.5 and 45.4 kcal/mol × 4.184 kJ/kcal; U = 1.4 kcal/mol with k = 2 is u = 0.7 kcal/mol = 2.9288 kJ/mol.
    expect(energy?.before?.value).toBeCloseTo(186.188, 9);
    expect(energy?.after?.value).toBeCloseTo(189.9536, 9);
    expect(energy?.after?.standardUncertainty).toBeCloseTo(2.9288, 9);
    expect(factor).toMatchObject({ symbol: 'preExponential', before: { value: 1e13 }, after: null });
  });

  it('is the same seen from the other end, and nothing for a version and itself', async () => {
    const [there, back] = [await ask(visitor, 'from=1&to=2'), await ask(visitor, 'from=2&to=1')];
    expect(back.changes.map(({ field, before, after }) => ({ field, before: after, after: before }))).toEqual(there.changes);
    const itself = await ask(visitor, 'from=2&to=2');
    expect([itself.changes, itself.quantities]).toEqual([[], []]);
  });

  it('takes in a revision that is not public, for those who may see it', async () => {
    for (const { client } of [contributor, reviewer]) expect((await ask(client, 'from=2&to=r3')).changes).toEqual([{ field: 'Note', before: 'not reported', after: 'Read once more.' }]);
    const revisions = async (client: Client) => (okBody(await client.get(`/entries/${accession}`)) as EntryDetail).revisions.map(({ revision, version }) => [revision, version]);
    expect(await revisions(contributor.client)).toEqual([[1, 1], [2, 2], [3, null]]);
    expect(await revisions(visitor)).toEqual([[1, 1], [2, 2]]);
  });

  it.each<[string, () => Client, string, [number, string]]>([
    ['a revision not public, to a visitor', () => visitor, 'from=2&to=r3', [404, 'not-found']],
    ['a revision not public, to another contributor', () => other.client, 'from=2&to=r3', [404, 'not-found']],
    ['a version that is not there', () => visitor, 'from=1&to=9', [404, 'not-found']],
    ['no version at all', () => visitor, 'from=1', [422, 'invalid-input']],
    ['a word', () => visitor, 'from=1&to=latest', [422, 'invalid-input']],
  ])('refuses %s', async (_, client, query, refusal) => {
    expect(refusalOf(await client().get(`/entries/${accession}/changes?${query}`))).toEqual(refusal);
  });

  it('does not tell of an entry that is not public at all', async () => {
    const draft = await lives.draft(entryInputOf());
    expect(refusalOf(await visitor.get(`/entries/${draft.accession}/changes?from=r1&to=r1`))).toEqual([404, 'not-found']);
  });
});
