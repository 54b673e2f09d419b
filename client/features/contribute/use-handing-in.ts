import { useState } from 'react';
import type { EntryForEditing } from '#shared/contracts/entries.ts';
import { handIn } from './api.ts';
import type { DraftSaver } from './draft-saver.ts';

/** Handing a draft in: asked once, saved first, then frozen. */
export function useHandingIn(saver: DraftSaver, onSubmitted: (draft: EntryForEditing) => void) {
  const [open, setOpen] = useState(false);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);

  async function submit() {
    setBusy(true);
    setError(null);
    try {
      if (!(await saver.save())) {
        const { state } = saver.snapshot();
        if (state.kind === 'conflict') setOpen(false);
        else setError(state.kind === 'failed' ? state.error : new Error('the draft changed while it was saved'));
        return;
      }
      const { accession, etag } = saver.snapshot();
      if (accession === null) return;
      const draft = await handIn(accession, etag);
      setOpen(false);
      onSubmitted(draft);
    } catch (refused) {
      setError(refused);
    } finally {
      setBusy(false);
    }
  }

  return {
    open, busy, error, submit,
    ask: () => {
      setError(null);
      setOpen(true);
    },
    close: () => setOpen(false),
  };
}
