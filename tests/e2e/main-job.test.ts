import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';
import { unzip } from '#tests/setup/unzip.ts';

/** The whole job, in a real browser on the compiled product: typed as printed, checked by a second person, found, taken away. */
describe('the main job', { concurrent: false }, () => {
  const site = useSite();
  const folder = mkdtempSync(join(tmpdir(), 'sillstone-e2e-'));
  let contributor: Page;
  let reviewer: Page;
  let visitor: Page;
  let accession = '';
  const complaints: string[] = [];

  async function openPage(): Promise<Page> {
    const context = await site.browser.newContext({ viewport: { width: 1440, height: 900 }, acceptDownloads: true });
    const page = await context.newPage();
    page.on('pageerror', (error) => complaints.push(error.message));
    page.on('console', (message) => {
      // The browser itself reports answers such as 404 for an unknown DOI; only what the program says counts.
      if (message.type() === 'error' && !message.text().startsWith('Failed to load resource')) complaints.push(message.text());
    });
    return page;
  }

  async function signIn(page: Page, name: string): Promise<void> {
    await page.goto(`${site.url}/sign-in`);
    await page.getByLabel('E-mail', { exact: true }).fill(`${name}@demo.sillstone.example`);
    await page.getByLabel('Password', { exact: true }).fill('stepping-stone');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.waitForURL((url) => url.pathname !== '/sign-in');
  }

  beforeAll(async () => {
    [contributor, reviewer, visitor] = [await openPage(), await openPage(), await openPage()];
  });
  afterAll(async () => {
    for (const page of [contributor, reviewer, visitor]) await page?.context().close();
    rmSync(folder, { recursive: true, force: true });
  });

  it('takes a value as the paper prints it, with the DOI of the paper', async () => {
    await signIn(contributor, 'contributor');
    await contributor.goto(`${site.url}/contribute`);

    await contributor.getByLabel('DOI, BibTeX or RIS', { exact: true }).fill('https://doi.org/10.5555/AISK.1994.0412.');
    await contributor.getByRole('button', { name: 'Look up' }).click();
    await contributor.getByText('Desorption kinetics of nitrogen from a close-packed ruthenium surface').first().waitFor();
    await contributor.getByLabel('Where in the source').fill('Table 2, page 113');

    await contributor.getByLabel('Equation', { exact: true }).fill('N* + N* -> N2');
    await contributor.getByRole('button', { name: 'Add the free site' }).click();
    await expect.poll(() => contributor.getByLabel('Equation', { exact: true }).inputValue()).toContain('2*');

    await contributor.getByLabel('Metal', { exact: true }).selectOption('Ru');
    await contributor.getByLabel('Facet', { exact: true }).fill('(0001)');
    await contributor.getByLabel('Form', { exact: true }).selectOption({ label: 'single crystal' });
    await contributor.getByLabel('Kind', { exact: true }).selectOption('activation-energy');
    await contributor.getByLabel('How the source came by it', { exact: true }).selectOption('measured');
    await contributor.getByRole('radio', { name: /^Elementary/ }).check({ force: true });
    await contributor.getByRole('radio', { name: 'Measured' }).check({ force: true });
    await contributor.getByLabel('Technique', { exact: true }).fill('TPD');

    const energy = contributor.getByRole('listitem', { name: /^Quantity 1/ });
    await energy.getByLabel('As printed', { exact: true }).fill('44.5 ± 1.4');
    await energy.getByLabel('Unit as printed', { exact: true }).fill('kcal/mol');
    if (await energy.getByLabel('Which energy', { exact: true }).inputValue() !== 'arrhenius') await energy.getByLabel('Which energy', { exact: true }).selectOption('arrhenius');
    await contributor.getByRole('button', { name: 'Add a quantity' }).click();
    const factor = contributor.getByRole('listitem', { name: /^Quantity 2/ });
    await factor.getByLabel('Quantity', { exact: true }).selectOption('preExponential');
    await factor.getByLabel('As printed', { exact: true }).fill('10^13');
    await factor.getByLabel('Unit as printed', { exact: true }).fill('s-1');
    await contributor.getByLabel('Valid from, K', { exact: true }).fill('430');
    await contributor.getByLabel('Valid to, K', { exact: true }).fill('620');

    const result = contributor.getByRole('complementary', { name: 'What it becomes' });
    await result.getByText(/186\.19|186\.2/).first().waitFor();
    // Shown to the printed digits and one more; the derivation, which stands open, has the figure in full.
    const text = await result.innerText();
    expect(text).toContain('44.5 ± 1.4 kcal/mol');
    expect(text).toMatch(/× 4\.184/);
    expect(text).toContain('186.188 kJ/mol');
    expect(text).toMatch(/k at 700 K\s+0\.1279/);
  });

  it('hands it in, frozen, under a permanent name', async () => {
    await contributor.getByText(/^Saved/).first().waitFor();
    await contributor.getByRole('button', { name: 'Submit for review' }).first().click();
    await contributor.getByRole('dialog').getByRole('button', { name: 'Submit', exact: true }).click();
    await contributor.waitForURL(/\/contributions/);
    await contributor.getByText('Waiting for a reviewer').first().waitFor();
    const mine = await (await contributor.request.get(`${site.url}/api/v1/contributions?state=submitted`)).json() as { items: { accession: string; asPrinted: string }[] };
    accession = mine.items.find(({ asPrinted }) => asPrinted === '44.5 ± 1.4')?.accession ?? '';
    expect(accession).toMatch(/^[2-9A-HJ-NP-TV-Z]{3}-[2-9A-HJ-NP-TV-Z]{3}-[2-9A-HJ-NP-TV-Z]$/);
  });

  it('does not let its contributor decide, nor a visitor see it', async () => {
    const queue = await contributor.request.get(`${site.url}/api/v1/reviews`);
    expect(queue.status()).toBe(403);
    await contributor.goto(`${site.url}/review`);
    await contributor.getByText(/reviewer/i).first().waitFor();
    expect(await contributor.getByRole('button', { name: 'Accept' }).count()).toBe(0);
    expect((await visitor.request.get(`${site.url}/api/v1/entries/${accession}`)).status()).toBe(404);
  });

  it('is held against the paper and accepted by a reviewer', async () => {
    await signIn(reviewer, 'reviewer');
    const detail = await (await reviewer.request.get(`${site.url}/api/v1/entries/${accession}`)).json() as { submission: string };
    await reviewer.goto(`${site.url}/review/${detail.submission}`);
    await reviewer.getByText('44.5 ± 1.4 kcal/mol').first().waitFor();
    const points = reviewer.getByRole('radiogroup');
    await points.first().waitFor();
    expect(await points.count()).toBe(8);
    for (const point of await points.all()) await point.getByRole('radio').first().check({ force: true });
    await reviewer.getByRole('button', { name: 'Accept', exact: true }).click();
    await reviewer.getByRole('dialog').getByRole('button', { name: /^Accept/ }).click();
    await reviewer.getByText(/accepted/i).first().waitFor();
    await expect.poll(async () => (await visitor.request.get(`${site.url}/api/v1/entries/${accession}`)).status()).toBe(200);
  });

  it('is found by a visitor through the sentence, and k at 700 K agrees with a calculation by hand', async () => {
    await visitor.goto(`${site.url}/search`);
    const choose = async (part: string, words: string, option: RegExp): Promise<void> => {
      await visitor.getByRole('button', { name: part }).first().click();
      await visitor.getByRole('combobox', { name: /^Find in/ }).fill(words);
      await visitor.getByRole('option').filter({ hasText: option }).first().click();
      await visitor.keyboard.press('Escape');
    };
    await choose('any elementary step', '2N* -> N2 + 2*', /N/);
    await visitor.waitForURL(/step=/);
    await choose('any surface', 'Ru', /Ru/);
    await visitor.waitForURL(/metal=Ru/);
    await visitor.getByRole('row').filter({ hasText: '44.5 ± 1.4 kcal/mol' }).filter({ hasText: 'Vantongeren 1994' }).waitFor();
    await visitor.goto(`${site.url}/entries/${accession}`);
    await visitor.getByText('44.5 ± 1.4 kcal/mol').first().waitFor();
    const page = await visitor.innerText('main');
    expect(page).toMatch(/186\.19|186\.2/);
    expect(page).toContain('Vantongeren');
    // By hand: E = 44.5 × 4184 J/mol = 186188 J/mol; E/RT = 186188 / (8.31446261815324 × 700) = 31.9904;
    // k = 1e13 exp(-31.9904) = 1e13 × 1.27855e-14 = 0.12786 s-1.
    const byHand = 1e13 * Math.exp(-(44.5 * 4184) / (8.31446261815324 * 700));
    expect(byHand).toBeCloseTo(0.1279, 3);
    const answer = await (await visitor.request.get(`${site.url}/api/v1/entries/${accession}?T=700`)).json() as { kAtT: { value: number; unit: string; extrapolated: boolean } };
    expect(Math.abs(answer.kAtT.value / byHand - 1)).toBeLessThan(1e-12);
    expect(answer.kAtT).toMatchObject({ unit: 's-1', extrapolated: true });
  });

  it('is taken away as CSV and BibTeX that other programs read', async () => {
    await visitor.goto(`${site.url}/search?metal=Ru`);
    await visitor.getByRole('button', { name: 'Export', exact: true }).click();
    const [download] = await Promise.all([visitor.waitForEvent('download'), visitor.getByRole('link', { name: 'CSV and BibTeX, in a ZIP' }).click()]);
    const zip = join(folder, 'export.zip');
    await download.saveAs(zip);
    for (const [name, content] of await unzip(readFileSync(zip))) writeFileSync(join(folder, name), content);

    const rows = parse(readFileSync(join(folder, 'parameters.csv'), 'utf8'), { columns: true, bom: false }) as Record<string, string>[];
    const mine = rows.find((row) => row['accession'] === accession);
    expect(mine).toMatchObject({ value_as_printed: '44.5 ± 1.4', unit_as_printed: 'kcal/mol', unit: 'kJ/mol', standard_uncertainty: '', uncertainty_kind: 'unknown', step: 'N* + N* -> N2 + 2*' });
    expect(Number(mine?.['value'])).toBeCloseTo(186.188, 9);
    const found = await (await visitor.request.get(`${site.url}/api/v1/entries?metal=Ru&limit=1`)).json() as { total: number };
    expect(rows).toHaveLength(found.total);

    const bib = readFileSync(join(folder, 'references.bib'), 'utf8');
    const keys = new Set([...bib.matchAll(/^@\w+\{([^,]+),/gm)].map((match) => match[1]));
    for (const row of rows) expect(keys).toContain(row['citation_key']);

    // Real BibTeX, every key cited, not a single warning.
    writeFileSync(join(folder, 'check.aux'), `\\citation{*}\n\\bibdata{references}\n\\bibstyle{plain}\n`);
    const said = execFileSync('bibtex', ['check'], { cwd: folder, encoding: 'utf8' });
    expect(said).not.toMatch(/warning|error/i);
    const printed = readFileSync(join(folder, 'check.bbl'), 'utf8');
    expect(printed.match(/\\bibitem/g)).toHaveLength(keys.size);
  });

  it('left no complaint in the browser on the way', () => {
    expect(complaints).toEqual([]);
  });
});
