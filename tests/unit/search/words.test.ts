import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { promoterWord, readPromoters } from '#server/features/entries/promoters.ts';
import { editDistance } from '#server/features/search/edit-distance.ts';
import { rangesIn } from '#server/features/search/highlight.ts';
import { readFilter } from '#server/features/search/read-filter.ts';
import { readStepText, speciesFormula } from '#server/features/search/step-words.ts';
import { createVocabularyNames } from '#server/features/search/vocabulary-names.ts';
import { readVocabulary } from '#seeds/vocabulary/read-vocabulary.ts';

const names = createVocabularyNames(readVocabulary().map(({ kind, ...term }) => ({ list: kind, ...term })));

describe('the distance of two words', () => {
  it.each([
    ['ruthenium', 'ruthenium', 0], ['ruthenuim', 'ruthenium', 1], ['nikel', 'nickel', 1], ['cobolt', 'cobalt', 1], ['', 'abc', 3], ['abc', '', 3], ['ca', 'abc', 3], ['kitten', 'sitting', 3],
  ])('%s and %s: %d', (a, b, distance) => {
    expect(editDistance(a, b)).toBe(distance);
  });

  it('is the same both ways and never more than the longer word', () => {
    const word = fc.string({ unit: fc.constantFrom('a', 'b', 'c'), maxLength: 8 });
    fc.assert(fc.property(word, word, (a, b) => {
      const distance = editDistance(a, b);
      expect(distance).toBe(editDistance(b, a));
      expect(distance).toBeLessThanOrEqual(Math.max(a.length, b.length));
      expect(distance === 0).toBe(a === b);
    }));
  });
});

describe('where words stand in a text', () => {
  it.each<[string, string, string[]]>([
    ['Thermal desorption of ammonia', 'ammonia', ['ammonia']], ['Thermal desorption of ammonia', 'THERM amm', ['Therm', 'amm']], ['Ekström-Öhlin', 'ohlin ekstrom', ['Ekström', 'Öhlin']], ['e\u0301tude', 'etude', ['e\u0301tude']],
    ['Ruthenium', 'thenium', ['thenium']], ['cobalt', 'ba', []], ['Ba 2 %', 'ba %', ['Ba', '%']], ['N* + N* -> N2 + 2*', 'n2 2*', ['N2', '2*']], ['ammonia', 'ammonia mmon', ['ammonia']], ['\u{1F9EA} ammonia', 'ammonia', ['ammonia']],
    ['a.b', '.', ['.']], ['<b>bold</b>', '<b>', ['<b>b', 'b']], ['', 'x', []],
  ])('%s, looked through for %s', (text, q, found) => {
    expect(rangesIn(text, q).map(([from, to]) => text.slice(from, to))).toEqual(found);
  });

  it('is always inside the text, in order and apart', () => {
    fc.assert(fc.property(fc.string({ unit: 'grapheme', maxLength: 40 }), fc.string({ maxLength: 8 }), (text, q) => {
      let last = -1;
      for (const [from, to] of rangesIn(text, q)) {
        expect(from).toBeGreaterThan(last);
        expect(to).toBeGreaterThanOrEqual(from);
        expect(to).toBeLessThanOrEqual(text.length);
        last = to;
      }
    }));
  });
});

describe('promoters', () => {
  it.each<[string | undefined, string[]]>([
    [undefined, []], ['', []], ['none', []], ['clean surface', []], ['Cs', ['Cs']], ['Ba 2 %', ['Ba']], ['Cs 2 wt%, barium', ['Ba', 'Cs']], ['K/Ru 0.1', ['K', 'Ru']], ['0.08 ML potassium', ['K']], ['K2O', ['K2O']], ['constructor', ['constructor']],
  ])('%s: %j', (text, found) => {
    expect(readPromoters(text)).toEqual(found);
  });

  it.each([['cs', 'Cs'], ['CAESIUM', 'Cs'], ['cesium', 'Cs'], ['K2O', 'K2O'], ['__proto__', '__proto__']])('%s is kept as %s', (typed, kept) => {
    expect(promoterWord(typed)).toBe(kept);
  });
});

describe('a species', () => {
  it.each<[string, string | null]>([
    ['NH3', 'NH3'], ['NH3*', 'NH3'], ['NH3(g)', 'NH3'], ['*NH2', 'NH2'], ['N2_g', 'N2'], ['D2', 'H2'], ['ND3', 'NH3'], ['H*_fcc', 'H'], ['nitrogen', null], ['', null], ['*', null], ['N2 + H2', null], ['N2 ->', null], ['2N2', null], ['???', null],
  ])('%s is kept as %s', (typed, kept) => {
    expect(speciesFormula(typed)).toBe(kept);
  });
});

describe('words for an elementary step', () => {
  it.each<[string, object]>([
    ['nitrogen recombination', { classes: ['associative-desorption'], species: [['N2', 'N']] }], ['recombination', { classes: ['associative-desorption'], species: undefined }], ['Eley–Rideal', { classes: ['eley-rideal'], species: undefined }],
    ['N–H bond breaking', { classes: ['dehydrogenation'], species: undefined }], ['atomic nitrogen', { classes: undefined, species: [['N']] }], ['dissociation of the N2 on steps', { classes: ['dissociation'], species: [['N2']] }],
  ])('%s', (text, pattern) => {
    expect(readStepText(text, names).pattern).toEqual(pattern);
  });

  it('never throws, whatever is typed', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (text) => {
      const { pattern, message } = readStepText(text, names);
      expect(pattern !== null || message !== null).toBe(true);
    }), { numRuns: 500 });
  });
});

describe('a filter', () => {
  it('reads any words without throwing', () => {
    const words = fc.option(fc.array(fc.string({ unit: 'binary', minLength: 1, maxLength: 30 }), { minLength: 1, maxLength: 3 }), { nil: undefined });
    fc.assert(fc.property(fc.record({ metal: words, contains: words, formula: words, facet: words, support: words, promoter: words, step: words, stepClass: words, species: words, bond: words, method: words, methodFamily: words, source: words }), (asked) => {
      expect(() => readFilter(asked, names)).not.toThrow();
    }), { numRuns: 300 });
  });
});
