import { lazy } from 'react';
import { profileCalculator } from '#shared/calculators/profile.ts';
import { sheet } from '../sheet.ts';
import { temperature } from './common-fields.ts';

export const profileSheet = sheet({
  calculator: profileCalculator,
  fields: [
    {
      kind: 'table', key: 'steps', label: 'Elementary steps in their order', by: 'rows', least: 1, most: 200,
      columns: [
        { id: 'barrierKJPerMol', label: 'barrier', energy: true, optional: true, none: true },
        { id: 'reactionEnergyKJPerMol', label: 'reaction energy', energy: true },
        { id: 'u', label: 'u', energy: true, optional: true },
        { id: 'times', label: 'times', optional: true },
      ],
      hint: 'A step without a transition state has no barrier. u is the standard uncertainty of either energy of the step.',
    },
    {
      kind: 'choice', key: 'quantity', label: 'The energies are', usual: 'gibbs', look: 'segments',
      choices: [{ value: 'gibbs', label: 'Gibbs energies' }, { value: 'enthalpy', label: 'enthalpies' }, { value: 'electronic', label: 'electronic' }],
    },
    {
      kind: 'choice', key: 'cyclic', label: 'The steps', usual: 'no', look: 'segments', toInput: (value) => value === 'yes',
      choices: [{ value: 'no', label: 'lead from start to end' }, { value: 'yes', label: 'are a cycle' }],
    },
    { ...temperature, optional: true, only: { quantity: ['gibbs'], cyclic: ['yes'] }, hint: 'For the turnover of a cycle.' },
  ],
  example: { values: { cyclic: 'yes', temperatureK: '500' }, tables: { steps: [['', '-40', '3', '1'], ['60', '10', '5', '1'], ['90', '-20', '5', '1'], ['30', '-10', '5', '1']] } },
  empty: 'Give the steps of a pathway: the barrier and the reaction energy of each.',
  outcome: ({ result, input }) => {
    const u = result.uHighestKJPerMol;
    const highest = {
      label: 'Highest transition state above the start', value: result.highestKJPerMol, energy: true as const, digits: 5,
      ...(u ? { note: 'with independent errors', u: u.independent } : {}),
    };
    const span = result.spanKJPerMol === undefined ? [] : [{ label: 'Energetic span', symbol: 'δE', value: result.spanKJPerMol, energy: true as const, digits: 5 }];
    return {
      main: [...span, highest],
      facts: [
        { label: 'Its step', text: `${result.highestStep}${result.highestRun > 1 ? `, run ${result.highestRun}` : ''}` },
        ...(u ? [{ label: 'Uncertainty, errors shared', symbol: 'u', value: u.correlated, energy: true as const, digits: 2, note: 'as within one computational method' }] : []),
        { label: 'Reaction energy of the whole', value: result.reactionEnergyKJPerMol, energy: true, digits: 5 },
        ...(result.spanTransitionState === undefined ? [] : [{ label: 'Span from', text: `${result.spanIntermediate ?? ''} to ${result.spanTransitionState}` }]),
        ...(result.turnoverPerS === undefined ? [] : [{ label: `Turnover at ${input.temperatureK ?? ''} K`, value: result.turnoverPerS, unit: 's-1' }]),
        ...(result.turnoverAllStatesPerS === undefined ? [] : [{ label: 'The same, all states counted', value: result.turnoverAllStatesPerS, unit: 's-1' }]),
      ],
      warnings: [...(result.turnoverRefusal ? [result.turnoverRefusal] : []), ...result.warnings.map((warning) => warning.message)],
    };
  },
  picture: lazy(() => import('../pictures/profile-picture.tsx')),
});
