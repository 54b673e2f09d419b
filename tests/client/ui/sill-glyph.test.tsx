import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { SillGlyph } from '#client/ui/sill-glyph.tsx';

const common = { max: 200, unit: 'kJ/mol', computed: false, what: 'Activation energy', energy: 186.188 };

describe('sill glyph', () => {
  it.each([
    ['value and uncertainty', { u: 2.93 }, 'Activation energy 186 ± 3 kJ/mol, measured'],
    ['no uncertainty', { significantDigits: 3 }, 'Activation energy 186.2 kJ/mol, measured'],
    ['computed', { computed: true, u: 4 }, 'Activation energy 186 ± 4 kJ/mol, computed'],
    ['lower bound', { energy: null, low: 150.6, bound: '≥', significantDigits: 2 }, 'Activation energy ≥ 151 kJ/mol, measured'],
    ['upper bound', { energy: null, high: 20, bound: '<', significantDigits: 1 }, 'Activation energy < 20 kJ/mol, measured'],
    ['range', { energy: null, low: 86, high: 94, bound: 'range', significantDigits: 2 }, 'Activation energy 86.0 to 94.0 kJ/mol, measured'],
    ['nothing', { energy: null }, 'Activation energy not reported'],
  ] as const)('says in words what it draws: %s', (_, props, name) => {
    render(<SillGlyph {...common} {...props} />);
    expect(screen.getByRole('img').getAttribute('aria-label')).toBe(name);
  });

  const topOf = (container: HTMLElement) => Number(/V([\d.]+)/.exec(container.querySelector('path')?.getAttribute('d') ?? '')?.[1]);

  it('is drawn to scale: half the energy, half the height', () => {
    const foot = 28;
    const whole = topOf(render(<SillGlyph {...common} energy={200} />).container);
    const half = topOf(render(<SillGlyph {...common} energy={100} />).container);
    expect(foot - whole).toBeCloseTo(2 * (foot - half), 6);
  });

  it('is dashed when computed, and only then', () => {
    const dashOf = (computed: boolean) => render(<SillGlyph {...common} computed={computed} />).container.querySelector('g')?.getAttribute('stroke-dasharray');
    expect(dashOf(true)).toBeTruthy();
    expect(dashOf(false)).toBeNull();
  });

  it.each([
    ['=', 3, true], ['=', null, false], ['≥', 3, false],
  ] as const)('bound %s with u = %s has a whisker: %s', (bound, u, has) => {
    const { container } = render(<SillGlyph {...common} bound={bound} u={u} />);
    expect(container.querySelector('.sill-whisker') !== null).toBe(has);
  });
});
