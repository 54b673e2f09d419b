import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import type { Preview } from '#shared/contracts/entries.ts';
import { quantitySymbols, type QuantitySymbol } from '#shared/domain/kinds.ts';
import { Button } from '#client/ui/button.tsx';
import { InputField } from '#client/ui/field.tsx';
import { fieldId, useEntryField } from '../entry-field.ts';
import { quantityRow, type EntryForm } from '../entry-form.ts';
import { FormSection } from './form-section.tsx';
import { QuantityRow } from './quantity-row.tsx';

/** What is usually printed beside what is there already. */
function nextSymbol(held: readonly QuantitySymbol[]): QuantitySymbol {
  const usual: QuantitySymbol[] = ['energy', 'preExponential', 'exponent', 'referenceTemperature', 'rateConstant'];
  return [...usual, ...quantitySymbols].find((symbol) => !held.includes(symbol)) ?? 'energy';
}

interface QuantitiesSectionProps {
  preview: Preview | undefined;
  /** For each row of the form, its place in the input the preview answers; -1 for an empty row. */
  places: readonly number[];
}

/** The quantities, each with the value string and unit exactly as the source gives them. */
export function QuantitiesSection({ preview, places }: QuantitiesSectionProps) {
  const field = useEntryField();
  const { control } = useFormContext<EntryForm>();
  const { fields, append, remove } = useFieldArray<EntryForm, 'quantities'>({ name: 'quantities', control });
  const rows = useWatch<EntryForm, 'quantities'>({ name: 'quantities' });
  const symbols = rows.map((row) => row.symbol);
  const pair = symbols.includes('energy') && symbols.includes('preExponential');

  return (
    <FormSection title="Quantities as printed" hint="Value and unit exactly as the source prints them: digits, signs, powers of ten. Nothing is converted by hand.">
      <ol className="flex flex-col gap-5">
        {fields.map((row, index) => (
          <QuantityRow
            key={row.id}
            index={index}
            converted={preview?.quantities[places[index] ?? -1]}
            onRemove={fields.length > 1 ? () => {
              remove(index);
              document.getElementById(fieldId('quantities.add'))?.focus();
            } : undefined}
          />
        ))}
      </ol>
      <div>
        <Button id={fieldId('quantities.add')} small onClick={() => append(quantityRow(nextSymbol(symbols)))} disabled={fields.length >= 12}>
          Add a quantity
        </Button>
      </div>
      {pair && (
        <div className="max-w-[28rem]">
          <InputField
            {...field('correlation')} label="Correlation of ln A and the energy" inputMode="decimal"
            hint="From −1 to 1, where the source gives it; never taken as zero when it does not."
          />
        </div>
      )}
    </FormSection>
  );
}
