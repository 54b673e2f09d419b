import { csvText } from '#client/lib/csv-text.ts';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { PlotTable } from '#client/ui/plot-table.tsx';
import { fixed, plainNumber, setNumber } from '#client/lib/numbers.ts';
import { useWidth } from '#client/lib/use-width.ts';
import { linearScale } from '#client/ui/linear-scale.ts';
import { PlotAxes } from '#client/ui/plot-axes.tsx';
import type { PictureProps } from '../sheet.ts';

interface Point {
  heatingRateKPerS: number;
  peakTemperatureK: number;
}

type Input = { method: 'peak' } | { method: 'heating-rates'; points: readonly Point[] };

const pad = { left: 50, right: 16, top: 26, bottom: 40 };
const height = 280;

/** ln(T²/β) against 1000 K/T of the peaks, with the line through them: its slope is the energy. */
export default function DesorptionPicture({ input, result }: PictureProps<{ residuals?: readonly number[] }, Input>) {
  if (input.method !== 'heating-rates') return null;
  const drawn = input.points.map((point, index) => {
    const y = Math.log(point.peakTemperatureK ** 2 / point.heatingRateKPerS);
    return { ...point, x: 1000 / point.peakTemperatureK, y, fitted: y - (result.residuals?.[index] ?? 0) };
  });
  return (
    <PlotFrame
      title="Shift of the peak with the heating rate"
      csv={() => csvText(['heating_rate_K_per_s', 'peak_temperature_K', 'thousand_K_over_T', 'ln_T2_over_beta', 'line'], drawn.map(({ heatingRateKPerS, peakTemperatureK, x, y, fitted }) => [heatingRateKPerS, peakTemperatureK, x, y, fitted]))}
    >
      <ShiftPlot drawn={drawn} />
    </PlotFrame>
  );
}

function ShiftPlot({ drawn }: { drawn: readonly (Point & { x: number; y: number; fitted: number })[] }) {
  const [frame, width] = useWidth<HTMLElement>(440);
  const along = drawn.map((point) => point.x);
  const ends = [Math.min(...along), Math.max(...along)] as const;
  const margin = Math.max(0.01, (ends[1] - ends[0]) * 0.08);
  const heights = drawn.flatMap((point) => [point.y, point.fitted]);
  const x = linearScale({ domain: [ends[0] - margin, ends[1] + margin], range: [pad.left, width - pad.right] });
  const y = linearScale({ domain: [Math.min(...heights), Math.max(...heights)], range: [height - pad.bottom, pad.top], nice: 6 });
  const byX = [...drawn].sort((one, other) => one.x - other.x);
  const [first, last] = [byX[0], byX.at(-1)];
  return (
    <figure ref={frame} className="m-0">
      <svg className="plot" width={width} height={height} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={`ln of T squared over the heating rate, for ${drawn.length} peaks over 1000 K/T, with the fitted line; the values are in the table below.`}>
        <PlotAxes x={x} y={y} left={pad.left} right={width - pad.right} top={pad.top} bottom={height - pad.bottom} xTicks={Math.max(3, Math.min(6, Math.round(width / 100)))} xLabel="1000 K / T of the peak" yLabel="ln(T² / β)" />
        {first && last && <path d={`M${x(first.x)} ${y(first.fitted)}L${x(last.x)} ${y(last.fitted)}`} stroke="var(--color-lichen)" strokeWidth="2.200" fill="none" />}
        {drawn.map((point, index) => <circle key={index} cx={x(point.x)} cy={y(point.y)} r="4" fill="var(--color-ink)" stroke="var(--color-paper)" />)}
      </svg>
      <PlotTable
        columns={[{ label: 'Peak' }, { label: 'β', unit: 'K s-1', numeric: true }, { label: 'T', unit: 'K', numeric: true }, { label: 'ln(T²/β)', numeric: true }, { label: 'line', numeric: true }]}
        rows={drawn.map((point, index) => ({
          id: String(index),
          cells: [String(index + 1), plainNumber(setNumber(point.heatingRateKPerS, { digits: 4 })), plainNumber(setNumber(point.peakTemperatureK, { digits: 5 })), fixed(point.y, 4), fixed(point.fitted, 4)],
        }))}
      />
    </figure>
  );
}
