import { dateFromWords, readCsl, type Csl, type CslName } from '#shared/citations/csl.ts';
import { callName, yearOf } from '#shared/citations/citation-text.ts';
import { normaliseDoi } from '#shared/citations/doi.ts';
import { plainText } from '#shared/citations/rich-text.ts';
import type { ReadingProblem } from './bibtex-scan.ts';

/** Bounds on an RIS text; beyond them a problem says so. */
export const risBounds = { text: 2_000_000, records: 5_000, problems: 200, value: 5000, valuesPerRecord: 3000 } as const;

/** Types by the "TY" codes of the RIS format (reference manager export format, from memory). */
const cslTypeOfRis: Readonly<Record<string, string>> = {
  JOUR: 'article-journal', JFULL: 'article-journal', EJOUR: 'article-journal', INPR: 'article-journal', MGZN: 'article-magazine', CPAPER: 'paper-conference', CONF: 'paper-conference',
  BOOK: 'book', EBOOK: 'book', EDBOOK: 'book', CHAP: 'chapter', ECHAP: 'chapter', THES: 'thesis', RPRT: 'report', STAND: 'report', PAT: 'patent',
  UNPB: 'manuscript', ELEC: 'webpage', DATA: 'dataset', COMP: 'software', GEN: 'document',
};

const risTypeOfCsl: Readonly<Record<string, string>> = {
  'article-journal': 'JOUR', 'article-magazine': 'MGZN', 'paper-conference': 'CPAPER', book: 'BOOK', chapter: 'CHAP', thesis: 'THES', report: 'RPRT', patent: 'PAT',
  manuscript: 'UNPB', webpage: 'ELEC', dataset: 'DATA', software: 'COMP',
};

type RisRecord = { line: number; tags: Map<string, string[]>; values: number };

function readName(text: string): CslName {
  const [family = '', given, suffix] = text.split(',').map((part) => part.trim());
  if (given === undefined || given === '') return { literal: family };
  const particle = /^((?:(?:van|von|der|den|de|la|le|du|des|ten|ter|te|zu|zur|vom|del|della|di|da|dos|das|el|al|af|av)\s+)+)(?=\S)/.exec(family);
  return {
    family: particle === null ? family : family.slice(particle[0].length),
    given,
    ...(particle === null ? {} : { 'non-dropping-particle': particle[0].trim() }),
    ...(suffix === undefined || suffix === '' ? {} : { suffix }),
  };
}

function recordToItem(record: RisRecord): Record<string, unknown> {
  const first = (...names: string[]): string | undefined => names.map((name) => record.tags.get(name)?.[0]).find((value) => value !== undefined && value !== '');
  const all = (...names: string[]): string[] => names.flatMap((name) => record.tags.get(name) ?? []).filter((value) => value !== '');
  const type = cslTypeOfRis[(first('TY') ?? '').toUpperCase()] ?? 'document';
  const from = first('SP');
  const to = first('EP');
  const doi = first('DO', 'DI') ?? all('UR', 'L3', 'M3', 'N1').find((value) => /10\.\d{4,9}\//.test(value) && normaliseDoi(value) !== null);
  const date = (first('PY', 'Y1', 'DA') ?? '').replace(/\/+$/, '');
  const issued = dateFromWords(date);
  return {
    type,
    title: first('TI', 'T1', 'CT', ...(type === 'book' ? ['BT'] : [])),
    author: all('AU', 'A1').map(readName),
    editor: all('A2', 'ED').map(readName),
    issued,
    'container-title': type === 'book' || type === 'thesis' || type === 'report' ? undefined : first('JO', 'JF', 'T2', 'BT', 'JA', 'J2', 'J1'),
    'collection-title': first('T3'),
    volume: first('VL'),
    issue: first('IS', 'CP'),
    page: from !== undefined && to !== undefined && from !== to && !from.includes('-') ? `${from}-${to}` : from,
    number: first('C7'),
    edition: first('ET'),
    publisher: first('PB'),
    'publisher-place': first('CY', 'PP'),
    genre: type === 'thesis' ? first('M3') ?? 'PhD thesis' : undefined,
    language: first('LA'),
    DOI: doi,
    URL: first('UR'),
    ISSN: type === 'book' || type === 'chapter' ? undefined : first('SN'),
    ISBN: type === 'book' || type === 'chapter' ? first('SN') : undefined,
  };
}

/**
 * Reads RIS text into citations; a record that can't be read becomes a problem with its line and spoils no other. Never throws.
 */
export function readRis(text: string): { entries: Csl[]; problems: ReadingProblem[] } {
  const entries: Csl[] = [];
  const problems: ReadingProblem[] = [];
  const problem = (line: number, message: string): void => {
    problems.push({ line, message });
  };
  if (text.length > risBounds.text) return { entries, problems: [{ line: 1, message: `The text is longer than ${risBounds.text} characters. Split it.` }] };
  let record: RisRecord | null = null;
  let lastTag = '';
  const finish = (closed: boolean, line: number): void => {
    if (record === null) return;
    if (!closed) problem(line, `The record from line ${record.line} has no closing line "ER  - ". It was read as far as it goes.`);
    const reading = readCsl(recordToItem(record));
    if (reading.ok) entries.push(reading.csl);
    else problem(record.line, `The record from line ${record.line} was passed over. ${reading.problems[0]?.message ?? ''}`);
    record = null;
  };
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/);
  for (const [index, lineText] of lines.entries()) {
    const line = index + 1;
    const match = /^([A-Z][A-Z0-9]) {0,3}- ?(.*)$/.exec(lineText);
    const tag = match?.[1] ?? '';
    if (problems.length >= risBounds.problems) {
      problems.push({ line, message: `There are more than ${risBounds.problems} problems. The text from here on was not read.` });
      return { entries, problems };
    }
    const value = (match?.[2] ?? lineText).trim().slice(0, risBounds.value);
    if (tag === 'TY') {
      finish(false, line);
      if (entries.length >= risBounds.records) {
        problem(line, `The text holds more than ${risBounds.records} records. Split it.`);
        return { entries, problems };
      }
      record = { line, tags: new Map([['TY', [value]]]), values: 1 };
    } else if (tag === 'ER') {
      if (record === null) problem(line, 'A record ends here that never began with "TY  - ".');
      finish(true, line);
    } else if (record !== null && record.values < risBounds.valuesPerRecord) {
      const current: RisRecord = record;
      current.values += 1;
      const held = current.tags.get(tag);
      if (tag !== '' && held === undefined) current.tags.set(tag, [value]);
      else if (tag !== '' && held !== undefined) held.push(value);
      else if (value !== '' && lastTag !== '') {
        const values = current.tags.get(lastTag);
        if (values !== undefined) values[values.length - 1] = `${values.at(-1) ?? ''} ${value}`.slice(0, risBounds.value);
      }
    } else if (tag !== '' && record === null) {
      problem(line, `The line "${tag}" stands outside a record. A record begins with "TY  - ".`);
    }
    if (tag !== '') lastTag = tag;
  }
  finish(false, lines.length);
  if (entries.length === 0 && problems.length === 0) problem(1, 'No RIS record was found. A record begins with "TY  - ".');
  return { entries, problems };
}

function personText(name: CslName): string {
  if (name.family === undefined) return (name.literal ?? name.given ?? '').replaceAll(',', ' ');
  return [callName(name), name.given, name.suffix].filter((part) => part !== undefined).map((part) => part.replaceAll(',', ' ')).join(', ');
}

/**
 * Writes one citation as an RIS record with CRLF line ends; marks of the title are dropped, since the format has none.
 */
export function writeRis(csl: Csl): string {
  const isPart = csl.type === 'paper-conference' || csl.type === 'chapter';
  const pages = /^\s*([\p{L}\d.]+)\s*[-–—]+\s*([\p{L}\d.]+)\s*$/u.exec(csl.page ?? '');
  const month = csl.issued?.['date-parts']?.[0];
  const lines: [string, string | undefined][] = [
    ['TY', risTypeOfCsl[csl.type] ?? 'GEN'],
    ...(csl.author ?? []).map((name): [string, string] => ['AU', personText(name)]),
    ...(csl.editor ?? []).map((name): [string, string] => ['A2', personText(name)]),
    ['TI', csl.title === undefined ? undefined : plainText(csl.title)],
    [isPart ? 'T2' : 'JO', csl['container-title']],
    ['T3', csl['collection-title']],
    ['PB', csl.publisher],
    ['CY', csl['publisher-place']],
    ['VL', csl.volume],
    ['IS', csl.issue],
    ['SP', pages?.[1] ?? csl.page],
    ['EP', pages?.[2]],
    ['C7', csl.number],
    ['ET', csl.edition],
    ['PY', yearOf(csl) === null ? csl.issued?.literal : String(yearOf(csl))],
    ['DA', month !== undefined && month.length > 1 ? month.map((part) => String(part).padStart(2, '0')).join('/') : undefined],
    ['M3', csl.type === 'thesis' && csl.genre !== 'PhD thesis' ? csl.genre : undefined],
    ['LA', csl.language],
    ['SN', csl.ISSN ?? csl.ISBN],
    ['DO', csl.DOI],
    ['UR', csl.URL],
  ];
  const body = lines.map(([tag, value]) => [tag, (value ?? '').replace(/[\s\p{Cc}\u2028\u2029]+/gu, ' ').trim()] as const).filter(([, value]) => value !== '');
  return `${body.map(([tag, value]) => `${tag}  - ${value}\r\n`).join('')}ER  - \r\n`;
}
