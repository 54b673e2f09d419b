import { operationLine, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requireNonNegative, requirePositive } from './kinetics-error.ts';
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

/**
 * Says which input a kind needs before it has a standard uncertainty, or null when nothing is missing.
 *
 * @example missingForStandard({ kind: 'expanded' }) // 'coverage factor'
 */
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
  requireFactor(factor);
  return Math.log(factor) / studentCoverageFactor(level);
}

function requireFactor(factor: number): void {
  requirePositive('factor', factor);
  if (factor < 1) throw new KineticsError('factor', `factor must be 1 or more, got ${factor}`, 'out-of-range', factor);
}

/** A reported uncertainty whose kind is stated, as the HTTP contract names its parts. */
export type StatedUncertainty =
  | { kind: 'expanded'; value: number; coverageFactor: number }
  | { kind: 'confidence'; halfWidth: number; level: number; degreesOfFreedom?: number | null }
  | { kind: 'rectangular' | 'triangular' | 'arcsine'; halfWidth: number }
  | { kind: 'trapezoidal'; halfWidth: number; topFraction: number }
  | { kind: 'factor'; factor: number; level: number };

/** A standard uncertainty with the way it was reached. */
export interface EvaluatedUncertainty {
  /** In the unit of what was reported; of ln x where the scale is `ln`. */
  standardUncertainty: number;
  /** What the reported figure (or the logarithm of the factor) was divided by. */
  divisor: number;
  scale: 'linear' | 'ln';
  derivation: DerivationLine[];
}

/** The figure to divide, the divisor and the words for it. */
function divisionOf(given: StatedUncertainty): { figure: number; divisor: number; operation: string; assumption: string; reference: string } {
  switch (given.kind) {
    case 'expanded': {
      const divisor = requirePositive('coverageFactor', given.coverageFactor, 'coverage factor');
      return { figure: requireNonNegative('value', given.value, 'expanded uncertainty'), divisor, operation: 'Expanded uncertainty divided by its coverage factor', assumption: `coverage factor ${divisor}`, reference: `${references.gum} 4.3.3` };
    }
    case 'confidence': {
      const divisor = studentCoverageFactor(given.level, given.degreesOfFreedom);
      const distribution = given.degreesOfFreedom == null ? 'normal distribution, as no degrees of freedom are stated' : `Student t with ${given.degreesOfFreedom} degrees of freedom`;
      return { figure: requireNonNegative('halfWidth', given.halfWidth, 'half-width'), divisor, operation: 'Half-width of a confidence interval divided by its quantile', assumption: `two-sided level ${given.level}, ${distribution}`, reference: `${references.gum} annex G` };
    }
    case 'rectangular':
      return { figure: requireNonNegative('halfWidth', given.halfWidth, 'half-width'), divisor: Math.sqrt(3), operation: 'Half-width of a rectangular distribution divided by √3', assumption: 'every value between the limits is equally likely', reference: `${references.gum} 4.3.7` };
    case 'triangular':
      return { figure: requireNonNegative('halfWidth', given.halfWidth, 'half-width'), divisor: Math.sqrt(6), operation: 'Half-width of a triangular distribution divided by √6', assumption: 'symmetric triangle between the limits', reference: `${references.gum} 4.3.9` };
    case 'arcsine':
      return { figure: requireNonNegative('halfWidth', given.halfWidth, 'half-width'), divisor: Math.SQRT2, operation: 'Half-width of an arcsine distribution divided by √2', assumption: 'a sinusoid between the limits, as of a cycling temperature', reference: `${references.gum} 4.3.5, H.1.3.4` };
    case 'trapezoidal': {
      const top = requireNonNegative('topFraction', given.topFraction, 'top as a fraction of the base');
      if (top > 1) throw new KineticsError('topFraction', `the top of a trapezoid is at most as wide as its base: must not be above 1, got ${top}`, 'out-of-range', top);
      return { figure: requireNonNegative('halfWidth', given.halfWidth, 'half-width'), divisor: Math.sqrt(6 / (1 + top * top)), operation: 'Half-width of a trapezoidal distribution divided by √(6/(1 + β²))', assumption: `symmetric trapezoid between the limits, its top ${top} of its base`, reference: `${references.gum} 4.3.9` };
    }
    case 'factor': {
      requireFactor(given.factor);
      return { figure: Math.log(given.factor), divisor: studentCoverageFactor(given.level), operation: 'Logarithm of the factor divided by the normal quantile', assumption: `the factor encloses x/f to x f with the two-sided level ${given.level}; ln x is normal`, reference: `${references.gum} 4.3.4 on the logarithm` };
    }
  }
}

/**
 * Standard uncertainty of a reported uncertainty whose kind is stated, with its derivation.
 *
 * Expanded: U/k. Confidence: half-width/t (normal without degrees of freedom). Rectangular: /√3, triangular: /√6, arcsine: /√2,
 * trapezoidal with top β of the base: /√(6/(1 + β²)). Factor f: u(ln x) = ln f/z.
 * Source: JCGM 100:2008 (GUM) 4.3.3, 4.3.4, 4.3.7, 4.3.9, H.1.3.4, annex G.
 * @throws KineticsError on a negative half-width, a coverage factor or degrees of freedom not above 0, a level or top outside 0 to 1, a factor below 1.
 * @example evaluateUncertainty({ kind: 'expanded', value: 3, coverageFactor: 2 }).standardUncertainty // 1.5
 */
export function evaluateUncertainty(given: StatedUncertainty): EvaluatedUncertainty {
  const { figure, divisor, operation, assumption, reference } = divisionOf(given);
  const standardUncertainty = figure / divisor;
  return {
    standardUncertainty,
    divisor,
    scale: given.kind === 'factor' ? 'ln' : 'linear',
    derivation: [operationLine(operation, { value: figure }, { value: standardUncertainty }, reference, { constant: `divisor ${divisor}`, assumption })],
  };
}

/**
 * Standard uncertainty of a difference of two values that may be correlated, such as a reaction energy from the barriers there and back.
 *
 * u² = u1² + u2² - 2 r u1 u2. The correlation must be said: it is never taken as 0. Source: JCGM 100:2008 (GUM) 5.2.2.
 * @throws KineticsError on a negative uncertainty or a correlation outside -1 to 1.
 * @example differenceUncertainty(1.5, 2, 0) // 2.5
 */
export function differenceUncertainty(u1: number, u2: number, correlation: number): number {
  requireNonNegative('u1', u1);
  requireNonNegative('u2', u2);
  requireFinite('correlation', correlation);
  if (Math.abs(correlation) > 1) throw new KineticsError('correlation', `correlation must be between -1 and 1, got ${correlation}`, 'out-of-range', correlation);
  return Math.sqrt(Math.max(0, u1 * u1 + u2 * u2 - 2 * correlation * u1 * u2));
}
