import type { BrowserContext, Page } from 'playwright-core';
import { afterEach, describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';

/** A fit as a modeller does it: columns from a spreadsheet, A and E with the picture, the link sent to a colleague. */
describe('the Workbench in the browser', () => {
  const site = useSite();
  const contexts: BrowserContext[] = [];

  afterEach(async () => {
    for (const context of contexts.splice(0)) await context.close();
  });

  async function openContext(): Promise<Page> {
    const context = await site.browser.newContext({ viewport: { width: 1440, height: 900 }, permissions: ['clipboard-read', 'clipboard-write'] });
    contexts.push(context);
    return context.newPage();
  }

  const points = ['T / K\tk / s-1', '420\t3.80', '440\t13.1', '460\t45.2', '480\t127', '500\t366', '520\t880', '540\t2140', '560\t4600'].join('\n');
  const result = async (page: Page) => (await page.getByRole('region', { name: 'Result' }).innerText()).replace(/\s+/g, ' ');

  it('fits pasted points, draws them, and gives the same by the link', async () => {
    const page = await openContext();
    await page.goto(`${site.url}/workbench`);
    await page.getByRole('link', { name: 'Fit A and E' }).click();
    await page.getByRole('textbox', { name: 'T, K, row 1' }).click();
    await page.evaluate((text) => navigator.clipboard.writeText(text), points);
    await page.keyboard.press('Control+V');
    await page.getByText('8 rows, 2 columns read; header skipped.').waitFor();
    // Least squares of ln k on 1/T written out in Python: E = 99.58964 kJ/mol, standard error 0.42281.
    await expect.poll(() => result(page)).toMatch(/Activation energy E 99\.59 ± ?0\.42 kJ\/mol/);
    await page.getByRole('img', { name: /^8 rate constants against temperature with the fitted line/ }).waitFor();
    const before = await result(page);

    await page.waitForURL(/points=/);
    await page.getByRole('button', { name: 'Copy link' }).click();
    const link = await page.evaluate(() => navigator.clipboard.readText());
    expect(link).toBe(page.url());

    const colleague = await openContext();
    await colleague.goto(link);
    await colleague.getByRole('img', { name: /^8 rate constants/ }).waitFor();
    expect(await result(colleague)).toBe(before);

    await colleague.getByText('The plot as a table, and which points are used').click();
    await colleague.getByRole('checkbox', { name: /^Point 1, 420 K/ }).uncheck();
    await colleague.getByText('Row 1 left out of the fit.').waitFor();
    expect(await result(colleague)).not.toBe(before);
    await colleague.getByRole('textbox', { name: /^Rows left out/ }).fill('');
    await expect.poll(() => result(colleague)).toBe(before);

    await colleague.getByRole('link', { name: /^Evaluate k at a temperature/ }).click();
    await colleague.getByRole('button', { name: 'Use 700 K' }).click();
    await expect.poll(() => result(colleague)).toMatch(/extrapolated.*700 K lies outside the valid range, 420 to 560 K/);
  });

  it('prints what was given, the result and the method, without what is for the screen', async () => {
    const page = await openContext();
    await page.goto(`${site.url}/workbench/arrhenius?preExponential=1e13&energy=100&temperatureK=500`);
    await page.getByRole('heading', { name: 'The derivation' }).waitFor();
    await page.emulateMedia({ media: 'print' });
    expect(await page.getByRole('form').isVisible()).toBe(false);
    expect(await page.getByRole('navigation', { name: 'Calculators' }).isVisible()).toBe(false);
    expect(await page.getByRole('region', { name: 'Given' }).innerText()).toMatch(/Pre-exponential factor A: 1e13 s/);
  });

  it('starts an entry from a calculation, with its figures as typed and saved as a draft', async () => {
    const page = await openContext();
    await page.goto(`${site.url}/sign-in`);
    await page.getByLabel('E-mail', { exact: true }).fill('contributor@demo.sillstone.example');
    await page.getByLabel('Password', { exact: true }).fill('stepping-stone');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.waitForURL((url) => url.pathname !== '/sign-in');
    await page.goto(`${site.url}/workbench/energy?value=24.0&standardUncertainty=0.5`);
    await page.getByRole('link', { name: 'Use in a new entry' }).click();
    await expect.poll(() => page.getByLabel('As printed', { exact: true }).inputValue()).toBe('24.0 ± 0.5');
    expect(await page.getByLabel('Unit as printed', { exact: true }).inputValue()).toBe('kcal/mol');
    await page.getByText(/^Saved/).first().waitFor();
    await page.waitForURL(/\/contribute\/.+/);
  });

  it('answers while the server cannot be reached', async () => {
    const page = await openContext();
    await page.goto(`${site.url}/workbench/energy`);
    await page.getByRole('textbox', { name: /^Energy/ }).waitFor();
    await page.route('**/api/**', (route) => route.abort());
    await page.getByRole('textbox', { name: /^Energy/ }).fill('24');
    await expect.poll(() => result(page)).toMatch(/100\.416 kJ\/mol/);
  });
});
