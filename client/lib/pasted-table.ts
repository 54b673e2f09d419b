/** What separates the columns of a pasted text. */
export type ColumnSeparator = 'tab' | 'semicolon' | 'comma' | 'space';

/** A text from a spreadsheet, a file or a paper, read as rows of cells. */
export interface PastedTable {
  /** The rows without header lines and empty lines; each has as many cells as `columns`. */
  rows: string[][];
  columns: number;
  /** Lines at the top that hold names or units in the place of numbers. */
  headerLines: number;
  separator: ColumnSeparator;
  /** Cells whose decimal comma was set as a point. */
  decimalCommas: number;
  /** Cells such as 1,234 that may be read in two ways; they are left as they are. */
  ambiguous: number;
}

const signs: Readonly<Record<Exclude<ColumnSeparator, 'space'>, string>> = { tab: '\t', semicolon: ';', comma: ',' };

/** A number with point or comma; "<" and "≈" before it are a bound, which is a value too. */
const numberPattern = /^[<>≤≥≈~]?\s*[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i;
const commaNumber = /^([<>≤≥≈~]?\s*[+-]?\d*),(\d+(?:e[+-]?\d+)?)$/i;
const twoReadings = /^[<>≤≥≈~]?\s*[+-]?[1-9]\d{0,2},\d{3}$/;
const powerOfTen = /(\d)\s*[×x·*]\s*10\s*\^?\s*\(?\s*([+-]?\d+)\s*\)?(?![\d.])/gi;

const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Powers of ten as programs write them: 1.2 × 10^-3 and 1.2×10⁻³ as 1.2e-3. */
function plainPowers(text: string): string {
  const lowered = text.replace(/10([⁺⁻]?)([⁰¹²³⁴-⁹]+)/g, (_, sign: string, digits: string) => `10^${sign === '⁻' ? '-' : ''}${[...digits].map((digit) => raised.indexOf(digit)).join('')}`);
  return lowered.replace(powerOfTen, '$1e$2');
}

/** Spaces of every width as one, signs of every kind as those that programs write. */
function plainSigns(text: string): string {
  return text.replace(/\r\n?/g, '\n').replace(/[\u00a0\u2007\u2009\u202f]/g, ' ').replace(/[\u2212\u2012\u2013\ufe63\uff0d](?=\s*[\d.,])/g, '-').replace(/\ufeff/g, '');
}

/** Records and cells by one sign, with the quotes that spreadsheets put around cells; an open quote ends with the text. */
function splitBy(text: string, sign: string): string[][] {
  const records: string[][] = [];
  let record: string[] = [];
  let cell = '';
  let quoted = false;
  for (let at = 0; at < text.length; at += 1) {
    const character = text[at] as string;
    if (quoted) {
      if (character !== '"') cell += character;
      else if (text[at + 1] === '"') {
        cell += '"';
        at += 1;
      } else quoted = false;
    } else if (character === '"' && cell.trim() === '') {
      quoted = true;
      cell = '';
    } else if (character === sign || character === '\n') {
      record.push(cell);
      cell = '';
      if (character === '\n') {
        records.push(record);
        record = [];
      }
    } else cell += character;
  }
  record.push(cell);
  records.push(record);
  return records;
}

/** Cells by white space; what belongs together with spaces inside (a power of ten, a ±) is drawn together first. */
function splitBySpace(text: string): string[][] {
  const joined = plainPowers(text).replace(/[ ]*(±|\+\/-)[ ]*/g, '$1').replace(/([<>≤≥≈~]) +(?=[\d.+-])/g, '$1');
  return joined.split('\n').map((line) => line.trim().split(/[ \t]+/));
}

/** A comma between two numbers of a line is a separator unless white space parts the line into numbers already. */
function commaOrSpace(text: string): ColumnSeparator {
  const lines = text.split('\n').map((line) => line.trim()).filter(Boolean);
  if (!lines.some((line) => line.includes(','))) return 'space';
  const data = splitBySpace(lines.join('\n')).filter((cells) => cells.some((cell) => /\d/.test(cell)) && cells.length > 1);
  const numbers = data.filter((cells) => cells.every((cell) => numberPattern.test(cell) && !cell.endsWith(',')));
  return numbers.length > 0 && numbers.length * 2 > data.length ? 'space' : 'comma';
}

function separatorOf(text: string): ColumnSeparator {
  if (text.includes('\t')) return 'tab';
  if (text.includes(';')) return 'semicolon';
  return commaOrSpace(text);
}

/** Whether a cell holds a number, with a decimal point or comma. */
function isNumber(cell: string): boolean {
  return numberPattern.test(plainPowers(cell).replace(/^([+-])\s+/, '$1'));
}

/**
 * Reads a pasted text as a table: columns by tab, semicolon, comma or white space; leading lines without a number are
 * taken for a header; decimal commas become points where they cannot be anything else.
 *
 * @example readPastedTable('T/K;k\n300;1,5e-3').rows // [['300', '1.5e-3']]
 */
export function readPastedTable(text: string): PastedTable {
  const plain = plainSigns(text);
  const separator = separatorOf(plain);
  const split = separator === 'space' ? splitBySpace(plain) : splitBy(plain, signs[separator]);
  const records = split.map((record) => record.map((cell) => cell.replace(/\s+/g, ' ').trim())).filter((record) => record.some((cell) => cell !== ''));
  const firstData = records.findIndex((record) => (separator === 'space' ? isNumber(record[0] ?? '') : record.some(isNumber)));
  const headerLines = Math.max(0, firstData);
  const data = records.slice(headerLines);
  const columns = Math.max(0, ...data.map(usedCells));
  const points = data.some((record) => record.some((cell) => /\d\.\d|^\.\d/.test(cell)));
  const sureCommas = data.some((record) => record.some((cell) => commaNumber.test(cell) && !twoReadings.test(cell)));
  let decimalCommas = 0;
  let ambiguous = 0;
  const setCell = (cell: string): string => {
    const match = commaNumber.exec(cell);
    if (!match) return cell;
    // In a text with other decimal commas and no decimal point, 1,234 is one of them.
    if (twoReadings.test(cell) && (points || !sureCommas)) {
      ambiguous += 1;
      return cell;
    }
    decimalCommas += 1;
    return `${match[1]}.${match[2]}`;
  };
  const rows = data.map((record) => Array.from({ length: columns }, (_, index) => setCell(record[index] ?? '')));
  return { rows, columns, headerLines, separator, decimalCommas, ambiguous };
}

/** How many cells a record has up to its last one that is not empty: spreadsheets end lines with empty cells. */
function usedCells(record: readonly string[]): number {
  return record.findLastIndex((cell) => cell !== '') + 1;
}

/** Whether a pasted text is more than one cell, so that it should fill several. */
export function isTable(text: string): boolean {
  const trimmed = text.replace(/^\n+|\s+$/g, '');
  if (/[\t\n;]/.test(trimmed)) return true;
  const { rows, columns } = readPastedTable(trimmed);
  return columns > 1 && (rows[0] ?? []).every(isNumber) && /\s/.test(trimmed.trim());
}
