import { c, h, N_A, R } from './constants.ts';
import { operationLine, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requireNonNegative } from './kinetics-error.ts';
import { wavenumberEnergy } from './unit-tokens.ts';
import { findUnit, type Unit } from './units.ts';

/** An energy unit with its size per mole of particles. */
export interface EnergyUnit {
  symbol: string;
  /** J mol-1 per unit, as a fraction so that decimal steps stay exact. */
  numerator: number;
  denominator: number;
  /** How the unit becomes joule per mole, in words. */
  operation: string;
  constant: string;
  reference: string;
}

const perMole: Record<string, Omit<EnergyUnit, 'symbol'>> = {
  'J/mol': { numerator: 1, denominator: 1, operation: 'SI unit', constant: '1 kJ = 1000 J', reference: references.siBrochure },
  'kJ/mol': { numerator: 1000, denominator: 1, operation: 'SI unit, × 1000 exactly', constant: '1 kJ = 1000 J', reference: references.siBrochure },
  'cal/mol': { numerator: 4184, denominator: 1000, operation: 'Thermochemical calorie, × 4.184 exactly', constant: '1 cal = 4.184 J', reference: references.sp811 },
  'kcal/mol': { numerator: 4184, denominator: 1, operation: 'Thermochemical calorie, × 4.184 exactly', constant: '1 kcal = 4.184 kJ', reference: references.sp811 },
  K: { numerator: R, denominator: 1, operation: 'Temperature equivalent E/R, × R', constant: `R = ${R} J mol-1 K-1`, reference: references.codata },
  'cm-1': { numerator: N_A * wavenumberEnergy, denominator: 1, operation: 'Wavenumber E/hc, × N_A h c', constant: `N_A = 6.02214076e23 mol-1, h = ${h} J s, c = ${c} m s-1`, reference: references.codata },
};

const particleWords: Record<string, [operation: string, constant: string]> = {
  eV: ['Electronvolt per particle, × e N_A', 'e = 1.602176634e-19 C, N_A = 6.02214076e23 mol-1'],
  meV: ['Millielectronvolt per particle, × e N_A / 1000', 'e = 1.602176634e-19 C, N_A = 6.02214076e23 mol-1'],
  hartree: ['Hartree per particle, × E_h N_A', 'E_h = 4.3597447222060e-18 J, N_A = 6.02214076e23 mol-1'],
  mhartree: ['Millihartree per particle, × E_h N_A / 1000', 'E_h = 4.3597447222060e-18 J, N_A = 6.02214076e23 mol-1'],
  rydberg: ['Rydberg per particle, × E_h N_A / 2', 'E_h = 4.3597447222060e-18 J, N_A = 6.02214076e23 mol-1'],
  mrydberg: ['Millirydberg per particle, × E_h N_A / 2000', 'E_h = 4.3597447222060e-18 J, N_A = 6.02214076e23 mol-1'],
};

function fromUnit(unit: Unit): EnergyUnit | null {
  const fixed = perMole[unit.symbol];
  if (fixed) return { symbol: unit.symbol, ...fixed };
  const { dimension } = unit;
  const others = dimension.length || dimension.mass || dimension.pressure || dimension.temperature || dimension.time || dimension.coverage;
  if (others || dimension.energy !== 1) return null;
  const words = particleWords[unit.symbol];
  if (dimension.amount === 0 && words) {
    return { symbol: unit.symbol, numerator: unit.numerator * N_A, denominator: unit.denominator, operation: words[0], constant: words[1], reference: references.codata };
  }
  if (dimension.amount !== -1) return null;
  return {
    symbol: unit.symbol,
    numerator: unit.numerator,
    denominator: unit.denominator,
    operation: `Unit ${unit.symbol} to J/mol, × ${unit.toSi}`,
    constant: `1 ${unit.symbol} = ${unit.toSi} J/mol`,
    reference: references.sp811,
  };
}

/** The energy units that the calculators name. */
export const energyUnits = ['J/mol', 'kJ/mol', 'cal/mol', 'kcal/mol', 'eV', 'meV', 'hartree', 'rydberg', 'K', 'cm-1', 'Btu_IT/lbmol', 'Btu_th/lbmol'] as const;

const found = new WeakMap<Unit, EnergyUnit | null>();

/** Reads the unit of a molar energy: `K` means E/R, `cm-1` means E/hc, eV and hartree are per particle; null when it is none. */
export function findEnergyUnit(text: string): EnergyUnit | null {
  const unit = findUnit(text);
  if (unit === null) return null;
  const known = found.get(unit);
  if (known !== undefined) return known;
  const energy = fromUnit(unit);
  found.set(unit, energy);
  return energy;
}

/** The same, or an error that names the unit. */
export function requireEnergyUnit(text: string, path: string): EnergyUnit {
  const energy = findEnergyUnit(text);
  if (energy) return energy;
  const unit = findUnit(text);
  if (unit === null) throw new KineticsError(path, `unknown unit ${JSON.stringify(text)}: expected an energy unit such as kJ/mol`, 'unknown-unit', text);
  const bare = unit.dimension.energy === 1 && unit.dimension.amount === 0;
  throw new KineticsError(path, `${unit.symbol} is not a molar energy${bare ? `: write ${unit.symbol}/mol if that is meant` : ': expected a unit such as kJ/mol'}`, 'incompatible-units', text);
}

/** Multiplies by the exact ratio of two energy units. */
export function scaleEnergy(value: number, from: EnergyUnit, to: EnergyUnit): number {
  if (from.symbol === to.symbol) return value;
  const common = from.numerator === to.numerator ? 1 : null;
  if (common !== null) return (value * to.denominator) / from.denominator;
  return (value * (from.numerator * to.denominator)) / (from.denominator * to.numerator);
}

/** Result of an energy conversion. */
export interface ConvertedEnergy {
  value: number;
  unit: string;
  standardUncertainty: number | null;
  derivation: DerivationLine[];
}

/**
 * Converts an energy between units per mole and per particle.
 *
 * Constants: CODATA 2022; the calorie is the thermochemical one (4.184 J); Btu is named IT or th; K is E/R, cm-1 is E/hc.
 * Sources: SI Brochure, 9th edition; NIST SP 811 (2008).
 * @throws KineticsError on an unknown unit, one that is no energy, or a number that is not finite.
 * @example convertEnergy({ value: 44.5, from: 'kcal/mol', to: 'kJ/mol' }).value // 186.188
 */
export function convertEnergy(input: { value: number; from: string; to: string; standardUncertainty?: number | null }): ConvertedEnergy {
  requireFinite('value', input.value);
  const from = requireEnergyUnit(input.from, 'from');
  const to = requireEnergyUnit(input.to, 'to');
  const u = input.standardUncertainty ?? null;
  if (u !== null) requireNonNegative('standardUncertainty', u);
  const value = scaleEnergy(input.value, from, to);
  return {
    value,
    unit: to.symbol,
    standardUncertainty: u === null ? null : scaleEnergy(u, from, to),
    derivation: energyDerivation(input.value, from, to),
  };
}

/** The lines for a conversion: into joule per mole, then into the unit asked for; one line where that is enough. */
export function energyDerivation(value: number, from: EnergyUnit, to: EnergyUnit): DerivationLine[] {
  const final = { value: scaleEnergy(value, from, to), unit: to.symbol };
  const start = { value, unit: from.symbol };
  if (from.symbol === to.symbol) return [operationLine('Unit kept', start, final, references.siBrochure)];
  if (to.symbol === 'kJ/mol' || to.symbol === 'J/mol') return [operationLine(from.operation, start, final, from.reference, { constant: from.constant })];
  if (from.symbol === 'kJ/mol' || from.symbol === 'J/mol') {
    return [operationLine(`Inverse of: ${to.operation}`, start, final, to.reference, { constant: to.constant })];
  }
  const joule = findEnergyUnit('J/mol') as EnergyUnit;
  const middle = { value: scaleEnergy(value, from, joule), unit: 'J/mol' };
  return [
    operationLine(from.operation, start, middle, from.reference, { constant: from.constant }),
    operationLine(`Inverse of: ${to.operation}`, middle, final, to.reference, { constant: to.constant }),
  ];
}
