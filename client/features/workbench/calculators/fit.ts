import { lazy } from 'react';
import { fitCalculator } from '#shared/calculators/fit.ts';
import { rowsNamed } from '../read-typed.ts';
import { sheet } from '../sheet.ts';
import { rateUnit } from './common-fields.ts';

/** k = 1e13 s-1 exp(-100 kJ/mol / RT) to three digits, each moved by a few per cent. */
const points = [
  ['420', '3.80'], ['440', '13.1'], ['460', '45.2'], ['480', '127'], ['500', '366'], ['520', '880'], ['540', '2140'], ['560', '4600'],
];

/** The rows that hold a point, left out or not. */
const rowsFilled = (rows: readonly (readonly string[])[]) => rows.filter((row) => row[0]?.trim() && row[1]?.trim()).length;

export const fitSheet = sheet({
  calculator: fitCalculator,
  fields: [
    {
      kind: 'table', key: 'points', label: 'Rate constants', by: 'rows', least: 2, leftOutBy: 'leftOut',
      columns: [
        { id: 'temperatureK', label: 'T', unit: 'K' },
        { id: 'k', label: 'k', unitFrom: 'rateUnit' },
        { id: 'u', label: 'u of k', unitFrom: 'rateUnit', optional: true },
      ],
    },
    rateUnit,
    { kind: 'text', key: 'leftOut', label: 'Rows left out', optional: true, own: true, usual: '', hint: 'By their numbers, or by a click on a point of the plot.' },
    {
      kind: 'choice', key: 'weights', label: 'Weights', usual: 'none', look: 'segments',
      choices: [{ value: 'none', label: 'all alike' }, { value: 'given', label: 'by the u of k' }],
    },
    {
      kind: 'choice', key: 'covariance', label: 'Errors from', usual: 'scaled', look: 'segments', only: { weights: ['given'] },
      choices: [{ value: 'scaled', label: 'the residuals' }, { value: 'absolute', label: 'the u of k' }],
    },
  ],
  example: { tables: { points } },
  empty: 'Give temperatures and rate constants: type them, or paste two or three columns from a spreadsheet.',
  outcome: ({ result, own, cells, typed }) => {
    const unit = own.rateUnit ?? '';
    const filled = rowsFilled(cells('points'));
    const correlation = 1 - result.correlation < 1e-3 ? result.correlation.toFixed(6) : result.correlation.toFixed(4);
    return {
      main: [
        { label: 'Activation energy', symbol: 'E', value: result.energyKJPerMol, u: result.uEnergyKJPerMol, energy: true, digits: 5 },
        { label: 'Pre-exponential factor', symbol: 'A', value: result.preExponential, ln: result.lnPreExponential, u: result.uLnPreExponential, uScale: 'ln', unit, digits: 3 },
      ],
      facts: [
        { label: 'Natural logarithm', symbol: 'ln A', value: result.lnPreExponential, u: result.uLnPreExponential, digits: 5 },
        { label: 'Correlation of ln A and E', symbol: 'r', text: result.uEnergyKJPerMol === null ? 'not known from two points' : correlation },
        ...(result.ciEnergyKJPerMol ? [{ label: 'E, 95 % interval', value: null, low: result.ciEnergyKJPerMol[0], high: result.ciEnergyKJPerMol[1], bound: 'range' as const, energy: true as const, digits: 4 }] : []),
        ...(result.ciLnPreExponential ? [{ label: 'ln A, 95 % interval', value: null, low: result.ciLnPreExponential[0], high: result.ciLnPreExponential[1], bound: 'range' as const, digits: 4 }] : []),
        { label: 'Scatter of ln k', symbol: 's', ...(result.residualSd === null ? { text: 'not known from two points' } : { value: result.residualSd, digits: 3 }) },
        { label: 'Share explained', symbol: 'R^{2}', ...(result.rSquared === null ? { text: 'not known' } : { text: result.rSquared.toFixed(5) }) },
        { label: 'Points', text: `${result.n}, ${result.degreesOfFreedom} degrees of freedom` },
      ],
      warnings: [
        ...(result.n < filled ? [`${filled - result.n === 1 ? 'Row' : 'Rows'} ${[...rowsNamed(typed('leftOut')).rows].filter((row) => row < cells('points').length).map((row) => row + 1).join(', ')} left out of the fit.`] : []),
        ...result.warnings.map((warning) => warning.message),
      ],
    };
  },
  onward: ({ result, input, own }) => {
    if (result.preExponential === null) return [];
    const temperatures = input.points.map((point) => point.temperatureK);
    return [{
      to: 'arrhenius', label: 'Evaluate k at a temperature, with its uncertainty',
      values: {
        preExponential: String(result.preExponential), energy: String(result.energyKJPerMol), rateUnit: own.rateUnit ?? '',
        ...(result.uLnPreExponential === null || result.uEnergyKJPerMol === null ? {} : { uLnPreExponential: String(result.uLnPreExponential), uEnergy: String(result.uEnergyKJPerMol), correlation: String(result.correlation) }),
        validFromK: String(Math.min(...temperatures)), validToK: String(Math.max(...temperatures)),
      },
    }];
  },
  entry: ({ result, own, input, cells }) => {
    const u = result.uEnergyKJPerMol;
    const temperatures = input.points.map((point) => point.temperatureK);
    return {
      kind: 'activation-energy', provenance: 'derived-from-measured',
      quantities: [
        { symbol: 'energy', energyType: 'arrhenius', asPrinted: u ? `${result.energyKJPerMol.toPrecision(6)} ± ${u.toPrecision(3)}` : result.energyKJPerMol.toPrecision(6), unitAsPrinted: 'kJ/mol', ...(u ? { uncertaintyKind: 'fit-standard-error' as const } : {}) },
        { symbol: 'preExponential', asPrinted: `ln A = ${result.lnPreExponential.toPrecision(7)}${result.uLnPreExponential ? ` ± ${result.uLnPreExponential.toPrecision(3)}` : ''}`, unitAsPrinted: own.rateUnit ?? '', ...(result.uLnPreExponential ? { uncertaintyKind: 'fit-standard-error' as const } : {}) },
      ],
      ...(u ? { correlation: result.correlation } : {}),
      validRange: { min: Math.min(...temperatures), max: Math.max(...temperatures) },
      note: `A and E by a fit of ln k on 1/T to ${result.n} of ${rowsFilled(cells('points'))} rate constants between ${Math.min(...temperatures)} and ${Math.max(...temperatures)} K.`,
    };
  },
  picture: lazy(() => import('../pictures/fit-picture.tsx')),
});
