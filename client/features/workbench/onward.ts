import { printTyped } from './address.ts';
import type { Onward } from './sheet.ts';
import { sheetNamed } from './purposes.ts';
import { nothingTyped } from './typed.ts';

/** The address of the calculation that goes on from another, filled with what is handed over. */
export function addressOf({ to, values }: Onward): string {
  const found = sheetNamed(to);
  const query = found ? printTyped(found.sheet, { ...nothingTyped, values }).toString() : '';
  return `/workbench/${to}${query ? `?${query}` : ''}`;
}
