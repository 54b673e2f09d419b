import { KineticsError } from './kinetics-error.ts';

/** A value with its standard uncertainty, in one unit. */
export interface UncertainValue {
  value: number;
  /** Standard uncertainty, above 0. */
  u: number;
}

/** Values as deviations from the most precise one, in units of a power of two near the smallest uncertainty: rounding then follows the spread and not the size. */
export interface Centred {
  /** The value that is 0 among the deviations. */
  centre: number;
  /** Size of one unit of the deviations. */
  scale: number;
  deviations: number[];
  variances: number[];
}

/** Mean and scatter under weights 1/(u² + τ²), on the scale of `Centred`. */
export interface Weighting {
  /** Weighted mean of the deviations. */
  mean: number;
  sumWeights: number;
  /** Σ w (x - mean)². */
  q: number;
  /** Σ w² (x - mean)². */
  q2: number;
  /** Σw - Σw²/Σw, from positive terms alone. */
  spreadOfWeights: number;
}

/**
 * Centres values on the most precise one and scales them.
 *
 * @throws KineticsError where uncertainties, or values and uncertainties, differ by more than squares in double precision can hold.
 * @example centre([{ value: 72.5, u: 1 }, { value: 73, u: 2 }]).deviations // [0, 0.5]
 */
export function centre(values: readonly UncertainValue[]): Centred {
  const first = values.reduce((best, one) => (one.u < best.u ? one : best));
  const scale = 2 ** Math.floor(Math.log2(first.u));
  const deviations = values.map(({ value }) => (value - first.value) / scale);
  const variances = values.map(({ u }) => (u / scale) ** 2);
  values.forEach((one, i) => {
    const size = scale * scale;
    if (size > 0 && size < Infinity && Number.isFinite((variances[i] as number) ** 2) && Number.isFinite((deviations[i] as number) ** 4)) return;
    throw new KineticsError(`values.${i}.u`, `value ${i + 1} (${one.value}, u ${one.u}) cannot be pooled in double precision: its size is too far from 1, or from the smallest uncertainty, ${first.u}`, 'out-of-range', one.u);
  });
  return { centre: first.value, scale, deviations, variances };
}

/**
 * Weighted mean and scatter for a variance τ² between the values (on the scale of `Centred`).
 *
 * @example weigh({ centre: 0, scale: 1, deviations: [0, 3], variances: [1, 1] }, 0).mean // 1.5
 */
export function weigh({ deviations, variances }: Centred, tau2: number): Weighting {
  let sumWeights = 0;
  let product = 0;
  let pairs = 0;
  for (let i = 0; i < deviations.length; i += 1) {
    const w = 1 / ((variances[i] as number) + tau2);
    pairs += w * sumWeights;
    sumWeights += w;
    product += w * (deviations[i] as number);
  }
  const mean = product / sumWeights;
  let q = 0;
  let q2 = 0;
  for (let i = 0; i < deviations.length; i += 1) {
    const w = 1 / ((variances[i] as number) + tau2);
    const distance = (deviations[i] as number) - mean;
    q += w * distance * distance;
    q2 += w * w * distance * distance;
  }
  return { mean, sumWeights, q, q2, spreadOfWeights: (2 * pairs) / sumWeights };
}

/**
 * The root of f between `low`, where it is above 0, and `high`, where it is not, to the last digit.
 * False position by the Illinois rule (Dowell and Jarratt, BIT 11 (1971) 168), with a halving wherever three steps have not halved the bracket.
 */
function rootBetween(f: (x: number) => number, low: number, high: number): number {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  let last = NaN;
  let width = b - a;
  for (let step = 1; ; step += 1) {
    const middle = a + (b - a) / 2;
    const stalls = step % 3 === 0 && b - a > width / 2;
    if (step % 3 === 0) width = b - a;
    const chord = b - (fb * (b - a)) / (fb - fa);
    const x = !stalls && chord > a && chord < b ? chord : middle;
    if (!(x > a && x < b) || Math.abs(x - last) <= Number.EPSILON * x) return x;
    const value = f(x);
    if (value > 0) {
      if (last === a) fb /= 2;
      [a, fa] = [x, value];
    } else {
      if (last === b) fa /= 2;
      [b, fb] = [x, value];
    }
    last = x;
  }
}

/** No estimate of τ² lies beyond: half the square of the range for Paule–Mandel; the square, or the largest variance, for the restricted likelihood. */
function rangeSquared({ deviations }: Centred): number {
  return (Math.max(...deviations) - Math.min(...deviations)) ** 2;
}

/** τ² of DerSimonian and Laird, from one step of moments: (Q - k + 1)/(Σw - Σw²/Σw), cut at 0. */
function momentTau2(data: Centred): number {
  const { q, spreadOfWeights } = weigh(data, 0);
  return Math.max(0, (q - (data.deviations.length - 1)) / spreadOfWeights);
}

/** τ² of Paule and Mandel, at which Q(τ²) = k - 1; 0 where Q(0) is below that already. Q falls with τ², so there is one root. */
function pauleMandelTau2(data: Centred): number {
  const expected = data.deviations.length - 1;
  const excess = (tau2: number): number => weigh(data, tau2).q - expected;
  return excess(0) > 0 ? rootBetween(excess, 0, rangeSquared(data)) : 0;
}

/** ln of the restricted likelihood, less a constant. */
function restrictedLikelihood(data: Centred, tau2: number): number {
  const { q, sumWeights } = weigh(data, tau2);
  return -0.5 * (data.variances.reduce((sum, v) => sum + Math.log(v + tau2), 0) + Math.log(sumWeights) + q);
}

const gridPerDecade = 6;
const largestGrid = 200;

/** τ² at the highest maximum of the restricted likelihood over τ² >= 0. There can be several: every one between the points of a fine grid is solved and the highest taken. */
function restrictedTau2(data: Centred): number {
  // Twice the slope of the restricted likelihood.
  const slope = (tau2: number): number => {
    const { q2, spreadOfWeights } = weigh(data, tau2);
    return q2 - spreadOfWeights;
  };
  const start = Math.min(...data.variances) * 1e-3;
  const end = 1.01 * Math.max(...data.variances, rangeSquared(data));
  const steps = Math.min(largestGrid, Math.ceil(gridPerDecade * Math.log10(end / start)));
  const ratio = (end / start) ** (1 / steps);
  const maxima: number[] = [];
  let before = 0;
  let rising = slope(0) > 0;
  if (!rising) maxima.push(0);
  for (let i = 0; i <= steps; i += 1) {
    const here = start * ratio ** i;
    const now = slope(here) > 0;
    if (rising && !now) maxima.push(rootBetween(slope, before, here));
    before = here;
    rising = now;
  }
  return maxima.reduce((best, one) => (restrictedLikelihood(data, one) > restrictedLikelihood(data, best) ? one : best));
}

/** Models of pooling. */
export const poolModels = ['reml', 'dersimonian-laird', 'paule-mandel', 'fixed'] as const;

/** One of `poolModels`. */
export type PoolModel = (typeof poolModels)[number];

const estimators: Record<PoolModel, (data: Centred) => number> = {
  reml: restrictedTau2,
  'dersimonian-laird': momentTau2,
  'paule-mandel': pauleMandelTau2,
  fixed: () => 0,
};

/**
 * Variance τ² between two or more values, over and above their uncertainties, on the scale of `Centred`; 0 in the fixed-effect model.
 *
 * Solved to the last digit: the mean is sensitive to it, and loose tolerances move it by up to 1e-3.
 * Sources: DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177; Paule and Mandel, J. Res. Natl. Bur. Stand. 87 (1982) 377;
 * Viechtbauer, J. Educ. Behav. Stat. 30 (2005) 261 (restricted maximum likelihood).
 * @example betweenVariance({ centre: 0, scale: 1, deviations: [0, 3], variances: [1, 1] }, 'dersimonian-laird') // 3.5
 */
export function betweenVariance(data: Centred, model: PoolModel): number {
  return estimators[model](data);
}
