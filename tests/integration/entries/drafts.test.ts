import { beforeAll, describe, expect, it } from 'vitest';
import { readAccession } from '#shared/domain/accession.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';

const app = useApp();
let person: Person;
beforeAll(async () => {
  person = await app.person('contributor', 'Ida Example');
});

async function create(body: object = {}): Promise<{ entry: Body; tag: string }> {
  const answer = await person.client.post('/entries', body);
  return { entry: okBody(answer, 201), tag: String(answer.headers['etag']) };
}
const patch = (accession: string, body: unknown, tag?: string) => person.client.patch(`/entries/${accession}`, body, tag ? { 'If-Match': tag } : {});
const faultsOf = (entry: Body): string[] => (entry.faults as { path: string; code?: string }[]).map(({ path, code }) => (code ? `${path} ${code}` : path));

describe('a draft', () => {
  it('may be empty, gets its permanent name at once, and says what is still missing', async () => {
    const answer = await person.client.post('/entries', {});
    const entry = okBody(answer, 201);
    expect(readAccession(entry.accession as string)).toBe(entry.accession);
    expect(answer.headers['location']).toBe(`/api/v1/entries/${entry.accession as string}`);
    expect(answer.headers['etag']).toBe('"1.1"');
    expect(entry).toMatchObject({ version: null, revision: 1, state: 'draft', kind: null, step: null, surface: null, source: null, quantities: [], input: {}, lock: 1, contributor: 'Ida Example' });
    expect(faultsOf(entry).sort()).toEqual(['kind', 'locator', 'method.class', 'provenance', 'quantities', 'scope', 'source', 'step.equation', 'surface.metal surface']);
  });

  it('keeps what was typed to the letter', async () => {
    const quantities = [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: ' 44.50 ± 1.40 ', unitAsPrinted: 'kcal/mol' }];
    const { entry } = await create({ quantities, note: 'tab\tand “quotes”, Ø, 氨, \u{1F9EA}' });
    expect(entry.input).toEqual({ quantities, note: 'tab\tand “quotes”, Ø, 氨, \u{1F9EA}' });
    expect(okBody(await person.client.get(`/entries/${entry.accession as string}/draft`)).input).toEqual(entry.input);
  });

  it.each<[string, object, string[]]>([
    ['an unknown kind', { kind: 'enthalpy-of-mixing' }, ['kind']],
    ['a number for the locator', { locator: 7 }, ['locator']],
    ['a symbol out of the list', { quantities: [{ symbol: 'pKa', asPrinted: '1', unitAsPrinted: '' }] }, ['quantities.0.symbol']],
    ['a quantity without its print', { quantities: [{ symbol: 'energy', unitAsPrinted: 'eV' }] }, ['quantities.0.asPrinted']],
    ['thirteen quantities', { quantities: Array.from({ length: 13 }, () => ({ symbol: 'energy', asPrinted: '1', unitAsPrinted: 'eV' })) }, ['quantities']],
    ['a negative site density', { conditions: { siteDensityPerM2: -1 } }, ['conditions.siteDensityPerM2']],
    ['a correlation above one', { correlation: 1.5 }, ['correlation']],
    ['two faults at once', { kind: 'x', scope: 'y' }, ['kind', 'scope']],
    ['an equation of a kilobyte', { step: { equation: 'N'.repeat(1000) } }, ['step.equation']],
    ['a list instead of an object', { surface: [] }, ['surface']],
  ])('is refused with %s, naming the place', async (_what, body, paths) => {
    const answer = await person.client.post('/entries', body);
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(problemOf(answer).errors?.map(({ path }) => path).sort()).toEqual(paths);
  });

  it('takes no converted values from outside', async () => {
    const { entry } = await create({ ...entryInputOf(), quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '1', unitAsPrinted: 'eV', value: 5, standardUncertainty: 0 }] });
    expect(entry.quantities[0].value).toBeCloseTo(96.48533212331, 9);
    expect(entry.quantities[0].standardUncertainty).toBeNull();
  });

  it.each<[string, object, string, RegExp]>([
    ['an unbalanced elementary step', { step: { equation: 'NH3* -> NH2* + H*' } }, 'step.equation unbalanced', /site/i],
    ['an equation that cannot be read', { step: { equation: 'N2 + -> ?' } }, 'step.equation', /./],
    ['a unit that does not fit', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5', unitAsPrinted: 's-1' }] }, 'quantities.0.unitAsPrinted', /s-1|unit/i],
    ['letters for a value', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: 'abc', unitAsPrinted: 'eV' }] }, 'quantities.0.asPrinted', /abc|number|value/i],
    ['no value', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '  ', unitAsPrinted: 'eV' }] }, 'quantities.0.asPrinted', /printed|prints/i],
    ['no unit', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '1', unitAsPrinted: '' }] }, 'quantities.0.unitAsPrinted', /unit/i],
    ['a facet that does not exist', { surface: { metal: 'Ni', facet: '0001' } }, 'surface.facet facet-impossible', /three indices/],
    ['a metal nobody knows', { surface: { metal: 'Zz' } }, 'surface.metal', /Zz/],
    ['an activation energy called electronic', { quantities: [{ symbol: 'energy', energyType: 'electronic', asPrinted: '1', unitAsPrinted: 'eV' }] }, 'quantities.0.energyType', /Arrhenius/],
    ['the same quantity twice', { quantities: [1, 2].map((n) => ({ symbol: 'energy', energyType: 'arrhenius', asPrinted: String(n), unitAsPrinted: 'eV' })) }, 'quantities.1.symbol', /twice/],
    ['a DOI that is none', { source: { doi: 'see reference 7' } }, 'source.doi doi-unreadable', /10\./],
    ['a DOI that is not registered', { source: { doi: '10.5555/nobody.knows' } }, 'source.doi doi-not-found', /not registered/],
    ['a citation without a title', { source: { csl: { author: [{ family: 'A' }] } } }, 'source.csl.title citation-incomplete', /title/],
    ['BibTeX that is none', { source: { bibtex: 'hello' } }, 'source.bibtex citation-unreadable', /./],
    ['a source out of the air', { source: { id: '00000000-0000-4000-8000-000000000000' } }, 'source.id source-unknown', /not in the store/],
  ])('is saved with %s, and the fault says where and what', async (_what, changes, fault, words) => {
    const { entry } = await create(entryInputOf(changes));
    const found = (entry.faults as { path: string; code?: string; message: string }[]).filter(({ path, code }) => `${path} ${code ?? ''}`.startsWith(fault));
    expect(found, JSON.stringify(entry.faults)).toHaveLength(1);
    expect(found[0]?.message).toMatch(words);
    expect(entry.input).toMatchObject(changes);
    const refused = await person.client.post(`/entries/${entry.accession as string}/submit`);
    expect(refusalOf(refused)).toEqual([422, 'not-ready-to-submit']);
    expect(problemOf(refused).errors?.map(({ path }) => path)).toContain(found[0]?.path);
  });

  it('suggests the equation when only free sites are missing', async () => {
    const { entry } = await create(entryInputOf({ step: { equation: 'NH3* -> NH2* + H*' } }));
    const [fault] = entry.faults as { suggestion?: string }[];
    expect(fault?.suggestion).toBe('NH3* + * -> NH2* + H*');
    const mended = await patch(entry.accession as string, { step: { equation: fault?.suggestion } }, '"1.1"');
    expect(okBody(mended).faults).toEqual([]);
  });

  it('makes each name once: a hundred drafts at once, a hundred names', async () => {
    const made = await Promise.all(Array.from({ length: 100 }, () => app.services.entries.create(person.actor, {})));
    expect(new Set(made.map(({ accession }) => accession)).size).toBe(100);
  });
});

describe('changing a draft', () => {
  it.each<[string, object, object]>([
    ['a member is replaced', { locator: 'p. 9' }, { locator: 'p. 9' }],
    ['null takes a member away', { locator: null }, { locator: undefined }],
    ['objects are merged', { surface: { facet: '10-10' } }, { surface: { metal: 'Ru', facet: '10-10', site: 'terrace', sampleType: 'single-crystal' } }],
    ['null takes an inner member away', { surface: { site: null } }, { surface: { metal: 'Ru', facet: '0001', sampleType: 'single-crystal' } }],
    ['lists are replaced whole', { quantities: [{ symbol: 'kie', asPrinted: '1.4', unitAsPrinted: '' }] }, { quantities: [{ symbol: 'kie', asPrinted: '1.4', unitAsPrinted: '' }] }],
    ['an empty patch changes nothing', {}, {}],
    ['a prototype is no member', JSON.parse('{"__proto__": {"note": "x"}, "constructor": null}') as object, {}],
  ])('by JSON Merge Patch: %s', async (_what, change, result) => {
    const { entry, tag } = await create(entryInputOf());
    const answer = await patch(entry.accession as string, change, tag);
    expect(okBody(answer).input).toEqual(JSON.parse(JSON.stringify({ ...entryInputOf(), ...result })));
    expect(answer.headers['etag']).toBe('"1.2"');
  });

  it('needs the tag of what was seen', async () => {
    const { entry } = await create();
    expect(refusalOf(await patch(entry.accession as string, { note: 'x' }))).toEqual([428, 'precondition-required']);
  });

  it.each(['W/"1.1"', '1.1', '*', '"1.1", "1.2"', '""'])('refuses %s as a tag', async (tag) => {
    const { entry } = await create();
    expect(refusalOf(await patch(entry.accession as string, { note: 'x' }, tag))).toEqual([400, 'bad-request']);
  });

  it('in two tabs: the second is told, shown the current draft, and nothing of the first is lost', async () => {
    const { entry, tag } = await create({ note: 'as opened' });
    const accession = entry.accession as string;
    okBody(await patch(accession, { note: 'first tab' }, tag));
    const second = await patch(accession, { note: 'second tab' }, tag);
    expect(refusalOf(second)).toEqual([412, 'stale-version']);
    expect(problemOf(second).context).toMatchObject({ current: { tag: '1.2', input: { note: 'first tab' } } });
    expect(okBody(await person.client.get(`/entries/${accession}/draft`)).input).toEqual({ note: 'first tab' });
    okBody(await patch(accession, { note: 'second tab, after looking' }, '"1.2"'));
  });

  it('at the same instant: one is saved, the others are told', async () => {
    const { entry, tag } = await create();
    const answers = await Promise.all(Array.from({ length: 8 }, (_, n) => patch(entry.accession as string, { note: `tab ${n}` }, tag)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 412, 412, 412, 412, 412, 412, 412]);
  });

  it.each<[string, unknown, string]>([
    ['an unknown kind', { kind: 'x' }, 'kind'], ['text for a list', { quantities: 'none' }, 'quantities'], ['a deep fault', { conditions: { temperatureK: 'hot' } }, 'conditions.temperatureK'],
  ])('is refused with %s and leaves the draft as it was', async (_what, change, path) => {
    const { entry, tag } = await create(entryInputOf());
    const answer = await patch(entry.accession as string, change, tag);
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(problemOf(answer).errors?.map((error) => error.path)).toEqual([path]);
    const after = await person.client.get(`/entries/${entry.accession as string}/draft`);
    expect(after.headers['etag']).toBe(tag);
  });

  it.each(['[]', '"text"', '7', 'null'])('%s is no patch', async (body) => {
    const { entry, tag } = await create();
    const answer = await person.client.agent.patch(`/api/v1/entries/${entry.accession as string}`).set({ 'X-CSRF-Token': person.client.token, 'If-Match': tag, 'Content-Type': 'application/merge-patch+json' }).send(body);
    expect([400, 422]).toContain(problemOf(answer).status);
  });

  it('is over once submitted', async () => {
    const { entry } = await create(entryInputOf({ locator: 'p. 3' }));
    const submitted = okBody(await person.client.post(`/entries/${entry.accession as string}/submit`));
    expect(submitted).toMatchObject({ state: 'submitted', faults: [] });
    const answer = await patch(entry.accession as string, { note: 'too late' }, `"1.${String(submitted.lock)}"`);
    expect(refusalOf(answer)).toEqual([409, 'state-conflict']);
    expect(problemOf(answer).context).toEqual({ state: 'submitted' });
  });

  it('submitting with the tag of an earlier look is refused', async () => {
    const { entry, tag } = await create(entryInputOf({ locator: 'p. 4' }));
    await patch(entry.accession as string, { locator: 'p. 5' }, tag);
    expect(refusalOf(await person.client.post(`/entries/${entry.accession as string}/submit`, undefined, { 'If-Match': tag }))).toEqual([412, 'stale-version']);
  });

  it('submitting twice at once hands it in once', async () => {
    const { entry } = await create(entryInputOf({ locator: 'p. 6' }));
    const accession = entry.accession as string;
    const answers = await Promise.all([1, 2, 3, 4].map(() => person.client.post(`/entries/${accession}/submit`)));
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1);
    for (const answer of answers.filter(({ status }) => status !== 200)) expect([409, 412]).toContain(problemOf(answer).status);
    expect(await app.sql('select count(*)::int as n from submissions s join entries e on e.id = s.entry_id where e.accession = $1', [accession])).toEqual([{ n: 1 }]);
    expect(await app.sql('select count(*)::int as n from quantities q join revisions r on r.id = q.revision_id join entries e on e.id = r.entry_id where e.accession = $1', [accession])).toEqual([{ n: 2 }]);
  });
});
