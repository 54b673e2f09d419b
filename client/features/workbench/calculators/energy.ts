import { energyCalculator } from '#shared/calculators/energy.ts';
import { convertEnergy, energyUnits } from '#shared/kinetics/energy.ts';
import { sheet } from '../sheet.ts';

const words: Readonly<Record<string, string>> = { K: 'K (E/R)', 'cm-1': 'cm-1 (E/hc)', eV: 'eV per particle', meV: 'meV per particle', hartree: 'hartree per particle', rydberg: 'rydberg per particle' };

/** The energy units as they are picked from. */
export const energyUnitChoices = energyUnits.map((value) => ({ value, label: words[value] ?? value }));

export const energySheet = sheet({
  calculator: energyCalculator,
  fields: [
    { kind: 'number', key: 'value', label: 'Energy', symbol: 'E', unitFrom: 'from' },
    { kind: 'choice', key: 'from', label: 'From', choices: energyUnitChoices, usual: 'kcal/mol', look: 'select' },
    { kind: 'number', key: 'standardUncertainty', label: 'Standard uncertainty', symbol: 'u', unitFrom: 'from', optional: true },
    { kind: 'choice', key: 'to', label: 'To', choices: energyUnitChoices, usual: 'kJ/mol', look: 'select' },
  ],
  example: { values: { value: '24', standardUncertainty: '0.5' } },
  empty: 'Give an energy and its unit.',
  outcome: ({ result, input, typed }) => ({
    printed: `${typed('value')} ${input.from}`,
    main: [{ label: 'Converted', value: result.value, u: result.standardUncertainty, unit: result.unit, digits: 6 }],
    facts: energyUnits.filter((unit) => unit !== input.to && unit !== input.from).map((to) => {
      const other = convertEnergy({ ...input, to });
      return { label: words[to]?.replace(' per particle', '') ?? to, value: other.value, u: other.standardUncertainty, unit: to, digits: 6 };
    }),
  }),
  entry: ({ input, typed }) => ({
    kind: 'activation-energy', note: '',
    quantities: [{
      symbol: 'energy', asPrinted: input.standardUncertainty === undefined ? typed('value').trim() : `${typed('value').trim()} ± ${typed('standardUncertainty').trim()}`, unitAsPrinted: input.from,
      ...(input.standardUncertainty === undefined ? {} : { uncertaintyKind: 'standard' as const }),
    }],
  }),
});
