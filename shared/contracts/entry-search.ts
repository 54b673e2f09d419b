import * as z from 'zod';
import { energyTypes, kinds, methodClasses, provenances, sampleTypes, scopes, siteTypes } from '../domain/kinds.ts';
import { states } from '../domain/states.ts';
import { endpoint } from './endpoint.ts';
import { entry } from './entries.ts';
import { filterCounts, groupHead, match, nearMiss, searchNote, valueCount } from './entry-search-answers.ts';

export type { FilterCounts, GroupHead, Match, NearMiss, SearchNote } from './entry-search-answers.ts';

/**
 * Columns a search can be sorted by; a leading minus turns the order round. What has no value comes last either way, ties fall back to the
 * accession. `k` and `preExponential` are ordered within one unit, unit after unit.
 */
export const sortKeys = [
  'energy', '-energy', 'preExponential', '-preExponential', 'k', '-k', 'uncertainty', '-uncertainty', 'year', '-year', 'metal', '-metal',
  'surface', '-surface', 'step', '-step', 'source', '-source', 'method', '-method', 'validFrom', '-validFrom', 'validTo', '-validTo',
  'accepted', '-accepted', 'scope', '-scope', 'provenance', '-provenance', 'energyType', '-energyType', 'accession', '-accession',
] as const;
export type SortKey = (typeof sortKeys)[number];

/** What rows can be gathered by. */
export const groupings = ['step', 'surface', 'source'] as const;
export type GroupBy = (typeof groupings)[number];

/** A name that may be repeated in the address: one value or several, always read as a list. */
const several = <T extends z.ZodType>(item: T, most = 50) =>
  z.preprocess((value) => (value === undefined || value === '' ? undefined : Array.isArray(value) ? value : [value]), z.array(item).max(most).optional());

/** Takes out what cannot be seen: zero-width and direction marks; control characters become spaces. */
const visible = (text: unknown): unknown => (typeof text === 'string' ? text.replace(/\p{Cf}/gu, '').replace(/\p{Cc}/gu, ' ').trim() : text);
const textOf = (most: number, least = 0) => z.preprocess(visible, z.string().min(least).max(most));
const word = textOf(200, 1);
const year = z.coerce.number().int().min(1800).max(2200).optional();
const real = z.preprocess((value) => (value === '' ? undefined : value), z.coerce.number().optional());
const temperature = z.preprocess((value) => (value === '' ? undefined : value), z.coerce.number().min(1).max(5000).optional());
/** Whether a bond between heavy atoms breaks by itself or with hydrogen. */
export const cleavages = ['direct', 'hydrogen-assisted'] as const;

/** What a search asks: a repeated name is OR, different names are AND. */
export const entryFilter = z.object({
  /** Words looked for in title, authors, container, method, note, step and surface. */
  q: textOf(400).optional(),
  kind: several(z.enum(kinds)),
  energyType: several(z.enum(energyTypes)),
  /** A pure metal by its symbol. */
  metal: several(word),
  /** An element the material contains: pure metals and alloys. */
  contains: several(word),
  facet: several(word),
  site: several(z.enum(siteTypes)),
  /** The exact formula of an alloy or pure metal. */
  formula: several(word),
  /** A support by its vocabulary code or a synonym. */
  support: several(word),
  /** A promoter by symbol or name; `none` for clean surfaces, `any` for promoted ones. */
  promoter: several(word),
  /** Key or equation of an elementary step (both directions are found), or words that name a class of step and species. */
  step: several(textOf(500, 1)),
  stepClass: several(word),
  /** Formula of a species in the equation, in the gas or adsorbed; isotopes are ignored. */
  species: several(word),
  bond: several(word),
  cleavage: several(z.enum(cleavages)),
  /** Technique by its vocabulary code, or `measured` or `computed`. */
  method: several(word),
  methodClass: several(z.enum(methodClasses)),
  /** Family of techniques, by its vocabulary name. */
  methodFamily: several(word),
  provenance: several(z.enum(provenances)),
  scope: several(z.enum(scopes)),
  sampleType: several(z.enum(sampleTypes)),
  /** A source by DOI or id. */
  source: several(word),
  /** Family name of an author of the source; accents and case are ignored. */
  author: several(word),
  /** Public name of the contributor; accents and case are ignored. */
  contributor: several(word),
  /** Whether the standard uncertainty of the entry's own quantity is known. */
  hasUncertainty: z.preprocess((value) => (value === '' ? undefined : typeof value === 'boolean' ? String(value) : value), z.stringbool().optional()),
  yearFrom: year,
  yearTo: year,
  valueMin: real,
  valueMax: real,
  /** A temperature the valid range must hold [K]. */
  validAt: temperature,
  /** Both ends of a range of temperatures that the valid range must hold as a whole [K]; one end alone is a single temperature. */
  validFrom: temperature,
  validTo: temperature,
  /** States of the revision: `accepted` for everybody; their own for contributors; all for reviewers. Without it, accepted ones only. */
  state: several(z.enum(states)),
  /** One of your own collections, by its id. */
  collection: several(word, 5),
});
export type EntryFilter = z.infer<typeof entryFilter>;

export const entrySearch = entryFilter.extend({
  T: temperature,
  sort: z.enum(sortKeys).default('step'),
  /** Gathers the rows: groups come whole, the sort holds within each, and the answer has the heads of the groups on the page. */
  groupBy: z.enum(groupings).optional(),
  counts: z.stringbool().default(false),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(2000).optional(),
});
export type EntrySearch = z.infer<typeof entrySearch>;

/** An entry found, with where the words of the search stand in it. */
export const foundEntry = entry.extend({ matches: z.array(match).optional() });
export type FoundEntry = z.infer<typeof foundEntry>;

/** Counts for every filter chosen from a list; the later ones are in every answer of this version, too. */
export const allFilterCounts = filterCounts.extend({
  species: z.array(valueCount).optional(), contains: z.array(valueCount).optional(), bond: z.array(valueCount).optional(), cleavage: z.array(valueCount).optional(),
  formula: z.array(valueCount).optional(), support: z.array(valueCount).optional(), promoter: z.array(valueCount).optional(), methodFamily: z.array(valueCount).optional(),
  source: z.array(valueCount).optional(), hasUncertainty: z.array(valueCount).optional(),
  /** Only for those who may see more than accepted entries. */
  state: z.array(valueCount).optional(),
});
export type AllFilterCounts = z.infer<typeof allFilterCounts>;

export const searchEntries = endpoint({
  method: 'GET', path: '/entries', access: 'visitor', summary: 'Search accepted entries', query: entrySearch,
  response: z.object({
    items: z.array(foundEntry), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable(),
    /** All accepted entries, whatever the filters. */
    all: z.int(),
    counts: allFilterCounts.nullable(),
    /** When nothing is found: each filter in force with the number that would be found without it. */
    emptiedBy: z.array(z.object({ filter: z.string(), totalWithout: z.int() })).nullable(),
    /** When nothing is found: what lies near, each with the change of filters that finds it. */
    nearMisses: z.array(nearMiss).nullish(),
    /** With `validAt`, `validFrom` or `validTo`: measured entries left out because their source states no range. */
    withoutStatedRange: z.int().nullable(),
    /** The words that were looked for instead of `q`, when `q` as typed names nothing in the store and a near spelling does. */
    showingResultsFor: z.string().nullish(),
    /** What could not be read, or was read in another way than typed. */
    notes: z.array(searchNote).optional(),
    /** With `groupBy`: the heads of the groups that this page's items belong to. */
    groups: z.array(groupHead).nullish(),
    /** The states of the rows that were searched. */
    states: z.array(z.enum(states)).optional(),
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

export const groupEntries = endpoint({
  method: 'GET', path: '/entries/groups', access: 'visitor', summary: 'The groups that everything a search finds falls into, the largest first',
  query: entryFilter.extend({
    groupBy: z.enum(groupings).default('step'), limit: z.coerce.number().int().min(1).max(200).default(50), cursor: z.string().max(2000).optional(),
  }),
  response: z.object({ items: z.array(groupHead), total: z.int(), totalIsExact: z.boolean(), nextCursor: z.string().nullable() }),
});

/** How many chosen entries one address can name. */
export const mostChosen = 500;

export const exportFormats = ['zip', 'csv', 'bib'] as const;
export const exportEntries = endpoint({
  method: 'GET', path: '/entries/export', access: 'visitor', summary: 'The filtered set as a file, streamed',
  query: entryFilter.extend({
    format: z.enum(exportFormats).default('zip'),
    T: entrySearch.shape.T,
    /** Exports hold accepted entries only, so that no other state can be asked for. */
    state: several(z.enum(['accepted'])),
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
    if (value === undefined || value === null || (value === false && name === 'counts')) continue;
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
