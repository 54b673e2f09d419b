import { tunnellingCalculator } from '#shared/calculators/tunnelling.ts';
import { sheet } from '../sheet.ts';
import { temperature } from './common-fields.ts';

export const tunnellingSheet = sheet({
  calculator: tunnellingCalculator,
  fields: [
    {
      kind: 'choice', key: 'model', label: 'Model', usual: 'wigner', look: 'segments',
      choices: [{ value: 'wigner', label: 'Wigner' }, { value: 'bell-1935', label: 'Bell 1935' }, { value: 'bell-1959', label: 'Bell 1959' }],
    },
    { kind: 'number', key: 'imaginaryPerCm', label: 'Imaginary wavenumber', symbol: 'ν^{‡}', unit: 'cm-1', hint: 'Its size, without the i.' },
    temperature,
    { kind: 'number', key: 'energyKJPerMol', label: 'Barrier', symbol: 'E', energy: true, only: { model: ['bell-1935', 'bell-1959'] } },
  ],
  example: { values: { imaginaryPerCm: '1000', temperatureK: '500' } },
  empty: 'Give the imaginary wavenumber and T; Bell’s models ask for the barrier too.',
  outcome: ({ result, input }) => ({
    main: [{ label: `Tunnelling factor at ${input.temperatureK} K`, symbol: 'κ', value: result.kappa }],
    facts: [
      { label: 'Reduced imaginary frequency', symbol: 'u', value: result.u },
      { label: 'Crossover temperature', value: result.crossoverTemperatureK, unit: 'K', note: 'where u is 2π' },
      ...(result.alpha === undefined ? [] : [{ label: 'Reduced barrier', symbol: 'α', value: result.alpha }]),
      ...(result.beta === undefined ? [] : [{ label: 'Barrier over the quantum', symbol: 'β', value: result.beta }]),
    ],
    warnings: result.warnings,
  }),
});
