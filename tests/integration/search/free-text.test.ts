import { beforeAll, describe, expect, it } from 'vitest';
import type { Entry } from '#shared/contracts/entries.ts';
import { useApp } from '#tests/factories/app.ts';
import { okBody, problemOf, type Body, type Client } from '#tests/factories/client.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const app = useApp();
let visitor: Client;
const accessions: string[] = [];

beforeAll(async () => {
  visitor = await app.visitor();
  const lives = new Lives(app.services, (await app.person('contributor')).actor, (await app.person('reviewer')).actor);
  for (const input of [
    entryInputOf({ note: 'Promoted by caesium; 100 % coverage_limit' }),
    entryInputOf({ source: { doi: '10.5555/test.5' }, surface: { metal: 'Ni', facet: '111' }, step: { equation: 'N* + N* -> N2 + 2*' }, kind: 'barrier', provenance: 'computed', method: { class: 'computed', technique: 'DFT-PBE' }, quantities: [{ symbol: 'energy', energyType: 'electronic', asPrinted: '1.9', unitAsPrinted: 'eV' }] }),
    entryInputOf({ source: { doi: '10.5555/test.3' }, surface: { metal: 'Cu', facet: '111' }, step: { equation: 'H* + H* -> H2 + 2*' }, conditions: { promoter: 'Ba 2 %' } }),
  ]) accessions.push((await lives.accepted(input)).accession);
});

const find = async (q: string): Promise<string[]> => (okBody(await visitor.get(`/entries?q=${encodeURIComponent(q)}`)).items as Entry[]).map(({ accession }) => accession).sort();
const the = (...indices: number[]): string[] => indices.map((index) => accessions[index] ?? '').sort();

describe('free text', () => {
  it.each<[string, string, number[]]>([
    ['a word', 'ruthenium', [0]], ['capitals', 'RUTHENIUM', [0]], ['the beginning of a word', 'rutheni', [0]], ['a slip of spelling', 'ruthenuim', [0]], ['another slip', 'computd', [1]],
    ['an author', 'Ambrosetti', [0]], ['an author without the accents', 'ekstrom', [1]], ['with them', 'Ekström', [1]], ['a surface', 'Ni(111)', [1]], ['part of an equation', 'n2 + 2*', [1]],
    ['two words, both needed', 'ammonia ruthenium', [0]], ['two words of different entries', 'ruthenium copper', []], ['a year', '2008', [2]], ['a DOI', '10.5555/test.3', [2]], ['the beginning of a promoter and of a word', 'ba', [1, 2]],
    ['a percent sign, which stands for itself', '%', [0, 2]], ['an underscore, which stands for itself', 'coverage_limit', [0]], ['an underscore that would match anything', 'r_thenium', []],
    ['nothing but space', '   ', [0, 1, 2]],
  ])('%s: %s', async (_what, q, found) => {
    expect(await find(q)).toEqual(the(...found));
  });

  it('an accession finds its entry', async () => {
    expect(await find(accessions[1] ?? '')).toContain(accessions[1]);
  });

  it.each([
    "'", "''", '"', '\\', "\\'", '; drop table entries; --', "' or '1'='1", '$1', '%s', '{}', '()', '(', ')', ':*', '!', '&', '|', '<->', "foo':*", 'a:*b', '*', '**', '?', '[', '.*', '(?:', '\\d+', '^$', 'a{1000000}',
    '⑴', '½', 'ŉ', 'Ⅷ', '㎏', 'ﬁ', '№', 'ß', 'İ', 'ſ', '\u200b', '\u200bru\u200b', '\u202eur', '\u2066x\u2069', '\ufeff', '\u0301', 'e\u0301', 'مرحبا', 'שלום', '氨', '\u{1F9EA}', '\u{10FFFF}', '\uFFFD', '\uFFFE', '\u00a0', '\u2028', '\t', '\n', '\r\n', '\u0001', '\u007f', 'a'.repeat(400), '* '.repeat(200).trim(),
    '-1', '1e400', 'null', 'undefined', 'NaN', 'true', '[object Object]', '__proto__',
  ])('hostile text is only text: %j', async (q) => {
    const answer = await visitor.get(`/entries?counts=true&q=${encodeURIComponent(q)}`);
    expect(answer.status, answer.text.slice(0, 300)).toBe(200);
    expect((await visitor.get(`/entries/summary?q=${encodeURIComponent(q)}`)).status).toBe(200);
    expect((await visitor.get(`/sources?q=${encodeURIComponent(q.slice(0, 200))}`)).status).toBe(200);
  });

  it('so is every letter and number of the basic plane, a hundred at a time', async () => {
    const letters: string[] = [];
    for (let code = 0x80; code < 0xd800; code += 1) if (/[\p{L}\p{N}]/u.test(String.fromCharCode(code))) letters.push(String.fromCharCode(code));
    // Only those that accents are taken off can surprise; the rest are sampled.
    const worth = letters.filter((letter, index) => letter.normalize('NFKD') !== letter || index % 97 === 0);
    expect(worth.length).toBeGreaterThan(1500);
    for (let from = 0; from < worth.length; from += 10 * 38) {
      await Promise.all(Array.from({ length: 38 }, async (_, n) => {
        const q = worth.slice(from + n * 10, from + n * 10 + 10).join(' ');
        if (q) expect((await visitor.get(`/entries?q=${encodeURIComponent(q)}&limit=1`)).status, q).toBe(200);
      }));
    }
  });

  it.each<[string, string]>([
    ['too long a text', `q=${'x'.repeat(401)}`], ['ten kilobytes of text', `q=${'x'.repeat(10_000)}`], ['ten kilobytes of steps', `step=${encodeURIComponent('N* + '.repeat(1000))}`], ['a text given twice', 'q=a&q=b'],
    ['fifty-one values', Array.from({ length: 51 }, (_, n) => `metal=M${n}`).join('&')], ['an unknown kind', 'kind=enthalpy'], ['an unknown sort', 'sort=length'], ['a temperature of nothing', 'T=0'], ['a word for a temperature', 'validAt=hot'],
    ['counts of perhaps', 'counts=perhaps'], ['a year of the dinosaurs', 'yearFrom=-65000000'], ['an infinite limit', 'limit=1e999'], ['a hexadecimal nothing', 'T=0x'],
  ])('%s is refused as bad input', async (_what, query) => {
    const answer = await visitor.get(`/entries?${query}`);
    expect(problemOf(answer)).toMatchObject({ status: 422, code: 'invalid-input' });
  });

  it.each<[string, string]>([
    ['a name nobody knows', 'colour=red'], ['a name that objects have', '__proto__=x&constructor=y&toString=z'], ['brackets', 'metal[]=Ru&metal[0]=Ru'], ['half an escape', 'q=%E0%A4%A'], ['a broken encoding', 'q=%ff%fe'],
    ['quotes for a metal', "metal=' or 1=1 --"], ['a source that looks like an id', `source=${'-'.repeat(36)}`], ['a source almost an id', 'source=00000000-0000-0000-0000-00000000000z'], ['nothing at all', '&&=&=x'], ['five thousand steps that are none', `step=${'x'.repeat(400)}`],
  ])('%s does no harm', async (_what, query) => {
    const answer = await visitor.get(`/entries?${query}`);
    expect([200, 400, 422]).toContain(answer.status);
  });

  const wordFilters = ['metal', 'contains', 'formula', 'facet', 'support', 'promoter', 'step', 'stepClass', 'species', 'bond', 'method', 'methodFamily', 'source', 'author', 'contributor'];
  it.each(wordFilters)('no word given for %s does harm, and what cannot be understood finds nothing', async (name) => {
    for (const value of ["'", '"', '\\', '%', '_', '{a,b}', '{"a"}', '[', '*', '+', '.*', '(?:', '$1', "' or '1'='1", '\u202eurgnoR', 'مرحبا', 'שלום', '氨', '\u{1F9EA}', '\u00ad', 'a\u0301', 'x'.repeat(200), '-1', '1e999', 'null', '__proto__', 'constructor', '->', '0', '\t', '⑴']) {
      const answer = await visitor.get(`/entries?limit=1&${name}=${encodeURIComponent(value)}`);
      expect([200, 422], `${name}=${value}: ${answer.text.slice(0, 200)}`).toContain(answer.status);
      if (answer.status === 200) expect((answer.body as Body).total, `${name}=${value}`).toBe(0);
    }
  });

  it('a null character is refused, since no text can hold it', async () => {
    for (const name of ['q', 'metal', 'technique', 'source', 'facet', 'step']) {
      const answer = await visitor.get(`/entries?${name}=a%00b`);
      expect([200, 400, 422], name).toContain(answer.status);
    }
  });
});
