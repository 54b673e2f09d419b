import type { Db, Tx } from '#server/db/pool.ts';
import { loadRecords } from './entries.repository.ts';
import { SEARCH_ROW_MAKER, searchRowOf, type TermNames } from './search-row.ts';
import { insertSearchRows, listTermNames, listWithoutSearchRow, takeOldSearchRows, withoutSearchRow } from './search-rows.repository.ts';

/** Makes the search rows of frozen revisions that have none yet, and gives how many it made. */
export async function makeSearchRows(tx: Tx, revisionIds: readonly string[]): Promise<number> {
  const records = await loadRecords(tx, await withoutSearchRow(tx, revisionIds));
  if (records.length === 0) return 0;
  const known = new Map((await listTermNames(tx)).map(({ list, code, names }) => [`${list} ${code.toLowerCase()}`, names]));
  const names: TermNames = (list, code) => known.get(`${list} ${code.toLowerCase()}`) ?? [];
  return insertSearchRows(tx, records.map((record) => searchRowOf(record, names)));
}

/**
 * Makes anew the rows that an older maker made, and those that are missing, some at a time; run after the vocabulary is loaded.
 * @returns how many rows were made
 */
export async function renewSearchRows(db: Db, most = 200): Promise<number> {
  let renewed = 0;
  for (;;) {
    const made = await db.transaction(async (tx) => {
      const old = await takeOldSearchRows(tx, SEARCH_ROW_MAKER, most);
      return makeSearchRows(tx, old.length > 0 ? old : await listWithoutSearchRow(tx, most));
    });
    renewed += made;
    if (made === 0) return renewed;
  }
}
export { promoterWord, readPromoters } from './promoters.ts';
export { speciesIn } from './search-row.ts';
