import type { EntryForEditing } from '#shared/contracts/entries.ts';
import { decisionReasonWords, decisionReasons } from '#shared/domain/review.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Notice } from '#client/ui/notice.tsx';

/** What the reviewer said to the version before: it is what this draft has to answer. */
export function LastDecision({ decision }: { decision: NonNullable<EntryForEditing['lastDecision']> }) {
  const reason = decisionReasons.find((one) => one === decision.reason);
  const done = { return: 'Returned', reject: 'Rejected', accept: 'Accepted' }[decision.decision] ?? decision.decision;
  return (
    <Notice kind="doubt" title={`${done} by ${decision.by}, ${formatDate(decision.at)}${reason ? `: ${decisionReasonWords[reason]}.` : '.'}`} className="mb-5">
      <span className="whitespace-pre-wrap">{decision.comment}</span>
    </Notice>
  );
}
