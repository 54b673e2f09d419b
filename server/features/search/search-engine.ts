import type { Position } from '#server/db/keyset.ts';
import type { EntryFilter, GroupBy, GroupHead, SortKey } from '#shared/contracts/entry-search.ts';
import type { State } from '#shared/domain/states.ts';

/** Steps that a text stands for: of these keys, or of these classes and holding these species (any of each inner list). */
export interface StepPattern {
  keys?: readonly string[] | undefined;
  classes?: readonly string[] | undefined;
  species?: readonly (readonly string[])[] | undefined;
}

/** What is looked for, with every word brought to what the store compares. An empty list finds nothing; `undefined` asks nothing. */
export interface SearchFilter extends Omit<EntryFilter, 'step' | 'state' | 'methodFamily'> {
  /** Any of these. */
  step?: readonly StepPattern[] | undefined;
  /** Techniques of the families asked for, in lower case. */
  methodFamily?: readonly string[] | undefined;
  accession?: string[] | undefined;
  /** Accessions of the entries in the collections asked for. */
  collection?: string[] | undefined;
}

export type FilterName = keyof SearchFilter;

/** Whose rows may be found: accepted ones by all, others by those who may know of them. */
export interface Visibility {
  states: readonly State[];
  /** Whose rows that are not accepted: everybody's, one person's, or nobody's. */
  unaccepted: 'everybody' | 'nobody' | { of: string };
}

/** One question to the engine. */
export interface Ask {
  filter: SearchFilter;
  visible: Visibility;
}

export interface PageRequest {
  sort: SortKey;
  groupBy: GroupBy | undefined;
  /** Temperature of interest, for the sort by k [K]. */
  temperatureK: number | undefined;
  limit: number;
  position: Position | null;
}

/** A group by what it is called in the store. */
export interface GroupName {
  key: string;
  direction: number | null;
}

export interface FoundPage {
  revisionIds: string[];
  /** The groups these rows belong to, each once. */
  groups: GroupName[];
  next: Position | null;
}

export interface Counted {
  value: string;
  count: number;
}

/** Filters whose values are counted. */
export const countedFilters = [
  'kind', 'metal', 'step', 'stepClass', 'method', 'methodClass', 'facet', 'site', 'scope', 'provenance', 'energyType', 'sampleType', 'species', 'contains', 'bond', 'cleavage',
  'formula', 'support', 'promoter', 'methodFamily', 'source', 'hasUncertainty',
] as const;
export type CountedFilter = (typeof countedFilters)[number];
export type Counts = Record<CountedFilter, (Counted & { label: string | null })[]>;

export interface SummaryFigures {
  sources: number;
  measured: number;
  computed: number;
  /** Energies with a value: bounds and ranges left out [kJ/mol]. */
  energies: number;
  median: number | null;
  low: number | null;
  high: number | null;
  /** Whether there are energies among them that must not be mixed. */
  unlike: boolean;
  /** Energies that can be drawn, bounds and ranges among them. */
  drawn: number;
}

export interface SummaryPoint {
  accession: string;
  value: number;
  bound: string;
  methodClass: string;
  label: string;
}

/**
 * What answers searches. The service knows nothing of how: another engine can stand behind this as long as it finds the same rows.
 * Every answer leaves out what `visible` does not allow, counts included.
 */
export interface SearchEngine {
  page(ask: Ask, request: PageRequest): Promise<FoundPage>;
  /** How many parts the position of a page has. */
  positionWidth(sort: SortKey, groupBy: GroupBy | undefined): number;
  total(ask: Ask, without?: readonly FilterName[]): Promise<number>;
  /** How many would be found without each filter in force, those without effect left out. */
  totalsWithoutEach(ask: Ask): Promise<{ filter: FilterName; total: number }[]>;
  /** Measured entries that only the lack of a stated range keeps out. */
  totalWithoutRange(ask: Ask): Promise<number>;
  /** Counts of the values of every list filter, each leaving its own filter aside, at most 200 values each. */
  counts(ask: Ask): Promise<Counts>;
  /** Counts by state, over all rows that may be seen whatever the states asked for. */
  countsByState(ask: Ask): Promise<Counted[]>;
  /** The commonest facets. */
  facets(ask: Ask, most: number): Promise<Counted[]>;
  figures(ask: Ask): Promise<SummaryFigures>;
  points(ask: Ask, most: number): Promise<SummaryPoint[]>;
  histogram(ask: Ask, low: number, high: number, bins: number): Promise<number[]>;
  /** The heads of the groups named. */
  heads(ask: Ask, by: GroupBy, names: readonly GroupName[]): Promise<GroupHead[]>;
  /** Groups from the largest on. */
  groups(ask: Ask, by: GroupBy, request: { limit: number; position: Position | null }): Promise<{ heads: GroupHead[]; total: number; next: Position | null }>;
  /** For words that nothing listed has: near spellings that something has, the nearest by letters first. */
  nearWords(words: readonly string[]): Promise<Map<string, string[]>>;
}
