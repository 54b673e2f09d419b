import type { ReviewSummary } from '#server/features/entries/records.service.ts';
import type { QueueItem, ReviewView } from '#shared/contracts/reviews.ts';
import type { State } from '#shared/domain/states.ts';
import type { SubmissionRecord, SubmissionRow } from './reviews.repository.ts';

/** The claim in force, or null when there is none or it has run out. */
export function liveClaim(submission: SubmissionRow, now: Date): { by: string; until: Date } | null {
  return submission.claimedBy && submission.claimExpiresAt && submission.claimExpiresAt > now ? { by: submission.claimedBy, until: submission.claimExpiresAt } : null;
}

/** Whether somebody wrote the revision or first contributed its entry, and so may not decide. */
export function isOwn(record: SubmissionRecord, userId: string): boolean {
  return record.revision.authorId === userId || record.contributorId === userId || record.submission.submittedBy === userId;
}

export function claimOf(record: SubmissionRecord, userId: string, now: Date): ReviewView['claim'] {
  const claim = liveClaim(record.submission, now);
  return claim && { by: record.claimedByName ?? 'a former member', mine: claim.by === userId, until: claim.until.toISOString() };
}

export function presentQueueItem(record: SubmissionRecord, summary: ReviewSummary, userId: string, now: Date): QueueItem {
  return {
    submission: record.submission.id, accession: record.accession, round: record.submission.round, state: record.revision.state as State, ...summary,
    contributor: record.revision.authorName, submittedAt: record.submission.submittedAt.toISOString(),
    claim: record.decision ? null : claimOf(record, userId, now), own: isOwn(record, userId),
  };
}
