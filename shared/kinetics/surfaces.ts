import { N_A } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requirePositive } from './kinetics-error.ts';

/** Crystal structures that facets are written for. */
export const crystalStructures = ['fcc', 'bcc', 'hcp', 'sc', 'diamond'] as const;

/** One of `crystalStructures`. */
export type CrystalStructure = (typeof crystalStructures)[number];

const overline = /(\d)[\u0304\u0305]/g;

/** Reads Miller or Miller–Bravais indices: `111`, `(111)`, `0001`, `10-10`, `10 -1 0`, `1 1 -2 0`, `(10 1̅ 0)`; null when there are none. */
export function readFacet(facet: string): number[] | null {
  if (facet.length > 40) return null;
  const text = facet.normalize('NFD').replace(overline, '-$1').replace(/[\u2212\u2013]/g, '-').replace(/^[({[]|[)}\]]$/g, '').replace(/[\s,.·]+/g, ' ').trim();
  if (!/^-?\d(?:[ -]|\d)*$/.test(text)) return null;
  const compact = text.replaceAll(' ', '');
  const indices = [...compact.matchAll(/-?\d/g)].map((match) => Number(match[0]));
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
  const indices = readFacet(facet);
  if (indices === null || indices.every((index) => index === 0)) return false;
  if (structure === 'hcp') return indices.length === 4 && (indices[0] as number) + (indices[1] as number) + (indices[2] as number) === 0;
  return (crystalStructures as readonly string[]).includes(structure) && indices.length === 3;
}

/** Outermost atoms per a², by structure and family of facets. */
const atomsPerSquare: Record<string, Record<string, number>> = {
  fcc: { '111': 4 / Math.sqrt(3), '100': 2, '110': Math.SQRT2 },
  bcc: { '110': Math.SQRT2, '100': 1, '111': 1 / Math.sqrt(3) },
  hcp: { '0001': 2 / Math.sqrt(3) },
};

function family(indices: readonly number[]): string {
  if (indices.length === 4) return indices.slice(0, 3).every((index) => index === 0) ? '0001' : indices.join('');
  return [...indices].map(Math.abs).sort((a, b) => b - a).join('');
}

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
  const name = family(readFacet(input.facet) as number[]);
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
