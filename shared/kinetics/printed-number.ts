import type { Scanner } from './printed-text.ts';

/** A decimal as printed, kept as text so that scaling by a power of ten stays exact. */
export interface Decimal {
  /** Digits with an optional sign and point, readable by `Number`. */
  text: string;
  /** Digits after the point. */
  decimals: number;
  significantDigits: number;
}

/** The number that a decimal times a power of ten stands for. */
export function decimalValue(decimal: Decimal, exponent = 0): number {
  return Number(`${decimal.text}e${exponent}`);
}

const digits = /(?:\d{1,3}(?: \d{3})+(?![\d])|\d+)?/y;
const lead = /[+-]?/y;

function countSignificant(text: string): number {
  const bare = text.replace(/[-+.]/g, '');
  const stripped = bare.replace(/^0+/, '');
  return Math.max(1, stripped.length);
}

/**
 * Reads a decimal: `26.4`, `.45`, `45.`, `1 200`, `26,4`, `1,234.5`, `1.234,5`.
 *
 * A comma followed by exactly three digits, with one to three digits before it that are not a lone zero, is refused: it may be a decimal comma or a thousands separator.
 */
export function readDecimal(scanner: Scanner, signed = true): Decimal | null {
  const start = scanner.at;
  const sign = signed ? (scanner.take(lead)?.[0] ?? '') : '';
  if (sign) scanner.skipSpace();
  const bodyStart = scanner.at;
  let integer = scanner.take(digits)?.[0] ?? '';
  let fraction: string | null = null;
  const grouped = integer.includes(' ');
  integer = integer.replaceAll(' ', '');
  const commas = scanner.take(/(?:,\d{3})+(?!\d)/y)?.[0];
  if (commas) {
    const groups = commas.slice(1).split(',');
    const pointFollows = scanner.peek(/\.\d/y);
    if (integer === '') {
      scanner.at = start;
      return null;
    }
    if (groups.length === 1 && !pointFollows && !grouped) {
      const group = groups[0] as string;
      if (integer.length > 3 || integer === '0') fraction = group;
      else {
        throw scanner.fail(
          'a point as the decimal sign, or no separator',
          `${JSON.stringify(`${integer},${group}`)} is ambiguous: write ${integer}.${group} for a decimal comma or ${integer}${group} for a thousands separator`,
          bodyStart,
        );
      }
    } else if (integer.length <= 3 && !grouped) {
      integer += groups.join('');
    } else {
      throw scanner.fail('groups of three digits', undefined, bodyStart);
    }
  } else if (scanner.peek(/(?:\.\d{3})+,\d/y) && integer !== '' && integer.length <= 3) {
    integer += (scanner.take(/(?:\.\d{3})+/y)?.[0] ?? '').replaceAll('.', '');
    fraction = scanner.take(/,(\d+)/y)?.[1] ?? '';
  }
  if (fraction === null) {
    const point = scanner.take(integer === '' ? /\.(\d+)/y : /\.(\d*)/y) ?? scanner.take(/,(\d+)/y);
    if (point) fraction = (point[1] as string) + (scanner.take(/(?: \d{3})+(?!\d)/y)?.[0] ?? '').replaceAll(' ', '');
  }
  if (integer === '' && fraction === null) {
    scanner.at = start;
    return null;
  }
  const text = `${sign === '+' ? '' : sign}${integer || '0'}.${fraction ?? ''}`;
  return { text: text.endsWith('.') ? text.slice(0, -1) : text, decimals: fraction?.length ?? 0, significantDigits: countSignificant(`${integer}.${fraction ?? ''}`) };
}

const exponentBody = /\s?(?:\{\s?([+-]?\d+)\s?\}|\(\s?([+-]?\d+)\s?\)|([+-]?\d+))/y;

/** Reads the exponent after `10`: `^13`, `**13`, `^{13}`, `^(-3)`. */
function readExponent(scanner: Scanner): number | null {
  if (!scanner.take(/\*\*| ?\^/y)) return null;
  const match = scanner.take(exponentBody);
  if (!match) throw scanner.fail('an exponent such as 13 or -3');
  return Number(match[1] ?? match[2] ?? match[3]);
}

/** Reads a power of ten written after a number (`e13`, `D13`, `x 10^13`, `×10¹³`, `·10^13`), or null. */
export function readPowerOfTen(scanner: Scanner): number | null {
  const e = scanner.take(/(?:[eEdD]| E(?=[+-]))([+-]?\d+)(?![\d.])/y);
  if (e) return bounded(scanner, Number(e[1]));
  const start = scanner.at;
  if (!scanner.take(/ *(?:[x×X·]|\*(?!\*)|\\times|\\cdot) *10/y)) return null;
  const run = scanner.take(/\d+/y);
  if (run) {
    throw scanner.fail('an exponent', `10${run[0]} after a multiplication sign is read as a lost superscript: write 10^${run[0]} if that is meant, or the product itself`, start);
  }
  const exponent = readExponent(scanner);
  if (exponent === null) throw scanner.fail('an exponent such as ^13 after 10');
  return bounded(scanner, exponent);
}

function bounded(scanner: Scanner, exponent: number): number {
  if (Math.abs(exponent) > 400) throw scanner.fail('an exponent between -400 and 400');
  return exponent;
}
