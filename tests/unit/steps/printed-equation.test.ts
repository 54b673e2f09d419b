import { describe, expect, it } from 'vitest';
import { readStep } from '#shared/steps/parse-step.ts';
import { readPrinted } from '#shared/steps/printed-equation.ts';
import { tokensOf, wordsOf } from '#shared/steps/set-terms.ts';
import { speakStep, stepTokens } from '#shared/steps/step-format.ts';
import { notations } from './notations.ts';

const printed = [
  ...notations.filter(([, , stepClass]) => stepClass).map(([, becomes]) => becomes),
  '15 N* -> 15/2 N2 + 15*', '0.37N2 + 0.74* -> 0.74N*', '[13C][18O]* -> * + [13C][18O]', '(CH3)2CO + * -> (CH3)2CO*', 'trans-HCOOH* -> cis-HCOOH*', '[Co]* + CO* -> * + [Co](CO)*', 'Fe(CO)5 -> Fe(CO)4 + CO', '2[15N]* -> [15N]2 + 2*', 'H3O^+ + e^- + * -> H* + H2O',
];

describe('an equation as it is printed', () => {
  it.each(printed)('is set and said as by the whole reader: %s', (equation) => {
    const sides = readPrinted(equation);
    expect(sides && wordsOf(sides)).toBe(speakStep(equation));
    expect(sides && tokensOf(sides)).toEqual(stepTokens(equation));
    expect(readPrinted(readStep(equation).key.replace('<=>', '->'))).not.toBeNull();
  });

  it.each([['N2 + 2* <-> 2N*', 'N2 gas and two free sites to two N adsorbed'], ['CO(g) + O(ads) ⇌ CO2 + *', 'C O gas and O adsorbed to C O2 gas and a free site']])('may have an equilibrium and phases: %s', (equation, words) => {
    const sides = readPrinted(equation);
    expect(sides && wordsOf(sides)).toBe(words);
  });

  it.each([
    '', 'N2', 'N2 + -> N2', 'CO* + * = C* + O*', '13CO* + * -> C*', '15N* -> N2', 'O2-* -> O2', 'Co* -> C*', 'Xy* -> Q', 'co* -> CO', 'CO_ads -> CO + *', 'CO_top -> CO + *', '0N2 -> N2', '1/0 N2 -> N2', 'N2 -> N2 -> N2', '^- -> e^-', '(g) -> N2', '\\ce{N2} -> N2',
    `${'N'.repeat(90)} -> N2`, `${'N2 + '.repeat(90)}N2 -> N2`, `${'('.repeat(70)} -> N2*x`,
  ])('is nothing else: %s', (equation) => {
    expect(readPrinted(equation)).toBeNull();
  });
});
