import { useInfiniteQuery, useMutation, useQueryClient } from '@tanstack/react-query';
import type { State } from '#shared/domain/states.ts';
import { announce } from '#client/lib/announce.ts';
import { myEntriesOptions, revise, withdraw } from './api.ts';

/** My entries in one state or all, page by page, with how many there are in each. */
export function useMyEntries(state: State | null) {
  const query = useInfiniteQuery(myEntriesOptions(state));
  const pages = query.data?.pages ?? [];
  return {
    ...query,
    items: pages.flatMap((page) => page.items),
    total: pages.at(-1)?.total ?? 0,
    totalIsExact: pages.at(-1)?.totalIsExact ?? true,
    counts: pages.at(-1)?.counts ?? {},
  };
}

/** Withdraws an open revision. */
export function useWithdraw(onDone: () => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: withdraw,
    onSuccess: ({ accession }) => {
      announce(`Entry ${accession} is withdrawn`);
      void client.invalidateQueries({ queryKey: ['my-entries'] });
      onDone();
    },
  });
}

/** Opens a new draft copied from a returned or accepted revision. */
export function useRevise(onOpened: (accession: string) => void) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ accession, reason }: { accession: string; reason: string }) => revise(accession, reason),
    onSuccess: ({ accession }) => {
      void client.invalidateQueries({ queryKey: ['my-entries'] });
      onOpened(accession);
    },
  });
}
