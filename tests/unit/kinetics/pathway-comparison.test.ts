import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { energeticSpan } from '#shared/kinetics/energetic-span.ts';
import { energyProfile } from '#shared/kinetics/energy-profile.ts';
import { normalUpperTail } from '#shared/kinetics/normal.ts';
import { comparePathways, type ComparedStep, type PathwayComparisonInput } from '#shared/kinetics/pathway-comparison.ts';
import { RandomSequence, seededRandom, splitMix64 } from '#shared/kinetics/random.ts';

describe('random numbers', () => {
  it('are those of xoshiro128** 1.1', () => {
    // Outputs of the reference implementation xoshiro128starstar.c from the state 1, 2, 3, 4, as published in the tests of the crate rand_xoshiro.
    const random = new RandomSequence([1, 2, 3, 4]);
    expect(Array.from({ length: 10 }, () => random.uint32())).toEqual([11520, 0, 5927040, 70819200, 2031721883, 1637235492, 1287239034, 3734860849, 3729100597, 4258142804]);
  });

  it('are seeded by SplitMix64', () => {
    // Published outputs for the seed 1234567: Rosetta Code, Pseudo-random numbers/Splitmix64.
    const outputs: bigint[] = [];
    let state = 1234567n;
    for (let i = 0; i < 5; i += 1) {
      const next = splitMix64(state);
      outputs.push(next.output);
      state = next.state;
    }
    expect(outputs).toEqual([6457827717110365317n, 3203168211198807973n, 9817491932198370423n, 4593380528125082431n, 16408922859458223821n]);
  });

  it('have the moments and tails of their distributions', () => {
    const random = seededRandom(42);
    const count = 200_000;
    const sums = [0, 0, 0, 0, 0];
    let beyond = 0;
    let uniform = 0;
    for (let i = 0; i < count; i += 1) {
      const z = random.normal();
      for (let power = 1; power <= 4; power += 1) sums[power] = (sums[power] as number) + z ** power / count;
      if (Math.abs(z) > 1.959964) beyond += 1;
      uniform += random.uniform() / count;
    }
    const moment = (power: number): number => sums[power] as number;
    // Within four standard errors of 0, 1, 0, 3, 5 % and 1/2.
    expect(Math.abs(moment(1))).toBeLessThan(4 / Math.sqrt(count));
    expect(Math.abs(moment(2) - 1)).toBeLessThan(4 * Math.sqrt(2 / count));
    expect(Math.abs(moment(3))).toBeLessThan(4 * Math.sqrt(15 / count));
    expect(Math.abs(moment(4) - 3)).toBeLessThan(4 * Math.sqrt(96 / count));
    expect(Math.abs(beyond / count - 0.05)).toBeLessThan(4 * Math.sqrt((0.05 * 0.95) / count));
    expect(Math.abs(uniform - 0.5)).toBeLessThan(4 / Math.sqrt(12 * count));
  });

  it.each([-1, 0.5, NaN, 2 ** 53])('have no seed %s', (seed) => {
    expect(() => seededRandom(seed)).toThrow(expect.objectContaining({ path: 'seed' }));
  });

  it('have no state of zeros', () => {
    expect(() => new RandomSequence([0, 0, 0, 0])).toThrow('all zero');
    expect(seededRandom(0).uint32()).not.toBe(seededRandom(1).uint32());
  });
});

const step = (barrierKJPerMol: number | null, reactionEnergyKJPerMol: number, u: number, more: Partial<ComparedStep> = {}): ComparedStep => ({ barrierKJPerMol, reactionEnergyKJPerMol, u, ...more });
const compare = (first: ComparedStep[], second: ComparedStep[], more: Partial<PathwayComparisonInput> = {}) => comparePathways({ first, second, sharedVariance: 0, ...more });
const normalBelow = (z: number): number => (z >= 0 ? 1 - normalUpperTail(z) : normalUpperTail(-z));

describe('comparison of two pathways', () => {
  // Closed form: the difference of two normal values is normal, u² = u1² + u2² - 2 s u1 u2 (JCGM 100:2008 5.2.2).
  it.each([
    [60, 8, 70, 6, 0, undefined],
    [60, 8, 70, 6, 0.75, 'one'],
    [70, 8, 60, 6, 0.75, 'one'],
    [60, 8, 60, 8, 0.5, 'one'],
  ])('of one step each: %d ± %d against %d ± %d with %d shared', (a, ua, b, ub, sharedVariance, method) => {
    const result = compare([step(a, 0, ua, { method })], [step(b, 0, ub, { method })], { sharedVariance, draws: 100_000 });
    const u = Math.sqrt(ua * ua + ub * ub - 2 * sharedVariance * ua * ub);
    const wanted = normalBelow((b - a) / u);
    expect(Math.abs(result.probabilityFirstLower - wanted)).toBeLessThan(4 * result.samplingError);
    expect(Math.abs(result.difference.meanKJPerMol - (a - b))).toBeLessThan((4 * u) / Math.sqrt(100_000));
    expect(Math.abs(result.difference.standardDeviationKJPerMol / u - 1)).toBeLessThan(0.02);
    const [low, high] = result.difference.intervalKJPerMol;
    expect(Math.abs(low - (a - b - 1.959964 * u))).toBeLessThan(0.05 * u);
    expect(Math.abs(high - (a - b + 1.959964 * u))).toBeLessThan(0.05 * u);
    expect(result.difference.valueKJPerMol).toBe(a - b);
    const [least, most] = result.samplingInterval;
    expect(least).toBeLessThan(result.probabilityFirstLower);
    expect(most).toBeGreaterThan(result.probabilityFirstLower);
  });

  it('gives an error that all values share no say where it moves both alike', () => {
    const result = compare([step(60, 0, 30, { method: 'one' })], [step(62, 0, 30, { method: 'one' })], { sharedVariance: 1 });
    expect(result.probabilityFirstLower).toBe(1);
    expect(result.difference.standardDeviationKJPerMol).toBeLessThan(1e-12);
    expect(result.samplingError).toBe(0);
    // Even then the draws leave a little doubt: Wilson's interval is not empty.
    expect(result.samplingInterval[0]).toBeLessThan(1);
    expect(result.samplingInterval[0]).toBeGreaterThan(0.999);
    // Another method has an error of its own.
    expect(compare([step(60, 0, 30, { method: 'one' })], [step(62, 0, 30, { method: 'two' })], { sharedVariance: 1 }).probabilityFirstLower).toBeLessThan(0.6);
  });

  it('draws a value once that stands in both pathways', () => {
    const common = step(null, 15, 25, { key: 'SN-1' });
    const result = compare([common, step(50, 0, 1)], [common, step(55, 0, 1)]);
    expect(Math.abs(result.difference.standardDeviationKJPerMol - Math.SQRT2)).toBeLessThan(0.05);
    expect(compare([step(null, 15, 25), step(50, 0, 1)], [step(null, 15, 25), step(55, 0, 1)]).difference.standardDeviationKJPerMol).toBeGreaterThan(20);
  });

  it('gives the runs of a step one error', () => {
    // 2 ΔE + E with one error in ΔE: u² = 4 u² + u².
    const result = compare([step(100, 10, 5, { times: 3 })], [step(120, 0, 0)], { draws: 50_000 });
    expect(Math.abs(result.difference.standardDeviationKJPerMol / Math.sqrt(4 * 25 + 25) - 1)).toBeLessThan(0.02);
  });

  it('counts equal draws half', () => {
    const same = [step(60, 0, 5, { key: 'SN-1' })];
    expect(compare(same, same)).toMatchObject({ probabilityFirstLower: 0.5, difference: { meanKJPerMol: 0, intervalKJPerMol: [0, 0] } });
  });

  it('repeats itself with one seed, and not with another', () => {
    const a = [step(60, -10, 8), step(40, 5, 8)];
    const b = [step(62, -10, 8)];
    expect(compare(a, b, { seed: 5 })).toEqual(compare(a, b, { seed: 5 }));
    expect(compare(a, b, { seed: 5 }).difference.meanKJPerMol).not.toBe(compare(a, b, { seed: 6 }).difference.meanKJPerMol);
    expect(compare(a, b).derivation[0]).toMatchObject({ constant: 'seed 1, xoshiro128**', assumption: expect.stringContaining('share 0 of their variance') });
  });

  it('measures as the profile and its span do', () => {
    const one = fc.record({ barrierKJPerMol: fc.option(fc.integer({ min: 0, max: 200 })), reactionEnergyKJPerMol: fc.integer({ min: -150, max: 150 }), u: fc.constant(0), times: fc.integer({ min: 1, max: 3 }) });
    const pathway = fc.array(one, { minLength: 1, maxLength: 6 }).filter((steps) => steps.some(({ barrierKJPerMol }) => barrierKJPerMol !== null));
    fc.assert(fc.property(pathway, pathway, (first, second) => {
      const high = compare(first, second, { draws: 1000 });
      expect([high.firstKJPerMol, high.secondKJPerMol]).toEqual([energyProfile(first).highestKJPerMol, energyProfile(second).highestKJPerMol]);
      const span = compare(first, second, { draws: 1000, measure: 'span' });
      expect([span.firstKJPerMol, span.secondKJPerMol]).toEqual([energeticSpan(energyProfile(first)).spanKJPerMol, energeticSpan(energyProfile(second)).spanKJPerMol]);
    }), { numRuns: 60 });
  });

  it('hides no fault of its own', () => {
    expect(() => comparePathways({ first: null as never, second: [], sharedVariance: 0 })).toThrow(TypeError);
  });

  it.each([
    ['first.0.u', { first: [{ barrierKJPerMol: 1, reactionEnergyKJPerMol: 0 }] }, /a missing one is never taken as 0/],
    ['second.1.u', { second: [step(1, 0, 1), { barrierKJPerMol: 1, reactionEnergyKJPerMol: 0, u: null }] }, /step 2/],
    ['second.0.key', { first: [step(1, 0, 1, { key: 'a' })], second: [step(2, 0, 1, { key: 'a' })] }, /"a" names two different values/],
    ['second.0.key', { first: [step(1, 0, 1, { key: 'a' })], second: [step(1, 1, 1, { key: 'a' })] }, /two different/],
    ['second.0.key', { first: [step(1, 0, 1, { key: 'a' })], second: [step(1, 0, 2, { key: 'a' })] }, /two different/],
    ['second.0.key', { first: [step(1, 0, 1, { key: 'a' })], second: [step(1, 0, 1, { key: 'a', method: 'm' })] }, /two different/],
    ['first', { first: [] }, /1 to 200 steps/],
    ['second.0.times', { second: [step(1, 0, 1, { times: 1.5 })] }, /whole number/],
    ['sharedVariance', { sharedVariance: 1.5 }, /from 0 to 1, got 1.5/],
    ['sharedVariance', { sharedVariance: NaN }, /got NaN/],
    ['draws', { draws: 10 }, /a whole number from 1000 to 1000000, got 10/],
    ['draws', { draws: 1000.5 }, /whole number/],
    ['seed', { seed: -1 }, /whole number/],
  ] as [string, Partial<PathwayComparisonInput>, RegExp][])('refuses %s', (path, part, message) => {
    expect(() => compare([step(1, 0, 1)], [step(1, 0, 1)], part)).toThrow(expect.objectContaining({ path, message: expect.stringMatching(message) }));
  });
});
