import { describe, expect, it } from 'vitest';
import { energyUnits } from '#shared/contracts/accounts.ts';
import { energyFromKJPerMol } from '#shared/kinetics/format.ts';
import { decimalsOf, energyIn, energyToKJPerMol, fixed, plainNumber, setNumber } from '#client/lib/numbers.ts';

describe('numbers', () => {
  it.each(energyUnits)('converts %s as the units registry does, there and back', (unit) => {
    expect(energyIn(unit, 186.188)).toBeCloseTo(energyFromKJPerMol(186.188, unit), 12);
    expect(energyToKJPerMol(unit, energyIn(unit, 186.188))).toBeCloseTo(186.188, 12);
  });

  // NIST SP 811 (2008), B.8: thermochemical calorie 4.184 J; CODATA 2022: e N_A = 96485.33212... C/mol.
  it.each([['kcal/mol', 4.184], ['eV', 96.48533212331]] as const)('one %s is %s kJ/mol', (unit, value) => {
    expect(energyToKJPerMol(unit, 1)).toBeCloseTo(value, 10);
  });

  it.each([
    [186.188, { u: 2.93 }, 1], [186.188, { u: 2.93, uDigits: 1 }, 0], [186.188, { u: 29.3 }, 0], [38.594, { significantDigits: 2 }, 1],
    [0, { significantDigits: 2 }, 2], [9.996, { significantDigits: 2 }, 1], [50, { u: 0.0996 }, 2], [12345, { significantDigits: 2 }, 0], [1.23456, {}, 3],
  ])('%s with %j has %s decimals', (value, precision, decimals) => {
    expect(decimalsOf(value, precision)).toBe(decimals);
  });

  it.each([
    [0.128, '0.128'], [8.8e-6, '8.80 × 10^\u22126'], [1.28e13, '1.28 × 10^13'], [0, '0.00'], [-42.1, '\u221242.1'], [Number.POSITIVE_INFINITY, 'infinite'], [Number.NaN, 'not a number'],
  ])('sets %s as %s', (value, text) => {
    expect(plainNumber(setNumber(value))).toBe(text);
  });

  it.each([[-0.04, 1, '0.0'], [-1.5, 1, '\u22121.5'], [2.675, 0, '3']])('writes %s with %s decimals as %s', (value, decimals, text) => {
    expect(fixed(value, decimals)).toBe(text);
  });
});
