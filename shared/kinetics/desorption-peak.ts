import { R } from './constants.ts';
import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { peakReducedEnergy, scaledExponentialIntegral } from './desorption-integral.ts';
import { KineticsError, requirePositive, requireTemperature } from './kinetics-error.ts';

/** Order of desorption in the coverage. */
export type DesorptionOrder = 1 | 2;

/** Input of `desorptionEnergyFromPeak`. */
export interface DesorptionPeakInput {
  /** Temperature of the highest rate [K]. */
  peakTemperatureK: number;
  /** β, constant while heating [K s-1]. */
  heatingRateKPerS: number;
  order: DesorptionOrder;
  /** ν of -dθ/dt = ν θ^m exp(-E/RT): s-1 for first order; for second order ν θ0 must come out in s-1. */
  preExponential: number;
  /** θ0 before heating, in the measure that ν goes with; needed for second order, without effect for first. */
  initialCoverage?: number;
}

/** Energy of desorption from one peak. */
export interface DesorptionPeakResult {
  /** E by Redhead's condition at the peak [kJ mol-1]; for second order with θ0/2 left at the peak. */
  energyKJPerMol: number;
  /** E with the coverage at the peak from the integrated rate equation [kJ mol-1]; the same for first order. */
  energyIntegratedKJPerMol: number;
  /** E/RT at the peak, of `energyKJPerMol` [1]. */
  reducedEnergy: number;
  /** What is left at the peak, θ/θ0, from the integrated rate equation [1]. */
  coverageLeftAtPeak: number;
  /** How much E grows if ν is taken ten times larger [kJ mol-1]. */
  energyPerDecadeKJPerMol: number;
  derivation: DerivationLine[];
}

const redhead = 'Redhead, Vacuum 12 (1962) 203';

function coverageOf({ order, initialCoverage }: DesorptionPeakInput): number {
  if (order !== 1 && order !== 2) throw new KineticsError('order', `the order must be 1 or 2, got ${String(order)}`, 'unsupported', order);
  if (order === 1) return 1;
  if (initialCoverage === undefined) throw new KineticsError('initialCoverage', 'the coverage before heating is missing: a second-order peak shifts with it', 'missing-input');
  return requirePositive('initialCoverage', initialCoverage, 'the initial coverage');
}

/** E/RT of a second-order peak with the coverage of the integrated rate equation: x e^x = N (2 - x e^x E₂(x)), N = ν θ0 T/β. */
function integratedSecondOrder(ln: number, start: number): number {
  let x = start;
  for (let step = 0; step < 100; step += 1) {
    const next = peakReducedEnergy(ln + Math.log(2 - x * scaledExponentialIntegral(x)));
    if (Math.abs(next - x) <= 2e-16 * x) return next;
    x = next;
  }
  return x;
}

/**
 * Energy of desorption from the temperature of a peak, for one energy and pre-exponential factor, linear heating and no readsorption.
 *
 * First order: E/(RT_p²) = (ν/β) exp(-E/RT_p), exact. Second order: E/(RT_p²) = (2νθ_p/β) exp(-E/RT_p), where Redhead takes θ_p = θ0/2, which
 * gives E/(RT_p²) = (νθ0/β) exp(-E/RT_p); the integrated rate equation leaves θ_p/θ0 = 1 - (x/2) e^x E₂(x) ≈ ½ + RT_p/E, and E with it is given
 * beside (larger by about 2(RT_p)²/E² of itself). Both are solved numerically, without the linear rule E/RT_p = ln(νT_p/β) - 3.64.
 * ν is that of the coverage, -dθ/dt = ν θ² exp(-E/RT); per event of 2A* → A2 it is half as large. Energies [kJ mol-1].
 * Source: Redhead, Vacuum 12 (1962) 203.
 * @throws KineticsError on an order other than 1 or 2, an input not above 0, a second order without coverage, or figures that no energy above RT_p gives.
 * @example desorptionEnergyFromPeak({ peakTemperatureK: 500, heatingRateKPerS: 5, order: 1, preExponential: 1e13 }).energyKJPerMol // 129.29621150490545
 */
export function desorptionEnergyFromPeak(input: DesorptionPeakInput): DesorptionPeakResult {
  const T = requireTemperature('peakTemperatureK', input.peakTemperatureK, 'T_p');
  const beta = requirePositive('heatingRateKPerS', input.heatingRateKPerS, 'the heating rate', 'K/s');
  const nu = requirePositive('preExponential', input.preExponential, 'ν');
  const coverage = coverageOf(input);
  const ln = Math.log(nu) + Math.log(coverage) + Math.log(T) - Math.log(beta);
  const x = peakReducedEnergy(ln);
  const exact = input.order === 1 ? x : integratedSecondOrder(ln, x);
  const part = exact * scaledExponentialIntegral(exact);
  const toEnergy = (R * T) / 1000;
  const energyKJPerMol = x * toEnergy;
  const energyIntegratedKJPerMol = exact * toEnergy;
  const given = `T_p = ${quantityText(T)} K, β = ${quantityText(beta)} K/s`;
  const constant = `R = ${R} J mol-1 K-1`;
  const second = input.order === 2;
  const at = second ? `${given}, θ0 = ${quantityText(coverage)}` : given;
  const start = { value: nu };
  return {
    energyKJPerMol,
    energyIntegratedKJPerMol,
    reducedEnergy: x,
    coverageLeftAtPeak: second ? 1 - part / 2 : Math.exp(-part),
    energyPerDecadeKJPerMol: ((toEnergy * x) / (1 + x)) * Math.LN10,
    derivation: [
      operationLine(`Solve E/(RT_p²) = (${second ? 'νθ0' : 'ν'}/β) exp(-E/RT_p), ${at}`, start, { value: energyKJPerMol, unit: 'kJ/mol' }, redhead, {
        constant,
        assumption: `order ${input.order}; ν and E do not change with coverage; no readsorption${second ? '; θ0/2 is left at the peak; ν is that of -dθ/dt' : ''}`,
      }),
      ...(second
        ? [operationLine(`Solve E/(RT_p²) = (2νθ_p/β) exp(-E/RT_p), 1/θ_p = 1/θ0 + (ν/β) ∫ exp(-E/RT) dT from 0 to T_p, ${at}`, start, { value: energyIntegratedKJPerMol, unit: 'kJ/mol' }, 'integrated rate equation of second order', { constant })]
        : []),
    ],
  };
}
