import { line as lineShape } from 'd3-shape';
import { useState } from 'react';
import { fixed, plainNumber, setNumber } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from './linear-scale.ts';
import { PlotAxes, temperatureText } from './plot-axes.tsx';
import { PlotLegend } from './plot-legend.tsx';
import { PlotTable } from './plot-table.tsx';
import { SeriesMark, seriesLook } from './series-look.tsx';

/** One kinetic isotope effect against temperature. */
export interface KieLine {
  id: string;
  label: string;
  /** k light over k heavy at a temperature [K]. */
  kie: (temperatureK: number) => number;
  /** The valid range [K]; outside it the line is dashed, without one the whole of it. */
  range?: { min: number; max: number } | null;
}

/** One reported kinetic isotope effect. */
export interface KiePoint {
  id: string;
  label: string;
  temperatureK: number;
  kie: number;
  /** Standard uncertainty. */
  u?: number | null;
  /** Computed values are drawn open. */
  computed?: boolean;
}

interface KiePlotProps {
  lines: readonly KieLine[];
  points?: readonly KiePoint[];
  /** The semiclassical limit at a temperature [K]: beyond it a value asks for a reason. */
  limit?: (temperatureK: number) => number;
  limitLabel?: string;
  /** The temperature of interest [K]. */
  temperatureK: number;
  height?: number;
  id?: string;
}

interface Sample {
  t: number;
  kie: number;
}

const pad = { left: 46, right: 16, top: 26, bottom: 40 };

/** Kinetic isotope effects against T, with 1 (no effect) as a rule and the semiclassical limit as a dotted line. */
export function KiePlot({ lines, points = [], limit, limitLabel = 'semiclassical limit', temperatureK, height = 270, id }: KiePlotProps) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const [active, setActive] = useState<string | null>(null);
  const temperatures = [...lines.flatMap((one) => (one.range ? [one.range.min, one.range.max] : [])), ...points.map((point) => point.temperatureK), temperatureK];
  const coldest = Math.min(...temperatures);
  const hottest = Math.max(...temperatures);
  const margin = Math.max(25, (hottest - coldest) * 0.08);
  const ends = [Math.max(10, coldest - margin), hottest + margin] as const;
  const many = (of: (t: number) => number, from: number, to: number): Sample[] => Array.from({ length: 61 }, (_, index) => {
    const t = from + ((to - from) * index) / 60;
    return { t, kie: of(t) };
  });
  const sampled = lines.map((one) => ({
    one, samples: many(one.kie, ...ends),
    solid: one.range ? many(one.kie, one.range.min, one.range.max) : [],
  }));
  const own = [
    1, ...sampled.flatMap(({ one, samples, solid }) => [...(solid.length > 0 ? solid : samples).map((sample) => sample.kie), one.kie(temperatureK)]),
    ...points.flatMap((point) => [point.kie - (point.u ?? 0), point.kie + (point.u ?? 0)]),
  ].filter(Number.isFinite);
  const [lowest, highest] = [Math.min(...own), Math.max(...own)];
  const limits = limit ? many(limit, ...ends) : [];
  // The limit may lie far above all values: it does not then press them flat against the foot.
  const near = limits.map((sample) => sample.kie).filter((kie) => kie <= 1 + (highest - 1) * 2.5);
  const x = linearScale({ domain: ends, range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(lowest, 1), Math.max(highest, ...near, lowest + 0.05)], range: [height - pad.bottom, pad.top], nice: 6 });
  const [floor, ceiling] = y.domain;
  const inside = (kie: number) => Number.isFinite(kie) && kie >= floor && kie <= ceiling;
  const path = lineShape<Sample>().defined((sample) => inside(sample.kie)).x((sample) => x(sample.t)).y((sample) => y(sample.kie));
  const atX = x(temperatureK);
  const extrapolated = lines.some((one) => !within(one, temperatureK));
  const limitNote = limits.length > 0 && !limits.some((sample) => inside(sample.kie)) ? `The ${limitLabel} lies above the plot: ${set(limit?.(temperatureK))} at ${temperatureK} K.` : null;

  return (
    <figure ref={frame} className="m-0">
      <svg
        id={id} className="plot" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img"
        aria-label={`Kinetic isotope effect against temperature: ${[lines.length > 0 && `${lines.length} ${lines.length === 1 ? 'line' : 'lines'}`, points.length > 0 && `${points.length} ${points.length === 1 ? 'value' : 'values'}`, limit && `the ${limitLabel}`].filter(Boolean).join(', ')}; the figures are in the table below.`}
      >
        <PlotAxes x={x} y={y} left={pad.left} right={width - pad.right} top={pad.top} bottom={height - pad.bottom} xTicks={Math.max(3, Math.min(7, Math.round(width / 80)))} xLabel="T / K" yLabel="k light / k heavy" />
        {inside(1) && (
          <g className="kie-one" aria-hidden="true">
            <path d={`M${pad.left} ${y(1)}H${width - pad.right}`} stroke="var(--color-edge)" strokeWidth="1" />
            <text className="plot-halo" x={width - pad.right} y={y(1) - 5} textAnchor="end">no effect</text>
          </g>
        )}
        {limit && <path className="kie-limit" d={path(limits) ?? ''} fill="none" stroke="var(--color-rust)" strokeWidth="1.500" strokeDasharray="1.500 3" />}
        <path d={`M${atX} ${pad.top - 6}V${height - pad.bottom}`} stroke="var(--color-ochre)" strokeWidth="1.500" strokeDasharray="2 3" />
        <text className="plot-doubt" x={atX > width * 0.6 ? atX - 7 : atX + 7} y={pad.top + 4} textAnchor={atX > width * 0.6 ? 'end' : 'start'}>{`${temperatureK} K${extrapolated ? ', extrapolated' : ''}`}</text>
        {sampled.map(({ one, samples, solid }, index) => {
          const look = seriesLook(index);
          const valid = within(one, temperatureK);
          return (
            <g key={one.id} className="kie-line" opacity={active !== null && active !== one.id ? 0.25 : 1}>
              <path d={path(samples) ?? ''} fill="none" stroke={look.colour} strokeWidth="1.700" strokeDasharray="5 4" />
              {solid.length > 0 && <path d={path(solid) ?? ''} fill="none" stroke="var(--color-paper)" strokeWidth="4" />}
              {solid.length > 0 && <path d={path(solid) ?? ''} fill="none" stroke={look.colour} strokeWidth="2.200" />}
              {inside(one.kie(temperatureK)) && <SeriesMark index={index} x={atX} y={y(one.kie(temperatureK))} open={!valid} colour={valid ? look.colour : 'var(--color-ochre)'} />}
            </g>
          );
        })}
        {points.map((point) => (
          <g key={point.id} className="kie-point">
            <title>{`${point.label}: ${set(point.kie)} at ${point.temperatureK} K`}</title>
            {point.u ? <path d={`M${x(point.temperatureK) - 3} ${y(point.kie - point.u)}h6M${x(point.temperatureK)} ${y(point.kie - point.u)}V${y(point.kie + point.u)}M${x(point.temperatureK) - 3} ${y(point.kie + point.u)}h6`} stroke="var(--color-ink)" strokeWidth="1.200" fill="none" /> : null}
            <circle cx={x(point.temperatureK)} cy={y(point.kie)} r="4" fill={point.computed ? 'var(--color-paper)' : 'var(--color-ink)'} stroke="var(--color-ink)" strokeWidth="1.500" />
          </g>
        ))}
      </svg>
      <PlotLegend
        onActive={lines.length > 1 ? setActive : undefined}
        items={[
          ...lines.map((one, index) => ({
            id: one.id, label: one.label,
            sample: <><path d="M0 6H26" stroke={seriesLook(index).colour} strokeWidth="2" /><SeriesMark index={index} x={13} y={6} open={false} colour={seriesLook(index).colour} /></>,
          })),
          ...(points.length > 0 ? [{ id: 'points', label: points.some((point) => point.computed) ? 'reported values; open is computed' : 'reported values', sample: <circle cx="13" cy="6" r="4" fill="var(--color-ink)" /> }] : []),
          ...(limit ? [{ id: 'limit', label: limitLabel, sample: <path d="M0 6H26" stroke="var(--color-rust)" strokeWidth="1.500" strokeDasharray="1.500 3" /> }] : []),
        ]}
      />
      {limitNote && <p className="plot-note">{limitNote}</p>}
      <PlotTable
        columns={[{ label: 'Line or value' }, { label: 'T', unit: 'K', numeric: true }, { label: 'k light / k heavy', numeric: true }, ...(limit ? [{ label: limitLabel, numeric: true }] : [])]}
        rows={[
          ...lines.flatMap((one) => [...new Set([...(one.range ? [one.range.min, one.range.max] : []), temperatureK])].sort((a, b) => a - b).map((t) => ({
            id: `${one.id} ${t}`,
            cells: [one.label, `${temperatureText(t)}${within(one, t) ? '' : ', extrapolated'}`, set(one.kie(t)), ...(limit ? [set(limit(t))] : [])],
          }))),
          ...points.map((point) => ({
            id: point.id,
            cells: [point.label, temperatureText(point.temperatureK), point.u ? `${set(point.kie)} ± ${set(point.u)}` : set(point.kie), ...(limit ? [set(limit(point.temperatureK))] : [])],
          })),
        ]}
      />
    </figure>
  );
}

function within({ range }: KieLine, temperatureK: number): boolean {
  return range != null && temperatureK >= range.min && temperatureK <= range.max;
}

/** An isotope effect with so many decimals as it can have a meaning: heavy-atom effects live in the third. */
function set(kie: number | undefined): string {
  if (kie === undefined || !Number.isFinite(kie)) return 'not finite';
  return kie >= 1e4 ? plainNumber(setNumber(kie, { digits: 3 })) : fixed(kie, Math.abs(kie - 1) < 0.2 ? 4 : 2);
}
