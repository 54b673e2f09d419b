import { isNuclide } from './nuclides.ts';
import type { Species, Term } from './species.ts';

/** Writes a coefficient: nothing for 1, a fraction with a small denominator, else the number; a fraction is followed by a space. */
export function printCoefficient(coefficient: number): string {
  if (coefficient === 1) return '';
  if (Number.isInteger(coefficient)) return String(coefficient);
  for (let denominator = 2; denominator <= 12; denominator += 1) {
    const numerator = Math.round(coefficient * denominator);
    if (numerator > 0 && numerator / denominator === coefficient) return `${numerator}/${denominator} `;
  }
  return String(coefficient);
}

function printCharge(charge: number | undefined): string {
  if (!charge) return '';
  const size = Math.abs(charge);
  return `^${size === 1 ? '' : size}${charge > 0 ? '+' : '-'}`;
}

/** Writes a species in ASCII: `N*`, `C2H4**`, `H*_fcc`, `O^2-*`, `N2`, `*`. */
export function printSpecies(species: Species): string {
  const site = species.siteType ? `_${species.siteType}` : '';
  if (species.phase === 'free-site') return `*${site}`;
  return `${species.spelling}${printCharge(species.charge)}${'*'.repeat(species.sites)}${site}`;
}

/** Writes a coefficient before a species; with a blank where together they would read as a nuclide: `15 N*`. */
export function printCounted(coefficient: number, name: string): string {
  const printed = printCoefficient(coefficient);
  const symbol = /^[A-Z][a-z]?/.exec(name)?.[0] ?? '';
  return isNuclide(`${printed}${symbol}`) ? `${printed} ${name}` : `${printed}${name}`;
}

/** Writes a term in ASCII: `2N*`, `1/2 N2`. */
export function printTerm(term: Term): string {
  return printCounted(term.coefficient, printSpecies(term.species));
}

/** Writes one side, in the order of its terms. */
export function printSide(terms: readonly Term[]): string {
  return terms.map(printTerm).join(' + ');
}

/** Writes an equation in ASCII with `->`. */
export function printEquation(reactants: readonly Term[], products: readonly Term[]): string {
  return `${printSide(reactants)} -> ${printSide(products)}`;
}
