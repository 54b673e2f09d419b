/** A heavy atom of a linear formula with the hydrogens written on it. */
interface Group {
  element: string;
  hydrogens: number;
}

const groupCache = new Map<string, Group[]>();

/** Reads a formula as a chain of heavy atoms with their hydrogens; hydrogens written first belong to the first heavy atom. */
function chain(formula: string): Group[] {
  const cached = groupCache.get(formula);
  if (cached) return cached;
  const groups: Group[] = [];
  let waiting = 0;
  for (const match of formula.matchAll(/([A-Z][a-z]?)(\d*)/g)) {
    const element = match[1] as string;
    const count = match[2] ? Number(match[2]) : 1;
    if (element === 'H') {
      const last = groups.at(-1);
      if (last) last.hydrogens += count;
      else waiting += count;
    } else {
      for (let i = 0; i < Math.min(count, 40); i += 1) groups.push({ element, hydrogens: 0 });
      const first = groups[0];
      if (first) first.hydrogens += waiting;
      waiting = 0;
    }
  }
  if (groupCache.size > 500) groupCache.clear();
  groupCache.set(formula, groups);
  return groups;
}

function bond(a: string, b: string): string {
  return a === 'H' || (b !== 'H' && a > b) ? `${b}-${a}` : `${a}-${b}`;
}

function sameElements(a: readonly Group[], b: readonly Group[]): boolean {
  return a.length === b.length && a.every((group, i) => group.element === (b[i] as Group).element);
}

/** The bond from a heavy atom to hydrogen that a parent loses on the way to a fragment, or null when the formulas do not say. */
function hydrogenBond(parent: string, fragment: string): string | null {
  const whole = chain(parent);
  const rest = chain(fragment);
  const heavy = new Set(whole.map((group) => group.element));
  if (whole.length === 0) return parent === 'H2' && fragment === 'H' ? 'H-H' : null;
  if (heavy.size === 1 && whole.length === rest.length) return bond(whole[0]?.element as string, 'H');
  if (!sameElements(whole, rest)) return null;
  const changed = whole.filter((group, i) => group.hydrogens !== (rest[i] as Group).hydrogens);
  const lost = whole.reduce((sum, group, i) => sum + group.hydrogens - (rest[i] as Group).hydrogens, 0);
  return changed.length === 1 && lost === 1 ? bond((changed[0] as Group).element, 'H') : null;
}

function sameGroups(a: readonly Group[], b: readonly Group[]): boolean {
  return sameElements(a, b) && a.every((group, i) => group.hydrogens === (b[i] as Group).hydrogens);
}

/** Whether a molecule falls into two fragments with every hydrogen where it was: CH2O into CH2 and O, not into CH and OH. */
export function splitsInto(parent: string, a: string, b: string): boolean {
  const whole = chain(parent);
  const turned = [...whole].reverse();
  const parts = [...chain(a), ...chain(b)];
  const swapped = [...chain(b), ...chain(a)];
  return [whole, turned].some((groups) => sameGroups(groups, parts) || sameGroups(groups, swapped));
}

/**
 * The bond that joins two fragments in a parent molecule: `N-N`, `C-O`, `N-H`; null when the formulas leave it open.
 *
 * Read from the order of atoms in the formula, so CH3OH and CH2OH tell C–H from O–H.
 */
export function bondBetween(parent: string, a: string, b: string): string | null {
  if (a === 'H') return hydrogenBond(parent, b);
  if (b === 'H') return hydrogenBond(parent, a);
  const whole = chain(parent);
  const first = chain(a);
  const second = chain(b);
  if (first.length === 0 || second.length === 0 || whole.length !== first.length + second.length) return null;
  const elementsOf = (groups: readonly Group[]): Set<string> => new Set(groups.map((group) => group.element));
  const one = elementsOf(first);
  const two = elementsOf(second);
  if (one.size === 1 && two.size === 1 && first.length === 1 && second.length === 1) return bond([...one][0] as string, [...two][0] as string);
  // One central atom with several of another kind around it, as in CO2, HCOO, COOH, NO2: the bond is to the centre.
  const centre = (whole[0] as Group).element;
  const around = elementsOf(whole.slice(1));
  if (whole.length > 2 && around.size === 1 && !around.has(centre)) return bond(centre, [...around][0] as string);
  for (const [front, back] of [[first, second], [second, first]] as const) {
    const head = whole.slice(0, front.length);
    const tail = whole.slice(front.length);
    const fits = (part: readonly Group[], fragment: readonly Group[]): boolean => sameElements(part, fragment) || sameElements(part, [...fragment].reverse());
    if (fits(head, front) && fits(tail, back)) return bond((head.at(-1) as Group).element, (tail[0] as Group).element);
  }
  return null;
}
