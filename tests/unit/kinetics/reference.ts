import { readFileSync } from 'node:fs';
import { expect } from 'vitest';

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
