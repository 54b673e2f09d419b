import { c, h, k_B, R } from '#shared/kinetics/constants.ts';
import { KiePlot, type KieLine } from '#client/ui/kie-plot.tsx';
import { PlotFrame } from '#client/ui/plot-frame.tsx';
import type { PictureProps } from '../sheet.ts';

type Input =
  | { method: 'arrhenius-pair'; preExponentialLight: number; energyLightKJPerMol: number; preExponentialHeavy: number; energyHeavyKJPerMol: number; temperatureK: number }
  | { method: 'two-temperatures'; kie1: number; temperature1K: number; kie2: number; temperature2K: number; temperatureK: number }
  | { method: 'zero-point'; wavenumberLightPerCm: number; wavenumberHeavyPerCm: number; temperatureK: number }
  | { method: 'bigeleisen-mayer' | 'tunnelling-ratio' | 'swain-schaad' | 'swain-schaad-from-dt' };

/** The temperatures a line is drawn over that has no range of its own: about the one asked for [K]. */
const around = (temperatureK: number) => ({ min: temperatureK * 0.7, max: temperatureK * 1.4 });

/** The isotope effect against T where the method gives one; null where it holds at one temperature only. */
function lineOf(input: Input): { line: KieLine; temperatureK: number } | null {
  if (input.method === 'arrhenius-pair') {
    const { preExponentialLight: aL, preExponentialHeavy: aH, energyLightKJPerMol: eL, energyHeavyKJPerMol: eH, temperatureK } = input;
    return { temperatureK, line: { id: 'typed', label: 'from the Arrhenius parameters', kie: (t) => (aL / aH) * Math.exp(((eH - eL) * 1000) / (R * t)), range: around(temperatureK) } };
  }
  if (input.method === 'two-temperatures') {
    const { kie1, temperature1K: t1, kie2, temperature2K: t2, temperatureK } = input;
    const slope = Math.log(kie1 / kie2) / (1 / t1 - 1 / t2);
    return {
      temperatureK,
      line: { id: 'typed', label: 'through both', kie: (t) => kie1 * Math.exp(slope * (1 / t - 1 / t1)), range: { min: Math.min(t1, t2), max: Math.max(t1, t2) } },
    };
  }
  if (input.method !== 'zero-point') return null;
  const { wavenumberLightPerCm, wavenumberHeavyPerCm, temperatureK } = input;
  const theta = (100 * h * c * (wavenumberLightPerCm - wavenumberHeavyPerCm)) / (2 * k_B);
  return { temperatureK, line: { id: 'typed', label: 'from zero-point energies', kie: (t) => Math.exp(theta / t), range: around(temperatureK) } };
}

/** The isotope effect against temperature. */
export default function KiePicture({ input }: PictureProps<unknown, Input>) {
  const drawn = lineOf(input);
  if (!drawn) return null;
  return (
    <PlotFrame title="Isotope effect against temperature" caption={input.method === 'arrhenius-pair' ? 'Drawn about the temperature asked for, whatever range the parameters were found in.' : undefined}>
      <KiePlot
        lines={[drawn.line]} temperatureK={drawn.temperatureK}
        points={input.method === 'two-temperatures' ? [{ id: '1', label: 'first', temperatureK: input.temperature1K, kie: input.kie1 }, { id: '2', label: 'second', temperatureK: input.temperature2K, kie: input.kie2 }] : []}
      />
    </PlotFrame>
  );
}
