import { fluxPerPressure, meanSpeed, type Gas } from './collision.ts';
import { N_A, R, Torr } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { requireFinite, requireNonNegative, requirePositive } from './kinetics-error.ts';
import { flagAboveOne, requireSticking, type StickingFlag } from './sticking-coefficient.ts';

const hertzKnudsen = 'Hertz–Knudsen equation, kinetic theory of gases';
const constants = `R = ${R} J mol-1 K-1, N_A = ${quantityText(N_A)} mol-1`;

/** A gas above a surface of known site density. */
export interface GasSurface extends Gas {
  /** Γ [m-2]. */
  siteDensityPerM2: number;
}

const gasText = ({ molarMassGPerMol, temperatureK, siteDensityPerM2 }: GasSurface): string =>
  `M = ${quantityText(molarMassGPerMol)} g/mol, T = ${quantityText(temperatureK)} K, Γ = ${quantityText(siteDensityPerM2)} m-2`;

/**
 * The largest rate constant of adsorption per site, 1/(Γ√(2π m k_B T)) [Pa-1 s-1]: every molecule that strikes sticks.
 *
 * Source: Hertz–Knudsen equation, kinetic theory of gases.
 * @throws KineticsError on a site density, molar mass or T not above 0.
 * @example collisionLimit({ molarMassGPerMol: 31.998, temperatureK: 298.15, siteDensityPerM2: 1.5e19 }) // 1798.3482338932138
 */
export function collisionLimit(input: GasSurface): number {
  return fluxPerPressure(input) / requirePositive('siteDensityPerM2', input.siteDensityPerM2, 'the site density', 'm-2');
}

/** A rate constant of adsorption in the units it is printed in: r = k p (1 - θ) per site and second. */
export interface AdsorptionConstant {
  /** [Pa-1 s-1] */
  kAdsPerPaS: number;
  /** [bar-1 s-1] */
  kAdsPerBarS: number;
  /** [Torr-1 s-1] */
  kAdsPerTorrS: number;
  /** On the concentration of the gas, per site [m3 mol-1 s-1]. */
  kAdsM3PerMolS: number;
  /** On the concentration of the gas, per area: s v/4 [m s-1]. */
  kAdsMPerS: number;
  derivation: DerivationLine[];
}

function constantsFrom(sticking: number, input: GasSurface, from: { operation: string }): AdsorptionConstant {
  const kAdsPerPaS = sticking * collisionLimit(input);
  const kAdsM3PerMolS = kAdsPerPaS * R * input.temperatureK;
  const line = operationLine(`${from.operation}, ${gasText(input)}`, { value: sticking }, { value: kAdsPerPaS, unit: 'Pa-1 s-1' }, hertzKnudsen, {
    constant: constants,
    assumption: 'initial sticking coefficient per molecule, at zero coverage; T is that of the gas; no other correction',
  });
  return {
    kAdsPerPaS,
    kAdsPerBarS: kAdsPerPaS * 1e5,
    kAdsPerTorrS: kAdsPerPaS * Torr,
    kAdsM3PerMolS,
    kAdsMPerS: (sticking * meanSpeed(input)) / 4,
    derivation: [line, operationLine(`k_c = k_p RT, T = ${quantityText(input.temperatureK)} K`, { value: kAdsPerPaS, unit: 'Pa-1 s-1' }, { value: kAdsM3PerMolS, unit: 'm3 mol-1 s-1' }, references.idealGas, { constant: `R = ${R} J mol-1 K-1` })],
  };
}

/**
 * Rate constant of adsorption per site from an initial sticking coefficient: k = s0/(Γ√(2π m k_B T)).
 *
 * The sticking coefficient is per molecule, at zero coverage; T is that of the gas. A beam value at one energy and angle is not thermal and makes no rate constant.
 * Source: Hertz–Knudsen equation, kinetic theory of gases.
 * @throws KineticsError on a sticking coefficient outside 0 to 1, or a site density, molar mass or T not above 0.
 * @example adsorptionConstant({ sticking: 0.8, molarMassGPerMol: 28.010, temperatureK: 300, siteDensityPerM2: 1.5e19 }).kAdsPerPaS // 1532.9409358869873
 */
export function adsorptionConstant(input: GasSurface & { sticking: number }): AdsorptionConstant {
  return constantsFrom(requireSticking('sticking', input.sticking), input, { operation: 'k = s0 N_A/(Γ √(2π M R T))' });
}

/** A sticking coefficient that a rate constant stands for. */
export interface StickingFromRate extends StickingFlag {
  sticking: number;
  derivation: DerivationLine[];
}

/**
 * Sticking coefficient that a rate constant of adsorption stands for: s = k Γ √(2π m k_B T); above 1 it is flagged, not refused.
 *
 * Source: Hertz–Knudsen equation, kinetic theory of gases.
 * @param input `kAdsPerPaS` per site [Pa-1 s-1].
 * @throws KineticsError on a negative rate constant, or a site density, molar mass or T not above 0.
 * @example stickingFromRateConstant({ kAdsPerPaS: 5e2, molarMassGPerMol: 2.016, temperatureK: 500, siteDensityPerM2: 1.86e19 }).sticking // 0.11206483058951959
 */
export function stickingFromRateConstant(input: GasSurface & { kAdsPerPaS: number }): StickingFromRate {
  const k = requireNonNegative('kAdsPerPaS', input.kAdsPerPaS, 'the rate constant', 'Pa-1 s-1');
  const sticking = k / collisionLimit(input);
  return {
    sticking,
    ...flagAboveOne(sticking),
    derivation: [operationLine(`s = k Γ √(2π M R T)/N_A, ${gasText(input)}`, { value: k, unit: 'Pa-1 s-1' }, { value: sticking }, hertzKnudsen, { constant: constants })],
  };
}

/** Activated sticking at a temperature, and the rate constant as a function of temperature. */
export interface ActivatedSticking extends AdsorptionConstant, StickingFlag {
  /** s = A_s exp(-E_s/RT). */
  sticking: number;
  /** Local activation energy of k on pressure, E_s - RT/2 [kJ mol-1]. */
  energyPressureKJPerMol: number;
  /** Local activation energy of k on concentration, E_s + RT/2 [kJ mol-1]. */
  energyConcentrationKJPerMol: number;
  /** k_p(T) = A (T/1 K)^-½ exp(-E_s/RT), exact at every T: A [Pa-1 s-1]. */
  preExponentialPerPaS: number;
}

/**
 * Sticking s = A_s exp(-E_s/RT) at T with its rate constant, whose local activation energy is E_s - RT/2 on pressure and E_s + RT/2 on concentration.
 *
 * A_s is the factor of an Arrhenius form and not the initial sticking coefficient s0; a negative E_s is that of a precursor. Above 1 the result is flagged.
 * Source: Hertz–Knudsen equation, whose 1/√T gives the half RT; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149 (activation energy as a slope).
 * @throws KineticsError on A_s not above 0, an energy that is not finite, or a site density, molar mass or T not above 0.
 * @example activatedSticking({ stickingFactor: 0.2, stickingEnergyKJPerMol: 57, molarMassGPerMol: 20.067, temperatureK: 600, siteDensityPerM2: 1.86e19 }).energyPressureKJPerMol // 54.50566121455403
 */
export function activatedSticking(input: GasSurface & { stickingFactor: number; stickingEnergyKJPerMol: number }): ActivatedSticking {
  const factor = requirePositive('stickingFactor', input.stickingFactor, 'A_s');
  const energy = requireFinite('stickingEnergyKJPerMol', input.stickingEnergyKJPerMol);
  const limit = collisionLimit(input);
  const T = input.temperatureK;
  const sticking = factor * Math.exp((-energy * 1000) / (R * T));
  const half = (R * T) / 2000;
  const { derivation, ...rates } = constantsFrom(sticking, input, { operation: 'k = s N_A/(Γ √(2π M R T))' });
  return {
    sticking,
    ...flagAboveOne(sticking),
    ...rates,
    energyPressureKJPerMol: energy - half,
    energyConcentrationKJPerMol: energy + half,
    preExponentialPerPaS: factor * limit * Math.sqrt(T),
    derivation: [
      operationLine(`s = A_s exp(-E_s/RT), E_s = ${quantityText(energy)} kJ/mol, T = ${quantityText(T)} K`, { value: factor }, { value: sticking }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
      ...derivation,
      operationLine(`E(k_p) = E_s - RT/2, T = ${quantityText(T)} K`, { value: energy, unit: 'kJ/mol' }, { value: energy - half, unit: 'kJ/mol' }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
      operationLine(`E(k_c) = E_s + RT/2, T = ${quantityText(T)} K`, { value: energy, unit: 'kJ/mol' }, { value: energy + half, unit: 'kJ/mol' }, references.glossary, { constant: `R = ${R} J mol-1 K-1` }),
    ],
  };
}
