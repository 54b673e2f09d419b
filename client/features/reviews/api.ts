import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  claimReview, commentReview, decideReview, getReview, listReviews, releaseReview, saveChecklist, type Checklist, type ReviewView,
} from '#shared/contracts/reviews.ts';
import type { DecisionKind, DecisionReason } from '#shared/domain/review.ts';
import { call } from '#client/lib/api-client.ts';

export const queueStates = ['waiting', 'mine', 'decided'] as const;
export type QueueState = (typeof queueStates)[number];

export const queueOptions = (state: QueueState) => ({
  queryKey: ['reviews', state] as const,
  queryFn: ({ pageParam, signal }: { pageParam: string | null; signal: AbortSignal }) =>
    call(listReviews, { query: { state, ...(pageParam ? { cursor: pageParam } : {}) }, signal }),
  initialPageParam: null as string | null,
  getNextPageParam: (last: { nextCursor: string | null }) => last.nextCursor,
});

export const reviewOptions = (submission: string) => queryOptions({
  queryKey: ['review', submission],
  queryFn: ({ signal }) => call(getReview, { params: { submission }, signal }),
});

export interface Decision {
  decision: DecisionKind;
  reason?: DecisionReason;
  comment: string;
  checklist: Checklist;
  seen: string;
}

/** What a reviewer does with one submission; every answer is the submission as it stands after it. */
export function useReviewActions(submission: string) {
  const client = useQueryClient();
  const params = { submission };
  const show = (view: ReviewView) => client.setQueryData(reviewOptions(submission).queryKey, view);
  /** The queue and the count in the header follow. */
  const moveQueue = (view: ReviewView) => {
    show(view);
    void client.invalidateQueries({ queryKey: ['reviews'] });
    void client.invalidateQueries({ queryKey: ['session'] });
  };
  return {
    claim: useMutation({ mutationFn: () => call(claimReview, { params }), onSuccess: moveQueue }),
    release: useMutation({ mutationFn: () => call(releaseReview, { params }), onSuccess: moveQueue }),
    check: useMutation({ mutationFn: (checklist: Checklist) => call(saveChecklist, { params, body: { checklist } }), onSuccess: show, scope: { id: `checklist-${submission}` } }),
    comment: useMutation({
      mutationFn: (body: string) => call(commentReview, { params, body: { body } }),
      onSuccess: () => client.invalidateQueries({ queryKey: reviewOptions(submission).queryKey }),
    }),
    decide: useMutation({ mutationFn: (body: Decision) => call(decideReview, { params, body }), onSuccess: moveQueue }),
    /** Fetches the submission as it stands now, after a refusal. */
    look: () => client.invalidateQueries({ queryKey: reviewOptions(submission).queryKey }),
  };
}
