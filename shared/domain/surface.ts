import type { SurfaceInput } from '../contracts/entries.ts';
import { arrangementWords, sampleTypeWords, type Arrangement, type SampleType, type SiteType, type Structure } from './kinds.ts';
import { readComposition, type Composition } from './surface-composition.ts';
import { SurfaceError } from './surface-error.ts';
import { describeFacet, requireSite, steppedNames, type Facet } from './surface-facet.ts';
import { materialName, readMaterial, type Material } from './surface-material.ts';
import { isMetal, metalStructures } from './surface-metals.ts';
import { supportName } from './surface-support.ts';

export { metalStructures, SurfaceError };

/** A surface in its canonical description; two descriptions of the same surface have the same `key`. */
export interface Surface {
  key: string;
  /** Symbol of a pure metal; null for an alloy or a compound, and where a second metal is on, in or under the first layer. */
  metal: string | null;
  /** What the material is called: `Ru`, `Ni3Fe`, `Ni/Pt overlayer`, `Pt1Cu`. */
  formula: string;
  /** Formula of the bulk where a second metal is on, in or under its first layer, else null. */
  host: string | null;
  /** The second metal. */
  guest: string | null;
  arrangement: Arrangement | null;
  guestMonolayers: number | null;
  elements: string[];
  structure: Structure | null;
  facet: string | null;
  /** Terraces and steps of a stepped fcc facet, in each way they are named: `Pt(S)-[4(111)×(100)]`. */
  stepped: string[];
  reconstruction: string | null;
  site: SiteType | null;
  sampleType: SampleType | null;
  support: string | null;
  particleSizeNm: number | null;
  /** Surface atoms per atom of the metal, 0–1. */
  dispersion: number | null;
  /** Change of the lattice constant, in %, above 0 when stretched. */
  strainPercent: number | null;
  /** Share of the sites that are at step edges, 0–1. */
  stepFraction: number | null;
  label: string;
}

const siteLabels: Readonly<Record<SiteType, string>> = {
  'terrace': 'terrace', 'step-edge': 'step edge', 'kink': 'kink', 'defect': 'defect', 'B5': 'B5 site', 'fcc-hollow': 'fcc hollow',
  'hcp-hollow': 'hcp hollow', 'bridge': 'bridge', 'top': 'top', 'threefold-hollow': 'threefold hollow', 'fourfold-hollow': 'fourfold hollow',
  'long-bridge': 'long bridge', 'short-bridge': 'short bridge', 'edge': 'edge of a particle', 'corner': 'corner of a particle', 'interface': 'metal–support interface', 'subsurface': 'subsurface site',
};

/** The site in words. */
export const siteLabel = (site: SiteType): string => siteLabels[site];

/** The material with the guest that is given in fields of its own. */
function materialOf(input: SurfaceInput): Material {
  const metal = input.metal?.trim() || null;
  const alloy = input.formula?.trim() || null;
  if (metal && alloy && metal !== alloy) throw new SurfaceError('formula', 'Give either one pure metal or the formula of an alloy, not both.');
  const typed = alloy ?? metal;
  if (!typed) throw new SurfaceError('metal', 'Name the metal by its symbol, or the alloy by its formula.');
  const material = readMaterial(typed, alloy ? 'formula' : 'metal');
  const guest = input.guest?.trim() ? readComposition(input.guest) : null;
  if (guest && 'fault' in guest) throw new SurfaceError('guest', guest.fault);
  const named = { ...material, guest: guest?.formula ?? material.guest, arrangement: input.arrangement ?? material.arrangement, monolayers: input.guestMonolayers ?? material.monolayers };
  if (named.guest && !named.arrangement) throw new SurfaceError('arrangement', `Say where ${named.guest} is: on ${material.bulk.formula} (overlayer), under its first layer (subsurface), in it (surface alloy) or as single atoms.`);
  if (!named.guest && named.arrangement && named.arrangement !== 'single-atom') throw new SurfaceError('guest', `Name the metal that makes the ${arrangementWords[named.arrangement]}.`);
  const compound = [named.guest ?? '', material.bulk.formula].find((formula) => named.guest !== null && !(readComposition(formula) as Composition).elements.every(isMetal));
  if (compound !== undefined) throw new SurfaceError('guest', `${compound} is no metal: a near-surface or single-atom alloy has a metal in or on a metal. Name what carries particles under support.`);
  if (named.guest === material.bulk.formula) throw new SurfaceError('guest', `${named.guest} on, in or under ${named.guest} is ${named.guest}: leave the second metal out.`);
  return named;
}

/** The support, said once or twice alike. */
function supportOf(input: SurfaceInput, material: Material): string | null {
  const field = input.support?.trim() ? supportName(input.support) : null;
  const beside = material.support ? supportName(material.support) : null;
  if (field && beside && field !== beside) throw new SurfaceError('support', `The material names ${beside} as its support, this field ${field}. Leave one out.`);
  return field ?? beside;
}

function facetOf(input: SurfaceInput, material: Material, structure: Structure | null): Facet | null {
  const name = material.bulk.formula;
  const field = input.facet?.trim() ? describeFacet(name, structure, input.facet) : null;
  const beside = material.facet ? describeFacet(name, structure, material.facet) : null;
  if (field && beside && field.facet !== beside.facet) throw new SurfaceError('facet', `The material names the facet ${beside.facet}, this field ${field.facet}. Leave one out.`);
  return field ? { facet: field.facet, reconstruction: field.reconstruction ?? beside?.reconstruction ?? null } : beside;
}

/** The name with its facet or support, then what sets it apart. */
function labelOf(surface: Omit<Surface, 'label' | 'key'>, bulk: Composition): string {
  const { guest, arrangement, facet, support, site, sampleType, particleSizeNm, reconstruction } = surface;
  const plain = arrangement === null || arrangement === 'core-shell' ? surface.formula : guest === null ? bulk.formula : materialName(bulk.formula, guest, arrangement).replace(/ (?:overlayer|subsurface|single-atom|surface alloy)$/, '');
  const place = facet ? `${plain}(${facet})${reconstruction ? `-(${reconstruction})`.replace('(hex)', 'hex') : ''}` : plain;
  return [
    support ? `${plain}/${support}` : place,
    support && facet ? `(${facet})` : null,
    arrangement && arrangement !== 'core-shell' ? (surface.guestMonolayers === null ? arrangementWords[arrangement] : `${arrangementWords[arrangement]} of ${surface.guestMonolayers} ML`) : null,
    site && site !== 'terrace' ? siteLabels[site] : null,
    !facet && !support && sampleType ? sampleTypeWords[sampleType] : null,
    particleSizeNm !== null ? `${particleSizeNm} nm` : null,
    surface.dispersion !== null ? `dispersion ${surface.dispersion}` : null,
    surface.strainPercent ? `strain ${surface.strainPercent > 0 ? '+' : '−'}${Math.abs(surface.strainPercent)} %` : null,
    surface.stepFraction !== null ? `steps ${surface.stepFraction}` : null,
  ].filter((part) => part !== null).join(', ');
}

/** What few surfaces state, kept out of the key of those that do not. */
function rareParts(surface: Omit<Surface, 'label' | 'key'>): Record<string, unknown> | null {
  const { guest, arrangement, guestMonolayers, reconstruction, dispersion, strainPercent, stepFraction } = surface;
  const said = Object.entries({ guest, arrangement, guestMonolayers, reconstruction, dispersion, strainPercent: strainPercent || null, stepFraction }).filter(([, value]) => value !== null);
  return said.length > 0 ? Object.fromEntries(said) : null;
}

/**
 * Brings the description of a surface to its canonical form.
 * A pure metal's structure is filled in when it is not stated; nothing else is. What is written in one field (`Ni(111)`, `Ru/Al2O3`, `Pt1Cu(111)`) is taken apart;
 * alike facets, formulas of one material and names of one support become one.
 * @throws SurfaceError naming the part that is missing, impossible (a facet that the structure does not have, for instance) or can mean two things.
 * @example describeSurface({ metal: 'Ru', facet: '(0001)' }).label // 'Ru(0001)'
 */
export function describeSurface(input: SurfaceInput): Surface {
  const material = materialOf(input);
  const { bulk, guest, arrangement } = material;
  const structure = input.structure ?? (bulk.pure && !(arrangement === 'single-atom' && guest === null) ? (metalStructures[bulk.pure] ?? null) : null);
  const facet = facetOf(input, material, structure);
  const site = input.site ?? null;
  requireSite(bulk.formula, structure, facet?.facet ?? null, site);
  const formula = materialName(bulk.formula, guest, arrangement);
  const described: Omit<Surface, 'label' | 'key'> = {
    metal: arrangement === null ? bulk.pure : null,
    formula,
    host: arrangement === null ? null : bulk.formula,
    guest,
    arrangement,
    guestMonolayers: guest ? material.monolayers : null,
    elements: [...new Set([...bulk.elements, ...(guest ? (readComposition(guest) as Composition).elements : [])])],
    structure,
    facet: facet?.facet ?? null,
    stepped: steppedNames(bulk.formula, structure, facet?.facet ?? null),
    reconstruction: input.reconstruction?.trim() || (facet?.reconstruction ?? null),
    site,
    sampleType: input.sampleType ?? null,
    support: supportOf(input, material),
    particleSizeNm: input.particleSizeNm ?? null,
    dispersion: input.dispersion ?? null,
    strainPercent: input.strainPercent ?? null,
    stepFraction: input.stepFraction ?? null,
  };
  const rare = rareParts(described);
  const common = [arrangement === null ? (bulk.pure ?? formula) : formula, structure, described.facet, site, described.sampleType, described.support, described.particleSizeNm];
  return { key: JSON.stringify(rare ? [...common, rare] : common), ...described, label: labelOf(described, bulk) };
}
