import { N_A } from './constants.ts';
import type { Check } from './plausibility.ts';

/** A slip that would explain an outlier. */
export interface SlipHint {
  /** The factor that brings the value into the family: the value times it. */
  factor: number;
  /** What the factor is, in words. */
  name: string;
}

/** Result of a comparison with a family of values. */
export interface OutlierResult {
  outlier: boolean;
  /** Distance from the median in units of the scaled median absolute deviation. */
  score: number;
  median: number;
  /** 1.4826 × median absolute deviation. */
  scaledDeviation: number;
  hint: SlipHint | null;
  /** The check that it raises: none or one. */
  checks: Check[];
}

/** Slips that are common in tables, with what they are. Source: common practice; factors from CODATA 2022 and NIST SP 811. */
export const slipFactors: readonly SlipHint[] = [
  { factor: 4.184, name: 'calorie for joule' },
  { factor: 96.48533212331, name: 'electronvolt for kJ/mol' },
  { factor: 23.06054783061903, name: 'electronvolt for kcal/mol' },
  { factor: 27.211386245981, name: 'hartree for electronvolt' },
  { factor: 627.5094740631, name: 'hartree for kcal/mol' },
  { factor: 0.01196265657, name: 'cm-1 for kJ/mol' },
  { factor: 8.31446261815324, name: 'R in joule left out' },
  { factor: 1.98720425864083, name: 'R in calories left out' },
  { factor: 2.302585092994046, name: 'ln 10 left out' },
  { factor: 2, name: 'a factor of 2 (per atom or per molecule)' },
  { factor: 60, name: 'minute for second' },
  { factor: 3600, name: 'hour for second' },
  { factor: 133.322368421, name: 'torr for pascal' },
  { factor: N_A, name: 'molecule for mole' },
];

/** How a family is compared. */
export interface FamilyOptions {
  /** Compare logarithms. */
  logarithmic?: boolean;
  /** Scaled deviations beyond which a value is an outlier, 3.5 when absent. */
  threshold?: number;
  /** Further slips to try, such as a site density. */
  extraFactors?: readonly SlipHint[];
}

function medianOf(sorted: readonly number[]): number {
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? (sorted[middle] as number) : ((sorted[middle - 1] as number) + (sorted[middle] as number)) / 2;
}

function center(values: readonly number[]): { median: number; scaled: number } {
  const sorted = [...values].sort((a, b) => a - b);
  const median = medianOf(sorted);
  const scaled = 1.4826 * medianOf(sorted.map((value) => Math.abs(value - median)).sort((a, b) => a - b));
  return { median, scaled };
}

/**
 * Compares a value with the others of its family by median and median absolute deviation; null with fewer than five others.
 *
 * A value more than `threshold` scaled deviations away is an outlier. Where a common slip would bring it within two, the hint names it.
 * With `logarithmic` the comparison is on ln (rate constants, factors). A family without any scatter uses a hundredth of its median as the deviation.
 * Source: median absolute deviation scaled by 1.4826, Rousseeuw & Croux, J. Am. Stat. Assoc. 88 (1993) 1273; threshold 3.5: common practice.
 * @example compareWithFamily(25, [101, 104, 106, 108, 110])?.hint?.name // 'calorie for joule'
 */
export function compareWithFamily(value: number, others: readonly number[], options: FamilyOptions = {}): OutlierResult | null {
  const transform = options.logarithmic ? Math.log : (x: number): number => x;
  const family = others.map(transform).filter(Number.isFinite);
  const own = transform(value);
  if (family.length < 5 || !Number.isFinite(own)) return null;
  const { median, scaled } = center(family);
  const floor = options.logarithmic ? 0.01 : Math.max(Math.abs(median) / 100, Number.MIN_VALUE);
  const scale = Math.max(scaled, floor);
  const score = Math.abs(own - median) / scale;
  const shown = options.logarithmic ? Math.exp(median) : median;
  if (score <= (options.threshold ?? 3.5)) return { outlier: false, score, median: shown, scaledDeviation: scaled, hint: null, checks: [] };
  const hint = findSlip(value, transform, median, scale, [...(options.extraFactors ?? []), ...slipFactors]);
  const short = (x: number): number => Number(x.toPrecision(4));
  const reading = hint ? `; ${hint.name} would explain it: the value would then be ${short(value * hint.factor)}` : '';
  const message = `${short(value)} lies ${score.toFixed(1)} scaled deviations from the median ${short(shown)} of ${family.length} accepted values${reading}`;
  return { outlier: true, score, median: shown, scaledDeviation: scaled, hint, checks: [{ code: 'outlier', severity: 'warning', message }] };
}

function findSlip(value: number, transform: (x: number) => number, median: number, scale: number, factors: readonly SlipHint[]): SlipHint | null {
  let best: { distance: number; hint: SlipHint } | null = null;
  const attempt = (hint: SlipHint): void => {
    const distance = Math.abs(transform(value * hint.factor) - median) / scale;
    if (distance <= 2 && (best === null || distance < best.distance)) best = { distance, hint };
  };
  for (const { factor, name } of factors) {
    attempt({ factor, name });
    attempt({ factor: 1 / factor, name: `${name}, the other way round` });
  }
  if (best === null) for (let power = 1; power <= 12; power += 1) {
    attempt({ factor: 10 ** power, name: `a power of ten (10^${power})` });
    attempt({ factor: 10 ** -power, name: `a power of ten (10^-${power})` });
  }
  return (best as { hint: SlipHint } | null)?.hint ?? null;
}

/** The check that an outlier raises, as a list of none or one; silent with fewer than five others. See `compareWithFamily`. */
export function outlierCheck(value: number, others: readonly number[], options: FamilyOptions = {}): Check[] {
  return compareWithFamily(value, others, options)?.checks ?? [];
}
