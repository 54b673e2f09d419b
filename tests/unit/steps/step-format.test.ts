import { describe, expect, it } from 'vitest';
import { readStep } from '#shared/steps/parse-step.ts';
import { speakStep, stepTokens } from '#shared/steps/step-format.ts';

const pieces = (text: string): string => stepTokens(text).map(({ kind, text: part }) => `${kind}:${part}`).join(' ');

describe('pieces of an equation', () => {
  it.each([
    ['2N* -> N2 + 2*', 'coefficient:2 text:N site:* arrow:-> text:N sub:2 plus:+ coefficient:2 site:*'],
    ['NH3* + * -> NH2* + H*', 'text:NH sub:3 site:* plus:+ site:* arrow:-> text:NH sub:2 site:* plus:+ text:H site:*'],
    ['[13C]O*_top -> [13C]O + *_top', 'sup:13 text:CO site:* site-type:top arrow:-> sup:13 text:CO plus:+ site:* site-type:top'],
    ['1/2 N2 + * -> N*', 'coefficient:1/2 text:N sub:2 plus:+ site:* arrow:-> text:N site:*'],
    ['O2* + 2e- -> O2^2-*', 'text:O sub:2 site:* plus:+ coefficient:2 text:e sup:− arrow:-> text:O sub:2 sup:2− site:*'],
    ['H^+ + e- + * -> H*', 'text:H sup:+ plus:+ text:e sup:− plus:+ site:* arrow:-> text:H site:*'],
    ['C2H4 + 2* -> C2H4**', 'text:C sub:2 text:H sub:4 plus:+ coefficient:2 site:* arrow:-> text:C sub:2 text:H sub:4 site:**'],
  ])('%s', (text, expected) => {
    expect(pieces(text)).toBe(expected);
    expect(stepTokens(readStep(text))).toEqual(stepTokens(text));
  });
});

describe('words for a screen reader', () => {
  it.each([
    ['2N* -> N2 + 2*', 'two N adsorbed to N2 gas and two free sites'],
    ['NH3* + * -> NH2* + H*', 'N H3 adsorbed and a free site to N H2 adsorbed and H adsorbed'],
    ['1/2 N2 + *_B5 -> N*_B5', 'one half N2 gas and a free B5 site to N adsorbed at B5'],
    ['3/2 H2 + N* -> NH3 + *', 'three halves H2 gas and N adsorbed to N H3 gas and a free site'],
    ['[13C]O + * -> [13C]O*', '13 C O gas and a free site to 13 C O adsorbed'],
    ['C2H4 + 2* -> C2H4**', 'C2 H4 gas and two free sites to C2 H4 adsorbed on two sites'],
    ['H^+ + e- + * -> H*', 'H plus and electron and a free site to H adsorbed'],
    ['O2* + 2e- -> O2^2-*', 'O2 adsorbed and two electrons to O2 2 minus adsorbed'],
    ['(CH3)2CO + * -> (CH3)2CO*', '(C H3)2 C O gas and a free site to (C H3)2 C O adsorbed'],
    ['12H* -> 6H2 + 12*', '12 H adsorbed to six H2 gas and 12 free sites'],
    ['1/3 N2 + 2/3 * -> 2/3 N*', '1 over 3 N2 gas and 2 over 3 free sites to 2 over 3 N adsorbed'],
  ])('%s', (text, words) => {
    expect(speakStep(text)).toBe(words);
    expect(speakStep(readStep(text))).toBe(words);
  });
});
