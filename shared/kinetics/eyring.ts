import { h, k_B, R } from './constants.ts';
import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requirePositive, requireTemperature } from './kinetics-error.ts';

/** Where the elementary step takes place: at the surface, in the gas, or from the gas onto the surface. */
export type EyringPhase = 'surface' | 'gas' | 'gas-surface';

/** Standard state of the entropy of activation of a gas reaction. */
export type StandardState = '1 bar' | '1 mol/L';

interface EyringSystem {
  temperatureK: number;
  phase: EyringPhase;
  /** Molecules on the reactant side, 1 or 2. */
  molecularity: 1 | 2;
  /** Transmission coefficient κ, 1 when absent. */
  transmission?: number;
  standardState?: StandardState;
}

/** Input from thermodynamics of activation. */
export interface EyringToArrheniusInput extends EyringSystem {
  enthalpyKJPerMol: number;
  entropyJPerMolK: number;
}

/** Input from Arrhenius parameters. */
export interface ArrheniusToEyringInput extends EyringSystem {
  preExponential: number;
  energyKJPerMol: number;
}

const standardPressure = 1e5;
const goldBook = 'IUPAC Gold Book E02142';
const constant = `R = ${R} J mol-1 K-1, k_B = ${k_B} J K-1, h = ${h} J s`;

interface Form {
  /** Multiplies e (k_B T/h) exp(ΔS/R) to give A. */
  factor: number;
  /** E - ΔH in units of RT. */
  shift: number;
  unit: string;
  words: string;
  /** The standard state's part of k, in words; empty where there is none. */
  standard: string;
}

/** Δn‡ counts gas molecules in the transition state minus those in the reactants. */
function formOf(input: EyringSystem): Form {
  const T = requireTemperature('temperatureK', input.temperatureK);
  if (input.molecularity !== 1 && input.molecularity !== 2) throw new KineticsError('molecularity', `molecularity must be 1 or 2, got ${String(input.molecularity)}`, 'out-of-range', input.molecularity);
  const state = input.standardState ?? '1 bar';
  if (input.phase === 'surface' || (input.phase === 'gas' && input.molecularity === 1)) {
    return { factor: 1, shift: 1, unit: 's-1', words: input.phase === 'surface' ? 'E = ΔH‡ + RT, coverages with θ° = 1' : 'E = ΔH‡ + RT', standard: '' };
  }
  if (input.phase === 'gas') {
    const volume = state === '1 bar' ? (R * T) / standardPressure : 1e-3;
    return { factor: Math.E * volume, shift: 2, unit: 'm3 mol-1 s-1', words: `E = ΔH‡ + 2RT, standard state ${state}`, standard: state === '1 bar' ? ' (RT/p°)' : '/c°' };
  }
  // Δn‡ = -1: one gas molecule adsorbs and the transition state holds no gas.
  const pressure = state === '1 bar' ? standardPressure : 1e3 * R * T;
  return { factor: 1 / pressure, shift: 1, unit: 'Pa-1 s-1', words: `E = ΔH‡ + RT, Δn‡ = -1, per site, standard state ${state}`, standard: state === '1 bar' ? '/p°' : '/(c° RT)' };
}

/** Rate constant and tangent Arrhenius parameters at T. */
export interface EyringResult {
  k: number;
  preExponential: number;
  energyKJPerMol: number;
  gibbsKJPerMol: number;
  unit: string;
  derivation: DerivationLine[];
}

/**
 * Turns enthalpy and entropy of activation into k and the tangent A and E at T.
 *
 * Surface steps and unimolecular gas: E = ΔH‡ + RT, A = κ e (k_B T/h) exp(ΔS‡/R). Gas bimolecular: E = ΔH‡ + 2RT,
 * A = κ e² (k_B T/h)(RT/p°) exp(ΔS‡/R). Adsorption and Eley–Rideal on pressure: Δn‡ = -1, A = κ e (k_B T/h)/p° exp(ΔS‡/R).
 * Source: IUPAC Gold Book E02142; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on T or κ not above 0, or a molecularity other than 1 or 2.
 * @example eyringToArrhenius({ enthalpyKJPerMol: 72.4, entropyJPerMolK: -35.2, temperatureK: 500, phase: 'surface', molecularity: 1 }).energyKJPerMol // 76.55723130907662
 */
export function eyringToArrhenius(input: EyringToArrheniusInput): EyringResult {
  const form = formOf(input);
  const T = input.temperatureK;
  const H = requireFinite('enthalpyKJPerMol', input.enthalpyKJPerMol);
  const S = requireFinite('entropyJPerMolK', input.entropyJPerMolK);
  const kappa = requirePositive('transmission', input.transmission ?? 1, 'transmission coefficient');
  const preExponential = kappa * Math.E * ((k_B * T) / h) * form.factor * Math.exp(S / R);
  const energyKJPerMol = H + (form.shift * R * T) / 1000;
  const gibbsKJPerMol = H - (T * S) / 1000;
  const lnK = Math.log(kappa) + Math.log((k_B * T) / h) + Math.log(form.factor) + 1 - form.shift - (gibbsKJPerMol * 1000) / (R * T);
  const k = Math.exp(lnK);
  return {
    k,
    preExponential,
    energyKJPerMol,
    gibbsKJPerMol,
    unit: form.unit,
    derivation: [
      operationLine(`ΔG‡ = ΔH‡ - TΔS‡, ΔS‡ = ${quantityText(S)} J mol-1 K-1, T = ${quantityText(T)} K`, { value: H, unit: 'kJ/mol' }, { value: gibbsKJPerMol, unit: 'kJ/mol' }, goldBook),
      operationLine(`k = κ (k_B T/h)${form.standard} exp(-ΔG‡/RT), κ = ${quantityText(kappa)}, T = ${quantityText(T)} K`, { value: gibbsKJPerMol, unit: 'kJ/mol' }, { value: k, unit: form.unit }, goldBook, { constant }),
      operationLine(`${form.words}, T = ${quantityText(T)} K`, { value: H, unit: 'kJ/mol' }, { value: energyKJPerMol, unit: 'kJ/mol' }, goldBook, { constant, assumption: `A and E are tangent values at T = ${quantityText(T)} K` }),
      operationLine(`A = k exp(E/RT), E = ${quantityText(energyKJPerMol)} kJ/mol, T = ${quantityText(T)} K`, { value: k, unit: form.unit }, { value: preExponential, unit: form.unit }, goldBook, { constant }),
    ],
  };
}

/** Thermodynamics of activation at T. */
export interface ActivationThermodynamics {
  enthalpyKJPerMol: number;
  entropyJPerMolK: number;
  gibbsKJPerMol: number;
  derivation: DerivationLine[];
}

/**
 * Turns A and E, tangent at T, into enthalpy, entropy and Gibbs energy of activation; the inverse of `eyringToArrhenius`.
 *
 * Source: IUPAC Gold Book E02142.
 * @throws KineticsError on A, T or κ not above 0.
 * @example arrheniusToEyring({ preExponential: 1e13, energyKJPerMol: 72.4, temperatureK: 298.15, phase: 'surface', molecularity: 1 }).entropyJPerMolK // -4.356514986046
 */
export function arrheniusToEyring(input: ArrheniusToEyringInput): ActivationThermodynamics {
  const form = formOf(input);
  const T = input.temperatureK;
  const A = requirePositive('preExponential', input.preExponential, 'A');
  const E = requireFinite('energyKJPerMol', input.energyKJPerMol);
  const kappa = requirePositive('transmission', input.transmission ?? 1, 'transmission coefficient');
  const enthalpyKJPerMol = E - (form.shift * R * T) / 1000;
  const entropyJPerMolK = R * (Math.log(A) - Math.log(kappa) - 1 - Math.log((k_B * T) / h) - Math.log(form.factor));
  const gibbsKJPerMol = enthalpyKJPerMol - (T * entropyJPerMolK) / 1000;
  return {
    enthalpyKJPerMol,
    entropyJPerMolK,
    gibbsKJPerMol,
    derivation: [
      operationLine(`${form.words.replace('E = ΔH‡ +', 'ΔH‡ = E -')}, T = ${quantityText(T)} K`, { value: E, unit: 'kJ/mol' }, { value: enthalpyKJPerMol, unit: 'kJ/mol' }, goldBook, { constant, assumption: `values at T = ${quantityText(T)} K` }),
      operationLine(`ΔG‡ = -RT ln[k/(κ (k_B T/h)${form.standard})] with k = A exp(-E/RT), E = ${quantityText(E)} kJ/mol, κ = ${quantityText(kappa)}, T = ${quantityText(T)} K`, { value: A, unit: form.unit }, { value: gibbsKJPerMol, unit: 'kJ/mol' }, goldBook, { constant }),
      operationLine(`ΔS‡ = (ΔH‡ - ΔG‡)/T, ΔH‡ = ${quantityText(enthalpyKJPerMol)} kJ/mol, T = ${quantityText(T)} K`, { value: gibbsKJPerMol, unit: 'kJ/mol' }, { value: entropyJPerMolK, unit: 'J mol-1 K-1' }, goldBook),
    ],
  };
}
