import { useQuery } from '@tanstack/react-query';
import { useFormContext, useWatch } from 'react-hook-form';
import { kindWord, kinds, primarySymbol, provenanceWords, provenances, scopes, type Kind } from '#shared/domain/kinds.ts';
import { RadioGroup } from '#client/ui/choice.tsx';
import { InputField, SelectField } from '#client/ui/field.tsx';
import { vocabularyOptions } from '../api.ts';
import { fieldId, useEntryField, useFaultAt } from '../entry-field.ts';
import { quantityRow, type EntryForm } from '../entry-form.ts';
import { FieldRow, FormSection } from './form-section.tsx';

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

const scopeHints = {
  elementary: 'one elementary step',
  lumped: 'several elementary steps printed as one',
  apparent: 'the overall reaction under its conditions',
} as const;

/** What is reported, for what, by which method, and how the source came by it. */
export function ReportSection() {
  const field = useEntryField();
  const faultAt = useFaultAt();
  const { setValue, getValues } = useFormContext<EntryForm>();
  const method = useWatch<EntryForm, 'method'>({ name: 'method' });
  const scope = useWatch<EntryForm, 'scope'>({ name: 'scope' });
  const { data: vocabulary } = useQuery(vocabularyOptions);
  const techniques = (vocabulary?.techniques ?? []).filter((term) => !method.class || term.data.class === undefined || term.data.class === method.class);
  const kind = field('kind');

  /** The row for what the kind reports is put ready, as long as nothing was typed in it. */
  function prepareRow(chosen: Kind) {
    const rows = getValues('quantities');
    const symbol = primarySymbol[chosen];
    if (rows.some((row) => row.symbol === symbol && symbol !== 'energy') || rows.some((row) => row.asPrinted.trim())) return;
    setValue('quantities', [quantityRow(symbol, chosen === 'activation-energy' ? 'arrhenius' : '')]);
  }

  return (
    <FormSection title="What is reported">
      <FieldRow>
        <SelectField
          {...kind} label="Kind" empty="choose a kind" choices={kinds.map((value) => ({ value, label: kindWord[value] }))}
          onChange={(event) => {
            void kind.onChange(event);
            const chosen = kinds.find((one) => one === event.target.value);
            if (chosen) prepareRow(chosen);
          }}
        />
        <SelectField
          {...field('provenance')} label="How the source came by it" empty="choose"
          choices={provenances.map((value) => ({ value, label: provenanceWords[value] }))}
        />
      </FieldRow>
      <RadioGroup
        legend="Stands for" name="scope" value={scope || null} error={faultAt('scope')}
        choices={scopes.map((value) => ({ value, label: capital(value), hint: scopeHints[value] }))}
        onChange={(value) => setValue('scope', value, { shouldDirty: true })}
      />
      <RadioGroup
        legend="Method" name="method.class" look="segments" value={method.class || null} error={faultAt('method.class') ?? faultAt('method')}
        choices={[{ value: 'measured', label: 'Measured' }, { value: 'computed', label: 'Computed' }]}
        onChange={(value) => setValue('method.class', value, { shouldDirty: true })}
      />
      <FieldRow>
        <div>
          <InputField {...field('method.technique')} label="Technique" list={fieldId('techniques')} hint="Type to find it; its short name is kept." />
          <datalist id={fieldId('techniques')}>{techniques.map((term) => <option key={term.code} value={term.code}>{term.label}</option>)}</datalist>
        </div>
        <InputField
          {...field('method.detail')} label="Detail"
          hint={method.class === 'computed' ? 'Program, functional, layers, transition-state search' : 'Analysis, order assumed, detector, reactor'}
        />
      </FieldRow>
    </FormSection>
  );
}
