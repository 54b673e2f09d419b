import { energyTypeWords, kindWords, provenanceWords, sampleTypeWords, type EnergyType, type Kind, type Provenance, type SampleType } from '#shared/domain/kinds.ts';
import { stateWords, type State } from '#shared/domain/states.ts';
import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Term, Vocabulary } from '#shared/contracts/vocabulary.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, setNumber } from '#client/lib/numbers.ts';
import { isSet, type FilterName } from './search-state.ts';

/** Filters whose values are chosen from a list of their own. */
export const listFilters = [
  'kind', 'facet', 'site', 'sampleType', 'support', 'promoter', 'scope', 'energyType', 'provenance', 'source', 'hasUncertainty', 'state', 'collection',
] as const satisfies readonly FilterName[];
export type ListFilter = (typeof listFilters)[number];

/** A part of the query sentence: the words before its picker, the words of the picker while nothing is chosen, and how many are said. */
export interface SentencePart {
  filter: ListFilter;
  before: string;
  unset: string;
  /** The heading of the picker. */
  title: string;
  /** "3 facets", once the values are too many or too long to be said. */
  several: string;
  /** The most values that the sentence says by name. */
  sayUpTo: number;
  /** One value at most: another choice takes its place. */
  single?: boolean;
}

/** The first part of the sentence. */
export const kindPart: SentencePart = { filter: 'kind', before: 'Show', unset: 'all entries', title: 'Kind of parameter', several: 'kinds of parameter', sayUpTo: 2 };

/** The parts that always stand in the sentence and set several filters each. */
export const mainParts = {
  step: { before: 'for', unset: 'any elementary step', title: 'Elementary step' },
  metal: { before: 'on', unset: 'any surface', title: 'Metal' },
  method: { before: 'by', unset: 'any method', title: 'Method' },
} as const;

/** The parts that join the sentence when they are set or asked for. */
export const furtherParts: readonly SentencePart[] = [
  { filter: 'facet', before: 'on facet', unset: 'any facet', title: 'Facet', several: 'facets', sayUpTo: 4 },
  { filter: 'site', before: 'at sites', unset: 'of any type', title: 'Site', several: 'site types', sayUpTo: 3 },
  { filter: 'sampleType', before: 'studied as', unset: 'any sample', title: 'Form of the sample', several: 'forms', sayUpTo: 2 },
  { filter: 'support', before: 'supported on', unset: 'any support', title: 'Support', several: 'supports', sayUpTo: 3 },
  { filter: 'promoter', before: 'with', unset: 'any promoter or none', title: 'Promoter', several: 'promoters', sayUpTo: 3 },
  { filter: 'scope', before: 'of scope', unset: 'any scope', title: 'Scope', several: 'scopes', sayUpTo: 3 },
  { filter: 'energyType', before: 'with energy given as', unset: 'any type', title: 'Type of energy', several: 'types of energy', sayUpTo: 2 },
  { filter: 'provenance', before: 'being', unset: 'of any provenance', title: 'Provenance', several: 'kinds of provenance', sayUpTo: 2 },
  { filter: 'hasUncertainty', before: 'with', unset: 'uncertainty known or not', title: 'Standard uncertainty', several: '', sayUpTo: 1, single: true },
  { filter: 'source', before: 'from', unset: 'any source', title: 'Source', several: 'sources', sayUpTo: 2 },
  { filter: 'state', before: 'in state', unset: 'accepted', title: 'State', several: 'states', sayUpTo: 3 },
  { filter: 'collection', before: 'kept in', unset: 'any of your collections', title: 'Your collection', several: 'collections', sayUpTo: 2 },
];

/** The parts of the sentence that are typed: names that are in no list. */
export const nameParts = [
  { filter: 'author', before: 'written by', unset: 'anybody', title: 'Author', hint: 'Family name; several with commas between them.' },
  { filter: 'contributor', before: 'contributed by', unset: 'anybody', title: 'Contributor', hint: 'Public name as shown with the entry; several with commas between them.' },
] as const;
export type NameFilter = (typeof nameParts)[number]['filter'];

const vocabularyOf: Partial<Record<FilterName, keyof Vocabulary>> = {
  metal: 'metals', contains: 'metals', facet: 'facets', method: 'techniques', stepClass: 'stepClasses', step: 'steps', support: 'supports',
};

/** The terms of the vocabulary that a filter draws on. */
export function termsOf(filter: FilterName, vocabulary: Vocabulary | undefined): readonly Term[] {
  const name = vocabularyOf[filter];
  return name && vocabulary ? vocabulary[name] : [];
}

const promoterWords: Readonly<Record<string, string>> = { none: 'no promoter', any: 'any promoter' };

/** A value of a filter in words, as the sentence and the pickers say it. */
export function valueWords(filter: FilterName, value: string, vocabulary?: Vocabulary, counts?: AllFilterCounts | null): string {
  switch (filter) {
    case 'kind': return kindWords[value as Kind] ?? value;
    case 'energyType': return energyTypeWords[value as EnergyType] ?? value;
    case 'provenance': return provenanceWords[value as Provenance] ?? value;
    case 'sampleType': return sampleTypeWords[value as SampleType] ?? value;
    case 'state': return stateWords[value as State] ?? value;
    case 'site': return siteWords(value);
    case 'stepClass':
    case 'cleavage': return value.replaceAll('-', ' ').replace('eley rideal', 'Eley–Rideal');
    case 'promoter': return promoterWords[value] ?? value;
    case 'hasUncertainty': return value === 'true' ? 'a known standard uncertainty' : 'no known standard uncertainty';
    case 'metal':
    case 'contains':
    case 'facet': return value;
    case 'method': if (value === 'measured' || value === 'computed') return `any ${value} method`;
  }
  const counted = counts?.[filter as keyof AllFilterCounts]?.find((one) => one.value === value)?.label;
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

/** The temperatures a value must hold at, with the word before them: at one, or over a range as a whole. */
export function validWords({ validAt, validFrom, validTo }: EntryFilter): { before: 'at' | 'over'; words: string | null } {
  const both = validFrom !== undefined && validTo !== undefined;
  const range = both ? `${validFrom} to ${validTo} K` : validFrom !== undefined || validTo !== undefined ? `${validFrom ?? validTo} K` : null;
  if (validAt === undefined) return { before: both ? 'over' : 'at', words: range };
  return { before: 'at', words: range ? `${validAt} K and ${both ? 'over' : 'at'} ${range}` : `${validAt} K` };
}

/** A filter in force, said whole, as for taking it away: "elementary step: N* + N* -> N2 + 2*". */
export function filterWords(name: FilterName, filter: EntryFilter, unit: EnergyUnit, vocabulary?: Vocabulary): { title: string; value: string } {
  if (!isSet(filter[name])) return { title: name, value: '' };
  const values = (Array.isArray(filter[name]) ? filter[name] : [String(filter[name])]) as readonly string[];
  const title = titles[name] ?? [kindPart, ...furtherParts, ...nameParts].find((one) => one.filter === name)?.title ?? name;
  switch (name) {
    case 'q': return { title, value: `"${filter.q}"` };
    case 'validAt':
    case 'validFrom':
    case 'validTo': return { title: `Valid ${validWords(filter).before}`, value: validWords(filter).words ?? '' };
    case 'yearFrom': return { title, value: `from ${filter.yearFrom}` };
    case 'yearTo': return { title, value: `up to ${filter.yearTo}` };
    case 'valueMin': return { title, value: valueRangeWords({ kind: filter.kind, valueMin: filter.valueMin }, unit) };
    case 'valueMax': return { title, value: valueRangeWords({ kind: filter.kind, valueMax: filter.valueMax }, unit) };
    default: return { title, value: joinWords(values.map((value) => valueWords(name, value, vocabulary)), 'or') };
  }
}

const titles: Partial<Record<FilterName, string>> = {
  q: 'Containing', step: 'Elementary step', stepClass: 'Class of elementary step', species: 'Species', bond: 'Bond', cleavage: 'How the bond breaks', metal: 'Metal', formula: 'Formula',
  contains: 'Containing the metal', method: 'Method', methodClass: 'Method', methodFamily: 'Family of methods', yearFrom: 'Published', yearTo: 'Published', valueMin: 'Value', valueMax: 'Value',
};

/** What the filter by valid range left out without knowing. */
export function statedRangeWords(count: number, validAt: number | undefined): string {
  return `${count} measured ${count === 1 ? 'entry is' : 'entries are'} left out because the source states no valid range${validAt === undefined ? '' : `, so that it is not known whether the value holds at ${validAt} K`}.`;
}
