import { useState } from 'react';
import { rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import type { Entry, EntryDetail } from '#shared/contracts/entries.ts';
import { lnRateAt, uLnRateAt } from '#shared/kinetics/arrhenius.ts';
import { R } from '#shared/kinetics/constants.ts';
import { ArrheniusPlot, type ArrheniusLine } from '#client/ui/arrhenius-plot.tsx';
import { setNumber } from '#client/lib/numbers.ts';
import { Checkbox } from '#client/ui/choice.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { NumberText } from '#client/ui/value.tsx';

/** k against temperature where the entry holds A and E; why not where it does not. */
export function RatePlot({ entry, temperatureK }: { entry: EntryDetail; temperatureK: number }) {
  const [withOthers, setWithOthers] = useState(false);
  const { kAtT } = entry;
  const line = lineOf(entry);
  const others = linesOfOthers(entry);
  const unlike = entry.sameStepAndSurface.filter(({ alike, rate }) => alike && rate !== null).length - others.length;
  return (
    <section>
      <h2 className="pb-2">Rate against temperature</h2>
      {line && kAtT && <ArrheniusPlot lines={withOthers ? [line, ...others] : [line]} temperatureK={temperatureK} unit={kAtT.unit} />}
      {line && kAtT && others.length > 0 && (
        <Checkbox
          className="no-print" checked={withOthers} onChange={(event) => setWithOthers(event.target.checked)}
          label={others.length === 1 ? 'Draw the other entry for this step and surface' : `Draw ${others.length} other entries for this step and surface`}
          {...(unlike > 0 ? { hint: `${unlike === 1 ? 'One more has' : `${unlike} more have`} k in another unit.` } : {})}
        />
      )}
      {kAtT ? (
        <p className="pt-1">
          k at {kAtT.temperatureK} K: <b className="font-semibold"><NumberText number={setNumber(kAtT.value, { scientific: true, digits: 3 })} /></b>{' '}
          <UnitText unit={kAtT.unit} />
          {spread(kAtT)}
          {kAtT.extrapolated && <>{' '}<Tag kind="doubt">extrapolated</Tag></>}
        </p>
      ) : <p className="text-second">{whyNot(entry)}</p>}
      {kAtT?.extrapolated && (
        <p className="text-fine text-ochre">{entry.validRange ? `${kAtT.temperatureK} K lies outside the valid range.` : 'The source states no valid range, so that any temperature is an extrapolation.'}</p>
      )}
    </section>
  );
}

/** The uncertainty of k as a factor; an interval of factors where the correlation of A and E is not known. */
function spread({ uLnK, uLnKRange }: NonNullable<Entry['kAtT']>): string {
  const factor = (u: number) => setNumber(Math.exp(u), { digits: 2 }).text;
  if (uLnK !== null) return `, ×/÷ ${factor(uLnK)}`;
  return uLnKRange ? `, ×/÷ ${factor(uLnKRange[0])} to ${factor(uLnKRange[1])}, as the correlation of A and E is not reported` : '';
}

function whyNot({ quantities }: Entry): string {
  const energy = quantities.find(({ symbol }) => symbol === 'energy');
  const factor = quantities.find(({ symbol }) => symbol === 'preExponential');
  if (!energy && !factor) return 'This entry holds neither an activation energy nor a pre-exponential factor, so that no rate constant follows from it.';
  if (!factor) return 'No pre-exponential factor is reported, so that the rate constant cannot be evaluated.';
  if (!energy) return 'No activation energy is reported, so that the rate constant cannot be evaluated.';
  if (factor.value === null) return 'The pre-exponential factor could not be converted, so that the rate constant cannot be evaluated.';
  return 'The rate constant cannot be evaluated: a bound or a range is printed for the activation energy or the pre-exponential factor.';
}

/** Most lines beside the entry's own: more could not be told apart. */
const mostOthers = 11;

/** The lines of entries of the same kind whose k has the same unit. */
function linesOfOthers({ sameStepAndSurface, kAtT }: EntryDetail): ArrheniusLine[] {
  return sameStepAndSurface.flatMap(({ accession, label, alike, rate, energyKJPerMol, validRange }) => {
    if (!alike || rate === null || energyKJPerMol === null || rate.unit !== kAtT?.unit) return [];
    const lnT0 = Math.log(rate.referenceTemperatureK);
    const energyOverR = (energyKJPerMol * 1000) / R;
    return [{
      id: accession, label, lnK: (temperatureK: number) => lnRateAt(rate.lnPreExponential, rate.exponent, lnT0, energyOverR, temperatureK),
      range: validRange && validRange.min !== null && validRange.max !== null ? { min: validRange.min, max: validRange.max } : null,
    }];
  }).slice(0, mostOthers);
}

function lineOf(entry: Entry): ArrheniusLine | null {
  const parameters = rateParameters(entry.quantities);
  if (!parameters || !entry.kAtT) return null;
  const { preExponential, exponent, referenceTemperatureK, energyKJPerMol, uLnPreExponential, uEnergyKJPerMol } = parameters;
  const energyOverR = (energyKJPerMol * 1000) / R;
  const lnK = (temperatureK: number) => lnRateAt(Math.log(preExponential), exponent, Math.log(referenceTemperatureK), energyOverR, temperatureK);
  // The server evaluates the pinned conversion; a line that misses its k would be drawn from other parameters.
  if (Math.abs(lnK(entry.kAtT.temperatureK) - Math.log(entry.kAtT.value)) > 1e-6) return null;
  const { correlation, validRange } = entry;
  const known = uLnPreExponential !== null && uEnergyKJPerMol !== null && correlation !== null;
  return {
    id: entry.accession,
    label: entry.source?.label ?? entry.accession,
    lnK,
    ...(known ? { uLnK: (temperatureK: number) => uLnRateAt(uLnPreExponential, (uEnergyKJPerMol * 1000) / R, correlation, temperatureK) } : {}),
    range: validRange && validRange.min !== null && validRange.max !== null ? { min: validRange.min, max: validRange.max } : null,
  };
}
