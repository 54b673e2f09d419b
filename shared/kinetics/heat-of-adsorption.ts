import { KineticsError, requirePositive } from './kinetics-error.ts';

/** Checks the number of metal atoms that an adsorbate touches. */
function requireCoordination(n: number): number {
  if (Number.isInteger(n) && n >= 1) return n;
  throw new KineticsError('coordination', `the coordination must be a whole number of metal atoms, 1 (atop) or more, got ${String(n)}`, Number.isFinite(n) ? 'out-of-range' : 'not-finite', n);
}

/** A molecule bound through one atom, by bond-order conservation. Energies in one unit, such as kJ/mol. */
export interface MonocoordinatedMolecule {
  /** Q0A, heat of adsorption of the bound atom atop one metal atom. */
  atopHeat: number;
  /** n, metal atoms that the site offers; 1 is atop. */
  coordination: number;
  /** D, total bond energy of the molecule in the gas; of all its bonds where it has several. */
  bondEnergy: number;
}

function readMolecule({ atopHeat, coordination, bondEnergy }: MonocoordinatedMolecule): { q0: number; n: number; d: number } {
  return { q0: requirePositive('atopHeat', atopHeat, 'Q0A'), n: requireCoordination(coordination), d: requirePositive('bondEnergy', bondEnergy, 'the bond energy') };
}

/**
 * Heat of adsorption of an atom at an n-fold site, Q_A = Q0A (2 - 1/n), in the unit of Q0A.
 *
 * Source: Shustorovich, Surf. Sci. Rep. 6 (1986) 1.
 * @throws KineticsError on Q0A not above 0, or n that is no whole number from 1.
 * @example atomicHeat({ atopHeat: 100, coordination: 2 }) // 150
 */
export function atomicHeat({ atopHeat, coordination }: { atopHeat: number; coordination: number }): number {
  return requirePositive('atopHeat', atopHeat, 'Q0A') * (2 - 1 / requireCoordination(coordination));
}

/**
 * Q0A from the heat of adsorption of an atom at an n-fold site: the inverse of `atomicHeat`.
 *
 * Source: Shustorovich, Surf. Sci. Rep. 6 (1986) 1.
 * @throws KineticsError on Q_A not above 0, or n that is no whole number from 1.
 * @example atopHeat({ heat: 150, coordination: 2 }) // 100
 */
export function atopHeat({ heat, coordination }: { heat: number; coordination: number }): number {
  return requirePositive('heat', heat, 'Q_A') / (2 - 1 / requireCoordination(coordination));
}

/**
 * Heat of adsorption of a weakly bound molecule (closed shell, through A): Q_AB = Q0A²/(Q0A/n + D), in the unit of Q0A and D.
 *
 * Source: Shustorovich, Adv. Catal. 37 (1990) 101.
 * @throws KineticsError on an energy not above 0, or n that is no whole number from 1.
 * @example weakMolecularHeat({ atopHeat: 96, coordination: 3, bondEnergy: 257 }) // 31.889273356401382
 */
export function weakMolecularHeat(molecule: MonocoordinatedMolecule): number {
  const { q0, n, d } = readMolecule(molecule);
  return (q0 * q0) / (q0 / n + d);
}

/**
 * Heat of adsorption of a strongly bound molecule (a radical, through A): Q_AB = Q_A²/(Q_A + D) with Q_A of the same site.
 *
 * Source: Shustorovich, Adv. Catal. 37 (1990) 101.
 * @throws KineticsError on an energy not above 0, or n that is no whole number from 1.
 * @example strongMolecularHeat({ atopHeat: 96, coordination: 3, bondEnergy: 257 }) // 61.39088729016787
 */
export function strongMolecularHeat(molecule: MonocoordinatedMolecule): number {
  const { d } = readMolecule(molecule);
  const q = atomicHeat(molecule);
  return (q * q) / (q + d);
}

/**
 * Heat of adsorption between weak and strong binding: the mean of the two.
 *
 * Source: Shustorovich and Sellers, Surf. Sci. Rep. 31 (1998) 1; from memory.
 * @throws KineticsError on an energy not above 0, or n that is no whole number from 1.
 * @example intermediateMolecularHeat({ atopHeat: 96, coordination: 3, bondEnergy: 257 }) // 46.64008032328462
 */
export function intermediateMolecularHeat(molecule: MonocoordinatedMolecule): number {
  return (weakMolecularHeat(molecule) + strongMolecularHeat(molecule)) / 2;
}

/** A molecule that lies flat, each end on one metal atom of a bridge. Energies in one unit. */
export interface DicoordinatedMolecule {
  /** Q0A, heat of adsorption of atom A atop. */
  atopHeatA: number;
  /** Q0B, heat of adsorption of atom B atop. */
  atopHeatB: number;
  /** D, total bond energy in the gas. */
  bondEnergy: number;
}

/**
 * Heat of adsorption of a molecule bound through both ends: Q_AB = [ab(a + b) + D(a - b)²]/[ab + D(a + b)],
 * a = Q0A²(Q0A + 2 Q0B)/(Q0A + Q0B)² and b likewise.
 *
 * Source: Shustorovich, Adv. Catal. 37 (1990) 101; form from memory, checked in the limit of equal ends.
 * @throws KineticsError on an energy not above 0.
 * @example dicoordinatedMolecularHeat({ atopHeatA: 60, atopHeatB: 75, bondEnergy: 151 }) // 17.180527049493527
 */
export function dicoordinatedMolecularHeat({ atopHeatA, atopHeatB, bondEnergy }: DicoordinatedMolecule): number {
  const qA = requirePositive('atopHeatA', atopHeatA, 'Q0A');
  const qB = requirePositive('atopHeatB', atopHeatB, 'Q0B');
  const d = requirePositive('bondEnergy', bondEnergy, 'the bond energy');
  const a = (qA * qA * (qA + 2 * qB)) / (qA + qB) ** 2;
  const b = (qB * qB * (qB + 2 * qA)) / (qA + qB) ** 2;
  return (a * b * (a + b) + d * (a - b) ** 2) / (a * b + d * (a + b));
}
