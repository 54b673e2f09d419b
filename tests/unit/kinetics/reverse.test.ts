import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { reverseCalculator } from '#shared/calculators/reverse.ts';
import { rateAt } from '#shared/kinetics/arrhenius.ts';
import { R } from '#shared/kinetics/constants.ts';
import { reverseRateConstant, reverseStep, stepEquilibrium, type ReverseStepInput } from '#shared/kinetics/reverse.ts';
import { checkConsistency, cycleClosure, enthalpyFromBarriers, internalEnergy, type ConsistencyInput } from '#shared/kinetics/thermo-consistency.ts';
import { expectClose, faultOf, referenceCases } from './reference.ts';

const cases = referenceCases('thermo_consistency');
const of = (kind: string) => cases.filter((item) => item.kind === kind);

describe('thermodynamic consistency, reference cases', () => {
  it('covers every case of the file', () => {
    const kinds = ['reverse_barrier', 'enthalpy_from_barriers', 'consistency_check', 'reverse_rate_constant', 'desorption_from_adsorption', 'cycle_closure', 'gas_adsorption_reverse_barrier'];
    expect(kinds.flatMap(of)).toHaveLength(cases.length);
  });

  it.each(of('reverse_barrier'))('$id reverse energy', ({ input, expected }) => {
    const result = reverseStep({ energyForwardKJPerMol: Number(input.Ea_fwd_kJ_mol), reactionEnthalpyKJPerMol: Number(input.dH_kJ_mol) });
    expectClose(result.energyReverseKJPerMol, expected.Ea_rev_kJ_mol as number, 1e-11);
    // A reverse energy below 0 and a forward one below the reaction enthalpy are one and the same.
    expect(result.warnings.some(({ code }) => code === 'negative-energy')).toBe(expected.reverse_negative);
    expect(result.warnings.some(({ code }) => code === 'negative-energy')).toBe(expected.forward_below_dH);
  });

  it.each(of('enthalpy_from_barriers'))('$id enthalpy', ({ input, expected }) => {
    expectClose(enthalpyFromBarriers({ energyForwardKJPerMol: Number(input.Ea_fwd_kJ_mol), energyReverseKJPerMol: Number(input.Ea_rev_kJ_mol) }), expected.dH_kJ_mol as number, 1e-11);
  });

  it.each(of('consistency_check'))('$id forward, reverse and enthalpy', ({ input, expected }) => {
    const result = checkConsistency({
      energyForwardKJPerMol: Number(input.Ea_fwd_kJ_mol), energyReverseKJPerMol: Number(input.Ea_rev_kJ_mol), reactionEnthalpyKJPerMol: Number(input.dH_kJ_mol),
      uEnergyForwardKJPerMol: Number(input.u_fwd), uEnergyReverseKJPerMol: Number(input.u_rev), uReactionEnthalpyKJPerMol: Number(input.u_dH),
    });
    expectClose(result.closureErrorKJPerMol, expected.closure_error_kJ_mol as number, 1e-11);
    expectClose(result.uClosureKJPerMol, expected.u_closure_kJ_mol as number, 1e-11);
    expectClose(result.normalizedError, expected.E_n as number, 1e-11);
    expect(result.consistent).toBe(expected.consistent_at_k2);
  });

  it.each(of('reverse_rate_constant'))('$id reverse rate constant', ({ input, expected }) => {
    const thermodynamics = { reactionEnthalpyKJPerMol: Number(input.dH_J_mol) / 1000, reactionEntropyJPerMolK: Number(input.dS_J_mol_K) };
    const temperatureK = Number(input.T_K);
    const result = reverseStep({ energyForwardKJPerMol: Number(input.Ea_fwd_J_mol) / 1000, preExponentialForward: Number(input.A_fwd), temperatureK, ...thermodynamics });
    expectClose(result.kForward, expected.k_fwd as number, 1e-11);
    expectClose(result.equilibriumConstant, expected.K as number, 1e-11);
    expectClose(result.kReverse, expected.k_rev as number, 1e-11);
    expectClose(result.lnKReverse, expected.ln_k_rev as number, 1e-11);
    expectClose(result.preExponentialReverse, expected.A_rev as number, 1e-11);
    expectClose(result.energyReverseKJPerMol * 1000, expected.Ea_rev_J_mol as number, 1e-11);
    expectClose((result.gibbsKJPerMol ?? NaN) * 1000, expected.dG_J_mol as number, 1e-11);
    const direct = reverseRateConstant({ ...thermodynamics, temperatureK, kForward: expected.k_fwd as number });
    expectClose(direct.kReverse, expected.k_rev as number, 1e-11);
  });

  it.each(of('desorption_from_adsorption'))('$id desorption', ({ input, expected }) => {
    const thermodynamics = { reactionEnthalpyKJPerMol: Number(input.dH_ads_J_mol) / 1000, reactionEntropyJPerMolK: Number(input.dS_ads_J_mol_K_at_1bar), gasMoleChange: -1 };
    const temperatureK = Number(input.T_K);
    const result = reverseRateConstant({ ...thermodynamics, temperatureK, kForward: Number(input['k_ads_Pa-1_s-1']) });
    expectClose(result.equilibriumConstant, expected.K0 as number, 1e-11);
    expectClose(result.rateRatio, expected['K_p_Pa-1'] as number, 1e-11);
    expectClose(result.kReverse, expected['k_des_s-1'] as number, 1e-11);
    // The same from Arrhenius parameters of the adsorption without activation.
    const step = reverseStep({ energyForwardKJPerMol: 0, preExponentialForward: Number(input['k_ads_Pa-1_s-1']), temperatureK, ...thermodynamics });
    expectClose(step.kReverse, expected['k_des_s-1'] as number, 1e-11);
  });

  it.each(of('cycle_closure'))('$id cycle', ({ input, expected }) => {
    const result = cycleClosure((input.dH_kJ_mol as unknown as string[]).map((text) => ({ enthalpyKJPerMol: Number(text) })));
    expectClose(result.sumKJPerMol, expected.sum_kJ_mol as number, 1e-11);
    expect(result.closedExactly).toBe(expected.closed_exactly);
  });

  it.each(of('gas_adsorption_reverse_barrier'))('$id adsorption on both bases', ({ input, expected }) => {
    const temperatureK = Number(input.T_K);
    const shared = { energyForwardKJPerMol: Number(input.Ea_ads_from_k_p_J_mol) / 1000, reactionEnthalpyKJPerMol: Number(input.dH_ads_J_mol) / 1000, gasMoleChange: -1, temperatureK };
    const pressure = reverseStep(shared);
    // k_c = k_p RT: the same adsorption on concentrations has n = 1.
    const concentration = reverseStep({ ...shared, exponentForward: 1, basis: 'concentration' });
    expectClose((concentration.localEnergyForwardKJPerMol ?? NaN) * 1000, expected.Ea_ads_from_k_c_J_mol as number, 1e-11);
    for (const result of [pressure, concentration]) expectClose((result.localEnergyReverseKJPerMol ?? NaN) * 1000, expected.Ea_des_J_mol as number, 1e-11);
    const difference = (concentration.localEnergyForwardKJPerMol ?? NaN) - (concentration.localEnergyReverseKJPerMol ?? NaN);
    expectClose(difference * 1000, expected.dU_ads_J_mol as number, 1e-11);
    expectClose(internalEnergy(shared) * 1000, expected.dU_ads_J_mol as number, 1e-11);
  });
});

const thermodynamics = fc.record({
  energyForwardKJPerMol: fc.double({ min: 0, max: 250, noNaN: true }), reactionEnthalpyKJPerMol: fc.double({ min: -200, max: 200, noNaN: true }), reactionEntropyJPerMolK: fc.double({ min: -200, max: 200, noNaN: true }),
  preExponentialForward: fc.double({ min: 1, max: 1e15, noNaN: true }), exponentForward: fc.constantFrom(-1, 0, 0.5, 2), gasMoleChange: fc.constantFrom(-2, -1, 0, 1), standardPressurePa: fc.constantFrom(1e5, 101325, 1),
  temperatureK: fc.double({ min: 200, max: 1500, noNaN: true }),
});

describe('the reverse step', () => {
  it('keeps detailed balance at every temperature, on both bases', () => {
    fc.assert(
      fc.property(thermodynamics, fc.double({ min: 200, max: 1500, noNaN: true }), fc.constantFrom('pressure' as const, 'concentration' as const), (input, otherK, basis) => {
        const { preExponentialReverse, exponentReverse, energyReverseKJPerMol } = reverseStep({ ...input, basis });
        for (const temperatureK of [input.temperatureK, otherK]) {
          const forward = rateAt({ preExponential: input.preExponentialForward, exponent: input.exponentForward, energyKJPerMol: input.energyForwardKJPerMol, temperatureK });
          const reverse = rateAt({ preExponential: preExponentialReverse as number, exponent: exponentReverse, energyKJPerMol: energyReverseKJPerMol, temperatureK });
          // K° of activities, K_p = K° (p°)^Δν, K_c = K_p/(RT)^Δν.
          const lnK0 = input.reactionEntropyJPerMolK / R - (input.reactionEnthalpyKJPerMol * 1000) / (R * temperatureK);
          const unit = basis === 'pressure' ? input.standardPressurePa : input.standardPressurePa / (R * temperatureK);
          expect(Math.abs(forward.lnK - reverse.lnK - lnK0 - input.gasMoleChange * Math.log(unit))).toBeLessThan(1e-9);
        }
      }),
    );
  });

  it('differs by ΔH° on pressures and by ΔH° - ΔνRT on concentrations, in local energies', () => {
    fc.assert(
      fc.property(thermodynamics, (input) => {
        const difference = (basis: 'pressure' | 'concentration'): number => {
          const { localEnergyForwardKJPerMol: forward = NaN, localEnergyReverseKJPerMol: reverse = NaN } = reverseStep({ ...input, basis });
          return forward - reverse;
        };
        expect(Math.abs(difference('pressure') - input.reactionEnthalpyKJPerMol)).toBeLessThan(1e-10);
        expect(Math.abs(difference('concentration') - input.reactionEnthalpyKJPerMol + (input.gasMoleChange * R * input.temperatureK) / 1000)).toBeLessThan(1e-10);
      }),
    );
  });

  it('reversed twice is the forward step again', () => {
    fc.assert(
      fc.property(thermodynamics, fc.constantFrom('pressure' as const, 'concentration' as const), (input, basis) => {
        const once = reverseStep({ ...input, basis });
        const twice = reverseStep({
          ...input, basis, energyForwardKJPerMol: once.energyReverseKJPerMol, exponentForward: once.exponentReverse, preExponentialForward: once.preExponentialReverse,
          reactionEnthalpyKJPerMol: -input.reactionEnthalpyKJPerMol, reactionEntropyJPerMolK: -input.reactionEntropyJPerMolK, gasMoleChange: -input.gasMoleChange,
        });
        expectClose(twice.preExponentialReverse, input.preExponentialForward, 1e-11);
        expectClose(twice.kReverse, once.kForward as number, 1e-9);
        expect(twice.exponentReverse).toBe(input.exponentForward);
      }),
    );
  });

  it('answers A_f/A_r = (p°)^Δν exp(ΔS°/R), at 1 bar unless said', () => {
    const input = { energyForwardKJPerMol: 0, reactionEnthalpyKJPerMol: -100, preExponentialForward: 2.5, reactionEntropyJPerMolK: -120, gasMoleChange: -1 };
    const ratio = (extra: Partial<ReverseStepInput>): number => 2.5 / (reverseStep({ ...input, ...extra }).preExponentialReverse as number);
    expectClose(ratio({}), 1e-5 * Math.exp(-120 / R), 1e-13);
    expectClose(ratio({ standardPressurePa: 101325 }), Math.exp(-120 / R) / 101325, 1e-13);
    // On concentrations with another T0: A_f/A_r = (p°/RT0)^Δν exp(ΔS°/R).
    expectClose(ratio({ basis: 'concentration', referenceTemperatureK: 300 }), Math.exp(-120 / R) / (1e5 / (R * 300)), 1e-13);
  });

  it.each([
    ['energy alone', {}, ['energyReverseKJPerMol', 'exponentReverse'], []],
    ['with T', { temperatureK: 500 }, ['energyReverseKJPerMol', 'exponentReverse', 'localEnergyForwardKJPerMol', 'localEnergyReverseKJPerMol'], []],
    ['with A, without the entropy', { temperatureK: 500, preExponentialForward: 1e13 }, ['energyReverseKJPerMol', 'exponentReverse', 'localEnergyForwardKJPerMol', 'localEnergyReverseKJPerMol'], ['no-entropy']],
    ['with the entropy, without A', { temperatureK: 500, reactionEntropyJPerMolK: 10 }, ['energyReverseKJPerMol', 'equilibriumConstant', 'exponentReverse', 'gibbsKJPerMol', 'lnEquilibriumConstant', 'localEnergyForwardKJPerMol', 'localEnergyReverseKJPerMol'], []],
    ['with A and the entropy, without T', { preExponentialForward: 1e13, reactionEntropyJPerMolK: 10 }, ['energyReverseKJPerMol', 'exponentReverse', 'lnPreExponentialReverse', 'preExponentialReverse'], []],
    ['with a forward energy under the enthalpy', { reactionEnthalpyKJPerMol: 90 }, ['energyReverseKJPerMol', 'exponentReverse'], ['negative-energy']],
  ] as [string, Partial<ReverseStepInput>, string[], string[]][])('leaves out what it cannot know: %s', (_, extra, names, codes) => {
    const { warnings, derivation, ...rest } = reverseStep({ energyForwardKJPerMol: 80, reactionEnthalpyKJPerMol: 20, ...extra });
    expect(Object.keys(rest).sort()).toEqual(names);
    expect(warnings.map(({ code }) => code)).toEqual(codes);
    expect(derivation[0]?.from).toBe('80 kJ/mol');
  });

  it('holds on to logarithms outside double range', () => {
    const tiny = reverseStep({ energyForwardKJPerMol: 500, reactionEnthalpyKJPerMol: -9000, preExponentialForward: 1e13, reactionEntropyJPerMolK: 0, temperatureK: 100 });
    expect([tiny.kReverse, tiny.equilibriumConstant]).toEqual([0, Infinity]);
    expectClose(tiny.lnKReverse, Math.log(1e13) - (9500 * 1000) / (R * 100), 1e-12);
    const far = reverseStep({ energyForwardKJPerMol: 500, reactionEnthalpyKJPerMol: 20, preExponentialForward: 1e13, reactionEntropyJPerMolK: -7000, temperatureK: 150 });
    expect(far.preExponentialReverse).toBe(Infinity);
    expectClose(far.kReverse, Math.exp(Math.log(1e13) + 7000 / R - 480000 / (R * 150)), 1e-9);
  });

  it('writes a derivation that ends at the figures', () => {
    const result = reverseStep({ energyForwardKJPerMol: 0, reactionEnthalpyKJPerMol: -100, preExponentialForward: 2.5, reactionEntropyJPerMolK: -120, gasMoleChange: -1, temperatureK: 500, basis: 'concentration', exponentForward: 0.5 });
    expect(result.derivation.map(({ to }) => parseFloat(to))).toEqual([100, -0.5, result.preExponentialReverse, result.kReverse]);
    expect(result.derivation[2]?.operation).toContain('p° = 100000 Pa, gas as concentrations, T0 = 1 K');
    expect(result.derivation[3]?.operation).toContain('n = -0.5, T0 = 1 K');
  });
});

describe('consistency', () => {
  const triple: ConsistencyInput = { energyForwardKJPerMol: 50, energyReverseKJPerMol: 10, reactionEnthalpyKJPerMol: 30 };
  it.each([
    ['without uncertainties nothing is said', triple, null, null, null],
    ['one missing uncertainty is not 0', { ...triple, uEnergyForwardKJPerMol: 5, uEnergyReverseKJPerMol: 5 }, null, null, null],
    ['exact agreement needs none', { ...triple, reactionEnthalpyKJPerMol: 40 }, null, null, true],
    ['all uncertainties 0', { ...triple, uEnergyForwardKJPerMol: 0, uEnergyReverseKJPerMol: 0, uReactionEnthalpyKJPerMol: 0 }, 0, null, false],
    ['on the limit', { ...triple, uEnergyForwardKJPerMol: 3, uEnergyReverseKJPerMol: 4, uReactionEnthalpyKJPerMol: 0 }, 5, 1, true],
    ['beyond it', { ...triple, uEnergyForwardKJPerMol: 3, uEnergyReverseKJPerMol: 3.9, uReactionEnthalpyKJPerMol: 0 }, Math.hypot(3, 3.9), 10 / (2 * Math.hypot(3, 3.9)), false],
  ] as [string, ConsistencyInput, number | null, number | null, boolean | null][])('%s', (_, input, u, normalized, consistent) => {
    const result = checkConsistency(input);
    expect([result.uClosureKJPerMol, result.normalizedError, result.consistent]).toEqual([u, normalized, consistent]);
    expect(result.derivation).toHaveLength(normalized === null ? 1 : 2);
  });

  it('compares with ΔH° - ΔνRT on concentrations', () => {
    const RT = (R * 700) / 1000;
    const adsorption = { energyForwardKJPerMol: RT, energyReverseKJPerMol: 45, basis: 'concentration' as const, gasMoleChange: -1, temperatureK: 700 };
    const result = checkConsistency({ ...adsorption, reactionEnthalpyKJPerMol: -45 });
    expect([result.closureErrorKJPerMol, result.consistent]).toEqual([0, true]);
    expect(result.derivation[0]?.operation).toContain('ΔH° - ΔνRT');
    expectClose(enthalpyFromBarriers(adsorption), -45, 1e-13);
    expectClose(checkConsistency({ ...adsorption, basis: 'pressure', reactionEnthalpyKJPerMol: -45 }).closureErrorKJPerMol, RT, 1e-12);
    expect(checkConsistency({ ...triple, basis: 'concentration' }).closureErrorKJPerMol).toBe(10);
  });

  it('sums a cycle with its uncertainty', () => {
    expect(cycleClosure([{ enthalpyKJPerMol: 10, u: 3 }, { enthalpyKJPerMol: -4, u: 4 }])).toMatchObject({ sumKJPerMol: 6, closedExactly: false, uSumKJPerMol: 5, normalizedError: 0.6 });
    expect(cycleClosure([{ enthalpyKJPerMol: 10, u: 3 }, { enthalpyKJPerMol: -4 }])).toMatchObject({ uSumKJPerMol: null, normalizedError: null });
    expect(cycleClosure([{ enthalpyKJPerMol: 10, u: 0 }, { enthalpyKJPerMol: -4, u: 0 }])).toMatchObject({ uSumKJPerMol: 0, normalizedError: null });
  });
});

describe('what is refused', () => {
  const base = { energyForwardKJPerMol: 80, reactionEnthalpyKJPerMol: 20, reactionEntropyJPerMolK: 5, preExponentialForward: 1e13 };
  it.each([
    [() => reverseStep({ ...base, energyForwardKJPerMol: NaN }), 'energyForwardKJPerMol', 'not-finite'],
    [() => reverseStep({ ...base, reactionEnthalpyKJPerMol: Infinity }), 'reactionEnthalpyKJPerMol', 'not-finite'],
    [() => reverseStep({ ...base, preExponentialForward: 0 }), 'preExponentialForward', 'out-of-range'],
    [() => reverseStep({ ...base, reactionEntropyJPerMolK: NaN }), 'reactionEntropyJPerMolK', 'not-finite'],
    [() => reverseStep({ ...base, standardPressurePa: 0 }), 'standardPressurePa', 'out-of-range'],
    [() => reverseStep({ ...base, temperatureK: -5 }), 'temperatureK', 'out-of-range'],
    [() => reverseStep({ ...base, referenceTemperatureK: 0 }), 'referenceTemperatureK', 'out-of-range'],
    [() => reverseStep({ ...base, exponentForward: NaN }), 'exponentForward', 'not-finite'],
    [() => reverseStep({ ...base, gasMoleChange: NaN }), 'gasMoleChange', 'not-finite'],
    [() => stepEquilibrium(base, 0), 'temperatureK', 'out-of-range'],
    [() => reverseRateConstant({ ...base, kForward: 0, temperatureK: 300 }), 'kForward', 'out-of-range'],
    [() => checkConsistency({ energyForwardKJPerMol: 1, energyReverseKJPerMol: 1, reactionEnthalpyKJPerMol: 0, uEnergyReverseKJPerMol: -1 }), 'uEnergyReverseKJPerMol', 'out-of-range'],
    [() => checkConsistency({ energyForwardKJPerMol: 1, energyReverseKJPerMol: 1, reactionEnthalpyKJPerMol: 0, basis: 'concentration', gasMoleChange: 1 }), 'temperatureK', 'missing-input'],
    [() => cycleClosure([]), 'steps', 'missing-input'],
    [() => cycleClosure([{ enthalpyKJPerMol: 1 }, { enthalpyKJPerMol: NaN }]), 'steps.1.enthalpyKJPerMol', 'not-finite'],
    [() => cycleClosure([{ enthalpyKJPerMol: 1, u: -1 }]), 'steps.0.u', 'out-of-range'],
  ])('%s', (action, path, code) => expect(faultOf(action)).toEqual([path, code]));
});

describe('the calculator', () => {
  const run = (input: unknown): Record<string, unknown> => {
    const calculation = runCalculator(reverseCalculator, input);
    return 'result' in calculation ? calculation.result : { faults: calculation.faults.map(({ path }) => path) };
  };
  const full = { energyForwardKJPerMol: 120, reactionEnthalpyKJPerMol: 95, preExponentialForward: 1e15, reactionEntropyJPerMolK: -140, temperatureK: 1200 };

  it('answers with what its output schema declares', () => {
    const result = run(full);
    expect(reverseCalculator.output.strict().parse(result)).toEqual(result);
    expectClose(result.kReverse as number, 1.6768970383562768e21, 1e-11);
    expect(run({ energyForwardKJPerMol: 120, reactionEnthalpyKJPerMol: 95 })).toMatchObject({ energyReverseKJPerMol: 25, warnings: [] });
  });

  it('gives null, and the logarithm, for what double precision cannot hold', () => {
    expect(run({ ...full, reactionEnthalpyKJPerMol: -9000, temperatureK: 100 })).toMatchObject({ kReverse: null, equilibriumConstant: null, lnKReverse: expect.any(Number) });
  });

  it.each([
    [{ ...full, temperatureK: 0 }, 'temperatureK'],
    [{ ...full, basis: 'mass' }, 'basis'],
    [{ energyForwardKJPerMol: 1 }, 'reactionEnthalpyKJPerMol'],
    [{ ...full, standardPressurePa: -1 }, 'standardPressurePa'],
  ])('refuses %j', (input, path) => expect(run(input)).toEqual({ faults: [path] }));
});
