import { N_A } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requirePositive } from './kinetics-error.ts';

/** Crystal structures that facets are written for. */
export const crystalStructures = ['fcc', 'bcc', 'hcp', 'sc', 'diamond'] as const;

/** One of `crystalStructures`. */
export type CrystalStructure = (typeof crystalStructures)[number];

const overline = /(\d)[\u0304\u0305\u00af]/g;
const barCommand = /\\(?:bar|overline)\s?\{?(\d)\}?/g;

function sumsToZero(indices: readonly number[]): boolean {
  return indices.length === 4 && (indices[0] as number) + (indices[1] as number) + (indices[2] as number) === 0;
}

/**
 * Reads Miller or Miller–Bravais indices: `111`, `(111)`, `0001`, `10-10`, `10 -1 0`, `1 1 -2 0`, `(10 1̅ 0)`, `(00.1)`, `10 8 7`; null when there are none.
 *
 * With the structure `hcp` four indices are looked for first: `10 -1 0` is then (1 0 -1 0), and the dot of `10.1` stands for the third.
 */
export function readFacet(facet: string, structure?: string): number[] | null {
  if (facet.length > 40) return null;
  const plain = facet.normalize('NFD').replace(barCommand, '-$1').replace(overline, '-$1').replace(/[\u2212\u2013]/g, '-').trim().replace(/^[({[]|[)}\]]$/g, '').trim();
  const dotted = structure === 'hcp' ? /^(-?\d)\s?(-?\d)\s?[.·]\s?(-?\d)$/.exec(plain) : null;
  if (dotted) {
    const [h, k, l] = dotted.slice(1).map(Number) as [number, number, number];
    return [h, k, 0 - h - k, l];
  }
  const text = plain.replace(/[\s,.·]+/g, ' ').trim();
  if (!/^-?\d(?:[ -]|\d)*$/.test(text)) return null;
  const compact = text.replaceAll(' ', '');
  const indices = [...compact.matchAll(/-?\d/g)].map((match) => Number(match[0]));
  if (structure === 'hcp' && sumsToZero(indices)) return indices;
  const wide = text.split(' ');
  const separate = wide.length === 3 || wide.length === 4 ? wide.map(Number) : null;
  const result = separate && separate.every(Number.isInteger) && wide.some((part) => part.replace('-', '').length > 1) ? separate : indices;
  return result.length === 3 || result.length === 4 ? result : null;
}

/**
 * True when a facet can exist for a structure: three indices for cubic, four with h + k + i = 0 for hcp, not all zero.
 *
 * Source: International Tables for Crystallography A, Miller–Bravais indices (common practice).
 * @example facetIsPossible('hcp', '111') // false
 */
export function facetIsPossible(structure: string, facet: string): boolean {
  const indices = readFacet(facet, structure);
  if (indices === null || indices.every((index) => index === 0)) return false;
  if (structure === 'hcp') return sumsToZero(indices);
  return (crystalStructures as readonly string[]).includes(structure) && indices.length === 3;
}

function divisorOf(indices: readonly number[]): number {
  return indices.reduce((a, b) => {
    let [x, y] = [Math.abs(a), Math.abs(b)];
    while (y > 0) [x, y] = [y, x % y];
    return x;
  }, 0);
}

/**
 * One name for the facets that are alike by symmetry: (001) and (0 -1 0) are `100` of a cubic structure, (01-10) is `10-10` of an hcp one.
 *
 * Common factors are taken out: (222) is `111`, (0002) is `0001`. Indices of ten and more are parted by blanks: `10 8 7`. Null for a facet that the structure cannot have.
 * Source: International Tables for Crystallography A, point groups m-3m and 6/mmm (common practice).
 * @example equivalentFacet('fcc', '(0 -1 1)') // '110'
 */
export function equivalentFacet(structure: string, facet: string): string | null {
  if (!facetIsPossible(structure, facet)) return null;
  const read = readFacet(facet, structure) as number[];
  const divisor = divisorOf(read);
  const indices = read.map((index) => index / divisor);
  if (indices.length === 3) return printIndices(indices.map(Math.abs).sort((a, b) => b - a));
  const inPlane = indices.slice(0, 3);
  // Two of h, k, i have one sign and the third the other: turned so that the two are not below 0.
  const sign = inPlane.filter((index) => index < 0).length > 1 ? -1 : 1;
  return printIndices([...inPlane.map((index) => sign * index + 0).sort((a, b) => b - a), Math.abs(indices[3] as number)]);
}

/** Writes indices: `111`, `10-10`, with blanks between where one of them has two digits. */
export function printIndices(indices: readonly number[]): string {
  return indices.join(indices.some((index) => Math.abs(index) > 9) ? ' ' : '');
}

/** Outermost atoms per a², by structure and family of facets. */
const atomsPerSquare: Record<string, Record<string, number>> = {
  fcc: { '111': 4 / Math.sqrt(3), '100': 2, '110': Math.SQRT2 },
  bcc: { '110': Math.SQRT2, '100': 1, '111': 1 / Math.sqrt(3) },
  hcp: { '0001': 2 / Math.sqrt(3) },
};

/** Density of outermost atoms of an ideal facet. */
export interface SiteDensity {
  perM2: number;
  perCm2: number;
  molPerM2: number;
  derivation: DerivationLine[];
}

/**
 * Density of the outermost atoms of an ideal, unreconstructed facet, from the lattice constant.
 *
 * Taken as a density of sites only for terraces of pure metals. fcc 111: 4/(√3 a²), 100: 2/a², 110: √2/a²;
 * bcc 110: √2/a², 100: 1/a², 111: 1/(√3 a²); hcp 0001: 2/(√3 a²). Source: geometry of the ideal (1×1) cell.
 * @throws KineticsError on a facet that the structure cannot have, one without a closed outermost layer here, or a lattice constant not above 0.
 * @example siteDensity({ structure: 'fcc', facet: '111', aAngstrom: 3.52 }).perCm2 // 1863863214067748.5
 */
export function siteDensity(input: { structure: string; facet: string; aAngstrom: number }): SiteDensity {
  if (!facetIsPossible(input.structure, input.facet)) {
    const need = input.structure === 'hcp' ? 'four indices with h + k + i = 0' : 'three indices';
    throw new KineticsError('facet', `facet ${JSON.stringify(input.facet)} is impossible for ${input.structure}: expected ${need}`, 'facet-impossible', input.facet);
  }
  const a = requirePositive('aAngstrom', input.aAngstrom, 'a', 'angstrom');
  const name = equivalentFacet(input.structure, input.facet) as string;
  const count = atomsPerSquare[input.structure]?.[name];
  if (count === undefined) {
    throw new KineticsError('facet', `no atom density is defined for ${input.structure}(${input.facet}): state a count of sites for open and stepped surfaces`, 'unsupported', input.facet);
  }
  const perM2 = (count / (a * a)) * 1e20;
  return {
    perM2,
    perCm2: (count / (a * a)) * 1e16,
    molPerM2: perM2 / N_A,
    derivation: [
      operationLine(`Outermost atoms of the ideal ${input.structure}(${name}) facet, ${count} / a²`, { value: a, unit: 'angstrom' }, { value: perM2, unit: 'm-2' }, references.greenBook, {
        constant: `N_A = ${quantityText(N_A)} mol-1`,
        assumption: 'one site per outermost atom of an unreconstructed terrace',
      }),
    ],
  };
}
