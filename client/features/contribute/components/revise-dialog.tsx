import { useState } from 'react';
import { isApiError } from '#client/lib/api-error.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { TextareaField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { useRevise } from '../use-my-entries.ts';

interface ReviseDialogProps {
  entry: { accession: string; state: string; lastComment: string | null } | null;
  onClose: () => void;
  onOpened: (accession: string) => void;
}

/** Opens a new draft from a returned or accepted version, with the reason for it. */
export function ReviseDialog({ entry, onClose, onOpened }: ReviseDialogProps) {
  const [reason, setReason] = useState('');
  const { mutate, isPending, error, reset } = useRevise((accession) => {
    close();
    onOpened(accession);
  });
  function close() {
    reset();
    setReason('');
    onClose();
  }
  const returned = entry?.state === 'returned';
  const withdrawn = entry?.state === 'withdrawn';
  return (
    <Dialog
      open={entry !== null}
      title={returned ? 'Answer the reviewer' : withdrawn ? 'Take this entry up again' : 'Revise this entry'}
      onClose={close}
      actions={(
        <>
          <Button look="primary" busy={isPending} onClick={() => entry && mutate({ accession: entry.accession, reason })}>Open a new draft</Button>
          <Button onClick={close}>Not now</Button>
        </>
      )}
    >
      {returned && entry.lastComment && <blockquote className="mb-3 border-l-4 border-ochre pl-3 whitespace-pre-wrap">{entry.lastComment}</blockquote>}
      <p className="pb-3">
        {returned
          ? 'The new draft is copied from the version that was returned. Change what the reviewer asks for, then submit it again.'
          : withdrawn ? 'The new draft is copied from the version that was withdrawn.' : 'The accepted version stays public, unchanged, until the new one is accepted.'}
      </p>
      <TextareaField
        label={returned ? 'Answer to the reviewer (optional)' : withdrawn ? 'Reason (optional)' : 'Reason for the revision'} rows={3} maxLength={1000} value={reason}
        onChange={(event) => setReason(event.target.value)}
      />
      {error && (
        <div className="pt-3">
          <Notice kind="refusal" live title={isApiError(error) ? `${error.title}.` : 'That did not succeed.'}>{isApiError(error) ? error.detail : 'Try again in a moment.'}</Notice>
        </div>
      )}
    </Dialog>
  );
}
