import { useState } from 'react';
import { fixed } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from './linear-scale.ts';
import { PlotAxes } from './plot-axes.tsx';
import { PlotLegend } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { UnitTspans } from './unit-text.tsx';

/** One pair of activation energy and pre-exponential factor. */
export interface CompensationPoint {
  id: string;
  label: string;
  /** In the unit of the axis. */
  energy: number;
  uEnergy?: number | null;
  /** Natural logarithm of A. */
  lnA: number;
  /** Standard uncertainty of ln A. */
  uLnA?: number | null;
  /** Computed values are drawn open. */
  computed?: boolean;
}

interface CompensationPlotProps {
  points: readonly CompensationPoint[];
  /** ln A = intercept + slope × energy, where one was fitted. */
  line?: { slope: number; intercept: number; label?: string } | null;
  energyUnit: string;
  /** Unit of A; only factors of one unit belong into one plot. */
  unit: string;
  height?: number;
  id?: string;
}

const pad = { left: 46, right: 18, top: 26, bottom: 40 };

/** log A against the activation energy, each point by its number: values that lie on a line give one rate constant at one temperature. */
export function CompensationPlot({ points, line = null, energyUnit, unit, height = 300, id }: CompensationPlotProps) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const [active, setActive] = useState<string | null>(null);
  const drawn = points.filter((point) => Number.isFinite(point.energy) && Number.isFinite(point.lnA));
  if (drawn.length === 0) return <p className="text-second">No pair of A and E to draw.</p>;

  const along = drawn.flatMap(({ energy, uEnergy }) => [energy - (uEnergy ?? 0), energy + (uEnergy ?? 0)]);
  const margin = Math.max(1e-9, (Math.max(...along) - Math.min(...along)) * 0.06);
  const ends = [Math.min(...along) - margin, Math.max(...along) + margin] as const;
  const lineAt = (energy: number) => (line ? line.intercept + line.slope * energy : Number.NaN) / Math.LN10;
  const heights = [...drawn.flatMap(({ lnA, uLnA }) => [lnA - (uLnA ?? 0), lnA + (uLnA ?? 0)]).map((value) => value / Math.LN10), ...(line ? ends.map(lineAt) : [])];
  const x = linearScale({ domain: ends, range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(...heights), Math.max(...heights, Math.min(...heights) + 0.5)], range: [height - pad.bottom, pad.top], nice: 6 });
  const open = drawn.some((point) => point.computed);

  return (
    <figure ref={frame} className="m-0">
      <svg id={id} className="plot" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={`Pre-exponential factor against activation energy for ${drawn.length} ${drawn.length === 1 ? 'entry' : 'entries'}: log A in ${unit} over E in ${energyUnit}${line ? ', with the fitted line' : ''}; the values are in the table below.`}>
        <PlotAxes
          x={x} y={y} left={pad.left} right={width - pad.right} top={pad.top} bottom={height - pad.bottom} xTicks={Math.max(3, Math.min(7, Math.round(width / 90)))}
          xLabel={`E / (${energyUnit})`} yLabel={<>log<tspan dy="3" fontSize="0.78em">10</tspan><tspan dy="-3">{'\u200b'}</tspan> A / (<UnitTspans unit={unit} />)</>}
        />
        {line && <path className="compensation-line" d={`M${x(ends[0])} ${y(lineAt(ends[0]))}L${x(ends[1])} ${y(lineAt(ends[1]))}`} stroke="var(--color-slate)" strokeWidth="1.500" strokeDasharray="5 4" fill="none" />}
        {drawn.map((point, index) => {
          const [atX, atY] = [x(point.energy), y(point.lnA / Math.LN10)];
          const [uX, uY] = [x(point.energy + (point.uEnergy ?? 0)) - atX, atY - y((point.lnA + (point.uLnA ?? 0)) / Math.LN10)];
          // The number stands to the left of a point that is too near the right edge for it.
          const turned = atX > width - pad.right - 24;
          return (
            <g key={point.id} className="compensation-point" opacity={active !== null && active !== point.id ? 0.25 : 1}>
              <title>{point.label}</title>
              {uX > 0 && <path className="compensation-whisker" d={`M${atX - uX} ${atY}H${atX + uX}`} stroke="var(--color-ink)" strokeWidth="1.200" />}
              {uY > 0 && <path className="compensation-whisker" d={`M${atX} ${atY - uY}V${atY + uY}`} stroke="var(--color-ink)" strokeWidth="1.200" />}
              <circle cx={atX} cy={atY} r="4.500" fill={point.computed ? 'var(--color-paper)' : 'var(--color-lichen)'} stroke="var(--color-lichen)" strokeWidth="1.800" />
              <text className="plot-ink plot-halo" x={turned ? atX - 8 : atX + 8} y={atY - 6} textAnchor={turned ? 'end' : 'start'}>{index + 1}</text>
            </g>
          );
        })}
      </svg>
      <PlotLegend
        onActive={setActive}
        items={[
          ...drawn.map((point, index) => ({ id: point.id, label: `${index + 1} ${point.label}`, sample: <circle cx="13" cy="6" r="4.500" fill={point.computed ? 'var(--color-paper)' : 'var(--color-lichen)'} stroke="var(--color-lichen)" strokeWidth="1.800" /> })),
          ...(line ? [{ id: 'line', label: line.label ?? 'fitted line', sample: <path d="M0 6H26" stroke="var(--color-slate)" strokeWidth="1.500" strokeDasharray="5 4" /> }] : []),
        ]}
      />
      {open && <p className="plot-note">Filled is measured, open is computed.</p>}
      <PlotTable
        columns={[{ label: 'Entry' }, { label: 'E', unit: energyUnit, numeric: true }, { label: <>log<sub>10</sub> A</>, unit: `of A in ${unit}`, numeric: true }]}
        rows={drawn.map((point, index) => ({
          id: point.id,
          cells: [`${index + 1} ${point.label}`, withU(point.energy, point.uEnergy, energyUnit === 'eV' ? 3 : 1), withU(point.lnA / Math.LN10, point.uLnA && point.uLnA / Math.LN10, 2)],
        }))}
      />
    </figure>
  );
}

function withU(value: number, u: number | null | undefined, decimals: number): string {
  return u ? `${fixed(value, decimals)} ± ${fixed(u, decimals)}` : fixed(value, decimals);
}
