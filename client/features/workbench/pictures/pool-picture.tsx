import { IntervalPlot } from '#client/ui/interval-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import type { PictureProps } from '../sheet.ts';

type Interval = [number, number] | null;

interface Result {
  mean: number;
  interval: Interval;
  predictionInterval: Interval;
  members: readonly { indices: readonly number[]; group: string | null; value: number; u: number; weightPercent: number }[];
  leaveOneOut: readonly { indices: readonly number[]; group: string | null; mean: number; standardError: number; interval: Interval }[];
}

/** The values with their shares and the pooled value; beneath, the pooled value with each left out in turn. */
export default function PoolPicture({ result, own, rowsOf }: PictureProps<Result>) {
  const unit = own.unit ?? '';
  const rows = rowsOf('values');
  const name = ({ indices, group }: { indices: readonly number[]; group: string | null }) => group ?? `row ${indices.map((index) => (rows[index] ?? index) + 1).join(', ')}`;
  const pooled = { mean: result.mean, interval: result.interval, predictionInterval: result.predictionInterval };
  return (
    <>
      <PlotFrame title="Values and the pooled value" caption="The size of a mark is its share in the pooled value.">
        <IntervalPlot
          unit={unit} rowName="Source" pooled={pooled}
          rows={result.members.map((member, index) => ({ id: String(index), label: name(member), value: member.value, u: member.u, weight: member.weightPercent / 100 }))}
        />
      </PlotFrame>
      {result.leaveOneOut.length > 1 && (
        <PlotFrame title="With each left out in turn">
          <IntervalPlot
            unit={unit} rowName="Left out" intervalLabel="95 % interval" reference={{ value: result.mean, label: 'all together' }}
            rows={result.leaveOneOut.map((one, index) => ({ id: String(index), label: `without ${name(one)}`, value: one.mean, u: one.standardError, low: one.interval?.[0], high: one.interval?.[1] }))}
          />
        </PlotFrame>
      )}
    </>
  );
}
