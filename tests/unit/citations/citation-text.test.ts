import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { citationKey, disambiguate } from '#shared/citations/citation-key.ts';
import { authorsText, callName, containerText, shortLabel, titleText, yearOf } from '#shared/citations/citation-text.ts';
import { citationBounds, dateFromWords, readCsl, type Csl, type CslName } from '#shared/citations/csl.ts';
import { noticeSentence, readNotice } from '#shared/citations/notice.ts';
import { plainText, richText, richTextSource, taggedScripts, unicodeText } from '#shared/citations/rich-text.ts';
import { referenceCases } from './reference-cases.ts';

const source = (names: CslName[], year?: number): Csl => ({
  type: 'article-journal', title: 'Nitrogen on ruthenium', author: names, ...(year === undefined ? {} : { issued: { 'date-parts': [[year]] } }),
});

describe('what a reader says of a source', () => {
  test.each([
    [source([{ family: 'Vantongeren', given: 'A.' }], 1994), 'Vantongeren', 'Vantongeren 1994'],
    [source([{ family: 'Vantongeren' }, { family: 'Osei-Brandt' }], 1994), 'Vantongeren & Osei-Brandt', 'Vantongeren 1994'],
    [source([{ family: 'Vantongeren' }, { family: 'Osei-Brandt' }, { family: 'Ilmari' }], 2001), 'Vantongeren et al.', 'Vantongeren 2001'],
    [source([{ family: 'Berg', 'non-dropping-particle': 'van den' }]), 'van den Berg', 'van den Berg n.d.'],
    [source([{ family: 'Angelo', 'non-dropping-particle': "d'" }], 2007), "d'Angelo", "d'Angelo 2007"],
    [source([{ literal: 'Ammonia Data Group' }], 2010), 'Ammonia Data Group', 'Ammonia Data Group 2010'],
    [source([], 1966), 'Anonymous', 'Anonymous 1966'],
    [{ type: 'book', editor: [{ family: 'Editor' }], issued: { 'date-parts': [[1980]] } } satisfies Csl, 'Editor', 'Editor 1980'],
  ])('case %#', (csl, authors, label) => {
    expect(authorsText(csl)).toBe(authors);
    expect(shortLabel(csl)).toBe(label);
  });

  test('title, year and container have an answer for every record', () => {
    expect(titleText({ type: 'article-journal', title: 'CH<sub>4</sub> on Ni' })).toBe('CH4 on Ni');
    expect(titleText({ type: 'document' })).toBe('Untitled');
    expect(yearOf({ type: 'book', issued: { literal: 'in press' } })).toBeNull();
    expect(containerText({ type: 'thesis', publisher: 'University of Nowhere' })).toBe('University of Nowhere');
    expect(containerText({ type: 'document' })).toBeNull();
    expect(callName({ given: 'Plato' })).toBe('Plato');
  });
});

describe('citation keys', () => {
  test.each([
    [source([{ family: 'Vantongeren' }], 1994), 'vantongeren1994'],
    [source([{ family: 'Berg', 'non-dropping-particle': 'van den' }], 1994), 'vandenberg1994'],
    [source([{ family: "O'Brien" }], 2007), 'obrien2007'],
    [source([{ family: 'Đokić' }], 2013), 'dokic2013'],
    [source([{ family: 'Łukasiewicz-Ærø' }], 2013), 'lukasiewiczaero2013'],
    [source([{ family: 'Şahin' }]), 'sahinnd'],
    [source([{ family: 'Иванов' }], 2016), 'ivanov2016'],
    [source([{ family: '王' }, { family: 'Παπάς' }], 2016), 'papas2016'],
    [source([{ literal: '3M Group' }, { family: 'Second' }], 2016), 'second2016'],
    [source([], 1966), 'nitrogen1966'],
    [{ type: 'document', title: '王' } satisfies Csl, 'anonnd'],
  ])('case %#', (csl, key) => {
    expect(citationKey(csl)).toBe(key);
  });

  test.each([
    ['a1994', [], 'a1994'],
    ['a1994', ['A1994'], 'a1994b'],
    ['a1994', ['a1994', 'A1994B'], 'a1994c'],
    ['a1994', ['a1994', ...[...'bcdefghijklmnopqrstuvwxyz'].map((letter) => `a1994${letter}`)], 'a1994aa'],
  ])('%s among %j becomes %s', (key, taken, unique) => {
    expect(disambiguate(key, taken)).toBe(unique);
  });

  test('every key is a letter followed by letters and digits, and a thousand alike stay apart without regard to case', () => {
    fc.assert(fc.property(fc.string({ unit: 'binary', maxLength: 30 }), fc.option(fc.integer({ min: -300, max: 9999 })), (family, year) => {
      expect(citationKey(source([{ family }], year ?? undefined))).toMatch(/^[a-z][a-z0-9]*$/);
    }));
    const taken: string[] = [];
    for (let index = 0; index < 1000; index += 1) taken.push(disambiguate('parker2001', taken));
    expect(new Set(taken.map((key) => key.toLowerCase())).size).toBe(1000);
  });
});

describe('readCsl', () => {
  test.each(referenceCases)('$id is kept as it is', ({ input: { csl } }) => {
    expect(readCsl(csl)).toEqual({ ok: true, csl });
  });

  test('the answers of registration agencies are read', () => {
    // Shape after the Crossref Metadata API JSON Format, v2; the content is invented.
    const reading = readCsl({
      type: 'journal-article', title: ['N<sub>2</sub> on\n  Ru(0001)', 'second'], 'container-title': ['Invented Journal', 'Inv. J.'], volume: 12, 'article-number': '045401',
      author: [{ family: 'Vantongeren', given: 'A.', sequence: 'first', affiliation: [] }, { name: 'Ammonia Data Group' }, 'Someone'], 'published-online': { 'date-parts': [['2010', '3', null]] },
      issued: { 'date-parts': [[null]] }, DOI: '10.5555/ABC', URL: 'javascript:alert(1)', ISSN: ['1234-5678'], abstract: 'x'.repeat(99_999), 'is-referenced-by-count': 4,
    });
    expect(reading).toEqual({ ok: true, csl: {
      type: 'article-journal', title: 'N<sub>2</sub> on Ru(0001)', 'container-title': 'Invented Journal', volume: '12', number: '045401', DOI: '10.5555/abc', ISSN: '1234-5678',
      author: [{ family: 'Vantongeren', given: 'A.' }, { literal: 'Ammonia Data Group' }, { literal: 'Someone' }],
    } });
  });

  test.each([
    [null, ''], [[], ''], ['text', ''], [{ type: 'book' }, 'title'], [{ type: 'book', title: 'x'.repeat(citationBounds.title + 1) }, 'title'],
    [{ type: 'book', title: 't', volume: 'v'.repeat(501) }, 'volume'], [{ type: 'book', title: 't', author: Array.from({ length: 1001 }, () => ({ family: 'A' })) }, 'author'],
    [{ type: 'book', title: 't', author: [{ family: 'f'.repeat(201) }] }, 'author.0.family'],
  ])('case %# is refused with the field named', (value, path) => {
    const reading = readCsl(value);
    expect(reading.ok ? null : reading.problems[0]?.path).toBe(path);
  });

  test.each([
    ['1994', { 'date-parts': [[1994]] }], ['1994-06', { 'date-parts': [[1994, 6]] }], ['1994/06/12/', { 'date-parts': [[1994, 6, 12]] }], ['1994-13', { 'date-parts': [[1994]] }],
    ['2001-02-03T04:05:06Z', { 'date-parts': [[2001, 2, 3]] }], ['in press', { literal: 'in press' }], ['', undefined],
  ])('the date %j', (words, date) => {
    expect(dateFromWords(words)).toEqual(date);
  });

  test('any JSON: a reading or problems, and what is read is read again unchanged', () => {
    const item = fc.record({
      type: fc.anything(), title: fc.oneof(fc.string({ unit: 'binary' }), fc.anything()), author: fc.anything(), issued: fc.anything(), volume: fc.anything(), DOI: fc.anything(), 'container-title': fc.anything(),
    }, { requiredKeys: [] });
    fc.assert(fc.property(fc.oneof(fc.anything(), item), (value) => {
      const reading = readCsl(value);
      if (reading.ok) expect(readCsl(JSON.parse(JSON.stringify(reading.csl)))).toEqual(reading);
      else expect(reading.problems.length).toBeGreaterThan(0);
    }), { numRuns: 1000 });
  });
});

describe('titles with marks', () => {
  test.each([
    ['CH<sub>4</sub>', [{ text: 'CH', marks: [] }, { text: '4', marks: ['sub'] }]],
    ['p < 0.1 <script>alert(1)</script>', [{ text: 'p < 0.1 <script>alert(1)</script>', marks: [] }]],
    ['<i>in <b>situ</b></i>', [{ text: 'in ', marks: ['i'] }, { text: 'situ', marks: ['i', 'b'] }]],
    ['<span class="nocase">Ru</span> a</i>', [{ text: 'Ru a', marks: [] }]],
    ['<jats:italic>in situ</jats:italic>', [{ text: 'in situ', marks: ['i'] }]],
    ['never <sub>closed', [{ text: 'never ', marks: [] }, { text: 'closed', marks: ['sub'] }]],
  ])('%j', (text, runs) => {
    expect(richText(text)).toEqual(runs);
  });

  test('plain, Unicode and tagged forms', () => {
    expect(plainText('<sup>13</sup>CH<sub>4</sub>')).toBe('13CH4');
    expect(unicodeText('<sup>13</sup>CH<sub>4</sub>, CO<sub>x</sub>')).toBe('¹³CH₄, COx');
    expect(taggedScripts('H₂, s⁻¹ and ¹³C')).toBe('H<sub>2</sub>, s<sup>-1</sup> and <sup>13</sup>C');
    expect(richTextSource(richText('CH<sub>4'))).toBe('CH<sub>4</sub>');
  });

  test('writing and reading again changes nothing', () => {
    fc.assert(fc.property(fc.array(fc.oneof(fc.constantFrom('<sub>', '</sub>', '<i>', '</i>', '<', '>', '<span>', 'b', ' '), fc.string())).map((parts) => parts.join('')), (text) => {
      const once = richTextSource(richText(text));
      expect(richTextSource(richText(once))).toBe(once);
    }), { numRuns: 2000 });
  });
});

describe('notices', () => {
  // Members of an update after the Crossref Metadata API JSON Format ("Update"); `updated-by` itself from memory.
  const update = (type: string) => ({ type, DOI: '10.5555/N.1', label: 'Notice', updated: { 'date-parts': [[2019, 4, 2]] } });
  test.each([
    [{ 'updated-by': [update('retraction')] }, 'retracted', 'retraction'],
    [{ 'updated-by': [update('Withdrawal')] }, 'retracted', 'withdrawal'],
    [{ 'updated-by': [update('removal')] }, 'retracted', 'withdrawal'],
    [{ 'updated-by': [update('correction')] }, 'corrected', 'correction'],
    [{ 'updated-by': [update('erratum'), update('retraction')] }, 'retracted', 'retraction'],
    [{ 'updated-by': [update('expression_of_concern')] }, 'current', 'expression-of-concern'],
    [{ 'updated-by': [update('expression_of_concern'), update('corrigendum')] }, 'corrected', 'expression-of-concern'],
    [{ title: 'RETRACTED: Nitrogen on ruthenium' }, 'retracted', 'retraction'],
    [{ title: ['[Retracted] Nitrogen on ruthenium'] }, 'retracted', 'retraction'],
    [{ title: 'WITHDRAWN ARTICLE: Nitrogen on ruthenium' }, 'retracted', 'withdrawal'],
    [{ title: 'Retracted positions of the tip in microscopy' }, 'current', undefined],
    [{ 'update-to': [update('retraction')] }, 'current', undefined],
    [{ 'updated-by': [update('new_version')] }, 'current', undefined],
    [{ 'updated-by': 'retraction' }, 'current', undefined],
    [null, 'current', undefined],
  ])('case %#', (answer, status, kind) => {
    const standing = readNotice(answer);
    expect(standing.status).toBe(status);
    expect(standing.notice?.kind).toBe(kind);
  });

  test('the sentence says what, when and where', () => {
    const standing = readNotice({ 'updated-by': [update('retraction')] });
    expect(standing.notice && noticeSentence(standing.notice)).toBe('This source was retracted (2019-04-02), see 10.5555/n.1.');
    const titled = readNotice({ title: 'RETRACTED: x' });
    expect(titled.notice && noticeSentence(titled.notice)).toBe('This source was retracted, as its title says.');
  });

  test('any answer is read without an error', () => {
    fc.assert(fc.property(fc.record({ 'updated-by': fc.anything(), title: fc.anything() }, { requiredKeys: [] }), (answer) => {
      expect(['current', 'corrected', 'retracted']).toContain(readNotice(answer).status);
    }));
  });
});
