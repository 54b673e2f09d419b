/** A piece of an equation as it is set. */
export interface EquationToken {
  kind: 'text' | 'count' | 'index' | 'isotope' | 'star' | 'site' | 'charge' | 'plus' | 'arrow' | 'equilibrium' | 'phase';
  text: string;
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
      tokens.push({ kind: inside ? 'index' : 'count', text: digits });
      rest = rest.slice(digits.length);
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

const spoken: Partial<Record<EquationToken['kind'], string>> = { plus: 'plus', arrow: 'gives', equilibrium: 'in equilibrium with' };

/** An equation as it is read aloud: "N adsorbed plus N adsorbed gives N 2 plus 2 free sites". */
export function speakEquation(tokens: readonly EquationToken[]): string {
  const words: string[] = [];
  let speciesStart = true;
  let count = '';
  for (const token of tokens) {
    const joint = spoken[token.kind];
    if (joint) {
      words.push(joint);
      speciesStart = true;
      count = '';
    } else if (token.kind === 'star' && speciesStart) {
      words.push(count && count !== '1' ? 'free sites' : 'a free site');
      speciesStart = false;
    } else if (token.kind === 'star') {
      words.push(token.text.length > 1 ? `adsorbed on ${token.text.length} sites` : 'adsorbed');
    } else if (token.kind === 'count') {
      words.push(token.text);
      count = token.text;
    } else {
      words.push(token.kind === 'site' ? `at ${token.text.slice(1)}` : token.kind === 'phase' ? (token.text === '(g)' ? 'gas' : 'adsorbed') : token.text);
      speciesStart = false;
    }
  }
  return words.join(' ');
}
