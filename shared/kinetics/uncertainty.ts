import { KineticsError, requireNonNegative, requirePositive } from './kinetics-error.ts';
import { studentCoverageFactor } from './student-t.ts';

/** What a printed uncertainty stands for; `none` where nothing was printed, `unknown` for a bare ±. */
export const uncertaintyKinds = [
  'standard',
  'expanded',
  'confidence',
  'rectangular',
  'triangular',
  'fit-standard-error',
  'spread',
  'unknown',
  'none',
] as const;

/** One of `uncertaintyKinds`. */
export type UncertaintyKind = (typeof uncertaintyKinds)[number];

/** What the contributor says about a printed uncertainty. */
export interface UncertaintyStatement {
  kind: UncertaintyKind;
  /** Coverage factor k of an expanded uncertainty. */
  coverageFactor?: number | null;
  /** Level of a confidence interval, 0.95 for 95 %. */
  level?: number | null;
  /** Degrees of freedom behind a confidence interval or a spread; the normal distribution when absent. */
  degreesOfFreedom?: number | null;
}

/** Says which input a kind needs before it has a standard uncertainty, or null when nothing is missing. */
export function missingForStandard(statement: UncertaintyStatement): string | null {
  if (statement.kind === 'expanded' && statement.coverageFactor == null) return 'coverage factor';
  if (statement.kind === 'confidence' && statement.level == null) return 'confidence level';
  if (statement.kind === 'spread' && statement.degreesOfFreedom == null) return 'number of determinations';
  if (statement.kind === 'unknown') return 'kind of uncertainty';
  return null;
}

/**
 * Turns a reported half-width into a standard uncertainty, or null where the kind does not allow one.
 *
 * Expanded: U/k. Confidence: half-width/t (Student t with the degrees of freedom given, else normal z).
 * Rectangular: /√3; triangular: /√6. Standard error of a fit: as it is. Spread of n = degrees of freedom + 1
 * determinations: s/√n, the standard deviation of the mean. Unknown: null, never zero.
 * Source: JCGM 100:2008 (GUM) 4.2.3, 4.3.3, 4.3.7, 4.3.9, annex G.
 * @throws KineticsError on a negative half-width, a coverage factor not above 0, a level outside 0 to 1.
 * @example standardUncertaintyOf(3, { kind: 'expanded', coverageFactor: 2 }) // 1.5
 */
export function standardUncertaintyOf(halfWidth: number, statement: UncertaintyStatement): number | null {
  requireNonNegative('uncertainty', halfWidth, 'uncertainty');
  if (missingForStandard(statement) !== null) return null;
  switch (statement.kind) {
    case 'standard':
    case 'fit-standard-error':
      return halfWidth;
    case 'expanded':
      return halfWidth / requirePositive('coverageFactor', statement.coverageFactor as number, 'coverage factor');
    case 'confidence':
      return halfWidth / studentCoverageFactor(statement.level as number, statement.degreesOfFreedom);
    case 'rectangular':
      return halfWidth / Math.sqrt(3);
    case 'triangular':
      return halfWidth / Math.sqrt(6);
    case 'spread': {
      const degreesOfFreedom = requirePositive('degreesOfFreedom', statement.degreesOfFreedom as number, 'degrees of freedom');
      return halfWidth / Math.sqrt(degreesOfFreedom + 1);
    }
    default:
      return null;
  }
}

/**
 * Standard uncertainty of ln x from a factor f that encloses x/f to x·f with a two-sided probability `level`.
 *
 * Source: JCGM 100:2008 (GUM) 4.3.4 on the logarithm, normal distribution (common practice in rate evaluations).
 * @throws KineticsError when the factor is below 1.
 * @example factorUncertainty(10, 0.95) // 1.1748099001596677
 */
export function factorUncertainty(factor: number, level: number): number {
  requirePositive('factor', factor);
  if (factor < 1) throw new KineticsError('factor', `factor must be 1 or more, got ${factor}`, 'out-of-range', factor);
  return Math.log(factor) / studentCoverageFactor(level);
}
