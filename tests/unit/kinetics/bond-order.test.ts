import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bondOrderCalculator } from '#shared/calculators/bond-order.ts';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { bondOrderBarrier, type BondOrderDissociation, type BondOrderExchange, type BondOrderInput } from '#shared/kinetics/bond-order.ts';
import { convertEnergy } from '#shared/kinetics/energy.ts';
import { atomicHeat, atopHeat, dicoordinatedMolecularHeat, intermediateMolecularHeat, strongMolecularHeat, weakMolecularHeat } from '#shared/kinetics/heat-of-adsorption.ts';
import { expectClose, faultOf, referenceCases, type ReferenceCase } from './reference.ts';

const cases = referenceCases('bocmp');
const of = (kind: string) => cases.filter((item) => item.kind === kind);
const expectedOf = (item: ReferenceCase) => item.expected as Record<string, number>;

/** Within 1e-11 of a figure, or of the sum of terms where the figure is 0. */
function expectNear(actual: number, expected: number | undefined): void {
  expect(Math.abs(actual - (expected as number)), `${actual} against ${expected}`).toBeLessThanOrEqual(1e-11 * Math.max(Math.abs(expected as number), 1));
}

function dissociation({ input }: ReferenceCase, other: Partial<BondOrderDissociation> = {}): BondOrderDissociation {
  return {
    form: 'early', process: 'dissociation', from: 'adsorbed', dissociationEnergy: Number(input.D_AB), heatA: Number(input.Q_A), heatB: Number(input.Q_B), heatAB: Number(input.Q_AB),
    unit: input.unit as string, ...other,
  };
}

describe('heats of adsorption, reference cases', () => {
  it.each(of('atomic_heat'))('$id', (item) => {
    expectClose(atomicHeat({ atopHeat: Number(item.input.Q0A), coordination: Number(item.input.n) }), expectedOf(item).Q_A as number, 1e-11);
  });

  it.each(of('atomic_heat_inverse'))('$id', (item) => {
    expectClose(atopHeat({ heat: Number(item.input.Q_A), coordination: Number(item.input.n) }), expectedOf(item).Q0A as number, 1e-11);
  });

  it.each(of('molecular_heat'))('$id', (item) => {
    const molecule = { atopHeat: Number(item.input.Q0A), coordination: Number(item.input.n), bondEnergy: Number(item.input.D_AB) };
    expectClose(weakMolecularHeat(molecule), expectedOf(item).Q_AB_weak as number, 1e-11);
    expectClose(strongMolecularHeat(molecule), expectedOf(item).Q_AB_strong as number, 1e-11);
    expectClose(intermediateMolecularHeat(molecule), expectedOf(item).Q_AB_intermediate_mean as number, 1e-11);
  });

  it.each(of('molecular_heat_dicoordinated'))('$id', (item) => {
    const heat = dicoordinatedMolecularHeat({ atopHeatA: Number(item.input.Q0A), atopHeatB: Number(item.input.Q0B), bondEnergy: Number(item.input.D_AB) });
    expectClose(heat, expectedOf(item).Q_AB as number, 1e-11);
  });

  it('binds a homonuclear molecule through both ends by 4.5 Q0²/(3 Q0 + 8 D)', () => {
    // a = b = 3 Q0/4, so Q_AB = 2a²/(a + 2D): the limit of equal ends.
    expectClose(dicoordinatedMolecularHeat({ atopHeatA: 80, atopHeatB: 80, bondEnergy: 119 }), (4.5 * 80 * 80) / (3 * 80 + 8 * 119), 1e-14);
  });

  it.each([
    [() => atomicHeat({ atopHeat: 0, coordination: 1 }), 'atopHeat', 'out-of-range'],
    [() => atomicHeat({ atopHeat: 10, coordination: 0 }), 'coordination', 'out-of-range'],
    [() => atomicHeat({ atopHeat: 10, coordination: 1.5 }), 'coordination', 'out-of-range'],
    [() => atomicHeat({ atopHeat: 10, coordination: NaN }), 'coordination', 'not-finite'],
    [() => atopHeat({ heat: -1, coordination: 3 }), 'heat', 'out-of-range'],
    [() => weakMolecularHeat({ atopHeat: 10, coordination: 3, bondEnergy: 0 }), 'bondEnergy', 'out-of-range'],
    [() => strongMolecularHeat({ atopHeat: Infinity, coordination: 3, bondEnergy: 5 }), 'atopHeat', 'not-finite'],
    [() => dicoordinatedMolecularHeat({ atopHeatA: 10, atopHeatB: 0, bondEnergy: 5 }), 'atopHeatB', 'out-of-range'],
  ])('refuses %s', (action, path, code) => expect(faultOf(action)).toEqual([path, code]));
});

describe('barriers, reference cases', () => {
  it('covers every case of the file', () => {
    const kinds = ['atomic_heat', 'atomic_heat_inverse', 'molecular_heat', 'molecular_heat_dicoordinated', 'bocmp_dissociation', 'bocmp_recombination', 'ubiqep_dissociation'];
    expect(kinds.flatMap(of)).toHaveLength(cases.length);
  });

  it.each(of('bocmp_dissociation'))('$id early form', (item) => {
    const expected = expectedOf(item);
    const gas = bondOrderBarrier(dissociation(item, { from: 'gas', heatAB: undefined }));
    const adsorbed = bondOrderBarrier(dissociation(item));
    expectNear(gas.unboundedBarrier, expected.E_gas);
    expectNear(gas.barrier, expected.E_gas_clamped_at_0);
    expectNear(gas.reactionEnergy, expected.dH_gas_to_adsorbed_atoms);
    expectNear(adsorbed.unboundedBarrier, expected.E_adsorbed);
    expectNear(adsorbed.barrier, expected.E_adsorbed_clamped_at_0);
    expectNear(adsorbed.reactionEnergy, expected.dH_adsorbed_to_adsorbed_atoms);
    expect(gas.unit).toBe('kcal/mol');
  });

  it.each(of('bocmp_recombination'))('$id reverse of the early form', (item) => {
    const expected = expectedOf(item);
    const gas = bondOrderBarrier(dissociation(item, { from: 'gas' }));
    const adsorbed = bondOrderBarrier(dissociation(item));
    expectNear(gas.unboundedReverseBarrier, expected.E_recombination_to_gas_unclamped);
    expectNear(gas.unboundedReverseBarrier, expected.equals_QAQB_over_sum);
    expectNear(adsorbed.unboundedReverseBarrier, expected.E_recombination_to_adsorbed_unclamped);
    expectNear(gas.reverseBarrier, expected.E_recombination_to_gas_with_E_gas_clamped);
    expectNear(adsorbed.reverseBarrier, expected.E_recombination_to_adsorbed_with_E_ads_clamped);
  });

  it.each(of('ubiqep_dissociation'))('$id interpolated form', (item) => {
    const expected = expectedOf(item);
    const later = { form: 'interpolated', interpolation: Number(item.input.phi) } as const;
    const gas = bondOrderBarrier(dissociation(item, { ...later, from: 'gas' }));
    const adsorbed = bondOrderBarrier(dissociation(item, later));
    expectNear(adsorbed.unboundedBarrier, expected.E_adsorbed);
    expectNear(adsorbed.unboundedReverseBarrier, expected.E_reverse_from_adsorbed_atoms_to_adsorbed_AB);
    expectNear(adsorbed.reactionEnergy, expected.dH_adsorbed);
    expectNear(gas.unboundedBarrier, expected.E_gas);
    // The variant that leaves Q_AB out is the same formula for a molecule that is not held at all.
    expectNear(bondOrderBarrier(dissociation(item, { ...later, from: 'gas', heatAB: 0 })).unboundedBarrier, expected.E_gas_memory_variant_QAB_omitted);
  });
});

describe('known figures of the method', () => {
  // The heats, and about 67 and 100 kcal/mol for CO* + * → C* + O*, are from memory, as given for the method by its author; not checked against the text.
  // Both come out in the early form from the adsorbed molecule, E = D + Q_CO - Q_C - Q_O + Q_C Q_O/(Q_C + Q_O), and no bound acts:
  // on Ni the reaction energy is -2 kcal/mol, on Pd +44 kcal/mol, each below the barrier.
  it.each([
    ['Ni(111)', 171, 115, 27, 67, -2, 257 + 27 - 171 - 115 + (171 * 115) / (171 + 115)],
    ['Pd(111)', 160, 87, 34, 100, 44, 257 + 34 - 160 - 87 + (160 * 87) / (160 + 87)],
  ])('direct CO cleavage on %s', (_, heatA, heatB, heatAB, published, reactionEnergy, exact) => {
    const result = bondOrderBarrier({ form: 'early', process: 'dissociation', dissociationEnergy: 257, heatA, heatB, heatAB, from: 'adsorbed', unit: 'kcal/mol' });
    expect(Math.round(result.barrier)).toBe(published);
    expectClose(result.barrier, exact, 1e-14);
    expect([result.reactionEnergy, result.bound]).toEqual([reactionEnergy, 'none']);
  });
});

const heats = fc.record({
  dissociationEnergy: fc.double({ min: 1, max: 300, noNaN: true }), heatA: fc.double({ min: 1, max: 200, noNaN: true }), heatB: fc.double({ min: 1, max: 200, noNaN: true }),
  heatAB: fc.double({ min: 0, max: 80, noNaN: true }), interpolation: fc.double({ min: 0, max: 1, noNaN: true }), form: fc.constantFrom('early' as const, 'interpolated' as const),
});
const exchanges = fc.record({ formedBondEnergy: fc.double({ min: 1, max: 300, noNaN: true }), heatC: fc.double({ min: 0, max: 200, noNaN: true }) });

describe('bounds, cycle and exchange', () => {
  it('is never below 0 or the reaction energy, forwards and backwards, in every form and process', () => {
    fc.assert(
      fc.property(heats, exchanges, fc.constantFrom('gas' as const, 'adsorbed' as const), (some, other, from) => {
        for (const input of [{ ...some, process: 'dissociation', from, unit: 'kJ/mol' }, { ...some, ...other, process: 'exchange', from, unit: 'kJ/mol' }] as BondOrderInput[]) {
          const { barrier, reverseBarrier, reactionEnergy, unboundedBarrier, bound } = bondOrderBarrier(input);
          expect(barrier).toBe(Math.max(0, reactionEnergy, unboundedBarrier));
          expect(reverseBarrier).toBeGreaterThanOrEqual(0);
          expect(reverseBarrier).toBe(barrier - reactionEnergy);
          expect(bound === 'none').toBe(barrier === unboundedBarrier);
        }
      }),
    );
  });

  it.each([
    ['zero', { form: 'early', process: 'dissociation', dissociationEnergy: 119, heatA: 115, heatB: 115, from: 'gas', unit: 'kcal/mol' }],
    ['reaction-energy', { form: 'interpolated', process: 'dissociation', dissociationEnergy: 257, heatA: 110, heatB: 80, heatAB: 6, from: 'adsorbed', unit: 'kcal/mol' }],
    ['none', { form: 'early', process: 'dissociation', dissociationEnergy: 257, heatA: 171, heatB: 115, heatAB: 27, from: 'adsorbed', unit: 'kcal/mol' }],
  ] as [string, BondOrderDissociation][])('says that the bound is %s', (bound, input) => {
    const result = bondOrderBarrier(input);
    expect(result.bound).toBe(bound);
    expect(result.derivation).toHaveLength(bound === 'none' ? 3 : 4);
    expect(result.derivation.at(-1)?.from).toBe(`${result.barrier} kcal/mol`);
  });

  // NH3* + O* → NH2* + OH*, invented heats: ΔH = 104 - 102 + 20 + 90 - 63 - 60 = -11, P = 63·60/123.
  const exchange: BondOrderExchange = { form: 'early', process: 'exchange', dissociationEnergy: 104, formedBondEnergy: 102, heatA: 63, heatBC: 60, heatC: 90, heatAB: 20, from: 'adsorbed', unit: 'kcal/mol' };
  const product = (63 * 60) / 123;

  it.each([
    ['early, adsorbed', {}, -11, -11 + product],
    ['early, gas', { from: 'gas' }, -31, -31 + product],
    ['early, gas, without the heat of the molecule', { from: 'gas', heatAB: undefined }, -31, -31 + product],
    ['interpolated, adsorbed', { form: 'interpolated' }, -11, 0.5 * (-11 + product)],
    ['interpolated, gas', { form: 'interpolated', from: 'gas' }, -31, 0.5 * (-11 + product) - 20],
    ['interpolated, φ 0.7', { form: 'interpolated', interpolation: 0.7 }, -11, 0.7 * (-11 + product)],
  ] as [string, Partial<BondOrderExchange>, number, number][])('exchanges a group: %s', (_, other, reactionEnergy, unbounded) => {
    const result = bondOrderBarrier({ ...exchange, ...other });
    expectNear(result.reactionEnergy, reactionEnergy);
    expectNear(result.unboundedBarrier, unbounded);
  });

  it('reads heatB as the heat of BC where heatBC is absent, and says so', () => {
    const { heatBC, ...rest } = exchange;
    const read = bondOrderBarrier({ ...rest, heatB: heatBC });
    expect(read.barrier).toBe(bondOrderBarrier(exchange).barrier);
    expect(read.derivation[0]?.assumption).toContain('heatB is the heat of adsorption of BC');
    const both = bondOrderBarrier({ ...exchange, heatB: 115 });
    expect(both.barrier).toBe(read.barrier);
    expect(both.derivation[0]?.assumption).toContain('heatB, of the atom or group alone, does not enter');
    expect(bondOrderBarrier(exchange).derivation[0]?.assumption).toContain('recalled from memory');
  });

  it('marks the interpolated form as recalled, the early one not', () => {
    const lines = (form: 'early' | 'interpolated') => bondOrderBarrier({ ...exchange, form }).derivation.map(({ reference }) => reference).join(' ');
    expect(lines('interpolated')).toContain('recalled from memory');
    expect(lines('early')).not.toContain('recalled');
  });

  it.each(['kJ/mol', 'eV'])('gives the same barrier in %s', (unit) => {
    const to = (value: number): number => convertEnergy({ value, from: 'kcal/mol', to: unit }).value;
    const other = bondOrderBarrier({ ...exchange, dissociationEnergy: to(104), formedBondEnergy: to(102), heatA: to(63), heatBC: to(60), heatC: to(90), heatAB: to(20), unit });
    expect(other.unit).toBe(unit);
    expectClose(other.barrier, to(bondOrderBarrier(exchange).barrier), 1e-12);
  });
});

describe('what the estimate refuses', () => {
  const plain: BondOrderDissociation = { form: 'early', process: 'dissociation', dissociationEnergy: 226, heatA: 135, heatB: 135, heatAB: 11, from: 'adsorbed', unit: 'kcal/mol' };
  const swap: BondOrderExchange = { ...plain, process: 'exchange', formedBondEnergy: 100, heatBC: 60, heatC: 90 };
  it.each([
    [{ ...plain, heatAB: undefined }, 'heatAB', 'missing-input'],
    [{ ...plain, heatAB: undefined, form: 'interpolated', from: 'gas' }, 'heatAB', 'missing-input'],
    [{ ...plain, heatAB: -1 }, 'heatAB', 'out-of-range'],
    [{ ...plain, heatA: 0 }, 'heatA', 'out-of-range'],
    [{ ...plain, heatB: -5 }, 'heatB', 'out-of-range'],
    [{ ...plain, dissociationEnergy: NaN }, 'dissociationEnergy', 'not-finite'],
    [{ ...plain, interpolation: 1.1 }, 'interpolation', 'out-of-range'],
    [{ ...plain, unit: 's-1' }, 'unit', 'incompatible-units'],
    [{ ...plain, unit: 'furlong' }, 'unit', 'unknown-unit'],
    [{ ...swap, heatBC: undefined, heatB: undefined }, 'heatBC', 'missing-input'],
    [{ ...swap, heatBC: 0 }, 'heatBC', 'out-of-range'],
    [{ ...swap, heatBC: undefined, heatB: 0 }, 'heatB', 'out-of-range'],
    [{ ...swap, formedBondEnergy: 0 }, 'formedBondEnergy', 'out-of-range'],
    [{ ...swap, heatC: -1 }, 'heatC', 'out-of-range'],
  ] as [BondOrderInput, string, string][])('%j', (input, path, code) => {
    expect(faultOf(() => bondOrderBarrier(input))).toEqual([path, code]);
  });
});

describe('the calculator', () => {
  const plain = { form: 'early', process: 'dissociation', dissociationEnergy: 226, heatA: 135, heatB: 135, heatAB: 11, from: 'adsorbed', unit: 'kcal/mol' };
  it('answers with what its output schema declares', () => {
    const calculation = runCalculator(bondOrderCalculator, plain);
    if (!('result' in calculation)) throw new Error(JSON.stringify(calculation));
    expect(bondOrderCalculator.output.strict().parse(calculation.result)).toEqual(calculation.result);
    expect(calculation.result).toMatchObject({ barrier: 34.5, reverseBarrier: 67.5, reactionEnergy: -33, unit: 'kcal/mol' });
  });

  it.each([
    [{ ...plain, heatAB: undefined }, 'heatAB'],
    [{ ...plain, formedBondEnergy: 100 }, ''],
    [{ ...plain, process: 'exchange', formedBondEnergy: 100 }, 'heatC'],
    [{ ...plain, process: 'exchange', heatC: 100 }, 'formedBondEnergy'],
    [{ ...plain, process: 'wishing' }, 'process'],
    [{ ...plain, from: 'liquid' }, 'from'],
  ])('refuses %j', (input, path) => {
    const calculation = runCalculator(bondOrderCalculator, input);
    expect('faults' in calculation ? calculation.faults.map((fault) => fault.path) : []).toEqual([path]);
  });
});
