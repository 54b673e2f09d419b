import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PrintedValueError, readPrintedValue, resolveUncertainty } from '#shared/kinetics/printed-value.ts';

/** Forms that papers print; what each says follows JCGM 100:2008 (GUM) 7.2 and common practice of journals. */
describe('printed values', () => {
  it.each([
    ['26.4', 26.4, 3],
    [' 26.4 ', 26.4, 3],
    ['1.0e13', 1e13, 2],
    ['1.0E+13', 1e13, 2],
    ['1.0 E+13', 1e13, 2],
    ['1.0D13', 1e13, 2],
    ['1.0 x 10^13', 1e13, 2],
    ['1.0 X 10**13', 1e13, 2],
    ['1.0×10¹³', 1e13, 2],
    ['1.0·10^13', 1e13, 2],
    ['1.0 \\times 10^{13}', 1e13, 2],
    ['1.0*10^(13)', 1e13, 2],
    ['5 × 10⁻³', 0.005, 1],
    ['10^13', 1e13, 1],
    ['10^{13}', 1e13, 1],
    ['10¹³', 1e13, 1],
    ['10^13.5', 10 ** 13.5, 1],
    ['10¹³·⁵', 10 ** 13.5, 1],
    ['10^-3', 0.001, 1],
    ['log A = 13.2', 10 ** 13.2, 1],
    ['log10(A/s-1) = 13.20', 10 ** 13.2, 2],
    ['lg A = 13', 1e13, 1],
    ['ln A = 30.4', Math.exp(30.4), 1],
    ['-3.5', -3.5, 2],
    ['−3.5', -3.5, 2],
    ['–3.5', -3.5, 2],
    ['+3.5', 3.5, 2],
    ['1 200', 1200, 4],
    ['1\u2009200.5', 1200.5, 5],
    ['0.123 456', 0.123456, 6],
    ['.45', 0.45, 2],
    ['45.', 45, 2],
    ['0.0450', 0.045, 3],
    ['0', 0, 1],
    ['26,4', 26.4, 3],
    ['0,123', 0.123, 3],
    ['1234,567', 1234.567, 7],
    ['1,234.5', 1234.5, 5],
    ['1.234,5', 1234.5, 5],
    ['1,234,567', 1234567, 7],
    ['Ea = 25', 25, 2],
    ['k(300 K) = 25', 25, 2],
  ])('reads %s', (text, value, digits) => {
    const read = readPrintedValue(text);
    expect(read.value).toBeCloseTo(value, 12);
    expect(Math.abs((read.value as number) / (value || 1) - (value ? 1 : 0))).toBeLessThan(1e-15);
    expect(read).toMatchObject({ bound: '=', significantDigits: digits, low: null, high: null, uncertaintyKind: 'none', standardUncertainty: null, reportedUncertainty: null });
  });

  it.each([
    ['26.4 ± 1.2', 1.2, 'unknown', null],
    ['26.4 +/- 1.2', 1.2, 'unknown', null],
    ['26.4 \\pm 1.2', 1.2, 'unknown', null],
    ['26.4(12)', 1.2, 'standard', 1.2],
    ['26.4(1.2)', 1.2, 'standard', 1.2],
    ['26.4 ± 1.2 (1σ)', 1.2, 'standard', 1.2],
    ['26.4 ± 3 (2σ)', 3, 'expanded', 1.5],
    ['26.4 ± 3 (k = 2)', 3, 'expanded', 1.5],
    ['26.4 ± 1.2 (SE)', 1.2, 'fit-standard-error', 1.2],
    ['26.4 ± 5%', 1.32, 'unknown', null],
  ])('reads the uncertainty of %s', (text, reported, kind, standard) => {
    const read = readPrintedValue(text);
    expect(read).toMatchObject({ value: 26.4, uncertaintyKind: kind, uncertaintyScale: 'linear' });
    expect(read.reportedUncertainty).toBeCloseTo(reported, 12);
    expect(read.standardUncertainty).toBe(standard);
  });

  it('reads a confidence interval', () => {
    expect(readPrintedValue('26.4 ± 3 (95 % CI)').standardUncertainty).toBeCloseTo(3 / 1.959963984540054, 12);
  });

  it.each([
    ['(1.1 ± 0.2) × 10^13', 1.1e13, 2e12],
    ['1.1 ± 0.2 × 10^13', 1.1e13, 2e12],
    ['1.1e13 ± 2e12', 1.1e13, 2e12],
    ['1.1e13 ± 10%', 1.1e13, 1.1e12],
    ['1.234(5)e13', 1.234e13, 5e10],
    ['1.234e13(5)', 1.234e13, 5e10],
  ])('shares the power of ten in %s', (text, value, u) => {
    const read = readPrintedValue(text);
    expect(read.value).toBe(value);
    expect(read.reportedUncertainty).toBeCloseTo(u, -1);
  });

  it.each([
    ['10^13.5±0.4', 0.4 * Math.LN10],
    ['10^(13.5 ± 0.4)', 0.4 * Math.LN10],
    ['log A = 13.5 ± 0.4', 0.4 * Math.LN10],
    ['ln A = 30.4 ± 0.5', 0.5],
  ])('gives the uncertainty of ln A for %s', (text, reported) => {
    const read = readPrintedValue(text);
    expect(read).toMatchObject({ uncertaintyScale: 'ln', uncertaintyKind: 'unknown', standardUncertainty: null });
    expect(read.reportedUncertainty).toBeCloseTo(reported, 12);
  });

  it.each([
    ['25 +2/-3', 3, 2],
    ['25 (+2/-3)', 3, 2],
    ['25^{+2}_{-3}', 3, 2],
    ['25 + 2 − 3', 3, 2],
  ])('keeps the asymmetric %s as reported', (text, minus, plus) => {
    expect(readPrintedValue(text)).toMatchObject({ value: 25, reportedUncertainty: null, reportedMinus: minus, reportedPlus: plus, standardUncertainty: null, uncertaintyKind: 'unknown' });
  });

  it.each([
    ['~25', '≈'], ['≈ 25', '≈'], ['∼25', '≈'], ['ca. 25', '≈'], ['about 25', '≈'], ['approx. 25', '≈'], ['Ea ≈ 25', '≈'],
    ['<25', '<'], ['< 25', '<'], ['less than 25', '<'], ['≤ 25', '≤'], ['<= 25', '≤'], ['⩽25', '≤'], ['at most 25', '≤'],
    ['>25', '>'], ['more than 25', '>'], ['≥25', '≥'], ['⩾25', '≥'], ['>= 25', '≥'], ['at least 25', '≥'],
  ])('keeps the bound of %s', (text, bound) => {
    const read = readPrintedValue(text);
    expect(read).toMatchObject({ bound, value: 25 });
    expect(read.high).toBe(bound === '<' || bound === '≤' ? 25 : null);
    expect(read.low).toBe(bound === '>' || bound === '≥' ? 25 : null);
  });

  it.each([
    ['24-27', 24, 27], ['24–27', 24, 27], ['24 to 27', 24, 27], ['24…27', 24, 27], ['between 24 and 27', 24, 27], ['from 24 to 27', 24, 27], ['-5 to -3', -5, -3], ['−5–−3', -5, -3],
    ['10^12-10^14', 1e12, 1e14], ['1e12–5e13', 1e12, 5e13], ['(1–2) × 10^13', 1e13, 2e13],
  ])('reads the range %s', (text, low, high) => {
    expect(readPrintedValue(text)).toMatchObject({ value: null, low, high, bound: 'range' });
  });

  it.each([
    ['44.5 ± 1.4 kcal/mol', undefined, 'kcal/mol'],
    ['(26 ± 2) kJ mol⁻¹', undefined, 'kJ/mol'],
    ['24-27 kJ/mol', undefined, 'kJ/mol'],
    ['10¹³ s⁻¹', undefined, 's-1'],
    ['5 d-1', undefined, 'd-1'],
    ['log(A/s-1) = 13.2', undefined, 's-1'],
    ['log(A / s^-1) = 13.2', undefined, 's-1'],
    ['ln(A/xyz) = 13.2', undefined, null],
    ['25', 'kcal mol-1', 'kcal/mol'],
    ['25 kcal/mol', 'kcal mol^-1', 'kcal/mol'],
    ['25', 'no such unit', 'no such unit'],
    ['25 (kJ/mol)', undefined, 'kJ/mol'],
    ['25', undefined, null],
  ])('finds the unit in %s beside %s', (text, beside, unit) => {
    expect(readPrintedValue(text, beside).unit).toBe(unit);
  });

  it.each([
    ['', 0, 'a number'],
    ['~', 1, 'a number'],
    ['abc', 0, 'a number'],
    ['12..', 3, 'a unit or the end of the value'],
    ['2 3', 2, 'a unit or the end of the value'],
    ['25 furlongs', 3, 'a unit or the end of the value'],
    ['26.4 ±', 6, 'the half-width after ±'],
    ['1.0 × 10', 8, 'an exponent such as ^13 after 10'],
    ['1.0 × 10^', 9, 'an exponent such as 13 or -3'],
    ['25 +2', 5, 'the lower part of an asymmetric uncertainty, such as +2/-3'],
    ['25 +2/-', 7, 'the lower part of an asymmetric uncertainty, such as +2/-3'],
    ['25 (+2/-3', 9, 'a closing bracket'],
    ['(1.1 ± 0.2', 10, 'a closing bracket'],
    ['10^(13', 6, 'a closing bracket'],
    ['(x)', 1, 'a number'],
    ['(1-x)', 3, 'the upper end of the range'],
    ['between 24', 10, 'and'],
    ['24 ± 1 - 27', 9, 'the end of the value'],
    ['24 - 27 ± 1', 11, 'a plain number as the upper end of the range'],
    ['10^x', 3, 'a number'],
    ['1e999', 3, 'an exponent between -400 and 400'],
    ['-', 0, 'a number'],
    ['–x', 0, 'a number'],
  ])('says where %s stops', (text, position, expected) => {
    try {
      readPrintedValue(text);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(PrintedValueError);
      expect(error).toMatchObject({ expected, path: 'asPrinted', code: 'unreadable-value' });
      if (expected !== 'an exponent between -400 and 400' && text !== '–x') expect((error as PrintedValueError).position).toBe(position);
    }
  });

  it.each([
    ['1,234', /ambiguous: write 1\.234 for a decimal comma or 1234 for a thousands separator/],
    ['-12,345', /write 12\.345 .* or 12345/],
    ['1.0 x 1013', /lost superscript: write 10\^13/],
    ['1-2 x 10^13', /both ends or to the upper end only/],
    ['27-24', /write the lower end first/],
    ['<0.1 ± 0.05', /both a limit and an uncertainty/],
    ['<24-27', /both a limit and a range/],
    ['25 kJ/mol', /printed in kJ\/mol, the unit beside it is eV/, 'eV'],
    ['1 200,345', /groups of three digits/],
    [`${'9'.repeat(320)}`, /at most 300 characters/],
    [`${'9'.repeat(299)}e99`, /at most 300|within double range/],
  ])('explains %s', (text, message, unit?: string) => {
    expect(() => readPrintedValue(text, unit)).toThrow(message);
  });

  it('shortens a long text in the message', () => {
    expect(() => readPrintedValue(`x${'y'.repeat(200)}`)).toThrow(/\.\.\./);
    expect(() => readPrintedValue('9'.repeat(299) + 'e')).toThrow(PrintedValueError);
    expect(() => readPrintedValue('1e399')).toThrow(/within double range/);
  });

  it('reads every decimal it prints', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e300, max: 1e300 }), (value) => {
        expect(readPrintedValue(String(value)).value === value).toBe(true);
        expect(readPrintedValue(value.toExponential()).value === value).toBe(true);
      }),
    );
  });

  it('reads value and half-width back, whatever the sign', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99999, max: 99999 }), fc.integer({ min: 1, max: 999 }), fc.constantFrom(' ± ', '±', '+/-', ' +- '), (v, u, sign) => {
        const read = readPrintedValue(`${v / 100}${sign}${u / 100}`);
        expect(read).toMatchObject({ value: v / 100, reportedUncertainty: u / 100, standardUncertainty: null });
      }),
    );
  });

  it('throws nothing but its own error, on any text', () => {
    const piece = fc.constantFrom('1', '23', '.', ',', ' ', '±', '+', '-', '–', '(', ')', '10^', '×', 'x', 'e', 'E', '{', '}', '%', '~', '<', '≥', 'log A = ', 'ln', ' to ', 'kJ/mol', 's-1', '⁻¹', '¹³', '10', '/', 'σ', 'between ', 'and', '*');
    fc.assert(
      fc.property(fc.oneof(fc.string({ maxLength: 60 }), fc.array(piece, { maxLength: 14 }).map((pieces) => pieces.join(''))), (text) => {
        try {
          const read = readPrintedValue(text);
          for (const number of [read.value, read.low, read.high, read.reportedUncertainty]) expect(number === null || Number.isFinite(number)).toBe(true);
          expect(read.bound === 'range' ? read.value === null : read.value !== null).toBe(true);
        } catch (error) {
          if (!(error instanceof PrintedValueError)) throw error;
          expect(error.position).toBeGreaterThanOrEqual(0);
          expect(error.position).toBeLessThanOrEqual(text.length);
        }
      }),
      { numRuns: 2000 },
    );
  });

  it('is linear in a hostile text', () => {
    const start = performance.now();
    for (const text of [' '.repeat(300), '1,000'.repeat(60), '1 000 '.repeat(50), 'log('.repeat(70), '('.repeat(300), '10^'.repeat(100)]) {
      try {
        readPrintedValue(text);
      } catch (error) {
        expect(error).toBeInstanceOf(PrintedValueError);
      }
    }
    expect(performance.now() - start).toBeLessThan(500);
  });
});

describe('kind of uncertainty', () => {
  const half = readPrintedValue('26.4 ± 3');
  it.each([
    [{ kind: 'standard' }, 3],
    [{ kind: 'fit-standard-error' }, 3],
    [{ kind: 'expanded', coverageFactor: 2 }, 1.5],
    [{ kind: 'rectangular' }, 3 / Math.sqrt(3)],
    [{ kind: 'triangular' }, 3 / Math.sqrt(6)],
    [{ kind: 'spread', degreesOfFreedom: 8 }, 1],
    [{ kind: 'spread' }, null],
    [{ kind: 'expanded' }, null],
    [{ kind: 'confidence' }, null],
    [{ kind: 'unknown' }, null],
  ] as const)('%j', (statement, standard) => {
    const resolved = resolveUncertainty(half, statement);
    expect(resolved).toMatchObject({ value: 26.4, reportedUncertainty: 3, uncertaintyKind: statement.kind });
    if (standard === null) expect(resolved.standardUncertainty).toBeNull();
    else expect(resolved.standardUncertainty).toBeCloseTo(standard, 14);
  });

  it('keeps asymmetric figures as reported', () => {
    expect(resolveUncertainty(readPrintedValue('25 +2/-3'), { kind: 'standard' })).toMatchObject({ reportedMinus: 3, reportedPlus: 2, standardUncertainty: null, uncertaintyKind: 'standard' });
  });

  it('has nothing to say where none is printed, and can not deny one that is', () => {
    expect(resolveUncertainty(readPrintedValue('25'), { kind: 'standard' })).toMatchObject({ uncertaintyKind: 'none', standardUncertainty: null });
    expect(() => resolveUncertainty(half, { kind: 'none' })).toThrow('state its kind');
    expect(() => resolveUncertainty(half, { kind: 'expanded', coverageFactor: 0 })).toThrow('coverage factor must be above 0');
  });
});
