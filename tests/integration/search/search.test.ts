import { beforeAll, describe, expect, it } from 'vitest';
import { loadVocabulary } from '#seeds/run.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import { sortKeys, type FilterCounts } from '#shared/contracts/entry-search.ts';
import { kinds } from '#shared/domain/kinds.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, problemOf, refusalOf, type Body, type Client } from '#tests/factories/client.ts';
import { populate, populationRecords } from '#tests/factories/population.ts';
import { authorsByDoi, countsOf, energyOf, matching, namesOf, position, queryText, randomQuery, seeded, valuesOf, type Query } from './reference.ts';

const app = useApp({ doiRecords: populationRecords });
let visitor: Client;
let all: Entry[] = [];

const search = async (query: Query): Promise<Body> => okBody(await visitor.get(`/entries?${queryText(query)}`));

async function wholeSet(query: Query, limit = 7): Promise<Entry[]> {
  const items: Entry[] = [];
  for (let cursor: string | null = null, page = 0; page < 200; page += 1) {
    const answer: Body = await search({ ...query, limit: String(limit), ...(cursor === null ? {} : { cursor }) });
    items.push(...(answer.items as Entry[]));
    cursor = answer.nextCursor as string | null;
    if (cursor === null) return items;
  }
  throw new Error('The pages do not end.');
}

beforeAll(async () => {
  visitor = await app.visitor();
  await loadVocabulary(app.services);
  for (const { DOI, author } of await populationRecords()) authorsByDoi.set(String(DOI).toLowerCase(), (author as { family?: string }[]).flatMap(({ family }) => family ?? []));
  const { lives } = await populate(app);
  for (const state of ['draft', 'submitted', 'returned', 'rejected', 'withdrawn', 'retracted'] as const) await lives.inState(state);
  all = await wholeSet({}, 200);
}, 120_000);

const matches = (query: Query, except: readonly string[] = []) => matching(all, query, except);

describe('the population', () => {
  it('is varied enough to tell filters apart, and holds nothing that is not accepted', () => {
    expect(all.length).toBeGreaterThanOrEqual(55);
    expect(new Set(all.map(({ kind }) => kind)).size).toBeGreaterThanOrEqual(8);
    expect(new Set(all.map(({ surface }) => surface?.metal)).size).toBeGreaterThanOrEqual(6);
    expect(new Set(all.map(({ accession }) => accession)).size).toBe(all.length);
    expect(new Set(all.map(({ state }) => state))).toEqual(new Set(['accepted']));
  });
});

describe('filters', () => {
  it.each([...Object.keys(valuesOf), 'author', 'contributor'])('%s: each value finds what it means, and two values find either', async (name) => {
    const read = valuesOf[name] ?? (({ source, contributor }: Entry) => (name === 'author' ? authorsByDoi.get(source?.doi ?? '') ?? [] : [contributor]));
    const values = [...new Set(all.flatMap((entry) => [...read(entry)]))].filter((value): value is string => Boolean(value)).slice(0, 6);
    expect(values.length).toBeGreaterThan(0);
    const several = values.length > 1 && name !== 'hasUncertainty' ? [values.slice(0, 2)] : [];
    for (const value of [...values, ...several]) {
      const found = await search({ [name]: value, limit: '200' });
      expect(namesOf(found.items as Entry[]), `${name}=${String(value)}`).toEqual(namesOf(matches({ [name]: value })));
      expect(found.total).toBe((found.items as unknown[]).length);
    }
  });

  it('an elementary step is found by its key and by any spelling of its equation', async () => {
    const { key, equation } = all.find(({ step }) => step?.equation.includes('N2'))?.step ?? { key: '', equation: '' };
    const [left = '', right = ''] = equation.split('->').map((side) => side.trim());
    const wanted = namesOf(all.filter(({ step }) => step?.key === key));
    for (const spelling of [key, equation, `${right} -> ${left}`, equation.replace('->', '→'), equation.replaceAll(' ', '  ')]) {
      expect(namesOf((await search({ step: spelling, limit: '200' })).items as Entry[]), spelling).toEqual(wanted);
    }
  });

  it.each([2, 3, 5, 7, 11, 13, 17, 19, 23, 29, 31, 37, 41, 43, 47, 53, 59, 61, 67, 71, 73, 79, 83, 89, 97, 101, 103, 107, 109, 113])('thirty at random (seed %d): items, total and every count agree with the slow reference', async (seed) => {
    const query = randomQuery(all, seeded(seed));
    const found = await search({ ...query, counts: 'true', limit: '200' });
    const wanted = matches(query);
    expect(namesOf(found.items as Entry[]), queryText(query)).toEqual(namesOf(wanted));
    expect([found.total, found.totalIsExact, found.all]).toEqual([wanted.length, true, all.length]);
    const counts = Object.fromEntries(Object.entries(found.counts as FilterCounts).map(([name, list]) => [name, Object.fromEntries(list.map(({ value, count }) => [value, count]))]));
    expect(counts, queryText(query)).toEqual(countsOf(all, query));
  });
});

describe('values and ranges', () => {
  it.each(kinds)('a range of %s filters by the canonical value', async (kind) => {
    const held = all.map((entry) => position(entry, kind)).filter((value): value is number => value !== null).sort((a, b) => a - b);
    const middle = held[Math.floor(held.length / 2)] ?? 1;
    const queries: Query[] = [{ kind, valueMin: String(middle) }, { kind, valueMax: String(middle) }, { kind, valueMin: String(middle), valueMax: String(middle) }];
    for (const query of queries) {
      const found = (await search({ ...query, limit: '200' })).items as Entry[];
      expect(namesOf(found)).toEqual(namesOf(matches(query).filter((entry) => position(entry, kind) !== null)));
    }
  });

  it.each<[string, Query, string]>([
    ['no kind', { valueMin: '1' }, 'kind'], ['two kinds', { valueMin: '1', kind: ['barrier', 'kie'] }, 'kind'], ['an end below its beginning', { kind: 'kie', valueMin: '2', valueMax: '1' }, 'valueMax'],
    ['words', { kind: 'kie', valueMin: 'low' }, 'valueMin'], ['infinity', { kind: 'kie', valueMin: 'Infinity' }, 'valueMin'],
  ])('with %s is refused, naming %s', async (_what, query, path) => {
    const answer = await visitor.get(`/entries?${queryText(query)}`);
    expect(refusalOf(answer)).toEqual([422, 'invalid-input']);
    expect(problemOf(answer).errors?.map((error) => error.path)).toEqual([path]);
  });

  it('an empty value is no filter', async () => {
    expect((await search({ valueMin: '', validAt: '', metal: '', T: '' })).total).toBe(all.length);
  });

  it.each([300, 700, 1500])('valid at %d K: computed values without a range match, measured ones do not and are counted', async (temperature) => {
    const found = await search({ validAt: String(temperature), limit: '200' });
    expect(namesOf(found.items as Entry[])).toEqual(namesOf(matches({ validAt: String(temperature) })));
    const lost = all.filter(({ validRange, method }) => validRange === null && method.class === 'measured');
    expect(lost.length).toBeGreaterThan(0);
    expect(found.withoutStatedRange).toBe(lost.length);
    expect((await search({})).withoutStatedRange).toBeNull();
  });

  it('a filter that finds nothing says which condition emptied it', async () => {
    const metal = all.find(({ surface }) => surface?.metal)?.surface?.metal ?? '';
    const query = { metal, yearFrom: '2200' };
    const found = await search(query);
    expect(found).toMatchObject({ total: 0, items: [], nextCursor: null });
    expect(found.emptiedBy).toEqual([{ filter: 'yearFrom', totalWithout: matches({ metal }).length }]);
    expect((await search({ metal })).emptiedBy).toBeNull();
    const two = await search({ metal: 'Xx', yearFrom: '2200' });
    expect(two.emptiedBy).toEqual([]);
  });
});

describe('pages', () => {
  const withT = (sort: string): Query => (sort.endsWith('k') ? { sort, T: '700' } : { sort });

  it.each(sortKeys)('by %s are together the whole set, once each, in one order', async (sort) => {
    const whole = (await search({ ...withT(sort), limit: '200' })).items as Entry[];
    const paged = await wholeSet(withT(sort), 9);
    expect(paged.map(({ accession }) => accession)).toEqual(whole.map(({ accession }) => accession));
    expect(namesOf(paged)).toEqual(namesOf(all));
  });

  const energyAt = (entry: Entry): number | null => {
    const energy = energyOf(entry);
    return energy ? energy.value ?? (energy.low !== null && energy.high !== null ? (energy.low + energy.high) / 2 : energy.low ?? energy.high) : null;
  };
  it.each<[string, (entry: Entry) => number | null]>([
    ['energy', energyAt], ['year', ({ source }) => source?.year ?? null], ['validFrom', ({ validRange }) => validRange?.min ?? null], ['validTo', ({ validRange }) => validRange?.max ?? null],
    ['accepted', ({ acceptedAt }) => (acceptedAt ? Date.parse(acceptedAt) : null)], ['uncertainty', ({ quantities }) => quantities.find(({ symbol }) => symbol === 'energy')?.standardUncertainty ?? null],
  ])('by %s rise or fall, and what has none comes last either way', async (name, read) => {
    for (const sort of [name, `-${name}`]) {
      const values = ((await search({ sort, limit: '200' })).items as Entry[]).map(read);
      const known = values.filter((value): value is number => value !== null);
      expect(values.slice(known.length).every((value) => value === null), sort).toBe(true);
      expect(known, sort).toEqual([...known].sort((a, b) => (sort === name ? a - b : b - a)));
    }
  });

  it.each<[string, (entry: Entry) => string | null]>([
    ['step', ({ step }) => step?.key ?? null], ['metal', ({ surface }) => surface?.formula ?? null], ['surface', ({ surface }) => surface?.label ?? null], ['source', ({ source }) => source?.label ?? null],
    ['method', ({ method }) => method.technique ?? method.class], ['scope', ({ scope }) => scope], ['provenance', ({ provenance }) => provenance], ['energyType', (entry) => energyOf(entry)?.energyType ?? null], ['accession', ({ accession }) => accession],
  ])('by %s follow the codes of their letters either way, and what has none comes last', async (name, read) => {
    for (const sort of [name, `-${name}`]) {
      const values = ((await search({ sort, limit: '200' })).items as Entry[]).map(read);
      const known = values.filter((value): value is string => value !== null);
      expect(values.slice(known.length).every((value) => value === null), sort).toBe(true);
      expect(known, sort).toEqual([...known].sort((a, b) => Buffer.compare(Buffer.from(a), Buffer.from(b)) * (sort === name ? 1 : -1)));
    }
  });

  it.each(['preExponential', '-preExponential'])('by %s are in order within one unit', async (sort) => {
    const factors = ((await search({ sort, limit: '200' })).items as Entry[]).map(({ quantities }) => quantities.find(({ symbol }) => symbol === 'preExponential') ?? null);
    const known = factors.flatMap((factor) => (factor ? [{ unit: factor.siteUnit ?? factor.unit, value: factor.siteValue ?? factor.value ?? factor.low ?? factor.high ?? 0 }] : []));
    expect(known.length).toBeGreaterThan(8);
    expect(factors.slice(known.length).every((factor) => factor === null)).toBe(true);
    expect(known.map(({ unit }) => unit)).toEqual(known.map(({ unit }) => unit).sort());
    for (const unit of new Set(known.map((one) => one.unit))) {
      const values = known.filter((one) => one.unit === unit).map(({ value }) => value);
      expect(values).toEqual([...values].sort((a, b) => (sort === 'preExponential' ? a - b : b - a)));
    }
  });

  it.each(['k', '-k'])('by %s, within one unit, follow the k that is shown', async (sort) => {
    const items = (await search({ sort, T: '650', limit: '200' })).items as Entry[];
    const shown = items.flatMap(({ kAtT }) => (kAtT ? [kAtT] : []));
    expect(shown.length).toBeGreaterThan(8);
    const units = shown.map(({ unit }) => unit);
    expect(units).toEqual([...units].sort());
    for (const unit of new Set(units)) {
      const values = shown.filter((k) => k.unit === unit).map(({ value }) => value);
      expect(values).toEqual([...values].sort((a, b) => (sort === 'k' ? a - b : b - a)));
    }
    expect(shown.every(({ temperatureK }) => temperatureK === 650)).toBe(true);
  });

  it('by k need a temperature', async () => {
    expect(problemOf(await visitor.get('/entries?sort=k')).errors).toEqual([{ path: 'T', message: expect.any(String) as string }]);
  });

  it('are not entered with the marker of another search', async () => {
    const { nextCursor } = await search({ limit: '5' }) as { nextCursor: string };
    expect((await visitor.get(`/entries?limit=9&cursor=${nextCursor}`)).status).toBe(200);
    for (const other of ['sort=energy', 'metal=Ru', 'T=500', 'q=ammonia', 'validAt=700']) expect(refusalOf(await visitor.get(`/entries?${other}&cursor=${nextCursor}`)), other).toEqual([400, 'cursor-invalid']);
  });

  it.each<[string, (parts: unknown[]) => unknown]>([
    ['another position', (parts) => [parts[0], 'zzz', ...parts.slice(2)]], ['a number for text', (parts) => [parts[0], 1, ...parts.slice(2)]], ['text for a number', (parts) => [parts[0], parts[1], 'text', ...parts.slice(3)]],
    ['an object', (parts) => [parts[0], {}, ...parts.slice(2)]], ['too few parts', (parts) => parts.slice(0, 2)], ['too many', (parts) => [...parts, 1]], ['no list', () => 'x'], ['nothing', () => null],
    ['a control character', (parts) => [parts[0], '\u0000', ...parts.slice(2)]],
  ])('are not entered with a marker tampered with: %s', async (_what, change) => {
    const { nextCursor } = await search({ limit: '5' }) as { nextCursor: string };
    const tampered = Buffer.from(JSON.stringify(change(JSON.parse(Buffer.from(nextCursor, 'base64url').toString()) as unknown[]))).toString('base64url');
    expect(refusalOf(await visitor.get(`/entries?cursor=${tampered}`))).toEqual([400, 'cursor-invalid']);
  });

  it.each(['%00', 'null', 'W10', '..%2F..', 'x'.repeat(2000), "' or 1=1 --"])('nor with %s', async (cursor) => {
    expect(refusalOf(await visitor.get(`/entries?cursor=${encodeURIComponent(cursor)}`))).toEqual([400, 'cursor-invalid']);
  });

  it.each(['0', '201', '-1', '1.5', 'many'])('hold from 1 to 200: %s is refused', async (limit) => {
    expect(refusalOf(await visitor.get(`/entries?limit=${limit}`))).toEqual([422, 'invalid-input']);
  });
});

describe('the summary', () => {
  it.each<[string, Query]>([['of everything', {}], ['of one metal', { metal: 'Ru' }], ['of nothing', { yearFrom: '2200' }]])('%s is what the items say', async (_what, query) => {
    const wanted = matches(query);
    const summary = okBody(await visitor.get(`/entries/summary?${queryText(query)}`));
    expect(summary).toMatchObject({
      sources: new Set(wanted.map(({ source }) => source?.id)).size, measured: wanted.filter(({ method }) => method.class === 'measured').length, computed: wanted.filter(({ method }) => method.class === 'computed').length,
    });
    const exact = wanted.map(({ quantities }) => quantities.find(({ symbol }) => symbol === 'energy')).flatMap((energy) => (energy && energy.bound === '=' && energy.value !== null ? [energy.value] : [])).sort((a, b) => a - b);
    if (exact.length === 0) expect(summary.energy).toBeNull();
    else {
      const median = exact.length % 2 ? exact[(exact.length - 1) / 2] : ((exact[exact.length / 2 - 1] ?? 0) + (exact[exact.length / 2] ?? 0)) / 2;
      expect(summary.energy).toEqual({ count: exact.length, median: expect.closeTo(median ?? 0, 9) as number, low: exact[0], high: exact.at(-1) });
    }
  });
});
