import { and, asc, eq, inArray, or, sql } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { users } from '#server/db/schema/accounts.ts';
import { revisions } from '#server/db/schema/entries.ts';
import { events } from '#server/db/schema/log.ts';
import { decisions, submissions } from '#server/db/schema/reviews.ts';
import type { EntryDetail } from '#shared/contracts/entries.ts';

/** What the log's actions are called on a page, and whether everybody may read them. */
const words: Readonly<Record<string, { text: string; open: boolean }>> = {
  'revision.drafted': { text: 'Draft begun', open: false },
  'revision.submitted': { text: 'Submitted', open: true },
  'revision.withdrawn': { text: 'Withdrawn by its contributor', open: false },
  'submission.claimed': { text: 'Taken for review', open: false },
  'submission.released': { text: 'Given back to the queue', open: false },
  'submission.accept': { text: 'Accepted', open: true },
  'submission.return': { text: 'Returned to the contributor', open: false },
  'submission.reject': { text: 'Rejected', open: false },
  'revision.retracted': { text: 'Retracted', open: true },
};

/** The history of an entry in plain words, oldest first, read from the event log. What was never public is for those who may see it. */
export async function readHistory(db: DbOrTx, entryId: string, seesAll: boolean): Promise<EntryDetail['history']> {
  const shown = Object.entries(words).filter(([, word]) => seesAll || word.open).map(([action]) => action);
  const rows = await db.select({
    at: events.at, action: events.action, name: users.name, number: revisions.number, version: revisions.version, comment: decisions.comment,
  }).from(revisions)
    .leftJoin(submissions, eq(submissions.revisionId, revisions.id))
    .innerJoin(events, or(
      and(eq(events.subjectType, 'revision'), eq(events.subjectId, revisions.id)),
      and(eq(events.subjectType, 'submission'), eq(events.subjectId, submissions.id)),
    ))
    .leftJoin(users, eq(users.id, events.actorId))
    .leftJoin(decisions, and(eq(decisions.submissionId, submissions.id), sql`${events.action} = 'submission.' || ${decisions.decision}`))
    .where(and(eq(revisions.entryId, entryId), inArray(events.action, shown), seesAll ? undefined : sql`${revisions.version} is not null`))
    .orderBy(asc(events.seq));
  return rows.map(({ at, action, name, version, comment, number }) => {
    const text = words[action]?.text ?? action;
    const what = action === 'submission.accept' && version !== null ? `Version ${version} accepted` : version === null && number > 1 ? `${text} (revision ${number})` : text;
    return { at: at.toISOString(), by: name ?? 'the system', what: comment ? `${what}: ${comment}` : what, version };
  });
}
