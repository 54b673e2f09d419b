import { asc } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { vocabularyTerms } from '#server/db/schema/vocabulary.ts';
import { createVocabularyNames, type VocabularyNames } from './vocabulary-names.ts';

/** The vocabulary as words can be looked up in it. */
export async function readVocabularyNames(db: DbOrTx): Promise<VocabularyNames> {
  const { list, code, label, synonyms, data, position } = vocabularyTerms;
  return createVocabularyNames(await db.select({ list, code, label, synonyms, data }).from(vocabularyTerms).orderBy(asc(list), asc(position), asc(code)));
}
