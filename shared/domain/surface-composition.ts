import { isMetal } from './surface-metals.ts';

/** A material by its elements and their shares. */
export interface Composition {
  /** One formula for one material: shares in the smallest whole numbers, the larger first, equal ones by the alphabet; then what is no metal. */
  formula: string;
  /** In the order of the formula. */
  elements: string[];
  /** Symbol of a pure metal; null for anything else. */
  pure: string | null;
  /** False for `Pt-Ru`: the elements are named and their shares are not. */
  stated: boolean;
}

/** A formula that can't be read as a material, with what to do. */
export interface CompositionFault {
  fault: string;
}

/** What makes nitrides, carbides, oxides, hydrides and the like of a metal, in the order of formulas (IUPAC Red Book 2005, table VI, excerpt). */
const nonMetals = ['B', 'Si', 'C', 'As', 'P', 'N', 'H', 'Te', 'Se', 'S', 'O', 'Cl', 'F'];

const lowered = '₀₁₂₃₄₅₆₇₈₉';

/** Formula without indices set low, blanks and dashes of other kinds. */
export function plainFormula(text: string): string {
  return text
    .replace(/[₀-₉]/g, (digit) => String(lowered.indexOf(digit)))
    .replace(/_\{?([\d.]+)\}?/g, '$1')
    .replace(/[\u2010-\u2015\u2212]/g, '-')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Shares as whole numbers without a common factor: 0.5 and 0.5 are 1 and 1, 75 and 25 are 3 and 1. */
function smallest(amounts: readonly string[]): number[] {
  const decimals = Math.max(...amounts.map((amount) => amount.split('.')[1]?.length ?? 0));
  const whole = amounts.map((amount) => Math.round(Number(amount) * 10 ** decimals));
  const divisor = whole.reduce((a, b) => {
    let [x, y] = [a, b];
    while (y > 0) [x, y] = [y, x % y];
    return x;
  });
  return whole.map((amount) => amount / divisor);
}

function share(amount: number): string {
  return amount === 1 ? '' : String(amount);
}

function print(shares: ReadonlyMap<string, number>): { formula: string; elements: string[] } {
  const metals = [...shares].filter(([element]) => isMetal(element)).sort(([a, x], [b, y]) => y - x || (a < b ? -1 : 1));
  const others = [...shares].filter(([element]) => !isMetal(element)).sort(([a], [b]) => nonMetals.indexOf(a) - nonMetals.indexOf(b));
  const all = [...metals, ...others];
  // A hydride with a broken share of hydrogen is written per atom of its metal: PdH0.6.
  const per = metals.length === 1 && others.length === 1 && others[0]?.[0] === 'H' && (metals[0]?.[1] ?? 1) > 2 ? (metals[0]?.[1] as number) : 1;
  return { formula: all.map(([element, amount]) => `${element}${share(Number((amount / per).toPrecision(6)))}`).join(''), elements: all.map(([element]) => element) };
}

/** Elements joined by dashes, whose shares are not stated: `Pt-Ru`. */
function unstated(parts: readonly string[]): Composition | CompositionFault {
  const unknown = parts.filter((part) => !isMetal(part));
  if (unknown.length > 0) return { fault: `${unknown.join(', ')}: not a metal in the vocabulary. Write the elements of an alloy with their shares, such as Ni3Fe; dashes join metals whose shares are not stated.` };
  const elements = [...new Set(parts)].sort();
  return elements.length < 2 ? { fault: `“${parts.join('-')}” names one metal twice.` } : { formula: elements.join('-'), elements, pure: null, stated: false };
}

/**
 * Reads the formula of a metal, an alloy, or a nitride, carbide, oxide or hydride: `Ni3Fe`, `Pt0.5Ru0.5` = `Pt50Ru50` = `PtRu`, `Pt-Ru` (shares not stated), `Mo2N`, `PdH0.6`.
 *
 * @example readComposition('Ni75Fe25') // { formula: 'Ni3Fe', elements: ['Ni', 'Fe'], pure: null, stated: true }
 */
export function readComposition(text: string): Composition | CompositionFault {
  const plain = plainFormula(text).replace(/(?<=\d)\s?%/g, '').replace(/\s/g, '');
  if (/^[A-Z][a-z]?(?:-[A-Z][a-z]?)+$/.test(plain)) return unstated(plain.split('-'));
  if (/[xyδ]/.test(plain.replace(/[A-Z][a-z]?/g, ''))) return { fault: `“${text}” has shares by letters. Write them as numbers, such as Ni0.8Fe0.2.` };
  if (plain.length > 60 || !/^(?:[A-Z][a-z]?(?:\d{1,4}(?:\.\d{1,6})?|\.\d{1,6})?)+$/.test(plain)) return { fault: `“${text}” is not a formula. Write it as Ni3Fe or Co0.5Mo0.5.` };
  const tokens = [...plain.matchAll(/([A-Z][a-z]?)([\d.]*)/g)].map(([, element, amount]) => ({ element: element as string, amount: amount || '1' }));
  const unknown = [...new Set(tokens.map(({ element }) => element))].filter((element) => !isMetal(element) && !nonMetals.includes(element));
  if (unknown.length > 0 || !tokens.some(({ element }) => isMetal(element))) {
    const names = unknown.length > 0 ? unknown : [...new Set(tokens.map(({ element }) => element))];
    return { fault: `${names.join(', ')}: not a metal in the vocabulary.` };
  }
  if (tokens.some(({ amount }) => !(Number(amount) > 0))) return { fault: `“${text}” has a share of 0. Leave the element out.` };
  const shares = new Map<string, number>();
  smallest(tokens.map(({ amount }) => amount)).forEach((amount, i) => {
    const { element } = tokens[i] as { element: string };
    shares.set(element, (shares.get(element) ?? 0) + amount);
  });
  if (shares.size === 1) {
    const [element] = shares.keys();
    return { formula: element as string, elements: [element as string], pure: element as string, stated: true };
  }
  const names = [...shares.keys()];
  const reduced = smallest([...shares.values()].map(String));
  return { ...print(new Map(names.map((element, i) => [element, reduced[i] as number]))), pure: null, stated: true };
}
