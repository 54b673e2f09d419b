import { sortKeys, type SortKey } from '#shared/contracts/entry-search.ts';
import { usualColumns } from '#client/lib/table-setting.ts';

/** The columns of the table of entries that may be shown or not, in their order. */
export const columnNames = [
  'step', 'surface', 'barrier', 'value', 'uncertainty', 'printed', 'factor', 'rate', 'energyType', 'scope', 'provenance', 'method', 'range', 'found', 'source', 'year',
  'conditions', 'accession', 'accepted',
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
  factor: 'Pre-exponential factor',
  rate: 'k at the temperature of interest',
  energyType: 'Type of energy',
  scope: 'Scope',
  provenance: 'Provenance',
  method: 'Method',
  range: 'Valid range',
  found: 'Where the words stand',
  source: 'Source',
  year: 'Year of publication',
  conditions: 'Coverage and promoter',
  accession: 'Accession',
  accepted: 'Accepted on',
};

/** Columns that a first visitor does not see. */
const usuallyHidden: readonly ColumnName[] = ['factor', 'energyType', 'scope', 'provenance', 'year', 'conditions', 'accession', 'accepted'];

/** Columns that always stand: without them a row says nothing. */
export const fixedColumns: readonly ColumnName[] = ['step', 'surface', 'value'];

/** Reads the remembered choice of columns: the hidden ones, by name. */
export function readHidden(stored: string): ReadonlySet<ColumnName> {
  if (stored === usualColumns) return new Set(usuallyHidden);
  return new Set(columnNames.filter((name) => stored.split(' ').includes(name)));
}

/** The sort behind a heading; the other columns cannot be sorted. The value column is sorted by what it holds. */
export const columnSort: Partial<Record<ColumnName, SortKey>> = {
  step: 'step', surface: 'surface', uncertainty: 'uncertainty', factor: 'preExponential', rate: 'k', energyType: 'energyType', scope: 'scope', provenance: 'provenance',
  method: 'method', range: 'validFrom', source: 'source', year: 'year', accession: 'accession', accepted: 'accepted',
};

/** The words of a sort, its lower end and its upper end. */
const sortWords: Readonly<Record<string, readonly [name: string, up: string, down: string]>> = {
  energy: ['energy', 'smallest first', 'largest first'], uncertainty: ['uncertainty', 'smallest first', 'largest first'],
  preExponential: ['pre-exponential factor', 'smallest first', 'largest first'], k: ['k at the temperature of interest', 'smallest first', 'largest first'],
  year: ['year', 'earliest first', 'latest first'], validFrom: ['lower end of the valid range', 'lowest first', 'highest first'],
  validTo: ['upper end of the valid range', 'lowest first', 'highest first'], accepted: ['day of acceptance', 'earliest first', 'latest first'],
  step: ['elementary step', 'a to z', 'z to a'], metal: ['metal', 'a to z', 'z to a'], surface: ['surface', 'a to z', 'z to a'], source: ['source', 'a to z', 'z to a'],
  method: ['method', 'a to z', 'z to a'], scope: ['scope', 'a to z', 'z to a'], provenance: ['provenance', 'a to z', 'z to a'], energyType: ['type of energy', 'a to z', 'z to a'],
  accession: ['accession', 'a to z', 'z to a'],
};

/** A sort in words: "energy, largest first". */
export function wordsOfSort(sort: SortKey): string {
  const { key, descending } = tableSort(sort);
  const [name, up, down] = sortWords[key] ?? [key, '', ''];
  return `${name}, ${descending ? down : up}`;
}

/** A sort in short: its name, and its sense only where it is turned round. */
export function shortWordsOfSort(sort: SortKey): string {
  return sort.startsWith('-') ? wordsOfSort(sort) : wordsOfSort(sort).replace(/,.*/, '');
}

/** A sort as the table shows it: its key and its sense. */
export function tableSort(sort: SortKey): { key: string; descending: boolean } {
  return sort.startsWith('-') ? { key: sort.slice(1), descending: true } : { key: sort, descending: false };
}

/** A sort of the table as the address has it; null when it is none that the server knows. */
export function sortOf(sort: { key: string; descending: boolean }): SortKey | null {
  const name = `${sort.descending ? '-' : ''}${sort.key}`;
  return sortKeys.find((key) => key === name) ?? null;
}
