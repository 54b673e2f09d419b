import type { BrowserContext, Page } from 'playwright-core';
import { afterEach, describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';

/** What people get wrong, and what goes wrong around them: each a clear message on the screen, and nothing typed is lost. */
describe('bad input in the browser', () => {
  const site = useSite();
  const contexts: BrowserContext[] = [];

  afterEach(async () => {
    for (const context of contexts.splice(0)) await context.close();
  });

  async function signedIn(name: string): Promise<Page> {
    const context = await site.browser.newContext({ viewport: { width: 1440, height: 900 } });
    contexts.push(context);
    const page = await context.newPage();
    await page.goto(`${site.url}/sign-in`);
    await giveCredentials(page, name);
    await page.waitForURL((url) => url.pathname !== '/sign-in');
    return page;
  }

  async function giveCredentials(page: Page, name: string): Promise<void> {
    await page.getByLabel('E-mail', { exact: true }).fill(`${name}@demo.sillstone.example`);
    await page.getByLabel('Password', { exact: true }).fill('stepping-stone');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  }

  async function lookUp(page: Page, doi: string): Promise<void> {
    await page.goto(`${site.url}/contribute`);
    await page.getByLabel('DOI, BibTeX or RIS', { exact: true }).fill(doi);
    await page.getByRole('button', { name: 'Look up' }).click();
  }

  const saved = (page: Page) => page.getByText(/^Saved/).first().waitFor();

  it('says that a DOI is not registered', async () => {
    const page = await signedIn('contributor');
    await lookUp(page, '10.5555/no.such.paper');
    await page.getByText('This DOI is not registered.').waitFor();
  });

  it('goes on with a typed citation while the DOI service is down', async () => {
    const page = await signedIn('contributor');
    await lookUp(page, '10.5555/failing');
    await page.getByText('The DOI could not be looked up now.').waitFor();
    await page.getByRole('button', { name: 'Type the citation', exact: true }).click();
    await page.getByLabel('Title', { exact: true }).fill('A paper typed by hand');
    await page.getByLabel('Authors', { exact: true }).fill('Example, Ida');
    await page.getByLabel('Year', { exact: true }).fill('2011');
    await page.getByLabel('Equation', { exact: true }).fill('H2 + 2* -> 2H*');
    await saved(page);
    const accession = new URL(page.url()).pathname.split('/').at(-1) ?? '';
    await expect.poll(async () => {
      const draft = await (await page.request.get(`${site.url}/api/v1/entries/${accession}/draft`)).json() as { source: { title: string } | null };
      return draft.source?.title;
    }).toBe('A paper typed by hand');
  });

  it.each([
    ['an equation that does not balance', 'Equation', 'NH3* -> NH2* + H*', /site/],
    ['a value that is no number', 'As printed', 'abc', /abc|expected|number/i],
    ['a unit that does not fit', 'Unit as printed', 's-1', /s-1|unit/i],
  ])('names %s at its field', async (_what, label, typed, message) => {
    const page = await signedIn('contributor');
    await page.goto(`${site.url}/contribute`);
    if (label !== 'As printed') await page.getByLabel('As printed', { exact: true }).fill('44.5');
    if (label === 'As printed') await page.getByLabel('Unit as printed', { exact: true }).fill('kJ/mol');
    await page.getByLabel(label, { exact: true }).fill(typed);
    await page.getByLabel('Where in the source').click();
    const field = page.getByLabel(label, { exact: true });
    await expect.poll(() => field.getAttribute('aria-invalid')).toBe('true');
    const described = (await field.getAttribute('aria-describedby') ?? '').split(' ').map((id) => `[id="${id}"]`).join(', ');
    await expect.poll(async () => (await page.locator(described).allInnerTexts()).join(' ')).toMatch(message);
  });

  it('lets somebody whose session ended sign in again in place, and saves what was typed', async () => {
    const page = await signedIn('contributor');
    await page.goto(`${site.url}/contribute`);
    await page.getByLabel('Equation', { exact: true }).fill('NH3* + * -> NH2* + H*');
    await saved(page);
    await page.context().clearCookies();
    await page.getByLabel('Where in the source').fill('Figure 3, digitised');
    const dialog = page.getByRole('dialog', { name: 'Your session has ended' });
    await dialog.waitFor();
    await giveCredentials(page, 'contributor');
    await dialog.waitFor({ state: 'hidden' });
    const accession = new URL(page.url()).pathname.split('/').at(-1) ?? '';
    await expect.poll(async () => {
      const draft = await (await page.request.get(`${site.url}/api/v1/entries/${accession}/draft`)).json() as { input: { locator?: string } };
      return draft.input.locator;
    }, { timeout: 10_000 }).toBe('Figure 3, digitised');
  });

  it('shows both versions when two windows edit one draft', async () => {
    const first = await signedIn('contributor');
    await first.goto(`${site.url}/contribute`);
    await first.getByLabel('Equation', { exact: true }).fill('NH2* + * -> NH* + H*');
    await saved(first);
    const second = await first.context().newPage();
    await second.goto(first.url());
    await second.getByLabel('Where in the source').fill('Table 9 of the second window');
    await saved(second);
    await first.getByLabel('Where in the source').fill('Table 1 of the first window');
    const dialog = first.getByRole('dialog', { name: 'This draft was changed elsewhere' });
    await dialog.waitFor();
    const words = await dialog.innerText();
    expect(words).toContain('Table 1 of the first window');
    expect(words).toContain('Table 9 of the second window');
    await dialog.getByRole('button', { name: 'Keep mine over it' }).click();
    const accession = new URL(first.url()).pathname.split('/').at(-1) ?? '';
    await expect.poll(async () => {
      const draft = await (await first.request.get(`${site.url}/api/v1/entries/${accession}/draft`)).json() as { input: { locator?: string } };
      return draft.input.locator;
    }, { timeout: 10_000 }).toBe('Table 1 of the first window');
  });

  it('tells the slower of two reviewers who decided what', async () => {
    const slow = await signedIn('second.reviewer');
    const quick = await signedIn('reviewer');
    const { items } = await (await quick.request.get(`${site.url}/api/v1/reviews?state=submitted`)).json() as { items: { submission: string; own: boolean }[] };
    const free = items.find(({ own }) => !own)?.submission ?? '';
    await slow.goto(`${site.url}/review/${free}`);
    await slow.getByRole('radiogroup').first().waitFor();
    const { token } = await (await quick.request.get(`${site.url}/api/v1/auth/csrf`)).json() as { token: string };
    const { seen } = await (await quick.request.get(`${site.url}/api/v1/reviews/${free}`)).json() as { seen: string };
    const answer = await quick.request.post(`${site.url}/api/v1/reviews/${free}/decision`, {
      headers: { 'X-CSRF-Token': token }, data: { decision: 'return', reason: 'locator-missing', comment: 'Which table is it?', seen },
    });
    expect(answer.status()).toBe(200);
    await slow.getByLabel('To the contributor', { exact: true }).fill('The value differs from Table 2.');
    await slow.getByLabel('Reason, to return or reject').selectOption('value-differs-from-source');
    await slow.getByRole('button', { name: 'Return', exact: true }).click();
    await slow.getByRole('dialog').getByRole('button', { name: /Return/ }).click();
    await slow.getByText(/I\. Okonjo-Vale has returned it/).first().waitFor();
  });
});
