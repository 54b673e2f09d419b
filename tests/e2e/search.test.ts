import { AxeBuilder } from '@axe-core/playwright';
import type { Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { useSite } from '#tests/setup/browser.ts';

interface Found {
  accession: string;
  kind: string;
  step: { key: string; equation: string; class: string; direction: number } | null;
  surface: { metal: string | null; formula: string; facet: string | null; site: string | null } | null;
  method: { class: string; technique: string | null };
  quantities: { symbol: string; energyType: string | null; value: number | null; standardUncertainty: number | null }[];
  source: { authors: string } | null;
  validRange: { min: number | null; max: number | null } | null;
  kAtT: { value: number; unit: string } | null;
}

/** Hands on the keyboard and the mouse that count what they do. */
class Hands {
  clicks = 0;
  keys = 0;

  constructor(readonly page: Page) {}

  async click(target: Locator): Promise<void> {
    this.clicks += 1;
    await target.click();
  }

  async type(text: string): Promise<void> {
    this.keys += text.length;
    await this.page.keyboard.type(text);
  }

  async press(...names: string[]): Promise<void> {
    for (const name of names) {
      this.keys += 1;
      await this.page.keyboard.press(name);
    }
  }

  /** Opens a part of the sentence, looks for each of the words and takes the first that is found. */
  async choose(part: RegExp, ...words: string[]): Promise<void> {
    await this.click(this.page.getByRole('button', { name: part }));
    for (const word of words) {
      await this.type(word);
      await this.page.locator('.picker-active').waitFor();
      await this.press('Enter');
    }
    await this.press('Escape');
  }

  /** Adds a further part to the sentence, which opens. */
  async add(words: string): Promise<void> {
    await this.click(this.page.getByRole('button', { name: /^Add to the question/ }));
    await this.type(words);
    await this.press('Enter');
  }
}

/** Questions of people who model reactions, answered by clicks and keys, each checked against a count over all entries made here. */
describe('questions to the search', { concurrent: false }, () => {
  const site = useSite();
  let page: Page;
  let all: Found[] = [];
  const asked: { question: string; clicks: number; keys: number; answer: string }[] = [];
  const complaints: string[] = [];

  beforeAll(async () => {
    const context = await site.browser.newContext({ viewport: { width: 1440, height: 900 }, reducedMotion: 'reduce' });
    page = await context.newPage();
    page.setDefaultTimeout(15_000);
    page.on('pageerror', (error) => complaints.push(error.message));
    for (let cursor: string | null = ''; cursor !== null;) {
      const answer = await page.request.get(`${site.url}/api/v1/entries?limit=200&T=700${cursor ? `&cursor=${encodeURIComponent(cursor)}` : ''}`);
      const { items, nextCursor } = (await answer.json()) as { items: Found[]; nextCursor: string | null };
      all = [...all, ...items];
      cursor = nextCursor;
    }
  });
  afterAll(async () => {
    await page?.context().close();
    const rows = asked.map(({ question, clicks, keys, answer }) => `${String(clicks).padStart(6)} ${String(keys).padStart(5)}  ${question}\n${' '.repeat(14)}${answer}`);
    process.stdout.write(`clicks  keys  question\n${rows.join('\n')}\n`);
  });

  const energyOf = (entry: Found) => entry.quantities.find(({ symbol }) => symbol === 'energy');
  const isActivationEnergy = (entry: Found) => energyOf(entry)?.energyType === 'arrhenius';
  const holdsAt = (entry: Found, from: number, to = from) => entry.method.class === 'computed' || (entry.validRange !== null && (entry.validRange.min ?? -Infinity) <= from && (entry.validRange.max ?? Infinity) >= to);
  const breaksNH = (entry: Found) => /^(?:H\* \+ NH?2?\* <=> NH?[23]?\* \+ \*)$/.test(entry.step?.key ?? '');

  /** Asks a question from the empty screen and waits for the number of entries that it must find. */
  async function ask(question: string, expected: number, work: (hands: Hands) => Promise<void>): Promise<Hands> {
    await page.goto(`${site.url}/search`);
    await page.getByRole('table').waitFor();
    const hands = new Hands(page);
    await work(hands);
    if (expected > 0) await page.getByRole('heading', { name: `${expected} ${expected === 1 ? 'entry' : 'entries'}`, exact: true }).waitFor({ timeout: 10_000 });
    else await page.getByRole('heading', { name: 'No accepted entry answers this question' }).waitFor({ timeout: 10_000 });
    asked.push({ question, clicks: hands.clicks, keys: hands.keys, answer: expected === 0 ? 'none, and what there is without each filter' : `${expected} entries` });
    return hands;
  }

  it('barriers for breaking N–H at nickel step edges, measured, near 700 K: none, and says what there is', async () => {
    const others = all.filter((entry) => isActivationEnergy(entry) && breaksNH(entry) && entry.surface?.metal === 'Ni' && entry.method.class === 'measured' && holdsAt(entry, 700));
    await ask('barriers for breaking N–H at nickel step edges, measured, near 700 K', 0, async (hands) => {
      await hands.choose(/^Kind of parameter:/, 'activation');
      await hands.choose(/^Elementary step:/, 'bond N-H');
      await hands.choose(/^Metal:/, 'nickel');
      await hands.choose(/^Method:/, 'measured');
      await hands.click(page.getByRole('button', { name: /^Valid at:/ }));
      await hands.click(page.getByRole('button', { name: '700 K, the temperature of interest' }));
      await hands.add('site');
      await hands.click(page.getByRole('option', { name: /^step edge/ }));
      await hands.press('Escape');
    });
    expect(others.length).toBeGreaterThan(0);
    await page.getByRole('button', { name: `Take it away: ${others.length} entries` }).click();
    await page.getByRole('heading', { name: `${others.length} entries`, exact: true }).waitFor();
  });

  it('nitrogen recombination on Ru(0001): found by its name, both directions apart', async () => {
    const found = all.filter(({ step, surface }) => step?.key === '2N* <=> N2 + 2*' && surface?.metal === 'Ru' && surface.facet === '0001');
    await ask('nitrogen recombination on Ru(0001), all there is, each direction by itself', found.length, async (hands) => {
      await hands.choose(/^Elementary step:/, 'nitrogen recomb');
      await hands.choose(/^Metal:/, 'Ru');
      await hands.add('facet');
      await hands.click(page.getByRole('option', { name: /^0001/ }));
      await hands.press('Escape');
    });
    const heads = await page.locator('.table-group').allInnerTexts();
    expect(heads).toHaveLength(2);
    expect(heads.filter((head) => head.includes('reverse direction'))).toHaveLength(1);
    const backwards = found.filter(({ step }) => step?.direction === -1).length;
    expect(heads.find((head) => head.includes('reverse direction'))).toContain(`${backwards} entries`);
  });

  it('computed barriers of hydrogen dissociation on the coinage metals, the step typed as an equation, a group chosen whole', async () => {
    const found = all.filter(({ step, surface, method }) => step?.key === '2H* <=> H2 + 2*' && ['Cu', 'Ag', 'Au'].includes(surface?.metal ?? '') && method.class === 'computed');
    await ask('hydrogen dissociation on coinage metals, computed', found.length, async (hands) => {
      await hands.choose(/^Elementary step:/, 'H2+2*->2H*');
      await hands.choose(/^Metal:/, 'coinage');
      await hands.choose(/^Method:/, 'computed');
    });
    expect(new URL(page.url()).searchParams.getAll('metal')).toEqual(['Cu', 'Ag', 'Au']);
    expect(new URL(page.url()).searchParams.getAll('step')).toEqual(['2H* <=> H2 + 2*']);
  });

  it('everything on nickel and its alloys', async () => {
    const found = all.filter(({ surface }) => /Ni(?![a-z])/.test(surface?.formula ?? ''));
    await ask('everything on nickel and its alloys', found.length, (hands) => hands.choose(/^Metal:/, 'Ni alloys'));
  });

  it('kinetic isotope effects', async () => {
    const found = all.filter(({ quantities }) => quantities.some(({ symbol }) => symbol === 'kie'));
    await ask('kinetic isotope effects', found.length, (hands) => hands.choose(/^Kind of parameter:/, 'isotope'));
  });

  it('a spelling slip in free words is forgiven, said and the words are marked', async () => {
    await page.goto(`${site.url}/search`);
    const total = ((await (await page.request.get(`${site.url}/api/v1/entries?q=potassium&limit=1`)).json()) as { total: number }).total;
    await ask('what is known of potassium (typed “potasium”)', total, async (hands) => {
      await hands.click(page.getByRole('searchbox'));
      await hands.type('potasium');
    });
    await page.getByText('As typed, “potasium” finds nothing.').waitFor();
    expect((await page.locator('mark').allInnerTexts()).some((text) => /potassium|^K$/i.test(text))).toBe(true);
  });

  it('the fastest nitrogen desorption at 700 K, by k in one unit', async () => {
    const found = all.filter(({ step }) => step?.key === '2N* <=> N2 + 2*');
    await ask('nitrogen desorption, the largest k at 700 K first', found.length, async (hands) => {
      await hands.choose(/^Elementary step:/, '2N*->N2+2*');
      await hands.click(page.getByRole('button', { name: /^k at 700 K/ }));
      await hands.click(page.getByRole('button', { name: /^k at 700 K/ }));
    });
    await page.waitForURL(/sort=-k/);
    const forward = found.filter(({ step, kAtT }) => step?.direction === 1 && kAtT);
    const [unit] = forward.map(({ kAtT }) => kAtT?.unit ?? '').sort();
    const fastest = forward.filter(({ kAtT }) => kAtT?.unit === unit).sort((a, b) => (b.kAtT?.value ?? 0) - (a.kAtT?.value ?? 0))[0];
    await expect.poll(() => page.locator('tr[data-row]').first().getAttribute('data-row')).toBe(fastest?.accession);
  });

  it('activation energies from 80 to 100 kJ/mol whose uncertainty is known', async () => {
    const found = all.filter((entry) => {
      const energy = energyOf(entry);
      return isActivationEnergy(entry) && energy?.value != null && energy.value >= 80 && energy.value <= 100 && energy.standardUncertainty !== null;
    });
    await ask('activation energies from 80 to 100 kJ/mol with a known uncertainty', found.length, async (hands) => {
      await hands.choose(/^Kind of parameter:/, 'activation');
      await hands.click(page.getByRole('textbox', { name: 'from', exact: true }));
      await hands.type('80');
      await hands.press('Tab');
      await hands.type('100');
      await hands.press('Enter');
      await hands.add('uncertainty');
      await hands.click(page.getByRole('option', { name: /^a known/ }));
      await hands.press('Escape');
    });
  });

  it('what one author measured', async () => {
    const found = all.filter(({ source, method }) => source?.authors.includes('Tillinghast') && method.class === 'measured');
    await ask('what Tillinghast measured', found.length, async (hands) => {
      await hands.choose(/^Method:/, 'measured');
      await hands.add('author');
      await hands.type('tillinghast');
      await hands.press('Enter');
    });
  });

  it('desorption methods over a whole range of temperature', async () => {
    const families = ((await (await page.request.get(`${site.url}/api/v1/vocabulary`)).json()) as { techniques: { code: string; data: { family?: string } }[] }).techniques;
    const desorption = new Set(families.filter(({ data }) => data.family === 'desorption').map(({ code }) => code));
    const found = all.filter((entry) => desorption.has(entry.method.technique ?? '') && holdsAt(entry, 400, 450));
    await ask('desorption experiments that hold from 400 to 450 K', found.length, async (hands) => {
      await hands.choose(/^Method:/, 'desorption methods');
      await hands.click(page.getByRole('button', { name: /^Valid at:/ }));
      await hands.press('Tab');
      await hands.type('400');
      await hands.press('Tab');
      await hands.type('450');
      await hands.press('Enter');
    });
  });

  it('nothing on Cu(0001), with what lies near; the link leads there', async () => {
    await page.goto(`${site.url}/search?metal=Cu&facet=0001`);
    await page.getByText(/Cu is fcc/).waitFor();
    const near = all.filter(({ surface }) => surface?.metal === 'Cu' && surface.facet === '111').length;
    await page.getByRole('link', { name: `${near} entries on the facet 111` }).click();
    await page.getByRole('heading', { name: `${near} entries`, exact: true }).waitFor();
  });

  it('the address shows the same to somebody else, and rows stay chosen over paging and filters', async () => {
    await page.goto(`${site.url}/search?metal=Ru&metal=Ni&groupBy=surface&sort=-energy`);
    await page.getByRole('table').waitFor();
    const first = page.locator('tr[data-row]').first();
    await first.focus();
    await page.keyboard.press('Shift+ArrowDown');
    await page.keyboard.press('Shift+ArrowDown');
    await page.getByText('3 entries chosen').waitFor();
    await page.getByRole('button', { name: 'Show more entries' }).click();
    await page.getByText(/100 of \d+ entries shown/).waitFor();
    await page.getByText('3 entries chosen').waitFor();
    const rows = async (one: Page) => (await one.locator('tr[data-row]').evaluateAll((all_) => all_.slice(0, 50).map((row) => row.getAttribute('data-row'))));
    const context = await site.browser.newContext({ viewport: { width: 1440, height: 900 } });
    const other = await context.newPage();
    await other.goto(page.url());
    await other.getByRole('table').waitFor();
    expect(await rows(other)).toEqual(await rows(page));
    await context.close();
  });

  it.each([['light', 1440], ['dark', 390]] as const)('no list or state has a fault that a program can tell, %s, %i px', async (colorScheme, width) => {
    const context = await site.browser.newContext({ viewport: { width, height: 900 }, colorScheme, reducedMotion: 'reduce' });
    const one = await context.newPage();
    one.setDefaultTimeout(15_000);
    const faults: string[] = [];
    /** Of an open panel only itself is looked at: what it covers is met again without it. */
    const check = async (what: string, part?: string) => {
      const axe = new AxeBuilder({ page: one });
      const { violations } = await (part ? axe.include(part) : axe).withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']).analyze();
      faults.push(...violations.map(({ id, nodes }) => `${what}: ${id}: ${nodes[0]?.html.slice(0, 200) ?? ''}`));
      const wider = await one.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
      if (wider > 1) faults.push(`${what}: ${wider} px wider than the window`);
    };
    const open = async (path: string) => {
      await one.goto(`${site.url}${path}`);
      await one.waitForLoadState('networkidle');
    };
    await open('/search?q=potassium&groupBy=source');
    await check('words found');
    await open('/search?metal=Cu&facet=0001&step=nonsense');
    await check('nothing found, with notes and near misses');
    await open('/search');
    for (const part of [/^Elementary step:/, /^Metal:/, /^Method:/, /^Valid at:/, /^Columns/, /^Sort by:/]) {
      await one.getByRole('button', { name: part }).click();
      await check(`open: ${part.source}`, '.floating');
      await one.keyboard.press('Escape');
    }
    await context.close();
    expect(faults).toEqual([]);
  }, 300_000);

  it('left no complaint in the browser on the way', () => {
    expect(complaints).toEqual([]);
  });
});
