import type { ReactNode } from 'react';
import type { LinearScale } from './linear-scale.ts';

interface PlotAxesProps {
  x: LinearScale;
  y: LinearScale;
  left: number;
  right: number;
  top: number;
  bottom: number;
  xLabel: ReactNode;
  yLabel: ReactNode;
  xTicks?: number;
  yTicks?: number;
  /** Leaves out the figures and the name at the foot, where another plot below has them. */
  bareFoot?: boolean;
  /** Lifts the name of the upright axis, clear of an axis along the top [px]. */
  yLabelLift?: number;
}

/** A temperature with the digits it has, for tables and names. */
export function temperatureText(temperatureK: number): string {
  return String(Number(temperatureK.toPrecision(6)));
}

/** The two axes of a plot: a rule at the left and at the foot, few ticks, the unit with the name. */
export function PlotAxes({ x, y, left, right, top, bottom, xLabel, yLabel, xTicks = 5, yTicks = 5, bareFoot = false, yLabelLift = 0 }: PlotAxesProps) {
  return (
    <g aria-hidden="true">
      <path className="plot-axis" d={`M${left + 0.5} ${top - 8}V${bottom + 0.5}H${right}`} />
      {x.ticks(xTicks).map((tick) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${x(tick)} ${bottom}v5`} />
          {!bareFoot && <text x={x(tick)} y={bottom + 18} textAnchor="middle">{x.tickText(tick, xTicks)}</text>}
        </g>
      ))}
      {y.ticks(yTicks).map((tick) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${left} ${y(tick)}h-5`} />
          <text x={left - 9} y={y(tick) + 4} textAnchor="end">{y.tickText(tick, yTicks)}</text>
        </g>
      ))}
      {!bareFoot && <text x={(left + right) / 2} y={bottom + 35} textAnchor="middle">{xLabel}</text>}
      <text x={left - 30} y={top - 13 - yLabelLift}>{yLabel}</text>
    </g>
  );
}

/** Round temperatures [K] for an axis of 1000 K/T: the roundest first, each at least so far from the next [px]. */
export function temperatureTicks(x: LinearScale, apart = 42): number[] {
  const [from, to] = x.domain;
  const hottest = from > 0 ? Math.min(5000, 1000 / from) : 5000;
  const coldest = 1000 / to;
  const chosen: number[] = [];
  for (const step of [1000, 500, 100, 50, 20, 10]) {
    for (let t = Math.ceil(coldest / step) * step; t <= hottest; t += step) {
      if (chosen.every((one) => Math.abs(x(1000 / one) - x(1000 / t)) >= apart)) chosen.push(t);
    }
  }
  return chosen.sort((a, b) => a - b);
}

/** The temperature itself along the top of an axis of 1000 K/T. */
export function PlotTopAxis({ x, left, right, top }: { x: LinearScale; left: number; right: number; top: number }) {
  return (
    <g className="plot-top-axis" aria-hidden="true">
      <path className="plot-axis" d={`M${left} ${top - 8}H${right}`} />
      {temperatureTicks(x).map((t) => (
        <g key={t}>
          <path className="plot-axis" d={`M${x(1000 / t)} ${top - 8}v-5`} />
          <text x={x(1000 / t)} y={top - 18} textAnchor="middle">{t}</text>
        </g>
      ))}
      <text x={right} y={top - 36} textAnchor="end">T / K</text>
    </g>
  );
}
