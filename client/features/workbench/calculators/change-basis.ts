import { changeBasisCalculator } from '#shared/calculators/change-basis.ts';
import { sheet } from '../sheet.ts';
import { activationEnergy, exponent, referenceTemperature } from './common-fields.ts';

const bases = [{ value: 'concentration', label: 'concentrations' }, { value: 'pressure', label: 'pressures' }] as const;

export const changeBasisSheet = sheet({
  calculator: changeBasisCalculator,
  fields: [
    { kind: 'choice', key: 'from', label: 'Given for', choices: bases, usual: 'concentration', look: 'segments' },
    { kind: 'choice', key: 'to', label: 'Wanted for', choices: bases, usual: 'pressure', look: 'segments' },
    { kind: 'number', key: 'preExponential', label: 'Pre-exponential factor', symbol: 'A', hint: 'In SI units: m3, mol, Pa, s.' },
    { ...activationEnergy },
    { kind: 'number', key: 'gasOrder', label: 'Gas order', symbol: 'g', hint: 'Gas factors of the rate law as printed.' },
    { ...exponent },
    { ...referenceTemperature },
  ],
  example: { values: { preExponential: '1e7', energy: '20', gasOrder: '1' } },
  empty: 'Give A, E and the gas order of the rate law.',
  outcome: ({ result, input }) => ({
    main: [
      { label: 'Pre-exponential factor', symbol: input.to === 'pressure' ? 'A_{p}' : 'A_{c}', value: result.preExponential, digits: 6, note: 'in SI units' },
      { label: 'Temperature exponent', symbol: input.to === 'pressure' ? 'n_{p}' : 'n_{c}', text: String(result.exponent) },
    ],
    facts: [
      { label: 'Energy', symbol: 'E', value: result.energyKJPerMol, energy: true, digits: 5, note: 'unchanged' },
      { label: 'Reference temperature', symbol: 'T_{0}', value: result.referenceTemperatureK, unit: 'K' },
    ],
    warnings: input.from === input.to ? ['Both bases are the same: nothing changes.'] : [],
  }),
  onward: ({ result }) => [{
    to: 'arrhenius', label: 'Evaluate k at a temperature',
    values: { preExponential: String(result.preExponential), exponent: String(result.exponent), referenceTemperatureK: String(result.referenceTemperatureK), energy: String(result.energyKJPerMol) },
  }],
});
