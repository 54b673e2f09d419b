import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { quantityText } from '#shared/kinetics/derivation.ts';
import { formatScientific, formatValue } from '#shared/kinetics/format.ts';

describe('display of a value', () => {
  // Two digits of the standard uncertainty: JCGM 100:2008 (GUM) 7.2.6; one guard digit otherwise: common practice.
  it.each([
    [186.188, 5.8576, 3, '186.2 ± 5.9'],
    [186.188, null, 3, '186.2'],
    [25, null, 2, '25.0'],
    [0.5, null, 1, '0.50'],
    [99.96, null, 2, '100'],
    [1.1e13, 2e12, 2, '(1.10 ± 0.20)e13'],
    [1e13, null, 1, '1.0e13'],
    [9.9996e13, null, 3, '1.000e14'],
    [1.2e-4, null, 2, '1.20e-4'],
    [12345, 400, 3, '12350 ± 400'],
    [5, 50000, 2, '0 ± 50000'],
    [-0.04, 5, 2, '0.0 ± 5.0'],
    [0, null, 3, '0.000'],
    [-186.188, null, 3, '-186.2'],
    [4.2, 0, 2, '4.20 ± 0.00'],
    [NaN, null, 2, 'NaN'],
    [1.5, Infinity, 2, '1.50'],
    [1.5, null, NaN, '1.500'],
  ])('%d ± %d with %d digits', (value, u, digits, text) => {
    expect(formatValue(value, u, digits).text).toBe(text);
  });

  it.each([
    [186.188, null, 3, '1.862', 2, null],
    [1.1e13, 2e12, 2, '1.10', 13, '0.20'],
    [0, null, 2, '0.00', 0, null],
    [1e13, 5e14, 2, '1', 13, '50'],
    [-1.23e-5, 1e-9, 3, '-1.23000', -5, '0.00010'],
  ])('scientific %d', (value, u, digits, mantissa, exponent, uncertainty) => {
    expect(formatScientific(value, u, digits)).toMatchObject({ mantissa, exponent, uncertainty });
  });

  it('passes infinity through', () => {
    expect(formatScientific(Infinity, null, 2)).toEqual({ mantissa: 'Infinity', exponent: null, uncertainty: null, text: 'Infinity' });
  });

  it('stays within half of the last digit', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-20, max: 1e20, noNaN: true }), fc.integer({ min: 1, max: 8 }), (value, digits) => {
        const shown = formatValue(value, null, digits);
        const number = Number(shown.mantissa) * 10 ** (shown.exponent ?? 0);
        expect(Math.abs(number / value - 1)).toBeLessThanOrEqual(0.51 * 10 ** -digits + 1e-12);
      }),
    );
  });

  it('writes full precision into derivations', () => {
    expect(quantityText(186.188, 'kJ/mol')).toBe('186.188 kJ/mol');
    expect(quantityText(6.02214076e23)).toBe('6.02214076e23');
    expect(quantityText(-2.5e-12, 'cm3 s-1')).toBe('-2.5e-12 cm3 s-1');
    expect(quantityText(0, '1')).toBe('0');
  });
});
