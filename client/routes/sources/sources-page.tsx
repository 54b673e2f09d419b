import { useInfiniteQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { EmptyState, ErrorState, LoadingState } from '#client/ui/states.tsx';
import { SearchBox } from '#client/features/entries/components/search-box.tsx';
import { sourcesOptions } from '#client/features/sources/api.ts';
import { useSourceListState } from '#client/features/sources/list-state.ts';
import { SourceTable } from '#client/features/sources/components/source-table.tsx';

/** The bibliography of the store. */
export function Component() {
  const { q, sort, changeText, changeSort } = useSourceListState();
  const list = useInfiniteQuery(sourcesOptions(q, sort));
  const page = list.data?.pages[0];
  const sources = list.data?.pages.flatMap(({ items }) => items) ?? [];
  const found = page && !list.isPlaceholderData ? page.total : null;
  useEffect(() => {
    if (found !== null) announce(`${found} ${found === 1 ? 'source' : 'sources'} found.`);
  }, [found, q]);
  return (
    <>
      <PageHead title="Sources" aside={page && `${page.total} ${page.total === 1 ? 'publication' : 'publications'}${q ? ' found' : ''}`} />
      <div className="pb-5"><SearchBox label="Find a source" placeholder="author, title, journal, DOI …" maxLength={200} value={q} onChange={changeText} /></div>
      {list.isError && !page ? <ErrorState error={list.error} onRetry={() => void list.refetch()} />
        : !page ? <LoadingState what="sources" rows={10} />
          : page.total === 0 ? (
            <EmptyState title={q ? 'No source is spelled like this' : 'The store holds no source yet'} actions={q && <Button onClick={() => changeText('')}>Show all sources</Button>}>
              <p>{q ? `Nothing was found for "${q}" among authors, titles, journals and DOIs.` : 'A source appears here with the first entry that names it.'}</p>
            </EmptyState>
          ) : (
            <>
              <SourceTable sources={sources} sort={sort} stale={list.isPlaceholderData} onSort={changeSort} />
              <LoadMore shown={sources.length} total={page.total} totalIsExact={page.totalIsExact} hasMore={list.hasNextPage} busy={list.isFetchingNextPage} onMore={() => void list.fetchNextPage()} what="sources" />
            </>
          )}
    </>
  );
}
