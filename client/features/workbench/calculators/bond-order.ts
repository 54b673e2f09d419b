import { bondOrderCalculator } from '#shared/calculators/bond-order.ts';
import { sheet } from '../sheet.ts';
import { energyUnitChoices } from './energy.ts';

const exchange = { process: ['exchange'] };

export const bondOrderSheet = sheet({
  calculator: bondOrderCalculator,
  fields: [
    {
      kind: 'choice', key: 'process', label: 'Process', usual: 'dissociation', look: 'segments',
      choices: [{ value: 'dissociation', label: 'dissociation, AB to A + B' }, { value: 'exchange', label: 'exchange, AB + C to A + BC' }],
    },
    {
      kind: 'choice', key: 'from', label: 'AB starts', usual: 'adsorbed', look: 'segments',
      choices: [{ value: 'adsorbed', label: 'adsorbed' }, { value: 'gas', label: 'in the gas' }],
    },
    {
      kind: 'choice', key: 'form', label: 'Form', usual: 'interpolated', look: 'segments',
      choices: [{ value: 'early', label: 'early' }, { value: 'interpolated', label: 'interpolated' }],
    },
    { kind: 'choice', key: 'unit', param: 'in', label: 'Unit of all energies', choices: energyUnitChoices, usual: 'kcal/mol', look: 'select' },
    { kind: 'number', key: 'dissociationEnergy', label: 'Energy of the bond A–B', symbol: 'D_{AB}', unitFrom: 'in', hint: 'Of the bond that breaks, not of the whole molecule.' },
    { kind: 'number', key: 'formedBondEnergy', label: 'Energy of the bond B–C', symbol: 'D_{BC}', unitFrom: 'in', only: exchange },
    { kind: 'number', key: 'heatA', label: 'Heat of adsorption of A', symbol: 'Q_{A}', unitFrom: 'in' },
    { kind: 'number', key: 'heatB', label: 'Heat of adsorption of B', symbol: 'Q_{B}', unitFrom: 'in', only: { process: ['dissociation'] } },
    { kind: 'number', key: 'heatBC', label: 'Heat of adsorption of BC', symbol: 'Q_{BC}', unitFrom: 'in', only: exchange },
    { kind: 'number', key: 'heatC', label: 'Heat of adsorption of C', symbol: 'Q_{C}', unitFrom: 'in', only: exchange },
    { kind: 'number', key: 'heatAB', label: 'Heat of adsorption of AB', symbol: 'Q_{AB}', unitFrom: 'in', only: { from: ['adsorbed'] } },
    { kind: 'number', key: 'heatAB', label: 'Heat of adsorption of AB', symbol: 'Q_{AB}', unitFrom: 'in', only: { from: ['gas'], form: ['interpolated'] } },
    { kind: 'number', key: 'heatAB', label: 'Heat of adsorption of AB', symbol: 'Q_{AB}', unitFrom: 'in', only: { from: ['gas'], form: ['early'], process: ['exchange'] }, optional: true },
    { kind: 'number', key: 'interpolation', label: 'Interpolation', symbol: 'φ', optional: true, usual: '0.5', only: { form: ['interpolated'] } },
  ],
  example: { values: { dissociationEnergy: '100', heatA: '70', heatB: '60', heatAB: '20' } },
  empty: 'Give the energy of the bond that breaks and the heats of adsorption.',
  outcome: ({ result }) => ({
    main: [{ label: 'Estimated barrier', symbol: 'E', value: result.barrier, unit: result.unit }],
    facts: [
      { label: 'Barrier of the reverse', value: result.reverseBarrier, unit: result.unit },
      { label: 'Reaction energy', symbol: 'ΔH', value: result.reactionEnergy, unit: result.unit },
      ...(result.bound === 'none' ? [] : [{ label: 'Before the bound', value: result.unboundedBarrier, unit: result.unit }]),
    ],
    warnings: [
      'An estimate from a model: it is shown beside literature values and never stored as one.',
      ...(result.bound === 'zero' ? ['The formula gave less than nothing: the barrier is set to 0.'] : []),
      ...(result.bound === 'reaction-energy' ? ['The formula gave less than the reaction energy: the barrier is set to it.'] : []),
    ],
  }),
});
