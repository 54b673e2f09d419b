import type { Preferences } from '#shared/contracts/accounts.ts';
import { writeStored } from './local-storage.ts';

/** Where this device remembers how the table of entries is set. */
export const columnsKey = 'sillstone.columns';
export const rowsKey = 'sillstone.rows';
/** What stands for the usual columns where nothing was chosen. */
export const usualColumns = '-';

/** Remembers on this device what of a choice concerns the table: hidden columns by name, and how close the rows stand. */
export function rememberTable({ hiddenColumns, rows }: Partial<Pick<Preferences, 'hiddenColumns' | 'rows'>>): void {
  if (hiddenColumns !== undefined) writeStored(columnsKey, hiddenColumns === null ? usualColumns : hiddenColumns.join(' '));
  if (rows !== undefined) writeStored(rowsKey, rows);
}
