import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it } from 'vitest';
import { CompensationPlot, type CompensationPoint } from '#client/ui/compensation-plot.tsx';
import { attribute, numbersIn, onOneAxis } from './affine.ts';

const points: CompensationPoint[] = [[186, 29.9, 3, 0.4], [158, 27, null, null], [120, 22.5, 5, null], [92, 20, null, 1]].map(([energy = 0, lnA = 0, uEnergy = null, uLnA = null], index) => ({
  id: String(index), label: `Entry ${index}`, energy: energy ?? 0, lnA: lnA ?? 0, uEnergy, uLnA, computed: index === 3,
}));
const draw = (more: Partial<Parameters<typeof CompensationPlot>[0]> = {}) => render(<CompensationPlot points={points} energyUnit="kJ/mol" unit="s-1" {...more} />).container;
const marks = (container: Element) => [...container.querySelectorAll('.compensation-point circle')];

describe('the compensation plot', () => {
  it('sets each pair at its E and log A', () => {
    const drawn = marks(draw());
    expect(onOneAxis(points.map((point) => point.energy), drawn.map((mark) => attribute(mark, 'cx')))).toBe(true);
    expect(onOneAxis(points.map((point) => point.lnA), drawn.map((mark) => attribute(mark, 'cy')))).toBe(true);
  });

  it('has whiskers only where an uncertainty is known, and an open mark for what is computed', () => {
    const container = draw();
    expect([...container.querySelectorAll('.compensation-point')].map((point) => point.querySelectorAll('.compensation-whisker').length)).toEqual([2, 0, 1, 1]);
    expect(marks(container).map((mark) => mark.getAttribute('fill') === 'var(--color-paper)')).toEqual([false, false, false, true]);
    expect(screen.getByText('Filled is measured, open is computed.')).toBeTruthy();
  });

  it('draws the fitted line through the points that lie on it', () => {
    const slope = (29.9 - 20) / (186 - 92);
    const container = draw({ line: { slope, intercept: 20 - slope * 92 } });
    const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = numbersIn(container.querySelector('.compensation-line')?.getAttribute('d'));
    for (const mark of [marks(container)[0], marks(container)[3]]) {
      expect(y0 + ((y1 - y0) * (attribute(mark, 'cx') - x0)) / (x1 - x0)).toBeCloseTo(attribute(mark, 'cy'), 6);
    }
  });

  it('numbers the points as its key does, and has the figures as a table', async () => {
    const container = draw();
    expect([...container.querySelectorAll('.compensation-point text')].map((text) => text.textContent)).toEqual(['1', '2', '3', '4']);
    expect(screen.getByRole('button', { name: '3 Entry 2' })).toBeTruthy();
    await userEvent.setup().click(screen.getByText('The plot as a table'));
    expect(screen.getAllByRole('row')[1]?.textContent).toBe('1 Entry 0186.0 ± 3.012.99 ± 0.17');
  });

  it('says when there is no pair', () => {
    draw({ points: [{ id: 'a', label: 'a', energy: 10, lnA: Number.NEGATIVE_INFINITY }] });
    expect(screen.getByText('No pair of A and E to draw.')).toBeTruthy();
  });
});
