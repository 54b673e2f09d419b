import { useQuery } from '@tanstack/react-query';
import { useFormContext, useWatch } from 'react-hook-form';
import { sampleTypeWords, sampleTypes, siteTypes, structures, type Structure } from '#shared/domain/kinds.ts';
import type { Term } from '#shared/contracts/vocabulary.ts';
import { RadioGroup } from '#client/ui/choice.tsx';
import { InputField, SelectField } from '#client/ui/field.tsx';
import { vocabularyOptions } from '../api.ts';
import { fieldId, useEntryField } from '../entry-field.ts';
import type { EntryForm } from '../entry-form.ts';
import { FieldRow, FormSection } from './form-section.tsx';
import { KeptNote } from './kept-note.tsx';

function structureOf(term: Term | undefined): Structure | null {
  return structures.find((one) => one === term?.data.structure) ?? null;
}

const siteWords = (site: string) => (site === 'B5' ? 'B5' : site.replace('-', ' '));

/** Material, structure, facet or site, form, support and size. */
export function SurfaceSection() {
  const field = useEntryField();
  const { setValue, getValues } = useFormContext<EntryForm>();
  const surface = useWatch<EntryForm, 'surface'>({ name: 'surface' });
  const { data: vocabulary } = useQuery(vocabularyOptions);
  const metals = vocabulary?.metals ?? [];
  const known = metals.some((metal) => metal.code === surface.metal);
  const metal = field('surface.metal');
  const facets = (vocabulary?.facets ?? []).filter((facet) => {
    const of = facet.data.structures;
    return !surface.structure || !Array.isArray(of) || of.includes(surface.structure);
  });
  const dispersed = surface.sampleType === 'supported-particles' || surface.sampleType === 'powder' || surface.sampleType === 'film';

  return (
    <FormSection title="Surface">
      <RadioGroup
        legend="Material" name="surface.of" look="segments" value={surface.of}
        choices={[{ value: 'metal', label: 'Pure metal' }, { value: 'alloy', label: 'Alloy' }]}
        onChange={(of) => setValue('surface.of', of, { shouldDirty: true })}
      />
      <FieldRow>
        {surface.of === 'metal' ? (
          <SelectField
            {...metal} label="Metal" empty="choose a metal"
            choices={[
              ...(surface.metal && !known ? [{ value: surface.metal, label: surface.metal }] : []),
              ...metals.map(({ code, label }) => ({ value: code, label: `${code}, ${label}` })),
            ]}
            value={surface.metal}
            onChange={(event) => {
              void metal.onChange(event);
              const structure = structureOf(metals.find(({ code }) => code === event.target.value));
              if (structure && !getValues('surface.facet')) setValue('surface.structure', structure);
            }}
          />
        ) : (
          <InputField {...field('surface.formula')} label="Formula of the alloy" typed hint={<>Such as <code>Ni3Fe</code> or <code>Pt0.5Ru0.5</code></>} />
        )}
        <SelectField
          {...field('surface.structure')} label="Structure" empty="not stated" choices={structures.map((value) => ({ value, label: value }))}
        />
        <div>
          <InputField
            {...field('surface.facet')} label="Facet" typed list={fieldId('facets')} hint="Without brackets: 111, 0001, 10-10. Leave empty for particles."
          />
          <datalist id={fieldId('facets')}>{facets.map((facet) => <option key={facet.code} value={facet.code}>{facet.label}</option>)}</datalist>
        </div>
        <SelectField
          {...field('surface.site')} label="Site or step edge" empty="not stated" choices={siteTypes.map((value) => ({ value, label: siteWords(value) }))}
        />
        <SelectField
          {...field('surface.sampleType')} label="Form" empty="not stated"
          choices={sampleTypes.map((value) => ({ value, label: sampleTypeWords[value] }))}
        />
        {(dispersed || surface.support) && (
          <div>
            <InputField {...field('surface.support')} label="Support" list={fieldId('supports')} />
            <datalist id={fieldId('supports')}>
              {vocabulary?.supports.map((support) => <option key={support.code} value={support.code}>{support.label}</option>)}
            </datalist>
          </div>
        )}
        {(dispersed || surface.particleSizeNm) && (
          <InputField {...field('surface.particleSizeNm')} label="Size, nm" inputMode="decimal" hint="Of the particles, or the thickness of the film" />
        )}
      </FieldRow>
      <KeptNote part="surface" />
    </FormSection>
  );
}
