import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { printSearch, type SortKey } from '#shared/contracts/entry-search.ts';
import type { CollectionDetail } from '#shared/contracts/collections.ts';
import { stateWords } from '#shared/domain/states.ts';
import { announce } from '#client/lib/announce.ts';
import { formatDate } from '#client/lib/dates.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { useTitle } from '#client/lib/use-title.ts';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { collectionOptions, useCollectionChanges } from '#client/features/collections/api.ts';
import { DiscardCollection, RenameCollection } from '#client/features/collections/components/collection-dialogs.tsx';
import { entrySearchOptions, exportAddress } from '#client/features/entries/api.ts';
import { clearChosen, useChosen } from '#client/features/entries/chosen.ts';
import { ResultTable } from '#client/features/entries/components/result-table.tsx';
import { Button, LinkButton, TextButton } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { LoadMore } from '#client/ui/pagination.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { EmptyState, ErrorState, LoadingState } from '#client/ui/states.tsx';
import { Tray } from '#client/ui/tray.tsx';

/** One of the reader's collections: its entries as a table, to be taken out, exported, or asked further as a search. */
export function Component() {
  return <RequireRole role="reader" title="Collection">{() => <CollectionPage />}</RequireRole>;
}

function CollectionPage() {
  const { id = '' } = useParams();
  const { data: collection, error, refetch } = useQuery(collectionOptions(id));
  useTitle(collection?.name ?? 'Collection');
  if (!collection) {
    return (
      <>
        <h1 className="sr-only">Collection</h1>
        {error ? <ErrorState error={error} onRetry={() => void refetch()} /> : <LoadingState what="the collection" rows={8} />}
      </>
    );
  }
  return <Collection key={collection.id} collection={collection} />;
}

function Collection({ collection }: { collection: CollectionDetail }) {
  const { temperatureK } = useInstrument();
  const navigate = useNavigate();
  const { id, name, description, entries, changedAt, items } = collection;
  const gone = items.filter(({ state }) => state !== 'accepted');
  return (
    <>
      <PageHead title={name} trail={[{ label: 'Collections', to: '/collections' }]} aside={`${entries} ${entries === 1 ? 'entry' : 'entries'} · changed ${formatDate(changedAt)} · only you see this list`} />
      {description && <p className="max-w-[76ch] pb-4">{description}</p>}
      <div className="flex flex-wrap gap-3 pb-6 no-print">
        {entries > 0 && <LinkButton to={`/search?${printSearch({ collection: [id] })}`}>Open as a search</LinkButton>}
        {entries > 0 && <a className="button" href={exportAddress('zip', temperatureK, { collection: [id] })} download>Export CSV + BibTeX</a>}
        <RenameCollection collection={collection} />
        <DiscardCollection collection={collection} onDiscarded={() => void navigate('/collections', { state: { discarded: { id, name } } })} />
      </div>
      {gone.length > 0 && (
        <Notice kind="doubt" title={gone.length === 1 ? 'One entry of this collection is no longer searched or exported:' : `${gone.length} entries of this collection are no longer searched or exported:`} className="mb-5">
          {gone.map(({ accession, state }, i) => <span key={accession}>{i > 0 && ', '}<Link to={`/entries/${accession}`}>{accession}</Link> ({stateWords[state]})</span>)}.
        </Notice>
      )}
      {entries === 0 ? (
        <EmptyState title="Nothing is collected yet" actions={<LinkButton to="/search">Go to the search</LinkButton>}>
          <p>Choose rows in the search, or open an entry, and add them to this collection.</p>
        </EmptyState>
      ) : <CollectedEntries collection={collection} />}
    </>
  );
}

function CollectedEntries({ collection }: { collection: CollectionDetail }) {
  const { id, name, items } = collection;
  const { temperatureK } = useInstrument();
  const [sort, setSort] = useState<SortKey>('step');
  const [activeId, setActiveId] = useState<string | null>(null);
  const [taken, setTaken] = useState<readonly string[]>([]);
  const chosen = useChosen();
  const { add, remove } = useCollectionChanges();
  const search = useInfiniteQuery(entrySearchOptions({ collection: [id] }, sort, 'step', temperatureK));
  const page = search.data?.pages[0];
  const shown = search.data?.pages.flatMap(({ items }) => items) ?? [];
  const heads = search.data?.pages.flatMap(({ groups }) => groups ?? []) ?? [];
  const held = useMemo(() => new Set(items.map(({ accession }) => accession)), [items]);
  // Rows chosen elsewhere stay chosen there; here only those of this collection count.
  const accessions = [...chosen.keys()].filter((accession) => held.has(accession));

  function takeOut() {
    remove.mutate({ id, accessions }, {
      onSuccess: () => {
        setTaken(accessions);
        clearChosen();
        announce(`${accessions.length} taken out of ${name}.`);
      },
    });
  }

  return (
    <>
      {taken.length > 0 && (
        <Notice kind="result" live title={`${taken.length} ${taken.length === 1 ? 'entry' : 'entries'} taken out.`} className="mb-4">
          <TextButton onClick={() => add.mutate({ id, accessions: taken }, { onSuccess: () => setTaken([]) })}>Put back</TextButton>
        </Notice>
      )}
      {(remove.error ?? add.error) && <p className="field-error" role="alert">{(remove.error ?? add.error)?.message}</p>}
      {search.isError && !page ? <ErrorState error={search.error} onRetry={() => void search.refetch()} />
        : !page ? <LoadingState what="the entries" rows={8} />
          : (
            <>
              <ResultTable
                entries={shown} heads={heads} searchedWords={false} dense={false} kinds={undefined} grouping="step" sort={sort} hidden={noColumns} activeId={activeId} stale={search.isPlaceholderData} onActive={setActiveId} onSort={setSort}
              />
              <LoadMore shown={shown.length} total={page.total} totalIsExact={page.totalIsExact} hasMore={search.hasNextPage} busy={search.isFetchingNextPage} onMore={() => void search.fetchNextPage()} what="entries" />
            </>
          )}
      <Tray count={accessions.length} onClear={clearChosen}>
        <Button busy={remove.isPending} onClick={takeOut}>Take out of the collection</Button>
      </Tray>
    </>
  );
}

const noColumns: ReadonlySet<never> = new Set();
