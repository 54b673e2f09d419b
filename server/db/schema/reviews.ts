import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, unique, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core';
import type { Checklist } from '../../../shared/contracts/reviews.ts';
import { decisionReasons, decisions as decisionKinds } from '../../../shared/domain/review.ts';
import { users } from './accounts.ts';
import { oneOf } from './checks.ts';
import { code, id, instant } from './columns.ts';
import { entries, revisions } from './entries.ts';

/** One hand-in of a revision; the next round links back to the one before. */
export const submissions = pgTable('submissions', {
  id: id(),
  entryId: uuid('entry_id').notNull().references(() => entries.id),
  revisionId: uuid('revision_id').notNull().references(() => revisions.id),
  round: integer('round').notNull(),
  previousId: uuid('previous_id').references((): AnyPgColumn => submissions.id),
  submittedBy: uuid('submitted_by').notNull().references(() => users.id),
  submittedAt: instant('submitted_at').notNull(),
  claimedBy: uuid('claimed_by').references(() => users.id),
  claimExpiresAt: instant('claim_expires_at'),
  /** The claiming reviewer's answers so far. */
  checklist: jsonb('checklist').$type<Checklist>().notNull().default({}),
}, (t) => [
  unique('submissions_entry_round_key').on(t.entryId, t.round),
  unique('submissions_revision_round_key').on(t.revisionId, t.round),
  index('submissions_submitted_at_idx').on(t.submittedAt),
  check('submissions_claim_check', sql`(${t.claimedBy} is null) = (${t.claimExpiresAt} is null)`),
]);

/** Decisions stand for ever; one submission has one. */
export const decisions = pgTable('decisions', {
  id: id(),
  submissionId: uuid('submission_id').notNull().references(() => submissions.id),
  decision: code('decision').notNull(),
  reason: code('reason'),
  comment: text('comment').notNull(),
  checklist: jsonb('checklist').$type<Checklist>().notNull(),
  decidedBy: uuid('decided_by').notNull().references(() => users.id),
  decidedAt: instant('decided_at').notNull(),
}, (t) => [
  unique('decisions_submission_key').on(t.submissionId),
  check('decisions_decision_check', oneOf(t.decision, decisionKinds)),
  check('decisions_reason_check', oneOf(t.reason, decisionReasons)),
  check('decisions_reason_needed_check', sql`${t.decision} = 'accept' or ${t.reason} is not null`),
]);

export const reviewComments = pgTable('review_comments', {
  id: id(),
  submissionId: uuid('submission_id').notNull().references(() => submissions.id),
  authorId: uuid('author_id').notNull().references(() => users.id),
  body: text('body').notNull(),
  createdAt: instant('created_at').notNull(),
}, (t) => [index('review_comments_submission_idx').on(t.submissionId, t.createdAt)]);
