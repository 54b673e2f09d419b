import { afterEach, describe, expect, it } from 'vitest';
import { svgImage } from '#client/lib/svg-image.ts';

function page(): { svg: SVGSVGElement; legend: Element } {
  document.body.innerHTML = `
    <svg class="plot" width="300" height="200" role="img" aria-label="A plot" style="max-width: none">
      <rect id="x" class="hit" tabindex="0" width="10" height="10" fill="none"></rect>
      <g class="profile-state" role="option" aria-label="one" opacity="0.3"><title>one</title><path class="line" d="M0 0H10" stroke="red" fill="none"></path></g>
      <text class="plot-ink" x="1" y="2">log k</text>
    </svg>
    <ul class="legend"><li><svg width="26" height="12"><circle cx="13" cy="6" r="4" fill="red"></circle></svg><span>rate &amp; constant</span></li><li><svg><path d="M0 0"></path></svg><span>fitted line</span></li></ul>`;
  return { svg: document.querySelector('svg') as SVGSVGElement, legend: document.querySelector('.legend') as Element };
}

const parse = (text: string) => new DOMParser().parseFromString(text, 'image/svg+xml');

describe('a plot as a file', () => {
  afterEach(() => {
    document.body.innerHTML = '';
    delete document.documentElement.dataset.theme;
  });

  it('stands on its own: no class, role or address of the page is left in it', async () => {
    const { text } = await svgImage({ ...page(), title: 'k <against> T', notes: [] });
    const drawing = parse(text);
    expect(drawing.querySelector('parsererror')).toBeNull();
    expect(drawing.querySelectorAll('[class], [tabindex], [id], [aria-label], [style], g[role]')).toHaveLength(0);
    expect(drawing.documentElement.getAttribute('role')).toBe('img');
    expect(drawing.querySelector('title')?.textContent).toBe('k <against> T');
    expect(text).not.toContain('var(--');
  });

  it('takes the legend and the notes along, and grows by the room they need', async () => {
    const { svg, legend } = page();
    const bare = await svgImage({ svg, title: 'a' });
    const whole = await svgImage({ svg, legend, title: 'a', notes: ['Not design data.', 'Invented.'] });
    const drawing = parse(whole.text);
    const texts = [...drawing.querySelectorAll('text')].map((one) => one.textContent);
    expect(texts).toEqual(['log k', 'rate & constant', 'fitted line', 'Not design data.', 'Invented.']);
    expect(drawing.querySelector('desc')?.textContent).toBe('Not design data. Invented.');
    expect(drawing.querySelectorAll('circle')).toHaveLength(1);
    expect(whole.height).toBeGreaterThan(bare.height + 40);
    expect(drawing.documentElement.getAttribute('viewBox')).toBe(`-12 -12 ${whole.width} ${whole.height}`);
  });

  it('breaks long notes into lines', async () => {
    const { text } = await svgImage({ svg: page().svg, title: 'a', notes: ['word '.repeat(40).trim()] });
    expect([...parse(text).querySelectorAll('text')].length).toBeGreaterThan(4);
  });

  it.each([undefined, 'dark', 'light'])('leaves the page as it was with the theme %s', async (theme) => {
    if (theme) document.documentElement.dataset.theme = theme;
    const { svg } = page();
    const before = document.body.innerHTML;
    await svgImage({ svg, title: 'a', notes: ['b'] });
    expect(document.body.innerHTML).toBe(before);
    expect({ ...document.documentElement.dataset }).toEqual(theme ? { theme } : {});
  });

  it('puts the theme back when the drawing fails', async () => {
    const { svg } = page();
    const legend = { querySelectorAll: () => { throw new Error('broken'); } } as unknown as Element;
    await expect(svgImage({ svg, legend, title: 'a' })).rejects.toThrow('broken');
    expect({ ...document.documentElement.dataset }).toEqual({});
    expect(document.querySelectorAll('.plot')).toHaveLength(1);
  });
});
