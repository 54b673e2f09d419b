import { bondBetween, splitsInto } from './bonds.ts';
import { netSides } from './net-sides.ts';
import type { Species, Term } from './species.ts';

/** Classes of elementary steps; `overall` for a reaction that is none. */
export const stepClasses = [
  'adsorption',
  'dissociative-adsorption',
  'desorption',
  'associative-desorption',
  'dissociation',
  'association',
  'hydrogenation',
  'dehydrogenation',
  'disproportionation',
  'diffusion',
  'isomerisation',
  'eley-rideal',
  'overall',
] as const;

/** One of `stepClasses`. */
export type StepClass = (typeof stepClasses)[number];

/** Class of a step with what happens to its bonds, where the formulas say. */
export interface Classification {
  class: StepClass;
  /** Bonds between atoms of the reacting species, such as `N-H`; bonds to the surface are not counted. */
  bond: { broken: string | null; formed: string | null };
  /** Whether a bond between heavy atoms breaks by itself or with hydrogen; null where none breaks. */
  assistance: 'direct' | 'hydrogen-assisted' | null;
}

function molecules(terms: readonly Term[], phase: Species['phase']): string[] {
  const list: string[] = [];
  for (const { coefficient, species } of terms) {
    if (species.phase !== phase) continue;
    for (let i = 0; i < Math.min(8, Math.ceil(coefficient)); i += 1) list.push(species.formula);
  }
  return list;
}

function result(stepClass: StepClass, broken: string | null = null, formed: string | null = null, assistance: Classification['assistance'] = null): Classification {
  return { class: stepClass, bond: { broken, formed }, assistance };
}

function isHeavyBond(bond: string | null): boolean {
  return bond !== null && !bond.split('-').includes('H');
}

function direct(bond: string | null): Classification['assistance'] {
  return isHeavyBond(bond) ? 'direct' : null;
}

/** Takes each common molecule off both lists. */
function withoutCommon(left: string[], right: string[]): [string[], string[]] {
  const rest = [...right];
  const only: string[] = [];
  for (const name of left) {
    const at = rest.indexOf(name);
    if (at >= 0) rest.splice(at, 1);
    else only.push(name);
  }
  return [only, rest];
}

function hydrogenCount(formula: string): number {
  return [...formula.matchAll(/H(?![a-z])(\d*)/g)].reduce((sum, match) => sum + (match[1] ? Number(match[1]) : 1), 0);
}

/** Two adsorbed species that exchange an atom or a group. */
function exchange(left: [string, string], right: [string, string]): Classification {
  for (const [donor, acceptor] of [left, [left[1], left[0]]] as [string, string][]) {
    for (const [rest, grown] of [right, [right[1], right[0]]] as [string, string][]) {
      const grownHydrogen = bondBetween(grown, acceptor, 'H');
      const lostHydrogen = bondBetween(donor, rest, 'H');
      if (grownHydrogen !== null && lostHydrogen !== null && hydrogenCount(grown) === hydrogenCount(acceptor) + 1 && hydrogenCount(donor) === hydrogenCount(rest) + 1) {
        if (left[0] === left[1] || right[0] === right[1]) return result('disproportionation', lostHydrogen, grownHydrogen);
        // Adsorbed O and OH take hydrogen off the other species, OH and H2O give it.
        const takes = ['O', 'OH'].includes(acceptor) && !['OH', 'H2O'].includes(donor);
        const gives = ['OH', 'H2O'].includes(donor) && !['O', 'OH'].includes(acceptor);
        return result(takes || (!gives && hydrogenCount(donor) > hydrogenCount(acceptor)) ? 'dehydrogenation' : 'hydrogenation', lostHydrogen, grownHydrogen);
      }
    }
  }
  for (const hydrogenSide of [left, right]) {
    const at = hydrogenSide.indexOf('H');
    if (at < 0) continue;
    const parent = hydrogenSide[1 - at] as string;
    const fragments = hydrogenSide === left ? right : left;
    const ways = ([fragments, [fragments[1], fragments[0]]] as [string, string][]).flatMap(([grown, other]) => withoutHydrogen(grown).map((bare) => ({ grown, other, bare })));
    // Where the hydrogens of the parent stay in place the hydrogen that came is the other one.
    for (const { grown, other, bare } of [...ways.filter((way) => splitsInto(parent, way.bare, way.other)), ...ways]) {
      const heavy = bondBetween(parent, bare, other);
      const hydrogen = bondBetween(grown, bare, 'H');
      if (!isHeavyBond(heavy) || hydrogen === null) continue;
      return hydrogenSide === left ? result('dissociation', heavy, hydrogen, 'hydrogen-assisted') : result('association', hydrogen, heavy);
    }
  }
  return result(left[0] === left[1] || right[0] === right[1] ? 'disproportionation' : 'association');
}

/** Sites under adsorbed species: a change of it is a change of how a species is bound. */
function sitesHeld(terms: readonly Term[]): number {
  return terms.filter(({ species }) => species.phase === 'adsorbed').reduce((sum, { coefficient, species }) => sum + coefficient * species.sites, 0);
}

/** Formulas with one hydrogen less at one place. */
function withoutHydrogen(formula: string): string[] {
  const list: string[] = [];
  for (const match of formula.matchAll(/H(?![a-z])(\d*)/g)) {
    const count = match[1] ? Number(match[1]) : 1;
    const less = count === 1 ? '' : count === 2 ? 'H' : `H${count - 1}`;
    list.push(formula.slice(0, match.index) + less + formula.slice((match.index as number) + match[0].length));
  }
  return list;
}

function onSurface(reactants: string[], products: string[], sitesKept = true): Classification {
  const [left, right] = withoutCommon(reactants, products);
  if (left.length === 0 && right.length === 0) return result(reactants.length > 1 ? 'overall' : sitesKept ? 'diffusion' : 'isomerisation');
  if (left.length === 1 && right.length === 1) return result('isomerisation');
  if (left.length === 1 && right.length === 2) {
    const broken = bondBetween(left[0] as string, right[0] as string, right[1] as string);
    const losesHydrogen = right.includes('H') && left[0] !== 'H2';
    return result(losesHydrogen ? 'dehydrogenation' : 'dissociation', broken, null, direct(broken));
  }
  if (left.length === 2 && right.length === 1) {
    const formed = bondBetween(right[0] as string, left[0] as string, left[1] as string);
    const gainsHydrogen = left.includes('H') && right[0] !== 'H2';
    return result(gainsHydrogen ? 'hydrogenation' : 'association', null, formed);
  }
  if (left.length === 2 && right.length === 2) return exchange(left as [string, string], right as [string, string]);
  return result('overall');
}

function ontoSurface(gas: string[], reactants: string[], products: string[]): Classification {
  if (gas.length !== 1) return result('overall');
  if (reactants.length > 0) {
    const [kept, made] = withoutCommon(reactants, products);
    if (kept.length === 0) return ontoSurface(gas, [], made);
    const formed = kept.length === 1 && made.length === 1 ? bondBetween(made[0] as string, kept[0] as string, gas[0] as string) : null;
    return result('eley-rideal', null, formed);
  }
  if (products.length === 1 && products[0] === gas[0]) return result('adsorption');
  if (products.length === 1) return result('overall');
  if (products.length > 3) return result('overall');
  const [a, b] = products as [string, string];
  const broken = products.length <= 2 ? bondBetween(gas[0] as string, a, b) : null;
  return result('dissociative-adsorption', broken, null, direct(broken));
}

/** Reads the class of a step from its equation, in the direction typed. */
export function classify(typedReactants: readonly Term[], typedProducts: readonly Term[]): Classification {
  const [reactants, products] = netSides(typedReactants, typedProducts);
  const terms = [...reactants, ...products];
  if (terms.every(({ species }) => species.phase === 'gas') || terms.some(({ species }) => species.formula === 'e')) return result('overall');
  const gasIn = molecules(reactants, 'gas');
  const gasOut = molecules(products, 'gas');
  const adsorbedIn = molecules(reactants, 'adsorbed');
  const adsorbedOut = molecules(products, 'adsorbed');
  if (gasIn.length === 0 && gasOut.length === 0) return onSurface(adsorbedIn, adsorbedOut, sitesHeld(reactants) === sitesHeld(products));
  if (gasOut.length === 0) return ontoSurface(gasIn, adsorbedIn, adsorbedOut);
  if (gasIn.length === 0) return fromSurface(gasOut, adsorbedIn, adsorbedOut);
  if (gasIn.length !== 1 || gasOut.length !== 1 || adsorbedIn.length === 0) return result('overall');
  const formed = adsorbedIn.length === 1 && adsorbedOut.length === 0 ? bondBetween(gasOut[0] as string, gasIn[0] as string, adsorbedIn[0] as string) : null;
  return result('eley-rideal', null, formed);
}

function fromSurface(gas: string[], reactants: string[], products: string[]): Classification {
  if (products.length > 0) {
    const [left, right] = withoutCommon(reactants, products);
    if (right.length === 0) return fromSurface(gas, left, []);
    return onSurface(left, [...right, ...gas]);
  }
  const back = ontoSurface(gas, [], reactants);
  if (back.class === 'adsorption') return result('desorption');
  if (back.class === 'dissociative-adsorption') return result('associative-desorption', null, back.bond.broken);
  return result('overall');
}
