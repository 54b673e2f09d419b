import { describe, expect, it } from 'vitest';
import { countsMatter, neededConditions } from '#client/features/contribute/condition-needs.ts';
import { speciesOf } from '#client/features/contribute/components/rate-counts.tsx';
import { leavesKindOpen } from '#client/features/contribute/components/quantity-row.tsx';
import { emptyForm, quantityRow, type ConditionName } from '#client/features/contribute/entry-form.ts';
import { fieldOfFault, formFaults, placeName, sourceFaults } from '#client/features/contribute/faults.ts';
import { differingParts, inWords } from '#client/features/contribute/input-parts.ts';
import { readSource } from '#client/features/contribute/read-source.ts';
import { cslOf, emptyCitation, readAuthors, typedFromCsl } from '#client/features/contribute/typed-citation.ts';

describe('the one box for a source', () => {
  it.each([
    ['', 'empty'], ['  \n', 'empty'],
    ['10.5555/aisk.1994.0412', 'doi'], ['https://doi.org/10.5555/AISK.1994.0412', 'doi'], ['see doi: 10.5555/aisk.1994.0412, Table 2', 'doi'],
    ['@article{v94, title={T}}', 'bibtex'], ['% from the library\n@ARTICLE{v94,', 'bibtex'],
    ['TY  - JOUR\nTI  - T\nER  - ', 'ris'],
    ['Vantongeren 1994', 'unknown'], ['10.5555', 'unknown'],
  ])('%j is %s', (typed, form) => {
    expect(readSource(typed).form).toBe(form);
  });

  it('brings a DOI to its one form', () => {
    expect(readSource('see doi: 10.5555/AISK.1994.0412, Table 2')).toEqual({ form: 'doi', doi: '10.5555/aisk.1994.0412' });
  });
});

describe('a typed citation', () => {
  it.each([
    ['Vantongeren, L.; Osei-Brandt, K.', [['Vantongeren', 'L.'], ['Osei-Brandt', 'K.']]],
    ['L. Vantongeren and K. Osei-Brandt', [['Vantongeren', 'L.'], ['Osei-Brandt', 'K.']]],
    ['Harrowgate', [['Harrowgate', undefined]]],
    [' ; ', []],
  ])('reads the authors of %j', (line, names) => {
    expect(readAuthors(line).map(({ family, given }) => [family, given])).toEqual(names);
  });

  it('becomes CSL-JSON and comes back', () => {
    const typed = { title: 'T', authors: 'Vantongeren, L.; Osei-Brandt, K.', year: '1994', journal: 'J', volume: '41', pages: '108-121', doi: '' };
    expect(typedFromCsl(cslOf(typed) ?? {})).toEqual(typed);
    expect(cslOf(emptyCitation)).toBeUndefined();
  });
});

describe('conditions that a method calls for', () => {
  const needs = (change: (form: ReturnType<typeof emptyForm>) => void) => {
    const form = emptyForm();
    change(form);
    return neededConditions(form);
  };
  it.each<[string, (form: ReturnType<typeof emptyForm>) => void, ConditionName[], ConditionName[]]>([
    ['desorption with a heating ramp', (form) => { form.method = { class: 'measured', technique: 'TPD', detail: '' }; }, ['heatingRateKPerS', 'promoter'], ['functional', 'pressures']],
    ['a slab calculation', (form) => { form.method = { class: 'computed', technique: 'DFT-RPBE', detail: '' }; }, ['functional', 'supercell', 'endStateReference'], ['heatingRateKPerS', 'promoter']],
    ['flow at steady state', (form) => { form.method.technique = 'steady-state kinetics'; }, ['pressures', 'temperatureK'], ['heatingRateKPerS']],
    ['an isotope effect', (form) => { form.kind = 'kie'; form.quantities = [quantityRow('kie')]; }, ['isotopes', 'kieDirection', 'temperatureK'], ['functional']],
    ['a unit per area', (form) => { form.quantities = [{ ...quantityRow('preExponential'), unitAsPrinted: 'molecules cm-2 s-1' }]; }, ['siteDensityPerM2'], ['siteDensitySource']],
    ['what was typed under another method', (form) => { form.conditions.functional = 'RPBE'; }, ['functional'], ['supercell']],
  ])('%s', (_, change, asked, notAsked) => {
    const needed = needs(change);
    expect(needed).toEqual(expect.arrayContaining(asked));
    for (const name of notAsked) expect(needed).not.toContain(name);
  });

  it('what the rate counts matters for rates, not for an energy alone', () => {
    expect(countsMatter(emptyForm())).toBe(false);
    expect(countsMatter({ ...emptyForm(), quantities: [quantityRow('energy'), quantityRow('preExponential')] })).toBe(true);
  });
});

describe('a print that leaves its uncertainty open', () => {
  it.each([
    ['26.4 ± 1.2', true], ['26.4 +/- 1.2', true], ['25 +2/-3', true], ['26.4(12)', false], ['26.4', false], ['24-27', false], ['1.0e+13', false], ['< 0.1', false],
  ])('%j: %s', (asPrinted, open) => {
    expect(leavesKindOpen(asPrinted, undefined)).toBe(open);
  });
});

describe('the species of an equation', () => {
  it.each([
    ['NH3* + * -> NH2* + H*', ['NH3*', '*', 'NH2*', 'H*']],
    ['2N* -> N2 + 2*', ['N*', 'N2', '*']],
    ['', []],
  ])('%j', (equation, species) => {
    expect(speciesOf(equation)).toEqual(species);
  });
});

describe('faults', () => {
  it('lead from the quantity that was sent to the row it was typed in, and are not said twice', () => {
    expect(formFaults(
      [{ path: 'correlation', message: 'no number' }],
      [{ path: 'quantities.0.unitAsPrinted', message: 'unit' }, { path: '/quantities/1', message: 'value' }, { path: 'correlation', message: 'missing' }],
      [1, 3],
    )).toEqual([
      { path: 'correlation', message: 'no number' }, { path: 'quantities.1.unitAsPrinted', message: 'unit' }, { path: 'quantities.3', message: 'value' },
    ]);
  });

  it.each([
    ['step', 'step.equation'], ['surface', 'surface.metal'], ['source.doi', 'source'], ['quantities.2', 'quantities.2.asPrinted'], ['locator', 'locator'],
  ])('of %s are shown at %s', (path, field) => {
    expect(fieldOfFault(path)).toBe(field);
  });

  it.each([['quantities.1.asPrinted', 'Quantity 2'], ['quantities', 'Quantities'], ['validRange.max', 'Valid range'], ['method.class', 'Method'], ['elsewhere', 'The entry']])(
    '%s is called %s', (path, name) => {
      expect(placeName(path)).toBe(name);
    },
  );

  it('of the source come from the form, the preview or the draft, once', () => {
    const fault = { path: 'source', message: 'The DOI is not registered.' };
    expect(sourceFaults(false, [], []).map(({ path }) => path)).toEqual(['source']);
    expect(sourceFaults(true, [], [fault, fault])).toEqual([fault]);
    expect(sourceFaults(true, [fault], [fault])).toEqual([]);
    expect(sourceFaults(true, [], [])).toEqual([]);
  });
});

describe('two versions of a draft side by side', () => {
  it('names the parts that differ, in the order of the form', () => {
    expect(differingParts(
      { locator: 'Table 9', step: { equation: 'N2 + 2* -> 2N*' }, note: 'same' },
      { locator: 'Table 10', note: 'same', quantities: [{ symbol: 'energy', asPrinted: '5', unitAsPrinted: 'eV' }] },
    )).toEqual([
      { name: 'Where in the source', mine: 'Table 9', theirs: 'Table 10' },
      { name: 'Elementary step', mine: 'N2 + 2* -> 2N*', theirs: 'empty' },
      { name: 'Quantities', mine: 'empty', theirs: 'energy, 5, eV' },
    ]);
  });

  it.each([
    [undefined, 'empty'], ['', 'empty'], [{}, 'empty'], [[], 'empty'], [{ min: 430, max: undefined }, 'min 430'], [{ heatingRateKPerS: 5 }, 'heating rate 5'],
  ])('%j in words is %s', (value, words) => {
    expect(inWords(value)).toBe(words);
  });
});
