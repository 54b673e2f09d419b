import { findToken, type UnitToken } from './unit-tokens.ts';

/** A factor of a unit with its exponent. */
export interface UnitFactor {
  token: UnitToken;
  exponent: number;
}

const raised: Record<string, string> = { '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9', '⁻': '-', '⁺': '', '⁄': '/', 'ᐟ': '/', '·': '.', '˙': '.', '⋅': '.' };

/** Brings the many ways of writing a unit to letters, `^`, digits, `/`, brackets and spaces. */
function tidy(text: string): string {
  return text
    .replace(/<sup>(.*?)<\/sup>/gi, '^{$1}')
    .replace(/\^\{\s?([+\u2212-]?[\d.]+)\s?\}/g, '^$1')
    .replace(/\\(?:mathrm|text|rm)\s?\{([^{}]*)\}/g, '$1')
    .replace(/\\[,;:! ]|\\cdot|\\times|[$~]/g, ' ')
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺]+(?:[⁄ᐟ·˙⋅][⁰¹²³⁴⁵⁶⁷⁸⁹]+)?/g, (run) => `^${[...run].map((character) => raised[character]).join('')}`)
    .replace(/[\u2212\u2010\u2011\u2013\uFE63\uFF0D]/g, '-')
    .replace(/\^?(-?)½/g, '^$10.5')
    .replace(/[µμ]/g, 'u')
    .replace(/\u212B/g, 'Å')
    .replace(/[\u2215\u2044÷]/g, '/')
    .replace(/(?:° ?|\bdeg )K\b/g, 'K')
    .replace(/[·⋅•∙×\u00a0\u2009\u202f\s]+/g, ' ')
    .replace(/\*\*/g, '^')
    .replace(/\*/g, ' ')
    .replace(/\(\s?per (?:surface |active |adsorption )?site\s?\)/gi, ' site-1')
    .replace(/\bper (?:surface |active |adsorption )?site\b/gi, ' site-1')
    .replace(/(?<=\S )per\b/gi, '/')
    .replace(/^\s*per\b/i, '1/')
    .replace(/\bmm[.-]? ?Hg\b/g, 'mmHg')
    .replace(/\b(molec|at|sec|hr|min|atm)\.(?=\W|$)/g, '$1')
    .replace(/\be\.\s?u\.?(?![A-Za-z])/gi, 'eu')
    .replace(/\ba\.\s?u\.(?![A-Za-z])/g, 'hartree')
    .replace(/\b(lb|g|kg)-mol(e?)(?![A-Za-z])/g, '$1mol$2')
    .replace(/\/ ?(lb|g|kg) mol(e?)(?![A-Za-z])/g, '/$1mol$2')
    .replace(/\b([km]?g)[ _-]?(?:\{cat\.?\}|\(cat\.?\)|cat\b\.?|catalyst\b)/g, '$1')
    .replace(/\bBtu ?\(?_?(IT|th)\)?/gi, (_, table: string) => `Btu_${table.toLowerCase() === 'th' ? 'th' : 'IT'}`)
    .replace(/([A-Za-zÅ0-9)])[.-](?=[A-Za-zÅ])/g, '$1 ')
    .replace(/[.,;\s]+$/, '')
    .replace(/^\s*\/ ?(?=[A-Za-zÅ(])/, '1/')
    .trim();
}

const nameAt = /[A-Za-zÅåöÖ_ℓ]+|%/y;
const exponentAt = /\^? ?(?:\{ ?([+-]?[\d.]+(?: ?\/ ?\d+)?) ?\}|\( ?([+-]?[\d.]+(?: ?\/ ?\d+)?) ?\)|([+-]?\d+\/[2-9](?![\d.])|[+-]?\d+(?:\.\d+)?|[+-]?\.\d+))/y;

/** An exponent that lost its raised place in copying: `kJ mol -1`, `cm 3 s -1`. A space and a digit can mean nothing else. */
const lostExponent = / (?=-\d|[2346](?![\d.]))/y;

function exponentNumber(text: string): number {
  const [top, bottom] = text.split('/');
  return bottom === undefined ? Number(top) : Number(top) / Number(bottom);
}

class UnitReader {
  readonly factors = new Map<UnitToken, number>();
  private readonly text: string;
  private at = 0;

  constructor(text: string) {
    this.text = text;
  }

  private match(pattern: RegExp): RegExpExecArray | null {
    pattern.lastIndex = this.at;
    const found = pattern.exec(this.text);
    if (found) this.at += found[0].length;
    return found;
  }

  private skipSpace(): void {
    while (this.text[this.at] === ' ') this.at += 1;
  }

  /** An exponent straight after a factor, or 1; null when it can't be read. */
  private exponent(): { value: number; negative: boolean } | null {
    this.match(lostExponent);
    const next = this.text[this.at];
    if (next === undefined || !/[\^{(\d+.-]/.test(next) || (next === '(' && !/^\( ?[+-]?[\d.]/.test(this.text.slice(this.at)))) return { value: 1, negative: false };
    const found = this.match(exponentAt);
    if (!found) return null;
    const text = found[1] ?? found[2] ?? (found[3] as string);
    const value = exponentNumber(text);
    if (!Number.isFinite(value) || Math.abs(value) > 12) return null;
    return { value, negative: text.startsWith('-') };
  }

  /** Reads factors up to the end or a closing bracket; returns false when something can't be read. */
  product(outer: number, depth: number): boolean {
    if (depth > 6) return false;
    let divided = false;
    let fresh = false;
    let count = 0;
    for (;;) {
      this.skipSpace();
      if (this.at >= this.text.length || this.text[this.at] === ')') return count > 0 && !fresh;
      if (this.text[this.at] === '/') {
        if (fresh || count === 0) return false;
        divided = true;
        fresh = true;
        this.at += 1;
        continue;
      }
      const sign = divided ? -1 : 1;
      if (this.text[this.at] === '(') {
        const close = this.closing();
        if (close < 0) return false;
        const inner = this.text.slice(this.at + 1, close);
        this.at = close + 1;
        const power = this.exponent();
        if (!power || (power.negative && fresh)) return false;
        const reader = new UnitReader(inner);
        if (!reader.product(1, depth + 1) || reader.at < inner.length) return false;
        for (const [token, exponent] of reader.factors) this.add(token, exponent * power.value * (power.negative ? 1 : sign) * outer);
      } else if (this.text[this.at] === '1' && !/^1[\d.]/.test(this.text.slice(this.at))) {
        if (count > 0) return false;
        this.at += 1;
      } else {
        const name = this.match(nameAt);
        const token = name ? findToken(name[0]) : null;
        if (!token) return false;
        const power = this.exponent();
        if (!power || (power.negative && fresh)) return false;
        this.add(token, power.value * (power.negative ? 1 : sign) * outer);
      }
      fresh = false;
      count += 1;
    }
  }

  private closing(): number {
    let depth = 0;
    for (let i = this.at; i < this.text.length; i += 1) {
      if (this.text[i] === '(') depth += 1;
      if (this.text[i] === ')') {
        depth -= 1;
        if (depth === 0) return i;
      }
    }
    return -1;
  }

  private add(token: UnitToken, exponent: number): void {
    this.factors.set(token, (this.factors.get(token) ?? 0) + exponent);
  }

  get done(): boolean {
    return this.at >= this.text.length;
  }
}

/**
 * Reads the text of a unit into its factors, or null when it is not a unit.
 *
 * After a slash every factor without a sign belongs to the denominator (`cm3/molecule s` is `cm3/(molecule s)`);
 * a factor with a written negative exponent keeps it (`L/mol s-1`). A hyphen between factors multiplies them (`mol/cm2-s`).
 * An empty text, `-` and `1` are dimensionless.
 * Source: SI Brochure, 9th edition, 5.4.6, with the spellings that papers print (common practice).
 * @example readUnitFactors('cm3/molecule s').map(({ token, exponent }) => `${token.symbol} ${exponent}`) // ['cm 3', 'molecule -1', 's -1']
 */
export function readUnitFactors(text: string): UnitFactor[] | null {
  if (text.length > 160) return null;
  const clean = tidy(text);
  if (clean === '' || clean === '-' || clean === '\u2014' || clean === '1' || /^(?:dimensionless|none|unitless)$/i.test(clean)) return [];
  if (/^(?:wavenumbers?|kaysers?)$/i.test(clean)) return readUnitFactors('cm-1');
  // A percentage of an amount is a composition, not an amount times a percentage.
  if (/^(?:mol|at)[. ]*%$/i.test(clean)) return null;
  const reader = new UnitReader(clean);
  if (!reader.product(1, 0) || !reader.done) return null;
  return [...reader.factors].filter(([, exponent]) => exponent !== 0).map(([token, exponent]) => ({ token, exponent: Number(exponent.toPrecision(12)) }));
}
