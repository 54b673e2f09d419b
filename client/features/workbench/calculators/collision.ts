import { collisionCalculator } from '#shared/calculators/collision.ts';
import type { Figure } from '../figures.ts';
import { sheet } from '../sheet.ts';
import { temperature } from './common-fields.ts';

const way = (...values: string[]) => ({ way: values });

/** The figure, where the calculator gave one. */
function some(value: number | undefined, figure: Figure): Figure[] {
  return value === undefined ? [] : [{ ...figure, value }];
}

export const collisionSheet = sheet({
  calculator: collisionCalculator,
  fields: [
    { kind: 'number', key: 'molarMassGPerMol', label: 'Molar mass', symbol: 'M', unit: 'g/mol' },
    { ...temperature, label: 'Gas temperature' },
    { kind: 'number', key: 'pressurePa', label: 'Pressure', symbol: 'p', unit: 'Pa', optional: true, hint: 'For the flux. 1 mbar is 100 Pa, 1 Torr 133.322 Pa.' },
    { kind: 'number', key: 'siteDensityPerM2', label: 'Site density', symbol: 'Γ', unit: 'm-2', optional: true, hint: 'For figures per site.' },
    {
      kind: 'choice', key: 'way', label: 'Sticking given as', usual: 'none', own: true, look: 'segments',
      choices: [{ value: 'none', label: 'not given' }, { value: 'initial', label: 'coefficient' }, { value: 'activated', label: 'A and E' }, { value: 'rate', label: 'rate constant' }],
    },
    { kind: 'number', key: 'sticking', label: 'Initial sticking coefficient', symbol: 's_{0}', only: way('initial'), hint: 'From 0 to 1, per molecule at zero coverage.' },
    { kind: 'number', key: 'stickingFactor', label: 'Sticking factor', symbol: 'A_{s}', only: way('activated') },
    { kind: 'number', key: 'stickingEnergyKJPerMol', label: 'Energy of sticking', symbol: 'E_{s}', energy: true, only: way('activated') },
    { kind: 'number', key: 'kAdsPerPaS', label: 'Rate constant of adsorption', symbol: 'k', unit: 'Pa-1 s-1', only: way('rate') },
    { kind: 'number', key: 'exposureLangmuir', label: 'Exposure', symbol: 'L', unit: 'langmuir', optional: true, hint: '1 L is 1e-6 Torr s.' },
  ],
  example: { values: { molarMassGPerMol: '28', temperatureK: '300', pressurePa: '1e-4', siteDensityPerM2: '1e19', way: 'initial', sticking: '0.5' } },
  empty: 'Give molar mass and temperature; with a pressure the flux, with a site density and sticking the rate constant of adsorption.',
  outcome: ({ result }) => {
    const adsorption = some(result.kAdsPerPaS, { label: 'Rate constant of adsorption', symbol: 'k_{ads}', unit: 'Pa-1 s-1' });
    const flux = some(result.fluxPerM2S, { label: 'Flux', symbol: 'Z', unit: 'm-2 s-1' });
    const sticking = some(result.sticking, { label: 'Sticking coefficient', symbol: 's' });
    const speed = some(result.meanSpeedMPerS, { label: 'Mean speed', unit: 'm s-1' });
    const ranked = [...adsorption, ...flux, ...speed];
    return {
      main: ranked.slice(0, adsorption.length + flux.length || 1),
      facts: [
        ...sticking,
        ...some(result.preExponentialPerPaS, { label: 'Pre-exponential factor', symbol: 'A', unit: 'Pa-1 s-1' }),
        ...some(result.energyPressureKJPerMol, { label: 'Activation energy on pressure', symbol: 'E(k_{p})', energy: true }),
        ...some(result.energyConcentrationKJPerMol, { label: 'Activation energy on concentration', symbol: 'E(k_{c})', energy: true }),
        ...some(result.kAdsPerBarS, { label: 'The same per bar', unit: 'bar-1 s-1' }),
        ...some(result.kAdsPerTorrS, { label: 'The same per Torr', unit: 'Torr-1 s-1' }),
        ...some(result.kAdsM3PerMolS, { label: 'The same on concentration', unit: 'm3 mol-1 s-1' }),
        ...some(result.kAdsMPerS, { label: 'The same per area', unit: 'm s-1' }),
        ...some(result.collisionLimitPerPaS, { label: 'Collision limit', unit: 'Pa-1 s-1', note: 'where every collision sticks' }),
        ...some(result.collisionsPerSiteS, { label: 'Collisions per site', unit: 's-1' }),
        ...some(result.monolayerTimeS, { label: 'Time of a monolayer', unit: 's', note: 'at constant sticking' }),
        ...some(result.numberDensityPerM3, { label: 'Number density', unit: 'm-3' }),
        ...(ranked[0] === speed[0] ? [] : speed),
        ...some(result.exposurePaS, { label: 'Exposure', unit: 'Pa s' }),
        ...some(result.exposureTimeS, { label: 'Time of the exposure', unit: 's', note: 'at this pressure' }),
      ],
      warnings: result.warnings ?? [],
    };
  },
  entry: ({ input, typed }) => (input.sticking === undefined ? null : {
    kind: 'sticking', note: '', quantities: [{ symbol: 'stickingCoefficient', asPrinted: typed('sticking').trim(), unitAsPrinted: '' }],
  }),
});
