import { beforeAll, describe, expect, it } from 'vitest';
import { loadVocabulary } from '#seeds/run.ts';
import type { FoundEntry, GroupHead, NearMiss, SearchNote } from '#shared/contracts/entry-search.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, type Body, type Client } from '#tests/factories/client.ts';
import { entryInputOf, withEnergy } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let visitor: Client;
const accessions: string[] = [];

const recombination = { equation: 'N* + N* -> N2 + 2*' };
const inputs: EntryInput[] = [
  withEnergy('180', { step: recombination, surface: { metal: 'Ru', facet: '0001', site: 'terrace', sampleType: 'single-crystal' }, note: 'A careful study of caesium.', conditions: { promoter: 'Cs' } }),
  withEnergy('140', { step: recombination, surface: { metal: 'Ru', facet: '0001', site: 'step-edge' }, source: { doi: '10.5555/test.2' } }),
  withEnergy('36', { step: { equation: 'N2 + 2* -> 2N*' }, surface: { metal: 'Fe', facet: '110' }, source: { doi: '10.5555/test.4' }, kind: 'barrier', provenance: 'computed', method: { class: 'computed', technique: 'DFT-PBE' }, quantities: [{ symbol: 'energy', energyType: 'electronic', asPrinted: '0.4', unitAsPrinted: 'eV' }], validRange: undefined }),
  withEnergy('75', { step: { equation: 'H* + H* -> H2 + 2*' }, surface: { metal: 'Ni', facet: '111' }, source: { doi: '10.5555/test.3' } }),
  withEnergy('95', { step: { equation: 'NH3* + * -> NH2* + H*' }, surface: { formula: 'Ni3Fe' }, source: { doi: '10.5555/test.5' }, method: { class: 'measured', technique: 'molecular beam' } }),
  entryInputOf({ surface: { metal: 'Ni', support: 'MgO', sampleType: 'supported-particles' }, source: { doi: '10.5555/test.6' } }),
];

beforeAll(async () => {
  visitor = await app.visitor();
  await loadVocabulary(app.services);
  const lives = new Lives(app.services, (await app.person('contributor', 'Émile Überall')).actor, (await app.person('reviewer')).actor);
  for (const input of inputs) accessions.push((await lives.accepted(input)).accession);
});

const ask = async (query: Record<string, string> | string): Promise<Body> => okBody(await visitor.get(`/entries?${typeof query === 'string' ? query : new URLSearchParams(query).toString()}`));
const found = (answer: Body): number[] => (answer.items as FoundEntry[]).map(({ accession }) => accessions.indexOf(accession)).sort();
const notes = (answer: Body): SearchNote[] => answer.notes as SearchNote[];

describe('an elementary step asked for', () => {
  it.each<[string, string, number[]]>([
    ['by its key', '2N* <=> N2 + 2*', [0, 1, 2]], ['by an equation', '2N* = N2 + 2*', [0, 1, 2]], ['by an equation the other way', 'N2(g) + 2* -> 2 N(ads)', [0, 1, 2]],
    ['by words of the trade', 'nitrogen recombination', [0, 1]], ['by the class', 'associative desorption', [0, 1, 3]], ['by class and formula', 'associative desorption of N2', [0, 1]],
    ['by a synonym with its own hyphen', 'second-order desorption of hydrogen', [3]], ['by a species', 'NH3', [4, 5]], ['by an adsorbed species', 'NH2*', [4]], ['by a species under its name', 'ammonia', [4, 5]],
    ['by several species', 'H2 + H*', [3]], ['by deuterium, which is hydrogen', 'D2', [3]], ['by words in capitals', 'RECOMBINATION OF NITROGEN', [0, 1]],
  ])('%s: %s', async (_how, step, wanted) => {
    expect(found(await ask({ step }))).toEqual(wanted);
  });

  it.each<[string, string, RegExp]>([
    ['in words that name nothing', 'blargh', /could not be read.*no arrow.*“blargh”/], ['by an equation that does not balance', 'N2 + * -> 3N*', /could not be read/], ['by half an equation', 'N2 ->', /could not be read/],
    ['by punctuation', '?!', /could not be read/], ['by an arrow alone', '->', /could not be read/], ['from right to left', 'مرحبا', /could not be read/], ['by a pattern', '.*', /could not be read/],
  ])('%s finds nothing and says why: %s', async (_how, step, message) => {
    const answer = await ask({ step });
    expect(answer).toMatchObject({ total: 0, items: [] });
    expect(notes(answer)).toEqual([{ filter: 'step', value: step, found: false, message: expect.stringMatching(message) as string }]);
    expect(answer.emptiedBy).toEqual([{ filter: 'step', totalWithout: inputs.length }]);
  });

  it('without its free sites is balanced, and that is said', async () => {
    const answer = await ask({ step: 'N2 -> N* + N*' });
    expect(found(answer)).toEqual([0, 1, 2]);
    expect(notes(answer)).toMatchObject([{ filter: 'step', found: true, message: expect.stringContaining('free sites') as string }]);
  });

  it('beside an unreadable one finds what the other finds', async () => {
    const answer = await ask('step=blargh&step=2N* = N2 %2B 2*');
    expect(found(answer)).toEqual([0, 1, 2]);
    expect(notes(answer)).toMatchObject([{ value: 'blargh', found: false }]);
  });
});

describe('filters by names', () => {
  it.each<[string, Record<string, string>, number[]]>([
    ['a metal by its name', { metal: 'ruthenium' }, [0, 1]], ['a metal in small letters', { metal: 'ni' }, [3, 5]], ['a metal contained', { contains: 'iron' }, [2, 4]], ['an alloy', { formula: 'Ni3Fe' }, [4]],
    ['a facet in brackets', { facet: '(0001)' }, [0, 1]], ['a support by its name', { support: 'magnesia' }, [5]], ['a promoter by its name', { promoter: 'caesium' }, [0]], ['a promoter in small letters', { promoter: 'cs' }, [0]],
    ['clean surfaces', { promoter: 'none' }, [1, 2, 3, 4, 5]], ['promoted ones', { promoter: 'any' }, [0]], ['a technique by its name', { method: 'temperature-programmed desorption' }, [0, 1, 3, 5]], ['a technique by a synonym', { method: 'TDS' }, [0, 1, 3, 5]],
    ['a family of techniques', { methodFamily: 'DFT' }, [2]], ['another family', { methodFamily: 'Beam and uptake' }, [4]], ['a class of step by a synonym', { stepClass: 'recombination' }, [0, 1, 3]], ['a bond the other way round', { bond: 'H-N' }, [4]],
    ['a species by its name', { species: 'ammonia' }, [4, 5]], ['a species, adsorbed', { species: 'NH3*' }, [4, 5]], ['an author without accents', { author: 'EKSTROM-OHLIN' }, [4]], ['the contributor without accents', { contributor: 'emile uberall' }, [0, 1, 2, 3, 4, 5]],
    ['a source by the address of its DOI', { source: 'https://doi.org/10.5555/TEST.3' }, [3]], ['an uncertainty that is known', { hasUncertainty: 'true' }, [5]], ['one that is not', { hasUncertainty: 'false' }, [0, 1, 2, 3, 4]],
    ['a range of temperatures', { validFrom: '600', validTo: '800' }, [0, 1, 2, 3, 4, 5]], ['a range too wide', { validFrom: '600', validTo: '801' }, [2]], ['zero-width marks, which are not seen', { metal: 'R\u200bu' }, [0, 1]],
  ])('%s', async (_what, query, wanted) => {
    expect(found(await ask(query))).toEqual(wanted);
  });

  it.each<[string, Record<string, string>, string, RegExp]>([
    ['a metal that is none', { metal: 'Xx' }, 'metal', /no metal/], ['a number for a metal', { metal: '12' }, 'metal', /no metal/], ['a word for a facet', { facet: 'flat' }, 'facet', /not a facet/],
    ['a facet that the metal cannot have', { metal: 'Ru', facet: '111' }, 'facet', /Ru is hcp/], ['a four-index facet of a cubic metal', { metal: 'Ni', facet: '0001' }, 'facet', /Ni is fcc/], ['a species that is none', { species: '???' }, 'species', /neither a formula/],
    ['a family that is none', { methodFamily: 'magic' }, 'methodFamily', /no family/], ['a formula that is none', { formula: 'nickel iron' }, 'formula', /not a formula|formula/], ['a class that is none', { stepClass: 'explosion' }, 'stepClass', /no class/],
  ])('%s finds nothing and says why', async (_what, query, filter, message) => {
    const answer = await ask(query);
    expect(answer.total).toBe(0);
    expect(notes(answer)).toContainEqual(expect.objectContaining({ filter, found: false, message: expect.stringMatching(message) as string }));
  });

  it.each<[string, string, string]>([
    ['a range of temperatures that ends below its beginning', 'validFrom=800&validTo=600', 'validTo'], ['a word for a temperature', 'validFrom=warm', 'validFrom'], ['perhaps for an uncertainty', 'hasUncertainty=perhaps', 'hasUncertainty'],
    ['an unknown cleavage', 'cleavage=violent', 'cleavage.0'], ['an unknown grouping', 'groupBy=colour', 'groupBy'], ['a species of 201 letters', `species=${'N'.repeat(201)}`, 'species.0'], ['nothing but zero-width marks', 'metal=%E2%80%8B', 'metal.0'],
  ])('%s is refused', async (_what, query, path) => {
    const answer = await visitor.get(`/entries?${query}`);
    expect([answer.status, (answer.body as { errors: { path: string }[] }).errors[0]?.path]).toEqual([422, path]);
  });
});

describe('near spellings', () => {
  it.each<[string, string, number[]]>([
    ['ruthenuim', 'ruthenium', [0, 1]], ['recombnation', 'recombination', [0, 1, 3]], ['nitrogen recombinaton', 'nitrogen recombination', [0, 1]], ['amonia', 'ammonia', [0, 4, 5]],
  ])('%s is looked for as %s', async (typed, corrected, wanted) => {
    const answer = await ask({ q: typed });
    expect(answer.showingResultsFor).toBe(corrected);
    for (const index of wanted.filter((one) => typed !== 'amonia' || one > 0)) expect(found(answer)).toContain(index);
    expect(okBody(await visitor.get(`/entries/summary?q=${encodeURIComponent(typed)}`)).points).toHaveLength((answer.total as number));
    const csv = (await visitor.get(`/entries/export?format=csv&q=${encodeURIComponent(typed)}`)).text;
    for (const { accession } of answer.items as FoundEntry[]) expect(csv).toContain(accession);
  });

  it.each(['ruthenium', 'ruthen', 'thenium', 'ruthenium nickel', 'zzzzzzzzz', 'xq', '12345', 'N2', ''])('“%s” stays as typed', async (q) => {
    expect((await ask({ q })).showingResultsFor).toBeNull();
  });
});

describe('where words stand', () => {
  const marked = (answer: Body, index: number): Record<string, string[]> => {
    const item = (answer.items as FoundEntry[]).find(({ accession }) => accession === accessions[index]);
    return Object.fromEntries((item?.matches ?? []).map(({ field, text, ranges }) => [field, ranges.map(([from, to]) => text.slice(from, to))]));
  };
  it.each<[string, number, Record<string, string[]>]>([
    ['thermal', 0, { title: ['Thermal'], method: ['thermal'] }], ['careful caes', 0, { note: ['careful', 'caes'] }], ['ekstrom', 4, { authors: ['Ekström'] }], ['recombination', 1, { stepClass: ['recombination'] }],
    ['ruthenuim', 1, { metal: ['ruthenium'] }], ['n2', 3, {}], ['n2', 0, { step: ['N2'] }], ['magnesia', 5, { support: ['magnesia'] }],
  ])('%s in entry %d', async (q, index, wanted) => {
    expect(marked(await ask({ q }), index)).toEqual(expect.objectContaining(wanted));
  });

  it('is not asked, and not told, without words', async () => {
    expect(((await ask({})).items as FoundEntry[]).every((item) => !('matches' in item))).toBe(true);
  });
});

describe('what lies near', () => {
  it.each<[string, Record<string, string>, NearMiss[]]>([
    ['another facet of the metal', { metal: 'Ru', facet: '10-10' }, [{ kind: 'other-facet', count: 2, change: { facet: ['0001'] } }]],
    ['the reverse step', { stepClass: 'dissociative-adsorption', metal: 'Ru' }, [{ kind: 'reverse-step', count: 2, change: { stepClass: ['associative-desorption'] } }]],
    ['the reverse of a step in words', { step: 'dissociative adsorption of H2' }, [{ kind: 'reverse-step', count: 1, change: { step: null, stepClass: ['associative-desorption'], species: ['H2'] } }]],
    ['a measured value in place of a computed one', { metal: 'Ru', methodClass: 'computed' }, [{ kind: 'other-method-class', count: 2, change: { methodClass: ['measured'] } }]],
    ['a computed value in place of a technique', { metal: 'Fe', method: 'TPD' }, [
      { kind: 'other-method-class', count: 1, change: { method: null, methodClass: ['computed'] } },
    ]],
    ['alloys that contain the metal', { metal: 'Ni', species: 'NH2' }, [{ kind: 'alloys-containing', count: 1, change: { metal: null, contains: ['Ni'] } }]],
    ['nothing', { metal: 'Cu', yearFrom: '2200' }, []],
  ])('%s', async (_what, query, wanted) => {
    const answer = await ask(query);
    expect(answer.total).toBe(0);
    expect(answer.nearMisses).toEqual(wanted);
    for (const { change, count } of wanted) {
      const changed = new URLSearchParams(query);
      for (const [name, values] of Object.entries(change)) {
        changed.delete(name);
        for (const value of values ?? []) changed.append(name, value);
      }
      expect((await ask(changed.toString())).total).toBe(count);
    }
  });

  it('is not looked for when something is found', async () => {
    expect((await ask({ metal: 'Ru' })).nearMisses).toBeNull();
  });
});

describe('groups', () => {
  it('of steps part the directions, and have a median of like energies only', async () => {
    const heads = (await ask({ groupBy: 'step' })).groups as GroupHead[];
    expect(heads.filter(({ key }) => key === '2N* <=> N2 + 2*').map(({ direction, count, energy, noMedian }) => ({ direction, count, median: energy?.median, noMedian }))).toEqual([
      { direction: 1, count: 2, median: 160, noMedian: null }, { direction: -1, count: 1, median: expect.closeTo(38.59, 2) as number, noMedian: null },
    ]);
  });

  it.each<[string, Record<string, string>, string, Partial<GroupHead>]>([
    ['of several steps', { groupBy: 'source' }, 'Ambrosetti', { count: 1 }], ['of a surface', { groupBy: 'surface' }, 'Ru(0001)', { count: 1, noMedian: null }], ['of an alloy', { groupBy: 'surface' }, 'Ni3Fe', { count: 1, measured: 1, computed: 0 }],
  ])('%s', async (_what, query, label, wanted) => {
    expect(((await ask(query)).groups as GroupHead[]).find((head) => head.label.startsWith(label))).toMatchObject(wanted);
  });

  it.each(['step', 'surface', 'source'])('by %s come whole, page after page, whatever the sort within', async (groupBy) => {
    for (const sort of ['energy', '-energy', 'year', 'accession']) {
      const items: FoundEntry[] = [];
      const heads = new Map<string, GroupHead>();
      for (let cursor: string | null = ''; cursor !== null;) {
        const answer: Body = await ask({ groupBy, sort, limit: '2', ...(cursor ? { cursor } : {}) });
        items.push(...(answer.items as FoundEntry[]));
        for (const head of answer.groups as GroupHead[]) heads.set(`${head.direction} ${head.key}`, head);
        cursor = answer.nextCursor as string | null;
      }
      expect(items.length).toBe(inputs.length);
      const keys = items.map(({ step, surface, source }) => (groupBy === 'step' ? `${step?.direction} ${step?.key}` : `null ${groupBy === 'surface' ? surface?.label : source?.id}`));
      const runs = keys.filter((key, at) => key !== keys[at - 1]);
      expect(runs.length).toBe(new Set(keys).size);
      for (const key of runs) expect(heads.get(key)?.count).toBe(keys.filter((one) => one === key).length);
    }
  });

  it.each(['step', 'surface', 'source'])('by %s are listed from the largest on, page by page', async (groupBy) => {
    const whole = okBody(await visitor.get(`/entries/groups?groupBy=${groupBy}`));
    const counts = (whole.items as GroupHead[]).map(({ count }) => count);
    expect(counts).toEqual([...counts].sort((a, b) => b - a));
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(inputs.length);
    expect(whole.total).toBe(counts.length);
    const paged: GroupHead[] = [];
    for (let cursor: string | null = ''; cursor !== null;) {
      const answer: Body = okBody(await visitor.get(`/entries/groups?groupBy=${groupBy}&limit=1${cursor ? `&cursor=${cursor}` : ''}`));
      paged.push(...(answer.items as GroupHead[]));
      cursor = answer.nextCursor as string | null;
    }
    expect(paged).toEqual(whole.items);
  });

  it('without a group asked for there are no heads', async () => {
    expect((await ask({})).groups).toBeNull();
  });
});
