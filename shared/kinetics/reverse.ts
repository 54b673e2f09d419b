import { R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import type { GasBasis } from './arrhenius.ts';
import { requireFinite, requirePositive, requireTemperature } from './kinetics-error.ts';

/** Thermodynamics of a step as it is written, taken as independent of temperature. */
export interface StepThermodynamics {
  /** ΔH° [kJ mol-1]. */
  reactionEnthalpyKJPerMol: number;
  /** ΔS° at the standard pressure, coverages with θ° = 1 [J mol-1 K-1]. */
  reactionEntropyJPerMolK: number;
  /** Δν, gas molecules of the products minus those of the reactants; 0 when absent. */
  gasMoleChange?: number;
  /** p° [Pa]; 1e5 when absent. */
  standardPressurePa?: number;
  /** Whether gas factors of the rate constants are pressures [Pa] or concentrations [mol m-3]; `pressure` when absent. */
  basis?: GasBasis;
}

/** Input of `reverseStep`. */
export interface ReverseStepInput extends Omit<StepThermodynamics, 'reactionEntropyJPerMolK'> {
  /** E of the forward step, as it stands in k = A (T/T0)^n exp(-E/RT) [kJ mol-1]. */
  energyForwardKJPerMol: number;
  reactionEntropyJPerMolK?: number;
  /** A of the forward step, in SI: s-1, Pa-1 s-1, m3 mol-1 s-1. */
  preExponentialForward?: number;
  /** n of the forward step; 0 when absent. */
  exponentForward?: number;
  /** T0 of both steps [K]; 1 K when absent. */
  referenceTemperatureK?: number;
  temperatureK?: number;
}

/** What a reversal warns of. */
export interface ReverseWarning {
  code: 'negative-energy' | 'no-entropy';
  message: string;
}

/** The reverse step: what is left out could not be computed from what was given. */
export interface ReverseStepResult {
  /** E of the reverse step [kJ mol-1]. */
  energyReverseKJPerMol: number;
  /** n of the reverse step: that of the forward one on the basis of pressure, n + Δν on that of concentration. */
  exponentReverse: number;
  /** A of the reverse step, in the unit that its own gas factors ask for. */
  preExponentialReverse?: number;
  lnPreExponentialReverse?: number;
  /** E + nRT at T, forward and reverse [kJ mol-1]. */
  localEnergyForwardKJPerMol?: number;
  localEnergyReverseKJPerMol?: number;
  /** ΔG° at T [kJ mol-1]. */
  gibbsKJPerMol?: number;
  /** K° at T, of activities [1]. */
  equilibriumConstant?: number;
  lnEquilibriumConstant?: number;
  kForward?: number;
  kReverse?: number;
  lnKReverse?: number;
  warnings: ReverseWarning[];
  derivation: DerivationLine[];
}

const gasConstant = `R = ${R} J mol-1 K-1`;
const detailedBalance = `detailed balance, k_f/k_r = K; ${references.glossary}`;

/** Direct product where it stays inside double range, which rounds less than the exponential of a sum. */
function safeProduct(direct: number, ln: number): number {
  return Number.isFinite(direct) && direct > 1e-300 ? direct : Math.exp(ln);
}

interface Read {
  dH: number;
  dNu: number;
  p0: number;
  concentration: boolean;
}

function readThermodynamics(input: Omit<StepThermodynamics, 'reactionEntropyJPerMolK'>): Read {
  return {
    dH: requireFinite('reactionEnthalpyKJPerMol', input.reactionEnthalpyKJPerMol),
    dNu: requireFinite('gasMoleChange', input.gasMoleChange ?? 0),
    p0: requirePositive('standardPressurePa', input.standardPressurePa ?? 1e5, 'the standard pressure', 'Pa'),
    concentration: input.basis === 'concentration',
  };
}

/** The unit of gas factors in K at T, or at T0 for A: p° on pressure, p°/RT on concentration. */
const gasFactor = ({ p0, concentration }: Read, temperatureK: number): number => (concentration ? p0 / (R * temperatureK) : p0);

/** An equilibrium constant at T in its three forms. */
export interface StepEquilibrium {
  /** ΔG° [kJ mol-1]. */
  gibbsKJPerMol: number;
  /** K°, of activities [1]; 0 or Infinity outside double range, where the logarithm still holds. */
  equilibriumConstant: number;
  lnEquilibriumConstant: number;
  /** k_f/k_r in the units of the basis: K° (p°)^Δν or K° (p°/RT)^Δν. */
  rateRatio: number;
  lnRateRatio: number;
}

/**
 * Equilibrium constant of a step at T and the ratio of its rate constants, k_f/k_r = K° (p°)^Δν, or K° (p°/RT)^Δν on concentrations.
 *
 * K° = exp(ΔS°/R - ΔH°/RT) [1], ΔG° [kJ mol-1]; the ratio in Pa^Δν or (mol m-3)^Δν.
 * Source: IUPAC Green Book, 3rd edition, 2.11; detailed balance, IUPAC glossary, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on T or p° not above 0, or a number that is not finite.
 * @example stepEquilibrium({ reactionEnthalpyKJPerMol: -60, reactionEntropyJPerMolK: -110, gasMoleChange: -1 }, 300).rateRatio // 0.5023724454737721
 */
export function stepEquilibrium(input: StepThermodynamics, temperatureK: number): StepEquilibrium {
  const known = readThermodynamics(input);
  const S = requireFinite('reactionEntropyJPerMolK', input.reactionEntropyJPerMolK);
  const T = requireTemperature('temperatureK', temperatureK);
  const lnEquilibriumConstant = S / R - (known.dH * 1000) / (R * T);
  const equilibriumConstant = Math.exp(lnEquilibriumConstant);
  const factor = gasFactor(known, T);
  const lnRateRatio = lnEquilibriumConstant + known.dNu * Math.log(factor);
  return {
    gibbsKJPerMol: known.dH - (T * S) / 1000,
    equilibriumConstant,
    lnEquilibriumConstant,
    rateRatio: safeProduct(equilibriumConstant * factor ** known.dNu, lnRateRatio),
    lnRateRatio,
  };
}

/**
 * Rate constant of the reverse step from that of the forward one at T, such as desorption from adsorption.
 *
 * k_r = k_f/[K° (p°)^Δν]; for A + * → A* Δν = -1, k_f [Pa-1 s-1] and k_r [s-1].
 * Source: detailed balance; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on k_f, T or p° not above 0, or a number that is not finite.
 * @example reverseRateConstant({ kForward: 1500, temperatureK: 300, reactionEnthalpyKJPerMol: -60, reactionEntropyJPerMolK: -110, gasMoleChange: -1 }).kReverse // 2985.832550161854
 */
export function reverseRateConstant(input: StepThermodynamics & { kForward: number; temperatureK: number }): StepEquilibrium & { kReverse: number; lnKReverse: number; derivation: DerivationLine[] } {
  const kForward = requirePositive('kForward', input.kForward, 'k of the forward step');
  const equilibrium = stepEquilibrium(input, input.temperatureK);
  const lnKReverse = Math.log(kForward) - equilibrium.lnRateRatio;
  const kReverse = safeProduct(kForward / equilibrium.rateRatio, lnKReverse);
  return {
    ...equilibrium,
    kReverse,
    lnKReverse,
    derivation: [operationLine(`k_r = k_f/K: ${equilibriumText(input, readThermodynamics(input))}, T = ${quantityText(input.temperatureK)} K`, { value: kForward }, { value: kReverse }, detailedBalance, { constant: gasConstant })],
  };
}

function equilibriumText({ reactionEntropyJPerMolK }: { reactionEntropyJPerMolK?: number }, { dH, dNu, p0, concentration }: Read): string {
  const gas = dNu === 0 ? 'Δν = 0' : `Δν = ${dNu}, p° = ${quantityText(p0)} Pa, gas as ${concentration ? 'concentrations' : 'pressures'}`;
  return `ΔH° = ${quantityText(dH)} kJ/mol, ΔS° = ${quantityText(reactionEntropyJPerMolK as number)} J mol-1 K-1, ${gas}`;
}

type Factors = Pick<ReverseStepResult, 'preExponentialReverse' | 'lnPreExponentialReverse'>;

function reverseFactor(input: ReverseStepInput, known: Read, T0: number): Factors & { lines: DerivationLine[] } {
  const { preExponentialForward, reactionEntropyJPerMolK: S } = input;
  if (preExponentialForward === undefined || S === undefined) return { lines: [] };
  const A = requirePositive('preExponentialForward', preExponentialForward, 'A of the forward step');
  requireFinite('reactionEntropyJPerMolK', S);
  const factor = gasFactor(known, T0);
  const ln = Math.log(A) - S / R - known.dNu * Math.log(factor);
  const value = safeProduct((A * Math.exp(-S / R)) / factor ** known.dNu, ln);
  const words = known.concentration ? 'A_r = A_f exp(-ΔS°/R)/(p°/RT0)^Δν' : 'A_r = A_f exp(-ΔS°/R)/(p°)^Δν';
  const at = known.concentration && known.dNu !== 0 ? `, T0 = ${quantityText(T0)} K` : '';
  return {
    preExponentialReverse: value,
    lnPreExponentialReverse: ln,
    lines: [operationLine(`${words}: ${equilibriumText(input, known)}${at}`, { value: A }, { value }, detailedBalance, { constant: gasConstant, assumption: 'ΔH° and ΔS° do not change with temperature; coverages with θ° = 1' })],
  };
}

function atTemperature(input: ReverseStepInput, energies: { forward: number; reverse: number }, exponents: { forward: number; reverse: number }, factors: Factors, T0: number): Partial<ReverseStepResult> & { lines: DerivationLine[] } {
  if (input.temperatureK === undefined) return { lines: [] };
  const T = requireTemperature('temperatureK', input.temperatureK);
  const local = (side: 'forward' | 'reverse'): number => energies[side] + (exponents[side] * R * T) / 1000;
  const found: Partial<ReverseStepResult> = { localEnergyForwardKJPerMol: local('forward'), localEnergyReverseKJPerMol: local('reverse') };
  const { reactionEntropyJPerMolK, preExponentialForward } = input;
  if (reactionEntropyJPerMolK === undefined) return { ...found, lines: [] };
  const { gibbsKJPerMol, equilibriumConstant, lnEquilibriumConstant } = stepEquilibrium({ ...input, reactionEntropyJPerMolK }, T);
  Object.assign(found, { gibbsKJPerMol, equilibriumConstant, lnEquilibriumConstant });
  const { preExponentialReverse, lnPreExponentialReverse } = factors;
  if (preExponentialForward === undefined || preExponentialReverse === undefined || lnPreExponentialReverse === undefined) return { ...found, lines: [] };
  const rate = (A: number, lnA: number, side: 'forward' | 'reverse'): { k: number; ln: number } => {
    const exponent = (-energies[side] * 1000) / (R * T);
    const ln = lnA + exponents[side] * Math.log(T / T0) + exponent;
    return { k: safeProduct(A * (T / T0) ** exponents[side] * Math.exp(exponent), ln), ln };
  };
  const { k: kReverse, ln: lnKReverse } = rate(preExponentialReverse, lnPreExponentialReverse, 'reverse');
  const power = exponents.reverse === 0 ? 'n = 0' : `n = ${quantityText(exponents.reverse)}, T0 = ${quantityText(T0)} K`;
  return {
    ...found,
    kForward: rate(preExponentialForward, Math.log(preExponentialForward), 'forward').k,
    kReverse,
    lnKReverse,
    lines: [operationLine(`k_r = A_r (T/T0)^n exp(-E_r/RT), ${power}, E = ${quantityText(energies.reverse)} kJ/mol, T = ${quantityText(T)} K`, { value: preExponentialReverse }, { value: kReverse }, references.glossary, { constant: gasConstant })],
  };
}

/**
 * Arrhenius parameters of the reverse step by detailed balance, exact at every temperature for constant ΔH° and ΔS°.
 *
 * On the basis of pressure E_r = E_f - ΔH°, n_r = n_f, A_r = A_f exp(-ΔS°/R)/(p°)^Δν, so the local energies differ by ΔH°.
 * On that of concentration E_r is the same, n_r = n_f + Δν and A_r = A_f exp(-ΔS°/R) (RT0/p°)^Δν, so the local energies differ by ΔH° - ΔνRT.
 * Like goes with like: an electronic barrier with an electronic reaction energy, a zero-point-corrected one with ΔE0, a Gibbs energy with ΔG.
 * Without A or ΔS° the reverse A is left out, without T what needs T.
 * Source: detailed balance; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149; Green Book, 3rd edition, 2.11 and 2.12.
 * @throws KineticsError on A, T, T0 or p° not above 0, or a number that is not finite.
 * @example reverseStep({ energyForwardKJPerMol: 120, reactionEnthalpyKJPerMol: 95, preExponentialForward: 1e15, reactionEntropyJPerMolK: -140, temperatureK: 1200 }).kReverse // 1.6768970383562768e21
 */
export function reverseStep(input: ReverseStepInput): ReverseStepResult {
  const forward = requireFinite('energyForwardKJPerMol', input.energyForwardKJPerMol);
  const known = readThermodynamics(input);
  const n = requireFinite('exponentForward', input.exponentForward ?? 0);
  const T0 = requireTemperature('referenceTemperatureK', input.referenceTemperatureK ?? 1, 'T0');
  const reverse = forward - known.dH;
  const exponentReverse = known.concentration ? n + known.dNu : n;
  const warnings: ReverseWarning[] = [];
  if (reverse < 0) warnings.push({ code: 'negative-energy', message: `the reverse energy is ${quantityText(reverse)} kJ/mol: the forward one lies below the reaction enthalpy, as no elementary step does beyond its uncertainties` });
  if (input.preExponentialForward !== undefined && input.reactionEntropyJPerMolK === undefined) warnings.push({ code: 'no-entropy', message: 'the reverse pre-exponential factor and k need the reaction entropy, which is not given' });
  const { lines: factorLines, ...factors } = reverseFactor(input, known, T0);
  const { lines: rateLines, ...rates } = atTemperature(input, { forward, reverse }, { forward: n, reverse: exponentReverse }, factors, T0);
  return {
    energyReverseKJPerMol: reverse,
    exponentReverse,
    ...factors,
    ...rates,
    warnings,
    derivation: [
      operationLine(`E_r = E_f - ΔH°, ΔH° = ${quantityText(known.dH)} kJ/mol`, { value: forward, unit: 'kJ/mol' }, { value: reverse, unit: 'kJ/mol' }, detailedBalance),
      ...(exponentReverse === n ? [] : [operationLine(`n_r = n_f + Δν on concentrations, Δν = ${known.dNu}`, { value: n }, { value: exponentReverse }, detailedBalance)]),
      ...factorLines,
      ...rateLines,
    ],
  };
}
