import { and, asc, count, desc, eq, ilike, isNotNull, isNull, lt, or, sql, type SQL } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchRows } from '#server/db/schema/search.ts';
import { sources } from '#server/db/schema/sources.ts';

export type SourceRow = typeof sources.$inferSelect;
export type NewSource = typeof sources.$inferInsert;

export async function findSource(db: DbOrTx, id: string): Promise<SourceRow | null> {
  const [row] = await db.select().from(sources).where(eq(sources.id, id));
  return row ?? null;
}

export async function findSourceByDoi(db: DbOrTx, doi: string): Promise<SourceRow | null> {
  const [row] = await db.select().from(sources).where(eq(sources.doi, doi));
  return row ?? null;
}

export async function findSourceByKey(db: DbOrTx, key: string): Promise<SourceRow | null> {
  const [row] = await db.select().from(sources).where(eq(sources.citationKey, key));
  return row ?? null;
}

/** A source without a DOI that has the same title and year. */
export async function findSourceByTitle(db: DbOrTx, title: string, year: number | null): Promise<SourceRow | null> {
  const [row] = await db.select().from(sources)
    .where(and(sql`lower(${sources.title}) = lower(${title})`, year === null ? isNull(sources.year) : eq(sources.year, year)));
  return row ?? null;
}

export async function listKeysLike(db: DbOrTx, key: string): Promise<string[]> {
  const rows = await db.select({ key: sources.citationKey }).from(sources).where(ilike(sources.citationKey, `${key.replace(/[%_\\]/g, '\\$&')}%`));
  return rows.map((row) => row.key);
}

export async function insertSource(db: DbOrTx, row: NewSource): Promise<SourceRow> {
  const [inserted] = await db.insert(sources).values(row).returning();
  if (!inserted) throw new Error('The source was not stored.');
  return inserted;
}

export async function updateSource(db: DbOrTx, id: string, change: Partial<NewSource>): Promise<SourceRow | null> {
  const [row] = await db.update(sources).set(change).where(eq(sources.id, id)).returning();
  return row ?? null;
}

/** Sources with a DOI that the DOI service has not confirmed yet, those longest untried first. */
export async function listUnconfirmed(db: DbOrTx, triedBefore: Date, limit: number): Promise<SourceRow[]> {
  return db.select().from(sources)
    .where(and(isNotNull(sources.doi), isNull(sources.confirmedAt), or(isNull(sources.lookedUpAt), lt(sources.lookedUpAt, triedBefore))))
    .orderBy(sql`${sources.lookedUpAt} nulls first`).limit(limit);
}

const acceptedEntries = sql<number>`(select count(*)::int from ${searchRows} where ${searchRows.sourceId} = ${sources.id} and ${searchRows.listed})`;
export type SourceSort = 'label' | 'year' | '-year' | 'entries' | '-entries';

export async function listSourceRows(
  db: DbOrTx,
  { q, sort, limit, offset }: { q: string | undefined; sort: SourceSort; limit: number; offset: number },
): Promise<{ rows: (SourceRow & { acceptedEntries: number })[]; total: number }> {
  const conditions: SQL[] = [];
  for (const word of (q ?? '').split(/\s+/).filter(Boolean).slice(0, 10)) {
    const pattern = `%${word.replace(/[%_\\]/g, '\\$&')}%`;
    const found = or(ilike(sources.title, pattern), ilike(sources.authors, pattern), ilike(sources.container, pattern), ilike(sources.doi, pattern), sql`${sources.year}::text = ${word}`);
    if (found) conditions.push(found);
  }
  const order = {
    'label': [asc(sources.label)], 'year': [sql`${sources.year} asc nulls last`], '-year': [sql`${sources.year} desc nulls last`],
    'entries': [asc(acceptedEntries)], '-entries': [desc(acceptedEntries)],
  }[sort];
  const where = and(...conditions);
  const [rows, [counted]] = await Promise.all([
    db.select({ source: sources, acceptedEntries }).from(sources).where(where).orderBy(...order, asc(sources.label), asc(sources.id)).limit(limit).offset(offset),
    db.select({ total: count() }).from(sources).where(where),
  ]);
  return { rows: rows.map((row) => ({ ...row.source, acceptedEntries: row.acceptedEntries })), total: counted?.total ?? 0 };
}

export async function countAccepted(db: DbOrTx, sourceId: string): Promise<number> {
  const [row] = await db.select({ n: count() }).from(searchRows).where(and(eq(searchRows.sourceId, sourceId), searchRows.listed));
  return row?.n ?? 0;
}
