import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { collectionsOptions, useCollectionChanges } from '#client/features/collections/api.ts';
import { CollectionTable } from '#client/features/collections/components/collection-table.tsx';
import { Button, LinkButton, TextButton } from '#client/ui/button.tsx';
import { InputField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { PageHead } from '#client/ui/page-head.tsx';
import { EmptyState, ErrorState, LoadingState } from '#client/ui/states.tsx';

const title = 'Collections';

/** The reader's own lists of entries. */
export function Component() {
  return <RequireRole role="reader" title={title}>{() => <Collections />}</RequireRole>;
}

function Collections() {
  const list = useQuery(collectionsOptions);
  const items = list.data?.items;
  return (
    <>
      <PageHead title={title} aside={items && `${items.length} ${items.length === 1 ? 'collection' : 'collections'}`} />
      <Discarded />
      <StartCollection />
      {list.isError && !items ? <ErrorState error={list.error} onRetry={() => void list.refetch()} />
        : !items ? <LoadingState what="your collections" rows={4} />
          : items.length === 0 ? (
            <EmptyState title="You have no collection yet" actions={<LinkButton to="/search">Go to the search</LinkButton>}>
              <p>A collection is your own list of entries, such as the set a model uses. Choose rows in the search, or open an entry, and add them; only you see the list.</p>
            </EmptyState>
          ) : <CollectionTable collections={items} />}
    </>
  );
}

/** After a collection was discarded: the way to take that back. */
function Discarded() {
  const location = useLocation();
  const navigate = useNavigate();
  const { restore } = useCollectionChanges();
  const discarded = (location.state as { discarded?: { id: string; name: string } } | null)?.discarded;
  if (!discarded) return null;
  return (
    <Notice kind="result" live title={`“${discarded.name}” is discarded.`} className="mb-5">
      <TextButton onClick={() => restore.mutate(discarded.id, { onSuccess: () => void navigate(`/collections/${discarded.id}`) })}>Bring it back</TextButton>
      {restore.isError && <span role="alert"> {restore.error.message}</span>}
    </Notice>
  );
}

function StartCollection() {
  const [name, setName] = useState('');
  const [missing, setMissing] = useState(false);
  const navigate = useNavigate();
  const { create } = useCollectionChanges();
  function start() {
    setMissing(!name.trim());
    if (name.trim()) create.mutate({ name: name.trim(), accessions: [] }, { onSuccess: (made) => void navigate(`/collections/${made.id}`) });
  }
  return (
    <form className="flex flex-wrap items-end gap-3 pb-6" onSubmit={(event) => { event.preventDefault(); start(); }}>
      <InputField
        label="New collection" placeholder="name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)}
        error={missing && !name.trim() ? 'Give the collection a name.' : create.error?.message}
      />
      <Button type="submit" className="mb-1.5" busy={create.isPending}>Start it</Button>
    </form>
  );
}
