import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { GroupHead, NearMiss } from '#shared/contracts/entry-search.ts';
import { FoundIn, stretches } from '#client/features/entries/components/found-in.tsx';
import { groupCountWords, groupEnergyWords } from '#client/features/entries/components/group-heading.tsx';
import { nearAddress, nearMissWords } from '#client/features/entries/components/zero-results.tsx';
import { shortWordsOfSort, wordsOfSort } from '#client/features/entries/columns.ts';

const said = (text: string, ranges: [number, number][]) => stretches({ text, ranges }).map(({ text: part, found }) => (found ? `[${part}]` : part)).join('');

describe('where words are found', () => {
  const title = 'Desorption kinetics of nitrogen from a close-packed ruthenium surface under ultrahigh vacuum, with potassium';
  it.each<[string, [number, number][], string]>([
    ['step edge', [[0, 4]], '[step] edge'],
    ['N2 on Ru', [[0, 2], [6, 8]], '[N2] on [Ru]'],
    [title, [[23, 31]], 'Desorption kinetics of [nitrogen] from a close-packed ruthenium surface …'],
    [title, [[99, 108]], '… ultrahigh vacuum, with [potassium]'],
    ['short', [[3, 99], [-1, 2]], 'short'],
  ])('%s is cut around %o', (text, ranges, expected) => {
    expect(said(text, ranges)).toBe(expected);
  });

  it('is marked as text, whatever stands in it', () => {
    const { container } = render(<FoundIn matches={[{ field: 'note', text: '<b>potassium</b>', ranges: [[3, 12]] }, { field: 'title', text: 'Potassium', ranges: [[0, 9]] }, { field: 'surface', text: 'K/Ru', ranges: [[0, 1]] }]} />);
    expect(container.querySelector('b')).toBeNull();
    expect([...container.querySelectorAll('mark')].map((mark) => mark.textContent)).toEqual(['potassium', 'Potassium']);
    expect(container.textContent).toBe('note <b>potassium</b>title Potassiumalso surface');
  });
});

describe('heads of groups', () => {
  const energy = { count: 4, median: 98.4, low: 14, high: 186 };
  it.each<[Pick<GroupHead, 'energy' | 'noMedian'>, string | null]>([
    [{ energy, noMedian: null }, 'median 98 kJ/mol, 14 to 186'],
    [{ energy: { ...energy, median: null }, noMedian: 'several-energy-types' }, '14 to 186 kJ/mol; no median: several types of energy'],
    [{ energy: { ...energy, median: null }, noMedian: 'both-directions' }, '14 to 186 kJ/mol; no median: both directions of the step'],
    [{ energy: { count: 1, median: 14, low: 14, high: 14 }, noMedian: null }, 'one energy, 14 kJ/mol'],
    [{ energy: null, noMedian: 'no-energies' }, null],
  ])('%o', (head, words) => {
    expect(groupEnergyWords(head, 'kJ/mol')).toBe(words);
  });

  it.each([[{ count: 1, measured: 1, computed: 0 }, '1 entry, measured'], [{ count: 6, measured: 4, computed: 2 }, '6 entries, 4 measured and 2 computed'], [{ count: 2, measured: 0, computed: 2 }, '2 entries, computed']])('%o', (head, words) => {
    expect(groupCountWords(head)).toBe(words);
  });
});

describe('near misses', () => {
  it.each<[NearMiss, string, string]>([
    [{ kind: 'other-facet', count: 6, change: { facet: ['0001'] } }, '6 entries on the facet 0001', '/search?metal=Ru&facet=0001'],
    [{ kind: 'reverse-step', count: 1, change: { step: null, stepClass: ['dissociative-adsorption'], species: ['N2'] } }, '1 entry for the reverse: dissociative adsorption with N2', '/search?metal=Ru&facet=9999&stepClass=dissociative-adsorption&species=N2'],
    [{ kind: 'other-method-class', count: 2, change: { methodClass: ['computed'] } }, '2 entries that are computed', '/search?metal=Ru&facet=9999&methodClass=computed'],
    [{ kind: 'alloys-containing', count: 3, change: { metal: null, contains: ['Ru'] } }, '3 entries on materials that contain Ru', '/search?contains=Ru&facet=9999'],
  ])('%o', (miss, words, address) => {
    expect([nearMissWords(miss), nearAddress({ metal: ['Ru'], facet: ['9999'] }, miss)]).toEqual([words, address]);
  });
});

it('a sort is said with its sense, in short only where it is turned round', () => {
  expect([wordsOfSort('energy'), wordsOfSort('-k'), shortWordsOfSort('energy'), shortWordsOfSort('-year')]).toEqual(['energy, smallest first', 'k at the temperature of interest, largest first', 'energy', 'year, latest first']);
});
