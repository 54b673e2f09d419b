import { area, line } from 'd3-shape';
import { useState } from 'react';
import { numberFromLn } from '#client/lib/log-number.ts';
import { fixed } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from './linear-scale.ts';
import { PlotAxes, PlotTopAxis, temperatureText } from './plot-axes.tsx';
import { PlotLegend } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { SeriesMark, seriesLook } from './series-look.tsx';
import { UnitTspans } from './unit-text.tsx';
import { NumberText } from './value.tsx';

/** One rate constant against temperature. */
export interface ArrheniusLine {
  id: string;
  label: string;
  /** Natural logarithm of k at a temperature [K]. */
  lnK: (temperatureK: number) => number;
  /** Standard uncertainty of ln k at a temperature; null where no single figure can be given. */
  uLnK?: (temperatureK: number) => number | null;
  /** The valid range [K]; without one the whole line is dashed. */
  range: { min: number; max: number } | null;
}

interface ArrheniusPlotProps {
  lines: readonly ArrheniusLine[];
  temperatureK: number;
  /** Unit of k; empty where nobody said it. */
  unit: string;
  height?: number;
  activeId?: string | null;
  /** The temperature itself along the top. */
  topAxis?: boolean;
  id?: string;
}

interface Sample {
  x: number;
  y: number;
  low: number;
  high: number;
}

const margins = { left: 46, right: 16, top: 26, bottom: 40 };

/** Above so many lines only the one pointed at has its band: many bands over each other show nothing. */
const mostBands = 8;

/** log₁₀ k against 1000 K/T: solid within the valid range, dashed outside, a band for the uncertainty, the temperature of interest as a line. */
export function ArrheniusPlot({ lines, temperatureK, unit, height = 270, activeId = null, topAxis = false, id }: ArrheniusPlotProps) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const [pointed, setPointed] = useState<string | null>(null);
  const active = activeId ?? pointed;
  const pad = topAxis ? { ...margins, top: 56 } : margins;
  const temperatures = lines.flatMap((one) => (one.range ? [one.range.min, one.range.max] : [])).concat(temperatureK);
  const coldest = Math.min(...temperatures);
  const hottest = Math.max(...temperatures);
  const span = Math.max(0.12, 1000 / coldest - 1000 / hottest);
  const xFrom = Math.max(0.12, 1000 / hottest - span * 0.1);
  const xTo = 1000 / coldest + span * 0.1;

  const sampled = lines.map((one, index) => ({ one, index, ...sampleLine(one, xFrom, xTo) }));
  // A rate constant of nothing has no logarithm: its line is not drawn and does not stretch the axis.
  const all = sampled.flatMap(({ samples }) => samples.flatMap((sample) => [sample.low, sample.high])).filter(Number.isFinite);
  if (all.length === 0) return <p className="text-second">No rate constant to draw.</p>;
  const x = linearScale({ domain: [xFrom, xTo], range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(...all), Math.max(...all)], range: [height - pad.bottom, pad.top], nice: 8 });
  const path = line<Sample>().defined(drawable).x((sample) => x(sample.x)).y((sample) => y(sample.y));
  const band = area<Sample>().defined(drawable).x((sample) => x(sample.x)).y0((sample) => y(sample.low)).y1((sample) => y(sample.high));
  const atX = x(1000 / temperatureK);
  const extrapolated = lines.some((one) => !within(one, temperatureK));

  return (
    <figure ref={frame} className="m-0">
      <svg id={id} className="plot" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={`${lines.length === 1 ? 'Rate constant' : `${lines.length} rate constants`} against temperature: log k${unit && ` in ${unit}`} over 1000 K/T; the values are in the table below.`}>
        <PlotAxes x={x} y={y} left={pad.left} bottom={height - pad.bottom} right={width - pad.right} top={pad.top} xLabel="1000 K / T" yLabel={<>log<tspan dy="3" fontSize="0.78em">10</tspan><tspan dy="-3"> k</tspan>{unit && <> / (<UnitTspans unit={unit} />)</>}</>} yLabelLift={topAxis ? 23 : 0} />
        {topAxis && <PlotTopAxis x={x} left={pad.left} right={width - pad.right} top={pad.top} />}
        <path d={`M${atX} ${pad.top - 6}V${height - pad.bottom}`} stroke="var(--color-ochre)" strokeWidth="1.500" strokeDasharray="2 3" />
        <text className="plot-doubt" x={atX > width * 0.6 ? atX - 7 : atX + 7} y={pad.top + 4} textAnchor={atX > width * 0.6 ? 'end' : 'start'}>{`${temperatureK} K${extrapolated ? ', extrapolated' : ''}`}</text>
        {inFront(sampled, active).map(({ one, index, samples, solid }) => {
          const look = seriesLook(index);
          const faded = active !== null && active !== one.id;
          const banded = lines.length <= mostBands || active === one.id;
          const yAt = y(one.lnK(temperatureK) / Math.LN10);
          return (
            <g key={one.id} opacity={faded ? 0.2 : 1}>
              {banded && solid.length > 1 && solid.some((sample) => sample.high > sample.low) && <path d={band(solid) ?? ''} fill={look.colour} opacity="0.18" />}
              <path d={path(samples) ?? ''} fill="none" stroke={look.colour} strokeWidth="1.700" strokeDasharray="5 4" opacity={solid.length > 1 ? 0.85 : 1} />
              {lines.length <= mostBands && solid.length > 1 && <path d={path(solid) ?? ''} fill="none" stroke="var(--color-paper)" strokeWidth="4" />}
              {solid.length > 1 && <path d={path(solid) ?? ''} fill="none" stroke={look.colour} strokeWidth="2.200" />}
              {Number.isFinite(yAt) && <SeriesMark index={index} x={atX} y={yAt} open={!within(one, temperatureK)} colour={within(one, temperatureK) ? look.colour : 'var(--color-ochre)'} />}
            </g>
          );
        })}
      </svg>
      {lines.length > 1 && (
        <PlotLegend
          onActive={setPointed}
          items={lines.map((one, index) => {
            const { colour } = seriesLook(index);
            return { id: one.id, label: one.label, sample: <><path d="M0 6H26" stroke={colour} strokeWidth="2" /><SeriesMark index={index} x={13} y={6} open={false} colour={colour} /></> };
          })}
        />
      )}
      <ArrheniusTable lines={lines} temperatureK={temperatureK} unit={unit} />
    </figure>
  );
}

/** The line that is pointed at is drawn last, over the others. */
function inFront<Line extends { one: ArrheniusLine }>(sampled: readonly Line[], active: string | null): Line[] {
  return [...sampled.filter(({ one }) => one.id !== active), ...sampled.filter(({ one }) => one.id === active)];
}

function drawable({ low, y, high }: Sample): boolean {
  return Number.isFinite(low) && Number.isFinite(y) && Number.isFinite(high);
}

function within({ range }: ArrheniusLine, temperatureK: number): boolean {
  return range !== null && temperatureK >= range.min && temperatureK <= range.max;
}

function sampleLine(one: ArrheniusLine, xFrom: number, xTo: number): { samples: Sample[]; solid: Sample[] } {
  const at = (reciprocal: number): Sample => {
    const temperature = 1000 / reciprocal;
    const y = one.lnK(temperature) / Math.LN10;
    const u = (one.uLnK?.(temperature) ?? 0) / Math.LN10;
    return { x: reciprocal, y, low: y - u, high: y + u };
  };
  const many = (from: number, to: number) => Array.from({ length: 41 }, (_, index) => at(from + ((to - from) * index) / 40));
  return { samples: many(xFrom, xTo), solid: one.range ? many(1000 / one.range.max, 1000 / one.range.min) : [] };
}

/** The figures behind the plot: k at the temperature of interest and at both ends of the valid range. */
function ArrheniusTable({ lines, temperatureK, unit }: { lines: readonly ArrheniusLine[]; temperatureK: number; unit: string }) {
  const rows = lines.flatMap((one) => {
    const temperatures = one.range ? [one.range.min, one.range.max] : [];
    return [...new Set([...temperatures, temperatureK])].sort((a, b) => a - b).map((t) => ({ one, t }));
  });
  return (
    <PlotTable
      columns={[{ label: 'Entry' }, { label: 'T', unit: 'K', numeric: true }, { label: <>log<sub>10</sub> k</>, numeric: true }, { label: 'k', unit, numeric: true }]}
      rows={rows.map(({ one, t }) => ({
        id: `${one.id} ${t}`,
        cells: [
          one.label, `${temperatureText(t)}${within(one, t) ? '' : ', extrapolated'}`,
          // By its logarithm, since k itself may be too large or too small to be held as a number.
          fixed(one.lnK(t) / Math.LN10, 2), <NumberText key="k" number={numberFromLn(one.lnK(t))} />,
        ],
      }))}
    />
  );
}
