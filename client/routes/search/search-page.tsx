import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useEffect, useMemo, useState } from 'react';
import { useChoosePreferences } from '#client/app/preferences.ts';
import { announce } from '#client/lib/announce.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { useTitle } from '#client/lib/use-title.ts';
import { Notice } from '#client/ui/notice.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { entrySearchOptions, filterCountsOptions, summaryOptions, vocabularyOptions } from '#client/features/entries/api.ts';
import { useChosen } from '#client/features/entries/chosen.ts';
import { statedRangeWords } from '#client/features/entries/filter-words.ts';
import { useEntrySearchState } from '#client/features/entries/search-state.ts';
import { ChosenTray } from '#client/features/entries/components/chosen-tray.tsx';
import { QuerySentence } from '#client/features/entries/components/query-sentence.tsx';
import { ColumnChoice, ExportChoice, GroupChoice, SortChoice, useDensity, useHiddenColumns } from '#client/features/entries/components/result-controls.tsx';
import { ResultStrip } from '#client/features/entries/components/result-strip.tsx';
import { ResultTable } from '#client/features/entries/components/result-table.tsx';
import { SearchBox } from '#client/features/entries/components/search-box.tsx';
import { SearchNotes, SpellingLine } from '#client/features/entries/components/search-notes.tsx';
import { SummaryLine } from '#client/features/entries/components/summary-line.tsx';
import { Collect } from '#client/routes/collections/collect.tsx';
import { useOwnCollections } from './own-collections.ts';

/** Loaded only for a question that finds nothing. */
const ZeroResults = lazy(async () => ({ default: (await import('#client/features/entries/components/zero-results.tsx')).ZeroResults }));

/** The search: a question as a sentence, and the entries that answer it. */
export function Component() {
  useTitle('Search');
  const { filter, sort, grouping, ignored, changeFilter, clearFilter, changeSort, changeGrouping } = useEntrySearchState();
  const { temperatureK, unit } = useInstrument();
  const hidden = useHiddenColumns();
  const choose = useChoosePreferences();
  const [activeId, setActiveId] = useState<string | null>(null);
  const density = useDensity();
  const chosen = useChosen();
  const collections = useOwnCollections();
  const search = useInfiniteQuery(entrySearchOptions(filter, sort, grouping, temperatureK));
  const { data: counts } = useQuery(filterCountsOptions(filter));
  const { data: summary } = useQuery(summaryOptions(filter));
  const { data: vocabulary } = useQuery(vocabularyOptions);

  const entries = useMemo(() => search.data?.pages.flatMap((page) => page.items) ?? [], [search.data]);
  const heads = useMemo(() => search.data?.pages.flatMap((page) => page.groups ?? []) ?? [], [search.data]);
  const accessions = useMemo(() => new Set(chosen.keys()), [chosen]);
  const page = search.data?.pages[0];
  const stale = search.isPlaceholderData;
  const found = page && !stale ? page.total : null;
  useEffect(() => {
    if (found !== null) announce(found === 0 ? 'No entries found.' : `${found} ${found === 1 ? 'entry' : 'entries'} found.`);
  }, [found, filter]);

  return (
    <>
      <h1 className="sr-only" tabIndex={-1}>Search</h1>
      <QuerySentence filter={filter} counts={counts} vocabulary={vocabulary} collections={collections} onChange={changeFilter} />
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 pt-4 pb-5">
        <SearchBox
          label="Also containing" placeholder="also containing: step edge, potassium, author …" maxLength={400}
          value={filter.q ?? ''} onChange={(q) => changeFilter({ q: q || undefined }, true)}
        />
        {page && <p className="text-second">{filter.state ? 'Entries that are not accepted are marked; they are not public.' : `${page.total} of ${page.all} entries · filters live in the address bar`}</p>}
        {(stale || (search.isFetching && !search.isFetchingNextPage && page)) && <p className="text-second" role="status">Searching</p>}
      </div>
      <SearchNotes ignored={ignored} notes={page?.notes ?? []} />
      {page?.showingResultsFor && filter.q && <SpellingLine typed={filter.q} shown={page.showingResultsFor} onTake={(q) => changeFilter({ q })} />}
      {search.isError && !page ? <ErrorState error={search.error} onRetry={() => void search.refetch()} />
        : !page ? <LoadingState what="entries" rows={10} />
          : page.total === 0 ? (
            <div className="section-line">
              <Suspense fallback={<LoadingState what="what lies near" rows={3} />}>
                <ZeroResults
                  filter={filter} emptiedBy={page.emptiedBy} nearMisses={page.nearMisses ?? []} withoutStatedRange={page.withoutStatedRange} unit={unit} vocabulary={vocabulary}
                  onChange={changeFilter} onClear={clearFilter}
                />
              </Suspense>
            </div>
          ) : (
            <>
              {search.isError && <Notice kind="refusal" live className="mb-5" title="The search did not succeed.">{`${search.error.message} The rows below are those found before.`}</Notice>}
              <SummaryLine total={page.total} totalIsExact={page.totalIsExact} summary={summary} unit={unit}>
                <GroupChoice grouping={grouping} onChange={changeGrouping} />
                <SortChoice sort={sort} onChange={changeSort} />
                <ColumnChoice hidden={hidden} density={density} onChange={choose} />
                <ExportChoice filter={filter} total={page.total} temperatureK={temperatureK} />
              </SummaryLine>
              {page.withoutStatedRange !== null && page.withoutStatedRange > 0 && (
                <p className="pt-1 text-second">{statedRangeWords(page.withoutStatedRange, filter.validAt)}</p>
              )}
              {summary && (
                <ResultStrip summary={summary} filter={filter} unit={unit} activeId={activeId} chosen={accessions} onActive={setActiveId} onFilter={changeFilter} />
              )}
              <ResultTable
                entries={entries} heads={heads} searchedWords={filter.q !== undefined} kinds={filter.kind} grouping={grouping} sort={sort} hidden={hidden}
                dense={density === 'dense'} activeId={activeId} stale={stale}
                onActive={setActiveId} onSort={changeSort}
              />
              <LoadMore
                shown={entries.length} total={page.total} totalIsExact={page.totalIsExact} hasMore={search.hasNextPage}
                busy={search.isFetchingNextPage} onMore={() => void search.fetchNextPage()}
              />
            </>
          )}
      <ChosenTray>{(accessions) => <Collect accessions={accessions} />}</ChosenTray>
    </>
  );
}
