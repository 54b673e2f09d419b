import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { choice, listOrNothing, valuesOf, withChosen, type ChoiceOption, type Choices, type SentenceSource } from './choices.ts';
import { joinWords, valueWords } from './filter-words.ts';

/** The filters that say how a value was found. */
export const methodFilters = ['method', 'methodFamily', 'methodClass'] as const;

const isClass = (value: string): boolean => value === 'measured' || value === 'computed';

/** One list for the method: measured or computed, families of techniques, techniques. */
export function methodChoices({ filter, counts, vocabulary }: SentenceSource): Choices {
  const terms = vocabulary?.techniques ?? [];
  const asked = [...(filter.methodClass ?? []), ...(filter.method ?? [])];
  const options: ChoiceOption[] = [
    ...(counts?.methodClass ?? []).map(({ value, count }) => ({
      value: choice('method', value), label: valueWords('method', value), count, also: value === 'measured' ? 'experiment experimental' : 'theory theoretical calculated', section: 'any of a kind',
    })),
    ...(counts?.methodFamily ?? []).map(({ value, count }) => ({
      value: choice('methodFamily', value), label: familyWords(value), count, section: 'families',
      also: terms.filter(({ data }) => data['family'] === value).map(({ label }) => label).join(', '),
    })),
    ...(counts?.method ?? []).map(({ value, label, count }) => {
      const term = terms.find(({ code }) => code === value);
      return { value: choice('method', value), label, count, also: [value, ...(term?.synonyms ?? [])].join(', '), section: 'techniques', ...(/^[A-Z\d/-]{2,6}$/.test(value) && value !== label ? { group: value } : {}) };
    }),
  ];
  const chosen = [...new Set(asked)].map((value) => choice('method', value)).concat((filter.methodFamily ?? []).map((value) => choice('methodFamily', value)));
  const label = (value: string) => options.find((one) => one.value === choice('method', value))?.label ?? valueWords('method', value, vocabulary, counts);
  return {
    counted: Boolean(counts),
    options: withChosen(options, chosen, (value) => ({ value, label: label(value.replace(/^\w+:/, '')), ...(counts ? { count: 0 } : {}), section: 'chosen' })),
    chosen,
    words: chosen.length === 0 ? null : methodWords(filter, label),
    equation: null,
    change: (next, toggled) => {
      const methods = valuesOf(next, 'method');
      const families = valuesOf(next, 'methodFamily');
      // A technique within a family, or a family beside a technique, would both have to hold: the last chosen stands.
      const byFamily = toggled === undefined ? families.length > 0 : toggled.startsWith('methodFamily:') ? families.length > 0 : methods.length === 0;
      return { methodClass: undefined, method: byFamily ? undefined : listOrNothing(methods), methodFamily: byFamily ? listOrNothing(families) : undefined };
    },
  };
}

/** A family of techniques in words: "DFT methods", "desorption methods". */
function familyWords(family: string): string {
  return `${family} methods`;
}

/** By which methods, as the sentence says it. */
export function methodWords({ method = [], methodFamily = [], methodClass = [] }: EntryFilter, label: (method: string) => string): string {
  const asked = [...new Set([...methodClass, ...method])];
  const classes = asked.filter(isClass);
  const named = asked.length > 2 && classes.length === 0 ? `${asked.length} methods` : joinWords(asked.map(label), 'or');
  return [named, joinWords(methodFamily.map(familyWords), 'or')].filter(Boolean).join(' among ');
}
