import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

interface Example {
  file: string;
  expression: string;
  expected: string;
}

const folders = ['kinetics', 'steps'];
const root = new URL('../../../shared/', import.meta.url);
const files = folders.flatMap((folder) => readdirSync(new URL(`${folder}/`, root)).filter((name) => name.endsWith('.ts')).map((name) => `${folder}/${name}`));

/** Every `@example expression // value` of a doc comment. */
const examples: Example[] = files.flatMap((file) =>
  [...readFileSync(new URL(file, root), 'utf8').matchAll(/@example (.+?) \/\/ (.+)$/gm)].map((match) => ({ file, expression: match[1] as string, expected: match[2] as string })),
);

const modules = import.meta.glob<Record<string, unknown>>(['../../../shared/kinetics/*.ts', '../../../shared/steps/*.ts']);

function evaluate(expression: string, scope: Record<string, unknown>): unknown {
  // The text comes from our own doc comments.
  return (new Function(...Object.keys(scope), `return (${expression});`) as (...values: unknown[]) => unknown)(...Object.values(scope));
}

describe('examples in doc comments', () => {
  it('has some', () => {
    expect(examples.length).toBeGreaterThan(20);
  });

  it.each(examples)('$file: $expression', async ({ file, expression, expected }) => {
    const scope: Record<string, unknown> = {};
    for (const load of [modules['../../../shared/kinetics/constants.ts'], modules[`../../../shared/${file}`]]) Object.assign(scope, await load?.());
    const actual = evaluate(expression, scope);
    const wanted = evaluate(expected, {});
    if (typeof wanted === 'number') expect(Math.abs((actual as number) - wanted)).toBeLessThanOrEqual(1e-12 * Math.abs(wanted));
    else expect(actual).toEqual(wanted);
  });
});
