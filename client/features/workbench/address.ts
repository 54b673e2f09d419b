import { energyUnits } from '#shared/kinetics/energy.ts';
import type { Field, Sheet, TableField } from './sheet.ts';
import { fieldsAsked, mostCharacters, nothingTyped, paramOf, tidy, tidyRows, unitParamOf, usualEnergyUnit, type Typed } from './typed.ts';

/** A part of an address that was left out, and why. */
export interface LeftOut {
  name: string;
  message: string;
}

/** Names of the address that belong to the instrument in the header. */
export const instrumentParams: readonly string[] = ['T', 'unit'];

/** Most characters of an address that every browser, mail program and proxy carries. */
export const longestAddress = 7500;

/** Most rows of a table. */
export const mostRowsOf = (field: TableField) => field.most ?? 300;

const marks: Readonly<Record<string, string>> = { '\\': '\\b', '_': '\\u', ' ': '\\s' };

/** Rows as one text: cells parted by a space (a "+" in the address), rows by "_". */
function printRows(rows: readonly (readonly string[])[]): string {
  return rows.map((cells) => cells.map((cell) => cell.replace(/[\\_ ]/g, (sign) => marks[sign] as string)).join(' ')).join('_');
}

function readRows(text: string): string[][] {
  return text.split('_').map((row) => row.split(' ').map((cell) => cell.replace(/\\([bus])/g, (_, sign: string) => (sign === 'b' ? '\\' : sign === 'u' ? '_' : ' '))));
}

/** The address of a form as typed: what is empty, usual or not asked is not in it. */
export function printTyped(sheet: Sheet, typed: Typed): URLSearchParams {
  const { values, tables } = tidy(sheet, typed);
  const params = new URLSearchParams();
  for (const field of fieldsAsked(sheet, typed)) {
    const param = paramOf(field);
    const unit = unitParamOf(field);
    if (values[param]) params.set(param, values[param]);
    if (tables[param]) params.set(param, printRows(tables[param]));
    if (unit && values[unit]) params.set(unit, values[unit]);
  }
  return params;
}

/** Reads a form from an address; what makes no sense in it is left out and named. */
export function readTypedFrom(sheet: Sheet, params: URLSearchParams): { typed: Typed; leftOut: LeftOut[] } {
  const given = new Map<string, string>();
  const leftOut: LeftOut[] = [];
  for (const [name, text] of params) {
    if (instrumentParams.includes(name)) continue;
    if (given.has(name)) leftOut.push({ name, message: 'given twice: the first is used' });
    else given.set(name, text);
  }
  const choices = Object.fromEntries([...given].filter(([name]) => sheet.fields.some((field) => field.kind === 'choice' && paramOf(field) === name)));
  const asked = fieldsAsked(sheet, { ...nothingTyped, values: choices });
  const values: Record<string, string> = {};
  const tables: Record<string, string[][]> = {};
  const leave = (name: string, message: string) => {
    leftOut.push({ name, message });
  };
  for (const [name, text] of given) {
    const field = asked.find((one) => paramOf(one) === name);
    const unitOf = asked.find((one) => unitParamOf(one) === name);
    if (field?.kind === 'table') {
      const rows = readRows(text);
      const faults = rowFaults(field, rows);
      if (faults) leave(name, faults);
      tables[name] = tidyRows(field, rows.slice(0, mostRowsOf(field)).map((cells) => cells.map((cell) => (cell.length > mostCharacters ? '' : cell))));
    } else if (field) {
      const fault = valueFault(field, text);
      if (fault) leave(name, fault);
      else values[name] = text;
    } else if (unitOf) {
      if ((energyUnits as readonly string[]).includes(text)) values[name] = text;
      else leave(name, `"${short(text)}" is no energy unit of the list: ${usualEnergyUnit} is used`);
    } else {
      const known = sheet.fields.some((one) => paramOf(one) === name || unitParamOf(one) === name);
      leave(name, known ? 'not asked for by what is chosen' : 'no input of this calculator');
    }
  }
  return { typed: tidy(sheet, { values, tables }), leftOut };
}

const short = (text: string) => (text.length > 30 ? `${text.slice(0, 29)}…` : text);

function valueFault(field: Exclude<Field, TableField>, text: string): string | null {
  if (field.kind === 'choice') return field.choices.some((choice) => choice.value === text) ? null : `"${short(text)}" is none of ${field.choices.map((choice) => choice.value).join(', ')}`;
  const most = (field.kind === 'text' && field.most) || mostCharacters;
  return text.length > most ? `longer than ${most} characters` : null;
}

function rowFaults(field: TableField, rows: readonly (readonly string[])[]): string | null {
  const most = mostRowsOf(field);
  if (rows.length > most) return `rows from the ${most + 1}th on`;
  const wide = rows.findIndex((cells) => cells.slice(field.columns.length).some((cell) => cell !== ''));
  if (wide >= 0) return `cells of row ${wide + 1} from the ${field.columns.length + 1}th on`;
  const long = rows.findIndex((cells) => cells.some((cell) => cell.length > mostCharacters));
  return long >= 0 ? `a cell of row ${long + 1}, longer than ${mostCharacters} characters` : null;
}

/** The part of an address that is the calculator's, in the order in which it stands. */
export function ownAddress(params: URLSearchParams): string {
  return new URLSearchParams([...params].filter(([name]) => !instrumentParams.includes(name))).toString();
}
