import { useMemo } from 'react';
import { energyTypes, kinds, provenances, sampleTypes, scopes, siteTypes } from '#shared/domain/kinds.ts';
import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { Picker, type PickerOption } from '#client/ui/picker.tsx';
import { joinWords, termsOf, valueWords, type ListFilter, type SentencePart } from '../filter-words.ts';

/** A list of the reader's own, by its name. */
export interface NamedCollection {
  id: string;
  name: string;
}

interface FilterPickerProps {
  part: SentencePart;
  filter: EntryFilter;
  counts: AllFilterCounts | null | undefined;
  vocabulary: Vocabulary | undefined;
  collections?: readonly NamedCollection[] | undefined;
  onChange: (change: Partial<EntryFilter>) => void;
}

/** One part of the query sentence: its words, and the list of values with the entries each would find. */
export function FilterPicker({ part, filter, counts, vocabulary, collections, onChange }: FilterPickerProps) {
  const held = filter[part.filter];
  const chosen = useMemo(() => (held === undefined ? [] : Array.isArray(held) ? held.map(String) : [String(held)]), [held]);
  const options = useMemo(() => optionsFor(part.filter, chosen, counts, vocabulary, collections), [part.filter, chosen, counts, vocabulary, collections]);
  const label = (value: string) => options.find((option) => option.value === value)?.label ?? value;
  const names = chosen.map(label);
  const text = chosen.length === 0 ? part.unset : chosen.length <= part.sayUpTo ? join(part.filter, names) : `${chosen.length} ${part.several}`;

  function change(next: readonly string[], toggled?: string) {
    const kept = part.single ? next.filter((value) => value === toggled) : next;
    const value = part.filter === 'hasUncertainty' ? kept[0] && kept[0] === 'true' : kept;
    onChange({ [part.filter]: kept.length > 0 ? value : undefined });
  }

  return (
    <Picker
      label={part.title}
      summary={text}
      summaryText={text}
      options={options}
      chosen={chosen}
      clearLabel={chosen.length > 0 ? part.unset.replace(/^./, (first) => first.toUpperCase()) : ''}
      onChange={change}
      {...(counts ? {} : { empty: 'Fetching what there is to choose from.' })}
      {...(options.length > 8 ? { recent: part.filter } : {})}
    />
  );
}

/** Short symbols are listed as on a blackboard ("111, 0001"), words as in speech ("foil or film"). */
function join(filter: ListFilter, names: readonly string[]): string {
  return filter === 'facet' ? names.join(', ') : joinWords(names, filter === 'kind' ? 'and' : 'or');
}

/** The values to choose from, those that find most first; a chosen one stays in the list when it finds nothing. */
function optionsFor(
  filter: ListFilter, chosen: readonly string[], counts: AllFilterCounts | null | undefined, vocabulary: Vocabulary | undefined, collections: readonly NamedCollection[] | undefined,
): PickerOption[] {
  const terms = termsOf(filter, vocabulary);
  const options = filter === 'collection'
    ? (collections ?? []).map(({ id, name }) => ({ value: id, label: name }))
    : (counts?.[filter] ?? []).map(({ value, label, count }) => ({ value, label: filter === 'source' ? label : worded(filter, value, label), count, also: alsoOf(filter, value, terms) }));
  const known = new Set(options.map(({ value }) => value));
  // What finds nothing now can be asked all the same: the answer says what stands against it. Long lists keep it for those who type.
  const others = counts ? [...closedLists[filter] ?? [], ...terms.map(({ code }) => code)] : [];
  const rest = [...new Set([...chosen, ...others])].filter((value) => !known.has(value)).map((value) => ({
    value, label: filter === 'collection' ? 'a collection of yours' : valueWords(filter, value, vocabulary), also: alsoOf(filter, value, terms),
    ...(counts && filter !== 'collection' ? { count: 0 } : {}), ...(terms.length > 0 ? { deep: true } : {}),
  }));
  return [...options, ...rest];
}

/** Filters whose values are known beforehand, whatever the store holds. */
const closedLists: Partial<Record<ListFilter, readonly string[]>> = {
  kind: kinds, site: siteTypes, sampleType: sampleTypes, scope: scopes, energyType: energyTypes, provenance: provenances, hasUncertainty: ['true', 'false'],
};

/** The words of the sentence where it has its own; else those that came with the count. */
function worded(filter: ListFilter, value: string, label: string): string {
  const words = valueWords(filter, value);
  return words === value ? label : words;
}

function alsoOf(filter: ListFilter, value: string, terms: ReturnType<typeof termsOf>): string {
  const term = terms.find((one) => one.code === value);
  return [value, term?.label, ...(term?.synonyms ?? []), filter === 'promoter' && value === 'none' ? 'clean unpromoted' : '', filter === 'site' ? 'steps edges' : ''].filter(Boolean).join(', ');
}
