import type { ComponentType } from 'react';
import type * as z from 'zod';
import type { Calculator } from '#shared/calculators/calculator.ts';
import type { Kind, Provenance } from '#shared/domain/kinds.ts';
import type { QuantityInput } from '#shared/contracts/quantities.ts';
import type { Figure } from './figures.ts';

interface FieldBase {
  /** Name of the input over HTTP; of the page alone when the field is its `own`. */
  key: string;
  /** Name in the address; the key without the unit of an energy when not given. */
  param?: string;
  label: string;
  /** The letter it has in the formulas; `_{}` and `^{}` set indices. */
  symbol?: string;
  hint?: string;
  optional?: true;
  /** For the page alone (a unit to be shown, the name of a row): the calculator does not get it. */
  own?: true;
  /** Asked only while these choices, by their name in the address, have one of these values. */
  only?: Readonly<Record<string, readonly string[]>>;
}

export interface NumberField extends FieldBase {
  kind: 'number';
  unit?: string;
  /** The field, by its name in the address, that says the unit. */
  unitFrom?: string;
  /** A molar energy: its unit is picked beside it, and the calculator gets kJ/mol. */
  energy?: true;
  /** A temperature: the temperature of interest is offered. */
  temperature?: true;
  /** What an empty field stands for, shown in it. */
  usual?: string;
}

export interface TextField extends FieldBase {
  kind: 'text';
  suggestions?: readonly string[];
  placeholder?: string;
  /** What an empty field of the page's own stands for. */
  usual?: string;
  most?: number;
  /** Takes the whole width. */
  wide?: true;
}

export interface ChoiceField extends FieldBase {
  kind: 'choice';
  choices: readonly { value: string; label: string; hint?: string }[];
  /** Chosen when nothing is said. */
  usual: string;
  look?: 'segments' | 'list' | 'select';
  /** What the calculator gets for a choice, where that is not its name. */
  toInput?: (value: string) => unknown;
}

export interface TableColumn {
  /** Name in each row of the input, or of the list over HTTP when the table is read by columns. */
  id: string;
  label: string;
  unit?: string;
  /** The field, by its name in the address, that says the unit. */
  unitFrom?: string;
  optional?: true;
  own?: true;
  energy?: true;
  /** Words, not a number. */
  text?: true;
  /** An empty cell says that there is none: the calculator gets null. */
  none?: true;
}

export interface TableField extends FieldBase {
  kind: 'table';
  columns: readonly TableColumn[];
  /** Whether each row is one object of a list, or each column a list by itself. */
  by: 'rows' | 'columns';
  /** The field, by its name in the address, that names rows to be left out by their numbers. */
  leftOutBy?: string;
  /** Rows that are needed before anything can be computed. */
  least: number;
  most?: number;
}

export type Field = NumberField | TextField | ChoiceField | TableField;

/** What an outcome is made from: the result, the input with its usual values, and what the page alone was told. */
export interface Given<Result, Input> {
  result: Result;
  input: Input;
  /** The page's own fields by their key, as text; empty where nothing was typed. */
  own: Readonly<Record<string, string>>;
  /** The text of a field as typed, by its name in the address. */
  typed: (param: string) => string;
  /** For each row of a table's input, the row it was typed in, counted from 0. */
  rowsOf: (param: string) => readonly number[];
  /** Cells of a table as typed, by its name in the address. */
  cells: (param: string) => readonly (readonly string[])[];
}

/** What a calculation amounts to, as it is shown. */
export interface Outcome {
  /** One to three figures that were asked for. */
  main: readonly Figure[];
  facts: readonly Figure[];
  warnings?: readonly string[];
  /** What the figures were read from, where it is a quotation: shown beside them. */
  printed?: string;
  /** The result is outside of what it was found for. */
  extrapolated?: boolean;
}

/** A calculation that goes on from this one, with what is handed over by names in its address. */
export interface Onward {
  to: string;
  label: string;
  values: Readonly<Record<string, string>>;
}

/** The start of an entry made from a calculation. */
export interface EntryStart {
  kind: Kind;
  provenance?: Provenance;
  quantities: readonly (Pick<QuantityInput, 'symbol' | 'asPrinted' | 'unitAsPrinted'> & Partial<QuantityInput>)[];
  correlation?: number;
  validRange?: { min: number; max: number };
  /** How the figures came about. */
  note: string;
}

export interface PictureProps<Result = unknown, Input = unknown> extends Given<Result, Input> {
  /** Sets a field, as if it were typed. */
  onType: (param: string, text: string) => void;
}

export interface SheetDeclaration<C extends Calculator> {
  calculator: C;
  fields: readonly Field[];
  /** What the form is filled with to try it: round numbers that report nothing. */
  example: { values?: Readonly<Record<string, string>>; tables?: Readonly<Record<string, readonly (readonly string[])[]>> };
  /** What to give, while nothing is typed. */
  empty: string;
  outcome: (given: Given<ReturnType<C['calculate']>, z.output<C['input']>>) => Outcome;
  onward?: (given: Given<ReturnType<C['calculate']>, z.output<C['input']>>) => readonly Onward[];
  entry?: (given: Given<ReturnType<C['calculate']>, z.output<C['input']>>) => EntryStart | null;
  picture?: ComponentType<PictureProps<ReturnType<C['calculate']>, z.output<C['input']>>>;
}

/** One calculator of the Workbench: what is asked, how the result is shown, where it leads on. */
export type Sheet = Omit<SheetDeclaration<Calculator>, 'outcome' | 'onward' | 'entry' | 'picture'> & {
  outcome: (given: Given<unknown, unknown>) => Outcome;
  onward?: (given: Given<unknown, unknown>) => readonly Onward[];
  entry?: (given: Given<unknown, unknown>) => EntryStart | null;
  picture?: ComponentType<PictureProps>;
};

/** Declares the sheet of a calculator; the result it is handed is the calculator's own. */
export function sheet<C extends Calculator>(declaration: SheetDeclaration<C>): Sheet {
  return declaration as unknown as Sheet;
}
