import { describe, expect, it } from 'vitest';
import { quantityText } from '#shared/kinetics/derivation.ts';
import { convertRateConstant } from '#shared/kinetics/rate-constant.ts';
import { expectClose, rateUnitInput, referenceCases } from './reference.ts';

describe('rate-constant conversion', () => {
  // Exact SI 2019 constants by python fractions, unit definitions NIST SP 811 (2008), cross-checked with GNU units 2.22 and pint 0.19.2.
  it.each(referenceCases('rate_units'))('$id $kind $input.from to $input.to', (item) => {
    expectClose(convertRateConstant(rateUnitInput(item)).value, item.expected.value as number, 1e-13);
  });

  it('carries the uncertainty and the assumptions', () => {
    const result = convertRateConstant({ value: 2, from: 'cm2 molecule-1 s-1', to: 's-1', siteDensityPerM2: 1e19, standardUncertainty: 0.2 });
    expectClose(result.value, 2e15, 1e-15);
    expectClose(result.standardUncertainty, 2e14, 1e-14);
    expect(result.assumptions).toEqual(['site density 1e19 m-2']);
    expect(result.derivation.at(-1)?.to).toBe(quantityText(result.value, 's-1'));
    expect(convertRateConstant({ value: 5, from: 's-1', to: 's-1', standardUncertainty: 1 })).toMatchObject({ value: 5, standardUncertainty: 1, assumptions: [] });
  });

  it('understands a molecule that is left out, and says so', () => {
    const result = convertRateConstant({ value: 1, from: 'cm3 s-1', to: 'cm3 molecule-1 s-1' });
    expect(result.value).toBe(1);
    expect(result.assumptions[0]).toContain('understood');
    expect(convertRateConstant({ value: 1, from: 'molecule cm-2 s-1', to: 'cm-2 s-1' }).value).toBeCloseTo(1, 14);
  });

  it('converts an adsorption velocity to the site basis', () => {
    // k = s (k_B T / 2πm)^½ in m s-1 becomes k RT-free pressure form: v/(Γ R T) with Γ in mol m-2.
    const result = convertRateConstant({ value: 100, from: 'm s-1', to: 'Pa-1 s-1', temperatureK: 300, siteDensityPerM2: 1.5e19 });
    expectClose(result.value, 100 / (8.31446261815324 * 300) / (1.5e19 / 6.02214076e23), 1e-14);
  });

  it.each([
    [{ value: 1, from: 'm3 mol-1 s-1', to: 'Pa-1 s-1' }, 'missing-input', 'temperatureK'],
    [{ value: 1, from: 'cm2 molecule-1 s-1', to: 's-1' }, 'missing-input', 'siteDensityPerM2'],
    [{ value: 1, from: 's-1', to: 'Pa-1 s-1' }, 'incompatible-units', 'to'],
    [{ value: 1, from: 'kJ/mol', to: 's-1' }, 'incompatible-units', 'from'],
    [{ value: 1, from: 's-1', to: 's' }, 'incompatible-units', 'to'],
    [{ value: 1, from: 'cm2 s-1', to: 's-1' }, 'ambiguous-unit', 'from'],
    [{ value: 1, from: 's-1', to: 'm2 s-1' }, 'ambiguous-unit', 'to'],
    [{ value: 1, from: 'ML-1 s-1', to: 's-1' }, 'incompatible-units', 'to'],
    [{ value: 1, from: 'xyz', to: 's-1' }, 'unknown-unit', 'from'],
    [{ value: 1, from: 'm3 mol-1 s-1', to: 'Pa-1 s-1', temperatureK: -5 }, 'out-of-range', 'temperatureK'],
    [{ value: 1, from: 'cm2 molecule-1 s-1', to: 's-1', siteDensityPerM2: 0 }, 'out-of-range', 'siteDensityPerM2'],
    [{ value: Infinity, from: 's-1', to: 's-1' }, 'not-finite', 'value'],
  ])('refuses %j', (input, code, path) => {
    expect(() => convertRateConstant(input)).toThrow(expect.objectContaining({ code, path }));
  });

  it('does not overflow on the way', () => {
    expectClose(convertRateConstant({ value: 1e300, from: 'cm6 molecule-2 s-1', to: 'cm6 mol-2 s-1' }).value === Infinity ? 1 : 0, 1, 0);
    expectClose(convertRateConstant({ value: 1e-300, from: 'm6 mol-2 s-1', to: 'm6 mol-2 min-1' }).value, 6e-299, 1e-14);
  });
});
