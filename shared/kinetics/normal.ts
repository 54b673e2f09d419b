import { KineticsError } from './kinetics-error.ts';

/** Complementary error function for x >= 0, by series below 2.5 and by continued fraction above. */
function erfcPositive(x: number): number {
  if (x < 2.5) {
    // Abramowitz & Stegun 7.1.6: erf x = 2/sqrt(pi) exp(-x²) sum 2^n x^(2n+1)/(1·3·…·(2n+1)); all terms are positive.
    let term = x;
    let sum = x;
    for (let n = 1; n < 200; n += 1) {
      term *= (2 * x * x) / (2 * n + 1);
      sum += term;
      if (term < sum * 1e-17) break;
    }
    return 1 - (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
  }
  // Abramowitz & Stegun 7.1.14, evaluated from the tail.
  let fraction = 0;
  for (let n = 120; n >= 1; n -= 1) fraction = n / 2 / (x + fraction);
  return Math.exp(-x * x) / (Math.sqrt(Math.PI) * (x + fraction));
}

/** Upper tail probability of the standard normal distribution for z >= 0. */
export function normalUpperTail(z: number): number {
  return erfcPositive(z / Math.SQRT2) / 2;
}

/**
 * The z that encloses a two-sided probability `level` of the standard normal distribution.
 *
 * Newton steps on the tail probability. Source: JCGM 100:2008 (GUM), table G.1.
 * @throws KineticsError when level is not between 0 and 1.
 * @example normalCoverageFactor(0.95) // 1.959963984540054
 */
export function normalCoverageFactor(level: number): number {
  if (!(level > 0 && level < 1)) throw new KineticsError('level', `level must be between 0 and 1, got ${level}`, 'out-of-range', level);
  const tail = (1 - level) / 2;
  // Abramowitz & Stegun 26.2.23 as the start.
  const t = Math.sqrt(-2 * Math.log(tail));
  let z = Math.max(0, t - (2.515517 + 0.802853 * t + 0.010328 * t * t) / (1 + 1.432788 * t + 0.189269 * t * t + 0.001308 * t * t * t));
  for (let step = 0; step < 8; step += 1) {
    const density = Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
    const change = (normalUpperTail(z) - tail) / density;
    z += change;
    if (Math.abs(change) <= 1e-16 * Math.abs(z)) break;
  }
  return z;
}
