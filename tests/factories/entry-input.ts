import type { EntryInput } from '#shared/contracts/entries.ts';
import { checklistPoints } from '#shared/domain/review.ts';
import type { Checklist } from '#shared/contracts/reviews.ts';

/** Invented sources that the stand-in DOI service of a test knows: `10.5555/test.1` and on. */
export const testSources = [
  ['Ambrosetti', 'Thermal desorption of ammonia from ruthenium, an invented study', 1994],
  ['Brandvold', 'Nitrogen association on stepped nickel, an invented study', 2001],
  ['Czerwiński', 'Hydrogen from copper: H$_{2}$ & D$_{2}$, an invented study', 2008],
  ['Dubrovin', 'Ammonia decomposition over cobalt foils, an invented study', 2012],
  ['Ekström-Öhlin', 'Computed barriers on close-packed metals, an invented study', 2016],
  ['Fairweather', 'Kinetic isotope effects of ammonia, an invented study', 2021],
].map(([family, title, year], index) => ({
  type: 'article-journal', DOI: `10.5555/test.${index + 1}`, title, author: [{ family, given: 'Ada' }, { family: 'Example', given: 'Ida' }],
  'container-title': 'Invented Journal of Surface Kinetics', volume: String(10 + index), page: `${100 + index}-${110 + index}`, issued: { 'date-parts': [[year]] },
}));

/** A complete, plausible and invented entry: desorption of ammonia from Ru(0001), 44.5 ± 1.4 kcal/mol with A = 10^13 s-1. */
export function entryInputOf(changes: Partial<EntryInput> = {}): EntryInput {
  return {
    kind: 'activation-energy', scope: 'elementary', provenance: 'measured',
    step: { equation: 'NH3* -> NH3 + *' },
    surface: { metal: 'Ru', facet: '0001', site: 'terrace', sampleType: 'single-crystal' },
    source: { doi: '10.5555/test.1' },
    locator: 'Table 2, p. 104',
    method: { class: 'measured', technique: 'TPD' },
    quantities: [
      { symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', uncertaintyKind: 'standard' },
      { symbol: 'preExponential', asPrinted: '10^13', unitAsPrinted: 's-1' },
    ],
    rateOf: 'event',
    conditions: { coverage: '0.1', coverageDefinition: 'per-surface-atom' },
    validRange: { min: 600, max: 800 },
    ...changes,
  };
}

/** The same with another energy, in kJ/mol. */
export function withEnergy(asPrinted: string, changes: Partial<EntryInput> = {}): EntryInput {
  return entryInputOf({ quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted, unitAsPrinted: 'kJ/mol', uncertaintyKind: 'none' }], ...changes });
}

/** Every point of the checklist answered alike. */
export function answers(answer: 'yes' | 'no' | 'not-applicable' = 'yes'): Checklist {
  return Object.fromEntries(checklistPoints.map((point) => [point, answer]));
}
