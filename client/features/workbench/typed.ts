import type { ChoiceField, Field, Sheet, TableField } from './sheet.ts';

/** A form as it is typed: the text of each field and the cells of each table, by their names in the address. */
export interface Typed {
  values: Readonly<Record<string, string>>;
  tables: Readonly<Record<string, readonly (readonly string[])[]>>;
}

export const nothingTyped: Typed = { values: {}, tables: {} };

/** The unit of an energy when none is picked. */
export const usualEnergyUnit = 'kJ/mol';

/** Most characters of a field that does not say otherwise, and of a cell. */
export const mostCharacters = 200;

/** The name of a field in the address. */
export function paramOf(field: Field): string {
  return field.param ?? (field.kind === 'number' && field.energy ? field.key.replace(/KJPerMol$/, '') : field.key);
}

/** The name, in the address, of the unit picked for an energy or for the energies of a table; null where none is picked. */
export function unitParamOf(field: Field): string | null {
  const picked = (field.kind === 'number' && field.energy) || (field.kind === 'table' && field.columns.some((column) => column.energy));
  return picked ? `${paramOf(field)}Unit` : null;
}

/** The unit a number or a column is said to be in, fixed or by another field; empty where there is none. */
export function unitSaid(sheet: Sheet, typed: Typed, { unit, unitFrom }: { unit?: string; unitFrom?: string }): string {
  if (unitFrom === undefined) return unit ?? '';
  const field = sheet.fields.find((one) => paramOf(one) === unitFrom);
  return (typed.values[unitFrom] ?? '').trim() || (field && 'usual' in field && field.usual) || '';
}

/** The choice in force: what was chosen, or what is usual. */
export function chosen(field: ChoiceField, typed: Typed): string {
  const value = typed.values[paramOf(field)];
  return field.choices.some((choice) => choice.value === value) ? value as string : field.usual;
}

/** The fields that are asked, as the choices stand. */
export function fieldsAsked(sheet: Sheet, typed: Typed): Field[] {
  const choices = new Map<string, string>();
  return sheet.fields.filter((field) => {
    const asked = Object.entries(field.only ?? {}).every(([param, values]) => values.includes(choices.get(param) ?? ''));
    if (asked && field.kind === 'choice') choices.set(paramOf(field), chosen(field, typed));
    return asked;
  });
}

/** The rows of a table with a cell for each column and no empty rows at the end. */
export function tidyRows(field: TableField, rows: readonly (readonly string[])[] = []): string[][] {
  const padded = rows.map((cells) => field.columns.map((_, index) => cells[index] ?? ''));
  return padded.slice(0, padded.findLastIndex((cells) => cells.some((cell) => cell !== '')) + 1);
}

/** The same form without what says nothing: empty fields, usual choices and units, and what is not asked. */
export function tidy(sheet: Sheet, typed: Typed): Typed {
  const values: Record<string, string> = {};
  const tables: Record<string, string[][]> = {};
  for (const field of fieldsAsked(sheet, typed)) {
    const param = paramOf(field);
    const unit = unitParamOf(field);
    if (field.kind === 'table') {
      const rows = tidyRows(field, typed.tables[param]);
      if (rows.length > 0) tables[param] = rows;
    } else if (field.kind === 'choice') {
      const value = chosen(field, typed);
      if (value !== field.usual) values[param] = value;
    } else if (typed.values[param]) values[param] = typed.values[param];
    if (unit && typed.values[unit] && typed.values[unit] !== usualEnergyUnit) values[unit] = typed.values[unit];
  }
  return { values, tables };
}

/** Whether nothing is typed; choices alone do not count. */
export function isEmpty(sheet: Sheet, typed: Typed): boolean {
  return fieldsAsked(sheet, typed).every((field) => {
    const param = paramOf(field);
    if (field.kind === 'choice') return true;
    if (field.kind === 'table') return tidyRows(field, typed.tables[param]).length === 0;
    return (typed.values[param] ?? '').trim() === '' || field.own === true;
  });
}
