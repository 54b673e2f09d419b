import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { KineticsError } from '#shared/kinetics/kinetics-error.ts';
import type { RateConstantInput } from '#shared/kinetics/rate-constant.ts';

/** A case of a reference file. */
export interface ReferenceCase {
  id: string;
  kind: string;
  input: Record<string, string>;
  expected: Record<string, unknown>;
  source: string;
}

/** The cases of a reference file. */
export function referenceCases(name: string): ReferenceCase[] {
  const text = readFileSync(new URL(`../../reference/${name}.json`, import.meta.url), 'utf8');
  return (JSON.parse(text) as { cases: ReferenceCase[] }).cases;
}

/** Expects equality within a relative tolerance. */
export function expectClose(actual: number | null | undefined, expected: number, relative: number, label = ''): void {
  const distance = Math.abs((actual ?? NaN) - expected);
  expect(distance, `${label} ${String(actual)} against ${expected}`).toBeLessThanOrEqual(relative * Math.max(Math.abs(expected), Number.MIN_VALUE));
}

/** The input of a case of `rate_units`; the file adds words behind the unit of a rate per site. */
export function rateUnitInput({ input }: ReferenceCase): RateConstantInput {
  const unit = (text: string | undefined): string => (text ?? '').replace(/ \(per site.*\)/, '');
  const density = input['site_density_cm-2'];
  return {
    value: Number(input.value), from: unit(input.from), to: unit(input.to), temperatureK: input.T_K === undefined ? undefined : Number(input.T_K),
    siteDensityPerM2: density === undefined ? undefined : Number(density) * 1e4,
  };
}

/** What is refused: the input at fault and the code; `accepted` when nothing is. */
export function faultOf(action: () => unknown): [path: string, code: string] {
  try {
    action();
  } catch (error) {
    if (error instanceof KineticsError) return [error.path, error.code];
    throw error;
  }
  return ['accepted', ''];
}
