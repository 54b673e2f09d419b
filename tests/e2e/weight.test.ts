import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';

/** The first visit to Search, nothing cached: how much program has to come before the page works. */
describe('weight of the Search route', () => {
  const site = useSite();

  it('is at most 220 kB of JavaScript, gzipped', async () => {
    const context = await site.browser.newContext();
    const page = await context.newPage();
    const scripts = new Map<string, number>();
    page.on('response', (response) => {
      if (response.request().resourceType() === 'script') void response.body().then((body) => scripts.set(response.url(), gzipSync(body, { level: 9 }).length));
    });
    await page.goto(`${site.url}/search`);
    await page.getByRole('table').waitFor();
    await page.waitForLoadState('networkidle');
    await context.close();
    const kilobytes = [...scripts.values()].reduce((sum, size) => sum + size, 0) / 1000;
    process.stdout.write(`JavaScript of the Search route: ${kilobytes.toFixed(1)} kB gzipped in ${scripts.size} files\n`);
    expect(scripts.size).toBeGreaterThan(1);
    expect(kilobytes).toBeLessThanOrEqual(220);
  });
});
