import { lazy } from 'react';
import { arrheniusCalculator } from '#shared/calculators/arrhenius.ts';
import { sheet } from '../sheet.ts';
import { activationEnergy, exponent, preExponential, rateUnit, referenceTemperature, temperature } from './common-fields.ts';
import { validRange } from './valid-range.ts';

export const arrheniusSheet = sheet({
  calculator: arrheniusCalculator,
  fields: [
    preExponential, rateUnit, activationEnergy, temperature, exponent, referenceTemperature,
    { kind: 'number', key: 'uLnPreExponential', label: 'Standard uncertainty', symbol: 'u(ln A)', optional: true },
    { kind: 'number', key: 'uEnergyKJPerMol', label: 'Standard uncertainty', symbol: 'u(E)', energy: true, optional: true },
    { kind: 'number', key: 'correlation', label: 'Correlation of ln A and E', symbol: 'r', optional: true, hint: 'Near 1 in a fit; never taken as 0.' },
    { kind: 'number', key: 'validFromK', label: 'Valid from', unit: 'K', optional: true, own: true },
    { kind: 'number', key: 'validToK', label: 'Valid to', unit: 'K', optional: true, own: true },
  ],
  example: { values: { preExponential: '1e13', energy: '100', temperatureK: '500', uLnPreExponential: '0.5', uEnergy: '2', correlation: '0.98', validFromK: '400', validToK: '600' } },
  empty: 'Give A, E and T.',
  outcome: ({ result, input, own }) => {
    const { from, to } = validRange(own);
    const outside = (from !== null && input.temperatureK < from) || (to !== null && input.temperatureK > to);
    const range = result.uLnKRange;
    return {
      extrapolated: outside,
      main: [{ label: `Rate constant at ${input.temperatureK} K`, symbol: 'k', value: result.k, ln: result.lnK, u: result.uLnK, uScale: 'ln', unit: own.rateUnit }],
      facts: [
        { label: 'Natural logarithm', symbol: 'ln k', value: result.lnK, u: result.uLnK, digits: 6 },
        ...(range ? [{ label: 'Uncertainty of ln k', symbol: 'u(ln k)', low: range[0], high: range[1], bound: 'range' as const, value: null, digits: 3, note: 'from full correlation to full anticorrelation' }] : []),
        { label: 'Local activation energy', symbol: 'E + nRT', value: result.localEnergyKJPerMol, energy: true, digits: 5 },
      ],
      warnings: [
        ...(outside ? [`${input.temperatureK} K lies outside the valid range, ${from ?? 'no lower end'} to ${to ?? 'no upper end'} K: the figure is an extrapolation.`] : []),
        ...(range ? ['The correlation of ln A and E is not given: there is no single uncertainty of k, only its two ends.'] : []),
      ],
    };
  },
  onward: ({ input }) => [{
    to: 'eyring', label: 'Find enthalpy and entropy of activation',
    values: { direction: 'to-eyring', preExponential: String(input.preExponential), energy: String(input.energyKJPerMol), temperatureK: String(input.temperatureK) },
  }],
  picture: lazy(() => import('../pictures/arrhenius-picture.tsx')),
});
