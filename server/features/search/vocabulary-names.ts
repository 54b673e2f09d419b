/** A word of the vocabulary with the list it belongs to. */
export interface NamedTerm {
  list: string;
  code: string;
  label: string;
  synonyms: readonly string[];
  data: Readonly<Record<string, unknown>>;
}

export type TermList = 'metal' | 'facet' | 'technique' | 'support' | 'step-class' | 'species';

/** The vocabulary, asked by words as people type them. */
export interface VocabularyNames {
  /** Terms of a list that a word names: by code, label or synonym, whatever its case, accents and dashes. */
  find(list: TermList, word: string): readonly NamedTerm[];
  term(list: TermList, code: string): NamedTerm | undefined;
  all(list: TermList): readonly NamedTerm[];
}

/** Words as they are compared: without accents, case and the difference between dashes, hyphens and spaces. */
export const foldWords = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase().replace(/[\s\u2010-\u2015-]+/g, ' ').trim();

/** Every spelling of a term. */
export const spellings = ({ code, label, synonyms }: NamedTerm): string[] => [...new Set([code, label, ...synonyms])];

export function createVocabularyNames(terms: readonly NamedTerm[]): VocabularyNames {
  const named = new Map<string, NamedTerm[]>();
  for (const term of terms) {
    for (const name of new Set(spellings(term).map(foldWords))) {
      const key = `${term.list} ${name}`;
      named.set(key, [...(named.get(key) ?? []), term]);
    }
  }
  return {
    find: (list, word) => named.get(`${list} ${foldWords(word)}`) ?? [],
    term: (list, code) => terms.find((one) => one.list === list && one.code === code),
    all: (list) => terms.filter((one) => one.list === list),
  };
}
