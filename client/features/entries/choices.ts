import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import type { PickerOption } from '#client/ui/picker.tsx';

/** What the parts of the sentence are made from. */
export interface SentenceSource {
  filter: EntryFilter;
  counts: AllFilterCounts | null | undefined;
  vocabulary: Vocabulary | undefined;
}

/** A choice in a list; an equation or a formula is set as such in the place of its label. */
export interface ChoiceOption extends PickerOption {
  equation?: string;
  formula?: string;
}

/** A part of the sentence that sets several filters from one list. */
export interface Choices {
  /** Whether the counts are there that say what there is to choose from. */
  counted: boolean;
  options: ChoiceOption[];
  chosen: string[];
  /** The part in words; `unset` of the part stands where nothing is chosen. */
  words: string | null;
  /** The part is one equation, to be set as such. */
  equation: string | null;
  /** The change of the filters when this is chosen next, with the one choice that was made or taken back. */
  change: (next: readonly string[], toggled: string | undefined) => Partial<EntryFilter>;
}

/** A choice in a list that sets several filters: which filter, and its value. */
export function choice(filter: string, value: string): string {
  return `${filter}:${value}`;
}

/** The values that belong to one filter among the choices of a list. */
export function valuesOf(choices: readonly string[], filter: string): string[] {
  return choices.filter((one) => one.startsWith(`${filter}:`)).map((one) => one.slice(filter.length + 1));
}

/** A list for the address: nothing in the place of an empty one. */
export function listOrNothing(values: readonly string[]): string[] | undefined {
  return values.length > 0 ? [...values] : undefined;
}

/** Options for chosen values that the counts do not list: they find nothing now, and can be taken back. */
export function withChosen(options: readonly ChoiceOption[], chosen: readonly string[], make: (value: string) => ChoiceOption): ChoiceOption[] {
  const known = new Set(options.map(({ value }) => value));
  return [...options, ...chosen.filter((value) => !known.has(value)).map(make)];
}
