import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import * as z from 'zod';
import { runCalculator, type Calculator } from '#shared/calculators/calculator.ts';
import { calculators } from '#shared/calculators/registry.ts';
import { calculatorCases } from '#tests/integration/calculators/calculator-cases.ts';

/** Everything that has broken a calculator somewhere: ends of the double range, other types, other scripts, too much. */
const hostile = fc.oneof(
  fc.constantFrom<unknown>(0, -0, NaN, Infinity, -Infinity, 1e308, -1e308, 5e-324, 1e-300, 1e300, 2 ** 53, -1, 0.5, 1e-9, null, undefined, true, '', '0', 'NaN', [], {}, [[]], [null], '\u0000', '\ud800', 'x'.repeat(5000), '(((((((((', '10^999', '-'.repeat(200), '*'.repeat(200), '1e400', '__proto__', 'constructor'),
  fc.double(), fc.integer(), fc.string({ unit: 'binary', maxLength: 30 }), fc.jsonValue({ maxDepth: 2 }) as fc.Arbitrary<unknown>,
);

type Change = { at: number; to: unknown; how: 'replace' | 'remove' | 'add' | 'repeat' | 'stretch'; by: number };
const change: fc.Arbitrary<Change> = fc.record({ at: fc.nat(30), to: hostile, how: fc.constantFrom('replace', 'replace', 'stretch', 'stretch', 'stretch', 'remove', 'add', 'repeat'), by: fc.integer({ min: -40, max: 40 }) });

/** Every place of an input: the object or list, and the name in it. */
function places(value: unknown, found: { holder: Record<string, unknown>; name: string }[] = []): typeof found {
  if (value === null || typeof value !== 'object') return found;
  for (const [name, part] of Object.entries(value)) {
    found.push({ holder: value as Record<string, unknown>, name });
    places(part, found);
  }
  return found;
}

function changed(input: unknown, changes: readonly Change[]): unknown {
  const copy: unknown = structuredClone(input);
  for (const { at, to: shared, how, by } of changes) {
    const to: unknown = structuredClone(shared);
    const all = places(copy);
    const place = all[at % Math.max(1, all.length)];
    if (!place) continue;
    const { holder, name } = place;
    const value = holder[name];
    if (how === 'remove') Reflect.deleteProperty(holder, name);
    else if (how === 'add') Object.assign(holder, { [`extra${by}`]: to });
    else if (how === 'repeat' && Array.isArray(value)) holder[name] = Array.from({ length: Math.abs(by) * 40 }, (_, i) => value[i % value.length] as unknown);
    else if (how === 'stretch' && typeof value === 'number') holder[name] = value * (at % 3 === 0 ? 10 ** by : 1 + by / 100);
    else holder[name] = to;
  }
  return copy;
}

function expectSound(value: unknown, place = 'result'): void {
  if (typeof value === 'number') expect(Number.isFinite(value), `${place} is ${value}`).toBe(true);
  else if (value !== null && typeof value === 'object') for (const [name, part] of Object.entries(value)) expectSound(part, `${place}.${name}`);
}

const names = new Map<string, Set<string>>();

/** Names of the inputs and outputs of a calculator. */
function namesOf(calculator: Calculator): Set<string> {
  const known = names.get(calculator.name);
  if (known) return known;
  const schemas = [z.toJSONSchema(calculator.input, { unrepresentable: 'any', io: 'input' }), z.toJSONSchema(calculator.output, { unrepresentable: 'any' })] as JsonSchema[];
  const found = new Set(schemas.flatMap((schema) => (schema.oneOf ?? schema.anyOf ?? [schema]).flatMap(({ properties = {} }) => Object.keys(properties))));
  names.set(calculator.name, found);
  return found;
}

interface JsonSchema {
  properties?: Record<string, unknown>;
  oneOf?: JsonSchema[];
  anyOf?: JsonSchema[];
}

/** A result with only finite numbers that its own contract accepts, or faults that say where and what; never an exception, never a long wait. */
function expectAnswer(calculator: Calculator, input: unknown): 'result' | 'faults' {
  const started = performance.now();
  const answer = runCalculator(calculator, input);
  expect(performance.now() - started, 'milliseconds').toBeLessThan(2000);
  if ('result' in answer) {
    expectSound(answer.result);
    const read = calculator.output.safeParse(answer.result);
    expect(read.success ? [] : read.error.issues, calculator.name).toEqual([]);
    expect((answer.result.derivation as unknown[]).length).toBeGreaterThan(0);
    return 'result';
  }
  expect(answer.faults.length).toBeGreaterThan(0);
  for (const { path, message } of answer.faults) {
    // A fault names an input; or an output, where that leaves the double range.
    if (path !== '') expect(namesOf(calculator)).toContain(path.split('.')[0]);
    expect(message).toMatch(/\S/);
    expect(message, path).not.toMatch(/undefined is not|Cannot read propert|is not a function|\[object Object\]/);
  }
  return 'faults';
}

describe.each(calculators.map((calculator) => ({ name: calculator.name, calculator })))('$name', ({ name, calculator }) => {
  const inputs = calculatorCases.filter((one) => one.name === name).map(({ input }) => input);
  const runs = { seed: 20_260_301, numRuns: 400 };

  it('answers its own cases with a result', () => {
    expect(inputs.length).toBeGreaterThan(0);
    for (const input of inputs) expect(expectAnswer(calculator, input)).toBe('result');
  });

  it('answers its cases with something changed, stretched, repeated, left out or put in', () => {
    const outcomes = new Set<string>();
    fc.assert(fc.property(fc.constantFrom(...inputs), fc.array(change, { minLength: 1, maxLength: 4 }), (input, changes) => {
      outcomes.add(expectAnswer(calculator, changed(input, changes)));
    }), runs);
    expect(outcomes).toContain('faults');
  });

  it('answers anything at all', () => {
    fc.assert(fc.property(fc.oneof(hostile, fc.dictionary(fc.constantFrom(...Object.keys(inputs[0] ?? {})), hostile)), (input) => {
      expectAnswer(calculator, input);
    }), runs);
  });

  it('leaves its input as it was', () => {
    for (const input of inputs) {
      const before = structuredClone(input);
      runCalculator(calculator, input);
      expect(input).toEqual(before);
    }
  });
});
