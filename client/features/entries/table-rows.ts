import type { Kind } from '#shared/domain/kinds.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { barrierOf, commonUnit, quantityFor, rowFigure, type RowFigure } from './row-figures.ts';
import type { Grouping } from './search-state.ts';

/** A row of the table: the entry, and its figures as they are set. */
export interface EntryRow {
  entry: Entry;
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
}

/** What a group of rows is told apart by. */
export function groupKey(entry: Entry, grouping: Grouping): string {
  switch (grouping) {
    // Both directions of a step have one key, and are different groups.
    case 'step': return entry.step ? `${entry.step.key} ${entry.step.direction}` : '';
    case 'surface': return entry.surface?.label ?? '';
    case 'source': return entry.source?.id ?? '';
    case 'none': return '';
  }
}

/** The rows in the order of the search, those of a group brought together where its first row stands. */
export function entryRows(entries: readonly Entry[], grouping: Grouping, kinds: readonly Kind[] | undefined, unit: EnergyUnit): EntryRow[] {
  const groups = new Map<string, EntryRow[]>();
  for (const entry of entries) {
    const quantity = quantityFor(entry, kinds);
    const row = { entry, figure: quantity && rowFigure(quantity, unit) };
    const key = groupKey(entry, grouping);
    const group = groups.get(key);
    if (group) group.push(row);
    else groups.set(key, [row]);
  }
  return [...groups.values()].flat();
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
  return {
    unit,
    temperatureK,
    tallestKJPerMol: Math.max(1, ...tall),
    valueUnit: unitOfAll,
    // Values of different units have no decimal point in common.
    valueDecimals: unitOfAll === null ? 0 : Math.max(0, ...numbers.map((number) => (number?.exponent === null ? number.text.split('.')[1]?.length ?? 0 : 0))),
    valuePower: unitOfAll !== null && numbers.some((number) => number !== null && number.exponent !== null),
    kUnit: kUnits.size === 1 ? [...kUnits][0] ?? null : null,
  };
}
