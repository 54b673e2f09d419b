import type { Bound } from '#shared/domain/kinds.ts';

/** One value of an interval plot. */
export interface IntervalRow {
  id: string;
  label: string;
  /** Null where there is only a range or a limit. */
  value: number | null;
  /** Standard uncertainty; null where the source gives none. */
  u: number | null;
  /** Ends of an interval of the value's own, drawn in the place of ± u; or of a range. */
  low?: number | null;
  high?: number | null;
  /** Rows of one group stand together under its name. */
  group?: string;
  /** Share in the pooled value, 0 to 1: the size of the mark. */
  weight?: number | null;
  bound?: Bound;
  /** Computed values are drawn open. */
  computed?: boolean;
  href?: string;
}

/** The pooled value. */
export interface Pooled {
  mean: number;
  interval: readonly [number, number] | null;
  predictionInterval?: readonly [number, number] | null;
  label?: string;
}

/** A line of the plot: the name of a group, or a row. */
export type IntervalLine = { kind: 'group'; name: string } | { kind: 'row'; row: IntervalRow };

/** The rows under the names of their groups, each group where its first row stands; rows without a group go first. */
export function linesOf(rows: readonly IntervalRow[]): IntervalLine[] {
  const groups = new Map<string, IntervalRow[]>([['', []]]);
  for (const row of rows) groups.set(row.group ?? '', [...(groups.get(row.group ?? '') ?? []), row]);
  return [...groups].flatMap(([name, members]): IntervalLine[] => [
    ...(name !== '' ? [{ kind: 'group' as const, name }] : []),
    ...members.map((row) => ({ kind: 'row' as const, row })),
  ]);
}

/** The ends of what is drawn for a row; equal where there is nothing but the value. */
export function extentOf({ value, u, low, high }: IntervalRow): readonly [number, number] | null {
  const from = low ?? (value !== null ? value - (u ?? 0) : high);
  const to = high ?? (value !== null ? value + (u ?? 0) : low);
  return from == null || to == null ? null : [from, to];
}

export function isOpenAbove(bound: Bound | undefined): boolean {
  return bound === '>' || bound === '≥';
}

export function isOpenBelow(bound: Bound | undefined): boolean {
  return bound === '<' || bound === '≤';
}

/** Everything that must find room on the axis. */
export function valuesShown(rows: readonly IntervalRow[], pooled: Pooled | null): number[] {
  const own = rows.flatMap((row) => [...(extentOf(row) ?? []), ...(row.value === null ? [] : [row.value])]);
  const of = pooled ? [pooled.mean, ...(pooled.interval ?? []), ...(pooled.predictionInterval ?? [])] : [];
  return [...own, ...of].filter(Number.isFinite);
}
