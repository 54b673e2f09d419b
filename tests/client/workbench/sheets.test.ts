import { describe, expect, it } from 'vitest';
import { calculators } from '#shared/calculators/registry.ts';
import { printTyped, readTypedFrom } from '#client/features/workbench/address.ts';
import { answerOf } from '#client/features/workbench/answer.ts';
import { exampleOf } from '#client/features/workbench/example.ts';
import { figureText } from '#client/features/workbench/figures.ts';
import { addressOf } from '#client/features/workbench/onward.ts';
import { sheetNamed, sheets } from '#client/features/workbench/purposes.ts';
import { reportCsv, reportText } from '#client/features/workbench/report.ts';
import { nothingTyped, paramOf, tidy, type Typed } from '#client/features/workbench/typed.ts';

const cases = sheets.map((sheet) => [sheet.calculator.name, sheet] as const);

function answer(name: string, typed: Partial<Typed>) {
  const found = sheetNamed(name);
  if (!found) throw new Error(`No calculator ${name}.`);
  return answerOf(found.sheet, { ...nothingTyped, ...typed });
}

const main = (of: ReturnType<typeof answer>, unit: 'kJ/mol' | 'kcal/mol' | 'eV' = 'kJ/mol') => (of.state === 'result' ? of.outcome.main.map((figure) => figureText(figure, unit)) : of);

describe('the sheets', () => {
  it('are one for every calculator, and no other', () => {
    expect(sheets.map((sheet) => sheet.calculator.name).sort()).toEqual(calculators.map((calculator) => calculator.name).sort());
  });

  it.each(cases)('have an example that gives a result with its derivation, and is itself an address: %s', (_, sheet) => {
    const example = exampleOf(sheet);
    const result = answerOf(sheet, example);
    if (result.state !== 'result') throw new Error(JSON.stringify(result));
    expect(result.derivation.length).toBeGreaterThan(0);
    expect(result.outcome.main.length).toBeGreaterThan(0);
    for (const figure of [...result.outcome.main, ...result.outcome.facts]) expect(figureText(figure, 'kJ/mol')).not.toMatch(/undefined|NaN|Infinity|not reported/);
    expect(readTypedFrom(sheet, printTyped(sheet, example))).toEqual({ typed: tidy(sheet, example), leftOut: [] });
    expect(reportText(sheet, example, result, { energyUnit: 'kJ/mol', link: 'https://sillstone.test/x' })).toMatch(/Given[^]*Result[^]*Derivation[^]*Formula[^]*Where it holds/);
    expect(reportCsv(sheet, example, result).split('\r\n')[0]).toBe('role,quantity,symbol,row,value,low,high,standard_uncertainty,uncertainty_of,unit');
  });

  it.each(cases)('hand on to calculations that take what they are given: %s', (_, sheet) => {
    const result = answerOf(sheet, exampleOf(sheet));
    const onward = result.state === 'result' ? result.onward : [];
    for (const one of onward) {
      const target = sheetNamed(one.to)?.sheet;
      if (!target) throw new Error(`${one.to} is no calculator.`);
      const { typed, leftOut } = readTypedFrom(target, new URL(addressOf(one), 'https://sillstone.test').searchParams);
      expect(leftOut).toEqual([]);
      const usual = (param: string, value: string) => target.fields.some((field) => paramOf(field) === param && 'usual' in field && field.usual === value);
      for (const [param, value] of Object.entries(one.values)) if (!usual(param, value)) expect(typed.values[param]).toBe(value);
    }
  });

  it.each(cases)('say what to give while nothing is typed: %s', (_, sheet) => {
    expect(answerOf(sheet, nothingTyped)).toEqual({ state: 'empty' });
    expect(sheet.empty).toMatch(/^(Give|Choose) .*\.$/);
  });
});

// Expected figures: 1e13 exp(-100000/(R 500)) = 357.4999; 24 × 4.184 = 100.416 (SP 811); hand calculation.
describe('what is typed becomes the input', () => {
  it.each([
    ['1e13', '100', ''], ['10^13', '100', 'kJ/mol'], ['1.0×10¹³', '100,0', ''], ['1.0 x 10^13', '1.00e2', 'kJ/mol'], ['1e13', '100000', 'J/mol'], ['1e13', '100 kJ/mol', ''],
  ])('A as %s, E as %s %s', (preExponential, energy, energyUnit) => {
    expect(main(answer('arrhenius', { values: { preExponential, energy, energyUnit: energyUnit || 'kJ/mol', temperatureK: '500' } }))).toEqual(['357.5 s-1']);
  });

  it('converts an energy at the border and shows it in the reader’s unit', () => {
    const reversed = answer('reverse', { values: { energyForward: '24', energyForwardUnit: 'kcal/mol', reactionEnthalpy: '100.416' } });
    expect(main(reversed)).toEqual(['0.0000 kJ/mol']);
    const two = { values: { temperature1K: '400', k1: '0.87', temperature2K: '500', k2: '358' } };
    expect(main(answer('two-temperature', two), 'kcal/mol')).not.toEqual(main(answer('two-temperature', two), 'eV'));
  });

  it('shows the logarithm where k leaves double precision', () => {
    const far = answer('arrhenius', { values: { preExponential: '1e13', energy: '10000', temperatureK: '300' } });
    expect(main(far)).toEqual([expect.stringMatching(/^\d\.\d{3} × 10\^−\d{4} s-1 \(ln = −3979\.\d+\)$/)]);
  });

  it('marks a temperature outside the valid range', () => {
    const outside = answer('arrhenius', { values: { preExponential: '1e13', energy: '100', temperatureK: '700', validToK: '600' } });
    expect(outside.state === 'result' && outside.outcome.extrapolated).toBe(true);
    expect(outside.state === 'result' && outside.outcome.warnings?.join(' ')).toMatch(/700 K lies outside the valid range/);
  });
});

describe('what cannot be calculated is named at its place', () => {
  it.each([
    ['arrhenius', { preExponential: 'many', energy: '1', temperatureK: '500' }, 'preExponential', /"many" is not a number/],
    ['arrhenius', { preExponential: '1e13', energy: '1', temperatureK: '-5' }, 'temperatureK', /T must be above 0 K, got -5/],
    ['arrhenius', { preExponential: '1e13', energy: '24-27', temperatureK: '500' }, 'energy', /is a range/],
    ['arrhenius', { preExponential: '1e13', energy: '< 30', temperatureK: '500' }, 'energy', /is a limit/],
    ['arrhenius', { preExponential: '1e13', energy: '26.4 ± 1.2', temperatureK: '500' }, 'energy', /has an uncertainty/],
    ['arrhenius', { preExponential: '1e13', energy: '26.4 kcal/mol', temperatureK: '500' }, 'energy', /is in kcal\/mol, this field in kJ\/mol/],
    ['arrhenius', { preExponential: '1,234', energy: '26.4', temperatureK: '500' }, 'preExponential', /ambiguous/],
    ['rate-constant', { value: '1', from: 's-1', to: 'parsec' }, 'to', /unknown unit/i],
    ['collision', { molarMassGPerMol: '28', temperatureK: '300', way: 'initial', sticking: '1.5', siteDensityPerM2: '1e19' }, 'sticking', /1/],
  ])('%s %o', (name, values, param, message) => {
    const found = answer(name, { values: values as unknown as Record<string, string> });
    if (found.state !== 'faulty') throw new Error(JSON.stringify(found));
    expect(found.faults[0]).toMatchObject({ param, message: expect.stringMatching(message) });
  });

  it('finds the cell of a table, also with empty rows before it', () => {
    const rows = [['300', '0.1', ''], ['', '', ''], ['350', '-2', ''], ['400', '3', '']];
    expect(answer('fit', { tables: { points: rows } })).toEqual({ state: 'faulty', faults: [{ param: 'points', message: 'k must be above 0, got -2.', cell: { row: 2, column: 1 } }] });
  });

  it('passes over a row that is half typed, and says so', () => {
    const found = answer('fit', { tables: { points: [['300', '0.1', ''], ['350', '2', ''], ['400', '', '']] } });
    expect(found.state === 'result' && found.notes).toEqual(['Row 3 is not used: k is empty.']);
  });

  it('leaves rows out of a fit by their numbers, and says which', () => {
    const points = [['300', '0.1', ''], ['325', '99', ''], ['350', '2', ''], ['400', '30', '']];
    const found = answer('fit', { values: { leftOut: '2' }, tables: { points } });
    expect(main(found)).toEqual(main(answer('fit', { tables: { points: points.filter((_, row) => row !== 1) } })));
    expect(found.state === 'result' && found.outcome.warnings?.[0]).toBe('Row 2 left out of the fit.');
    expect(answer('fit', { values: { leftOut: 'two' }, tables: { points } })).toEqual({ state: 'faulty', faults: [{ param: 'leftOut', message: '"two" is no number of a row: write them as 2, 5.' }] });
  });

  it('names what is still to give', () => {
    const found = answer('arrhenius', { values: { preExponential: '1e13' } });
    expect(found.state === 'missing' && found.missing.map((field) => field.key)).toEqual(['energyKJPerMol', 'temperatureK']);
  });

  it('offers the free site that an equation lacks', () => {
    const found = answer('parse-step', { values: { equation: 'NH3* -> NH2* + H*' } });
    expect(found.state === 'faulty' && found.suggestion).toMatch(/NH3\* \+ \* -> /);
  });
});
