import { plainText } from '#shared/citations/rich-text.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { Match } from '#shared/contracts/entry-search.ts';
import { readPromoters } from '#server/features/entries/make-search-rows.service.ts';
import { wordsOf } from './free-words.ts';
import { spellings, type TermList, type VocabularyNames } from './vocabulary-names.ts';

interface Folded {
  text: string;
  /** Where each folded letter stands in the text as it is, with the end after the last. */
  at: number[];
}

/** Takes case and accents off and remembers where each letter came from. */
function fold(text: string): Folded {
  let folded = '';
  const at: number[] = [];
  let place = 0;
  for (const character of text) {
    const plain = character.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
    for (let i = 0; i < plain.length; i += 1) at.push(place);
    folded += plain;
    place += character.length;
  }
  at.push(place);
  return { text: folded, at };
}

const isWordPart = (character: string | undefined): boolean => character !== undefined && /[\p{L}\p{N}]/u.test(character);

/** The parts of the words that are looked for at the beginning of words, and the words that may stand anywhere. */
function sought(q: string): { beginnings: string[]; anywhere: string[] } {
  const words = wordsOf(q).map((word) => fold(word).text);
  return {
    beginnings: [...new Set(words.flatMap((word) => word.split(/[^\p{L}\p{N}]+/u)).filter(Boolean))],
    anywhere: [...new Set(words.filter((word) => word.length > 2 || /[^\p{L}\p{N}]/u.test(word)))],
  };
}

/** Where words stand in a text, in order, those that touch joined. */
export function rangesIn(text: string, q: string): [number, number][] {
  const { beginnings, anywhere } = sought(q);
  const folded = fold(text);
  const found: [number, number][] = [];
  const look = (word: string, atBeginning: boolean): void => {
    for (let from = folded.text.indexOf(word); from >= 0; from = folded.text.indexOf(word, from + 1)) {
      if (!atBeginning || !isWordPart(folded.text[from - 1])) found.push([folded.at[from] ?? 0, folded.at[from + word.length] ?? text.length]);
    }
  };
  for (const word of beginnings) look(word, true);
  for (const word of anywhere) look(word, false);
  found.sort((a, b) => a[0] - b[0] || a[1] - b[1]);
  const joined: [number, number][] = [];
  for (const [from, to] of found) {
    const last = joined.at(-1);
    if (last && from <= last[1]) last[1] = Math.max(last[1], to);
    else joined.push([from, to]);
  }
  return joined;
}

/** Where the words of a free text stand in an entry, part by part. A name of the vocabulary is told where the entry's own words lack it. */
export function matchesIn(entry: Entry, species: readonly string[], q: string, names: VocabularyNames): Match[] {
  const { source, step, surface, method, conditions } = entry;
  const called = (list: TermList, codes: readonly string[]): string[] => codes.flatMap((code) => names.find(list, code).flatMap(spellings));
  const parts: [Match['field'], string | null | undefined, string[]?][] = [
    ['title', source && plainText(source.title)], ['authors', source?.authors], ['container', source?.container], ['year', source?.year?.toString()], ['doi', source?.doi],
    ['step', step?.equation], ['stepClass', step?.class.replaceAll('-', ' '), called('step-class', step ? [step.class] : [])], ['species', null, called('species', species)],
    ['surface', surface?.label], ['metal', null, called('metal', surface?.formula.match(/[A-Z][a-z]?/g) ?? [])], ['support', surface?.support, called('support', surface?.support ? [surface.support] : [])],
    ['promoter', conditions.promoter, called('metal', readPromoters(conditions.promoter))],
    ['method', [method.technique, method.detail].filter(Boolean).join('; '), called('technique', method.technique ? [method.technique] : [])],
    ['conditions', [conditions.functional, conditions.text].filter(Boolean).join('; ')], ['note', entry.note], ['accession', entry.accession],
  ];
  return parts.flatMap(([field, text, also = []]) => {
    for (const one of [text ?? '', ...new Set(also)]) {
      const ranges = one === '' ? [] : rangesIn(one, q);
      if (ranges.length > 0) return [{ field, text: one, ranges }];
    }
    return [];
  });
}
