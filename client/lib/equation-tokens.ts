import { isNuclide } from '#shared/steps/nuclides.ts';
import { readPrinted } from '#shared/steps/printed-equation.ts';
import { wordsOf } from '#shared/steps/set-terms.ts';

/** A piece of an equation as it is set. */
export interface EquationToken {
  kind: 'text' | 'count' | 'index' | 'isotope' | 'star' | 'site' | 'charge' | 'plus' | 'arrow' | 'equilibrium' | 'phase';
  text: string;
}

/** An equation cut into pieces, and in words for those who listen. */
export interface SetEquation {
  tokens: EquationToken[];
  spoken: string;
}

const patterns: readonly [EquationToken['kind'] | 'space', RegExp][] = [
  ['space', /^\s+/],
  ['equilibrium', /^(?:<->|<=>|⇌|↔)/],
  ['arrow', /^(?:->|→|=>|=)/],
  ['isotope', /^\[\d+(?=[A-Z])/],
  ['phase', /^\((?:g|ads|a|s|l)\)/],
  ['site', /^_[A-Za-z0-9-]+/],
  ['charge', /^\^[0-9]*[+-]/],
  ['star', /^\*+/],
  ['text', /^[A-Z][a-z]?/],
];

/** A count keeps its blank where the number would make a fraction of the formula, or a nuclide: `1/2 N2`, `15 N*`. */
export function spacedCount(count: string, next: string): string {
  return count.includes('/') || isNuclide(`${count}${/^[A-Z][a-z]?/.exec(next)?.[0] ?? ''}`) ? `${count} ` : count;
}

/**
 * Cuts an equation, in the one spelling the program prints, into the pieces that are set differently.
 * What it does not know is text: an equation somebody is still typing is set as far as it goes.
 */
export function equationTokens(equation: string): EquationToken[] {
  const tokens: EquationToken[] = [];
  let rest = equation.trim();
  /** Digits after a letter or bracket count atoms; at the start of a species they count species. */
  let inside = false;
  while (rest) {
    const digits = /^(?:\d+(?:[./]\d+)?|[½¼¾])/.exec(rest)?.[0];
    if (digits) {
      rest = rest.slice(digits.length);
      tokens.push({ kind: inside ? 'index' : 'count', text: inside || !/^\s/.test(rest) ? digits : spacedCount(digits, rest.trimStart()) });
      continue;
    }
    if (/^\+(?=\s|$)/.test(rest) || (rest.startsWith('+') && !inside)) {
      tokens.push({ kind: 'plus', text: '+' });
      rest = rest.slice(1);
      inside = false;
      continue;
    }
    const found = patterns.map(([kind, pattern]) => [kind, pattern.exec(rest)?.[0]] as const).find(([, text]) => text);
    const [kind, text] = found ?? ['text', rest.slice(0, 1)];
    rest = rest.slice((text as string).length);
    if (kind === 'space') {
      inside = false;
      continue;
    }
    if (kind === 'isotope') {
      tokens.push({ kind, text: (text as string).slice(1) });
      // The closing bracket belongs to the isotope's spelling only.
      rest = rest.replace(']', '');
      inside = true;
      continue;
    }
    inside = kind !== 'arrow' && kind !== 'equilibrium' && !(kind === 'star' && /^\s|^$/.test(rest));
    tokens.push({ kind, text: text as string });
  }
  return tokens;
}

/** An equation in the spelling that is printed, cut into pieces and in words; null for one that only the whole reader can read. */
export function setPrinted(equation: string): SetEquation | null {
  const printed = readPrinted(equation);
  return printed ? { tokens: equationTokens(equation), spoken: wordsOf(printed) } : null;
}

/** An equation that is no equation yet: set as far as it goes, and heard as it is typed. */
export function setAsTyped(equation: string): SetEquation {
  return { tokens: equationTokens(equation), spoken: equation };
}
