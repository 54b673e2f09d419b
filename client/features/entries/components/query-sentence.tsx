import { Fragment, useEffect, useRef, useState, type ReactNode } from 'react';
import type { EntryFilter, FilterCounts } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { energyIn, energyToKJPerMol } from '#client/lib/numbers.ts';
import { NumberPicker } from '#client/ui/number-picker.tsx';
import { Picker } from '#client/ui/picker.tsx';
import {
  addable, fixedParts, furtherParts, isEnergyKind, joinWords, rangeWords, valueRangeWords, valueWords, type ListFilter, type SentencePart,
} from '../filter-words.ts';
import { FilterPicker } from './filter-picker.tsx';
import { RangePicker } from './range-picker.tsx';

interface QuerySentenceProps {
  filter: EntryFilter;
  counts: FilterCounts | null | undefined;
  vocabulary: Vocabulary | undefined;
  onChange: (change: Partial<EntryFilter>) => void;
}

type Addition = ListFilter | 'year' | 'value';

/** The filters as a sentence whose emphasised parts are pickers. */
export function QuerySentence({ filter, counts, vocabulary, onChange }: QuerySentenceProps) {
  const { temperatureK, unit } = useInstrument();
  const root = useRef<HTMLDivElement>(null);
  /** Parts the reader has asked for and not set yet. */
  const [added, setAdded] = useState<readonly Addition[]>([]);
  const [last, setLast] = useState<Addition | null>(null);
  const shared = { filter, counts, vocabulary };
  const oneKind = filter.kind?.length === 1 ? filter.kind[0] : undefined;
  const energy = oneKind !== undefined && isEnergyKind(oneKind);

  const shows = (part: Addition): boolean => {
    if (part === 'year') return filter.yearFrom !== undefined || filter.yearTo !== undefined || added.includes(part);
    if (part === 'value') return filter.valueMin !== undefined || filter.valueMax !== undefined || (added.includes(part) && oneKind !== undefined);
    return (filter[part] !== undefined) || added.includes(part);
  };

  /** Limits of a value belong to one kind: another kind takes them away. */
  const changeKind = (change: Partial<EntryFilter>) => onChange({ ...change, valueMin: undefined, valueMax: undefined });

  // A part that was asked for takes the focus, so that it can be set at once.
  useEffect(() => {
    if (last) root.current?.querySelector<HTMLElement>(`[data-part="${last}"] button`)?.focus();
  }, [last]);

  const list = (part: SentencePart, change = onChange) => <FilterPicker part={part} onChange={change} {...shared} />;
  const value = (limit: number | undefined) => (limit === undefined ? undefined : energy ? Number(energyIn(unit, limit).toPrecision(6)) : limit);
  const canonical = (limit: number | undefined) => (limit === undefined ? undefined : energy ? Number(energyToKJPerMol(unit, limit).toPrecision(12)) : limit);

  const further: { key: Addition; words: ReactNode }[] = [
    ...furtherParts.filter((part) => shows(part.filter)).map((part) => ({ key: part.filter as Addition, words: <>{part.before} {list(part)}</> })),
    ...(shows('value') ? [{
      key: 'value' as const,
      words: (
        <>with values{' '}
          <RangePicker
            label="Value" words={valueRangeWords(filter, unit)} unset="of any size" unit={energy ? unit : ''}
            from={value(filter.valueMin)} to={value(filter.valueMax)}
            onChange={(from, to) => onChange({ valueMin: canonical(from), valueMax: canonical(to) })}
          />
        </>
      ),
    }] : []),
    ...(shows('year') ? [{
      key: 'year' as const,
      words: (
        <>published{' '}
          <RangePicker
            label="Year of publication" unset="in any year" from={filter.yearFrom} to={filter.yearTo}
            words={rangeWords(filter.yearFrom?.toString() ?? null, filter.yearTo?.toString() ?? null)}
            onChange={(from, to) => onChange({ yearFrom: from, yearTo: to })}
          />
        </>
      ),
    }] : []),
  ];

  const more = [
    ...furtherParts.filter((part) => addable.includes(part.filter) && !shows(part.filter)).map((part) => ({ value: part.filter as Addition, label: part.title })),
    ...(shows('year') ? [] : [{ value: 'year' as const, label: 'Year of publication' }]),
    ...(shows('value') || !oneKind ? [] : [{ value: 'value' as const, label: 'Size of the value' }]),
  ];

  return (
    <div className="sentence max-w-[76rem]" role="group" aria-label={spokenSentence(filter, vocabulary, counts)} ref={root}>
      {fixedParts.kind.before} {list(fixedParts.kind, changeKind)} {fixedParts.step.before} {list(fixedParts.step)}{' '}
      {fixedParts.metal.before} {list(fixedParts.metal)} {fixedParts.method.before} {list(fixedParts.method)}, valid at{' '}
      <NumberPicker
        label="Valid at" unset="any temperature" unit="K" min={1} max={5000} value={filter.validAt ?? null}
        offer={{ value: temperatureK, label: `${temperatureK} K, the temperature of interest` }}
        onChange={(next) => onChange({ validAt: next ?? undefined })}
      />
      {further.map(({ key, words }) => <Fragment key={key}>, <span data-part={key}>{words}</span></Fragment>)}
      {'. '}
      {more.length > 0 && (
        <Picker
          label="Add to the question"
          summary="and …"
          summaryText="a further filter"
          buttonClassName="sentence-button sentence-unset text-[0.75em]"
          multiple={false}
          search={false}
          options={more}
          chosen={[]}
          onChange={([next]) => {
            if (!next) return;
            setAdded((before) => [...before, next]);
            setLast(next);
          }}
        />
      )}
    </div>
  );
}

/** The sentence as it is read aloud. */
export function spokenSentence(filter: EntryFilter, vocabulary?: Vocabulary, counts?: FilterCounts | null): string {
  const say = (part: SentencePart) => {
    const values = (filter[part.filter] ?? []) as readonly string[];
    return `${part.before} ${values.length === 0 ? part.unset : joinWords(values.map((value) => valueWords(part.filter, value, vocabulary, counts)), part.filter === 'kind' ? 'and' : 'or')}`;
  };
  const further = furtherParts.filter((part) => filter[part.filter] !== undefined).map((part) => `, ${say(part)}`).join('');
  const main = Object.values(fixedParts).map(say).join(' ');
  return `${main}, valid at ${filter.validAt === undefined ? 'any temperature' : `${filter.validAt} K`}${further}.`;
}
