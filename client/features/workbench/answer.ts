import { runCalculator } from '#shared/calculators/calculator.ts';
import type { DerivationLine } from '#shared/contracts/quantities.ts';
import type { EntryStart, Field, Given, Onward, Outcome, Sheet } from './sheet.ts';
import { readTyped, type Fault, type Reading } from './read-typed.ts';
import { fieldsAsked, isEmpty, paramOf, type Typed } from './typed.ts';
import { sentence } from './typed-number.ts';

/** What the form amounts to: nothing yet, something in the way, or a result. */
export type Answer =
  | { state: 'empty' }
  | { state: 'missing'; missing: readonly Field[]; faults: readonly Fault[] }
  | { state: 'faulty'; faults: readonly Fault[]; suggestion?: string }
  | {
    state: 'result'; outcome: Outcome; given: Given<unknown, unknown>; derivation: readonly DerivationLine[]; onward: readonly Onward[]; entry: EntryStart | null;
    /** Rows passed over, in words. */
    notes: readonly string[];
  };

/** Calculates what is typed, by the same code that answers over HTTP. */
export function answerOf(sheet: Sheet, typed: Typed): Answer {
  if (isEmpty(sheet, typed)) return { state: 'empty' };
  const reading = readTyped(sheet, typed);
  if (reading.missing.length > 0) return { state: 'missing', missing: reading.missing, faults: reading.faults };
  if (reading.faults.length > 0) return { state: 'faulty', faults: reading.faults };
  const calculation = runCalculator(sheet.calculator, reading.input);
  if ('faults' in calculation) {
    const suggestion = calculation.faults.map((fault) => fault.context?.suggestion).find((one) => typeof one === 'string');
    return { state: 'faulty', faults: calculation.faults.map((fault) => placed(sheet, typed, reading, fault)), ...(suggestion ? { suggestion } : {}) };
  }
  const { result } = calculation;
  const given: Given<unknown, unknown> = {
    result, input: sheet.calculator.input.parse(reading.input), own: reading.own,
    typed: (param) => typed.values[param] ?? '', rowsOf: (param) => reading.rowsUsed[param] ?? [], cells: (param) => typed.tables[param] ?? [],
  };
  return {
    state: 'result', given, outcome: sheet.outcome(given), onward: sheet.onward?.(given) ?? [], entry: sheet.entry?.(given) ?? null,
    derivation: result.derivation as DerivationLine[],
    notes: reading.incomplete.map(({ row, column }) => `Row ${row + 1} is not used: ${column} is empty.`),
  };
}

/** The words a field goes by in messages. */
export function fieldName(field: Pick<Field, 'label' | 'symbol'>): string {
  return field.symbol ? `${field.label} ${field.symbol.replace(/[_^]\{([^}]*)\}/g, '$1')}` : field.label;
}

/** A fault of the calculator at the field that was typed, in the page's words. */
function placed(sheet: Sheet, typed: Typed, reading: Reading, fault: { path: string; message: string }): Fault {
  const [head = '', row, cell] = fault.path.split('.');
  const asked = fieldsAsked(sheet, typed);
  const message = sentence(inWords(fault.message, asked));
  for (const field of asked) {
    const param = paramOf(field);
    if (field.kind !== 'table') {
      if (field.key === head && !field.own) return { param, message };
      continue;
    }
    const column = field.by === 'columns' ? field.columns.findIndex((one) => one.id === head) : field.columns.findIndex((one) => one.id === cell);
    if (field.by === 'columns' && column >= 0) {
      const filled = (typed.tables[param] ?? []).flatMap((cells, at) => ((cells[column] ?? '').trim() === '' ? [] : [at]));
      const at = row === undefined ? undefined : filled[Number(row)];
      return at === undefined ? { param, message } : { param, message, cell: { row: at, column } };
    }
    if (field.by === 'rows' && field.key === head) {
      const at = row === undefined ? undefined : reading.rowsUsed[param]?.[Number(row)];
      return at === undefined ? { param, message } : { param, message, cell: { row: at, column: Math.max(0, column) } };
    }
  }
  return { param: '', message };
}

/** A message with the names that inputs have over HTTP replaced by those of the form. */
function inWords(message: string, fields: readonly Field[]): string {
  const names = fields.flatMap((field) => (field.kind === 'table'
    ? [[field.key, field.label] as const, ...field.columns.map((column) => [column.id, column.label] as const)]
    : [[field.key, field.label] as const]));
  return names.filter(([key]) => /[a-z][A-Z]/.test(key)).reduce((text, [key, label]) => text.replace(new RegExp(`\\b${key}\\b(?![.\\w])`, 'g'), label.charAt(0).toLowerCase() + label.slice(1)), message);
}
