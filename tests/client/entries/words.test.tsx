import { render } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import type { EntryFilter } from '#shared/contracts/entry-search.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { entryTitle, methodTags, methodText } from '#client/features/entries/entry-words.ts';
import { filterWords, joinWords, valueRangeWords } from '#client/features/entries/filter-words.ts';
import { uncertaintyText } from '#client/features/entries/quantity-words.ts';
import { readHidden, sortOf, tableSort } from '#client/features/entries/columns.ts';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { energy, sampleEntry } from './entry-samples.ts';

describe('words of filters', () => {
  it.each<[EntryFilter, keyof EntryFilter, string]>([
    [{ metal: ['Ru', 'Ni'] }, 'metal', 'Metal: Ru or Ni'],
    [{ energyType: ['electronic'] }, 'energyType', 'Type of energy: electronic energy barrier'],
    [{ method: ['computed'] }, 'method', 'Method: any computed method'],
    [{ q: 'potassium' }, 'q', 'Containing: "potassium"'],
    [{ validAt: 700 }, 'validAt', 'Valid at: 700 K'],
    [{ kind: ['activation-energy'], valueMin: 96.485 }, 'valueMin', 'Value: from 1.00 eV up'],
  ])('%o', (filter, name, words) => {
    const { title, value } = filterWords(name, filter, 'eV');
    expect(`${title}: ${value}`).toBe(words);
  });

  it.each<[EntryFilter, string]>([
    [{ kind: ['kie'], valueMin: 1, valueMax: 3 }, 'from 1.00 to 3.00'],
    [{ kind: ['pre-exponential'], valueMax: 1e13 }, 'up to 1.00e13'],
    [{}, 'any'],
  ])('limits of the value %o', (filter, words) => {
    expect(valueRangeWords(filter, 'kJ/mol')).toBe(words);
  });

  it('joins words as a sentence does', () => {
    expect([joinWords([]), joinWords(['a']), joinWords(['a', 'b']), joinWords(['a', 'b', 'c'], 'or')]).toEqual(['', 'a', 'a and b', 'a, b or c']);
  });
});

describe('words of entries', () => {
  it.each([
    ['associative-desorption', 'Associative desorption of nitrogen from Ru(0001)'],
    ['dissociative-adsorption', 'Dissociative adsorption on Ru(0001)'],
    ['eley-rideal', 'Eley–Rideal on Ru(0001)'],
    ['dehydrogenation', 'Dehydrogenation on Ru(0001)'],
  ])('the title of %s', (stepClass, title) => {
    const { step, surface } = sampleEntry('x');
    expect(entryTitle({ step: step && { ...step, class: stepClass }, surface })).toBe(title);
  });

  it('what sets a value apart is beside its method', () => {
    const entry = sampleEntry('x', { method: { class: 'computed', technique: 'DFT-PBE', detail: null }, scope: 'apparent', provenance: 'quoted', conditions: { functional: 'PBE' } });
    expect([methodText(entry), methodTags(entry)]).toEqual(['DFT-PBE', ['computed', 'apparent', 'quoted from elsewhere']]);
    expect(methodText(sampleEntry('y', { conditions: { functional: 'PBE' } }))).toBe('TPD, PBE');
  });

  it.each<[Partial<Quantity>, string]>([
    [{}, '± is one standard uncertainty, as reported'],
    [{ uncertaintyKind: 'expanded', reportedUncertainty: 1.4, standardUncertainty: 0.7 }, '± 1.4 reported as an expanded uncertainty; ± is one standard uncertainty'],
    [{ uncertaintyKind: 'spread', standardUncertainty: null }, '± 3 reported as a spread of several determinations, from which no standard uncertainty follows'],
    [{ uncertaintyKind: 'unknown', standardUncertainty: null }, '± 3 reported, kind unknown'],
    [{ uncertaintyKind: 'unknown', standardUncertainty: null, reportedUncertainty: null, reportedMinus: 3, reportedPlus: 2 }, '+2/−3 reported, kind unknown'],
    [{ uncertaintyKind: 'none', standardUncertainty: null, reportedUncertainty: null }, 'no uncertainty reported'],
    [{ uncertaintyKind: 'none', standardUncertainty: null, reportedUncertainty: null, bound: '≥' }, 'a limit, without uncertainty'],
  ])('uncertainty %o', (change, words) => {
    expect(uncertaintyText(energy(change))).toBe(words);
  });

  it.each([['Ru/Al2O3, 3 nm', '<sub>2</sub>O<sub>3</sub>, 3 nm'], ['Ni3Fe(111)', 'Ni<sub>3</sub>Fe(111)'], ['Ru(0001), B5 site', 'Ru(0001), B5 site']])(
    'indices belong to the material of %s alone', (label, html) => {
      const { container } = render(<SurfaceLabel label={label} />);
      expect(container.innerHTML).toContain(html);
      expect(container.textContent).toBe(label);
    },
  );
});

describe('columns', () => {
  it('a choice is remembered and read back; nonsense hides nothing', () => {
    const hidden = new Set(['barrier', 'rate'] as const);
    expect(readHidden([...hidden].join(' '))).toEqual(hidden);
    expect(readHidden('unheard of').size).toBe(0);
    expect([...readHidden('-')]).toEqual(['factor', 'energyType', 'scope', 'provenance', 'year', 'conditions', 'accession', 'accepted']);
  });

  it('a sort goes to the address and back', () => {
    expect(sortOf(tableSort('-validFrom'))).toBe('-validFrom');
    expect(sortOf({ key: 'beauty', descending: false })).toBeNull();
  });
});
