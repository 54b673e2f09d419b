import { requireEnergyUnit, scaleEnergy } from '#shared/kinetics/energy.ts';
import type { Field, NumberField, Sheet, TableField } from './sheet.ts';
import { chosen, fieldsAsked, paramOf, unitParamOf, usualEnergyUnit, type Typed } from './typed.ts';
import { readTypedNumber, type TypedNumber } from './typed-number.ts';

/** What is wrong with a field, or with one cell of it. */
export interface Fault {
  param: string;
  message: string;
  cell?: { row: number; column: number };
}

/** A form as the calculator's input, with what is missing or cannot be read. */
export interface Reading {
  input: Record<string, unknown>;
  /** The page's own fields by their key. */
  own: Record<string, string>;
  missing: Field[];
  faults: Fault[];
  /** Rows that were passed over since a cell of them is still empty. */
  incomplete: { param: string; row: number; column: string }[];
  /** For each table by its name in the address, the rows its input was made from. */
  rowsUsed: Record<string, number[]>;
}

/** The unit picked for the energies of a field. */
export function unitPicked(field: Field, typed: Typed): string {
  return typed.values[unitParamOf(field) ?? ''] ?? usualEnergyUnit;
}

/** An energy in kJ/mol. */
function toKJPerMol(value: number, unit: string): number {
  return unit === usualEnergyUnit ? value : scaleEnergy(value, requireEnergyUnit(unit, 'unit'), requireEnergyUnit(usualEnergyUnit, 'unit'));
}

function readNumber(text: string, energyUnit: string | null, unit?: string): TypedNumber {
  const read = readTypedNumber(text, energyUnit ?? unit);
  return energyUnit !== null && 'value' in read ? { value: toKJPerMol(read.value, energyUnit) } : read;
}

/** Reads the form: numbers, choices and tables as the calculator takes them. */
export function readTyped(sheet: Sheet, typed: Typed): Reading {
  const reading: Reading = { input: {}, own: {}, missing: [], faults: [], incomplete: [], rowsUsed: {} };
  for (const field of fieldsAsked(sheet, typed)) {
    const param = paramOf(field);
    const text = typed.values[param] ?? '';
    if (field.kind === 'table') readTable(field, typed, reading);
    else if (field.kind === 'choice') {
      const value = chosen(field, typed);
      if (field.own) reading.own[field.key] = value;
      else reading.input[field.key] = field.toInput ? field.toInput(value) : value;
    } else if (text.trim() === '') {
      if (field.own) reading.own[field.key] = field.usual ?? '';
      else if (!field.optional) reading.missing.push(field);
    } else if (field.kind === 'text') {
      if (field.own) reading.own[field.key] = text.trim();
      else reading.input[field.key] = text;
    } else readNumberField(field, text, typed, reading);
  }
  return reading;
}

function readNumberField(field: NumberField, text: string, typed: Typed, reading: Reading): void {
  const read = readNumber(text, field.energy ? unitPicked(field, typed) : null, field.unit);
  if ('fault' in read) reading.faults.push({ param: paramOf(field), message: read.fault });
  else if (field.own) reading.own[field.key] = String(read.value);
  else reading.input[field.key] = read.value;
}

/** Rows as people number them, "2, 5": counted from 0, or the sentence that says what is no number of a row. */
export function rowsNamed(text: string): { rows: Set<number>; fault: string | null } {
  const words = text.split(/[\s,;]+/).filter(Boolean);
  const wrong = words.find((word) => !/^[1-9]\d{0,3}$/.test(word));
  return {
    rows: new Set(words.filter((word) => word !== wrong).map((word) => Number(word) - 1)),
    fault: wrong === undefined ? null : `"${wrong.slice(0, 20)}" is no number of a row: write them as 2, 5.`,
  };
}

function readTable(field: TableField, typed: Typed, reading: Reading): void {
  const param = paramOf(field);
  const rows = typed.tables[param] ?? [];
  const energyUnit = unitPicked(field, typed);
  const readCell = (row: number, column: number): number | string | null => {
    const { text: words, energy, unit } = field.columns[column] ?? { id: '', label: '' };
    const text = (rows[row]?.[column] ?? '').trim();
    if (text === '') return null;
    if (words) return text;
    const read = readNumber(text, energy ? energyUnit : null, unit);
    if ('value' in read) return read.value;
    reading.faults.push({ param, message: read.fault, cell: { row, column } });
    return Number.NaN;
  };

  if (field.by === 'columns') {
    let short = false;
    field.columns.forEach((column, at) => {
      const list = rows.map((_, row) => readCell(row, at)).filter((value) => value !== null);
      reading.input[column.id] = list;
      if (!column.optional && list.length < field.least) short = true;
    });
    if (short) reading.missing.push(field);
    return;
  }

  const items: Record<string, unknown>[] = [];
  const used: number[] = [];
  const leftOut = field.leftOutBy ? rowsNamed(typed.values[field.leftOutBy] ?? '') : { rows: new Set<number>(), fault: null };
  if (leftOut.fault) reading.faults.push({ param: field.leftOutBy ?? param, message: leftOut.fault });
  rows.forEach((cells, row) => {
    if (leftOut.rows.has(row) || cells.every((cell) => cell.trim() === '')) return;
    const values = field.columns.map((_, column) => readCell(row, column));
    const gap = field.columns.findIndex((column, at) => !column.optional && values[at] === null);
    if (gap >= 0) {
      reading.incomplete.push({ param, row, column: field.columns[gap]?.label ?? '' });
      return;
    }
    items.push(Object.fromEntries(field.columns.flatMap((column, at) => (column.own || (values[at] === null && !column.none) ? [] : [[column.id, values[at]]]))));
    used.push(row);
  });
  reading.input[field.key] = items;
  reading.rowsUsed[param] = used;
  if (items.length < field.least) reading.missing.push(field);
}
