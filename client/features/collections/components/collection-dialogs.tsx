import { useState } from 'react';
import type { CollectionDetail } from '#shared/contracts/collections.ts';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { InputField, TextareaField } from '#client/ui/field.tsx';
import { useCollectionChanges } from '../api.ts';

/** Changes the name and the description. */
export function RenameCollection({ collection }: { collection: CollectionDetail }) {
  const [open, setOpen] = useState(false);
  const [name, setName] = useState(collection.name);
  const [description, setDescription] = useState(collection.description);
  const { rename } = useCollectionChanges();
  const missing = !name.trim();
  return (
    <>
      <Button onClick={() => { setName(collection.name); setDescription(collection.description); setOpen(true); }}>Rename</Button>
      <Dialog
        open={open}
        title="Name and description"
        onClose={() => setOpen(false)}
        actions={(
          <>
            <Button
              look="primary" busy={rename.isPending}
              onClick={() => { if (!missing) rename.mutate({ id: collection.id, name: name.trim(), description: description.trim() }, { onSuccess: () => setOpen(false) }); }}
            >
              Save
            </Button>
            <Button onClick={() => setOpen(false)}>Leave it</Button>
          </>
        )}
      >
        <div className="flex flex-col gap-4">
          <InputField label="Name" required maxLength={120} value={name} onChange={(event) => setName(event.target.value)} error={missing ? 'Give the collection a name.' : rename.error?.message} />
          <TextareaField label="Description" maxLength={1000} rows={3} value={description} onChange={(event) => setDescription(event.target.value)} hint="What the collection is for." />
        </div>
      </Dialog>
    </>
  );
}

/** Discards the collection after a question. */
export function DiscardCollection({ collection, onDiscarded }: { collection: CollectionDetail; onDiscarded: () => void }) {
  const [open, setOpen] = useState(false);
  const { discard } = useCollectionChanges();
  return (
    <>
      <Button look="refusal" onClick={() => setOpen(true)}>Discard</Button>
      <Dialog
        open={open}
        title={`Discard “${collection.name}”`}
        onClose={() => setOpen(false)}
        actions={(
          <>
            <Button look="refusal" busy={discard.isPending} onClick={() => discard.mutate(collection.id, { onSuccess: () => { announce('Discarded.'); onDiscarded(); } })}>Discard</Button>
            <Button onClick={() => setOpen(false)}>Keep it</Button>
          </>
        )}
      >
        <p>The list leaves your collections; its entries stay in the store. The next page offers to bring it back.</p>
        {discard.isError && <p className="field-error" role="alert">{discard.error.message}</p>}
      </Dialog>
    </>
  );
}
