import { createHash } from 'node:crypto';
import type { Tx } from './pool.ts';
import { events } from './schema/log.ts';

export interface EventRecord {
  at: Date;
  actorId: string | null;
  /** What happened, as `subject.verb`. */
  action: string;
  subjectType: 'entry' | 'revision' | 'submission' | 'source' | 'user' | 'vocabulary' | 'collection';
  subjectId: string;
  /** Opaque ids, codes, numbers and hashes only: nothing that names a person or repeats a text. */
  payload?: Record<string, string | number | boolean | null>;
}

/**
 * Appends to the event log, as the last act of a transaction: from here to the commit no other transaction can append,
 * so that the log's order is the order of commits. The database numbers and chains the rows.
 */
export async function appendEvents(tx: Tx, records: readonly EventRecord[]): Promise<void> {
  for (const record of records) {
    await tx.insert(events).values({
      at: record.at, actorId: record.actorId, action: record.action, subjectType: record.subjectType, subjectId: record.subjectId,
      payload: record.payload ?? {},
      // The trigger sets these; the values here only satisfy the column definitions.
      seq: 0, previousHash: Buffer.alloc(0), hash: Buffer.alloc(0),
    });
  }
}

/** SHA-256 of a text, in hexadecimal, for payloads that must not hold the text itself. */
export function textHash(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}
