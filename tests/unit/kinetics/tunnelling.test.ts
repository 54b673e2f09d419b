import { describe, expect, it } from 'vitest';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { tunnellingCalculator } from '#shared/calculators/tunnelling.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { bell1935Factor, bell1959Factor, tunnellingFactor, tunnellingKie, wignerFactor, type TunnellingInput, type TunnellingKieInput, type TunnellingResult } from '#shared/kinetics/tunnelling.ts';
import { expectClose, referenceCases } from './reference.ts';

const cases = referenceCases('kie');
const of = (kind: string) => cases.filter((item) => item.kind === kind);

describe('tunnelling from reference cases', () => {
  it.each(of('wigner'))('$id Wigner', ({ input, expected }) => {
    const result = tunnellingFactor({ model: 'wigner', imaginaryPerCm: Number(input['nu_imag_cm-1']), temperatureK: Number(input.T_K) });
    expectClose(result.u, expected.u as number, 1e-11);
    expectClose(result.kappa, expected.kappa as number, 1e-11);
  });

  it.each(of('wigner_kie'))('$id ratio of Wigner factors', ({ input, expected }) => {
    const result = tunnellingKie({ model: 'wigner', imaginaryLightPerCm: Number(input['nu_imag_H_cm-1']), imaginaryHeavyPerCm: Number(input['nu_imag_D_cm-1']), temperatureK: Number(input.T_K) });
    expectClose(result.kie, expected.kappa_H_over_kappa_D as number, 1e-11);
    expectClose(result.kappaLight / result.kappaHeavy, result.kie, 1e-15);
  });

  it.each(of('bell'))('$id Bell', ({ input, expected }) => {
    const given = { imaginaryPerCm: Number(input['nu_imag_cm-1']), temperatureK: Number(input.T_K), energyKJPerMol: Number(input.E_J_mol) / 1000 };
    const second = tunnellingFactor({ model: 'bell-1959', ...given });
    expectClose(second.kappa, expected.Q_Bell_1959 as number, 1e-11);
    expectClose(second.kappa, expected.quadrature_check_of_1959 as number, 1e-11);
    expectClose(second.u, expected.u as number, 1e-11);
    expectClose(second.alpha, expected.alpha_E_over_kT as number, 1e-11);
    expectClose(second.beta, expected.beta_2piE_over_hnu as number, 1e-11);
    expectClose(tunnellingFactor({ model: 'bell-1935', ...given }).kappa, expected.Q_Bell_1935 as number, 1e-11);
    const first = expected['Q_first_term_u/2_over_sin'];
    // Where the barrier is high the first term alone is the factor; it has no meaning beyond 2π.
    if (typeof first === 'number') expectClose(second.u / 2 / Math.sin(second.u / 2), first, 1e-11);
    else expect(second.u).toBeGreaterThan(2 * Math.PI);
  });
});

/**
 * u, α and the factor of the truncated parabola: the integral (u/2π) ∫ e^(-uz/2π)/(1 + e^-z) dz from z = -β,
 * by quadrature in mpmath 1.3.0 with 30 digits. Poles of the sine at u = 2πn among them, low barriers and u far beyond 2π too.
 */
const quadratures: [number, number, number][] = [
  [0.0006283185307179586, 5e-06, 0.9999331622651134],
  [0.0006283185307179586, 0.002, 1.0000000164491343],
  [0.6283185307179586, 0.005, 0.940569196368057],
  [0.6283185307179586, 0.3, 1.0093440229457866],
  [0.6283185307179586, 2.0, 1.016640736770832],
  [3.1409643350590755, 0.024995, 0.7979204461446257],
  [3.1409643350590755, 9.998, 1.5704369539291825],
  [3.141592653589793, 0.025, 0.7978968615175286],
  [3.141592653589793, 1.5, 1.3512623360227027],
  [6.283185307179586, 0.05, 0.7184596480132863],
  [6.283185307179586, 3.0, 3.048587351573742],
  [6.283185307179586, 20.0, 20.000000002061146],
  [6.283185935498117, 0.050000005, 0.7184596376760901],
  [6.283185935498117, 3.0000003, 3.0485879614334275],
  [6.283185935498117, 20.000002, 20.000021837583052],
  [6.157521601035994, 0.049, 0.720559343975338],
  [6.157521601035994, 19.6, 16.186573308949985],
  [8.168140899333462, 0.065, 0.6935700748413529],
  [8.168140899333462, 26.0, 1743.1432513120992],
  [9.42477796076938, 4.5, 9.391280202946085],
  [12.566370614359172, 0.1, 0.6656228967254755],
  [12.566370614359172, 6.0, 34.07389914322785],
  [12.566370614359172, 40.0, 970330350.8195798],
  [12.817698026646356, 6.12, 37.93740959863309],
  [18.84955592153876, 0.15, 0.6593220320252582],
  [18.84955592153876, 60.0, 3.530778988000342e+17],
  [43.982297150257104, 0.35, 0.7421260272824046],
  [43.982297150257104, 21.0, 72293879.43670711],
  [43.982297150257104, 140.0, 1.5215443543625393e+52],
  [43.982359982110175, 0.3500005, 0.7421263275864561],
  [43.982359982110175, 21.00003, 72296032.38811973],
];

describe('the series of the truncated parabola', () => {
  it.each(quadratures)('u = %d, α = %d: %d', (u, alpha, factor) => {
    expectClose(bell1959Factor(u, alpha), factor, 1e-11);
  });

  it.each([1, 2, 3, 10])('is smooth across the pole at u = 2π × %i', (n) => {
    const at = bell1959Factor(2 * Math.PI * n, 15);
    for (const step of [1e-13, 1e-10, 1e-8, 1e-6]) {
      const [below, above] = [bell1959Factor(2 * Math.PI * n * (1 - step), 15), bell1959Factor(2 * Math.PI * n * (1 + step), 15)];
      expectClose((below + above) / 2, at, 1e-9);
    }
  });

  it('joins the two branches of the pole remainder', () => {
    const inside = bell1959Factor(2 * Math.PI * 1.04999999, 12);
    const outside = bell1959Factor(2 * Math.PI * 1.05000001, 12);
    expectClose(inside, outside, 1e-6);
    expectClose(inside, bell1959Factor(2 * Math.PI * 1.05, 12), 1e-6);
  });

  it('goes to the first term for a high barrier and to ½ for none', () => {
    expectClose(bell1959Factor(1, 500), 0.5 / Math.sin(0.5), 1e-14);
    expectClose(bell1959Factor(6000, 1e-9), 0.5, 1e-3);
  });
});

describe('the first model of Bell', () => {
  it('has its limit 1 + α at u = 2π', () => {
    expect(bell1935Factor(2 * Math.PI, 12)).toBe(13);
    expectClose(bell1935Factor(2 * Math.PI * (1 + 1e-12), 12), 13, 1e-9);
  });

  it('goes to 1 without tunnelling', () => {
    expectClose(bell1935Factor(1e-6, 12), 1, 1e-6);
  });
});

const bell: TunnellingInput = { model: 'bell-1959', imaginaryPerCm: 1400, temperatureK: 300, energyKJPerMol: 30 };
const both: TunnellingKieInput = { model: 'bell-1935', imaginaryLightPerCm: 1400, imaginaryHeavyPerCm: 1000, temperatureK: 300, energyLightKJPerMol: 30, energyHeavyKJPerMol: 32 };

describe('what is refused and what is warned of', () => {
  it.each<[string, () => unknown]>([
    ['imaginaryPerCm', () => tunnellingFactor({ ...bell, imaginaryPerCm: -1400 })],
    ['imaginaryPerCm', () => tunnellingFactor({ ...bell, imaginaryPerCm: 0 })],
    ['imaginaryPerCm', () => tunnellingFactor({ ...bell, model: 'wigner', imaginaryPerCm: -1 })],
    ['temperatureK', () => tunnellingFactor({ ...bell, temperatureK: 0 })],
    ['energyKJPerMol', () => tunnellingFactor({ ...bell, energyKJPerMol: undefined })],
    ['energyKJPerMol', () => tunnellingFactor({ ...bell, energyKJPerMol: 0 })],
    ['temperatureK', () => tunnellingFactor({ ...bell, temperatureK: 0.01 })],
    ['temperatureK', () => tunnellingFactor({ ...bell, temperatureK: 3 })],
    ['temperatureK', () => tunnellingFactor({ ...bell, model: 'bell-1935', temperatureK: 3 })],
    ['imaginaryLightPerCm', () => tunnellingKie({ ...both, imaginaryLightPerCm: 0 })],
    ['imaginaryHeavyPerCm', () => tunnellingKie({ ...both, imaginaryHeavyPerCm: NaN })],
    ['energyLightKJPerMol', () => tunnellingKie({ ...both, energyLightKJPerMol: undefined })],
    ['energyHeavyKJPerMol', () => tunnellingKie({ ...both, energyHeavyKJPerMol: -1 })],
    ['temperatureK', () => tunnellingKie({ ...both, temperatureK: -1 })],
    ['model', () => tunnellingKie({ ...both, get model(): never { throw new KineticsError('model', 'none') } })],
  ])('%s', (path, action) => {
    expect(action).toThrow(KineticsError);
    try {
      action();
    } catch (error) {
      expect((error as KineticsError).path).toBe(path);
    }
  });

  it('hands an error on that is no fault of the input', () => {
    expect(() => tunnellingKie({ ...both, get model(): never { throw new RangeError('broken') } })).toThrow(RangeError);
  });

  it.each<[Partial<TunnellingInput>, RegExp | null]>([
    [{ model: 'wigner', imaginaryPerCm: 500, temperatureK: 600 }, null],
    [{ model: 'wigner', imaginaryPerCm: 1000, temperatureK: 400 }, /not well below 2π/],
    [{ model: 'wigner', imaginaryPerCm: 1500, temperatureK: 300 }, /does not hold/],
    [{ temperatureK: 600 }, null],
    [{ temperatureK: 300 }, /foot of the barrier/],
    [{ temperatureK: 600, energyKJPerMol: 5 }, /lower than one quantum/],
  ])('%j', (change, message) => {
    const { warnings } = tunnellingFactor({ ...bell, ...change });
    if (message === null) expect(warnings).toEqual([]);
    else expect(warnings.join(' ')).toMatch(message);
  });

  it('says whose warning it is', () => {
    expect(tunnellingKie({ ...both, model: 'wigner' }).warnings.map((text) => text.slice(0, 6))).toEqual(['Light:', 'Heavy:']);
  });

  it('names the temperature of the crossover, where u is 2π', () => {
    const { crossoverTemperatureK } = tunnellingFactor(bell);
    expectClose(tunnellingFactor({ ...bell, temperatureK: crossoverTemperatureK }).u, 2 * Math.PI, 1e-14);
  });

  it('agrees for small u: every model goes to 1 + u²/24', () => {
    const given = { imaginaryPerCm: 100, temperatureK: 1000, energyKJPerMol: 200 };
    const { kappa, u } = tunnellingFactor({ model: 'bell-1959', ...given });
    expectClose(kappa, wignerFactor(u), 1e-6);
  });
});

describe('the calculator', () => {
  it('gives the factor with its warnings', () => {
    const outcome = runCalculator(tunnellingCalculator, { model: 'wigner', imaginaryPerCm: 1500, temperatureK: 300 });
    if (!('result' in outcome)) throw new Error(JSON.stringify(outcome));
    const result = tunnellingCalculator.output.parse(outcome.result) as unknown as TunnellingResult;
    expectClose(result.kappa, 3.1563321908749686, 1e-13);
    expect(result.warnings).toHaveLength(1);
    expect(result.derivation).toHaveLength(2);
  });

  it('asks for the barrier that Bell’s models need', () => {
    const outcome = runCalculator(tunnellingCalculator, { model: 'bell-1935', imaginaryPerCm: 1500, temperatureK: 300 });
    expect('faults' in outcome && outcome.faults[0]?.path).toBe('energyKJPerMol');
  });
});
