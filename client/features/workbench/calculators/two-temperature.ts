import { lazy } from 'react';
import { twoTemperatureCalculator } from '#shared/calculators/two-temperature.ts';
import { sheet } from '../sheet.ts';
import { rateUnit } from './common-fields.ts';

export const twoTemperatureSheet = sheet({
  calculator: twoTemperatureCalculator,
  fields: [
    { kind: 'number', key: 'temperature1K', label: 'First temperature', symbol: 'T_{1}', unit: 'K' },
    { kind: 'number', key: 'k1', label: 'Rate constant there', symbol: 'k_{1}', unitFrom: 'rateUnit' },
    { kind: 'number', key: 'temperature2K', label: 'Second temperature', symbol: 'T_{2}', unit: 'K' },
    { kind: 'number', key: 'k2', label: 'Rate constant there', symbol: 'k_{2}', unitFrom: 'rateUnit' },
    rateUnit,
  ],
  example: { values: { temperature1K: '400', k1: '0.87', temperature2K: '500', k2: '358' } },
  empty: 'Give two temperatures with their rate constants.',
  outcome: ({ result, input, own }) => ({
    main: [
      { label: 'Activation energy', symbol: 'E', value: result.energyKJPerMol, energy: true, digits: 4 },
      { label: 'Pre-exponential factor', symbol: 'A', value: result.preExponential, ln: result.lnPreExponential, unit: own.rateUnit, digits: 3 },
    ],
    facts: [
      { label: 'Natural logarithm', symbol: 'ln A', value: result.lnPreExponential, digits: 5 },
      { label: 'Holds between', text: `${Math.min(input.temperature1K, input.temperature2K)} and ${Math.max(input.temperature1K, input.temperature2K)} K` },
    ],
    warnings: ['Two points fix a line and say nothing about its errors: A and E have no uncertainty here.'],
  }),
  onward: ({ result, input, own }) => (result.preExponential === null ? [] : [{
    to: 'arrhenius', label: 'Evaluate k at a temperature',
    values: {
      preExponential: String(result.preExponential), energy: String(result.energyKJPerMol), rateUnit: own.rateUnit ?? '',
      validFromK: String(Math.min(input.temperature1K, input.temperature2K)), validToK: String(Math.max(input.temperature1K, input.temperature2K)),
    },
  }]),
  entry: ({ result, input, own }) => ({
    kind: 'activation-energy', provenance: 'derived-from-measured',
    quantities: [
      { symbol: 'energy', energyType: 'arrhenius', asPrinted: result.energyKJPerMol.toPrecision(5), unitAsPrinted: 'kJ/mol' },
      ...(result.preExponential === null ? [] : [{ symbol: 'preExponential' as const, asPrinted: result.preExponential.toExponential(3).replace('e+', 'e'), unitAsPrinted: own.rateUnit ?? '' }]),
    ],
    note: `A and E by two temperatures: k = ${input.k1} at ${input.temperature1K} K and ${input.k2} at ${input.temperature2K} K, ${own.rateUnit ?? ''}.`,
  }),
  picture: lazy(() => import('../pictures/two-temperature-picture.tsx')),
});
