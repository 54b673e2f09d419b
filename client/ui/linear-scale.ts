import { nice as niceEnds, tickStep, ticks as ticksBetween } from 'd3-array';

/** A straight axis: from values to places in a drawing and back. */
export interface LinearScale {
  (value: number): number;
  invert: (place: number) => number;
  domain: readonly [number, number];
  /** Round values along the axis, about so many. */
  ticks: (count: number) => number[];
  /** Writes a tick with the decimals that the distance of the ticks needs, and a true minus. */
  tickText: (tick: number, count: number) => string;
}

interface ScaleInput {
  domain: readonly [number, number];
  range: readonly [number, number];
  /** Widens the domain to round values, at about so many ticks. */
  nice?: number;
}

/** Makes a straight axis. Small on purpose: the usual scale package brings colours and dates with it, a third of a page's first load. */
export function linearScale({ domain, range, nice }: ScaleInput): LinearScale {
  const [low, high] = domain[0] === domain[1] ? [domain[0], domain[0] + 1] : domain;
  const ends = nice === undefined ? [low, high] as const : niceEnds(low, high, nice);
  const [from, to] = ends;
  const scale = (value: number) => range[0] + ((value - from) / (to - from)) * (range[1] - range[0]);
  return Object.assign(scale, {
    invert: (place: number) => from + ((place - range[0]) / (range[1] - range[0])) * (to - from),
    domain: [from, to] as const,
    ticks: (count: number) => ticksBetween(from, to, count),
    tickText: (tick: number, count: number) => {
      const step = tickStep(from, to, count);
      const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
      return tick.toFixed(Math.min(12, decimals)).replace(/^-0(\.0*)?$/, '0$1').replace('-', '\u2212');
    },
  });
}
