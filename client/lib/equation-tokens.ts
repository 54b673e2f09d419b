import { isNuclide } from '#shared/steps/nuclides.ts';
import { StepError } from '#shared/steps/step-error.ts';
import { speakStep, stepTokens, type StepToken } from '#shared/steps/step-format.ts';

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

/** A count keeps its blank where the number would make a fraction of the formula, or a nuclide: `1/2 N2`, `15 N*`. */
function spaced(count: string, next: string): string {
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
      tokens.push({ kind: inside ? 'index' : 'count', text: inside ? digits : spaced(digits, rest.trimStart()) });
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

const kindOf: Readonly<Record<Exclude<StepToken['kind'], 'sup' | 'coefficient'>, EquationToken['kind']>> = {
  'text': 'text', 'sub': 'index', 'site': 'star', 'site-type': 'site', 'plus': 'plus', 'arrow': 'arrow',
};

function fromStepToken({ kind, text }: StepToken, index: number, all: readonly StepToken[]): EquationToken {
  if (kind === 'coefficient') return { kind: 'count', text: spaced(text, all[index + 1]?.text ?? '') };
  if (kind === 'sup') return /^\d+$/.test(text) ? { kind: 'isotope', text } : { kind: 'charge', text: `^${text}` };
  return { kind: kindOf[kind], text: kind === 'site-type' ? `_${text}` : text };
}

/** Only the symbol right after an isotope's number belongs to it: the letters that follow are cut off. */
function afterIsotope(token: EquationToken, index: number, all: readonly EquationToken[]): EquationToken[] {
  const [, symbol, rest] = /^([A-Z][a-z]?)(.+)$/.exec(token.text) ?? [];
  if (all[index - 1]?.kind !== 'isotope' || !symbol || !rest) return [token];
  return [{ kind: 'text', text: symbol }, { kind: 'text', text: rest }];
}

/** An equation cut into pieces, and in words for those who listen; one that is no equation yet is heard as it is typed. */
export function readEquation(equation: string): { tokens: EquationToken[]; spoken: string } {
  try {
    const spoken = speakStep(equation);
    // The reader of equations keeps one arrow; an equilibrium and a phase that were printed are set as printed, unless with markup.
    const plain = /<->|<=>|[⇌↔]|\([a-z]+\)/.test(equation) && /^[\w\s*+<>=⇌↔→()[\]^/.,½¼¾-]+$/.test(equation) && !/&|<\/|[_^]\{|_ads?\b|\^\*/.test(equation);
    return { tokens: plain ? equationTokens(equation) : stepTokens(equation).map(fromStepToken).flatMap(afterIsotope), spoken };
  } catch (error) {
    if (error instanceof StepError) return { tokens: equationTokens(equation), spoken: equation };
    throw error;
  }
}
