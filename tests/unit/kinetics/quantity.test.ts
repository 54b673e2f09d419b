import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readColumnHeader } from '#shared/kinetics/column-header.ts';
import { N_A, R } from '#shared/kinetics/constants.ts';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import { convertQuantity, quantitySymbols, type QuantityInput } from '#shared/kinetics/quantity.ts';
import { splitUnitPower } from '#shared/kinetics/quantity-unit.ts';
import type { QuantityContext } from '#shared/kinetics/quantity-symbols.ts';
import { expectClose } from './reference.ts';

const surface1: QuantityContext = { gasOrder: 0, surfaceOrder: 1 };
const surface2: QuantityContext = { gasOrder: 0, surfaceOrder: 2 };
const adsorption: QuantityContext = { gasOrder: 1, surfaceOrder: 1 };

describe('conversion of a quantity', () => {
  it('keeps a bare ± without a standard uncertainty', () => {
    const energy = convertQuantity({ symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol' }, {});
    expect(energy).toMatchObject({
      symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', bound: '=', value: 186.188, low: null, high: null, unit: 'kJ/mol',
      reportedUncertainty: 1.4, uncertaintyKind: 'unknown', uncertaintyScale: 'linear', standardUncertainty: null, significantDigits: 3,
      printed: { value: 44.5, low: null, high: null, standardUncertainty: null }, unitId: 'kcal/mol',
    });
    expect(energy.missing).toBeUndefined();
    expect(energy.derivation.map((line) => line.operation)).toEqual(['Read the printed value', 'Thermochemical calorie, × 4.184 exactly']);
    expect(energy.derivation.every((line) => line.reference.length > 0)).toBe(true);
  });

  it.each([
    [{ symbol: 'energy', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', uncertaintyKind: 'standard' }, {}, 186.188, 5.8576],
    [{ symbol: 'energy', asPrinted: '44.5(14)', unitAsPrinted: 'kcal/mol' }, {}, 186.188, 5.8576],
    [{ symbol: 'energy', asPrinted: '25 ± 3', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'expanded', coverageFactor: 2 }, {}, 25, 1.5],
    [{ symbol: 'energy', asPrinted: '25 kJ/mol' }, {}, 25, null],
    [{ symbol: 'reactionEnergy', asPrinted: '-1.0', unitAsPrinted: 'eV' }, {}, -96.48533212331, null],
    [{ symbol: 'adsorptionEnergy', asPrinted: '-100', unitAsPrinted: 'kJ/mol' }, {}, -100, null],
    [{ symbol: 'coverageSlope', asPrinted: '10', unitAsPrinted: 'kJ mol-1 ML-1' }, {}, 10, null],
    [{ symbol: 'coverageSlope', asPrinted: '10', unitAsPrinted: 'kcal/mol' }, {}, 41.84, null],
    [{ symbol: 'activationEntropy', asPrinted: '-10', unitAsPrinted: 'e.u.' }, {}, -41.84, null],
    [{ symbol: 'activationEntropy', asPrinted: '2', unitAsPrinted: 'kB' }, {}, 2 * R, null],
    [{ symbol: 'diffusionCoefficient', asPrinted: '3', unitAsPrinted: 'cm2/s' }, {}, 3e-4, null],
    [{ symbol: 'equilibriumConstant', asPrinted: '3', unitAsPrinted: 'bar-1' }, {}, 3e-5, null],
    [{ symbol: 'equilibriumConstant', asPrinted: '3' }, {}, 3, null],
    [{ symbol: 'kie', asPrinted: '1.9(1)' }, {}, 1.9, 0.1],
    [{ symbol: 'stickingCoefficient', asPrinted: '2 %' }, {}, 0.02, null],
    [{ symbol: 'exponent', asPrinted: '0.5' }, {}, 0.5, null],
    [{ symbol: 'reactionOrder', asPrinted: '-0.3 ± 0.1', uncertaintyKind: 'standard' }, {}, -0.3, 0.1],
    [{ symbol: 'referenceTemperature', asPrinted: '298', unitAsPrinted: 'K' }, {}, 298, null],
    [{ symbol: 'turnoverRate', asPrinted: '0.5', unitAsPrinted: 's-1' }, {}, 0.5, null],
    [{ symbol: 'preExponential', asPrinted: '10^13', unitAsPrinted: 's-1' }, surface1, 1e13, null],
    [{ symbol: 'preExponential', asPrinted: '2.1', unitAsPrinted: '10^13 s-1' }, surface1, 2.1e13, null],
    [{ symbol: 'preExponential', asPrinted: '0.6', unitAsPrinted: '1' }, adsorption, 0.6, null],
    [{ symbol: 'rateConstant', asPrinted: '6 ± 3', unitAsPrinted: 'min-1', uncertaintyKind: 'standard' }, surface1, 0.1, 0.05],
    [{ symbol: 'rateConstant', asPrinted: '2', unitAsPrinted: 's-1', multiplier: 1e-3 }, surface1, 2e-3, null],
  ] as [QuantityInput, QuantityContext, number, number | null][])('%j', (input, context, value, u) => {
    const result = convertQuantity(input, context);
    expectClose(result.value, value, 1e-14);
    if (u === null) expect(result.standardUncertainty).toBeNull();
    else expectClose(result.standardUncertainty, u, 1e-14);
  });

  it('keeps bounds and ranges', () => {
    expect(convertQuantity({ symbol: 'energy', asPrinted: '<1', unitAsPrinted: 'kcal/mol' }, {})).toMatchObject({ bound: '<', value: 4.184, high: 4.184, low: null });
    expect(convertQuantity({ symbol: 'energy', asPrinted: '>1', unitAsPrinted: 'kcal/mol' }, {})).toMatchObject({ bound: '>', value: 4.184, low: 4.184, high: null });
    expect(convertQuantity({ symbol: 'energy', asPrinted: '24–27', unitAsPrinted: 'kcal/mol' }, {})).toMatchObject({ bound: 'range', value: null, low: 100.416, high: 112.968, printed: { value: null, low: 24, high: 27 } });
    expect(convertQuantity({ symbol: 'preExponential', asPrinted: '10^12-10^14', unitAsPrinted: 's-1' }, surface1)).toMatchObject({ value: null, low: 1e12, high: 1e14, siteValue: null, siteUnit: 's-1' });
    expect(convertQuantity({ symbol: 'energy', asPrinted: '≈ 25', unitAsPrinted: 'kJ/mol' }, {}).derivation[0]?.to).toBe('≈ 25 kJ/mol');
  });

  it('leaves an uncertainty of the logarithm as it is', () => {
    const factor = convertQuantity({ symbol: 'preExponential', asPrinted: '10^13.5±0.4', unitAsPrinted: 'min-1', uncertaintyKind: 'standard' }, surface1);
    expect(factor.uncertaintyScale).toBe('ln');
    expectClose(factor.standardUncertainty, 0.4 * Math.LN10, 1e-14);
    expectClose(factor.value, 10 ** 13.5 / 60, 1e-14);
  });

  it('keeps asymmetric figures', () => {
    expect(convertQuantity({ symbol: 'energy', asPrinted: '25 +2/-3', unitAsPrinted: 'kJ/mol', uncertaintyKind: 'standard' }, {})).toMatchObject({ reportedMinus: 3, reportedPlus: 2, reportedUncertainty: null, standardUncertainty: null });
  });

  it('says what a standard uncertainty still needs', () => {
    const base = { symbol: 'energy', asPrinted: '25 ± 3', unitAsPrinted: 'kJ/mol' } as const;
    expect(convertQuantity({ ...base, uncertaintyKind: 'expanded' }, {}).missing).toEqual(['coverage factor']);
    expect(convertQuantity({ ...base, uncertaintyKind: 'confidence' }, {}).missing).toEqual(['confidence level']);
    expect(convertQuantity({ ...base, uncertaintyKind: 'none' }, {})).toMatchObject({ uncertaintyKind: 'unknown', standardUncertainty: null });
    expect(convertQuantity({ ...base, asPrinted: '25', uncertaintyKind: 'expanded' }, {}).missing).toBeUndefined();
  });

  it('writes the multiplier into the derivation', () => {
    const { derivation } = convertQuantity({ symbol: 'rateConstant', asPrinted: '2.5', unitAsPrinted: '10^3 s-1', multiplier: 1e-6 }, surface1);
    expect(derivation.map((line) => line.operation)).toEqual(['Read the printed value', 'Multiplier of the column heading', 'Power of ten printed with the unit']);
    expect(derivation.at(-1)?.to).toBe('0.0025 s-1');
    expect(() => convertQuantity({ symbol: 'kie', asPrinted: '2', multiplier: 0 }, {})).toThrow('multiplier must be above 0');
  });
});

describe('rate basis', () => {
  const density = 1.5e19;
  it('is already per site for a first-order surface step', () => {
    expect(convertQuantity({ symbol: 'preExponential', asPrinted: '10^13', unitAsPrinted: 's-1' }, surface1)).toMatchObject({ siteValue: 1e13, siteUnit: 's-1' });
  });

  it('needs a site density for an areal second-order constant, once', () => {
    const input = { symbol: 'preExponential', asPrinted: '1e-2', unitAsPrinted: 'cm2 molecule-1 s-1' } as const;
    const without = convertQuantity(input, surface2);
    expect(without).toMatchObject({ unit: 'm2 mol-1 s-1', missing: ['site density'] });
    expect(without.siteValue).toBeUndefined();
    expectClose(without.value, 1e-6 * N_A, 1e-14);
    const known = convertQuantity(input, { ...surface2, siteDensityPerM2: density, siteDensitySource: 'lattice constant' });
    expectClose(known.siteValue, 1.5e13, 1e-14);
    expect(known.siteUnit).toBe('s-1');
    expect(known.derivation.at(-1)?.assumption).toBe('site density 1.5e19 m-2, lattice constant');
  });

  it('divides a rate per area by the site density', () => {
    expectClose(convertQuantity({ symbol: 'rateConstant', asPrinted: '1.5e15', unitAsPrinted: 'molecule cm-2 s-1' }, { ...surface2, siteDensityPerM2: density }).siteValue, 1, 1e-14);
    expectClose(convertQuantity({ symbol: 'turnoverRate', asPrinted: '3e15', unitAsPrinted: 'molecule cm-2 s-1' }, { siteDensityPerM2: density }).siteValue, 2, 1e-14);
    // A rate per area with coverages and (1-θ) gives k/Γ, not k.
    const rate = convertQuantity({ symbol: 'rateConstant', asPrinted: '1', unitAsPrinted: 'mol m-2 s-1 Pa-1' }, { ...adsorption, siteDensityPerM2: density });
    expectClose(rate.siteValue, N_A / density, 1e-14);
    expect(rate.siteUnit).toBe('Pa-1 s-1');
  });

  it('halves the consumption rate of 2A* -> A2', () => {
    const base = { symbol: 'rateConstant', asPrinted: '10', unitAsPrinted: 's-1' } as const;
    expect(convertQuantity(base, { ...surface2, rateOf: { consumption: 'N*', coefficient: 2 } }).value).toBe(5);
    expect(convertQuantity(base, { ...surface2, rateOf: 'event' }).value).toBe(10);
    const unknown = convertQuantity(base, { ...surface2, rateOf: 'unknown' });
    expect(unknown.value).toBe(10);
    expect(unknown.derivation.some((line) => line.assumption?.includes('± ln 2'))).toBe(true);
    expect(() => convertQuantity(base, { ...surface2, rateOf: { consumption: 'N*', coefficient: 0 } })).toThrow('must be above 0');
  });

  it('changes the gas basis at T for k, exactly in T for A', () => {
    const k = { symbol: 'rateConstant', asPrinted: '2.5e-12', unitAsPrinted: 'cm3 molecule-1 s-1' } as const;
    expect(convertQuantity(k, adsorption).missing).toEqual(['temperature']);
    // R-case of the reference file: 2.5e-12 cm3 molecule-1 s-1 at 300 K is 80470.83 Torr-1 s-1.
    expectClose((convertQuantity(k, { ...adsorption, temperatureK: 300 }).siteValue as number) * (101325 / 760), 80470.831966858, 1e-13);
    const A = convertQuantity({ ...k, symbol: 'preExponential' }, { ...adsorption, referenceTemperatureK: 298.15 });
    expect(A).toMatchObject({ siteUnit: 'Pa-1 s-1', siteExponentChange: -1 });
    expectClose(A.siteValue, (2.5e-12 * 1e-6 * N_A) / (R * 298.15), 1e-14);
    expect(convertQuantity({ ...k, symbol: 'preExponential' }, adsorption).derivation.at(-1)?.assumption).toContain('as none is stated');
  });

  it('reads a monolayer as a site only when told so', () => {
    const input = { symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 'ML-1 s-1' } as const;
    expect(convertQuantity(input, surface2)).toMatchObject({ unit: 'ML-1 s-1', missing: ['coverage definition: 1 ML as one per site'] });
    expect(convertQuantity(input, { ...surface2, coverageDefinition: 'per-adsorption-site' })).toMatchObject({ siteValue: 3, siteUnit: 's-1' });
  });

  it('scales a coverage relative to saturation', () => {
    const input = { symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 's-1' } as const;
    expect(convertQuantity(input, { ...surface2, coverageDefinition: 'relative-to-saturation' }).missing).toEqual(['saturation coverage']);
    expectClose(convertQuantity(input, { ...surface2, coverageDefinition: 'relative-to-saturation', saturationCoverage: 0.5 }).siteValue, 6, 1e-14);
    expect(convertQuantity(input, { ...surface1, coverageDefinition: 'relative-to-saturation' }).siteValue).toBe(3);
  });

  it('needs the sites of a mass', () => {
    const input = { symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 'mol g-1 s-1 bar-0.3' } as const;
    const context = { kineticOrders: { NH3: 0.3 } };
    expect(convertQuantity(input, context)).toMatchObject({ unit: 'mol kg-1 Pa-0.3 s-1', missing: ['sites per mass'] });
    const known = convertQuantity(input, { ...context, sitesPerKg: 2 * N_A });
    expect(known.siteUnit).toBe('Pa-0.3 s-1');
    expectClose(known.siteValue, (known.value as number) / 2, 1e-14);
  });

  it('brings a constant per pair to mean field only with the number of neighbours', () => {
    // A site with z neighbours: z k θ_A θ_B for unlike pairs, (z/2) k θ² for like ones (mean field of a lattice, common practice).
    const input = { symbol: 'rateConstant', asPrinted: '4', unitAsPrinted: 's-1' } as const;
    const pairs = { ...surface2, perPair: true, likePair: true, rateOf: 'unknown' } as const;
    expect(convertQuantity(input, { ...pairs, nearestNeighbours: 6 })).toMatchObject({ value: 4, unit: 's-1', siteValue: 12, siteUnit: 's-1' });
    expect(convertQuantity(input, { ...pairs, nearestNeighbours: 6, likePair: false }).siteValue).toBe(24);
    const { derivation } = convertQuantity(input, { ...pairs, nearestNeighbours: 6 });
    expect(derivation.at(-1)).toMatchObject({ operation: expect.stringContaining('per pair of like neighbours'), from: '4 s-1', to: '12 s-1', assumption: '6 nearest neighbours, given; the species are mixed at random' });
    // A pair is an event: nothing is left open about a factor of 2.
    expect(derivation.map(({ operation }) => operation)).not.toContain('Rate convention not stated');
    const without = convertQuantity(input, pairs);
    expect(without).toMatchObject({ value: 4, missing: ['number of nearest neighbours'] });
    expect(without).not.toHaveProperty('siteValue');
    expect(convertQuantity({ ...input, symbol: 'preExponential' }, { ...pairs, nearestNeighbours: 4, likePair: false }).siteValue).toBe(16);
    expect(convertQuantity(input, { ...pairs, nearestNeighbours: 6, likePair: null }).missing).toEqual(['whether the pair is of one species']);
    expect(convertQuantity(input, { ...surface1, perPair: true, nearestNeighbours: 6 }).missing).toEqual(['two surface species for a constant per pair']);
    expect(convertQuantity(input, { perPair: true }).missing).toEqual(['number of nearest neighbours', 'two surface species for a constant per pair']);
    expect(convertQuantity({ ...input, unitAsPrinted: 'ML-1 s-1' }, pairs).missing).toEqual(['coverage definition: 1 ML as one per site', 'number of nearest neighbours']);
    // Whatever is no rate constant of the step, or not said to be per pair, is left as it is.
    expect(convertQuantity({ ...input, symbol: 'turnoverRate' }, pairs).siteValue).toBe(4);
    expect(convertQuantity(input, { ...pairs, perPair: false }).siteValue).toBe(4);
    expect(() => convertQuantity(input, { ...pairs, nearestNeighbours: 0 })).toThrow('the number of nearest neighbours must be above 0');
  });

  it.each([
    ['s-1', surface1], ['s-1', surface2], ['h-1', surface2], ['mol m-2 s-1', surface2], ['cm2 mol-1 s-1', surface2], ['ML-1 s-1', surface2], ['ML s-1', surface2],
    ['Pa-1 s-1', adsorption], ['cm3 molecule-1 s-1', adsorption], ['cm3 s-1', adsorption], ['m s-1', adsorption], ['molecule cm-2 s-1 Torr-1', adsorption], ['cm-2 s-1', surface1],
    ['m4 mol-2 s-1', { gasOrder: 0, surfaceOrder: 3 }], ['m2 mol-1 s-1', { gasOrder: 0, surfaceOrder: 3 }],
    ['cm3 molecule-1 s-1', { gasOrder: 2, surfaceOrder: 0 }], ['mol kg-1 s-1', surface2], ['mol g-1 s-1 bar-0.3', { gasOrder: 2, surfaceOrder: 0, kineticOrders: { 'NH3': 0.8, 'H2': -0.5 } }],
    ['Pa-0.5 s-1', { gasOrder: 0.5, surfaceOrder: 1 }], ['s-1', {}], ['cm3 s-1', {}], ['m2 mol-1 s-1', { kineticOrders: { 'N*': 1, '*': 1 } }], ['s-1', { gasOrder: 2, surfaceOrder: 0, kineticOrders: {} , }],
  ] as [string, QuantityContext][])('takes %s for %j', (unitAsPrinted, context) => {
    const orders = context.kineticOrders && Object.keys(context.kineticOrders).length === 0 ? { ...context, gasOrder: 0 } : context;
    expect(convertQuantity({ symbol: 'rateConstant', asPrinted: '1', unitAsPrinted }, orders).value).toBeGreaterThan(0);
  });

  it.each([
    ['cm2 molecule-1 s-1', surface1, 'unit-contradicts-orders', /orders of the elementary step \(0 in gas, 1 at the surface\).*expected s-1 \(time-1\)/],
    ['s-1', adsorption, 'unit-contradicts-orders', /expected Pa-1 s-1/],
    ['Pa-1 s-1', surface2, 'unit-contradicts-orders', /length2 amount-1 time-1/],
    ['Pa-2 s-1', adsorption, 'unit-contradicts-orders', /pressure-1/],
    ['mol g-1 s-1 bar-1', { kineticOrders: { NH3: 0.3 } }, 'unit-contradicts-orders', /reported orders \(0.3 in gas/],
    ['ML-2 s-1', surface1, 'unit-contradicts-orders', /expected/],
    ['mol m-2 s-1 ML', surface1, 'unit-contradicts-orders', /expected/],
    ['kg s-1', surface1, 'unit-contradicts-orders', /is not the unit of a rate/],
    ['s', surface1, 'unit-contradicts-orders', /is not the unit of a rate/],
    ['kJ/mol', {}, 'incompatible-units', /a unit per time/],
    ['cm2 s-1', surface2, 'ambiguous-unit', /diffusion coefficient/],
    ['cm5 s-1', surface2, 'unit-contradicts-orders', /length5/],
    ['cm3 molecule-1 s-1', { gasOrder: 3, surfaceOrder: 0 }, 'unit-contradicts-orders', /m6 mol-2 s-1/],
  ] as [string, QuantityContext, string, RegExp][])('refuses %s for %j', (unitAsPrinted, context, code, message) => {
    try {
      convertQuantity({ symbol: 'rateConstant', asPrinted: '1', unitAsPrinted }, context);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(KineticsError);
      expect(error).toMatchObject({ code, path: 'unitAsPrinted' });
      expect((error as Error).message).toMatch(message);
    }
  });

  it('gives no site value to a homogeneous gas reaction', () => {
    expect(convertQuantity({ symbol: 'rateConstant', asPrinted: '1', unitAsPrinted: 'cm3 molecule-1 s-1' }, { gasOrder: 2, surfaceOrder: 0 })).not.toHaveProperty('siteValue');
  });
});

describe('refused quantities', () => {
  it.each([
    [{ symbol: 'energy', asPrinted: '25' }, 'missing-input', 'unitAsPrinted'],
    [{ symbol: 'energy', asPrinted: '25', unitAsPrinted: 'parsec' }, 'unknown-unit', 'unitAsPrinted'],
    [{ symbol: 'energy', asPrinted: '25', unitAsPrinted: 's-1' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'energy', asPrinted: 'high', unitAsPrinted: 'eV' }, 'unreadable-value', 'asPrinted'],
    [{ symbol: 'kie', asPrinted: '2', unitAsPrinted: 's' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'diffusionCoefficient', asPrinted: '2', unitAsPrinted: 'cm s-1' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'activationEntropy', asPrinted: '2', unitAsPrinted: 'kJ/mol' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'equilibriumConstant', asPrinted: '2', unitAsPrinted: 's' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'referenceTemperature', asPrinted: '2', unitAsPrinted: 's' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'coverageSlope', asPrinted: '2', unitAsPrinted: 's ML-1' }, 'incompatible-units', 'unitAsPrinted'],
    [{ symbol: 'rateConstant', asPrinted: '1e300', unitAsPrinted: 'cm6 molecule-2 s-1' }, 'not-finite', 'asPrinted'],
    [{ symbol: 'speed' as 'energy', asPrinted: '2' }, 'unsupported', 'symbol'],
  ] as [QuantityInput, string, string][])('%j', (input, code, path) => {
    expect(() => convertQuantity(input, {})).toThrow(expect.objectContaining({ code, path }));
  });

  it('throws nothing but its own error', () => {
    const unit = fc.oneof(fc.constantFrom('', 's-1', 'kJ/mol', 'cm2 s-1', 'cm3 s-1', 'mol g-1 s-1', 'ML-1 s-1', '10^13 s-1', 'K', '%', 'eV K-1'), fc.string({ maxLength: 20 }));
    const text = fc.oneof(fc.constantFrom('25', '25 ± 3', '10^13.5±0.4', '<3', '2-3', '26.4(12)', '25 +2/-3', '3 %'), fc.string({ maxLength: 20 }));
    fc.assert(
      fc.property(fc.constantFrom(...quantitySymbols), text, unit, fc.constantFrom(undefined, 1e-3, 10), fc.record({ gasOrder: fc.constantFrom(undefined, 0, 1, 2), surfaceOrder: fc.constantFrom(undefined, 0, 1, 2), temperatureK: fc.constantFrom(undefined, 500), siteDensityPerM2: fc.constantFrom(undefined, 1e19) }), (symbol, asPrinted, unitAsPrinted, multiplier, context) => {
        try {
          const result = convertQuantity({ symbol, asPrinted, unitAsPrinted, multiplier }, context);
          expect(result.value === null || Number.isFinite(result.value)).toBe(true);
          expect(result.derivation.length).toBeGreaterThan(0);
        } catch (error) {
          if (!(error instanceof KineticsError)) throw error;
        }
      }),
      { numRuns: 1500 },
    );
  });
});

describe('column headings', () => {
  it.each([
    ['10^3 k / s-1', 'k', 1e-3, 's-1'],
    ['10⁻³ k', 'k', 1e3, null],
    ['A/10^13', 'A', 1e13, null],
    ['A / 10^13 s-1', 'A', 1e13, 's-1'],
    ['A (10^13 s-1)', 'A', 1e13, 's-1'],
    ['A / 1e13 s-1', 'A', 1e13, 's-1'],
    ['1e3 k', 'k', 1e-3, null],
    ['Ea / kJ mol-1', 'Ea', 1, 'kJ/mol'],
    ['Ea (kcal/mol)', 'Ea', 1, 'kcal/mol'],
    ['Ea, eV', 'Ea', 1, 'eV'],
    ['Ea in eV', 'Ea', 1, 'eV'],
    ['s0', 's0', 1, null],
    ['E/x', 'E/x', 1, null],
  ])('%s', (heading, name, multiplier, unit) => {
    expect(readColumnHeader(heading)).toMatchObject({ name, multiplier, unit });
  });

  it('takes a power off a unit only when a unit is left', () => {
    expect(splitUnitPower('x10^13 s-1')).toEqual({ multiplier: 1e13, unit: 's-1' });
    expect(splitUnitPower('10¹³ · s⁻¹')).toMatchObject({ multiplier: 1e13 });
    expect(splitUnitPower('10^13 zzz')).toEqual({ multiplier: 1, unit: '10^13 zzz' });
    expect(splitUnitPower('s-1')).toEqual({ multiplier: 1, unit: 's-1' });
  });
});
