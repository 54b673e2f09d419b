import { Fragment, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { energyIn, energyToKJPerMol } from '#client/lib/numbers.ts';
import { Picker } from '#client/ui/picker.tsx';
import { furtherParts, isEnergyKind, kindPart, mainParts, nameParts, rangeWords, validWords, valueRangeWords, type ListFilter, type NameFilter } from '../filter-words.ts';
import { metalChoices } from '../metal-choices.ts';
import { methodChoices } from '../method-choices.ts';
import { spokenSentence } from '../spoken-sentence.ts';
import { stepChoices } from '../step-choices.ts';
import { ChoicePicker, StepPicker } from './choice-picker.tsx';
import { FilterPicker, type NamedCollection } from './filter-picker.tsx';
import { NamesPicker } from './names-picker.tsx';
import { RangePicker } from './range-picker.tsx';
import { ValidPicker } from './valid-picker.tsx';

interface QuerySentenceProps {
  filter: EntryFilter;
  counts: AllFilterCounts | null | undefined;
  vocabulary: Vocabulary | undefined;
  /** The reader's own collections; nothing for a visitor. */
  collections?: readonly NamedCollection[] | undefined;
  onChange: (change: Partial<EntryFilter>) => void;
}

type Addition = ListFilter | NameFilter | 'year' | 'value';

/** The filters as a sentence whose emphasised parts are pickers. */
export function QuerySentence({ filter, counts, vocabulary, collections, onChange }: QuerySentenceProps) {
  const { temperatureK } = useInstrument();
  const root = useRef<HTMLDivElement>(null);
  /** Parts the reader has asked for and not set yet. */
  const [added, setAdded] = useState<readonly Addition[]>([]);
  const [last, setLast] = useState<{ part: Addition } | null>(null);
  const source = { filter, counts, vocabulary };
  const steps = useMemo(() => stepChoices({ filter, counts, vocabulary }), [filter, counts, vocabulary]);
  const metals = useMemo(() => metalChoices({ filter, counts, vocabulary }), [filter, counts, vocabulary]);
  const methods = useMemo(() => methodChoices({ filter, counts, vocabulary }), [filter, counts, vocabulary]);
  const oneKind = filter.kind?.length === 1;

  const shows = (part: Addition): boolean => {
    if (part === 'year') return filter.yearFrom !== undefined || filter.yearTo !== undefined || added.includes(part);
    if (part === 'value') return filter.valueMin !== undefined || filter.valueMax !== undefined || (added.includes(part) && oneKind);
    return filter[part] !== undefined || added.includes(part);
  };
  /** A state can be asked for by those to whom the answer counts states; a collection by those who have one. */
  const offered = (part: ListFilter): boolean => (part === 'state' ? counts?.state !== undefined : part === 'collection' ? (collections?.length ?? 0) > 0 : true);

  // A part that was asked for opens, so that it can be set at once.
  useEffect(() => {
    if (last) root.current?.querySelector<HTMLElement>(`[data-part="${last.part}"] button`)?.click();
  }, [last]);

  const further: { key: Addition; words: ReactNode }[] = [
    ...furtherParts.filter((part) => shows(part.filter)).map((part) => ({
      key: part.filter as Addition, words: <>{part.before} <FilterPicker part={part} collections={collections} onChange={onChange} {...source} /></>,
    })),
    ...(shows('value') ? [{ key: 'value' as const, words: <>with values <ValueRange filter={filter} onChange={onChange} /></> }] : []),
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
    ...nameParts.filter((part) => shows(part.filter)).map((part) => ({ key: part.filter as Addition, words: <>{part.before} <NamesPicker part={part} filter={filter} onChange={onChange} /></> })),
  ];

  const more = [
    ...furtherParts.filter((part) => offered(part.filter) && !shows(part.filter)).map((part) => ({ value: part.filter as Addition, label: part.title })),
    ...(shows('value') || !oneKind ? [] : [{ value: 'value' as const, label: 'Size of the value' }]),
    ...(shows('year') ? [] : [{ value: 'year' as const, label: 'Year of publication' }]),
    ...nameParts.filter((part) => !shows(part.filter)).map((part) => ({ value: part.filter as Addition, label: part.title })),
  ];

  return (
    <div className="sentence max-w-[76rem]" role="group" aria-label={spokenSentence(filter, vocabulary, counts, collections)} ref={root}>
      {kindPart.before}{' '}
      {/* Limits of a value belong to one kind: another kind takes them away. */}
      <FilterPicker part={kindPart} onChange={(change) => onChange({ ...change, valueMin: undefined, valueMax: undefined })} {...source} />{' '}
      {mainParts.step.before} <StepPicker title={mainParts.step.title} unset={mainParts.step.unset} choices={steps} onChange={onChange} />{' '}
      {mainParts.metal.before}{' '}
      <ChoicePicker title={mainParts.metal.title} unset={mainParts.metal.unset} choices={metals} recent="metal" placeholder="symbol, name, group or alloy" onChange={onChange} />{' '}
      {mainParts.method.before}{' '}
      <Tied mark=",">
        <ChoicePicker title={mainParts.method.title} unset={mainParts.method.unset} choices={methods} recent="method" placeholder="technique, family, measured …" onChange={onChange} />
      </Tied>{' '}
      valid {validWords(filter).before} <Tied mark={further.length > 0 ? ',' : '.'}><ValidPicker filter={filter} temperatureK={temperatureK} onChange={onChange} /></Tied>{' '}
      {further.map(({ key, words }, index) => (
        <Fragment key={key}><span data-part={key}><Tied mark={index < further.length - 1 ? ',' : '.'}>{words}</Tied></span>{' '}</Fragment>
      ))}
      {more.length > 0 && (
        <Picker
          label="Add to the question"
          summary="and …"
          summaryText="a further filter"
          buttonClassName="sentence-button sentence-unset text-[0.75em]"
          multiple={false}
          options={more}
          chosen={[]}
          onChange={([next]) => {
            if (!next) return;
            setAdded((before) => (before.includes(next) ? before : [...before, next]));
            setLast({ part: next });
          }}
        />
      )}
    </div>
  );
}

/** Keeps a mark with what it follows: a line would otherwise break between a picker and its full stop. */
function Tied({ mark, children }: { mark: string; children: ReactNode }) {
  return <span className="sentence-tied">{children}{mark}</span>;
}

/** Limits of the value, in the reader's unit where it is an energy. */
function ValueRange({ filter, onChange }: Pick<QuerySentenceProps, 'filter' | 'onChange'>) {
  const { unit } = useInstrument();
  const [kind] = filter.kind ?? [];
  const energy = filter.kind?.length === 1 && kind !== undefined && isEnergyKind(kind);
  const value = (limit: number | undefined) => (limit === undefined ? undefined : energy ? Number(energyIn(unit, limit).toPrecision(6)) : limit);
  const canonical = (limit: number | undefined) => (limit === undefined ? undefined : energy ? Number(energyToKJPerMol(unit, limit).toPrecision(12)) : limit);
  return (
    <RangePicker
      label="Value" words={valueRangeWords(filter, unit)} unset="of any size" unit={energy ? unit : ''}
      from={value(filter.valueMin)} to={value(filter.valueMax)}
      onChange={(from, to) => onChange({ valueMin: canonical(from), valueMax: canonical(to) })}
    />
  );
}
