import Papa from 'papaparse';

export type Cell = string | number | boolean | null | undefined;

/** Keeps a spreadsheet from running a text cell as a formula; plain numbers are left alone. The manifest says so, and an import takes it off. */
function guardCell(text: string): string {
  return /^[=+\-@\t\r]/.test(text) && !/^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(text) ? `'${text}` : text;
}

/** One line of a table (RFC 4180). */
export function csvLine(cells: readonly Cell[]): string {
  const texts = cells.map((cell) => (cell === null || cell === undefined ? '' : typeof cell === 'string' ? guardCell(cell) : String(cell)));
  return `${Papa.unparse([texts], { newline: '\r\n', header: false })}\r\n`;
}
