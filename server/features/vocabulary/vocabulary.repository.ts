import { asc, count, eq, sql } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { searchRows } from '#server/db/schema/search.ts';
import { vocabularyTerms } from '#server/db/schema/vocabulary.ts';

export type TermRow = typeof vocabularyTerms.$inferSelect;

export async function listTerms(db: DbOrTx): Promise<TermRow[]> {
  return db.select().from(vocabularyTerms).orderBy(asc(vocabularyTerms.list), asc(vocabularyTerms.position), asc(vocabularyTerms.code));
}

/** Adds or renews a term of the vocabulary that ships with the product. */
export async function saveTerm(tx: Tx, row: TermRow): Promise<void> {
  await tx.insert(vocabularyTerms).values(row).onConflictDoUpdate({
    target: [vocabularyTerms.list, vocabularyTerms.code], set: { label: row.label, synonyms: row.synonyms, data: row.data, position: row.position },
  });
}

/** The elementary steps that accepted entries are about, the commonest first. */
export async function listKnownSteps(db: DbOrTx): Promise<{ key: string; equation: string; stepClass: string; n: number }[]> {
  return db.select({
    key: searchRows.stepKey, equation: sql<string>`coalesce(min(${searchRows.equation}) filter (where ${searchRows.stepDirection} = 1), min(${searchRows.equation}))`,
    stepClass: sql<string>`min(${searchRows.stepClass})`, n: count(),
  }).from(searchRows).where(eq(searchRows.listed, true)).groupBy(searchRows.stepKey).orderBy(sql`count(*) desc`, asc(searchRows.stepKey)).limit(500);
}
