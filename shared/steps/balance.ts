import { printEquation, printSpecies, printTerm } from './print-step.ts';
import type { Term } from './species.ts';
import { StepError, type Imbalance } from './step-error.ts';

function totals(terms: readonly Term[]): Map<string, number> {
  const sums = new Map<string, number>();
  const add = (what: string, amount: number): void => {
    sums.set(what, (sums.get(what) ?? 0) + amount);
  };
  for (const { coefficient, species } of terms) {
    for (const [element, count] of Object.entries(species.composition)) add(element, coefficient * count);
    for (const [isotope, count] of Object.entries(species.isotopes ?? {})) add(isotope, coefficient * count);
    if (species.sites > 0) add('site', coefficient * species.sites);
    if (species.charge) add('charge', coefficient * species.charge);
  }
  return sums;
}

function amount(value: number): string {
  return String(Number(value.toPrecision(6)));
}

/** Elements and isotopes by the letters people write. */
function nameOf(what: string): string {
  return what === '2H' ? 'D' : what === '3H' ? 'T' : what;
}

function sentence(what: string, left: number, right: number): string {
  const more = Math.abs(right - left);
  const side = right > left ? 'right' : 'left';
  const name = what === 'site' ? (more === 1 ? 'site' : 'sites') : what === 'charge' ? 'of charge' : nameOf(what);
  return `${amount(more)} ${name} more on the ${side} (${amount(left)} left, ${amount(right)} right)`;
}

/** Free sites added to those of a side, or at its end. */
function withSites(terms: readonly Term[], count: number): Term[] {
  const at = terms.findIndex(({ species }) => species.phase === 'free-site' && species.siteType === undefined);
  if (at >= 0) return terms.map((term, i) => (i === at ? { ...term, coefficient: Number((term.coefficient + count).toPrecision(12)) } : term));
  return [...terms, { coefficient: count, species: { formula: '*', spelling: '*', composition: {}, phase: 'free-site', sites: 1 } }];
}

/** The most species one elementary step is written with. */
export const mostTerms = 24;

function sameSides(reactants: readonly Term[], products: readonly Term[]): boolean {
  const list = (terms: readonly Term[]): string => terms.map(({ coefficient, species }) => `${coefficient} ${printSpecies(species)}`).sort().join('|');
  return list(reactants) === list(products);
}

/** Whether both sides are the same and nothing of it is adsorbed: free sites and gases that only stand there. */
export function nothingHappens(reactants: readonly Term[], products: readonly Term[]): boolean {
  return sameSides(reactants, products) && reactants.every(({ species }) => species.phase !== 'adsorbed');
}

/**
 * Refuses an equation that is not balanced for elements, isotopes, sites and charge.
 *
 * Where only free sites are missing, and with them it would be a step, the error holds the equation with them.
 * @throws StepError `unbalanced`
 */
export function requireBalance(reactants: readonly Term[], products: readonly Term[]): void {
  const left = totals(reactants);
  const right = totals(products);
  const imbalance: Imbalance[] = [];
  const sentences: string[] = [];
  for (const what of new Set([...left.keys(), ...right.keys()])) {
    const l = left.get(what) ?? 0;
    const r = right.get(what) ?? 0;
    if (Math.abs(r - l) < 1e-6) continue;
    imbalance.push({ what, by: Number((r - l).toPrecision(6)) });
    sentences.push(sentence(what, l, r));
  }
  if (imbalance.length === 0) return;
  const only = imbalance[0] as Imbalance;
  let suggestion: string | undefined;
  let addition = '';
  if (imbalance.length === 1 && only.what === 'site') {
    const fixedLeft = only.by > 0 ? withSites(reactants, only.by) : reactants;
    const fixedRight = only.by < 0 ? withSites(products, -only.by) : products;
    if (!sameSides(fixedLeft, fixedRight) && fixedLeft.length + fixedRight.length <= mostTerms) suggestion = printEquation(fixedLeft, fixedRight);
    if (suggestion) addition = `; add ${printTerm({ coefficient: Math.abs(only.by), species: withSites([], 1)[0]?.species as Term['species'] })} on the ${only.by > 0 ? 'left' : 'right'}`;
  }
  throw new StepError('unbalanced', `not balanced: ${sentences.join('; ')}${addition}`, { imbalance, ...(suggestion ? { suggestion } : {}) });
}
