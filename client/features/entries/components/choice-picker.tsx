import { useCallback, useMemo, useState, type ReactNode } from 'react';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { Equation } from '#client/ui/equation.tsx';
import { Picker, type TypedOption } from '#client/ui/picker.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import type { ChoiceOption, Choices } from '../choices.ts';
import { isEquation, typedStep } from '../step-choices.ts';

interface ChoicePickerProps {
  title: string;
  unset: string;
  choices: Choices;
  /** Under which name the last choices are remembered. */
  recent: string;
  placeholder: string;
  asTyped?: (typed: string) => TypedOption | null;
  onType?: (typed: string) => void;
  onChange: (change: Partial<EntryFilter>) => void;
}

/** A part of the sentence whose one list sets several filters. */
export function ChoicePicker({ title, unset, choices, recent, placeholder, asTyped, onType, onChange }: ChoicePickerProps) {
  const { chosen, words, equation, change } = choices;
  const options = useMemo(() => choices.options.map(set), [choices.options]);
  return (
    <Picker
      label={title}
      summary={equation === null ? words ?? unset : <Equation equation={equation} />}
      summaryText={words ?? unset}
      options={options}
      chosen={chosen}
      search
      placeholder={placeholder}
      recent={recent}
      {...(choices.counted ? {} : { empty: 'Fetching what there is to choose from.' })}
      clearLabel={unset.replace(/^./, (first) => first.toUpperCase())}
      onChange={(next, toggled) => onChange(change(next, toggled))}
      {...(asTyped ? { asTyped } : {})}
      {...(onType ? { onType } : {})}
    />
  );
}

function set({ equation, formula, ...option }: ChoiceOption): ChoiceOption & { display?: ReactNode } {
  if (equation !== undefined) return { ...option, display: <Equation equation={equation} /> };
  return formula === undefined ? option : { ...option, display: <SurfaceLabel label={option.label} /> };
}

type ReadStep = (typeof import('#shared/steps/parse-step.ts'))['readStep'];

/** The elementary step: what is typed may also be an equation, in any notation, or words that the server reads. */
export function StepPicker({ choices, ...rest }: Omit<ChoicePickerProps, 'asTyped' | 'onType' | 'placeholder' | 'recent'>) {
  const [readStep, setReader] = useState<ReadStep | null>(null);
  const onType = useCallback((typed: string) => {
    // The reader of equations is fetched for the first one that is typed; without it the server reads all the same.
    if (isEquation(typed)) void import('#shared/steps/parse-step.ts').then((module) => setReader(() => module.readStep), () => undefined);
  }, []);
  const { counted, options } = choices;
  const asTyped = useCallback((typed: string) => {
    // Before the list is there, words would be taken for free ones that the list may hold.
    if (!counted && !isEquation(typed)) return null;
    return typedStep(typed, options.map(set), readStep && isEquation(typed) ? keyOf(readStep, typed) : null);
  }, [counted, options, readStep]);
  return <ChoicePicker choices={choices} recent="step" placeholder="equation, species, class or bond" asTyped={asTyped} onType={onType} {...rest} />;
}

/** The key that both directions of an equation share; null while it cannot be read. */
function keyOf(readStep: ReadStep, equation: string): string | null {
  try {
    return readStep(equation).key;
  } catch {
    return null;
  }
}
