import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { R } from '#shared/kinetics/constants.ts';
import { ArrheniusPlot, type ArrheniusLine } from '#client/ui/arrhenius-plot.tsx';
import { linearScale } from '#client/ui/linear-scale.ts';
import { temperatureTicks } from '#client/ui/plot-axes.tsx';
import { numbersIn, onOneAxis } from './affine.ts';

const lnK = (energy: number, lnA = 30) => (t: number) => lnA - (energy * 1000) / (R * t);
const line = (id: string, more: Partial<ArrheniusLine> = {}): ArrheniusLine => ({ id, label: `Entry ${id}`, lnK: lnK(120), range: { min: 430, max: 620 }, ...more });
const draw = (lines: ArrheniusLine[], more: Partial<Parameters<typeof ArrheniusPlot>[0]> = {}) => render(<ArrheniusPlot lines={lines} temperatureK={500} unit="s-1" {...more} />).container;
const solids = (container: Element) => [...container.querySelectorAll('.plot path[stroke-width="2.200"]')];

describe('the Arrhenius plot', () => {
  it('draws ln k straight over 1000/T', () => {
    const points = numbersIn(solids(draw([line('a')]))[0]?.getAttribute('d'));
    const xs = points.filter((_, index) => index % 2 === 0);
    expect(onOneAxis(xs, points.filter((_, index) => index % 2 === 1), 0.01)).toBe(true);
  });

  it.each<[string, Partial<ArrheniusLine>, number, string]>([
    ['within its range', {}, 500, '500 K'], ['outside it', {}, 700, '700 K, extrapolated'], ['without one', { range: null }, 500, '500 K, extrapolated'],
  ])('marks an extrapolation: %s', (_, more, temperatureK, words) => {
    const container = draw([line('a', more)], { temperatureK });
    expect(screen.getByText(words)).toBeTruthy();
    expect(solids(container)).toHaveLength(more.range === null ? 0 : 1);
    expect(container.querySelectorAll('.plot path[stroke-dasharray="5 4"]')).toHaveLength(1);
  });

  it.each<[string, ArrheniusLine['uLnK'], number]>([['known', () => 0.5, 1], ['not known', () => null, 0], ['not given', undefined, 0]])('has a band where the uncertainty is %s', (_, uLnK, bands) => {
    expect(draw([line('a', { uLnK })]).querySelectorAll('.plot path[opacity="0.18"]')).toHaveLength(bands);
  });

  // log k = 30/ln 10 - E/(RT ln 10) worked out with 40 digits (Python 3 decimal).
  it.each([[9000, '−927.18', '6.66 × 10−928'], [-9000, '953.23', '1.71 × 10953']])('stays right where k is beyond a double: E = %s kJ/mol', async (energy, log, k) => {
    const container = draw([line('a', { lnK: lnK(energy) })]);
    expect(container.innerHTML).not.toMatch(/NaN|Infinity/);
    await userEvent.setup().click(screen.getByText('The plot as a table'));
    const cells = within(screen.getAllByRole('row')[2] as HTMLElement).getAllByRole('cell').map((cell) => cell.textContent);
    expect(cells[0]).toBe('500');
    expect(cells[1]).toBe(log);
    expect(cells[2]?.replaceAll('\u2009', ' ').replace('^', '')).toBe(k);
  });

  it('leaves out a line whose k is nothing, without harm to the others', () => {
    const container = draw([line('a'), line('b', { lnK: () => Number.NEGATIVE_INFINITY })]);
    expect(container.querySelector('.plot')?.innerHTML).not.toMatch(/NaN|Infinity/);
    expect(solids(container).filter((path) => path.getAttribute('d'))).toHaveLength(1);
    draw([line('c', { lnK: () => Number.NEGATIVE_INFINITY })]);
    expect(screen.getByText('No rate constant to draw.')).toBeTruthy();
  });

  it('draws sixty lines without their bands, and brings out the one pointed at', async () => {
    const container = draw(Array.from({ length: 60 }, (_, index) => line(String(index), { lnK: lnK(80 + index), uLnK: () => 0.3 })));
    expect(solids(container)).toHaveLength(60);
    expect(container.querySelectorAll('.plot path[opacity="0.18"]')).toHaveLength(0);
    await userEvent.setup().hover(screen.getByText('Entry 7', { selector: '.plot-legend-label' }));
    expect(container.querySelectorAll('.plot path[opacity="0.18"]')).toHaveLength(1);
    const groups = [...container.querySelectorAll('.plot > g[opacity]')];
    expect(groups.filter((group) => group.getAttribute('opacity') === '1')).toEqual([groups.at(-1)]);
  });

  it('sets round temperatures along the top where asked', () => {
    expect(draw([line('a')]).querySelector('.plot-top-axis')).toBeNull();
    const texts = [...draw([line('a')], { topAxis: true }).querySelectorAll('.plot-top-axis text')].map((text) => text.textContent);
    expect(texts).toContain('500');
    expect(texts.at(-1)).toBe('T / K');
  });
});

describe('temperatures along the top', () => {
  it('are round, within the axis, and never closer than asked', () => {
    fc.assert(fc.property(fc.double({ min: 0.2, max: 5, noNaN: true }), fc.double({ min: 0.05, max: 15, noNaN: true }), (from, span) => {
      const x = linearScale({ domain: [from, from + span], range: [50, 600] });
      const ticks = temperatureTicks(x);
      const places = ticks.map((t) => x(1000 / t));
      expect(ticks.every((t) => t % 10 === 0)).toBe(true);
      expect(places.every((place) => place >= 50 - 1e-6 && place <= 600 + 1e-6)).toBe(true);
      expect(places.every((place, index) => places.slice(index + 1).every((other) => Math.abs(other - place) >= 42))).toBe(true);
    }));
  });
});
