import { runCalculator } from '#shared/calculators/calculator.ts';
import { calculators } from '#shared/calculators/registry.ts';
import type { ReferenceCase } from './reference.ts';

/** One figure of a case: what the product gives beside what the file says. */
export interface Measure {
  what: string;
  actual: number;
  expected: number;
}

/** How a kind of case is asked of the product, or why the product does not answer it. */
export type Kind = ((item: ReferenceCase) => Measure[]) | { notOffered: string };

/** Runs a calculator as it is run over HTTP and on the Workbench. @throws Error naming the fault. */
export function run(name: string, input: Record<string, unknown>): Record<string, unknown> {
  const calculator = calculators.find((one) => one.name === name);
  if (!calculator) throw new Error(`there is no calculator "${name}"`);
  const calculation = runCalculator(calculator, input);
  if ('faults' in calculation) throw new Error(`${name}: ${calculation.faults.map(({ path, message }) => `${path}: ${message}`).join('; ')}`);
  return calculation.result;
}

/** Pairs figures of a result with those of the file; a scale brings kJ to J and the like. A figure the file leaves null is left out. */
export function measures(pairs: readonly (readonly [what: string, actual: unknown, expected: unknown, scale?: number])[]): Measure[] {
  return pairs.flatMap(([what, actual, expected, scale = 1]) => {
    if (expected === null || expected === undefined) return [];
    if (typeof actual !== 'number' || typeof expected !== 'number') throw new Error(`${what}: ${String(actual)} against ${String(expected)}`);
    return [{ what, actual: actual * scale, expected }];
  });
}

/** Relative error; against an expected 0 the error itself. */
export function relativeError({ actual, expected }: Measure): number {
  const distance = Math.abs(actual - expected);
  return expected === 0 ? distance : distance / Math.abs(expected);
}
