import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import Papa from 'papaparse';
import * as z from 'zod';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { grantableRoles } from '#shared/domain/roles.ts';
import { inputOfRow, scriptOfRow, type EntryRow, type EntryScript } from './entry-row.ts';

/** Where the demonstration files lie; all they hold is invented. */
export const demoFolder = fileURLToPath(new URL('.', import.meta.url));

const person = z.object({
  email: z.email(),
  name: z.string().min(1),
  role: z.enum(grantableRoles),
  /** Whether the account can be used to sign in; the others only appear as contributors. */
  sign_in: z.enum(['yes', 'no']),
  affiliation: z.string(),
});

/** An invented person. */
export type DemoPerson = { email: string; name: string; role: (typeof grantableRoles)[number]; signsIn: boolean; affiliation: string };

/** A row of entries.csv: what is typed, and what is done with it. */
export type DemoEntry = { row: string; sourceKey: string; input: EntryInput; script: EntryScript };

/** A citation of the bibliography with its own text. */
export type DemoSource = { key: string; doi: string; bibtex: string };

const notice = z.object({
  doi: z.string().startsWith('10.5555/'),
  type: z.enum(['retraction', 'correction']),
  notice_doi: z.string().startsWith('10.5555/'),
  updated: z.iso.date(),
  label: z.string().min(1),
});

/** What the stand-in DOI service says of a source that was retracted or corrected. */
export type DemoNotice = { doi: string; type: 'retraction' | 'correction'; noticeDoi: string; updated: string; label: string };

function text(folder: string, name: string): string {
  return readFileSync(join(folder, name), 'utf8');
}

function table(folder: string, name: string): EntryRow[] {
  const { data, errors } = Papa.parse<Record<string, string>>(text(folder, name), { header: true, skipEmptyLines: true });
  const [first] = errors;
  if (first) throw new Error(`${name}, line ${(first.row ?? 0) + 2}: ${first.message}`);
  return data;
}

/** The invented people: the five demonstration accounts and those who only appear by name. */
export function readDemoPeople(folder: string = demoFolder): DemoPerson[] {
  return table(folder, 'people.csv').map((line) => {
    const { sign_in: signIn, ...rest } = person.parse(line);
    return { ...rest, signsIn: signIn === 'yes' };
  });
}

/** The 60 invented sources as one BibTeX text. */
export function readDemoSources(folder: string = demoFolder): string {
  return text(folder, 'sources.bib');
}

/** BibTeX of the one source that the stand-in DOI service knows and no entry uses. */
export function readLookupOnlySource(folder: string = demoFolder): string {
  return text(folder, 'lookup-only.bib');
}

/**
 * Splits a BibTeX text of this folder into its citations. It relies on their form here, a closing brace alone on its line,
 * and is no reader for BibTeX at large.
 *
 * @throws Error naming the key of a citation without a DOI
 */
export function splitBibliography(bibliography: string): DemoSource[] {
  return bibliography.split(/^(?=@)/m).filter((part) => part.startsWith('@')).map((part) => {
    const key = /^@\w+\{([^,]+),/.exec(part)?.[1] ?? '';
    const doi = /^\s*doi = \{(.+)\},?$/m.exec(part)?.[1];
    if (doi === undefined) throw new Error(`The source ${key} has no DOI line`);
    return { key, doi, bibtex: part.trim() };
  });
}

/** Retraction and correction notices of invented sources. */
export function readDemoNotices(folder: string = demoFolder): DemoNotice[] {
  return table(folder, 'source-notices.csv').map((line) => {
    const { notice_doi: noticeDoi, ...rest } = notice.parse(line);
    return { ...rest, noticeDoi };
  });
}

/**
 * The demonstration entries in the order of their submission, drafts last: a row that revises another comes after it.
 *
 * @throws ZodError or Error naming row and column when the file is not right
 */
export function readDemoEntries(folder: string = demoFolder): DemoEntry[] {
  const dois = new Map(splitBibliography(readDemoSources(folder)).map(({ key, doi }) => [key, doi]));
  return table(folder, 'entries.csv').map((line) => {
    const sourceKey = line['source'] ?? '';
    const doi = dois.get(sourceKey);
    if (doi === undefined) throw new Error(`entries.csv, row ${line['row']}: sources.bib has no source "${sourceKey}"`);
    return { row: line['row'] ?? '', sourceKey, input: inputOfRow(line, doi), script: scriptOfRow(line) };
  });
}
