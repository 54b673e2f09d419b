import * as z from 'zod';
import { term } from '#shared/contracts/vocabulary.ts';
import { methodClasses, siteTypes, structures } from '#shared/domain/kinds.ts';
import alloys from './alloys.json' with { type: 'json' };
import facets from './facets.json' with { type: 'json' };
import metals from './metals.json' with { type: 'json' };
import sites from './sites.json' with { type: 'json' };
import species from './species.json' with { type: 'json' };
import stepClasses from './step-classes.json' with { type: 'json' };
import supports from './supports.json' with { type: 'json' };
import techniques from './techniques.json' with { type: 'json' };

/** The controlled lists that a fresh deployment begins with; facts of the trade, nothing invented. */
export const vocabularyKinds = ['metal', 'facet', 'technique', 'support', 'step-class', 'species', 'alloy', 'site'] as const;

/** One of `vocabularyKinds`. */
export type VocabularyKind = (typeof vocabularyKinds)[number];

/** Every fact says where it comes from: a publication, `common practice` or `from memory`. */
const sourced = z.object({ source: z.string().min(1) });

/** What each list must know of its words. Lattice constants are in [Å]. */
const dataOf = {
  metal: sourced.extend({
    name: z.string().min(2), structure: z.enum(structures), aAngstrom: z.number().min(2).max(6).optional(), cAngstrom: z.number().min(3).max(8).optional(),
  }),
  facet: sourced.extend({
    structures: z.array(z.enum(structures)).min(1), surface: z.enum(['flat', 'open', 'stepped', 'kinked']), idealAtomDensity: z.boolean(),
  }),
  technique: sourced.extend({ class: z.enum(methodClasses), family: z.string().min(1), functional: z.string().optional() }),
  support: sourced,
  'step-class': sourced,
  alloy: sourced.extend({ elements: z.array(z.string()).min(2), structure: z.enum(structures).optional(), note: z.string().min(1) }),
  site: sourced,
  species: sourced.extend({ also: z.array(z.string().min(1)).optional() }),
} as const;

function listOf<K extends VocabularyKind>(kind: K) {
  return z.object({
    about: z.string().min(1),
    terms: z.array(term.extend({ code: kind === 'site' ? z.enum(siteTypes) : z.string(), kind: z.literal(kind).default(kind as never), data: dataOf[kind] })).min(1),
  });
}

/** A metal, with its structure and lattice constants. */
export type MetalTerm = z.infer<typeof term> & { kind: 'metal'; data: z.infer<typeof dataOf.metal> };

/** A word of the vocabulary with the list it belongs to. */
export type VocabularyTerm = z.infer<typeof term> & { kind: VocabularyKind };

/**
 * Reads the lists and holds each against its schema.
 *
 * @throws ZodError naming the list's term and field that is not right
 * @example readVocabulary().filter((word) => word.kind === 'metal')[0]?.code // 'Ru'
 */
export function readVocabulary(): VocabularyTerm[] {
  return [
    ...listOf('metal').parse(metals).terms,
    ...listOf('facet').parse(facets).terms,
    ...listOf('technique').parse(techniques).terms,
    ...listOf('support').parse(supports).terms,
    ...listOf('step-class').parse(stepClasses).terms,
    ...listOf('species').parse(species).terms,
    ...listOf('alloy').parse(alloys).terms,
    ...listOf('site').parse(sites).terms,
  ];
}

/** The metals alone, for what needs their structure and lattice constants [Å]. */
export function readMetals(): MetalTerm[] {
  return listOf('metal').parse(metals).terms;
}
