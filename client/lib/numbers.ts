import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { calorie, e, N_A } from '#shared/kinetics/constants.ts';

/** The reader's units in kJ/mol. The units registry knows them too, but with all others: too much for the first page. */
const kJPerMol: Readonly<Record<EnergyUnit, number>> = { 'kJ/mol': 1, 'kcal/mol': calorie, 'eV': (e * N_A) / 1000 };

/** An energy [kJ/mol] in the reader's unit. */
export function energyIn(unit: EnergyUnit, valueKJPerMol: number): number {
  return valueKJPerMol / kJPerMol[unit];
}

/** An energy in the reader's unit as kJ/mol. */
export function energyToKJPerMol(unit: EnergyUnit, value: number): number {
  return value * kJPerMol[unit];
}

/** A number ready to be set: digits with a true minus, and a power of ten where it is written with one. */
export interface SetNumber {
  text: string;
  exponent: number | null;
}

/** Digits with a true minus sign. */
export function fixed(value: number, decimals: number): string {
  const text = value.toFixed(Math.min(20, Math.max(0, decimals)));
  // "-0.0" is a zero that lost its sign's meaning by rounding.
  return /^-0(\.0*)?$/.test(text) ? text.slice(1) : text.replace('-', '\u2212');
}

/** The decimal position of the last of `digits` significant digits: positive after the point, negative before it. */
function placesFor(value: number, digits: number): number {
  if (value === 0 || !Number.isFinite(value)) return digits - 1;
  // By the rounded value, since 9.96 at two digits is 10 and has one place fewer than 9.96 suggests.
  const rounded = Math.abs(Number(value.toPrecision(Math.max(1, digits))));
  return digits - 1 - Math.floor(Math.log10(rounded));
}

export interface Precision {
  /** Standard uncertainty in the same unit; it decides the places when it is there. */
  u?: number | null;
  /** Digits of the uncertainty that are shown: two beside one value, one in dense tables. */
  uDigits?: number;
  /** Digits the source printed. */
  significantDigits?: number | null;
  /** Digits added to those printed, since a conversion would lose part of the last. */
  guard?: number;
}

/**
 * How many decimals a value is shown with: to the digits shown of its uncertainty, else to the digits printed
 * and a guard digit, else to four significant digits; never negative.
 */
export function decimalsOf(value: number, { u, uDigits = 2, significantDigits, guard = 1 }: Precision): number {
  const places = u ? placesFor(u, uDigits) : placesFor(value, significantDigits ? significantDigits + guard : 4);
  return Math.min(8, Math.max(0, places));
}

/** Sets a number with fixed decimals, or with a power of ten when it is very large or very small. */
export function setNumber(value: number, { decimals, digits = 3, scientific = 'auto' }: {
  decimals?: number; digits?: number; scientific?: boolean | 'auto';
} = {}): SetNumber {
  if (!Number.isFinite(value)) return { text: Number.isNaN(value) ? 'not a number' : value > 0 ? 'infinite' : '\u2212infinite', exponent: null };
  const size = Math.abs(value);
  const withPower = scientific === 'auto' ? size !== 0 && (size >= 1e5 || size < 1e-3) : scientific && size !== 0;
  if (!withPower) return { text: fixed(value, decimals ?? Math.min(8, Math.max(0, placesFor(value, digits)))), exponent: null };
  const [mantissa = '0', exponent = '0'] = value.toExponential(Math.max(0, digits - 1)).split('e');
  return { text: mantissa.replace('-', '\u2212'), exponent: Number(exponent) };
}

/** A set number as plain text: "1.3 × 10^−1". */
export function plainNumber({ text, exponent }: SetNumber): string {
  return exponent === null ? text : `${text} × 10^${String(exponent).replace('-', '\u2212')}`;
}
