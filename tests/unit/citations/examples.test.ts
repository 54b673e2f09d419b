import { readFileSync, readdirSync } from 'node:fs';
import { expect, test } from 'vitest';
import * as citationKey from '#shared/citations/citation-key.ts';
import * as citationText from '#shared/citations/citation-text.ts';
import * as csl from '#shared/citations/csl.ts';
import * as doi from '#shared/citations/doi.ts';
import * as notice from '#shared/citations/notice.ts';
import * as richText from '#shared/citations/rich-text.ts';

const names: Record<string, unknown> = { ...citationKey, ...citationText, ...csl, ...doi, ...notice, ...richText };
const folder = new URL('../../../shared/citations/', import.meta.url);
const examples = readdirSync(folder).flatMap((file) => [...readFileSync(new URL(file, folder), 'utf8').matchAll(/@example (.+)/g)].map((match) => ({ file, code: (match[1] ?? '').replace(/ satisfies \w+/g, '') })));

test('there are examples to run', () => {
  expect(examples.length).toBeGreaterThan(15);
});

test.each(examples)('$file: $code', ({ code }) => {
  const evaluate = new Function(...Object.keys(names), `return (${code});`) as (...values: unknown[]) => unknown;
  expect(evaluate(...Object.values(names))).toBe(true);
});
