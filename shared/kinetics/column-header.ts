import { toPlainText } from './printed-text.ts';
import { findUnit } from './units.ts';

/** What a table heading says about the figures under it. */
export interface ColumnHeader {
  /** The name left when power and unit are taken off. */
  name: string;
  /** Value = printed figure × multiplier. */
  multiplier: number;
  /** Unit in the one printed form, or null. */
  unit: string | null;
  /** How the multiplier was read, in words. */
  reading: string;
}

const power = String.raw`(?:10\s?(?:\^|\*\*)\s?[{(]?\s?([+-]?\d{1,3})\s?[)}]?|1[eE]([+-]?\d{1,3}))`;
const before = new RegExp(String.raw`^${power}\s*[×x*·]?\s*(?=[A-Za-zν])`);
const after = new RegExp(String.raw`[/(]\s*[x×]?\s*${power}\s*[)]?`);

/**
 * Reads the heading of a column: `10^3 k / s-1` means k = figure × 10^-3, `A/10^13 s-1` means A = figure × 10^13.
 *
 * Source: SI Brochure, 9th edition, 5.4.1 (a heading is the quotient of quantity and unit).
 * @example readColumnHeader('10^3 k / s-1').multiplier // 0.001
 */
export function readColumnHeader(heading: string): ColumnHeader {
  let text = toPlainText(heading.slice(0, 200)).text.trim();
  let multiplier = 1;
  let reading = 'no power of ten in the heading';
  const front = before.exec(text);
  const behind = front ? null : after.exec(text);
  if (front) {
    const exponent = Number(front[1] ?? front[2]);
    multiplier = Number(`1e${-exponent}`);
    text = text.slice(front[0].length);
    reading = `the heading multiplies the quantity by 10^${exponent}: value = figure × 10^${-exponent}`;
  } else if (behind) {
    const exponent = Number(behind[1] ?? behind[2]);
    multiplier = Number(`1e${exponent}`);
    text = `${text.slice(0, behind.index)} / ${text.slice(behind.index + behind[0].length)}`.replace(/\s*\/\s*$/, '');
    reading = `the heading divides the quantity by 10^${exponent}: value = figure × 10^${exponent}`;
  }
  const split = /^(.*?)\s*(?:\/|,|\(|\[|\bin\b)\s*(.+?)\s*[)\]]?$/.exec(text.replace(/\/\s*\/+/g, '/'));
  const unit = split ? findUnit(split[2] as string) : null;
  return { name: (unit && split ? (split[1] as string) : text).trim(), multiplier, unit: unit?.symbol ?? null, reading };
}
