import type { PastedTable } from '#client/lib/pasted-table.ts';

type Rows = readonly (readonly string[])[];

/** The text of a cell; one that is not there is empty. */
export function cellOf(cells: readonly string[], column: number): string {
  return cells[column] ?? '';
}

/** The rows with as many cells as there are columns, and at least so many rows. */
export function padRows(rows: Rows, columns: number, minRows: number): string[][] {
  return Array.from({ length: Math.max(rows.length, minRows) }, (_, row) => Array.from({ length: columns }, (_one, column) => cellOf(rows[row] ?? [], column)));
}

/** The rows without the empty ones at the end. */
export function trimRows(rows: Rows): string[][] {
  const last = rows.findLastIndex((cells) => cells.some((cell) => cell.trim() !== ''));
  return rows.slice(0, last + 1).map((cells) => [...cells]);
}

export function sameRows(one: Rows, other: Rows): boolean {
  return one.length === other.length && one.every((cells, row) => cells.length === other[row]?.length && cells.every((cell, column) => cell === other[row]?.[column]));
}

/** The rows after a paste, and how much of it found room. */
export interface Filled {
  rows: string[][];
  rowsTaken: number;
  columnsTaken: number;
}

/** Writes a pasted table over the rows, from one cell on to the right and downwards. */
export function fillFrom(rows: Rows, table: Rows, at: { row: number; column: number; columns: number; mostRows: number }): Filled {
  const rowsTaken = Math.max(0, Math.min(table.length, at.mostRows - at.row));
  const columnsTaken = Math.min(Math.max(0, ...table.map((cells) => cells.length)), at.columns - at.column);
  const filled = padRows(rows, at.columns, Math.max(rows.length, at.row + rowsTaken));
  table.slice(0, rowsTaken).forEach((cells, row) => {
    const target = filled[at.row + row];
    if (target) cells.slice(0, columnsTaken).forEach((cell, column) => { target[at.column + column] = cell; });
  });
  return { rows: filled, rowsTaken, columnsTaken };
}

const count = (number: number, one: string) => `${number} ${one}${number === 1 ? '' : 's'}`;

/** What a paste did, in a sentence: what was read, what was left out, what was changed. */
export function reportOf(table: PastedTable, filled: Filled, mostRows: number): string {
  if (table.rows.length === 0) return 'Nothing to read in what was pasted: no line holds a number.';
  const parts = [`${count(filled.rowsTaken, 'row')}, ${count(filled.columnsTaken, 'column')} read`];
  if (table.headerLines > 0) parts.push(table.headerLines === 1 ? 'header skipped' : `${table.headerLines} header lines skipped`);
  if (table.decimalCommas > 0) parts.push('decimal commas written as points');
  if (table.rows.length > filled.rowsTaken) parts.push(`${count(table.rows.length - filled.rowsTaken, 'row')} left out, since a table holds at most ${mostRows}`);
  if (table.columns > filled.columnsTaken) parts.push(`${count(table.columns - filled.columnsTaken, 'column')} left out, since there is no room to the right`);
  if (table.ambiguous > 0) parts.push(`${count(table.ambiguous, 'cell')} with a comma that may be a decimal or a thousands sign, left as ${table.ambiguous === 1 ? 'it is' : 'they are'}`);
  return `${parts.join('; ')}.`;
}
