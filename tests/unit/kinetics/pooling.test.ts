import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runCalculator } from '#shared/calculators/calculator.ts';
import { poolCalculator } from '#shared/calculators/pool.ts';
import { betweenVariance, centre, poolModels, type UncertainValue } from '#shared/kinetics/heterogeneity.ts';
import { poolIntervals, poolValues } from '#shared/kinetics/pool.ts';
import { groupValues } from '#shared/kinetics/pool-groups.ts';
import { studentCoverageFactor } from '#shared/kinetics/student-t.ts';
import { expectClose, faultOf, referenceCases } from './reference.ts';

interface Interval {
  se: number;
  ci95: [number, number];
}
interface ModelExpected {
  mean: number;
  se: number;
  tau2: number;
  ci95_normal: [number, number];
  I2_tau2_percent?: number;
  knapp_hartung?: Interval & { q: number; 't_0.975': number };
  knapp_hartung_adhoc_q_not_below_1?: Interval;
  metafor: { mean: number; se: number; tau2: number; I2: number };
}

const keys = [['FE', 'fixed'], ['DL', 'dersimonian-laird'], ['PM', 'paule-mandel'], ['REML', 'reml']] as const;
const variants = referenceCases('pooled').flatMap((item) => {
  const { value, u } = item.input as unknown as { value: number[]; u: number[] };
  return keys.map(([key, model]) => ({ id: item.id, model, values: value.map((one, i) => ({ value: one, u: u[i] as number })), expected: item.expected[key] as ModelExpected, all: item.expected }));
});

const three = [{ value: 41.8, u: 1.3 }, { value: 46, u: 1.6 }, { value: 39.7, u: 2.2 }];
const five = [...three, { value: 44.1, u: 0.9 }, { value: 50.2, u: 3 }];

describe('pooling, reference cases', () => {
  // metafor 3.8-1 (R 4.2.2) with tightened tolerances; full double precision from the same equations in mpmath 1.2.1.
  it('covers every model of every case', () => expect(variants).toHaveLength(32));

  it.each(variants)('$id, $model', ({ model, values, expected, all }) => {
    const normal = poolValues(values, { model, interval: 'normal' });
    expectClose(normal.mean, expected.mean, 1e-13, 'mean');
    expectClose(normal.standardError, expected.se, 1e-12, 'se');
    expectClose(normal.tau2, expected.tau2, 1e-9, 'tau2');
    [0, 1].forEach((end) => expectClose(normal.interval?.[end], expected.ci95_normal[end] as number, 1e-12, 'normal'));
    expect(normal.k).toBe(all.k);
    expectClose(normal.q, all.Q as number, 1e-9, 'Q');
    expectClose(normal.i2Percent, all.I2_Q_percent as number, 1e-9, 'I2');
    expectClose(normal.birgeRatio, all.birge_ratio as number, 1e-9);
    if (expected.I2_tau2_percent !== undefined) expectClose(normal.i2Tau2Percent, expected.I2_tau2_percent, 1e-9);
  });

  it.each(variants.filter(({ expected }) => expected.knapp_hartung))('$id, $model, Hartung–Knapp and the variant that never narrows', ({ model, values, expected }) => {
    const pairs = [['hartung-knapp', expected.knapp_hartung], ['hartung-knapp-ad-hoc', expected.knapp_hartung_adhoc_q_not_below_1]] as const;
    for (const [interval, wanted] of pairs) {
      const result = poolValues(values, { model, interval });
      expectClose(result.standardError, wanted?.se as number, 1e-9, interval);
      expectClose(result.modelStandardError, expected.se, 1e-12);
      [0, 1].forEach((end) => expectClose(result.interval?.[end], wanted?.ci95[end] as number, 1e-12, interval));
    }
    const scatter = (poolValues(values, { model }).standardError / expected.se) ** 2;
    expect(Math.abs(scatter - (expected.knapp_hartung?.q as number))).toBeLessThan(1e-11);
    expectClose(studentCoverageFactor(0.95, values.length - 1), expected.knapp_hartung?.['t_0.975'] as number, 1e-13);
  });

  // What metafor itself returns, to the tolerance the file states for it: 1e-10 on τ² with one tiny u, else the last digits.
  it.each(variants)('$id, $model, metafor', ({ id, model, values, expected: { metafor } }) => {
    const result = poolValues(values, { model, interval: 'normal' });
    const tolerance = id === 'P-tiny-u' ? 1e-10 : 1e-12;
    expectClose(result.mean, metafor.mean, tolerance);
    expectClose(result.standardError, metafor.se, tolerance);
    expectClose(result.tau2, metafor.tau2, tolerance);
    expect(Math.abs((model === 'fixed' ? result.i2Percent : result.i2Tau2Percent) as number) - metafor.I2).toBeLessThan(1e-8);
  });
});

describe('variance between values', () => {
  const logLikelihood = ({ deviations: x, variances: v }: ReturnType<typeof centre>, tau2: number): number => {
    const w = v.map((one) => 1 / (one + tau2));
    const sum = w.reduce((a, b) => a + b);
    const mean = w.reduce((a, one, i) => a + one * (x[i] as number), 0) / sum;
    return -0.5 * (w.reduce((a, one) => a - Math.log(one), 0) + Math.log(sum) + w.reduce((a, one, i) => a + one * ((x[i] as number) - mean) ** 2, 0));
  };

  it('takes the highest of two maxima of the restricted likelihood', () => {
    // Two precise values that agree and rough ones that do not: one maximum at 0, another far out.
    const both = ([far]: [number]): UncertainValue[] => [{ value: 0, u: 0.01 }, { value: 0.01, u: 0.01 }, { value: far, u: 1 }, { value: -far, u: 1 }, { value: far, u: 1 }];
    const found = [2, 3, 4, 6, 8].map((far) => {
      const data = centre(both([far]));
      const tau2 = betweenVariance(data, 'reml');
      const best = Array.from({ length: 6000 }, (_, i) => logLikelihood(data, i === 0 ? 0 : 10 ** (i / 600 - 3))).reduce((a, b) => Math.max(a, b));
      expect(logLikelihood(data, tau2)).toBeGreaterThanOrEqual(best - 1e-9);
      return tau2;
    });
    expect(found[0]).toBe(0);
    expect(found.at(-1)).toBeGreaterThan(1);
  });

  const sample = fc.array(fc.record({ value: fc.double({ min: -200, max: 200, noNaN: true }), u: fc.double({ min: 1e-3, max: 50, noNaN: true }) }), { minLength: 2, maxLength: 9 });

  it('is where the restricted likelihood is highest, for any values', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const data = centre(values);
        const found = logLikelihood(data, betweenVariance(data, 'reml'));
        for (let i = 0; i <= 300; i += 1) expect(logLikelihood(data, i === 0 ? 0 : 10 ** (i / 20 - 4))).toBeLessThanOrEqual(found + 1e-9 * (1 + Math.abs(found)));
      }),
      { numRuns: 60 },
    );
  });

  it('makes Q equal to k - 1 by Paule and Mandel, or is 0', () => {
    fc.assert(
      fc.property(sample, (values) => {
        const { tau2, mean } = poolValues(values, { model: 'paule-mandel' });
        const q = values.reduce((sum, { value, u }) => sum + (value - mean) ** 2 / (u * u + (tau2 as number)), 0);
        if (tau2 === 0) expect(q).toBeLessThanOrEqual((values.length - 1) * (1 + 1e-9));
        else expectClose(q, values.length - 1, 1e-6);
      }),
    );
  });

  it('follows a change of unit and of zero, in every model', () => {
    fc.assert(
      fc.property(sample, fc.constantFrom(...poolModels), (values, model) => {
        const plain = poolValues(values, { model });
        const moved = poolValues(values.map(({ value, u }) => ({ value: 4 * value + 1024, u: 4 * u })), { model });
        expect(Math.abs(moved.mean - 1024 - 4 * plain.mean)).toBeLessThan(1e-7);
        expect(Math.abs((moved.tau2 as number) - 16 * (plain.tau2 as number))).toBeLessThan(1e-6 * (1 + (plain.tau2 as number)));
      }),
    );
  });
});

describe('what pooling returns', () => {
  it('is restricted maximum likelihood with the Hartung–Knapp interval unless said', () => {
    expect(poolValues(three)).toEqual(poolValues(three, { model: 'reml', interval: 'hartung-knapp' }));
    expect(poolIntervals[0]).toBe('hartung-knapp');
  });

  it('gives the prediction interval by Student t with k - 2 degrees of freedom, and none under three values or for a fixed effect', () => {
    const result = poolValues(five, { interval: 'normal' });
    // t of 0.975 for 3 degrees of freedom, 3.182: GUM table G.2.
    const half = 3.1824463052837095 * Math.sqrt((result.tau2 as number) + result.standardError ** 2);
    expectClose(result.predictionInterval?.[0], result.mean - half, 1e-12);
    expectClose(result.predictionInterval?.[1], result.mean + half, 1e-12);
    // One degree of freedom, 12.706.
    const few = poolValues(three);
    expectClose(few.predictionInterval?.[1], few.mean + 12.706204736174707 * Math.sqrt((few.tau2 as number) + few.modelStandardError ** 2), 1e-12);
    expect(poolValues(three.slice(1)).predictionInterval).toBeNull();
    expect(poolValues(five, { model: 'fixed' }).predictionInterval).toBeNull();
  });

  it('leaves every value out once', () => {
    for (const model of poolModels) {
      const { leaveOneOut } = poolValues(five, { model });
      leaveOneOut.forEach((left, i) => {
        const rest = poolValues(five.filter((_, j) => j !== i), { model });
        expect(left).toEqual({ indices: [i], group: null, mean: rest.mean, standardError: rest.standardError, interval: rest.interval, tau2: rest.tau2 });
      });
      expect(leaveOneOut).toHaveLength(5);
    }
    const [withoutFirst] = poolValues(three.slice(0, 2)).leaveOneOut;
    expect(withoutFirst).toEqual({ indices: [0], group: null, mean: 46, standardError: 1.6, interval: null, tau2: null });
  });

  it('keeps a single value as it is and says so', () => {
    const result = poolValues([{ value: 72.4, u: 1.2 }]);
    expect(result).toMatchObject({
      mean: 72.4, standardError: 1.2, modelStandardError: 1.2, tau2: null, q: 0, i2Percent: null, i2Tau2Percent: null, birgeRatio: null, interval: null, predictionInterval: null, k: 1, leaveOneOut: [],
    });
    expect(result.warnings.map(({ code }) => code)).toEqual(['one-value']);
    expect(result.derivation.map(({ to }) => to)).toEqual(['72.4']);
  });

  it.each([
    ['two values', [{ value: 1, u: 1 }, { value: 9, u: 1 }], 'hartung-knapp', ['few-values']],
    ['values that agree too well', [...three.map(({ u }) => ({ value: 40, u }))], 'hartung-knapp', ['narrowed']],
    ['values that agree too well, normal interval', [...three.map(({ u }) => ({ value: 40, u }))], 'normal', []],
    ['values of one group', [{ ...three[0], group: 'x' }, { ...three[1], group: 'x' }, { value: 51, u: 1 }, { value: 61, u: 1 }], 'hartung-knapp', ['grouped']],
    ['values of one group alone', three.map((one) => ({ ...one, group: 'x' })), 'hartung-knapp', ['grouped', 'one-value']],
    ['groups of one', three.map((one, i) => ({ ...one, value: 10 * i, group: String(i) })), 'hartung-knapp', []],
  ] as [string, (UncertainValue & { group?: string })[], 'normal' | 'hartung-knapp', string[]][])('warns of %s', (_, values, interval, codes) => {
    expect(poolValues(values, { interval }).warnings.map(({ code }) => code)).toEqual(codes);
  });

  it('has a derivation that arrives at the mean and the interval', () => {
    for (const interval of poolIntervals) {
      const result = poolValues([...five, { value: 52, u: 2, group: 'a' }, { value: 48, u: 2, group: 'a' }], { interval });
      const [group, tau2, mean, error, half] = result.derivation;
      expect(group?.operation).toContain('52 (u 2), 48 (u 2)');
      expect(Number(tau2?.to)).toBe(result.tau2);
      expect(Number(mean?.to)).toBe(result.mean);
      expect(Number(error?.to)).toBe(result.standardError);
      expectClose(Number(half?.to), (result.interval?.[1] as number) - result.mean, 1e-12);
    }
  });

  it('shares the weight among the members', () => {
    const { members } = poolValues([...five, { value: 52, u: 2, group: 'a' }, { value: 48, u: 2, group: 'a' }]);
    expect(members.map(({ indices }) => indices)).toEqual([[0], [1], [2], [3], [4], [5, 6]]);
    expectClose(members.reduce((sum, { weightPercent }) => sum + weightPercent, 0), 100, 1e-12);
  });
});

describe('values of one group', () => {
  // The uncertainties are fully correlated (GUM 5.2.2, note 1) and the scatter counts on top.
  it.each([
    ['a value printed twice adds nothing', [[70, 1], [70, 1]], 70, 1],
    ['scatter adds', [[50, 1], [90, 1]], 70, Math.sqrt(1 + 400)],
    ['weights go by 1/u²', [[60, 1], [65, 2]], 61, Math.sqrt((0.8 + 0.4) ** 2 + 0.8 + 0.2 * 16)],
    ['three', [[1, 1], [2, 1], [3, 1]], 2, Math.sqrt(1 + 1 / 3)],
  ] as [string, [number, number][], number, number][])('%s', (_, pairs, value, u) => {
    const [member, ...others] = groupValues(pairs.map(([one, error]) => ({ value: one, u: error, group: 'a' })));
    expect(others).toEqual([]);
    expectClose(member?.value, value, 1e-14);
    expectClose(member?.u, u, 1e-14);
  });

  it('keeps values without a group apart', () => {
    expect(groupValues([{ value: 1, u: 1 }, { value: 1, u: 1, group: null }, { value: 1, u: 1, group: 'a' }])).toHaveLength(3);
  });

  it('counts a source once, whoever repeats it', () => {
    const repeated = Array.from({ length: 6 }, () => ({ ...(three[0] as UncertainValue), group: 'one paper' }));
    const once = poolValues(three);
    const again = poolValues([...repeated, ...three.slice(1)]);
    expectClose(again.mean, once.mean, 1e-12);
    expectClose(again.standardError, once.standardError, 1e-9);
    expect(again.leaveOneOut.map(({ group }) => group)).toEqual(['one paper', null, null]);
  });
});

describe('what pooling refuses', () => {
  it.each([
    [[], 'values', 'missing-input'],
    [[{ value: 1, u: 0 }], 'values.0.u', 'out-of-range'],
    [[{ value: 1, u: 1 }, { value: 1, u: -1 }], 'values.1.u', 'out-of-range'],
    [[{ value: 1, u: NaN }], 'values.0.u', 'not-finite'],
    [[{ value: 1, u: Infinity }], 'values.0.u', 'not-finite'],
    [[{ value: NaN, u: 1 }], 'values.0.value', 'not-finite'],
    [[{ value: 1, u: 1 }, { value: -Infinity, u: 1 }], 'values.1.value', 'not-finite'],
    [[{ value: 1, u: 1e-200 }, { value: 2, u: 1 }], 'values.0.u', 'out-of-range'],
    [[{ value: 1, u: 1e-100 }, { value: 2, u: 1 }], 'values.1.u', 'out-of-range'],
    [[{ value: 1, u: 1 }, { value: 1e300, u: 1 }], 'values.1.u', 'out-of-range'],
    [[{ value: 1e200, u: 1e190 }, { value: 2e200, u: 1e190 }], 'values.0.u', 'out-of-range'],
    [[{ value: 1e-200, u: 1e-200 }], 'values.0.u', 'out-of-range'],
  ] as [UncertainValue[], string, string][])('%j', (values, path, code) => {
    expect(faultOf(() => poolValues(values))).toEqual([path, code]);
  });

  it('pools what is merely extreme, and nothing it returns is infinite', () => {
    for (const model of poolModels) {
      for (const values of [[{ value: 1e140, u: 1e130 }, { value: 1.5e140, u: 1e139 }], [{ value: 1e-140, u: 1e-150 }, { value: 2e-140, u: 1e-141 }]]) {
        const { mean, standardError, tau2, interval } = poolValues(values, { model, interval: 'normal' });
        for (const number of [mean, standardError, ...(interval ?? [])]) expect(Number.isFinite(number)).toBe(true);
        expect(mean).toBeGreaterThanOrEqual(values[0]?.value as number);
        expect(tau2).toBeGreaterThanOrEqual(0);
      }
    }
  });
});

describe('the calculator', () => {
  const run = (input: unknown) => runCalculator(poolCalculator, input);

  it('answers with what its output schema declares', () => {
    const calculation = run({ values: [...three, { value: 44, u: 1, group: 'a' }, { value: 45, u: 1, group: 'a' }] });
    const { derivation, ...result } = 'result' in calculation ? calculation.result : { derivation: [] };
    expect(poolCalculator.output.strict().parse({ ...result, derivation })).toEqual({ ...result, derivation });
    expect(result).toMatchObject({ model: 'reml', intervalKind: 'hartung-knapp', k: 4 });
  });

  it.each([
    [{ values: [] }, 'values'],
    [{ values: [{ value: 1, u: 0 }] }, 'values.0.u'],
    [{ values: [{ value: 1 }] }, 'values.0.u'],
    [{ values: [{ value: 1, u: 1 }], model: 'guess' }, 'model'],
    [{ values: [{ value: 1, u: 1 }], interval: 'wide' }, 'interval'],
    [{ values: Array.from({ length: 101 }, () => ({ value: 1, u: 1 })) }, 'values'],
    [{ values: [{ value: 1, u: 1, v: 2 }] }, 'values.0'],
  ])('%j is refused', (input, path) => {
    const calculation = run(input);
    expect('faults' in calculation ? calculation.faults.map((fault) => fault.path) : []).toEqual([path]);
  });
});
