import { FitPlot } from '#client/ui/fit-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import type { PictureProps } from '../sheet.ts';

interface Input {
  k1: number;
  temperature1K: number;
  k2: number;
  temperature2K: number;
}

/** The line through two rate constants. */
export default function TwoTemperaturePicture({ input, result, own }: PictureProps<{ lnPreExponential: number; energyKJPerMol: number }, Input>) {
  return (
    <PlotFrame title="The line through both">
      <FitPlot
        points={[{ temperatureK: input.temperature1K, lnK: Math.log(input.k1) }, { temperatureK: input.temperature2K, lnK: Math.log(input.k2) }]}
        line={{ lnPreExponential: result.lnPreExponential, energyKJPerMol: result.energyKJPerMol }} unit={own.rateUnit ?? ''}
      />
    </PlotFrame>
  );
}
