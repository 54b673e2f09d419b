/**
 * Takes the pictures of the README from a running server with the demonstration data:
 *   node tests/screenshots/take.mjs http://127.0.0.1:4200
 * The draft it fills in for the picture is withdrawn again.
 */
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';

const base = process.argv[2] ?? 'http://127.0.0.1:4200';
const place = (name) => fileURLToPath(new URL(`${name}.png`, import.meta.url));
const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu', '--disable-dev-shm-usage'] });

async function open(colorScheme, email) {
  const context = await browser.newContext({ viewport: { width: 1440, height: 1000 }, colorScheme, reducedMotion: 'reduce' });
  const page = await context.newPage();
  if (email) {
    await page.goto(`${base}/sign-in`);
    await page.getByLabel('E-mail', { exact: true }).fill(`${email}@demo.sillstone.example`);
    await page.getByLabel('Password', { exact: true }).fill('stepping-stone');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();
    await page.waitForURL((url) => url.pathname !== '/sign-in');
  }
  return page;
}

async function shoot(page, path, name) {
  await page.goto(base + path);
  await page.waitForLoadState('networkidle');
  await page.waitForTimeout(500);
  await page.screenshot({ path: place(name) });
}

const search = `/search?kind=activation-energy&step=${encodeURIComponent('2N* <=> N2 + 2*')}&metal=Ru&metal=Ni&metal=Co&metal=Fe`;
for (const theme of ['light', 'dark']) {
  const page = await open(theme, null);
  await shoot(page, search, `search-${theme}`);
  if (theme === 'light') {
    const { items: [entry] } = await (await page.request.get(`${base}/api/v1/entries?q=Tillinghast&method=TPD&metal=Ru&step=${encodeURIComponent('N* + N* -> N2 + 2*')}`)).json();
    await shoot(page, `/entries/${entry.accession}`, 'entry-light');
    await page.goto(`${base}/workbench/fit`);
    await page.getByRole('button', { name: 'Example' }).click();
    await page.getByRole('heading', { name: 'The derivation' }).waitFor();
    await page.waitForTimeout(500);
    await page.screenshot({ path: place('workbench-light') });
  }
}

const reviewer = await open('light', 'reviewer');
const { items } = await (await reviewer.request.get(`${base}/api/v1/reviews`)).json();
await shoot(reviewer, `/review/${(items.find(({ asPrinted }) => asPrinted === '152') ?? items[0]).submission}`, 'review-light');

const contributor = await open('light', 'contributor');
await contributor.goto(`${base}/contribute`);
await contributor.getByLabel('DOI, BibTeX or RIS', { exact: true }).fill('10.5555/aisk.1994.0412');
await contributor.getByRole('button', { name: 'Look up' }).click();
await contributor.getByText('Vantongeren').first().waitFor();
await contributor.getByLabel('Where in the source').fill('Table 2, page 113');
await contributor.getByLabel('Equation', { exact: true }).fill('N* + N* -> N2 + 2*');
await contributor.getByLabel('Metal', { exact: true }).selectOption('Ru');
await contributor.getByLabel('Facet', { exact: true }).fill('0001');
await contributor.getByLabel('Kind', { exact: true }).selectOption('activation-energy');
const energy = contributor.getByRole('listitem', { name: /^Quantity 1/ });
await energy.getByLabel('As printed', { exact: true }).fill('44.5 ± 1.4');
await energy.getByLabel('Unit as printed', { exact: true }).fill('kcal/mol');
await contributor.getByText('186.2').first().waitFor();
await contributor.getByText(/^Saved/).first().waitFor();
await contributor.evaluate('scrollTo(0, 0)');
await contributor.screenshot({ path: place('contribute-light') });
await contributor.getByText(/^Saved/).first().waitFor();
const { token } = await (await contributor.request.get(`${base}/api/v1/auth/csrf`)).json();
await contributor.request.post(`${base}/api/v1/entries/${new URL(contributor.url()).pathname.split('/').at(-1)}/withdraw`, { headers: { 'X-CSRF-Token': token } });
await browser.close();
