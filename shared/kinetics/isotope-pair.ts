/** Two isotopes that a kinetic isotope effect compares. */
export interface IsotopePair {
  /** Symbol of the element. */
  element: string;
  /** Mass numbers. */
  light: number;
  heavy: number;
}

/** The common isotope of each element that is labelled here. */
const commonMass: Readonly<Record<string, number>> = { H: 1, C: 12, N: 14, O: 16, S: 32, Cl: 35 };

/** Elements that labelled molecules are written with; anything else in a text is a word. */
const formula = /^(?:(?:Cl|[HDTCNOS])\d*)+$/;

/** Abbreviations of techniques and states that read as formulas of labelled molecules. */
const notFormulas: ReadonlySet<string> = new Set(['TS', 'TST', 'TON', 'DOS', 'DSC', 'NOT']);

/** Superscript digits brought down, so that ¹⁵N is 15N and D₂ is D2. */
const plainDigits = (text: string): string => text.normalize('NFKC');

function hydrogens(text: string): Set<1 | 2 | 3> {
  const found = new Set<1 | 2 | 3>();
  if (/deuter/i.test(text)) found.add(2);
  if (/triti/i.test(text)) found.add(3);
  if (/proti/i.test(text)) found.add(1);
  for (const match of text.matchAll(/(?<![A-Za-z\d.])\[?([123])\]?H(?![a-z])/g)) found.add(Number(match[1]) as 1 | 2 | 3);
  // A temperature is no tritium.
  for (const word of text.replace(/\[?[123]\]?H(?![a-z])|\bT(?=\s*[=<>≈])/g, ' ').split(/[^A-Za-z\d]+/)) {
    if (!formula.test(word) || notFormulas.has(word)) continue;
    if (word.includes('D')) found.add(2);
    if (word.includes('T')) found.add(3);
    if (word.includes('H')) found.add(1);
  }
  return found;
}

function hydrogenPair(found: ReadonlySet<1 | 2 | 3>): IsotopePair | null {
  if (found.has(2) && found.has(3)) return found.has(1) ? null : { element: 'H', light: 2, heavy: 3 };
  if (found.has(2)) return { element: 'H', light: 1, heavy: 2 };
  return found.has(3) ? { element: 'H', light: 1, heavy: 3 } : null;
}

/** Labels of heavy atoms other than the common isotope, such as `15N`. */
function heavyLabels(text: string): Map<string, number> {
  const found = new Map<string, number>();
  const note = (element: string, mass: number): void => {
    if (commonMass[element] !== undefined && mass !== commonMass[element]) found.set(`${mass}${element}`, mass);
  };
  for (const match of text.matchAll(/(?<![\d.])(1[3-8]|3[3-7])\]?-?(Cl|[CNOS])(?![a-z])/g)) note(match[2] as string, Number(match[1]));
  for (const match of text.matchAll(/(?<![A-Za-z\d])(Cl|[CNOS])-(1[3-8]|3[3-7])(?!\d)/g)) note(match[1] as string, Number(match[2]));
  return found;
}

/**
 * The two isotopes that a text compares, such as `H/D`, `NH3 and ND3`, `14N/15N`, `12C vs 13C`, `¹⁶O/¹⁸O`; null where it names none, or more than one pair.
 *
 * A label alone is compared with the common isotope. Source: IUPAC Red Book 2005 for the notation; common practice for the words.
 * @example readIsotopePair('NH3 and ND3') // { element: 'H', light: 1, heavy: 2 }
 */
export function readIsotopePair(text: string): IsotopePair | null {
  const plain = plainDigits(text.slice(0, 300));
  const heavy = heavyLabels(plain);
  const pair = hydrogenPair(hydrogens(plain));
  if (heavy.size === 0) return pair;
  const [label, second] = [...heavy.keys()];
  if (pair !== null || second !== undefined) return null;
  const element = (label as string).replace(/^\d+/, '');
  return { element, light: commonMass[element] as number, heavy: heavy.get(label as string) as number };
}
