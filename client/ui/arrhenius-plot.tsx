import { area, line } from 'd3-shape';
import { fixed, plainNumber, setNumber } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from './linear-scale.ts';
import { PlotAxes } from './plot-axes.tsx';
import { SeriesMark, seriesLook } from './series-look.tsx';
import { UnitText, UnitTspans } from './unit-text.tsx';
import { Value } from './value.tsx';

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
  /** Unit of k. */
  unit: string;
  height?: number;
  activeId?: string | null;
  id?: string;
}

interface Sample {
  x: number;
  y: number;
  low: number;
  high: number;
}

const pad = { left: 46, right: 16, top: 26, bottom: 40 };

/** log₁₀ k against 1000 K/T: solid within the valid range, dashed outside, a band for the uncertainty, the temperature of interest as a line. */
export function ArrheniusPlot({ lines, temperatureK, unit, height = 270, activeId = null, id }: ArrheniusPlotProps) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const temperatures = lines.flatMap((one) => (one.range ? [one.range.min, one.range.max] : [])).concat(temperatureK);
  const coldest = Math.min(...temperatures);
  const hottest = Math.max(...temperatures);
  const span = Math.max(0.12, 1000 / coldest - 1000 / hottest);
  const xFrom = Math.max(0.12, 1000 / hottest - span * 0.1);
  const xTo = 1000 / coldest + span * 0.1;

  const sampled = lines.map((one) => ({ one, ...sampleLine(one, xFrom, xTo) }));
  const all = sampled.flatMap(({ samples }) => samples.flatMap((sample) => [sample.low, sample.high]));
  const x = linearScale({ domain: [xFrom, xTo], range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(...all), Math.max(...all)], range: [height - pad.bottom, pad.top], nice: 8 });
  const path = line<Sample>().x((sample) => x(sample.x)).y((sample) => y(sample.y));
  const band = area<Sample>().x((sample) => x(sample.x)).y0((sample) => y(sample.low)).y1((sample) => y(sample.high));
  const atX = x(1000 / temperatureK);
  const extrapolated = lines.some((one) => !within(one, temperatureK));

  return (
    <figure ref={frame} className="m-0">
      <svg id={id} className="plot" width={width} height={height} role="img" aria-label={`${lines.length === 1 ? 'Rate constant' : `${lines.length} rate constants`} against temperature: log k in ${unit} over 1000 K/T; the values are in the table below.`}>
        <PlotAxes x={x} y={y} left={pad.left} bottom={height - pad.bottom} right={width - pad.right} top={pad.top} xLabel="1000 K / T" yLabel={<>log<tspan dy="3" fontSize="0.78em">10</tspan><tspan dy="-3"> k / (</tspan><UnitTspans unit={unit} />)</>} />
        <path d={`M${atX} ${pad.top - 6}V${height - pad.bottom}`} stroke="var(--color-ochre)" strokeWidth="1.500" strokeDasharray="2 3" />
        <text className="plot-doubt" x={atX > width * 0.6 ? atX - 7 : atX + 7} y={pad.top + 4} textAnchor={atX > width * 0.6 ? 'end' : 'start'}>{`${temperatureK} K${extrapolated ? ', extrapolated' : ''}`}</text>
        {sampled.map(({ one, samples, solid }, index) => {
          const look = seriesLook(index);
          const faded = activeId !== null && activeId !== one.id;
          const yAt = y(one.lnK(temperatureK) / Math.LN10);
          return (
            <g key={one.id} opacity={faded ? 0.3 : 1}>
              {solid.length > 1 && solid.some((sample) => sample.high > sample.low) && <path d={band(solid) ?? ''} fill={look.colour} opacity="0.18" />}
              <path d={path(samples) ?? ''} fill="none" stroke={look.colour} strokeWidth="1.700" strokeDasharray="5 4" opacity={solid.length > 1 ? 0.85 : 1} />
              {solid.length > 1 && <path d={path(solid) ?? ''} fill="none" stroke="var(--color-paper)" strokeWidth="4" />}
              {solid.length > 1 && <path d={path(solid) ?? ''} fill="none" stroke={look.colour} strokeWidth="2.200" />}
              <SeriesMark index={index} x={atX} y={yAt} open={!within(one, temperatureK)} colour={within(one, temperatureK) ? look.colour : 'var(--color-ochre)'} />
            </g>
          );
        })}
      </svg>
      {lines.length > 1 && <Legend lines={lines} />}
      <ArrheniusTable lines={lines} temperatureK={temperatureK} unit={unit} />
    </figure>
  );
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

function Legend({ lines }: { lines: readonly ArrheniusLine[] }) {
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-fine">
      {lines.map((one, index) => (
        <li key={one.id} className="flex items-center gap-2">
          <svg width="22" height="12" aria-hidden="true">
            <path d="M0 6H22" stroke={seriesLook(index).colour} strokeWidth="2" />
            <SeriesMark index={index} x={11} y={6} open={false} colour={seriesLook(index).colour} />
          </svg>
          {one.label}
        </li>
      ))}
    </ul>
  );
}

/** The figures behind the plot: k at the temperature of interest and at both ends of the valid range. */
function ArrheniusTable({ lines, temperatureK, unit }: { lines: readonly ArrheniusLine[]; temperatureK: number; unit: string }) {
  const rows = lines.flatMap((one) => {
    const temperatures = one.range ? [one.range.min, one.range.max] : [];
    return [...new Set([...temperatures, temperatureK])].sort((a, b) => a - b).map((t) => ({ one, t }));
  });
  return (
    <details className="plot-table">
      <summary>The plot as a table</summary>
      <table className="data-table mt-2">
        <thead>
          <tr><th scope="col">Entry</th><th scope="col" className="numeric">T<br />K</th><th scope="col" className="numeric">log k</th><th scope="col" className="numeric">k<br /><UnitText unit={unit} /></th></tr>
        </thead>
        <tbody>
          {rows.map(({ one, t }) => (
            <tr key={`${one.id} ${t}`}>
              <th scope="row">{one.label}</th>
              <td className="numeric">{plainNumber(setNumber(t, { digits: 4 }))}{within(one, t) ? '' : ', extrapolated'}</td>
              <td className="numeric">{fixed(one.lnK(t) / Math.LN10, 2)}</td>
              <td className="numeric"><Value value={Math.exp(one.lnK(t))} scientific digits={3} /></td>
            </tr>
          ))}
        </tbody>
      </table>
    </details>
  );
}
