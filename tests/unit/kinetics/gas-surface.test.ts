import { describe, expect, it } from 'vitest';
import { collisionCalculator } from '#shared/calculators/collision.ts';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { rateAt } from '#shared/kinetics/arrhenius.ts';
import { isotopeMasses, molarMass, standardAtomicWeights } from '#shared/kinetics/atomic-weights.ts';
import { collisionFlux, fluxPerPressure, langmuirExposure, meanSpeed, monolayerTime, numberDensity } from '#shared/kinetics/collision.ts';
import { N_A, R } from '#shared/kinetics/constants.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { recordChecks, type CheckedQuantity, type RecordFacts } from '#shared/kinetics/record-checks.ts';
import { activatedSticking, adsorptionConstant, collisionLimit, stickingFromRateConstant } from '#shared/kinetics/sticking.ts';
import { expectClose, referenceCases, type ReferenceCase } from './reference.ts';

const cases = referenceCases('gas_surface');
const of = (kind: string) => cases.filter((item) => item.kind === kind);
const gasOf = ({ input }: ReferenceCase) => ({ molarMassGPerMol: Number(input.molar_mass_g_mol), temperatureK: Number(input.T_K) });
const surfaceOf = (item: ReferenceCase) => ({ ...gasOf(item), siteDensityPerM2: Number(item.input['site_density_cm-2']) * 1e4 });

describe('gas and surface from reference cases', () => {
  it.each(of('flux'))('$id flux of $input.gas', (item) => {
    const { expected } = item;
    const result = collisionFlux({ ...gasOf(item), pressurePa: Number(item.input.p_Pa) });
    expectClose(result.fluxPerM2S, expected['flux_m-2_s-1'] as number, 1e-11);
    expectClose(result.fluxPerM2S / 1e4, expected['flux_cm-2_s-1'] as number, 1e-11);
    expectClose(result.meanSpeedMPerS, expected.mean_speed_m_s as number, 1e-11);
    expectClose(result.numberDensityPerM3, expected['number_density_m-3'] as number, 1e-11);
    // Kinetic theory: the flux is a quarter of number density times mean speed.
    expectClose((result.numberDensityPerM3 * result.meanSpeedMPerS) / 4, result.fluxPerM2S, 1e-14);
  });

  it.each(of('monolayer_time'))('$id time of a monolayer of $input.gas', (item) => {
    const result = monolayerTime({ ...surfaceOf(item), pressurePa: Number(item.input.p_Pa), sticking: Number(item.input.sticking) });
    expectClose(result.collisionsPerSiteS, item.expected['impingement_per_site_s-1'] as number, 1e-11);
    expectClose(result.monolayerTimeS, item.expected.seconds_per_monolayer_at_unit_sticking as number, 1e-11);
  });

  it.each(of('sticking_to_rate_constant'))('$id k from sticking of $input.gas', (item) => {
    const { expected } = item;
    const result = adsorptionConstant({ ...surfaceOf(item), sticking: Number(item.input.sticking) });
    expectClose(result.kAdsPerPaS, expected['k_Pa-1_s-1'] as number, 1e-11);
    expectClose(result.kAdsPerBarS, expected['k_bar-1_s-1'] as number, 1e-11);
    expectClose(result.kAdsPerTorrS, expected['k_Torr-1_s-1'] as number, 1e-11);
    expectClose(result.kAdsM3PerMolS, expected['k_m3_mol-1_s-1'] as number, 1e-11);
    expectClose(result.kAdsMPerS, expected['k_areal_m_s-1'] as number, 1e-11);
    // Both ways round.
    expectClose(stickingFromRateConstant({ ...surfaceOf(item), kAdsPerPaS: result.kAdsPerPaS }).sticking, Number(item.input.sticking), 1e-13);
    // k per area on concentration, brought to sites of the density given.
    expectClose((result.kAdsMPerS * N_A) / surfaceOf(item).siteDensityPerM2, result.kAdsM3PerMolS, 1e-13);
  });

  it.each(of('rate_constant_to_sticking'))('$id sticking from k of $input.gas', (item) => {
    const result = stickingFromRateConstant({ ...surfaceOf(item), kAdsPerPaS: Number(item.input['k_Pa-1_s-1']) });
    expectClose(result.sticking, item.expected.sticking as number, 1e-11);
    expect(result.aboveOne).toBe(item.expected.above_one);
  });

  it.each(of('activated_sticking'))('$id activated sticking of $input.gas', (item) => {
    const { expected, input } = item;
    const given = { ...surfaceOf(item), stickingFactor: Number(input.s0), stickingEnergyKJPerMol: Number(input.Es_J_mol) / 1000 };
    const result = activatedSticking(given);
    expectClose(result.sticking, expected.sticking as number, 1e-11);
    expectClose(result.kAdsPerPaS, expected['k_Pa-1_s-1'] as number, 1e-11);
    expectClose(result.energyPressureKJPerMol * 1000, expected.Ea_of_k_p_J_mol as number, 1e-11);
    expectClose(result.energyConcentrationKJPerMol * 1000, expected.Ea_of_k_c_J_mol as number, 1e-11);
    // The same through the modified Arrhenius form, whose local energy is the slope.
    const rate = rateAt({ preExponential: result.preExponentialPerPaS, exponent: -0.5, energyKJPerMol: given.stickingEnergyKJPerMol, temperatureK: given.temperatureK });
    expectClose(rate.k, result.kAdsPerPaS, 1e-12);
    expectClose(rate.localEnergyKJPerMol, result.energyPressureKJPerMol, 1e-12);
  });

  it.each(of('langmuir_exposure'))('$id exposure', ({ input, expected }) => {
    const result = langmuirExposure({ exposureLangmuir: Number(input.exposure_L), pressurePa: Number(input.p_Pa) });
    expectClose(result.exposurePaS, expected.exposure_Pa_s as number, 1e-11);
    expectClose(result.timeS, expected.time_s as number, 1e-11);
    expect(langmuirExposure({ exposureLangmuir: Number(input.exposure_L) }).timeS).toBeNull();
  });

  it('holds every kind of the file', () => {
    const held = ['flux', 'monolayer_time', 'sticking_to_rate_constant', 'rate_constant_to_sticking', 'activated_sticking', 'langmuir_exposure'];
    expect([...new Set(cases.map(({ kind }) => kind))].filter((kind) => !held.includes(kind))).toEqual([]);
  });
});

const gas = { molarMassGPerMol: 28.01, temperatureK: 300 };
const surface = { ...gas, siteDensityPerM2: 1.5e19 };

describe('refused and flagged', () => {
  it.each<[string, () => unknown]>([
    ['molarMassGPerMol', () => fluxPerPressure({ ...gas, molarMassGPerMol: 0 })],
    ['temperatureK', () => meanSpeed({ ...gas, temperatureK: -1 })],
    ['temperatureK', () => numberDensity({ pressurePa: 1, temperatureK: 0 })],
    ['pressurePa', () => collisionFlux({ ...gas, pressurePa: -1 })],
    ['pressurePa', () => monolayerTime({ ...surface, pressurePa: 0 })],
    ['sticking', () => monolayerTime({ ...surface, pressurePa: 1, sticking: 0 })],
    ['sticking', () => monolayerTime({ ...surface, pressurePa: 1, sticking: 1.1 })],
    ['siteDensityPerM2', () => monolayerTime({ ...surface, pressurePa: 1, siteDensityPerM2: -1 })],
    ['siteDensityPerM2', () => collisionLimit({ ...surface, siteDensityPerM2: 0 })],
    ['sticking', () => adsorptionConstant({ ...surface, sticking: 1.2 })],
    ['sticking', () => adsorptionConstant({ ...surface, sticking: -0.1 })],
    ['sticking', () => adsorptionConstant({ ...surface, sticking: NaN })],
    ['kAdsPerPaS', () => stickingFromRateConstant({ ...surface, kAdsPerPaS: -1 })],
    ['stickingFactor', () => activatedSticking({ ...surface, stickingFactor: 0, stickingEnergyKJPerMol: 1 })],
    ['stickingEnergyKJPerMol', () => activatedSticking({ ...surface, stickingFactor: 1, stickingEnergyKJPerMol: NaN })],
    ['exposureLangmuir', () => langmuirExposure({ exposureLangmuir: -1 })],
    ['pressurePa', () => langmuirExposure({ exposureLangmuir: 1, pressurePa: 0 })],
    ['isotopes', () => molarMass({ H: 2 }, { '7H': 1 })],
    ['isotopes', () => molarMass({ H: 2 }, { '2H': 3 })],
    ['isotopes', () => molarMass({ C: 1 }, { '2H': 1 })],
    ['composition', () => molarMass({ Tc: 1 })],
    ['composition', () => molarMass({})],
  ])('%s', (path, action) => {
    expect(action).toThrow(KineticsError);
    try {
      action();
    } catch (error) {
      expect((error as KineticsError).path).toBe(path);
    }
  });

  it('takes the ends of 0 to 1', () => {
    expect(adsorptionConstant({ ...surface, sticking: 0 }).kAdsPerPaS).toBe(0);
    expect(adsorptionConstant({ ...surface, sticking: 1 }).kAdsPerPaS).toBe(collisionLimit(surface));
  });

  it('flags a sticking coefficient above one, with its figure', () => {
    const { aboveOne, warnings } = stickingFromRateConstant({ ...surface, kAdsPerPaS: 2 * collisionLimit(surface) });
    expect([aboveOne, warnings[0]]).toEqual([true, expect.stringContaining('2.000')]);
    expect(activatedSticking({ ...surface, stickingFactor: 0.5, stickingEnergyKJPerMol: -10 }).aboveOne).toBe(true);
  });
});

describe('molar masses', () => {
  // Sums by hand from IUPAC, Standard atomic weights of the elements 2021, Pure Appl. Chem. 94 (2022) 573; AME 2020 for the isotopes.
  it.each<[Record<string, number>, Record<string, number>, number]>([
    [{ C: 1, O: 1 }, {}, 28.01],
    [{ N: 2 }, {}, 28.014],
    [{ C: 1, H: 4 }, {}, 16.043],
    [{ N: 1, H: 3 }, { '2H': 3 }, 14.007 + 3 * 2.014102],
    [{ N: 2 }, { '15N': 1 }, 14.007 + 15.000109],
  ])('%j %j', (composition, isotopes, mass) => {
    expectClose(molarMass(composition, isotopes), mass, 1e-12);
  });

  it('tabulates isotopes next to their mass number, and weights that grow save where nature turns them round', () => {
    for (const [isotope, mass] of Object.entries(isotopeMasses)) expect(Math.abs(mass - Number.parseInt(isotope, 10))).toBeLessThan(0.05);
    const symbols = Object.keys(standardAtomicWeights);
    const reversed = symbols.filter((symbol, i) => i > 0 && (standardAtomicWeights[symbol] as number) < (standardAtomicWeights[symbols[i - 1] as string] as number));
    // Periodic table: argon and potassium, cobalt and nickel, tellurium and iodine; thorium and protactinium.
    expect(reversed).toEqual(['K', 'Ni', 'I', 'Pa']);
  });
});

describe('the calculator', () => {
  const run = (input: Record<string, unknown>): Record<string, unknown> => {
    const outcome = runCalculator(collisionCalculator, { ...gas, ...input });
    if (!('result' in outcome)) return { fault: outcome.faults[0]?.path };
    return collisionCalculator.output.parse(outcome.result);
  };
  const names = (input: Record<string, unknown>): string[] => Object.keys(run(input)).filter((name) => name !== 'derivation').sort();

  it('gives what the input allows', () => {
    expect(names({})).toEqual(['meanSpeedMPerS']);
    expect(names({ pressurePa: 1 })).toEqual(['fluxPerM2S', 'meanSpeedMPerS', 'numberDensityPerM3']);
    expect(names({ sticking: 0.5 })).toEqual(['meanSpeedMPerS']);
    expect(names({ siteDensityPerM2: 1.5e19 })).toEqual(['collisionLimitPerPaS', 'meanSpeedMPerS']);
    expect(names({ siteDensityPerM2: 1.5e19, pressurePa: 1 })).toContain('monolayerTimeS');
    expect(names({ siteDensityPerM2: 1.5e19, pressurePa: 0 })).not.toContain('monolayerTimeS');
    expect(names({ siteDensityPerM2: 1.5e19, sticking: 0, pressurePa: 1 })).not.toContain('monolayerTimeS');
    expect(names({ exposureLangmuir: 1 })).toEqual(['exposurePaS', 'meanSpeedMPerS']);
    expect(names({ exposureLangmuir: 1, pressurePa: 1 })).toContain('exposureTimeS');
  });

  it('takes sticking in each of its ways', () => {
    expectClose(run({ siteDensityPerM2: 1.5e19, sticking: 0.8 }).kAdsPerPaS as number, 1532.9409358869873, 1e-11);
    expectClose(run({ siteDensityPerM2: 1.5e19, kAdsPerPaS: 1532.9409358869873 }).sticking as number, 0.8, 1e-11);
    const activated = run({ siteDensityPerM2: 1.5e19, stickingFactor: 0.8, stickingEnergyKJPerMol: 10, pressurePa: 1 });
    expectClose(activated.sticking as number, 0.8 * Math.exp(-10000 / (R * 300)), 1e-12);
    expectClose(activated.monolayerTimeS as number, 1 / (activated.kAdsPerPaS as number), 1e-12);
    expect(run({ siteDensityPerM2: 1.5e19, kAdsPerPaS: 1e9, pressurePa: 1 })).toMatchObject({ aboveOne: true });
    expect((run({ siteDensityPerM2: 1.5e19, sticking: 0.5, pressurePa: 1 }).derivation as unknown[]).length).toBeGreaterThan(4);
  });

  it.each<[Record<string, unknown>, string]>([
    [{ sticking: 2 }, 'sticking'],
    [{ molarMassGPerMol: -1 }, 'molarMassGPerMol'],
    [{ siteDensityPerM2: 0 }, 'siteDensityPerM2'],
    [{ sticking: 0.5, kAdsPerPaS: 1, siteDensityPerM2: 1e19 }, 'kAdsPerPaS'],
    [{ sticking: 0.5, stickingFactor: 0.1, siteDensityPerM2: 1e19 }, 'stickingFactor'],
    [{ stickingEnergyKJPerMol: 5, siteDensityPerM2: 1e19 }, 'stickingFactor'],
    [{ stickingFactor: 0.5, siteDensityPerM2: 1e19 }, 'stickingEnergyKJPerMol'],
    [{ kAdsPerPaS: 1 }, 'siteDensityPerM2'],
    [{ beamEnergyEV: 1 }, ''],
  ])('refuses %j at %s', (input, path) => {
    expect(run(input).fault).toBe(path);
  });
});

describe('adsorption constants against the collision limit', () => {
  // 1.5e19 sites per m2: the limit of CO at 300 K is 1532.94/0.8 = 1916 Pa-1 s-1 (reference case G019).
  const entry: EntryInput = {
    kind: 'rate-constant', scope: 'elementary', provenance: 'measured', step: { equation: 'CO + * -> CO*' }, surface: { metal: 'Ni', facet: '111' }, locator: 'Table 1',
    method: { class: 'measured' }, quantities: [{ symbol: 'rateConstant', asPrinted: '2000', unitAsPrinted: 'Pa-1 s-1' }], conditions: { temperatureK: 300, siteDensityPerM2: 1.5e19 },
  };
  const k = (asPrinted: string, unitAsPrinted: string): Partial<EntryInput> => ({ quantities: [{ symbol: 'rateConstant', asPrinted, unitAsPrinted }] });
  it.each<[string, Partial<EntryInput>, boolean]>([
    ['above it', {}, true],
    ['below it', k('1900', 'Pa-1 s-1'), false],
    ['above it, printed per bar', k('2.0e8', 'bar-1 s-1'), true],
    ['below it, printed per bar', k('1.9e8', 'bar-1 s-1'), false],
    ['above it, on concentration', k('5.0e6', 'm3 mol-1 s-1'), true],
    ['below it, on concentration', k('4.7e6', 'm3 mol-1 s-1'), false],
    ['of no known site density', { conditions: { temperatureK: 300 } }, false],
    ['of no known temperature', { conditions: { siteDensityPerM2: 1.5e19 } }, false],
    ['at the lower end of its range', { conditions: { siteDensityPerM2: 1.5e19 }, validRange: { min: 300, max: 400 } }, true],
    ['of a gas without a standard weight', { step: { equation: 'Rn + * -> Rn*' } }, false],
    ['of deuterium, heavier than hydrogen', { ...k('6000', 'Pa-1 s-1'), step: { equation: 'D2 + 2* -> 2D*' } }, true],
    ['of hydrogen', { ...k('6000', 'Pa-1 s-1'), step: { equation: 'H2 + 2* -> 2H*' } }, false],
    ['of half a molecule', { step: { equation: '1/2 N2 + * -> N*' } }, false],
    ['of a step without a gas', { ...k('2000', 's-1'), step: { equation: 'CO* -> CO + *' } }, false],
    ['of a step that cannot be read', { step: { equation: 'CO + * ->' } }, false],
  ])('%s', (_what, change, flagged) => {
    expect(assessEntry({ ...entry, ...change }).checks.some(({ code }) => code === 'rate-above-limit')).toBe(flagged);
  });

  const facts: RecordFacts = { quantities: [], scope: null, stepClass: 'adsorption', methodClass: null, validRange: null, temperatureK: 300, siteDensityPerM2: 1.5e19, gasMolarMassGPerMol: 28.01 };
  const plain = { symbol: 'rateConstant', standardUncertainty: null, reportedUncertainty: null, uncertaintyKind: 'none', uncertaintyScale: 'linear' } as const;
  it.each<[Partial<CheckedQuantity>, Partial<RecordFacts>, number]>([
    [{ value: 2000, unit: 'Pa-1 s-1' }, {}, 1],
    [{ value: null, low: 2000, high: 3000, unit: 'Pa-1 s-1' }, {}, 1],
    [{ value: 5, unit: 'm s-1', siteValue: 2000, siteUnit: 'Pa-1 s-1' }, {}, 1],
    [{ value: 5, unit: 'm s-1', siteValue: null, siteUnit: 'Pa-1 s-1' }, {}, 0],
    [{ value: 1e17, unit: 's-1' }, {}, 1],
    [{ value: 2000, unit: 'Pa-1 s-1' }, { gasMolarMassGPerMol: null }, 0],
    [{ value: 2000, unit: 'Pa-1 s-1' }, { temperatureK: null }, 0],
    [{ value: 2000, unit: 'Pa-1 s-1' }, { temperatureK: -300 }, 0],
    [{ value: 2000, unit: 'Pa-1 s-1' }, { siteDensityPerM2: null }, 0],
  ])('%j, %j: %i', (quantity, change, count) => {
    const checks = recordChecks({ ...facts, ...change, quantities: [{ ...plain, ...quantity } as CheckedQuantity] });
    expect(checks.filter(({ code }) => code === 'rate-above-limit')).toHaveLength(count);
  });
});
