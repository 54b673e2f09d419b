import { describe, expect, it } from 'vitest';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { emptyForm, formOf, quantityRow, type EntryForm } from '#client/features/contribute/entry-form.ts';
import { isWorthSaving, readForm, readNumber } from '#client/features/contribute/read-form.ts';

describe('numbers as people type them', () => {
  it.each([
    ['26.4', 26.4], ['.45', 0.45], ['-3.5', -3.5], ['−3.5', -3.5], ['1.5e19', 1.5e19], ['1.5 x 10^19', 1.5e19], ['1.5×10^-3', 1.5e-3], [' 7 ', 7],
    ['', null], ['abc', null], ['1,5', null], ['1e999', null], ['1.2.3', null], ['5 K', null],
  ])('%j is %s', (typed, value) => {
    expect(readNumber(typed)).toBe(value);
  });
});

const full: EntryInput = {
  kind: 'activation-energy', scope: 'elementary', provenance: 'measured',
  step: { equation: 'N2 + 2* -> 2N*' },
  surface: { metal: 'Ru', structure: 'hcp', facet: '0001', site: 'terrace', sampleType: 'single-crystal', particleSizeNm: 2.1 },
  source: { doi: '10.5555/aisk.1994.0412' }, locator: 'Table 2, page 113',
  method: { class: 'measured', technique: 'TPD', detail: 'leading edge' },
  quantities: [
    { symbol: 'energy', energyType: 'arrhenius', asPrinted: '44.5 ± 1.4', unitAsPrinted: 'kcal/mol', uncertaintyKind: 'expanded', coverageFactor: 2 },
    { symbol: 'preExponential', asPrinted: '1.0', unitAsPrinted: 's-1', multiplier: 1e-13, uncertaintyKind: 'confidence', level: 0.95, degreesOfFreedom: 4 },
  ],
  correlation: 0.98, rateOf: { consumptionOf: 'N' }, kineticOrders: { 'N*': 2 },
  conditions: { coverage: '0.05 to 0.25 ML', coverageDefinition: 'per-surface-atom', heatingRateKPerS: 5, temperatureK: 430, kieDirection: 'light/heavy', text: 'clean' },
  validRange: { min: 430, max: 620 }, note: 'Two runs.',
};

describe('the form and the input', () => {
  it.each<[string, EntryInput]>([
    ['everything', full],
    ['nothing', {}],
    ['an alloy', { surface: { formula: 'Ni3Fe', sampleType: 'supported-particles', support: 'Al2O3' } }],
    ['a held source', { source: { id: 's1' } }],
    ['BibTeX', { source: { bibtex: '@article{a, title={T}}' } }],
    ['RIS', { source: { ris: 'TY  - JOUR\nER  - ' } }],
    ['a typed citation', { source: { csl: { type: 'article-journal', title: 'T', author: [{ family: 'Osei-Brandt', given: 'K.' }], issued: { 'date-parts': [[1994]] }, volume: '41' } } }],
    ['a rate whose counting is unknown', { rateOf: 'unknown' }],
  ])('%s comes back as it was', (_, input) => {
    expect(readForm(formOf(input))).toEqual({ input, faults: [], rows: input.quantities?.map((_row, index) => index) ?? [] });
  });

  it('keeps a value string exactly, spaces inside included', () => {
    const form = { ...emptyForm(), quantities: [{ ...quantityRow('preExponential'), asPrinted: ' 1.0  x 10^13 ' }] };
    expect(readForm(form).input.quantities?.[0]?.asPrinted).toBe('1.0  x 10^13');
  });

  it('leaves an empty row out and tells which row each quantity was typed in', () => {
    const form = { ...emptyForm(), quantities: [quantityRow('energy'), { ...quantityRow('rateConstant'), asPrinted: '3.1' }] };
    expect(readForm(form)).toMatchObject({ input: { quantities: [{ symbol: 'rateConstant', asPrinted: '3.1' }] }, rows: [1] });
  });

  it.each<[string, (form: EntryForm) => void, string, RegExp]>([
    ['a word for a number', (form) => { form.conditions.heatingRateKPerS = 'fast'; }, 'conditions.heatingRateKPerS', /"fast" is no number/],
    ['a negative site density', (form) => { form.conditions.siteDensityPerM2 = '-1e19'; }, 'conditions.siteDensityPerM2', /greater than zero/],
    ['a temperature in another unit', (form) => { form.validRange.max = '6000'; }, 'validRange.max', /between 1 and 5000 K/],
    ['a range that runs backwards', (form) => { form.validRange = { min: '620', max: '430' }; }, 'validRange.max', /below its start at 620 K/],
    ['a coverage factor out of reach', (form) => { form.quantities[0] = { ...quantityRow('energy'), asPrinted: '5 ± 1', uncertaintyKind: 'expanded', coverageFactor: '20' }; }, 'quantities.0.coverageFactor', /usually 2/],
    ['a level in percent', (form) => { form.quantities[0] = { ...quantityRow('energy'), asPrinted: '5 ± 1', uncertaintyKind: 'confidence', level: '95' }; }, 'quantities.0.level', /such as 0.95/],
    ['a correlation of two', (form) => { form.correlation = '2'; }, 'correlation', /between -1 and 1/],
    ['a year of two digits', (form) => { form.source = { ...form.source, via: 'typed', typed: { ...form.source.typed, title: 'T', year: '94' } }; }, 'source.typed.year', /four digits/],
    ['a locator longer than the store takes', (form) => { form.locator = 'p'.repeat(201); }, 'locator', /./],
  ])('%s is named, and the rest goes on', (_, spoil, path, message) => {
    const form = formOf({ ...full, locator: 'Table 2' });
    form.note = 'still here';
    spoil(form);
    const { faults, input } = readForm(form);
    expect(faults.map((fault) => fault.path)).toEqual([path]);
    expect(faults[0]?.message).toMatch(message);
    expect(input.note).toBe('still here');
  });
});

describe('what the form has no field for', () => {
  it('stays in the entry when the rest is edited', () => {
    const input: EntryInput = { ...full, surface: { metal: 'Pt', guest: 'Ni', arrangement: 'subsurface', facet: '111' }, conditions: { perPair: true, nearestNeighbours: 6 } };
    const form = formOf(input);
    form.surface.facet = '100';
    form.conditions.text = 'at low coverage';
    const { input: saved, faults } = readForm(form);
    expect(faults).toEqual([]);
    expect(saved.surface).toEqual({ metal: 'Pt', guest: 'Ni', arrangement: 'subsurface', facet: '100' });
    expect(saved.conditions).toEqual({ perPair: true, nearestNeighbours: 6, text: 'at low coverage' });
  });
});

describe('a draft is made by something worth keeping', () => {
  it.each<[EntryInput, boolean]>([
    [{}, false], [{ kind: 'kie' }, false], [{ kind: 'kie', scope: 'elementary', provenance: 'measured' }, false], [{ locator: 'p. 3' }, true], [{ source: { doi: '10.5555/x' } }, true],
  ])('%j: %s', (input, worth) => {
    expect(isWorthSaving(input)).toBe(worth);
  });
});
