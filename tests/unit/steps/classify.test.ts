import { describe, expect, it } from 'vitest';
import { bondBetween } from '#shared/steps/bonds.ts';
import { stepClasses } from '#shared/steps/classify.ts';
import { readStep } from '#shared/steps/parse-step.ts';

/** Classes and bonds as surface chemistry uses the words: common practice. */
describe('class of a step', () => {
  it.each([
    ['CO + * -> CO*', 'adsorption', null, null, null],
    ['C2H4 + 2* -> C2H4**', 'adsorption', null, null, null],
    ['N2 + O* + * -> N2* + O*', 'adsorption', null, null, null],
    ['N2 + 2* -> 2N*', 'dissociative-adsorption', 'N-N', null, 'direct'],
    ['H2 + 2* -> 2H*', 'dissociative-adsorption', 'H-H', null, null],
    ['1/2 N2 + * -> N*', 'dissociative-adsorption', 'N-N', null, 'direct'],
    ['CH4 + 2* -> CH3* + H*', 'dissociative-adsorption', 'C-H', null, null],
    ['NH3 + 4* -> N* + 3H*', 'overall', null, null, null],
    ['H2O + 3* -> 2H* + O*', 'dissociative-adsorption', null, null, null],
    ['CO* -> CO + *', 'desorption', null, null, null],
    ['N2* + O* -> N2 + O* + *', 'desorption', null, null, null],
    ['2N* -> N2 + 2*', 'associative-desorption', null, 'N-N', null],
    ['CO* + O* -> CO2 + 2*', 'associative-desorption', null, 'C-O', null],
    ['CO* + * -> C* + O*', 'dissociation', 'C-O', null, 'direct'],
    ['N2* + * -> 2N*', 'dissociation', 'N-N', null, 'direct'],
    ['C2H6* + * -> 2CH3*', 'dissociation', 'C-C', null, 'direct'],
    ['H2* + * -> 2H*', 'dissociation', 'H-H', null, null],
    ['N2O* -> N2 + O*', 'dissociation', 'N-O', null, 'direct'],
    ['CHO* + * -> CH* + O*', 'dissociation', 'C-O', null, 'direct'],
    ['COOH* + * -> CO* + OH*', 'dissociation', 'C-O', null, 'direct'],
    ['CO* + H* -> C* + OH*', 'dissociation', 'C-O', 'O-H', 'hydrogen-assisted'],
    ['C* + OH* -> CO* + H*', 'association', 'O-H', 'C-O', null],
    ['2N* -> N2* + *', 'association', null, 'N-N', null],
    ['CO* + OH* -> COOH* + *', 'association', null, 'C-O', null],
    ['2H* -> H2* + *', 'association', null, 'H-H', null],
    ['N* + H* -> NH* + *', 'hydrogenation', null, 'N-H', null],
    ['CO* + H* -> CHO* + *', 'hydrogenation', null, 'C-H', null],
    ['CO* + H* -> COH* + *', 'hydrogenation', null, 'O-H', null],
    ['NH2* + OH* -> NH3* + O*', 'hydrogenation', 'O-H', 'N-H', null],
    ['NH3* + * -> NH2* + H*', 'dehydrogenation', 'N-H', null, null],
    ['CH3OH* + * -> CH3O* + H*', 'dehydrogenation', 'O-H', null, null],
    ['CH3OH* + * -> CH2OH* + H*', 'dehydrogenation', 'C-H', null, null],
    ['NH3* + O* -> NH2* + OH*', 'dehydrogenation', 'N-H', 'O-H', null],
    ['HCOO* -> CO2 + H*', 'dehydrogenation', 'C-H', null, null],
    ['2OH* -> H2O* + O*', 'disproportionation', 'O-H', 'O-H', null],
    ['2NH2* -> NH3* + NH*', 'disproportionation', 'N-H', 'N-H', null],
    ['2CO* -> C* + CO2*', 'disproportionation', null, null, null],
    ['H*_fcc -> H*_hcp', 'diffusion', null, null, null],
    ['H* + * -> * + H*', 'diffusion', null, null, null],
    ['HCN* -> CNH*', 'isomerisation', null, null, null],
    ['CO + O* -> CO2 + *', 'eley-rideal', null, 'C-O', null],
    ['H + H* -> H2 + *', 'eley-rideal', null, 'H-H', null],
    ['CO + O* -> CO2*', 'eley-rideal', null, 'C-O', null],
    ['H2 + O* + * -> OH* + H*', 'eley-rideal', null, null, null],
    ['2NH3 -> N2 + 3H2', 'overall', null, null, null],
    ['CO + H2O + * -> CO2 + H2 + *', 'overall', null, null, null],
    ['CO + H2 + 3* -> CO* + 2H*', 'overall', null, null, null],
    ['H^+ + e- + * -> H*', 'overall', null, null, null],
    ['HD* + D* -> D2* + H*', 'overall', null, null, null],
    ['NH3* + 3* -> N* + 3H*', 'overall', null, null, null],
    ['2H2O* -> 2H2 + O2 + 2*', 'overall', null, null, null],
    ['2N2 + 4* -> 4N*', 'dissociative-adsorption', 'N-N', null, 'direct'],
    ['2CO* + 2* -> 2C* + 2O*', 'dissociation', 'C-O', null, 'direct'],
    ['0.37 N2 + 0.74 * -> 0.74 N*', 'overall', null, null, null],
    ['HCOO** -> HCOO* + *', 'isomerisation', null, null, null],
    ['HCN + * -> CNH*', 'overall', null, null, null],
    ['N2 + O*_fcc + *_hcp -> N2*_fcc + O*_hcp', 'adsorption', null, null, null],
    ['N2*_fcc + O*_hcp -> N2 + O*_fcc + *_hcp', 'desorption', null, null, null],
    ['CO + [13C]O* -> [13C]O + CO*', 'eley-rideal', null, null, null],
    ['COOH* + OH* -> CO2* + H2O*', 'dehydrogenation', 'O-H', 'O-H', null],
    ['NH* + H2O* -> NH2* + OH*', 'hydrogenation', 'O-H', 'N-H', null],
    ['CH4* + OH* -> CH3* + H2O*', 'dehydrogenation', 'C-H', 'O-H', null],
    ['CH3* + OH* -> CH4* + O*', 'hydrogenation', 'O-H', 'C-H', null],
    ['NO* + H* -> N* + OH*', 'dissociation', 'N-O', 'O-H', 'hydrogen-assisted'],
    ['CO* + H* + * -> CH* + O* + *', 'dissociation', 'C-O', 'C-H', 'hydrogen-assisted'],
    ['CH2O* + H* -> CH2* + OH*', 'dissociation', 'C-O', 'O-H', 'hydrogen-assisted'],
    ['NH2OH* + H* -> NH2* + H2O*', 'dissociation', 'N-O', 'O-H', 'hydrogen-assisted'],
    ['CH2CO* + H* -> CH3* + CO*', 'dissociation', 'C-C', 'C-H', 'hydrogen-assisted'],
    ['N2H* + H* -> 2NH*', 'dissociation', 'N-N', 'N-H', 'hydrogen-assisted'],
    ['CO2* + H* -> CO* + OH*', 'dissociation', 'C-O', 'O-H', 'hydrogen-assisted'],
    ['N2* + H* -> N2H* + *', 'hydrogenation', null, 'N-H', null],
    ['NaOH* + H* -> Na* + H2O*', 'dissociation', 'Na-O', 'O-H', 'hydrogen-assisted'],
    ['H2* + H* -> H* + H2*', 'overall', null, null, null],
    ['CO* + N* -> CN* + O*', 'association', null, null, null],
    ['2CO + O2 + 2* -> 2CO2 + 2*', 'overall', null, null, null],
  ])('%s', (text, stepClass, broken, formed, assistance) => {
    const step = readStep(text);
    expect(stepClasses).toContain(step.class);
    expect([step.class, step.bond.broken, step.bond.formed, step.assistance]).toEqual([stepClass, broken, formed, assistance]);
  });
});

describe('bonds', () => {
  it.each([
    ['CO2', 'CO', 'O', 'C-O'], ['NO2', 'NO', 'O', 'N-O'], ['N2H4', 'NH2', 'NH2', 'N-N'], ['CH3CHO', 'CH3', 'CHO', 'C-C'], ['CHO', 'CO', 'H', 'C-H'], ['COH', 'H', 'CO', 'O-H'],
    ['CH3CHO', 'CO', 'C', 'C-C'], ['CH3CHO', 'CN', 'C', null], ['HCl', 'H', 'Cl', 'Cl-H'], ['CH3CH2OH', 'CH2CH2O', 'H', null], ['H3', 'H2', 'H', null], ['CCO', 'OC', 'C', 'C-C'], ['CO', 'H2', 'O', null], ['CO', 'C', 'H2O2', null],
  ])('%s from %s and %s', (parent, a, b, bond) => {
    expect(bondBetween(parent, a, b)).toBe(bond);
  });

  it('stays correct when its memory is emptied', () => {
    for (let i = 1; i < 600; i += 1) bondBetween(`C${i}H`, `C${i}`, 'H');
    expect(bondBetween('NH3', 'NH2', 'H')).toBe('N-H');
  });
});
