import type { Kind } from '#shared/domain/kinds.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { FoundEntry, GroupHead } from '#shared/contracts/entry-search.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { barrierOf, commonUnit, factorOf, quantityFor, rowFigure, type RowFigure } from './row-figures.ts';
import type { Grouping } from './search-state.ts';

/** A row of the table: the entry, and its figures as they are set. */
export interface EntryRow {
  entry: FoundEntry;
  figure: RowFigure | null;
}

/** What all rows of a table share: units, room for decimals, the scale of the drawn barriers. */
export interface RowView {
  unit: EnergyUnit;
  temperatureK: number;
  /** Energies up to here are drawn [kJ/mol]. */
  tallestKJPerMol: number;
  /** The unit of the value column, or null when each row names its own. */
  valueUnit: string | null;
  valueDecimals: number;
  valuePower: boolean;
  kUnit: string | null;
  /** The unit of the pre-exponential factors, when they share one. */
  factorUnit: string | null;
}

/** What a group of rows is told apart by. */
export function groupKey(entry: Entry, grouping: Grouping): string {
  switch (grouping) {
    // Both directions of a step have one key, and are different groups.
    case 'step': return entry.step ? `${entry.step.direction} ${entry.step.key}` : '';
    case 'surface': return entry.surface?.label ?? '';
    case 'source': return entry.source?.id ?? '';
    case 'none': return '';
  }
}

/** The heads of the groups by what their rows are told apart by. */
export function headsByKey(heads: readonly GroupHead[]): ReadonlyMap<string, GroupHead> {
  return new Map(heads.map((head) => [head.by === 'step' ? `${head.direction ?? 1} ${head.key}` : head.key, head]));
}

/** The rows in the order of the search, which brings groups whole. */
export function entryRows(entries: readonly FoundEntry[], kinds: readonly Kind[] | undefined, unit: EnergyUnit): EntryRow[] {
  return entries.map((entry) => {
    const quantity = quantityFor(entry, kinds);
    return { entry, figure: quantity && rowFigure(quantity, unit) };
  });
}

/** What the columns need to know of all their rows. */
export function rowView(rows: readonly EntryRow[], unit: EnergyUnit, temperatureK: number): RowView {
  const figures = rows.map(({ figure }) => figure);
  const numbers = figures.map((figure) => figure?.number ?? null);
  const tall = rows.map(({ entry }) => {
    const barrier = barrierOf(entry);
    return barrier ? (barrier.value ?? barrier.high ?? barrier.low ?? 0) + (barrier.uncertaintyScale === 'linear' ? barrier.standardUncertainty ?? 0 : 0) : 0;
  });
  const unitOfAll = commonUnit(figures);
  const kUnits = new Set(rows.flatMap(({ entry }) => (entry.kAtT ? [entry.kAtT.unit] : [])));
  const factorUnits = new Set(rows.flatMap(({ entry }) => factorOf(entry)?.unit ?? []));
  return {
    unit,
    temperatureK,
    tallestKJPerMol: Math.max(1, ...tall),
    valueUnit: unitOfAll,
    // Values of different units have no decimal point in common.
    valueDecimals: unitOfAll === null ? 0 : Math.max(0, ...numbers.map((number) => (number?.exponent === null ? number.text.split('.')[1]?.length ?? 0 : 0))),
    valuePower: unitOfAll !== null && numbers.some((number) => number !== null && number.exponent !== null),
    kUnit: kUnits.size === 1 ? [...kUnits][0] ?? null : null,
    factorUnit: factorUnits.size === 1 ? [...factorUnits][0] ?? null : null,
  };
}
