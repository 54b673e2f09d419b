import fc from 'fast-check';
import type { Csl, CslName } from '#shared/citations/csl.ts';
import { richText, richTextSource } from '#shared/citations/rich-text.ts';

/** Characters met in titles of this trade, with everything TeX and BibTeX give a meaning to. */
const characters = [...'abcXYZ019 .,:;-+*/=()[]{}<>%&#_$^~\\\'"`!?@|éüçñøłßÅŞěőąγΔμα→⇌≤×±·°‡“”‘’–—…−€王Иπω'];
const text = (maxLength: number) => fc.string({ unit: fc.constantFrom(...characters), minLength: 1, maxLength })
  .map((value) => value.replace(/\s+/g, ' ').trim()).filter((value) => value !== '');

/** Titles with marks, in the one form in which the store keeps them. */
export const richTitles = fc.array(fc.oneof(text(12), fc.constantFrom('<sub>2</sub>', '<sup>13</sup>', '<sup>-1</sup>', '<i>in situ</i>', '<sub>ads</sub>', '<b>B5</b>', '<sup>2+</sup>', 'CH<sub>4</sub>')), { minLength: 1, maxLength: 6 })
  .map((parts) => richTextSource(richText(parts.join('').replace(/\s+/g, ' ').trim())));

const word = fc.constantFrom('Arden', 'Bolton', "O'Brien", 'Smith-Jones', 'Đokić', 'Şahin', 'Ørsted', 'Łuk', 'de Boer', 'Smith Jones', 'and', 'others', 'Müller', 'Иванов', '王', 'Παπάς', 'Île', 'A&B', '100%', 'x_y', 'Co, Inc.', "d'Or", '#1', '{x', 'a\\b');
const name: fc.Arbitrary<CslName> = fc.oneof(
  fc.record({ family: word, given: fc.constantFrom('A.', 'Jean-Paul', 'Žarko', 'B. C.', 'Ē.', 'X and Y', 'K, L') }),
  fc.record({ family: fc.constantFrom('Berg', 'Cruz', 'Ørsted'), given: fc.constantFrom('P.', 'María'), 'non-dropping-particle': fc.constantFrom('van den', 'de la', 'von') }),
  fc.record({ family: fc.constantFrom('Foo', 'Bar'), given: fc.constantFrom('A.'), suffix: fc.constantFrom('Jr.', 'III') }),
  fc.record({ literal: fc.constantFrom('The Sillstone and Sons Group', 'Ammonia Data, Inc.', 'R&D Group of 100% People', 'Group #1_a') }),
);

const optional = <Value>(value: fc.Arbitrary<Value>) => fc.option(value, { nil: undefined, freq: 3 });
const doi = fc.string({ unit: fc.constantFrom(...'abc019-_.;()/:<>&#'), minLength: 1, maxLength: 20 }).map((tail) => `10.5555/t${tail.replace(/\/\.{0,2}(?=\/|$)/g, '')}x`).filter((value) => !/[()<>&]/.test(value) || /^[^()<>&]*(\([^()<>&]*\)|<[^()<>&]*>)*[^()<>&]*$/.test(value));

function withoutUndefined(csl: Record<string, unknown>): Csl {
  return Object.fromEntries(Object.entries(csl).filter(([, value]) => value !== undefined && !(Array.isArray(value) && value.length === 0))) as unknown as Csl;
}

/** Citations of every kind we write, complete enough to be written as their own type. */
export const csls: fc.Arbitrary<Csl> = fc.oneof(
  fc.record({
    type: fc.constant('article-journal'), title: richTitles, author: fc.array(name, { maxLength: 4 }), 'container-title': text(20), volume: optional(fc.constantFrom('12', '107')), issue: optional(fc.constantFrom('3', '3-4')),
    page: optional(fc.constantFrom('101-118', 'R1-R27', '5')), number: optional(fc.constantFrom('045401', 'e12')), issued: fc.integer({ min: 1500, max: 2100 }).map((year) => ({ 'date-parts': [[year]] })), DOI: optional(doi),
  }),
  fc.record({
    type: fc.constantFrom('paper-conference', 'chapter'), title: richTitles, author: fc.array(name, { maxLength: 3 }), editor: fc.array(name, { maxLength: 2 }), 'container-title': text(20), publisher: text(15), page: optional(fc.constantFrom('31-36')),
    issued: fc.constant({ 'date-parts': [[2018, 6]] }), DOI: optional(doi),
  }),
  fc.record({ type: fc.constant('thesis'), title: richTitles, author: fc.array(name, { minLength: 1, maxLength: 1 }), publisher: text(15), genre: fc.constantFrom('PhD thesis', "Master's thesis"), issued: fc.constant({ 'date-parts': [[2009]] }) }),
  fc.record({ type: fc.constant('report'), title: richTitles, author: fc.array(name, { maxLength: 2 }), publisher: text(15), number: optional(fc.constantFrom('TR-1')), issued: fc.constant({ 'date-parts': [[2009]] }), DOI: optional(doi) }),
  fc.record({ type: fc.constant('book'), title: richTitles, author: fc.array(name, { minLength: 1, maxLength: 2 }), publisher: text(15), 'publisher-place': optional(fc.constant('Nowhere')), edition: optional(fc.constant('2')), issued: fc.constant({ 'date-parts': [[1999]] }) }),
).map(withoutUndefined);
