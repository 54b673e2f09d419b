import { reducedWavenumber } from './kie-wavenumber.ts';
import type { IsotopePair } from './isotope-pair.ts';
import { swainSchaadExponent } from './kie-swain-schaad.ts';
import { requireTemperature } from './kinetics-error.ts';

/** A stretching vibration of a bond to hydrogen and to deuterium. */
export interface BondStretch {
  /** The bond as a step names it: `C-H`. */
  bond: string;
  /** The molecules that the wavenumbers are those of. */
  molecules: string;
  /** Fundamental wavenumbers [cm-1]. */
  lightPerCm: number;
  heavyPerCm: number;
}

/**
 * Stretching fundamentals that bound a semiclassical hydrogen isotope effect: the symmetric stretch of the simplest hydride, whose difference is the largest.
 *
 * Source: Shimanouchi, Tables of Molecular Vibrational Frequencies, consolidated volume I, NSRDS-NBS 39 (1972); H2 and D2 by Raman spectroscopy,
 * Stoicheff, Can. J. Phys. 35 (1957) 730. The figures are from memory.
 */
export const bondStretches: readonly BondStretch[] = [
  { bond: 'C-H', molecules: 'CH4/CD4', lightPerCm: 2917, heavyPerCm: 2109 },
  { bond: 'N-H', molecules: 'NH3/ND3', lightPerCm: 3337, heavyPerCm: 2420 },
  { bond: 'O-H', molecules: 'H2O/D2O', lightPerCm: 3657, heavyPerCm: 2671 },
  { bond: 'S-H', molecules: 'H2S/D2S', lightPerCm: 2615, heavyPerCm: 1896 },
  { bond: 'H-H', molecules: 'H2/D2', lightPerCm: 4161, heavyPerCm: 2994 },
];

/** The largest hydrogen isotope effect of zero-point energies alone, with the stretch it comes from. */
export interface SemiclassicalLimit {
  limit: number;
  /** Where it comes from, in words. */
  words: string;
}

/** ln of the limit of a pair of hydrogens over ln of that of H and D. Source: Swain, Stivers, Reuwer and Schaad, J. Am. Chem. Soc. 80 (1958) 5885. */
function exponentOf({ light, heavy }: IsotopePair): number {
  if (heavy === 2) return 1;
  return light === 1 ? swainSchaadExponent : swainSchaadExponent - 1;
}

/**
 * Largest isotope effect of zero-point energies alone: exp[hc(ν_L - ν_H)/2k_BT] of a stretch that is wholly lost in the transition state.
 *
 * A bond that is not known, or not tabulated, takes the largest of the tabulated stretches save that of H2. Tritium goes by the Swain–Schaad exponent.
 * Tunnelling and several bonds at once go beyond it. Source: Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261, the zero-point factor alone.
 * @param bond as a step names it, such as `C-H`
 * @returns null for isotopes of another element than hydrogen
 * @throws KineticsError on T not above 0.
 * @example semiclassicalLimit({ bond: 'C-H', temperatureK: 298.15, pair: { element: 'H', light: 1, heavy: 2 } }).limit // 7.025702725851153
 */
export function semiclassicalLimit({ bond, temperatureK, pair }: { bond: string | null; temperatureK: number; pair: IsotopePair }): SemiclassicalLimit | null {
  const T = requireTemperature('temperatureK', temperatureK);
  if (pair.element !== 'H') return null;
  const known = bondStretches.find((stretch) => stretch.bond === bond);
  const { lightPerCm, heavyPerCm, bond: name, molecules } = known ?? largestStretch;
  const limit = Math.exp((exponentOf(pair) * reducedWavenumber(lightPerCm - heavyPerCm, T)) / 2);
  return { limit, words: `${known ? '' : 'no stretch of the bond is tabulated, so the largest is taken: '}${name} stretch ${lightPerCm}/${heavyPerCm} cm-1 of ${molecules}, at ${T} K` };
}

const spread = ({ lightPerCm, heavyPerCm }: BondStretch): number => lightPerCm - heavyPerCm;
const largestStretch = bondStretches.filter(({ bond }) => bond !== 'H-H').reduce((widest, stretch) => (spread(stretch) > spread(widest) ? stretch : widest));
