import { describe, expect, it } from 'vitest';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import { asPrinted, quantityFor, rangeText, rowFigure, uncertaintyWords } from '#client/features/entries/row-figures.ts';
import { entryRows, groupKey, rowView } from '#client/features/entries/table-rows.ts';
import { energy, sampleEntry } from './entry-samples.ts';

const none = { uncertaintyKind: 'none', reportedUncertainty: null, standardUncertainty: null } as const;

describe('digits of a row', () => {
  it.each<[string, Partial<Quantity>, EnergyUnit, string]>([
    ['to the last digit of u', { value: 186.188, standardUncertainty: 2.9, significantDigits: 3, unitAsPrinted: 'kcal/mol' }, 'kJ/mol', '186'],
    ['to a decimal where u has one', { value: 38.59, standardUncertainty: 0.4, unitAsPrinted: 'eV' }, 'kJ/mol', '38.6'],
    ['as printed, in the unit printed', { ...none, asPrinted: '137', value: 137, significantDigits: 3 }, 'kJ/mol', '137'],
    ['one guard digit after a conversion', { ...none, asPrinted: '0.40', unitAsPrinted: 'eV', value: 38.594, significantDigits: 2 }, 'kJ/mol', '38.6'],
    ['by a reported half-width of unknown kind', { asPrinted: '25100 ± 1000', unitAsPrinted: 'cal/mol', value: 105.018, reportedUncertainty: 1000, uncertaintyKind: 'unknown', standardUncertainty: null, significantDigits: 5 }, 'kJ/mol', '105'],
    ['zeros at the end of a whole number are not trusted', { ...none, asPrinted: '7100', unitAsPrinted: 'J/mol', value: 7.1, significantDigits: 4 }, 'kJ/mol', '7.10'],
    ['in the unit of the reader', { value: 186, standardUncertainty: 3 }, 'eV', '1.93'],
    ['a limit', { ...none, asPrinted: '>= 36', unitAsPrinted: 'kcal/mol', bound: '≥', value: null, low: 150.624, significantDigits: 2 }, 'kJ/mol', '151'],
  ])('%s', (_, change, unit, text) => {
    expect(rowFigure(energy(change), unit).number?.text).toBe(text);
  });

  it('sets both ends of a range and no value', () => {
    const figure = rowFigure(energy({ ...none, asPrinted: '24-27', unitAsPrinted: 'kcal/mol', bound: 'range', value: null, low: 100.416, high: 112.968, significantDigits: 2 }), 'kJ/mol');
    expect([figure.number, figure.low?.text, figure.high?.text]).toEqual([null, '100', '113']);
  });
});

describe('words of a row', () => {
  it.each<[Partial<Quantity>, string]>([
    [{ asPrinted: '1.64(4)', unitAsPrinted: 'eV' }, '1.64(4) eV'],
    [{ asPrinted: '1.64 eV', unitAsPrinted: 'eV' }, '1.64 eV'],
    [{ asPrinted: '2.4', unitAsPrinted: 's-1', multiplier: 1e13 }, '2.4 s-1 (× 1e13 by its heading)'],
    [{ asPrinted: '0.8', unitAsPrinted: '' }, '0.8'],
  ])('the print is kept: %o', (change, words) => {
    expect(asPrinted(energy(change))).toBe(words);
  });

  it('an uncertainty that is not known is said, never zero', () => {
    expect(uncertaintyWords(energy(none))).toBe('not reported');
    expect(uncertaintyWords(energy({ uncertaintyKind: 'unknown', standardUncertainty: null }))).toBe('kind unknown');
    expect(uncertaintyWords(energy())).toBeNull();
  });

  it.each([
    [{ min: 430, max: 620 }, '430–620'], [{ min: 430, max: null }, 'from 430'], [{ min: null, max: 620 }, 'to 620'], [{ min: null, max: null }, null], [null, null],
  ])('valid range %o', (range, words) => {
    expect(rangeText(range)).toBe(words);
  });
});

describe('rows', () => {
  const kie: Quantity = { ...energy(), symbol: 'kie', energyType: null, asPrinted: '2.1', unitAsPrinted: '', unit: '', value: 2.1 };
  const entry = sampleEntry('222-222-2', { quantities: [energy(), kie] });

  it('show the quantity that was asked for, else the primary one', () => {
    expect(quantityFor(entry, ['kie'])?.symbol).toBe('kie');
    expect(quantityFor(entry, ['sticking'])?.symbol).toBe('energy');
    expect(quantityFor(entry, undefined)?.symbol).toBe('energy');
  });

  it('of both directions of a step are told apart', () => {
    const other = { key: 'x', variantKey: 'x', equation: 'N2 + 2* -> 2N*', class: 'dissociative-adsorption', direction: 1 as const };
    expect([groupKey(sampleEntry('b', { step: other }), 'step'), groupKey(sampleEntry('d', { step: { ...other, direction: -1 } }), 'step')]).toEqual(['1 x', '-1 x']);
  });

  it('name the unit once where all rows share it, and each where they do not', () => {
    const view = (entries: ReturnType<typeof sampleEntry>[]) => rowView(entryRows(entries, undefined, 'eV'), 'eV', 700);
    expect(view([entry, sampleEntry('b')])).toMatchObject({ valueUnit: 'eV', kUnit: 's-1', tallestKJPerMol: 189 });
    expect(view([entry, sampleEntry('b', { kind: 'kie', quantities: [kie], kAtT: { temperatureK: 700, value: 1, unit: 'Pa-1 s-1', uLnK: null, extrapolated: false } })])).toMatchObject({ valueUnit: null, kUnit: null });
  });
});
