import { useQuery } from '@tanstack/react-query';
import { useId, useState } from 'react';
import { Link } from 'react-router-dom';
import { announce } from '#client/lib/announce.ts';
import { Button, LinkButton } from '#client/ui/button.tsx';
import { RadioGroup } from '#client/ui/choice.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { InputField } from '#client/ui/field.tsx';
import { collectionsOptions, useCollectionChanges } from '../api.ts';

interface CollectButtonProps {
  accessions: readonly string[];
  /** Null while it is not known who is signed in. */
  signedIn: boolean | null;
  /** Where signing in leads back to. */
  returnTo: string;
}

const newList = 'new';

/** Adds entries to one of the reader's collections, or to a new one; offers to take it back. */
export function CollectButton({ accessions, signedIn, returnTo }: CollectButtonProps) {
  const [open, setOpen] = useState(false);
  const [done, setDone] = useState<{ id: string; name: string; words: string } | null>(null);
  const { remove } = useCollectionChanges();
  if (signedIn === false) return <LinkButton to={`/sign-in?next=${encodeURIComponent(returnTo)}`}>Sign in to collect</LinkButton>;
  return (
    <>
      <Button disabled={signedIn === null || accessions.length === 0} onClick={() => { setDone(null); setOpen(true); }}>Add to collection</Button>
      {done && (
        <span role="status">
          {done.words} <Link to={`/collections/${done.id}`}>{done.name}</Link>.
        </span>
      )}
      {remove.isError && <span role="alert">{remove.error.message}</span>}
      {open && (
        <CollectDialog
          accessions={accessions}
          onClose={() => setOpen(false)}
          onDone={(made) => {
            setOpen(false);
            setDone(made);
            announce(`${made.words} ${made.name}.`);
          }}
        />
      )}
    </>
  );
}

function CollectDialog({ accessions, onClose, onDone }: { accessions: readonly string[]; onClose: () => void; onDone: (made: { id: string; name: string; words: string }) => void }) {
  const group = useId();
  const lists = useQuery(collectionsOptions);
  const { create, add } = useCollectionChanges();
  const [picked, setPicked] = useState<string | null>(null);
  const [name, setName] = useState('');
  const [missing, setMissing] = useState(false);
  const items = lists.data?.items ?? [];
  const chosen = picked ?? items[0]?.id ?? newList;
  const error = create.error ?? add.error;
  const count = (n: number) => `${n} ${n === 1 ? 'entry' : 'entries'}`;

  async function save() {
    if (chosen === newList) {
      setMissing(!name.trim());
      if (!name.trim()) return;
      const made = await create.mutateAsync({ name: name.trim(), accessions });
      onDone({ id: made.id, name: made.name, words: `${count(accessions.length)} added to` });
    } else {
      const { added, collection } = await add.mutateAsync({ id: chosen, accessions });
      const already = accessions.length - added;
      onDone({ id: chosen, name: collection?.name ?? '', words: already === 0 ? `${count(added)} added to` : added === 0 ? 'All of them were already in' : `${count(added)} added, ${already} already in` });
    }
  }

  return (
    <Dialog
      open
      title={`Add ${count(accessions.length)} to a collection`}
      onClose={onClose}
      actions={(
        <>
          <Button look="primary" busy={create.isPending || add.isPending} disabled={lists.isPending} onClick={() => void save().catch(() => undefined)}>Add</Button>
          <Button onClick={onClose}>Leave it</Button>
        </>
      )}
    >
      {lists.isPending && <p role="status">Fetching your collections</p>}
      {lists.isError && <p className="field-error" role="alert">{lists.error.message}</p>}
      {lists.data && (
        <div className="max-h-80 overflow-y-auto">
          <RadioGroup
            legend="Collection" hideLegend name={group} value={chosen} onChange={setPicked}
            choices={[...items.map((item) => ({ value: item.id, label: item.name, hint: count(item.entries) })), { value: newList, label: 'A new collection' }]}
          />
          {chosen === newList && (
            <InputField
              label="Name" hideLabel placeholder="name of the new collection" maxLength={120} value={name} onChange={(event) => setName(event.target.value)}
              error={missing && !name.trim() ? 'Give the collection a name.' : undefined}
            />
          )}
        </div>
      )}
      {error && <p className="field-error" role="alert">{error.message}</p>}
    </Dialog>
  );
}
