import * as z from 'zod';
import { normaliseDoi } from './doi.ts';
import { plainText, richText, richTextSource, taggedScripts } from './rich-text.ts';

/** Bounds on what a citation may hold; a longer answer is refused with the field named. */
export const citationBounds = { title: 2000, text: 500, name: 200, authors: 1000 } as const;

/** A person or a group as CSL-JSON 1.0.2 writes names. */
export const cslName = z.object({
  family: z.string().max(citationBounds.name).optional(),
  given: z.string().max(citationBounds.name).optional(),
  'non-dropping-particle': z.string().max(60).optional(),
  'dropping-particle': z.string().max(60).optional(),
  suffix: z.string().max(60).optional(),
  literal: z.string().max(citationBounds.text).optional(),
});

/** A person or a group as CSL-JSON 1.0.2 writes names. */
export type CslName = z.infer<typeof cslName>;

/** A date as CSL-JSON writes it: year, month, day, as far as known, or words such as "in press". */
export const cslDate = z.object({
  'date-parts': z.array(z.array(z.int()).min(1).max(3)).min(1).max(2).optional(),
  literal: z.string().max(100).optional(),
});

/** A date as CSL-JSON writes it. */
export type CslDate = z.infer<typeof cslDate>;

const text = z.string().max(citationBounds.text);

/** The part of a CSL-JSON item we keep (CSL-JSON 1.0.2, docs.citationstyles.org, from memory); every other field is dropped. */
export const cslSchema = z.object({
  id: z.string().max(200).optional(),
  type: z.string().max(40),
  title: z.string().max(citationBounds.title).optional(),
  'title-short': z.string().max(citationBounds.text).optional(),
  author: z.array(cslName).max(citationBounds.authors).optional(),
  editor: z.array(cslName).max(citationBounds.authors).optional(),
  issued: cslDate.optional(),
  'container-title': text.optional(),
  'container-title-short': text.optional(),
  'collection-title': text.optional(),
  'event-title': text.optional(),
  volume: text.optional(),
  issue: text.optional(),
  page: text.optional(),
  number: text.optional(),
  edition: text.optional(),
  publisher: text.optional(),
  'publisher-place': text.optional(),
  genre: text.optional(),
  note: text.optional(),
  language: text.optional(),
  DOI: text.optional(),
  URL: z.string().max(1000).optional(),
  ISSN: text.optional(),
  ISBN: text.optional(),
});

/** One citation in the form we keep. */
export type Csl = z.infer<typeof cslSchema>;

/** A citation, or what is wrong with it and where. */
export type CslReading = { ok: true; csl: Csl } | { ok: false; problems: { path: string; message: string }[] };

const textFields = [
  'id', 'title-short', 'container-title', 'container-title-short', 'collection-title', 'event-title', 'volume', 'issue', 'page', 'number',
  'edition', 'publisher', 'publisher-place', 'genre', 'note', 'language', 'DOI', 'URL', 'ISSN', 'ISBN',
] as const;

/** Names by which the registration agencies' own answers differ from CSL-JSON (Crossref Metadata API JSON Format, v1 and v2). */
const typeAliases: Readonly<Record<string, string>> = {
  'journal-article': 'article-journal', 'proceedings-article': 'paper-conference', 'book-chapter': 'chapter', monograph: 'book',
  'edited-book': 'book', 'reference-book': 'book', dissertation: 'thesis', 'report-component': 'report', 'posted-content': 'article', other: 'document',
};

function oneLine(value: unknown): string | undefined {
  const first: unknown = Array.isArray(value) ? value[0] : value;
  if (typeof first !== 'string' && typeof first !== 'number') return undefined;
  const line = String(first).replace(/\p{Cs}/gu, '\uFFFD').replace(/[\s\p{Cc}]+/gu, ' ').trim();
  return line === '' ? undefined : line;
}

function nameOf(value: unknown): CslName | null {
  if (typeof value === 'string') return oneLine(value) === undefined ? null : { literal: oneLine(value) };
  if (typeof value !== 'object' || value === null) return null;
  const source = value as Record<string, unknown>;
  const name: CslName = {};
  for (const part of ['family', 'given', 'non-dropping-particle', 'dropping-particle', 'suffix'] as const) {
    const piece = oneLine(source[part]);
    if (piece !== undefined) name[part] = plainText(piece);
  }
  const literal = oneLine(source['literal'] ?? source['name']);
  if (name.family === undefined && literal !== undefined) return { literal: plainText(literal) };
  if (name.family === undefined && name.given !== undefined) return { literal: name.given };
  return name.family === undefined ? null : name;
}

function dateOf(value: unknown): CslDate | undefined {
  if (typeof value === 'number' || typeof value === 'string') return dateFromWords(String(value));
  if (typeof value !== 'object' || value === null) return undefined;
  const source = value as Record<string, unknown>;
  const ranges = Array.isArray(source['date-parts']) ? source['date-parts'].slice(0, 2) : [];
  const parts: number[][] = [];
  for (const range of ranges as unknown[]) {
    const numbers: number[] = [];
    for (const part of Array.isArray(range) ? range.slice(0, 3) : []) {
      const number = typeof part === 'string' && /^-?\d{1,5}$/.test(part.trim()) ? Number(part) : part;
      const limit = numbers.length === 0 ? 9999 : numbers.length === 1 ? 12 : 31;
      if (typeof number !== 'number' || !Number.isInteger(number) || Math.abs(number) > limit || (numbers.length > 0 && number < 1)) break;
      numbers.push(number);
    }
    if (numbers.length > 0) parts.push(numbers);
  }
  if (parts.length > 0) return { 'date-parts': parts };
  return dateFromWords(oneLine(source['raw'] ?? source['literal']) ?? '');
}

/**
 * Reads a date as bibliographies print it: a year, an ISO 8601 date, or words, which are kept as words.
 *
 * @example dateFromWords('1994-06')['date-parts'][0][1] === 6
 */
export function dateFromWords(words: string): CslDate | undefined {
  const line = words.trim();
  if (line === '') return undefined;
  const match = /^(\d{4})(?:[-/](\d{1,2})(?:[-/](\d{1,2}))?)?(?:[T /].*)?\/?$/.exec(line);
  if (match === null) return { literal: line.slice(0, 100) };
  const [year, month, day] = match.slice(1).map(Number);
  const parts = [year ?? 0];
  if (month !== undefined && month >= 1 && month <= 12) {
    parts.push(month);
    if (day !== undefined && day >= 1 && day <= 31) parts.push(day);
  }
  return { 'date-parts': [parts] };
}

/**
 * Reads a CSL-JSON item as DOI services, programs and people send it, and gives the part we keep in one fixed form.
 *
 * Tolerant where answers differ (lists where one string is meant, numbers as strings, group names under `name`); unknown
 * fields are dropped; the DOI is put in canonical form. Problems name the field; a text with neither title nor container is refused.
 *
 * @example readCsl({ type: 'article-journal', title: ['Oxygen on silver'], volume: 2 }).ok === true
 */
export function readCsl(value: unknown): CslReading {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    return { ok: false, problems: [{ path: '', message: 'A citation must be one CSL-JSON object.' }] };
  }
  const source = value as Record<string, unknown>;
  const draft: Record<string, unknown> = {};
  const type = oneLine(source['type']) ?? 'document';
  draft['type'] = typeAliases[type] ?? type;
  const title = oneLine(source['title']);
  if (title !== undefined) draft['title'] = title.length > citationBounds.title ? title : richTextSource(richText(taggedScripts(title)));
  for (const field of textFields) {
    const line = oneLine(source[field]);
    if (line !== undefined) draft[field] = field === 'URL' || field === 'DOI' || field === 'id' ? line : plainText(line);
  }
  for (const role of ['author', 'editor'] as const) {
    const list = source[role];
    if (!Array.isArray(list)) continue;
    const names = list.slice(0, citationBounds.authors + 1).map(nameOf).filter((name) => name !== null);
    if (names.length > 0) draft[role] = names;
  }
  const issued = dateOf(source['issued'] ?? source['published-print'] ?? source['published-online']);
  if (issued !== undefined) draft['issued'] = issued;
  if (draft['number'] === undefined && source['article-number'] !== undefined) draft['number'] = oneLine(source['article-number']);
  if (typeof draft['DOI'] === 'string') {
    const doi = normaliseDoi(draft['DOI']);
    if (doi === null) delete draft['DOI'];
    else draft['DOI'] = doi;
  }
  if (typeof draft['URL'] === 'string' && !/^https?:\/\//i.test(draft['URL'])) delete draft['URL'];
  const checked = cslSchema.safeParse(draft);
  if (!checked.success) {
    return { ok: false, problems: checked.error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message })) };
  }
  if (checked.data.title === undefined && checked.data['container-title'] === undefined) {
    return { ok: false, problems: [{ path: 'title', message: 'The citation has no title. Add one.' }] };
  }
  return { ok: true, csl: checked.data };
}
