import { boundLines, operationLine, printedLine, quantityText, readingText, references, type DerivationLine } from './derivation.ts';
import { findEnergyUnit } from './energy.ts';
import { KineticsError, requireFinite, requirePositive } from './kinetics-error.ts';
import { readPrintedValue, resolveUncertainty, type Bound } from './printed-value.ts';
import { quantitySymbols, type QuantityContext, type QuantitySymbol } from './quantity-symbols.ts';
import { canonicalUnit, splitUnitPower } from './quantity-unit.ts';
import { basisScale, unitOfBasis } from './rate-basis.ts';
import { requireUnit, siConstants } from './rate-constant.ts';
import { isHomogeneous, judgeRateUnit, meanFieldOfPairs, ordersOf, type ReportedOrders } from './rate-law.ts';
import { toSiteBasis } from './site-basis.ts';
import { missingForStandard, type UncertaintyKind } from './uncertainty.ts';

export { quantitySymbols };
export type { QuantityContext, QuantitySymbol };

/** A quantity as a contributor enters it: what is printed, and what the figures stand for. */
export interface QuantityInput {
  symbol: QuantitySymbol;
  energyType?: string | null;
  asPrinted: string;
  unitAsPrinted?: string | null;
  /**
   * Value = printed figure × multiplier. A column headed `A/10^13` has 1e13; a column headed `10^3 k` has 1e-3
   * (`readColumnHeader` reads either).
   */
  multiplier?: number | null;
  uncertaintyKind?: UncertaintyKind | null;
  coverageFactor?: number | null;
  level?: number | null;
  degreesOfFreedom?: number | null;
}

/** A quantity with its converted values and the way they were reached. */
export interface ConvertedQuantity {
  symbol: QuantitySymbol;
  energyType?: string;
  asPrinted: string;
  unitAsPrinted: string | null;
  multiplier?: number;
  bound: Bound;
  /** Canonical value: kJ/mol, or SI of the printed unit for rates; null for a range. */
  value: number | null;
  low: number | null;
  high: number | null;
  /** Canonical unit; `1` for a pure number. */
  unit: string;
  /** Value per site (s-1 Pa^-g), where it can be reached. */
  siteValue?: number | null;
  siteUnit?: string;
  /** Change of the exponent n that belongs to `siteValue` of a pre-exponential factor printed on a concentration basis. */
  siteExponentChange?: number;
  /** What the site basis or the standard uncertainty still needs. */
  missing?: string[];
  /** As reported, in the printed unit (on `uncertaintyScale`). */
  reportedUncertainty: number | null;
  reportedMinus?: number | null;
  reportedPlus?: number | null;
  uncertaintyKind: UncertaintyKind;
  uncertaintyScale: 'linear' | 'ln';
  /** In the canonical unit, or of the natural logarithm where the scale is `ln`. */
  standardUncertainty: number | null;
  significantDigits: number;
  derivation: DerivationLine[];
  /** The same in the printed unit, the multiplier applied. */
  printed: { value: number | null; low: number | null; high: number | null; standardUncertainty: number | null };
  /** Registry id of the printed unit. */
  unitId: string;
}

interface SiteConversion {
  value: number | null;
  unit?: string;
  exponentChange: number;
  missing: string[];
  lines: DerivationLine[];
}

interface Conversion {
  unit: string;
  scale: (value: number) => number;
  lines: (value: number) => DerivationLine[];
  site?: (value: number) => SiteConversion;
}

const pureNumbers: ReadonlySet<QuantitySymbol> = new Set(['exponent', 'kie', 'stickingCoefficient', 'reactionOrder', 'equilibriumConstant']);
const rates: ReadonlySet<QuantitySymbol> = new Set(['rateConstant', 'preExponential', 'turnoverRate']);

/**
 * Converts a quantity from what is printed to canonical units, with every operation on the way.
 *
 * Energies become kJ/mol; rate constants and pre-exponential factors become SI of the printed unit in `value` and, where the context
 * allows, the site basis in `siteValue`; what is lacking stands in `missing`. A consumption rate is divided by its coefficient. A constant
 * per pair of neighbours stays one in `value`; its mean field stands in `siteValue` where the number of neighbours is given.
 * Sources: SI Brochure, 9th edition; NIST SP 811 (2008); JCGM 100:2008 (GUM); CODATA 2022.
 * @throws PrintedValueError on an unreadable value
 * @throws KineticsError on an unknown unit, one of another dimension, one that contradicts the orders, or `cm2 s-1`
 * @example convertQuantity({ symbol: 'energy', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol' }, {}).value // 186.188
 */
export function convertQuantity(input: QuantityInput, context: QuantityContext): ConvertedQuantity {
  if (!quantitySymbols.includes(input.symbol)) throw new KineticsError('symbol', `unknown quantity ${JSON.stringify(input.symbol)}`, 'unsupported', input.symbol);
  const multiplier = input.multiplier == null ? 1 : requirePositive('multiplier', input.multiplier);
  const { multiplier: unitPower, unit: unitText } = splitUnitPower(input.unitAsPrinted ?? '');
  if (unitText.trim() !== '') requireUnit(unitText, 'unitAsPrinted');
  const read = readPrintedValue(input.asPrinted, unitText);
  const printed = input.uncertaintyKind == null ? read : resolveUncertainty(read, { kind: input.uncertaintyKind === 'none' ? 'unknown' : input.uncertaintyKind, coverageFactor: input.coverageFactor, level: input.level, degreesOfFreedom: input.degreesOfFreedom });
  const unitName = printed.unit ?? (pureNumbers.has(input.symbol) || (input.symbol === 'preExponential' && unitText.trim() === '1') ? '1' : null);
  if (unitName === null) throw new KineticsError('unitAsPrinted', `a unit is needed for ${input.symbol}`, 'missing-input', input.unitAsPrinted);

  const derivation: DerivationLine[] = [printedLine(input.asPrinted, unitName === '1' ? null : (input.unitAsPrinted?.trim() || null), readingText(printed, unitName))];
  const scaled = (number: number): number => timesDecimal(timesDecimal(number, multiplier), unitPower);
  const conversion = conversionFor(input.symbol, unitName, context);
  const way = (number: number): { lines: DerivationLine[]; site: SiteConversion | undefined } => {
    const site = conversion.site?.(conversion.scale(scaled(number)));
    return {
      site,
      lines: [
        ...(multiplier === 1 ? [] : [multiplierLine(number, multiplier, unitName, 'Multiplier of the column heading')]),
        ...(unitPower === 1 ? [] : [multiplierLine(timesDecimal(number, multiplier), unitPower, unitName, 'Power of ten printed with the unit')]),
        ...conversion.lines(scaled(number)),
        ...(site?.lines ?? []),
      ],
    };
  };
  const { lines, site } = way(printed.value ?? (printed.low as number));
  derivation.push(...boundLines(printed.bound, lines, printed.bound === 'range' ? way(printed.high as number).lines : undefined));

  const inPrinted = (value: number | null): number | null => (value === null ? null : requireFinite('asPrinted', scaled(value)));
  const convert = (value: number | null): number | null => (value === null ? null : requireFinite('asPrinted', conversion.scale(value)));
  const value = inPrinted(printed.value);
  const linear = printed.uncertaintyScale === 'linear';
  const u = linear ? inPrinted(printed.standardUncertainty) : printed.standardUncertainty;
  const missing: string[] = [];
  if (site) missing.push(...site.missing);
  const reported = printed.reportedUncertainty !== null || printed.reportedMinus !== null;
  if (reported && input.uncertaintyKind != null) {
    const need = missingForStandard({ kind: input.uncertaintyKind, coverageFactor: input.coverageFactor, level: input.level, degreesOfFreedom: input.degreesOfFreedom });
    if (need !== null) missing.push(need);
  }
  return {
    symbol: input.symbol,
    ...(input.energyType == null ? {} : { energyType: input.energyType }),
    asPrinted: input.asPrinted,
    unitAsPrinted: input.unitAsPrinted ?? null,
    ...(input.multiplier == null ? {} : { multiplier: input.multiplier }),
    bound: printed.bound,
    value: convert(value),
    low: convert(inPrinted(printed.low)),
    high: convert(inPrinted(printed.high)),
    unit: conversion.unit,
    ...(site && site.missing.length === 0 ? { siteValue: value === null ? null : site.value, siteUnit: site.unit, ...(site.exponentChange === 0 ? {} : { siteExponentChange: site.exponentChange }) } : {}),
    ...(missing.length > 0 ? { missing } : {}),
    reportedUncertainty: printed.reportedUncertainty,
    ...(printed.reportedMinus === null ? {} : { reportedMinus: printed.reportedMinus, reportedPlus: printed.reportedPlus }),
    uncertaintyKind: printed.uncertaintyKind,
    uncertaintyScale: printed.uncertaintyScale,
    standardUncertainty: linear ? convert(u) : u,
    significantDigits: printed.significantDigits,
    derivation,
    printed: { value, low: inPrinted(printed.low), high: inPrinted(printed.high), standardUncertainty: u },
    unitId: unitName,
  };
}

/** Multiplies by a factor; a power of ten moves the decimal point and rounds nothing. */
function timesDecimal(value: number, factor: number): number {
  if (factor === 1) return value;
  const [mantissa, power] = factor.toExponential().split('e');
  if (mantissa !== '1') return value * factor;
  const [digits, exponent] = value.toExponential().split('e');
  return Number(`${digits}e${Number(exponent) + Number(power)}`);
}

function multiplierLine(value: number, multiplier: number, unit: string, operation: string): DerivationLine {
  return operationLine(operation, { value, unit }, { value: timesDecimal(value, multiplier), unit }, references.printed, {
    assumption: `the printed figure times ${quantityText(multiplier)} is the value`,
  });
}

function conversionFor(symbol: QuantitySymbol, unitName: string, context: QuantityContext): Conversion {
  if (rates.has(symbol)) {
    if (symbol === 'preExponential' && unitName === '1') return plainNumber();
    return rateConversion(symbol, unitName, context);
  }
  const canonical = canonicalUnit(symbol as Parameters<typeof canonicalUnit>[0], unitName);
  const scale = (value: number): number => (canonical.numerator === canonical.denominator ? value : (value * canonical.numerator) / canonical.denominator);
  const from = findEnergyUnit(unitName)?.symbol ?? unitName;
  return {
    unit: canonical.unit,
    scale,
    lines: (value) =>
      canonical.numerator === canonical.denominator && canonical.unit === from ? [] : [operationLine(canonical.operation, { value, unit: from }, { value: scale(value), unit: canonical.unit }, canonical.reference, canonical.constant ? { constant: canonical.constant } : {})],
  };
}

/** The factor A_s of an activated sticking coefficient s = A_s exp(-E_s/RT) has no unit. */
function plainNumber(): Conversion {
  return { unit: '1', scale: (value) => value, lines: (value) => [operationLine('Factor of a sticking coefficient kept', { value }, { value }, references.printed, { assumption: 's = A_s exp(-E_s/RT)' })] };
}

function rateConversion(symbol: QuantitySymbol, unitName: string, context: QuantityContext): Conversion {
  const unit = requireUnit(unitName, 'unitAsPrinted');
  const orders: ReportedOrders | null = symbol === 'turnoverRate' ? { gas: 0, surface: 0, reported: false } : ordersOf(context);
  const basis = judgeRateUnit(unit, orders);
  const { numerator, denominator } = basisScale(unit, basis.omittedMolecule);
  const coefficient = consumptionCoefficient(context);
  const target = unitOfBasis(basis).symbol;
  const si = (value: number): number => {
    const direct = (value * numerator) / denominator;
    return Number.isFinite(direct) ? direct : value * (numerator / denominator);
  };
  const lines = (value: number): DerivationLine[] => {
    const result: DerivationLine[] = [];
    if (target !== unit.symbol || numerator !== denominator) {
      result.push(
        operationLine(`SI unit of ${unit.symbol}`, { value, unit: unit.symbol }, { value: si(value), unit: target }, references.sp811, {
          constant: siConstants(unit, basis.omittedMolecule),
          ...(basis.omittedMolecule !== 0 ? { assumption: `molecule${basis.omittedMolecule === 1 ? '' : basis.omittedMolecule} is understood in ${unit.symbol}` } : {}),
        }),
      );
    }
    if (coefficient !== 1) {
      const species = (context.rateOf as { consumption: string }).consumption;
      result.push(operationLine(`Rate of the elementary step: divide the consumption rate by ${coefficient}`, { value: si(value), unit: target }, { value: si(value) / coefficient, unit: target }, references.glossary, { assumption: `the source prints the consumption of ${species}` }));
    } else if (context.rateOf === 'unknown' && context.perPair !== true && (orders?.surface ?? 0) >= 2) {
      result.push(operationLine('Rate convention not stated', { value: si(value), unit: target }, { value: si(value), unit: target }, references.glossary, { assumption: 'kept as printed; the rate of the elementary step may differ by a factor of 2 (± ln 2)' }));
    }
    return result;
  };
  const conversion: Conversion = { unit: target, scale: (value) => si(value) / coefficient, lines };
  if (isHomogeneous(basis, orders)) return conversion;
  conversion.site = (value) => {
    const site = toSiteBasis(value, basis, orders, context, symbol === 'preExponential' ? 'pre-exponential' : 'single');
    const pair = symbol === 'turnoverRate' ? null : meanFieldOfPairs(orders, context);
    const missing = [...site.missing, ...(pair?.missing ?? [])];
    if (missing.length > 0) return { value: null, exponentChange: 0, missing, lines: [] };
    const { unit, exponentChange, lines: siteLines } = site as { unit: string; exponentChange: number; lines: DerivationLine[] };
    const perSite = value * (site.factor as number);
    if (pair === null) return { value: perSite, unit, exponentChange, missing, lines: siteLines };
    const meanField = perSite * (pair.factor as number);
    return { value: meanField, unit, exponentChange, missing, lines: [...siteLines, operationLine(pair.operation, { value: perSite, unit }, { value: meanField, unit }, pair.reference, { assumption: pair.assumption })] };
  };
  return conversion;
}

function consumptionCoefficient(context: QuantityContext): number {
  const { rateOf } = context;
  if (rateOf == null || typeof rateOf === 'string') return 1;
  return requirePositive('rateOf', rateOf.coefficient, 'the coefficient of the species consumed');
}
