import { printCounted, printSpecies } from './print-step.ts';
import type { Species, Term } from './species.ts';

/** Keys of an elementary step and the sense in which it was typed. */
export interface StepKeys {
  key: string;
  variantKey: string;
  direction: 1 | -1;
}

function plain(species: Species): Species {
  return { ...species, spelling: species.formula, isotopes: undefined, siteType: undefined };
}

type Side = Map<string, number>;

function collect(terms: readonly Term[], view: (species: Species) => Species): Side {
  const side: Side = new Map();
  for (const { coefficient, species } of terms) {
    const name = printSpecies(view(species));
    side.set(name, (side.get(name) ?? 0) + coefficient);
  }
  return side;
}

function round(value: number): number {
  return Number(value.toPrecision(12));
}

/** Takes what stands on both sides off both; returns null when nothing is left. */
function withoutSpectators(left: Side, right: Side): [Side, Side] | null {
  const a: Side = new Map();
  const b: Side = new Map();
  for (const name of new Set([...left.keys(), ...right.keys()])) {
    const net = round((right.get(name) ?? 0) - (left.get(name) ?? 0));
    if (net < -1e-9) a.set(name, -net);
    else if (net > 1e-9) b.set(name, net);
  }
  return a.size > 0 || b.size > 0 ? [a, b] : null;
}

function isFreeSite(name: string): boolean {
  return /^\*(?:_|$)/.test(name);
}

function withoutFreeSites(side: Side): Side {
  return new Map([...side].filter(([name]) => !isFreeSite(name)));
}

/** Species in alphabetical order, free sites last. */
function text(side: Side): string {
  return [...side].sort(([a], [b]) => Number(isFreeSite(a)) - Number(isFreeSite(b)) || (a < b ? -1 : 1)).map(([name, coefficient]) => printCounted(round(coefficient), name)).join(' + ');
}

function sides(reactants: readonly Term[], products: readonly Term[], view: (species: Species) => Species): [string, string] {
  const left = collect(reactants, view);
  const right = collect(products, view);
  // A hop or an isotope exchange has nothing left once its spectators are gone: its own species stay then.
  const [a, b] = withoutSpectators(left, right) ?? [withoutFreeSites(left), withoutFreeSites(right)];
  return [text(a), text(b)];
}

/**
 * The keys of an elementary step: independent of order, spelling and direction, species on both sides removed, coefficients kept.
 *
 * `key` leaves out isotopes and site types, `variantKey` keeps them. The direction is 1 when the typed reactants stand first in the key.
 */
export function stepKeys(reactants: readonly Term[], products: readonly Term[]): StepKeys {
  const [left, right] = sides(reactants, products, plain);
  const [variantLeft, variantRight] = sides(reactants, products, (species) => species);
  const forward = left === right ? variantLeft <= variantRight : left < right;
  return {
    key: forward ? `${left} <=> ${right}` : `${right} <=> ${left}`,
    variantKey: forward ? `${variantLeft} <=> ${variantRight}` : `${variantRight} <=> ${variantLeft}`,
    direction: forward ? 1 : -1,
  };
}
