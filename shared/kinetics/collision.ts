import { k_B, N_A, R, Torr } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { requireNonNegative, requirePositive, requireTemperature } from './kinetics-error.ts';
import { requireSticking } from './sticking-coefficient.ts';

/** A gas at one temperature. */
export interface Gas {
  /** Molar mass [g mol-1]. */
  molarMassGPerMol: number;
  /** Temperature of the gas [K]. */
  temperatureK: number;
}

const kineticTheory = 'Hertz–Knudsen equation, kinetic theory of gases; impingement rate of ISO 3529-1';

/** Constants that the lines of a collision rate name. */
const constants = `R = ${R} J mol-1 K-1, N_A = ${quantityText(N_A)} mol-1`;

const gasText = ({ molarMassGPerMol, temperatureK }: Gas): string => `M = ${quantityText(molarMassGPerMol)} g/mol, T = ${quantityText(temperatureK)} K`;

function checkGas({ molarMassGPerMol, temperatureK }: Gas): { massKgPerMol: number; T: number } {
  return {
    massKgPerMol: requirePositive('molarMassGPerMol', molarMassGPerMol, 'the molar mass', 'g/mol') / 1000,
    T: requireTemperature('temperatureK', temperatureK),
  };
}

/**
 * Molecules that strike a unit area per time and pressure, 1/√(2π m k_B T) [m-2 s-1 Pa-1].
 *
 * Source: Hertz–Knudsen equation, kinetic theory of gases.
 * @throws KineticsError on a molar mass or T not above 0.
 * @example fluxPerPressure({ molarMassGPerMol: 31.998, temperatureK: 500 }) // 2.083039265276845e+22
 */
export function fluxPerPressure(gas: Gas): number {
  const { massKgPerMol, T } = checkGas(gas);
  return N_A / Math.sqrt(2 * Math.PI * massKgPerMol * R * T);
}

/**
 * Mean speed of the molecules of a gas, √(8RT/πM) [m s-1].
 *
 * Source: Maxwell distribution, kinetic theory of gases; IUPAC Green Book, 3rd edition.
 * @throws KineticsError on a molar mass or T not above 0.
 * @example meanSpeed({ molarMassGPerMol: 4.002602, temperatureK: 77 }) // 638.2066251549832
 */
export function meanSpeed(gas: Gas): number {
  const { massKgPerMol, T } = checkGas(gas);
  return Math.sqrt((8 * R * T) / (Math.PI * massKgPerMol));
}

/**
 * Molecules per volume of an ideal gas, p/(k_B T) [m-3].
 *
 * Source: ideal gas law.
 * @throws KineticsError on a negative pressure, or T not above 0.
 * @example numberDensity({ pressurePa: 1e5, temperatureK: 500 }) // 1.4485941032079841e+25
 */
export function numberDensity({ pressurePa, temperatureK }: { pressurePa: number; temperatureK: number }): number {
  const p = requireNonNegative('pressurePa', pressurePa, 'the pressure', 'Pa');
  return p / (k_B * requireTemperature('temperatureK', temperatureK));
}

/** How often the molecules of a gas strike a surface. */
export interface CollisionFlux {
  /** Flux p/√(2π m k_B T) [m-2 s-1]. */
  fluxPerM2S: number;
  /** [m s-1] */
  meanSpeedMPerS: number;
  /** [m-3] */
  numberDensityPerM3: number;
  derivation: DerivationLine[];
}

/**
 * Collision flux of a gas on a surface by the Hertz–Knudsen equation, p/√(2π m k_B T), with the mean speed and the number density behind it.
 *
 * Source: Hertz–Knudsen equation, kinetic theory of gases; impingement rate of ISO 3529-1.
 * @throws KineticsError on a molar mass or T not above 0, or a negative pressure.
 * @example collisionFlux({ molarMassGPerMol: 31.998, temperatureK: 500, pressurePa: 1e5 }).fluxPerM2S // 2.083039265276845e+27
 */
export function collisionFlux(input: Gas & { pressurePa: number }): CollisionFlux {
  const numberDensityPerM3 = numberDensity(input);
  const fluxPerM2S = input.pressurePa * fluxPerPressure(input);
  return {
    fluxPerM2S,
    meanSpeedMPerS: meanSpeed(input),
    numberDensityPerM3,
    derivation: [
      operationLine(`Collision flux p N_A/√(2π M R T), ${gasText(input)}`, { value: input.pressurePa, unit: 'Pa' }, { value: fluxPerM2S, unit: 'm-2 s-1' }, kineticTheory, { constant: constants }),
    ],
  };
}

/** Time to fill a surface from the gas. */
export interface MonolayerTime {
  /** Collisions per site and second. */
  collisionsPerSiteS: number;
  /** Time in which as many molecules stick as there are sites, at constant sticking [s]. */
  monolayerTimeS: number;
  derivation: DerivationLine[];
}

/**
 * Time in which one molecule per site sticks, at a sticking coefficient that does not change with coverage: Γ/(s × flux).
 *
 * Source: Hertz–Knudsen equation, kinetic theory of gases; common practice of surface science.
 * @param input `sticking` 1 when absent.
 * @throws KineticsError on a pressure, site density, molar mass, T or sticking coefficient not above 0, or one above 1.
 * @example monolayerTime({ molarMassGPerMol: 31.998, temperatureK: 298.15, pressurePa: 1e-6, siteDensityPerM2: 1e19 }).monolayerTimeS // 370.7105521067025
 */
export function monolayerTime(input: Gas & { pressurePa: number; siteDensityPerM2: number; sticking?: number }): MonolayerTime {
  requirePositive('pressurePa', input.pressurePa, 'the pressure', 'Pa');
  const density = requirePositive('siteDensityPerM2', input.siteDensityPerM2, 'the site density', 'm-2');
  const sticking = requirePositive('sticking', requireSticking('sticking', input.sticking ?? 1), 'the sticking coefficient');
  const { fluxPerM2S, derivation } = collisionFlux(input);
  const collisionsPerSiteS = fluxPerM2S / density;
  const monolayerTimeS = 1 / (sticking * collisionsPerSiteS);
  return {
    collisionsPerSiteS,
    monolayerTimeS,
    derivation: [
      ...derivation,
      operationLine(`Divide by the site density Γ = ${quantityText(density)} m-2`, { value: fluxPerM2S, unit: 'm-2 s-1' }, { value: collisionsPerSiteS, unit: 's-1' }, references.siteBalance),
      operationLine(`Time per molecule and site: 1/(s × rate), s = ${quantityText(sticking)}`, { value: collisionsPerSiteS, unit: 's-1' }, { value: monolayerTimeS, unit: 's' }, kineticTheory, { assumption: 'the sticking coefficient does not change with coverage' }),
    ],
  };
}

/** An exposure in SI, and the time it takes. */
export interface Exposure {
  /** [Pa s] */
  exposurePaS: number;
  /** Time at the pressure given [s]; null without one. */
  timeS: number | null;
  derivation: DerivationLine[];
}

/**
 * Brings an exposure in langmuir [1 L = 1e-6 Torr s] to Pa s and, at a pressure, to a time.
 *
 * Source: NIST SP 811 (2008) for the torr, 101325/760 Pa; the langmuir is common practice of surface science.
 * @throws KineticsError on a negative exposure, or a pressure not above 0.
 * @example langmuirExposure({ exposureLangmuir: 1 }).exposurePaS // 0.00013332236842105263
 */
export function langmuirExposure({ exposureLangmuir, pressurePa }: { exposureLangmuir: number; pressurePa?: number }): Exposure {
  const exposure = requireNonNegative('exposureLangmuir', exposureLangmuir, 'the exposure', 'L');
  const exposurePaS = (exposure * Torr) / 1e6;
  const lines = [operationLine('Langmuir to pascal second: × 1e-6 Torr s', { value: exposure, unit: 'L' }, { value: exposurePaS, unit: 'Pa s' }, references.sp811, { constant: `1 Torr = ${Torr} Pa` })];
  if (pressurePa === undefined) return { exposurePaS, timeS: null, derivation: lines };
  const p = requirePositive('pressurePa', pressurePa, 'the pressure', 'Pa');
  const timeS = exposurePaS / p;
  return { exposurePaS, timeS, derivation: [...lines, operationLine(`Divide by the pressure p = ${quantityText(p)} Pa`, { value: exposurePaS, unit: 'Pa s' }, { value: timeS, unit: 's' }, references.sp811)] };
}
