import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { energyTypeWords, energyTypes, quantitySymbols, symbolWords, uncertaintyKindWords, uncertaintyKinds } from '#shared/domain/kinds.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Button, TextButton } from '#client/ui/button.tsx';
import { InputField, SelectField } from '#client/ui/field.tsx';
import { QuantityValue } from '#client/ui/quantity-value.tsx';
import { Sign } from '#client/ui/signs.tsx';
import { fieldId, useEntryField } from '../entry-field.ts';
import type { EntryForm } from '../entry-form.ts';
import { unitsFor } from '../printed-units.ts';

/** Whether a print leaves open what its uncertainty is: a ± was read; the form 26.4(12) says it by itself. */
export function leavesKindOpen(asPrinted: string, converted: Quantity | undefined): boolean {
  if (/±|\+\s*\/?\s*[-−]|\\pm/.test(asPrinted) || /\+\s*[\d.]+\s*\/?\s*[-−]\s*[\d.]+/.test(asPrinted)) return true;
  return converted !== undefined && converted.uncertaintyKind === 'unknown' && converted.reportedUncertainty !== null;
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

interface QuantityRowProps {
  index: number;
  converted: Quantity | undefined;
  onRemove: (() => void) | undefined;
}

/** One quantity: what it is, the print, the unit; then only what the print leaves open; and what it becomes. */
export function QuantityRow({ index, converted, onRemove }: QuantityRowProps) {
  const field = useEntryField();
  const { unit: energyUnit } = useInstrument();
  const { control } = useFormContext<EntryForm>();
  const row = useWatch({ control, name: `quantities.${index}` });
  const [headed, setHeaded] = useState(false);
  const path = `quantities.${index}` as const;
  const open = leavesKindOpen(row.asPrinted, converted) || row.uncertaintyKind !== '';
  const name = capital(symbolWords[row.symbol]);

  return (
    <li className="flex flex-col gap-3 border-l-4 border-ink pl-4" aria-label={`Quantity ${index + 1}: ${name}`}>
      <div className="grid items-start gap-x-4 gap-y-3 mid:grid-cols-[minmax(0,1.1fr)_minmax(0,1.2fr)_minmax(0,1fr)]">
        <SelectField
          {...field(`${path}.symbol`)} label="Quantity" choices={quantitySymbols.map((value) => ({ value, label: capital(symbolWords[value]) }))}
        />
        <InputField {...field(`${path}.asPrinted`)} label="As printed" typed placeholder={row.symbol === 'energy' ? '26.4 ± 1.2' : '1.0e13'} />
        <div>
          <InputField {...field(`${path}.unitAsPrinted`)} label="Unit as printed" typed list={fieldId(`${path}.units`)} />
          <datalist id={fieldId(`${path}.units`)}>{unitsFor(row.symbol).map((unit) => <option key={unit} value={unit} />)}</datalist>
        </div>
      </div>
      {row.symbol === 'energy' && (
        <div className="mid:max-w-[20rem]">
          <SelectField
            {...field(`${path}.energyType`)} label="Which energy" empty="choose"
            choices={energyTypes.map((value) => ({ value, label: energyTypeWords[value] }))}
          />
        </div>
      )}
      {open && <UncertaintyFields path={path} kind={row.uncertaintyKind} />}
      {(headed || row.multiplier) ? (
        <div className="mid:max-w-[24rem]">
          <InputField
            {...field(`${path}.multiplier`)} label="Multiplier of the column heading" inputMode="decimal"
            hint={<>A column headed <code>10^3 k</code> has 1e3; one headed <code>A/10^13</code> has 1e-13.</>}
          />
        </div>
      ) : null}
      <div className="flex flex-wrap items-baseline gap-x-5 gap-y-2">
        <p className="min-w-0 flex-1" aria-live="polite">
          {converted && <><Sign of="->" />{' '}<QuantityValue quantity={converted} energyUnit={energyUnit} /></>}
          {converted?.siteValue != null && converted.siteUnit !== converted.unit && <span className="text-second">{`; ${converted.siteValue.toPrecision(3)} ${converted.siteUnit ?? ''} per site`}</span>}
        </p>
        {!headed && !row.multiplier && <TextButton className="text-fine" onClick={() => setHeaded(true)}>The column heading has a multiplier</TextButton>}
        {onRemove && <Button look="quiet" small onClick={onRemove} aria-label={`Remove quantity ${index + 1}, ${name}`}>Remove</Button>}
      </div>
    </li>
  );
}

function UncertaintyFields({ path, kind }: { path: `quantities.${number}`; kind: string }) {
  const field = useEntryField();
  return (
    <div className="grid items-start gap-x-4 gap-y-3 mid:grid-cols-3">
      <SelectField
        {...field(`${path}.uncertaintyKind`)} label="What the ± is" empty="the source does not say"
        hint={kind === '' ? 'Left so, no standard uncertainty is drawn from it.' : undefined}
        choices={uncertaintyKinds.filter((one) => one !== 'none' && one !== 'unknown').map((value) => ({ value, label: uncertaintyKindWords[value] }))}
      />
      {kind === 'expanded' && <InputField {...field(`${path}.coverageFactor`)} label="Coverage factor k" inputMode="decimal" placeholder="2" />}
      {kind === 'confidence' && (
        <>
          <InputField {...field(`${path}.level`)} label="Level" inputMode="decimal" placeholder="0.95" />
          <InputField {...field(`${path}.degreesOfFreedom`)} label="Degrees of freedom" inputMode="numeric" hint="If the source gives them" />
        </>
      )}
    </div>
  );
}
