import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeBasis, lnRateAt, rateAt, twoTemperature, uLnRateAt } from '#shared/kinetics/arrhenius.ts';
import { h, k_B, N_A, R } from '#shared/kinetics/constants.ts';
import { arrheniusToEyring, eyringToArrhenius, type StandardState } from '#shared/kinetics/eyring.ts';
import { expectClose, referenceCases } from './reference.ts';

const cases = referenceCases('arrhenius');
const of = (kind: string) => cases.filter((item) => item.kind === kind);

describe('Arrhenius form', () => {
  // IUPAC Gold Book, modified Arrhenius equation; mpmath 1.2.1 with 40 digits.
  it.each(of('k_of_T'))('$id k at $input.T_K K', ({ input, expected }) => {
    const result = rateAt({ preExponential: Number(input.A), exponent: Number(input.n), referenceTemperatureK: Number(input.Tref_K), energyKJPerMol: Number(input.Ea_J_mol) / 1000, temperatureK: Number(input.T_K) });
    expectClose(result.lnK, expected.ln_k as number, 1e-13);
    if (expected.k_outside_double_range === false) expectClose(result.k, expected.k as number, 1e-12);
    else expect(result.k === 0 || result.k === Infinity || result.k < 1e-307).toBe(true);
    const fast = lnRateAt(Math.log(Number(input.A)), Number(input.n), Math.log(Number(input.Tref_K)), Number(input.Ea_J_mol) / R, Number(input.T_K));
    expectClose(fast, expected.ln_k as number, 1e-13);
  });

  it.each(of('local_activation_energy'))('$id local energy', ({ input, expected }) => {
    const result = rateAt({ preExponential: Number(input.A), exponent: Number(input.n), referenceTemperatureK: Number(input.Tref_K), energyKJPerMol: Number(input.Ea_J_mol) / 1000, temperatureK: Number(input.T_K) });
    expectClose(result.localEnergyKJPerMol * 1000, expected.Ea_local_J_mol as number, 1e-12);
  });

  it.each(of('kBT_over_h_prefactor'))('$id with k_B T/h', ({ input, expected }) => {
    const T = Number(input.T_K);
    const result = rateAt({ preExponential: k_B / h, exponent: 1, energyKJPerMol: Number(input.E0_J_mol) / 1000, temperatureK: T });
    expectClose(result.lnK, expected.ln_k as number, 1e-13);
    expectClose(result.localEnergyKJPerMol * 1000, expected.Ea_local_J_mol as number, 1e-12);
  });

  it.each(of('two_temperature_inversion'))('$id two temperatures', ({ input, expected }) => {
    const result = twoTemperature({ k1: Number(input.k1), temperature1K: Number(input.T1_K), k2: Number(input.k2), temperature2K: Number(input.T2_K) });
    expectClose(result.energyKJPerMol * 1000, expected.Ea_J_mol as number, 1e-12);
    expectClose(result.lnPreExponential, expected.ln_A as number, 1e-12);
    expectClose(result.preExponential, expected.A as number, 1e-11);
  });

  // JCGM 100:2008 (GUM) 5.2.2; uncertainties 3.1.6 agrees.
  it.each(referenceCases('uncertainty').filter((item) => item.kind === 'k_from_correlated_lnA_Ea'))('$id uncertainty of ln k', ({ input, expected }) => {
    const result = rateAt({
      preExponential: Math.exp(Number(input.ln_A)), energyKJPerMol: Number(input.Ea_J_mol) / 1000, temperatureK: Number(input.T_K),
      uLnPreExponential: Number(input.u_ln_A), uEnergyKJPerMol: Number(input.u_Ea_J_mol) / 1000, correlation: Number(input.r_lnA_Ea),
    });
    expectClose(result.uLnK, expected.u_ln_k as number, 1e-11);
    expect(result.uLnKRange).toBeUndefined();
  });

  it('never takes a missing correlation as 0', () => {
    const base = { preExponential: 1e13, energyKJPerMol: 100, temperatureK: 500, uLnPreExponential: 2, uEnergyKJPerMol: 8 };
    const b = 8000 / (R * 500);
    expect(rateAt(base)).toMatchObject({ uLnK: null, uLnKRange: [Math.abs(2 - b), 2 + b] });
    expectClose(rateAt({ ...base, correlation: 0 }).uLnK, Math.hypot(2, b), 1e-14);
    expect(rateAt({ ...base, correlation: null }).uLnK).toBeNull();
  });

  it('needs both uncertainties', () => {
    const base = { preExponential: 1e13, energyKJPerMol: 100, temperatureK: 500 };
    expect(rateAt(base).uLnK).toBeNull();
    expect(rateAt({ ...base, uEnergyKJPerMol: 5 })).toMatchObject({ uLnK: null });
    expect(rateAt({ ...base, uEnergyKJPerMol: 5 }).uLnKRange).toBeUndefined();
    expectClose(rateAt({ ...base, uEnergyKJPerMol: 5, uLnPreExponential: 0 }).uLnK, 5000 / (R * 500), 1e-14);
    expect(rateAt({ ...base, uEnergyKJPerMol: 0, uLnPreExponential: 0.7 }).uLnK).toBe(0.7);
  });

  it('says which reference temperature it took', () => {
    expect(rateAt({ preExponential: 1, exponent: 1, energyKJPerMol: 0, temperatureK: 300 }).derivation[0]?.assumption).toContain('T0 = 1 K');
    expect(rateAt({ preExponential: 1, exponent: 1, referenceTemperatureK: 300, energyKJPerMol: 0, temperatureK: 300 }).derivation[0]?.assumption).toBeUndefined();
  });

  it.each([
    [{ temperatureK: -5 }, 'T must be above 0 K, got -5'],
    [{ temperatureK: 0 }, 'T must be above 0 K, got 0'],
    [{ preExponential: 0 }, 'A must be above 0, got 0'],
    [{ referenceTemperatureK: 0 }, 'T0 must be above 0 K, got 0'],
    [{ uLnPreExponential: -1 }, 'u(ln A) must not be below 0, got -1'],
    [{ uEnergyKJPerMol: -1 }, 'u(E) must not be below 0 kJ/mol, got -1'],
    [{ correlation: 1.2 }, 'correlation must be between -1 and 1, got 1.2'],
    [{ energyKJPerMol: NaN }, 'energyKJPerMol must be a finite number, got NaN'],
  ])('refuses %j', (part, message) => {
    expect(() => rateAt({ preExponential: 1e13, energyKJPerMol: 100, temperatureK: 500, ...part })).toThrow(message);
  });

  it('refuses equal temperatures', () => {
    expect(() => twoTemperature({ k1: 1, temperature1K: 300, k2: 2, temperature2K: 300 })).toThrow('must differ');
  });

  it('gives a rounding-safe zero for full cancellation', () => {
    expect(uLnRateAt(1, 500, 1, 500)).toBe(0);
  });
});

describe('change of basis', () => {
  it('holds at every temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e20, noNaN: true }), fc.double({ min: -3, max: 3, noNaN: true }), fc.double({ min: -50, max: 300, noNaN: true }), fc.constantFrom(0.5, 1, 2), fc.double({ min: 200, max: 2000, noNaN: true }), fc.constantFrom(1, 298.15), (A, n, E, g, T, T0) => {
        const pressure = changeBasis({ preExponential: A, exponent: n, energyKJPerMol: E, referenceTemperatureK: T0, gasOrder: g, from: 'concentration', to: 'pressure' });
        const kc = rateAt({ preExponential: A, exponent: n, energyKJPerMol: E, referenceTemperatureK: T0, temperatureK: T });
        const kp = rateAt({ ...pressure, temperatureK: T });
        expect(Math.abs(kp.lnK - (kc.lnK - g * Math.log(R * T)))).toBeLessThan(1e-9);
        // The local activation energy obeys E(k_p) = E(k_c) - gRT.
        expect(Math.abs(kp.localEnergyKJPerMol - (kc.localEnergyKJPerMol - (g * R * T) / 1000))).toBeLessThan(1e-9);
        const back = changeBasis({ ...pressure, gasOrder: g, from: 'pressure', to: 'concentration' });
        expectClose(back.preExponential, A, 1e-12);
        expect(back.exponent).toBeCloseTo(n, 12);
      }),
    );
  });

  it('keeps what is asked to stay', () => {
    expect(changeBasis({ preExponential: 5, energyKJPerMol: 1, gasOrder: 1, from: 'pressure', to: 'pressure' })).toMatchObject({ preExponential: 5, exponent: 0, referenceTemperatureK: 1 });
    expect(changeBasis({ preExponential: 1e7, energyKJPerMol: 35, gasOrder: 1, from: 'concentration', to: 'pressure' }).derivation[0]?.assumption).toContain('T0 = 1 K');
  });
});

describe('Eyring form', () => {
  // IUPAC Gold Book E02142; mpmath 1.2.1 with 40 digits.
  it.each(cases.filter((item) => /^eyring_to/.test(item.kind)))('$id $kind', ({ kind, input, expected }) => {
    const gas = kind.includes('gas');
    const result = eyringToArrhenius({
      enthalpyKJPerMol: Number(input.dH_J_mol) / 1000, entropyJPerMolK: Number(input.dS_J_mol_K), temperatureK: Number(input.T_K),
      phase: gas ? 'gas' : 'surface', molecularity: kind.includes('bimolecular') ? 2 : 1, standardState: input.standard_state as StandardState | undefined,
    });
    const k = (expected['k_s-1'] ?? expected['k_m3_mol-1_s-1'] ?? expected.k) as number;
    const A = (expected['A_s-1'] ?? expected['A_m3_mol-1_s-1'] ?? expected.A) as number;
    expectClose(result.k, k, 1e-12);
    expectClose(result.preExponential, A, 1e-12);
    expectClose(result.energyKJPerMol * 1000, expected.Ea_J_mol as number, 1e-12);
    expect(result.unit).toBe(gas ? 'm3 mol-1 s-1' : 's-1');
  });

  it.each(cases.filter((item) => /^arrhenius_to_eyring/.test(item.kind)))('$id $kind', ({ kind, input, expected }) => {
    const gas = kind.includes('gas');
    const result = arrheniusToEyring({
      preExponential: Number(input['A_s-1'] ?? input['A_m3_mol-1_s-1']), energyKJPerMol: Number(input.Ea_J_mol) / 1000, temperatureK: Number(input.T_K),
      phase: gas ? 'gas' : 'surface', molecularity: gas ? 2 : 1, standardState: input.standard_state as StandardState | undefined,
    });
    expectClose(result.enthalpyKJPerMol * 1000, expected.dH_J_mol as number, 1e-12);
    expectClose(result.entropyJPerMolK, expected.dS_J_mol_K as number, 1e-11);
    expectClose(result.gibbsKJPerMol * 1000, expected.dG_J_mol as number, 1e-11);
  });

  it('adsorbs with Δn‡ = -1: A = κ e (k_B T/h)/p° exp(ΔS‡/R), E = ΔH‡ + RT', () => {
    const result = eyringToArrhenius({ enthalpyKJPerMol: 10, entropyJPerMolK: -120, temperatureK: 400, phase: 'gas-surface', molecularity: 2, transmission: 0.5 });
    expect(result.unit).toBe('Pa-1 s-1');
    expectClose(result.preExponential, (0.5 * Math.E * k_B * 400) / h / 1e5 * Math.exp(-120 / R), 1e-13);
    expectClose(result.energyKJPerMol, 10 + (R * 400) / 1000, 1e-14);
    expectClose(rateAt({ preExponential: result.preExponential, energyKJPerMol: result.energyKJPerMol, temperatureK: 400 }).k, result.k, 1e-12);
    // 1 mol/L against 1 bar: the entropies differ by R ln(R T c°/p°) and the rate constant stays.
    const other = eyringToArrhenius({ enthalpyKJPerMol: 10, entropyJPerMolK: -120 + R * Math.log((1e3 * R * 400) / 1e5), temperatureK: 400, phase: 'gas-surface', molecularity: 2, transmission: 0.5, standardState: '1 mol/L' });
    expectClose(other.k, result.k, 1e-12);
  });

  it('goes there and back', () => {
    for (const phase of ['surface', 'gas', 'gas-surface'] as const) {
      for (const molecularity of [1, 2] as const) {
        const there = eyringToArrhenius({ enthalpyKJPerMol: 42, entropyJPerMolK: -33, temperatureK: 350, phase, molecularity, transmission: 0.7 });
        const back = arrheniusToEyring({ preExponential: there.preExponential, energyKJPerMol: there.energyKJPerMol, temperatureK: 350, phase, molecularity, transmission: 0.7 });
        expectClose(back.enthalpyKJPerMol, 42, 1e-13);
        expectClose(back.entropyJPerMolK, -33, 1e-12);
      }
    }
  });

  it('refuses other molecularities', () => {
    expect(() => eyringToArrhenius({ enthalpyKJPerMol: 1, entropyJPerMolK: 1, temperatureK: 300, phase: 'gas', molecularity: 3 as 2 })).toThrow('molecularity must be 1 or 2, got 3');
  });

  it('keeps the constants consistent', () => {
    expectClose(N_A * k_B, R, 1e-15);
  });
});
