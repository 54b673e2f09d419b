import { useCallback } from 'react';
import { useSearchParams } from 'react-router-dom';
import { listSources } from '#shared/contracts/sources.ts';
import type { SourceSort } from './api.ts';

const usual: SourceSort = 'label';

/** Reads a sort of the bibliography; what is none is the usual one. */
export function readSourceSort(text: string | null): SourceSort {
  const parsed = listSources.query?.shape.sort.safeParse(text ?? undefined);
  return parsed?.success ? parsed.data : usual;
}

/** What is looked for in the bibliography and how it is sorted: kept in the address. */
export function useSourceListState() {
  const [params, setParams] = useSearchParams();
  const put = useCallback((name: string, value: string, replace: boolean) => {
    setParams((before) => {
      const next = new URLSearchParams(before);
      if (value) next.set(name, value);
      else next.delete(name);
      return next;
    }, { replace, preventScrollReset: true });
  }, [setParams]);
  return {
    q: (params.get('q') ?? '').slice(0, 200),
    sort: readSourceSort(params.get('sort')),
    changeText: useCallback((q: string) => put('q', q, true), [put]),
    changeSort: useCallback((sort: SourceSort) => put('sort', sort === usual ? '' : sort, false), [put]),
  };
}
