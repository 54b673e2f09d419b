import { useQuery } from '@tanstack/react-query';
import { useFormContext, useWatch } from 'react-hook-form';
import type { Fault, Preview } from '#shared/contracts/entries.ts';
import { Button } from '#client/ui/button.tsx';
import { Equation } from '#client/ui/equation.tsx';
import { InputField } from '#client/ui/field.tsx';
import { vocabularyOptions } from '../api.ts';
import { fieldId, useEntryField } from '../entry-field.ts';
import type { EntryForm } from '../entry-form.ts';
import { FormSection } from './form-section.tsx';

/** The fault of the equation that names a spelling which would be right. */
function stepSuggestion(faults: readonly Fault[]): Fault | undefined {
  return faults.find((fault) => fault.path.startsWith('step') && fault.suggestion);
}

/** The elementary step, set as it is typed; what is not balanced is said, and missing free sites are offered. */
export function StepSection({ preview }: { preview: Preview | undefined }) {
  const field = useEntryField();
  const { setValue } = useFormContext<EntryForm>();
  const equation = useWatch<EntryForm, 'step.equation'>({ name: 'step.equation' });
  const { data: vocabulary } = useQuery(vocabularyOptions);
  const suggestion = equation.trim() ? stepSuggestion(preview?.faults ?? []) : undefined;

  return (
    <FormSection title="Elementary step" hint="As the source means it, in the direction of the printed value; the overall reaction when the value is apparent.">
      <InputField
        {...field('step.equation')} label="Equation" typed list={fieldId('steps')}
        hint={<>Adsorbed species with an asterisk, a free site as <code>*</code>: <code>{'NH3* + * -> NH2* + H*'}</code></>}
      />
      <datalist id={fieldId('steps')}>
        {vocabulary?.steps.map((step) => <option key={step.code} value={typeof step.data.equation === 'string' ? step.data.equation : step.label}>{step.label}</option>)}
      </datalist>
      {equation.trim() && (
        <p className="flex flex-wrap items-baseline gap-x-4 text-lead" aria-live="polite">
          <Equation display equation={preview?.step?.equation ?? equation} />
          {preview?.step && <span className="text-fine text-second">{preview.step.class.replaceAll('-', ' ')}</span>}
        </p>
      )}
      {suggestion?.suggestion && (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <Button
            small
            // Leaving the field would set its error, which moves this button from under the pointer before it is pressed.
            onPointerDown={(event) => event.preventDefault()}
            onMouseDown={(event) => event.preventDefault()}
            onClick={() => {
              setValue('step.balancedAs', suggestion.suggestion ?? '');
              setValue('step.equation', suggestion.suggestion ?? '', { shouldDirty: true });
            }}
          >
            Add the free site
          </Button>
          <span className="text-second">gives <Equation equation={suggestion.suggestion} />; the entry will record it as an assumption.</span>
        </div>
      )}
    </FormSection>
  );
}
