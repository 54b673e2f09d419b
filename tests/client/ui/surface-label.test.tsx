import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';

describe('name of a surface', () => {
  it.each<[string, string[], string[]]>([
    ['Ru(0001)', [], []],
    ['Ni3Fe(111)', ['3'], []],
    ['Ru/Al2O3, 2.1 nm', ['2', '3'], []],
    ['Ru(10-10)', [], ['1']],
    ['Ru(11-20), step edge', [], ['2']],
    ['Ru(0001), B5 site', [], []],
    ['PdH0.6', ['0.6'], []],
    ['Pt1Cu(111), single atoms', ['1'], []],
    ['Ni/Pt(111), overlayer of 2 ML', [], []],
    ['Pt(100)-(1×1)', [], []],
    ['Pt(10 8 7)', [], []],
    ['', [], []],
  ])('%s has its indices low and barred, and is copied as typed', (label, low, barred) => {
    const { container } = render(<p><SurfaceLabel label={label} /></p>);
    expect([...container.querySelectorAll('sub')].map((sub) => sub.textContent)).toEqual(low);
    expect([...container.querySelectorAll('.overline')].map((bar) => bar.textContent)).toEqual(barred);
    expect(container.textContent).toBe(label);
  });
});
