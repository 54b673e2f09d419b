import { describe, expect, test } from 'vitest';
import Cite from 'citation-js';
import { readBibtex } from '#server/services/citation/bibtex-read.ts';
import { writeBibtex } from '#server/services/citation/bibtex-write.ts';
import { readRis, writeRis } from '#server/services/citation/ris.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import { referenceCases } from './reference-cases.ts';

// Source of the cases: invented citations rendered and parsed by pybtex 0.24.0, bibtexparser 1.1.0, biber 2.18 and BibTeX 0.99d.
describe.each(referenceCases)('$id: $feature', ({ input: { csl }, expected }) => {
  test('the BibTeX is read into the same citation', () => {
    const { entries, problems } = readBibtex(expected.bibtex);
    expect(problems).toEqual([]);
    expect(entries).toEqual([csl]);
  });

  test('the RIS is read into the same names and title', () => {
    const { entries, problems } = readRis(expected.ris);
    expect(problems).toEqual([]);
    const { id: _id, ...rest } = csl;
    expect(entries).toEqual([{ ...rest, title: plainText(csl.title ?? '') }]);
  });

  test('BibTeX and RIS are written as the reference has them', () => {
    const bibtex = csl.author === undefined ? expected.bibtex.replace(',\n', ',\n  author = {{Anonymous}},\n') : expected.bibtex;
    expect(writeBibtex(csl, expected.key)).toBe(bibtex);
    expect(writeRis(csl)).toBe(expected.ris);
  });

  // Independent reader: citation-js 0.7.22, which leaves some symbols in mathematics unread, hence no check of the titles with them.
  test('another program reads the same names and the DOI from what is written', () => {
    const read = (text: string, forceType: '@bibtex/text' | '@ris/file') => Cite.plugins.input.chain(text, { forceType, generateGraph: false })[0];
    const bibtex = read(writeBibtex(csl, expected.key), '@bibtex/text');
    expect(bibtex?.['author']).toEqual(csl.author ?? [{ family: 'Anonymous' }]);
    expect(bibtex?.['DOI']).toBe(csl.DOI);
    expect(read(writeRis(csl), '@ris/file')?.['DOI']).toBe(csl.DOI);
  });
});
