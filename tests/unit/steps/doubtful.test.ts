import { describe, expect, it } from 'vitest';
import { readStep, StepError } from '#shared/steps/parse-step.ts';
import { Choices, everyReading } from '#shared/steps/readings.ts';

function refusal(text: string): StepError {
  try {
    readStep(text);
  } catch (error) {
    if (error instanceof StepError) return error;
    throw error;
  }
  throw new Error(`${text} was read`);
}

describe('what has two readings is settled by the balance', () => {
  it.each([
    // A number before a formula: coefficient or mass number.
    ['12H* -> 6H2 + 12*', '12H* -> 6H2 + 12*'],
    ['15 N* -> 15 N + 15*', '15 N* -> 15 N + 15*'],
    ['15N* -> 15N + *', '[15N]* -> [15N] + *'],
    ['1/2 15N2 + * -> 15N*', '1/2 [15N]2 + * -> [15N]*'],
    ['1 1/2 15N2 + 3* -> 3 15N*', '3/2 [15N]2 + 3* -> 3[15N]*'],
    ['0.5 18O2 + * -> 18O*', '1/2 [18O]2 + * -> [18O]*'],
    ['.5 O2 + * -> O*', '1/2 O2 + * -> O*'],
    ['14N* + 15N* -> 14N15N + 2*', 'N* + [15N]* -> N[15N] + 2*'],
    ['13C18O* -> 13C18O + *', '[13C][18O]* -> [13C][18O] + *'],
    ['(13C)O* -> *13CO', '[13C]O* -> [13C]O*'],
    ['(13C)O* -> [13CO] + *', '[13C]O* -> [13C]O + *'],
    // A number in a formula: count or mass number.
    ['H218O* + * -> H* + 18OH*', 'H2[18O]* + * -> H* + [18O]H*'],
    ['CH318OH* + * -> CH318O* + H*', 'CH3[18O]H* + * -> CH3[18O]* + H*'],
    ['C6H15N + * -> C6H15N*', 'C6H15N + * -> C6H15N*'],
    ['(CH3)2CO + * -> *(CH3)2CO', '(CH3)2CO + * -> (CH3)2CO*'],
    // A number before a sign: atoms or charge.
    ['NH3* + H+ -> NH4+ + *', 'NH3* + H^+ -> NH4^+ + *'],
    ['Ca2+ + 2e- + * -> Ca*', 'Ca^2+ + 2e^- + * -> Ca*'],
    ['Ca++ + 2e- + * -> Ca*', 'Ca^2+ + 2e^- + * -> Ca*'],
    ['SO42- + * -> SO4* + 2e-', 'SO4^2- + * -> SO4* + 2e^-'],
    ['SO4(2-) + * -> SO4* + 2e-', 'SO4^2- + * -> SO4* + 2e^-'],
    ['[SO4]2- + * -> SO4* + 2e-', 'SO4^2- + * -> SO4* + 2e^-'],
    ['[NO]- + * -> NO* + e-', 'NO^- + * -> NO* + e^-'],
    ['OH(-) + * -> OH* + e-', 'OH^- + * -> OH* + e^-'],
    ['O^{-2}* -> O* + 2e-', 'O^2-* -> O* + 2e^-'],
    ['O^--* -> O* + 2e-', 'O^2-* -> O* + 2e^-'],
    ['OH*^- -> OH* + e-', 'OH^-* -> OH* + e^-'],
    ['OH*- -> OH* + e-', 'OH^-* -> OH* + e^-'],
    ['O*^{2-}_{fcc} -> O*_fcc + 2e-', 'O^2-*_fcc -> O*_fcc + 2e^-'],
    ['O^{δ-}* + H* -> OH* + *', 'O* + H* -> OH* + *'],
    ['H++e-+*->H*', 'H^+ + e^- + * -> H*'],
    ['H++e−→½H2', 'H^+ + e^- -> 1/2 H2'],
    // A letter behind a formula.
    ['Na + Ha -> NHa + *', 'N* + H* -> NH* + *'],
    ['Na + * -> Na*', 'Na + * -> Na*'],
    ['Hg + * -> Hg*', 'Hg + * -> Hg*'],
    ['OHg + 2* -> O* + H*', 'OH + 2* -> O* + H*'],
    ['H2S* + * -> HS* + H*', 'H2S* + * -> SH* + H*'],
    ['S + O2 -> SO2', 'S + O2 -> SO2'],
    ['H2 + 2X -> 2H-X', 'H2 + 2* -> 2H*'],
    ['O2 + 2Z -> 2ZO', 'O2 + 2* -> 2O*'],
    ['CO + Co(s) -> CO(s)', 'CO + * -> CO*'],
    ['CO(g) + (s) -> CO(s)', 'CO + * -> CO*'],
    ['CO(s) + * -> C(s) + O(s)', 'CO* + * -> C* + O*'],
    ['NH3(ads) + (ads) -> NH2(ads) + H(ads)', 'NH3* + * -> NH2* + H*'],
    ['CO_A + *_B -> CO_B + *_A', 'CO*_A + *_B -> CO*_B + *_A'],
    ['CO* + *_{vac} -> C* + O*', 'CO* + * -> C* + O*'],
    // What binds, and to how many sites.
    ['C2H4 + * -> η2-C2H4*', 'C2H4 + * -> C2H4*'],
    ['C2H4 + 2* -> η²-C2H4*', 'C2H4 + 2* -> C2H4**'],
    ['C2H4 + 2* -> η2-(C2H4)', 'C2H4 + 2* -> C2H4**'],
    ['C2H4 + 2* -> di-σ-C2H4', 'C2H4 + 2* -> C2H4**'],
    ['C2H4 + * -> π-C2H4*', 'C2H4 + * -> C2H4*_pi'],
    ['C2H4 + * -> π-C2H4*_top', 'C2H4 + * -> C2H4*_top'],
    ['CO + * -> μ2-CO*', 'CO + * -> CO*'],
    ['bidentate-HCOO* -> monodentate-HCOO* + *', 'HCOO** -> HCOO* + *'],
    ['C2H4*2 -> C2H4 + *_2 + *_1', null],
    ['C2H4 + 2*_fcc -> C2H4*2_fcc', 'C2H4 + 2*_fcc -> C2H4**_fcc'],
    ['C2H4 + *2 -> C2H4**', 'C2H4 + 2* -> C2H4**'],
    ['*N2* + 2* -> 2N* + 2*', 'N2** + 2* -> 2N* + 2*'],
    // Numbers and labels about an equation.
    ['(2) N2 + 2* -> 2N*', 'N2 + 2* -> 2N*'],
    ['(2) H* -> H2 + 2*', '2H* -> H2 + 2*'],
    ['"N2 + 2* -> 2N*"', 'N2 + 2* -> 2N*'],
    ['N2 + 2* → 2 N*  (R3)', 'N2 + 2* -> 2N*'],
    ['CO* + * ->[13C]* + O*', null],
    ['[13C]O* + * ->[13C]* + O*', '[13C]O* + * -> [13C]* + O*'],
    ['\\ce{2N\\textsuperscript{*} -> N\\textsubscript{2} + 2\\{ \\}}', '2N* -> N2 + 2*'],
  ])('%s', (text, equation) => {
    if (equation === null) expect(refusal(text).code).toBe('unbalanced');
    else expect(readStep(text).equation).toBe(equation);
  });
});

describe('what stays doubtful is refused with its readings', () => {
  it.each([
    ['O2-* -> O2- + *', ['O2^-* -> O2^- + *', 'O^2-* -> O^2- + *']],
    ['H-* + * -> * + H-*', ['H^-* + * -> * + H^-*', 'H* + * -> * + H*']],
    ['C2H4*2 + H* -> C2H5*2 + *', ['C2H4** + H* -> C2H5** + *', 'C2H4*_site2 + H* -> C2H5*_site2 + *']],
    ['H2 + 2S -> 2H-S', ['H2 + 2S -> 2SH', 'H2 + 2* -> 2H*']],
    ['12CO -> 12CO*', ['CO + * -> CO*', '12 CO + 12* -> 12 CO*']],
    ['Co* + * -> C* + O*', ['CO*', '[Co]*']],
    ['No + * -> No*', ['NO', '[No]']],
    ['Ho* + * -> H* + O*', ['HO*', '[Ho]*']],
    ['2CoOH* -> Co2* + *', ['2COOH*', '2[Co]OH*']],
  ])('%s', (text, readings) => {
    const error = refusal(text);
    expect(error.code).toBe('ambiguous');
    expect(error.readings).toEqual(readings);
    for (const reading of readings) expect(error.message).toContain(reading);
  });

  it('takes cobalt in brackets for cobalt', () => {
    const step = readStep('[Co]* + CO* -> * + [Co](CO)*');
    expect(step.equation).toBe('[Co]* + CO* -> * + [Co](CO)*');
    expect(step.reactants[0]?.species.composition).toEqual({ Co: 1 });
    expect(readStep(step.key).key).toBe(step.key);
  });

  it('gives up where there are too many readings', () => {
    const error = refusal('O2- + N2- + C2- + S2- + P2- + F2- + B2- -> O2*');
    expect(error).toMatchObject({ code: 'ambiguous', position: 0 });
    expect(error.message).toContain('too many ways');
  });

  it('lets what is no fault of the text through', () => {
    expect(() => everyReading(() => { throw new TypeError('a mistake'); })).toThrow(TypeError);
    expect(new Choices(new Map([['kind', 7]])).pick('kind', ['one', 'two'])).toBe('one');
  });
});

describe('says what to write instead', () => {
  it.each([
    ['CO*(g) -> CO + *', 'either an adsorbed species (*) or a gas (g), not both'],
    ['*CO(g) -> CO + *', 'either an adsorbed species (*) or a gas (g), not both'],
    ['η2-C2H4(g) + 2* -> C2H4**', 'either an adsorbed species or a gas (g), not both'],
    ['H2O(l) + * -> H2O*', 'leave (l) out: H2O'],
    ['H+(aq) + e- + * -> H*', 'leave (aq) out: H+'],
    ['C(s) + O* -> CO*', 'write C* for an adsorbed species'],
    ['C(s) + * -> *C', 'write C* for an adsorbed species'],
    ['θ_CO + * -> C* + O*', 'is a coverage: write the species, such as CO*'],
    ['n2 + 2* -> 2N*', 'in capitals it is N2'],
    ['pt* -> C*', 'in capitals it is Pt'],
    ['PT* -> PT + *', 'T is tritium); the element is Pt'],
    ['CO(S) + Pt(S) -> C(S) + Rh(S)', 'two kinds of free site, Pt(s) and Rh(s): write * with the names of the sites'],
    ['[QQ]* -> C*', 'expected an element symbol'],
    ['[Qq]* -> C*', 'expected an element symbol'],
    ['A* -> B*', 'expected an element symbol'],
  ])('%s', (text, words) => {
    expect(refusal(text).message).toContain(words);
  });
});

describe('one name for a kind of site', () => {
  it.each([['atop', 'top'], ['on-top', 'top'], ['br', 'bridge'], ['3f', 'threefold'], ['4-fold', 'fourfold'], ['sub', 'subsurface'], ['b5', 'B5'], ['ads', ''], ['fcc-hollow', 'fcc'], ['Ru1', 'Ru1'], ['110', '110'], ['7', 'site7']])('%s is %s', (typed, name) => {
    expect(readStep(`N*_{${typed}} -> N + *`).reactants[0]?.species.siteType ?? '').toBe(name);
  });
});
