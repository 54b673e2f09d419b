import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import { choice, listOrNothing, valuesOf, withChosen, type ChoiceOption, type Choices, type SentenceSource } from './choices.ts';
import { joinWords } from './filter-words.ts';
import { groupOfExactly, metalGroups, type MetalGroup } from './metal-groups.ts';

/** The filters that say which material is meant. */
export const metalFilters = ['metal', 'formula', 'contains'] as const;

/** Metals that are said by name; more are counted. */
const sayUpTo = 5;

const isPure = (formula: string): boolean => /^[A-Z][a-z]?$/.test(formula);

/** The pure metals and the alloys asked for: the filter by formula holds both, since different filters are AND. */
function materials({ metal = [], formula = [] }: EntryFilter): { metals: string[]; alloys: string[] } {
  return { metals: [...new Set([...metal, ...formula.filter(isPure)])], alloys: formula.filter((one) => !isPure(one)) };
}

/** One list for the material: metals, groups of metals, alloys by formula, and everything that contains a metal. */
export function metalChoices({ filter, counts, vocabulary }: SentenceSource): Choices {
  const terms = vocabulary?.metals ?? [];
  const groups = metalGroups(terms);
  const { metals, alloys } = materials(filter);
  const contains = filter.contains ?? [];
  const counted = new Map((counts?.metal ?? []).map(({ value, count }) => [value, count]));
  const nameOf = (symbol: string) => terms.find(({ code }) => code === symbol)?.label ?? '';
  const also = (symbol: string) => [nameOf(symbol), ...(terms.find(({ code }) => code === symbol)?.synonyms ?? [])].join(', ');
  const groupIsChosen = (group: MetalGroup) => contains.length === 0 && group.metals.every((metal) => metals.includes(metal));
  const options: ChoiceOption[] = [
    ...(counts?.metal ?? []).map(({ value, count }) => ({ value: choice('metal', value), label: value, count, also: also(value), group: nameOf(value), section: 'metals' })),
    ...(counts ? terms : []).filter(({ code }) => !counted.has(code)).map(({ code, label }) => ({
      value: choice('metal', code), label: code, count: 0, also: also(code), group: label, section: 'metals', deep: true,
    })),
    ...groups.map((group) => ({
      value: choice('group', group.code), label: group.name, also: `${group.also} ${group.metals.join(' ')}`, group: group.metals.join(', '), section: 'groups of metals',
      ...(counts ? { count: group.metals.reduce((sum, metal) => sum + (counted.get(metal) ?? 0), 0) } : {}),
    })),
    ...(counts?.formula ?? []).filter(({ value }) => !isPure(value)).map(({ value, label, count }) => ({
      value: choice('formula', value), label, formula: value, count, also: (value.match(/[A-Z][a-z]?/g) ?? []).map(nameOf).join(' '), section: 'alloys',
    })),
    ...(counts?.contains ?? []).map(({ value, count }) => ({
      value: choice('contains', value), label: `${value} and its alloys`, count, also: `${also(value)}, containing`, section: 'a metal and its alloys',
    })),
  ];
  const chosen = [
    ...metals.map((value) => choice('metal', value)), ...alloys.map((value) => choice('formula', value)), ...contains.map((value) => choice('contains', value)),
  ];
  return {
    counted: Boolean(counts),
    options: withChosen(options, chosen, (value) => ({ value, label: value.replace(/^contains:(.*)/, '$1 and its alloys').replace(/^\w+:/, ''), ...(counts ? { count: 0 } : {}), section: 'chosen' })),
    chosen: [...chosen, ...groups.filter(groupIsChosen).map(({ code }) => choice('group', code))],
    words: chosen.length === 0 ? null : metalWords(filter, groups),
    equation: null,
    change: (next, toggled) => metalChange(filter, groups, next, toggled),
  };
}

function metalChange(filter: EntryFilter, groups: readonly MetalGroup[], next: readonly string[], toggled: string | undefined): Partial<EntryFilter> {
  const contains = valuesOf(next, 'contains');
  const adds = toggled !== undefined && next.includes(toggled);
  // "Ru and its alloys" says more than "Ru": the two are not asked together, for that would be the narrower of both.
  if (adds && toggled.startsWith('contains:')) return { metal: undefined, formula: undefined, contains };
  const group = groups.find(({ code }) => toggled === choice('group', code));
  let metals = valuesOf(next, 'metal');
  if (group) metals = adds ? [...new Set([...metals, ...group.metals])] : metals.filter((metal) => !group.metals.includes(metal));
  const alloys = valuesOf(next, 'formula');
  return {
    ...(alloys.length > 0 ? { metal: undefined, formula: [...metals, ...alloys] } : { metal: listOrNothing(metals), formula: undefined }),
    contains: adds && filter.contains ? undefined : listOrNothing(contains),
  };
}

/** Which material is asked for: listed as on a blackboard ("Ru, Ni"), or joined as in speech ("Ru or Ni"). */
export function metalWords(filter: EntryFilter, groups: readonly MetalGroup[] = [], spoken = false): string {
  const { metals, alloys } = materials(filter);
  const all = [...metals, ...alloys];
  const group = alloys.length === 0 ? groupOfExactly(metals, groups) : null;
  const named = group ? group.name : all.length > sayUpTo ? `${all.length} ${alloys.length > 0 ? 'materials' : 'metals'}` : spoken ? joinWords(all, 'or') : all.join(', ');
  const { contains = [] } = filter;
  if (contains.length === 0) return named;
  const alloysOf = `${joinWords(contains, 'or')} and ${contains.length === 1 ? 'its' : 'their'} alloys`;
  return named ? `${named}, among ${alloysOf}` : alloysOf;
}
