import type { Sheet } from './sheet.ts';
import type { Typed } from './typed.ts';

/** The form filled with the example. */
export function exampleOf({ example }: Sheet): Typed {
  return { values: example.values ?? {}, tables: example.tables ?? {} };
}
