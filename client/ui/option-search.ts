import { useEffect, useMemo, useState } from 'react';
import type { PickerOption } from './picker.tsx';

type Fuse = typeof import('fuse.js').default;

let loading: Promise<Fuse> | null = null;

/** Letters as they are compared: without accents, case, and the differences between dashes and between small and plain digits. */
function foldLetters(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').replace(/[\u2010-\u2015\u2212]/g, '-').toLowerCase().trim();
}

interface Prepared<Value extends string> {
  option: PickerOption<Value>;
  label: string;
  /** Every spelling, one after another. */
  text: string;
  words: string[];
}

const prepare = <Value extends string>(option: PickerOption<Value>): Prepared<Value> => {
  const text = foldLetters([option.label, option.also ?? '', option.group ?? ''].join(' '));
  return { option, label: foldLetters(option.label), text, words: [...new Set(text.split(/[\s,;]+/).filter(Boolean))] };
};

/** How near an option is to what is typed, the nearest 0; null when its letters are other ones. */
function nearness({ label, text, words }: Prepared<string>, typed: string, tokens: readonly string[]): number | null {
  if (label === typed || words.includes(typed)) return 0;
  if (label.startsWith(typed)) return 1;
  if (tokens.every((token) => words.includes(token))) return 2;
  if (tokens.every((token) => words.some((word) => word.startsWith(token)))) return 3;
  return tokens.every((token) => text.includes(token)) ? 4 : null;
}

/** The searcher that forgives slips of the key; it comes when the first list is opened. */
function useFuse(): Fuse | null {
  const [Searcher, setSearcher] = useState<Fuse | null>(null);
  useEffect(() => {
    let gone = false;
    loading ??= import('fuse.js').then((module) => module.default);
    loading.then((found) => !gone && setSearcher(() => found), () => {
      // Not loaded (the connection was lost): letters as typed still find, and the next opening tries again.
      loading = null;
    });
    return () => {
      gone = true;
    };
  }, []);
  return Searcher;
}

/**
 * The options that have all the words typed, in any order, the closest first and otherwise as they come;
 * where none has them, those that have them with a slip of the key.
 */
export function useOptionSearch<Value extends string>(options: readonly PickerOption<Value>[], typed: string): readonly PickerOption<Value>[] {
  const Searcher = useFuse();
  const prepared = useMemo(() => options.map(prepare), [options]);
  const searcher = useMemo(
    () => Searcher && new Searcher(prepared, { keys: ['words'], threshold: 0.35, ignoreLocation: true, ignoreFieldNorm: true }),
    [Searcher, prepared],
  );
  return useMemo(() => {
    const sought = foldLetters(typed);
    if (!sought) return options;
    const tokens = sought.split(/[\s,;]+/).filter(Boolean);
    const exact = prepared.flatMap((one) => {
      const near = nearness(one, sought, tokens);
      return near === null ? [] : [{ near, option: one.option }];
    });
    if (exact.length > 0) return exact.sort((a, b) => a.near - b.near).map(({ option }) => option);
    return searcher?.search({ $and: tokens.map((token) => ({ words: token })) }).map(({ item }) => item.option) ?? [];
  }, [options, prepared, searcher, typed]);
}
