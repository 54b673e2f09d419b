import { N_A } from './constants.ts';
import { siUnit, type Unit } from './units.ts';

/**
 * What a rate-constant unit says about its rate law, whatever the spelling.
 *
 * A rate is per site (s-1), per area (mol m-2 s-1), per volume (counted as one gas factor less) or per mass.
 */
export interface RateBasis {
  /** Gas factors taken as concentrations. */
  gasConcentration: number;
  /** Gas factors taken as pressures. */
  gasPressure: number;
  /** q - a: surface factors taken as areal concentrations, less one when the rate is per area. */
  areal: number;
  /** 1 when the rate is per mass of catalyst. */
  perMass: number;
  /** Exponent of coverage in monolayers. */
  coverage: number;
  /** Exponent of time. */
  time: number;
  /** Power of molecule that the unit leaves out (`cm3 s-1` for `cm3 molecule-1 s-1`). */
  omittedMolecule: number;
}

/** Takes rounding off an exponent; whole ones, which nearly all are, stay as they are. */
export function tidy(value: number): number {
  if (Number.isInteger(value)) return value + 0;
  const rounded = Number(value.toPrecision(12));
  return Math.abs(rounded) < 1e-9 ? 0 : rounded;
}

/**
 * Reads the basis of a rate unit from its exponents, or null when it is no rate unit.
 *
 * With L the exponent of length and n that of amount (mass rates: n - 1), the unit is (m3/mol)^g (m2/mol)^d, so g = L + 2n and d = -L - 3n.
 * @param omittedMolecule the power of molecule to add before reading
 */
export function rateBasisOf(unit: Unit, omittedMolecule = 0): RateBasis | null {
  const { dimension } = unit;
  if (dimension.energy !== 0 || dimension.temperature !== 0) return null;
  if (dimension.mass !== 0 && dimension.mass !== -1) return null;
  const perMass = dimension.mass === -1 ? 1 : 0;
  const amount = dimension.amount + omittedMolecule - perMass;
  return {
    gasConcentration: tidy(dimension.length + 2 * amount),
    gasPressure: tidy(-dimension.pressure),
    areal: tidy(-dimension.length - 3 * amount),
    perMass,
    coverage: tidy(dimension.coverage),
    time: dimension.time,
    omittedMolecule,
  };
}

/** The SI unit of a basis with every molecule written as mol. */
export function unitOfBasis(basis: RateBasis): Unit {
  return siUnit({
    length: tidy(3 * basis.gasConcentration + 2 * basis.areal),
    amount: tidy(-basis.gasConcentration - basis.areal + basis.perMass),
    mass: -basis.perMass,
    pressure: tidy(-basis.gasPressure),
    coverage: basis.coverage,
    time: basis.time,
  });
}

/** Size of a unit in SI with the molecule it leaves out counted: numerator and denominator. */
export function basisScale(unit: Unit, omittedMolecule: number): { numerator: number; denominator: number } {
  if (omittedMolecule === 0) return { numerator: unit.numerator, denominator: unit.denominator };
  const power = N_A ** Math.abs(omittedMolecule);
  return omittedMolecule < 0 ? { numerator: unit.numerator * power, denominator: unit.denominator } : { numerator: unit.numerator, denominator: unit.denominator * power };
}

/** True for the unit that is both a second-order surface constant without its molecule and a diffusion coefficient. */
export function isAmbiguousArea(unit: Unit): boolean {
  const { dimension } = unit;
  return dimension.length === 2 && dimension.time === -1 && dimension.amount === 0 && dimension.pressure === 0 && dimension.mass === 0 && dimension.coverage === 0;
}

/** The powers of molecule that a unit without any amount may leave out, in the order to try. */
export function omissionCandidates(unit: Unit): number[] {
  const { dimension } = unit;
  if (dimension.amount !== 0 || dimension.length === 0) return [0];
  const whole = [-dimension.length / 3, -dimension.length / 2].map(tidy).filter((power) => Number.isInteger(power));
  return [0, ...whole];
}
