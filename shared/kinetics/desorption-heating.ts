import { R } from './constants.ts';
import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import type { DesorptionOrder } from './desorption-peak.ts';
import { fitArrhenius, type FitResult, type FitWarning } from './fit.ts';
import { KineticsError, requirePositive, requireTemperature } from './kinetics-error.ts';
import { studentCoverageFactor } from './student-t.ts';

/** One peak at one heating rate. */
export interface HeatingRatePoint {
  /** β [K s-1]. */
  heatingRateKPerS: number;
  /** T_p [K]. */
  peakTemperatureK: number;
}

/** Input of `desorptionFromHeatingRates`. */
export interface HeatingRatesInput {
  points: readonly HeatingRatePoint[];
  /** 1 when absent; E does not depend on it, the pre-exponential factor does. */
  order?: DesorptionOrder;
  /** θ0, the same in every run; turns νθ0 of a second order into ν. */
  initialCoverage?: number;
}

/** What a variation of the heating rate warns of. */
export interface HeatingRateWarning {
  code: FitWarning['code'] | 'no-coverage';
  message: string;
}

/** E and ν from the shift of a peak with the heating rate; errors are null where the points leave no degree of freedom. */
export interface HeatingRatesResult extends Pick<FitResult, 'uEnergyKJPerMol' | 'ciEnergyKJPerMol' | 'rSquared' | 'residualSd' | 'n' | 'degreesOfFreedom' | 'residuals' | 'leverage'> {
  /** E [kJ mol-1]. */
  energyKJPerMol: number;
  /** ν [s-1] for first order; for second order in the unit that goes with θ0, null without θ0. 0 or Infinity outside double range. */
  preExponential: number | null;
  lnPreExponential: number | null;
  uLnPreExponential: number | null;
  ciLnPreExponential: [number, number] | null;
  /** Correlation of ln ν and E, near 1; null without errors. */
  correlation: number | null;
  warnings: HeatingRateWarning[];
  derivation: DerivationLine[];
}

const redhead = 'Redhead, Vacuum 12 (1962) 203';

function readPoints(points: readonly HeatingRatePoint[]): HeatingRatePoint[] {
  points.forEach(({ heatingRateKPerS, peakTemperatureK }, i) => {
    requirePositive(`points.${i}.heatingRateKPerS`, heatingRateKPerS, 'the heating rate', 'K/s');
    requireTemperature(`points.${i}.peakTemperatureK`, peakTemperatureK, 'T_p');
    const ratio = heatingRateKPerS / peakTemperatureK ** 2;
    if (!(ratio > 0 && ratio < Infinity)) throw new KineticsError(`points.${i}.heatingRateKPerS`, `β/T_p² leaves the range of double precision for ${heatingRateKPerS} K/s and ${peakTemperatureK} K`, 'out-of-range', heatingRateKPerS);
  });
  const distinct = (values: readonly number[]): number => new Set(values).size;
  if (points.length < 2 || distinct(points.map(({ heatingRateKPerS }) => heatingRateKPerS)) < 2) {
    throw new KineticsError('points', `the peaks of at least two different heating rates are needed, got ${points.length} ${points.length === 1 ? 'point' : 'points'} of one rate or none`, 'missing-input', points.length);
  }
  if (distinct(points.map(({ peakTemperatureK }) => peakTemperatureK)) < 2) throw new KineticsError('points', 'all peak temperatures are equal: no energy can be fitted', 'out-of-range', points[0]?.peakTemperatureK);
  return [...points];
}

/** The factor: ln ν = ln(E/R) - intercept, its errors following from those of slope and intercept, which move together. */
function factorOf(fit: FitResult, lnCoverage: number): Pick<HeatingRatesResult, 'lnPreExponential' | 'uLnPreExponential' | 'ciLnPreExponential' | 'correlation'> {
  const E = fit.energyKJPerMol;
  const lnPreExponential = fit.lnPreExponential + Math.log((E * 1000) / R) - lnCoverage;
  const { uLnPreExponential: uIntercept, uEnergyKJPerMol: uE } = fit;
  if (uIntercept === null || uE === null) return { lnPreExponential, uLnPreExponential: null, ciLnPreExponential: null, correlation: null };
  const relative = uE / E;
  const u = Math.sqrt(uIntercept ** 2 + relative ** 2 + 2 * fit.correlation * uIntercept * relative);
  const half = studentCoverageFactor(0.95, fit.degreesOfFreedom) * u;
  return {
    lnPreExponential,
    uLnPreExponential: u,
    ciLnPreExponential: [lnPreExponential - half, lnPreExponential + half],
    correlation: u > 0 ? (fit.correlation * uIntercept + relative) / u : null,
  };
}

/**
 * Energy of desorption and pre-exponential factor from the shift of a peak with the heating rate, without assuming either.
 *
 * Least squares of ln(T_p²/β) on 1/T_p: slope E/R, intercept ln(E/Rν). Exact for first order; for second order νθ0 stands for ν by Redhead's
 * θ_p = θ0/2, with one θ0 in all runs. E [kJ mol-1], ν [s-1] for first order. Standard errors come from the residuals, intervals are 95 % by Student's t;
 * two points leave none. ln ν and E are almost fully correlated: use them together.
 * Source: Redhead, Vacuum 12 (1962) 203; JCGM 100:2008 (GUM) 5.2.2 and H.3 for the errors.
 * @throws KineticsError on fewer than two heating rates, a rate or temperature not above 0, or peaks that do not rise with the heating rate.
 * @example desorptionFromHeatingRates({ points: [{ heatingRateKPerS: 1, peakTemperatureK: 480 }, { heatingRateKPerS: 10, peakTemperatureK: 510 }] }).energyKJPerMol // 147.99494467755253
 */
export function desorptionFromHeatingRates(input: HeatingRatesInput): HeatingRatesResult {
  const points = readPoints(input.points);
  const order = input.order ?? 1;
  if (order !== 1 && order !== 2) throw new KineticsError('order', `the order must be 1 or 2, got ${String(order)}`, 'unsupported', order);
  const coverage = input.initialCoverage === undefined ? null : requirePositive('initialCoverage', input.initialCoverage, 'the initial coverage');
  // β/T_p² = (Rν/E) exp(-E/RT_p) has the form of an Arrhenius equation.
  const fit = fitArrhenius({ points: points.map(({ heatingRateKPerS, peakTemperatureK }) => ({ temperatureK: peakTemperatureK, k: heatingRateKPerS / peakTemperatureK ** 2 })), weights: 'none', covariance: 'scaled' });
  const E = fit.energyKJPerMol;
  if (!(E > 0)) throw new KineticsError('points', `the peaks do not rise with the heating rate as a desorption does: the slope of ln(T_p²/β) gives E = ${E.toPrecision(4)} kJ/mol`, 'out-of-range', E);
  const known = order === 1 || coverage !== null;
  const factor = factorOf(fit, order === 2 && coverage !== null ? Math.log(coverage) : 0);
  const preExponential = known ? Math.exp(factor.lnPreExponential as number) : null;
  const warnings: HeatingRateWarning[] = fit.warnings.map(({ code, message }) => ({ code, message: message.replace('ln k against 1/T', 'ln(T_p²/β) against 1/T_p').replace('1/T spans', '1/T_p spans').replace('ln A and E', 'ln ν and E') }));
  if (!known) warnings.push({ code: 'no-coverage', message: 'the pre-exponential factor of a second order needs the coverage before heating, which is not given' });
  const { uEnergyKJPerMol, ciEnergyKJPerMol, rSquared, residualSd, n, degreesOfFreedom, leverage } = fit;
  return {
    energyKJPerMol: E,
    preExponential,
    ...(known ? factor : { lnPreExponential: null, uLnPreExponential: null, ciLnPreExponential: null, correlation: null }),
    uEnergyKJPerMol, ciEnergyKJPerMol, rSquared, residualSd, n, degreesOfFreedom, leverage,
    residuals: fit.residuals.map((residual) => 0 - residual),
    warnings,
    derivation: linesOf(points, fit, order, coverage, preExponential),
  };
}

function linesOf(points: readonly HeatingRatePoint[], fit: FitResult, order: DesorptionOrder, coverage: number | null, preExponential: number | null): DerivationLine[] {
  const slope = (fit.energyKJPerMol * 1000) / R;
  const constant = `R = ${R} J mol-1 K-1`;
  const listed = points.map(({ heatingRateKPerS, peakTemperatureK }) => `${quantityText(heatingRateKPerS)} K/s ${quantityText(peakTemperatureK)} K`).join(', ');
  const product = order === 2 ? 'νθ0' : 'ν';
  return [
    operationLine(`Least squares of ln(T_p²/β) on 1/T_p, equal weights: ${listed}`, { value: points.length, unit: 'points' }, { value: slope, unit: 'K' }, redhead, { assumption: `order ${order}; ν and E do not change with coverage; no readsorption; errors from the residuals, Student t` }),
    operationLine('E = R × slope', { value: slope, unit: 'K' }, { value: fit.energyKJPerMol, unit: 'kJ/mol' }, redhead, { constant }),
    ...(preExponential === null
      ? []
      : [operationLine(`${product} = (E/R) exp(-intercept), E = ${quantityText(fit.energyKJPerMol)} kJ/mol${order === 2 ? `, θ0 = ${quantityText(coverage as number)}` : ''}`, { value: -fit.lnPreExponential }, { value: preExponential }, redhead, { constant, assumption: order === 2 ? 'θ0/2 is left at the peak; ν is that of -dθ/dt' : undefined })]),
  ];
}
