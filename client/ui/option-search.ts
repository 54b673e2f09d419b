import { useEffect, useMemo, useState } from 'react';
import type { PickerOption } from './picker.tsx';

type Fuse = typeof import('fuse.js').default;

let loading: Promise<Fuse> | null = null;

/** The options that are spelled like what is typed, the closest first; slips of the key are forgiven once the searcher is loaded. */
export function useOptionSearch<Value extends string>(options: readonly PickerOption<Value>[], typed: string): readonly PickerOption<Value>[] {
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
  const searcher = useMemo(
    () => Searcher && new Searcher(options, { keys: ['label', 'also', 'value'], threshold: 0.35, ignoreLocation: true }),
    [Searcher, options],
  );
  if (!typed) return options;
  if (searcher) return searcher.search(typed).map((result) => result.item);
  const letters = typed.toLowerCase();
  return options.filter((option) => `${option.label} ${option.also ?? ''} ${option.value}`.toLowerCase().includes(letters));
}
