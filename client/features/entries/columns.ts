import { sortKeys, type SortKey } from '#shared/contracts/entry-search.ts';

/** The columns of the table of entries that may be shown or not, in their order. */
export const columnNames = [
  'step', 'surface', 'barrier', 'value', 'uncertainty', 'printed', 'rate', 'energyType', 'scope', 'method', 'range', 'source', 'conditions', 'accession',
] as const;
export type ColumnName = (typeof columnNames)[number];

/** What a column is called where columns are chosen. */
export const columnWords: Readonly<Record<ColumnName, string>> = {
  step: 'Elementary step',
  surface: 'Surface',
  barrier: 'Drawn barrier',
  value: 'Converted value',
  uncertainty: 'Standard uncertainty',
  printed: 'As printed',
  rate: 'k at the temperature of interest',
  energyType: 'Type of energy',
  scope: 'Scope',
  method: 'Method',
  range: 'Valid range',
  source: 'Source',
  conditions: 'Coverage and promoter',
  accession: 'Accession',
};

/** Columns that a first visitor does not see. */
const usuallyHidden: readonly ColumnName[] = ['energyType', 'scope', 'conditions', 'accession'];

/** Columns that always stand: without them a row says nothing. */
export const fixedColumns: readonly ColumnName[] = ['step', 'surface', 'value'];

/** Reads the remembered choice of columns: the hidden ones, by name. */
export function readHidden(stored: string): ReadonlySet<ColumnName> {
  if (stored === usual) return new Set(usuallyHidden);
  return new Set(columnNames.filter((name) => stored.split(' ').includes(name)));
}

/** What stands for the usual columns where nothing was chosen. */
export const usual = '-';

/** Prints a choice of columns to be remembered. */
export function printHidden(hidden: ReadonlySet<ColumnName>): string {
  return columnNames.filter((name) => hidden.has(name)).join(' ');
}

/** The sort behind a heading; the other columns cannot be sorted. */
export const columnSort: Partial<Record<ColumnName, SortKey>> = {
  step: 'step', surface: 'metal', value: 'energy', uncertainty: 'uncertainty', rate: 'k', method: 'method', range: 'validFrom', source: 'source',
};

/** A sort as the table shows it: its key and its sense. */
export function tableSort(sort: SortKey): { key: string; descending: boolean } {
  return sort.startsWith('-') ? { key: sort.slice(1), descending: true } : { key: sort, descending: false };
}

/** A sort of the table as the address has it; null when it is none that the server knows. */
export function sortOf(sort: { key: string; descending: boolean }): SortKey | null {
  const name = `${sort.descending ? '-' : ''}${sort.key}`;
  return sortKeys.find((key) => key === name) ?? null;
}
