import { describe, expect, it } from 'vitest';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import { rateAtTemperature, rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';

const whole: EntryInput = {
  kind: 'activation-energy', scope: 'elementary', provenance: 'measured', step: { equation: 'N* + N* -> N2 + 2*' },
  surface: { metal: 'Ru', facet: '0001' }, locator: 'Table 2', method: { class: 'measured', technique: 'TPD' },
  quantities: [
    { symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol' },
    { symbol: 'preExponential', asPrinted: '10^13', unitAsPrinted: 's-1' },
  ],
  validRange: { min: 430, max: 620 },
};

describe('assessing what was typed', () => {
  it('finds nothing in the way of a whole entry', () => {
    const { faults, checks, step, surface, quantities } = assessEntry(whole);
    expect(faults).toEqual([]);
    expect(checks.map(({ code }) => code)).toEqual(['uncertainty-unknown']);
    expect([step?.class, surface?.label]).toEqual(['associative-desorption', 'Ru(0001)']);
    // 44.5 thermochemical kilocalories of 4.184 kJ each (NIST SP 811 (2008), appendix B.8).
    expect(quantities[0]?.value).toBeCloseTo(186.188, 10);
    expect(quantities[0]?.standardUncertainty).toBeNull();
  });

  it('names everything that is missing from nothing', () => {
    expect(assessEntry({}).faults.map(({ path }) => path).sort()).toEqual(['kind', 'locator', 'method.class', 'provenance', 'quantities', 'scope', 'step.equation', 'surface.metal']);
  });

  it.each<[string, Partial<EntryInput>, string, RegExp]>([
    ['an equation that does not balance', { step: { equation: 'NH3* -> NH2* + H*' } }, 'step.equation', /site/],
    ['an impossible facet', { surface: { metal: 'Ni', facet: '0001' } }, 'surface.facet', /does not exist/],
    ['a value that is no number', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: 'abc', unitAsPrinted: 'kJ/mol' }] }, 'quantities.0.asPrinted', /./],
    ['a unit of another dimension', { quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5', unitAsPrinted: 's-1' }] }, 'quantities.0.unitAsPrinted', /./],
    ['an energy of no type', { quantities: [{ symbol: 'energy', asPrinted: '44.5', unitAsPrinted: 'kJ/mol' }] }, 'quantities.0.energyType', /kind of energy/],
    ['the same quantity twice', { quantities: [...(whole.quantities ?? []), { symbol: 'energy', energyType: 'arrhenius', asPrinted: '45', unitAsPrinted: 'kcal/mol' }] }, 'quantities.2.symbol', /twice/],
    ['a kind without its quantity', { kind: 'kie' }, 'quantities', /kinetic isotope effect/],
    ['a barrier called an activation energy', { kind: 'barrier' }, 'quantities.0.energyType', /Arrhenius/],
    ['a range turned round', { validRange: { min: 620, max: 430 } }, 'validRange', /620/],
    ['a temperature out of the world', { conditions: { temperatureK: 9000 } }, 'conditions.temperatureK', /5000/],
  ])('says where %s stands', (_what, change, path, message) => {
    const fault = assessEntry({ ...whole, ...change }).faults.find((one) => one.path === path);
    expect(fault?.message).toMatch(message);
  });

  it('offers the free sites that are missing, and notes that they were added', () => {
    expect(assessEntry({ ...whole, step: { equation: 'N* + N* -> N2' } }).faults[0]?.suggestion).toBe('N* + N* -> N2 + 2*');
    expect(assessEntry({ ...whole, step: { equation: 'N* + N* -> N2 + 2*', sitesAdded: true } }).checks.map(({ code }) => code)).toContain('free-sites-added');
  });

  it('halves a consumption rate of a second-order step, by the species named', () => {
    const rate: EntryInput = { ...whole, kind: 'rate-constant', rateOf: { consumptionOf: 'N*' }, conditions: { temperatureK: 600 }, quantities: [{ symbol: 'rateConstant', asPrinted: '4.0e-2', unitAsPrinted: 's-1' }] };
    expect(assessEntry(rate).quantities[0]?.value).toBeCloseTo(2.0e-2, 12);
    expect(assessEntry({ ...rate, rateOf: 'event' }).quantities[0]?.value).toBeCloseTo(4.0e-2, 12);
  });
});

describe('constants per pair of kinetic Monte Carlo', () => {
  const quantities: EntryInput['quantities'] = [{ symbol: 'rateConstant', asPrinted: '4', unitAsPrinted: 's-1' }];
  it.each([
    ['N* + N* -> N2 + 2*', 12], ['NH3* + * -> NH2* + H*', 24], ['15N* + N* -> 15NN + 2*', 24], ['N*_fcc + N*_hcp -> N2 + 2*', 24], ['N2* -> N2 + *', undefined],
  ])('%s has the mean field %s with six neighbours', (equation, meanField) => {
    const [quantity] = assessEntry({ ...whole, kind: 'rate-constant', step: { equation }, quantities, conditions: { perPair: true, nearestNeighbours: 6, temperatureK: 500 } }).quantities;
    expect(quantity?.siteValue).toBe(meanField);
  });
  it('stay as they are without the number of neighbours', () => {
    const [quantity] = assessEntry({ ...whole, kind: 'rate-constant', quantities, conditions: { perPair: true } }).quantities;
    expect(quantity).toMatchObject({ value: 4, missing: ['number of nearest neighbours'] });
  });
});

describe('the rate constant at a temperature', () => {
  const { quantities } = assessEntry(whole);
  const at = (temperatureK: number, measured = true, validRange: { min?: number; max?: number } | null = whole.validRange ?? null) =>
    rateAtTemperature(quantities as Parameters<typeof rateAtTemperature>[0], { temperatureK, correlation: null, validRange, measured });

  it('is A exp(-E/RT)', () => {
    // By hand: 1e13 exp(-186188 / (8.31446261815324 × 700)).
    expect(at(700)?.value).toBeCloseTo(1e13 * Math.exp(-186188 / (8.31446261815324 * 700)), 12);
    expect(at(700)).toMatchObject({ unit: 's-1', extrapolated: true, uLnK: null });
  });

  it.each([[500, true, undefined, false], [429, true, undefined, true], [700, true, null, true], [700, false, null, false]] as const)(
    'at %i K, measured %s, range %s: extrapolated %s', (temperatureK, measured, range, extrapolated) => {
      expect(at(temperatureK, measured, range === undefined ? whole.validRange : range)?.extrapolated).toBe(extrapolated);
    });

  it('is null without A, with a bound for E, and beyond the range of a double', () => {
    const without = assessEntry({ ...whole, quantities: whole.quantities?.slice(0, 1) }).quantities;
    expect(rateParameters(without as Parameters<typeof rateParameters>[0])).toBeNull();
    const bound = assessEntry({ ...whole, quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '> 44.5', unitAsPrinted: 'kcal/mol' }, ...(whole.quantities ?? []).slice(1)] }).quantities;
    expect(rateParameters(bound as Parameters<typeof rateParameters>[0])).toBeNull();
    expect(at(1)).toBeNull();
  });
});
