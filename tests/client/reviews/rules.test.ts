import { describe, expect, it } from 'vitest';
import type { Checklist } from '#shared/contracts/reviews.ts';
import { checklistPoints, type ChecklistAnswer } from '#shared/domain/review.ts';
import { ApiError } from '#client/lib/api-error.ts';
import { neighbourPoint, standingOf, whyNotAccept } from '#client/features/reviews/checklist-state.ts';
import { conditionFacts } from '#client/features/reviews/condition-facts.ts';
import { refusalWords } from '#client/features/reviews/refusals.ts';
import { placeLabel } from '#client/ui/neighbour-scale.tsx';

const all = (answer: ChecklistAnswer, change: Checklist = {}): Checklist => ({ ...Object.fromEntries(checklistPoints.map((point) => [point, answer])), ...change });

describe('accepting', () => {
  it.each<[string, Checklist, RegExp | null]>([
    ['nothing answered', {}, /8 are not answered/],
    ['all yes', all('yes'), null],
    ['all not applicable', all('not-applicable'), null],
    ['one open', all('yes', { unit: undefined }), /one is not answered/],
    ['one no', all('yes', { unit: 'no' }), /one point is answered no/],
    ['two no', all('yes', { unit: 'no', value: 'no' }), /2 points are answered no/],
    ['an open one before a no', all('yes', { unit: 'no', value: undefined }), /one is not answered/],
  ])('%s', (_, checklist, why) => {
    const standing = standingOf(checklist);
    expect(standing.complete).toBe(why === null);
    if (why === null) expect(whyNotAccept(standing)).toBeNull();
    else expect(whyNotAccept(standing)).toMatch(why);
  });
});

describe('moving between the points', () => {
  it.each([
    [null, 1, 'source'], [null, -1, 'primary'], ['source', 1, 'value'], ['source', -1, 'source'], ['primary', 1, 'primary'], ['range', -1, 'uncertainty'],
  ] as const)('from %s by %i to %s', (from, by, to) => {
    expect(neighbourPoint(from, by)).toBe(to);
  });
});

const refused = (code: ConstructorParameters<typeof ApiError>[0]['code'], context = {}, errors: { path: string; message: string }[] = []) =>
  new ApiError({ status: 409, code, title: 'Title', detail: 'Detail.', context, errors });

describe('a refused claim or decision', () => {
  it.each([
    [refused('claimed-by-another', { by: 'P. Brisebois', until: '2026-03-17T14:16:00' }), 'P. Brisebois holds this submission until 17 Mar 2026, 14:16.'],
    [refused('claimed-by-another'), 'Another reviewer holds this submission.'],
    [refused('already-decided', { by: 'P. Brisebois', decision: 'return', at: '2026-03-14T09:05:00' }), 'P. Brisebois has returned it, 14 Mar 2026, 09:05.'],
    [refused('already-decided'), 'Another reviewer has decided.'],
    [refused('stale-version'), 'This submission changed since you opened it.'],
    [refused('own-submission'), 'You contributed this value.'],
    [refused('internal'), 'Title.'],
    [new Error('x'), 'That did not succeed.'],
  ])('%o', (error, title) => {
    expect(refusalWords(error).title).toBe(title);
  });

  it('says the first fault of what was sent', () => {
    expect(refusalWords(refused('invalid-input', {}, [{ path: 'reason', message: 'Choose the reason.' }])).text).toBe('Choose the reason.');
  });
});

describe('conditions as facts', () => {
  it('names those reported, in order, and leaves out the others', () => {
    expect(conditionFacts({
      conditions: { heatingRateKPerS: 5, coverage: '0.1 ML', coverageDefinition: 'per-surface-atom' }, rateOf: { consumptionOf: 'N' }, kineticOrders: { 'N*': 2 },
    })).toEqual([
      { name: 'Coverage', value: '0.1 ML' }, { name: 'Coverage is', value: 'per surface atom' }, { name: 'Heating rate', value: '5 K/s' },
      { name: 'Rate counts', value: 'consumption of N' }, { name: 'Orders', value: 'N*: 2' },
    ]);
    expect(conditionFacts({ conditions: {}, rateOf: null, kineticOrders: null })).toEqual([]);
  });
});

describe('labels over the dots of the scale', () => {
  it.each([['short', 200], ['short', 0], ['short', 400], ['a label that is far too long to stand in the whole width of this drawing, wherever its dot may lie', 200]])(
    '%j at %i stays inside', (label, at) => {
      const { text, x } = placeLabel(label, at, 400);
      expect(x).toBeGreaterThanOrEqual(0);
      expect(x + text.length * 6).toBeLessThanOrEqual(400);
    },
  );
});
