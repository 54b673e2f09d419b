import * as z from 'zod';

/** How many entries one value of a filter would find, given all the other filters. */
export const valueCount = z.object({ value: z.string(), label: z.string(), count: z.int() });
export type ValueCount = z.infer<typeof valueCount>;

/** Counts for the filters of the query sentence; each leaves its own filter aside. */
export const filterCounts = z.object({
  kind: z.array(valueCount), metal: z.array(valueCount), step: z.array(valueCount), stepClass: z.array(valueCount),
  method: z.array(valueCount), methodClass: z.array(valueCount), facet: z.array(valueCount), site: z.array(valueCount),
  scope: z.array(valueCount), provenance: z.array(valueCount), energyType: z.array(valueCount), sampleType: z.array(valueCount),
});
export type FilterCounts = z.infer<typeof filterCounts>;

/** Parts of an entry that free words are looked for in. */
export const matchFields = [
  'title', 'authors', 'container', 'year', 'doi', 'step', 'stepClass', 'species', 'surface', 'metal', 'support', 'promoter', 'method', 'conditions', 'note', 'accession',
] as const;

/** Where words of the search stand in one part of an entry: from and to (not included) in `text`, in UTF-16 units. Never markup. */
export const match = z.object({ field: z.enum(matchFields), text: z.string(), ranges: z.array(z.tuple([z.int(), z.int()])) });
export type Match = z.infer<typeof match>;

/** A value of a filter that could not be read (`found` is false: it finds nothing), or was read in another way than typed. */
export const searchNote = z.object({ filter: z.string(), value: z.string(), found: z.boolean(), message: z.string() });
export type SearchNote = z.infer<typeof searchNote>;

/** What lies near a search that finds nothing. */
export const nearMissKinds = ['other-facet', 'reverse-step', 'other-method-class', 'alloys-containing'] as const;

/** One near miss: how many entries there are, and the filters to change; null takes a filter away. */
export const nearMiss = z.object({ kind: z.enum(nearMissKinds), count: z.int(), change: z.record(z.string(), z.array(z.string()).nullable()) });
export type NearMiss = z.infer<typeof nearMiss>;

/** Why a group has no median: its energies are not all of one elementary step, direction, scope, energy type and state. */
export const noMedianReasons = ['no-energies', 'several-steps', 'both-directions', 'several-scopes', 'several-energy-types', 'several-states'] as const;

/** The head of a group of entries. */
export const groupHead = z.object({
  by: z.enum(['step', 'surface', 'source']),
  /** Key of the elementary step, label of the surface, or id of the source. */
  key: z.string(),
  /** An equation in the direction of the group, the surface's label, or the short form of the source. */
  label: z.string(),
  /** Of a step: 1 as its key is written, -1 the reverse, which is a group of its own; null for the other groups. */
  direction: z.union([z.literal(1), z.literal(-1)]).nullable(),
  count: z.int(), measured: z.int(), computed: z.int(),
  /** Over energies with a value (bounds and ranges left out) [kJ/mol]; `median` is null where they are not alike. */
  energy: z.object({ count: z.int(), median: z.number().nullable(), low: z.number(), high: z.number() }).nullable(),
  noMedian: z.enum(noMedianReasons).nullable(),
});
export type GroupHead = z.infer<typeof groupHead>;
