import { lazy } from 'react';
import { desorptionCalculator } from '#shared/calculators/desorption.ts';
import type { Figure } from '../figures.ts';
import { sheet } from '../sheet.ts';

const peak = { method: ['peak'] };
const series = { method: ['heating-rates'] };

export const desorptionSheet = sheet({
  calculator: desorptionCalculator,
  fields: [
    {
      kind: 'choice', key: 'method', label: 'From', usual: 'peak', look: 'segments',
      choices: [{ value: 'peak', label: 'one peak and a taken ν' }, { value: 'heating-rates', label: 'several heating rates' }],
    },
    {
      kind: 'choice', key: 'order', label: 'Order of desorption', usual: '1', look: 'segments', toInput: Number,
      choices: [{ value: '1', label: 'first' }, { value: '2', label: 'second' }],
    },
    { kind: 'number', key: 'peakTemperatureK', label: 'Peak temperature', symbol: 'T_{p}', unit: 'K', only: peak },
    { kind: 'number', key: 'heatingRateKPerS', label: 'Heating rate', symbol: 'β', unit: 'K s-1', only: peak },
    { kind: 'number', key: 'preExponential', label: 'Pre-exponential factor', symbol: 'ν', unit: 's-1', only: peak, hint: 'The energy is as good as this.' },
    {
      kind: 'table', key: 'points', label: 'Peaks', by: 'rows', least: 2, only: series,
      columns: [{ id: 'heatingRateKPerS', label: 'β', unit: 'K s-1' }, { id: 'peakTemperatureK', label: 'T of the peak', unit: 'K' }],
    },
    { kind: 'number', key: 'initialCoverage', label: 'Initial coverage', symbol: 'θ_{0}', only: { order: ['2'] }, hint: 'One per site is 1.' },
  ],
  example: { values: { peakTemperatureK: '400', heatingRateKPerS: '2', preExponential: '1e13' } },
  empty: 'Give peak temperature, heating rate and pre-exponential factor, or peaks at several heating rates.',
  outcome: ({ result, input }) => {
    const some = (value: number | null | undefined, figure: Figure): Figure[] => (value == null ? [] : [{ ...figure, value }]);
    const interval = (label: string, ends: [number, number] | null | undefined, more: Partial<Figure> = {}): Figure[] => (ends ? [{ label, value: null, low: ends[0], high: ends[1], bound: 'range', digits: 4, ...more }] : []);
    return {
      main: [
        { label: 'Energy of desorption', symbol: 'E', value: result.energyKJPerMol, u: result.uEnergyKJPerMol, energy: true, digits: 5 },
        ...(result.lnPreExponential == null ? [] : [{ label: 'Pre-exponential factor', symbol: 'ν', value: result.preExponential ?? null, ln: result.lnPreExponential, u: result.uLnPreExponential, uScale: 'ln' as const, unit: 's-1', digits: 3 }]),
      ],
      facts: [
        ...some(input.order === 2 ? result.energyIntegratedKJPerMol : undefined, { label: 'With the coverage of the integrated equation', energy: true, digits: 5 }),
        ...some(result.energyPerDecadeKJPerMol, { label: 'Change for a decade of ν', energy: true, digits: 3 }),
        ...some(result.reducedEnergy, { label: 'Reduced energy', symbol: 'E/RT_{p}' }),
        ...some(result.coverageLeftAtPeak, { label: 'Share left at the peak', digits: 3 }),
        ...some(result.lnPreExponential, { label: 'Natural logarithm', symbol: 'ln ν', u: result.uLnPreExponential, digits: 5 }),
        ...some(result.correlation, { label: 'Correlation of ln ν and E', symbol: 'r', digits: 5 }),
        ...interval('E, 95 % interval', result.ciEnergyKJPerMol, { energy: true }),
        ...interval('ln ν, 95 % interval', result.ciLnPreExponential),
        ...some(result.residualSd, { label: 'Scatter', symbol: 's', digits: 3 }),
        ...(result.n === undefined ? [] : [{ label: 'Points', text: `${result.n}, ${result.degreesOfFreedom ?? 0} degrees of freedom` }]),
      ],
      warnings: [
        ...(input.method === 'peak' ? ['The pre-exponential factor is taken, not found: the energy stands and falls with it.'] : []),
        ...(result.warnings ?? []).map((warning) => warning.message),
      ],
    };
  },
  entry: ({ result, input }) => {
    const u = result.uEnergyKJPerMol;
    return {
      kind: 'activation-energy', provenance: 'derived-from-measured',
      quantities: [
        { symbol: 'energy', energyType: 'arrhenius', asPrinted: u ? `${result.energyKJPerMol.toPrecision(6)} ± ${u.toPrecision(3)}` : result.energyKJPerMol.toPrecision(5), unitAsPrinted: 'kJ/mol', ...(u ? { uncertaintyKind: 'fit-standard-error' as const } : {}) },
        ...(result.lnPreExponential == null ? [] : [{ symbol: 'preExponential' as const, asPrinted: `ln A = ${result.lnPreExponential.toPrecision(7)}`, unitAsPrinted: 's-1' }]),
      ],
      note: input.method === 'peak'
        ? `Energy of desorption from a peak at ${input.peakTemperatureK} K, heating rate ${input.heatingRateKPerS} K/s, order ${input.order}, pre-exponential factor ${input.preExponential} s-1 taken.`
        : `Energy of desorption from the peaks at ${input.points.length} heating rates.`,
    };
  },
  picture: lazy(() => import('../pictures/desorption-picture.tsx')),
});
