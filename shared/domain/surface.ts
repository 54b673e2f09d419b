import type { SurfaceInput } from '../contracts/entries.ts';
import { facetIsPossible } from '../kinetics/surfaces.ts';
import { sampleTypeWords, type SampleType, type SiteType, type Structure } from './kinds.ts';

/** Crystal structure of the pure metals at room temperature (common handbook knowledge; from memory). */
export const metalStructures: Readonly<Record<string, Structure>> = {
  Al: 'fcc', Ca: 'fcc', Ni: 'fcc', Cu: 'fcc', Rh: 'fcc', Pd: 'fcc', Ag: 'fcc', Ir: 'fcc', Pt: 'fcc', Au: 'fcc', Pb: 'fcc',
  V: 'bcc', Cr: 'bcc', Fe: 'bcc', Nb: 'bcc', Mo: 'bcc', Ta: 'bcc', W: 'bcc',
  Mg: 'hcp', Sc: 'hcp', Ti: 'hcp', Co: 'hcp', Zn: 'hcp', Y: 'hcp', Zr: 'hcp', Tc: 'hcp', Ru: 'hcp', Hf: 'hcp', Re: 'hcp', Os: 'hcp',
  Mn: 'other', Ga: 'other', In: 'other', Sn: 'other', Bi: 'other',
};

/** A surface in its canonical description; two descriptions of the same surface have the same `key`. */
export interface Surface {
  key: string;
  /** Symbol of a pure metal; null for an alloy. */
  metal: string | null;
  formula: string;
  elements: string[];
  structure: Structure | null;
  facet: string | null;
  site: SiteType | null;
  sampleType: SampleType | null;
  support: string | null;
  particleSizeNm: number | null;
  label: string;
}

/** What is wrong with a description of a surface; `field` is the part of the input it is about. */
export class SurfaceError extends Error {
  readonly field: string;
  readonly code: string;

  constructor(field: string, message: string, code = 'surface') {
    super(message);
    this.name = 'SurfaceError';
    this.field = field;
    this.code = code;
  }
}

const siteLabels: Readonly<Record<SiteType, string>> = {
  'terrace': 'terrace', 'step-edge': 'step edge', 'kink': 'kink', 'defect': 'defect', 'B5': 'B5 site', 'fcc-hollow': 'fcc hollow',
  'hcp-hollow': 'hcp hollow', 'bridge': 'bridge', 'top': 'top',
};

/** The site in words. */
export const siteLabel = (site: SiteType): string => siteLabels[site];

const elementSymbol = /^[A-Z][a-z]?$/;
const formulaPattern = /^(?:[A-Z][a-z]?\d*(?:\.\d+)?)+$/;

function readFacet(text: string): string {
  const plain = text.trim().replace(/^[({[]|[)}\]]$/g, '').replace(/[\s,]/g, '').replaceAll('−', '-');
  if (!/^(?:-?\d){3,4}$/.test(plain)) {
    throw new SurfaceError('facet', `“${text}” is not a facet. Write Miller indices such as 111 or, on an hcp metal, four such as 0001.`);
  }
  return plain;
}

/**
 * Brings the description of a surface to its canonical form.
 * A pure metal's structure is filled in when it is not stated; nothing else is.
 * @throws SurfaceError naming the part that is missing or impossible (a facet that the structure does not have, for instance).
 * @example describeSurface({ metal: 'Ru', facet: '(0001)' }).label // 'Ru(0001)'
 */
export function describeSurface(input: SurfaceInput): Surface {
  const metal = input.metal?.trim() || null;
  const alloy = input.formula?.trim().replace(/\s/g, '') || null;
  if (metal && alloy && metal !== alloy) throw new SurfaceError('formula', 'Give either one pure metal or the formula of an alloy, not both.');
  const formula = alloy ?? metal;
  if (!formula) throw new SurfaceError('metal', 'Name the metal by its symbol, or the alloy by its formula.');
  if (metal && !alloy && !elementSymbol.test(metal)) throw new SurfaceError('metal', `“${metal}” is not an element symbol. Write it as Ru or Ni; an alloy goes under formula.`);
  if (!formulaPattern.test(formula)) throw new SurfaceError('formula', `“${formula}” is not a formula. Write it as Ni3Fe or Co0.5Mo0.5.`);
  const elements = [...new Set(formula.match(/[A-Z][a-z]?/g) ?? [])];
  const unknown = elements.filter((element) => !(element in metalStructures));
  if (unknown.length > 0) throw new SurfaceError(metal ? 'metal' : 'formula', `${unknown.join(', ')}: not a metal in the vocabulary.`);
  const pure = elements.length === 1 ? (elements[0] ?? null) : null;
  const stated = input.structure ?? null;
  const structure = stated ?? (pure ? (metalStructures[pure] ?? null) : null);
  const facet = input.facet?.trim() ? readFacet(input.facet) : null;
  if (facet && structure && structure !== 'other' && !facetIsPossible(structure, facet)) {
    const why = structure === 'hcp' ? 'an hcp structure takes four indices whose first three add up to zero, such as 0001' : `a ${structure} structure takes three indices, such as 111`;
    throw new SurfaceError('facet', `${formula}(${facet}) does not exist: ${why}.`, 'facet-impossible');
  }
  const support = input.support?.trim() || null;
  const site = input.site ?? null;
  const sampleType = input.sampleType ?? null;
  const particleSizeNm = input.particleSizeNm ?? null;
  const label = [
    support ? `${formula}/${support}` : facet ? `${formula}(${facet})` : formula,
    site && site !== 'terrace' ? siteLabels[site] : null,
    !facet && !support && sampleType ? sampleTypeWords[sampleType] : null,
    particleSizeNm !== null ? `${particleSizeNm} nm` : null,
  ].filter((part) => part !== null).join(', ');
  return {
    key: JSON.stringify([pure ?? formula, structure, facet, site, sampleType, support, particleSizeNm]),
    metal: pure, formula: pure ?? formula, elements, structure, facet, site, sampleType, support, particleSizeNm, label,
  };
}
