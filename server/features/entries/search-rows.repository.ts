import { and, asc, inArray, isNotNull, ne, sql } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { conversions, revisions } from '#server/db/schema/entries.ts';
import { searchRows } from '#server/db/schema/search.ts';
import { vocabularyTerms } from '#server/db/schema/vocabulary.ts';

/** What the program knows of a search row; state, people and publication are filled in by the database. */
export type NewSearchRow = Omit<
  typeof searchRows.$inferInsert, 'document' | 'state' | 'contributorKey' | 'sourceLabel' | 'authorKeys' | 'doi' | 'year' | 'acceptedAt'
>;

/** Adds rows where there are none yet, and gives how many were added. */
export async function insertSearchRows(tx: Tx, rows: readonly NewSearchRow[]): Promise<number> {
  if (rows.length === 0) return 0;
  // The columns that the database fills are not null, so that something must stand there until then.
  const filled = { document: sql`''::tsvector`, state: 'draft', contributorKey: '', sourceLabel: '', authorKeys: [] };
  const made = await tx.insert(searchRows).values(rows.map((row) => ({ ...row, ...filled }))).onConflictDoNothing().returning({ id: searchRows.revisionId });
  return made.length;
}

/** Label and synonyms of every term of the vocabulary but facets, which are figures. */
export async function listTermNames(db: DbOrTx): Promise<{ list: string; code: string; names: string[] }[]> {
  const terms = await db.select({ list: vocabularyTerms.list, code: vocabularyTerms.code, label: vocabularyTerms.label, synonyms: vocabularyTerms.synonyms }).from(vocabularyTerms)
    .where(ne(vocabularyTerms.list, 'facet'));
  return terms.map(({ list, code, label, synonyms }) => ({ list, code, names: [label, ...synonyms] }));
}

/** Takes away rows that an older maker made and gives their revisions; to be made anew in the same transaction. */
export async function takeOldSearchRows(tx: Tx, maker: number, most: number): Promise<string[]> {
  const { rows } = await tx.execute<{ id: string }>(sql`select take_old_search_rows(${maker}, ${most}) as id`);
  return rows.map(({ id }) => id);
}

/** Which of some revisions have no search row. */
export async function withoutSearchRow(tx: Tx, revisionIds: readonly string[]): Promise<string[]> {
  if (revisionIds.length === 0) return [];
  const rows = await tx.select({ id: searchRows.revisionId }).from(searchRows).where(inArray(searchRows.revisionId, [...revisionIds]));
  const there = new Set(rows.map(({ id }) => id));
  return revisionIds.filter((id) => !there.has(id));
}

/** Frozen revisions without a search row. */
export async function listWithoutSearchRow(tx: Tx, most: number): Promise<string[]> {
  const rows = await tx.select({ id: revisions.id }).from(revisions).where(and(
    ne(revisions.state, 'draft'), isNotNull(revisions.stepId), isNotNull(revisions.surfaceId), isNotNull(revisions.sourceId),
    inArray(revisions.id, tx.select({ id: conversions.revisionId }).from(conversions)),
    sql`not exists (select 1 from ${searchRows} where ${searchRows.revisionId} = ${revisions.id})`,
  )).orderBy(asc(revisions.id)).limit(most);
  return rows.map(({ id }) => id);
}
