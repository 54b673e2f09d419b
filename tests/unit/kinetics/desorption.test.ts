import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { desorptionCalculator } from '#shared/calculators/desorption.ts';
import { R } from '#shared/kinetics/constants.ts';
import { peakReducedEnergy, scaledExponentialIntegral } from '#shared/kinetics/desorption-integral.ts';
import { desorptionFromHeatingRates, type HeatingRatesInput } from '#shared/kinetics/desorption-heating.ts';
import { desorptionEnergyFromPeak, type DesorptionPeakInput } from '#shared/kinetics/desorption-peak.ts';
import { expectClose, faultOf } from './reference.ts';

interface Run {
  order: 1 | 2;
  nu: number;
  energyKJPerMol: number;
  heatingRate: number;
  coverage: number;
}

/** Heats a surface by the rate equation -dθ/dt = ν θ^m exp(-E/RT), by fourth-order Runge–Kutta steps of 0.02 K, and finds the highest rate by a parabola through the three highest points. */
function heat({ order, nu, energyKJPerMol, heatingRate, coverage }: Run): { peakK: number; left: number } {
  const loss = (T: number, theta: number): number => (nu / heatingRate) * theta ** order * Math.exp((-energyKJPerMol * 1000) / (8.31446261815324 * T));
  const step = 0.02;
  let T = 50;
  let theta = coverage;
  let before = { T, rate: 0, theta };
  let here = { T, rate: 0, theta };
  for (;;) {
    const k1 = loss(T, theta);
    const k2 = loss(T + step / 2, theta - (step / 2) * k1);
    const k3 = loss(T + step / 2, theta - (step / 2) * k2);
    const k4 = loss(T + step, theta - step * k3);
    theta -= (step / 6) * (k1 + 2 * k2 + 2 * k3 + k4);
    T += step;
    const next = { T, rate: loss(T, theta), theta };
    if (next.rate < here.rate) {
      const shift = (step / 2) * ((before.rate - next.rate) / (before.rate - 2 * here.rate + next.rate));
      return { peakK: here.T + shift, left: (here.theta - shift * here.rate) / coverage };
    }
    [before, here] = [here, next];
  }
}

const runs: Run[] = [
  { order: 1, nu: 1e13, energyKJPerMol: 120, heatingRate: 2, coverage: 1 },
  { order: 1, nu: 1e13, energyKJPerMol: 35, heatingRate: 5, coverage: 0.3 },
  { order: 1, nu: 3e16, energyKJPerMol: 210, heatingRate: 10, coverage: 0.5 },
  { order: 1, nu: 1e9, energyKJPerMol: 80, heatingRate: 0.5, coverage: 1 },
  { order: 2, nu: 1e13, energyKJPerMol: 100, heatingRate: 2, coverage: 0.5 },
  { order: 2, nu: 1e13, energyKJPerMol: 100, heatingRate: 2, coverage: 0.05 },
  { order: 2, nu: 1e9, energyKJPerMol: 75, heatingRate: 10, coverage: 1 },
  // cm2 s-1 and cm-2: only νθ0 counts.
  { order: 2, nu: 1e-2, energyKJPerMol: 160, heatingRate: 5, coverage: 4e14 },
];

const peakOf = (run: Run, peakTemperatureK: number): DesorptionPeakInput => ({
  peakTemperatureK, heatingRateKPerS: run.heatingRate, order: run.order, preExponential: run.nu, initialCoverage: run.order === 2 ? run.coverage : undefined,
});

describe('energy from one peak', () => {
  // The rate equation integrated step by step, with nothing of the computing core in it.
  it.each(runs)('recovers E of a heated surface: order $order, ν $nu, E $energyKJPerMol, β $heatingRate, θ0 $coverage', (run) => {
    const { peakK, left } = heat(run);
    const result = desorptionEnergyFromPeak(peakOf(run, peakK));
    expectClose(result.energyIntegratedKJPerMol, run.energyKJPerMol, 1e-6);
    expectClose(result.coverageLeftAtPeak, left, 1e-4);
    // Redhead's condition: exact for first order, low by about 2/x² for second.
    const x = run.energyKJPerMol / ((R * peakK) / 1000);
    if (run.order === 1) expect(result.energyKJPerMol).toBe(result.energyIntegratedKJPerMol);
    else expectClose((run.energyKJPerMol - result.energyKJPerMol) / run.energyKJPerMol, 2 / (x * x), 0.25);
  });

  it('satisfies the condition at the peak', () => {
    fc.assert(
      fc.property(fc.double({ min: 6, max: 20, noNaN: true }), fc.double({ min: 50, max: 1500, noNaN: true }), fc.double({ min: 1e-3, max: 100, noNaN: true }), fc.double({ min: 1e-3, max: 1, noNaN: true }), fc.constantFrom(1 as const, 2 as const), (lgNu, T, beta, theta, order) => {
        const result = desorptionEnergyFromPeak({ peakTemperatureK: T, heatingRateKPerS: beta, order, preExponential: 10 ** lgNu, initialCoverage: theta });
        const factor = order === 1 ? 10 ** lgNu : 10 ** lgNu * theta;
        const E = result.energyKJPerMol * 1000;
        expectClose(E / (R * T * T), (factor / beta) * Math.exp(-E / (R * T)), 1e-11);
        // The numerical derivative of E by the decade of ν.
        const more = desorptionEnergyFromPeak({ peakTemperatureK: T, heatingRateKPerS: beta, order, preExponential: 10 ** (lgNu + 1e-5), initialCoverage: theta });
        expectClose((more.energyKJPerMol - result.energyKJPerMol) / 1e-5, result.energyPerDecadeKJPerMol, 1e-4);
      }),
    );
  });

  // Lambert's W, mpmath 1.2.1 (30 digits): E = R T_p W(νT_p/β).
  it('equals figures of another program', () => {
    expectClose(desorptionEnergyFromPeak({ peakTemperatureK: 500, heatingRateKPerS: 5, order: 1, preExponential: 1e13 }).energyKJPerMol, 129.29621150490547, 1e-14);
    const second = desorptionEnergyFromPeak({ peakTemperatureK: 400, heatingRateKPerS: 2, order: 2, preExponential: 1e13, initialCoverage: 0.5 });
    expectClose(second.energyKJPerMol, 103.43696920392436, 1e-14);
    expectClose(second.energyIntegratedKJPerMol, 103.62076391516533, 1e-14);
    expectClose(second.coverageLeftAtPeak, 0.5293484734552522, 1e-14);
  });

  // The rule of Redhead (1962), E/RT_p = ln(νT_p/β) - 3.64, is meant for ν/β near 1e13 K-1; its bound of 1.5 % is from memory.
  it.each([1e12, 1e13, 1e14])('is within 1.5 percent of the linear rule for ν/β = %d K-1', (ratio) => {
    for (const T of [200, 500, 1000]) {
      const { reducedEnergy } = desorptionEnergyFromPeak({ peakTemperatureK: T, heatingRateKPerS: 1, order: 1, preExponential: ratio });
      expectClose(reducedEnergy, Math.log(ratio * T) - 3.64, 0.015);
    }
  });

  it('holds its figures for extreme factors', () => {
    for (const preExponential of [1e-250, 1e250]) {
      const { energyKJPerMol, energyIntegratedKJPerMol } = desorptionEnergyFromPeak({ peakTemperatureK: 300, heatingRateKPerS: 1, order: 2, preExponential, initialCoverage: preExponential < 1 ? 1e260 : 1 });
      expect(energyIntegratedKJPerMol).toBeGreaterThan(energyKJPerMol);
      expect(Number.isFinite(energyIntegratedKJPerMol)).toBe(true);
    }
  });

  it('says what it takes for granted', () => {
    const [condition, integrated] = desorptionEnergyFromPeak({ peakTemperatureK: 400, heatingRateKPerS: 2, order: 2, preExponential: 1e13, initialCoverage: 0.5 }).derivation;
    expect(condition?.assumption).toContain('θ0/2 is left at the peak; ν is that of -dθ/dt');
    expect(condition?.operation).toContain('T_p = 400 K, β = 2 K/s, θ0 = 0.5');
    expect(integrated?.operation).toContain('1/θ_p = 1/θ0');
    expect(desorptionEnergyFromPeak({ peakTemperatureK: 400, heatingRateKPerS: 2, order: 1, preExponential: 1e13 }).derivation).toHaveLength(1);
  });

  // mpmath 1.2.1 (30 digits): expint(2, x) e^x, and Lambert's W of 1e15.
  it.each([[1, 0.4036526376768059], [1.5, 0.32761499606262556], [30, 0.03130783723059624], [700, 0.0014245071893793158]] as const)('has e^x E₂(x) at x = %d', (x, expected) => {
    expectClose(scaledExponentialIntegral(x), expected, 1e-14);
  });

  it('solves x e^x', () => {
    expectClose(peakReducedEnergy(15 * Math.LN10), 31.101519711594776, 1e-15);
    expectClose(peakReducedEnergy(1), 1, 1e-15);
  });
});

describe('variation of the heating rate', () => {
  const rates = [0.5, 1, 2, 5, 10, 20];
  const simulate = (run: Omit<Run, 'heatingRate'>, list = rates) => list.map((heatingRate) => ({ heatingRateKPerS: heatingRate, peakTemperatureK: heat({ ...run, heatingRate }).peakK }));

  it.each([
    { order: 1 as const, nu: 1e13, energyKJPerMol: 120, coverage: 1 },
    { order: 1 as const, nu: 1e15, energyKJPerMol: 60, coverage: 1 },
  ])('finds E and ν of a heated surface, first order: ν $nu, E $energyKJPerMol', (run) => {
    const result = desorptionFromHeatingRates({ points: simulate(run) });
    expectClose(result.energyKJPerMol, run.energyKJPerMol, 1e-5);
    expectClose(result.lnPreExponential, Math.log(run.nu), 1e-5);
    expectClose(result.preExponential, run.nu, 1e-3);
    expect(result.uEnergyKJPerMol).toBeLessThan(1e-3);
    expect(result.rSquared).toBeGreaterThan(0.999999);
  });

  it('finds E and ν of a second order, with the coverage', () => {
    const run = { order: 2 as const, nu: 1e13, energyKJPerMol: 100, coverage: 0.5 };
    const result = desorptionFromHeatingRates({ points: simulate(run), order: 2, initialCoverage: 0.5 });
    // Redhead's θ0/2 at the peak shifts both a little.
    expectClose(result.energyKJPerMol, 100, 2e-3);
    expectClose(result.lnPreExponential, Math.log(1e13), 0.01);
    const without = desorptionFromHeatingRates({ points: simulate(run), order: 2 });
    expect(without).toMatchObject({ energyKJPerMol: result.energyKJPerMol, preExponential: null, lnPreExponential: null, uLnPreExponential: null, ciLnPreExponential: null, correlation: null });
    expect(without.warnings.map(({ code }) => code)).toContain('no-coverage');
    expect(result.warnings.map(({ code }) => code)).not.toContain('no-coverage');
    expect(without.derivation).toHaveLength(2);
  });

  const scattered = [[0.5, 471.2], [1, 480.9], [2, 490.1], [5, 503.8], [10, 513.6], [20, 525.5]].map(([heatingRateKPerS = 0, peakTemperatureK = 0]) => ({ heatingRateKPerS, peakTemperatureK }));

  it('has the errors of a line through ln(T_p²/β), carried to E and ν', () => {
    const result = desorptionFromHeatingRates({ points: scattered });
    // Normal equations written out, 1/T_p about its mean.
    const x = scattered.map(({ peakTemperatureK }) => 1 / peakTemperatureK);
    const y = scattered.map(({ heatingRateKPerS, peakTemperatureK }) => Math.log(peakTemperatureK ** 2 / heatingRateKPerS));
    const n = x.length;
    const meanX = x.reduce((a, b) => a + b) / n;
    const meanY = y.reduce((a, b) => a + b) / n;
    const sxx = x.reduce((a, b) => a + (b - meanX) ** 2, 0);
    const slope = x.reduce((a, b, i) => a + (b - meanX) * ((y[i] as number) - meanY), 0) / sxx;
    const intercept = meanY - slope * meanX;
    const variance = x.reduce((a, b, i) => a + ((y[i] as number) - intercept - slope * b) ** 2, 0) / (n - 2);
    const uSlope = Math.sqrt(variance / sxx);
    expectClose(result.energyKJPerMol, (slope * R) / 1000, 1e-9);
    expectClose(result.uEnergyKJPerMol, (uSlope * R) / 1000, 1e-8);
    expectClose(result.lnPreExponential, Math.log(slope) - intercept, 1e-9);
    // ln ν = ln(slope) - meanY + slope meanX, of slope and meanY, which are not correlated.
    const bySlope = 1 / slope + meanX;
    expectClose(result.uLnPreExponential, Math.sqrt((bySlope * uSlope) ** 2 + variance / n), 1e-8);
    expectClose(result.correlation, (bySlope * uSlope) / Math.sqrt((bySlope * uSlope) ** 2 + variance / n), 1e-8);
    // Student t of 0.975 with 4 degrees of freedom: GUM table G.2, 2.776.
    expectClose((result.ciLnPreExponential?.[1] as number) - (result.lnPreExponential as number), 2.7764451051977943 * (result.uLnPreExponential as number), 1e-9);
    expect(result.warnings).toEqual([]);
    result.residuals.forEach((residual, i) => expect(residual).toBeCloseTo((y[i] as number) - intercept - slope * (x[i] as number), 9));
  });

  it('covers the true E about as often as a 95 % interval should', () => {
    // Peaks of a first order with E = 120 kJ/mol and ν = 1e13 s-1, each read with an error of 0.5 K; a fixed seed.
    const exact = simulate({ order: 1, nu: 1e13, energyKJPerMol: 120, coverage: 1 });
    let state = 12345;
    const uniform = (): number => {
      state = (state * 1103515245 + 12345) % 2147483648;
      return (state + 0.5) / 2147483648;
    };
    const normal = (): number => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
    let inside = 0;
    for (let i = 0; i < 1000; i += 1) {
      const [low, high] = desorptionFromHeatingRates({ points: exact.map((point) => ({ ...point, peakTemperatureK: point.peakTemperatureK + 0.5 * normal() })) }).ciEnergyKJPerMol as [number, number];
      if (low <= 120 && high >= 120) inside += 1;
    }
    expect(inside).toBeGreaterThan(925);
    expect(inside).toBeLessThan(975);
  });

  it('has no errors from two points, and warns', () => {
    const result = desorptionFromHeatingRates({ points: scattered.slice(0, 2) });
    expect(result).toMatchObject({ uEnergyKJPerMol: null, ciEnergyKJPerMol: null, uLnPreExponential: null, ciLnPreExponential: null, correlation: null, degreesOfFreedom: 0 });
    expect(result.warnings).toEqual([{ code: 'few-points', message: expect.any(String) }, { code: 'small-span', message: expect.stringContaining('1/T_p spans') }]);
  });

  it('has errors of 0 and no correlation where the line is exact', () => {
    // Powers of two throughout, so that nothing is rounded.
    const points = [[1, 256], [65536, 512], [1, 256], [65536, 512]].map(([heatingRateKPerS = 0, peakTemperatureK = 0]) => ({ heatingRateKPerS, peakTemperatureK }));
    const result = desorptionFromHeatingRates({ points });
    expect(result).toMatchObject({ uEnergyKJPerMol: 0, uLnPreExponential: 0, correlation: null, residuals: [0, 0, 0, 0] });
    expect(result.ciLnPreExponential).toEqual([result.lnPreExponential, result.lnPreExponential]);
  });

  it('warns of a bend in its own words', () => {
    const bent = [[0.5, 460], [1, 478], [2, 490.1], [5, 503.8], [10, 509], [20, 512]].map(([heatingRateKPerS = 0, peakTemperatureK = 0]) => ({ heatingRateKPerS, peakTemperatureK }));
    expect(desorptionFromHeatingRates({ points: bent }).warnings.find(({ code }) => code === 'curvature')?.message).toContain('ln(T_p²/β) against 1/T_p is curved');
  });

  it('writes a derivation that arrives at E and ν', () => {
    for (const extra of [{}, { order: 2 as const, initialCoverage: 0.25 }]) {
      const result = desorptionFromHeatingRates({ points: scattered, ...extra });
      expect(result.derivation.map(({ to }) => parseFloat(to)).slice(1)).toEqual([result.energyKJPerMol, result.preExponential]);
      expect(result.derivation[0]?.operation).toContain('0.5 K/s 471.2 K');
    }
  });
});

describe('what is refused', () => {
  const peak: DesorptionPeakInput = { peakTemperatureK: 500, heatingRateKPerS: 5, order: 1, preExponential: 1e13 };
  const points = [{ heatingRateKPerS: 1, peakTemperatureK: 480 }, { heatingRateKPerS: 10, peakTemperatureK: 510 }];
  it.each([
    [{ ...peak, peakTemperatureK: 0 }, 'peakTemperatureK', 'out-of-range'],
    [{ ...peak, heatingRateKPerS: -1 }, 'heatingRateKPerS', 'out-of-range'],
    [{ ...peak, preExponential: NaN }, 'preExponential', 'not-finite'],
    [{ ...peak, preExponential: 0.02 }, 'preExponential', 'out-of-range'],
    [{ ...peak, order: 0 }, 'order', 'unsupported'],
    [{ ...peak, order: 2 }, 'initialCoverage', 'missing-input'],
    [{ ...peak, order: 2, initialCoverage: 0 }, 'initialCoverage', 'out-of-range'],
  ] as [DesorptionPeakInput, string, string][])('peak %j', (input, path, code) => expect(faultOf(() => desorptionEnergyFromPeak(input))).toEqual([path, code]));

  it.each([
    [{ points: [] }, 'points', 'missing-input'],
    [{ points: points.slice(0, 1) }, 'points', 'missing-input'],
    [{ points: [points[0], { heatingRateKPerS: 1, peakTemperatureK: 481 }] }, 'points', 'missing-input'],
    [{ points: [points[0], { heatingRateKPerS: 10, peakTemperatureK: 480 }] }, 'points', 'out-of-range'],
    [{ points: [points[0], { heatingRateKPerS: 10, peakTemperatureK: 470 }] }, 'points', 'out-of-range'],
    [{ points: [points[0], { heatingRateKPerS: 0, peakTemperatureK: 470 }] }, 'points.1.heatingRateKPerS', 'out-of-range'],
    [{ points: [{ heatingRateKPerS: 1, peakTemperatureK: NaN }, points[1]] }, 'points.0.peakTemperatureK', 'not-finite'],
    [{ points: [points[0], { heatingRateKPerS: 1e-300, peakTemperatureK: 1e20 }] }, 'points.1.heatingRateKPerS', 'out-of-range'],
    [{ points: [{ heatingRateKPerS: 1e300, peakTemperatureK: 1e-10 }, points[1]] }, 'points.0.heatingRateKPerS', 'out-of-range'],
    [{ points, order: 3 }, 'order', 'unsupported'],
    [{ points, order: 2, initialCoverage: -1 }, 'initialCoverage', 'out-of-range'],
  ] as [HeatingRatesInput, string, string][])('heating rates %j', (input, path, code) => expect(faultOf(() => desorptionFromHeatingRates(input))).toEqual([path, code]));
});

describe('the calculator', () => {
  const run = (input: unknown): Record<string, unknown> => {
    const calculation = runCalculator(desorptionCalculator, input);
    return 'result' in calculation ? calculation.result : { faults: calculation.faults.map(({ path }) => path) };
  };
  const points = [{ heatingRateKPerS: 1, peakTemperatureK: 480 }, { heatingRateKPerS: 10, peakTemperatureK: 510 }, { heatingRateKPerS: 4, peakTemperatureK: 498 }];

  it.each([
    [{ method: 'peak', peakTemperatureK: 500, heatingRateKPerS: 5, order: 1, preExponential: 1e13 }, 129.29621150490547],
    [{ method: 'peak', peakTemperatureK: 400, heatingRateKPerS: 2, order: 2, preExponential: 1e13, initialCoverage: 0.5 }, 103.43696920392436],
    [{ method: 'heating-rates', points: points.slice(0, 2) }, 147.99494467755252],
  ])('answers %j with what its output schema declares', (input, energy) => {
    const result = run(input);
    expect(desorptionCalculator.output.strict().parse(result)).toEqual(result);
    expectClose(result.energyKJPerMol as number, energy, 1e-12);
  });

  it('gives ln ν where ν leaves double precision', () => {
    const result = run({ method: 'heating-rates', points: [{ heatingRateKPerS: 1, peakTemperatureK: 300 }, { heatingRateKPerS: 1e9, peakTemperatureK: 302 }] });
    expect(result).toMatchObject({ preExponential: null });
    expect(result.lnPreExponential).toBeGreaterThan(700);
  });

  it.each([
    [{ method: 'guess' }, 'method'],
    [{ method: 'peak', peakTemperatureK: 500, heatingRateKPerS: 5, order: 3, preExponential: 1e13 }, 'order'],
    [{ method: 'peak', peakTemperatureK: 500, heatingRateKPerS: 5, order: 2, preExponential: 1e13 }, 'initialCoverage'],
    [{ method: 'heating-rates', points: [points[0]] }, 'points'],
    [{ method: 'heating-rates', points: [points[0], { heatingRateKPerS: 2, peakTemperatureK: -3 }] }, 'points.1.peakTemperatureK'],
  ])('refuses %j', (input, path) => expect(run(input)).toEqual({ faults: [path] }));
});
