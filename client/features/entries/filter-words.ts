import { energyTypeWords, kindWords, provenanceWords, sampleTypeWords, type EnergyType, type Kind, type Provenance, type SampleType } from '#shared/domain/kinds.ts';
import type { EntryFilter, FilterCounts } from '#shared/contracts/entry-search.ts';
import type { Term, Vocabulary } from '#shared/contracts/vocabulary.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, setNumber } from '#client/lib/numbers.ts';
import { isSet, type FilterName } from './search-state.ts';

/** Filters whose values are chosen from a list. */
export const listFilters = [
  'kind', 'step', 'metal', 'method', 'stepClass', 'facet', 'site', 'contains', 'scope', 'energyType', 'provenance', 'sampleType', 'bond', 'source',
] as const satisfies readonly FilterName[];
export type ListFilter = (typeof listFilters)[number];

/** A part of the query sentence: the words before its picker, the words of the picker while nothing is chosen, and how many are said. */
export interface SentencePart {
  filter: ListFilter;
  before: string;
  unset: string;
  /** The heading of the picker. */
  title: string;
  /** "3 elementary steps", once the values are too many or too long to be said. */
  several: string;
  /** The most values that the sentence says by name. */
  sayUpTo: number;
}

/** The parts that always stand in the sentence. */
export const fixedParts = {
  kind: { filter: 'kind', before: 'Show', unset: 'all entries', title: 'Kind of parameter', several: 'kinds of parameter', sayUpTo: 2 },
  step: { filter: 'step', before: 'for', unset: 'any elementary step', title: 'Elementary step', several: 'elementary steps', sayUpTo: 1 },
  metal: { filter: 'metal', before: 'on', unset: 'any surface', title: 'Metal', several: 'metals', sayUpTo: 5 },
  method: { filter: 'method', before: 'by', unset: 'any method', title: 'Method', several: 'methods', sayUpTo: 2 },
} as const satisfies Record<string, SentencePart>;

/** The parts that join the sentence when they are set or asked for. */
export const furtherParts: readonly SentencePart[] = [
  { filter: 'stepClass', before: 'of class', unset: 'any class of step', title: 'Class of elementary step', several: 'classes', sayUpTo: 2 },
  { filter: 'facet', before: 'on facet', unset: 'any facet', title: 'Facet', several: 'facets', sayUpTo: 4 },
  { filter: 'site', before: 'at sites', unset: 'of any type', title: 'Site', several: 'site types', sayUpTo: 3 },
  { filter: 'contains', before: 'in a material containing', unset: 'any metal', title: 'Contains', several: 'metals', sayUpTo: 5 },
  { filter: 'sampleType', before: 'studied as', unset: 'any sample', title: 'Form of the sample', several: 'forms', sayUpTo: 2 },
  { filter: 'scope', before: 'of scope', unset: 'any scope', title: 'Scope', several: 'scopes', sayUpTo: 3 },
  { filter: 'energyType', before: 'with energy given as', unset: 'any type', title: 'Type of energy', several: 'types of energy', sayUpTo: 2 },
  { filter: 'provenance', before: 'being', unset: 'of any provenance', title: 'Provenance', several: 'kinds of provenance', sayUpTo: 2 },
  { filter: 'bond', before: 'about the bond', unset: 'any bond', title: 'Bond', several: 'bonds', sayUpTo: 3 },
  { filter: 'source', before: 'from', unset: 'any source', title: 'Source', several: 'sources', sayUpTo: 1 },
];

/** What can be added to the sentence by the reader; the rest comes by links only. */
export const addable: readonly ListFilter[] = ['stepClass', 'facet', 'site', 'contains', 'sampleType', 'scope', 'energyType', 'provenance'];

const vocabularyOf: Partial<Record<ListFilter, keyof Vocabulary>> = {
  metal: 'metals', contains: 'metals', facet: 'facets', method: 'techniques', stepClass: 'stepClasses', step: 'steps',
};

/** The terms of the vocabulary that a filter draws on. */
export function termsOf(filter: ListFilter, vocabulary: Vocabulary | undefined): readonly Term[] {
  const name = vocabularyOf[filter];
  return name && vocabulary ? vocabulary[name] : [];
}

/** A value of a filter in words, as the sentence and the pickers say it. */
export function valueWords(filter: ListFilter, value: string, vocabulary?: Vocabulary, counts?: FilterCounts | null): string {
  switch (filter) {
    case 'kind': return kindWords[value as Kind] ?? value;
    case 'energyType': return energyTypeWords[value as EnergyType] ?? value;
    case 'provenance': return provenanceWords[value as Provenance] ?? value;
    case 'sampleType': return sampleTypeWords[value as SampleType] ?? value;
    case 'site': return siteWords(value);
    case 'metal':
    case 'contains': return value;
    case 'method': if (value === 'measured' || value === 'computed') return `any ${value} method`;
  }
  const counted = counts && filter in counts ? counts[filter as keyof FilterCounts].find((one) => one.value === value)?.label : undefined;
  return counted ?? termsOf(filter, vocabulary).find((term) => term.code === value)?.label ?? value;
}

/** A site type in words. */
export function siteWords(site: string): string {
  return site.replace(/^(fcc|hcp|step)-/, '$1 ');
}

/** Words joined as a sentence does: "a", "a and b", "a, b and c". */
export function joinWords(words: readonly string[], last = 'and'): string {
  return words.length < 2 ? words[0] ?? '' : `${words.slice(0, -1).join(', ')} ${last} ${words.at(-1)}`;
}

/** Whether one kind of energy alone is asked for, whose value can be limited in the reader's unit. */
export function isEnergyKind(kind: Kind): boolean {
  return kind === 'activation-energy' || kind === 'barrier' || kind === 'reaction-energy' || kind === 'adsorption-energy';
}

/** Limits of the value in words: "from 50 to 120 kJ/mol". */
export function valueRangeWords({ valueMin, valueMax, kind }: EntryFilter, unit: EnergyUnit): string {
  const energy = kind?.length === 1 && isEnergyKind(kind[0] as Kind);
  const say = (value: number) => {
    const { text, exponent } = setNumber(energy ? energyIn(unit, value) : value, { digits: 3 });
    return exponent === null ? text : `${text}e${exponent}`;
  };
  return rangeWords(valueMin === undefined ? null : say(valueMin), valueMax === undefined ? null : say(valueMax), energy ? ` ${unit}` : '');
}

/** A range in words: "from 1990 to 2005", "up to 2005", "from 1990 on". */
export function rangeWords(from: string | null, to: string | null, tail = ''): string {
  if (from !== null && to !== null) return `from ${from} to ${to}${tail}`;
  if (from !== null) return `from ${from}${tail} up`;
  return to === null ? 'any' : `up to ${to}${tail}`;
}

/** A filter in force, said whole, as for taking it away: "elementary step: N* + N* -> N2 + 2*". */
export function filterWords(name: FilterName, filter: EntryFilter, unit: EnergyUnit, vocabulary?: Vocabulary): { title: string; value: string } {
  if (!isSet(filter[name])) return { title: name, value: '' };
  const part = [...Object.values(fixedParts), ...furtherParts].find((one) => one.filter === name);
  if (part) {
    const values = (filter[part.filter] ?? []) as readonly string[];
    return { title: part.title, value: joinWords(values.map((value) => valueWords(part.filter, value, vocabulary)), 'or') };
  }
  switch (name) {
    case 'q': return { title: 'Containing', value: `"${filter.q}"` };
    case 'methodClass': return { title: 'Method', value: joinWords(filter.methodClass ?? [], 'or') };
    case 'validAt': return { title: 'Valid at', value: `${filter.validAt} K` };
    case 'yearFrom': return { title: 'Published', value: `from ${filter.yearFrom}` };
    case 'yearTo': return { title: 'Published', value: `up to ${filter.yearTo}` };
    case 'valueMin': return { title: 'Value', value: valueRangeWords({ kind: filter.kind, valueMin: filter.valueMin }, unit) };
    case 'valueMax': return { title: 'Value', value: valueRangeWords({ kind: filter.kind, valueMax: filter.valueMax }, unit) };
    default: return { title: name, value: String(filter[name]) };
  }
}
