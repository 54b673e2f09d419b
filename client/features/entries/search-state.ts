import { useCallback, useEffect, useMemo, useRef } from 'react';
import { useSearchParams } from 'react-router-dom';
import { entryFilter, groupings as serverGroupings, printSearch, readSearch, type EntryFilter, type EntrySearch, type SortKey } from '#shared/contracts/entry-search.ts';

/** How the rows are gathered. The page gathers by step unless the address says otherwise; `none` is the page's own word. */
export const groupings = [...serverGroupings, 'none'] as const;
export type Grouping = (typeof groupings)[number];
const usualGrouping: Grouping = 'step';
/** The name in the address for the page's own way to show the rows. */
const ungrouped = 'group';

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

/** How an address gathers the rows. */
function groupingIn(params: URLSearchParams, { groupBy }: EntrySearch): Grouping {
  if (groupBy) return groupBy;
  // An older link named every grouping so.
  return groupings.find((one) => one === params.get(ungrouped)) ?? usualGrouping;
}

function nextParams(before: URLSearchParams, change: (search: EntrySearch) => Partial<EntrySearch>, group?: Grouping): URLSearchParams {
  const { search } = readSearch(before);
  const { cursor: _cursor, limit: _limit, counts: _counts, groupBy: _groupBy, ...asked } = search;
  const grouping = group ?? groupingIn(before, search);
  const next = printSearch({ ...change(asked as EntrySearch), ...(grouping === usualGrouping || grouping === 'none' ? {} : { groupBy: grouping }) });
  // The reader's unit is no part of the search and survives its changes.
  const unit = before.get('unit');
  if (unit) next.set('unit', unit);
  if (grouping === 'none') next.set(ungrouped, 'none');
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
    return { filter: filterOf(search), sort: search.sort, grouping: groupingIn(params, search), ignored };
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
    change((before) => nextParams(before, (search) => search, grouping));
  }, [change]);
  return { ...read, changeFilter, clearFilter, changeSort, changeGrouping };
}
