import { findEnergyUnit, scaleEnergy, type EnergyUnit } from './energy.ts';
import { KineticsError } from './kinetics-error.ts';

/** Energy units that a reader chooses between. */
export const displayEnergyUnits = ['kJ/mol', 'kcal/mol', 'eV'] as const;

/** One of `displayEnergyUnits`. */
export type DisplayEnergyUnit = (typeof displayEnergyUnits)[number];

const canonical = findEnergyUnit('kJ/mol') as EnergyUnit;

/** Brings an energy [kJ mol-1] to the reader's unit. Example: energyFromKJPerMol(4.184, 'kcal/mol') is 1. */
export function energyFromKJPerMol(value: number, unit: string): number {
  const target = findEnergyUnit(unit);
  if (target === null) throw new KineticsError('unit', `unknown energy unit ${JSON.stringify(unit)}`, 'unknown-unit', unit);
  return scaleEnergy(value, canonical, target);
}

/** Brings an energy in the reader's unit back to kJ mol-1. */
export function energyToKJPerMol(value: number, unit: string): number {
  const source = findEnergyUnit(unit);
  if (source === null) throw new KineticsError('unit', `unknown energy unit ${JSON.stringify(unit)}`, 'unknown-unit', unit);
  return scaleEnergy(value, source, canonical);
}

/** Decimal exponent of the first significant digit after rounding to `digits`. */
function leadingExponent(value: number, digits: number): number {
  return value === 0 ? 0 : Number(Math.abs(value).toExponential(Math.max(0, digits - 1)).split('e')[1]);
}

/** A value in parts, for a renderer: mantissa, power of ten, uncertainty on the same power. */
export interface FormattedValue {
  /** Digits of the value, without the power of ten. */
  mantissa: string;
  /** Power of ten, or null where none is written. */
  exponent: number | null;
  /** Digits of the standard uncertainty on the same power of ten, or null. */
  uncertainty: string | null;
  /** The whole in ASCII: `(1.10 ± 0.20)e13`. */
  text: string;
}

function clampDigits(digits: number): number {
  return Math.min(15, Math.max(1, Math.round(Number.isFinite(digits) ? digits : 3)));
}

/** Last decimal place to show: two digits of the uncertainty, else the printed digits and one guard digit. */
function lastPlace(value: number, u: number | null, significantDigits: number): number {
  if (u !== null && u > 0 && Number.isFinite(u)) return leadingExponent(u, 2) - 1;
  const digits = clampDigits(significantDigits) + 1;
  return leadingExponent(value, digits) - digits + 1;
}

function fixed(value: number, decimals: number): string {
  const text = value.toFixed(Math.min(100, Math.max(0, decimals)));
  return /^-0(?:\.0*)?$/.test(text) ? text.slice(1) : text;
}

/** Rounds to a power of ten above the units place, for values such as 12300 ± 400. */
function roundTo(value: number, place: number): number {
  return place <= 0 ? value : Number(`${Math.round(Number(`${value}e${-place}`))}e${place}`);
}

/**
 * Writes a value to the digits it deserves: two digits of the standard uncertainty, or the printed digits with one guard digit.
 *
 * Powers of ten are written outside 1e-3 to 1e5. Source: JCGM 100:2008 (GUM) 7.2.6; the guard digit is common practice.
 * @param standardUncertainty in the unit of the value, or null
 * @param significantDigits digits as printed
 * @example formatValue(186.188, 5.8576, 3).text // '186.2 ± 5.9'
 */
export function formatValue(value: number, standardUncertainty: number | null, significantDigits: number): FormattedValue {
  if (!Number.isFinite(value)) return { mantissa: String(value), exponent: null, uncertainty: null, text: String(value) };
  const size = Math.abs(value);
  if (size !== 0 && (size >= 1e5 || size < 1e-3)) return formatScientific(value, standardUncertainty, significantDigits);
  const place = lastPlace(value, standardUncertainty, significantDigits);
  const decimals = Math.max(0, -place);
  const hasU = standardUncertainty !== null && Number.isFinite(standardUncertainty);
  const mantissa = fixed(roundTo(value, place), decimals);
  const uncertainty = hasU ? fixed(roundTo(standardUncertainty, place), decimals) : null;
  return { mantissa, exponent: null, uncertainty, text: uncertainty === null ? mantissa : `${mantissa} ± ${uncertainty}` };
}

/**
 * Writes a value as mantissa and power of ten, to the same digits as `formatValue`.
 *
 * @example formatScientific(1.1e13, 2e12, 2).text // '(1.10 ± 0.20)e13'
 */
export function formatScientific(value: number, standardUncertainty: number | null, significantDigits: number): FormattedValue {
  if (!Number.isFinite(value)) return { mantissa: String(value), exponent: null, uncertainty: null, text: String(value) };
  const place = lastPlace(value, standardUncertainty, significantDigits);
  const digits = Math.max(1, leadingExponent(value, 17) - place + 1);
  const exponent = leadingExponent(value, Math.min(17, digits));
  const decimals = Math.min(20, Math.max(0, exponent - place));
  // Scaling by a decimal shift of the text keeps the rounding in decimal.
  const mantissa = value === 0 ? fixed(0, decimals) : fixed(Number(shift(value, -exponent)), decimals);
  const hasU = standardUncertainty !== null && Number.isFinite(standardUncertainty);
  const uncertainty = hasU ? fixed(Number(shift(standardUncertainty, -exponent)), decimals) : null;
  return { mantissa, exponent, uncertainty, text: uncertainty === null ? `${mantissa}e${exponent}` : `(${mantissa} ± ${uncertainty})e${exponent}` };
}

function shift(value: number, by: number): string {
  const [mantissa, exponent] = value.toExponential().split('e');
  return `${mantissa}e${Number(exponent) + by}`;
}
