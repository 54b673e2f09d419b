import { mostTerms, nothingHappens, requireBalance } from './balance.ts';
import { classify, type Classification, type StepClass } from './classify.ts';
import { printEquation } from './print-step.ts';
import { readTerm } from './read-species.ts';
import type { Species, Term } from './species.ts';
import { StepError } from './step-error.ts';
import { stepKeys } from './step-key.ts';
import { splitEquation } from './step-text.ts';

export { StepError };
export type { Species, Term };

/** Version of this reader, stored beside every key it made. */
export const STEP_PARSER_VERSION = '1.0.0';

/** A balanced elementary step, or an overall reaction. */
export interface ElementaryStep {
  /** Independent of order, spelling, isotopes, site types and direction. */
  key: string;
  /** The same with isotopes and site types. */
  variantKey: string;
  /** One ASCII print, in the direction and order typed: `N* + N* -> N2 + 2*`. */
  equation: string;
  /** 1 when the typed reactants stand first in the key, else -1. */
  direction: 1 | -1;
  class: StepClass;
  bond: Classification['bond'];
  assistance: Classification['assistance'];
  reactants: Term[];
  products: Term[];
  /** Gas molecules on the reactant side. */
  gasOrder: number;
  /** Adsorbed species and free sites on the reactant side. */
  surfaceOrder: number;
  parserVersion: string;
}

/** Free sites of one kind are counted together, where the first of them stands. */
function gatherFreeSites(terms: readonly Term[]): Term[] {
  const result: Term[] = [];
  for (const term of terms) {
    const same = term.species.phase === 'free-site' ? result.find(({ species }) => species.phase === 'free-site' && species.siteType === term.species.siteType) : undefined;
    if (same) same.coefficient += term.coefficient;
    else result.push({ ...term });
  }
  return result;
}

function orderOf(terms: readonly Term[], gas: boolean): number {
  const sum = terms.filter(({ species }) => (species.phase === 'gas') === gas && species.formula !== 'e').reduce((total, { coefficient }) => total + coefficient, 0);
  return Number(sum.toPrecision(12));
}

/**
 * Reads the equation of an elementary step in any of its notations.
 *
 * `CO* + * -> C* + O*`, `CO(ads)`, `CO_ads`, `N2(g) + 2* <-> 2N*`, `*CO`, `D*`, `[13C]O*`, `H*_fcc`, `C2H4**`; the last arrow style does not matter, `<-` is turned round.
 * It must balance for elements, isotopes, sites and charge.
 * Source: notation of surface kinetics (common practice); IUPAC Red Book 2005 for formulas.
 * @throws StepError with its position, or with the imbalance and, where only free sites are missing, a suggestion
 * @example readStep('2N* = N2 + 2*').class // 'associative-desorption'
 */
export function readStep(text: string): ElementaryStep {
  const { left, right } = splitEquation(text);
  if (left.length + right.length > mostTerms) throw new StepError('unreadable', `more than ${mostTerms} species: write one elementary step at a time`, { position: 0 });
  const reactants = gatherFreeSites(left.map(readTerm));
  const products = gatherFreeSites(right.map(readTerm));
  requireBalance(reactants, products);
  if (nothingHappens(reactants, products)) throw new StepError('no-change', 'both sides are the same: nothing happens in this step', { position: 0 });
  const { class: stepClass, bond, assistance } = classify(reactants, products);
  return {
    ...stepKeys(reactants, products),
    equation: printEquation(reactants, products),
    class: stepClass,
    bond,
    assistance,
    reactants,
    products,
    gasOrder: orderOf(reactants, true),
    surfaceOrder: orderOf(reactants, false),
    parserVersion: STEP_PARSER_VERSION,
  };
}
