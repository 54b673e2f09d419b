import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { entryFilter, printSearch, readSearch, type EntryFilter, type EntrySearch, type SortKey } from '#shared/contracts/entry-search.ts';

/** How the rows are gathered; a matter of the page alone, kept in the address beside the search. */
export const groupings = ['step', 'surface', 'source', 'none'] as const;
export type Grouping = (typeof groupings)[number];
const usualGrouping: Grouping = 'step';

export type FilterName = keyof EntryFilter;

export interface EntrySearchState {
  filter: EntryFilter;
  sort: SortKey;
  grouping: Grouping;
  /** Parts of the address that made no sense and were left out. */
  ignored: readonly { name: string; message: string }[];
  /** Changes some filters; `undefined` takes one away. Typing replaces the address, choosing adds to its history. */
  changeFilter: (change: Partial<EntryFilter>, replace?: boolean) => void;
  clearFilter: () => void;
  changeSort: (sort: SortKey) => void;
  changeGrouping: (grouping: Grouping) => void;
}

const filterNames = Object.keys(entryFilter.shape) as FilterName[];

/** The filters of a search alone: what is asked, without how it is shown. */
export function filterOf(search: EntrySearch): EntryFilter {
  return Object.fromEntries(filterNames.filter((name) => isSet(search[name])).map((name) => [name, search[name]])) as EntryFilter;
}

/** Whether a filter asks for anything. */
export function isSet(value: EntryFilter[FilterName]): boolean {
  return value !== undefined && value !== '' && !(Array.isArray(value) && value.length === 0);
}

/** The names of the filters in force. */
export function filtersInForce(filter: EntryFilter): FilterName[] {
  return filterNames.filter((name) => isSet(filter[name]));
}

/** Names of the address that are no part of the search and must survive its changes. */
const besides = ['unit', 'group'] as const;

function nextParams(before: URLSearchParams, change: (search: EntrySearch) => Partial<EntrySearch>, group?: Grouping): URLSearchParams {
  const { search } = readSearch(before);
  const { cursor: _cursor, limit: _limit, counts: _counts, ...asked } = search;
  const next = printSearch(change(asked as EntrySearch));
  for (const name of besides) {
    const value = before.get(name);
    if (value) next.set(name, value);
  }
  if (group === usualGrouping) next.delete('group');
  else if (group) next.set('group', group);
  return next;
}

/** The search the address asks, and the one way to change it. */
export function useEntrySearchState(): EntrySearchState {
  const [params, setParams] = useSearchParams();
  const address = params.toString();
  const read = useMemo(() => {
    const { search, ignored } = readSearch(new URLSearchParams(address));
    return { filter: filterOf(search), sort: search.sort, ignored };
  }, [address]);

  const changeFilter = useCallback((change: Partial<EntryFilter>, replace = false) => {
    setParams((before) => nextParams(before, (search) => ({ ...search, ...change })), { replace, preventScrollReset: true });
  }, [setParams]);
  const clearFilter = useCallback(() => {
    setParams((before) => nextParams(before, ({ sort, T }) => ({ sort, T })), { preventScrollReset: true });
  }, [setParams]);
  const changeSort = useCallback((sort: SortKey) => {
    setParams((before) => nextParams(before, (search) => ({ ...search, sort })), { preventScrollReset: true });
  }, [setParams]);
  const changeGrouping = useCallback((grouping: Grouping) => {
    setParams((before) => nextParams(before, (search) => ({ ...search, sort: sortFor(grouping, search.sort) }), grouping), { preventScrollReset: true });
  }, [setParams]);

  const grouping = groupings.find((one) => one === params.get('group')) ?? usualGrouping;
  return { ...read, grouping, changeFilter, clearFilter, changeSort, changeGrouping };
}

/** The order in which groups come whole. */
export const groupSorts: Readonly<Record<Grouping, SortKey>> = { step: 'step', surface: 'metal', source: 'source', none: 'step' };

/** Groups come whole when the rows are sorted by what they are grouped by; a sort the reader chose by a figure stays. */
function sortFor(grouping: Grouping, sort: SortKey): SortKey {
  const byGroup = Object.values(groupSorts).includes(sort);
  return byGroup ? groupSorts[grouping] : sort;
}
