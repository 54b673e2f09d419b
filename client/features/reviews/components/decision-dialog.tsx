import type { ReviewView } from '#shared/contracts/reviews.ts';
import type { DecisionKind } from '#shared/domain/review.ts';
import { Button } from '#client/ui/button.tsx';
import { Dialog } from '#client/ui/dialog.tsx';

const words: Readonly<Record<DecisionKind, { title: string; verb: string; text: string }>> = {
  accept: { title: 'Accept this submission?', verb: 'Accept', text: 'The value becomes public at once, under the contributor\'s name and with yours as its reviewer.' },
  return: { title: 'Return it to the contributor?', verb: 'Return', text: 'The contributor gets your comment and can hand in a changed version.' },
  reject: { title: 'Reject this submission?', verb: 'Reject', text: 'It is closed. The contributor sees the reason and your comment.' },
};

interface DecisionDialogProps {
  asking: DecisionKind | null;
  view: ReviewView;
  comment: string;
  busy: boolean;
  onDecide: () => void;
  onClose: () => void;
}

/** Asks once more before a decision, which takes effect at once. */
export function DecisionDialog({ asking, view, comment, busy, onDecide, onClose }: DecisionDialogProps) {
  const said = asking && words[asking];
  return (
    <Dialog
      open={asking !== null}
      title={said?.title}
      onClose={onClose}
      actions={said && (
        <>
          <Button look={asking === 'reject' ? 'refusal' : 'primary'} busy={busy} onClick={onDecide}>{said.verb}</Button>
          <Button onClick={onClose}>Not yet</Button>
        </>
      )}
    >
      <p>{said?.text}</p>
      {comment.trim() && <blockquote className="mt-3 border-l-4 border-ink pl-3 whitespace-pre-wrap">{comment.trim()}</blockquote>}
      {asking === 'accept' && view.entry.checks.some((check) => check.severity === 'warning') && (
        <p className="pt-3 text-ochre">Checks have raised doubts about it; accepting says that you looked into them.</p>
      )}
    </Dialog>
  );
}
