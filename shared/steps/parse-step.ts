import { mostTerms, nothingHappens, requireBalance } from './balance.ts';
import { classify, type Classification, type StepClass } from './classify.ts';
import { printEquation } from './print-step.ts';
import { takeCoefficient } from './coefficient.ts';
import { endsInBareA, readTerm } from './read-species.ts';
import { everyReading, type Choices, type Reading } from './readings.ts';
import { findSiteMarks } from './site-marks.ts';
import type { Species, Term } from './species.ts';
import { StepError } from './step-error.ts';
import { stepKeys } from './step-key.ts';
import { splitEquation } from './step-text.ts';

export { StepError };
export type { Species, Term };

/** Version of this reader, stored beside every key it made. */
export const STEP_PARSER_VERSION = '2.0.0';

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

interface Sides {
  reactants: Term[];
  products: Term[];
}

/** Reads every term of an equation in one way. */
function readSides(text: string, choices: Choices): Sides {
  const { left, right } = splitEquation(text, choices);
  if (left.length + right.length > mostTerms) throw new StepError('unreadable', `more than ${mostTerms} species: write one elementary step at a time`, { position: 0 });
  const slices = [...left, ...right];
  const plain = slices.map((slice) => takeCoefficient(slice, choices).rest);
  const context = { marks: findSiteMarks(plain, choices), bareA: plain.some(({ text }) => endsInBareA(text)), choices };
  return { reactants: gatherFreeSites(left.map((slice) => readTerm(slice, context))), products: gatherFreeSites(right.map((slice) => readTerm(slice, context))) };
}

function imbalanceOf({ reactants, products }: Sides): StepError | null {
  try {
    requireBalance(reactants, products);
    return null;
  } catch (error) {
    if (error instanceof StepError) return error;
    throw error;
  }
}

/** Refuses a text of which two readings are left. */
function refuseTwo(readings: string[]): StepError {
  return new StepError('ambiguous', `this can be read as ${readings.slice(0, 3).join(' or as ')}: write the one that is meant`, { position: 0, readings });
}

/** The one way to read an equation in which it balances. */
function settle(readings: Reading<Sides>[]): Sides {
  const first = readings[0] as Reading<Sides>;
  const found = new Map<string, { sides: Sides; error: StepError | null }>();
  for (const reading of readings) {
    if ('error' in reading) continue;
    const sides = reading.value;
    found.set(printEquation(sides.reactants, sides.products), { sides, error: imbalanceOf(sides) });
  }
  const balanced = [...found].filter(([, { error, sides }]) => error === null && !nothingHappens(sides.reactants, sides.products));
  if (balanced.length > 1) throw refuseTwo(balanced.map(([equation]) => equation));
  if (balanced[0]) return balanced[0][1].sides;
  const mendable = [...found.values()].flatMap(({ error }) => (error?.suggestion ? [error] : []));
  if (mendable.length > 1) throw refuseTwo(mendable.map(({ suggestion }) => suggestion as string));
  if (mendable[0]) throw mendable[0];
  if ('error' in first && found.size === 0) throw first.error;
  const likeliest = [...found.values()][0] as { sides: Sides; error: StepError | null };
  throw likeliest.error ?? new StepError('no-change', 'both sides are the same: nothing happens in this step', { position: 0 });
}

/**
 * Reads the equation of an elementary step in any of its notations.
 *
 * `CO* + * -> C* + O*`, `CO(ads)`, `CO_ads`, `COads`, `N2(g) + 2* <-> 2N*`, `*CO`, `D*`, `[13C]O*`, `15N*`, `H*_fcc`, `C2H4**`, `O2^2-*`, `CO(S)`, `CO-M`, LaTeX and
 * Unicode; the arrow's style does not matter, `<-` is turned round. It must balance for elements, isotopes, sites and charge.
 * What can be read in two ways (`13CO*`, `O2-*`, `CO-*`, `C2H4*2`) is settled by the balance, and refused where both balance.
 * Source: notation of surface kinetics (common practice); IUPAC Red Book 2005 for formulas.
 * @throws StepError with its position, with the imbalance and, where only free sites are missing, a suggestion, or with the readings between which to choose
 * @example readStep('2N* = N2 + 2*').class // 'associative-desorption'
 */
export function readStep(text: string): ElementaryStep {
  const { reactants, products } = settle(everyReading((choices) => readSides(text, choices)));
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
