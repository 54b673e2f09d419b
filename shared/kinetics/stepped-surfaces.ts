import { equivalentFacet, printIndices, readFacet } from './surfaces.ts';

/** A family of stepped fcc surfaces: terraces n atomic rows wide, steps of one atom. */
interface SteppedFamily {
  terrace: string;
  step: string;
  /** Miller indices for n rows. */
  indices: (n: number) => number[];
  /** Rows for indices h ≥ k ≥ l; not whole where the surface is not of this family. */
  rows: (h: number, k: number, l: number) => number;
}

/**
 * Notation of Lang, Joyner & Somorjai, Surf. Sci. 30 (1972) 440; the relations to Miller indices from memory, and proved by the geometry of the lattice in the tests.
 * A step named (110) on a (111) terrace is a (111) step whose edge row is counted to the step: one row less.
 */
const families: readonly SteppedFamily[] = [
  { terrace: '111', step: '100', indices: (n) => [n + 1, n - 1, n - 1], rows: (h, k, l) => (k === l ? (h + k) / (h - k) : NaN) },
  { terrace: '111', step: '111', indices: (n) => [n, n, n - 2], rows: (h, k, l) => (h === k && l > 0 ? (2 * h) / (h - l) : NaN) },
  { terrace: '111', step: '110', indices: (n) => [n + 1, n + 1, n - 1], rows: (h, k, l) => (h === k && l > 0 ? (2 * h) / (h - l) - 1 : NaN) },
  { terrace: '100', step: '111', indices: (n) => [2 * n - 1, 1, 1], rows: (h, k, l) => (k === l && l > 0 ? (h / k + 1) / 2 : NaN) },
  { terrace: '100', step: '110', indices: (n) => [n, 1, 0], rows: (h, k, l) => (l === 0 && k > 0 ? h / k : NaN) },
  { terrace: '110', step: '111', indices: (n) => [2 * n - 1, 2 * n - 1, 1], rows: (h, k, l) => (h === k && l > 0 ? (h / l + 1) / 2 : NaN) },
  { terrace: '110', step: '100', indices: (n) => [n, n - 1, 0], rows: (h, k, l) => (l === 0 && k > 0 ? h / (h - k) : NaN) },
];

/** Terraces and steps of a stepped fcc surface. */
export interface Terraces {
  /** Atomic rows of a terrace. */
  rows: number;
  terrace: string;
  step: string;
}

const notation = /^(?:\(S\)\s?-?)?\s?\[?\s?(\d{1,3})\s?\(\s?(\d[\d\s\u0304\u0305-]*)\)\s?[×x*✕]\s?\(\s?(-?\d[\d\s\u0304\u0305-]*)\)\s?\]?$/i;

/** Reads the terrace–step notation, `(S)-[4(111)×(100)]` or `4(111)x(100)`; null when it is none. */
export function readTerraces(text: string): Terraces | null {
  const match = notation.exec(text.normalize('NFD').trim());
  if (!match) return null;
  const name = (facet: string): string => equivalentFacet('fcc', facet) ?? facet;
  return { rows: Number(match[1]), terrace: name(match[2] as string), step: name(match[3] as string) };
}

/**
 * The facet of a stepped fcc surface by its Miller indices; null where the terraces are under two rows or the family has no rule here.
 *
 * Source: Lang, Joyner & Somorjai, Surf. Sci. 30 (1972) 440 (relations from memory).
 * @example millerOfTerraces({ rows: 4, terrace: '111', step: '100' }) // '533'
 */
export function millerOfTerraces({ rows, terrace, step }: Terraces): string | null {
  const family = families.find((one) => one.terrace === terrace && one.step === step);
  return family && rows >= 2 ? equivalentFacet('fcc', printIndices(family.indices(rows))) : null;
}

/**
 * The terraces and steps of an fcc facet, in every way it is named; none for flat, kinked and irregular ones.
 *
 * Source: Lang, Joyner & Somorjai, Surf. Sci. 30 (1972) 440 (relations from memory).
 * @example terracesOf('533') // [{ rows: 4, terrace: '111', step: '100' }]
 */
export function terracesOf(facet: string): Terraces[] {
  const name = equivalentFacet('fcc', facet);
  if (name === null) return [];
  const [h, k, l] = readFacet(name) as [number, number, number];
  return families.flatMap(({ terrace, step, rows }) => {
    const n = rows(h, k, l);
    return Number.isInteger(n) && n >= 2 ? [{ rows: n, terrace, step }] : [];
  });
}

/** Writes the terrace–step notation after the symbol of a metal: `Pt(S)-[4(111)×(100)]`. */
export function printTerraces({ rows, terrace, step }: Terraces, metal: string): string {
  return `${metal}(S)-[${rows}(${terrace})×(${step})]`;
}
