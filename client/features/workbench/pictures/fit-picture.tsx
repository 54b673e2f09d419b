import { normalCoverageFactor } from '#shared/kinetics/normal.ts';
import { studentCoverageFactor } from '#shared/kinetics/student-t.ts';
import { csvText } from '#client/lib/csv-text.ts';
import { FitPlot } from '#client/ui/fit-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { rowsNamed } from '../read-typed.ts';
import type { PictureProps } from '../sheet.ts';
import { readTypedNumber } from '../typed-number.ts';

interface Input {
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

const numberIn = (text: string | undefined, unit = '') => {
  const read = readTypedNumber(text ?? '', unit);
  return 'value' in read && read.value > 0 ? read.value : null;
};

/** The points with the fitted line, its 95 % band and the residuals; a click on a point leaves it out or takes it in again. */
export default function FitPicture({ input, result, own, cells, typed, rowsOf, onType }: PictureProps<Result, Input>) {
  const { lnPreExponential, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol, correlation, degreesOfFreedom, residuals, leverage } = result;
  const coverageFactor = input.covariance === 'absolute' ? normalCoverageFactor(0.95) : degreesOfFreedom > 0 ? studentCoverageFactor(0.95, degreesOfFreedom) : 1;
  const unit = own.rateUnit ?? '';
  const leftOut = rowsNamed(typed('leftOut')).rows;
  const used = rowsOf('points');
  const points = cells('points').flatMap((texts, row) => {
    const temperatureK = numberIn(texts[0], 'K');
    const k = numberIn(texts[1], unit);
    if (temperatureK === null || k === null) return [];
    const u = numberIn(texts[2], unit);
    return [{ row, temperatureK, k, u, lnK: Math.log(k), uLnK: u === null ? null : u / k, excluded: leftOut.has(row) }];
  });

  function toggle(index: number) {
    const row = points[index]?.row;
    if (row === undefined) return;
    const next = new Set(leftOut);
    if (!next.delete(row)) next.add(row);
    onType('leftOut', [...next].sort((one, other) => one - other).map((one) => one + 1).join(', '));
  }

  return (
    <PlotFrame
      title="Fit of k against T"
      csv={() => csvText(
        ['row', 'temperature_K', 'k', 'u_k', 'ln_k', 'in_the_fit', 'residual_ln_k', 'leverage'],
        points.map(({ row, temperatureK, k, u, lnK, excluded }) => [row + 1, temperatureK, k, u, lnK, excluded ? 'no' : 'yes', residuals[used.indexOf(row)], leverage[used.indexOf(row)]]),
      )}
    >
      <FitPlot
        points={points} onToggle={toggle} unit={unit}
        line={{ lnPreExponential, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol, correlation, coverageFactor, bandLabel: '95 % confidence of the line' }}
      />
    </PlotFrame>
  );
}
