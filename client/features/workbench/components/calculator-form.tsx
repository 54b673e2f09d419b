import type { Fault } from '../read-typed.ts';
import type { Sheet } from '../sheet.ts';
import { fieldsAsked, paramOf } from '../typed.ts';
import type { TypedState } from '../use-typed.ts';
import { FormField } from './form-field.tsx';

interface CalculatorFormProps {
  sheet: Sheet;
  form: TypedState;
  faults: readonly Fault[];
}

/** What the calculator asks, as the choices stand; the result follows as it is typed. */
export function CalculatorForm({ sheet, form, faults }: CalculatorFormProps) {
  return (
    <form className="calculator-form no-print" noValidate aria-label={sheet.calculator.title} onSubmit={(event) => event.preventDefault()}>
      {fieldsAsked(sheet, form.typed).map((field) => (
        <FormField key={`${field.kind} ${paramOf(field)}`} field={field} form={form} faults={faults} />
      ))}
    </form>
  );
}
