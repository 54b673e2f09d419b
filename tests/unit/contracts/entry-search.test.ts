import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleavages, collectParams, entryFilter, entrySearch, exportEntries, groupings, printSearch, readSearch, sortKeys } from '#shared/contracts/entry-search.ts';
import { kinds, methodClasses, scopes } from '#shared/domain/kinds.ts';
import { states } from '#shared/domain/states.ts';

const words = fc.array(fc.string({ minLength: 1, maxLength: 20 }).map((text) => text.replace(/[\p{Cf}\p{Cc}]/gu, '').trim()).filter((text) => text !== ''), { minLength: 1, maxLength: 4 });
const some = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined });

const search = fc.record({
  q: some(fc.string({ minLength: 1, maxLength: 40 }).map((text) => text.trim()).filter((text) => text !== '')),
  kind: some(fc.uniqueArray(fc.constantFrom(...kinds), { minLength: 1 })),
  metal: some(words), step: some(words), method: some(words), facet: some(words), species: some(words), formula: some(words), support: some(words), promoter: some(words),
  author: some(words), contributor: some(words), methodFamily: some(words), cleavage: some(fc.uniqueArray(fc.constantFrom(...cleavages), { minLength: 1 })),
  state: some(fc.uniqueArray(fc.constantFrom(...states), { minLength: 1 })), hasUncertainty: some(fc.boolean()), groupBy: some(fc.constantFrom(...groupings)),
  validFrom: some(fc.double({ min: 1, max: 5000, noNaN: true })), validTo: some(fc.double({ min: 1, max: 5000, noNaN: true })),
  methodClass: some(fc.uniqueArray(fc.constantFrom(...methodClasses), { minLength: 1 })),
  scope: some(fc.uniqueArray(fc.constantFrom(...scopes), { minLength: 1 })),
  yearFrom: some(fc.integer({ min: 1800, max: 2200 })),
  valueMin: some(fc.double({ noNaN: true, noDefaultInfinity: true })),
  validAt: some(fc.double({ min: 1, max: 5000, noNaN: true })),
  T: some(fc.double({ min: 1, max: 5000, noNaN: true })),
  sort: fc.constantFrom(...sortKeys),
  limit: fc.integer({ min: 1, max: 200 }),
  counts: fc.boolean(),
});

describe('the address of a search', () => {
  it('printed and read again is the same search', () => {
    fc.assert(fc.property(search, (asked) => {
      const known = entrySearch.parse(asked.counts ? { ...asked, counts: 'true' } : { ...asked, counts: 'false' });
      const { search: read, ignored } = readSearch(new URLSearchParams(printSearch(known).toString()));
      expect(ignored).toEqual([]);
      // Minus zero is written as zero.
      expect(JSON.stringify(read)).toBe(JSON.stringify(known));
    }));
  });

  it('leaves out what makes no sense, and names it', () => {
    const { search: read, ignored } = readSearch(new URLSearchParams('metal=Ru&validAt=abc&sort=beauty&kind=nothing'));
    expect(read).toMatchObject({ metal: ['Ru'], sort: 'step' });
    expect(ignored.map(({ name }) => name).sort()).toEqual(['kind', 'sort', 'validAt']);
  });

  it('opens whatever the address holds', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.string(), fc.string())), (pairs) => {
      expect(() => readSearch(new URLSearchParams(pairs))).not.toThrow();
    }));
  });

  it.each<[string, Record<string, unknown>, Record<string, unknown>]>([
    ['zero-width marks', { q: '\u200bru\u200dthenium\ufeff' }, { q: 'ruthenium' }], ['marks of direction', { metal: ['\u202eRu\u202c'] }, { metal: ['Ru'] }], ['a soft hyphen', { author: 'Ek\u00adström' }, { author: ['Ekström'] }],
    ['control characters', { q: 'a\u0000b\tc' }, { q: 'a b c' }],
  ])('takes out what cannot be seen: %s', (_what, typed, read) => {
    expect(entryFilter.parse(typed)).toEqual(read);
  });

  it.each<[string, Record<string, unknown>]>([
    ['a state that is none', { state: 'published' }], ['a temperature below 1 K', { validFrom: '0' }], ['a word that cannot be seen', { species: '\u200b' }], ['perhaps', { hasUncertainty: 'perhaps' }], ['fifty-one species', { species: Array.from({ length: 51 }, (_, n) => `N${n}`) }],
  ])('refuses %s', (_what, typed) => {
    expect(entryFilter.safeParse(typed).success).toBe(false);
  });

  it('lets an export ask for accepted entries only', () => {
    expect(exportEntries.query?.safeParse({ state: 'accepted' }).success).toBe(true);
    expect(exportEntries.query?.safeParse({ state: ['accepted', 'submitted'] }).success).toBe(false);
  });

  it('reads a name that comes once as text and one that repeats as a list', () => {
    expect(collectParams(new URLSearchParams('a=1&b=2&b=3'))).toEqual({ a: '1', b: ['2', '3'] });
  });
});
