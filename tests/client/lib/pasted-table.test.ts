import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isTable, readPastedTable } from '#client/lib/pasted-table.ts';

describe('a pasted table', () => {
  it.each<[string, string, string[][], number]>([
    ['from a spreadsheet', '450\t0.0045\n480\t0.04\n', [['450', '0.0045'], ['480', '0.04']], 0],
    ['with a header', 'T / K\tk / s-1\n450\t0.0045', [['450', '0.0045']], 1],
    ['with names and units over each other', 'T\tk\nK\t1/s\n450\t0.0045', [['450', '0.0045']], 2],
    ['comma-separated', 'T,k,u\r\n450,0.0045,0.001\r\n480,4e-2,', [['450', '0.0045', '0.001'], ['480', '4e-2', '']], 1],
    ['comma and space', '450, 0.0045\n480, 0.04', [['450', '0.0045'], ['480', '0.04']], 0],
    ['semicolons and decimal commas', 'T;k\n450;4,5e-3\n480,5;0,04', [['450', '4.5e-3'], ['480.5', '0.04']], 1],
    ['tabs and decimal commas', '450,5\t1,25', [['450.5', '1.25']], 0],
    ['white space', '  450   0.0045 \n 480 0.04', [['450', '0.0045'], ['480', '0.04']], 0],
    ['white space and decimal commas', '450,5 0,0045\n480,5 0,04', [['450.5', '0.0045'], ['480.5', '0.04']], 0],
    ['white space and a header of words', 'temperature rate\n450 0.0045', [['450', '0.0045']], 1],
    ['powers of ten with spaces', '450 4.5 × 10^-3\n480 4 x 10−2', [['450', '4.5e-3'], ['480', '4e-2']], 0],
    ['raised powers of ten', '450 4.5 × 10⁻³ 1×10¹²', [['450', '4.5e-3', '1e12']], 0],
    ['a header over raised powers', 'T\tk\n4×10²\t4.5×10⁻³', [['4×10²', '4.5×10⁻³']], 1],
    ['a true minus and no-break spaces', '450\u00a0\u22122,5\n480\u00a0\u22121,5', [['450', '-2.5'], ['480', '-1.5']], 0],
    ['bounds keep their sign', '450\t< 0.01\n480\t≥0.5', [['450', '< 0.01'], ['480', '≥0.5']], 0],
    ['an uncertainty stays with its value', '450 0.0045 ± 0.0003', [['450', '0.0045±0.0003']], 0],
    ['quoted cells', '"Vantongeren, 1994",186.2,2.9\n"say ""so""",12,1', [['Vantongeren, 1994', '186.2', '2.9'], ['say "so"', '12', '1']], 0],
    ['empty cells at the ends of lines', '450\t0.0045\t\t\n480\t0.04\t\t\n', [['450', '0.0045'], ['480', '0.04']], 0],
    ['empty lines between', '450\t1\n\n480\t2\n\n', [['450', '1'], ['480', '2']], 0],
    ['rows of different length', '450\t1\t2\n480\t3', [['450', '1', '2'], ['480', '3', '']], 0],
    ['one column', '450\n480\n510', [['450'], ['480'], ['510']], 0],
  ])('%s', (_, text, rows, headerLines) => {
    const table = readPastedTable(text);
    expect(table.rows).toEqual(rows);
    expect(table.headerLines).toBe(headerLines);
  });

  it.each([
    ['alone', '1,234\t5', 1, 0, '1,234'],
    ['beside a decimal point', '1,234\t5.5', 1, 0, '1,234'],
    ['beside a sure decimal comma', '1,234\t5,5', 0, 2, '1.234'],
    ['after a zero', '0,234\t5', 0, 1, '0.234'],
  ])('leaves 1,234 as it is unless it can only be a decimal: %s', (_, text, ambiguous, decimalCommas, cell) => {
    const table = readPastedTable(text);
    expect([table.ambiguous, table.decimalCommas, table.rows[0]?.[0]]).toEqual([ambiguous, decimalCommas, cell]);
  });

  it.each([['nothing', ''], ['spaces', ' \n \t'], ['an open quote', '"450,1\n480,2'], ['only separators', ';;;\n;;']])('survives %s', (_, text) => {
    expect(() => readPastedTable(text)).not.toThrow();
  });

  const numbers = fc.array(fc.array(fc.double({ noNaN: true, noDefaultInfinity: true }), { minLength: 3, maxLength: 3 }), { minLength: 1, maxLength: 12 });

  it.each([['\t', 'tab'], ['; ', 'semicolon'], [', ', 'comma'], ['   ', 'space']] as const)('gives back the numbers written with %j', (sign, separator) => {
    fc.assert(fc.property(numbers, fc.boolean(), (rows, header) => {
      const text = `${header ? `T${sign}k${sign}u\n` : ''}${rows.map((row) => row.join(sign)).join('\n')}`;
      const table = readPastedTable(text);
      expect(table.separator).toBe(separator);
      expect(table.headerLines).toBe(header ? 1 : 0);
      // A text keeps no sign of zero; -0 + 0 is 0.
      expect(table.rows.map((row) => row.map(Number))).toEqual(rows.map((row) => row.map((value) => value + 0)));
    }));
  });

  it('gives back numbers written with decimal commas', () => {
    const tenths = fc.array(fc.tuple(fc.integer({ min: -99999, max: 99999 }), fc.integer({ min: -99999, max: 99999 })), { minLength: 1, maxLength: 12 });
    const text = (value: number) => (value / 10).toFixed(1).replace('.', ',');
    fc.assert(fc.property(tenths, fc.constantFrom('\t', ';', ' '), (rows, sign) => {
      const table = readPastedTable(rows.map((row) => row.map(text).join(sign)).join('\n'));
      expect(table.rows.map((row) => row.map((cell) => Math.round(Number(cell) * 10) + 0))).toEqual(rows);
    }));
  });

  it('reads any text into rows of equal length', () => {
    fc.assert(fc.property(fc.string({ maxLength: 400 }), (text) => {
      const { rows, columns } = readPastedTable(text);
      expect(rows.every((row) => row.length === columns)).toBe(true);
    }));
  });

  it.each([['powers', '1,2 × 10 '.repeat(20_000), 1], ['quotes', '"'.repeat(100_000), 1], ['digits', '1'.repeat(200_000), 1], ['signs', '- '.repeat(50_000), 1]])('comes to an end with many %s', (_, text, rows) => {
    expect(readPastedTable(text).rows).toHaveLength(rows);
  });
});

describe('a paste', () => {
  it.each([
    ['450\t1', true], ['450\n480', true], ['450;1', true], ['450 0,5', true], ['450, 1', true],
    ['450', false], ['0,5', false], ['1.5e-3', false], ['4.5 × 10^-3', false], ['44.5 ± 1.4', false], ['450\n', false], ['Ru step edge', false], ['', false],
  ])('%j fills several cells: %s', (text, several) => {
    expect(isTable(text)).toBe(several);
  });
});
