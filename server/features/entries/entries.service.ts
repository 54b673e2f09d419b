import { randomInt } from 'node:crypto';
import { requireRole, type Actor, type SignedIn } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { appendEvents, textHash, type EventRecord } from '#server/db/event-log.ts';
import { readCursor, writeCursor } from '#server/db/keyset.ts';
import { isUniqueViolation } from '#server/db/pg-errors.ts';
import type { SourcesService } from '#server/features/sources/sources.service.ts';
import type { PageHead } from '#server/http/page-head.ts';
import { notFound, Refusal, refusalFromZod } from '#server/refusal.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import { rateAtTemperature } from '#shared/assessment/rate-at-temperature.ts';
import { entryInput, type EntryChanges, type EntryDetail, type EntryForEditing, type EntryInput, type Preview } from '#shared/contracts/entries.ts';
import { accessionAlphabetSize, accessionFrom, readAccession } from '#shared/domain/accession.ts';
import type { State } from '#shared/domain/states.ts';
import { readHistory } from './history.repository.ts';
import { mergePatch } from './merge-patch.ts';
import { maySee } from './entries.policy.ts';
import { actionsFor, presentAssessed, presentDraft, presentRecord, presentStep, revisionTag } from './entries.present.ts';
import * as repository from './entries.repository.ts';
import type { EntryHead, RevisionRow } from './entries.repository.ts';
import { relatedTo } from './related.ts';
import { makeSearchRows } from './make-search-rows.service.ts';
import { headOfEntry, hiddenHead } from './entry-head.ts';
import { freezeRevision } from './freeze.ts';
import { checkAgainstStore } from './store-checks.ts';
import { describeStanding } from './standing.ts';
import { compareRevisions, findNamed } from './version-changes.ts';

const newAccession = () => accessionFrom(Array.from({ length: 6 }, () => randomInt(accessionAlphabetSize)));
const inputHash = (input: EntryInput) => textHash(JSON.stringify(input));

export function createEntriesService(context: Context, sources: SourcesService) {
  const { db, clock, publicUrl, demonstration } = context;

  async function findVisible(actor: Actor, text: string): Promise<{ head: EntryHead; all: RevisionRow[] }> {
    const accession = readAccession(text);
    const head = accession ? await repository.findEntry(db, accession) : null;
    const all = head ? await repository.listRevisions(db, head.id) : [];
    if (!head || !all.some((revision) => maySee(actor, { state: revision.state as State, authorId: revision.authorId }))) throw notFound(`Entry ${text}`);
    return { head, all };
  }

  /** The revision that is being worked at: the newest, if the actor wrote it. */
  async function findOwn(actor: SignedIn, text: string): Promise<{ head: EntryHead; all: RevisionRow[]; revision: RevisionRow }> {
    const { head, all } = await findVisible(actor, text);
    const [revision] = all;
    if (!revision) throw notFound(`Entry ${text}`);
    if (revision.authorId !== actor.userId) {
      throw maySee(actor, { state: revision.state as State, authorId: revision.authorId })
        ? new Refusal('forbidden', 'Only the contributor who wrote this revision may do that.') : new Refusal('forbidden', 'Another contributor has a revision of this entry on its way.');
    }
    return { head, all, revision };
  }

  function requireDraft(revision: RevisionRow): void {
    if (revision.state !== 'draft') throw new Refusal('state-conflict', `This revision is ${revision.state.replace('-', ' ')} and can no longer be changed.`, { context: { state: revision.state } });
  }

  /** The open revision as its contributor works at it: converted, checked, and with what still stands in the way. */
  async function forEditing(actor: Actor, head: EntryHead, revision: RevisionRow, all: RevisionRow[], fault?: EntryForEditing['faults'][number] | null): Promise<EntryForEditing> {
    const assessment = assessEntry(revision.input);
    const source = revision.sourceId ? await sources.findById(revision.sourceId) : await sources.peek(revision.input.source);
    const findings = await checkAgainstStore(db, revision.input, assessment, source, head.id);
    const faults = [...assessment.faults];
    if (fault) faults.push(fault);
    else if (!source) faults.push({ path: 'source', message: 'Name the source: a DOI, a pasted BibTeX or RIS record, or a typed citation.' });
    const last = await repository.findLastSubmission(db, head.id);
    const view = { temperatureK: null, actions: actionsFor(actor, head.contributorId, revision, all), publicUrl };
    const decision = last?.decision;
    return {
      ...presentDraft({ accession: head.accession, revision }, assessment, source, [...assessment.checks, ...findings.checks], view),
      input: revision.input, faults: revision.state === 'draft' ? faults : [], lock: revision.lock,
      lastDecision: decision
        ? { decision: decision.decision, reason: decision.reason, comment: decision.comment, by: await repository.userName(db, decision.decidedBy), at: decision.decidedAt.toISOString() }
        : null,
      submission: last?.submission.revisionId === revision.id ? last.submission.id : null,
    };
  }

  async function createWith(actor: SignedIn, input: EntryInput): Promise<{ head: EntryHead; revision: RevisionRow; fault: EntryForEditing['faults'][number] | null }> {
    const { source, fault } = await sources.resolve(input.source);
    const at = clock();
    for (let attempt = 0; ; attempt += 1) {
      const accession = newAccession();
      try {
        return await db.transaction(async (tx) => {
          const id = await repository.insertEntry(tx, { accession, contributorId: actor.userId, createdAt: at });
          const revision = await repository.insertRevision(tx, {
            entryId: id, number: 1, authorId: actor.userId, authorName: actor.name, input, inputHash: inputHash(input), sourceId: source?.id ?? null, createdAt: at, changedAt: at,
          });
          await appendEvents(tx, [{ at, actorId: actor.userId, action: 'revision.drafted', subjectType: 'revision', subjectId: revision.id, payload: { accession, revision: 1 } }]);
          return { head: { id, accession, contributorId: actor.userId }, revision, fault };
        });
      } catch (error) {
        if (!isUniqueViolation(error, 'entries_accession_key') || attempt >= 5) throw error;
      }
    }
  }

  function stale(revision: RevisionRow): Refusal {
    return new Refusal('stale-version', 'This draft was changed elsewhere since you opened it. Nothing of yours was saved yet.', {
      context: { current: { tag: revisionTag(revision), input: revision.input, changedAt: revision.changedAt.toISOString() } },
    });
  }

  async function detailOf(actor: Actor, head: EntryHead, revision: RevisionRow, all: RevisionRow[], temperatureK: number | null): Promise<EntryDetail> {
    const record = await repository.loadRecord(db, revision.id);
    const view = { temperatureK, actions: actionsFor(actor, head.contributorId, revision, all), publicUrl };
    const last = await repository.findLastSubmission(db, head.id);
    const versions = all.filter((other) => other.version !== null)
      .map((other) => ({ version: other.version ?? 0, state: other.state as State, acceptedAt: other.acceptedAt?.toISOString() ?? '' }));
    const seesAll = maySee(actor, { state: 'draft', authorId: revision.authorId });
    const revisions = all.filter((other) => maySee(actor, { state: other.state as State, authorId: other.authorId })).reverse()
      .map((other) => ({ revision: other.number, version: other.version, state: other.state as State, at: (other.acceptedAt ?? other.changedAt).toISOString() }));
    const shared = { history: await readHistory(db, head.id, seesAll), versions, revisions, submission: seesAll && last?.submission.revisionId === revision.id ? last.submission.id : null };
    if (!record) {
      const draft = await forEditing(actor, head, revision, all);
      return {
        ...draft, kAtT: null, ...shared, sourceDetail: null, sameStepAndSurface: [], reverse: [],
      };
    }
    return {
      ...presentRecord(record, view), ...shared, ...await relatedTo(db, record, temperatureK),
      sourceDetail: { citation: record.source.citation, bibtex: record.source.bibtex, ris: record.source.ris },
    };
  }

  const isPublic = (revision: RevisionRow) => revision.version !== null;

  return {
    async create(who: Actor, input: EntryInput): Promise<EntryForEditing> {
      const actor = requireRole(who, 'contributor');
      const { head, revision, fault } = await createWith(actor, input);
      return forEditing(actor, head, revision, [revision], fault);
    },

    /** Changes a draft; `seen` is the tag of the revision the caller had before them. */
    async patch(who: Actor, accession: string, patch: unknown, seen: string | null): Promise<EntryForEditing> {
      const actor = requireRole(who, 'contributor');
      const { head, all, revision } = await findOwn(actor, accession);
      requireDraft(revision);
      if (seen === null) throw new Refusal('precondition-required', 'Send If-Match with the ETag of the draft you changed.');
      if (seen !== revisionTag(revision)) throw stale(revision);
      const parsed = entryInput.safeParse(mergePatch(revision.input, patch));
      if (!parsed.success) throw refusalFromZod(parsed.error);
      const input = parsed.data;
      const { source, fault } = await sources.resolve(input.source, false);
      const at = clock();
      const changed = await db.transaction(async (tx) => {
        const row = await repository.updateRevision(tx, revision, { input, inputHash: inputHash(input), sourceId: source?.id ?? null, authorName: actor.name, changedAt: at });
        if (!row) return null;
        await appendEvents(tx, [{ at, actorId: actor.userId, action: 'revision.edited', subjectType: 'revision', subjectId: row.id, payload: { input: row.inputHash } }]);
        return row;
      });
      if (!changed) throw stale((await repository.findRevision(db, revision.id)) ?? revision);
      return forEditing(actor, head, changed, all.map((other) => (other.id === changed.id ? changed : other)), fault);
    },

    /** The newest revision as its contributor typed it. */
    async draft(who: Actor, accession: string): Promise<EntryForEditing> {
      const actor = requireRole(who, 'contributor');
      const { head, all, revision } = await findOwn(actor, accession);
      return forEditing(actor, head, revision, all);
    },

    async preview(who: Actor, input: EntryInput, temperatureK: number | null): Promise<Preview> {
      requireRole(who, 'contributor');
      const assessment = assessEntry(input);
      const source = await sources.peek(input.source);
      const { checks, neighbours } = await checkAgainstStore(db, input, assessment, source, null);
      const { surface } = assessment;
      const quantities = presentAssessed(assessment);
      return {
        step: presentStep(assessment),
        surface: surface && { ...surface, id: null },
        quantities,
        kAtT: temperatureK === null ? null : rateAtTemperature(quantities, {
          temperatureK, correlation: input.correlation ?? null, validRange: input.validRange ?? null, measured: input.method?.class === 'measured',
        }),
        checks: [...assessment.checks, ...checks], faults: assessment.faults,
        neighbours: neighbours.map(({ accession, label, energyKJPerMol, computed, sameSurface }) => ({ accession, label, energyKJPerMol, computed, sameSurface })),
      };
    },

    /** Hands a draft in: everything it says is read once more, frozen, converted and queued for review. */
    async submit(who: Actor, accession: string, seen: string | null): Promise<EntryForEditing> {
      const actor = requireRole(who, 'contributor');
      const { head, all, revision } = await findOwn(actor, accession);
      requireDraft(revision);
      if (seen !== null && seen !== revisionTag(revision)) throw stale(revision);
      const assessment = assessEntry(revision.input);
      const { source, fault } = await sources.resolve(revision.input.source);
      const faults = [...assessment.faults];
      if (fault) faults.push(fault);
      else if (!source) faults.push({ path: 'source', message: 'Name the source: a DOI, a pasted BibTeX or RIS record, or a typed citation.' });
      if (faults.length > 0 || !source) throw new Refusal('not-ready-to-submit', faults[0]?.message, { errors: faults.map(({ path, message }) => ({ path, message })), context: { faults } });
      const findings = await checkAgainstStore(db, revision.input, assessment, source, head.id);
      const last = await repository.findLastSubmission(db, head.id);
      const at = clock();
      const { input } = revision;
      const submitted = await db.transaction(async (tx) => {
        const { stepId, surfaceId } = await freezeRevision(tx, revision, assessment, [...assessment.checks, ...findings.checks], at);
        const round = (last?.submission.round ?? 0) + 1;
        const row = await repository.updateRevision(tx, revision, {
          state: 'submitted', authorName: actor.name, changedAt: at, kind: input.kind ?? null, scope: input.scope ?? null, provenance: input.provenance ?? null,
          stepId, surfaceId, sourceId: source.id, methodClass: input.method?.class ?? null, technique: input.method?.technique?.trim() || null,
          validMinK: input.validRange?.min ?? null, validMaxK: input.validRange?.max ?? null,
        });
        if (!row) return null;
        const submissionId = await repository.insertSubmission(tx, {
          entryId: head.id, revisionId: revision.id, round, previousId: last?.submission.id ?? null, submittedBy: actor.userId, submittedAt: at,
        });
        await makeSearchRows(tx, [revision.id]);
        await appendEvents(tx, [{ at, actorId: actor.userId, action: 'revision.submitted', subjectType: 'revision', subjectId: revision.id, payload: { submission: submissionId, round, input: row.inputHash } }]);
        return row;
      });
      if (!submitted) throw stale((await repository.findRevision(db, revision.id)) ?? revision);
      return forEditing(actor, head, submitted, all.map((other) => (other.id === submitted.id ? submitted : other)));
    },

    async withdraw(who: Actor, accession: string): Promise<{ accession: string; state: State }> {
      const actor = requireRole(who, 'contributor');
      const { head, all, revision } = await findOwn(actor, accession);
      if (revision.state === 'withdrawn') return { accession: head.accession, state: 'withdrawn' };
      if (!actionsFor(actor, head.contributorId, revision, all).includes('withdraw')) {
        throw new Refusal('state-conflict', `This revision is ${revision.state.replace('-', ' ')} and cannot be withdrawn.`, { context: { state: revision.state } });
      }
      const at = clock();
      const done = await db.transaction(async (tx) => {
        const row = await repository.updateRevision(tx, revision, { state: 'withdrawn', changedAt: at, endedAt: at });
        if (row) await appendEvents(tx, [{ at, actorId: actor.userId, action: 'revision.withdrawn', subjectType: 'revision', subjectId: revision.id, payload: { from: revision.state } }]);
        return row;
      });
      if (!done) throw stale((await repository.findRevision(db, revision.id)) ?? revision);
      return { accession: head.accession, state: 'withdrawn' };
    },

    /** Takes an accepted entry out of search and exports; its page goes on answering and says why. */
    async retract(who: Actor, accession: string, reason: string): Promise<{ accession: string; state: State }> {
      const actor = requireRole(who, 'reviewer');
      const { head, all } = await findVisible(actor, accession);
      const revision = all.find(({ state }) => state === 'accepted');
      if (!revision) throw new Refusal('state-conflict', 'Only an accepted entry can be retracted.');
      const at = clock();
      await db.transaction(async (tx) => {
        if (!await repository.updateRevision(tx, revision, { state: 'retracted', notice: reason, changedAt: at, endedAt: at })) throw stale(revision);
        await appendEvents(tx, [{ at, actorId: actor.userId, action: 'revision.retracted', subjectType: 'revision', subjectId: revision.id, payload: { version: revision.version } }]);
      });
      return { accession: head.accession, state: 'retracted' };
    },

    /** Opens the next draft revision, copied from the last public or returned one. */
    async revise(who: Actor, accession: string, reason: string | undefined): Promise<EntryForEditing> {
      const actor = requireRole(who, 'contributor');
      const { head, all } = await findVisible(actor, accession);
      const base = all.find((revision) => actionsFor(actor, head.contributorId, revision, all).includes('revise'));
      if (!base) {
        const open = all.find((revision) => ['draft', 'submitted', 'under-review'].includes(revision.state));
        throw open ? new Refusal('revision-open') : new Refusal('state-conflict', 'This entry cannot be revised in its present state.');
      }
      if (base.state === 'accepted' && actor.userId !== head.contributorId && !reason) {
        throw new Refusal('invalid-input', 'Say why you revise an entry that another person contributed.', { errors: [{ path: 'reason', message: 'A reason is needed.' }] });
      }
      const at = clock();
      const revision = await db.transaction(async (tx) => {
        const row = await repository.insertRevision(tx, {
          entryId: head.id, number: (all[0]?.number ?? 0) + 1, authorId: actor.userId, authorName: actor.name, input: base.input, inputHash: base.inputHash,
          sourceId: base.sourceId, reviseReason: reason ?? null, createdAt: at, changedAt: at,
        });
        const events: EventRecord[] = [{ at, actorId: actor.userId, action: 'revision.drafted', subjectType: 'revision', subjectId: row.id, payload: { accession: head.accession, revision: row.number, basedOn: base.number } }];
        await appendEvents(tx, events);
        return row;
      });
      return forEditing(actor, head, revision, [revision, ...all]);
    },

    /** An entry for reading: its public version, else the newest revision the viewer may see. */
    async get(actor: Actor, accession: string, temperatureK: number | null): Promise<EntryDetail> {
      const { head, all } = await findVisible(actor, accession);
      const visible = all.filter((revision) => maySee(actor, { state: revision.state as State, authorId: revision.authorId }));
      const revision = visible.find(({ state }) => state === 'accepted') ?? visible.find(isPublic) ?? visible[0];
      if (!revision) throw notFound(`Entry ${accession}`);
      return detailOf(actor, head, revision, all, temperatureK);
    },

    async getVersion(actor: Actor, accession: string, version: number, temperatureK: number | null): Promise<EntryDetail> {
      const { head, all } = await findVisible(actor, accession);
      const revision = all.find((other) => other.version === version);
      if (!revision) throw notFound(`Version ${version} of entry ${accession}`);
      return detailOf(actor, head, revision, all, temperatureK);
    },

    /** What differs between two versions, or between two revisions that the viewer may see. */
    async changes(actor: Actor, accession: string, { from, to }: { from: string; to: string }): Promise<EntryChanges> {
      const { head, all } = await findVisible(actor, accession);
      const visible = all.filter((revision) => maySee(actor, { state: revision.state as State, authorId: revision.authorId }));
      return compareRevisions(db, head.accession, findNamed(from, visible, accession), findNamed(to, visible, accession));
    },

    /** What the page of an entry says of itself to whoever asks without being signed in. */
    async pageHead(text: string, version: number | null): Promise<PageHead> {
      const accession = readAccession(text);
      const head = accession ? await repository.findEntry(db, accession) : null;
      const published = head ? (await repository.listRevisions(db, head.id)).filter(isPublic) : [];
      const revision = version === null ? published.find(({ state }) => state === 'accepted') ?? published[0] : published.find((one) => one.version === version);
      const record = revision ? await repository.loadRecord(db, revision.id) : null;
      return record ? headOfEntry(record, { publicUrl, demonstration }) : hiddenHead;
    },

    async versions(actor: Actor, accession: string) {
      const { all } = await findVisible(actor, accession);
      return all.filter(isPublic).map((other) => ({ version: other.version ?? 0, state: other.state as State, acceptedAt: other.acceptedAt?.toISOString() ?? '' }));
    },

    async listMine(who: Actor, query: { state?: State | undefined; limit: number; cursor?: string | undefined }) {
      const actor = requireRole(who, 'contributor');
      const question = ['mine', actor.userId, query.state ?? ''];
      const position = query.cursor ? readCursor(query.cursor, question, 2) : null;
      const before = position ? { changedAt: new Date(String(position[0])), id: String(position[1]) } : null;
      const rows = await repository.listOwnRevisions(db, { userId: actor.userId, state: query.state, limit: query.limit + 1, before });
      const page = rows.slice(0, query.limit);
      const counts = await repository.countOwnByState(db, actor.userId);
      const items = await Promise.all(page.map(async ({ accession, contributorId, revision }) => {
        const all = await repository.listRevisions(db, revision.entryId);
        return describeStanding({
          accession, revision, actions: actionsFor(actor, contributorId, revision, all), last: await repository.findLastSubmission(db, revision.entryId),
          source: revision.sourceId ? await sources.findById(revision.sourceId) : null,
        });
      }));
      const lastRow = page.at(-1)?.revision;
      return {
        items, total: query.state ? (counts[query.state] ?? 0) : Object.values(counts).reduce((sum, n) => sum + n, 0), totalIsExact: true,
        nextCursor: rows.length > query.limit && lastRow ? writeCursor([lastRow.changedAt.toISOString(), lastRow.id], question) : null, counts,
      };
    },

    /** What has been taken from a source already, as far as the viewer may know. */
    async listOfSource(actor: Actor, sourceId: string) {
      const rows = await repository.listBySource(db, sourceId, null);
      return rows.filter(({ revision }) => maySee(actor, { state: revision.state as State, authorId: revision.authorId })).map((row) => {
        const primary = row.input.quantities?.[0];
        return { accession: row.accession, equation: row.equation, surface: row.surface, asPrinted: primary ? `${primary.asPrinted} ${primary.unitAsPrinted}`.trim() : '', state: row.revision.state };
      });
    },
  };
}
export type EntriesService = ReturnType<typeof createEntriesService>;
