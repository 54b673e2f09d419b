import { R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { radiationConstantText, reducedWavenumber, requireWavenumber, secondRadiationConstant } from './kie-wavenumber.ts';
import { KineticsError, requireNonNegative, requirePositive, requireTemperature } from './kinetics-error.ts';

/** Models of the tunnelling factor. */
export const tunnellingModels = ['wigner', 'bell-1935', 'bell-1959'] as const;

/** One of `tunnellingModels`. */
export type TunnellingModel = (typeof tunnellingModels)[number];

const sources: Record<TunnellingModel, string> = {
  wigner: 'Wigner, Z. Phys. Chem. B 19 (1932) 203',
  'bell-1935': 'Bell, Proc. R. Soc. A 148 (1935) 241',
  'bell-1959': 'Bell, Trans. Faraday Soc. 55 (1959) 1',
};

const formulas: Record<TunnellingModel, string> = {
  wigner: 'κ = 1 + u²/24',
  'bell-1935': 'κ = e^α/(β - α) [β e^-α - α e^-β], α = E/RT, β = 2πα/u',
  'bell-1959': 'κ = (u/2)/sin(u/2) - Σ (-1)^n α e^(α - nβ)/(α - nβ), α = E/RT, β = 2πα/u',
};

/**
 * Wigner's tunnelling factor κ = 1 + u²/24 [1] of a reduced imaginary frequency u [1]: the first term of a series, for u well below 2π.
 *
 * Source: Wigner, Z. Phys. Chem. B 19 (1932) 203.
 * @example wignerFactor(7.193884387519669) // 3.1563321908749686
 */
export function wignerFactor(u: number): number {
  return 1 + (u * u) / 24;
}

/** (e^x - 1)/x, 1 at x = 0. */
function expm1Ratio(x: number): number {
  return x === 0 ? 1 : Math.expm1(x) / x;
}

/**
 * Bell's first tunnelling factor, of particles that pass a parabolic barrier by tunnelling below its top and without reflection above it.
 *
 * κ = e^α/(β - α) [β e^-α - α e^-β] with β = 2πα/u, written as 1 + α(1 - e^(α-β))/(β - α), which has no pole at u = 2π.
 * Source: Bell, Proc. R. Soc. A 148 (1935) 241.
 * @param u reduced imaginary frequency hν/k_BT [1]
 * @param alpha barrier over k_BT, E/RT [1]
 * @example bell1935Factor(2.158165316255901, 21.769296262733413) // 1.5231890562965826
 */
export function bell1935Factor(u: number, alpha: number): number {
  const beta = (2 * Math.PI * alpha) / u;
  return 1 + alpha * expm1Ratio(alpha - beta);
}

/** π/sin(πx) - 1/x: what is left of a pole of the sine at x = 0, for |x| up to ½. */
function poleRemainder(x: number): number {
  if (Math.abs(x) >= 0.05) return Math.PI / Math.sin(Math.PI * x) - 1 / x;
  const s = (Math.PI * x) ** 2;
  // Series of the cosecant (Abramowitz and Stegun 4.3.68); the next term is below 1e-15 of the first here.
  return Math.PI * Math.PI * x * (1 / 6 + s * (7 / 360 + s * (31 / 15120 + s * (127 / 604800 + s * (73 / 3421440 + s * (1414477 / 653837184000))))));
}

const accelerationTerms = 26;

/**
 * Sum of (-1)^k term(k) from k = 0 for terms that fall totally monotonously; the error is below 5.8^-26 of the first term.
 * Source: Cohen, Rodriguez Villegas and Zagier, Exp. Math. 9 (2000) 3, algorithm 1.
 */
function alternatingSum(term: (k: number) => number): number {
  const n = accelerationTerms;
  const power = (3 + Math.sqrt(8)) ** n;
  const d = (power + 1 / power) / 2;
  let b = -1;
  let weight = -d;
  let sum = 0;
  for (let k = 0; k < n; k += 1) {
    weight = b - weight;
    sum += weight * term(k);
    b *= ((k + n) * (k - n)) / ((k + 0.5) * (k + 1));
  }
  return sum / d;
}

const alternate = (n: number): number => (n % 2 === 0 ? 1 : -1);

/**
 * Bell's second tunnelling factor, of a truncated parabola with reflection above its top, with its whole series.
 *
 * κ = (u/2)/sin(u/2) - Σ_{n≥1} (-1)^n α e^(α - nβ)/(α - nβ) with β = 2πα/u. The sine and the term of the series nearest to it share a
 * pole at u = 2πn and are added in closed form, so the result is smooth there; the tail of the series is summed to the end by acceleration.
 * Equal to the integral of the transmission 1/(1 + e^(β(1 - W/E))) over W > 0.
 * Source: Bell, Trans. Faraday Soc. 55 (1959) 1.
 * @param u reduced imaginary frequency hν/k_BT [1]
 * @param alpha barrier over k_BT, E/RT [1]
 * @example bell1959Factor(6.714292095018358, 12.027235504272603) // 18.01692095915481
 */
export function bell1959Factor(u: number, alpha: number): number {
  const a = u / (2 * Math.PI);
  const beta = alpha / a;
  const pole = Math.round(a);
  const offset = a - pole;
  const nearPole = pole === 0 ? Math.PI / Math.sin(Math.PI * a) : alternate(pole) * (poleRemainder(offset) - beta * expm1Ratio(offset * beta));
  let head = 0;
  for (let n = 1; n < pole; n += 1) head += (alternate(n) * Math.exp((a - n) * beta)) / (n - a);
  const tail = alternate(pole + 1) * alternatingSum((k) => Math.exp((a - pole - 1 - k) * beta) / (pole + 1 + k - a));
  return a * (nearPole + head + tail);
}

/** Input of `tunnellingFactor`. */
export interface TunnellingInput {
  model: TunnellingModel;
  /** Modulus of the imaginary wavenumber [cm-1]. */
  imaginaryPerCm: number;
  /** [K] */
  temperatureK: number;
  /** Height of the barrier [kJ mol-1]; needed by both of Bell's models. */
  energyKJPerMol?: number;
}

/** A tunnelling factor with what it rests on. */
export interface TunnellingResult {
  /** Factor on the rate constant [1]. */
  kappa: number;
  /** Reduced imaginary frequency hν/k_BT [1]. */
  u: number;
  /** Temperature at which u = 2π [K]: tunnelling rules below it. */
  crossoverTemperatureK: number;
  /** E/RT [1], for Bell's models. */
  alpha?: number;
  /** 2πE/hν [1], for Bell's models. */
  beta?: number;
  warnings: string[];
  derivation: DerivationLine[];
}

/** Largest u taken: beyond it the alternating series loses digits. */
const greatestU = 2e4 * Math.PI;

function warningsOf(model: TunnellingModel, u: number, beta: number | undefined): string[] {
  const warnings: string[] = [];
  const size = u.toPrecision(4);
  if (model === 'wigner' && u >= 2 * Math.PI) warnings.push(`u = ${size} is not below 2π: Wigner's formula does not hold here and gives too small a factor.`);
  else if (model === 'wigner' && u > Math.PI) warnings.push(`u = ${size} is not well below 2π: Wigner's formula is the first term of a series whose further terms count here.`);
  else if (model !== 'wigner' && u >= 2 * Math.PI) warnings.push(`u = ${size} is not below 2π: most of the rate passes near the foot of the barrier, where a parabola is a poor likeness. Take the factor as an order of magnitude.`);
  if (beta !== undefined && beta < 2 * Math.PI) warnings.push('The barrier is lower than one quantum of its own imaginary frequency: a parabola of that curvature does not describe it.');
  return warnings;
}

/**
 * Tunnelling factor κ on a rate constant, from the imaginary wavenumber of the transition state and, for Bell's models, the barrier.
 *
 * Wigner's formula holds for u = hν/k_BT well below 2π; a warning says where it does not.
 * Sources: Wigner, Z. Phys. Chem. B 19 (1932) 203; Bell, Proc. R. Soc. A 148 (1935) 241; Bell, Trans. Faraday Soc. 55 (1959) 1.
 * @throws KineticsError on a wavenumber below 0 (for Bell's models not above 0), T or a barrier not above 0, a barrier missing for Bell's models, u above 2π × 10⁴, or a factor beyond double precision.
 * @example tunnellingFactor({ model: 'wigner', imaginaryPerCm: 500, temperatureK: 600 }).kappa // 1.0598981164131935
 */
export function tunnellingFactor(input: TunnellingInput): TunnellingResult {
  const { model } = input;
  // Wigner's formula has its limit 1 at 0; Bell's parabola would be flat there.
  const wavenumber = model === 'wigner' ? requireNonNegative('imaginaryPerCm', input.imaginaryPerCm, 'imaginaryPerCm', 'cm-1') : requireWavenumber('imaginaryPerCm', input.imaginaryPerCm);
  const T = requireTemperature('temperatureK', input.temperatureK);
  const u = reducedWavenumber(wavenumber, T);
  if (!(u <= greatestU)) throw new KineticsError('temperatureK', `u = hν/k_BT = ${u.toPrecision(4)} is too large for a tunnelling factor: it must not exceed ${greatestU.toFixed(0)}`, 'out-of-range', T);
  const crossoverTemperatureK = (secondRadiationConstant * wavenumber) / (2 * Math.PI);
  const line = (kappa: number, barrier = '', assumption?: string): DerivationLine[] => [
    operationLine(`u = hcν/k_BT, T = ${quantityText(T)} K`, { value: wavenumber, unit: 'cm-1' }, { value: u }, references.codata, { constant: radiationConstantText }),
    operationLine(`${formulas[model]}${barrier}`, { value: u }, { value: kappa }, sources[model], { assumption }),
  ];
  if (model === 'wigner') {
    const kappa = wignerFactor(u);
    return { kappa, u, crossoverTemperatureK, warnings: warningsOf(model, u, undefined), derivation: line(kappa) };
  }
  if (input.energyKJPerMol === undefined) throw new KineticsError('energyKJPerMol', 'energyKJPerMol is needed: Bell’s models take the height of the barrier', 'missing-input');
  const energy = requirePositive('energyKJPerMol', input.energyKJPerMol, 'the barrier', 'kJ/mol');
  const alpha = (energy * 1000) / (R * T);
  const beta = (2 * Math.PI * alpha) / u;
  const kappa = model === 'bell-1935' ? bell1935Factor(u, alpha) : bell1959Factor(u, alpha);
  if (!(kappa > 0 && kappa < Infinity)) throw new KineticsError('temperatureK', `the tunnelling factor leaves the range of double precision: E/RT = ${alpha.toPrecision(4)}, 2πE/hν = ${beta.toPrecision(4)}`, 'out-of-range', T);
  return { kappa, u, crossoverTemperatureK, alpha, beta, warnings: warningsOf(model, u, beta), derivation: line(kappa, `, α = ${quantityText(alpha)}, β = ${quantityText(beta)}`, `parabolic barrier, E = ${quantityText(energy)} kJ/mol, R = ${R} J mol-1 K-1`) };
}

/** Input of `tunnellingKie`. */
export interface TunnellingKieInput {
  model: TunnellingModel;
  /** Modulus of the imaginary wavenumbers [cm-1]. */
  imaginaryLightPerCm: number;
  imaginaryHeavyPerCm: number;
  /** [K] */
  temperatureK: number;
  /** Barriers [kJ mol-1], for Bell's models. */
  energyLightKJPerMol?: number;
  energyHeavyKJPerMol?: number;
}

/** The share of tunnelling in an isotope effect. */
export interface TunnellingKie {
  /** κ_L/κ_H: multiplies a semiclassical isotope effect. */
  kie: number;
  lnKie: number;
  kappaLight: number;
  kappaHeavy: number;
  warnings: string[];
  derivation: DerivationLine[];
}

/** The factor of one isotopologue; what is refused names its own input. */
function factorOf(input: TunnellingKieInput, isotope: 'Light' | 'Heavy'): TunnellingResult {
  const ownPaths: Record<string, string> = { imaginaryPerCm: `imaginary${isotope}PerCm`, energyKJPerMol: `energy${isotope}KJPerMol` };
  try {
    return tunnellingFactor({ model: input.model, imaginaryPerCm: input[`imaginary${isotope}PerCm`], temperatureK: input.temperatureK, energyKJPerMol: input[`energy${isotope}KJPerMol`] });
  } catch (error) {
    const own = error instanceof KineticsError ? ownPaths[error.path] : undefined;
    if (own === undefined) throw error;
    const { path, message, code, value } = error as KineticsError;
    throw new KineticsError(own, message.replace(path, own), code, value);
  }
}

/**
 * Ratio of the tunnelling factors of two isotopologues, κ_L/κ_H, that multiplies a semiclassical isotope effect.
 *
 * Source: as for `tunnellingFactor`.
 * @throws KineticsError as `tunnellingFactor`, naming the input of the light or the heavy isotopologue.
 * @example tunnellingKie({ model: 'wigner', imaginaryLightPerCm: 1050, imaginaryHeavyPerCm: 790, temperatureK: 298.15 }).kie // 1.289114263135687
 */
export function tunnellingKie(input: TunnellingKieInput): TunnellingKie {
  const light = factorOf(input, 'Light');
  const heavy = factorOf(input, 'Heavy');
  const kie = light.kappa / heavy.kappa;
  return {
    kie,
    lnKie: Math.log(kie),
    kappaLight: light.kappa,
    kappaHeavy: heavy.kappa,
    warnings: [...light.warnings.map((text) => `Light: ${text}`), ...heavy.warnings.map((text) => `Heavy: ${text}`)],
    derivation: [...light.derivation, ...heavy.derivation, operationLine(`κ_L/κ_H, κ_H = ${quantityText(heavy.kappa)}`, { value: light.kappa }, { value: kie }, sources[input.model])],
  };
}
