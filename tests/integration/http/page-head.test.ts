import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createApp, usualLimits } from '#server/app.ts';
import { dataBlock, withHead } from '#server/http/page-head.ts';
import { createServices } from '#server/services.ts';
import { useApp, type Person } from '#tests/factories/app.ts';
import { entryInputOf } from '#tests/factories/entry-input.ts';
import { Lives } from '#tests/factories/lives.ts';

const shell = '<!doctype html>\n<html lang="en">\n  <head>\n    <meta name="description" content="The usual words." />\n    <title>Sillstone</title>\n  </head>\n  <body><div id="root"></div></body>\n</html>\n';
const hostile = '</script><script>alert("1")</script> $& \' & <!-- H<sub>2</sub>';

const app = useApp();
let folder = '';
let contributor: Person;
let reviewer: Person;
let lives: Lives;

/** The page as a browser that is not signed in gets it. */
async function page(address: string, demonstration = false) {
  const context = { ...app.context, demonstration };
  const served = createApp(context, createServices(context), { sessionSecret: 'a long text that is only ever used in tests 0123456789', secureCookies: false, clientDir: folder, limits: usualLimits });
  const answer = await request(served).get(address);
  expect(answer.status).toBe(200);
  const { text, headers } = answer;
  const block = /<script type="application\/ld\+json">(.*?)<\/script>/s.exec(text)?.[1];
  return {
    text, robots: headers['x-robots-tag'] as string | undefined, metaRobots: /<meta name="robots" content="([^"]*)"/.exec(text)?.[1],
    canonical: /<link rel="canonical" href="([^"]*)"/.exec(text)?.[1], title: /<title>([^<]*)<\/title>/.exec(text)?.[1], policy: String(headers['content-security-policy']),
    data: block === undefined ? null : JSON.parse(block) as Record<string, unknown> & { citation: Record<string, unknown>; variableMeasured: Record<string, unknown>[] },
  };
}

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'sillstone-page-'));
  writeFileSync(path.join(folder, 'index.html'), shell);
  [contributor, reviewer] = [await app.person('contributor', 'Ada Contributor'), await app.person('reviewer')];
  lives = new Lives(app.services, contributor.actor, reviewer.actor);
});
afterAll(() => rmSync(folder, { recursive: true }));

describe('the page of an accepted entry', () => {
  it('names itself, its one address and its source', async () => {
    const { accession } = await lives.accepted();
    const { title, canonical, robots, metaRobots, data, policy } = await page(`/entries/${accession}`);
    expect(title).toBe('NH3* -&gt; NH3 + * on Ru(0001): 44.5 ± 1.4 kcal/mol · Sillstone');
    expect(canonical).toBe(`http://sillstone.test/entries/${accession}`);
    expect([robots, metaRobots]).toEqual([undefined, undefined]);
    // Nothing in a data block is run, so that the policy stays as strict as it is.
    expect(policy).toContain("script-src 'self';");
    expect(data).toMatchObject({
      '@context': 'https://schema.org', '@type': 'Dataset', 'identifier': accession, 'version': '1', 'url': `http://sillstone.test/entries/${accession}`,
      'datePublished': '2026-03-02', 'creator': { name: 'Ada Contributor' },
      'citation': {
        '@type': 'ScholarlyArticle', 'name': 'Thermal desorption of ammonia from ruthenium, an invented study', 'author': [{ '@type': 'Person', 'name': 'Ada Ambrosetti' }, { '@type': 'Person', 'name': 'Ida Example' }],
        'datePublished': '1994', 'sameAs': 'https://doi.org/10.5555/test.1',
      },
    });
    expect(data?.variableMeasured[0]).toMatchObject({ name: 'Arrhenius activation energy', unitText: 'kJ/mol', description: 'printed as 44.5 ± 1.4 kcal/mol' });
  });

  it('gives a bound the end it has, and no value', async () => {
    const { accession } = await lives.accepted(entryInputOf({ quantities: [{ symbol: 'energy', energyType: 'arrhenius', asPrinted: '< 30', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'none' }] }));
    const [energy] = (await page(`/entries/${accession}`)).data?.variableMeasured ?? [];
    expect(energy).toMatchObject({ maxValue: 30 });
    expect(energy).not.toHaveProperty('value');
  });

  it('has one address whichever of its own is asked for', async () => {
    const { accession } = await lives.accepted();
    for (const address of [`/entries/${accession}/v/1`, `/entries/${accession.toLowerCase()}`, `/entries/${accession}/?T=500`]) expect((await page(address)).canonical).toBe(`http://sillstone.test/entries/${accession}`);
  });

  it('takes the words of others for words', async () => {
    const { accession } = await lives.accepted(entryInputOf({
      locator: hostile, source: { csl: { type: 'article-journal', title: hostile, author: [{ family: hostile, given: '"' }], issued: { 'date-parts': [[2001]] }, 'container-title': hostile } as never },
    }));
    const { text, data } = await page(`/entries/${accession}`);
    expect(text.match(/<script/g)).toHaveLength(1);
    expect(text).not.toContain('<!--');
    expect(text.match(/<\/head>/g)).toHaveLength(1);
    expect(text).toContain('&lt;/script&gt;&lt;script&gt;alert(&quot;1&quot;)&lt;/script&gt; $&amp;');
    expect(JSON.stringify(data?.citation)).toContain('</script><script>alert(');
  });
});

describe('what search services are kept out of', () => {
  it.each(['draft', 'submitted', 'rejected', 'withdrawn', 'retracted', 'superseded'] as const)('an entry of which the first version is %s', async (state) => {
    const { accession } = await lives.inState(state);
    const address = state === 'superseded' || state === 'retracted' ? `/entries/${accession}/v/1` : `/entries/${accession}`;
    const { robots, metaRobots, data, canonical, text } = await page(address);
    expect([robots, metaRobots, data, canonical]).toEqual(['noindex', 'noindex', null, undefined]);
    // What is not public is not told by the head either.
    if (state !== 'superseded' && state !== 'retracted') expect(text).not.toContain('44.5');
  });

  it.each(['/entries/222-222-2', '/entries/nothing', '/entries/222-222-2/v/99'])('%s, which is not there', async (address) => {
    const { robots, metaRobots } = await page(address);
    expect([robots, metaRobots]).toEqual(['noindex', 'noindex']);
  });

  it('every page and every answer of demonstration data', async () => {
    const { accession } = await lives.accepted();
    for (const address of ['/', '/search', `/entries/${accession}`]) {
      const { robots, metaRobots } = await page(address, true);
      expect([address, robots, metaRobots]).toEqual([address, 'noindex', 'noindex']);
    }
    expect((await page(`/entries/${accession}`, true)).text).toContain('Invented data for demonstration.');
    const context = { ...app.context, demonstration: true };
    const served = createApp(context, app.services, { sessionSecret: 'a long text that is only ever used in tests 0123456789', secureCookies: false, clientDir: folder, limits: usualLimits });
    expect((await request(served).get(`/api/v1/entries/${accession}`)).headers['x-robots-tag']).toBe('noindex');
  });

  it('nothing else: the other pages are served as they were built', async () => {
    const { text, robots } = await page('/search?metal=Ru');
    expect([text, robots]).toEqual([shell, undefined]);
  });
});

describe('the words of a head', () => {
  it.each(['</script>', '<!--<script>', '$& $` $\' $1', '\u2028\u2029', '"\'&<>'])('%j stays one text of a data block and of a head', (text) => {
    const block = dataBlock({ name: text });
    const inside = block.slice('<script type="application/ld+json">'.length, -'</script>'.length);
    expect(inside).not.toMatch(/[<>&\u2028\u2029]/);
    expect(JSON.parse(inside)).toEqual({ name: text });
    const html = withHead(shell, { title: text, description: text, canonical: null, alternate: null, indexed: true, data: { name: text } });
    expect(html.replace(/<title>.*<\/title>|<meta name="description".*\/>|<script.*<\/script>/gs, '').replace(/\s+/g, '')).toBe(shell.replace(/<title>.*<\/title>|<meta.*\/>/g, '').replace(/\s+/g, ''));
  });
});
