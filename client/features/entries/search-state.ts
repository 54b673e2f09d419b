import { useCallback, useEffect, useMemo, useRef } from 'react';
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

/**
 * The address's parameters and a setter that builds on the newest ones. The router shows a new address when it has time to (a transition),
 * and its own setter builds on what is shown: a second change made before that would undo the first.
 */
function useNewestParams(): [string, (make: (before: URLSearchParams) => URLSearchParams, replace?: boolean) => void] {
  const [params, setParams] = useSearchParams();
  const shown = params.toString();
  const newest = useRef(shown);
  /** Addresses that were set and are not shown yet. */
  const underway = useRef<string[]>([]);
  useEffect(() => {
    const at = underway.current.indexOf(shown);
    if (at >= 0) {
      underway.current.splice(0, at + 1);
    } else {
      underway.current = [];
      newest.current = shown;
    }
  }, [shown]);
  const change = useCallback((make: (before: URLSearchParams) => URLSearchParams, replace = false) => {
    const next = make(new URLSearchParams(newest.current));
    const address = next.toString();
    if (address === newest.current) return;
    newest.current = address;
    underway.current.push(address);
    setParams(next, { replace, preventScrollReset: true });
  }, [setParams]);
  return [shown, change];
}

/** The search the address asks, and the one way to change it. */
export function useEntrySearchState(): EntrySearchState {
  const [address, change] = useNewestParams();
  const read = useMemo(() => {
    const params = new URLSearchParams(address);
    const { search, ignored } = readSearch(params);
    const grouping = groupings.find((one) => one === params.get('group')) ?? usualGrouping;
    return { filter: filterOf(search), sort: search.sort, grouping, ignored };
  }, [address]);

  const changeFilter = useCallback((filters: Partial<EntryFilter>, replace = false) => {
    change((before) => nextParams(before, (search) => ({ ...search, ...filters })), replace);
  }, [change]);
  const clearFilter = useCallback(() => {
    change((before) => nextParams(before, ({ sort, T }) => ({ sort, T })));
  }, [change]);
  const changeSort = useCallback((sort: SortKey) => {
    change((before) => nextParams(before, (search) => ({ ...search, sort })));
  }, [change]);
  const changeGrouping = useCallback((grouping: Grouping) => {
    change((before) => nextParams(before, (search) => ({ ...search, sort: sortFor(grouping, search.sort) }), grouping));
  }, [change]);
  return { ...read, changeFilter, clearFilter, changeSort, changeGrouping };
}

/** The order in which groups come whole. */
export const groupSorts: Readonly<Record<Grouping, SortKey>> = { step: 'step', surface: 'metal', source: 'source', none: 'step' };

/** Groups come whole when the rows are sorted by what they are grouped by; a sort the reader chose by a figure stays. */
function sortFor(grouping: Grouping, sort: SortKey): SortKey {
  const byGroup = Object.values(groupSorts).includes(sort);
  return byGroup ? groupSorts[grouping] : sort;
}
