import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { changeBasis, rateAt, rateEvaluator, twoTemperature } from '#shared/kinetics/arrhenius.ts';
import { R } from '#shared/kinetics/constants.ts';
import { quantityText } from '#shared/kinetics/derivation.ts';
import { convertEnergy, energyUnits } from '#shared/kinetics/energy.ts';
import { arrheniusToEyring, eyringToArrhenius } from '#shared/kinetics/eyring.ts';
import { fitArrhenius } from '#shared/kinetics/fit.ts';
import { poolModels } from '#shared/kinetics/heterogeneity.ts';
import { poolValues } from '#shared/kinetics/pool.ts';
import { readPrintedValue } from '#shared/kinetics/printed-value.ts';
import { convertQuantity } from '#shared/kinetics/quantity.ts';
import { convertRateConstant } from '#shared/kinetics/rate-constant.ts';
import { reverseStep } from '#shared/kinetics/reverse.ts';
import { listUnits } from '#shared/kinetics/units.ts';
import { expectClose } from './reference.ts';

// One seed, so that a failure can be run again.
const runs = { seed: 20_260_301, numRuns: 300 };
const real = (min: number, max: number) => fc.double({ min, max, noNaN: true });
/** Positive numbers over many powers of ten. */
const positive = (from: number, to: number) => fc.tuple(real(1, 10), fc.integer({ min: from, max: to })).map(([mantissa, exponent]) => mantissa * 10 ** exponent);
const temperature = real(80, 2500);
const check = <T extends unknown[]>(arbitraries: { [K in keyof T]: fc.Arbitrary<T[K]> }, holds: (...values: T) => void): void => {
  fc.assert(fc.property(...(arbitraries as unknown as [fc.Arbitrary<T[0]>]), holds as unknown as (first: T[0]) => void), runs);
};

describe('conversions', () => {
  const energyUnit = fc.constantFrom(...energyUnits);
  it('of an energy there and back is the identity, and a way over a third unit is the direct way', () => {
    check([positive(-12, 12), energyUnit, energyUnit, energyUnit, fc.boolean()], (size, from, over, to, negative) => {
      const value = negative ? -size : size;
      const convert = (number: number, a: string, b: string): number => convertEnergy({ value: number, from: a, to: b }).value;
      expectClose(convert(convert(value, from, to), to, from), value, 1e-14);
      expectClose(convert(convert(value, from, over), over, to), convert(value, from, to), 1e-14);
    });
  });

  // Every order and basis: per site, areal, pressure, concentration of second and third order, per area.
  const families = (['first-order', 'second-order-gas', 'second-order-surface', 'third-order-gas', 'pressure', 'areal-rate', 'mass-rate'] as const)
    .map((kind) => listUnits(kind).map(({ symbol }) => symbol).filter((symbol) => !symbol.includes('ML')));
  const convert = (value: number, from: string, to: string, temperatureK: number, siteDensityPerM2: number): number => convertRateConstant({ value, from, to, temperatureK, siteDensityPerM2 }).value;
  it('of a rate constant there and back is the identity for every order and basis, and a way over a third unit is the direct way', () => {
    const three = fc.constantFrom(...families).chain((units) => fc.tuple(fc.constantFrom(...units), fc.constantFrom(...units), fc.constantFrom(...units)));
    check([positive(-30, 30), three, temperature, positive(17, 20)], (value, [from, over, to], T, density) => {
      expectClose(convert(convert(value, from, to, T, density), to, from, T, density), value, 1e-13);
      expectClose(convert(convert(value, from, over, T, density), over, to, T, density), convert(value, from, to, T, density), 1e-13);
    });
  });

  it('between concentration and pressure, areal and site, do not depend on the order of the operations', () => {
    const concentration = fc.constantFrom('cm3 molecule-1 s-1', 'L mol-1 s-1', 'm3 mol-1 s-1', 'M-1 s-1');
    const pressure = fc.constantFrom('Pa-1 s-1', 'Torr-1 s-1', 'bar-1 s-1', 'atm-1 s-1');
    check([positive(-20, 20), concentration, pressure, concentration, pressure, temperature], (value, c1, p1, c2, p2, T) => {
      const direct = convert(value, c1, p2, T, 1e19);
      expectClose(convert(convert(value, c1, p1, T, 1e19), p1, p2, T, 1e19), direct, 1e-13);
      expectClose(convert(convert(value, c1, c2, T, 1e19), c2, p2, T, 1e19), direct, 1e-13);
      expectClose(convert(direct, p2, c1, T, 1e19), value, 1e-13);
    });
    check([positive(-20, 20), fc.constantFrom('cm2 molecule-1 s-1', 'm2 mol-1 s-1'), fc.constantFrom('s-1', 'min-1', 'h-1'), positive(17, 20)], (value, areal, site, density) => {
      expectClose(convert(convert(value, areal, site, 300, density), site, areal, 300, density), value, 1e-13);
    });
  });

  it('carry a relative uncertainty unchanged', () => {
    check([positive(-10, 10), real(1e-6, 1), energyUnit, energyUnit], (value, share, from, to) => {
      const result = convertEnergy({ value, from, to, standardUncertainty: value * share });
      expectClose((result.standardUncertainty as number) / result.value, share, 1e-13);
    });
  });
});

describe('a printed value', () => {
  const decimals = fc.tuple(fc.integer({ min: 0, max: 999_999 }), fc.integer({ min: 0, max: 5 }), fc.boolean()).map(([digits, places, negative]) => `${negative && digits > 0 ? '-' : ''}${(digits / 10 ** places).toFixed(places)}`);
  it('is read to the double it stands for, with or without a power of ten, in every way of writing it', () => {
    check([decimals, fc.integer({ min: -40, max: 40 }), fc.constantFrom('e', 'E', 'D', ' x 10^', ' × 10^', '·10^')], (digits, exponent, way) => {
      expect(readPrintedValue(digits).value).toBe(Number(digits));
      expect(readPrintedValue(`${digits}${way}${exponent}`).value).toBe(Number(`${digits}e${exponent}`));
      expect(readPrintedValue(digits.replace('-', '\u2212')).value).toBe(Number(digits));
    });
  });

  it('printed from a number, read and printed again is the same text', () => {
    check([fc.double({ noNaN: true, noDefaultInfinity: true }), fc.constantFrom('', 'kJ/mol', 's-1', 'cm2 molecule-1 s-1')], (value, unit) => {
      const text = quantityText(value === 0 ? 0 : value, unit);
      const read = readPrintedValue(text);
      expect(quantityText(read.value as number, read.unit ?? '')).toBe(text);
    });
  });

  it('with its uncertainty in three notations has one standard uncertainty', () => {
    check([fc.integer({ min: 1, max: 9999 }), fc.integer({ min: 1, max: 99 }), fc.integer({ min: 0, max: 3 })], (digits, last, places) => {
      const value = (digits / 10 ** places).toFixed(places);
      const u = (last / 10 ** places).toFixed(places);
      const concise = readPrintedValue(`${value}(${last})`);
      const plain = convertQuantity({ symbol: 'energy', asPrinted: `${value} ± ${u}`, unitAsPrinted: 'kJ/mol', uncertaintyKind: 'standard' }, {});
      const expanded = convertQuantity({ symbol: 'energy', asPrinted: `${value} ± ${u}`, unitAsPrinted: 'kJ/mol', uncertaintyKind: 'expanded', coverageFactor: 2 }, {});
      expectClose(concise.standardUncertainty, Number(u), 1e-12);
      expectClose(plain.standardUncertainty, Number(u), 1e-12);
      expectClose(expanded.standardUncertainty, Number(u) / 2, 1e-12);
    });
  });
});

describe('k(T)', () => {
  const parameters = fc.record({ preExponential: positive(0, 18), exponent: real(-3, 3), referenceTemperatureK: fc.constantFrom(1, 298.15, 300), energyKJPerMol: real(-50, 300) });
  it('is the same from the prepared evaluator and with a derivation', () => {
    check([parameters, temperature, real(0, 2), real(0, 10), real(-1, 1)], (given, temperatureK, uLnPreExponential, uEnergyKJPerMol, correlation) => {
      const input = { ...given, uLnPreExponential, uEnergyKJPerMol, correlation };
      const evaluator = rateEvaluator(input);
      const full = rateAt({ ...input, temperatureK });
      expect(Math.abs(evaluator.lnK(temperatureK) - full.lnK)).toBeLessThan(1e-11);
      expect(evaluator.uLnK(temperatureK)).toBe(full.uLnK);
      expect(evaluator.uLnKRange(temperatureK)).toBeNull();
      // No correlation can lead outside the interval that is given when none is known.
      const [least, greatest] = rateEvaluator({ ...input, correlation: null }).uLnKRange(temperatureK) ?? [full.uLnK as number, full.uLnK as number];
      expect((full.uLnK as number) - least).toBeGreaterThan(-1e-7);
      expect(greatest - (full.uLnK as number)).toBeGreaterThan(-1e-7);
    });
  });

  it('at two temperatures gives A and E back', () => {
    check([positive(0, 16), real(1, 200), real(200, 1000), real(1.05, 2)], (A, E, T, ratio) => {
      const lnK = (temperatureK: number): number => rateAt({ preExponential: A, energyKJPerMol: E, temperatureK }).lnK;
      const found = twoTemperature({ k1: Math.exp(lnK(T)), temperature1K: T, k2: Math.exp(lnK(T * ratio)), temperature2K: T * ratio });
      expect(Math.abs(found.energyKJPerMol - E)).toBeLessThan(1e-9 * (E + 100));
      expect(Math.abs(found.lnPreExponential - Math.log(A))).toBeLessThan(1e-9 * (100 + E));
    });
  });

  it('keeps its value at every T through a change of basis there and back, and through several at once', () => {
    check([parameters, temperature, fc.constantFrom(0.5, 1, 1.5, 2), fc.constantFrom(-1, 0.5, 1)], (given, temperatureK, gasOrder, more) => {
      const there = changeBasis({ ...given, gasOrder, from: 'concentration', to: 'pressure' });
      const back = changeBasis({ ...there, gasOrder, from: 'pressure', to: 'concentration' });
      expect(Math.abs(rateAt({ ...back, temperatureK }).lnK - rateAt({ ...given, temperatureK }).lnK)).toBeLessThan(1e-9);
      const twice = changeBasis({ ...there, gasOrder: more, from: 'concentration', to: 'pressure' });
      const once = changeBasis({ ...given, gasOrder: gasOrder + more, from: 'concentration', to: 'pressure' });
      expectClose(twice.preExponential, once.preExponential, 1e-12);
      expect(twice.exponent).toBeCloseTo(once.exponent, 12);
    });
  });

  it('goes to Eyring parameters and back for every phase, molecularity and standard state', () => {
    const system = fc.record({ temperatureK: temperature, phase: fc.constantFrom('surface', 'gas', 'gas-surface'), molecularity: fc.constantFrom(1, 2), transmission: real(0.1, 3), standardState: fc.constantFrom('1 bar', '1 mol/L') } as const);
    check([system, real(-20, 200), real(-250, 100)], (given, enthalpyKJPerMol, entropyJPerMolK) => {
      const there = eyringToArrhenius({ ...given, enthalpyKJPerMol, entropyJPerMolK });
      const back = arrheniusToEyring({ ...given, preExponential: there.preExponential, energyKJPerMol: there.energyKJPerMol });
      expect(Math.abs(back.enthalpyKJPerMol - enthalpyKJPerMol)).toBeLessThan(1e-10);
      expect(Math.abs(back.entropyJPerMolK - entropyJPerMolK)).toBeLessThan(1e-10);
      // A and E are tangent at T: there they give the very k of the Eyring equation.
      const lnK = rateAt({ preExponential: there.preExponential, energyKJPerMol: there.energyKJPerMol, temperatureK: given.temperatureK }).lnK;
      if (there.k > 0) expect(Math.abs(lnK - Math.log(there.k))).toBeLessThan(1e-9);
    });
  });
});

describe('a reverse step', () => {
  const forward = fc.record({
    energyForwardKJPerMol: real(-20, 250), preExponentialForward: positive(-3, 18), exponentForward: fc.constantFrom(-1, 0, 0.5, 2), reactionEnthalpyKJPerMol: real(-200, 200), reactionEntropyJPerMolK: real(-200, 200),
    gasMoleChange: fc.constantFrom(-2, -1, 0, 1, 2), standardPressurePa: fc.constantFrom(1e5, 101_325), basis: fc.constantFrom('pressure', 'concentration'), referenceTemperatureK: fc.constantFrom(1, 298.15), temperatureK: real(250, 1500),
  } as const);

  it('reversed again is the forward step, at every T', () => {
    check([forward], (step) => {
      const there = reverseStep(step);
      const back = reverseStep({
        ...step, energyForwardKJPerMol: there.energyReverseKJPerMol, preExponentialForward: there.preExponentialReverse as number, exponentForward: there.exponentReverse,
        reactionEnthalpyKJPerMol: -step.reactionEnthalpyKJPerMol, reactionEntropyJPerMolK: -step.reactionEntropyJPerMolK, gasMoleChange: -step.gasMoleChange,
      });
      expect(Math.abs(back.energyReverseKJPerMol - step.energyForwardKJPerMol)).toBeLessThan(1e-10);
      expectClose(back.preExponentialReverse, step.preExponentialForward, 1e-11);
      expect(back.exponentReverse).toBeCloseTo(step.exponentForward, 12);
      // Detailed balance in logarithms: ln k_f - ln k_r = ln K, and the way back has the inverse.
      expect(Math.abs((there.lnEquilibriumConstant as number) + (back.lnEquilibriumConstant as number))).toBeLessThan(1e-9);
    });
  });
});

describe('a fit', () => {
  const noisy = fc.tuple(real(15, 35), real(20, 150), fc.array(real(-0.3, 0.3), { minLength: 4, maxLength: 15 })).map(([lnA, E, noise]) => noise.map((one, i) => {
    const temperatureK = 350 + 30 * i;
    return { temperatureK, k: Math.exp(lnA - (E * 1000) / (R * temperatureK) + one) };
  }));
  const fit = (points: { temperatureK: number; k: number; u?: number }[]) => fitArrhenius({ points, weights: 'none', covariance: 'scaled' });

  it('of k times a factor moves ln A by its logarithm and nothing else', () => {
    check([noisy, positive(-8, 8)], (points, factor) => {
      const before = fit(points);
      const after = fit(points.map(({ temperatureK, k }) => ({ temperatureK, k: k * factor })));
      expect(Math.abs(after.lnPreExponential - before.lnPreExponential - Math.log(factor))).toBeLessThan(1e-9);
      expect(Math.abs(after.energyKJPerMol - before.energyKJPerMol)).toBeLessThan(1e-9);
      expect(Math.abs((after.uEnergyKJPerMol as number) - (before.uEnergyKJPerMol as number))).toBeLessThan(1e-9);
      expectClose(after.correlation, before.correlation, 1e-12);
    });
  });

  it('of 1/T shifted leaves E as it is', () => {
    check([noisy, real(0, 1e-3)], (points, shift) => {
      const before = fit(points);
      const after = fit(points.map(({ temperatureK, k }) => ({ temperatureK: 1 / (1 / temperatureK + shift), k })));
      expect(Math.abs(after.energyKJPerMol - before.energyKJPerMol)).toBeLessThan(1e-7);
      expect(Math.abs(after.lnPreExponential - before.lnPreExponential - (before.energyKJPerMol * 1000 * shift) / R)).toBeLessThan(1e-7);
      expect(Math.abs((after.residualSd as number) - (before.residualSd as number))).toBeLessThan(1e-9);
    });
  });

  it('does not depend on the order of the points, and equal weights are no weights', () => {
    check([noisy, real(0.01, 0.5)], (points, share) => {
      const before = fit(points);
      const turned = fit([...points].reverse());
      expect(Math.abs(turned.energyKJPerMol - before.energyKJPerMol)).toBeLessThan(1e-9);
      const weighted = fitArrhenius({ points: points.map(({ temperatureK, k }) => ({ temperatureK, k, u: k * share })), weights: 'given', covariance: 'scaled' });
      expect(Math.abs(weighted.energyKJPerMol - before.energyKJPerMol)).toBeLessThan(1e-8);
      expect(Math.abs((weighted.uEnergyKJPerMol as number) - (before.uEnergyKJPerMol as number))).toBeLessThan(1e-9);
    });
  });
});

describe('a pooled mean', () => {
  const values = fc.array(fc.record({ value: real(-100, 300), u: real(0.2, 20) }), { minLength: 2, maxLength: 10 });
  const model = fc.constantFrom(...poolModels);
  const kind = fc.constantFrom('hartung-knapp', 'normal');

  it('moves and stretches with the values', () => {
    check([values, model, kind, real(-200, 200), real(0.1, 10)], (list, chosen, interval, shift, scale) => {
      const options = { model: chosen, interval } as const;
      const before = poolValues(list, options);
      const after = poolValues(list.map(({ value, u }) => ({ value: value * scale + shift, u: u * scale })), options);
      const size = Math.max(...list.map(({ value }) => Math.abs(value))) * scale + Math.abs(shift) + 1;
      expect(Math.abs(after.mean - (before.mean * scale + shift))).toBeLessThan(1e-6 * size);
      expect(Math.abs((after.tau2 ?? 0) - (before.tau2 ?? 0) * scale * scale)).toBeLessThan(1e-6 * size * size);
      expect(Math.abs(after.standardError - before.standardError * scale)).toBeLessThan(1e-5 * size);
    });
  });

  it('lies among the values, whatever their order', () => {
    check([values, model], (list, chosen) => {
      const pooled = poolValues(list, { model: chosen, interval: 'normal' });
      const all = list.map(({ value }) => value);
      expect(pooled.mean).toBeGreaterThanOrEqual(Math.min(...all) - 1e-9);
      expect(pooled.mean).toBeLessThanOrEqual(Math.max(...all) + 1e-9);
      expect(Math.abs(poolValues([...list].reverse(), { model: chosen, interval: 'normal' }).mean - pooled.mean)).toBeLessThan(1e-6);
    });
  });
});
