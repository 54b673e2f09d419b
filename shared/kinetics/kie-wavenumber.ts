import { c, h, k_B } from './constants.ts';
import { requirePositive } from './kinetics-error.ts';

/** Second radiation constant h c/k_B [cm K], exact in the SI of 2019: reduces a wavenumber over a temperature. */
export const secondRadiationConstant = ((h * c) / k_B) * 100;

/** The same as derivations name it. */
export const radiationConstantText = `hc/k_B = ${secondRadiationConstant} cm K`;

/**
 * Returns a wavenumber [cm-1] above zero, or throws with the path of the input.
 *
 * @throws KineticsError on a wavenumber that is not finite or not above 0: an imaginary one is given by its modulus.
 * @example requireWavenumber('reactantLightPerCm.0', 2917) // 2917
 */
export function requireWavenumber(path: string, wavenumberPerCm: number): number {
  return requirePositive(path, wavenumberPerCm, path, 'cm-1');
}

/**
 * Reduced frequency u = h c ν/(k_B T) [1] of a wavenumber ν [cm-1] at T [K].
 *
 * Source: IUPAC Green Book, 3rd edition; CODATA 2022.
 * @example reducedWavenumber(1500, 300) // 7.193884387519669
 */
export function reducedWavenumber(wavenumberPerCm: number, temperatureK: number): number {
  return (secondRadiationConstant * wavenumberPerCm) / temperatureK;
}
