import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Vocabulary } from '#shared/contracts/vocabulary.ts';
import { furtherParts, joinWords, kindPart, mainParts, nameParts, validWords, valueWords } from './filter-words.ts';
import { metalGroups } from './metal-groups.ts';
import { metalFilters, metalWords } from './metal-choices.ts';
import { methodFilters, methodWords } from './method-choices.ts';
import { isSet } from './search-state.ts';
import { stepFilters, stepWords } from './step-choices.ts';

/** The sentence as it is read aloud. */
export function spokenSentence(
  filter: EntryFilter, vocabulary?: Vocabulary, counts?: AllFilterCounts | null, collections?: readonly { id: string; name: string }[],
): string {
  const any = (names: readonly (keyof EntryFilter)[]) => names.some((name) => isSet(filter[name]));
  const kinds = (filter.kind ?? []).map((kind) => valueWords('kind', kind));
  const step = (key: string) => valueWords('step', key, vocabulary, counts);
  const method = (code: string) => valueWords('method', code, vocabulary, counts);
  const main = [
    `${kindPart.before} ${kinds.length > 0 ? joinWords(kinds) : kindPart.unset}`,
    `${mainParts.step.before} ${any(stepFilters) ? stepWords(filter, step) : mainParts.step.unset}`,
    `${mainParts.metal.before} ${any(metalFilters) ? metalWords(filter, metalGroups(vocabulary?.metals ?? []), true) : mainParts.metal.unset}`,
    `${mainParts.method.before} ${any(methodFilters) ? methodWords(filter, method) : mainParts.method.unset}`,
  ].join(' ');
  const further = furtherParts.filter((part) => isSet(filter[part.filter])).map((part) => {
    const held = filter[part.filter];
    const values = (Array.isArray(held) ? held : [String(held)]) as readonly string[];
    const say = (value: string) => (part.filter === 'collection' ? collections?.find(({ id }) => id === value)?.name ?? 'a collection of yours' : valueWords(part.filter, value, vocabulary, counts));
    return `, ${part.before} ${joinWords(values.map(say), 'or')}`;
  });
  const names = nameParts.filter((part) => isSet(filter[part.filter])).map((part) => `, ${part.before} ${joinWords(filter[part.filter] ?? [], 'or')}`);
  const valid = validWords(filter);
  return `${main}, valid ${valid.before} ${valid.words ?? 'any temperature'}${further.join('')}${names.join('')}.`;
}
