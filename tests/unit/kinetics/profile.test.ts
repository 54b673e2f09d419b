import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { profileCalculator } from '#shared/calculators/profile.ts';
import { h, k_B, R } from '#shared/kinetics/constants.ts';
import { energeticSpan, spanTurnover } from '#shared/kinetics/energetic-span.ts';
import { energyProfile, type ProfileStep } from '#shared/kinetics/energy-profile.ts';
import { expectClose } from './reference.ts';

const step = (barrierKJPerMol: number | null, reactionEnergyKJPerMol: number, more: Partial<ProfileStep> = {}): ProfileStep => ({ barrierKJPerMol, reactionEnergyKJPerMol, ...more });
const energies = (steps: ProfileStep[]): [string, number][] => energyProfile(steps).states.map(({ name, energyKJPerMol }) => [name, energyKJPerMol]);

describe('energy profile', () => {
  it('adds a barrier of 17 kcal/mol to an intermediate 50 kcal/mol up: 67 above the start', () => {
    const kcal = 4.184;
    const profile = energyProfile([step(50 * kcal, 50 * kcal), step(17 * kcal, -30 * kcal)]);
    expectClose(profile.highestKJPerMol, 67 * kcal, 1e-15);
    expect(profile).toMatchObject({ highestStep: 2, highestRun: 1, warnings: [] });
    expectClose(profile.reactionEnergyKJPerMol, 20 * kcal, 1e-14);
    expect(profile.derivation[0]?.operation).toContain('step 2: the energy before it plus its barrier of 71.128 kJ/mol');
  });

  it('names the states in order', () => {
    expect(energies([step(80, -20), step(null, -30), step(60, 10)])).toEqual([['start', 0], ['TS1', 80], ['I1', -20], ['I2', -50], ['TS3', 10], ['end', -40]]);
    expect(energyProfile([step(80, -20), step(null, -30)]).states.map(({ kind, step: number }) => [kind, number])).toEqual([['start', null], ['transition-state', 1], ['intermediate', 1], ['end', 2]]);
  });

  it('meets the transition state of a repeated step in each run', () => {
    // Uphill the last run is the highest, downhill the first, level the first of equal heights.
    expect(energies([step(70, 20, { times: 2 }), step(30, -5)])).toEqual([['start', 0], ['TS1.1', 70], ['I1.1', 20], ['TS1.2', 90], ['I1.2', 40], ['TS2', 70], ['end', 35]]);
    expect(energyProfile([step(70, 20, { times: 3 })])).toMatchObject({ highestKJPerMol: 110, highestStep: 1, highestRun: 3, reactionEnergyKJPerMol: 60 });
    expect(energyProfile([step(70, -20, { times: 3 })])).toMatchObject({ highestKJPerMol: 70, highestRun: 1, reactionEnergyKJPerMol: -60 });
    expect(energyProfile([step(70, 0, { times: 2 })])).toMatchObject({ highestKJPerMol: 70, highestRun: 1 });
    expect(energyProfile([step(70, 20, { times: 2 })]).derivation[0]?.operation).toContain('run 2 of 2');
  });

  it('is the maximum of (Σ ΔE_j before i) + E_i', () => {
    const one = fc.record({ barrierKJPerMol: fc.integer({ min: 0, max: 200 }), reactionEnergyKJPerMol: fc.integer({ min: -150, max: 150 }) });
    fc.assert(fc.property(fc.array(one, { minLength: 1, maxLength: 12 }), (steps) => {
      const heights = steps.map(({ barrierKJPerMol }, i) => steps.slice(0, i).reduce((sum, { reactionEnergyKJPerMol }) => sum + reactionEnergyKJPerMol, 0) + barrierKJPerMol);
      expect(energyProfile(steps).highestKJPerMol).toBe(Math.max(...heights));
    }));
  });

  it('warns of a transition state below its own product or reactant, and keeps it', () => {
    expect(energyProfile([step(10, 25)]).warnings).toEqual([expect.objectContaining({ code: 'below-product', step: 1, message: expect.stringContaining('10 kJ/mol is below the reaction energy of 25 kJ/mol') })]);
    expect(energyProfile([step(5, 0), step(-3, -20)]).warnings.map(({ code, step: number }) => [code, number])).toEqual([['below-reactant', 2]]);
    expect(energyProfile([step(25, 25), step(0, 0), step(null, 40)]).warnings).toEqual([]);
  });

  it('carries the uncertainties up to the highest transition state', () => {
    const steps = [step(20, 10, { u: 3, times: 2 }), step(70, -10, { u: 4 }), step(5, 0, { u: 100 })];
    expect(energyProfile(steps)).toMatchObject({ highestStep: 2, uHighestKJPerMol: { independent: Math.sqrt(52), correlated: 10 } });
    expect(energyProfile([step(70, 20, { u: 2, times: 3 })]).uHighestKJPerMol).toEqual({ independent: Math.sqrt(20), correlated: 6 });
    // A missing one is never taken as 0, unless it lies behind the highest transition state.
    expect(energyProfile([step(20, 10), step(70, -10, { u: 4 })]).uHighestKJPerMol).toBeNull();
    expect(energyProfile([step(70, 10, { u: 4 }), step(20, -10)]).uHighestKJPerMol).toEqual({ independent: 4, correlated: 4 });
  });

  it.each([
    ['steps', [], /1 to 200 steps, got 0/],
    ['steps', Array.from({ length: 201 }, () => step(1, 1)), /got 201/],
    ['steps', [step(null, 1)], /at least one transition state/],
    ['steps.0.barrierKJPerMol', [step(NaN, 1)], /finite/],
    ['steps.1.reactionEnergyKJPerMol', [step(1, 1), step(1, Infinity)], /finite/],
    ['steps.0.u', [step(1, 1, { u: -1 })], /standard uncertainty must not be below 0 kJ\/mol, got -1/],
    ['steps.0.times', [step(1, 1, { times: 0.5 })], /whole number from 1 to 100, got 0.5/],
    ['steps.0.times', [step(1, 1, { times: 0 })], /got 0/],
    ['steps.0.times', [step(1, 1, { times: 101 })], /got 101/],
    ['steps', [step(1e308, 1e308, { times: 2 })], /finite/],
  ] as [string, ProfileStep[], RegExp][])('refuses %s', (path, steps, message) => {
    expect(() => energyProfile(steps)).toThrow(expect.objectContaining({ path, message: expect.stringMatching(message) }));
  });
});

describe('energetic span', () => {
  it('takes the transition state as it is where it follows the intermediate', () => {
    const span = energeticSpan(energyProfile([step(50, -20), step(90, -40)]));
    expect(span).toMatchObject({ spanKJPerMol: 90, follows: true, transitionState: { name: 'TS2' }, intermediate: { name: 'I1' } });
  });

  it('adds the energy of the cycle where it precedes', () => {
    // TS1 at 90, I1 at -60, TS2 at -30, cycle -20: 90 for TS1 after the start, but 90 + 60 - 20 = 130 for TS1 of the next cycle after I1.
    const span = energeticSpan(energyProfile([step(90, -60), step(30, 40)]));
    expect(span).toMatchObject({ spanKJPerMol: 130, follows: false, transitionState: { name: 'TS1' }, intermediate: { name: 'I1' } });
    expect(span.derivation[0]?.operation).toContain('which it precedes, plus the energy of one cycle');
  });

  it('does not depend on where the cycle is cut', () => {
    const one = fc.record({ barrierKJPerMol: fc.integer({ min: 0, max: 200 }), reactionEnergyKJPerMol: fc.integer({ min: -150, max: 150 }) });
    fc.assert(fc.property(fc.array(one, { minLength: 1, maxLength: 8 }), fc.nat(7), (steps, shift) => {
      const cut = shift % steps.length;
      const turned = [...steps.slice(cut), ...steps.slice(0, cut)];
      expect(energeticSpan(energyProfile(turned)).spanKJPerMol).toBe(energeticSpan(energyProfile(steps)).spanKJPerMol);
    }));
  });
});

/** Steady-state turnover of a cycle of steps i → i+1 with Eyring rate constants both ways, by elimination: nothing of the span model is used. */
function steadyState(steps: { barrierKJPerMol: number; reactionEnergyKJPerMol: number }[], T: number): number {
  const n = steps.length;
  const rate = (barrier: number): number => ((k_B * T) / h) * Math.exp((-barrier * 1000) / (R * T));
  const forward = steps.map(({ barrierKJPerMol }) => rate(barrierKJPerMol));
  const backward = steps.map(({ barrierKJPerMol, reactionEnergyKJPerMol }) => rate(barrierKJPerMol - reactionEnergyKJPerMol));
  // Rows 0 to n-2: dθ_i/dt = 0; the last row: Σθ = 1.
  const rows = Array.from({ length: n }, (_, i) => {
    const row = new Array<number>(n + 1).fill(0);
    if (i === n - 1) return row.fill(1);
    const before = (i + n - 1) % n;
    row[i] = (row[i] as number) - (forward[i] as number) - (backward[before] as number);
    row[before] = (row[before] as number) + (forward[before] as number);
    row[(i + 1) % n] = (row[(i + 1) % n] as number) + (backward[i] as number);
    return row;
  });
  for (let i = 0; i < n; i += 1) {
    const pivot = rows.slice(i).reduce((best, row, k) => (Math.abs(row[i] as number) > Math.abs((rows[best] as number[])[i] as number) ? i + k : best), i);
    [rows[i], rows[pivot]] = [rows[pivot] as number[], rows[i] as number[]];
    const top = rows[i] as number[];
    for (const row of rows) {
      if (row === top) continue;
      const factor = (row[i] as number) / (top[i] as number);
      for (let j = i; j <= n; j += 1) row[j] = (row[j] as number) - factor * (top[j] as number);
    }
  }
  const coverage = rows.map((row, i) => (row[n] as number) / (row[i] as number));
  return (forward[0] as number) * (coverage[0] as number) - (backward[0] as number) * (coverage[1 % n] as number);
}

describe('turnover from the energetic span', () => {
  const cycle = [step(60, -20), step(75, 10), step(40, -50)];
  it('is (k_B T/h) exp(-δE/RT)', () => {
    const result = spanTurnover(energyProfile(cycle), 'gibbs', 500);
    expectClose(result.turnoverPerS, ((k_B * 500) / h) * Math.exp(-75000 / (R * 500)), 1e-13);
    expect(result.refusal).toBeNull();
    expect(result.derivation[0]?.assumption).toContain('Gibbs energies at T = 500 K');
  });

  // Independent check: the steady state of the same cycle by elimination.
  it.each([
    [[{ barrierKJPerMol: 60, reactionEnergyKJPerMol: -20 }, { barrierKJPerMol: 75, reactionEnergyKJPerMol: 10 }, { barrierKJPerMol: 40, reactionEnergyKJPerMol: -50 }], 500],
    [[{ barrierKJPerMol: 60, reactionEnergyKJPerMol: 20 }, { barrierKJPerMol: 45, reactionEnergyKJPerMol: -25 }], 400],
    [[{ barrierKJPerMol: 50, reactionEnergyKJPerMol: -2 }, { barrierKJPerMol: 50, reactionEnergyKJPerMol: -2 }, { barrierKJPerMol: 50, reactionEnergyKJPerMol: -2 }, { barrierKJPerMol: 52, reactionEnergyKJPerMol: 1 }], 600],
  ])('with every state counted is the steady state of %j', (steps, T) => {
    expectClose(spanTurnover(energyProfile(steps), 'gibbs', T).turnoverAllStatesPerS, steadyState(steps, T), 1e-8);
  });

  it.each([
    ['enthalpy', 500, cycle, /No turnover from enthalpies/],
    ['electronic', 500, cycle, /No turnover from electronic energies/],
    ['gibbs', undefined, cycle, /without the temperature/],
    ['gibbs', 500, [step(60, 20)], /does not run forward/],
    ['gibbs', 10, [step(900, -20)], /double precision/],
    ['gibbs', 1, [step(-900, -1000)], /double precision/],
  ] as const)('is refused for %s at %s K', (quantity, T, steps, reason) => {
    expect(spanTurnover(energyProfile(steps), quantity, T)).toMatchObject({ turnoverPerS: null, turnoverAllStatesPerS: null, refusal: expect.stringMatching(reason), derivation: [] });
  });

  it('refuses a temperature not above 0 K', () => {
    expect(() => spanTurnover(energyProfile(cycle), 'gibbs', 0)).toThrow(expect.objectContaining({ path: 'temperatureK' }));
  });
});

describe('profile calculator', () => {
  const run = (input: unknown) => {
    const calculation = runCalculator(profileCalculator, input);
    return 'result' in calculation ? profileCalculator.output.parse(calculation.result) : calculation.faults;
  };
  const steps = [{ barrierKJPerMol: 60, reactionEnergyKJPerMol: -20 }, { barrierKJPerMol: 75, reactionEnergyKJPerMol: -10 }];
  it('has a span for a cycle alone, and a turnover from Gibbs energies alone', () => {
    expect(run({ steps, quantity: 'electronic' })).not.toHaveProperty('spanKJPerMol');
    expect(run({ steps, quantity: 'gibbs', cyclic: true, temperatureK: 500 })).toMatchObject({ spanKJPerMol: 75, spanTransitionState: 'TS2', spanIntermediate: 'I1', turnoverPerS: expect.any(Number) });
    const refused = run({ steps, quantity: 'electronic', cyclic: true, temperatureK: 500 });
    expect(refused).toMatchObject({ spanKJPerMol: 75, turnoverRefusal: expect.stringContaining('entropy') });
    expect(refused).not.toHaveProperty('turnoverPerS');
  });
  it.each([
    [{ steps, quantity: 'free' }, 'quantity'],
    [{ steps: [], quantity: 'gibbs' }, 'steps'],
    [{ steps, quantity: 'gibbs', temperatureK: -1 }, 'temperatureK'],
    [{ steps: [{ ...steps[0], times: 1.5 }], quantity: 'gibbs' }, 'steps.0.times'],
  ])('refuses %j', (input, path) => {
    expect(run(input)).toEqual([expect.objectContaining({ path })]);
  });
});
