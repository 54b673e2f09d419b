import { beforeAll, describe, expect, it } from 'vitest';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body, type Client } from '#tests/factories/client.ts';
import { answers, entryInputOf, withEnergy } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let contributor: Person;
let reviewer: Person;
let visitor: Client;
let lives: Lives;
beforeAll(async () => {
  [contributor, reviewer] = [await app.person('contributor', 'Ada Contributor'), await app.person('reviewer', 'Rosa Reviewer')];
  visitor = await app.visitor();
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
});

const accept = async (submission: string): Promise<void> => {
  const { seen } = okBody(await reviewer.client.get(`/reviews/${submission}`)) as { seen: string };
  okBody(await reviewer.client.post(`/reviews/${submission}/decision`, { decision: 'accept', checklist: answers(), seen }));
};
const total = async (query: string): Promise<number> => okBody(await visitor.get(`/entries?${query}`)).total as number;

describe('the main job, by the interface alone', () => {
  it('a value goes from paper to search with its derivation, and k is what the formula gives', async () => {
    const draft = okBody(await contributor.client.post('/entries', entryInputOf()), 201);
    expect(draft.faults).toEqual([]);
    const submitted = okBody(await contributor.client.post(`/entries/${draft.accession as string}/submit`, undefined, { 'If-Match': '"1.1"' }));
    expect(submitted).toMatchObject({ state: 'submitted', actions: ['withdraw'] });
    expect((await visitor.get(`/entries/${draft.accession as string}`)).status).toBe(404);
    expect(await total('metal=Ru')).toBe(0);
    await accept(submitted.submission as string);

    const entry = okBody(await visitor.get(`/entries/${draft.accession as string}?T=700`));
    expect(entry).toMatchObject({ version: 1, revision: 1, state: 'accepted', contributor: 'Ada Contributor', step: { equation: 'NH3* -> NH3 + *' }, surface: { label: 'Ru(0001)' } });
    const [energy, factor] = entry.quantities as Body[];
    expect(energy).toMatchObject({ symbol: 'energy', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', bound: '=', unit: 'kJ/mol', reportedUncertainty: 1.4, uncertaintyKind: 'standard', significantDigits: 3 });
    // 44.5 kcal/mol × 4.184 kJ/kcal (thermochemical, exact) = 186.188 kJ/mol; 1.4 × 4.184 = 5.8576 kJ/mol.
    expect(energy.value).toBeCloseTo(186.188, 12);
    expect(energy.standardUncertainty).toBeCloseTo(5.8576, 12);
    expect((energy.derivation as { operation: string }[]).length).toBeGreaterThanOrEqual(2);
    expect(factor).toMatchObject({ asPrinted: '10^13', unitAsPrinted: 's-1', value: 1e13, unit: 's-1' });
    // k = A exp(-E/(RT)) with R = 8.31446261815324 J/(mol K), exact in the SI of 2019:
    // E/(RT) = 186188 / (8.31446261815324 × 700) = 186188 / 5820.123832707 = 31.990384630; k = 10^13 × e^-31.990384630 = 0.12786524 s-1.
    // The factor is printed without an uncertainty, so that of k is unknown, never the energy's alone.
    expect(entry.kAtT).toMatchObject({ temperatureK: 700, unit: 's-1', extrapolated: false });
    expect(Math.abs((entry.kAtT.value as number) / 0.1278652350793735 - 1)).toBeLessThan(1e-12);
    expect(entry.kAtT.uLnK).toBeNull();
    expect(await total('metal=Ru&kind=activation-energy')).toBe(1);
    expect(await total('kind=pre-exponential')).toBe(1);
  });

  it.each([['inside its range', 700, false], ['at its end', 800, false], ['outside it', 801, true], ['below it', 599, true]])('k %s, at %d K, says whether it is extrapolated', async (_where, temperatureK, extrapolated) => {
    const { accession } = await lives.accepted(entryInputOf({ locator: `p. ${temperatureK}` }));
    expect(okBody(await visitor.get(`/entries/${accession}?T=${temperatureK}`)).kAtT.extrapolated).toBe(extrapolated);
  });

  it.each<[string, ReturnType<typeof entryInputOf>, object]>([
    ['an upper bound is kept as one', withEnergy('< 30'), { bound: '<', value: 30, low: null, high: 30 }],
    ['a range is kept as one', withEnergy('80–95'), { bound: 'range', value: null, low: 80, high: 95 }],
    ['about is kept', withEnergy('≈ 75'), { bound: '≈', value: 75 }],
  ])('%s', async (_what, input, shown) => {
    const { accession } = await lives.accepted(input);
    expect(okBody(await visitor.get(`/entries/${accession}`)).quantities[0]).toMatchObject(shown);
  });
});

describe('withdrawing and revising', () => {
  it.each(['draft', 'submitted', 'under-review', 'returned'] as const)('a %s revision is withdrawn, twice with the same answer', async (state) => {
    const { accession } = await lives.inState(state);
    for (let time = 0; time < 2; time += 1) expect(okBody(await contributor.client.post(`/entries/${accession}/withdraw`))).toEqual({ accession, state: 'withdrawn' });
    const revised = okBody(await contributor.client.post(`/entries/${accession}/revise`, {}), 201);
    expect(revised).toMatchObject({ accession, revision: 2, state: 'draft', version: null, input: entryInputOf() });
  });

  it.each(['accepted', 'rejected', 'superseded', 'retracted'] as const)('one that is %s is not', async (state) => {
    const { accession } = await lives.inState(state);
    const answer = await contributor.client.post(`/entries/${accession}/withdraw`);
    expect(refusalOf(answer)).toEqual([409, 'state-conflict']);
  });

  it('a second revision is refused while one is on its way', async () => {
    const { accession } = await lives.accepted();
    okBody(await contributor.client.post(`/entries/${accession}/revise`, {}), 201);
    expect(refusalOf(await contributor.client.post(`/entries/${accession}/revise`, {}))).toEqual([409, 'revision-open']);
    expect(refusalOf(await (await app.person('contributor')).client.post(`/entries/${accession}/revise`, { reason: 'x' }))).toEqual([409, 'revision-open']);
  });

  it('two revisions at once: one is opened', async () => {
    const { accession } = await lives.accepted();
    const answers = await Promise.all([1, 2, 3].map(() => contributor.client.post(`/entries/${accession}/revise`, {})));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
    for (const answer of answers.filter(({ status }) => status === 409)) expect(['revision-open', 'conflict']).toContain(problemOf(answer).code);
  });

  it('readers go on seeing the accepted version while its revision is worked at', async () => {
    const { accession } = await lives.accepted();
    const revised = okBody(await contributor.client.post(`/entries/${accession}/revise`, { reason: 'A misprint.' }), 201);
    await contributor.client.patch(`/entries/${accession}`, { note: 'Not public yet' }, { 'If-Match': `"2.${String(revised.lock)}"` });
    for (const client of [visitor, contributor.client]) expect(okBody(await client.get(`/entries/${accession}`))).toMatchObject({ version: 1, note: null });
    expect(okBody(await contributor.client.get(`/entries/${accession}/draft`)).note).toBe('Not public yet');
  });
});

describe('versions and history', () => {
  it('every version stays readable as it was; search holds the last', async () => {
    const { accession } = await lives.accepted(withEnergy('90', { locator: 'p. 90', surface: { metal: 'Ir', facet: '111' } }));
    const revised = okBody(await contributor.client.post(`/entries/${accession}/revise`, { reason: 'Digit misread.' }), 201);
    await contributor.client.patch(`/entries/${accession}`, { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '99', unitAsPrinted: 'kJ/mol' }] }, { 'If-Match': `"2.${String(revised.lock)}"` });
    const { submission } = await lives.submit(accession);
    expect(await total('metal=Ir')).toBe(1);
    await accept(submission);
    const versions = okBody(await visitor.get(`/entries/${accession}/versions`)).items as { version: number; state: string }[];
    expect(versions.map(({ version, state }) => [version, state])).toEqual([[2, 'accepted'], [1, 'superseded']]);
    expect(okBody(await visitor.get(`/entries/${accession}`))).toMatchObject({ version: 2, quantities: [{ asPrinted: '99' }] });
    expect(okBody(await visitor.get(`/entries/${accession}/versions/1`))).toMatchObject({ version: 1, state: 'superseded', quantities: [{ asPrinted: '90' }] });
    expect(refusalOf(await visitor.get(`/entries/${accession}/versions/3`))).toEqual([404, 'not-found']);
    expect(refusalOf(await visitor.get(`/entries/${accession}/versions/0`))).toEqual([422, 'invalid-input']);
    const found = okBody(await visitor.get('/entries?metal=Ir'));
    expect(found).toMatchObject({ total: 1, items: [{ accession, version: 2 }] });
    const history = (okBody(await visitor.get(`/entries/${accession}`)).history as { what: string; by: string }[]).map(({ what, by }) => `${by}: ${what}`);
    expect(history).toEqual([
      'Ada Contributor: Submitted', 'Rosa Reviewer: Version 1 accepted', 'Ada Contributor: Submitted (revision 2)', 'Rosa Reviewer: Version 2 accepted',
    ].map((line) => expect.stringMatching(new RegExp(`^${line.replace(/[()]/g, '\\$&').replace(' \\(revision 2\\)', '( \\(revision 2\\))?')}$`)) as string));
  });

  it('its contributor reads more of it than a visitor', async () => {
    const { accession } = await lives.inState('returned');
    const lines = (okBody(await contributor.client.get(`/entries/${accession}`)).history as { what: string }[]).map(({ what }) => what);
    expect(lines).toEqual(['Draft begun', 'Submitted', 'Returned to the contributor: Held against the paper.']);
  });

  it('answers from its cache tag when nothing changed', async () => {
    const { accession } = await lives.accepted();
    const first = await visitor.get(`/entries/${accession}`);
    expect(first.headers['etag']).toMatch(/^W\/"/);
    expect((await visitor.get(`/entries/${accession}`, { 'If-None-Match': String(first.headers['etag']) })).status).toBe(304);
    await app.services.entries.retract(reviewer.actor, accession, 'Wrong sample.');
    expect((await visitor.get(`/entries/${accession}`, { 'If-None-Match': String(first.headers['etag']) })).status).toBe(200);
  });

  it('keeps answers to somebody who is signed in out of shared caches', async () => {
    const { accession } = await lives.accepted();
    expect((await contributor.client.get(`/entries/${accession}`)).headers['cache-control']).toContain('private');
  });

  it('my submissions page by page are all of them once', async () => {
    const { client } = contributor;
    const all = okBody(await client.get('/contributions?limit=200')).items as { accession: string; revision: number }[];
    const paged: { accession: string; revision: number }[] = [];
    for (let cursor = ''; ;) {
      const page = okBody(await client.get(`/contributions?limit=4${cursor && `&cursor=${cursor}`}`));
      paged.push(...(page.items as typeof paged));
      if (page.nextCursor === null) break;
      cursor = page.nextCursor as string;
    }
    expect(paged.map(({ accession, revision }) => `${accession} ${revision}`)).toEqual(all.map(({ accession, revision }) => `${accession} ${revision}`));
  });
});
