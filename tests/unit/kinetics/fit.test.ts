import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitArrhenius, type FitInput } from '#shared/kinetics/fit.ts';
import { curvature, fitLine } from '#shared/kinetics/least-squares.ts';
import { expectClose, referenceCases } from './reference.ts';

interface Expected {
  n: number;
  df: number;
  ln_A: number;
  A: number;
  Ea_J_mol: number;
  R2: number | null;
  correlation_lnA_Ea: number;
  residual_sd_lnk: number | null;
  se_ln_A: number | null;
  se_Ea_J_mol: number | null;
  ci95_ln_A: [number, number] | null;
  ci95_Ea_J_mol: [number, number] | null;
}
interface Data {
  T_K: number[];
  k: number[];
  sigma_k: number[] | null;
  note?: string;
}

const cases = referenceCases('arrhenius_fit');
const fits = cases.filter((item) => item.kind.startsWith('lnk'));
const variants = fits.flatMap((item) => Object.keys(item.expected).map((covariance) => ({ id: item.id, covariance, data: item.input as unknown as Data, expected: item.expected[covariance] as Expected })));

describe('fit of k against T', () => {
  // Normal equations in mpmath 1.2.1 (50 digits); statsmodels 0.13.5 and R 4.2.2 lm agree.
  it.each(variants)('$id, $covariance', ({ id, covariance, data, expected }) => {
    const result = fitArrhenius({
      points: data.T_K.map((temperatureK, i) => ({ temperatureK, k: data.k[i] as number, u: data.sigma_k?.[i] })),
      weights: data.sigma_k ? 'given' : 'none',
      covariance: covariance === 'scaled' ? 'scaled' : 'absolute',
    });
    expectClose(result.lnPreExponential, expected.ln_A, 1e-9);
    expectClose(result.energyKJPerMol * 1000, expected.Ea_J_mol, 1e-9);
    expectClose(result.preExponential, expected.A, 1e-8);
    expect([result.n, result.degreesOfFreedom]).toEqual([expected.n, expected.df]);
    expectClose(result.correlation, expected.correlation_lnA_Ea, 1e-9);
    // Residual statistics of an exact line are rounding noise.
    if (/exact/i.test(`${id} ${data.note ?? ''}`)) return;
    const pairs: [number | null, number | null | undefined, number][] = [
      [result.uLnPreExponential, expected.se_ln_A, 1],
      [result.uEnergyKJPerMol, expected.se_Ea_J_mol, 1000],
      [result.residualSd, expected.residual_sd_lnk, 1],
      [result.rSquared, expected.R2, 1],
      [result.ciLnPreExponential?.[0] ?? null, expected.ci95_ln_A?.[0] ?? null, 1],
      [result.ciLnPreExponential?.[1] ?? null, expected.ci95_ln_A?.[1] ?? null, 1],
      [result.ciEnergyKJPerMol?.[0] ?? null, expected.ci95_Ea_J_mol?.[0] ?? null, 1000],
      [result.ciEnergyKJPerMol?.[1] ?? null, expected.ci95_Ea_J_mol?.[1] ?? null, 1000],
    ];
    for (const [actual, wanted, scale] of pairs) {
      if (wanted === undefined) continue;
      if (wanted === null) expect(actual).toBeNull();
      else expectClose((actual ?? NaN) * scale, wanted, 1e-8, id);
    }
  });

  it('has every standard error null for two points', () => {
    const result = fitArrhenius({ points: [{ temperatureK: 300, k: 0.0012 }, { temperatureK: 350, k: 0.045 }], weights: 'none', covariance: 'scaled' });
    expect(result).toMatchObject({ uLnPreExponential: null, uEnergyKJPerMol: null, ciLnPreExponential: null, ciEnergyKJPerMol: null, residualSd: null, rSquared: null, degreesOfFreedom: 0 });
    expect(result.warnings.map(({ code }) => code)).toEqual(['few-points']);
  });

  it('finds A and E of an exact line', () => {
    fc.assert(
      fc.property(fc.double({ min: 5, max: 40, noNaN: true }), fc.double({ min: 5, max: 200, noNaN: true }), fc.integer({ min: 2, max: 12 }), (lnA, E, n) => {
        const points = Array.from({ length: n }, (_, i) => ({ temperatureK: 300 + 25 * i, k: Math.exp(lnA - (E * 1000) / (8.31446261815324 * (300 + 25 * i))) }));
        const result = fitArrhenius({ points, weights: 'none', covariance: 'scaled' });
        expect(Math.abs(result.energyKJPerMol - E)).toBeLessThan(1e-9 * (E + 100));
        expect(Math.abs(result.lnPreExponential - lnA)).toBeLessThan(1e-8);
        expect(result.warnings.filter(({ code }) => code === 'curvature' || code === 'decisive-point')).toEqual([]);
      }),
    );
  });

  const codes = (points: FitInput['points'], part: Partial<FitInput> = {}): string[] => fitArrhenius({ points, weights: 'none', covariance: 'scaled', ...part }).warnings.map(({ code }) => code);
  const line = (temperatures: number[], noise: (i: number, T: number) => number, u?: number[]) =>
    temperatures.map((temperatureK, i) => {
      const k = Math.exp(25 - 8000 / temperatureK + noise(i, temperatureK));
      return { temperatureK, k, ...(u ? { u: k * (u[i] as number) } : {}) };
    });

  it('warns of a small span, curvature and a decisive point', () => {
    const noise = (i: number): number => (i % 2 === 0 ? 0.02 : -0.02);
    expect(codes(line([400, 450, 500, 550, 600, 650], noise))).toEqual([]);
    expect(codes(line([500, 503, 506, 509, 512, 515], noise))).toEqual(['small-span']);
    expect(codes(line([400, 450, 500, 550, 600, 650], (i, T) => noise(i) / 10 + 2e6 * (1 / T - 0.002) ** 2))).toContain('curvature');
    expect(codes(line([500, 501, 502, 503, 900], noise))).toContain('decisive-point');
    expect(codes(line([400, 450, 500, 550, 600], noise, [0.1, 0.1, 0.1, 0.1, 1e-9]), { weights: 'given' })).toContain('decisive-point');
  });

  it.each([
    [{ points: [{ temperatureK: 300, k: 1 }] }, 'points', /at least two points, got 1/],
    [{ points: [{ temperatureK: 300, k: 1 }, { temperatureK: 300, k: 2 }] }, 'points', /same x/],
    [{ points: [{ temperatureK: 300, k: 1 }, { temperatureK: -1, k: 2 }] }, 'points.1.temperatureK', /T must be above 0 K, got -1/],
    [{ points: [{ temperatureK: 300, k: 1 }, { temperatureK: 400, k: 0 }] }, 'points.1.k', /k must be above 0/],
    [{ points: [{ temperatureK: 300, k: 1, u: 1 }, { temperatureK: 400, k: 2 }], weights: 'given' }, 'points.1.u', /point 2 has no standard uncertainty/],
    [{ points: [{ temperatureK: 300, k: 1 }, { temperatureK: 400, k: 2 }], covariance: 'absolute' }, 'covariance', /absolute errors need/],
  ] as [Partial<FitInput>, string, RegExp][])('refuses %j', (part, path, message) => {
    const run = () => fitArrhenius({ points: [], weights: 'none', covariance: 'scaled', ...part });
    expect(run).toThrow(expect.objectContaining({ path }));
    expect(run).toThrow(message);
  });
});

describe('straight line', () => {
  // NIST StRD, certified values: the source of each case is in the file.
  const certified = cases.filter((item) => item.kind === 'nist_strd' && (item.expected.B as number[]).length === 2 && /B0 \+ B1/.test(item.input.model ?? ''));
  it('has certified sets to be held to', () => {
    expect(certified.length).toBeGreaterThan(0);
  });
  it.each(certified)('$id', ({ input, expected }) => {
    const { x, y } = input as unknown as { x: number[]; y: number[] };
    const fitted = fitLine(x, y);
    const [b0, b1] = expected.B as [number, number];
    expectClose(fitted.intercept, b0, 1e-9);
    expectClose(fitted.slope, b1, 1e-9);
    expectClose(fitted.rss, expected.rss as number, 1e-9);
    expectClose(fitted.rSquared, expected.R2 as number, 1e-9);
  });

  it('refuses what is no line', () => {
    expect(() => fitLine([1], [1])).toThrow('at least two points');
    expect(() => fitLine([1, 2], [1])).toThrow('at least two points');
    expect(() => fitLine([1, 2], [1, NaN])).toThrow('points.1.y must be a finite number');
  });

  it('has no curvature to judge with three points, two distinct x, or an exact parabola', () => {
    expect(curvature([1, 2, 3], fitLine([1, 2, 3], [1, 2, 4]))).toBeNull();
    expect(curvature([1, 1, 2, 2], fitLine([1, 1, 2, 2], [1, 2, 3, 5]))).toBeNull();
    expect(Math.abs(curvature([0, 1, 2, 3], fitLine([0, 1, 2, 3], [0, 1, 4, 9]))?.t ?? Infinity)).toBeGreaterThan(1e6);
  });
});
