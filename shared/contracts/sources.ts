import * as z from 'zod';
import { endpoint } from './endpoint.ts';

export const sourceStatuses = ['current', 'corrected', 'retracted'] as const;

/** A source as entries show it. */
export const sourceSummary = z.object({
  id: z.string(),
  doi: z.string().nullable(),
  /** Citation key in every exported bibliography. */
  key: z.string(),
  title: z.string(),
  /** "Vantongeren & Osei-Brandt", as a reader would say it. */
  authors: z.string(),
  /** "Vantongeren 1994". */
  label: z.string(),
  year: z.int().nullable(),
  container: z.string().nullable(),
  status: z.enum(sourceStatuses),
  /** What the DOI service says of a correction or retraction, in words. */
  notice: z.string().nullable(),
});
export type SourceSummary = z.infer<typeof sourceSummary>;

export const sourceDetail = sourceSummary.extend({
  /** Formatted citation, plain text. */
  citation: z.string(),
  bibtex: z.string(),
  ris: z.string(),
  /** Whether the DOI service has confirmed the record. */
  confirmed: z.boolean(),
  acceptedEntries: z.int(),
});
export type SourceDetail = z.infer<typeof sourceDetail>;

export const listSources = endpoint({
  method: 'GET', path: '/sources', access: 'visitor', summary: 'The bibliography, with how many accepted entries each source has',
  query: z.object({
    q: z.string().max(200).optional(),
    sort: z.enum(['label', 'year', '-year', 'entries', '-entries']).default('label'),
    limit: z.coerce.number().int().min(1).max(200).default(50),
    cursor: z.string().max(500).optional(),
  }),
  response: z.object({
    items: z.array(sourceSummary.extend({ acceptedEntries: z.int() })),
    total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable(),
  }),
});

export const getSource = endpoint({
  method: 'GET', path: '/sources/:id', access: 'visitor', summary: 'One source with its formatted citation',
  params: z.object({ id: z.string().max(60) }), response: sourceDetail,
});

/** The DOI may hold slashes and brackets, so it comes as a query on one fixed path as well as at the end of the path. */
export const lookUpDoi = endpoint({
  method: 'GET', path: '/doi/*doi', access: 'contributor', summary: 'Look a DOI up: the source we hold, or what the DOI service answers',
  params: z.object({ doi: z.union([z.string(), z.array(z.string())]) }),
  response: z.object({
    doi: z.string(),
    /** The source when the store holds it already. */
    source: sourceDetail.nullable(),
    title: z.string(), authors: z.string(), year: z.int().nullable(), container: z.string().nullable(),
    citation: z.string(),
    status: z.enum(sourceStatuses), notice: z.string().nullable(),
    /** Accepted and own entries already taken from this source, so that nothing is entered twice. */
    entries: z.array(z.object({ accession: z.string(), equation: z.string(), surface: z.string(), asPrinted: z.string(), state: z.string() })),
  }),
});
