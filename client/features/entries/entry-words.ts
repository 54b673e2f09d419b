import { provenanceWords } from '#shared/domain/kinds.ts';
import type { Entry } from '#shared/contracts/entries.ts';

/** Words in frames beside the method: what sets this value apart from a measured one of an elementary step. */
export function methodTags(entry: Entry): string[] {
  const tags: string[] = [];
  if (entry.method.class === 'computed') tags.push('computed');
  if (entry.scope === 'apparent' || entry.scope === 'lumped') tags.push(entry.scope);
  if (entry.provenance && !['measured', 'computed'].includes(entry.provenance)) tags.push(provenanceWords[entry.provenance]);
  return tags;
}

/** How the value was found, short: "TPD", "DFT, PBE". */
export function methodText(entry: Entry): string {
  const { technique, class: methodClass } = entry.method;
  const { functional } = entry.conditions;
  return [technique ?? methodClass, functional && !technique?.includes(functional) ? functional : null].filter(Boolean).join(', ') || 'not reported';
}

/** The class of an elementary step in words. */
export function classWords(stepClass: string): string {
  return stepClass.replace(/-/g, ' ').replace('eley rideal', 'Eley–Rideal');
}

const titles: Readonly<Record<string, string>> = {
  adsorption: 'Adsorption on',
  'dissociative-adsorption': 'Dissociative adsorption on',
  desorption: 'Desorption from',
  'associative-desorption': 'Associative desorption from',
};

/** What an entry is about, in plain words: "Associative desorption from Ru(0001)". */
export function entryTitle({ step, surface }: Pick<Entry, 'step' | 'surface'>): string {
  const where = surface?.label ?? 'a surface not given yet';
  if (!step) return `An elementary step not given yet on ${where}`;
  const words = classWords(step.class);
  return `${titles[step.class] ?? `${words.replace(/^./, (first) => first.toUpperCase())} on`} ${where}`;
}
