import type { Csl, CslName } from './csl.ts';
import { plainText } from './rich-text.ts';

/**
 * Gives the title of a citation without marks; the container's title, then "Untitled", where there is none.
 *
 * @example titleText({ type: 'article-journal', title: 'CH<sub>4</sub> on Ni' }) === 'CH4 on Ni'
 */
export function titleText(csl: Csl): string {
  return plainText(csl.title ?? csl['container-title'] ?? '') || 'Untitled';
}

/**
 * Gives the name by which a person or a group is called in the text: particle and family name, or the group's name.
 *
 * @example callName({ family: 'Berg', 'non-dropping-particle': 'van den' }) === 'van den Berg'
 */
export function callName(name: CslName): string {
  if (name.family === undefined) return name.literal ?? name.given ?? '';
  const particle = name['non-dropping-particle'];
  return particle === undefined ? name.family : `${particle}${/['’-]$/.test(particle) ? '' : ' '}${name.family}`;
}

function people(csl: Csl): CslName[] {
  return csl.author ?? csl.editor ?? [];
}

/**
 * Gives the authors as a reader would say them: one, two joined by "&", or the first with "et al."; editors where there are no authors.
 *
 * @example authorsText({ type: 'book', author: [{ family: 'Vantongeren' }, { family: 'Osei-Brandt' }] }) === 'Vantongeren & Osei-Brandt'
 */
export function authorsText(csl: Csl): string {
  const names = people(csl).map(callName).filter((name) => name !== '');
  if (names.length === 0) return 'Anonymous';
  if (names.length > 2) return `${names[0] ?? ''} et al.`;
  return names.join(' & ');
}

/**
 * Gives the year of publication, or null where the source states none.
 *
 * @example yearOf({ type: 'book', issued: { 'date-parts': [[1994, 6]] } }) === 1994
 */
export function yearOf(csl: Csl): number | null {
  return csl.issued?.['date-parts']?.[0]?.[0] ?? null;
}

/**
 * Gives the shortest label that names a source: first author and year, or "n.d." where there is no year.
 *
 * @example shortLabel({ type: 'book', author: [{ family: 'Vantongeren' }], issued: { 'date-parts': [[1994]] } }) === 'Vantongeren 1994'
 */
export function shortLabel(csl: Csl): string {
  const first = people(csl).map(callName).find((name) => name !== '') ?? 'Anonymous';
  return `${first} ${yearOf(csl) ?? 'n.d.'}`;
}

/**
 * Gives the journal, book or series a work appeared in, or its publisher, or null.
 *
 * @example containerText({ type: 'thesis', publisher: 'University of Nowhere' }) === 'University of Nowhere'
 */
export function containerText(csl: Csl): string | null {
  return csl['container-title'] ?? csl.publisher ?? null;
}
