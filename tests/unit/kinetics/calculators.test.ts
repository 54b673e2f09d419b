import { describe, expect, it } from 'vitest';
import { runCalculator, type Calculator } from '#shared/calculators/calculator.ts';
import { changeBasisCalculator } from '#shared/calculators/change-basis.ts';
import { eyringCalculator } from '#shared/calculators/eyring.ts';
import { fitCalculator } from '#shared/calculators/fit.ts';
import { calculators } from '#shared/calculators/registry.ts';
import { siteDensityCalculator } from '#shared/calculators/site-density.ts';
import { twoTemperatureCalculator } from '#shared/calculators/two-temperature.ts';
import { uncertaintyCalculator } from '#shared/calculators/uncertainty.ts';
import { R } from '#shared/kinetics/constants.ts';
import { expectClose, referenceCases } from './reference.ts';

function run(one: Calculator, input: unknown): Record<string, unknown> {
  const calculation = runCalculator(one, input);
  if (!('result' in calculation)) throw new Error(JSON.stringify(calculation.faults));
  // What a calculator returns is what its output declares.
  return one.output.parse(calculation.result) as Record<string, unknown>;
}

function faultPath(one: Calculator, input: unknown): string | null {
  const calculation = runCalculator(one, input);
  return 'faults' in calculation ? (calculation.faults[0]?.path ?? '') : null;
}

const arrhenius = referenceCases('arrhenius');

describe('calculators', () => {
  it('are each registered once, and say what they do, where it holds and by which source', () => {
    const names = calculators.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    for (const name of ['change-basis', 'two-temperature', 'eyring', 'fit', 'site-density', 'uncertainty']) expect(names).toContain(name);
    for (const { title, summary, formulas, validity, references } of calculators) {
      for (const text of [title, summary, validity, ...formulas, ...references]) expect(text.length).toBeGreaterThan(3);
      expect(formulas.length * references.length).toBeGreaterThan(0);
    }
  });
});

describe('change of basis', () => {
  const base = { preExponential: 1e7, energyKJPerMol: 35, gasOrder: 1, from: 'concentration', to: 'pressure' };
  it('keeps E and lowers n', () => {
    const result = run(changeBasisCalculator, base);
    expect(result).toMatchObject({ exponent: -1, energyKJPerMol: 35, referenceTemperatureK: 1 });
    expectClose(result.preExponential as number, 1e7 / R, 1e-15);
    expect(JSON.stringify(result.derivation)).toContain('T0 = 1 K, as none is stated');
  });
  it.each([
    [{ ...base, preExponential: 0 }, 'preExponential'],
    [{ ...base, referenceTemperatureK: -1 }, 'referenceTemperatureK'],
    [{ ...base, gasOrder: 9 }, 'gasOrder'],
    [{ ...base, gasOrder: 5, referenceTemperatureK: 1e300 }, 'preExponential'],
    [{ ...base, gasOrder: 5, referenceTemperatureK: 1e300, from: 'pressure', to: 'concentration' }, 'preExponential'],
    [{ ...base, to: 'mass' }, 'to'],
    [{ ...base, extra: 1 }, ''],
  ])('refuses %j', (input, path) => {
    expect(faultPath(changeBasisCalculator, input)).toBe(path);
  });
});

describe('two temperatures', () => {
  // E = R ln(k2/k1)/(1/T1 - 1/T2); mpmath 1.2.1.
  it.each(arrhenius.filter(({ kind }) => kind === 'two_temperature_inversion'))('$id', ({ input, expected }) => {
    const result = run(twoTemperatureCalculator, { k1: Number(input.k1), temperature1K: Number(input.T1_K), k2: Number(input.k2), temperature2K: Number(input.T2_K) });
    expectClose(result.energyKJPerMol as number, (expected.Ea_J_mol as number) / 1000, 1e-12);
    expectClose(result.preExponential as number, expected.A as number, 1e-11);
  });
  it('gives ln A where A leaves double precision', () => {
    expect(run(twoTemperatureCalculator, { k1: 1, temperature1K: 300, k2: 1e9, temperature2K: 301 })).toMatchObject({ preExponential: null });
    expect(run(twoTemperatureCalculator, { k1: 1e9, temperature1K: 300, k2: 1, temperature2K: 301 })).toMatchObject({ preExponential: null });
  });
  it('refuses equal temperatures', () => {
    expect(faultPath(twoTemperatureCalculator, { k1: 1, temperature1K: 300, k2: 2, temperature2K: 300 })).toBe('temperature2K');
  });
});

describe('Eyring', () => {
  const surface = { temperatureK: 500, phase: 'surface', molecularity: 1 };
  // IUPAC Gold Book E02142; mpmath 1.2.1 with 40 digits.
  it.each(arrhenius.filter(({ kind }) => kind.startsWith('eyring_to_arrhenius')))('$id', ({ kind, input, expected }) => {
    const result = run(eyringCalculator, {
      direction: 'to-arrhenius', enthalpyKJPerMol: Number(input.dH_J_mol) / 1000, entropyJPerMolK: Number(input.dS_J_mol_K), temperatureK: Number(input.T_K),
      phase: kind.includes('gas') ? 'gas' : 'surface', molecularity: kind.includes('bimolecular') ? 2 : 1, ...(input.standard_state ? { standardState: input.standard_state } : {}),
    });
    expectClose(result.energyKJPerMol as number, (expected.Ea_J_mol as number) / 1000, 1e-12);
    expectClose(result.k as number, (expected['k_s-1'] ?? expected['k_m3_mol-1_s-1'] ?? expected.k) as number, 1e-11);
  });
  it('comes back to where it began', () => {
    const there = run(eyringCalculator, { direction: 'to-arrhenius', enthalpyKJPerMol: 72.4, entropyJPerMolK: -35.2, ...surface });
    const back = run(eyringCalculator, { direction: 'to-eyring', preExponential: there.preExponential, energyKJPerMol: there.energyKJPerMol, ...surface });
    expectClose(back.enthalpyKJPerMol as number, 72.4, 1e-13);
    expectClose(back.entropyJPerMolK as number, -35.2, 1e-12);
    expectClose(back.gibbsKJPerMol as number, there.gibbsKJPerMol as number, 1e-13);
  });
  it('gives null for a k below double precision, and keeps A and E', () => {
    expect(run(eyringCalculator, { direction: 'to-arrhenius', enthalpyKJPerMol: 9000, entropyJPerMolK: 0, ...surface })).toMatchObject({ k: null, unit: 's-1' });
  });
  it.each([
    [{ direction: 'to-arrhenius', enthalpyKJPerMol: 1, entropyJPerMolK: 1e5, ...surface }, 'k'],
    [{ direction: 'to-arrhenius', enthalpyKJPerMol: 1, entropyJPerMolK: 1, ...surface, temperatureK: 0 }, 'temperatureK'],
    [{ direction: 'to-eyring', preExponential: -1, energyKJPerMol: 1, ...surface }, 'preExponential'],
    [{ direction: 'to-eyring', preExponential: 1, energyKJPerMol: 1, ...surface, molecularity: 3 }, 'molecularity'],
    [{ direction: 'sideways' }, 'direction'],
  ])('refuses %j', (input, path) => {
    expect(faultPath(eyringCalculator, input)).toBe(path);
  });
});

describe('fit', () => {
  const points = [{ temperatureK: 300, k: 0.0012 }, { temperatureK: 350, k: 0.045 }];
  it('has no errors from two points', () => {
    const result = run(fitCalculator, { points });
    expectClose(result.energyKJPerMol as number, 63.28233912561672, 1e-12);
    expect(result).toMatchObject({ uEnergyKJPerMol: null, ciEnergyKJPerMol: null, rSquared: null, n: 2, degreesOfFreedom: 0 });
    expect(result.warnings).toEqual([expect.objectContaining({ code: 'few-points' })]);
  });
  it('gives ln A where A leaves double precision', () => {
    expect(run(fitCalculator, { points: [{ temperatureK: 300, k: 1 }, { temperatureK: 301, k: 1e9 }] })).toMatchObject({ preExponential: null });
    expect(run(fitCalculator, { points: [{ temperatureK: 300, k: 1e9 }, { temperatureK: 301, k: 1 }] })).toMatchObject({ preExponential: null });
  });
  it.each([
    [{ points: [points[0]] }, 'points'],
    [{ points: [points[0], { temperatureK: 350, k: -1 }] }, 'points.1.k'],
    [{ points, weights: 'given' }, 'points.0.u'],
    [{ points, covariance: 'absolute' }, 'covariance'],
  ])('refuses %j', (input, path) => {
    expect(faultPath(fitCalculator, input)).toBe(path);
  });
});

describe('density of surface atoms', () => {
  // ase 3.22.1, geometry of the ideal cell.
  it.each(referenceCases('site_density'))('$id', ({ input, expected }) => {
    const result = run(siteDensityCalculator, { structure: input.structure, facet: input.face, aAngstrom: Number(input.a_A) });
    expectClose(result.perM2 as number, expected.sites_per_m2 as number, 1e-13);
    expectClose(result.molPerM2 as number, expected.mol_per_m2 as number, 1e-13);
  });
  it.each([
    [{ structure: 'hcp', facet: '111', aAngstrom: 2.7 }, 'facet'],
    [{ structure: 'fcc', facet: '211', aAngstrom: 3.5 }, 'facet'],
    [{ structure: 'fcc', facet: '111', aAngstrom: 0 }, 'aAngstrom'],
    [{ structure: 'cubic', facet: '111', aAngstrom: 1 }, 'structure'],
  ])('refuses %j', (input, path) => {
    expect(faultPath(siteDensityCalculator, input)).toBe(path);
  });
});

describe('standard uncertainty', () => {
  const cases = referenceCases('uncertainty');
  const of = (kind: string) => cases.filter((item) => item.kind === kind);
  const standard = (input: unknown) => run(uncertaintyCalculator, input).standardUncertainty as number;
  // JCGM 100:2008 (GUM) 4.3 and annex G, by scipy 1.10.1 and mpmath 1.2.1.
  it.each(of('expanded_to_standard'))('$id expanded', ({ input, expected }) => {
    expectClose(standard({ kind: 'expanded', value: Number(input.U), coverageFactor: Number(input.k) }), expected.u as number, 1e-14);
  });
  it.each(of('confidence_interval_normal'))('$id normal interval', ({ input, expected }) => {
    expectClose(standard({ kind: 'confidence', halfWidth: expected.half_width, level: Number(input.level) }), expected.u as number, 1e-11);
  });
  it.each(of('confidence_interval_student_t'))('$id Student interval', ({ input, expected }) => {
    expectClose(standard({ kind: 'confidence', halfWidth: Number(input.half_width), level: Number(input.level), degreesOfFreedom: Number(input.df) }), expected.u as number, 1e-12);
  });
  it.each(of('rectangular_half_width'))('$id rectangular', ({ input, expected }) => {
    expectClose(standard({ kind: 'rectangular', halfWidth: Number(input.a) }), expected.u as number, 1e-14);
  });
  it.each(of('triangular_half_width'))('$id triangular', ({ input, expected }) => {
    expectClose(standard({ kind: 'triangular', halfWidth: Number(input.a) }), expected.u as number, 1e-14);
  });
  it.each(of('factor_uncertainty'))('$id factor', ({ input, expected }) => {
    const result = run(uncertaintyCalculator, { kind: 'factor', factor: Number(input.factor), level: input.coverage === 'one_sigma' ? 0.6826894921370859 : 0.95 });
    expectClose(result.standardUncertainty as number, expected.u_ln as number, 1e-11);
    expect(result.scale).toBe('ln');
  });
  it('says what it took for granted', () => {
    expect(run(uncertaintyCalculator, { kind: 'confidence', halfWidth: 1, level: 0.95 }).derivation).toEqual([expect.objectContaining({ assumption: expect.stringContaining('no degrees of freedom are stated') })]);
    expect(run(uncertaintyCalculator, { kind: 'confidence', halfWidth: 1, level: 0.95, degreesOfFreedom: 4 }).derivation).toEqual([expect.objectContaining({ assumption: expect.stringContaining('Student t with 4') })]);
  });
  it.each([
    [{ kind: 'expanded', value: -1, coverageFactor: 2 }, 'value'],
    [{ kind: 'expanded', value: 1, coverageFactor: 0 }, 'coverageFactor'],
    [{ kind: 'confidence', halfWidth: -1, level: 0.95 }, 'halfWidth'],
    [{ kind: 'confidence', halfWidth: 1, level: 95 }, 'level'],
    [{ kind: 'confidence', halfWidth: 1, level: 0.95, degreesOfFreedom: 0 }, 'degreesOfFreedom'],
    [{ kind: 'rectangular', halfWidth: -1 }, 'halfWidth'],
    [{ kind: 'triangular', halfWidth: -1 }, 'halfWidth'],
    [{ kind: 'factor', factor: 0.5, level: 0.95 }, 'factor'],
    [{ kind: 'factor', factor: 2, level: 1 }, 'level'],
    [{ kind: 'unknown', halfWidth: 1 }, 'kind'],
  ])('refuses %j', (input, path) => {
    expect(faultPath(uncertaintyCalculator, input)).toBe(path);
  });
});
