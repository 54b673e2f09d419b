import type { ScaleLinear } from 'd3-scale';
import type { ReactNode } from 'react';

interface PlotAxesProps {
  x: ScaleLinear<number, number>;
  y: ScaleLinear<number, number>;
  left: number;
  right: number;
  top: number;
  bottom: number;
  xLabel: ReactNode;
  yLabel: ReactNode;
  xTicks?: number;
  yTicks?: number;
}

const minus = (text: string) => text.replace('-', '\u2212');

/** The two axes of a plot: a rule at the left and at the foot, few ticks, the unit with the name. */
export function PlotAxes({ x, y, left, right, top, bottom, xLabel, yLabel, xTicks = 5, yTicks = 5 }: PlotAxesProps) {
  const xFormat = x.tickFormat(xTicks);
  const yFormat = y.tickFormat(yTicks);
  return (
    <g aria-hidden="true">
      <path className="plot-axis" d={`M${left + 0.5} ${top - 8}V${bottom + 0.5}H${right}`} />
      {x.ticks(xTicks).map((tick) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${x(tick)} ${bottom}v5`} />
          <text x={x(tick)} y={bottom + 18} textAnchor="middle">{minus(xFormat(tick))}</text>
        </g>
      ))}
      {y.ticks(yTicks).map((tick) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${left} ${y(tick)}h-5`} />
          <text x={left - 9} y={y(tick) + 4} textAnchor="end">{minus(yFormat(tick))}</text>
        </g>
      ))}
      <text x={(left + right) / 2} y={bottom + 35} textAnchor="middle">{xLabel}</text>
      <text x={left - 30} y={top - 13}>{yLabel}</text>
    </g>
  );
}
