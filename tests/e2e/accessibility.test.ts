import { AxeBuilder } from '@axe-core/playwright';
import type { BrowserContext, Page } from 'playwright-core';
import { describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';

/** The Workbench: its list, a calculator of each make with a result, with a fault, and empty. */
const workbench = [
  { path: '/workbench', what: 'workbench' },
  { path: '/workbench/arrhenius?preExponential=1e13&energy=100&temperatureK=700&validToK=600', what: 'extrapolated rate constant' },
  { path: '/workbench/fit?points=420+3.8+_440+13.1+_460+45.2+_480+127+', what: 'fit' },
  { path: '/workbench/pool?values=100+4+first_106+3+second_94+6+third', what: 'pooled values' },
  { path: '/workbench/profile?cyclic=yes&temperatureK=500&steps=60+10++_90+-20++', what: 'energy profile' },
  { path: '/workbench/kie?method=zero-point&wavenumberLightPerCm=3000&wavenumberHeavyPerCm=2200&temperatureK=500', what: 'isotope effect' },
  { path: '/workbench/energy?value=many&colour=red', what: 'calculation with a fault' },
  { path: '/workbench/collision', what: 'empty calculator' },
];

/** WCAG 2.2 AA as far as a program can tell, on every screen, in both themes, wide and narrow; and nothing wider than the window. */
describe('accessibility', () => {
  const site = useSite();

  async function open(colorScheme: 'light' | 'dark', width: number, email: string | null): Promise<{ context: BrowserContext; page: Page }> {
    const context = await site.browser.newContext({ viewport: { width, height: 900 }, colorScheme, reducedMotion: 'reduce' });
    const page = await context.newPage();
    if (email) {
      await page.goto(`${site.url}/sign-in`);
      await page.getByLabel('E-mail', { exact: true }).fill(`${email}@demo.sillstone.example`);
      await page.getByLabel('Password', { exact: true }).fill('stepping-stone');
      await page.getByRole('button', { name: 'Sign in', exact: true }).click();
      await page.waitForURL((url) => url.pathname !== '/sign-in');
    }
    return { context, page };
  }

  async function addresses(page: Page): Promise<{ path: string; what: string }[]> {
    const get = async <T>(path: string) => (await (await page.request.get(`${site.url}/api/v1${path}`)).json()) as T;
    const { items: [entry] } = await get<{ items: { accession: string; source: { id: string } }[] }>('/entries?q=Tillinghast&kind=activation-energy&limit=1');
    const { items: [review] } = await get<{ items: { submission: string }[] }>('/reviews?limit=1');
    const { items: [draft] } = await get<{ items: { accession: string }[] }>('/contributions?state=draft&limit=1');
    return [
      { path: '/search?metal=Ru', what: 'search' },
      { path: '/search?metal=Cu&facet=9999', what: 'search that finds nothing' },
      { path: `/entries/${entry?.accession ?? ''}`, what: 'entry' },
      { path: '/entries/222-222-2', what: 'entry that does not exist' },
      { path: '/sources', what: 'sources' },
      { path: `/sources/${entry?.source.id ?? ''}`, what: 'source' },
      { path: '/contribute', what: 'contribute' },
      ...(draft ? [{ path: `/contribute/${draft.accession}`, what: 'draft' }] : []),
      { path: '/contributions', what: 'my submissions' },
      { path: '/review', what: 'review queue' },
      { path: `/review/${review?.submission ?? ''}`, what: 'review' },
      ...workbench,
      { path: '/nowhere', what: 'no such page' },
    ];
  }

  it.each([['light', 1440], ['dark', 1440], ['light', 360], ['dark', 390]] as const)('holds on every screen, %s, %i px', async (theme, width) => {
    const { context, page } = await open(theme, width, 'reviewer');
    const found: string[] = [];
    for (const { path, what } of await addresses(page)) {
      await page.goto(`${site.url}${path}`);
      await page.waitForLoadState('networkidle');
      const { violations } = await new AxeBuilder({ page }).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']).analyze();
      for (const { id, nodes } of violations) found.push(`${what}: ${id}: ${nodes.slice(0, 2).map(({ html }) => html.slice(0, 160)).join(' | ')}`);
      const overflow = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
      if (overflow > 1) found.push(`${what}: ${overflow} px wider than the window`);
    }
    await context.close();
    expect(found).toEqual([]);
  }, 300_000);

  it('holds on the sign-in page', async () => {
    const { context, page } = await open('light', 1440, null);
    await page.goto(`${site.url}/sign-in`);
    await page.getByRole('heading', { name: 'Demonstration accounts' }).waitFor();
    const { violations } = await new AxeBuilder({ page }).analyze();
    await context.close();
    expect(violations.map(({ id }) => id)).toEqual([]);
  });
});
