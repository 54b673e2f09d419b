import { eq, sql } from 'drizzle-orm';
import type { Tx } from '#server/db/pool.ts';
import { searchRows } from '#server/db/schema/search.ts';

/** A search row before the database has made its full-text document. */
export type NewSearchRow = Omit<typeof searchRows.$inferInsert, 'document'>;

export async function insertSearchRow(tx: Tx, row: NewSearchRow): Promise<void> {
  await tx.insert(searchRows).values({ ...row, document: sql`to_tsvector('simple', unaccent(${row.searchText}))` });
}

export async function unlistSearchRow(tx: Tx, revisionId: string): Promise<void> {
  await tx.update(searchRows).set({ listed: false }).where(eq(searchRows.revisionId, revisionId));
}
