import { useMemo, type ReactNode } from 'react';
import type { EntryFilter, FilterCounts } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { Equation } from '#client/ui/equation.tsx';
import { Picker, type PickerOption } from '#client/ui/picker.tsx';
import { joinWords, termsOf, valueWords, type ListFilter, type SentencePart } from '../filter-words.ts';

interface FilterPickerProps {
  part: SentencePart;
  filter: EntryFilter;
  counts: FilterCounts | null | undefined;
  vocabulary: Vocabulary | undefined;
  onChange: (change: Partial<EntryFilter>) => void;
}

/** One part of the query sentence: its words, and the list of values with the entries each would find. */
export function FilterPicker({ part, filter, counts, vocabulary, onChange }: FilterPickerProps) {
  const chosen = (filter[part.filter] ?? noValues) as readonly string[];
  const options = useMemo(() => optionsFor(part.filter, chosen, counts, vocabulary), [part.filter, chosen, counts, vocabulary]);
  const label = (value: string) => options.find((option) => option.value === value)?.label ?? value;
  const said = chosen.length <= part.sayUpTo;
  const names = chosen.map(label);
  const text = chosen.length === 0 ? part.unset : said ? join(part.filter, names) : `${chosen.length} ${part.several}`;
  const words: ReactNode = part.filter === 'step' && said && names[0] ? <Equation equation={names[0]} /> : text;
  return (
    <Picker
      label={part.title}
      summary={words}
      summaryText={text}
      options={options}
      chosen={chosen}
      clearLabel={chosen.length > 0 ? part.unset.replace(/^./, (first) => first.toUpperCase()) : ''}
      onChange={(next) => onChange({ [part.filter]: next.length > 0 ? next : undefined })}
    />
  );
}

const noValues: readonly string[] = [];

/** Short symbols are listed as on a blackboard ("Ru, Ni"), words as in speech ("foil or film"). */
function join(filter: ListFilter, names: readonly string[]): string {
  return filter === 'metal' || filter === 'contains' || filter === 'facet' ? names.join(', ') : joinWords(names, filter === 'kind' ? 'and' : 'or');
}

/** The values to choose from, those that find most first; a chosen one stays in the list when it finds nothing. */
function optionsFor(
  filter: ListFilter, chosen: readonly string[], counts: FilterCounts | null | undefined, vocabulary: Vocabulary | undefined,
): PickerOption[] {
  const terms = termsOf(filter, vocabulary);
  const counted = countsFor(filter, counts);
  const known = new Set(counted.map((one) => one.value));
  const rest = chosen.filter((value) => !known.has(value)).map((value) => ({ value, label: valueWords(filter, value, vocabulary), count: counts ? 0 : undefined }));
  return [...counted, ...rest].map(({ value, label, count }) => {
    const term = terms.find((one) => one.code === value);
    const words = filter === 'method' || filter === 'step' || filter === 'stepClass' || filter === 'facet' ? label : valueWords(filter, value, vocabulary);
    const name = (filter === 'metal' || filter === 'contains') && term ? term.label : '';
    return {
      value,
      label: words,
      count,
      also: [...(term?.synonyms ?? []), name].join(' '),
      ...(filter === 'step' ? { display: <Equation equation={words} /> } : {}),
      ...(name && name !== words ? { group: name } : {}),
    };
  });
}

function countsFor(filter: ListFilter, counts: FilterCounts | null | undefined): readonly { value: string; label: string; count: number }[] {
  if (!counts) return [];
  switch (filter) {
    case 'method': return [...counts.methodClass.map((one) => ({ ...one, label: valueWords('method', one.value) })), ...counts.method];
    case 'contains': return counts.metal;
    case 'bond':
    case 'source': return [];
    default: return counts[filter];
  }
}
