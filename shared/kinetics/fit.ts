import { R } from './constants.ts';
import { operationLine, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requirePositive, requireTemperature } from './kinetics-error.ts';
import { curvature, fitLine, type FittedLine } from './least-squares.ts';
import { normalCoverageFactor } from './normal.ts';
import { studentCoverageFactor, studentTwoSidedTail } from './student-t.ts';

/** One measured rate constant. */
export interface FitPoint {
  temperatureK: number;
  k: number;
  /** Standard uncertainty of k. */
  u?: number | null;
}

/** Input of a fit of k against T. */
export interface FitInput {
  points: readonly FitPoint[];
  /** `none`: all points count alike. `given`: by (k/u)². */
  weights: 'none' | 'given';
  /** `scaled`: errors from the residuals, Student t. `absolute`: errors from the given u, normal. */
  covariance: 'scaled' | 'absolute';
}

/** What a fit warns of. */
export interface FitWarning {
  code: 'few-points' | 'small-span' | 'curvature' | 'decisive-point';
  message: string;
}

/** Arrhenius parameters from a fit; null where the points leave no degree of freedom. */
export interface FitResult {
  preExponential: number;
  lnPreExponential: number;
  energyKJPerMol: number;
  uLnPreExponential: number | null;
  uEnergyKJPerMol: number | null;
  /** Correlation of ln A and E. */
  correlation: number;
  ciLnPreExponential: [number, number] | null;
  ciEnergyKJPerMol: [number, number] | null;
  /** Residual standard deviation of ln k (weighted with given weights). */
  residualSd: number | null;
  rSquared: number | null;
  n: number;
  degreesOfFreedom: number;
  /** Residuals of ln k and leverage, in the order of the points. */
  residuals: number[];
  leverage: number[];
  warnings: FitWarning[];
  derivation: DerivationLine[];
}

function readPoints(input: FitInput): { x: number[]; y: number[]; weights: number[] | undefined } {
  if (input.points.length < 2) throw new KineticsError('points', `a fit needs at least two points, got ${input.points.length}`, 'missing-input', input.points.length);
  if (input.covariance === 'absolute' && input.weights !== 'given') {
    throw new KineticsError('covariance', 'absolute errors need the standard uncertainty of every k: give u and weights', 'missing-input', input.covariance);
  }
  const x: number[] = [];
  const y: number[] = [];
  const weights: number[] = [];
  input.points.forEach((point, i) => {
    x.push(1 / requireTemperature(`points.${i}.temperatureK`, point.temperatureK));
    y.push(Math.log(requirePositive(`points.${i}.k`, point.k, 'k')));
    if (input.weights !== 'given') return;
    if (point.u == null) throw new KineticsError(`points.${i}.u`, `point ${i + 1} has no standard uncertainty, which weights need`, 'missing-input');
    weights.push((point.k / requirePositive(`points.${i}.u`, point.u, 'u')) ** 2);
  });
  return { x, y, weights: input.weights === 'given' ? weights : undefined };
}

/** True when the residuals are no more than rounding. */
function isExact(line: FittedLine): boolean {
  return line.rss <= 1e-24 * line.sumWeights * (1 + line.meanY * line.meanY);
}

function warningsOf(input: FitInput, x: readonly number[], line: FittedLine, weights: readonly number[] | undefined): FitWarning[] {
  const warnings: FitWarning[] = [];
  const n = x.length;
  if (n < 4) warnings.push({ code: 'few-points', message: `${n} points: a line through fewer than four says little about its own errors` });
  const span = (Math.max(...x) - Math.min(...x)) / line.meanX;
  if (span < 0.05) {
    const temperatures = input.points.map(({ temperatureK }) => temperatureK);
    warnings.push({ code: 'small-span', message: `1/T spans ${(span * 100).toFixed(1)} % (${Math.min(...temperatures)} to ${Math.max(...temperatures)} K): ln A and E can hardly be told apart` });
  }
  if (n < 4 || isExact(line)) return warnings;
  const bend = curvature(x, line, weights);
  if (bend !== null) {
    const probability = studentTwoSidedTail(Math.abs(bend.t), bend.degreesOfFreedom);
    if (probability < 0.05) warnings.push({ code: 'curvature', message: `ln k against 1/T is curved: a quadratic term has t = ${bend.t.toFixed(2)} (p = ${probability.toPrecision(2)})` });
  }
  const variance = line.rss / (n - 2);
  line.residuals.forEach((residual, i) => {
    const leverage = line.leverage[i] as number;
    const cook = leverage < 1 ? ((weights ? (weights[i] as number) : 1) * residual * residual * leverage) / (2 * variance * (1 - leverage) ** 2) : Infinity;
    if (leverage > 0.9 || cook > 1) {
      const point = input.points[i] as FitPoint;
      warnings.push({ code: 'decisive-point', message: `the point at ${point.temperatureK} K decides the fit: leverage ${leverage.toFixed(2)}, Cook's distance ${Number.isFinite(cook) ? cook.toFixed(2) : 'without bound'}` });
    }
  });
  return warnings;
}

/**
 * Fits A and E to rate constants at several temperatures by least squares of ln k on 1/T.
 *
 * With given weights w = (k/u)², from u(ln k) = u/k. Scaled errors are multiplied by the residual variance and use Student's t;
 * absolute ones rest on the given u and use the normal distribution. Two points leave no scaled error: null.
 * Warns of fewer than four points, a span of 1/T under 5 %, curvature (quadratic term at 5 %) and a decisive point (leverage above 0.9 or Cook's distance above 1): common practice.
 * Sources: JCGM 100:2008 (GUM) H.3 (line by least squares); Cook, Technometrics 19 (1977) 15.
 * @throws KineticsError on fewer than two points, a temperature or k not above 0, equal temperatures, or weights without u.
 * @example fitArrhenius({ points: [{ temperatureK: 300, k: 0.0012 }, { temperatureK: 350, k: 0.045 }], weights: 'none', covariance: 'scaled' }).energyKJPerMol // 63.28233912561672
 */
export function fitArrhenius(input: FitInput): FitResult {
  const { x, y, weights } = readPoints(input);
  const line = fitLine(x, y, weights);
  const n = x.length;
  const degreesOfFreedom = n - 2;
  const scaled = input.covariance === 'scaled';
  const variance = degreesOfFreedom > 0 ? line.rss / degreesOfFreedom : null;
  const unit = scaled ? variance : 1;
  const toEnergy = R / 1000;
  const energyKJPerMol = -line.slope * toEnergy;
  const rootInverse = Math.sqrt(1 / line.sumWeights + (line.meanX * line.meanX) / line.spread);
  const uLnA = unit === null ? null : Math.sqrt(unit) * rootInverse;
  const uE = unit === null ? null : Math.sqrt(unit / line.spread) * toEnergy;
  const factor = unit === null ? null : scaled ? studentCoverageFactor(0.95, degreesOfFreedom) : normalCoverageFactor(0.95);
  const interval = (value: number, u: number | null): [number, number] | null => (u === null || factor === null ? null : [value - factor * u, value + factor * u]);
  return {
    preExponential: Math.exp(line.intercept),
    lnPreExponential: line.intercept,
    energyKJPerMol,
    uLnPreExponential: uLnA,
    uEnergyKJPerMol: uE,
    correlation: line.meanX / (Math.sqrt(line.spread) * rootInverse),
    ciLnPreExponential: interval(line.intercept, uLnA),
    ciEnergyKJPerMol: interval(energyKJPerMol, uE),
    residualSd: variance === null ? null : Math.sqrt(variance),
    rSquared: line.rSquared,
    n,
    degreesOfFreedom,
    residuals: line.residuals,
    leverage: line.leverage,
    warnings: warningsOf(input, x, line, weights),
    derivation: [
      operationLine(`Least squares of ln k on 1/T, ${n} points, ${input.weights === 'given' ? 'weights (k/u)²' : 'equal weights'}`, { value: n, unit: 'points' }, { value: line.slope, unit: 'K' }, references.gum, {
        assumption: scaled ? 'errors from the residuals, Student t' : 'errors from the given standard uncertainties, normal distribution',
      }),
      operationLine('E = -R × slope', { value: line.slope, unit: 'K' }, { value: energyKJPerMol, unit: 'kJ/mol' }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
      operationLine('A = exp(intercept)', { value: line.intercept }, { value: Math.exp(line.intercept) }, references.glossary),
    ],
  };
}
