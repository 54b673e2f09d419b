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

const titles: Readonly<Record<string, { words: string; side: 0 | 1; place: 'on' | 'from' }>> = {
  'adsorption': { words: 'Adsorption', side: 0, place: 'on' },
  'dissociative-adsorption': { words: 'Dissociative adsorption', side: 0, place: 'on' },
  'desorption': { words: 'Desorption', side: 1, place: 'from' },
  'associative-desorption': { words: 'Associative desorption', side: 1, place: 'from' },
};

const names: Readonly<Record<string, string>> = { N2: 'nitrogen', H2: 'hydrogen', NH3: 'ammonia', D2: 'deuterium', ND3: 'deuterated ammonia', O2: 'oxygen', CO: 'carbon monoxide' };

/** The gas on one side of an equation by its name, or null when we have none for it. */
function gasName(equation: string, side: 0 | 1): string | null {
  const terms = equation.split('->')[side]?.split(' + ').map((term) => term.trim().replace(/^[\d.]+\s*/, '')) ?? [];
  const gas = terms.find((term) => !term.includes('*'));
  return gas ? names[gas] ?? null : null;
}

/** What an entry is about, in plain words: "Associative desorption of nitrogen from Ru(0001)". */
export function entryTitle({ step, surface }: Pick<Entry, 'step' | 'surface'>): string {
  const where = surface?.label ?? 'a surface not given yet';
  if (!step) return `An elementary step not given yet on ${where}`;
  const title = titles[step.class];
  if (!title) return `${classWords(step.class).replace(/^./, (first) => first.toUpperCase())} on ${where}`;
  const gas = gasName(step.equation, title.side);
  return `${title.words}${gas ? ` of ${gas}` : ''} ${title.place} ${where}`;
}
