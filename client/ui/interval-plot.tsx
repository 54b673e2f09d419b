import { Link } from 'react-router-dom';
import { decimalsOf, fixed } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { fittedLabel } from './fitted-label.ts';
import { extentOf, isOpenAbove, isOpenBelow, linesOf, valuesShown, type IntervalRow, type Pooled } from './interval-rows.ts';
import { linearScale } from './linear-scale.ts';
import { PlotLegend, type LegendItem } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { UnitTspans } from './unit-text.tsx';

interface IntervalPlotProps {
  rows: readonly IntervalRow[];
  pooled?: Pooled | null;
  /** The quantity, as the name of the axis: "Activation energy". */
  what?: string;
  unit: string;
  /** Decimals of the figures; by the uncertainties when not given. */
  digits?: number;
  /** What the interval of a row is: ± one standard uncertainty when not given. */
  intervalLabel?: string;
  /** What the rows are, as the head of the table: "Source". */
  rowName?: string;
  /** A value to compare with, as a dotted line: that of all rows beside those with one left out. */
  reference?: { value: number; label: string } | null;
  id?: string;
}

const rowHeight = 26;
const groupHeight = 32;
const top = 12;
const narrowBelow = 560;

/** Values with their intervals one under another, grouped, the pooled value as a diamond beneath and its prediction interval as a bar. */
export function IntervalPlot({ rows, pooled = null, what = 'Value', unit, digits, intervalLabel = '± one standard uncertainty', rowName = 'Value', reference = null, id }: IntervalPlotProps) {
  const [frame, width] = useWidth<HTMLElement>(640);
  if (rows.length === 0) return <p className="text-second">No value to draw yet.</p>;

  // On a narrow page each name stands over its interval; on a wide one beside it.
  const stacked = width < narrowBelow;
  const decimals = digits ?? Math.max(...rows.map(decimalsOfRow));
  const text = (value: number) => fixed(value, decimals);
  const figures = new Map(rows.map((row) => [row.id, figureText(row, decimals)]));
  const figureRoom = Math.max(...[...figures.values()].map((one) => one.length)) * 6.6 + 10;
  const labelRoom = stacked ? 0 : Math.min(width * 0.36, 14 + Math.max(...rows.map((row) => row.label.length), 10) * 6.4);
  const left = stacked ? 10 : labelRoom + 14;
  const right = stacked ? width - 10 : width - figureRoom - 10;
  const each = stacked ? rowHeight + 18 : rowHeight;

  let y = top;
  const placed = linesOf(rows).map((line) => {
    const from = y;
    y += line.kind === 'group' ? groupHeight : each;
    return { line, from, middle: line.kind === 'group' ? from + 21 : from + (stacked ? 31 : each / 2) };
  });
  const pooledFrom = y + 6;
  const pooledMiddle = pooledFrom + (stacked ? 33 : 18);
  const predictionMiddle = pooledMiddle + 20;
  const axisY = pooled ? (pooled.predictionInterval ? predictionMiddle : pooledMiddle) + 18 : y + 6;
  const height = axisY + 42;
  const values = [...valuesShown(rows, pooled), ...(reference ? [reference.value] : [])];
  const x = linearScale({ domain: [Math.min(...values), Math.max(...values)], range: [left + 8, right - 8], nice: 6 });
  const ticks = Math.max(2, Math.min(8, Math.round((right - left) / 80)));
  const guide = pooled?.mean ?? null;
  const shares = rows.map((row) => row.weight ?? 0);
  const most = Math.max(...shares);

  return (
    <figure ref={frame} className="m-0">
      <svg
        id={id} className="plot" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img"
        aria-label={`${what} of ${rows.length} ${rows.length === 1 ? 'row' : 'rows'} with intervals${unit && `, in ${unit}`}${pooled ? `; pooled value ${text(pooled.mean)}${pooled.interval ? `, ${text(pooled.interval[0])} to ${text(pooled.interval[1])}` : ''}` : ''}; the values are in the table below.`}
      >
        <g aria-hidden="true">
          {x.ticks(ticks).map((tick) => (
            <g key={tick}>
              <path className="plot-hairline" d={`M${x(tick)} ${top}V${axisY}`} />
              <path className="plot-axis" d={`M${x(tick)} ${axisY}v5`} />
              <text x={x(tick)} y={axisY + 18} textAnchor="middle">{x.tickText(tick, ticks)}</text>
            </g>
          ))}
          <path className="plot-axis" d={`M${left} ${axisY + 0.5}H${right}`} />
          <text x={(left + right) / 2} y={axisY + 36} textAnchor="middle">{what}{unit && <> / (<UnitTspans unit={unit} />)</>}</text>
          {guide !== null && <path className="interval-guide" d={`M${x(guide)} ${top}V${axisY}`} stroke="var(--color-lichen)" strokeWidth="1.200" strokeDasharray="5 3" fill="none" />}
          {reference && <path className="interval-reference" d={`M${x(reference.value)} ${top}V${axisY}`} stroke="var(--color-slate)" strokeWidth="1.500" strokeDasharray="2 3" fill="none" />}
        </g>
        {placed.map(({ line, from, middle }) => (line.kind === 'group'
          ? <text key={`group ${line.name}`} className="plot-head" x={stacked ? left : 0} y={middle}>{fittedLabel(line.name, width - 10)}</text>
          : (
            <g key={line.row.id} className="interval-row">
              <title>{`${line.row.label}: ${figures.get(line.row.id)}`}</title>
              <text className="plot-ink plot-halo" x={stacked ? left : labelRoom} y={stacked ? from + 15 : middle + 4} textAnchor={stacked ? 'start' : 'end'}>
                {fittedLabel(line.row.label, stacked ? right - left - figureRoom : labelRoom)}
              </text>
              <text className="plot-halo" x={stacked ? right : width} y={stacked ? from + 15 : middle + 4} textAnchor="end">{figures.get(line.row.id)}</text>
              <Interval row={line.row} x={x} y={middle} size={most > 0 ? 2.5 + 4.5 * Math.sqrt((line.row.weight ?? 0) / most) : 4.5} />
            </g>
          )))}
        {pooled && (
          <g className="interval-pooled">
            <path className="plot-axis" d={`M${stacked ? left : 0} ${pooledFrom - 2.5}H${stacked ? right : width}`} aria-hidden="true" />
            <text className="plot-ink" fontWeight="600" x={stacked ? left : labelRoom} y={stacked ? pooledFrom + 16 : pooledMiddle + 4} textAnchor={stacked ? 'start' : 'end'}>{fittedLabel(pooled.label ?? 'Pooled value', stacked ? width * 0.5 : labelRoom)}</text>
            <text className="plot-ink" x={stacked ? right : width} y={stacked ? pooledFrom + 16 : pooledMiddle + 4} textAnchor="end">{text(pooled.mean)}</text>
            <Diamond pooled={pooled} x={x} y={pooledMiddle} />
            {pooled.predictionInterval && <PredictionBar interval={pooled.predictionInterval} x={x} y={predictionMiddle} />}
          </g>
        )}
      </svg>
      <PlotLegend items={legendOf({ rows, pooled, reference, intervalLabel, weighted: most > 0 })} />
      <IntervalTable {...{ rows, pooled, text, decimals, unit, rowName, intervalLabel }} />
    </figure>
  );
}

/** Decimals of a value: by its uncertainty, by the width of its interval, else those that three digits need. */
function decimalsOfRow({ value, u, low, high }: IntervalRow): number {
  const spread = u ?? (value !== null && low != null && high != null ? (high - low) / 4 : null);
  return decimalsOf(value ?? high ?? low ?? 0, { u: spread, uDigits: 2, significantDigits: 3, guard: 0 });
}

/** The figure of a row; without an uncertainty it shows no zeros that nobody reported. */
function figureText(row: IntervalRow, most: number): string {
  const { value, u, low, high, bound = '=' } = row;
  const own = Math.min(most, decimalsOfRow(row));
  const text = (number: number) => (u ? fixed(number, own) : fixed(Number(number.toFixed(own)), 12).replace(/\.?0+$/, ''));
  if (bound === 'range' && low != null && high != null) return `${text(low)} to ${text(high)}`;
  const limit = value ?? high ?? low;
  if (limit == null) return 'not reported';
  const sign = bound === '=' || bound === 'range' ? '' : `${bound}\u00a0`;
  return `${sign}${text(limit)}${u ? `\u2009±\u2009${text(u)}` : ''}`;
}

/** The drawing of one row: a mark with a whisker, a bar for a range, an arrow for a bound. */
function Interval({ row, x, y, size }: { row: IntervalRow; x: (value: number) => number; y: number; size: number }) {
  const extent = extentOf(row);
  const limit = row.value ?? row.high ?? row.low;
  if (!extent || limit == null) return null;
  const stroke = 'var(--color-ink)';
  const at = x(limit);
  if (isOpenAbove(row.bound) || isOpenBelow(row.bound)) {
    const tip = isOpenAbove(row.bound) ? 22 : -22;
    return <path className="interval-bound" d={`M${at} ${y - 6}V${y + 6}M${at} ${y}h${tip}M${at + tip * 0.75} ${y - 4}L${at + tip} ${y}L${at + tip * 0.75} ${y + 4}`} stroke={stroke} strokeWidth="1.800" fill="none" />;
  }
  if (row.bound === 'range' && row.value === null) {
    return <rect className="interval-range" x={x(extent[0])} y={y - 4} width={Math.max(1, x(extent[1]) - x(extent[0]))} height="8" fill="var(--color-slate)" fillOpacity="0.25" stroke="var(--color-slate)" strokeWidth="1.200" />;
  }
  return (
    <>
      {extent[1] > extent[0] && <path className="interval-whisker" d={`M${x(extent[0])} ${y - 4}v8M${x(extent[0])} ${y}H${x(extent[1])}M${x(extent[1])} ${y - 4}v8`} stroke={stroke} strokeWidth="1.300" strokeDasharray={row.bound === '≈' ? '3 2' : undefined} fill="none" />}
      <rect className="interval-mark" x={at - size} y={y - size} width={2 * size} height={2 * size} fill={row.computed ? 'var(--color-paper)' : stroke} stroke={stroke} strokeWidth="1.500" />
    </>
  );
}

function Diamond({ pooled, x, y }: { pooled: Pooled; x: (value: number) => number; y: number }) {
  const at = x(pooled.mean);
  const [from, to] = pooled.interval ? pooled.interval.map(x) as [number, number] : [at - 6, at + 6];
  return <path className="interval-diamond" d={`M${from} ${y}L${at} ${y - 7}L${to} ${y}L${at} ${y + 7}Z`} fill={pooled.interval ? 'var(--color-lichen)' : 'var(--color-paper)'} stroke="var(--color-lichen)" strokeWidth="1.500" />;
}

function PredictionBar({ interval, x, y }: { interval: readonly [number, number]; x: (value: number) => number; y: number }) {
  const [from, to] = interval.map(x) as [number, number];
  return <path className="interval-prediction" d={`M${from} ${y - 4}v8M${from} ${y}H${to}M${to} ${y - 4}v8`} stroke="var(--color-lichen)" strokeWidth="2" strokeDasharray="4 2" fill="none" />;
}

function legendOf({ rows, pooled, reference, intervalLabel, weighted }: {
  rows: readonly IntervalRow[]; pooled: Pooled | null; reference: { label: string } | null; intervalLabel: string; weighted: boolean;
}): LegendItem[] {
  const solid = (value: number) => value;
  const sampleRow = (more: Partial<IntervalRow>): IntervalRow => ({ id: '', label: '', value: 13, u: 10, ...more });
  const some = (test: (row: IntervalRow) => boolean) => rows.some(test);
  return [
    { id: 'interval', label: `${intervalLabel}${weighted ? '; the size of the mark is the weight' : ''}`, sample: <Interval row={sampleRow({})} x={solid} y={6} size={4} /> },
    ...(some((row) => row.computed === true) ? [{ id: 'computed', label: 'computed', sample: <Interval row={sampleRow({ computed: true })} x={solid} y={6} size={4} /> }] : []),
    ...(some((row) => row.value === null && row.bound === 'range') ? [{ id: 'range', label: 'range as reported', sample: <Interval row={sampleRow({ value: null, low: 3, high: 23, bound: 'range' })} x={solid} y={6} size={4} /> }] : []),
    ...(some((row) => isOpenAbove(row.bound) || isOpenBelow(row.bound)) ? [{ id: 'bound', label: 'bound: the value lies there or beyond', sample: <Interval row={sampleRow({ value: 2, bound: '≥' })} x={solid} y={6} size={4} /> }] : []),
    ...(pooled ? [{ id: 'pooled', label: pooled.interval ? 'pooled value with its 95 % interval' : 'pooled value', sample: <Diamond pooled={{ mean: 13, interval: pooled.interval ? [2, 24] : null }} x={solid} y={6} /> }] : []),
    ...(pooled?.predictionInterval ? [{ id: 'prediction', label: '95 % prediction interval of a further value', sample: <PredictionBar interval={[1, 25]} x={solid} y={6} /> }] : []),
    ...(reference ? [{ id: 'reference', label: reference.label, sample: <path d="M13 0V12" stroke="var(--color-slate)" strokeWidth="1.500" strokeDasharray="2 3" /> }] : []),
  ];
}

interface IntervalTableProps {
  rows: readonly IntervalRow[];
  pooled: Pooled | null;
  text: (value: number) => string;
  decimals: number;
  unit: string;
  rowName: string;
  intervalLabel: string;
}

function IntervalTable({ rows, pooled, text, decimals, unit, rowName, intervalLabel }: IntervalTableProps) {
  const grouped = rows.some((row) => row.group);
  const weighted = rows.some((row) => row.weight != null);
  const between = (ends: readonly [number, number] | null | undefined) => (ends && ends[1] > ends[0] ? `${text(ends[0])} to ${text(ends[1])}` : 'none');
  const ordered = linesOf(rows).flatMap((line) => (line.kind === 'row' ? [line.row] : []));
  return (
    <PlotTable
      columns={[
        { label: rowName }, ...(grouped ? [{ label: 'Group' }] : []), { label: 'value', unit, numeric: true },
        { label: intervalLabel, unit, numeric: true }, ...(weighted ? [{ label: 'weight', unit: '%', numeric: true }] : []),
      ]}
      rows={[
        ...ordered.map((row) => ({
          id: row.id,
          cells: [
            row.href ? <Link key="link" to={row.href}>{row.label}</Link> : row.label,
            ...(grouped ? [row.group ?? ''] : []),
            figureText(row, decimals),
            isOpenAbove(row.bound) || isOpenBelow(row.bound) ? 'bound' : between(extentOf(row)),
            ...(weighted ? [row.weight == null ? 'left out' : fixed(row.weight * 100, 1)] : []),
          ],
        })),
        ...(pooled ? [{ id: 'pooled', cells: [pooled.label ?? 'Pooled value', ...(grouped ? [''] : []), text(pooled.mean), between(pooled.interval), ...(weighted ? [''] : [])] }] : []),
        ...(pooled?.predictionInterval ? [{ id: 'prediction', cells: ['Prediction interval', ...(grouped ? [''] : []), '', between(pooled.predictionInterval), ...(weighted ? [''] : [])] }] : []),
      ]}
    />
  );
}
