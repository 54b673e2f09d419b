import { KineticsError } from './kinetics-error.ts';

/**
 * Standard atomic weights, abridged to five significant digits [g mol-1]; elements without one are left out.
 * Source: IUPAC, Standard atomic weights of the elements 2021, Pure Appl. Chem. 94 (2022) 573, abridged table.
 */
export const standardAtomicWeights: Readonly<Record<string, number>> = {
  H: 1.008, He: 4.0026, Li: 6.94, Be: 9.0122, B: 10.81, C: 12.011, N: 14.007, O: 15.999, F: 18.998, Ne: 20.18,
  Na: 22.99, Mg: 24.305, Al: 26.982, Si: 28.085, P: 30.974, S: 32.06, Cl: 35.45, Ar: 39.95, K: 39.098, Ca: 40.078,
  Sc: 44.956, Ti: 47.867, V: 50.942, Cr: 51.996, Mn: 54.938, Fe: 55.845, Co: 58.933, Ni: 58.693, Cu: 63.546, Zn: 65.38,
  Ga: 69.723, Ge: 72.63, As: 74.922, Se: 78.971, Br: 79.904, Kr: 83.798, Rb: 85.468, Sr: 87.62, Y: 88.906, Zr: 91.224,
  Nb: 92.906, Mo: 95.95, Ru: 101.07, Rh: 102.91, Pd: 106.42, Ag: 107.87, Cd: 112.41, In: 114.82, Sn: 118.71, Sb: 121.76,
  Te: 127.6, I: 126.9, Xe: 131.29, Cs: 132.91, Ba: 137.33, La: 138.91, Ce: 140.12, Pr: 140.91, Nd: 144.24, Sm: 150.36,
  Eu: 151.96, Gd: 157.25, Tb: 158.93, Dy: 162.5, Ho: 164.93, Er: 167.26, Tm: 168.93, Yb: 173.05, Lu: 174.97, Hf: 178.49,
  Ta: 180.95, W: 183.84, Re: 186.21, Os: 190.23, Ir: 192.22, Pt: 195.08, Au: 196.97, Hg: 200.59, Tl: 204.38, Pb: 207.2,
  Bi: 208.98, Th: 232.04, Pa: 231.04, U: 238.03,
};

/**
 * Masses of the isotopes that labelled species hold [g mol-1].
 * Source: The AME 2020 atomic mass evaluation (II), Chin. Phys. C 45 (2021) 030003; rounded, from memory.
 */
export const isotopeMasses: Readonly<Record<string, number>> = {
  '1H': 1.007825, '2H': 2.014102, '3H': 3.016049, '12C': 12, '13C': 13.003355, '14C': 14.003242, '14N': 14.003074, '15N': 15.000109,
  '16O': 15.994915, '17O': 16.999132, '18O': 17.99916, '32S': 31.972071, '34S': 33.967867, '35Cl': 34.968853, '37Cl': 36.965903,
};

/**
 * Molar mass of a species [g mol-1] from its composition, labelled atoms by the mass of their isotope.
 *
 * Source: IUPAC, Standard atomic weights of the elements 2021, Pure Appl. Chem. 94 (2022) 573; AME 2020, Chin. Phys. C 45 (2021) 030003.
 * @param composition atoms by element, labelled ones counted as their element
 * @param isotopes labelled atoms by isotope, such as `{ '2H': 2 }`
 * @throws KineticsError on a composition without atoms, an element without a standard atomic weight, or an isotope without a mass here.
 * @example molarMass({ N: 1, H: 3 }) // 17.031
 */
export function molarMass(composition: Readonly<Record<string, number>>, isotopes: Readonly<Record<string, number>> = {}): number {
  const plain = { ...composition };
  let sum = 0;
  for (const [isotope, count] of Object.entries(isotopes)) {
    const mass = isotopeMasses[isotope];
    if (mass === undefined) throw new KineticsError('isotopes', `no mass is tabulated for ${isotope}`, 'unsupported', isotope);
    const element = isotope.replace(/^\d+/, '');
    plain[element] = (plain[element] ?? 0) - count;
    sum += count * mass;
  }
  for (const [element, count] of Object.entries(plain)) {
    const weight = standardAtomicWeights[element];
    if (weight === undefined) throw new KineticsError('composition', `${element} has no standard atomic weight`, 'unsupported', element);
    if (!(count >= 0)) throw new KineticsError('isotopes', `more atoms of ${element} are labelled than there are`, 'out-of-range', count);
    sum += count * weight;
  }
  if (!(sum > 0)) throw new KineticsError('composition', 'the composition holds no atom', 'missing-input', composition);
  return Number(sum.toPrecision(12));
}
