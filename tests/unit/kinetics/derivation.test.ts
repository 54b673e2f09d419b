import { describe, expect, it } from 'vitest';
import { readDemoEntries } from '#seeds/demo/read-demo.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import { convertEnergy } from '#shared/kinetics/energy.ts';
import type { DerivationLine } from '#shared/kinetics/derivation.ts';
import { convertQuantity, type ConvertedQuantity, type QuantityInput } from '#shared/kinetics/quantity.ts';
import type { QuantityContext } from '#shared/kinetics/quantity-symbols.ts';
import { convertRateConstant } from '#shared/kinetics/rate-constant.ts';
import { findUnit, listUnits, unitKinds } from '#shared/kinetics/units.ts';
import { readFigure, readPlainly, replay } from './derivation-replay.ts';
import { expectClose, rateUnitInput, referenceCases } from './reference.ts';

const entries = readDemoEntries().map(({ row, input }) => ({ row, input, assessed: assessEntry(input) }));
const derived = entries.flatMap(({ row, input, assessed }) => assessed.quantities.map((quantity) => ({ row, input, quantity })));

/** Each line starts where the one before it ends, and its operation gives what it states. */
function expectRuns(lines: readonly DerivationLine[], label: string): void {
  lines.forEach((line, i) => {
    const before = lines[i - 1];
    if (before) expect(line.from, `${label}, line ${i + 1}`).toBe(before.to);
    const { given, stated } = replay(line);
    given.forEach((value, end) => expectClose(stated[end], value, 1e-12, `${label}, line ${i + 1}, ${line.operation}`));
    expect(line.reference, label).not.toBe('');
  });
}

/** The whole derivation of a quantity: the reading, the chain, and where it arrives. */
function expectDerives(quantity: ConvertedQuantity, label: string): void {
  const [reading, ...lines] = quantity.derivation;
  expect(reading?.operation, label).toBe('Read the printed value');
  expect(reading?.from.startsWith(quantity.asPrinted), label).toBe(true);
  const read = readFigure(reading?.to ?? '');
  expect(read.bound, label).toBe(quantity.bound);
  readPlainly(quantity.asPrinted).forEach((value, end) => expectClose(read.numbers[end], value, 1e-14, `${label}, ${quantity.asPrinted}`));
  if (lines[0]) expect(lines[0].from, label).toBe(reading?.to);
  expectRuns(lines, label);
  const ends = quantity.bound === 'range' ? [quantity.low, quantity.high] : [quantity.value];
  const reached = (unit: string): number[][] => quantity.derivation.map(({ to }) => readFigure(to)).filter((figure) => figure.unit === (unit === '1' ? '' : unit)).map(({ numbers }) => numbers);
  expect(reached(quantity.unit), label).toContainEqual(ends);
  const last = readFigure(quantity.derivation.at(-1)?.to ?? '');
  if (quantity.siteUnit === undefined) {
    expect([last.numbers, last.unit || '1'], label).toEqual([ends, quantity.unit]);
  } else {
    expect(last.unit, label).toBe(quantity.siteUnit);
    if (quantity.bound !== 'range') expect(last.numbers, label).toEqual([quantity.siteValue]);
  }
}

describe('every derivation of the demonstration', () => {
  it('is there: hundreds of quantities in units of every kind', () => {
    expect(derived.length).toBeGreaterThan(700);
    expect(new Set(derived.flatMap(({ quantity }) => quantity.derivation.map(({ operation }) => operation))).size).toBeGreaterThan(15);
  });

  it('comes out the same to the last digit when the entry is converted anew, in another order, from its own JSON', () => {
    for (const { row, input, assessed } of [...entries].reverse()) {
      for (let i = 0; i < 5; i += 1) findUnit(`nonsense ${row} ${i}`);
      expect(assessEntry(JSON.parse(JSON.stringify(input)) as typeof input), row).toEqual(assessed);
    }
  });

  it('is one chain of lines from as printed to the stored value, each of which gives its figure when run again by another program', () => {
    for (const { row, quantity } of derived) expectDerives(quantity, `${row}, ${quantity.symbol}`);
  });

  it('is refused by that program when one digit of one line is changed', () => {
    const many = derived.filter(({ quantity }) => quantity.derivation.length > 2).slice(0, 30);
    expect(many).toHaveLength(30);
    for (const { quantity } of many) {
      const changed = structuredClone(quantity);
      const line = changed.derivation[1] as DerivationLine;
      line.to = line.to.replace(/\d/, (digit) => String((Number(digit) + 1) % 10));
      expect(() => expectDerives(changed, 'changed')).toThrow();
    }
  });
});

describe('derivations that the demonstration does not reach', () => {
  const surface2: QuantityContext = { gasOrder: 0, surfaceOrder: 2 };
  const adsorption: QuantityContext = { gasOrder: 1, surfaceOrder: 1 };
  it.each([
    [{ symbol: 'coverageSlope', asPrinted: '2.5', unitAsPrinted: 'kcal mol-1 ML-1' }, {}],
    [{ symbol: 'coverageSlope', asPrinted: '10', unitAsPrinted: 'kJ mol-1 ML-1' }, {}],
    [{ symbol: 'coverageSlope', asPrinted: '-0.2', unitAsPrinted: 'eV' }, {}],
    [{ symbol: 'activationEntropy', asPrinted: '-10', unitAsPrinted: 'e.u.' }, {}],
    [{ symbol: 'activationEntropy', asPrinted: '2', unitAsPrinted: 'kB' }, {}],
    [{ symbol: 'activationEntropy', asPrinted: '1.2e-3', unitAsPrinted: 'eV K-1' }, {}],
    [{ symbol: 'stickingCoefficient', asPrinted: '2', unitAsPrinted: '%' }, {}],
    [{ symbol: 'equilibriumConstant', asPrinted: '24 to 27', unitAsPrinted: 'Torr-1' }, {}],
    [{ symbol: 'preExponential', asPrinted: '2.1', unitAsPrinted: '10^13 min-1' }, { gasOrder: 0, surfaceOrder: 1 }],
    [{ symbol: 'preExponential', asPrinted: '0.6', unitAsPrinted: '1' }, adsorption],
    [{ symbol: 'preExponential', asPrinted: '10^-3 to 10^-1', unitAsPrinted: 'cm2 molecule-1 s-1' }, { ...surface2, siteDensityPerM2: 1.5e19, rateOf: { consumption: 'N', coefficient: 2 } }],
    [{ symbol: 'preExponential', asPrinted: '2.3e-11', unitAsPrinted: 'cm3 s-1' }, { ...adsorption, referenceTemperatureK: 298.15 }],
    [{ symbol: 'rateConstant', asPrinted: '1.5e15', unitAsPrinted: 'molecule cm-2 s-1' }, { ...surface2, siteDensityPerM2: 1.5e19 }],
    [{ symbol: 'rateConstant', asPrinted: '100', unitAsPrinted: 'm s-1' }, { ...adsorption, temperatureK: 300, siteDensityPerM2: 1.5e19 }],
    [{ symbol: 'rateConstant', asPrinted: '< 3', unitAsPrinted: 'ML-1 s-1' }, { ...surface2, coverageDefinition: 'per-adsorption-site' }],
    [{ symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 's-1' }, { ...surface2, coverageDefinition: 'relative-to-saturation', saturationCoverage: 0.5 }],
    [{ symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 'mmol g-1 h-1 bar-0.3' }, { kineticOrders: { NH3: 0.3 }, sitesPerKg: 2e23 }],
    [{ symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 's-1' }, { ...surface2, perPair: true, nearestNeighbours: 6, likePair: true }],
    [{ symbol: 'rateConstant', asPrinted: '3', unitAsPrinted: 's-1' }, { ...surface2, perPair: true, nearestNeighbours: 4, likePair: false }],
    [{ symbol: 'turnoverRate', asPrinted: '3e15', unitAsPrinted: 'molecule cm-2 s-1' }, { siteDensityPerM2: 1.2e19 }],
  ] as [QuantityInput, QuantityContext][])('%j', (input, context) => {
    const quantity = convertQuantity(input, context);
    expect(quantity.derivation.length).toBeGreaterThan(1);
    expectDerives(quantity, JSON.stringify(input));
  });
});

describe('derivations of the converters', () => {
  it('run again for every energy of the reference file', () => {
    for (const { id, input } of referenceCases('energy_units')) {
      const { derivation, value } = convertEnergy({ value: Number(input.value), from: input.from as string, to: input.to as string });
      expectRuns(derivation, id);
      expect(readFigure(derivation.at(-1)?.to ?? '').numbers, id).toEqual([value]);
    }
  });

  it('run again for every rate constant of the reference file', () => {
    for (const item of referenceCases('rate_units')) {
      const { derivation, value } = convertRateConstant(rateUnitInput(item));
      expectRuns(derivation, item.id);
      expect(readFigure(derivation.at(-1)?.to ?? '').numbers, item.id).toEqual([value]);
    }
  });

  it('run again between any two units that a picker offers for one quantity', () => {
    let run = 0;
    for (const kind of unitKinds.filter((name) => /order|rate|pressure/.test(name))) {
      for (const from of listUnits(kind)) {
        for (const to of listUnits(kind)) {
          if (from.dimension.coverage !== to.dimension.coverage) continue;
          expectRuns(convertRateConstant({ value: 1.7, from: from.symbol, to: to.symbol, temperatureK: 500, siteDensityPerM2: 1.5e19 }).derivation, `${from.symbol} to ${to.symbol}`);
          run += 1;
        }
      }
    }
    expect(run).toBeGreaterThan(100);
  });
});
