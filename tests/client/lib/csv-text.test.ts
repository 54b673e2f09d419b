import Papa from 'papaparse';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csvText, type CsvCell } from '#client/lib/csv-text.ts';

describe('CSV from figures', () => {
  it.each<[string, CsvCell, string]>([
    ['a number in full', 0.1 + 0.2, '0.30000000000000004'], ['nothing', null, ''], ['not a number', Number.NaN, ''], ['a comma', 'Ru, terrace', '"Ru, terrace"'],
    ['a quote', 'the "edge"', '"the ""edge"""'], ['a formula', '=1+1', "'=1+1"], ['an at sign', '@x', "'@x"], ['a negative number as text', '-2.5', '-2.5'], ['a hyphenated word', '-OH', "'-OH"],
  ])('sets %s', (_, cell, text) => {
    expect(csvText(['a'], [[cell]])).toBe(`a\r\n${text}\r\n`);
  });

  it('is read back as it was by an independent reader (papaparse 5.7)', () => {
    const texts = fc.array(fc.array(fc.string(), { minLength: 2, maxLength: 2 }), { maxLength: 8 });
    fc.assert(fc.property(texts, (rows) => {
      const read = Papa.parse<string[]>(csvText(['a', 'b'], rows), { delimiter: ',', newline: '\r\n' }).data.slice(0, -1);
      const plain = read.slice(1).map((row) => row.map((cell) => cell.replace(/^'(?=[=+\-@\t\r])/, '')));
      expect(plain).toEqual(rows.map((row) => row.map((cell) => cell.replace(/^'(?=[=+\-@\t\r])/, ''))));
    }));
  });
});
