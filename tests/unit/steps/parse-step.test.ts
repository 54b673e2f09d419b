import { describe, expect, it } from 'vitest';
import { readStep, StepError, STEP_PARSER_VERSION } from '#shared/steps/parse-step.ts';

/** The error that an equation raises. */
function refusal(text: string): StepError {
  try {
    readStep(text);
  } catch (error) {
    if (error instanceof StepError) return error;
    throw error;
  }
  throw new Error(`${text} was read`);
}

describe('notations', () => {
  it.each([
    ['CO* + * -> C* + O*', 'CO* + * -> C* + O*'],
    ['CO(ads) + * = C(ads) + O(ads)', 'CO* + * -> C* + O*'],
    ['CO_ads + * -> C_ads + O_ads', 'CO* + * -> C* + O*'],
    ['CO_{ads} + * → C_{ads} + O_{ads}', 'CO* + * -> C* + O*'],
    ['CO(a) + * ⇌ C(a) + O(ad)', 'CO* + * -> C* + O*'],
    ['N2(g) + 2* <-> 2N*', 'N2 + 2* -> 2N*'],
    ['N2_g + * + * <=> N* + N*', 'N2 + 2* -> N* + N*'],
    ['H2 + 2 * ⇌ 2 H*', 'H2 + 2* -> 2H*'],
    ['H₂(gas) + 2∗ ⟶ 2 H∗', 'H2 + 2* -> 2H*'],
    ['H_{2}(g) + 2* \\rightarrow 2H^{*}', 'H2 + 2* -> 2H*'],
    ['H_2 + 2\\ast \\rightleftharpoons 2H^*', 'H2 + 2* -> 2H*'],
    ['$\\mathrm{H2} + 2* \\to 2H*$', 'H2 + 2* -> 2H*'],
    ['NH3* + * → NH2* + H*', 'NH3* + * -> NH2* + H*'],
    ['NH3* + * --> NH2* + H*', 'NH3* + * -> NH2* + H*'],
    ['NH2* + H* <- NH3* + *', 'NH3* + * -> NH2* + H*'],
    ['NH2* + H* ← NH3* + *', 'NH3* + * -> NH2* + H*'],
    ['*CO + *H -> *CHO + *', 'CO* + H* -> CHO* + *'],
    ['*CO+*H->*CHO+*', 'CO* + H* -> CHO* + *'],
    ['CO*+*->C*+O*', 'CO* + * -> C* + O*'],
    ['2D* -> D2 + 2*', '2D* -> D2 + 2*'],
    ['[13C]O* + * -> [13C]* + O*', '[13C]O* + * -> [13C]* + O*'],
    ['¹³CO* + * -> ^{13}C* + O*', '[13C]O* + * -> [13C]* + O*'],
    ['H*_fcc + *_hcp -> H*_hcp + *_fcc', 'H*_fcc + *_hcp -> H*_hcp + *_fcc'],
    ['H*(fcc) -> H*{hcp}', 'H*_fcc -> H*_hcp'],
    ['H_fcc -> H_hcp', 'H*_fcc -> H*_hcp'],
    ['CO(ads,top) -> CO(ads,bridge)', 'CO*_top -> CO*_bridge'],
    ['N2 + 2*_B5 -> 2N*_B5', 'N2 + 2*_B5 -> 2N*_B5'],
    ['C2H4 + 2* -> C2H4**', 'C2H4 + 2* -> C2H4**'],
    ['C2H4 + ** -> **C2H4', 'C2H4 + 2* -> C2H4**'],
    ['½N2 + * ⇌ N*', '1/2 N2 + * -> N*'],
    ['0.5 N2 + * -> N*', '1/2 N2 + * -> N*'],
    ['N2 + 3 H2 -> 2NH3', 'N2 + 3H2 -> 2NH3'],
    ['1½H2 + N* -> NH3 + *', '3/2 H2 + N* -> NH3 + *'],
    ['O2 + □ → O2*', 'O2 + * -> O2*'],
    ['H^+ + e^- + * -> H*', 'H^+ + e^- + * -> H*'],
    ['H+ + e- + * -> H*', 'H^+ + e^- + * -> H*'],
    ['H⁺ + e⁻ + * → H*', 'H^+ + e^- + * -> H*'],
    ['O2* + 2e- -> O2^2-*', 'O2* + 2e^- -> O2^2-*'],
    ['CH2=CH2 + * -> C2H4*', 'C2H4 + * -> C2H4*'],
    ['CH3-CH3* + * -> 2CH3*', 'C2H6* + * -> 2CH3*'],
    ['(CH3)2CO + * -> (CH3)2CO*', '(CH3)2CO + * -> (CH3)2CO*'],
    ['trans-HCOOH* -> cis-HCOOH*', 'trans-HCOOH* -> cis-HCOOH*'],
    ['HCO* + * -> CO* + H*', 'CHO* + * -> CO* + H*'],
    ['H3N* + * -> H2N* + H*', 'NH3* + * -> NH2* + H*'],
    ['H2O* + * -> HO* + H*', 'H2O* + * -> OH* + H*'],
    ['OC* + * -> CO + 2*', 'CO* + * -> CO + 2*'],
    ['HD + 2* -> H* + D*', 'HD + 2* -> H* + D*'],
    ['H*+*→*+H*', 'H* + * -> * + H*'],
    ['D2N* + D* -> ND3* + *', 'ND2* + D* -> ND3* + *'],
    ['[15N][15N] + 2* -> 2[15N]*', '[15N]2 + 2* -> 2[15N]*'],
    ['[15N2] + 2* -> 2[15N]*', '[15N]2 + 2* -> 2[15N]*'],
    ['CHD2* + D* -> CHD3 + 2*', 'CHD2* + D* -> CHD3 + 2*'],
    ['CD3CD3* + * -> 2CD3*', 'C2D6* + * -> 2CD3*'],
    ['CD3OCD3 + * -> CD3OCD3*', 'CD3OCD3 + * -> CD3OCD3*'],
    ['HCOOH + * -> HCOOH*', 'HCOOH + * -> HCOOH*'],
  ])('reads %s', (text, equation) => {
    expect(readStep(text).equation).toBe(equation);
  });

  it('gives orders of the direction typed', () => {
    expect(readStep('N2 + 2* -> 2N*')).toMatchObject({ gasOrder: 1, surfaceOrder: 2, parserVersion: STEP_PARSER_VERSION });
    expect(readStep('2N* -> N2 + 2*')).toMatchObject({ gasOrder: 0, surfaceOrder: 2 });
    expect(readStep('1/2 N2 + * -> N*')).toMatchObject({ gasOrder: 0.5, surfaceOrder: 1 });
    expect(readStep('C2H4** -> C2H4 + 2*')).toMatchObject({ gasOrder: 0, surfaceOrder: 1 });
    expect(readStep('H^+ + e- + * -> H*').gasOrder).toBe(1);
  });

  it('describes species', () => {
    const { reactants, products } = readStep('[13C]D3* + H* -> [13C]HD3 + 2*');
    expect(reactants[0]).toEqual({ coefficient: 1, species: { formula: 'CH3', spelling: '[13C]D3', composition: { C: 1, H: 3 }, phase: 'adsorbed', sites: 1, isotopes: { '13C': 1, '2H': 3 } } });
    expect(products[0]?.species).toMatchObject({ formula: 'CH4', phase: 'gas', sites: 0 });
    expect(products[1]).toMatchObject({ coefficient: 2, species: { phase: 'free-site', formula: '*' } });
    expect(readStep('O2* + e- -> O2^-*').products[0]?.species).toMatchObject({ charge: -1, formula: 'O2' });
  });
});

describe('keys', () => {
  const same = (a: string, b: string): void => {
    expect(readStep(a).key, `${a} against ${b}`).toBe(readStep(b).key);
  };

  it('does not depend on order, spelling, isotopes, site types or direction', () => {
    same('N2 + 2* -> 2N*', '* + N2(g) + * <-> N* + N*');
    same('N2 + 2* -> 2N*', '2N* = N2 + 2*');
    same('N2 + 2* -> 2N*', '[15N]2 + 2*_B5 -> 2[15N]*_B5');
    same('H2 + 2* -> 2H*', '2D* -> D2 + 2*');
    same('H2 + 2* -> 2H*', 'HD + 2* -> H* + D*');
    same('NH3* + * -> NH2* + H*', '*D + D2N(ads) -> * + ND3*');
    same('CHO* + * -> CO* + H*', '*CO + *H -> *HCO + *');
    expect(readStep('N2 + 2* -> 2N*').key).toBe('2N* <=> N2 + 2*');
  });

  it('takes species that stand on both sides off', () => {
    same('N2 + 3* -> 2N* + *', 'N2 + 2* -> 2N*');
    same('NH3* + O* + * -> NH2* + H* + O*', 'NH3* + * -> NH2* + H*');
    same('H*_fcc + *_hcp -> H*_hcp + *_fcc', 'H*_fcc -> H*_hcp');
  });

  it('keeps the coefficients', () => {
    expect(readStep('1/2 N2 + * -> N*').key).not.toBe(readStep('N2 + 2* -> 2N*').key);
    expect(readStep('2 CO* + 2* -> 2C* + 2O*').key).not.toBe(readStep('CO* + * -> C* + O*').key);
  });

  it('keeps species apart that differ', () => {
    expect(readStep('CHO* -> COH*').key).toBe('CHO* <=> COH*');
    expect(readStep('CO + * -> CO*').key).not.toBe(readStep('CO* + * -> C* + O*').key);
    expect(readStep('C2H4 + 2* -> C2H4**').key).not.toBe(readStep('C2H4 + * -> C2H4*').key);
  });

  it('keeps isotopes and site types in the variant', () => {
    expect(readStep('2D*_edge -> D2 + 2*_edge').variantKey).toBe('2D*_edge <=> D2 + 2*_edge');
    expect(readStep('2H* -> H2 + 2*').variantKey).toBe(readStep('2H* -> H2 + 2*').key);
  });

  it('turns the sign with the direction', () => {
    for (const [a, b] of [['N2 + 2* -> 2N*', '2N* -> N2 + 2*'], ['H*_fcc -> H*_hcp', 'H*_hcp -> H*_fcc'], ['D2 + 2* -> 2D*', '2D* -> D2 + 2*']] as const) {
      expect(readStep(a).direction).toBe(-readStep(b).direction);
      expect(readStep(a).variantKey).toBe(readStep(b).variantKey);
    }
    expect(readStep('2N* -> N2 + 2*').direction).toBe(1);
  });

  it('reads its own keys', () => {
    for (const text of ['N2 + 2* -> 2N*', '1/2 N2 + * -> N*', 'H*_fcc -> H*_hcp', '[13C]O* + * -> [13C]* + O*', 'O2* + e- -> O2^-*']) {
      const { key, variantKey } = readStep(text);
      expect(readStep(key).key).toBe(key);
      expect(readStep(variantKey).variantKey).toBe(variantKey);
      expect(readStep(variantKey).direction).toBe(1);
    }
  });
});

describe('balance', () => {
  it.each([
    ['NH3* -> NH2* + H*', 'NH3* + * -> NH2* + H*'],
    ['2N* -> N2', '2N* -> N2 + 2*'],
    ['N2 -> 2N*', 'N2 + 2* -> 2N*'],
    ['CO -> CO*', 'CO + * -> CO*'],
    ['NH2* + H* -> NH3*', 'NH2* + H* -> NH3* + *'],
    ['1/2 N2 -> N*', '1/2 N2 + * -> N*'],
    ['½H2 + ½* -> H*', '1/2 H2 + * -> H*'],
  ])('offers the free site that %s lacks', (text, suggestion) => {
    const error = refusal(text);
    expect(error).toMatchObject({ code: 'unbalanced', suggestion });
    expect(error.imbalance).toHaveLength(1);
    expect(error.imbalance?.[0]?.what).toBe('site');
    expect(readStep(suggestion).equation).toBeTruthy();
  });

  it.each([
    ['N2 + 2* -> N*', [{ what: 'N', by: -1 }, { what: 'site', by: -1 }], /1 N more on the left \(2 left, 1 right\); 1 site more on the left/],
    ['CO* + * -> C* + N*', [{ what: 'O', by: -1 }, { what: 'N', by: 1 }], /1 O more on the left \(1 left, 0 right\); 1 N more on the right/],
    ['H2 + 2* -> 2D*', [{ what: '2H', by: 2 }], /2 D more on the right/],
    ['H^+ + * -> H*', [{ what: 'charge', by: -1 }], /1 of charge more on the left/],
    ['2NH3 -> N2 + 2H2', [{ what: 'H', by: -2 }], /2 H more on the left \(6 left, 4 right\)/],
  ])('says what is wrong with %s', (text, imbalance, message) => {
    const error = refusal(text);
    expect(error).toMatchObject({ code: 'unbalanced', imbalance });
    expect(error.message).toMatch(message);
    expect(error.suggestion).toBeUndefined();
  });
});

describe('what is no step', () => {
  it.each([
    ['', 'no-arrow', 0],
    ['CO* + * C* + O*', 'no-arrow', 15],
    ['-> N2', 'empty-side', 0],
    ['N2 + -> N2', 'empty-side', 5],
    ['N2 + 2* ->', 'empty-side', 10],
    ['A* -> B* -> C*', 'unreadable', 9],
    ['A=B=C', 'unreadable', 3],
    ['foo* -> C*', 'unreadable', 0],
    ['CO* + * -> C* + Xx*', 'unreadable', 16],
    ['CO(s) -> C', 'unreadable', 3],
    ['C O* -> CO*', 'unreadable', 1],
    ['*C* -> C*', 'unreadable', 0],
    ['0N2 -> N2', 'unreadable', 0],
    ['1/0 N2 -> N2', 'unreadable', 0],
    ['9999 N2 -> N2', 'unreadable', 0],
    ['2 -> N2', 'unreadable', 1],
    ['Ca²⁺ + CO*{ -> C', 'unreadable', 9],
    ['(g) -> N2', 'unreadable', 0],
    ['(CO -> CO', 'unreadable', 3],
    ['C0* -> C*', 'unreadable', 2],
    ['CO)* -> C*', 'unreadable', 2],
    ['(99C)O* -> C*', 'unreadable', 1],
    ['*99CO -> C', 'unreadable', 1],
    ['()* -> C*', 'unreadable', 1],
    ['[13Q]* -> C*', 'unreadable', 3],
    ['(((((((((((C))))))))))) -> C', 'unreadable', 9],
    ['* -> *', 'no-change', 0],
    ['N2 -> N2', 'no-change', 0],
    ['N2 + * -> * + N2', 'no-change', 0],
    [`${'H* + '.repeat(30)}H* -> H2`, 'unreadable', 0],
    ['H'.repeat(500), 'unreadable', 400],
  ])('%s', (text, code, position) => {
    expect(refusal(text)).toMatchObject({ code, position });
  });

  it('suggests the asterisk for (s)', () => {
    expect(refusal('CO(s) -> C').message).toContain('write CO* for an adsorbed species');
  });
});
