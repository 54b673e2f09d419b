import { useState } from 'react';
import { Button } from '#client/ui/button.tsx';
import { FieldError, InputField } from '#client/ui/field.tsx';
import { useFloating } from '#client/ui/popover.tsx';

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

/** A range in a sentence: a button that opens two fields, either of which may stay empty. */
export function RangePicker({ label, words, unset, unit = '', from, to, onChange }: RangePickerProps) {
  const { open, show, hide, root, button, panel } = useFloating();
  const [low, setLow] = useState('');
  const [high, setHigh] = useState('');
  const [error, setError] = useState('');
  const set = from !== undefined || to !== undefined;
  const said = set ? words : unset;

  function submit() {
    const read = [low, high].map((text) => (text.trim() ? Number(text.trim().replace(',', '.')) : undefined));
    const [min, max] = read;
    if (read.some((value) => value !== undefined && !Number.isFinite(value))) {
      setError('Type numbers, or leave a field empty for no limit.');
    } else if (min !== undefined && max !== undefined && min > max) {
      setError('The first number must not be greater than the second.');
    } else {
      onChange(min, max);
      hide();
    }
  }

  return (
    <span className="picker" ref={root}>
      <button
        ref={button}
        type="button"
        className={`sentence-button ${set ? 'sentence-set' : 'sentence-unset'}`}
        aria-haspopup="dialog"
        aria-expanded={open}
        aria-label={`${label}: ${said}`}
        onClick={() => {
          setLow(from === undefined ? '' : String(from));
          setHigh(to === undefined ? '' : String(to));
          setError('');
          if (open) hide();
          else show();
        }}
      >
        {said}
      </button>
      {open && (
        <div className="floating floating-panel picker-panel left-0 p-4" ref={panel} role="dialog" aria-label={label}>
          <form
            className="flex flex-col gap-3"
            noValidate
            onSubmit={(event) => {
              event.preventDefault();
              submit();
            }}
          >
            <div className="grid grid-cols-2 gap-3">
              <InputField label={`from${unit && `, ${unit}`}`} inputMode="decimal" autoComplete="off" autoFocus value={low} onChange={(event) => setLow(event.target.value)} />
              <InputField label={`to${unit && `, ${unit}`}`} inputMode="decimal" autoComplete="off" value={high} onChange={(event) => setHigh(event.target.value)} />
            </div>
            <FieldError id={`${label}-error`} error={error} />
            <div className="flex flex-wrap gap-2">
              <Button type="submit" look="primary" small>Set</Button>
              {set && <Button small look="quiet" onClick={() => { onChange(undefined, undefined); hide(); }}>{unset.replace(/^./, (first) => first.toUpperCase())}</Button>}
            </div>
          </form>
        </div>
      )}
    </span>
  );
}
