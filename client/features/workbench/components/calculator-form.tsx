import type { Fault } from '../read-typed.ts';
import type { Field, Sheet } from '../sheet.ts';
import { fieldsAsked, paramOf } from '../typed.ts';
import type { TypedState } from '../use-typed.ts';
import { FormField } from './form-field.tsx';

interface CalculatorFormProps {
  sheet: Sheet;
  form: TypedState;
  faults: readonly Fault[];
}

/** What the calculator asks, as the choices stand; the result follows as it is typed. What may stay empty comes last. */
export function CalculatorForm({ sheet, form, faults }: CalculatorFormProps) {
  const asked = fieldsAsked(sheet, form.typed);
  const optional = asked.filter((field) => field.optional);
  const line = (field: Field) => <FormField key={`${field.kind} ${paramOf(field)}`} sheet={sheet} field={field} form={form} faults={faults} />;
  return (
    <form className="calculator-form no-print" noValidate aria-label={sheet.calculator.title} onSubmit={(event) => event.preventDefault()}>
      {asked.filter((field) => !field.optional).map(line)}
      {optional.length > 0 && (
        <fieldset className="form-wide form-optional">
          <legend>May stay empty</legend>
          <div className="calculator-form">{optional.map(line)}</div>
        </fieldset>
      )}
    </form>
  );
}
