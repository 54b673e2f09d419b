import { bigint, check, customType, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { users } from './accounts.ts';
import { oneOf } from './checks.ts';
import { code, id, instant } from './columns.ts';

const bytes = customType<{ data: Buffer }>({ dataType: () => 'bytea' });

/**
 * The event log: audit trail and change sequence in one. Appended as the last act of a transaction; the database itself numbers the row,
 * chains its hash to the row before, and refuses to change or delete it. The payload holds opaque ids and hashes, never a name or a text.
 */
export const events = pgTable('events', {
  seq: bigint('seq', { mode: 'number' }).primaryKey(),
  /** When it happened, by the service's clock. */
  at: instant('at').notNull(),
  /** When the database wrote it down, by its own clock. */
  recordedAt: instant('recorded_at').notNull().defaultNow(),
  actorId: uuid('actor_id'),
  action: code('action').notNull(),
  subjectType: code('subject_type').notNull(),
  subjectId: uuid('subject_id').notNull(),
  payload: jsonb('payload').$type<Record<string, unknown>>().notNull(),
  previousHash: bytes('previous_hash').notNull(),
  hash: bytes('hash').notNull(),
}, (t) => [unique('events_hash_key').on(t.hash), index('events_subject_idx').on(t.subjectType, t.subjectId, t.seq)]);

export const outboxStates = ['pending', 'sending', 'sent', 'failed', 'uncertain'] as const;

/** Messages to be sent after the transaction that caused them; each at most once, every other accounted for. */
export const outbox = pgTable('outbox', {
  id: id(),
  eventSeq: bigint('event_seq', { mode: 'number' }).notNull().references(() => events.seq),
  recipientId: uuid('recipient_id').notNull().references(() => users.id),
  template: code('template').notNull(),
  parameters: jsonb('parameters').$type<Record<string, unknown>>().notNull(),
  messageId: text('message_id').notNull(),
  state: code('state').notNull().default('pending'),
  attempts: integer('attempts').notNull().default(0),
  nextAttemptAt: instant('next_attempt_at').notNull().defaultNow(),
  lastError: text('last_error'),
  createdAt: instant('created_at').notNull().defaultNow(),
}, (t) => [unique('outbox_message_id_key').on(t.messageId), check('outbox_state_check', oneOf(t.state, outboxStates)), index('outbox_state_idx').on(t.state, t.nextAttemptAt)]);

/** Marks that something was done once for this database, such as loading the demonstration data. */
export const milestones = pgTable('milestones', { name: code('name').primaryKey(), at: instant('at').notNull().defaultNow() });
