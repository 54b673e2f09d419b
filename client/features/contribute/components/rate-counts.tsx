import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import type { Preview } from '#shared/contracts/entries.ts';
import { RadioGroup } from '#client/ui/choice.tsx';
import { Button } from '#client/ui/button.tsx';
import { InputField } from '#client/ui/field.tsx';
import { fieldId, useEntryField, useFaultAt } from '../entry-field.ts';
import type { EntryForm } from '../entry-form.ts';
import { FormSection } from './form-section.tsx';

/** The species of an equation in plain spelling, for suggestions. */
export function speciesOf(equation: string): string[] {
  const sides = equation.split(/<->|<=>|->|=>|=|→|⇌/);
  const species = sides.flatMap((side) => side.split(/\s\+\s/)).map((one) => one.trim().replace(/^\d+(\/\d+)?\s*/, '')).filter(Boolean);
  return [...new Set(species)];
}

/** What one unit of the printed rate is, and the orders of the reported rate law. */
export function RateCounts({ preview }: { preview: Preview | undefined }) {
  const field = useEntryField();
  const faultAt = useFaultAt();
  const { control, setValue } = useFormContext<EntryForm>();
  const counts = useWatch<EntryForm, 'rateOf.counts'>({ name: 'rateOf.counts' });
  const equation = useWatch<EntryForm, 'step.equation'>({ name: 'step.equation' });
  const { fields, append, remove } = useFieldArray({ control, name: 'kineticOrders' });
  const species = speciesOf(preview?.step?.equation ?? equation);

  return (
    <FormSection title="What the rate counts" hint="Two nitrogen atoms consumed are one event of 2N* → N2 + 2*: a factor of two hides here.">
      <RadioGroup
        legend="The printed rate counts" name="rateOf.counts" value={counts || null} error={faultAt('rateOf')}
        choices={[
          { value: 'event', label: 'Events of the elementary step as written' },
          { value: 'consumption', label: 'Consumption of a species' },
          { value: 'unknown', label: 'The source does not say', hint: 'kept as printed and marked "± ln 2" where a factor of two is open' },
        ]}
        onChange={(value) => setValue('rateOf.counts', value, { shouldDirty: true })}
      />
      <datalist id={fieldId('species')}>{species.map((one) => <option key={one} value={one} />)}</datalist>
      {counts === 'consumption' && (
        <div className="mid:max-w-[16rem]"><InputField {...field('rateOf.species')} label="Species consumed" typed list={fieldId('species')} /></div>
      )}
      <div className="flex flex-col gap-3">
        <p className="text-fine text-second">
          Orders of the reported rate law: only where they differ from the elementary step's own stoichiometry. Zero, half and fractions are allowed.
        </p>
        {fields.map((row, index) => (
          <div key={row.id} className="flex flex-wrap items-end gap-3">
            <div className="w-40"><InputField {...field(`kineticOrders.${index}.species`)} label={`Species ${index + 1}`} typed list={fieldId('species')} /></div>
            <div className="w-28"><InputField {...field(`kineticOrders.${index}.order`)} label="Order" inputMode="decimal" /></div>
            <Button look="quiet" small onClick={() => remove(index)} aria-label={`Remove the order in species ${index + 1}`}>Remove</Button>
          </div>
        ))}
        <div>
          <Button id={fieldId('kineticOrders.add')} small onClick={() => append({ species: species[fields.length] ?? '', order: '' })}>Add an order</Button>
        </div>
      </div>
    </FormSection>
  );
}
