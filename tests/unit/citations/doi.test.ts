import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { doiUrl, encodeDoi, isDoi, normaliseDoi } from '#shared/citations/doi.ts';

const sici = '10.1002/(sici)1096-9999(199801)1:1<1::aid-abc_1>3.0.co;2-a';

describe('normaliseDoi', () => {
  test.each([
    ['10.5555/test.0001', '10.5555/test.0001'],
    ['  10.5555/TEST.0001  ', '10.5555/test.0001'],
    ['doi:10.5555/test.0001', '10.5555/test.0001'],
    ['DOI: 10.5555/test.0001', '10.5555/test.0001'],
    ['DOI 10.5555/test.0001', '10.5555/test.0001'],
    ['info:doi/10.5555/test', '10.5555/test'],
    ['urn:doi:10.5555/test', '10.5555/test'],
    ['https://doi.org/10.5555/test.0001', '10.5555/test.0001'],
    ['http://dx.doi.org/10.5555/test.0001', '10.5555/test.0001'],
    ['https://www.doi.org/10.5555/test.0001', '10.5555/test.0001'],
    ['doi.org/10.5555/test.0001', '10.5555/test.0001'],
    ['//doi.org/10.5555/test.0001', '10.5555/test.0001'],
    ['https://doi.org/10.5555/test.0001?utm_source=mail#top', '10.5555/test.0001'],
    ['https://doi.org/doi:10.5555/test', '10.5555/test'],
    ['10.5555/test.0001.', '10.5555/test.0001'],
    ['10.5555/test.0001,', '10.5555/test.0001'],
    ['(10.5555/test.0001).', '10.5555/test.0001'],
    ['<https://doi.org/10.5555/test>', '10.5555/test'],
    ['“10.5555/test”', '10.5555/test'],
    ['10.5555/s0039-6028(94)90001-9', '10.5555/s0039-6028(94)90001-9'],
    ['10.5555/0039-6028(94)', '10.5555/0039-6028(94)'],
    [sici.toUpperCase(), sici],
    [`https://doi.org/${encodeURIComponent(sici)}`, sici],
    ['10.1002/(SICI)1096(1998)1:1&lt;1::AID&gt;3.0.CO;2-A', '10.1002/(sici)1096(1998)1:1<1::aid>3.0.co;2-a'],
    ['10.1002/(sici)1(1998)1:1<1::aid>3.0.co;2-#', '10.1002/(sici)1(1998)1:1<1::aid>3.0.co;2-#'],
    ['10.5555/a%2Fb', '10.5555/a/b'],
    ['10.5555/a\u200Bb', '10.5555/ab'],
    ['10.5555.1/sub', '10.5555.1/sub'],
    ['10.5555/é', '10.5555/é'],
  ])('%j is %j', (text, doi) => {
    expect(normaliseDoi(text)).toBe(doi);
  });

  test.each(['', 'oxygen on silver', '11.5555/x', '10.55/x', '10.5555', '10.5555/', '10.5555/.', '10.5555/a b', '10.5555/a/../b', '10.5555/%2e%2e/x', '10.5555/a\u0000b', '10.5555/%ff%fe',
    `10.5555/${'x'.repeat(300)}`, 'https://example.org/10.5555/test', '10.5555/\uD800', '10.5555/%25252541'])('%j is no DOI', (text) => {
    expect(normaliseDoi(text)).toBeNull();
  });

  test('any text: an answer in canonical form or none, and asking again changes nothing', () => {
    fc.assert(fc.property(fc.oneof(fc.string({ unit: 'binary' }), fc.string().map((tail) => `10.5555/${tail}`), fc.string().map((tail) => `https://doi.org/10.5555/${tail}`)), (text) => {
      const doi = normaliseDoi(text);
      if (doi !== null) expect(normaliseDoi(doi)).toBe(doi);
    }), { numRuns: 2000 });
  });

  test('every form of a DOI leads to the same one', () => {
    const suffix = fc.string({ unit: fc.constantFrom(...'abcz0189-_.;()/:<>[]+'), minLength: 1, maxLength: 40 });
    fc.assert(fc.property(suffix, (tail) => {
      const doi = normaliseDoi(`10.5555/${tail}`);
      fc.pre(doi !== null);
      for (const form of [doi.toUpperCase(), `doi:${doi}`, doiUrl(doi), `http://dx.doi.org/${encodeDoi(doi)}`, `https://doi.org/${encodeURIComponent(doi)}`]) expect(normaliseDoi(form)).toBe(doi);
      expect(isDoi(doi)).toBe(true);
      // The address keeps the whole DOI in its path.
      expect(decodeURIComponent(new URL(doiUrl(doi)).pathname.slice(1))).toBe(doi);
    }), { numRuns: 1000 });
  });
});

test('isDoi wants the canonical form', () => {
  expect(isDoi('10.5555/test')).toBe(true);
  expect(isDoi('10.5555/TEST')).toBe(false);
  expect(isDoi('https://doi.org/10.5555/test')).toBe(false);
});

test('doiUrl escapes what an address can not hold', () => {
  expect(doiUrl('10.5555/test.0001')).toBe('https://doi.org/10.5555/test.0001');
  expect(encodeDoi('10.5555/a<1>#')).toBe('10.5555/a%3C1%3E%23');
  expect(doiUrl('10.5555/a?b+c')).toBe('https://doi.org/10.5555/a%3Fb%2Bc');
});
