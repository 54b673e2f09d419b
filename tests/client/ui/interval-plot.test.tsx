import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { IntervalPlot } from '#client/ui/interval-plot.tsx';
import { linesOf, type IntervalRow } from '#client/ui/interval-rows.ts';
import { attribute, numbersIn, onOneAxis } from './affine.ts';

const row = (id: string, value: number | null, more: Partial<IntervalRow> = {}): IntervalRow => ({ id, label: `Source ${id}`, value, u: null, ...more });
const draw = (rows: IntervalRow[], more: Partial<Parameters<typeof IntervalPlot>[0]> = {}) => render(<MemoryRouter><IntervalPlot rows={rows} what="Activation energy" unit="kJ/mol" {...more} /></MemoryRouter>).container;
const plot = (container: Element) => container.querySelector('.plot') as SVGSVGElement;
const middle = (mark: Element) => attribute(mark, 'x') + attribute(mark, 'width') / 2;

describe('the interval plot', () => {
  it('sets values, ends of intervals, the pooled value and its intervals on one axis', () => {
    const container = plot(draw([row('a', 186.2, { u: 2.9 }), row('b', 141, { low: 120, high: 150 })], { pooled: { mean: 154, interval: [142, 166], predictionInterval: [118, 190] } }));
    const marks = [...container.querySelectorAll('.interval-mark')].map(middle);
    // M left y v8 M left y H right M right y v8
    const whiskers = [...container.querySelectorAll('.interval-whisker')].map((path) => numbersIn(path.getAttribute('d')));
    const diamond = numbersIn(container.querySelector('.interval-diamond')?.getAttribute('d'));
    const prediction = numbersIn(container.querySelector('.interval-prediction')?.getAttribute('d'));
    expect(onOneAxis(
      [186.2, 141, 183.3, 189.1, 120, 150, 142, 154, 166, 118, 190],
      [...marks, whiskers[0]?.[0], whiskers[0]?.[5], whiskers[1]?.[0], whiskers[1]?.[5], diamond[0], diamond[2], diamond[4], prediction[0], prediction[5]] as number[],
    )).toBe(true);
  });

  it.each<[string, Partial<IntervalRow>, string, boolean]>([
    ['a value without uncertainty', { value: 92 }, '.interval-mark', true],
    ['a range', { value: null, low: 121, high: 152, bound: 'range' }, '.interval-range', false],
    ['a lower bound', { value: 152, bound: '≥' }, '.interval-bound', false],
    ['an upper bound', { value: null, high: 70, bound: '<' }, '.interval-bound', false],
  ])('draws %s by its own mark and no whisker', (_, more, selector, mark) => {
    const container = plot(draw([row('z', 100, { u: 5 }), { ...row('a', null), ...more }]));
    const drawn = container.querySelectorAll('.interval-row')[1] as Element;
    expect(drawn.querySelector(selector)).toBeTruthy();
    expect(drawn.querySelector('.interval-whisker')).toBeNull();
    expect(drawn.querySelector('.interval-mark') !== null).toBe(mark);
  });

  it('points a bound to where the value may lie', () => {
    const arrows = [...plot(draw([row('a', 100, { bound: '>' }), row('b', 100, { bound: '<' })])).querySelectorAll('.interval-bound')];
    expect(arrows.map((arrow) => Math.sign(numbersIn(/h(-?\d+)/.exec(arrow.getAttribute('d') ?? '')?.[1])[0] ?? 0))).toEqual([1, -1]);
  });

  it('makes the mark as large as the weight, by area', () => {
    const sizes = [...plot(draw([row('a', 1, { weight: 0.64 }), row('b', 2, { weight: 0.16 }), row('c', 3)])).querySelectorAll('.interval-mark')].map((mark) => attribute(mark, 'width'));
    expect(((sizes[0] ?? 0) - 5) / ((sizes[1] ?? 0) - 5)).toBeCloseTo(2, 6);
    expect(sizes[2]).toBe(5);
  });

  it('draws computed values open', () => {
    const marks = [...plot(draw([row('a', 1), row('b', 2, { computed: true })])).querySelectorAll('.interval-mark')];
    expect(marks.map((mark) => mark.getAttribute('fill') === 'var(--color-paper)')).toEqual([false, true]);
  });

  it('keeps groups together where their first row stands', () => {
    const lines = linesOf([row('a', 1, { group: 'Terrace' }), row('b', 2), row('c', 3, { group: 'Step edge' }), row('d', 4, { group: 'Terrace' })]);
    expect(lines.map((line) => (line.kind === 'group' ? line.name : line.row.id))).toEqual(['b', 'Terrace', 'a', 'd', 'Step edge', 'c']);
  });

  it('shows figures with the digits they have', () => {
    const container = plot(draw([row('a', 186.188, { u: 2.93 }), row('b', 158, { u: 12.4 }), row('c', 152, { bound: '≥' }), row('d', null, { low: 121, high: 152.36, bound: 'range' })]));
    expect([...container.querySelectorAll('.interval-row title')].map((title) => title.textContent)).toEqual([
      'Source a: 186.2\u2009±\u20092.9', 'Source b: 158\u2009±\u200912', 'Source c: ≥\u00a0152', 'Source d: 121 to 152',
    ]);
  });

  it('says what it draws, and has the figures as a table with links', async () => {
    draw([row('a', 186.2, { u: 2.9, weight: 0.25, href: '/entries/K7Q-4MD-2' }), row('b', 152, { bound: '≥' })], { pooled: { mean: 154.2, interval: [142.1, 166.3] }, rowName: 'Source' });
    expect(screen.getByRole('img').getAttribute('aria-label')).toBe('Activation energy of 2 rows with intervals, in kJ/mol; pooled value 154.2, 142.1 to 166.3; the values are in the table below.');
    await userEvent.setup().click(screen.getByText('The plot as a table'));
    expect(screen.getByRole('link', { name: 'Source a' }).getAttribute('href')).toBe('/entries/K7Q-4MD-2');
    const rows = screen.getAllByRole('row').slice(1).map((one) => within(one).getAllByRole('cell').map((cell) => cell.textContent));
    expect(rows).toEqual([['186.2\u2009±\u20092.9', '183.3 to 189.1', '25.0'], ['≥\u00a0152', 'bound', 'left out'], ['154.2', '142.1 to 166.3', '']]);
  });

  it('draws a pooled value without an interval open, and none where nothing is pooled', () => {
    expect(plot(draw([row('a', 1)], { pooled: { mean: 1, interval: null } })).querySelector('.interval-diamond')?.getAttribute('fill')).toBe('var(--color-paper)');
    expect(plot(draw([row('a', 1)])).querySelector('.interval-diamond')).toBeNull();
    draw([]);
    expect(screen.getByText('No value to draw yet.')).toBeTruthy();
  });
});
