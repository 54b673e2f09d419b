import { useEffect, useId, useRef, useState } from 'react';
import type { Checklist, ReviewView } from '#shared/contracts/reviews.ts';
import { decisionReasons, decisionReasonWords, type ChecklistAnswer, type ChecklistPoint, type DecisionKind, type DecisionReason } from '#shared/domain/review.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { useLocalStorage } from '#client/lib/local-storage.ts';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';
import { SelectField, TextareaField } from '#client/ui/field.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { useReviewActions } from '../api.ts';
import { standingOf, whyNotAccept } from '../checklist-state.ts';
import { refusalWords } from '../refusals.ts';
import { ChecklistFields, ChecklistKeys } from './checklist.tsx';
import { DecisionDialog } from './decision-dialog.tsx';

/** The eight points, the comment and the reason, and the three decisions. */
export function DecisionForm({ view }: { view: ReviewView }) {
  const actions = useReviewActions(view.submission);
  const mayDecide = view.actions.includes('decide');
  const [checklist, setChecklist] = useState<Checklist>(view.checklist);
  const [comment, setComment] = useLocalStorage(`sillstone.review.${view.submission}`, '');
  const [reason, setReason] = useState<DecisionReason | ''>('');
  const [faults, setFaults] = useState<{ reason?: string; comment?: string }>({});
  const [asking, setAsking] = useState<DecisionKind | null>(null);
  const reasonField = useRef<HTMLSelectElement>(null);
  const commentField = useRef<HTMLTextAreaElement>(null);
  const whyId = useId();
  const standing = standingOf(checklist);
  const why = whyNotAccept(standing);
  const { mutate: saveChecklist } = actions.check;

  // Answers reach the server when the answering pauses: saving renews the claim.
  const changed = useRef(false);
  useEffect(() => {
    if (!changed.current) return;
    const timer = setTimeout(() => {
      changed.current = false;
      saveChecklist(checklist);
    }, 600);
    return () => clearTimeout(timer);
  }, [checklist, saveChecklist]);

  function answer(point: ChecklistPoint, value: ChecklistAnswer) {
    changed.current = true;
    setChecklist((before) => ({ ...before, [point]: value }));
  }

  function ask(decision: DecisionKind) {
    if (decision === 'accept') {
      if (why) announce(why);
      else setAsking('accept');
      return;
    }
    const found = {
      ...(reason ? {} : { reason: 'Choose the reason: the contributor needs it, and it is counted.' }),
      ...(comment.trim() ? {} : { comment: 'Tell the contributor what is wrong and what to do.' }),
    };
    setFaults(found);
    if (found.reason) reasonField.current?.focus();
    else if (found.comment) commentField.current?.focus();
    else setAsking(decision);
  }

  function decide() {
    if (!asking) return;
    changed.current = false;
    actions.decide.mutate(
      { decision: asking, comment: comment.trim(), checklist, seen: view.seen, ...(asking !== 'accept' && reason ? { reason } : {}) },
      {
        onSuccess: () => {
          setComment('');
          announce('The decision is recorded');
        },
        onError: (error) => {
          if (isApiError(error, 'claimed-by-another', 'already-decided', 'stale-version', 'state-conflict')) void actions.look();
        },
        onSettled: () => setAsking(null),
      },
    );
  }

  const refused = actions.decide.error ?? actions.check.error;
  return (
    <div>
      <ChecklistFields checklist={view.decision ? view.checklist : checklist} onAnswer={answer} disabled={!mayDecide} />
      {mayDecide && <ChecklistKeys />}
      {mayDecide && !view.claim && <p className="text-fine text-second">The first answer claims the submission for you, for 72 hours.</p>}
      {refused && <Notice kind="refusal" live title={refusalWords(refused).title} className="mt-4">{refusalWords(refused).text}</Notice>}
      {mayDecide && (
        <div className="flex flex-col gap-4 pt-5">
          <TextareaField
            ref={commentField} label="To the contributor" rows={4} maxLength={4000} value={comment} error={faults.comment}
            onChange={(event) => {
              setComment(event.target.value);
              setFaults(({ comment: _, ...rest }) => rest);
            }}
          />
          <SelectField
            ref={reasonField} label="Reason, to return or reject" empty="choose a reason" value={reason} error={faults.reason}
            choices={decisionReasons.map((value) => ({ value, label: decisionReasonWords[value] }))}
            onChange={(event) => {
              setReason(decisionReasons.find((one) => one === event.target.value) ?? '');
              setFaults(({ reason: _, ...rest }) => rest);
            }}
          />
          <div className="flex flex-wrap gap-3">
            <Button look="primary" aria-disabled={why !== null || undefined} aria-describedby={whyId} onClick={() => ask('accept')}>Accept</Button>
            <Button onClick={() => ask('return')}>Return</Button>
            <Button look="refusal" onClick={() => ask('reject')}>Reject</Button>
          </div>
          <p id={whyId} className="text-fine text-second">
            {why ?? 'All eight points are answered and none with no.'} The decision is recorded and never erased.
          </p>
        </div>
      )}
      <DecisionDialog asking={asking} view={view} comment={comment} busy={actions.decide.isPending} onDecide={decide} onClose={() => setAsking(null)} />
    </div>
  );
}
