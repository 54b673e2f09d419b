import { useId, useMemo, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { useWidth } from '#client/lib/use-width.ts';
import { StripRangeFields } from './strip-range.tsx';
import { countInBins, mostDots, mostLanes, placePoints, stripScale, type Histogram, type PlacedPoint, type StripPoint } from './strip-layout.ts';

export interface StripRange {
  min: number | null;
  max: number | null;
}

interface StripProps {
  points: readonly StripPoint[];
  /** Counts from the server in the place of points, when there are too many to send. */
  histogram?: Histogram | null;
  unit: string;
  /** What the axis shows: "Activation energy". */
  what: string;
  /** The row that is hovered or focused: its dot is marked. */
  activeId?: string | null;
  onActive?: (id: string | null) => void;
  onOpen?: (id: string) => void;
  chosen?: ReadonlySet<string>;
  range?: StripRange;
  onRange?: (range: StripRange) => void;
}

const margin = 12;
const laneHeight = 11;

/** Where the axis lies under so many lanes of dots. */
const axisUnder = (lanes: number) => lanes * laneHeight + 10;

/** All found values on one axis: filled when measured, open when computed, an arrow for a bound; a histogram above 400. */
export function Strip({ points, histogram, unit, what, activeId = null, onActive, onOpen, chosen, range, onRange }: StripProps) {
  const [frame, width] = useWidth<HTMLDivElement>(1100);
  const id = useId();
  const [drag, setDrag] = useState<{ from: number; to: number } | null>(null);
  const values = useMemo(() => (histogram ? [...histogram.edges] : points.map((point) => point.value)), [histogram, points]);
  const scale = useMemo(() => stripScale(values, width, margin), [values, width]);
  const dense = Boolean(histogram) || points.length > mostDots;
  const placed = useMemo(() => (dense ? [] : placePoints(points, scale)), [dense, points, scale]);
  const counted = useMemo(() => (dense ? histogram ?? countInBins(values, scale) : null), [dense, histogram, values, scale]);
  const axisY = axisUnder(dense ? mostLanes : Math.max(1, ...placed.map((point) => point.lane + 1)));
  const height = axisY + 22;
  const active = placed.find((point) => point.id === activeId);
  const count = histogram ? histogram.counts.reduce((sum, one) => sum + one, 0) : points.length;

  function at(event: PointerEvent<SVGSVGElement>): number {
    return event.clientX - event.currentTarget.getBoundingClientRect().left;
  }

  function finish() {
    if (!drag) return;
    setDrag(null);
    if (Math.abs(drag.to - drag.from) < 5) return;
    const [from, to] = [Math.min(drag.from, drag.to), Math.max(drag.from, drag.to)].map((px) => scale.invert(px));
    onRange?.({ min: roundTo(from ?? 0, scale.ticks(10)), max: roundTo(to ?? 0, scale.ticks(10)) });
  }

  function onKey(event: KeyboardEvent) {
    const index = placed.findIndex((point) => point.id === activeId);
    const moves: Record<string, number> = { ArrowRight: index + 1, ArrowLeft: index < 0 ? placed.length - 1 : index - 1, Home: 0, End: placed.length - 1 };
    const to = moves[event.key];
    if (to !== undefined) {
      event.preventDefault();
      onActive?.(placed[Math.max(0, Math.min(placed.length - 1, to))]?.id ?? null);
    } else if (event.key === 'Enter' && active) onOpen?.(active.id);
    else if (event.key === 'Escape') onActive?.(null);
  }

  const shownRange = drag
    ? { x0: Math.min(drag.from, drag.to), x1: Math.max(drag.from, drag.to) }
    : range && (range.min !== null || range.max !== null)
      ? { x0: range.min === null ? margin : scale(range.min), x1: range.max === null ? width - margin : scale(range.max) }
      : null;
  const interactive = !dense && placed.length > 0;

  return (
    <div className="strip" ref={frame}>
      <div
        role={interactive ? 'listbox' : undefined}
        tabIndex={interactive ? 0 : undefined}
        aria-label={interactive ? `${what} of ${count} entries, by value` : undefined}
        aria-activedescendant={active ? `${id}-${active.id}` : undefined}
        onKeyDown={interactive ? onKey : undefined}
      >
        <svg
          className="strip-plot"
          height={height}
          role={interactive ? 'presentation' : 'img'}
          aria-label={interactive ? undefined : `${what} of ${count} entries as a histogram, in ${unit}`}
          onPointerDown={(event) => {
            if (!onRange || event.button !== 0 || (event.target as Element).closest('.strip-dot')) return;
            event.currentTarget.setPointerCapture(event.pointerId);
            setDrag({ from: at(event), to: at(event) });
          }}
          onPointerMove={(event) => drag && setDrag({ ...drag, to: at(event) })}
          onPointerUp={finish}
          onPointerCancel={() => setDrag(null)}
        >
          {shownRange && <rect className="strip-range" x={shownRange.x0} y={0.5} width={Math.max(1, shownRange.x1 - shownRange.x0)} height={axisY} />}
          <Axis ticks={scale.ticks(Math.max(3, Math.round(width / 130)))} x={scale} unit={unit} width={width} axisY={axisY} />
          {counted && <Bars histogram={counted} x={scale} axisY={axisY} />}
          {placed.map((point) => (
            <g
              key={point.id}
              id={`${id}-${point.id}`}
              role="option"
              aria-selected={point.id === activeId}
              aria-label={`${point.label}${chosen?.has(point.id) ? ', chosen' : ''}`}
              onPointerEnter={() => onActive?.(point.id)}
              onPointerLeave={() => onActive?.(null)}
              onClick={() => onOpen?.(point.id)}
            >
              <Dot point={point} marked={point.id === activeId} chosen={chosen?.has(point.id) ?? false} axisY={axisY} />
            </g>
          ))}
        </svg>
      </div>
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1">
        <p className="strip-note min-w-0 text-fine text-second" aria-hidden="true">{active ? active.label : onRange && !dense ? 'Drag over the axis to keep a range of values.' : ''}</p>
        {onRange && <StripRangeFields unit={unit} range={range ?? { min: null, max: null }} onRange={onRange} />}
      </div>
    </div>
  );
}

/** Rounds to a hundredth part of the distance of the ticks, so that a dragged end is a number one can read. */
function roundTo(value: number, ticks: readonly number[]): number {
  const step = ((ticks[1] ?? 1) - (ticks[0] ?? 0)) / 20 || 0.05;
  return Number((Math.round(value / step) * step).toPrecision(6));
}

function Axis({ ticks, x, unit, width, axisY }: { ticks: readonly number[]; x: (value: number) => number; unit: string; width: number; axisY: number }) {
  return (
    <g className="plot" aria-hidden="true">
      <path className="plot-axis" d={`M0 ${axisY + 0.5}H${width}`} />
      {ticks.map((tick, index) => (
        <g key={tick}>
          <path className="plot-axis" d={`M${Math.round(x(tick)) + 0.5} ${axisY}v5`} />
          <text x={x(tick)} y={axisY + 18} textAnchor={index === 0 ? 'start' : index === ticks.length - 1 ? 'end' : 'middle'} dx={index === 0 ? -4 : index === ticks.length - 1 ? 4 : 0}>
            {String(tick).replace('-', '\u2212')}{index === ticks.length - 1 ? ` ${unit}` : ''}
          </text>
        </g>
      ))}
    </g>
  );
}

function Bars({ histogram, x, axisY }: { histogram: Histogram; x: (value: number) => number; axisY: number }) {
  const most = Math.max(1, ...histogram.counts);
  const tall = axisY - 4;
  return histogram.counts.map((count, index) => {
    const from = x(histogram.edges[index] ?? 0);
    const to = x(histogram.edges[index + 1] ?? 0);
    const bar = (count / most) * tall;
    return <rect key={index} className="strip-bar" x={from + 0.5} y={axisY - bar} width={Math.max(1, to - from - 1)} height={bar} />;
  });
}

function Dot({ point, marked, chosen, axisY }: { point: PlacedPoint; marked: boolean; chosen: boolean; axisY: number }) {
  const { x, bound, computed } = point;
  const y = axisY - 8 - point.lane * laneHeight;
  const look = `strip-dot ${marked ? 'strip-marked' : ''}`;
  const up = bound === '>' || bound === '≥';
  const down = bound === '<' || bound === '≤';
  return (
    <>
      {(marked || chosen) && <circle className="strip-ring" cx={x} cy={y} r={marked ? 8 : 7} strokeDasharray={marked ? undefined : '2 2'} />}
      {/* A bound points to where the value may lie. */}
      {up && <path className={`${look} strip-arrow`} d={`M${x} ${y - 4}V${y + 4}M${x} ${y}H${x + 9}M${x + 5.5} ${y - 3}L${x + 9} ${y}L${x + 5.5} ${y + 3}`} />}
      {down && <path className={`${look} strip-arrow`} d={`M${x} ${y - 4}V${y + 4}M${x} ${y}H${x - 9}M${x - 5.5} ${y - 3}L${x - 9} ${y}L${x - 5.5} ${y + 3}`} />}
      {!up && !down && <circle className={`${look} ${computed ? 'strip-open' : ''}`} cx={x} cy={y} r={4.4} />}
    </>
  );
}
