import type { Csl } from '#shared/citations/csl.ts';
import { yearOf } from '#shared/citations/citation-text.ts';
import { writeBibtexNames } from './bibtex-names.ts';
import { anonymous, bibtexTypeOfCsl } from './bibtex-types.ts';
import { writeTex, writeTexName } from './tex-write.ts';

/** Characters that would end or unbalance a verbatim field; the percent form means the same in a DOI and in an address. */
function verbatim(text: string): string {
  return text.replace(/[{}\\\s\p{Cc}\p{Cs}"]/gu, (character) => (/\p{Cs}/u.test(character) ? '' : encodeURIComponent(character)));
}

/** The pages, or the number that stands in their place where articles have numbers. */
function pagesOf(csl: Csl, isArticle: boolean): string | undefined {
  const text = csl.page ?? (isArticle ? csl.number : undefined);
  return text === undefined ? undefined : writeTexName(text.replace(/(?<=[\p{L}\d])\s*[-–—]+\s*(?=[\p{L}\d])/gu, '–'));
}

/** Where a work of no standard kind appeared, in one line, since biber allows it no volume and no pages. */
function howPublished(csl: Csl): string | undefined {
  const place = csl['container-title'] ?? csl.publisher ?? csl.note;
  const parts = [place, csl.volume && `vol. ${csl.volume}`, csl.issue && `no. ${csl.issue}`, csl.page ?? csl.number].filter((part) => part !== undefined && part !== '');
  return parts.length === 0 ? undefined : writeTexName(parts.join(', '));
}

const withPublisher: ReadonlySet<string> = new Set(['book', 'proceedings', 'inproceedings', 'incollection']);
const partOfBook: ReadonlySet<string> = new Set(['inproceedings', 'incollection']);

/** Every field the entry can have, in the order we print them; undefined ones are left out. */
function fieldsOf(csl: Csl, type: string): [string, string | undefined][] {
  const name = (text: string | undefined): string | undefined => (text === undefined ? undefined : writeTexName(text));
  const authors = csl.author === undefined ? '' : writeBibtexNames(csl.author);
  const editors = csl.editor === undefined ? '' : writeBibtexNames(csl.editor);
  const isArticle = type === 'article';
  const isThesis = type === 'phdthesis' || type === 'mastersthesis';
  const isMisc = type === 'misc';
  const year = yearOf(csl);
  const month = csl.issued?.['date-parts']?.[0]?.[1];
  return [
    ['author', type === 'proceedings' ? undefined : authors || `{${anonymous}}`],
    ['editor', partOfBook.has(type) || type === 'proceedings' ? editors || undefined : undefined],
    ['title', csl.title === undefined ? undefined : `{${writeTex(csl.title)}}`],
    ['journal', isArticle ? name(csl['container-title']) : undefined],
    ['booktitle', partOfBook.has(type) ? name(csl['container-title']) : undefined],
    ['howpublished', isMisc ? howPublished(csl) : undefined],
    ['school', isThesis ? name(csl.publisher) : undefined],
    ['institution', type === 'techreport' ? name(csl.publisher) : undefined],
    ['publisher', withPublisher.has(type) ? name(csl.publisher) : undefined],
    ['type', type === 'techreport' ? name(csl.genre) : undefined],
    ['series', withPublisher.has(type) ? name(csl['collection-title']) : undefined],
    ['volume', isArticle || withPublisher.has(type) ? name(csl.volume) : undefined],
    // The standard styles refuse an issue without a volume; biber has a field of its own for it.
    ['number', isArticle ? (csl.volume === undefined ? undefined : name(csl.issue)) : type === 'techreport' ? name(csl.number) : undefined],
    ['issue', isArticle && csl.volume === undefined ? name(csl.issue) : undefined],
    ['eid', isArticle ? name(csl.number) : undefined],
    ['pages', isMisc || type === 'book' || type === 'proceedings' ? undefined : pagesOf(csl, isArticle)],
    ['edition', type === 'book' ? name(csl.edition) : undefined],
    ['address', isThesis || withPublisher.has(type) || type === 'techreport' ? name(csl['publisher-place']) : undefined],
    ['year', year === null ? undefined : String(year).padStart(4, '0')],
    ['month', year === null || month === undefined ? undefined : String(month)],
    ['note', name(csl.issued?.literal)],
    ['doi', csl.DOI === undefined ? undefined : verbatim(csl.DOI)],
    ['url', csl.DOI === undefined && csl.URL !== undefined ? verbatim(csl.URL) : undefined],
    ['issn', isArticle && csl.ISSN !== undefined ? verbatim(csl.ISSN) : undefined],
    ['isbn', withPublisher.has(type) && csl.ISBN !== undefined ? verbatim(csl.ISBN) : undefined],
    // A chapter of a book without editors: biber demands them of "incollection", and this says what the entry is.
    ['entrysubtype', type === 'inproceedings' && csl.type !== 'paper-conference' ? csl.type.replace(/[^a-z-]/gi, '') : undefined],
  ];
}

function entryType(csl: Csl): string {
  const entry = bibtexTypeOfCsl[csl.type];
  if (entry === undefined) return 'misc';
  const has: Readonly<Record<string, boolean>> = {
    title: csl.title !== undefined, journal: csl['container-title'] !== undefined, booktitle: csl['container-title'] !== undefined,
    publisher: csl.publisher !== undefined, school: csl.publisher !== undefined, institution: csl.publisher !== undefined, year: yearOf(csl) !== null,
  };
  // An entry short of what its type demands is written as "misc", which demands nothing, rather than with invented fields.
  if (!entry.needs.every((field) => has[field] ?? false)) return 'misc';
  const hasEditor = csl.editor !== undefined && csl.editor.length > 0;
  if (entry.type === 'incollection') return hasEditor ? 'incollection' : 'inproceedings';
  if (entry.type === 'book') return hasEditor && (csl.author ?? []).length === 0 ? 'proceedings' : 'book';
  return csl.type === 'thesis' && /master|msc|diplom/i.test(csl.genre ?? '') ? 'mastersthesis' : entry.type;
}

/**
 * Writes one citation as BibTeX under the given key; real BibTeX and biber read it without a warning.
 *
 * Titles are braced twice so that no style lowers their case; DOIs are written as they are, since the field is verbatim. Two
 * things biber's validation still remarks on: a volume that is not a whole number, and a work without a year.
 */
export function writeBibtex(csl: Csl, key: string): string {
  const type = entryType(csl);
  const fields = fieldsOf(csl, type).filter(([, value]) => value !== undefined && value !== '');
  return `@${type}{${key},\n${fields.map(([name, value]) => `  ${name} = {${value ?? ''}}`).join(',\n')}\n}\n`;
}
