import { sql } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchWords } from '#server/db/schema/search.ts';
import { editDistance } from './edit-distance.ts';

/** How many letters may be wrong in a word of a length. */
const slips = (length: number): number => (length < 7 ? 1 : 2);

/**
 * For each word that no word of the store contains: the store's words nearest to it, at most three. Words of fewer than four letters, and what is
 * not written in letters alone, are typed right or not at all.
 */
export async function nearWords(db: DbOrTx, words: readonly string[]): Promise<Map<string, string[]>> {
  const asked = words.filter((word) => /^\p{L}{4,40}$/u.test(word)).slice(0, 12);
  if (asked.length === 0) return new Map();
  const { rows } = await db.execute<{ typed: string; plain: string; near: string[] | null }>(sql`
    select typed, folded(typed) as plain, (
      select array_agg(word order by likeness desc, word) from (
        select ${searchWords.word} as word, similarity(${searchWords.word}, folded(typed)) as likeness from ${searchWords}
        where ${searchWords.word} % folded(typed) and abs(length(${searchWords.word}) - length(folded(typed))) <= 2 order by 2 desc, 1 limit 20
      ) candidates
    ) as near
    from unnest(${sql.param([...new Set(asked)])}::text[]) typed
    where not exists (select 1 from ${searchWords} where ${searchWords.word} like '%' || folded(typed) || '%')`);
  return new Map(rows.flatMap(({ typed, plain, near }) => {
    const ranked = (near ?? []).map((word) => ({ word, distance: editDistance(plain, word) })).filter(({ distance }) => distance <= slips(plain.length)).sort((a, b) => a.distance - b.distance);
    return ranked.length > 0 ? [[typed, ranked.slice(0, 3).map(({ word }) => word)] as const] : [];
  }));
}
