import { useState } from 'react';
import { InputField } from '#client/ui/field.tsx';
import { SentencePanel } from './sentence-panel.tsx';

interface RangePickerProps {
  /** What is limited: "Year of publication". */
  label: string;
  words: string;
  unset: string;
  unit?: string;
  from: number | undefined;
  to: number | undefined;
  onChange: (from: number | undefined, to: number | undefined) => void;
}

/** Reads a number as typed, with a point or a comma; nothing where nothing is typed. */
export function readNumber(text: string): number | undefined {
  return text.trim() ? Number(text.trim().replace(/\s*K$/, '').replace(',', '.').replace('\u2212', '-')) : undefined;
}

/** A range in a sentence: a button that opens two fields, either of which may stay empty. */
export function RangePicker({ label, words, unset, unit = '', from, to, onChange }: RangePickerProps) {
  const [low, setLow] = useState('');
  const [high, setHigh] = useState('');
  const set = from !== undefined || to !== undefined;
  return (
    <SentencePanel
      label={label} words={set ? words : null} unset={unset}
      onOpen={() => {
        setLow(from === undefined ? '' : String(from));
        setHigh(to === undefined ? '' : String(to));
      }}
      onSet={() => {
        const [min, max] = [readNumber(low), readNumber(high)];
        if ([min, max].some((value) => value !== undefined && !Number.isFinite(value))) return 'Type numbers, or leave a field empty for no limit.';
        if (min !== undefined && max !== undefined && min > max) return 'The first number must not be greater than the second.';
        onChange(min, max);
        return null;
      }}
      onClear={() => onChange(undefined, undefined)}
    >
      <div className="grid grid-cols-2 gap-3">
        <InputField label={`from${unit && `, ${unit}`}`} inputMode="decimal" autoComplete="off" data-autofocus value={low} onChange={(event) => setLow(event.target.value)} />
        <InputField label={`to${unit && `, ${unit}`}`} inputMode="decimal" autoComplete="off" value={high} onChange={(event) => setHigh(event.target.value)} />
      </div>
    </SentencePanel>
  );
}
