import { area, line as lineShape } from 'd3-shape';
import { lnRateAt, uLnRateAt } from '#shared/kinetics/arrhenius.ts';
import { R } from '#shared/kinetics/constants.ts';
import { fixed, setNumber } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from './linear-scale.ts';
import { PlotAxes, temperatureText } from './plot-axes.tsx';
import { PlotLegend } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { UnitTspans } from './unit-text.tsx';

/** One rate constant of a fit. */
export interface FitPlotPoint {
  temperatureK: number;
  /** Natural logarithm of k. */
  lnK: number;
  /** Standard uncertainty of ln k. */
  uLnK?: number | null;
  /** Left out of the fit; drawn open and struck through. */
  excluded?: boolean;
}

/** The fitted line ln k = ln A - E/RT, and what its band needs. */
export interface FitPlotLine {
  lnPreExponential: number;
  energyKJPerMol: number;
  uLnPreExponential?: number | null;
  uEnergyKJPerMol?: number | null;
  /** Correlation of ln A and E; without it there is no band. */
  correlation?: number | null;
  /** By which the standard uncertainty of the line is multiplied: 1 when not given. */
  coverageFactor?: number;
  /** What the band then is: "95 % confidence". */
  bandLabel?: string;
}

interface FitPlotProps {
  points: readonly FitPlotPoint[];
  line: FitPlotLine | null;
  /** Unit of k; empty where nobody said it. */
  unit: string;
  logarithm?: 'ln' | 'log10';
  /** Leaves a point out or takes it in again, by its index. */
  onToggle?: (index: number) => void;
  height?: number;
  id?: string;
}

interface Sample {
  x: number;
  y: number;
  half: number;
}

const pad = { left: 50, right: 16, top: 26, bottom: 40 };
const residualHeight = 84;
const gap = 40;

/** log k against 1000 K/T with the fitted line and its band; the residuals beneath on the same axis. */
export function FitPlot({ points, line, unit, logarithm = 'log10', onToggle, height = 270, id }: FitPlotProps) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const per = logarithm === 'ln' ? 1 : Math.LN10;
  const drawn = points.map((point, index) => ({ ...point, index })).filter((point) => point.temperatureK > 0 && Number.isFinite(point.lnK));
  if (drawn.length === 0) return <p className="text-second">No point to draw yet.</p>;

  const lnFit = (temperatureK: number) => (line ? lnRateAt(line.lnPreExponential, 0, 0, (line.energyKJPerMol * 1000) / R, temperatureK) : Number.NaN);
  const half = bandOf(line);
  const reciprocals = drawn.map((point) => 1000 / point.temperatureK);
  const used = drawn.filter((point) => !point.excluded).map((point) => 1000 / point.temperatureK);
  const span = Math.max(0.02, Math.max(...reciprocals) - Math.min(...reciprocals));
  const ends = [Math.max(0.05, Math.min(...reciprocals) - span * 0.08), Math.max(...reciprocals) + span * 0.08] as const;
  const sample = (from: number, to: number): Sample[] => Array.from({ length: 41 }, (_, index) => {
    const x = from + ((to - from) * index) / 40;
    return { x, y: lnFit(1000 / x) / per, half: (half?.(1000 / x) ?? 0) / per };
  });
  const whole = line ? sample(...ends) : [];
  const solid = line && used.length > 1 ? sample(Math.min(...used), Math.max(...used)) : [];
  const heights = [
    ...drawn.flatMap((point) => [point.lnK - (point.uLnK ?? 0), point.lnK + (point.uLnK ?? 0)]).map((value) => value / per),
    ...whole.flatMap((one) => [one.y - one.half, one.y + one.half]),
  ];
  const residuals = drawn.map((point) => ({ ...point, residual: (point.lnK - lnFit(point.temperatureK)) / per, u: (point.uLnK ?? 0) / per }));
  // What is left out of the fit does not set the scale of what is in it; beyond it stands an arrow at the edge.
  const kept = residuals.filter((one) => !one.excluded);
  const farthest = Math.max(1e-9, ...(kept.length > 0 ? kept : residuals).map((one) => Math.abs(one.residual) + one.u).filter(Number.isFinite));

  const x = linearScale({ domain: ends, range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(...heights), Math.max(...heights)], range: [height - 8, pad.top], nice: 8 });
  const residualTop = height + gap;
  const residualY = linearScale({ domain: [-farthest, farthest], range: [residualTop + residualHeight, residualTop], nice: 3 });
  const total = line ? residualTop + residualHeight + pad.bottom : height + pad.bottom - 8;
  const path = lineShape<Sample>().x((one) => x(one.x)).y((one) => y(one.y));
  const band = area<Sample>().x((one) => x(one.x)).y0((one) => y(one.y - one.half)).y1((one) => y(one.y + one.half));
  const log = logarithm === 'ln' ? <>ln</> : <>log<tspan dy="3" fontSize="0.78em">10</tspan><tspan dy="-3">{'\u200b'}</tspan></>;
  const xTicks = Math.max(3, Math.min(6, Math.round(width / 90)));
  const excluded = drawn.filter((point) => point.excluded).length;

  return (
    <figure ref={frame} className="m-0">
      <svg
        id={id} className="plot" width={width} height={total} viewBox={`0 0 ${width} ${total}`} role="img"
        aria-label={`${drawn.length} rate constants against temperature${line ? ' with the fitted line and the residuals' : ''}${excluded ? `, ${excluded} left out of the fit` : ''}: ${logarithm === 'ln' ? 'ln' : 'log'} k${unit && ` in ${unit}`} over 1000 K/T; the values are in the table below.`}
      >
        <PlotAxes x={x} y={y} left={pad.left} right={width - pad.right} top={pad.top} bottom={height - 8} xTicks={xTicks} xLabel="1000 K / T" yLabel={<>{log} k{unit && <> / (<UnitTspans unit={unit} />)</>}</>} bareFoot={line !== null} />
        {half && <path className="fit-band" d={band(whole) ?? ''} fill="var(--color-lichen)" opacity="0.18" />}
        {line && <path className="fit-line-outside" d={path(whole) ?? ''} fill="none" stroke="var(--color-lichen)" strokeWidth="1.500" strokeDasharray="5 4" />}
        {solid.length > 0 && <path className="fit-line" d={path(solid) ?? ''} fill="none" stroke="var(--color-lichen)" strokeWidth="2.200" />}
        {drawn.map((point) => (
          <PointMark
            key={point.index} point={point} x={x(1000 / point.temperatureK)} y={y(point.lnK / per)}
            whisker={point.uLnK ? [y((point.lnK - point.uLnK) / per), y((point.lnK + point.uLnK) / per)] : null}
            title={`${point.index + 1}: ${temperatureText(point.temperatureK)} K${point.excluded ? ', left out' : ''}`}
            onToggle={onToggle && (() => onToggle(point.index))}
          />
        ))}
        {line && (
          <>
            <PlotAxes x={x} y={residualY} left={pad.left} right={width - pad.right} top={residualTop} bottom={residualTop + residualHeight} xTicks={xTicks} yTicks={3} xLabel="1000 K / T" yLabel={<>residual of {log} k</>} />
            <path className="plot-axis" d={`M${pad.left} ${residualY(0)}H${width - pad.right}`} />
            {residuals.map((one) => (
              <g key={one.index}>
                {!one.excluded && <path d={`M${x(1000 / one.temperatureK)} ${residualY(0)}V${residualY(one.residual)}`} stroke="var(--color-slate)" strokeWidth="1" opacity="0.6" />}
                {Math.abs(one.residual) > residualY.domain[1]
                  ? <Beyond x={x(1000 / one.temperatureK)} y={residualY(Math.sign(one.residual) * residualY.domain[1])} up={one.residual > 0} />
                  : <PointMark point={one} x={x(1000 / one.temperatureK)} y={residualY(one.residual)} whisker={one.u ? [residualY(one.residual - one.u), residualY(one.residual + one.u)] : null} title={`${one.index + 1}`} onToggle={onToggle && (() => onToggle(one.index))} />}
              </g>
            ))}
          </>
        )}
      </svg>
      <PlotLegend items={legendOf({ line, band: half !== null, excluded: excluded > 0 })} />
      {line && !half && <p className="plot-note">{noBandReason(line)}</p>}
      <FitTable {...{ points: drawn, lnFit: line ? lnFit : null, per, logarithm, unit, onToggle }} />
    </figure>
  );
}

/** Half the height of the band in ln k at a temperature; null where the line's uncertainty is not known in full. */
function bandOf(line: FitPlotLine | null): ((temperatureK: number) => number) | null {
  const { uLnPreExponential: uLnA, uEnergyKJPerMol: uEnergy, correlation, coverageFactor = 1 } = line ?? {};
  if (uLnA == null || uEnergy == null || correlation == null) return null;
  return (temperatureK) => coverageFactor * uLnRateAt(uLnA, (uEnergy * 1000) / R, correlation, temperatureK);
}

function noBandReason(line: FitPlotLine): string {
  return line.uLnPreExponential == null || line.uEnergyKJPerMol == null
    ? 'No band is drawn: the uncertainties of ln A and E are not known.'
    : 'No band is drawn: the correlation of ln A and E is not known.';
}

function legendOf({ line, band, excluded }: { line: FitPlotLine | null; band: boolean; excluded: boolean }) {
  const factor = line?.coverageFactor ?? 1;
  const bandLabel = line?.bandLabel ?? (factor === 1 ? 'one standard uncertainty of the line' : `${setNumber(factor, { digits: 3 }).text} standard uncertainties of the line`);
  return [
    { id: 'point', label: 'rate constant', sample: <circle cx="13" cy="6" r="4" fill="var(--color-ink)" /> },
    ...(excluded ? [{ id: 'excluded', label: 'left out of the fit', sample: <Struck x={13} y={6} /> }] : []),
    ...(line ? [{ id: 'line', label: 'fitted line, dashed outside its points', sample: <><path d="M0 6H13" stroke="var(--color-lichen)" strokeWidth="2.200" /><path d="M15 6H26" stroke="var(--color-lichen)" strokeWidth="1.500" strokeDasharray="4 3" /></> }] : []),
    ...(band ? [{ id: 'band', label: bandLabel, sample: <rect x="1" y="1" width="24" height="10" fill="var(--color-lichen)" opacity="0.25" /> }] : []),
  ];
}

function Struck({ x, y }: { x: number; y: number }) {
  return (
    <g fill="none" stroke="var(--color-second)" strokeWidth="1.500">
      <circle cx={x} cy={y} r="4" fill="var(--color-paper)" />
      <path d={`M${x - 5.5} ${y + 5.5}L${x + 5.5} ${y - 5.5}`} />
    </g>
  );
}

/** A residual that lies beyond its axis. */
function Beyond({ x, y, up }: { x: number; y: number; up: boolean }) {
  const tip = up ? -1 : 1;
  return <path className="fit-beyond" d={`M${x} ${y - tip * 10}V${y}M${x - 4} ${y - tip * 5}L${x} ${y}L${x + 4} ${y - tip * 5}`} stroke="var(--color-second)" strokeWidth="1.500" fill="none" />;
}

interface PointMarkProps {
  point: FitPlotPoint;
  x: number;
  y: number;
  whisker: [number, number] | null;
  title: string;
  onToggle?: () => void;
}

/** A point with its uncertainty; a click leaves it out or takes it in, as the box in the table does. */
function PointMark({ point, x, y, whisker, title, onToggle }: PointMarkProps) {
  if (!Number.isFinite(y)) return null;
  return (
    <g className={`fit-point ${onToggle ? 'plot-mark-button' : ''}`} onClick={onToggle}>
      <title>{title}</title>
      {onToggle && <circle cx={x} cy={y} r="12" fill="transparent" />}
      {whisker && <path className="fit-whisker" d={`M${x - 3} ${whisker[0]}h6M${x} ${whisker[0]}V${whisker[1]}M${x - 3} ${whisker[1]}h6`} stroke={point.excluded ? 'var(--color-second)' : 'var(--color-ink)'} strokeWidth="1.200" fill="none" />}
      {point.excluded ? <Struck x={x} y={y} /> : <circle cx={x} cy={y} r="4" fill="var(--color-ink)" stroke="var(--color-paper)" strokeWidth="1" />}
    </g>
  );
}

interface FitTableProps {
  points: readonly (FitPlotPoint & { index: number })[];
  lnFit: ((temperatureK: number) => number) | null;
  per: number;
  logarithm: 'ln' | 'log10';
  unit: string;
  onToggle?: (index: number) => void;
}

function FitTable({ points, lnFit, per, logarithm, unit, onToggle }: FitTableProps) {
  const log = logarithm === 'ln' ? 'ln k' : <>log<sub>10</sub> k</>;
  return (
    <PlotTable
      summary={onToggle ? 'The plot as a table, and which points are used' : undefined}
      columns={[
        { label: 'Point' }, ...(onToggle ? [{ label: 'In the fit' }] : []), { label: 'T', unit: 'K', numeric: true }, { label: log, unit: unit && `of k in ${unit}`, numeric: true },
        { label: <>standard<br />uncertainty</>, numeric: true }, ...(lnFit ? [{ label: 'line', numeric: true }, { label: 'residual', numeric: true }] : []),
      ]}
      rows={points.map((point) => ({
        id: String(point.index),
        cells: [
          `${point.index + 1}${point.excluded && !onToggle ? ', left out' : ''}`,
          ...(onToggle ? [<input key="used" type="checkbox" className="tick" aria-label={`Point ${point.index + 1}, ${point.temperatureK} K, in the fit`} checked={!point.excluded} onChange={() => onToggle(point.index)} />] : []),
          temperatureText(point.temperatureK),
          fixed(point.lnK / per, 3),
          point.uLnK ? fixed(point.uLnK / per, 3) : 'not given',
          ...(lnFit ? [fixed(lnFit(point.temperatureK) / per, 3), fixed((point.lnK - lnFit(point.temperatureK)) / per, 3)] : []),
        ],
      }))}
    />
  );
}
