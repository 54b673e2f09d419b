import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readBibtexNames, writeBibtexNames } from '#server/services/citation/bibtex-names.ts';
import { readBibtex } from '#server/services/citation/bibtex-read.ts';
import { bibtexBounds } from '#server/services/citation/bibtex-scan.ts';
import { writeBibtex } from '#server/services/citation/bibtex-write.ts';
import { readRis, writeRis } from '#server/services/citation/ris.ts';
import { readTex } from '#server/services/citation/tex-read.ts';
import { writeTex } from '#server/services/citation/tex-write.ts';
import type { CslName } from '#shared/citations/csl.ts';
import { csls, richTitles } from './csl-arbitrary.ts';

describe('TeX in titles', () => {
  // LaTeX commands as in the LaTeX2e reference manual; \ce after the mhchem manual (from memory).
  test.each([
    ['$\\mathrm{H_2O} \\rightarrow \\mathrm{H}_{2}$', 'H<sub>2</sub>O → H<sub>2</sub>'],
    ['\\ce{NH3 + H -> NH2 + H2}', 'NH<sub>3</sub> + H → NH<sub>2</sub> + H<sub>2</sub>'],
    ['\\ce{SO4^2-}, \\ce{Na+}, \\ce{^{15}N2} and \\ce{N2 <=> 2N}', 'SO<sub>4</sub><sup>2-</sup>, Na<sup>+</sup>, <sup>15</sup>N<sub>2</sub> and N<sub>2</sub> ⇌ 2N'],
    ['$^{15}$N$_2$ and $_{2}^{3}x$', '<sup>15</sup>N<sub>2</sub> and <sub>2</sub><sup>3</sup>x'],
    ['H$_\\mathrm{ads}$ on Pt', 'H<sub>ads</sub> on Pt'],
    ['(2$\\times$2), $\\leq$ 5 \\AA, $-$10 \\textdegree C, $\\Delta H^{\\ddagger}$', '(2×2), ≤ 5 Å, −10 °C, ΔH<sup>‡</sup>'],
    ['\\textsubscript{2}, \\textsuperscript{13}C, \\emph{in situ} {\\it ex situ}, \\textbf{B5}', '<sub>2</sub>, <sup>13</sup>C, <i>in situ</i> <i>ex situ</i>, <b>B5</b>'],
    ['{\\relax Ch}emistry of {R}u', 'Chemistry of Ru'],
    ['pre--exponential---and ``quoted\'\' 5\\% \\& \\_ \\# a~b', 'pre–exponential—and “quoted” 5% & _ # a b'],
    ['\\"{o}\\"o{\\"o}\\"{\\i}\\\'{\\i}\\v{c}\\c cø{\\o}\\ss', 'öööïíčçøøß'],
    ['Cheap: $5 per gram', 'Cheap: $5 per gram'],
    ['$$x$$ and \\(y_1\\)', 'x and y<sub>1</sub>'],
    ['$\\frac{1}{2}$N and \\href{http://x.example}{here} \\url{http://e.example/a_b}', '1/2N and here http://e.example/a_b'],
    ['<sub>2</sub> a < b', '<sub>2</sub> a < b'],
    ['K{\\"a}lte \\LaTeX{} log $\\ln k$', 'Kälte LaTeX log ln k'],
  ])('%s', (tex, text) => {
    expect(readTex(tex)).toEqual({ text, unknownCommands: [] });
  });

  test('a command not known is named and its argument kept', () => {
    expect(readTex('a \\strange{b} c')).toEqual({ text: 'a b c', unknownCommands: ['\\strange'] });
  });

  test('a title that is written is read back', () => {
    fc.assert(fc.property(richTitles, (title) => {
      expect(readTex(writeTex(title)).text).toBe(title);
    }), { numRuns: 3000 });
  });
});

describe('names', () => {
  test.each<[string, CslName[]]>([
    ['Arden, Mary T. and Karl Bolton', [{ family: 'Arden', given: 'Mary T.' }, { family: 'Bolton', given: 'Karl' }]],
    ['Ludwig van Example', [{ family: 'Example', given: 'Ludwig', 'non-dropping-particle': 'van' }]],
    ['van den Berg, Pieter', [{ family: 'Berg', given: 'Pieter', 'non-dropping-particle': 'van den' }]],
    ['von der Foo, III, Bar', [{ family: 'Foo', given: 'Bar', 'non-dropping-particle': 'von der', suffix: 'III' }]],
    ['{The A and B Group} and Others, A. and others', [{ literal: 'The A and B Group' }, { family: 'Others', given: 'A.' }]],
    ['{{CERN}}', [{ family: 'CERN' }]],
    ['{\\O}rsted, H. AND {\\\'E}lan, B.', [{ family: 'Ørsted', given: 'H.' }, { family: 'Élan', given: 'B.' }]],
    ['Plato', [{ family: 'Plato' }]],
    ['Smith Jones, X.', [{ family: 'Smith Jones', given: 'X.' }]],
    ['de la {Cruz Vega}, M.', [{ family: 'Cruz Vega', given: 'M.', 'non-dropping-particle': 'de la' }]],
    ['', []], [' and ', []], [',,,', []],
  ])('%s', (tex, names) => {
    expect(readBibtexNames(tex)).toEqual(names);
  });

  test.each<CslName[][]>([
    [[{ literal: 'Smith, Inc. and Sons' }]], [[{ family: 'de Boer', given: 'J.' }]], [[{ family: 'others', given: 'A.' }]], [[{ family: 'and', given: 'and' }]], [[{ literal: 'Smith Jones' }]],
    [[{ family: 'A', given: 'B', suffix: 'Jr.' }, { literal: 'Group 100% & Co' }]],
  ])('names that need care survive: %j', (names) => {
    expect(readBibtexNames(writeBibtexNames(names))).toEqual(names);
  });
});

describe('BibTeX files', () => {
  const good = '@article{a1, title = {One}, journal = {J}, year = 2001}\n';

  test.each([
    ['an unclosed brace', '@article{bad, title = {One, year = 2001}\n', /line 2.*not closed/],
    ['a missing comma', '@article{bad,\n title = {One}\n year = 2001}\n', /Expected a comma/],
    ['a key of two words', '@article{bad key, title = {One}}\n', /key of the entry/],
    ['an undefined abbreviation', '@article{bad, journal = foo}\n', /abbreviation "foo"/],
    ['a closing brace too many', '@article{bad, title = "a}b"}\n', /no opening one/],
    ['no title', '@article{bad, year = 2001}\n', /no title/],
    ['text in place of a field', '@article{bad, title {One}}\n', /Expected "="/],
  ])('%s spoils only its own entry', (_name, bad, message) => {
    const { entries, problems } = readBibtex(good + bad + good.replace('a1', 'a2'));
    expect(entries.map((entry) => entry.id)).toEqual(['a1', 'a2']);
    expect(problems).toHaveLength(1);
    expect(problems[0]?.line).toBeGreaterThanOrEqual(2);
    expect(problems[0]?.message).toMatch(message);
  });

  test('strings, months, round brackets, comments, inheritance and a missing key are understood', () => {
    const { entries, problems } = readBibtex(`\uFEFFsome words
@string{ijsk = "Invented Journal"} @comment{x} @preamble{"\\newcommand"}
@ARTICLE(k1, AUTHOR = "Arden, M.", title = "One " # {two} # " three", journal = ijsk # { of Kinetics}, month = jun, year = 2001, title = {ignored})
@inproceedings{k2, title={Part}, crossref={vol}, pages={1--2}}
@proceedings{vol, title={Whole Volume}, year={1999}, publisher={P}}
@book{title = {No Key}, year = {2000}, publisher = {P}}
@online{k4, title={Dated}, date={2001-02-03}, url={http://e.example/a\\_b}}`);
    expect(problems).toEqual([]);
    expect(entries).toEqual([
      { id: 'k1', type: 'article-journal', title: 'One two three', author: [{ family: 'Arden', given: 'M.' }], 'container-title': 'Invented Journal of Kinetics', issued: { 'date-parts': [[2001, 6]] } },
      { id: 'k2', type: 'paper-conference', title: 'Part', 'container-title': 'Whole Volume', page: '1-2', issued: { 'date-parts': [[1999]] }, publisher: 'P' },
      { id: 'vol', type: 'book', title: 'Whole Volume', issued: { 'date-parts': [[1999]] }, publisher: 'P' },
      { type: 'book', title: 'No Key', issued: { 'date-parts': [[2000]] }, publisher: 'P' },
      { id: 'k4', type: 'webpage', title: 'Dated', issued: { 'date-parts': [[2001, 2, 3]] }, URL: 'http://e.example/a_b' },
    ]);
  });

  test('odd DOIs and article numbers survive writing and reading', () => {
    for (const doi of ['10.1002/(sici)1096(1998)1:1<1::aid-abc_1>3.0.co;2-a', '10.5555/a{b', '10.5555/100%_&#x', '10.5555/a\\b', '10.5555/(x)']) {
      const csl = { id: 'k', type: 'article-journal', title: 'T', 'container-title': 'J', volume: '7', number: '045401', DOI: doi, issued: { 'date-parts': [[2001]] } };
      expect(readBibtex(writeBibtex(csl, 'k')).entries).toEqual([csl]);
      const { id: _id, ...rest } = csl;
      expect(readRis(writeRis(csl)).entries).toEqual([rest]);
    }
  });

  test('text without an entry says so', () => {
    expect(readBibtex('just words').problems[0]?.message).toMatch(/No BibTeX entry/);
    expect(readRis('just words').problems[0]?.message).toMatch(/No RIS record/);
  });
});

describe('hostile texts', () => {
  const bomb = Array.from({ length: 30 }, (_, index) => `@string{s${index + 1} = s${index} # s${index} # s${index}}`).join('\n');
  test.each([
    ['strings that grow without end', `@string{s0 = "xxxxxxxxxx"}\n${bomb}\n@article{a, title = s30}`],
    ['deep braces', `@article{a, title = {${'{'.repeat(50_000)}${'}'.repeat(50_000)}}}`],
    ['deep mathematics', `@article{a, title = {${'$_{'.repeat(5000)}}}`],
    ['accents without end', `@article{a, title = {${'\\\''.repeat(9000)}}}`],
    ['commands inside commands', `@article{a, title = {${'\\ce{\\emph{'.repeat(1500)}x${'}}'.repeat(1500)}}}`],
    ['entries never closed', '@article{a,\n'.repeat(100_000)],
    ['entries on one line', '@a{a,b={c}}'.repeat(100_000)],
    ['signs without entries', '@'.repeat(1_000_000)],
    ['blanks after a sign', `@${' '.repeat(1_000_000)}`],
    ['a word without end', `@${'a'.repeat(1_000_000)}`],
    ['a field without end', `@article{a, title = {${'x '.repeat(500_000)}}}`],
    ['names without end', `@article{a, title={t}, author = {${'A and '.repeat(3000)}B}}`],
    ['separators without end', `@article{a, title={t}, author = {${' and,'.repeat(3900)}}}`],
    ['dollars without end', `@article{a, title = {${'$'.repeat(19_999)}}}`],
    ['records never closed', 'TY  - JOUR\n'.repeat(200_000)],
    ['values without end', `TY  - JOUR\nTI  - t\n${'AU  - A, B\n'.repeat(200_000)}ER  - \n`],
  ])('%s', (_name, text) => {
    const started = performance.now();
    for (const reading of [readBibtex(text), readRis(text)]) {
      expect(reading.problems.length).toBeLessThanOrEqual(bibtexBounds.problems + 2);
      for (const problem of reading.problems) expect(problem.message.length).toBeLessThan(400);
    }
    // Quadratic behaviour would take minutes on these lengths; the limit only tells the two apart.
    expect(performance.now() - started).toBeLessThan(10_000);
  }, 60_000);

  test('a text beyond the limit is refused whole', () => {
    expect(readBibtex('x'.repeat(bibtexBounds.text + 1))).toEqual({ entries: [], problems: [{ line: 1, message: expect.stringContaining('longer') }] });
    expect(readRis('x'.repeat(bibtexBounds.text + 1)).entries).toEqual([]);
  });

  test('any text is read without an error', () => {
    const pieces = fc.constantFrom('@article{', '@string{', 'a', ' = ', '{', '}', '"', ',', '#', '$', '\\', '\\ce{', "\\'", '_', '^', '\n@misc{', ' and ', '~', 'title', 'author', '<sub>', 'TY  - JOUR\n', 'AU  - ', 'ER  - \n', 'TI  - ');
    const text = fc.oneof(fc.string({ unit: 'binary', maxLength: 300 }), fc.array(fc.oneof(pieces, fc.string({ maxLength: 5 })), { maxLength: 80 }).map((parts) => parts.join('')));
    fc.assert(fc.property(text, (hostile) => {
      for (const csl of [...readBibtex(hostile).entries, ...readBibtex(`@article{k, title={t}, author={${hostile}}, journal = {${hostile}}}`).entries, ...readRis(hostile).entries]) {
        expect(writeBibtex(csl, 'k')).toMatch(/^@[a-z]+\{k,\n/);
        expect(writeRis(csl)).toMatch(/^TY {2}- [A-Z]+\r\n/);
      }
    }), { numRuns: 3000 });
  });
});

describe('writing and reading', () => {
  test('any citation: names, title, container, year, DOI come back from BibTeX', () => {
    fc.assert(fc.property(csls, (csl) => {
      const { entries, problems } = readBibtex(writeBibtex(csl, 'key1'));
      expect(problems).toEqual([]);
      const { id: _id, ...rest } = csl;
      expect(entries).toEqual([{ ...rest, id: 'key1' }]);
    }), { numRuns: 2000 });
  });

  test('any citation in RIS is one record with one value a line', () => {
    fc.assert(fc.property(csls, (csl) => {
      const ris = writeRis(csl);
      expect(ris.match(/^ER {2}- \r$/gm)).toHaveLength(1);
      const { entries, problems } = readRis(ris);
      expect(problems).toEqual([]);
      expect(entries[0]?.DOI).toBe(csl.DOI);
    }), { numRuns: 500 });
  });
});
