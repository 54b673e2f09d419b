import { describe, expect, it } from 'vitest';
import { readStep } from '#shared/steps/parse-step.ts';
import { notations, notationsInMarkdown, readNotation } from './notations.ts';

describe('ways to write an elementary step', () => {
  it.each(notations)('%s', (typed, becomes, stepClass) => {
    expect(readNotation(typed)).toEqual([becomes, stepClass]);
  });

  it('are forty at least, each another', () => {
    expect(new Set(notations.map(([typed]) => typed)).size).toBeGreaterThanOrEqual(40);
  });

  it('become equations that are read as themselves', () => {
    for (const [, becomes, stepClass] of notations) if (stepClass) expect(readStep(becomes).equation).toBe(becomes);
  });

  it('print as a table', () => {
    const lines = notationsInMarkdown().split('\n');
    expect(lines).toHaveLength(notations.length + 2);
    expect(lines[2]).toBe('| `CO* + * -> C* + O*` | `CO* + * -> C* + O*` | dissociation |');
  });
});
