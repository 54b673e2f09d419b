import type { ReactNode } from 'react';
import { convertEnergy, energyUnits } from '#shared/kinetics/energy.ts';
import { Field } from '#client/ui/field.tsx';
import { Value } from '#client/ui/value.tsx';
import type { NumberField } from '../sheet.ts';
import { mostCharacters, usualEnergyUnit } from '../typed.ts';
import { readTypedNumber } from '../typed-number.ts';
import { FieldLabel } from './field-label.tsx';

interface EnergyFieldProps {
  field: NumberField;
  text: string;
  unit: string;
  error?: ReactNode;
  onText: (text: string) => void;
  onUnit: (unit: string) => void;
}

/** An energy as typed with the unit it is in; beneath it the same in kJ/mol, which is what is calculated with. */
export function EnergyField({ field, text, unit, error, onText, onUnit }: EnergyFieldProps) {
  const read = text.trim() === '' || unit === usualEnergyUnit ? null : readTypedNumber(text, unit);
  const converted = read && 'value' in read ? convertEnergy({ value: read.value, from: unit, to: usualEnergyUnit }).value : null;
  const hint = converted === null ? field.hint : <>is <Value value={converted} unit={usualEnergyUnit} digits={6} /></>;
  return (
    <Field label={<FieldLabel label={field.label} symbol={field.symbol} />} hint={hint} error={error}>
      {(wiring) => (
        <div className="number-with-unit">
          <input
            className="control control-typed" inputMode="text" spellCheck={false} autoComplete="off" autoCapitalize="off" maxLength={mostCharacters} placeholder={field.usual}
            value={text} onChange={(event) => onText(event.target.value)} {...wiring}
          />
          <UnitPicker label={`Unit of ${field.label.toLowerCase()}`} unit={unit} onUnit={onUnit} />
        </div>
      )}
    </Field>
  );
}

/** The unit that energies are typed in. */
export function UnitPicker({ label, unit, onUnit }: { label: string; unit: string; onUnit: (unit: string) => void }) {
  return (
    <select className="control unit-picker" aria-label={label} value={unit} onChange={(event) => onUnit(event.target.value)}>
      {energyUnits.map((one) => <option className="select-option" key={one} value={one}>{one}</option>)}
    </select>
  );
}
