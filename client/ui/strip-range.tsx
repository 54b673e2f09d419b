import { useId, useState } from 'react';
import type { StripRange } from './strip.tsx';

/** The range of the strip by typing: two numbers and the way back to all values. */
export function StripRangeFields({ unit, range, onRange }: { unit: string; range: StripRange; onRange: (range: StripRange) => void }) {
  const id = useId();
  const [error, setError] = useState<string | null>(null);

  /** Reads what stands in the form when it is left or sent; what is not a number is said and changes nothing. */
  function submit(form: HTMLFormElement) {
    const read = (name: string): number | null | undefined => {
      const text = (form.elements.namedItem(name) as HTMLInputElement).value.trim().replace(',', '.').replace('\u2212', '-');
      if (!text) return null;
      const value = Number(text);
      return Number.isFinite(value) ? value : undefined;
    };
    const min = read('min');
    const max = read('max');
    if (min === undefined || max === undefined) return setError('Type numbers, or leave a field empty.');
    if (min !== null && max !== null && min > max) return setError('The first number is larger than the second.');
    setError(null);
    if (min !== range.min || max !== range.max) onRange({ min, max });
  }

  const set = range.min !== null || range.max !== null;
  return (
    <form
      key={`${range.min} ${range.max}`}
      className="strip-range-form"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit(event.currentTarget);
      }}
    >
      <label htmlFor={`${id}-min`}>from</label>
      <input id={`${id}-min`} name="min" className="control strip-range-input" inputMode="decimal" autoComplete="off" defaultValue={range.min ?? ''} onBlur={(event) => event.currentTarget.form && submit(event.currentTarget.form)} />
      <label htmlFor={`${id}-max`}>to</label>
      <input id={`${id}-max`} name="max" className="control strip-range-input" inputMode="decimal" autoComplete="off" defaultValue={range.max ?? ''} onBlur={(event) => event.currentTarget.form && submit(event.currentTarget.form)} />
      <span>{unit}</span>
      <button type="submit" className="sr-only">Keep this range of values</button>
      {set && <button type="button" className="link-button" onClick={() => onRange({ min: null, max: null })}>All values</button>}
      {error && <span className="text-rust" role="alert">{error}</span>}
    </form>
  );
}
