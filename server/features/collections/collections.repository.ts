import { and, asc, count, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { collectionEntries, collections } from '#server/db/schema/collections.ts';
import { entries, revisions } from '#server/db/schema/entries.ts';
import { everAcceptedStates } from '#shared/domain/states.ts';

export type CollectionRow = typeof collections.$inferSelect;

export async function listCollections(db: DbOrTx, ownerId: string) {
  return db.select({ id: collections.id, name: collections.name, description: collections.description, changedAt: collections.changedAt, entries: count(collectionEntries.entryId) })
    .from(collections).leftJoin(collectionEntries, eq(collectionEntries.collectionId, collections.id))
    .where(and(eq(collections.ownerId, ownerId), isNull(collections.discardedAt)))
    .groupBy(collections.id).orderBy(desc(collections.changedAt), asc(collections.id));
}

/** A person's collection, kept or discarded; locked for the rest of the transaction when asked. */
export async function findCollection(db: DbOrTx, ownerId: string, id: string, lock = false): Promise<CollectionRow | null> {
  const found = db.select().from(collections).where(and(eq(collections.id, id), eq(collections.ownerId, ownerId)));
  const [row] = await (lock ? found.for('update') : found);
  return row ?? null;
}

export async function countCollections(db: DbOrTx, ownerId: string): Promise<number> {
  const [row] = await db.select({ n: count() }).from(collections).where(and(eq(collections.ownerId, ownerId), isNull(collections.discardedAt)));
  return row?.n ?? 0;
}

export async function insertCollection(tx: Tx, row: { ownerId: string; name: string; description: string; at: Date }): Promise<CollectionRow> {
  const [stored] = await tx.insert(collections).values({ ownerId: row.ownerId, name: row.name, description: row.description, createdAt: row.at, changedAt: row.at }).returning();
  if (!stored) throw new Error('The collection was not stored.');
  return stored;
}

export async function updateCollection(tx: Tx, id: string, change: Partial<Pick<CollectionRow, 'name' | 'description' | 'changedAt' | 'discardedAt'>>): Promise<void> {
  await tx.update(collections).set(change).where(eq(collections.id, id));
}

/** Ids of the entries that were ever public, by accession. */
export async function findPublicEntries(db: DbOrTx, accessions: readonly string[]): Promise<Map<string, string>> {
  const rows = await db.selectDistinct({ id: entries.id, accession: entries.accession }).from(entries)
    .innerJoin(revisions, eq(revisions.entryId, entries.id)).where(and(inArray(entries.accession, [...accessions]), inArray(revisions.state, [...everAcceptedStates])));
  return new Map(rows.map(({ id, accession }) => [accession, id]));
}

export async function insertEntries(tx: Tx, collectionId: string, entryIds: readonly string[], at: Date): Promise<number> {
  const added = await tx.insert(collectionEntries).values(entryIds.map((entryId) => ({ collectionId, entryId, addedAt: at }))).onConflictDoNothing().returning({ entryId: collectionEntries.entryId });
  return added.length;
}

export async function deleteEntries(tx: Tx, collectionId: string, entryIds: readonly string[]): Promise<number> {
  const gone = await tx.delete(collectionEntries).where(and(eq(collectionEntries.collectionId, collectionId), inArray(collectionEntries.entryId, [...entryIds]))).returning({ entryId: collectionEntries.entryId });
  return gone.length;
}

export async function countEntries(db: DbOrTx, collectionId: string): Promise<number> {
  const [row] = await db.select({ n: count() }).from(collectionEntries).where(eq(collectionEntries.collectionId, collectionId));
  return row?.n ?? 0;
}

/** The entries of a collection with the state of their newest public version, in the order they were added. */
export async function listEntries(db: DbOrTx, collectionId: string) {
  const state = sql<string>`(select r.state from ${revisions} r where r.entry_id = ${entries.id} and r.version is not null order by r.version desc limit 1)`;
  return db.select({ accession: entries.accession, addedAt: collectionEntries.addedAt, state })
    .from(collectionEntries).innerJoin(entries, eq(entries.id, collectionEntries.entryId))
    .where(eq(collectionEntries.collectionId, collectionId)).orderBy(asc(collectionEntries.addedAt), asc(entries.accession));
}

/** Accessions of the entries in some of a person's kept collections. */
export async function listAccessions(db: DbOrTx, ownerId: string, ids: readonly string[]): Promise<string[]> {
  const rows = await db.selectDistinct({ accession: entries.accession }).from(collections)
    .innerJoin(collectionEntries, eq(collectionEntries.collectionId, collections.id)).innerJoin(entries, eq(entries.id, collectionEntries.entryId))
    .where(and(eq(collections.ownerId, ownerId), inArray(collections.id, [...ids]), isNull(collections.discardedAt)));
  return rows.map(({ accession }) => accession);
}
