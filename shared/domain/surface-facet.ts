import { millerOfTerraces, printTerraces, readTerraces, terracesOf } from '../kinetics/stepped-surfaces.ts';
import { equivalentFacet, printIndices, readFacet } from '../kinetics/surfaces.ts';
import type { SiteType, Structure } from './kinds.ts';
import { SurfaceError } from './surface-error.ts';

/** A facet by its indices, with its reconstruction where one is named. */
export interface Facet {
  facet: string;
  reconstruction: string | null;
}

const impossible = 'facet-impossible';

/** A reconstruction or superstructure behind the indices: `-(1×1)`, `-hex`, `-(22×√3)`, `-c(2×2)`, `(1x2)`. */
function takeReconstruction(text: string): { text: string; reconstruction: string | null } {
  const match = /^(.*?[\d)])\s?-?\s?((?:[pc]\s?)?\(?\s?(?:\d{1,2}|√\d+)\s?[×x]\s?(?:\d{1,2}|√\d+)\s?\)?(?:-?R\d{1,2}°?)?|hex(?:-R\d\.?\d?°?)?)$/i.exec(text);
  if (!match || /\(S\)|\[/.test(text)) return { text, reconstruction: null };
  const name = (match[2] as string).replace(/\s/g, '').replace(/(?<=\d)x(?=[\d√])/gi, '×').replace(/^\((.*)\)$/, '$1').replace(/^HEX/i, 'hex');
  return { text: match[1] as string, reconstruction: name };
}

function refuse(material: string, typed: string, why: string): SurfaceError {
  return new SurfaceError('facet', `${material}(${typed}) does not exist: ${why}`, impossible);
}

/** Four indices of a plane that was given by three: (h k l) is (h k -(h+k) l). */
function fourIndices([h, k, l]: readonly number[]): string {
  return printIndices([h as number, k as number, 0 - (h as number) - (k as number), l as number]);
}

function refuseStructure(material: string, structure: Structure, indices: readonly number[], typed: string): SurfaceError {
  if (structure !== 'hcp') return refuse(material, typed, `${structure === 'fcc' ? 'an' : 'a'} ${structure} structure takes three indices, such as 111${indices.length === 4 ? '; four are for an hcp structure, which has to be named' : ''}.`);
  if (indices.length === 3 && indices.some((index) => index !== 0)) {
    const four = equivalentFacet('hcp', fourIndices(indices)) ?? '0001';
    return refuse(material, typed, `an hcp structure takes four indices whose first three add up to zero. If (${typed}) is meant in three hexagonal indices, write ${four}; if the metal is in its fcc phase, name that structure.`);
  }
  return refuse(material, typed, 'an hcp structure takes four indices whose first three add up to zero, such as 0001.');
}

function readStepped(text: string, material: string, structure: Structure | null): string | null {
  const terraces = readTerraces(text);
  if (!terraces) return null;
  if (structure !== 'fcc' && structure !== null) throw new SurfaceError('facet', `Terraces and steps, as in “${text}”, are read for fcc metals. Write the Miller indices of the ${structure} surface.`);
  const miller = millerOfTerraces(terraces);
  if (miller === null) {
    const { rows, terrace, step } = terraces;
    throw new SurfaceError('facet', rows < 2 ? `A terrace has two rows at least, not ${rows}.` : `Steps of (${step}) on terraces of (${terrace}) have no rule here. Write the Miller indices.`);
  }
  return miller;
}

/**
 * Reads a facet and brings it to the one name of all facets alike by symmetry: Miller indices, four of them for hcp, or terraces and steps of an fcc metal.
 *
 * Without a structure three indices stay as they are, since only a cubic one makes (001) the same as (100).
 * @throws SurfaceError on `facet`, with code `facet-impossible` where the structure has no such facet
 * @example describeFacet('Pt', 'fcc', '(S)-[4(111)×(100)]').facet // '533'
 */
export function describeFacet(material: string, structure: Structure | null, typed: string): Facet {
  const own = typed.trim().replace(/^[A-Z][A-Za-z0-9]*(?=\((?:S\)|[-\d]))/, '');
  const stepped = readStepped(own, material, structure);
  if (stepped !== null) return { facet: stepped, reconstruction: null };
  const { text, reconstruction } = takeReconstruction(own);
  const indices = readFacet(text, structure ?? undefined);
  if (indices === null) throw new SurfaceError('facet', `“${typed}” is not a facet. Write Miller indices such as 111 or, on an hcp metal, four such as 0001; a stepped fcc surface also as (S)-[4(111)×(100)].`);
  const printed = printIndices(indices);
  const assumed = structure === null && indices.length === 4 ? 'hcp' : structure;
  if (indices.every((index) => index === 0)) throw refuse(material, printed, 'an index has to differ from 0.');
  if (assumed === null || assumed === 'other') return { facet: printed, reconstruction };
  const facet = equivalentFacet(assumed, text);
  if (facet === null) throw refuseStructure(material, assumed, indices, printed);
  return { facet, reconstruction };
}

/** What a facet is like: its terraces and steps in the notation of Lang, Joyner & Somorjai where it is a regular stepped fcc surface. */
export function steppedNames(material: string, structure: Structure | null, facet: string | null): string[] {
  if (structure !== 'fcc' || facet === null) return [];
  return terracesOf(facet).map((terraces) => printTerraces(terraces, material));
}

const threefold: readonly string[] = ['fcc-hollow', 'hcp-hollow', 'threefold-hollow'];

/** Refuses a site that a flat facet does not have: no fcc hollow on (100), no fourfold hollow on (111). */
export function requireSite(material: string, structure: Structure | null, facet: string | null, site: SiteType | null): void {
  const square = (structure === 'fcc' || structure === 'bcc') && facet === '100';
  const close = (structure === 'fcc' && facet === '111') || (structure === 'hcp' && facet === '0001');
  if (site && square && threefold.includes(site)) throw new SurfaceError('site', `${material}(${facet}) has no ${site.replace('-', ' ')}: its hollows are fourfold.`, 'site-impossible');
  if (site === 'fourfold-hollow' && close) throw new SurfaceError('site', `${material}(${facet}) has no fourfold hollow: its hollows are threefold, fcc or hcp.`, 'site-impossible');
}
