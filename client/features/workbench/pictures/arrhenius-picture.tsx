import { R } from '#shared/kinetics/constants.ts';
import { ArrheniusPlot } from '#client/ui/arrhenius-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import { validRange } from '../calculators/valid-range.ts';
import type { PictureProps } from '../sheet.ts';

interface Input {
  preExponential: number;
  exponent: number;
  referenceTemperatureK: number;
  energyKJPerMol: number;
  temperatureK: number;
  uLnPreExponential?: number;
  uEnergyKJPerMol?: number;
  correlation?: number;
}

/** ln k of the modified Arrhenius equation at any temperature, with its standard uncertainty where the correlation is known. */
function lineOf(input: Input) {
  const { preExponential, exponent, referenceTemperatureK, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol, correlation } = input;
  return {
    lnK: (t: number) => Math.log(preExponential) + exponent * Math.log(t / referenceTemperatureK) - (energyKJPerMol * 1000) / (R * t),
    uLnK: (t: number) => {
      if (uLnPreExponential === undefined || uEnergyKJPerMol === undefined || correlation === undefined) return null;
      const uE = (uEnergyKJPerMol * 1000) / (R * t);
      return Math.sqrt(Math.max(0, uLnPreExponential ** 2 + uE ** 2 - 2 * correlation * uLnPreExponential * uE));
    },
  };
}

/** k against T around the temperature asked for, solid where it is said to be valid. */
export default function ArrheniusPicture({ input, own }: PictureProps<unknown, Input>) {
  const { from, to } = validRange(own);
  const range = from !== null && to !== null && from < to ? { min: from, max: to } : null;
  return (
    <PlotFrame title="Rate constant against temperature" caption={range ? undefined : 'Dashed throughout: no valid range is given.'}>
      <ArrheniusPlot lines={[{ id: 'typed', label: 'as typed', ...lineOf(input), range }]} temperatureK={input.temperatureK} unit={own.rateUnit ?? ''} topAxis />
    </PlotFrame>
  );
}
