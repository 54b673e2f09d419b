import { describe, expect, it } from 'vitest';
import { rateAt } from '#shared/kinetics/arrhenius.ts';
import { parametersAtCoverage, requireCoverage, type CoverageInput } from '#shared/kinetics/coverage-energy.ts';
import { kisliukSticking, langmuirSticking } from '#shared/kinetics/coverage-sticking.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { expectClose } from './reference.ts';

const definition = 'per-adsorption-site' as const;
const base: CoverageInput = {
  energyKJPerMol: 120, preExponential: 1e13,
  terms: [
    { species: 'CO*', definition, slopeKJPerMol: 40, sign: -1, lnPreExponentialSlope: 2, range: { min: 0, max: 0.6 } },
    { species: 'O*', definition, slopeKJPerMol: 10 },
  ],
  coverages: [{ species: 'CO*', definition, theta: 0.5 }, { species: 'O*', definition, theta: 0.25 }],
};
const first = base.terms[0] as CoverageInput['terms'][number];

describe('energy at a coverage', () => {
  it('adds every term with its printed sign', () => {
    const result = parametersAtCoverage(base);
    expectClose(result.energyKJPerMol, 120 - 20 + 2.5, 1e-15);
    expectClose(result.lnPreExponential, Math.log(1e13) + 1, 1e-15);
    expectClose(result.preExponential, 1e13 * Math.E, 1e-13);
    expect(result.derivation).toHaveLength(3);
    expect(result.derivation[0]?.assumption).toContain('0 to 0.6');
  });

  it('serves the rate constant as it is', () => {
    const { energyKJPerMol, preExponential } = parametersAtCoverage(base);
    expect(rateAt({ energyKJPerMol, preExponential: preExponential as number, temperatureK: 500 }).k).toBeGreaterThan(0);
  });

  it('keeps E without terms, and gives no A without one', () => {
    expect(parametersAtCoverage({ ...base, terms: [], coverages: [] })).toMatchObject({ energyKJPerMol: 120, derivation: [{ from: '120 kJ/mol' }] });
    expect(parametersAtCoverage({ ...base, preExponential: undefined })).toMatchObject({ preExponential: null, lnPreExponential: null });
  });

  it.each<[string, Partial<CoverageInput>]>([
    ['coverages.0.theta', { coverages: [{ species: 'CO*', definition, theta: 1.2 }, { species: 'O*', definition, theta: 0 }] }],
    ['coverages.0.theta', { coverages: [{ species: 'CO*', definition, theta: -0.1 }, { species: 'O*', definition, theta: 0 }] }],
    ['coverages.0.theta', { coverages: [{ species: 'CO*', definition, theta: 0.7 }, { species: 'O*', definition, theta: 0 }] }],
    ['coverages', { coverages: [{ species: 'CO*', definition, theta: 0.5 }] }],
    ['coverages.0.definition', { coverages: [{ species: 'CO*', definition: 'per-surface-atom', theta: 0.5 }] }],
    ['terms.0.definition', { terms: [{ ...first, definition: 'per-tile' as never }] }],
    ['terms.1.species', { terms: [first, first] }],
    ['terms.0.slopeKJPerMol', { terms: [{ ...first, slopeKJPerMol: NaN }] }],
    ['terms.0.lnPreExponentialSlope', { terms: [{ ...first, lnPreExponentialSlope: Infinity }] }],
    ['terms.0.range', { terms: [{ ...first, range: { min: 0.5, max: 0.2 } }] }],
    ['terms.0.range.max', { terms: [{ ...first, range: { min: 0, max: 2 } }] }],
    ['terms', { terms: [{ ...first, lnPreExponentialSlope: 5000 }] }],
    ['preExponential', { preExponential: -1 }],
    ['energyKJPerMol', { energyKJPerMol: NaN }],
  ])('refuses at %s', (path, change) => {
    const action = () => parametersAtCoverage({ ...base, ...change });
    expect(action).toThrow(KineticsError);
    try {
      action();
    } catch (error) {
      expect((error as KineticsError).path).toBe(path);
    }
  });

  it('says for which coverages a relation holds', () => {
    expect(() => requireCoverage('theta', 0.7, { min: 0.1, max: 0.6 })).toThrow('θ = 0.7 is outside the coverages 0.1 to 0.6');
    expect(() => requireCoverage('theta', 0.05, { min: 0.1, max: 0.6 })).toThrow('θ = 0.05 is outside');
  });
});

describe('sticking at a coverage', () => {
  it.each([[0.8, 0, 1, 0.8], [0.8, 0.5, 1, 0.4], [0.8, 0.5, 2, 0.2], [0.8, 1, 2, 0], [1, 0.75, 0.5, 0.5]])('Langmuir: s0 %d, θ %d, n %d: %d', (sticking, theta, order, expected) => {
    expect(langmuirSticking({ sticking, theta, order }).sticking).toBeCloseTo(expected, 14);
  });

  // Kisliuk, J. Phys. Chem. Solids 3 (1957) 95: s/s0 = (1 - θ)/(1 + (K - 1)θ) for one site; by hand.
  it.each([
    [0.5, 0.25, 1, 0.5 / 0.625], [0.5, 4, 1, 0.2], [0, 0.25, 1, 1], [1, 0.25, 1, 0], [0.9, 0, 1, 1], [1, 0, 1, 0], [0.5, 1, 1, 0.5],
    [0.5, 1, 2, 0.25], [0.5, 0.25, 2, 0.25 / (0.25 + 0.25 * 0.75)],
  ])('Kisliuk: θ %d, K %d, %d sites: %d', (theta, precursorParameter, sites, expected) => {
    expect(kisliukSticking({ sticking: 0.6, theta, precursorParameter, sites: sites as 1 | 2 }).sticking).toBeCloseTo(0.6 * expected, 14);
  });

  it('is Langmuir’s for K = 1, above it for K below 1 and below it for K above 1', () => {
    for (const theta of [0.1, 0.4, 0.8]) {
      const blocked = langmuirSticking({ sticking: 0.6, theta }).sticking;
      const through = (precursorParameter: number) => kisliukSticking({ sticking: 0.6, theta, precursorParameter }).sticking;
      expectClose(through(1), blocked, 1e-14);
      expect(through(0.2)).toBeGreaterThan(blocked);
      expect(through(5)).toBeLessThan(blocked);
    }
  });

  it.each<[string, () => unknown]>([
    ['sticking', () => langmuirSticking({ sticking: 1.1, theta: 0.5 })],
    ['theta', () => langmuirSticking({ sticking: 0.5, theta: 1.5 })],
    ['theta', () => langmuirSticking({ sticking: 0.5, theta: 0.5, range: { min: 0, max: 0.3 } })],
    ['order', () => langmuirSticking({ sticking: 0.5, theta: 0.5, order: 0 })],
    ['sticking', () => kisliukSticking({ sticking: -1, theta: 0.5, precursorParameter: 1 })],
    ['theta', () => kisliukSticking({ sticking: 0.5, theta: NaN, precursorParameter: 1 })],
    ['precursorParameter', () => kisliukSticking({ sticking: 0.5, theta: 0.5, precursorParameter: -1 })],
    ['sites', () => kisliukSticking({ sticking: 0.5, theta: 0.5, precursorParameter: 1, sites: 3 as never })],
  ])('refuses %s', (path, action) => {
    expect(action).toThrow(KineticsError);
    try {
      action();
    } catch (error) {
      expect((error as KineticsError).path).toBe(path);
    }
  });
});
