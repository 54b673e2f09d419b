import { KineticsError } from './kinetics-error.ts';

/**
 * e^x E₂(x) for x >= 1, by continued fraction: with it ∫ exp(-E/RT) dT from 0 to T is T exp(-x) times this, x = E/RT.
 *
 * Source: Abramowitz and Stegun 5.1.22 and 5.1.4 (exponential integral), evaluated by the modified Lentz method.
 * @example scaledExponentialIntegral(30) // 0.03130783723059624
 */
export function scaledExponentialIntegral(x: number): number {
  let b = x + 2;
  let c = Infinity;
  let d = 1 / b;
  let value = d;
  for (let i = 1; i < 1000; i += 1) {
    const a = -i * (i + 1);
    b += 2;
    d = 1 / (a * d + b);
    c = b + a / c;
    const factor = c * d;
    value *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return value;
}

/**
 * The x >= 1 with x e^x = exp(ln): E/RT at a desorption peak from ln(νT/β).
 *
 * Newton steps on x + ln x; they rise to the root from the left and stop where rounding ends them.
 * @throws KineticsError where x would be below 1: no energy above RT gives such a peak.
 * @example peakReducedEnergy(Math.log(1e15)) // 31.10151971159478
 */
export function peakReducedEnergy(ln: number): number {
  if (!(ln >= 1)) {
    throw new KineticsError('preExponential', `νT/β at the peak is ${Math.exp(ln).toPrecision(3)}, for which no energy above RT gives a peak: check the units of the pre-exponential factor (and coverage) and of the heating rate`, 'out-of-range', ln);
  }
  let x = Math.max(1, ln - Math.log(ln));
  for (let step = 0; step < 60; step += 1) {
    const next = x - ((x + Math.log(x) - ln) * x) / (1 + x);
    if (Math.abs(next - x) <= 1e-16 * x) return next;
    x = next;
  }
  return x;
}
