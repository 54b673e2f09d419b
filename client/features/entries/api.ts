import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import { getEntry, getEntryVersion } from '#shared/contracts/entries.ts';
import {
  exportEntries, searchEntries, summariseEntries, type EntryFilter, type EntrySearch, type exportFormats,
} from '#shared/contracts/entry-search.ts';
import { getVocabulary } from '#shared/contracts/vocabulary.ts';
import type { ResponseOf } from '#shared/contracts/endpoint.ts';
import { addressOf, call } from '#client/lib/api-client.ts';
import type { Grouping } from './search-state.ts';

export type SearchPage = ResponseOf<typeof searchEntries>;
export type ExportFormat = (typeof exportFormats)[number];

/** Rows fetched at a time. */
export const pageSize = 50;

/** The pages of a search, first to last fetched; the rows before stay in sight while others are on their way. */
export const entrySearchOptions = (filter: EntryFilter, sort: EntrySearch['sort'], grouping: Grouping, temperatureK: number) => infiniteQueryOptions({
  queryKey: ['entries', 'search', filter, sort, grouping, temperatureK],
  queryFn: ({ signal, pageParam }) => call(searchEntries, {
    query: { ...filter, sort, ...(grouping === 'none' ? {} : { groupBy: grouping }), T: temperatureK, limit: pageSize, ...(pageParam ? { cursor: pageParam } : {}) }, signal,
  }),
  initialPageParam: '',
  getNextPageParam: (page) => page.nextCursor,
  placeholderData: keepPreviousData,
});

/** How many entries each value of each filter would find; apart from the rows, since sorting does not change it. */
export const filterCountsOptions = (filter: EntryFilter) => queryOptions({
  queryKey: ['entries', 'counts', filter],
  queryFn: ({ signal }) => call(searchEntries, { query: { ...filter, counts: 'true', limit: 1 }, signal }),
  select: (page) => page.counts,
  placeholderData: keepPreviousData,
});

/** Figures over everything a search finds. */
export const summaryOptions = (filter: EntryFilter) => queryOptions({
  queryKey: ['entries', 'summary', filter],
  queryFn: ({ signal }) => call(summariseEntries, { query: filter, signal }),
  placeholderData: keepPreviousData,
});

/** The words of the vocabulary; they change seldom. */
export const vocabularyOptions = queryOptions({
  queryKey: ['vocabulary'],
  queryFn: ({ signal }) => call(getVocabulary, { signal }),
  staleTime: 600_000,
});

/** One entry: its newest public version (or open revision), or the version asked for. */
export const entryOptions = (accession: string, version: number | null, temperatureK: number) => queryOptions({
  queryKey: ['entries', 'one', accession, version, temperatureK],
  queryFn: ({ signal }) => (version === null
    ? call(getEntry, { params: { accession }, query: { T: temperatureK }, signal })
    : call(getEntryVersion, { params: { accession, version }, query: { T: temperatureK }, signal })),
  // A new temperature of interest keeps the page in sight; another entry does not show the one before.
  placeholderData: (before) => (before?.accession === accession && (version === null || before.version === version) ? before : undefined),
});

/** The address of an export: of everything a search finds, or of the entries named. */
export function exportAddress(format: ExportFormat, temperatureK: number, what: EntryFilter | { accession: readonly string[] }): string {
  // Exports hold accepted entries only, so that no other state can be asked for.
  return addressOf(exportEntries, { query: { ...what, state: undefined, T: temperatureK, format } });
}

/** Whether so many entries can be named in one export. */
export function canExportChosen(accessions: readonly string[]): boolean {
  return exportEntries.query?.shape.accession.safeParse(accessions).success ?? false;
}
