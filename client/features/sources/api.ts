import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { QueryOf } from '#shared/contracts/endpoint.ts';
import { getSource, listSources } from '#shared/contracts/sources.ts';
import { call } from '#client/lib/api-client.ts';

export type SourceSort = QueryOf<typeof listSources>['sort'];

/** The pages of the bibliography. */
export const sourcesOptions = (q: string, sort: SourceSort) => infiniteQueryOptions({
  queryKey: ['sources', 'list', q, sort],
  queryFn: ({ signal, pageParam }) => call(listSources, { query: { ...(q ? { q } : {}), sort, limit: 50, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
  initialPageParam: '',
  getNextPageParam: (page) => page.nextCursor,
  placeholderData: keepPreviousData,
});

/** One source with its citation. */
export const sourceOptions = (id: string) => queryOptions({
  queryKey: ['sources', 'one', id],
  queryFn: ({ signal }) => call(getSource, { params: { id }, signal }),
});
