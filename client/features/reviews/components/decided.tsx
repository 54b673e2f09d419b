import type { ReviewView } from '#shared/contracts/reviews.ts';
import { decisionReasons, decisionReasonWords } from '#shared/domain/review.ts';
import { formatDateTime } from '#client/lib/dates.ts';
import { LinkButton } from '#client/ui/button.tsx';
import { Notice } from '#client/ui/notice.tsx';

const done = { accept: 'Accepted', return: 'Returned', reject: 'Rejected' } as const;

/** The decision, and the way on. */
export function Decided({ view }: { view: ReviewView }) {
  const { decision } = view;
  if (!decision) return null;
  const reason = decisionReasons.find((one) => one === decision.reason);
  return (
    <div className="flex flex-col gap-4 pb-5">
      <Notice kind={decision.decision === 'accept' ? 'result' : decision.decision === 'return' ? 'doubt' : 'refusal'} live title={`${done[decision.decision]} by ${decision.by}, ${formatDateTime(decision.at)}.`}>
        {reason && <p>{decisionReasonWords[reason]}.</p>}
        {decision.comment && <p className="whitespace-pre-wrap">{decision.comment}</p>}
      </Notice>
      <div className="flex flex-wrap gap-3">
        {view.next
          ? <LinkButton look="primary" to={`/review/${view.next}`}>Next in the queue</LinkButton>
          : <LinkButton to="/review">To the queue: nothing else waits for you</LinkButton>}
        {decision.decision === 'accept' && <LinkButton to={`/entries/${view.entry.accession}`}>Open the entry</LinkButton>}
      </div>
    </div>
  );
}
