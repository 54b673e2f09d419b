import { KineticsError, requireFinite } from './kinetics-error.ts';

/** A straight line by weighted least squares, with what is needed to judge it. */
export interface FittedLine {
  intercept: number;
  slope: number;
  /** Mean of x, weighted: the line is computed about it, so that no digits are lost. */
  meanX: number;
  meanY: number;
  sumWeights: number;
  /** Σ w (x - mean)². */
  spread: number;
  residuals: number[];
  /** Weighted sum of squared residuals. */
  rss: number;
  /** Weighted, centred; null for two points. */
  rSquared: number | null;
  /** Leverage of each point, 0 to 1. */
  leverage: number[];
}

/**
 * Fits y = intercept + slope x by weighted least squares, centred on the weighted mean.
 *
 * Source: normal equations; checked against NIST StRD Norris and statsmodels 0.13.5.
 * @throws KineticsError on fewer than two points, lists of different length, or x without any spread.
 * @example fitLine([1, 2], [3, 5]).slope // 2
 */
export function fitLine(x: readonly number[], y: readonly number[], weights?: readonly number[]): FittedLine {
  const n = x.length;
  if (n < 2 || y.length !== n || (weights !== undefined && weights.length !== n)) throw new KineticsError('points', `a line needs at least two points with x, y and weight, got ${n}`, 'missing-input', n);
  const w = (i: number): number => (weights ? (weights[i] as number) : 1);
  for (let i = 0; i < n; i += 1) {
    requireFinite(`points.${i}.x`, x[i] as number);
    requireFinite(`points.${i}.y`, y[i] as number);
  }
  let sumWeights = 0;
  let meanX = 0;
  let meanY = 0;
  for (let i = 0; i < n; i += 1) sumWeights += w(i);
  for (let i = 0; i < n; i += 1) {
    meanX += (w(i) / sumWeights) * (x[i] as number);
    meanY += (w(i) / sumWeights) * (y[i] as number);
  }
  // A second pass takes off the rounding of the first mean.
  let shiftX = 0;
  let shiftY = 0;
  for (let i = 0; i < n; i += 1) {
    shiftX += (w(i) / sumWeights) * ((x[i] as number) - meanX);
    shiftY += (w(i) / sumWeights) * ((y[i] as number) - meanY);
  }
  meanX += shiftX;
  meanY += shiftY;
  let spread = 0;
  let product = 0;
  let total = 0;
  for (let i = 0; i < n; i += 1) {
    const dx = (x[i] as number) - meanX;
    const dy = (y[i] as number) - meanY;
    spread += w(i) * dx * dx;
    product += w(i) * dx * dy;
    total += w(i) * dy * dy;
  }
  if (!(spread > 0)) throw new KineticsError('points', 'all points have the same x: no slope can be fitted', 'out-of-range', x[0]);
  const slope = product / spread;
  const residuals: number[] = [];
  const leverage: number[] = [];
  let rss = 0;
  for (let i = 0; i < n; i += 1) {
    const dx = (x[i] as number) - meanX;
    const residual = (y[i] as number) - meanY - slope * dx;
    residuals.push(residual);
    leverage.push(w(i) / sumWeights + (w(i) * dx * dx) / spread);
    rss += w(i) * residual * residual;
  }
  return { intercept: meanY - slope * meanX, slope, meanX, meanY, sumWeights, spread, residuals, rss, rSquared: n > 2 && total > 0 ? 1 - rss / total : null, leverage };
}

/**
 * Student's t of a quadratic term added to a fitted line; null with fewer than four points, or where nothing is left to judge it by.
 *
 * The term is made orthogonal to the line, so the line itself need not be fitted again.
 */
export function curvature(x: readonly number[], line: FittedLine, weights?: readonly number[]): { t: number; degreesOfFreedom: number } | null {
  const n = x.length;
  if (n < 4) return null;
  const w = (i: number): number => (weights ? (weights[i] as number) : 1);
  const scale = Math.sqrt(line.spread / line.sumWeights);
  let mean = 0;
  let slope = 0;
  const u = x.map((value) => (value - line.meanX) / scale);
  u.forEach((value, i) => {
    mean += (w(i) * value * value) / line.sumWeights;
    slope += (w(i) * value ** 3) / line.sumWeights;
  });
  let spread = 0;
  let product = 0;
  u.forEach((value, i) => {
    const q = value * value - mean - slope * value;
    spread += w(i) * q * q;
    product += w(i) * q * (line.residuals[i] as number);
  });
  if (!(spread > 1e-12 * line.sumWeights)) return null;
  const degreesOfFreedom = n - 3;
  const rest = Math.max(0, line.rss - (product * product) / spread);
  if (rest === 0) return null;
  return { t: product / Math.sqrt((spread * rest) / degreesOfFreedom), degreesOfFreedom };
}
