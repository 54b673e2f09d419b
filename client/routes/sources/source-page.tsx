import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { printSearch, type SortKey } from '#shared/contracts/entry-search.ts';
import type { SourceDetail } from '#shared/contracts/sources.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Facts } from '#client/ui/facts.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { ErrorState, LoadingState } from '#client/ui/states.tsx';
import { entrySearchOptions } from '#client/features/entries/api.ts';
import type { ColumnName } from '#client/features/entries/columns.ts';
import { ChosenTray } from '#client/features/entries/components/chosen-tray.tsx';
import { useHiddenColumns } from '#client/features/entries/components/result-controls.tsx';
import { ResultTable } from '#client/features/entries/components/result-table.tsx';
import { sourceOptions } from '#client/features/sources/api.ts';
import { CitationCard } from '#client/features/sources/components/citation-card.tsx';
import { SourceNotice, SourceStatus } from '#client/features/sources/components/source-status.tsx';
import { Collect } from '#client/routes/collections/collect.tsx';

/** One source: how to cite it, its notice, and the accepted entries taken from it. */
export function Component() {
  const { id = '' } = useParams();
  const { data: source, error, refetch } = useQuery(sourceOptions(id));
  if (!source) {
    return (
      <>
        <h1 className="sr-only">Source</h1>
        {error ? <ErrorState error={error} onRetry={() => void refetch()} /> : <LoadingState what="the source" />}
      </>
    );
  }
  return (
    <>
      <PageHead
        title={source.title}
        trail={[{ label: 'Sources', to: '/sources' }, { label: source.label }]}
        aside={<><SourceStatus status={source.status} /><span>{`${source.acceptedEntries} accepted ${source.acceptedEntries === 1 ? 'entry' : 'entries'}`}</span></>}
      />
      <SourceNotice source={source} />
      <div className="grid gap-x-10 gap-y-8 pb-9 wide:grid-cols-2">
        <CitationCard source={source} />
        <section>
          <h2 className="pb-2">The publication</h2>
          <Facts
            facts={[
              { name: 'Authors', value: source.authors },
              { name: 'Published in', value: source.container },
              { name: 'Year', value: source.year },
              { name: 'DOI', value: source.doi && <a href={`https://doi.org/${encodeURI(source.doi)}`} rel="noreferrer">{source.doi}</a> },
              { name: 'Record', value: !source.doi ? 'typed: it has no DOI' : source.confirmed ? 'confirmed by the DOI service' : 'not confirmed by the DOI service yet' },
            ]}
          />
        </section>
      </div>
      <EntriesOf source={source} />
      <ChosenTray>{(accessions) => <Collect accessions={accessions} />}</ChosenTray>
    </>
  );
}

function EntriesOf({ source }: { source: SourceDetail }) {
  const { temperatureK } = useInstrument();
  const usually = useHiddenColumns();
  // Every row has this source: it is named above.
  const hidden = useMemo(() => new Set<ColumnName>([...usually, 'source']), [usually]);
  const [sort, setSort] = useState<SortKey>('step');
  const [activeId, setActiveId] = useState<string | null>(null);
  const filter = useMemo(() => ({ source: [source.doi ?? source.id] }), [source]);
  const search = useInfiniteQuery(entrySearchOptions(filter, sort, 'step', temperatureK));
  const entries = useMemo(() => search.data?.pages.flatMap((page) => page.items) ?? [], [search.data]);
  const heads = useMemo(() => search.data?.pages.flatMap((page) => page.groups ?? []) ?? [], [search.data]);
  const page = search.data?.pages[0];
  return (
    <section>
      <div className="section-line flex flex-wrap items-baseline justify-between gap-x-6">
        <h2>Accepted entries from this source</h2>
        {page && page.total > 0 && <Link to={`/search?${printSearch(filter)}`}>Search among them</Link>}
      </div>
      {search.isError && !page ? <ErrorState error={search.error} onRetry={() => void search.refetch()} />
        : !page ? <LoadingState what="its entries" />
          : page.total === 0 ? <p className="py-4 text-second">{source.status === 'retracted' ? 'None: the source is retracted.' : 'None has been accepted yet.'}</p>
            : (
              <>
                <ResultTable
                  entries={entries} heads={heads} searchedWords={false} dense={false} kinds={undefined} grouping="step" sort={sort} hidden={hidden} activeId={activeId}
                  stale={search.isPlaceholderData} onActive={setActiveId} onSort={setSort}
                />
                <LoadMore shown={entries.length} total={page.total} totalIsExact={page.totalIsExact} hasMore={search.hasNextPage} busy={search.isFetchingNextPage} onMore={() => void search.fetchNextPage()} />
              </>
            )}
    </section>
  );
}
