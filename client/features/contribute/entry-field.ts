import { createContext, useContext } from 'react';
import { useFormContext, type Path } from 'react-hook-form';
import type { EntryForm } from './entry-form.ts';

/** The id of the field at a path of the input: what a fault's link leads to. */
export function fieldId(path: string): string {
  return `entry-${path.replaceAll('.', '-')}`;
}

/** The message to show at a field, by its path. */
export const FaultsContext = createContext<(path: string) => string | undefined>(() => undefined);

export function useFaultAt(): (path: string) => string | undefined {
  return useContext(FaultsContext);
}

/** What a field of the form needs: its registration, its id and its error. */
export function useEntryField() {
  const { register } = useFormContext<EntryForm>();
  const faultAt = useFaultAt();
  return (path: Path<EntryForm>) => {
    const { onChange, onBlur, name, ref } = register(path);
    return { onChange, onBlur, name, ref, id: fieldId(path), error: faultAt(path) };
  };
}

/** Fields that stand for a part of the input as a whole. */
const standIns: Readonly<Record<string, string>> = {
  'source': 'source.box', 'source.doi': 'source.box', 'source.id': 'source.box', 'source.bibtex': 'source.box', 'source.ris': 'source.box',
  'source.csl': 'source.typed.title', 'step': 'step.equation', 'surface': 'surface.metal', 'method': 'method.class', 'validRange': 'validRange.min',
  'quantities': 'quantities.0.asPrinted', 'rateOf': 'rateOf.counts', 'kineticOrders': 'kineticOrders.add',
};

/**
 * Moves the focus to the field a path names, or the nearest that is on the page.
 * @returns the path of the field that has it now, or null when none is there
 */
export function focusField(path: string): string | null {
  const dotted = path.replace(/^\//, '').replaceAll('/', '.').replace(/\[(\d+)\]/g, '.$1');
  for (let rest = dotted; rest; rest = rest.includes('.') ? rest.slice(0, rest.lastIndexOf('.')) : '') {
    const at = /^quantities\.\d+$/.test(rest) ? `${rest}.asPrinted` : rest;
    for (const candidate of [at, standIns[at]]) {
      const element = candidate ? document.getElementById(fieldId(candidate)) ?? document.getElementsByName(candidate)[0] : null;
      if (!element) continue;
      element.scrollIntoView({ block: 'center' });
      element.focus({ preventScroll: true });
      return candidate ?? null;
    }
  }
  return null;
}
