import { printCoefficient } from './print-step.ts';
import type { Species } from './species.ts';

/** What of a term is set and said. */
export interface SetTerm {
  coefficient: number;
  species: Pick<Species, 'formula' | 'spelling' | 'phase' | 'sites' | 'siteType' | 'charge'>;
}

/** Two sides of terms to be set or said. */
export interface SetSides {
  reactants: readonly SetTerm[];
  products: readonly SetTerm[];
}

/** A piece of an equation for a renderer, which draws arrow and asterisk itself. */
export interface StepToken {
  /** `text` letters, `sub` lowered digits, `sup` raised text, `site` an asterisk, `site-type` the name of a site, `coefficient`, `plus`, `arrow`. */
  kind: 'text' | 'sub' | 'sup' | 'site' | 'site-type' | 'coefficient' | 'plus' | 'arrow';
  text: string;
}

function formulaTokens(spelling: string): StepToken[] {
  const tokens: StepToken[] = [];
  const put = (kind: StepToken['kind'], text: string): void => {
    const last = tokens.at(-1);
    if (last && last.kind === kind && kind === 'text') last.text += text;
    else tokens.push({ kind, text });
  };
  for (const match of spelling.matchAll(/\[(\d+)([A-Z][a-z]?)\]|(\d+)|(\[[A-Z][a-z]\]|[^\d[\]]+)/g)) {
    if (match[1]) {
      put('sup', match[1]);
      put('text', match[2] as string);
    } else if (match[3]) put('sub', match[3]);
    else put('text', match[4] as string);
  }
  return tokens;
}

function chargeText(charge: number): string {
  const size = Math.abs(charge);
  return `${size === 1 ? '' : size}${charge > 0 ? '+' : '−'}`;
}

function speciesTokens(species: SetTerm['species']): StepToken[] {
  const tokens: StepToken[] = species.phase === 'free-site' ? [] : formulaTokens(species.spelling);
  if (species.charge) tokens.push({ kind: 'sup', text: chargeText(species.charge) });
  if (species.sites > 0) tokens.push({ kind: 'site', text: '*'.repeat(species.sites) });
  if (species.siteType) tokens.push({ kind: 'site-type', text: species.siteType });
  return tokens;
}

function sideTokens(terms: readonly SetTerm[]): StepToken[] {
  return terms.flatMap((term, i) => [
    ...(i > 0 ? [{ kind: 'plus', text: '+' } as const] : []),
    ...(term.coefficient === 1 ? [] : [{ kind: 'coefficient', text: printCoefficient(term.coefficient).trim() } as const]),
    ...speciesTokens(term.species),
  ]);
}

/** The pieces of an equation by its terms. */
export function tokensOf({ reactants, products }: SetSides): StepToken[] {
  return [...sideTokens(reactants), { kind: 'arrow', text: '->' }, ...sideTokens(products)];
}

const numbers = ['zero', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

function spokenCoefficient(coefficient: number): string {
  if (coefficient === 1) return '';
  if (coefficient === 0.5) return 'one half ';
  if (coefficient === 1.5) return 'three halves ';
  return `${numbers[coefficient] ?? printCoefficient(coefficient).trim().replace('/', ' over ')} `;
}

function spokenFormula(spelling: string): string {
  return spelling.replace(/\[(\d+)([A-Z][a-z]?)\]/g, ' $1 $2 ').replace(/\[([A-Z][a-z])\]/g, '$1').replace(/([A-Z][a-z]?)(?=[A-Z(])/g, '$1 ').replace(/(\))(?=[A-Z(])/g, '$1 ').replace(/(\d)(?=[A-Z(])/g, '$1 ').replace(/\s+/g, ' ').trim();
}

function spokenTerm({ coefficient, species }: SetTerm): string {
  const count = spokenCoefficient(coefficient);
  const site = species.siteType ? ` ${species.siteType}` : '';
  if (species.phase === 'free-site') return coefficient === 1 ? `a free${site} site` : `${count}free${site} sites`;
  if (species.formula === 'e') return `${count}${coefficient === 1 ? 'electron' : 'electrons'}`;
  const charge = species.charge ? ` ${Math.abs(species.charge) === 1 ? '' : `${Math.abs(species.charge)} `}${species.charge > 0 ? 'plus' : 'minus'}` : '';
  const where = species.phase === 'gas' ? (species.charge ? '' : ' gas') : ` adsorbed${species.sites > 1 ? ` on ${numbers[species.sites] ?? species.sites} sites` : ''}${species.siteType ? ` at ${species.siteType}` : ''}`;
  return `${count}${spokenFormula(species.spelling)}${charge}${where}`;
}

function spokenSide(terms: readonly SetTerm[]): string {
  return terms.map(spokenTerm).join(' and ');
}

/** An equation in words by its terms. */
export function wordsOf({ reactants, products }: SetSides): string {
  return `${spokenSide(reactants)} to ${spokenSide(products)}`;
}
