import type { EventRecord } from '#server/db/event-log.ts';
import type { Tx } from '#server/db/pool.ts';
import { Refusal } from '#server/refusal.ts';
import * as repository from './entries.repository.ts';
import { makeSearchRows } from './make-search-rows.service.ts';

/**
 * Makes a decided revision public, inside the transaction of its decision: gives it the next version number, replaces the version before,
 * and pins the conversion. Its search row, made when it was handed in, follows by itself.
 * @returns what goes into the event log besides the decision itself.
 */
export async function acceptRevision(tx: Tx, revision: repository.RevisionRow, actorId: string, at: Date): Promise<EventRecord[]> {
  const events: EventRecord[] = [];
  const previous = await repository.findAcceptedRevision(tx, revision.entryId);
  if (previous) {
    if (!await repository.updateRevision(tx, previous, { state: 'superseded', changedAt: at, endedAt: at })) throw new Refusal('conflict');
    events.push({ at, actorId, action: 'revision.superseded', subjectType: 'revision', subjectId: previous.id, payload: { version: previous.version } });
  }
  const version = (await repository.highestVersion(tx, revision.entryId)) + 1;
  const accepted = await repository.updateRevision(tx, revision, { state: 'accepted', version, acceptedAt: at, changedAt: at });
  if (!accepted) throw new Refusal('stale-version');
  const record = await repository.loadRecord(tx, revision.id);
  if (!record) throw new Error('The accepted revision has no conversion.');
  await repository.pinConversion(tx, revision.id, record.conversion.id);
  // Handed in before rows were made at submission: it has none yet.
  await makeSearchRows(tx, [revision.id]);
  return events;
}
