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
}

/** The two axes of a plot: a rule at the left and at the foot, few ticks, the unit with the name. */
export function PlotAxes({ x, y, left, right, top, bottom, xLabel, yLabel, xTicks = 5, yTicks = 5, bareFoot = false }: PlotAxesProps) {
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
      <text x={left - 30} y={top - 13}>{yLabel}</text>
    </g>
  );
}
