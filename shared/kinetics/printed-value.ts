import { KineticsError } from './kinetics-error.ts';
import { readCoreValue, type CoreValue } from './printed-grammar.ts';
import { PrintedValueError, Scanner } from './printed-text.ts';
import { standardUncertaintyOf, type UncertaintyKind, type UncertaintyStatement } from './uncertainty.ts';
import { findUnit } from './units.ts';

export { PrintedValueError };

/** How a printed value is bounded. */
export const bounds = ['=', '≈', '<', '≤', '>', '≥', 'range'] as const;

/** One of `bounds`. */
export type Bound = (typeof bounds)[number];

/** A value read from a source's own words. */
export interface PrintedValue {
  /** Central value; the limit for `<`, `≤`, `>`, `≥`; null for a range. */
  value: number | null;
  /** Lower end of a range, or the limit of `>` and `≥`. */
  low: number | null;
  /** Upper end of a range, or the limit of `<` and `≤`. */
  high: number | null;
  bound: Bound;
  /** Half-width as reported, on `uncertaintyScale`; null when none or asymmetric. */
  reportedUncertainty: number | null;
  reportedMinus: number | null;
  reportedPlus: number | null;
  uncertaintyKind: UncertaintyKind;
  /** `ln` when the uncertainty belongs to the natural logarithm of the value. */
  uncertaintyScale: 'linear' | 'ln';
  standardUncertainty: number | null;
  /** Digits printed, trailing zeros included; for a logarithm its decimals, at least 1. */
  significantDigits: number;
  /** The unit found in the text or given beside it, in the one printed form; null when there is none. */
  unit: string | null;
}

const words: [RegExp, Bound][] = [
  [/(?:≤|<=|=<|at most\b|up to\b|no more than\b|not more than\b)/iy, '≤'],
  [/(?:≥|>=|=>|at least\b|no less than\b|not less than\b)/iy, '≥'],
  [/(?:<|less than\b|below\b|under\b|smaller than\b)/iy, '<'],
  [/(?:>|more than\b|above\b|over\b|greater than\b|larger than\b)/iy, '>'],
  [/(?:≈|approximately\b|approx\.?(?![a-z])|around\b|about\b|circa\b|ca\.?(?![a-z])|c\.|roughly\b|nearly\b)/iy, '≈'],
];

function readBound(scanner: Scanner): Bound {
  for (const [pattern, bound] of words) {
    if (scanner.take(pattern)) {
      scanner.skipSpace();
      return bound;
    }
  }
  return '=';
}

const symbolName = /[A-Za-zνΔ][A-Za-z0-9_‡†°{}]{0,11}(?: ?[(][^()=<>≈]{0,24}[)])? ?(?=[=≈<>≤≥])/y;

/** Takes a name such as `Ea =` or `A ≈` before the value. */
function skipName(scanner: Scanner): void {
  if (scanner.peek(/(?:log|ln|lg)/iy)) return;
  if (scanner.take(symbolName)) {
    scanner.take(/=(?![<>])/y);
    scanner.skipSpace();
  }
}

/**
 * Reads a value as a paper prints it: central value or interval, bound, reported uncertainty and its kind, digits, unit.
 *
 * A bare ± is of unknown kind and has no standard uncertainty; `26.4(12)` is a standard uncertainty (GUM 7.2.2);
 * asymmetric uncertainties are kept as reported; `10^13.5±0.4`, `log A = …` and `ln A = …` give the uncertainty of ln A.
 * Source: JCGM 100:2008 (GUM) 7.2; number forms: SI Brochure 5.4 and common practice of journals.
 * @param text the string as printed, with or without its unit
 * @param unit the unit printed beside it, if the string has none
 * @throws PrintedValueError with the position and what was expected there
 * @example readPrintedValue('26.4(12)').standardUncertainty // 1.2
 */
export function readPrintedValue(text: string, unit?: string | null): PrintedValue {
  if (text.length > 300) throw new PrintedValueError(text, 300, 'a value of at most 300 characters');
  const scanner = new Scanner(text);
  scanner.skipSpace();
  if (scanner.atEnd) throw scanner.fail('a number');
  skipName(scanner);
  const bound = readBound(scanner);
  const core = readCoreValue(scanner);
  if (bound !== '=' && bound !== '≈' && (core.low !== null || core.hasUncertainty)) {
    throw scanner.fail('a single limit', `${JSON.stringify(text)} has both a limit and ${core.low !== null ? 'a range' : 'an uncertainty'}: keep one`);
  }
  scanner.skipSpace();
  const unitStart = scanner.at;
  const found = readUnitText(scanner, unit?.trim() ? unit : core.unitInName && findUnit(core.unitInName) ? core.unitInName : null);
  return assemble(core, bound, found, scanner, unitStart);
}

function readUnitText(scanner: Scanner, beside: string | null): string | null {
  const trailing = scanner.rest.trim();
  const given = beside?.trim() ? (findUnit(beside)?.symbol ?? beside.trim()) : null;
  if (trailing === '') return given;
  const inText = findUnit(trailing) ?? findUnit(trailing.replace(/^\((.*)\)$/, '$1'));
  if (inText === null || inText.symbol === '1') throw scanner.fail('a unit or the end of the value');
  if (given !== null && given !== inText.symbol) {
    throw scanner.fail('the unit given beside the value', `the value is printed in ${inText.symbol}, the unit beside it is ${given}: keep one`);
  }
  return inText.symbol;
}

function assemble(core: CoreValue, bound: Bound, unit: string | null, scanner: Scanner, end: number): PrintedValue {
  for (const number of [core.value, core.low, core.high, core.reported]) {
    if (number !== null && !Number.isFinite(number)) throw scanner.fail('a number within double range', undefined, end);
  }
  const range = core.low !== null;
  const finalBound: Bound = range ? 'range' : bound;
  const value = range ? null : core.value;
  const kind = core.kind;
  return {
    value,
    low: range ? core.low : finalBound === '>' || finalBound === '≥' ? value : null,
    high: range ? core.high : finalBound === '<' || finalBound === '≤' ? value : null,
    bound: finalBound,
    reportedUncertainty: core.reported,
    reportedMinus: core.minus,
    reportedPlus: core.plus,
    uncertaintyKind: kind,
    uncertaintyScale: core.scale,
    standardUncertainty: core.reported === null ? null : standardUncertaintyOf(core.reported, { kind, coverageFactor: core.coverageFactor, level: core.level }),
    significantDigits: core.significantDigits,
    unit,
  };
}

/**
 * Gives a read value the kind of uncertainty that the contributor states, and the standard uncertainty where that kind allows one.
 *
 * The reported figures stay as they are. Asymmetric uncertainties, a bare ± left unknown, an expanded uncertainty without k
 * and a confidence interval without a level have none. Source: JCGM 100:2008 (GUM) 4.3, annex G.
 * @throws KineticsError on a coverage factor not above 0, or a level outside 0 to 1.
 * @example resolveUncertainty(readPrintedValue('26.4 ± 3'), { kind: 'expanded', coverageFactor: 2 }).standardUncertainty // 1.5
 */
export function resolveUncertainty(printed: PrintedValue, statement: UncertaintyStatement): PrintedValue {
  const asymmetric = printed.reportedMinus !== null;
  if (printed.reportedUncertainty === null && !asymmetric) return { ...printed, uncertaintyKind: 'none', standardUncertainty: null };
  if (statement.kind === 'none') {
    throw new KineticsError('uncertaintyKind', 'the value is printed with an uncertainty: state its kind, or unknown', 'out-of-range', statement.kind);
  }
  return {
    ...printed,
    uncertaintyKind: statement.kind,
    standardUncertainty: printed.reportedUncertainty === null ? null : standardUncertaintyOf(printed.reportedUncertainty, statement),
  };
}

