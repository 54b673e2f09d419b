import { R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requireNonNegative, requirePositive, requireTemperature } from './kinetics-error.ts';

/** Parameters of k = A (T/T0)^n exp(-E/RT). */
export interface ArrheniusParameters {
  /** A, in the unit of k. */
  preExponential: number;
  /** n, 0 when absent. */
  exponent?: number;
  /** T0 [K], 1 K when absent. */
  referenceTemperatureK?: number;
  /** E [kJ mol-1]. */
  energyKJPerMol: number;
}

/** A rate constant at one temperature. */
export interface RateAt {
  /** k, in the unit of A; 0 or Infinity outside double range, where `lnK` still holds. */
  k: number;
  lnK: number;
  /** E + nRT [kJ mol-1]. */
  localEnergyKJPerMol: number;
  /** Standard uncertainty of ln k; null when it is not known. */
  uLnK: number | null;
  /** Least and greatest u(ln k) over all correlations, where the correlation is not known. */
  uLnKRange?: [number, number];
  derivation: DerivationLine[];
}

/**
 * ln k without allocating: for loops over many entries and temperatures.
 *
 * @param lnA natural logarithm of A
 * @param exponent n
 * @param lnT0 natural logarithm of T0 [K]
 * @param energyOverR E/R [K]
 * @param temperatureK T [K]
 * @example lnRateAt(Math.log(1e13), 0, 0, 72400 / R, 300) // 0.9078778586113759
 */
export function lnRateAt(lnA: number, exponent: number, lnT0: number, energyOverR: number, temperatureK: number): number {
  return exponent === 0 ? lnA - energyOverR / temperatureK : lnA + exponent * (Math.log(temperatureK) - lnT0) - energyOverR / temperatureK;
}

/**
 * u(ln k) at T without allocating, for a known correlation: u² = u²(ln A) + u²(E)/(RT)² - 2 r u(ln A) u(E)/(RT).
 *
 * Source: JCGM 100:2008 (GUM) 5.2.2.
 */
export function uLnRateAt(uLnA: number, uEnergyOverR: number, correlation: number, temperatureK: number): number {
  const b = uEnergyOverR / temperatureK;
  return Math.sqrt(Math.max(0, uLnA * uLnA + b * b - 2 * correlation * uLnA * b));
}

/** What k(T) and its uncertainty are computed from. */
export interface UncertainArrhenius extends ArrheniusParameters {
  /** Standard uncertainty of ln A. */
  uLnPreExponential?: number | null;
  /** Standard uncertainty of E [kJ mol-1]. */
  uEnergyKJPerMol?: number | null;
  /** Correlation of ln A and E; a missing one is never taken as 0. */
  correlation?: number | null;
}

/** Checked parameters of k(T), evaluated at many temperatures without allocating: by `rateEvaluator`. */
export class RateEvaluator {
  readonly lnA: number;
  readonly exponent: number;
  readonly lnT0: number;
  /** E/R [K]. */
  readonly energyOverR: number;
  readonly uLnA: number | null;
  /** u(E)/R [K]. */
  readonly uEnergyOverR: number | null;
  readonly correlation: number | null;

  constructor(input: UncertainArrhenius) {
    this.lnA = Math.log(requirePositive('preExponential', input.preExponential, 'A'));
    this.exponent = requireFinite('exponent', input.exponent ?? 0);
    this.lnT0 = Math.log(requireTemperature('referenceTemperatureK', input.referenceTemperatureK ?? 1, 'T0'));
    this.energyOverR = (requireFinite('energyKJPerMol', input.energyKJPerMol) * 1000) / R;
    this.uLnA = input.uLnPreExponential ?? null;
    const uE = input.uEnergyKJPerMol ?? null;
    this.correlation = input.correlation ?? null;
    if (this.uLnA !== null) requireNonNegative('uLnPreExponential', this.uLnA, 'u(ln A)');
    if (uE !== null) requireNonNegative('uEnergyKJPerMol', uE, 'u(E)', 'kJ/mol');
    if (this.correlation !== null && !(this.correlation >= -1 && this.correlation <= 1)) {
      throw new KineticsError('correlation', `correlation must be between -1 and 1, got ${this.correlation}`, 'out-of-range', this.correlation);
    }
    this.uEnergyOverR = uE === null ? null : (uE * 1000) / R;
  }

  /** ln k at a temperature [K] above 0, which the caller has checked. */
  lnK(temperatureK: number): number {
    return lnRateAt(this.lnA, this.exponent, this.lnT0, this.energyOverR, temperatureK);
  }

  /** k at a temperature [K] above 0; 0 or Infinity outside double range. */
  k(temperatureK: number): number {
    return Math.exp(this.lnK(temperatureK));
  }

  /** u(ln k) at a temperature [K] above 0; null where an uncertainty, or the correlation of two, is not known. */
  uLnK(temperatureK: number): number | null {
    const { uLnA, uEnergyOverR } = this;
    if (uLnA === null || uEnergyOverR === null) return null;
    if (uLnA === 0 || uEnergyOverR === 0) return uLnA + uEnergyOverR / temperatureK;
    return this.correlation === null ? null : uLnRateAt(uLnA, uEnergyOverR, this.correlation, temperatureK);
  }

  /** Least and greatest u(ln k) over all correlations, where the correlation alone is not known; otherwise null. */
  uLnKRange(temperatureK: number): [number, number] | null {
    const { uLnA, uEnergyOverR } = this;
    if (this.correlation !== null || uLnA === null || uEnergyOverR === null || uLnA === 0 || uEnergyOverR === 0) return null;
    const b = uEnergyOverR / temperatureK;
    return [Math.abs(uLnA - b), uLnA + b];
  }
}

/**
 * Checks modified Arrhenius parameters once, to evaluate them at many temperatures.
 *
 * Sources: as for `rateAt`, which gives the same figures with a derivation.
 * @throws KineticsError on A or T0 not above 0, a negative uncertainty, or a correlation outside -1 to 1.
 * @example rateEvaluator({ preExponential: 1e13, energyKJPerMol: 72.4 }).k(300) // 2.479056039812485
 */
export function rateEvaluator(input: UncertainArrhenius): RateEvaluator {
  return new RateEvaluator(input);
}

/** n, T0 and E as a derivation names them. */
function parametersText({ exponent = 0, referenceTemperatureK = 1, energyKJPerMol }: ArrheniusParameters): string {
  const power = exponent === 0 ? 'n = 0' : `n = ${quantityText(exponent)}, T0 = ${quantityText(referenceTemperatureK)} K`;
  return `${power}, E = ${quantityText(energyKJPerMol)} kJ/mol`;
}

function uncertaintyLines({ uLnPreExponential, uEnergyKJPerMol, correlation }: UncertainArrhenius, uLnK: number | null, T: number): DerivationLine[] {
  if (uLnPreExponential == null || uEnergyKJPerMol == null || uLnK === null) return [];
  const known = `u(E) = ${quantityText(uEnergyKJPerMol)} kJ/mol, r = ${quantityText(correlation ?? 0)}, T = ${quantityText(T)} K`;
  return [
    operationLine(`u²(ln k) = u²(ln A) + u²(E)/(RT)² - 2 r u(ln A) u(E)/(RT), ${known}`, { value: uLnPreExponential }, { value: uLnK }, references.gum, { constant: `R = ${R} J mol-1 K-1` }),
  ];
}

/** Input of `rateAt`. */
export interface RateAtInput extends UncertainArrhenius {
  temperatureK: number;
}

/**
 * Rate constant at a temperature from modified Arrhenius parameters, with its uncertainty.
 *
 * Without a correlation u(ln k) is the interval |u(ln A) - u(E)/RT| to u(ln A) + u(E)/RT; without u(ln A) or u(E) it is null.
 * Sources: IUPAC Gold Book, modified Arrhenius equation; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149; JCGM 100:2008 (GUM) 5.2.2.
 * @throws KineticsError on A, T or T0 not above 0, a negative uncertainty, or a correlation outside -1 to 1.
 * @example rateAt({ preExponential: 1e13, energyKJPerMol: 72.4, temperatureK: 300 }).k // 2.479056039812485
 */
export function rateAt(input: RateAtInput): RateAt {
  const evaluator = rateEvaluator(input);
  const T = requireTemperature('temperatureK', input.temperatureK);
  const { preExponential: A, energyKJPerMol: E } = input;
  const n = evaluator.exponent;
  const ratio = T / (input.referenceTemperatureK ?? 1);
  const exponentPart = (-E * 1000) / (R * T);
  const lnK = evaluator.lnA + n * Math.log(ratio) + exponentPart;
  // The product rounds less than the exponential of a sum, but may leave double range on the way.
  const direct = A * ratio ** n * Math.exp(exponentPart);
  const k = Number.isFinite(direct) && direct > 1e-300 ? direct : Math.exp(lnK);
  const uLnK = evaluator.uLnK(T);
  const uLnKRange = evaluator.uLnKRange(T);
  return {
    k,
    lnK,
    localEnergyKJPerMol: E + (n * R * T) / 1000,
    uLnK,
    ...(uLnKRange === null ? {} : { uLnKRange }),
    derivation: [
      operationLine(`k = A (T/T0)^n exp(-E/RT), ${parametersText(input)}, T = ${quantityText(T)} K`, { value: A }, { value: k }, references.glossary, {
        constant: `R = ${R} J mol-1 K-1`,
        assumption: input.referenceTemperatureK === undefined && n !== 0 ? 'T0 = 1 K, as none is stated' : undefined,
      }),
      ...uncertaintyLines(input, uLnK, T),
    ],
  };
}

/** Arrhenius parameters through two points. */
export interface TwoTemperature {
  preExponential: number;
  lnPreExponential: number;
  energyKJPerMol: number;
  derivation: DerivationLine[];
}

/**
 * A and E of the Arrhenius line through two rate constants.
 *
 * Source: IUPAC Gold Book, Arrhenius equation: E = R ln(k1/k2)/(1/T2 - 1/T1).
 * @throws KineticsError on a rate constant or temperature not above 0, or equal temperatures.
 * @example twoTemperature({ k1: 1.2e-3, temperature1K: 300, k2: 4.5e-2, temperature2K: 350 }).energyKJPerMol // 63.282339125616716
 */
export function twoTemperature(input: { k1: number; temperature1K: number; k2: number; temperature2K: number }): TwoTemperature {
  const k1 = requirePositive('k1', input.k1);
  const k2 = requirePositive('k2', input.k2);
  const T1 = requireTemperature('temperature1K', input.temperature1K, 'T1');
  const T2 = requireTemperature('temperature2K', input.temperature2K, 'T2');
  if (T1 === T2) throw new KineticsError('temperature2K', `the two temperatures must differ, both are ${T1} K`, 'out-of-range', T2);
  const ratio = Math.log(k2) - Math.log(k1);
  const span = (T2 - T1) / (T1 * T2);
  const energyKJPerMol = (R * ratio) / span / 1000;
  // The intercept weights the point that is nearer to 1/T = 0, which keeps the extrapolation short.
  const lnA = (T2 * Math.log(k2) - T1 * Math.log(k1)) / (T2 - T1);
  return {
    preExponential: Math.exp(lnA),
    lnPreExponential: lnA,
    energyKJPerMol,
    derivation: [
      operationLine(`E = R ln(k2/k1)/(1/T1 - 1/T2), T1 = ${quantityText(T1)} K, T2 = ${quantityText(T2)} K, from ln(k2/k1)`, { value: ratio }, { value: energyKJPerMol, unit: 'kJ/mol' }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
      operationLine(`A = k1 exp(E/RT1), E = ${quantityText(energyKJPerMol)} kJ/mol, T1 = ${quantityText(T1)} K`, { value: k1 }, { value: Math.exp(lnA) }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
    ],
  };
}

/** Basis of the gas factors of a rate constant. */
export type GasBasis = 'concentration' | 'pressure';

/** Result of a change of basis: the same four parameters. */
export interface ChangedBasis {
  preExponential: number;
  exponent: number;
  referenceTemperatureK: number;
  energyKJPerMol: number;
  derivation: DerivationLine[];
}

/**
 * Changes the gas basis of Arrhenius parameters, exactly at every temperature.
 *
 * A_p = A_c/(R T0)^g and n_p = n - g with E unchanged, so k_p = k_c/(RT)^g holds for all T. A in SI (m3, mol, Pa, s).
 * Source: ideal gas law; IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on A or T0 not above 0, or a number that is not finite.
 * @example changeBasis({ preExponential: 1e7, energyKJPerMol: 35, gasOrder: 1, from: 'concentration', to: 'pressure' }).exponent // -1
 */
export function changeBasis(input: ArrheniusParameters & { gasOrder: number; from: GasBasis; to: GasBasis }): ChangedBasis {
  const A = requirePositive('preExponential', input.preExponential, 'A');
  const n = requireFinite('exponent', input.exponent ?? 0);
  const T0 = requireTemperature('referenceTemperatureK', input.referenceTemperatureK ?? 1, 'T0');
  const E = requireFinite('energyKJPerMol', input.energyKJPerMol);
  const g = requireFinite('gasOrder', input.gasOrder);
  if (input.from === input.to) {
    return { preExponential: A, exponent: n, referenceTemperatureK: T0, energyKJPerMol: E, derivation: [operationLine('Basis kept', { value: A }, { value: A }, references.idealGas)] };
  }
  const toPressure = input.to === 'pressure';
  const factor = (R * T0) ** g;
  const preExponential = toPressure ? A / factor : A * factor;
  const exponent = toPressure ? n - g : n + g;
  return {
    preExponential,
    exponent,
    referenceTemperatureK: T0,
    energyKJPerMol: E,
    derivation: [
      operationLine(toPressure ? `A_p = A_c/(R T0)^${g}, T0 = ${quantityText(T0)} K` : `A_c = A_p (R T0)^${g}, T0 = ${quantityText(T0)} K`, { value: A }, { value: preExponential }, references.idealGas, {
        constant: `R = ${R} J mol-1 K-1`,
        assumption: input.referenceTemperatureK === undefined ? 'T0 = 1 K, as none is stated' : undefined,
      }),
      operationLine(toPressure ? `n_p = n_c - ${g}, E unchanged` : `n_c = n_p + ${g}, E unchanged`, { value: n }, { value: exponent }, references.idealGas),
    ],
  };
}
