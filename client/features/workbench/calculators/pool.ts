import { lazy } from 'react';
import { poolCalculator } from '#shared/calculators/pool.ts';
import { setNumber } from '#client/lib/numbers.ts';
import { sheet } from '../sheet.ts';

export const poolSheet = sheet({
  calculator: poolCalculator,
  fields: [
    {
      kind: 'table', key: 'values', label: 'Values of one quantity', by: 'rows', least: 1, most: 200,
      columns: [
        { id: 'value', label: 'value', unitFrom: 'of' },
        { id: 'u', label: 'u', unitFrom: 'of' },
        { id: 'group', label: 'source', optional: true, text: true },
      ],
    },
    { kind: 'text', key: 'unit', param: 'of', label: 'Unit', own: true, usual: 'kJ/mol', most: 80, suggestions: ['kJ/mol', 'ln s-1'], hint: 'Shown with the figures; one unit for all.' },
    {
      kind: 'choice', key: 'model', label: 'Model', usual: 'reml', look: 'list',
      choices: [
        { value: 'reml', label: 'random effects by restricted maximum likelihood' }, { value: 'dersimonian-laird', label: 'random effects by DerSimonian and Laird' },
        { value: 'paule-mandel', label: 'random effects by Paule and Mandel' }, { value: 'fixed', label: 'fixed effect' },
      ],
    },
    {
      kind: 'choice', key: 'interval', label: '95 % interval', usual: 'hartung-knapp', look: 'segments',
      choices: [{ value: 'hartung-knapp', label: 'Hartung–Knapp' }, { value: 'normal', label: 'normal' }],
    },
  ],
  example: { tables: { values: [['100', '4', 'first'], ['106', '3', 'second'], ['94', '6', 'third'], ['103', '5', 'fourth'], ['110', '5', 'fifth']] } },
  empty: 'Give values of one quantity with their standard uncertainties; name the source of each, so that values of one source count together.',
  outcome: ({ result, own }) => {
    const unit = own.unit ?? '';
    const decimals = (value: number) => setNumber(value, { digits: 3 }).text;
    return {
      main: [{ label: 'Pooled value', symbol: 'x̄', value: result.mean, u: result.standardError, unit }],
      facts: [
        { label: '95 % interval', ...(result.interval ? { value: null, low: result.interval[0], high: result.interval[1], bound: 'range' as const, unit } : { text: 'not known' }) },
        { label: '95 % prediction interval', ...(result.predictionInterval ? { value: null, low: result.predictionInterval[0], high: result.predictionInterval[1], bound: 'range' as const, unit } : { text: 'needs three values and a random-effects model' }) },
        { label: 'Scatter beyond the uncertainties', symbol: 'τ', ...(result.tau2 === null ? { text: 'none in a fixed effect' } : { value: Math.sqrt(result.tau2), unit, digits: 3 }) },
        { label: 'Between-value variance', symbol: 'τ^{2}', ...(result.tau2 === null ? { text: 'none in a fixed effect' } : { value: result.tau2, digits: 4 }) },
        { label: 'Heterogeneity', symbol: 'Q', text: `${decimals(result.q)} for ${result.k} values` },
        { label: 'Share of it', symbol: 'I^{2}', text: result.i2Percent === null ? 'not known' : `${decimals(result.i2Percent)} %` },
        ...(result.birgeRatio === null ? [] : [{ label: 'Birge ratio', value: result.birgeRatio, digits: 3 }]),
      ],
      warnings: result.warnings.map((warning) => warning.message),
    };
  },
  picture: lazy(() => import('../pictures/pool-picture.tsx')),
});
