import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import type { Tx } from '#server/db/pool.ts';
import { presentSource } from '#server/features/sources/sources.service.ts';
import { notFound, Refusal } from '#server/refusal.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import type { Entry, EntryInput } from '#shared/contracts/entries.ts';
import type { QueueItem, ReviewView } from '#shared/contracts/reviews.ts';
import type { State } from '#shared/domain/states.ts';
import { actionsFor, presentRecord } from './entries.present.ts';
import * as repository from './entries.repository.ts';
import { checkAgainstStore } from './store-checks.ts';

export type ReviewSummary = Pick<QueueItem, 'equation' | 'surface' | 'asPrinted' | 'unitAsPrinted' | 'sourceLabel' | 'checks'>;

/** What other features may ask of frozen revisions. */
export function createEntryRecordsService({ db, publicUrl }: Context) {
  return {
    userName: (userId: string) => repository.userName(db, userId),

    /** Moves a revision to another state; the database refuses what the state machine does not allow. */
    async changeState(tx: Tx, revision: repository.RevisionRow, state: State, at: Date): Promise<repository.RevisionRow> {
      const ended = state === 'rejected' || state === 'returned' ? { endedAt: at } : {};
      const row = await repository.updateRevision(tx, revision, { state, changedAt: at, ...ended });
      if (!row) throw new Refusal('stale-version', 'This submission changed meanwhile. Look at it again.');
      return row;
    },

    async summaries(revisionIds: string[]): Promise<Map<string, ReviewSummary>> {
      const records = await repository.loadRecords(db, revisionIds);
      return new Map(records.map((record) => {
        const primary = record.quantities[0]?.printed;
        return [record.revision.id, {
          equation: record.step.equation, surface: record.surface.label, asPrinted: primary?.asPrinted ?? '', unitAsPrinted: primary?.unitAsPrinted ?? '',
          sourceLabel: record.source.label, checks: record.checks as Entry['checks'],
        }];
      }));
    },

    /** Public entries for a list, in the order asked for. */
    async list(actor: Actor, revisionIds: string[], temperatureK: number | null): Promise<Entry[]> {
      const records = await repository.loadRecords(db, revisionIds);
      const openOnes = await repository.listOpenRevisions(db, records.map(({ revision }) => revision.entryId));
      return records.map((record) => presentRecord(record, {
        temperatureK, publicUrl,
        actions: actionsFor(actor, record.contributorId, record.revision, [record.revision, ...openOnes.filter(({ entryId }) => entryId === record.revision.entryId)]),
      }));
    },

    /** A submission as its reviewer sees it, with the checks of today and the neighbours it lies among. */
    async forReview(actor: Actor, revisionId: string, accession: string): Promise<{ entry: Entry; neighbours: ReviewView['neighbours'] }> {
      const record = await repository.loadRecord(db, revisionId);
      if (!record) throw notFound(`Entry ${accession}`);
      const all = await repository.listRevisions(db, record.revision.entryId);
      const assessment = assessEntry(record.revision.input);
      const findings = await checkAgainstStore(db, record.revision.input, assessment, presentSource(record.source), record.revision.entryId);
      const entry = presentRecord(record, { temperatureK: null, actions: actionsFor(actor, record.contributorId, record.revision, all), publicUrl });
      const open = record.revision.state === 'submitted' || record.revision.state === 'under-review';
      return {
        entry: open ? { ...entry, checks: [...assessment.checks, ...findings.checks] } : entry,
        neighbours: findings.neighbours.map(({ accession: other, label, energyKJPerMol, computed, sameSurface }) => ({ accession: other, label, energyKJPerMol, computed, sameSurface })),
      };
    },

    /** What the last public version, or the last returned one, before a revision said; null for a first one. */
    async publicInput(entryId: string, beforeNumber: number): Promise<EntryInput | null> {
      const all = await repository.listRevisions(db, entryId);
      const earlier = all.filter(({ number, state }) => number < beforeNumber && state !== 'withdrawn' && state !== 'draft');
      return earlier[0]?.input ?? null;
    },
  };
}
export type EntryRecordsService = ReturnType<typeof createEntryRecordsService>;
export { loadRecords, type EntryRecord } from './entries.repository.ts';
export { presentRecord } from './entries.present.ts';
