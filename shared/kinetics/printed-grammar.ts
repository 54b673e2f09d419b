import { decimalValue, readDecimal, readPowerOfTen, type Decimal } from './printed-number.ts';
import type { Scanner } from './printed-text.ts';
import type { UncertaintyKind } from './uncertainty.ts';

/** The number part of a printed value, before bound and unit are added. */
export interface CoreValue {
  value: number | null;
  low: number | null;
  high: number | null;
  reported: number | null;
  minus: number | null;
  plus: number | null;
  kind: UncertaintyKind;
  coverageFactor: number | null;
  level: number | null;
  scale: 'linear' | 'ln';
  significantDigits: number;
  hasUncertainty: boolean;
  /** Unit inside the name of a logarithm, as in log(A/s-1). */
  unitInName: string | null;
}

interface Spread {
  reported: Decimal | null;
  minus: Decimal | null;
  plus: Decimal | null;
  percent: boolean;
  kind: UncertaintyKind;
}

const noSpread: Spread = { reported: null, minus: null, plus: null, percent: false, kind: 'none' };

function core(part: Partial<CoreValue>): CoreValue {
  return {
    value: null, low: null, high: null, reported: null, minus: null, plus: null, kind: 'none', coverageFactor: null, level: null,
    scale: 'linear', significantDigits: 1, hasUncertainty: false, unitInName: null, ...part,
  };
}

const plusMinus = / *(?:±|\+\/-|\+-|\\pm) */y;

/** Reads what follows a central number: ± half-width, (digits), +plus/-minus; nothing is fine. */
function readSpread(scanner: Scanner, central: Decimal): Spread {
  const concise = scanner.take(/\((\d+)\)/y);
  if (concise) {
    const text = concise[1] as string;
    return { ...noSpread, reported: { text: `${text}e-${central.decimals}`, decimals: central.decimals, significantDigits: text.length }, kind: 'standard' };
  }
  const conciseDecimal = scanner.take(/\((\d+\.\d+)\)/y);
  if (conciseDecimal) {
    const text = conciseDecimal[1] as string;
    return { ...noSpread, reported: { text, decimals: 0, significantDigits: text.length - 1 }, kind: 'standard' };
  }
  if (scanner.take(plusMinus)) {
    const half = readDecimal(scanner, false);
    if (!half) throw scanner.fail('the half-width after ±');
    const percent = scanner.take(/ ?%/y) !== null;
    return { ...noSpread, reported: half, percent, kind: 'unknown' };
  }
  const open = scanner.peek(/ *\( ?\+/y) ? scanner.take(/ *\( ?/y) : null;
  const braces = scanner.peek(/\^\{ ?\+/y) ? scanner.take(/\^\{ ?/y) : null;
  const plus = scanner.peek(/ *\+ ?[\d.]/y) ? (scanner.take(/ *\+ ?/y), readDecimal(scanner, false)) : null;
  if (plus) {
    if (braces) scanner.take(/ ?\}/y);
    if (!scanner.take(/ *[/,_]? ?\{? ?[-\u2013] ?/y)) throw scanner.fail('the lower part of an asymmetric uncertainty, such as +2/-3');
    const minus = readDecimal(scanner, false);
    if (!minus) throw scanner.fail('the lower part of an asymmetric uncertainty, such as +2/-3');
    if (braces) scanner.take(/ ?\}/y);
    if (open && !scanner.take(/ ?\)/y)) throw scanner.fail('a closing bracket');
    return { ...noSpread, minus, plus, kind: 'unknown' };
  }
  return noSpread;
}

function spreadNumber(decimal: Decimal | null, exponent: number): number | null {
  if (decimal === null) return null;
  const [mantissa, own] = decimal.text.split('e');
  return Number(`${mantissa}e${exponent + Number(own ?? 0)}`);
}

/** Reads the kind that the source states behind a ±: (1σ), (2σ), (k = 2), (95 % CI), (SE). */
function readStatedKind(scanner: Scanner, value: CoreValue): CoreValue {
  if (!value.hasUncertainty) return value;
  const sigma = scanner.take(/ *\(? ?([1-3]) ?(?:σ|sigma|s\.?d\.?)(?![a-z]) ?\)?/iy);
  if (sigma) {
    const factor = Number(sigma[1]);
    return factor === 1 ? { ...value, kind: 'standard' } : { ...value, kind: 'expanded', coverageFactor: factor };
  }
  const k = scanner.take(/ *\( ?k ?= ?(\d+(?:\.\d+)?) ?\)/iy);
  if (k && Number(k[1]) > 0) return { ...value, kind: 'expanded', coverageFactor: Number(k[1]) };
  const level = scanner.take(/ *\( ?(\d{2}(?:\.\d+)?) ?% ?(?:CI|C\.I\.|confidence(?: (?:interval|level|limits))?|CL)? ?\)/iy);
  if (level) return { ...value, kind: 'confidence', level: Number(level[1]) / 100 };
  if (scanner.take(/ *\( ?(?:SE|s\.e\.|standard error) ?\)/iy)) return { ...value, kind: 'fit-standard-error' };
  return value;
}

function withSpread(central: Decimal, exponent: number, spread: Spread): CoreValue {
  const value = decimalValue(central, exponent);
  const reported = spreadNumber(spread.reported, exponent);
  return core({
    value,
    reported: spread.percent && reported !== null ? (Math.abs(value) * (spreadNumber(spread.reported, 0) as number)) / 100 : reported,
    minus: spreadNumber(spread.minus, exponent),
    plus: spreadNumber(spread.plus, exponent),
    kind: spread.kind,
    significantDigits: central.significantDigits,
    hasUncertainty: spread.kind !== 'none',
  });
}

/** Reads `13.5 ± 0.4` as a logarithm to `base` and returns the number it stands for. */
function readLogarithm(scanner: Scanner, base: 'ten' | 'e'): CoreValue {
  const central = readDecimal(scanner);
  if (!central) throw scanner.fail('a number');
  const spread = readSpread(scanner, central);
  const factor = base === 'ten' ? Math.LN10 : 1;
  const log = decimalValue(central);
  const scaled = (part: Decimal | null): number | null => {
    const number = spreadNumber(part, 0);
    return number === null ? null : number * factor * (spread.percent ? Math.abs(log) / 100 : 1);
  };
  return core({
    value: base === 'ten' ? (Number.isInteger(log) ? Number(`1e${log}`) : 10 ** log) : Math.exp(log),
    reported: scaled(spread.reported),
    minus: scaled(spread.minus),
    plus: scaled(spread.plus),
    kind: spread.kind,
    scale: 'ln',
    significantDigits: Math.max(1, central.decimals),
    hasUncertainty: spread.kind !== 'none',
  });
}

const logName = /(log ?_?\{?(?:10)?\}?|lg|ln) ?(?:\( ?[A-Za-zν][^()]{0,30}(?:\([^()]{0,20}\))?[^()]{0,10}\)|[A-Za-zν][A-Za-z0-9_]{0,8}(?: ?\/ ?[^=]{1,24})?)? ?(?:=|≈) ?/iy;

/** Reads one number with its spread and power of ten; `(1.1 ± 0.2) × 10^13` shares the power. */
export function readAmount(scanner: Scanner): CoreValue {
  if (scanner.peek(/10(?:\^|\*\*| ?\^)/y)) return readPower(scanner);
  const open = scanner.take(/\( ?/y);
  if (open) return readBracket(scanner);
  const central = readDecimal(scanner);
  if (!central) throw scanner.fail('a number');
  let exponent = readPowerOfTen(scanner);
  const spread = readSpread(scanner, central);
  if (exponent === null && spread.kind !== 'none') {
    exponent = readPowerOfTen(scanner);
    return withSpread(central, exponent ?? 0, spread);
  }
  if (exponent !== null && spread.kind !== 'none') {
    const own = readPowerOfTen(scanner);
    const concise = spread.reported?.text.includes('e') === true;
    const value = withSpread(central, exponent, noSpread);
    const shift = own ?? (concise ? exponent : 0);
    return {
      ...value,
      reported: spread.percent ? (Math.abs(value.value as number) * (spreadNumber(spread.reported, 0) as number)) / 100 : spreadNumber(spread.reported, shift),
      minus: spreadNumber(spread.minus, shift),
      plus: spreadNumber(spread.plus, shift),
      kind: spread.kind,
      hasUncertainty: true,
    };
  }
  return withSpread(central, exponent ?? 0, spread);
}

/** Reads `10^13`, `10^{13}`, `10^13.5±0.4`, `10^(13.5 ± 0.4)`. */
function readPower(scanner: Scanner): CoreValue {
  scanner.take(/10 ?(?:\^|\*\*) ?/y);
  const bracket = scanner.take(/[({] ?/y);
  const result = readLogarithm(scanner, 'ten');
  if (bracket && !scanner.take(/ ?[)}]/y)) throw scanner.fail('a closing bracket');
  // A whole power of ten without an uncertainty of its own is an ordinary number.
  return result.hasUncertainty ? result : { ...result, scale: 'linear' };
}

function readBracket(scanner: Scanner): CoreValue {
  const first = readDecimal(scanner);
  if (!first) throw scanner.fail('a number');
  const separator = scanner.take(rangeSeparator);
  if (separator) {
    const second = readDecimal(scanner);
    if (!second) throw scanner.fail('the upper end of the range');
    closeBracket(scanner);
    const exponent = readPowerOfTen(scanner) ?? 0;
    return makeRange(scanner, decimalValue(first, exponent), decimalValue(second, exponent), Math.max(first.significantDigits, second.significantDigits));
  }
  const spread = readSpread(scanner, first);
  closeBracket(scanner);
  return withSpread(first, readPowerOfTen(scanner) ?? 0, spread);
}

function closeBracket(scanner: Scanner): void {
  if (!scanner.take(/ ?\)/y)) throw scanner.fail('a closing bracket');
}

const rangeSeparator = / *(?:-|\u2013|\.\.\.?|…|to\b|through\b) */iy;

function makeRange(scanner: Scanner, low: number, high: number, significantDigits: number): CoreValue {
  if (low >= high) throw scanner.fail('a range that rises', `the range runs from ${low} to ${high}: write the lower end first`);
  return core({ low, high, significantDigits });
}

/** Reads the number part: a logarithm, a range or an amount with its uncertainty. */
export function readCoreValue(scanner: Scanner): CoreValue {
  const log = scanner.take(logName);
  if (log) {
    const unitInName = /\/ ?(.+?) ?\)? ?[=≈] ?$/.exec(log[0])?.[1] ?? null;
    return { ...readStatedKind(scanner, readLogarithm(scanner, /^ln/i.test(log[1] as string) ? 'e' : 'ten')), unitInName };
  }
  // A dash of text width before the first digit is a minus sign.
  if (scanner.peek(/\u2013 ?[\d.]/y)) return negative(scanner);
  const between = scanner.take(/(?:between|from) +/iy);
  const first = readAmount(scanner);
  if (between && !scanner.peek(/ *(?:and|to|-|\u2013)/iy)) throw scanner.fail('and');
  const separator = between ? scanner.take(/ *(?:and|to|-|\u2013) */iy) : scanner.take(rangeSeparator);
  if (!separator) return readStatedKind(scanner, first);
  if (first.low !== null || first.hasUncertainty) throw scanner.fail('the end of the value');
  const second = readAmount(scanner);
  if (second.low !== null || second.hasUncertainty) throw scanner.fail('a plain number as the upper end of the range');
  const powers = scanner.text.slice(0, scanner.at);
  if (/^[^eEdD×^]*[-\u2013][^-\u2013]*(?:[×·x*] ?10)/.test(powers.trim())) {
    throw scanner.fail('the same form at both ends of the range', 'the power of ten may belong to both ends or to the upper end only: write (1-2) x 10^13, or both ends in full');
  }
  return makeRange(scanner, first.value as number, second.value as number, Math.max(first.significantDigits, second.significantDigits));
}

function negative(scanner: Scanner): CoreValue {
  scanner.take(/\u2013 ?/y);
  const value = readAmount(scanner);
  if (value.value === null || value.scale === 'ln') throw scanner.fail('a number');
  return readStatedKind(scanner, { ...value, value: -value.value });
}
