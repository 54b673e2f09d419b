import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { Derivation } from '#client/ui/derivation.tsx';

const line = (operation: string, constant?: string) => ({ operation, from: '1', to: '2', reference: 'r', ...(constant ? { constant } : {}) });

describe('the lines of a derivation', () => {
  it.each<[string, string[], string[]]>([
    ['KIE = (A_L/A_H) exp[(E_H - E_L)/RT]', ['L', 'H', 'H', 'L'], []],
    ['Divide by (RT)^1.5', [], ['1.5']],
    ['k_p = k_c/(RT)^g at 10^13.5', ['p', 'c'], ['g', '13.5']],
    ['A = κ e (k_B T/h)(p°)^Δn exp(ΔS/R)', ['B'], ['Δn']],
    ['Read the printed value, ±_ and ^', [], []],
  ])('%s has its indices set, and the text of it stays', (operation, subs, sups) => {
    const { container } = render(<Derivation lines={[line(operation, 'R = 8.31446261815324 J mol-1 K-1')]} />);
    expect([...container.querySelectorAll('sub')].map((index) => index.textContent)).toEqual(subs);
    expect([...container.querySelectorAll('sup')].map((index) => index.textContent)).toEqual(sups);
    expect(container.textContent).toContain(operation);
  });

  it('says that nothing was done', () => {
    render(<Derivation lines={[]} />);
    expect(screen.getByText(/No operation was needed/)).toBeTruthy();
  });
});
