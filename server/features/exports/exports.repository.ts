import { asc, inArray } from 'drizzle-orm';
import { drizzle } from 'drizzle-orm/node-postgres';
import type pg from 'pg';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchRows } from '#server/db/schema/search.ts';
import { sources } from '#server/db/schema/sources.ts';
import { loadRecords, type EntryRecord } from '#server/features/entries/records.service.ts';
import { exportOrder, filterConditions, type SearchFilter } from '#server/features/search/search.service.ts';

const batchSize = 500;

/** One consistent picture of the database for as long as an export runs. */
export async function inSnapshot<T>(client: pg.PoolClient, work: (db: DbOrTx) => Promise<T>): Promise<T> {
  await client.query('begin isolation level repeatable read read only');
  try {
    return await work(drizzle(client) as DbOrTx);
  } finally {
    await client.query('rollback').catch(() => undefined);
  }
}

/** Every accepted entry that a filter finds, a batch at a time, in the order of accessions. */
export async function* walkEntries(db: DbOrTx, filter: SearchFilter): AsyncGenerator<EntryRecord[]> {
  const conditions = filterConditions(filter);
  let after: string | null = null;
  for (;;) {
    const page: { id: string; accession: string }[] = await db.select({ id: searchRows.revisionId, accession: searchRows.accession }).from(searchRows)
      .where(exportOrder(conditions, after)).orderBy(asc(searchRows.accession)).limit(batchSize);
    if (page.length === 0) return;
    yield await loadRecords(db, page.map(({ id }) => id));
    after = page.at(-1)?.accession ?? null;
    if (page.length < batchSize) return;
  }
}

/** The rendered BibTeX of sources, a batch at a time, in the order of citation keys. */
export async function* walkBibtex(db: DbOrTx, sourceIds: readonly string[]): AsyncGenerator<string[]> {
  for (let from = 0; from < sourceIds.length; from += batchSize) {
    const rows = await db.select({ bibtex: sources.bibtex }).from(sources).where(inArray(sources.id, sourceIds.slice(from, from + batchSize))).orderBy(asc(sources.citationKey));
    yield rows.map(({ bibtex }) => bibtex);
  }
}
