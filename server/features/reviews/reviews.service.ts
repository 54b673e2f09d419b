import type * as z from 'zod';
import { requireRole, type Actor, type SignedIn } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { appendEvents } from '#server/db/event-log.ts';
import { readCursor, writeCursor } from '#server/db/keyset.ts';
import type { Tx } from '#server/db/pool.ts';
import { listChanges } from '#server/features/entries/changes.service.ts';
import { acceptRevision } from '#server/features/entries/acceptance.service.ts';
import type { EntryRecordsService } from '#server/features/entries/records.service.ts';
import { notFound, Refusal } from '#server/refusal.ts';
import type { Checklist, decisionBody, QueueItem, ReviewView } from '#shared/contracts/reviews.ts';
import { checklistPoints, checklistWords, claimHours } from '#shared/domain/review.ts';
import { nextState, type State } from '#shared/domain/states.ts';
import { claimOf, isOwn, liveClaim, presentQueueItem } from './reviews.present.ts';
import * as repository from './reviews.repository.ts';
import type { SubmissionRecord } from './reviews.repository.ts';

export function createReviewsService({ db, clock }: Context, records: EntryRecordsService) {
  const claimUntil = (now: Date) => new Date(now.getTime() + claimHours * 3_600_000);

  async function find(id: string): Promise<SubmissionRecord> {
    const record = await repository.findSubmission(db, id);
    if (!record) throw notFound('This submission');
    return record;
  }

  const tagOf = (record: SubmissionRecord) => `${record.revision.number}.${record.revision.lock}`;

  /** Refuses what is not open for review any more, saying who decided what. */
  async function requireWaiting(record: SubmissionRecord): Promise<void> {
    if (record.decision) {
      const by = await records.userName(record.decision.decidedBy);
      throw new Refusal('already-decided', `${by} decided this submission already: ${record.decision.decision}.`, {
        context: { decision: record.decision.decision, by, at: record.decision.decidedAt.toISOString() },
      });
    }
    const { state } = record.revision;
    if (state !== 'submitted' && state !== 'under-review') throw new Refusal('state-conflict', `This submission is ${state.replace('-', ' ')}.`, { context: { state } });
  }

  function requireUnclaimedByOthers(record: SubmissionRecord, actor: SignedIn): void {
    const claim = liveClaim(record.submission, clock());
    if (claim && claim.by !== actor.userId) {
      const until = claim.until.toISOString();
      throw new Refusal('claimed-by-another', `${record.claimedByName ?? 'Another reviewer'} holds this submission until ${until.slice(0, 16).replace('T', ' ')} UTC.`, { context: { by: record.claimedByName, until } });
    }
  }

  function requireOthers(record: SubmissionRecord, actor: SignedIn): void {
    if (isOwn(record, actor.userId)) throw new Refusal('own-submission', 'You contributed this value; another reviewer decides on it.');
  }

  /** Takes or renews the claim inside a transaction that holds the submission. */
  async function takeClaim(tx: Tx, record: SubmissionRecord, actor: SignedIn, now: Date): Promise<SubmissionRecord> {
    await repository.setClaim(tx, record.submission.id, { by: actor.userId, until: claimUntil(now) });
    if (record.revision.state === 'under-review') return record;
    const revision = await records.changeState(tx, record.revision, 'under-review', now);
    return { ...record, revision };
  }

  /** Runs `work` on the submission as it is once nobody else can change it, unless `isDone` finds it done already. */
  async function held(id: string, actor: SignedIn, work: (tx: Tx, record: SubmissionRecord, now: Date) => Promise<void>, isDone: (record: SubmissionRecord) => boolean = () => false): Promise<void> {
    await find(id);
    await db.transaction(async (tx) => {
      await repository.lockSubmission(tx, id);
      const record = await repository.findSubmission(tx, id);
      if (!record) throw notFound('This submission');
      if (isDone(record)) return;
      await requireWaiting(record);
      requireOthers(record, actor);
      requireUnclaimedByOthers(record, actor);
      await work(tx, record, clock());
    });
  }

  async function view(actor: SignedIn, id: string): Promise<ReviewView> {
    const record = await find(id);
    const now = clock();
    const { submission, revision } = record;
    const own = isOwn(record, actor.userId);
    const claim = liveClaim(submission, now);
    const waiting = revision.state === 'submitted' || revision.state === 'under-review';
    const mine = claim?.by === actor.userId;
    const actions: ReviewView['actions'] = [];
    if (waiting) actions.push('comment');
    if (waiting && !own && (!claim || mine)) actions.push('claim', 'checklist', 'decide');
    if (waiting && mine) actions.push('release');
    const whyNot = !waiting ? null : own ? 'You contributed this value; another reviewer decides on it.'
      : claim && !mine ? `${record.claimedByName ?? 'Another reviewer'} holds this submission.` : null;
    const shown = await records.forReview(actor, revision.id, record.accession);
    const before = await records.publicInput(revision.entryId, revision.number);
    return {
      submission: submission.id, round: submission.round, state: revision.state as State, contributor: revision.authorName, submittedAt: submission.submittedAt.toISOString(), own,
      entry: shown.entry,
      claim: claimOf(record, actor.userId, now), checklist: record.decision?.checklist ?? submission.checklist, seen: tagOf(record),
      changes: before ? listChanges(before, revision.input) : [],
      neighbours: shown.neighbours,
      comments: (await repository.listComments(db, revision.entryId)).map((comment) => ({ ...comment, at: comment.at.toISOString() })),
      decision: record.decision && {
        decision: record.decision.decision as 'accept' | 'return' | 'reject', reason: record.decision.reason, comment: record.decision.comment,
        by: await records.userName(record.decision.decidedBy), at: record.decision.decidedAt.toISOString(),
      },
      earlier: (await repository.listEarlierDecisions(db, revision.entryId, submission.round)).map((row) => ({ ...row, at: row.at.toISOString() })),
      actions, whyNot, next: await repository.findNext(db, actor.userId, submission.id, now),
    };
  }

  return {
    async countWaiting(): Promise<number> {
      return repository.countQueue(db, 'waiting', '00000000-0000-0000-0000-000000000000', clock());
    },

    async list(who: Actor, query: { state: repository.QueueState; limit: number; cursor?: string | undefined }) {
      const actor = requireRole(who, 'reviewer');
      const now = clock();
      const question = ['queue', actor.userId, query.state];
      const position = query.cursor ? readCursor(query.cursor, question, 2) : null;
      const after = position ? { at: new Date(String(position[0])), id: String(position[1]) } : null;
      const rows = await repository.listQueue(db, { state: query.state, userId: actor.userId, now, limit: query.limit + 1, after });
      const page = rows.slice(0, query.limit);
      const shown = await records.summaries(page.map(({ revision }) => revision.id));
      const items = page.flatMap((record): QueueItem[] => {
        const summary = shown.get(record.revision.id);
        return summary ? [presentQueueItem(record, summary, actor.userId, now)] : [];
      });
      const [waiting, submitted, underReview, mine, decided] = await Promise.all(
        (['waiting', 'submitted', 'under-review', 'mine', 'decided'] as const).map((state) => repository.countQueue(db, state, actor.userId, now)),
      ) as [number, number, number, number, number];
      const counts = { waiting, submitted, underReview, mine, decided };
      const last = page.at(-1);
      const at = query.state === 'decided' ? last?.decision?.decidedAt : last?.submission.submittedAt;
      return {
        items, counts, total: query.state === 'under-review' ? underReview : counts[query.state], totalIsExact: true,
        nextCursor: rows.length > query.limit && last && at ? writeCursor([at.toISOString(), last.submission.id], question) : null,
      };
    },

    async get(who: Actor, id: string): Promise<ReviewView> {
      return view(requireRole(who, 'reviewer'), id);
    },

    async claim(who: Actor, id: string): Promise<ReviewView> {
      const actor = requireRole(who, 'reviewer');
      await held(id, actor, async (tx, record, now) => {
        const renewed = liveClaim(record.submission, now)?.by === actor.userId;
        await takeClaim(tx, record, actor, now);
        if (!renewed) await appendEvents(tx, [{ at: now, actorId: actor.userId, action: 'submission.claimed', subjectType: 'submission', subjectId: id }]);
      });
      return view(actor, id);
    },

    async release(who: Actor, id: string): Promise<ReviewView> {
      const actor = requireRole(who, 'reviewer');
      await held(id, actor, async (tx, record, now) => {
        if (liveClaim(record.submission, now)?.by !== actor.userId) return;
        await repository.setClaim(tx, id, null);
        await records.changeState(tx, record.revision, 'submitted', now);
        await appendEvents(tx, [{ at: now, actorId: actor.userId, action: 'submission.released', subjectType: 'submission', subjectId: id, payload: { expired: false } }]);
      });
      return view(actor, id);
    },

    async saveChecklist(who: Actor, id: string, checklist: Checklist): Promise<ReviewView> {
      const actor = requireRole(who, 'reviewer');
      await held(id, actor, async (tx, record, now) => {
        const fresh = liveClaim(record.submission, now)?.by !== actor.userId;
        await takeClaim(tx, record, actor, now);
        await repository.setChecklist(tx, id, checklist);
        if (fresh) await appendEvents(tx, [{ at: now, actorId: actor.userId, action: 'submission.claimed', subjectType: 'submission', subjectId: id }]);
      });
      return view(actor, id);
    },

    /** A word in the discussion: by the contributor or any reviewer. Renews the speaker's own claim. */
    async comment(who: Actor, id: string, body: string): Promise<{ id: string }> {
      const actor = requireRole(who, 'contributor');
      const record = await find(id);
      if (!actor.roles.some((role) => role === 'reviewer' || role === 'curator') && record.revision.authorId !== actor.userId) throw notFound('This submission');
      const now = clock();
      return db.transaction(async (tx) => {
        await repository.lockSubmission(tx, id);
        const current = await repository.findSubmission(tx, id);
        if (!current) throw notFound('This submission');
        const commentId = await repository.insertComment(tx, { submissionId: id, authorId: actor.userId, body, createdAt: now });
        if (liveClaim(current.submission, now)?.by === actor.userId) await repository.setClaim(tx, id, { by: actor.userId, until: claimUntil(now) });
        await appendEvents(tx, [{ at: now, actorId: actor.userId, action: 'submission.commented', subjectType: 'submission', subjectId: id, payload: { comment: commentId } }]);
        return { id: commentId };
      });
    },

    /** Accepts, returns or rejects. The same decision by the same person again is a retry and changes nothing. */
    async decide(who: Actor, id: string, body: z.infer<typeof decisionBody>): Promise<void> {
      const actor = requireRole(who, 'reviewer');
      const before = await find(id);
      // Looked at again once the submission is held: a second press of the button may come while the first is under way.
      const isRetry = ({ decision }: SubmissionRecord) => decision?.decidedBy === actor.userId && decision.decision === body.decision;
      if (isRetry(before)) return;
      requireOthers(before, actor);
      const errors: { path: string; message: string }[] = [];
      if (body.decision === 'accept') {
        for (const point of checklistPoints) {
          const answer = body.checklist[point];
          if (!answer) errors.push({ path: `checklist.${point}`, message: `Answer “${checklistWords[point]}”.` });
          else if (answer === 'no') errors.push({ path: `checklist.${point}`, message: `“${checklistWords[point]}” is answered no: return it instead.` });
        }
      } else {
        if (!body.reason) errors.push({ path: 'reason', message: 'Choose the reason.' });
        if (!body.comment) errors.push({ path: 'comment', message: 'Tell the contributor what is wrong and what to do.' });
      }
      await held(id, actor, async (tx, record, now) => {
        if (errors.length > 0) throw new Refusal('invalid-input', errors[0]?.message, { errors });
        if (body.seen !== tagOf(record)) throw new Refusal('stale-version', 'This submission changed since you opened it. Look at it again before you decide.', { context: { seen: tagOf(record) } });
        const target = nextState(record.revision.state as State, body.decision);
        if (!target) throw new Refusal('state-conflict');
        await repository.setClaim(tx, id, { by: actor.userId, until: claimUntil(now) });
        await repository.insertDecision(tx, {
          submissionId: id, decision: body.decision, reason: body.decision === 'accept' ? null : (body.reason ?? null), comment: body.comment, checklist: body.checklist, decidedBy: actor.userId, decidedAt: now,
        });
        const events = target === 'accepted' ? await acceptRevision(tx, record.revision, actor.userId, now) : [];
        if (target !== 'accepted') await records.changeState(tx, record.revision, target, now);
        await appendEvents(tx, [...events, {
          at: now, actorId: actor.userId, action: `submission.${body.decision}`, subjectType: 'submission', subjectId: id, payload: { revision: record.revision.id, reason: body.reason ?? null },
        }]);
      }, isRetry);
    },

    /** Puts submissions whose claim has run out back into the queue; one round of the job. */
    async releaseExpired(): Promise<number> {
      const now = clock();
      let released = 0;
      for (const id of await repository.listExpiredClaims(db, now)) {
        await db.transaction(async (tx) => {
          await repository.lockSubmission(tx, id);
          const record = await repository.findSubmission(tx, id);
          if (!record || record.revision.state !== 'under-review' || liveClaim(record.submission, now)) return;
          await repository.setClaim(tx, id, null);
          await records.changeState(tx, record.revision, 'submitted', now);
          await appendEvents(tx, [{ at: now, actorId: null, action: 'submission.released', subjectType: 'submission', subjectId: id, payload: { expired: true } }]);
          released += 1;
        });
      }
      return released;
    },
  };
}
export type ReviewsService = ReturnType<typeof createReviewsService>;
