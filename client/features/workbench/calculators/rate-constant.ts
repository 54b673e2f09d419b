import { rateConstantCalculator } from '#shared/calculators/rate-constant.ts';
import { sheet } from '../sheet.ts';
import { rateUnits, temperature } from './common-fields.ts';

export const rateConstantSheet = sheet({
  calculator: rateConstantCalculator,
  fields: [
    { kind: 'number', key: 'value', label: 'Rate constant', symbol: 'k', unitFrom: 'from' },
    { kind: 'number', key: 'standardUncertainty', label: 'Standard uncertainty', symbol: 'u', unitFrom: 'from', optional: true },
    { kind: 'text', key: 'from', label: 'From', suggestions: rateUnits, most: 80, wide: true, placeholder: 'cm3 molecule-1 s-1' },
    { kind: 'text', key: 'to', label: 'To', suggestions: rateUnits, most: 80, wide: true, placeholder: 'Pa-1 s-1' },
    { ...temperature, optional: true, hint: 'Needed between concentration and pressure.' },
    { kind: 'number', key: 'siteDensityPerM2', label: 'Site density', symbol: 'Γ', unit: 'm-2', optional: true, hint: 'Needed between an area and a site.' },
  ],
  example: { values: { value: '1e-12', from: 'cm3 molecule-1 s-1', to: 'bar-1 s-1', temperatureK: '500' } },
  empty: 'Give a rate constant with its unit, and the unit wanted.',
  outcome: ({ result, input, typed }) => ({
    printed: `${typed('value')} ${input.from}`,
    main: [{ label: 'Converted', value: result.value, u: result.standardUncertainty, unit: result.unit, digits: 5 }],
    facts: result.assumptions.map((text) => ({ label: 'Rests on', text })),
  }),
  entry: ({ input, typed }) => ({
    kind: 'rate-constant', note: '',
    quantities: [{ symbol: 'rateConstant', asPrinted: typed('value').trim(), unitAsPrinted: input.from }],
  }),
});
