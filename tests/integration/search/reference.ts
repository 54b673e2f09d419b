import type { Entry } from '#shared/contracts/entries.ts';
import { kindsHeld, primarySymbol, type Kind } from '#shared/domain/kinds.ts';
import { readStep } from '#shared/steps/parse-step.ts';
import { readVocabulary } from '#seeds/vocabulary/read-vocabulary.ts';

/*
 * What a search means, said once more and slowly over entries as the interface shows them: the reference that the database's answers are held
 * against.
 */

export type Query = Record<string, string | readonly string[]>;
export const listOf = (value: string | readonly string[]): readonly string[] => (typeof value === 'string' ? [value] : value);
export const queryText = (query: Query): string => new URLSearchParams(Object.entries(query).flatMap(([name, value]) => listOf(value).map((one) => [name, one] as [string, string]))).toString();

/** Where a value stands: the value, the middle of a range, or the limit of a bound. */
export function position(entry: Entry, kind: Kind): number | null {
  const found = entry.quantities.find(({ symbol, energyType }) => symbol === primarySymbol[kind] && (symbol !== 'energy' || (kind === 'activation-energy') === (energyType === 'arrhenius')));
  if (!found) return null;
  const { value, low, high } = found;
  return value ?? (low !== null && high !== null ? (low + high) / 2 : low ?? high);
}

export const energyOf = ({ quantities }: Entry) => quantities.find(({ symbol }) => symbol === 'energy');
export const elementsOf = ({ surface }: Entry): readonly string[] => surface?.formula.match(/[A-Z][a-z]?/g) ?? [];
const stepOf = (entry: Entry) => readStep(entry.step?.equation ?? '');
const promotersOf = ({ conditions }: Entry): string[] => conditions.promoter?.match(/\b[A-Z][a-z]?\b/g) ?? [];
const hasUncertainty = ({ kind, quantities }: Entry): boolean => quantities.find(({ symbol }) => symbol === primarySymbol[kind as Kind])?.standardUncertainty !== null;
const families = new Map(readVocabulary().filter(({ kind }) => kind === 'technique').map(({ code, data }) => [code, data['family'] as string]));

/** Family names of authors by DOI, as the stand-in DOI service gives them. */
export const authorsByDoi = new Map<string, string[]>();
const plain = (text: string): string => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();

function holds({ validRange, method }: Entry, temperatureK: number): boolean {
  const { min = null, max = null } = validRange ?? {};
  if (min === null && max === null) return method.class === 'computed';
  return (min ?? -Infinity) <= temperatureK && (max ?? Infinity) >= temperatureK;
}

/** The values of an entry under each list filter, as counts give them. */
export const valuesOf: Record<string, (entry: Entry) => (string | null | undefined)[]> = {
  kind: ({ quantities }) => kindsHeld(quantities), metal: ({ surface }) => [surface?.metal], step: ({ step }) => [step?.key], stepClass: ({ step }) => [step?.class],
  method: ({ method }) => [method.technique], methodClass: ({ method }) => [method.class], facet: ({ surface }) => [surface?.facet], site: ({ surface }) => [surface?.site],
  scope: ({ scope }) => [scope], provenance: ({ provenance }) => [provenance], energyType: (entry) => [energyOf(entry)?.energyType], sampleType: ({ surface }) => [surface?.sampleType],
  contains: (entry) => [...new Set(elementsOf(entry))], formula: ({ surface }) => [surface?.formula], support: ({ surface }) => [surface?.support],
  promoter: (entry) => (promotersOf(entry).length === 0 ? ['none'] : ['any', ...promotersOf(entry)]),
  species: (entry) => [...new Set([...stepOf(entry).reactants, ...stepOf(entry).products].map(({ species }) => species.formula).filter((formula) => formula !== '*'))],
  bond: (entry) => [stepOf(entry).bond.broken ?? stepOf(entry).bond.formed], cleavage: (entry) => [stepOf(entry).assistance],
  methodFamily: ({ method }) => [families.get(method.technique ?? '')], source: ({ source }) => [source?.doi ?? source?.id], hasUncertainty: (entry) => [String(hasUncertainty(entry))],
};

const meansValue = Object.fromEntries(Object.entries(valuesOf).map(([name, read]) => [name, (entry: Entry, value: string) => read(entry).includes(value)]));

export const means: Record<string, (entry: Entry, value: string, query: Query) => boolean> = {
  ...meansValue,
  step: (entry, value) => entry.step?.key === readStep(value).key,
  method: (entry, value) => entry.method.technique === value || entry.method.class === value,
  source: (entry, value) => entry.source?.doi === value.toLowerCase() || entry.source?.id === value,
  author: ({ source }, value) => (authorsByDoi.get(source?.doi ?? '') ?? []).some((family) => plain(family) === plain(value)),
  contributor: ({ contributor }, value) => plain(contributor ?? '') === plain(value),
  yearFrom: (entry, value) => (entry.source?.year ?? -Infinity) >= Number(value),
  yearTo: (entry, value) => (entry.source?.year ?? Infinity) <= Number(value),
  valueMin: (entry, value, query) => (position(entry, query['kind'] as Kind) ?? -Infinity) >= Number(value),
  valueMax: (entry, value, query) => (position(entry, query['kind'] as Kind) ?? Infinity) <= Number(value),
  validAt: (entry, value) => holds(entry, Number(value)),
  validFrom: (entry, value) => holds(entry, Number(value)),
  validTo: (entry, value) => holds(entry, Number(value)),
  state: ({ state }, value) => state === value,
};

export const matching = (all: readonly Entry[], query: Query, except: readonly string[] = []): Entry[] =>
  all.filter((entry) => Object.entries(query).every(([name, value]) => except.includes(name) || !(name in means) || listOf(value).some((one) => means[name]?.(entry, one, query))));
export const namesOf = (items: readonly Entry[]): string[] => items.map(({ accession }) => accession).sort();

/** What counts must say: for each list filter, over everything that the other filters find. */
export function countsOf(all: readonly Entry[], query: Query): Record<string, Record<string, number>> {
  return Object.fromEntries(Object.entries(valuesOf).map(([name, read]) => {
    const counts: Record<string, number> = {};
    for (const entry of matching(all, query, name === 'kind' ? ['kind', 'valueMin', 'valueMax'] : [name])) for (const value of read(entry)) if (value) counts[value] = (counts[value] ?? 0) + 1;
    return [name, counts];
  }));
}

/** Mulberry32: small, seeded, the same everywhere. */
export function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** A query of one to three filters that some entry answers, or two of them together. */
export function randomQuery(all: readonly Entry[], random: () => number): Query {
  const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)] as T;
  const query: Query = {};
  for (let n = 0; n < 1 + Math.floor(random() * 3); n += 1) {
    const name = pick([...Object.keys(valuesOf), 'yearFrom', 'yearTo', 'validAt', 'validFrom', 'validTo', 'author', 'contributor']);
    const [entry, other] = [pick(all), pick(all)];
    if (name === 'yearFrom' || name === 'yearTo') query[name] = String(entry.source?.year ?? 2000);
    else if (name === 'validAt') query[name] = String(pick([300, 500, 650, 700, 900]));
    else if (name === 'validFrom') query[name] = String(pick([300, 500]));
    else if (name === 'validTo') query[name] = String(pick([550, 700, 900]));
    else if (name === 'author') query[name] = pick(authorsByDoi.get(entry.source?.doi ?? '') ?? ['Nobody']).toUpperCase();
    else if (name === 'contributor') query[name] = entry.contributor ?? '';
    else {
      const values = [...new Set([...(valuesOf[name]?.(entry) ?? []), ...(valuesOf[name]?.(other) ?? [])])].filter((value): value is string => Boolean(value));
      if (values.length > 0) query[name] = name === 'kind' || name === 'hasUncertainty' ? (values[0] as string) : values;
    }
  }
  if (typeof query['kind'] === 'string' && random() < 0.7) {
    const held = all.map((entry) => position(entry, query['kind'] as Kind)).filter((value): value is number => value !== null).sort((a, b) => a - b);
    query['valueMin'] = String(held[Math.floor(held.length / 4)] ?? 0);
    if (random() < 0.5) query['valueMax'] = String(held[Math.floor((held.length * 3) / 4)] ?? 0);
  }
  return query;
}
