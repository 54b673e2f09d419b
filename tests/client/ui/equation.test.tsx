import { render, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { Equation } from '#client/ui/equation.tsx';

const cases: [plain: string, spoken: string][] = [
  ['N* + N* -> N2 + 2*', 'N adsorbed and N adsorbed to N2 gas and two free sites'],
  ['NH3* + * -> NH2* + H*', 'N H3 adsorbed and a free site to N H2 adsorbed and H adsorbed'],
  ['N2 + 2* <-> 2N*', 'N2 gas and two free sites to two N adsorbed'],
  ['CO(g) + O*_edge -> CO2 + *_edge', 'C O gas and O adsorbed at edge to C O2 gas and a free edge site'],
  ['[13C]O* + * -> [13C]* + O*', '13 C O adsorbed and a free site to 13 C adsorbed and O adsorbed'],
  ['O2^2-*_top -> O2* + 2e^-', 'O2 2 minus adsorbed at top to O2 adsorbed and two electrons'],
  ['H^+ + e^- + * -> H*', 'H plus and electron and a free site to H adsorbed'],
  ['1/2 N2 + *_B5 -> N*_B5', 'one half N2 gas and a free B5 site to N adsorbed at B5'],
  ['15 N* -> 15/2 N2 + 15*', '15 N adsorbed to 15 over 2 N2 gas and 15 free sites'],
  ['[13C][18O]* -> * + [13C][18O]', '13 C 18 O adsorbed to a free site and 13 C 18 O gas'],
  ['2[15N]* <-> [15N]2 + 2*', 'two 15 N adsorbed to 15 N 2 gas and two free sites'],
  ['* + [15N] -> [15N]*', 'a free site and 15 N gas to 15 N adsorbed'],
  ['* + [Co] -> [Co]*', 'a free site and Co gas to Co adsorbed'],
  ['* + H2O^+ <-> H2O^+*_site2', 'a free site and H2 O plus to H2 O plus adsorbed at site2'],
  ['C2H4** -> C2H4 + 2*', 'C2 H4 adsorbed on two sites to C2 H4 gas and two free sites'],
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

  it.each([
    ['\\ce{N2(g) + 2$*$ <=> 2N$*$}', 'N2 + 2* -> 2N*'],
    ['NH<sub>3</sub>* + * &rarr; NH<sub>2</sub>* + H*', 'NH3* + * -> NH2* + H*'],
    ['CO_ads + * <-> C_ads + O_ads', 'CO* + * -> C* + O*'],
    ['13CO* + * -> 13C* + O*', '[13C]O* + * -> [13C]* + O*'],
    ['15N* -> 15N + *', '[15N]* -> [15N] + *'],
    ['O2* + e- -> O2-*', 'O2* + e^- -> O2^-*'],
    ['CO* + * = C* + O*', 'CO* + * -> C* + O*'],
  ])('sets %s in the spelling kept as soon as the reader is there', async (typed, plain) => {
    const { container } = render(<Equation equation={typed} />);
    await waitFor(() => expect(copied(container.firstElementChild)).toBe(plain));
  });

  it('sets a charge with a true minus sign, raised', () => {
    const { container } = render(<Equation equation="O^2-* -> O* + 2e^-" />);
    expect([...container.querySelectorAll('sup')].map((sup) => sup.getAttribute('data-set'))).toEqual(['2\u2212', '\u2212']);
  });

  it('sets indices as subscripts and counts of species in the line', () => {
    const { container } = render(<Equation equation="2NH3* -> N2 + 3H2 + 2*" />);
    expect([...container.querySelectorAll('sub')].map((sub) => sub.textContent)).toEqual(['3', '2', '2']);
  });

  it('draws its arrow, so that no font can lack it', () => {
    const { container } = render(<Equation equation="H2 + 2* -> 2H*" />);
    expect(container.querySelectorAll('svg')).toHaveLength(1);
  });

  it.each(['', 'N2 +', '??', 'N* + N* ->', '->->', '++', 'Xy* -> Q'])('sets what is still being typed as far as it goes, and says it as typed: %s', (typed) => {
    const { container } = render(<Equation equation={typed} />);
    expect(copied(container.firstElementChild).replace(/\s/g, '')).toBe(typed.replace(/\s/g, ''));
    expect(container.firstElementChild?.getAttribute('aria-label')).toBe(typed);
  });
});
