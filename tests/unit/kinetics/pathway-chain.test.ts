import { describe, expect, it } from 'vitest';
import { pathwayBalance, type BalanceStep, type BalanceTerm } from '#shared/kinetics/pathway-balance.ts';
import { chainFaults, type ChainedStep } from '#shared/kinetics/pathway-reference.ts';

describe('chaining of energies', () => {
  const on = (endStateReference: ChainedStep['endStateReference'], more: Partial<ChainedStep> = {}): ChainedStep => ({ energyType: 'electronic', endStateReference, ...more });
  it.each<[string, ChainedStep[], [string, number][]]>([
    ['one step', [on('co-adsorbed')], []],
    ['isolated end states', [on('isolated'), on('isolated'), on('isolated')], []],
    ['end states in one cell', [on('co-adsorbed'), on('co-adsorbed')], [['pairing-energy-missing', 1]]],
    ['a pairing energy between them', [on('co-adsorbed'), on(null, { joins: true }), on('co-adsorbed')], []],
    ['gas and isolated', [on('gas'), on('isolated'), on('co-adsorbed')], [['reference-differs', 1], ['pairing-energy-missing', 2]]],
    ['an unknown reference', [on('isolated'), on(null), on('isolated')], [['reference-unknown', 1], ['reference-unknown', 2]]],
    ['two types', [on('isolated'), on('isolated', { energyType: 'gibbs' })], [['mixed-energy-types', 0]]],
    ['a type that is not known', [on('isolated'), on('isolated', { energyType: undefined })], [['energy-type-unknown', 0]]],
  ])('%s', (_, steps, expected) => {
    expect(chainFaults(steps).map(({ code, afterStep }) => [code, afterStep])).toEqual(expected);
  });

  it('says what to do', () => {
    expect(chainFaults([on('co-adsorbed'), on('isolated')])[0]?.message).toBe('between steps 1 and 2 end states are adsorbates together in one cell: add the pairing energy as a step of its own, without a barrier');
    expect(chainFaults([on('gas'), on('isolated')])[0]?.message).toContain('from the gas to isolated adsorbates');
  });
});

describe('balance of a pathway', () => {
  const terms = (text: string): BalanceTerm[] => text.split(' + ').map((part) => {
    const [, coefficient = '', name = ''] = /^([\d.]*) ?(.+)$/.exec(part) ?? [];
    return { name, coefficient: coefficient === '' ? 1 : Number(coefficient), surface: name.includes('*') };
  });
  const step = (text: string, times?: number): BalanceStep => {
    const [left = '', right = ''] = text.split(' -> ');
    return { reactants: terms(left), products: terms(right), times };
  };
  const decomposition = [step('NH3 + * -> NH3*', 2), step('NH3* + * -> NH2* + H*', 2), step('NH2* + * -> NH* + H*', 2), step('NH* + * -> N* + H*', 2), step('2 N* -> N2 + 2 *'), step('2 H* -> H2 + 2 *', 3)];

  it('closes the decomposition of ammonia with its stoichiometric numbers', () => {
    expect(pathwayBalance(decomposition)).toMatchObject({ equation: '2 NH3 -> N2 + 3 H2', closed: true });
  });
  it('shows the surface species that are left over without them', () => {
    const open = pathwayBalance(decomposition.map(({ reactants, products }) => ({ reactants, products })));
    expect(open.closed).toBe(false);
    expect(open.equation).toBe('NH3 + N* -> H* + N2 + H2');
  });
  it('knows halves, and a pathway that leads back to where it began', () => {
    expect(pathwayBalance([step('0.5 N2 + * -> N*')]).equation).toBe('0.5 N2 + * -> N*');
    expect(pathwayBalance([step('A* -> B*'), step('B* -> A*')])).toEqual({ reactants: [], products: [], closed: true, equation: 'nothing -> nothing' });
  });
  it.each<[string, BalanceStep[]]>([
    ['steps', []],
    ['steps.0.times', [step('A -> B', 0)]],
    ['steps.0.products.0.coefficient', [{ reactants: terms('A'), products: [{ name: 'B', coefficient: -1, surface: false }] }]],
  ])('refuses %s', (path, steps) => {
    expect(() => pathwayBalance(steps)).toThrow(expect.objectContaining({ path }));
  });
});
