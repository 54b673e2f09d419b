import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { Equation } from '#client/ui/equation.tsx';

const cases: [plain: string, spoken: string][] = [
  ['N* + N* -> N2 + 2*', 'N adsorbed plus N adsorbed gives N 2 plus 2 free sites'],
  ['NH3* + * -> NH2* + H*', 'N H 3 adsorbed plus a free site gives N H 2 adsorbed plus H adsorbed'],
  ['N2 + 2* <-> 2N*', 'N 2 plus 2 free sites in equilibrium with 2 N adsorbed'],
  ['CO(g) + O*_edge -> CO2 + *', 'C O gas plus O adsorbed at edge gives C O 2 plus a free site'],
  ['[13C]O* + * -> C* + O*', '13 C O adsorbed plus a free site gives C adsorbed plus O adsorbed'],
  ['C2H4** -> C2H4 + 2*', 'C 2 H 4 adsorbed on 2 sites gives C 2 H 4 plus 2 free sites'],
];

/** What a copy of the element holds: its text, runs of space as one, as a browser copies it. */
const copied = (element: Element | null) => (element?.textContent ?? '').replace(/\s+/g, ' ').trim();

describe('equation', () => {
  it.each(cases)('%s is copied in its plain spelling', (plain) => {
    const { container } = render(<Equation equation={plain} />);
    expect(copied(container.firstElementChild)).toBe(plain);
  });

  it.each(cases)('%s is read aloud as words', (plain, spoken) => {
    const { container } = render(<Equation equation={plain} />);
    expect(container.firstElementChild?.getAttribute('aria-label')).toBe(spoken);
  });

  it('sets indices as subscripts and counts of species in the line', () => {
    const { container } = render(<Equation equation="2NH3* -> N2 + 3H2 + 2*" />);
    expect([...container.querySelectorAll('sub')].map((sub) => sub.textContent)).toEqual(['3', '2', '2']);
  });

  it('draws its arrow, so that no font can lack it', () => {
    const { container } = render(<Equation equation="H2 + 2* -> 2H*" />);
    expect(container.querySelectorAll('svg')).toHaveLength(1);
  });

  it.each(['', 'N2 + ', '??', 'N* + N* ->', '→→', '++'])('sets what is still being typed as far as it goes: %s', (typed) => {
    expect(() => render(<Equation equation={typed} />)).not.toThrow();
  });
});
