import { useMemo } from 'react';
import type { Fault } from '#shared/contracts/entries.ts';
import { fieldOfFault, formFaults, type FormFault } from './faults.ts';
import type { ReadForm } from './read-form.ts';

interface FieldFaults {
  /** All of them, for the list. */
  faults: FormFault[];
  /** The one to show at a field. */
  at: (path: string) => string | undefined;
}

/**
 * Faults as a list and at their fields. What cannot be read is shown at once; what is missing only once the field was left
 * or submitting was tried, so that nobody is scolded for what they have not come to yet.
 */
export function useFieldFaults(read: ReadForm, server: readonly Fault[], tried: boolean, wasTouched: (path: string) => boolean): FieldFaults {
  const faults = useMemo(() => formFaults(read.faults, server, read.rows), [read, server]);
  const local = useMemo(() => new Map(read.faults.map((fault) => [fault.path, fault.message])), [read]);
  const found = useMemo(() => new Map(faults.map((fault) => [fieldOfFault(fault.path), fault.message])), [faults]);
  return { faults, at: (path) => local.get(path) ?? (tried || wasTouched(path) ? found.get(path) : undefined) };
}
