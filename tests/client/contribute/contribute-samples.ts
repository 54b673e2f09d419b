import type { EntryForEditing, EntryInput, Preview } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';

export const energy: Quantity = {
  symbol: 'energy', energyType: 'arrhenius', asPrinted: '21.4 ± 1.2', unitAsPrinted: 'kcal/mol', bound: '=', value: 89.5376, low: null, high: null, unit: 'kJ/mol',
  reportedUncertainty: 5.02, uncertaintyKind: 'unknown', uncertaintyScale: 'linear', standardUncertainty: null, significantDigits: 3,
  derivation: [{ operation: 'Thermochemical calorie, × 4.184 exactly', from: '21.4 kcal/mol', to: '89.5376 kJ/mol', reference: 'in this test' }],
};

export const emptyPreview: Preview = { step: null, surface: null, quantities: [], kAtT: null, checks: [], faults: [], neighbours: [] };

/** A draft as the server answers it. */
export function draftOf(input: EntryInput, more: Partial<EntryForEditing> = {}): EntryForEditing {
  return {
    accession: 'K7Q-4MD-2', version: null, revision: 1, state: 'draft', kind: input.kind ?? null, scope: input.scope ?? null, provenance: input.provenance ?? null,
    step: null, surface: null, source: null, locator: input.locator ?? null, method: { class: null, technique: null, detail: null }, quantities: [],
    correlation: null, rateOf: null, kineticOrders: null, conditions: {}, validRange: null, note: input.note ?? null, checks: [], kAtT: null, conversion: null,
    notice: null, contributor: 'T. Adeyemi-Holt', acceptedAt: null, actions: ['edit', 'submit', 'withdraw'], links: { self: '/', page: '/' },
    input, faults: [], lock: 1, lastDecision: null, submission: null, ...more,
  };
}
