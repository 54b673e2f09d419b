import { KineticsError, requirePositive } from './kinetics-error.ts';
import { normalCoverageFactor } from './normal.ts';

const lanczos = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905,
  -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
];

/** Natural logarithm of the gamma function for x >= 0.5 (Lanczos, g = 7). */
export function logGamma(x: number): number {
  let sum = lanczos[0] as number;
  for (let i = 1; i < lanczos.length; i += 1) sum += (lanczos[i] as number) / (x - 1 + i);
  const t = x + 6.5;
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Continued fraction of the incomplete beta function (Lentz); DLMF 8.17.22. */
function betaFraction(a: number, b: number, x: number): number {
  const tiny = 1e-300;
  let cTerm = 1;
  let dTerm = 1 - ((a + b) * x) / (a + 1);
  if (Math.abs(dTerm) < tiny) dTerm = tiny;
  dTerm = 1 / dTerm;
  let result = dTerm;
  for (let m = 1; m <= 100000; m += 1) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    dTerm = 1 / (1 + even * dTerm);
    cTerm = 1 + even / cTerm;
    result *= dTerm * cTerm;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    dTerm = 1 / (1 + odd * dTerm);
    cTerm = 1 + odd / cTerm;
    const change = dTerm * cTerm;
    result *= change;
    if (Math.abs(change - 1) < 1e-16) break;
  }
  return result;
}

/** Two-sided tail probability P(|t| > value) of Student's distribution with `degreesOfFreedom`. */
export function studentTwoSidedTail(value: number, degreesOfFreedom: number): number {
  const a = degreesOfFreedom / 2;
  const b = 0.5;
  const x = degreesOfFreedom / (degreesOfFreedom + value * value);
  const y = (value * value) / (degreesOfFreedom + value * value);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log(y));
  if (value === 0) return 1;
  return x < (a + 1) / (a + b + 2) ? (front * betaFraction(a, b, x)) / a : 1 - (front * betaFraction(b, a, y)) / b;
}

function studentDensity(value: number, degreesOfFreedom: number): number {
  return Math.exp(
    logGamma((degreesOfFreedom + 1) / 2) - logGamma(degreesOfFreedom / 2) - 0.5 * Math.log(degreesOfFreedom * Math.PI) -
      ((degreesOfFreedom + 1) / 2) * Math.log1p((value * value) / degreesOfFreedom),
  );
}

/**
 * The t that encloses a two-sided probability `level` of Student's distribution; the normal z when no degrees of freedom are given.
 *
 * Safeguarded Newton steps on the exact tail. Source: JCGM 100:2008 (GUM), annex G and table G.2.
 * @throws KineticsError when level is not between 0 and 1 or the degrees of freedom are not above 0.
 * @example studentCoverageFactor(0.95, 10) // 2.228138851986275
 */
export function studentCoverageFactor(level: number, degreesOfFreedom?: number | null): number {
  const z = normalCoverageFactor(level);
  if (degreesOfFreedom === undefined || degreesOfFreedom === null || degreesOfFreedom === Infinity) return z;
  requirePositive('degreesOfFreedom', degreesOfFreedom, 'degrees of freedom');
  if (degreesOfFreedom > 1e10) return z;
  const tail = 1 - level;
  let low = 0;
  let high = Math.max(1, z);
  while (studentTwoSidedTail(high, degreesOfFreedom) > tail) {
    low = high;
    high *= 2;
    if (high > 1e150) throw new KineticsError('degreesOfFreedom', `no finite quantile for ${degreesOfFreedom} degrees of freedom`, 'out-of-range', degreesOfFreedom);
  }
  let t = (low + high) / 2;
  for (let step = 0; step < 300; step += 1) {
    const difference = studentTwoSidedTail(t, degreesOfFreedom) - tail;
    if (difference > 0) low = t;
    else high = t;
    let next = t + difference / (2 * studentDensity(t, degreesOfFreedom));
    if (!(next > low && next < high)) next = (low + high) / 2;
    if (Math.abs(next - t) <= 1e-15 * t) return next;
    t = next;
  }
  return t;
}
