import * as z from 'zod';
import { endpoint } from './endpoint.ts';

/** One word of the controlled vocabulary. */
export const term = z.object({
  code: z.string(), label: z.string(), synonyms: z.array(z.string()),
  /** What else is known of it: structure and lattice constant of a metal, class of a technique, structure of a facet. */
  data: z.record(z.string(), z.unknown()),
});
export type Term = z.infer<typeof term>;

export const vocabulary = z.object({
  metals: z.array(term), facets: z.array(term), techniques: z.array(term), supports: z.array(term), stepClasses: z.array(term), steps: z.array(term),
  alloys: z.array(term).default([]), sites: z.array(term).default([]),
});
export type Vocabulary = z.infer<typeof vocabulary>;

export const getVocabulary = endpoint({
  method: 'GET', path: '/vocabulary', access: 'visitor', summary: 'Metals, alloys, facets, kinds of site, techniques, supports, step classes and the elementary steps known', response: vocabulary,
});
