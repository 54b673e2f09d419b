import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { R } from '#shared/kinetics/constants.ts';
import { KiePlot, type KieLine } from '#client/ui/kie-plot.tsx';
import { attribute, numbersIn, onOneAxis } from './affine.ts';

const kie = (t: number) => Math.exp(3400 / (R * t));
const line: KieLine = { id: 'a', label: 'Ru(0001)', kie, range: { min: 450, max: 650 } };
const draw = (more: Partial<Parameters<typeof KiePlot>[0]> = {}) => render(<KiePlot lines={[line]} temperatureK={600} {...more} />).container;

describe('the plot of isotope effects', () => {
  it('sets reported values at their T and size', () => {
    const points = [[500, 2.3], [550, 2], [700, 1.6]].map(([temperatureK = 0, value = 0], index) => ({ id: String(index), label: String(index), temperatureK, kie: value, u: 0.1 }));
    const marks = [...draw({ points }).querySelectorAll('.plot .kie-point circle')];
    expect(onOneAxis(points.map((point) => point.temperatureK), marks.map((mark) => attribute(mark, 'cx')))).toBe(true);
    expect(onOneAxis(points.map((point) => point.kie), marks.map((mark) => attribute(mark, 'cy')))).toBe(true);
  });

  it.each([[{ min: 450, max: 650 }, 1], [null, 0]])('is solid within the valid range %j and dashed outside', (range, solid) => {
    const paths = [...draw({ lines: [{ ...line, range }] }).querySelectorAll('.kie-line > path:not([stroke="var(--color-paper)"])')];
    expect(paths.filter((path) => path.getAttribute('stroke-dasharray') === null && path.getAttribute('stroke-width') === '2.200')).toHaveLength(solid);
    expect(paths.filter((path) => path.getAttribute('stroke-dasharray'))).toHaveLength(1);
  });

  it.each([[600, '600 K'], [700, '700 K, extrapolated']])('marks the temperature of interest %s as %s', (temperatureK, words) => {
    draw({ temperatureK });
    expect(screen.getByText(words)).toBeTruthy();
  });

  it('draws the limit where it has room, and says where it lies where not', () => {
    const near = draw({ limit: () => 2.5 });
    expect(numbersIn(near.querySelector('.kie-limit')?.getAttribute('d')).length).toBeGreaterThan(4);
    expect(screen.queryByText(/lies above the plot/)).toBeNull();
    draw({ limit: () => 40 });
    expect(screen.getByText('The semiclassical limit lies above the plot: 40.00 at 600 K.')).toBeTruthy();
  });

  it('has the line of no effect even where all effects are far from it, and inverse ones below it', () => {
    const container = draw({ lines: [line, { id: 'b', label: 'inverse', kie: () => 0.8, range: { min: 400, max: 700 } }] });
    const one = numbersIn(container.querySelector('.kie-one path')?.getAttribute('d'))[1] ?? Number.NaN;
    const inverse = numbersIn(container.querySelectorAll('.kie-line')[1]?.querySelector('path')?.getAttribute('d'))[1] ?? Number.NaN;
    expect(inverse).toBeGreaterThan(one);
  });

  it('survives an effect that is not finite', () => {
    draw({ lines: [{ ...line, kie: () => Number.POSITIVE_INFINITY }] });
    expect(screen.getAllByText('not finite').length).toBeGreaterThan(0);
    expect(document.body.innerHTML).not.toContain('NaN');
  });

  it('says what it draws', () => {
    draw({ limit: () => 2.5, points: [{ id: 'p', label: 'p', temperatureK: 600, kie: 2 }] });
    expect(screen.getByRole('img').getAttribute('aria-label')).toBe('Kinetic isotope effect against temperature: 1 line, 1 value, the semiclassical limit; the figures are in the table below.');
  });
});
