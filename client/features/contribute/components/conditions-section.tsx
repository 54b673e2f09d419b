import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import type { Preview } from '#shared/contracts/entries.ts';
import { TextButton } from '#client/ui/button.tsx';
import { InputField, SelectField, TextareaField, type Choice } from '#client/ui/field.tsx';
import { countsMatter, neededConditions } from '../condition-needs.ts';
import { useEntryField } from '../entry-field.ts';
import { conditionNames, type ConditionName, type EntryForm } from '../entry-form.ts';
import { FieldRow, FormSection } from './form-section.tsx';
import { RateCounts } from './rate-counts.tsx';
import { KeptNote } from './kept-note.tsx';

interface ConditionField {
  label: string;
  hint?: string;
  decimal?: true;
  choices?: readonly Choice[];
}

const fields: Readonly<Record<Exclude<ConditionName, 'text'>, ConditionField>> = {
  coverage: { label: 'Coverage', hint: 'As printed, such as 0.05 to 0.25 ML of N' },
  coverageDefinition: {
    label: 'Coverage is per',
    choices: [
      { value: 'per-surface-atom', label: 'surface atom' }, { value: 'per-adsorption-site', label: 'adsorption site' },
      { value: 'relative-to-saturation', label: 'saturation, as a fraction of it' },
    ],
  },
  pressures: { label: 'Pressures', hint: 'As printed, such as NH3 50 mbar, H2 150 mbar' },
  temperatureK: { label: 'Temperature, K', decimal: true },
  heatingRateKPerS: { label: 'Heating rate, K/s', decimal: true },
  exposureLangmuir: { label: 'Exposure, langmuir', decimal: true },
  promoter: { label: 'Promoter', hint: 'With its loading, such as K, 0.1 per Ru; empty for a clean surface' },
  siteDensityPerM2: { label: 'Site density, sites per m²', decimal: true, hint: 'Only where the source gives it, such as 1.5e19' },
  siteDensitySource: { label: 'Where the site density comes from', hint: 'Page or reference' },
  functional: { label: 'Functional', hint: 'Such as RPBE, with its dispersion correction' },
  supercell: { label: 'Supercell', hint: 'Such as p(2×2), four layers' },
  endStateReference: {
    label: 'End states are', choices: [
      { value: 'gas', label: 'referred to the gas' }, { value: 'isolated', label: 'isolated on the surface' }, { value: 'co-adsorbed', label: 'co-adsorbed in one cell' },
    ],
  },
  isotopes: { label: 'Isotopes compared', hint: 'Such as NH3 and ND3' },
  kieDirection: { label: 'Ratio as printed', choices: [{ value: 'light/heavy', label: 'light over heavy' }, { value: 'heavy/light', label: 'heavy over light' }] },
};

/** Conditions, what the rate counts, and the temperatures between which the value holds. */
export function ConditionsSection({ preview }: { preview: Preview | undefined }) {
  const field = useEntryField();
  const { control } = useFormContext<EntryForm>();
  const form = useWatch({ control }) as EntryForm;
  const [all, setAll] = useState(false);
  const needed = all ? [...conditionNames] : neededConditions(form);
  const shown = conditionNames.filter((name): name is Exclude<ConditionName, 'text'> => name !== 'text' && needed.includes(name));

  return (
    <>
      {countsMatter(form) && <RateCounts preview={preview} />}
      <FormSection title="Conditions and valid range" hint="What this kind and method call for. What the source does not report stays empty.">
        <FieldRow>
          {shown.map((name) => {
            const { label, hint, decimal, choices } = fields[name];
            return choices
              ? <SelectField key={name} {...field(`conditions.${name}`)} label={label} hint={hint} empty="not stated" choices={choices} />
              : <InputField key={name} {...field(`conditions.${name}`)} label={label} hint={hint} inputMode={decimal ? 'decimal' : undefined} />;
          })}
        </FieldRow>
        {!all && <div><TextButton className="text-fine" onClick={() => setAll(true)}>Show all conditions</TextButton></div>}
        <TextareaField {...field('conditions.text')} label="Other conditions, in words" rows={2} className="min-h-0" />
        <FieldRow>
          <InputField {...field('validRange.min')} label="Valid from, K" inputMode="decimal" hint="The range of temperatures the source supports" />
          <InputField {...field('validRange.max')} label="Valid to, K" inputMode="decimal" />
        </FieldRow>
        <KeptNote part="conditions" />
    </FormSection>
    </>
  );
}
