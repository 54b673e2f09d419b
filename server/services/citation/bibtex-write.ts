import type { Csl } from '#shared/citations/csl.ts';
import { yearOf } from '#shared/citations/citation-text.ts';
import { writeBibtexNames } from './bibtex-names.ts';
import { anonymous, bibtexTypeOfCsl } from './bibtex-types.ts';
import { writeTex, writeTexName } from './tex-write.ts';

/** Characters that would end or unbalance a verbatim field; the percent form means the same in a DOI and in an address. */
function verbatim(text: string): string {
  return text.replace(/[{}\\\s\p{Cc}\p{Cs}"]/gu, (character) => (/\p{Cs}/u.test(character) ? '' : encodeURIComponent(character)));
}

function pagesOf(csl: Csl): string | undefined {
  const text = csl.page ?? csl.number;
  return text === undefined ? undefined : writeTexName(text.replace(/(?<=[\p{L}\d])\s*[-–—]+\s*(?=[\p{L}\d])/gu, '–'));
}

function yearText(csl: Csl): string | undefined {
  const year = yearOf(csl);
  if (year !== null) return String(year).padStart(4, '0');
  return undefined;
}

/** Every field the entry can have, in the order we print them; undefined ones are left out. */
function fieldsOf(csl: Csl, type: string): [string, string | undefined][] {
  const name = (text: string | undefined): string | undefined => (text === undefined ? undefined : writeTexName(text));
  const authors = csl.author === undefined ? '' : writeBibtexNames(csl.author);
  const editors = csl.editor === undefined ? '' : writeBibtexNames(csl.editor);
  const isArticle = type === 'article';
  const isThesis = type === 'phdthesis' || type === 'mastersthesis';
  const isPart = type === 'inproceedings' || type === 'incollection';
  const month = csl.issued?.['date-parts']?.[0]?.[1];
  // The standard styles refuse a number without a volume in an article, and both together elsewhere.
  const issue = name(csl.issue);
  const hasVolume = csl.volume !== undefined;
  const words = csl.issued?.literal;
  return [
    ['author', authors === '' ? undefined : authors],
    ['editor', editors === '' ? undefined : editors],
    ['title', csl.title === undefined ? undefined : `{${writeTex(csl.title)}}`],
    ['journal', isArticle ? name(csl['container-title']) : undefined],
    ['booktitle', isPart ? name(csl['container-title']) : undefined],
    ['howpublished', type === 'misc' ? name(csl['container-title'] ?? csl.publisher ?? csl.note) : undefined],
    ['school', isThesis ? name(csl.publisher) : undefined],
    ['institution', type === 'techreport' ? name(csl.publisher) : undefined],
    ['publisher', type === 'book' || isPart ? name(csl.publisher) : undefined],
    ['type', type === 'techreport' ? name(csl.genre) : undefined],
    ['series', isPart || type === 'book' ? name(csl['collection-title']) : undefined],
    ['volume', name(csl.volume)],
    ['number', isArticle ? (hasVolume ? issue : undefined) : type === 'techreport' ? name(csl.number) : undefined],
    ['issue', isArticle && !hasVolume ? issue : undefined],
    ['eid', isArticle ? name(csl.number) : undefined],
    ['pages', pagesOf(csl)],
    ['edition', type === 'book' ? name(csl.edition) : undefined],
    ['address', isThesis || type === 'book' || isPart || type === 'techreport' ? name(csl['publisher-place']) : undefined],
    ['year', yearText(csl)],
    ['month', month === undefined ? undefined : String(month)],
    ['note', words === undefined ? undefined : name(words)],
    ['doi', csl.DOI === undefined ? undefined : verbatim(csl.DOI)],
    ['url', csl.DOI === undefined && csl.URL !== undefined ? verbatim(csl.URL) : undefined],
    ['issn', csl.ISSN === undefined ? undefined : verbatim(csl.ISSN)],
    ['isbn', csl.ISBN === undefined ? undefined : verbatim(csl.ISBN)],
  ];
}

function entryType(csl: Csl): string {
  const entry = bibtexTypeOfCsl[csl.type];
  if (entry === undefined) return 'misc';
  const type = csl.type === 'thesis' && /master|msc|diplom/i.test(csl.genre ?? '') ? 'mastersthesis' : entry.type;
  const has: Readonly<Record<string, boolean>> = {
    title: csl.title !== undefined, journal: csl['container-title'] !== undefined, booktitle: csl['container-title'] !== undefined,
    publisher: csl.publisher !== undefined, school: csl.publisher !== undefined, institution: csl.publisher !== undefined,
    year: yearOf(csl) !== null, author: true,
  };
  // An entry short of what its type demands is written as "misc", which demands nothing, rather than with invented fields.
  return entry.needs.every((field) => has[field] ?? false) ? type : 'misc';
}

/**
 * Writes one citation as BibTeX under the given key; real BibTeX and biber read it without a warning.
 *
 * Titles are braced twice so that no style lowers their case; DOIs are written as they are, since the field is verbatim.
 */
export function writeBibtex(csl: Csl, key: string): string {
  const type = entryType(csl);
  const fields = fieldsOf(csl, type).filter((field): field is [string, string] => field[1] !== undefined && field[1] !== '');
  if (!fields.some(([name]) => name === 'author') && !(type === 'book' && fields.some(([name]) => name === 'editor'))) fields.unshift(['author', `{${anonymous}}`]);
  else if (type === 'book') fields.splice(0, fields.length, ...fields.filter(([name]) => name !== 'editor' || !fields.some(([other]) => other === 'author')));
  return `@${type}{${key},\n${fields.map(([name, value]) => `  ${name} = {${value}}`).join(',\n')}\n}\n`;
}
