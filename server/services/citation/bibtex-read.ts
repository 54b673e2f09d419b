import { dateFromWords, readCsl, type Csl } from '#shared/citations/csl.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import { readBibtexNames } from './bibtex-names.ts';
import { bibtexBounds, scanBibtex, type BibtexEntry, type ReadingProblem } from './bibtex-scan.ts';
import { anonymous, cslTypeOfBibtex } from './bibtex-types.ts';
import { readTex } from './tex-read.ts';

/** What was read from a bibliography file, and what could not be read, with the line. */
export type BibliographyReading = { entries: Csl[]; problems: ReadingProblem[] };

const monthNames = ['january', 'february', 'march', 'april', 'may', 'june', 'july', 'august', 'september', 'october', 'november', 'december'];

function monthOf(text: string): number | null {
  const word = text.trim().toLowerCase();
  const number = /^\d{1,2}$/.test(word) ? Number(word) : monthNames.findIndex((name) => word.length >= 3 && name.startsWith(word.slice(0, 3))) + 1;
  return number >= 1 && number <= 12 ? number : null;
}

/** Reads the fields of one entry; the TeX commands it could not read are collected. */
class EntryReader {
  readonly unknown = new Set<string>();
  private readonly fields: ReadonlyMap<string, string>;
  private readonly inherited: ReadonlyMap<string, string> | null;

  constructor(entry: BibtexEntry, parent: BibtexEntry | null) {
    this.fields = entry.fields;
    this.inherited = parent?.fields ?? null;
  }

  raw(...names: string[]): string | undefined {
    for (const name of names) {
      const value = this.fields.get(name) ?? (name === 'title' || name === 'booktitle' ? undefined : this.inherited?.get(name));
      if (value !== undefined && value.trim() !== '') return value;
    }
    // A paper takes the title of the volume it refers to as the title of its book.
    return names.includes('booktitle') ? this.inherited?.get('booktitle') ?? this.inherited?.get('title') : undefined;
  }

  rich(...names: string[]): string | undefined {
    const raw = this.raw(...names);
    if (raw === undefined) return undefined;
    const reading = readTex(raw);
    for (const command of reading.unknownCommands) this.unknown.add(command);
    return reading.text === '' ? undefined : reading.text;
  }

  plain(...names: string[]): string | undefined {
    const text = this.rich(...names);
    return text === undefined ? undefined : plainText(text);
  }

  /** Fields that are not TeX to biber; backslashes before the characters people escape all the same are taken off. */
  verbatim(name: string): string | undefined {
    return this.raw(name)?.trim().replace(/^\{(.*)\}$/s, '$1').replace(/\\([_%&#~{}])/g, '$1').replace(/\{\\(?:textunderscore|_)\}/g, '_').replace(/\\url\{([^{}]*)\}/, '$1');
  }
}

function issuedOf(reader: EntryReader): unknown {
  const words = reader.plain('date', 'year');
  if (words === undefined) return undefined;
  const date = dateFromWords(words.replace(/^\((\d{4})\)$/, '$1'));
  const parts = date?.['date-parts']?.[0];
  const month = reader.plain('month');
  const number = month === undefined ? null : monthOf(month);
  if (parts?.length === 1 && number !== null) return { 'date-parts': [[...parts, number]] };
  return date;
}

function entryToItem(entry: BibtexEntry, reader: EntryReader): Record<string, unknown> {
  const subtype = reader.plain('entrysubtype');
  const type = subtype === 'chapter' || subtype === 'entry-encyclopedia' ? subtype : cslTypeOfBibtex[entry.type] ?? 'document';
  const inBook = type === 'paper-conference' || type === 'chapter' || type === 'entry-encyclopedia';
  const subtitle = reader.rich('subtitle');
  const title = reader.rich('title');
  const pages = reader.plain('pages')?.replace(/\s*[–—]\s*|--+/g, '-');
  const number = reader.plain('eid', 'articleno', 'article-number');
  const isArticle = type === 'article-journal';
  const author = readBibtexNames(reader.raw('author') ?? '');
  const editor = readBibtexNames(reader.raw('editor') ?? '');
  const isAnonymous = author.length === 1 && (author[0]?.literal ?? author[0]?.family) === anonymous && author[0]?.given === undefined;
  const thesisKind = entry.type === 'mastersthesis' ? "Master's thesis" : type === 'thesis' ? 'PhD thesis' : undefined;
  return {
    id: entry.key,
    type,
    title: title !== undefined && subtitle !== undefined ? `${title}: ${subtitle}` : title,
    author: isAnonymous ? undefined : author,
    editor,
    issued: issuedOf(reader),
    'container-title': inBook ? reader.plain('booktitle', 'journal', 'journaltitle') : reader.plain('journal', 'journaltitle', 'booktitle'),
    'collection-title': reader.plain('series'),
    volume: reader.plain('volume'),
    issue: isArticle ? reader.plain('number', 'issue') : reader.plain('issue'),
    page: pages !== undefined && pages !== number ? pages : undefined,
    number: number ?? (isArticle ? undefined : reader.plain('number')),
    edition: reader.plain('edition'),
    publisher: reader.plain('publisher', 'school', 'institution', 'organization'),
    'publisher-place': reader.plain('address', 'location'),
    genre: reader.plain('type') ?? thesisKind,
    note: reader.plain('howpublished'),
    language: reader.plain('langid', 'language'),
    DOI: reader.verbatim('doi'),
    URL: reader.verbatim('url'),
    ISSN: reader.verbatim('issn'),
    ISBN: reader.verbatim('isbn'),
  };
}

/**
 * Reads BibTeX or biblatex text into citations, entry by entry: one that can't be read becomes a problem with its line and spoils no other.
 *
 * Never throws and never asks the network; sizes are bounded (`bibtexBounds`).
 */
export function readBibtex(text: string): BibliographyReading {
  const scan = scanBibtex(text);
  const problems = [...scan.problems];
  const byKey = new Map(scan.entries.map((entry) => [entry.key.toLowerCase(), entry]));
  const entries: Csl[] = [];
  for (const entry of scan.entries) {
    if (problems.length > bibtexBounds.problems) {
      problems.push({ line: entry.line, message: `There are more than ${bibtexBounds.problems} problems. The text from here on was not read.` });
      break;
    }
    const crossref = entry.fields.get('crossref')?.trim().toLowerCase();
    const reader = new EntryReader(entry, crossref === undefined ? null : byKey.get(crossref) ?? null);
    const reading = readCsl(entryToItem(entry, reader));
    const name = `Entry "${entry.key.slice(0, 60)}"`;
    if (reading.ok) {
      entries.push(reading.csl);
      if (reader.unknown.size > 0) {
        const commands = [...reader.unknown].slice(0, 5).map((command) => command.slice(0, 30)).join(', ');
        problems.push({ line: entry.line, message: `${name}: TeX commands not known and left out: ${commands}. Check the text.` });
      }
    } else {
      const first = reading.problems[0];
      problems.push({ line: entry.line, message: `${name} was passed over. ${first?.path ? `${first.path}: ` : ''}${first?.message ?? ''}` });
    }
  }
  if (entries.length === 0 && problems.length === 0) {
    problems.push({ line: 1, message: 'No BibTeX entry was found. An entry begins with @ and its type, for instance @article{.' });
  }
  return { entries, problems: problems.sort((a, b) => a.line - b.line) };
}
