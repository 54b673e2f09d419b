import { eyringCalculator } from '#shared/calculators/eyring.ts';
import { R } from '#shared/kinetics/constants.ts';
import { sheet } from '../sheet.ts';
import { activationEnergy, temperature } from './common-fields.ts';

const forward = { direction: ['to-arrhenius'] };
const back = { direction: ['to-eyring'] };

export const eyringSheet = sheet({
  calculator: eyringCalculator,
  fields: [
    {
      kind: 'choice', key: 'direction', label: 'Direction', usual: 'to-arrhenius', look: 'segments',
      choices: [{ value: 'to-arrhenius', label: 'ΔH‡, ΔS‡ to k, A, E' }, { value: 'to-eyring', label: 'A, E to ΔH‡, ΔS‡' }],
    },
    { kind: 'number', key: 'enthalpyKJPerMol', label: 'Enthalpy of activation', symbol: 'ΔH‡', energy: true, only: forward },
    { kind: 'number', key: 'entropyJPerMolK', label: 'Entropy of activation', symbol: 'ΔS‡', unit: 'J mol-1 K-1', only: forward },
    { kind: 'number', key: 'preExponential', label: 'Pre-exponential factor', symbol: 'A', only: back },
    { ...activationEnergy, only: back },
    temperature,
    { kind: 'number', key: 'transmission', label: 'Transmission coefficient', symbol: 'κ', optional: true, usual: '1' },
    {
      kind: 'choice', key: 'phase', label: 'Where', usual: 'surface', look: 'segments',
      choices: [{ value: 'surface', label: 'on the surface' }, { value: 'gas', label: 'in the gas' }, { value: 'gas-surface', label: 'gas onto surface' }],
    },
    {
      kind: 'choice', key: 'molecularity', label: 'Molecularity', usual: '1', look: 'segments', toInput: Number,
      choices: [{ value: '1', label: '1' }, { value: '2', label: '2' }],
    },
    {
      kind: 'choice', key: 'standardState', label: 'Standard state of the gas', usual: '1 bar', look: 'segments', only: { phase: ['gas', 'gas-surface'] },
      choices: [{ value: '1 bar', label: '1 bar' }, { value: '1 mol/L', label: '1 mol/L' }],
    },
  ],
  example: { values: { enthalpy: '100', entropyJPerMolK: '-10', temperatureK: '500' } },
  empty: 'Give enthalpy, entropy and temperature, or A, E and temperature.',
  outcome: ({ result, input }) => {
    const gibbs = { label: 'Gibbs energy of activation', symbol: 'ΔG‡', value: result.gibbsKJPerMol, energy: true as const, digits: 5 };
    if (input.direction === 'to-eyring') {
      return {
        main: [
          { label: 'Enthalpy of activation', symbol: 'ΔH‡', value: result.enthalpyKJPerMol, energy: true, digits: 5 },
          { label: 'Entropy of activation', symbol: 'ΔS‡', value: result.entropyJPerMolK, unit: 'J mol-1 K-1', digits: 4 },
        ],
        facts: [gibbs],
      };
    }
    const { unit } = result;
    return {
      main: [
        { label: `Rate constant at ${input.temperatureK} K`, symbol: 'k', value: result.k ?? null, ln: result.k == null ? lnK(result, input.temperatureK) : null, unit },
        { label: 'Activation energy', symbol: 'E', value: result.energyKJPerMol, energy: true, digits: 5 },
        { label: 'Pre-exponential factor', symbol: 'A', value: result.preExponential, unit },
      ],
      facts: [gibbs, { label: 'Hold', text: `as tangents at ${input.temperatureK} K` }],
    };
  },
  onward: ({ result, input }) => (input.direction === 'to-eyring' || result.preExponential === undefined ? [] : [{
    to: 'arrhenius', label: 'Evaluate k at another temperature',
    values: { preExponential: String(result.preExponential), energy: String(result.energyKJPerMol), rateUnit: result.unit ?? '', temperatureK: String(input.temperatureK) },
  }]),
});

/** ln k from A and E, where k itself leaves double precision. */
function lnK({ preExponential, energyKJPerMol }: { preExponential?: number; energyKJPerMol?: number }, temperatureK: number): number | null {
  return preExponential === undefined || energyKJPerMol === undefined ? null : Math.log(preExponential) - (energyKJPerMol * 1000) / (R * temperatureK);
}
