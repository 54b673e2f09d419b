import { isApiError } from '#client/lib/api-error.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { useWithdraw } from '../use-my-entries.ts';

interface WithdrawDialogProps {
  entry: { accession: string; state: string; asPrinted: string | null; unitAsPrinted: string | null } | null;
  onClose: () => void;
}

/** Asks before an open revision is withdrawn. */
export function WithdrawDialog({ entry, onClose }: WithdrawDialogProps) {
  const { mutate, isPending, error, reset } = useWithdraw(() => close());
  function close() {
    reset();
    onClose();
  }
  const draft = entry?.state === 'draft';
  return (
    <Dialog
      open={entry !== null}
      title={draft ? 'Discard this draft?' : 'Withdraw this submission?'}
      onClose={close}
      actions={(
        <>
          <Button look="refusal" busy={isPending} onClick={() => entry && mutate(entry.accession)}>{draft ? 'Discard it' : 'Withdraw it'}</Button>
          <Button onClick={close}>Keep it</Button>
        </>
      )}
    >
      <p>
        {entry?.accession}{entry?.asPrinted && <>, <samp>{[entry.asPrinted, entry.unitAsPrinted].filter(Boolean).join(' ')}</samp></>}.{' '}
        {draft ? 'A discarded draft can be brought back for 30 days by a curator.' : 'It leaves the review queue and is never published. What was said about it is kept.'}
      </p>
      {error && (
        <div className="pt-3">
          <Notice kind="refusal" live title={isApiError(error) ? `${error.title}.` : 'That did not succeed.'}>{isApiError(error) ? error.detail : 'Try again in a moment.'}</Notice>
        </div>
      )}
    </Dialog>
  );
}
