import type { ValueCount } from '#shared/contracts/entry-search-answers.ts';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Term } from '#shared/contracts/vocabulary.ts';
import type { TypedOption } from '#client/ui/picker.tsx';
import { choice, listOrNothing, valuesOf, withChosen, type ChoiceOption, type Choices, type SentenceSource } from './choices.ts';
import { classWords } from './entry-words.ts';
import { joinWords, valueWords } from './filter-words.ts';
import { namesOfSpecies, speciesOf } from './species-names.ts';

/** The filters that say which elementary steps are meant. */
export const stepFilters = ['step', 'stepClass', 'species', 'bond', 'cleavage'] as const;

/** Both directions of a step have one key, so that its reverse is found by the words of its own class, too. */
const reverseClass: Readonly<Record<string, string>> = {
  'adsorption': 'desorption', 'desorption': 'adsorption', 'dissociative-adsorption': 'associative-desorption', 'associative-desorption': 'dissociative-adsorption',
  'dissociation': 'association', 'association': 'dissociation', 'hydrogenation': 'dehydrogenation', 'dehydrogenation': 'hydrogenation',
};

/** Steps and species beyond the commonest are found by typing; the list itself stays short. */
const commonest = 12;

const looksLikeEquation = (text: string): boolean => /->|=|→|⇌|↔|<-/.test(text);

function namesOfClass(stepClass: string | undefined, classes: readonly Term[]): string {
  if (stepClass === undefined) return '';
  return [stepClass, reverseClass[stepClass]].flatMap((code) => {
    const term = classes.find((one) => one.code === code);
    return code ? [classWords(code), ...(term?.synonyms ?? [])] : [];
  }).join(', ');
}

const rare = (index: number): Pick<ChoiceOption, 'deep'> => (index < commonest ? {} : { deep: true });

/** One list for the elementary step: by equation, class, species, bond and the way a bond breaks, each setting its own filter. */
export function stepChoices({ filter, counts, vocabulary }: SentenceSource): Choices {
  const steps = vocabulary?.steps ?? [];
  const classes = vocabulary?.stepClasses ?? [];
  const made = (name: (typeof stepFilters)[number], values: readonly ValueCount[] | undefined, section: string, extra: (value: string, label: string, index: number) => Partial<ChoiceOption>): ChoiceOption[] =>
    (values ?? []).map(({ value, label, count }, index) => ({ value: choice(name, value), label, count, section, ...extra(value, label, index) }));
  const options = [
    ...made('step', counts?.step, 'by equation', (value, label, index) => {
      const stepClass = steps.find(({ code }) => code === value)?.data['class'];
      const known = typeof stepClass === 'string' ? stepClass : undefined;
      return {
        equation: label, ...rare(index), ...(known ? { group: classWords(known) } : {}),
        also: [namesOfClass(known, classes), ...speciesOf(label).flatMap((formula) => [formula, namesOfSpecies(formula)])].join(', '),
      };
    }),
    ...made('stepClass', counts?.stepClass, 'by class', (value) => ({ label: classWords(value), also: classes.find(({ code }) => code === value)?.synonyms.join(', ') ?? '' })),
    ...(counts ? classes : []).filter(({ code }) => !counts?.stepClass.some(({ value }) => value === code)).map(({ code, synonyms }) => ({
      value: choice('stepClass', code), label: classWords(code), count: 0, also: synonyms.join(', '), section: 'by class', deep: true,
    })),
    ...made('species', counts?.species, 'by species', (value, _, index) => ({ label: `with ${value}`, formula: value, ...rare(index), also: [value, namesOfSpecies(value)].join(', '), group: namesOfSpecies(value).split(',')[0] ?? '' })),
    ...made('bond', counts?.bond, 'by bond', (value) => ({ label: `bond ${bondWords(value)}`, also: `${value} ${value.replaceAll('-', '')} breaking forming scission` })),
    ...made('cleavage', counts?.cleavage, 'by bond', (value) => ({ label: `${valueWords('cleavage', value)} cleavage` })),
  ];
  const chosen = stepFilters.flatMap((name) => ((filter[name] ?? []) as readonly string[]).map((value) => choice(name, value)));
  const label = (value: string) => counts?.step.find((one) => one.value === value)?.label ?? steps.find(({ code }) => code === value)?.label ?? value;
  const only = filter.step?.length === 1 && chosen.length === 1 ? label(filter.step[0] as string) : null;
  return {
    counted: Boolean(counts),
    options: withChosen(options, chosen, (value) => chosenStep(value, label)),
    chosen,
    words: chosen.length === 0 ? null : stepWords(filter, label),
    equation: only !== null && looksLikeEquation(only) ? only : null,
    change: (next) => Object.fromEntries(stepFilters.map((name) => [name, listOrNothing(valuesOf(next, name))])),
  };
}

/** A chosen step, class or species that the counts do not list. */
function chosenStep(value: string, label: (step: string) => string): ChoiceOption {
  const name = stepFilters.find((one) => value.startsWith(`${one}:`)) ?? 'step';
  const bare = value.slice(name.length + 1);
  if (name !== 'step') return { value, label: valueWords(name, bare), section: 'chosen' };
  const words = label(bare);
  return { value, label: words, section: 'chosen', ...(looksLikeEquation(words) ? { equation: words } : {}) };
}

/** A bond with a dash between its atoms. */
function bondWords(bond: string): string {
  return bond.replaceAll('-', '–');
}

/** Which elementary steps are asked for, as the sentence says it: "dehydrogenation with NH3 at the N–H bond". */
export function stepWords(filter: EntryFilter, label: (step: string) => string = (step) => step): string {
  const { step = [], stepClass = [], species = [], bond = [], cleavage = [] } = filter;
  const [one] = step;
  const named = one !== undefined ? (step.length === 1 ? label(one) : `${step.length} elementary steps`) : null;
  const head = [named, stepClass.length > 0 ? joinWords(stepClass.map(classWords), 'or') : null].filter((words) => words !== null).join(' of class ');
  return [
    head || 'any step',
    species.length > 0 ? `with ${joinWords(species, 'or')}` : '',
    bond.length > 0 ? `at the ${joinWords(bond.map(bondWords), 'or')} bond` : '',
    cleavage.length > 0 ? `by ${joinWords(cleavage.map((value) => valueWords('cleavage', value)), 'or')} cleavage` : '',
  ].filter(Boolean).join(' ');
}

/** An equation or words as they are typed: the server reads them, and says how. A key that is in the list is offered under its own equation. */
export function typedStep(typed: string, options: readonly ChoiceOption[], key: string | null): TypedOption | null {
  if (typed.length < 2 || typed.length > 500) return null;
  const known = key === null ? undefined : options.find(({ value }) => value === choice('step', key));
  if (known) return { option: known, first: true };
  const equation = looksLikeEquation(typed);
  return { option: { value: choice('step', typed), label: equation ? typed : `“${typed}”`, group: equation ? 'as typed' : 'read as words' }, first: equation };
}

/** Whether a text is meant as an equation, so that it is worth being read as one. */
export const isEquation = looksLikeEquation;
