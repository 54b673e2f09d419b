import type { NearMiss } from '#shared/contracts/entry-search.ts';
import { methodClasses, type MethodClass } from '#shared/domain/kinds.ts';
import type { Ask, SearchEngine, SearchFilter } from './search-engine.ts';
import type { VocabularyNames } from './vocabulary-names.ts';

/** The class of step that undoes one; a class that undoes itself is not listed. */
const reverseClass = new Map(Object.entries({
  'adsorption': 'desorption', 'desorption': 'adsorption', 'dissociative-adsorption': 'associative-desorption', 'associative-desorption': 'dissociative-adsorption',
  'dissociation': 'association', 'association': 'dissociation', 'hydrogenation': 'dehydrogenation', 'dehydrogenation': 'hydrogenation',
}));

const mostFacets = 3;

interface Proposal {
  kind: NearMiss['kind'];
  filter: SearchFilter;
  change: NearMiss['change'];
}

const reversed = (classes: readonly string[]): string[] => classes.flatMap((one) => reverseClass.get(one) ?? []);

/** The same question about the reverse step, where the question said a direction. */
function reverseStep(filter: SearchFilter): Proposal[] {
  if (filter.stepClass) {
    const stepClass = reversed(filter.stepClass);
    return stepClass.length > 0 ? [{ kind: 'reverse-step', filter: { ...filter, stepClass }, change: { stepClass } }] : [];
  }
  const [pattern, ...more] = filter.step ?? [];
  if (!pattern?.classes || more.length > 0 || (pattern.species?.length ?? 0) > 1) return [];
  const stepClass = reversed(pattern.classes);
  const species = pattern.species?.[0] ? [...pattern.species[0]] : null;
  if (stepClass.length === 0 || (species && filter.species)) return [];
  return [{
    kind: 'reverse-step', filter: { ...filter, step: undefined, stepClass, ...(species ? { species } : {}) }, change: { step: null, stepClass, ...(species ? { species } : {}) },
  }];
}

/** Measured where computed was asked for, and the other way round. */
function otherMethodClass(filter: SearchFilter, names: VocabularyNames): Proposal[] {
  const isClass = (text: string): text is MethodClass => (methodClasses as readonly string[]).includes(text);
  const asked = new Set<string>([
    ...(filter.methodClass ?? []), ...(filter.method ?? []).flatMap((one) => (isClass(one) ? [one] : names.find('technique', one).map(({ data }) => String(data['class'])))),
    ...(filter.methodFamily ?? []).flatMap((one) => names.find('technique', one).map(({ data }) => String(data['class']))),
  ]);
  const [one, ...more] = asked;
  if (one === undefined || more.length > 0 || !isClass(one)) return [];
  const methodClass: MethodClass[] = [one === 'measured' ? 'computed' : 'measured'];
  const away = Object.fromEntries((['method', 'methodFamily'] as const).filter((name) => filter[name]).map((name) => [name, null]));
  return [{ kind: 'other-method-class', filter: { ...filter, method: undefined, methodFamily: undefined, methodClass }, change: { ...away, methodClass } }];
}

/** What lies near a question that finds nothing: only what there is, each with its count and the change of filters that leads there. */
export async function findNearMisses(engine: SearchEngine, { filter, visible }: Ask, names: VocabularyNames): Promise<NearMiss[]> {
  const proposals = [...reverseStep(filter), ...otherMethodClass(filter, names)];
  if (filter.metal) {
    const contains = [...filter.metal];
    proposals.push({ kind: 'alloys-containing', filter: { ...filter, metal: undefined, contains }, change: { metal: null, contains } });
  }
  const onFacets = filter.facet && (filter.metal ?? filter.formula ?? filter.contains)
    ? (await engine.facets({ filter: { ...filter, facet: undefined }, visible }, mostFacets)).map(({ value, count }): NearMiss => ({ kind: 'other-facet', count, change: { facet: [value] } })) : [];
  const others = await Promise.all(proposals.map(async ({ kind, change, filter: near }): Promise<NearMiss> => ({ kind, change, count: await engine.total({ filter: near, visible }) })));
  return [...onFacets, ...others].filter(({ count }) => count > 0);
}
