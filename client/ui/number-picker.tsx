import { useState } from 'react';
import { InputField } from './field.tsx';
import { Button } from './button.tsx';
import { useFloating } from './popover.tsx';

interface NumberPickerProps {
  /** What is set: "Valid at". */
  label: string;
  value: number | null;
  unit: string;
  /** The words in the sentence while nothing is set: "any temperature". */
  unset: string;
  min: number;
  max: number;
  onChange: (value: number | null) => void;
  /** A value offered in one press: the temperature of interest. */
  offer?: { value: number; label: string };
}

/** A number in a sentence: a button that opens a field for it. */
export function NumberPicker({ label, value, unit, unset, min, max, onChange, offer }: NumberPickerProps) {
  const { open, show, hide, root, button, panel } = useFloating();
  const [typed, setTyped] = useState('');
  const [error, setError] = useState<string | undefined>();
  const words = value === null ? unset : `${value} ${unit}`;

  function choose(next: number | null) {
    onChange(next);
    hide();
  }

  function submit() {
    const read = Number(typed.trim().replace(',', '.').replace(unit, ''));
    if (!typed.trim() || !Number.isFinite(read) || read < min || read > max) {
      setError(`Type a number from ${min} to ${max} ${unit}.`);
      return;
    }
    choose(read);
  }

  return (
    <span className="picker" ref={root}>
      <button
        ref={button}
        type="button"
        className={`sentence-button ${value === null ? 'sentence-unset' : 'sentence-set'}`}
        aria-haspopup="dialog"
        aria-expanded={open}
        aria-label={`${label}: ${words}`}
        onClick={() => {
          setTyped(value === null ? '' : String(value));
          setError(undefined);
          if (open) hide();
          else show();
        }}
      >
        {words}
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
            <InputField
              label={`${label}, ${unit}`} inputMode="decimal" autoComplete="off" data-autofocus error={error}
              value={typed} onChange={(event) => setTyped(event.target.value)}
            />
            <div className="flex flex-wrap gap-2">
              <Button type="submit" look="primary" small>Set</Button>
              {offer && offer.value !== value && <Button small onClick={() => choose(offer.value)}>{offer.label}</Button>}
              {value !== null && <Button small look="quiet" onClick={() => choose(null)}>{unset}</Button>}
            </div>
          </form>
        </div>
      )}
    </span>
  );
}
