import { useEffect, useId, useRef, type InputHTMLAttributes, type ReactNode } from 'react';
import { FieldError, type Choice } from './field.tsx';

type CheckboxProps = Omit<InputHTMLAttributes<HTMLInputElement>, 'type'> & {
  label: ReactNode;
  hint?: ReactNode;
  /** Keeps the label for those who listen, as in the first cell of a row. */
  hideLabel?: boolean;
  /** Some but not all of what it stands for is chosen. */
  indeterminate?: boolean;
  ref?: React.Ref<HTMLInputElement>;
};

/** A box that is ticked or not. */
export function Checkbox({ label, hint, hideLabel = false, indeterminate = false, className = '', ref, ...rest }: CheckboxProps) {
  const hintId = useId();
  const own = useRef<HTMLInputElement | null>(null);
  useEffect(() => {
    if (own.current) own.current.indeterminate = indeterminate;
  }, [indeterminate]);
  return (
    <label className={`choice ${className}`}>
      <input
        type="checkbox"
        className="tick"
        aria-describedby={hint ? hintId : undefined}
        {...rest}
        ref={(element) => {
          own.current = element;
          if (typeof ref === 'function') return ref(element);
          if (ref) ref.current = element;
          return undefined;
        }}
      />
      <span className={hideLabel ? 'sr-only' : 'choice-text'}>
        {label}
        {hint && <span className="field-hint block" id={hintId}>{hint}</span>}
      </span>
    </label>
  );
}

interface RadioGroupProps<Value extends string> {
  legend: ReactNode;
  name: string;
  choices: readonly Choice<Value>[];
  value: Value | null;
  onChange: (value: Value) => void;
  hint?: ReactNode;
  error?: ReactNode;
  required?: boolean;
  hideLegend?: boolean;
  /** Side by side in one frame (few short words), or one under another with their hints. */
  look?: 'list' | 'segments';
}

/** One of a few, all in sight. */
export function RadioGroup<Value extends string>(
  { legend, name, choices, value, onChange, hint, error, required = false, hideLegend = false, look = 'list' }: RadioGroupProps<Value>,
) {
  const id = useId();
  return (
    <fieldset className="field" aria-describedby={hint ? `${id}-hint` : undefined} aria-invalid={error ? true : undefined}>
      <legend className={hideLegend ? 'sr-only' : 'field-label'}>
        {legend}
        {required && <span className="field-required"> (required)</span>}
      </legend>
      <div className={look === 'segments' ? 'segments self-start' : ''}>
        {choices.map((choice) => (
          <label key={choice.value} className={look === 'segments' ? '' : 'choice'}>
            <input
              type="radio"
              className={look === 'segments' ? 'sr-only' : 'tick'}
              name={name}
              value={choice.value}
              checked={choice.value === value}
              disabled={choice.disabled}
              onChange={() => onChange(choice.value)}
            />
            <span className="choice-text">
              {choice.label}
              {choice.hint && look === 'list' && <span className="field-hint block">{choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {hint && <p className="field-hint" id={`${id}-hint`}>{hint}</p>}
      <FieldError id={`${id}-error`} error={error} />
    </fieldset>
  );
}
