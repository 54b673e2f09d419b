import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readBibtex } from '#server/services/citation/bibtex-read.ts';
import { writeBibtex } from '#server/services/citation/bibtex-write.ts';
import { yearOf } from '#shared/citations/citation-text.ts';
import type { Csl } from '#shared/citations/csl.ts';
import { csls } from './csl-arbitrary.ts';
import { referenceCases } from './reference-cases.ts';

// The real other side: BibTeX (Debian texlive-binaries and texlive-base) and biber (Debian biber). Missing programs fail the test.
const run = promisify(execFile);
let folder = '';

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), 'sillstone-bib-'));
});
afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
});

const incomplete: readonly Csl[] = [
  { type: 'article-journal', title: 'Nothing else' },
  { type: 'article-journal', title: 'No journal', author: [{ family: 'A', given: 'B.' }], issued: { 'date-parts': [[2001]] }, DOI: '10.1002/(sici)1(1998)1:1<1::aid-x_1>3.0.co;2-a' },
  { type: 'article-journal', title: 'No year', 'container-title': 'J', volume: '1', issue: '2', issued: { literal: 'in press' } },
  { type: 'article-journal', title: 'Issue without volume', 'container-title': 'J & K 100%_#', issue: '2', issued: { 'date-parts': [[2001, 2, 3]] }, number: 'e1', ISSN: '1234-5679' },
  { type: 'book', title: 'Edited', editor: [{ family: 'E', given: 'F.' }], publisher: 'P', issued: { 'date-parts': [[2001]] }, volume: '2', 'collection-title': 'S', ISBN: '978-3-16-148410-0' },
  { type: 'book', title: 'Both', author: [{ family: 'A' }], editor: [{ family: 'E', given: 'F.' }], publisher: 'P', issued: { 'date-parts': [[2001]] } },
  { type: 'chapter', title: 'In a book', author: [{ literal: 'Group and Sons, Inc.' }], 'container-title': 'B', publisher: 'P', volume: '3', 'collection-title': 'S', issued: { 'date-parts': [[2001]] } },
  { type: 'paper-conference', title: 'No book', issued: { 'date-parts': [[2001]] } },
  { type: 'thesis', title: 'No school', issued: { 'date-parts': [[2001]] } },
  { type: 'report', title: 'R', publisher: 'Institute', number: '7', genre: 'Technical report', issued: { 'date-parts': [[2001]] } },
  { type: 'webpage', title: 'W', URL: 'https://e.example/a_b%20c?d={x}#y', issued: { 'date-parts': [[2001]] } },
  { type: 'dataset', title: 'D {unbalanced $ 100% \\x', publisher: 'P', issued: { 'date-parts': [[1850]] } },
];

function bibliography(list: readonly Csl[]): string {
  return list.map((csl, index) => writeBibtex(csl, `key${index}`)).join('\n');
}

async function bibtex(name: string, text: string, style: string): Promise<{ log: string; bbl: string }> {
  await writeFile(path.join(folder, `${name}.bib`), text);
  await writeFile(path.join(folder, `${name}.aux`), `\\relax\n\\citation{*}\n\\bibdata{${name}}\n\\bibstyle{${style}}\n`);
  const { stdout } = await run('bibtex', [name], { cwd: folder });
  return { log: stdout, bbl: await readFile(path.join(folder, `${name}.bbl`), 'utf8') };
}

async function biber(name: string, text: string): Promise<string[]> {
  await writeFile(path.join(folder, `${name}.bib`), text);
  const { stdout } = await run('biber', ['--tool', '--validate-datamodel', '--output-encoding=UTF-8', '--output-fieldcase=lower', `${name}.bib`], { cwd: folder });
  return stdout.split('\n').filter((line) => /WARN|ERROR/.test(line));
}

const everyCase = [...referenceCases.map(({ input }) => input.csl), ...incomplete];

describe('what we write, read by the real programs without a warning', () => {
  test.each(['plain', 'alpha', 'abbrv', 'unsrt'])('BibTeX 0.99d with the style %s', async (style) => {
    const { log, bbl } = await bibtex(`cases-${style}`, bibliography(everyCase), style);
    expect(log.split('\n').filter((line) => /warning|error|Database file #1 .*line/i.test(line))).toEqual([]);
    expect(bbl.match(/\\bibitem/g)).toHaveLength(everyCase.length);
  }, 60_000);

  test('BibTeX prints scripts, accents and particles as the reference has them', async () => {
    // Source: \bibitem of BibTeX 0.99d with plain.bst for the same invented citation.
    const { bbl } = await bibtex('one', writeBibtex(referenceCases.find(({ id }) => id === 'tanner2010')?.input.csl ?? { type: 'document' }, 'tanner2010'), 'plain');
    expect(bbl.replace(/\s+/g, ' ')).toContain('{H$_{2}$ and D$_{2}$ exchange on Ni(111): a $^{13}$C study of CH$_{4}$}');
  }, 60_000);

  test('biber validates the data model', async () => {
    expect(await biber('cases', bibliography(everyCase.filter((csl) => yearOf(csl) !== null)))).toEqual([]);
  }, 120_000);

  test("the demonstration's bibliography is read whole, and what we write of it passes both programs", async () => {
    const { entries, problems } = readBibtex(await readFile(new URL('../../../seeds/demo/sources.bib', import.meta.url), 'utf8'));
    expect(problems).toEqual([]);
    expect(entries.length).toBeGreaterThanOrEqual(60);
    const text = bibliography(entries);
    expect((await bibtex('demo', text, 'plain')).log.split('\n').filter((line) => /warning|error/i.test(line))).toEqual([]);
    expect(await biber('demo', text)).toEqual([]);
  }, 120_000);

  test('biber remarks on a lettered volume and on a work without a year, and on nothing else', async () => {
    const lettered: Csl = { type: 'article-journal', title: 'T', 'container-title': 'J', volume: '46B', issued: { 'date-parts': [[2001]] } };
    const remarks = await biber('remarks', bibliography([lettered, { type: 'article-journal', title: 'T', 'container-title': 'J', issued: { literal: 'in press' } }]));
    expect(remarks.filter((line) => line.startsWith('WARN'))).toEqual([
      expect.stringContaining("Entry 'key0' (remarks.bib): Invalid value of field 'volume' must be datatype 'integer'"),
      expect.stringContaining("Entry 'key1' (remarks.bib): Missing mandatory field - one of 'date, year' must be defined"),
    ]);
  }, 60_000);

  test('a hundred and fifty generated citations, in both programs', async () => {
    const text = bibliography(fc.sample(csls, { numRuns: 150, seed: 20_240_101 }));
    const { log } = await bibtex('many', text, 'plain');
    expect(log.split('\n').filter((line) => /warning|error/i.test(line))).toEqual([]);
    expect(await biber('many', text)).toEqual([]);
  }, 180_000);
});
