import { useState } from 'react';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { InputField } from '#client/ui/field.tsx';
import { validWords } from '../filter-words.ts';
import { readNumber } from './range-picker.tsx';
import { SentencePanel } from './sentence-panel.tsx';

interface ValidPickerProps {
  filter: EntryFilter;
  temperatureK: number;
  onChange: (change: Partial<EntryFilter>) => void;
}

const limits = { min: 1, max: 5000 } as const;

/** Where a value must hold: at one temperature, or over a range that the valid range holds as a whole. */
export function ValidPicker({ filter, temperatureK, onChange }: ValidPickerProps) {
  const [fields, setFields] = useState({ at: '', from: '', to: '' });
  const { words } = validWords(filter);
  const field = (name: keyof typeof fields, label: string, first = false) => (
    <InputField
      label={label} inputMode="decimal" autoComplete="off" {...(first ? { 'data-autofocus': true } : {})}
      value={fields[name]} onChange={(event) => setFields({ ...fields, [name]: event.target.value })}
    />
  );
  return (
    <SentencePanel
      label="Valid at" words={words} unset="any temperature"
      onOpen={() => setFields({ at: said(filter.validAt), from: said(filter.validFrom), to: said(filter.validTo) })}
      onSet={() => {
        const [at, from, to] = [readNumber(fields.at), readNumber(fields.from), readNumber(fields.to)];
        if ([at, from, to].some((value) => value !== undefined && !(value >= limits.min && value <= limits.max))) return `Type numbers from ${limits.min} to ${limits.max} K, or leave a field empty.`;
        if (from !== undefined && to !== undefined && from > to) return 'The range ends below its beginning.';
        onChange({ validAt: at, validFrom: from, validTo: to });
        return null;
      }}
      onClear={() => onChange({ validAt: undefined, validFrom: undefined, validTo: undefined })}
      offer={filter.validAt === temperatureK ? undefined : {
        label: `${temperatureK} K, the temperature of interest`, onTake: () => onChange({ validAt: temperatureK, validFrom: undefined, validTo: undefined }),
      }}
    >
      {field('at', 'Valid at, K', true)}
      <fieldset>
        <legend className="field-hint pb-1">or over a whole range</legend>
        <div className="grid grid-cols-2 gap-3">{field('from', 'from, K')}{field('to', 'to, K')}</div>
      </fieldset>
    </SentencePanel>
  );
}

const said = (value: number | undefined): string => (value === undefined ? '' : String(value));
