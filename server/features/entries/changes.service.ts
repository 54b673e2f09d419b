import type { EntryInput } from '#shared/contracts/entries.ts';
import type { QuantityInput } from '#shared/contracts/quantities.ts';
import { arrangementWords, sampleTypeWords, symbolWords, uncertaintyKindWords, energyTypeWords, provenanceWords } from '#shared/domain/kinds.ts';
import { quantityText } from '#shared/kinetics/derivation.ts';

const partWords: Readonly<Partial<Record<keyof EntryInput, string>>> = {
  kind: 'Kind', scope: 'Scope', provenance: 'Provenance', step: 'Elementary step', surface: 'Surface', source: 'Source', locator: 'Where in the source',
  method: 'Method', correlation: 'Correlation', rateOf: 'What the rate counts', kineticOrders: 'Reported orders', conditions: 'Conditions', validRange: 'Valid range', note: 'Note',
};

/** What a part of a part is called, where the words of its name would not do; an empty name says no more than the part itself. */
const leafWords: Readonly<Record<string, string>> = {
  'step.equation': '', 'step.sitesAdded': 'free sites added to balance', 'method.class': 'measured or computed', 'source.doi': 'DOI', 'source.bibtex': 'BibTeX', 'source.ris': 'RIS',
  'source.csl': 'citation', 'source.id': 'record', 'validRange.min': 'from [K]', 'validRange.max': 'to [K]', 'surface.particleSizeNm': 'particle size [nm]', 'surface.strainPercent': 'strain [%]',
  'surface.guestMonolayers': 'guest [monolayers]', 'conditions.temperatureK': 'temperature [K]', 'conditions.siteDensityPerM2': 'site density [per m2]', 'conditions.heatingRateKPerS': 'heating rate [K/s]',
  'conditions.exposureLangmuir': 'exposure [langmuir]', 'conditions.kieDirection': 'isotope effect printed as', 'conditions.text': 'further', 'rateOf.consumptionOf': 'consumption of',
};

/** Values of closed lists in words. */
const valueWords: Readonly<Record<string, string>> = { ...provenanceWords, ...sampleTypeWords, ...arrangementWords };

const nothing = 'not reported';

function wordsOf(name: string): string {
  return name.replace(/([a-z])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`);
}

function show(value: unknown): string {
  if (value === undefined || value === null || value === '') return nothing;
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'object') return JSON.stringify(value);
  if (typeof value === 'number') return quantityText(value);
  return typeof value === 'string' ? valueWords[value] ?? value : String(value);
}

/** The parts that a field of the input has: of one that is a figure or a text itself, only that. */
function leavesOf(value: unknown): ReadonlyMap<string, unknown> {
  if (value === undefined || value === null) return new Map();
  return typeof value === 'object' ? new Map(Object.entries(value)) : new Map([['', value]]);
}

/** Two quantities side by side; either may be missing. */
export interface QuantityPair<Q> {
  symbol: QuantityInput['symbol'];
  before: Q | null;
  after: Q | null;
}

/** Quantities of the same symbol side by side, the first of a symbol with the first: an entry may hold a symbol more than once. */
export function pairQuantities<Q extends { symbol: QuantityInput['symbol'] }>(before: readonly Q[], after: readonly Q[]): QuantityPair<Q>[] {
  return [...new Set([...before, ...after].map(({ symbol }) => symbol))].flatMap((symbol) => {
    const [was, is] = [before, after].map((list) => list.filter((one) => one.symbol === symbol)) as [Q[], Q[]];
    return Array.from({ length: Math.max(was.length, is.length) }, (_, index) => ({ symbol, before: was[index] ?? null, after: is[index] ?? null }));
  });
}

function showQuantity(quantity: QuantityInput | null): string {
  if (!quantity) return 'not given';
  const { asPrinted, unitAsPrinted, multiplier, energyType, uncertaintyKind, coverageFactor, level, degreesOfFreedom } = quantity;
  const about = [
    energyType && energyTypeWords[energyType], uncertaintyKind && `± is ${uncertaintyKindWords[uncertaintyKind]}`, coverageFactor !== undefined && `k = ${coverageFactor}`,
    level !== undefined && `at ${level * 100} %`, degreesOfFreedom !== undefined && `${degreesOfFreedom} degrees of freedom`, multiplier !== undefined && `times ${multiplier}`,
  ].filter(Boolean).join(', ');
  return `${`${asPrinted} ${unitAsPrinted}`.trim()}${about ? ` (${about})` : ''}`;
}

/** What differs between two revisions, part by part, as printed. */
export function listChanges(before: EntryInput, after: EntryInput): { field: string; before: string; after: string }[] {
  const changes: { field: string; before: string; after: string }[] = [];
  for (const [part, field] of Object.entries(partWords) as [keyof EntryInput, string][]) {
    const [was, is] = [leavesOf(before[part]), leavesOf(after[part])];
    for (const leaf of new Set([...was.keys(), ...is.keys()])) {
      const [old, now] = [show(was.get(leaf)), show(is.get(leaf))];
      const name = leafWords[`${part}.${leaf}`] ?? wordsOf(leaf);
      if (old !== now) changes.push({ field: name ? `${field}, ${name}` : field, before: old, after: now });
    }
  }
  for (const pair of pairQuantities(before.quantities ?? [], after.quantities ?? [])) {
    const [was, is] = [showQuantity(pair.before), showQuantity(pair.after)];
    if (was !== is) changes.push({ field: symbolWords[pair.symbol].replace(/^./, (first) => first.toUpperCase()), before: was, after: is });
  }
  return changes;
}
