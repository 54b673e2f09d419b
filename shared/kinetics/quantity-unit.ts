import { N_A } from './constants.ts';
import { quantityText, references } from './derivation.ts';
import { findEnergyUnit, requireEnergyUnit } from './energy.ts';
import { KineticsError } from './kinetics-error.ts';
import { toPlainText } from './printed-text.ts';
import type { QuantitySymbol } from './quantity-symbols.ts';
import { requireUnit } from './rate-constant.ts';
import { dimensionText, findUnit, siUnit, unitConstants, type Unit } from './units.ts';

/** How one printed unit becomes the canonical one: a number, and the words for it. */
export interface CanonicalUnit {
  /** Canonical unit in the one printed form; `1` for a pure number. */
  unit: string;
  numerator: number;
  denominator: number;
  operation: string;
  constant?: string;
  reference: string;
}

const path = 'unitAsPrinted';

function wrong(unit: Unit, expected: string): KineticsError {
  return new KineticsError(path, `${unit.symbol} has dimension ${dimensionText(unit.dimension)}: expected ${expected}`, 'incompatible-units', unit.symbol);
}

function energy(text: string): CanonicalUnit {
  const unit = requireEnergyUnit(text, path);
  return { unit: 'kJ/mol', ...ratio(unit.numerator, unit.denominator), operation: unit.symbol === 'kJ/mol' ? 'Canonical unit kept' : unit.operation, constant: unit.constant, reference: unit.reference };
}

/** To kJ, keeping whole numbers whole. */
function ratio(numerator: number, denominator: number): { numerator: number; denominator: number } {
  return numerator === 1000 && denominator === 1 ? { numerator: 1, denominator: 1 } : { numerator, denominator: denominator * 1000 };
}

function coverageSlope(text: string): CanonicalUnit {
  if (findEnergyUnit(text)) return energy(text);
  const unit = requireUnit(text, path);
  const factors = unit.factors.filter(({ token }) => token.symbol !== 'ML');
  const bare = factors.map(({ token, exponent }) => `${token.symbol}^${exponent}`).join(' ');
  if (unit.dimension.coverage !== -1 || !findEnergyUnit(bare)) throw wrong(unit, 'an energy per coverage such as kJ/mol');
  const found = energy(bare);
  return { ...found, operation: `${found.operation}, per coverage of 1`, constant: [found.constant, '1 ML is a coverage of 1'].filter((part) => part !== undefined).join(', ') };
}

function entropy(text: string): CanonicalUnit {
  const unit = requireUnit(text, path);
  const { dimension } = unit;
  const rest = dimension.length || dimension.mass || dimension.pressure || dimension.coverage || dimension.time;
  if (rest || dimension.energy !== 1 || dimension.temperature !== -1 || (dimension.amount !== -1 && dimension.amount !== 0)) throw wrong(unit, 'an entropy such as J mol-1 K-1');
  const perParticle = dimension.amount === 0;
  return {
    unit: 'J mol-1 K-1',
    numerator: unit.numerator * (perParticle ? N_A : 1),
    denominator: unit.denominator,
    operation: `SI unit of ${unit.symbol}`,
    constant: [unitConstants(unit), perParticle ? `N_A = ${quantityText(N_A)} mol-1` : undefined].filter((part) => part !== undefined).join(', ') || undefined,
    reference: references.sp811,
  };
}

function number(text: string): CanonicalUnit {
  const unit = requireUnit(text, path);
  if (Object.values(unit.dimension).some((exponent) => exponent !== 0)) throw wrong(unit, 'a pure number');
  return { unit: '1', numerator: unit.numerator, denominator: unit.denominator, operation: unit.toSi === 1 ? 'Pure number kept' : `Factor of ${unit.symbol}`, constant: unitConstants(unit), reference: references.siBrochure };
}

function si(text: string, accept: (unit: Unit) => boolean, expected: string): CanonicalUnit {
  const unit = requireUnit(text, path);
  if (!accept(unit)) throw wrong(unit, expected);
  const canonical = siUnit(unit.dimension).symbol;
  return { unit: canonical, numerator: unit.numerator, denominator: unit.denominator, operation: canonical === unit.symbol ? 'SI unit kept' : `SI unit of ${unit.symbol}`, constant: unitConstants(unit), reference: references.sp811 };
}

const only = (unit: Unit, allowed: readonly string[]): boolean => Object.entries(unit.dimension).every(([name, exponent]) => exponent === 0 || allowed.includes(name));

/** The canonical unit of every quantity that is not a rate. Throws a `KineticsError` on `unitAsPrinted`. */
export function canonicalUnit(symbol: Exclude<QuantitySymbol, 'rateConstant' | 'preExponential' | 'turnoverRate'>, text: string): CanonicalUnit {
  switch (symbol) {
    case 'energy':
    case 'reactionEnergy':
    case 'adsorptionEnergy':
      return energy(text);
    case 'coverageSlope':
      return coverageSlope(text);
    case 'activationEntropy':
      return entropy(text);
    case 'diffusionCoefficient':
      return si(text, (unit) => unit.dimension.length === 2 && unit.dimension.time === -1 && only(unit, ['length', 'time']), 'a diffusion coefficient such as m2 s-1');
    case 'equilibriumConstant':
      return si(text, (unit) => only(unit, ['length', 'amount', 'pressure', 'coverage']), 'a pure number or a power of pressure or concentration');
    case 'referenceTemperature':
      return si(text, (unit) => unit.dimension.temperature === 1 && only(unit, ['temperature']), 'K');
    default:
      return number(text);
  }
}

/** Takes a power of ten off the front of a printed unit: `10^13 s-1` is `s-1` with a multiplier of 1e13. */
export function splitUnitPower(text: string): { multiplier: number; unit: string } {
  const match = /^\s*[x×*·]?\s*10\s?(?:\^|\*\*)\s?[{(]?\s?([+-]?\d{1,3})\s?[)}]?\s*[×*·]?\s*(.*)$/s.exec(toPlainText(text).text);
  if (!match) return { multiplier: 1, unit: text };
  const rest = match[2] as string;
  return findUnit(rest) === null ? { multiplier: 1, unit: text } : { multiplier: Number(`1e${match[1]}`), unit: rest };
}
