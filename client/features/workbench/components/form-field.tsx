import { useId } from 'react';
import { useInstrument } from '#client/lib/instrument.ts';
import { TextButton } from '#client/ui/button.tsx';
import { RadioGroup } from '#client/ui/choice.tsx';
import { FieldError, InputField, SelectField } from '#client/ui/field.tsx';
import { mostRowsOf } from '../address.ts';
import type { Fault } from '../read-typed.ts';
import type { Field, NumberField, Sheet, TableField, TextField } from '../sheet.ts';
import { chosen, mostCharacters, paramOf, unitParamOf, unitSaid, usualEnergyUnit } from '../typed.ts';
import type { TypedState } from '../use-typed.ts';
import { DataGrid } from './data-grid.tsx';
import { EnergyField, UnitPicker } from './energy-field.tsx';
import { FieldLabel } from './field-label.tsx';

interface FormFieldProps<F extends Field = Field> {
  sheet: Sheet;
  field: F;
  form: TypedState;
  faults: readonly Fault[];
}

/** One field of a calculator: number, text, choice or table. */
export function FormField({ sheet, field, form, faults }: FormFieldProps) {
  const { typed, onValue, onChoice } = form;
  const param = paramOf(field);
  const own = faults.filter((fault) => fault.param === param);
  const error = own.find((fault) => !fault.cell)?.message;
  if (field.kind === 'table') return <TableFormField sheet={sheet} field={field} form={form} faults={own} />;
  if (field.kind === 'choice') {
    const value = chosen(field, typed);
    const choose = (next: string) => onChoice(param, next);
    return field.look === 'select'
      ? <SelectField label={field.label} hint={field.hint} error={error} choices={field.choices} value={value} onChange={(event) => choose(event.target.value)} />
      : <div className="form-wide"><RadioGroup legend={field.label} name={param} hint={field.hint} error={error} choices={field.choices} value={value} onChange={choose} look={field.look ?? 'list'} /></div>;
  }
  const text = typed.values[param] ?? '';
  if (field.kind === 'text') return <TextFormField field={field} text={text} error={error} onText={(next) => onValue(param, next)} />;
  const unitParam = unitParamOf(field);
  if (unitParam) {
    return (
      <EnergyField
        field={field} text={text} unit={typed.values[unitParam] ?? usualEnergyUnit} error={error}
        onText={(next) => onValue(param, next)} onUnit={(next) => onValue(unitParam, next)}
      />
    );
  }
  return <NumberFormField field={field} unit={unitSaid(sheet, typed, field)} text={text} error={error} onText={(next) => onValue(param, next)} />;
}

interface TypedFieldProps<F extends Field> {
  field: F;
  text: string;
  error: string | undefined;
  onText: (text: string) => void;
}

function NumberFormField({ field, unit, text, error, onText }: TypedFieldProps<NumberField> & { unit: string }) {
  const { temperatureK } = useInstrument();
  const offer = field.temperature && text.trim() === '' && <TextButton onClick={() => onText(String(temperatureK))}>{`Use ${temperatureK} K`}</TextButton>;
  return (
    <InputField
      label={<FieldLabel label={field.label} symbol={field.symbol} unit={unit} />}
      hint={field.hint && offer ? <>{field.hint} {offer}</> : offer || field.hint} error={error} typed maxLength={mostCharacters} placeholder={field.usual}
      value={text} onChange={(event) => onText(event.target.value)}
    />
  );
}

function TextFormField({ field, text, error, onText }: TypedFieldProps<TextField>) {
  const id = useId();
  return (
    <div className={field.wide ? 'form-wide' : 'contents'}>
      <InputField
        label={<FieldLabel label={field.label} symbol={field.symbol} />} hint={field.hint} error={error} typed maxLength={field.most ?? mostCharacters}
        placeholder={field.placeholder ?? field.usual} list={field.suggestions ? id : undefined}
        value={text} onChange={(event) => onText(event.target.value)}
      />
      {field.suggestions && <datalist id={id}>{field.suggestions.map((one) => <option key={one} value={one} />)}</datalist>}
    </div>
  );
}

function TableFormField({ sheet, field, form, faults }: FormFieldProps<TableField>) {
  const { typed, onRows, onValue } = form;
  const id = useId();
  const param = paramOf(field);
  const unitParam = unitParamOf(field);
  const unit = unitParam ? typed.values[unitParam] ?? usualEnergyUnit : '';
  const whole = faults.find((fault) => !fault.cell);
  return (
    <fieldset className="form-wide field">
      <legend className="field-label">{field.label}</legend>
      {unitParam && (
        <div className="table-unit-choice"><span aria-hidden="true">Energies in</span><UnitPicker label="Unit of the energies" unit={unit} onUnit={(next) => onValue(unitParam, next)} /></div>
      )}
      <DataGrid
        label={field.label} rows={typed.tables[param] ?? []} minRows={Math.max(3, field.least)} mostRows={mostRowsOf(field)}
        columns={field.columns.map((column) => ({ id: column.id, label: column.label, unit: (column.energy ? unit : unitSaid(sheet, typed, column)) || undefined, optional: column.optional }))}
        faults={faults.flatMap((fault) => (fault.cell ? [{ ...fault.cell, message: fault.message }] : []))}
        onChange={(rows) => onRows(param, rows)}
      />
      {field.hint && <p className="field-hint">{field.hint}</p>}
      <FieldError id={`${id}-error`} error={whole?.message} />
    </fieldset>
  );
}
