import type { EntryDetail, RelatedEntry } from '#shared/contracts/entries.ts';
import { energy, sampleEntry } from './entry-samples.ts';

const factor = {
  ...energy(), symbol: 'preExponential' as const, energyType: null, asPrinted: '1.0e13', unitAsPrinted: 's-1', unit: 's-1', value: 1e13, reportedUncertainty: null,
  uncertaintyKind: 'none' as const, standardUncertainty: null, significantDigits: 2, derivation: [],
};

/** An accepted entry beside the one shown; invented. */
export function relatedEntry(change: Partial<RelatedEntry> = {}): RelatedEntry {
  return {
    accession: '222-223-9', asPrinted: '< 30 kcal/mol', label: 'Sørlie 1999', energyKJPerMol: 125.52, computed: false, bound: '<', uEnergyKJPerMol: null, energyType: 'arrhenius',
    scope: 'elementary', promoters: [], alike: true, validRange: null, rate: null, ...change,
  };
}

/** An accepted entry with all that its page shows; all of it invented. */
export function entryDetail(change: Partial<EntryDetail> = {}): EntryDetail {
  return {
    ...sampleEntry('222-222-2', { quantities: [energy(), factor], kAtT: { temperatureK: 700, value: 1e13 * Math.exp(-186000 / (8.31446261815324 * 700)), unit: 's-1', uLnK: null, extrapolated: true } }),
    sourceDetail: { citation: 'Vantongeren, L. (1994). An invented paper. https://doi.org/10.5555/invented.1', bibtex: '@article{vantongeren1994}', ris: 'TY  - JOUR' },
    history: [{ at: '2026-03-14T10:00:00Z', by: 'I. Okonjo-Vale', what: 'Version 1 accepted: figures agree', version: 1 }, { at: '2026-02-01T10:00:00Z', by: 'T. Adeyemi-Holt', what: 'Submitted', version: null }],
    versions: [{ version: 1, state: 'accepted', acceptedAt: '2026-03-14T10:00:00Z' }],
    revisions: [{ revision: 1, version: 1, state: 'accepted', at: '2026-03-14T10:00:00Z' }],
    sameStepAndSurface: [relatedEntry()], reverse: [], submission: null, ...change,
  };
}
