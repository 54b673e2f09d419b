import type { Context } from '#server/context.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import * as repository from './vocabulary.repository.ts';

export function createVocabularyService({ db }: Context) {
  return {
    async get(): Promise<Vocabulary> {
      const [terms, steps] = await Promise.all([repository.listTerms(db), repository.listKnownSteps(db)]);
      const list = (name: string) => terms.filter((term) => term.list === name).map(({ code, label, synonyms, data }) => ({ code, label, synonyms, data }));
      return {
        metals: list('metal'), facets: list('facet'), techniques: list('technique'), supports: list('support'), stepClasses: list('step-class'), alloys: list('alloy'), sites: list('site'),
        steps: steps.map(({ key, equation, stepClass, n }) => ({ code: key, label: equation, synonyms: [], data: { class: stepClass, entries: n } })),
      };
    },

    /** Loads the vocabulary that ships with the product; running it again changes nothing. */
    async load(terms: { list: string; code: string; label: string; synonyms: string[]; data: Record<string, unknown> }[]): Promise<void> {
      await db.transaction(async (tx) => {
        for (const [position, term] of terms.entries()) await repository.saveTerm(tx, { ...term, position });
      });
    },
  };
}
export type VocabularyService = ReturnType<typeof createVocabularyService>;
