import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { R } from '#shared/kinetics/constants.ts';
import { FitPlot, type FitPlotLine, type FitPlotPoint } from '#client/ui/fit-plot.tsx';
import { attribute, numbersIn, onOneAxis } from './affine.ts';

const line: FitPlotLine = { lnPreExponential: 30, energyKJPerMol: 130, uLnPreExponential: 0.9, uEnergyKJPerMol: 3.6, correlation: 0.99 };
const lnK = (t: number) => 30 - 130_000 / (R * t);
const points: FitPlotPoint[] = [450, 500, 550, 620].map((temperatureK, index) => ({ temperatureK, lnK: lnK(temperatureK) + (index === 1 ? 0.2 : 0), uLnK: 0.1 }));
const draw = (more: Partial<Parameters<typeof FitPlot>[0]> = {}) => render(<FitPlot points={points} line={line} unit="s-1" {...more} />).container;
const marks = (container: Element) => [...container.querySelectorAll('.plot .fit-point circle')];

describe('the plot of a fit', () => {
  it('sets each point at its 1000 K/T and log k', () => {
    const drawn = marks(draw()).slice(0, 4);
    expect(onOneAxis(points.map((point) => 1000 / point.temperatureK), drawn.map((mark) => attribute(mark, 'cx')))).toBe(true);
    expect(onOneAxis(points.map((point) => point.lnK), drawn.map((mark) => attribute(mark, 'cy')))).toBe(true);
  });

  it('sets the residuals beneath on the same axis, and none of a point on the line', () => {
    const drawn = marks(draw());
    const [above, beneath] = [drawn.slice(0, 4), drawn.slice(4)];
    expect(beneath.map((mark) => mark.getAttribute('cx'))).toEqual(above.map((mark) => mark.getAttribute('cx')));
    expect(onOneAxis([0, 0.2, 0, 0], beneath.map((mark) => attribute(mark, 'cy')))).toBe(true);
  });

  it('is solid between the points that are used and dashed outside', () => {
    const container = draw({ points: points.map((point, index) => ({ ...point, excluded: index === 0 })) });
    const solid = numbersIn(container.querySelector('.fit-line')?.getAttribute('d'));
    const xs = marks(container).map((mark) => attribute(mark, 'cx'));
    // From the hottest point, at the left, to the coldest that is used.
    expect(solid[0]).toBeCloseTo(xs[3] ?? Number.NaN, 2);
    expect(solid.at(-2)).toBeCloseTo(xs[1] ?? Number.NaN, 2);
    expect(container.querySelector('.fit-line')?.getAttribute('stroke-dasharray')).toBeNull();
    expect(container.querySelector('.fit-line-outside')?.getAttribute('stroke-dasharray')).toBeTruthy();
  });

  it.each<[string, FitPlotLine, string | null]>([
    ['uncertainties and correlation', line, null],
    ['no correlation', { ...line, correlation: null }, 'No band is drawn: the correlation of ln A and E is not known.'],
    ['no uncertainties', { ...line, uEnergyKJPerMol: null }, 'No band is drawn: the uncertainties of ln A and E are not known.'],
  ])('has a band only where it is known: %s', (_, of, reason) => {
    const container = draw({ line: of });
    expect(container.querySelector('.fit-band') === null).toBe(reason !== null);
    if (reason) expect(screen.getByText(reason)).toBeTruthy();
    else expect(screen.queryByText(/No band/)).toBeNull();
  });

  it('widens the band by the coverage factor', () => {
    const height = (factor: number) => {
      const ys = numbersIn(draw({ line: { ...line, coverageFactor: factor, lnPreExponential: 30 }, points: [...points, { temperatureK: 300, lnK: lnK(300) }] }).querySelector('.fit-band')?.getAttribute('d')).filter((_, index) => index % 2 === 1);
      return Math.abs((ys[0] ?? 0) - (ys.at(-1) ?? 0));
    };
    expect(height(2) / height(1)).toBeGreaterThan(1.5);
  });

  it('strikes through what is left out, and says so', () => {
    const container = draw({ points: points.map((point, index) => ({ ...point, excluded: index === 2 })) });
    expect(container.querySelectorAll('.plot .fit-point path[d*="L"]')).toHaveLength(2);
    expect(screen.getByRole('img').getAttribute('aria-label')).toContain('1 left out of the fit');
    expect(screen.getByText('left out of the fit')).toBeTruthy();
  });

  it('leaves a point out by its mark and by its box in the table', async () => {
    const user = userEvent.setup();
    const onToggle = vi.fn();
    const container = draw({ onToggle });
    await user.click(container.querySelectorAll('.plot .fit-point')[2] as Element);
    await user.click(screen.getByText(/which points are used/));
    await user.click(screen.getByRole('checkbox', { name: 'Point 4, 620 K, in the fit' }));
    expect(onToggle.mock.calls).toEqual([[2], [3]]);
  });

  it('has the figures behind it as a table', async () => {
    draw({ logarithm: 'ln' });
    await userEvent.setup().click(screen.getByText('The plot as a table'));
    const cells = within(screen.getAllByRole('row')[2] as HTMLElement).getAllByRole('cell').map((cell) => cell.textContent);
    expect(cells).toEqual(['500', (lnK(500) + 0.2).toFixed(3).replace('-', '\u2212'), '0.100', lnK(500).toFixed(3).replace('-', '\u2212'), '0.200']);
  });

  it('draws points before there is a line, and says when there is no point', () => {
    const container = draw({ line: null });
    expect(marks(container)).toHaveLength(4);
    expect(container.querySelector('.fit-line')).toBeNull();
    draw({ points: [{ temperatureK: 300, lnK: Number.NEGATIVE_INFINITY }] });
    expect(screen.getByText('No point to draw yet.')).toBeTruthy();
  });
});
