import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { csvText, type CsvCell } from '#client/lib/csv-text.ts';
import type { Answer } from './answer.ts';
import { figureText, type Figure } from './figures.ts';
import { unitPicked } from './read-typed.ts';
import type { Sheet, TableField } from './sheet.ts';
import { chosen, fieldsAsked, paramOf, tidyRows, unitSaid, usualEnergyUnit, type Typed } from './typed.ts';

/** A field that was filled, as it is printed and copied. */
export type InputLine = { label: string; symbol?: string; text: string; unit: string } | { label: string; table: TableField; rows: string[][]; units: string[] };

/** What was given: the filled fields and the choices in force, in the order of the form. */
export function inputLines(sheet: Sheet, typed: Typed): InputLine[] {
  return fieldsAsked(sheet, typed).flatMap((field): InputLine[] => {
    const param = paramOf(field);
    const { label, symbol } = field;
    if (field.kind === 'table') {
      const rows = tidyRows(field, typed.tables[param]).filter((cells) => cells.some((cell) => cell.trim() !== ''));
      return rows.length === 0 ? [] : [{ label, table: field, rows, units: field.columns.map((column) => (column.energy ? unitPicked(field, typed) : unitSaid(sheet, typed, column))) }];
    }
    if (field.kind === 'choice') {
      const value = chosen(field, typed);
      return [{ label, text: field.choices.find((choice) => choice.value === value)?.label ?? value, unit: '' }];
    }
    const text = (typed.values[param] ?? '').trim();
    const usual = 'usual' in field ? field.usual : undefined;
    if (text === '' && !usual) return [];
    const unit = field.kind === 'number' ? (field.energy ? unitPicked(field, typed) : unitSaid(sheet, typed, field)) : '';
    return [{ label, symbol, text: text || `${usual ?? ''} (as usual)`, unit }];
  });
}

type Result = Extract<Answer, { state: 'result' }>;

const indexed = (text: string) => text.replace(/([_^])\{([^}]*)\}/g, (_, sign: string, inside: string) => (sign === '^' ? `^${inside}` : `_${inside}`));

const figureLine = (figure: Figure, energyUnit: EnergyUnit) => `  ${figure.label}${figure.symbol ? ` ${indexed(figure.symbol)}` : ''}: ${figureText(figure, energyUnit)}${figure.note ? ` (${figure.note})` : ''}`;

/** The whole calculation as plain text: given, result, derivation, formula, where it holds, its address. */
export function reportText(sheet: Sheet, typed: Typed, answer: Result, { energyUnit, link }: { energyUnit: EnergyUnit; link: string }): string {
  const { calculator } = sheet;
  const { outcome, derivation, notes } = answer;
  const given = inputLines(sheet, typed).flatMap((line) => ('table' in line
    ? [`  ${line.label}`, `    ${line.table.columns.map((column, at) => [column.label, line.units[at]].filter(Boolean).join(' / ')).join('\t')}`, ...line.rows.map((cells) => `    ${cells.join('\t')}`)]
    : [`  ${line.label}${line.symbol ? ` ${indexed(line.symbol)}` : ''}: ${[line.text, line.unit].filter(Boolean).join(' ')}`]));
  const warnings = [...(outcome.warnings ?? []), ...notes];
  return [
    calculator.title, 'Sillstone, Workbench', ...(link ? [link] : []),
    '', 'Given', ...given,
    '', 'Result', ...[...outcome.main, ...outcome.facts].map((figure) => figureLine(figure, energyUnit)),
    ...(warnings.length > 0 ? ['', 'To be heeded', ...warnings.map((warning) => `  ${warning}`)] : []),
    '', 'Derivation', ...derivation.map((line, index) => `  ${index + 1}. ${line.operation}: ${line.from} -> ${line.to}${[line.constant, line.assumption && `assumed: ${line.assumption}`, line.reference].filter(Boolean).map((part) => `; ${part ?? ''}`).join('')}`),
    '', 'Formula', ...calculator.formulas.map((formula) => `  ${indexed(formula)}`),
    '', 'Where it holds', `  ${indexed(calculator.validity)}`,
    '', 'Sources', ...calculator.references.map((reference) => `  ${reference}`), '',
  ].join('\n');
}

const header = ['role', 'quantity', 'symbol', 'row', 'value', 'low', 'high', 'standard_uncertainty', 'uncertainty_of', 'unit'];

/** The calculation as CSV: what was given and what came out, numbers in full, energies of the result in kJ/mol. */
export function reportCsv(sheet: Sheet, typed: Typed, answer: Result): string {
  const given = inputLines(sheet, typed).flatMap((line): CsvCell[][] => ('table' in line
    ? line.rows.flatMap((cells, row) => line.table.columns.flatMap((column, at) => (cells[at]?.trim() ? [['given', column.label, '', row + 1, cells[at], '', '', '', '', line.units[at]]] : [])))
    : [['given', line.label, line.symbol ? indexed(line.symbol) : '', '', line.text, '', '', '', '', line.unit]]));
  const result = [...answer.outcome.main, ...answer.outcome.facts].flatMap((figure): CsvCell[][] => {
    const { label, symbol = '', value, low, high, u, uScale, unit = '', energy, ln, text, equation } = figure;
    const inUnit = energy ? usualEnergyUnit : unit;
    const row: CsvCell[] = ['result', label, indexed(symbol), '', text ?? equation ?? value, low, high, u, u == null ? '' : uScale === 'ln' ? 'natural logarithm' : 'value', inUnit];
    return value == null && ln != null ? [['result', `${label}, natural logarithm`, `ln ${indexed(symbol)}`, '', ln, '', '', u, u == null ? '' : 'value', '']] : [row];
  });
  return csvText(header, [...given, ...result]);
}

