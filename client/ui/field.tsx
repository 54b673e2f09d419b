import { useId, type InputHTMLAttributes, type ReactNode, type SelectHTMLAttributes, type TextareaHTMLAttributes } from 'react';

/** What every field shows around its control. */
export interface FieldText {
  label: ReactNode;
  /** What to type, said before it goes wrong. */
  hint?: ReactNode;
  /** What is wrong with what was typed, and what to do. */
  error?: ReactNode;
  required?: boolean;
  /** Keeps the label for those who listen, where the page already shows it. */
  hideLabel?: boolean;
  className?: string;
}

interface Wiring {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
  'aria-required': true | undefined;
}

interface FieldProps extends FieldText {
  children: (wiring: Wiring) => ReactNode;
  id?: string | undefined;
}

/** A label, a control, a hint and an error, tied together; the control is given by the child. */
export function Field({ label, hint, error, required = false, hideLabel = false, className = '', id, children }: FieldProps) {
  const made = useId();
  const own = id ?? made;
  const described = [hint ? `${own}-hint` : '', error ? `${own}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={`field ${className}`}>
      <label className={hideLabel ? 'sr-only' : 'field-label'} htmlFor={own}>
        {label}
        {required && <span className="field-required"> (required)</span>}
      </label>
      {children({
        id: own, 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined, 'aria-required': required || undefined,
      })}
      {hint && <p className="field-hint" id={`${own}-hint`}>{hint}</p>}
      <FieldError id={`${own}-error`} error={error} />
    </div>
  );
}

/** The error under a field; its place is kept as a live region, so that it is heard when it comes. */
export function FieldError({ id, error }: { id: string; error?: ReactNode }) {
  return (
    <div aria-live="polite">
      {error ? <p className="field-error" id={id}>{error}</p> : null}
    </div>
  );
}

type InputProps = FieldText & Omit<InputHTMLAttributes<HTMLInputElement>, 'required' | 'className'> & {
  /** What is typed here is a quotation or a formula: mono, no correction by the browser. */
  typed?: boolean;
  ref?: React.Ref<HTMLInputElement>;
};

/** A line of text. */
export function InputField({ label, hint, error, required, hideLabel, className, typed = false, id, ref, ...rest }: InputProps) {
  return (
    <Field {...{ label, hint, error, required, hideLabel, className, id }}>
      {(wiring) => (
        <input
          ref={ref}
          className={`control ${typed ? 'control-typed' : ''}`}
          {...(typed ? { spellCheck: false, autoComplete: 'off', autoCapitalize: 'off' } : {})}
          {...rest}
          {...wiring}
        />
      )}
    </Field>
  );
}

type TextareaProps = FieldText & Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, 'required' | 'className'> & {
  typed?: boolean;
  ref?: React.Ref<HTMLTextAreaElement>;
};

/** Several lines of text. */
export function TextareaField({ label, hint, error, required, hideLabel, className, typed = false, id, ref, ...rest }: TextareaProps) {
  return (
    <Field {...{ label, hint, error, required, hideLabel, className, id }}>
      {(wiring) => (
        <textarea ref={ref} className={`control ${typed ? 'control-typed' : ''}`} {...(typed ? { spellCheck: false } : {})} {...rest} {...wiring} />
      )}
    </Field>
  );
}

export interface Choice<Value extends string = string> {
  value: Value;
  label: string;
  hint?: string;
  disabled?: boolean;
}

type SelectProps = FieldText & Omit<SelectHTMLAttributes<HTMLSelectElement>, 'required' | 'className'> & {
  choices: readonly Choice[];
  /** The words of the empty choice; without them the first choice stands chosen. */
  empty?: string;
  ref?: React.Ref<HTMLSelectElement>;
};

/** One of a short list, by the browser's own list. */
export function SelectField({ label, hint, error, required, hideLabel, className, choices, empty, id, ref, ...rest }: SelectProps) {
  return (
    <Field {...{ label, hint, error, required, hideLabel, className, id }}>
      {(wiring) => (
        <select ref={ref} className="control" {...rest} {...wiring}>
          {empty !== undefined && <option className="select-option" value="">{empty}</option>}
          {choices.map((choice) => (
            <option className="select-option" key={choice.value} value={choice.value} disabled={choice.disabled}>{choice.label}</option>
          ))}
        </select>
      )}
    </Field>
  );
}
