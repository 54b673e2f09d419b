import { siteDensityCalculator } from '#shared/calculators/site-density.ts';
import { sheet } from '../sheet.ts';

const facets = (...names: string[]) => names.map((value) => ({ value, label: `(${value})` }));

export const siteDensitySheet = sheet({
  calculator: siteDensityCalculator,
  fields: [
    {
      kind: 'choice', key: 'structure', label: 'Crystal structure', usual: 'fcc', look: 'segments',
      choices: [{ value: 'fcc', label: 'fcc' }, { value: 'bcc', label: 'bcc' }, { value: 'hcp', label: 'hcp' }],
    },
    { kind: 'choice', key: 'facet', label: 'Facet', usual: '111', look: 'segments', choices: facets('111', '100', '110'), only: { structure: ['fcc'] } },
    { kind: 'choice', key: 'facet', label: 'Facet', usual: '110', look: 'segments', choices: facets('110', '100', '111'), only: { structure: ['bcc'] } },
    { kind: 'choice', key: 'facet', label: 'Facet', usual: '0001', look: 'segments', choices: facets('0001'), only: { structure: ['hcp'] } },
    { kind: 'number', key: 'aAngstrom', label: 'Lattice constant', symbol: 'a', unit: 'Å' },
  ],
  example: { values: { aAngstrom: '4' } },
  empty: 'Give the lattice constant.',
  outcome: ({ result }) => ({
    main: [{ label: 'Surface atoms', symbol: 'Γ', value: result.perM2, unit: 'm-2', digits: 5 }],
    facts: [
      { label: 'Per square centimetre', value: result.perCm2, unit: 'cm-2', digits: 5 },
      { label: 'Amount', value: result.molPerM2, unit: 'mol m-2', digits: 5 },
    ],
    warnings: ['Surface atoms stand for sites only where one site goes with one atom: say so where it is used.'],
  }),
  onward: ({ result }) => [
    { to: 'rate-constant', label: 'Convert a rate constant with this site density', values: { siteDensityPerM2: String(result.perM2) } },
    { to: 'collision', label: 'Find collisions per site', values: { siteDensityPerM2: String(result.perM2) } },
  ],
});
