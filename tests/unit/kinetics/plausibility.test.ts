import { describe, expect, it } from 'vitest';
import { compareWithFamily, slipFactors } from '#shared/kinetics/outlier.ts';
import {
  checkAgainstReactionEnergy, checkCodes, checkEnergy, checkKie, checkNotNegative, checkPreExponential, checkRateConstant, checkStickingCoefficient, checkTemperature,
  checkUncertainty, checkValidRange, factorKindOf, outlierCheck,
} from '#shared/kinetics/plausibility.ts';
import { recordChecks } from '#shared/kinetics/record-checks.ts';
import { convertQuantity, type QuantityInput } from '#shared/kinetics/quantity.ts';
import type { RecordFacts } from '#shared/kinetics/record-checks.ts';

const codes = (checks: { code: string; severity: string }[]): string[] => checks.map(({ code, severity }) => `${severity} ${code}`);

/** Limits: common practice. */
describe('checks of one record', () => {
  it.each([
    [checkTemperature(0.5), ['blocking temperature-out-of-range']],
    [checkTemperature(5001), ['blocking temperature-out-of-range']],
    [checkTemperature(NaN), ['blocking temperature-out-of-range']],
    [checkTemperature(1), []],
    [checkValidRange({ min: 500, max: 400 }), ['blocking valid-range-reversed']],
    [checkValidRange({ min: 500, max: 520 }, true), ['warning valid-range-narrow']],
    [checkValidRange({ min: 500, max: 520 }), []],
    [checkValidRange({ min: 0, max: 9000 }), ['blocking temperature-out-of-range', 'blocking temperature-out-of-range']],
    [checkValidRange({}), []],
    [checkStickingCoefficient(1.01), ['blocking sticking-out-of-range']],
    [checkStickingCoefficient(0), []],
    [checkNotNegative('A', -1), ['blocking negative-value']],
    [checkNotNegative('A', 0), []],
    [checkPreExponential('surface-first-order', 1e17), ['warning pre-exponential-unusual']],
    [checkPreExponential('surface-first-order', 1e13), []],
    [checkPreExponential('desorption', 1e10), ['warning pre-exponential-unusual']],
    [checkPreExponential('desorption', 1e19), []],
    [checkPreExponential('second-order-desorption', 1e3), ['warning pre-exponential-unusual']],
    [checkPreExponential('desorption', -1), []],
    [checkEnergy(-1, 'elementary'), ['warning negative-energy']],
    [checkEnergy(-1, 'apparent'), []],
    [checkAgainstReactionEnergy(50, 60), ['warning energy-below-reaction-energy']],
    [checkAgainstReactionEnergy(50, 51), []],
    [checkAgainstReactionEnergy(50, 60, 298.15, 10), []],
    [checkAgainstReactionEnergy(-10, -5), []],
    [checkRateConstant(1e17, 's-1'), ['warning rate-above-limit']],
    [checkRateConstant(1e15, 's-1'), []],
    [checkRateConstant(1e5, 'Pa-1 s-1', 1e4), ['warning rate-above-limit']],
    [checkRateConstant(1e3, 'Pa-1 s-1', 1e4), []],
    [checkKie(9, { semiclassicalLimit: 7 }), ['warning kie-unusual']],
    [checkKie(6, { semiclassicalLimit: 7 }), []],
    [checkKie(1.3, { heavyAtom: true }), ['warning kie-unusual']],
    [checkKie(1.1, { heavyAtom: true }), []],
  ])('%j', (checks, expected) => {
    expect(codes(checks)).toEqual(expected);
    for (const { code, message } of checks) {
      expect(checkCodes).toContain(code);
      expect(message).toMatch(/\d/);
    }
  });

  it('looks at uncertainties', () => {
    const base = { value: 10, standardUncertainty: null, reportedUncertainty: 3, uncertaintyKind: 'unknown', uncertaintyScale: 'linear' } as const;
    expect(codes(checkUncertainty(base))).toEqual(['note uncertainty-unknown']);
    expect(codes(checkUncertainty({ ...base, reportedUncertainty: 30 }))).toEqual(['warning uncertainty-larger-than-value', 'note uncertainty-unknown']);
    expect(codes(checkUncertainty({ ...base, standardUncertainty: 11, uncertaintyKind: 'standard' }))).toEqual(['warning uncertainty-larger-than-value']);
    expect(codes(checkUncertainty({ ...base, value: 41.84, printed: { value: 10 }, reportedUncertainty: 20 }))).toEqual(['warning uncertainty-larger-than-value', 'note uncertainty-unknown']);
    expect(codes(checkUncertainty({ ...base, value: null, uncertaintyKind: 'none' }))).toEqual([]);
    expect(codes(checkUncertainty({ ...base, uncertaintyScale: 'ln', reportedUncertainty: 30, uncertaintyKind: 'standard' }))).toEqual([]);
  });

  it('knows which factor to judge by', () => {
    expect(factorKindOf('desorption', 's-1')).toBe('desorption');
    expect(factorKindOf('diffusion', 's-1')).toBe('surface-first-order');
    expect(factorKindOf('adsorption', 's-1')).toBeNull();
    expect(factorKindOf('associative-desorption', 'cm2 molecule-1 s-1')).toBe('second-order-desorption');
    expect(factorKindOf('dissociation', 'cm2 molecule-1 s-1')).toBeNull();
  });
});

describe('a whole record', () => {
  const facts = (inputs: QuantityInput[], part: Partial<RecordFacts> = {}): RecordFacts => ({
    quantities: inputs.map((input) => convertQuantity(input, {})), scope: 'elementary', stepClass: 'dissociation', methodClass: 'measured', validRange: null, ...part,
  });
  const found = (inputs: QuantityInput[], part: Partial<RecordFacts> = {}): string[] => recordChecks(facts(inputs, part)).map(({ code, path }) => `${path} ${code}`);

  it.each([
    [[{ symbol: 'energy', asPrinted: '-3', unitAsPrinted: 'kJ/mol' }], {}, ['quantities.0.asPrinted negative-energy']],
    [[{ symbol: 'energy', asPrinted: '-3', unitAsPrinted: 'kJ/mol' }], { scope: null }, []],
    [[{ symbol: 'preExponential', asPrinted: '1e20', unitAsPrinted: 's-1' }], {}, ['quantities.0.asPrinted pre-exponential-unusual']],
    [[{ symbol: 'preExponential', asPrinted: '1e20', unitAsPrinted: 's-1' }], { scope: 'apparent' }, []],
    [[{ symbol: 'preExponential', asPrinted: '1e20', unitAsPrinted: 's-1' }], { stepClass: null }, []],
    [[{ symbol: 'preExponential', asPrinted: '1e20', unitAsPrinted: 'Pa-1 s-1' }], {}, []],
    [[{ symbol: 'preExponential', asPrinted: '1e12-1e20', unitAsPrinted: 's-1' }], {}, []],
    [[{ symbol: 'preExponential', asPrinted: '1e5', unitAsPrinted: 'cm2 molecule-1 s-1' }], { stepClass: 'associative-desorption' }, ['quantities.0.asPrinted pre-exponential-unusual']],
    [[{ symbol: 'preExponential', asPrinted: '-1', unitAsPrinted: 's-1' }], {}, ['quantities.0.asPrinted negative-value']],
    [[{ symbol: 'rateConstant', asPrinted: '1e17', unitAsPrinted: 's-1' }], {}, ['quantities.0.asPrinted rate-above-limit']],
    [[{ symbol: 'kie', asPrinted: '-2' }], {}, ['quantities.0.asPrinted negative-value']],
    [[{ symbol: 'kie', asPrinted: '20' }], { semiclassicalLimit: 7 }, ['quantities.0.asPrinted kie-unusual']],
    [[{ symbol: 'stickingCoefficient', asPrinted: '1.2' }], {}, ['quantities.0.asPrinted sticking-out-of-range']],
    [[{ symbol: 'stickingCoefficient', asPrinted: '0.9-1.2' }], {}, ['quantities.0.asPrinted sticking-out-of-range']],
    [[{ symbol: 'referenceTemperature', asPrinted: '0.1', unitAsPrinted: 'K' }], {}, ['quantities.0.asPrinted temperature-out-of-range']],
    [[{ symbol: 'reactionOrder', asPrinted: '1 ± 2' }], {}, ['quantities.0.asPrinted uncertainty-larger-than-value', 'quantities.0.asPrinted uncertainty-unknown']],
    [[{ symbol: 'energy', energyType: 'electronic', asPrinted: '50', unitAsPrinted: 'kJ/mol' }, { symbol: 'reactionEnergy', energyType: 'electronic', asPrinted: '70', unitAsPrinted: 'kJ/mol' }], { methodClass: 'computed', endStateReference: 'gas' }, ['quantities.0.asPrinted energy-below-reaction-energy']],
    [[{ symbol: 'energy', energyType: 'electronic', asPrinted: '50', unitAsPrinted: 'kJ/mol' }, { symbol: 'reactionEnergy', energyType: 'gibbs', asPrinted: '70', unitAsPrinted: 'kJ/mol' }], { methodClass: 'computed' }, ['conditions.endStateReference end-state-reference-missing']],
    [[{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '50', unitAsPrinted: 'kJ/mol' }], { validRange: { min: 500, max: 520 }, temperatureK: 9000 }, ['validRange valid-range-narrow', 'conditions.temperatureK temperature-out-of-range']],
    [[{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '50', unitAsPrinted: 'kJ/mol' }], { validRange: { min: 500, max: 520 }, methodClass: null }, []],
  ] as [QuantityInput[], Partial<RecordFacts>, string[]][])('%j %j', (inputs, part, expected) => {
    expect(found(inputs, part)).toEqual(expected);
  });
});

describe('outliers', () => {
  const family = [101, 104, 106, 108, 110];
  it('is silent under five', () => {
    expect(outlierCheck(25, family.slice(0, 4))).toEqual([]);
    expect(compareWithFamily(25, family.slice(0, 4))).toBeNull();
    expect(compareWithFamily(-1, family, { logarithmic: true })).toBeNull();
  });
  it('lets the family pass', () => {
    expect(outlierCheck(109, family)).toEqual([]);
    expect(compareWithFamily(109, family)).toMatchObject({ outlier: false, median: 106, hint: null });
  });
  it.each([
    [106 / 4.184, 'calorie for joule'],
    [106 * 4.184, 'calorie for joule, the other way round'],
    [106 / 96.485, 'electronvolt for kJ/mol'],
    [106 / 10, 'a power of ten (10^1)'],
    [106e5, 'a power of ten (10^-5)'],
    [53, 'a factor of 2 (per atom or per molecule)'],
  ])('sees the slip behind %d', (value, name) => {
    const [check] = outlierCheck(value, family);
    expect(check).toMatchObject({ code: 'outlier', severity: 'warning' });
    expect(compareWithFamily(value, family)?.hint?.name).toBe(name);
    expect(check?.message).toContain('would explain it');
  });
  it('has no hint where no slip fits', () => {
    const result = compareWithFamily(700, family);
    expect(result).toMatchObject({ outlier: true, hint: null });
    expect(result?.checks[0]?.message).not.toContain('explain');
  });
  it('compares logarithms and further factors', () => {
    const rates = [1e13, 2e13, 1.5e13, 3e13, 2.5e13, 1.8e13];
    expect(compareWithFamily(1.9e13 / 6.02214076e23, rates, { logarithmic: true })?.hint?.name).toBe('molecule for mole');
    expect(compareWithFamily(1.9e13 / 1.5e19, rates, { logarithmic: true, extraFactors: [{ factor: 1.5e19, name: 'site density left out' }] })?.hint?.name).toBe('site density left out');
    expect(compareWithFamily(5, [5, 5, 5, 5, 5])).toMatchObject({ outlier: false });
    expect(compareWithFamily(6, [5, 5, 5, 5, 5])?.outlier).toBe(true);
  });
  it('lists every slip once', () => {
    expect(new Set(slipFactors.map(({ factor }) => factor)).size).toBe(slipFactors.length);
  });
});
