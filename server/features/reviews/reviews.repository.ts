import { and, asc, count, desc, eq, gt, inArray, isNull, lt, ne, or, sql, type SQL } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { users } from '#server/db/schema/accounts.ts';
import { entries, revisions } from '#server/db/schema/entries.ts';
import { decisions, reviewComments, submissions } from '#server/db/schema/reviews.ts';
import type { Checklist } from '#shared/contracts/reviews.ts';

export type SubmissionRow = typeof submissions.$inferSelect;
export type DecisionRow = typeof decisions.$inferSelect;
type RevisionRow = typeof revisions.$inferSelect;

export interface SubmissionRecord {
  submission: SubmissionRow;
  revision: RevisionRow;
  accession: string;
  contributorId: string;
  decision: DecisionRow | null;
  claimedByName: string | null;
}

const recordColumns = {
  submission: submissions, revision: revisions, accession: entries.accession, contributorId: entries.contributorId, decision: decisions, claimedByName: users.name,
};

function records(db: DbOrTx) {
  return db.select(recordColumns).from(submissions)
    .innerJoin(revisions, eq(revisions.id, submissions.revisionId))
    .innerJoin(entries, eq(entries.id, submissions.entryId))
    .leftJoin(decisions, eq(decisions.submissionId, submissions.id))
    .leftJoin(users, eq(users.id, submissions.claimedBy));
}

export async function findSubmission(db: DbOrTx, id: string): Promise<SubmissionRecord | null> {
  const [row] = await records(db).where(eq(submissions.id, id));
  return row ?? null;
}

/** Holds the submission against every other writer until the transaction ends. */
export async function lockSubmission(tx: Tx, id: string): Promise<void> {
  await tx.select({ id: submissions.id }).from(submissions).where(eq(submissions.id, id)).for('update');
}

export type QueueState = 'waiting' | 'submitted' | 'under-review' | 'mine' | 'decided';

function queueCondition(state: QueueState, userId: string, now: Date): SQL | undefined {
  const waiting = inArray(revisions.state, ['submitted', 'under-review']);
  const free = or(isNull(submissions.claimedBy), lt(submissions.claimExpiresAt, now));
  const held = gt(submissions.claimExpiresAt, now);
  switch (state) {
    case 'waiting': return waiting;
    case 'submitted': return and(waiting, free);
    case 'under-review': return and(waiting, held);
    case 'mine': return and(waiting, held, eq(submissions.claimedBy, userId));
    case 'decided': return sql`${decisions.id} is not null`;
  }
}

export async function listQueue(
  db: DbOrTx,
  { state, userId, now, limit, after }: { state: QueueState; userId: string; now: Date; limit: number; after: { at: Date; id: string } | null },
): Promise<SubmissionRecord[]> {
  const decided = state === 'decided';
  const position = after
    ? decided
      ? sql`(${decisions.decidedAt}, ${submissions.id}) < (${after.at.toISOString()}::timestamptz, ${after.id}::uuid)`
      : sql`(${submissions.submittedAt}, ${submissions.id}) > (${after.at.toISOString()}::timestamptz, ${after.id}::uuid)`
    : undefined;
  const order = decided ? [desc(decisions.decidedAt), desc(submissions.id)] : [asc(submissions.submittedAt), asc(submissions.id)];
  return records(db).where(and(queueCondition(state, userId, now), position)).orderBy(...order).limit(limit);
}

export async function countQueue(db: DbOrTx, state: QueueState, userId: string, now: Date): Promise<number> {
  const [row] = await db.select({ n: count() }).from(submissions)
    .innerJoin(revisions, eq(revisions.id, submissions.revisionId))
    .leftJoin(decisions, eq(decisions.submissionId, submissions.id))
    .where(queueCondition(state, userId, now));
  return row?.n ?? 0;
}

export async function setClaim(tx: Tx, id: string, claim: { by: string; until: Date } | null): Promise<void> {
  await tx.update(submissions).set({ claimedBy: claim?.by ?? null, claimExpiresAt: claim?.until ?? null }).where(eq(submissions.id, id));
}

export async function setChecklist(tx: Tx, id: string, checklist: Checklist): Promise<void> {
  await tx.update(submissions).set({ checklist }).where(eq(submissions.id, id));
}

export async function insertDecision(tx: Tx, row: typeof decisions.$inferInsert): Promise<DecisionRow> {
  const [inserted] = await tx.insert(decisions).values(row).returning();
  if (!inserted) throw new Error('The decision was not stored.');
  return inserted;
}

export async function insertComment(tx: Tx, row: typeof reviewComments.$inferInsert): Promise<string> {
  const [inserted] = await tx.insert(reviewComments).values(row).returning({ id: reviewComments.id });
  if (!inserted) throw new Error('The comment was not stored.');
  return inserted.id;
}

export async function listComments(db: DbOrTx, entryId: string): Promise<{ id: string; by: string; at: Date; body: string }[]> {
  return db.select({ id: reviewComments.id, by: users.name, at: reviewComments.createdAt, body: reviewComments.body }).from(reviewComments)
    .innerJoin(submissions, eq(submissions.id, reviewComments.submissionId))
    .innerJoin(users, eq(users.id, reviewComments.authorId))
    .where(eq(submissions.entryId, entryId)).orderBy(asc(reviewComments.createdAt), asc(reviewComments.id)).limit(200);
}

export async function listEarlierDecisions(db: DbOrTx, entryId: string, beforeRound: number) {
  return db.select({ round: submissions.round, decision: decisions.decision, comment: decisions.comment, by: users.name, at: decisions.decidedAt }).from(decisions)
    .innerJoin(submissions, eq(submissions.id, decisions.submissionId))
    .innerJoin(users, eq(users.id, decisions.decidedBy))
    .where(and(eq(submissions.entryId, entryId), lt(submissions.round, beforeRound))).orderBy(asc(submissions.round));
}

/** The next submission that waits for somebody to take it, oldest first, leaving out what the reviewer may not decide on. */
export async function findNext(db: DbOrTx, userId: string, exceptId: string, now: Date): Promise<string | null> {
  const [row] = await db.select({ id: submissions.id }).from(submissions)
    .innerJoin(revisions, eq(revisions.id, submissions.revisionId))
    .innerJoin(entries, eq(entries.id, submissions.entryId))
    .where(and(
      ne(submissions.id, exceptId), inArray(revisions.state, ['submitted', 'under-review']), ne(revisions.authorId, userId), ne(entries.contributorId, userId),
      or(isNull(submissions.claimedBy), lt(submissions.claimExpiresAt, now), eq(submissions.claimedBy, userId)),
    )).orderBy(asc(submissions.submittedAt), asc(submissions.id)).limit(1);
  return row?.id ?? null;
}

/** Submissions whose claim has run out while they still stand as under review. */
export async function listExpiredClaims(db: DbOrTx, now: Date): Promise<string[]> {
  const rows = await db.select({ id: submissions.id }).from(submissions).innerJoin(revisions, eq(revisions.id, submissions.revisionId))
    .where(and(eq(revisions.state, 'under-review'), lt(submissions.claimExpiresAt, now))).limit(200);
  return rows.map(({ id }) => id);
}
