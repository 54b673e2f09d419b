import { bin, extent } from 'd3-array';
import type { Bound } from '#shared/domain/kinds.ts';
import { linearScale, type LinearScale } from './linear-scale.ts';

/** One found value on the strip. */
export interface StripPoint {
  id: string;
  value: number;
  bound: Bound;
  computed: boolean;
  /** What it is, with its value: heard and shown when it is marked. */
  label: string;
}

export interface PlacedPoint extends StripPoint {
  x: number;
  lane: number;
}

/** More values than this are counted in a histogram: dots would cover one another. */
export const mostDots = 400;
export const mostLanes = 4;
const clear = 11;

/** The axis over all values: from zero where none is negative, to a round number. */
export function stripScale(values: readonly number[], width: number, margin: number): LinearScale {
  const [least = 0, most = 1] = extent(values);
  const from = Math.min(0, least);
  const to = most > from ? most : from + 1;
  return linearScale({ domain: [from, to], range: [margin, width - margin], nice: 8 });
}

/** Puts each dot in the lowest lane where it covers no other; where all are taken, in the one that has the most room. */
export function placePoints(points: readonly StripPoint[], x: (value: number) => number): PlacedPoint[] {
  const ends: number[] = Array.from({ length: mostLanes }, () => Number.NEGATIVE_INFINITY);
  return [...points].sort((a, b) => a.value - b.value).map((point) => {
    const at = x(point.value);
    const free = ends.findIndex((end) => at - end >= clear);
    const lane = free >= 0 ? free : ends.indexOf(Math.min(...ends));
    ends[lane] = at;
    return { ...point, x: at, lane };
  });
}

export interface Histogram {
  edges: readonly number[];
  counts: readonly number[];
}

/** Counts values in bins of round width. */
export function countInBins(values: readonly number[], scale: LinearScale): Histogram {
  const [from, to] = scale.domain;
  const bins = bin().domain([from, to]).thresholds(scale.ticks(40))(values as number[]);
  return { edges: [...bins.map((one) => one.x0 ?? from), to], counts: bins.map((one) => one.length) };
}
