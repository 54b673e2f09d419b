import { describe, expect, it } from 'vitest';
import { formatAge, formatDate, formatDateTime } from '#client/lib/dates.ts';

describe('dates', () => {
  it.each([['2026-03-14', '14 Mar 2026'], ['2026-02-02', '2 Feb 2026'], ['not a date', 'not a date']])('writes %s as %s', (iso, text) => {
    expect(formatDate(iso)).toBe(text);
  });

  it('writes the time of day with two digits each', () => {
    expect(formatDateTime('2026-03-14T09:05:00')).toBe('14 Mar 2026, 09:05');
  });

  it.each([
    ['2026-03-14T12:00:30Z', 'just now'], ['2026-03-14T11:20:00Z', '41 min'], ['2026-03-14T07:00:00Z', '5 h'], ['2026-03-11T12:00:00Z', '3 days'],
  ])('gives the age of %s as %s', (iso, age) => {
    expect(formatAge(iso, new Date('2026-03-14T12:01:00Z'))).toBe(age);
  });
});
