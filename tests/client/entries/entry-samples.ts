import type { Entry } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';

/** An energy as printed in kJ/mol; all of it invented. */
export function energy(change: Partial<Quantity> = {}): Quantity {
  return {
    symbol: 'energy', energyType: 'arrhenius', asPrinted: '186 ± 3', unitAsPrinted: 'kJ/mol', multiplier: null, bound: '=', value: 186, low: null, high: null,
    unit: 'kJ/mol', reportedUncertainty: 3, uncertaintyKind: 'standard', uncertaintyScale: 'linear', standardUncertainty: 3, significantDigits: 3,
    derivation: [{ operation: 'Read the printed value', from: '186 ± 3 kJ/mol', to: '186 kJ/mol', reference: 'as printed in the source' }],
    ...change,
  };
}

/** An accepted entry; all of it invented. */
export function sampleEntry(accession: string, change: Partial<Entry> = {}): Entry {
  return {
    accession, version: 1, revision: 1, state: 'accepted', kind: 'activation-energy', scope: 'elementary', provenance: 'measured',
    step: { key: '2N* <=> N2 + 2*', variantKey: '2N* <=> N2 + 2*', equation: '2N* -> N2 + 2*', class: 'associative-desorption', direction: 1 },
    surface: {
      id: 'surface-1', metal: 'Ru', formula: 'Ru', structure: 'hcp', facet: '0001', site: 'terrace', sampleType: 'single-crystal', support: null, label: 'Ru(0001)',
    },
    source: {
      id: 'source-1', doi: '10.5555/invented.1', key: 'vantongeren1994', title: 'An invented paper', authors: 'Vantongeren', label: 'Vantongeren 1994', year: 1994,
      container: 'Journal of Invented Surfaces', status: 'current', notice: null,
    },
    locator: 'Table 2, p. 113', method: { class: 'measured', technique: 'TPD', detail: null }, quantities: [energy()], correlation: null, rateOf: 'event',
    kineticOrders: null, conditions: {}, validRange: { min: 430, max: 620 }, note: null, notice: null, checks: [],
    kAtT: { temperatureK: 700, value: 0.128, unit: 's-1', uLnK: null, extrapolated: true },
    conversion: { coreVersion: '1.0.0', constantsVersion: 'CODATA 2022', at: '2026-03-14T10:00:00Z' },
    contributor: 'T. Adeyemi-Holt', acceptedAt: '2026-03-14T10:00:00Z', actions: ['export'],
    links: { self: `/api/v1/entries/${accession}`, page: `/entries/${accession}` },
    ...change,
  };
}
