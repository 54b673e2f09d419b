import { embeddedFonts } from './embedded-fonts.ts';

/** What goes with a drawing out of the page. */
export interface SvgImageInput {
  svg: SVGSVGElement;
  /** The key of the plot: a list whose items hold a small drawing and a text. */
  legend?: Element | null;
  /** The name of the drawing, for programs that read it aloud. */
  title: string;
  /** Sentences set small at the foot: what the values are and are not. */
  notes?: readonly string[];
}

const svgNamespace = 'http://www.w3.org/2000/svg';
const margin = 12;
const legendRow = 20;
const noteRow = 15;

/** What a drawing looks like, as attributes that every program understands; with the value that need not be written. */
const looks: readonly (readonly [name: string, usual: string])[] = [
  ['fill', ''], ['fill-opacity', '1'], ['stroke', 'none'], ['stroke-width', ''], ['stroke-dasharray', 'none'], ['stroke-linecap', 'butt'], ['stroke-linejoin', 'miter'],
  ['stroke-opacity', '1'], ['opacity', '1'], ['paint-order', 'normal'],
];
const textLooks: readonly (readonly [name: string, usual: string])[] = [['font-family', ''], ['font-size', ''], ['font-weight', '400'], ['font-style', 'normal'], ['text-anchor', 'start']];
const dropped = /^(class|style|role|tabindex|id|aria-.*|data-.*)$/;

/** The properties that say how an element of a drawing looks; a group only passes on how strong its parts are. */
function looksOf(element: Element): readonly (readonly [name: string, usual: string])[] {
  if (/^(g|svg)$/.test(element.localName)) return looks.filter(([name]) => name === 'opacity');
  return /^(text|tspan)$/.test(element.localName) ? [...looks, ...textLooks] : looks;
}

/** What the page's styles make of an element; of a part of a text only what differs from the text. */
function computedLook(element: Element): [name: string, value: string | null][] {
  const style = window.getComputedStyle(element);
  const parent = element.localName === 'tspan' && element.parentElement ? window.getComputedStyle(element.parentElement) : null;
  const bare = style.getPropertyValue('stroke').trim() === 'none';
  return looksOf(element).flatMap(([name, usual]): [string, string | null][] => {
    const value = style.getPropertyValue(name).trim();
    if (value === '') return [];
    const idle = value === usual || (parent !== null && parent.getPropertyValue(name).trim() === value) || (bare && name.startsWith('stroke-'));
    return [[name, idle ? null : plainLook(value)]];
  });
}

/** Colours and lengths in the spelling that older programs read too. */
function plainLook(value: string): string {
  if (value === 'rgba(0, 0, 0, 0)') return 'none';
  const colour = /^rgb\((\d+), (\d+), (\d+)\)$/.exec(value);
  if (colour) return `#${colour.slice(1).map((part) => Number(part).toString(16).padStart(2, '0')).join('')}`;
  return value.replaceAll('"', "'").replace(/(\d)px\b/g, '$1');
}

function writeLook(element: Element, look: readonly (readonly [name: string, value: string | null])[]): void {
  for (const name of element.getAttributeNames()) if (dropped.test(name)) element.removeAttribute(name);
  for (const [name, value] of look) {
    if (value === null) element.removeAttribute(name);
    else element.setAttribute(name, value);
  }
}

function make<Name extends keyof SVGElementTagNameMap>(name: Name, attributes: Readonly<Record<string, string | number>>, text?: string): SVGElementTagNameMap[Name] {
  const element = document.createElementNS(svgNamespace, name);
  for (const [key, value] of Object.entries(attributes)) element.setAttribute(key, String(value));
  if (text !== undefined) element.textContent = text;
  return element;
}

/** Room that a text takes; by the count of its letters where the browser does not measure. */
function measured(text: SVGTextElement): number {
  return typeof text.getComputedTextLength === 'function' ? text.getComputedTextLength() : (text.textContent?.length ?? 0) * 6.6;
}

/** Sets the items of a legend in rows under the plot; the height they take. */
function drawLegend(into: SVGSVGElement, legend: Element, at: { top: number; width: number }): number {
  let x = 0;
  let row = 0;
  const items = [...legend.querySelectorAll('li')].map((item) => ({ sample: item.querySelector('svg'), label: item.textContent?.trim() ?? '' }));
  for (const { sample, label } of items) {
    const text = make('text', { class: 'plot-legend-label' }, label);
    into.append(text);
    const wide = 34 + measured(text) + 18;
    if (x > 0 && x + wide - 18 > at.width) {
      x = 0;
      row += 1;
    }
    const y = at.top + row * legendRow;
    text.setAttribute('x', String(x + 34));
    text.setAttribute('y', String(y + 13));
    const group = make('g', { transform: `translate(${x},${y + 3})` });
    for (const child of sample?.childNodes ?? []) group.append(child.cloneNode(true));
    into.append(group);
    x += wide;
  }
  return items.length === 0 ? 0 : (row + 1) * legendRow;
}

/** Breaks a sentence into lines of so many letters. */
function wrapped(text: string, most: number): string[] {
  const lines = [''];
  for (const word of text.split(' ')) {
    const last = lines[lines.length - 1] as string;
    if (last !== '' && last.length + word.length + 1 > most) lines.push(word);
    else lines[lines.length - 1] = last === '' ? word : `${last} ${word}`;
  }
  return lines;
}

/**
 * A drawing of the page as a file of its own: light on white in either theme, styles written into it, with its
 * fonts, its legend and its notes.
 */
export async function svgImage({ svg, legend, title, notes = [] }: SvgImageInput): Promise<{ text: string; width: number; height: number }> {
  const width = Number(svg.getAttribute('width')) || svg.getBoundingClientRect().width;
  const height = Number(svg.getAttribute('height')) || svg.getBoundingClientRect().height;
  const host = document.createElement('div');
  // Styles are read off a copy that is in the page, out of sight.
  host.style.cssText = `position:absolute;left:-20000px;top:0;width:${width}px;`;
  host.style.setProperty('--color-paper', '#ffffff');
  host.setAttribute('aria-hidden', 'true');
  const copy = svg.cloneNode(true) as SVGSVGElement;
  copy.classList.add('plot', 'plot-copy');
  host.append(copy);
  document.body.append(host);
  let total = height;
  const families = new Set<string>();
  try {
    inLightTheme(() => {
      if (legend) total += 8 + drawLegend(copy, legend, { top: height + 8, width });
      for (const line of notes.flatMap((note) => wrapped(note, Math.max(30, Math.floor(width / 6))))) {
        total += noteRow;
        copy.append(make('text', { x: 0, y: total, class: 'plot-copy-note' }, line));
      }
      const elements = [copy, ...copy.querySelectorAll('*')].filter((element) => element.localName !== 'title');
      // All are read before the first is written: what a parent loses would change its children.
      const found = elements.map((element) => [element, computedLook(element)] as const);
      for (const [element, look] of found) {
        writeLook(element, look);
        const family = element.localName === 'text' ? element.getAttribute('font-family') : null;
        if (family) families.add((family.split(',')[0] ?? '').replace(/["']/g, '').trim());
      }
    });
  } finally {
    host.remove();
  }
  for (const element of copy.querySelectorAll('rect, circle, path')) {
    // Grounds that only catch the pointer are nothing on paper.
    if (element.getAttribute('fill') === 'none' && !element.hasAttribute('stroke')) element.remove();
  }
  const box = { width: Math.ceil(width + 2 * margin), height: Math.ceil(total + 2 * margin) };
  for (const [name, value] of Object.entries({ ...box, viewBox: `${-margin} ${-margin} ${box.width} ${box.height}`, role: 'img' })) copy.setAttribute(name, String(value));
  const fonts = await embeddedFonts(families);
  copy.prepend(
    make('title', {}, title),
    ...(notes.length > 0 ? [make('desc', {}, notes.join(' '))] : []),
    ...(fonts ? [make('style', {}, fonts)] : []),
    make('rect', { x: -margin, y: -margin, ...box, fill: '#ffffff' }),
  );
  return { text: `<?xml version="1.0" encoding="UTF-8"?>\n${new XMLSerializer().serializeToString(copy)}\n`, ...box };
}

/** Does something while the page has its light theme, between two paints, so that nobody sees it. */
function inLightTheme(work: () => void): void {
  const root = document.documentElement;
  const { theme } = root.dataset;
  root.dataset.still = '';
  root.dataset.theme = 'light';
  try {
    work();
  } finally {
    if (theme === undefined) delete root.dataset.theme;
    else root.dataset.theme = theme;
    // The own theme is worked out before movement is allowed again, or it would be seen to come back.
    void window.getComputedStyle(root).color;
    delete root.dataset.still;
  }
}

/** A drawing as a picture of dots, at twice the size it has on the page. */
export async function pngImage(input: SvgImageInput, scale = 2): Promise<Blob> {
  const { text, width, height } = await svgImage(input);
  const address = URL.createObjectURL(new Blob([text], { type: 'image/svg+xml' }));
  try {
    const picture = new Image();
    picture.src = address;
    await picture.decode();
    const canvas = document.createElement('canvas');
    canvas.width = width * scale;
    canvas.height = height * scale;
    const context = canvas.getContext('2d');
    if (!context) throw new Error('This browser draws no pictures of dots; save the plot as SVG.');
    context.drawImage(picture, 0, 0, canvas.width, canvas.height);
    return await new Promise((resolve, reject) => {
      canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error('The picture is too large for this browser; save the plot as SVG.'))), 'image/png');
    });
  } finally {
    URL.revokeObjectURL(address);
  }
}
