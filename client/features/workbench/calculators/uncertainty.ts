import { uncertaintyCalculator } from '#shared/calculators/uncertainty.ts';
import { sheet } from '../sheet.ts';

const of = (...kinds: string[]) => ({ kind: kinds });

export const uncertaintySheet = sheet({
  calculator: uncertaintyCalculator,
  fields: [
    {
      kind: 'choice', key: 'kind', label: 'What the source states', usual: 'expanded', look: 'list',
      choices: [
        { value: 'expanded', label: 'expanded uncertainty', hint: 'A multiple of the standard uncertainty, such as two standard deviations.' },
        { value: 'confidence', label: 'confidence interval', hint: 'A half-width with its level.' },
        { value: 'rectangular', label: 'limits, all values between them alike' },
        { value: 'triangular', label: 'limits, the middle likeliest' },
        { value: 'trapezoidal', label: 'limits, a middle part alike, falling to both sides' },
        { value: 'arcsine', label: 'limits of something that swings between them' },
        { value: 'factor', label: 'factor', hint: '"Within a factor of 3": the uncertainty of the logarithm.' },
      ],
    },
    { kind: 'number', key: 'value', label: 'Expanded uncertainty', symbol: 'U', unitFrom: 'of', only: of('expanded') },
    { kind: 'number', key: 'coverageFactor', label: 'Coverage factor', symbol: 'k', only: of('expanded') },
    { kind: 'number', key: 'halfWidth', label: 'Half-width', symbol: 'a', unitFrom: 'of', only: of('confidence', 'rectangular', 'triangular', 'trapezoidal', 'arcsine'), hint: 'The figure after the ±.' },
    { kind: 'number', key: 'topFraction', label: 'Top as a fraction of the base', symbol: 'β', only: of('trapezoidal'), hint: '0 is a triangle, 1 a rectangle.' },
    { kind: 'number', key: 'factor', label: 'Factor', symbol: 'f', only: of('factor') },
    { kind: 'number', key: 'level', label: 'Level, two-sided', symbol: 'p', only: of('confidence', 'factor'), hint: '0.95 for 95 %.' },
    { kind: 'number', key: 'degreesOfFreedom', label: 'Degrees of freedom', symbol: 'ν', only: of('confidence'), optional: true, hint: 'Without them the normal distribution.' },
    { kind: 'text', key: 'unit', param: 'of', label: 'Unit', own: true, usual: '', most: 80, only: of('expanded', 'confidence', 'rectangular', 'triangular', 'trapezoidal', 'arcsine'), suggestions: ['kJ/mol', 'kcal/mol', 'eV'], hint: 'Shown with the result.' },
  ],
  example: { values: { value: '3', coverageFactor: '2', of: 'kJ/mol' } },
  empty: 'Choose what the source states and give its figures.',
  outcome: ({ result, own }) => ({
    main: [{
      label: result.scale === 'ln' ? 'Standard uncertainty of the natural logarithm' : 'Standard uncertainty', symbol: result.scale === 'ln' ? 'u(ln x)' : 'u',
      value: result.standardUncertainty, unit: result.scale === 'ln' ? '' : own.unit ?? '',
    }],
    facts: [
      { label: 'Divided by', value: result.divisor, digits: 6 },
      ...(result.scale === 'ln' ? [{ label: 'As a factor of one standard uncertainty', value: Math.exp(result.standardUncertainty) }] : []),
    ],
  }),
});
