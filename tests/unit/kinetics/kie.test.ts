import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kieCalculator } from '#shared/calculators/kie.ts';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { bigeleisenMayer, type BigeleisenMayerInput } from '#shared/kinetics/bigeleisen-mayer.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { isotopeLimits, type IsotopeFacts } from '#shared/kinetics/isotope-limits.ts';
import { readIsotopePair } from '#shared/kinetics/isotope-pair.ts';
import { bondStretches, semiclassicalLimit } from '#shared/kinetics/isotope-stretches.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { kieFromArrheniusPair, kieFromZeroPoint, kieLineFromTwoTemperatures } from '#shared/kinetics/kie.ts';
import { checkKie } from '#shared/kinetics/plausibility.ts';
import { recordChecks } from '#shared/kinetics/record-checks.ts';
import { swainSchaad, swainSchaadFromDT } from '#shared/kinetics/kie-swain-schaad.ts';
import { tunnellingKie } from '#shared/kinetics/tunnelling.ts';
import { expectClose, referenceCases } from './reference.ts';

const cases = referenceCases('kie');
const of = (kind: string) => cases.filter((item) => item.kind === kind);

function pathOf(action: () => unknown): string {
  try {
    action();
  } catch (error) {
    if (error instanceof KineticsError) return error.path;
    throw error;
  }
  return 'accepted';
}

const numbers = (value: unknown): number[] => (value as string[]).map(Number);

describe('isotope effects from reference cases', () => {
  it.each(of('arrhenius_pair'))('$id Arrhenius pair', ({ input, expected }) => {
    const result = kieFromArrheniusPair({
      preExponentialLight: Number(input.A_H), energyLightKJPerMol: Number(input.Ea_H_J_mol) / 1000,
      preExponentialHeavy: Number(input.A_D), energyHeavyKJPerMol: Number(input.Ea_D_J_mol) / 1000, temperatureK: Number(input.T_K),
    });
    expectClose(result.kie, expected.kH_over_kD as number, 1e-11);
    expectClose(result.lnKie, expected.ln_KIE as number, 1e-11);
    expectClose(result.preExponentialRatio, expected.A_ratio as number, 1e-11);
    expectClose(result.energyDifferenceKJPerMol * 1000, expected.dEa_D_minus_H_J_mol as number, 1e-11);
  });

  it.each(of('kie_two_temperatures'))('$id two temperatures', ({ input, expected }) => {
    const result = kieLineFromTwoTemperatures({ kie1: Number(input.KIE1), temperature1K: Number(input.T1_K), kie2: Number(input.KIE2), temperature2K: Number(input.T2_K) });
    expectClose(result.energyDifferenceKJPerMol * 1000, expected.dEa_D_minus_H_J_mol as number, 1e-11);
    expectClose(result.preExponentialRatio, expected.A_ratio as number, 1e-11);
  });

  it.each(of('zpe_only'))('$id zero-point energy', ({ input, expected }) => {
    const light = Number(input['nu_H_cm-1']);
    const heavy = input['nu_D_cm-1'] === 'nu_H/sqrt(2)' ? light / Math.SQRT2 : Number(input['nu_D_cm-1']);
    const result = kieFromZeroPoint({ wavenumberLightPerCm: light, wavenumberHeavyPerCm: heavy, temperatureK: Number(input.T_K) });
    expectClose(result.kie, expected.kH_over_kD as number, 1e-11);
    expectClose(result.zeroPointDifferenceKJPerMol * 1000, expected.delta_zpe_J_mol as number, 1e-11);
  });

  it.each(of('bigeleisen_mayer'))('$id Bigeleisen–Mayer', ({ input, expected }) => {
    const result = bigeleisenMayer({
      reactantLightPerCm: numbers(input['reactant_light_cm-1']), reactantHeavyPerCm: numbers(input['reactant_heavy_cm-1']),
      transitionLightPerCm: numbers(input['ts_light_real_cm-1']), transitionHeavyPerCm: numbers(input['ts_heavy_real_cm-1']),
      imaginaryLightPerCm: Number(input['ts_imag_light_cm-1']), imaginaryHeavyPerCm: Number(input['ts_imag_heavy_cm-1']), temperatureK: Number(input.T_K),
    });
    const { imaginaryRatio, productRule, excitation, zeroPoint } = result.factors;
    expectClose(result.kie, expected.kL_over_kH as number, 1e-11);
    expectClose(imaginaryRatio * productRule, expected.MMI as number, 1e-11);
    expectClose(zeroPoint, expected.ZPE as number, 1e-11);
    expectClose(excitation, expected.EXC as number, 1e-11);
    expectClose(excitation * zeroPoint, expected.harmonic_partition_function_ratio_all_modes as number, 1e-11);
    expectClose(imaginaryRatio * productRule * excitation * zeroPoint, result.kie, 1e-13);
    const wigner = tunnellingKie({ model: 'wigner', imaginaryLightPerCm: Number(input['ts_imag_light_cm-1']), imaginaryHeavyPerCm: Number(input['ts_imag_heavy_cm-1']), temperatureK: Number(input.T_K) });
    expectClose(result.kie * wigner.kie, expected.kL_over_kH_with_wigner as number, 1e-11);
  });

  it.each(of('swain_schaad'))('$id Swain–Schaad', ({ input, expected }) => {
    const result = swainSchaad({ kie: Number(input.kH_over_kD), exponent: Number(input.exponent) });
    expectClose(result.kie, expected.kH_over_kT as number, 1e-11);
    expectClose(result.kieDT, expected.kD_over_kT as number, 1e-11);
  });

  it.each(of('swain_schaad_from_DT'))('$id Swain–Schaad from D/T', ({ input, expected }) => {
    expectClose(swainSchaadFromDT({ kie: Number(input.kD_over_kT) }).kie, expected.kH_over_kT as number, 1e-11);
    expectClose(swainSchaadFromDT({ kie: Number(input.kD_over_kT), exponent: 1.442 / 0.442 }).kie, expected['kH_over_kT_from_1.442'] as number, 1e-11);
  });

  it('holds every kind of the file here or in the tests of tunnelling', () => {
    const held = ['arrhenius_pair', 'kie_two_temperatures', 'zpe_only', 'bigeleisen_mayer', 'swain_schaad', 'swain_schaad_from_DT', 'wigner', 'wigner_kie', 'bell'];
    expect([...new Set(cases.map(({ kind }) => kind))].filter((kind) => !held.includes(kind))).toEqual([]);
  });
});

const wells: BigeleisenMayerInput = {
  reactantLightPerCm: [2900, 1400], reactantHeavyPerCm: [2100, 1050], transitionLightPerCm: [1300], transitionHeavyPerCm: [980], imaginaryLightPerCm: 1100, imaginaryHeavyPerCm: 830, temperatureK: 400,
};
const pair = { preExponentialLight: 1e13, energyLightKJPerMol: 70, preExponentialHeavy: 2e13, energyHeavyKJPerMol: 75, temperatureK: 300 };
const line = { kie1: 6, temperature1K: 300, kie2: 3, temperature2K: 400 };
const stretch = { wavenumberLightPerCm: 2900, wavenumberHeavyPerCm: 2100, temperatureK: 300 };

describe('refused input', () => {
  it.each<[string, () => unknown]>([
    ['preExponentialLight', () => kieFromArrheniusPair({ ...pair, preExponentialLight: -1 })],
    ['preExponentialHeavy', () => kieFromArrheniusPair({ ...pair, preExponentialHeavy: 0 })],
    ['energyLightKJPerMol', () => kieFromArrheniusPair({ ...pair, energyLightKJPerMol: NaN })],
    ['energyHeavyKJPerMol', () => kieFromArrheniusPair({ ...pair, energyHeavyKJPerMol: Infinity })],
    ['temperatureK', () => kieFromArrheniusPair({ ...pair, temperatureK: 0 })],
    ['temperatureK', () => kieFromArrheniusPair({ ...pair, energyHeavyKJPerMol: 1e5 })],
    ['temperatureK', () => kieFromArrheniusPair({ ...pair, energyHeavyKJPerMol: -1e5 })],
    ['kie1', () => kieLineFromTwoTemperatures({ ...line, kie1: 0 })],
    ['kie2', () => kieLineFromTwoTemperatures({ ...line, kie2: -3 })],
    ['temperature1K', () => kieLineFromTwoTemperatures({ ...line, temperature1K: -1 })],
    ['temperature2K', () => kieLineFromTwoTemperatures({ ...line, temperature2K: 0 })],
    ['temperature2K', () => kieLineFromTwoTemperatures({ ...line, temperature2K: 300 })],
    ['temperature2K', () => kieLineFromTwoTemperatures({ kie1: 1e300, temperature1K: 300, kie2: 1e-300, temperature2K: 301 })],
    ['wavenumberLightPerCm', () => kieFromZeroPoint({ ...stretch, wavenumberLightPerCm: 0 })],
    ['wavenumberHeavyPerCm', () => kieFromZeroPoint({ ...stretch, wavenumberHeavyPerCm: -2100 })],
    ['temperatureK', () => kieFromZeroPoint({ ...stretch, temperatureK: -300 })],
    ['reactantLightPerCm.1', () => bigeleisenMayer({ ...wells, reactantLightPerCm: [2900, -1400] })],
    ['reactantHeavyPerCm.0', () => bigeleisenMayer({ ...wells, reactantHeavyPerCm: [0, 1050] })],
    ['transitionLightPerCm.0', () => bigeleisenMayer({ ...wells, transitionLightPerCm: [NaN] })],
    ['transitionHeavyPerCm', () => bigeleisenMayer({ ...wells, transitionHeavyPerCm: [980, 1000] })],
    ['reactantHeavyPerCm', () => bigeleisenMayer({ ...wells, reactantHeavyPerCm: [2100] })],
    ['reactantLightPerCm', () => bigeleisenMayer({ ...wells, reactantLightPerCm: [] })],
    ['transitionHeavyPerCm', () => bigeleisenMayer({ ...wells, transitionHeavyPerCm: [] })],
    ['imaginaryLightPerCm', () => bigeleisenMayer({ ...wells, imaginaryLightPerCm: -1100 })],
    ['imaginaryHeavyPerCm', () => bigeleisenMayer({ ...wells, imaginaryHeavyPerCm: 0 })],
    ['temperatureK', () => bigeleisenMayer({ ...wells, temperatureK: 0 })],
    ['temperatureK', () => bigeleisenMayer({ ...wells, temperatureK: 0.1 })],
    ['temperatureK', () => bigeleisenMayer({ ...wells, reactantLightPerCm: [1e-20, 1], temperatureK: 1e308 })],
    ['kie', () => swainSchaad({ kie: 0 })],
    ['exponent', () => swainSchaad({ kie: 3, exponent: -1 })],
    ['kie', () => swainSchaad({ kie: 1e300 })],
    ['kie', () => swainSchaadFromDT({ kie: -1 })],
    ['exponent', () => swainSchaadFromDT({ kie: 2, exponent: 0 })],
  ])('%s', (path, action) => {
    expect(pathOf(action)).toBe(path);
  });

  it('says what to do about a count of modes', () => {
    expect(() => bigeleisenMayer({ ...wells, reactantHeavyPerCm: [2100] })).toThrow('reactantHeavyPerCm holds 1 wavenumbers and reactantLightPerCm 2');
    expect(() => bigeleisenMayer({ ...wells, reactantLightPerCm: [2900, 0] })).toThrow('reactantLightPerCm.1 must be above 0 cm-1, got 0');
  });
});

describe('what the isotope effect must obey', () => {
  const wavenumber = fc.double({ min: 20, max: 4000, noNaN: true });

  it('is 1 for two equal isotopologues, and its own inverse when light and heavy change places', () => {
    fc.assert(fc.property(fc.array(wavenumber, { minLength: 2, maxLength: 12 }), fc.array(wavenumber, { minLength: 2, maxLength: 12 }), fc.double({ min: 50, max: 2000, noNaN: true }), (light, heavy, temperatureK) => {
      const size = Math.min(light.length, heavy.length);
      const L = light.slice(0, size);
      const H = heavy.slice(0, size);
      const forward: BigeleisenMayerInput = { reactantLightPerCm: L, reactantHeavyPerCm: H, transitionLightPerCm: L.slice(1), transitionHeavyPerCm: H.slice(1), imaginaryLightPerCm: 900, imaginaryHeavyPerCm: 700, temperatureK };
      const backward: BigeleisenMayerInput = { reactantLightPerCm: H, reactantHeavyPerCm: L, transitionLightPerCm: H.slice(1), transitionHeavyPerCm: L.slice(1), imaginaryLightPerCm: 700, imaginaryHeavyPerCm: 900, temperatureK };
      expect(bigeleisenMayer(forward).lnKie).toBeCloseTo(-bigeleisenMayer(backward).lnKie, 9);
      expect(bigeleisenMayer({ ...forward, reactantHeavyPerCm: L, transitionHeavyPerCm: L.slice(1), imaginaryHeavyPerCm: 900 }).kie).toBeCloseTo(1, 12);
    }));
  });

  it('does not depend on the order of the modes', () => {
    const reordered = bigeleisenMayer({ ...wells, reactantHeavyPerCm: [1050, 2100] });
    expectClose(reordered.kie, bigeleisenMayer(wells).kie, 1e-13);
    expectClose(reordered.factors.zeroPoint, bigeleisenMayer(wells).factors.zeroPoint, 1e-13);
  });

  // Small u: (1 - e^-u_L)/(1 - e^-u_H) → u_L/u_H, so only the ratio of the imaginary wavenumbers is left, the classical limit of Bigeleisen and Mayer (1947).
  it.each([1e5, 1e9, 1e15])('goes to the ratio of the imaginary wavenumbers at %d K', (temperatureK) => {
    expectClose(bigeleisenMayer({ ...wells, temperatureK }).kie, 1100 / 830, temperatureK === 1e5 ? 1e-3 : 1e-7);
  });

  it('keeps its digits where u is large', () => {
    const cold = bigeleisenMayer({ ...wells, temperatureK: 5 });
    expect(cold.factors.excitation).toBe(1);
    expectClose(cold.kie, cold.factors.imaginaryRatio * cold.factors.productRule * cold.factors.zeroPoint, 1e-13);
  });

  it('lets the factors of the two ways agree: one stretch lost and nothing else is the zero-point estimate', () => {
    const { factors } = bigeleisenMayer({ ...wells, reactantLightPerCm: [2900, 1300], reactantHeavyPerCm: [2100, 980], temperatureK: 300 });
    expectClose(factors.zeroPoint, kieFromZeroPoint(stretch).kie, 1e-13);
  });

  it('takes A of two sizes that no double holds the ratio of', () => {
    expect(kieFromArrheniusPair({ ...pair, preExponentialLight: 1e-200, preExponentialHeavy: 1e200, energyHeavyKJPerMol: 70 + 2297 }).lnKie).toBeCloseTo(-921.034 + 920.873, 1);
  });

  it('brings D/T and H/D together', () => {
    const fromH = swainSchaad({ kie: 6.8 });
    expectClose(swainSchaadFromDT({ kie: fromH.kieDT, exponent: 1.442 / 0.442 }).kie, fromH.kie, 1e-13);
  });
});

describe('the calculator', () => {
  const run = (input: unknown) => runCalculator(kieCalculator, input);
  it.each<[Record<string, unknown>, number]>([
    [{ method: 'arrhenius-pair', ...pair }, kieFromArrheniusPair(pair).kie],
    [{ method: 'zero-point', ...stretch }, kieFromZeroPoint(stretch).kie],
    [{ method: 'bigeleisen-mayer', ...wells }, bigeleisenMayer(wells).kie],
    [{ method: 'swain-schaad', kie: 3.3 }, 5.593673346550954],
    [{ method: 'swain-schaad', kie: 3.3, exponent: 1.442 }, 5.593673346550954],
    [{ method: 'swain-schaad-from-dt', kie: 1.37 }, 2.79067363207573],
    [{ method: 'two-temperatures', ...line, temperatureK: 300 }, 6],
    [{ method: 'two-temperatures', ...line, temperatureK: 400 }, 3],
    [{ method: 'tunnelling-ratio', model: 'wigner', imaginaryLightPerCm: 1050, imaginaryHeavyPerCm: 790, temperatureK: 298.15 }, 1.289114263135687],
  ])('%j', (input, kie) => {
    const outcome = run(input);
    if (!('result' in outcome)) throw new Error(JSON.stringify(outcome));
    expectClose(outcome.result.kie as number, kie, 1e-13);
    expectClose(outcome.result.lnKie as number, Math.log(kie), 1e-12);
    expect(kieCalculator.output.parse(outcome.result)).toHaveProperty('derivation.0.reference');
  });

  it.each<[Record<string, unknown>, string]>([
    [{ method: 'bigeleisen-mayer', ...wells, reactantLightPerCm: [2900, 0] }, 'reactantLightPerCm.1'],
    [{ method: 'bigeleisen-mayer', ...wells, reactantLightPerCm: [2900, 'x'] }, 'reactantLightPerCm.1'],
    [{ method: 'two-temperatures', ...line, temperatureK: 0 }, 'temperatureK'],
    [{ method: 'zero-point', ...stretch, other: 1 }, ''],
    [{ method: 'guess' }, 'method'],
  ])('refuses %j at %s', (input, path) => {
    const outcome = run(input);
    expect('faults' in outcome && outcome.faults[0]?.path).toBe(path);
  });
});

const deuterium = { element: 'H', light: 1, heavy: 2 };

describe('the isotopes that a text compares', () => {
  it.each<[string, string | null]>([
    ['H/D', '1-2 H'], ['H2/D2', '1-2 H'], ['NH3 and ND3', '1-2 H'], ['CH4 vs CD4', '1-2 H'], ['D', '1-2 H'], ['D₂O against H₂O', '1-2 H'], ['1H/2H', '1-2 H'], ['[2H]', '1-2 H'],
    ['protium and deuterium', '1-2 H'], ['deuterated methanol', '1-2 H'], ['H/T', '1-3 H'], ['tritium', '1-3 H'], ['1H/3H', '1-3 H'], ['D/T', '2-3 H'], ['H/D at T = 500 K', '1-2 H'],
    ['H/D by DFT, TS of the step', '1-2 H'], ['CD3OH', '1-2 H'],
    ['14N/15N', '14-15 N'], ['¹⁵N', '14-15 N'], ['15N2/14N2', '14-15 N'], ['12C vs 13C', '12-13 C'], ['[13C]O', '12-13 C'], ['C-13', '12-13 C'], ['16O/18O', '16-18 O'], ['34S', '32-34 S'], ['37Cl', '35-37 Cl'],
    ['', null], ['not stated', null], ['H2', null], ['12C', null], ['H/D/T', null], ['13C and D', null], ['13C and 15N', null], ['Cd, Os and Tb', null],
  ])('%s: %s', (text, expected) => {
    const pair = readIsotopePair(text);
    expect(pair && `${pair.light}-${pair.heavy} ${pair.element}`).toBe(expected);
  });
});

describe('the semiclassical limit', () => {
  // exp[hc(ν_L - ν_H)/2k_BT] of one stretch, as for the zero-point estimate.
  it.each(bondStretches)('is the zero-point estimate of the $bond stretch', ({ bond, lightPerCm, heavyPerCm }) => {
    const estimate = kieFromZeroPoint({ wavenumberLightPerCm: lightPerCm, wavenumberHeavyPerCm: heavyPerCm, temperatureK: 350 }).kie;
    expectClose(semiclassicalLimit({ bond, temperatureK: 350, pair: deuterium })?.limit, estimate, 1e-13);
  });

  it('goes to tritium by the Swain–Schaad exponents', () => {
    const at = (light: number, heavy: number) => semiclassicalLimit({ bond: 'C-H', temperatureK: 300, pair: { element: 'H', light, heavy } })?.limit as number;
    expectClose(at(1, 3), at(1, 2) ** 1.442, 1e-12);
    expectClose(at(1, 2) * at(2, 3), at(1, 3), 1e-12);
  });

  it('takes the largest stretch where the bond is not tabulated, and is for hydrogen alone', () => {
    const unknown = semiclassicalLimit({ bond: null, temperatureK: 300, pair: deuterium });
    expect(unknown).toMatchObject({ limit: semiclassicalLimit({ bond: 'O-H', temperatureK: 300, pair: deuterium })?.limit, words: expect.stringContaining('largest') });
    expect(semiclassicalLimit({ bond: 'C-H', temperatureK: 300, pair: { element: 'N', light: 14, heavy: 15 } })).toBeNull();
    expect(pathOf(() => semiclassicalLimit({ bond: null, temperatureK: 0, pair: deuterium }))).toBe('temperatureK');
  });

  it.each<[IsotopeFacts, number | undefined, boolean]>([
    [{ isotopes: 'H/D', bond: 'C-H', temperatureK: 298.15 }, 7.025702725851153, false],
    [{ isotopes: null, labels: ['2H'], bond: 'C-H', temperatureK: 298.15 }, 7.025702725851153, false],
    [{ isotopes: 'not stated', labels: ['2H'], bond: 'C-H', validRange: { min: 298.15, max: 500 } }, 7.025702725851153, false],
    [{ isotopes: 'H/D', bond: 'C-H' }, undefined, false],
    [{ isotopes: 'H/D', temperatureK: -5 }, undefined, false],
    [{ isotopes: '14N/15N', temperatureK: 500 }, undefined, true],
    [{ labels: ['18O'] }, undefined, true],
    [{ isotopes: '37Cl' }, undefined, false],
    [{ labels: [] }, undefined, false],
    [{}, undefined, false],
  ])('%j', (facts, limit, heavyAtomIsotope) => {
    const limits = isotopeLimits(facts);
    expect(limits.heavyAtomIsotope).toBe(heavyAtomIsotope);
    if (limit === undefined) expect(limits.semiclassicalLimit).toBeUndefined();
    else expectClose(limits.semiclassicalLimit, limit, 1e-12);
  });
});

describe('isotope effects in the checks', () => {
  it.each<[number, Parameters<typeof checkKie>[1], RegExp | null]>([
    [8, { semiclassicalLimit: 7, semiclassicalLimitWords: 'C-H stretch' }, /above the semiclassical limit 7\.0 \(C-H stretch\)/],
    [0.1, { semiclassicalLimit: 7 }, /heavy over light/],
    [1 / 7, { semiclassicalLimit: 7 }, null],
    [7, { semiclassicalLimit: 7 }, null],
    [0.89, { heavyAtom: true, semiclassicalLimit: 7 }, /outside 0\.9 to 1\.15/],
    [1.16, { heavyAtom: true }, /outside 0\.9 to 1\.15/],
    [1.15, { heavyAtom: true }, null],
    [1e6, {}, null],
  ])('%d against %j', (value, limits, message) => {
    const checks = checkKie(value, limits);
    if (message === null) expect(checks).toEqual([]);
    else expect(checks).toMatchObject([{ code: 'kie-unusual', severity: 'warning', message: expect.stringMatching(message) }]);
  });

  const entry: EntryInput = {
    kind: 'kie', scope: 'elementary', provenance: 'measured', step: { equation: 'CH4 + 2* -> CH3* + H*' }, surface: { metal: 'Ni', facet: '111' }, locator: 'Table 1',
    method: { class: 'measured' }, quantities: [{ symbol: 'kie', asPrinted: '20', unitAsPrinted: '' }], conditions: { temperatureK: 600, isotopes: 'CH4/CD4', kieDirection: 'light/heavy' },
  };
  const codes = (change: Partial<EntryInput>): string[] => assessEntry({ ...entry, ...change }).checks.map(({ code }) => code);
  const kie = (asPrinted: string): Partial<EntryInput> => ({ quantities: [{ symbol: 'kie', asPrinted, unitAsPrinted: '' }] });

  it.each<[string, Partial<EntryInput>, string[]]>([
    ['beyond the stretch at its temperature', {}, ['kie-unusual']],
    ['within it', kie('2.1'), []],
    ['beyond it for a lower temperature only', { ...kie('5'), conditions: { ...entry.conditions, temperatureK: 250 } }, []],
    ['beyond it for a higher one', { ...kie('5'), conditions: { ...entry.conditions, temperatureK: 800 } }, ['kie-unusual']],
    ['printed the other way round', { ...kie('0.05'), conditions: { ...entry.conditions, kieDirection: 'heavy/light' } }, ['kie-unusual']],
    ['printed the other way round, within it', { ...kie('0.5'), conditions: { ...entry.conditions, kieDirection: 'heavy/light' } }, []],
    ['of isotopes that the step alone labels', { step: { equation: 'CD4 + 2* -> CD3* + D*' }, conditions: { temperatureK: 600 } }, ['kie-unusual']],
    ['of isotopes that nothing names', { conditions: { temperatureK: 600 } }, []],
    ['of a heavy atom', { ...kie('1.3'), conditions: { temperatureK: 600, isotopes: '12C/13C' } }, ['kie-unusual']],
    ['of no step', { step: undefined }, ['kie-unusual']],
    ['of nothing', kie('0'), []],
  ])('%s', (_what, change, expected) => {
    expect(codes(change)).toEqual(expected);
  });

  it('says which stretch and which temperature, and does not stand in the way', () => {
    const { checks, faults } = assessEntry(entry);
    expect(checks[0]?.message).toMatch(/C-H stretch 2917\/2109 cm-1 of CH4\/CD4, at 600 K/);
    expect(faults).toEqual([]);
    expect(recordChecks({ quantities: [], scope: null, stepClass: null, methodClass: null, validRange: null })).toEqual([]);
  });
});
