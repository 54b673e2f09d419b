import { describe, expect, it } from 'vitest';
import { normalCoverageFactor, normalUpperTail } from '#shared/kinetics/normal.ts';
import { studentCoverageFactor, studentTwoSidedTail } from '#shared/kinetics/student-t.ts';
import { differenceUncertainty, evaluateUncertainty, factorUncertainty, standardUncertaintyOf } from '#shared/kinetics/uncertainty.ts';
import { expectClose, referenceCases } from './reference.ts';

const cases = referenceCases('uncertainty');
const of = (kind: string) => cases.filter((item) => item.kind === kind);

describe('standard uncertainty', () => {
  // JCGM 100:2008 (GUM) 4.3 and annex G, by scipy 1.10.1 and mpmath 1.2.1.
  it.each(of('expanded_to_standard'))('$id expanded', ({ input, expected }) => {
    expectClose(standardUncertaintyOf(Number(input.U), { kind: 'expanded', coverageFactor: Number(input.k) }), expected.u as number, 1e-14);
  });
  it.each(of('confidence_interval_normal'))('$id normal interval', ({ input, expected }) => {
    expectClose(normalCoverageFactor(Number(input.level)), expected.z as number, 1e-11);
    expectClose(standardUncertaintyOf(expected.half_width as number, { kind: 'confidence', level: Number(input.level) }), expected.u as number, 1e-11);
  });
  it.each(of('confidence_interval_student_t'))('$id Student interval', ({ input, expected }) => {
    const degreesOfFreedom = Number(input.df);
    expectClose(studentCoverageFactor(Number(input.level), degreesOfFreedom), expected.t as number, 1e-12);
    expectClose(standardUncertaintyOf(Number(input.half_width), { kind: 'confidence', level: Number(input.level), degreesOfFreedom }), expected.u as number, 1e-12);
  });
  it.each(of('triangular_half_width'))('$id triangular', ({ input, expected }) => {
    expectClose(standardUncertaintyOf(Number(input.a), { kind: 'triangular' }), expected.u as number, 1e-14);
  });
  it.each(of('rectangular_half_width'))('$id rectangular', ({ input, expected }) => {
    expectClose(standardUncertaintyOf(Number(input.a), { kind: 'rectangular' }), expected.u as number, 1e-14);
  });
  it.each(of('sd_to_standard_error'))('$id spread', ({ input, expected }) => {
    expectClose(standardUncertaintyOf(Number(input.s), { kind: 'spread', degreesOfFreedom: Number(input.n) - 1 }), expected.u as number, 1e-14);
  });
  it.each(of('factor_uncertainty'))('$id factor', ({ input, expected }) => {
    const level = input.coverage === 'one_sigma' ? 0.6826894921370859 : 0.95;
    expectClose(factorUncertainty(Number(input.factor), level), expected.u_ln as number, 1e-11);
  });
  it('has none for unknown and none', () => {
    expect(standardUncertaintyOf(1, { kind: 'unknown' })).toBeNull();
    expect(standardUncertaintyOf(1, { kind: 'none' })).toBeNull();
  });
  // GUM 4.3.9: a trapezoid without a top is the triangle, one with the whole base as its top the rectangle.
  it.each([[0, 'triangular'], [1, 'rectangular']] as const)('a trapezoid with a top of %d is %s', (topFraction, kind) => {
    expectClose(evaluateUncertainty({ kind: 'trapezoidal', halfWidth: 2.7, topFraction }).standardUncertainty, evaluateUncertainty({ kind, halfWidth: 2.7 }).standardUncertainty, 1e-15);
  });
  it('refuses nonsense', () => {
    expect(() => evaluateUncertainty({ kind: 'trapezoidal', halfWidth: 1, topFraction: 1.1 })).toThrow('must not be above 1, got 1.1');
    expect(() => differenceUncertainty(1, 1, 1.2)).toThrow('correlation must be between -1 and 1, got 1.2');
    expect(() => differenceUncertainty(-1, 1, 0)).toThrow('u1 must not be below 0, got -1');
    expect(() => standardUncertaintyOf(-1, { kind: 'standard' })).toThrow('uncertainty must not be below 0, got -1');
    expect(() => factorUncertainty(0.5, 0.95)).toThrow('factor must be 1 or more');
    expect(() => normalCoverageFactor(1)).toThrow('level must be between 0 and 1');
    expect(() => studentCoverageFactor(0.95, 0)).toThrow('degrees of freedom must be above 0');
  });
});

describe('quantiles', () => {
  // NIST/SEMATECH e-Handbook, table of Student's t, upper critical values at 0.975 and 0.995 (three decimals).
  it.each([[1, 12.706, 63.657], [2, 4.303, 9.925], [3, 3.182, 5.841], [5, 2.571, 4.032], [10, 2.228, 3.169], [30, 2.042, 2.75], [100, 1.984, 2.626]])('Student t with %d degrees of freedom', (degrees, t95, t99) => {
    expect(studentCoverageFactor(0.95, degrees)).toBeCloseTo(t95, 2.9);
    expect(studentCoverageFactor(0.99, degrees)).toBeCloseTo(t99, 2.9);
  });
  it('has closed forms for one and two degrees of freedom', () => {
    // One: tan(pi level/2). Two: level sqrt(2/(1 - level²)). Both are textbook identities of Student's distribution.
    for (const level of [0.1, 0.5, 0.9, 0.999, 1 - 1e-9]) {
      expectClose(studentCoverageFactor(level, 1), Math.tan((Math.PI * level) / 2), 3e-7);
      expectClose(studentCoverageFactor(level, 2), level * Math.sqrt(2 / (1 - level * level)), 3e-7);
    }
    expectClose(studentCoverageFactor(0.9, 1), Math.tan(0.45 * Math.PI), 1e-13);
    expectClose(studentCoverageFactor(0.9, 2), 0.9 * Math.sqrt(2 / 0.19), 1e-13);
  });
  it('runs into the normal distribution', () => {
    expect(studentCoverageFactor(0.95, Infinity)).toBe(normalCoverageFactor(0.95));
    expect(studentCoverageFactor(0.95, 1e12)).toBe(normalCoverageFactor(0.95));
    expectClose(studentCoverageFactor(0.95, 1e7), 1.959964, 1e-6);
    expect(studentCoverageFactor(0.95, null)).toBeCloseTo(1.959963984540054, 12);
    expect(studentTwoSidedTail(0, 5)).toBe(1);
    expect(normalUpperTail(0)).toBeCloseTo(0.5, 15);
  });
  it('inverts its own tail', () => {
    for (const degrees of [1, 1.5, 4, 29, 1000]) {
      for (const level of [0.5, 0.95, 0.9999]) expectClose(studentTwoSidedTail(studentCoverageFactor(level, degrees), degrees), 1 - level, 1e-9);
    }
  });
});
