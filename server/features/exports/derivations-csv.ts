import type { Entry } from '#shared/contracts/entries.ts';
import { csvLine, type Cell } from './csv-line.ts';

/** Columns of `derivations.csv`: one row a line of a derivation, the same lines as on the page of the entry. */
export const derivationColumns = [
  ['accession', 'string', 'Permanent name of the entry'],
  ['version', 'integer', 'Public version of the entry'],
  ['quantity_number', 'integer', 'Place of the quantity in its entry, from 1'],
  ['quantity', 'string', 'Symbol of the quantity'],
  ['line', 'integer', 'Place of the line in its derivation, from 1'],
  ['operation', 'string', 'What was done'],
  ['from', 'string', 'Before the operation, with its unit'],
  ['to', 'string', 'After the operation, with its unit'],
  ['constant', 'string', 'Constant used'],
  ['assumption', 'string', 'What was taken for granted'],
  ['reference', 'string', 'Standard, paper or rule behind the operation'],
] as const;

type Column = (typeof derivationColumns)[number][0];

export const derivationsHeader = (): string => csvLine(derivationColumns.map(([name]) => name));

/** The derivations of one entry as lines of `derivations.csv`. */
export function derivationRows({ accession, version, quantities }: Entry): string {
  return quantities.flatMap(({ symbol, derivation }, place) => derivation.map((step, index) => {
    const values: Record<Column, Cell> = { accession, version, quantity_number: place + 1, quantity: symbol, line: index + 1, constant: undefined, assumption: undefined, ...step };
    return csvLine(derivationColumns.map(([name]) => values[name]));
  })).join('');
}
