import { normalCoverageFactor } from '#shared/kinetics/normal.ts';
import { studentCoverageFactor } from '#shared/kinetics/student-t.ts';
import { csvText } from '#client/lib/csv-text.ts';
import { FitPlot } from '#client/ui/fit-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import type { PictureProps } from '../sheet.ts';

interface Input {
  points: readonly { temperatureK: number; k: number; u?: number }[];
  covariance: 'scaled' | 'absolute';
}

interface Result {
  lnPreExponential: number;
  energyKJPerMol: number;
  uLnPreExponential: number | null;
  uEnergyKJPerMol: number | null;
  correlation: number;
  degreesOfFreedom: number;
  residuals: readonly number[];
  leverage: readonly number[];
}

/** The points with the fitted line, its 95 % band and the residuals. */
export default function FitPicture({ input, result, own }: PictureProps<Result, Input>) {
  const { lnPreExponential, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol, correlation, degreesOfFreedom, residuals, leverage } = result;
  const coverageFactor = input.covariance === 'absolute' ? normalCoverageFactor(0.95) : degreesOfFreedom > 0 ? studentCoverageFactor(0.95, degreesOfFreedom) : 1;
  const unit = own.rateUnit ?? '';
  const rows = input.points.map((point, index) => [point.temperatureK, point.k, point.u, Math.log(point.k), residuals[index], leverage[index]]);
  return (
    <PlotFrame
      title="Fit of k against T"
      csv={() => csvText(['temperature_K', 'k', 'u_k', 'ln_k', 'residual_ln_k', 'leverage'], rows)}
    >
      <FitPlot
        points={input.points.map((point) => ({ temperatureK: point.temperatureK, lnK: Math.log(point.k), uLnK: point.u === undefined ? null : point.u / point.k }))}
        line={{ lnPreExponential, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol, correlation, coverageFactor, bandLabel: '95 % confidence of the line' }}
        unit={unit}
      />
    </PlotFrame>
  );
}
