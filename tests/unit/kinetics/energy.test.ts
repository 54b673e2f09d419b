import { describe, expect, it } from 'vitest';
import { convertEnergy, energyUnits, findEnergyUnit } from '#shared/kinetics/energy.ts';
import { energyFromKJPerMol, energyToKJPerMol } from '#shared/kinetics/format.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { expectClose, referenceCases } from './reference.ts';

describe('energy conversion', () => {
  // Exact SI 2019 constants by python fractions, cross-checked with GNU units 2.22 and pint 0.19.2: the source of each case is in the file.
  it.each(referenceCases('energy_units'))('$id $input.value $input.from to $input.to', ({ input, expected }) => {
    const result = convertEnergy({ value: Number(input.value), from: input.from as string, to: input.to as string });
    expectClose(result.value, expected.value as number, 1e-13);
  });

  it('keeps decimal steps exact', () => {
    expect(convertEnergy({ value: 44.5, from: 'kcal/mol', to: 'kJ/mol', standardUncertainty: 1.4 })).toMatchObject({ value: 186.188, unit: 'kJ/mol', standardUncertainty: 5.8576 });
    expect(convertEnergy({ value: 25, from: 'kJ mol-1', to: 'kJ/mol' }).value).toBe(25);
    expect(convertEnergy({ value: 0.3, from: 'kcal/mol', to: 'cal/mol' }).value).toBe(300);
  });

  it('goes there and back for every pair', () => {
    for (const from of energyUnits) {
      for (const to of energyUnits) {
        const there = convertEnergy({ value: 72.4, from, to }).value;
        expectClose(convertEnergy({ value: there, from: to, to: from }).value, 72.4, 1e-14, `${from} ${to}`);
      }
    }
  });

  it('tells how it went', () => {
    expect(convertEnergy({ value: 1, from: 'kcal/mol', to: 'kJ/mol' }).derivation).toEqual([
      { operation: 'Thermochemical calorie, × 4.184 exactly', from: '1 kcal/mol', to: '4.184 kJ/mol', constant: '1 kcal = 4.184 kJ', reference: 'NIST SP 811 (2008)' },
    ]);
    const viaJoule = convertEnergy({ value: 1, from: 'eV', to: 'kcal/mol' }).derivation;
    expect(viaJoule.map((line) => line.to.split(' ')[1])).toEqual(['J/mol', 'kcal/mol']);
    expect(convertEnergy({ value: 1, from: 'kJ/mol', to: 'eV' }).derivation[0]?.operation).toMatch(/^Inverse of/);
    expect(convertEnergy({ value: 1, from: 'eV', to: 'eV' }).derivation[0]?.operation).toBe('Unit kept');
  });

  it.each([
    ['kJ', 'incompatible-units', /kJ\/mol if that is meant/],
    ['s-1', 'incompatible-units', /not a molar energy/],
    ['furlong', 'unknown-unit', /unknown unit "furlong"/],
  ])('refuses %s', (from, code, message) => {
    try {
      convertEnergy({ value: 1, from, to: 'kJ/mol' });
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(KineticsError);
      expect(error).toMatchObject({ code, path: 'from' });
      expect((error as Error).message).toMatch(message);
    }
  });

  it('refuses what is no number', () => {
    expect(() => convertEnergy({ value: NaN, from: 'eV', to: 'eV' })).toThrow('value must be a finite number, got NaN');
    expect(() => convertEnergy({ value: 1, from: 'eV', to: 'eV', standardUncertainty: -1 })).toThrow('must not be below 0');
  });

  it('reads other spellings of energies', () => {
    expect(findEnergyUnit('kcal·mol⁻¹')?.symbol).toBe('kcal/mol');
    expect(findEnergyUnit('Btu(IT)/lb-mol')?.symbol).toBe('Btu_IT/lbmol');
    expect(findEnergyUnit('Pa')).toBeNull();
  });

  it('serves the display', () => {
    expect(energyFromKJPerMol(4.184, 'kcal/mol')).toBe(1);
    expectClose(energyToKJPerMol(1, 'eV'), 96.48533212331, 1e-12);
    expect(() => energyFromKJPerMol(1, 'x')).toThrow('unknown energy unit');
    expect(() => energyToKJPerMol(1, 'x')).toThrow('unknown energy unit');
  });
});
