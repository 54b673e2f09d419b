import { index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { users } from './accounts.ts';
import { id, instant } from './columns.ts';
import { entries } from './entries.ts';

/** A reader's own list of entries. Entries, not versions: a list follows its entries; editions will hold versions. */
export const collections = pgTable('collections', {
  id: id(),
  ownerId: uuid('owner_id').notNull().references(() => users.id),
  name: text('name').notNull(),
  description: text('description').notNull(),
  createdAt: instant('created_at').notNull(),
  changedAt: instant('changed_at').notNull(),
  discardedAt: instant('discarded_at'),
}, (t) => [index('collections_owner_idx').on(t.ownerId, t.changedAt)]);

export const collectionEntries = pgTable('collection_entries', {
  collectionId: uuid('collection_id').notNull().references(() => collections.id),
  entryId: uuid('entry_id').notNull().references(() => entries.id),
  addedAt: instant('added_at').notNull(),
}, (t) => [primaryKey({ columns: [t.collectionId, t.entryId] }), index('collection_entries_entry_idx').on(t.entryId)]);
