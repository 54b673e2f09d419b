import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { numberFromLn } from '#client/lib/log-number.ts';

describe('a number from its logarithm', () => {
  it.each([
    [0, '1.00', 0], [Math.log(9.999), '1.00', 1], [Math.log(1.28e13), '1.28', 13], [-1000 * Math.LN10, '1.00', -1000], [1000 * Math.LN10 + Math.log(1.25), '1.25', 1000],
  ])('e^%s is %s times ten to %s', (ln, text, exponent) => {
    expect(numberFromLn(ln)).toEqual({ text, exponent });
  });

  it.each([[Number.NEGATIVE_INFINITY, '0.00'], [Number.POSITIVE_INFINITY, 'infinite'], [Number.NaN, 'not a number']])('%s is said as %s', (ln, text) => {
    expect(numberFromLn(ln)).toEqual({ text, exponent: null });
  });

  it('is the number itself wherever a double holds it', () => {
    fc.assert(fc.property(fc.double({ min: -690, max: 690, noNaN: true }), (ln) => {
      const { text, exponent } = numberFromLn(ln, 4);
      expect(Number(`${text}e${exponent}`) / Math.exp(ln)).toBeCloseTo(1, 3);
      expect(Number(text)).toBeGreaterThanOrEqual(1);
      expect(Number(text)).toBeLessThan(10);
    }));
  });
});
