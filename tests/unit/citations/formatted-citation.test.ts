import fc from 'fast-check';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { formatCitation, formatRichCitation } from '#server/services/citation/citation.ts';
import { citationFormatter } from '#server/services/citation/formatted-citation.ts';
import { richText } from '#shared/citations/rich-text.ts';
import { csls } from './csl-arbitrary.ts';
import { referenceCases } from './reference-cases.ts';

afterEach(() => {
  vi.unstubAllGlobals();
});

const csl = (id: string) => referenceCases.find((reference) => reference.id === id)?.input.csl ?? { type: 'document' };

describe('printed citations', () => {
  // Form after the seventh edition of the style of the American Psychological Association (from memory).
  test.each([
    ['arden1998', 'Arden, M. T., & Bolton, K. (1998). Desorption of carbon monoxide from a nickel crystal. Invented Journal of Surface Kinetics, 12(3), 101–118. https://doi.org/10.5555/test.0001'],
    ['tanner2010', 'Tanner, P. Q. (2010). H₂ and D₂ exchange on Ni(111): a ¹³C study of CH₄. Invented Journal of Surface Kinetics, 24(1), 55–60. https://doi.org/10.5555/test.0003'],
    ['anon1966', 'Editorial note on units. (1966). Invented Journal of Surface Kinetics, 0, 1. https://doi.org/10.5555/test.0024'],
    ['thes2009', 'Thesis, D. (2009). Isotope effects in methanol decomposition [PhD thesis, University of Nowhere]. https://doi.org/10.5555/test.0021'],
    ['vandenberg1994', 'van den Berg, P., de la Cruz, M., & de Luc, J. (1994). Ethylene hydrogenation kinetics. Invented Journal of Surface Kinetics, 8(2), 99–110. https://doi.org/10.5555/test.0013'],
  ])('%s', async (id, text) => {
    expect(await formatCitation(csl(id))).toBe(text);
  });

  test('the marked form keeps scripts and italics and holds no other markup', async () => {
    expect(await formatRichCitation(csl('tanner2010'))).toBe('Tanner, P. Q. (2010). H<sub>2</sub> and D<sub>2</sub> exchange on Ni(111): a <sup>13</sup>C study of CH<sub>4</sub>. <i>Invented Journal of Surface Kinetics</i>, <i>24</i>(1), 55–60. https://doi.org/10.5555/test.0003');
    const hostile = await formatRichCitation({ type: 'book', title: '<script>alert(1)</script> a < b & c', author: [{ literal: '<img src=x onerror=1>' }] });
    expect(richText(hostile).map((run) => run.text).join('')).toContain('a < b & c');
    expect(await formatCitation({ type: 'book', title: 'a < b & c' })).toContain('a < b & c');
  });

  test('one after another, two works of one author and year are not told apart by letters', async () => {
    const formatter = await citationFormatter();
    const work = { type: 'article-journal', author: [{ family: 'Parker', given: 'J.' }], issued: { 'date-parts': [[2001]] } };
    expect(formatter.format({ ...work, title: 'One' }).text).toBe('Parker, J. (2001). One.');
    expect(formatter.format({ ...work, title: 'Two' }).text).toBe('Parker, J. (2001). Two.');
    expect(formatter.style).toBe('apa');
  });

  test('any citation is printed, without asking the network', async () => {
    vi.stubGlobal('fetch', () => {
      throw new Error('no network');
    });
    const formatter = await citationFormatter();
    fc.assert(fc.property(csls, (any) => {
      expect(formatter.format(any).text.length).toBeGreaterThan(3);
    }), { numRuns: 100 });
    expect(formatter.format({ type: 'no-such-type', title: '10.5555/test', URL: 'https://e.example/' }).text).toContain('10.5555/test');
  });
});
