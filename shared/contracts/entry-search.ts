import * as z from 'zod';
import { energyTypes, kinds, methodClasses, provenances, sampleTypes, scopes, siteTypes } from '../domain/kinds.ts';
import { endpoint } from './endpoint.ts';
import { entry } from './entries.ts';

/** Columns a search can be sorted by; a leading minus turns the order round. Ties fall back to the accession. */
export const sortKeys = [
  'energy', '-energy', 'k', '-k', 'uncertainty', '-uncertainty', 'year', '-year', 'metal', '-metal', 'step', '-step', 'source', '-source',
  'method', '-method', 'validFrom', '-validFrom', 'accepted', '-accepted',
] as const;
export type SortKey = (typeof sortKeys)[number];

/** A name that may be repeated in the address: one value or several, always read as a list. */
const several = <T extends z.ZodType>(item: T, most = 50) =>
  z.preprocess((value) => (value === undefined || value === '' ? undefined : Array.isArray(value) ? value : [value]), z.array(item).max(most).optional());
const word = z.string().trim().min(1).max(200);
const year = z.coerce.number().int().min(1800).max(2200).optional();
const real = z.preprocess((value) => (value === '' ? undefined : value), z.coerce.number().optional());

/** What a search asks: a repeated name is OR, different names are AND. */
export const entryFilter = z.object({
  q: z.string().trim().max(400).optional(),
  kind: several(z.enum(kinds)),
  energyType: several(z.enum(energyTypes)),
  /** A pure metal by its symbol. */
  metal: several(word),
  /** An element the material contains: pure metals and alloys. */
  contains: several(word),
  facet: several(word),
  site: several(z.enum(siteTypes)),
  /** Key or equation of an elementary step; both directions are found. */
  step: several(z.string().trim().min(1).max(500)),
  stepClass: several(word),
  bond: several(word),
  /** Technique by its vocabulary code, or `measured` or `computed`. */
  method: several(word),
  methodClass: several(z.enum(methodClasses)),
  provenance: several(z.enum(provenances)),
  scope: several(z.enum(scopes)),
  sampleType: several(z.enum(sampleTypes)),
  source: several(word),
  yearFrom: year,
  yearTo: year,
  valueMin: real,
  valueMax: real,
  /** A temperature the valid range must hold [K]. */
  validAt: z.preprocess((value) => (value === '' ? undefined : value), z.coerce.number().min(1).max(5000).optional()),
});
export type EntryFilter = z.infer<typeof entryFilter>;

export const entrySearch = entryFilter.extend({
  T: z.preprocess((value) => (value === '' ? undefined : value), z.coerce.number().min(1).max(5000).optional()),
  sort: z.enum(sortKeys).default('step'),
  counts: z.stringbool().default(false),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(2000).optional(),
});
export type EntrySearch = z.infer<typeof entrySearch>;

/** How many accepted entries each value of a filter would find, given all the other filters. */
export const valueCount = z.object({ value: z.string(), label: z.string(), count: z.int() });
export const filterCounts = z.object({
  kind: z.array(valueCount), metal: z.array(valueCount), step: z.array(valueCount), stepClass: z.array(valueCount),
  method: z.array(valueCount), methodClass: z.array(valueCount), facet: z.array(valueCount), site: z.array(valueCount),
  scope: z.array(valueCount), provenance: z.array(valueCount), energyType: z.array(valueCount), sampleType: z.array(valueCount),
});
export type FilterCounts = z.infer<typeof filterCounts>;

export const searchEntries = endpoint({
  method: 'GET', path: '/entries', access: 'visitor', summary: 'Search accepted entries', query: entrySearch,
  response: z.object({
    items: z.array(entry), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable(),
    /** All accepted entries, whatever the filters. */
    all: z.int(),
    counts: filterCounts.nullable(),
    /** When nothing is found: each filter in force with the number that would be found without it. */
    emptiedBy: z.array(z.object({ filter: z.string(), totalWithout: z.int() })).nullable(),
    /** With `validAt`: measured entries left out because their source states no range. */
    withoutStatedRange: z.int().nullable(),
  }),
});

/** Figures over the whole of what a search finds, and every value for the strip (or a histogram above 400). */
export const searchSummary = z.object({
  sources: z.int(), measured: z.int(), computed: z.int(),
  /** Over the energies with a value (bounds and ranges left out) [kJ/mol]; null when there is none. */
  energy: z.object({ count: z.int(), median: z.number(), low: z.number(), high: z.number() }).nullable(),
  /** Whether the energies are all of one elementary step and direction, one scope and one energy type; when not, a median would mix unlike quantities. */
  alike: z.boolean(),
  points: z.array(z.object({
    accession: z.string(), value: z.number(), bound: z.enum(['=', '≈', '<', '≤', '>', '≥', 'range']), computed: z.boolean(), label: z.string(),
  })).nullable(),
  histogram: z.object({ edges: z.array(z.number()), counts: z.array(z.int()) }).nullable(),
});
export type SearchSummary = z.infer<typeof searchSummary>;
export const summariseEntries = endpoint({
  method: 'GET', path: '/entries/summary', access: 'visitor', summary: 'Figures over everything a search finds', query: entryFilter, response: searchSummary,
});

/** How many chosen entries one address can name. */
export const mostChosen = 500;

export const exportFormats = ['zip', 'csv', 'bib'] as const;
export const exportEntries = endpoint({
  method: 'GET', path: '/entries/export', access: 'visitor', summary: 'The filtered set as a file, streamed',
  query: entryFilter.extend({
    format: z.enum(exportFormats).default('zip'),
    T: entrySearch.shape.T,
    /** Only these entries (the chosen rows), by accession. */
    accession: several(z.string().max(20), mostChosen),
  }),
});

/**
 * Prints a search as the address of the Search screen: defaults and empty filters left out, names in a fixed order.
 * `readSearch(printSearch(x))` gives `x` back.
 */
export function printSearch(search: Partial<EntrySearch>): URLSearchParams {
  const params = new URLSearchParams();
  for (const name of Object.keys(entrySearch.shape) as (keyof EntrySearch)[]) {
    const value = search[name];
    if (value === undefined || value === null || value === false) continue;
    if (name === 'sort' && value === 'step') continue;
    if (name === 'limit' && value === 50) continue;
    if (Array.isArray(value)) for (const item of value) params.append(name, String(item));
    else if (value !== '') params.append(name, String(value));
  }
  return params;
}

/** The parameters of an address as an object: a name that comes once is text, one that repeats a list. */
export function collectParams(params: URLSearchParams): Record<string, string | string[]> {
  const collected: Record<string, string | string[]> = {};
  for (const name of new Set(params.keys())) {
    const values = params.getAll(name);
    collected[name] = values.length === 1 ? (values[0] as string) : values;
  }
  return collected;
}

/**
 * Reads a search from an address. Parts that make no sense are left out and named, so that a mangled link still opens.
 */
export function readSearch(params: URLSearchParams): { search: EntrySearch; ignored: { name: string; message: string }[] } {
  const raw = collectParams(params);
  const ignored: { name: string; message: string }[] = [];
  for (let round = 0; round < 2; round += 1) {
    const parsed = entrySearch.safeParse(raw);
    if (parsed.success) return { search: parsed.data, ignored };
    for (const issue of parsed.error.issues) {
      const name = String(issue.path[0]);
      if (name in raw) ignored.push({ name, message: issue.message });
      delete raw[name];
    }
  }
  return { search: entrySearch.parse({}), ignored };
}
