import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { energyUnits } from '#shared/kinetics/energy.ts';
import { instrumentParams, printTyped, readTypedFrom } from '#client/features/workbench/address.ts';
import { answerOf } from '#client/features/workbench/answer.ts';
import { sheetNamed, sheets } from '#client/features/workbench/purposes.ts';
import type { Field, Sheet } from '#client/features/workbench/sheet.ts';
import { paramOf, tidy, unitParamOf, type Typed } from '#client/features/workbench/typed.ts';

const named = (name: string): Sheet => {
  const found = sheetNamed(name);
  if (!found) throw new Error(`No calculator ${name}.`);
  return found.sheet;
};
const cases = sheets.map((sheet) => [sheet.calculator.name, sheet] as const);

/** What people type, and what nobody should: both have to come back from the address as they went in. */
const text = fc.oneof(
  fc.constantFrom('', '1e13', '10^13', '1.0×10¹³', '-5', '26,4', ' 700 ', 'NH3* + * -> NH2* + H*', 'a_b c\\d', '&T=1', '%zz', '+', 'nan', '1/0'),
  fc.string({ unit: 'grapheme', maxLength: 30 }),
);

function typedFor(sheet: Sheet): fc.Arbitrary<Typed> {
  const values: Record<string, fc.Arbitrary<string>> = {};
  const tables: Record<string, fc.Arbitrary<string[][]>> = {};
  const choicesOf = (field: Field) => (field.kind === 'choice' ? field.choices.map((choice) => choice.value) : []);
  for (const field of sheet.fields) {
    const unit = unitParamOf(field);
    if (field.kind === 'table') tables[paramOf(field)] = fc.array(fc.array(text, { maxLength: field.columns.length + 1 }), { maxLength: 6 });
    else if (field.kind === 'choice') values[paramOf(field)] = fc.constantFrom(...choicesOf(field), 'none of these');
    else values[paramOf(field)] = text;
    if (unit) values[unit] = fc.constantFrom(...energyUnits);
  }
  return fc.record({ values: fc.record(values, { requiredKeys: [] }), tables: fc.record(tables, { requiredKeys: [] }) }).map(({ values: texts, tables: rows }) => ({ values: texts as Typed['values'], tables: rows as Typed['tables'] }));
}

describe('the address of a calculation', () => {
  it.each(cases)('gives back what was typed: %s', (_, sheet) => {
    fc.assert(fc.property(typedFor(sheet), (typed) => {
      const { typed: back, leftOut } = readTypedFrom(sheet, new URLSearchParams(printTyped(sheet, typed).toString()));
      expect(back).toEqual(tidy(sheet, typed));
      expect(leftOut).toEqual([]);
    }), { numRuns: 60 });
  });

  it.each(cases)('reads any address without failing, and what it read is a fixed point: %s', (_, sheet) => {
    const names = [...new Set(sheet.fields.flatMap((field) => [paramOf(field), unitParamOf(field) ?? 'nothing']))];
    const anyAddress = fc.array(fc.tuple(fc.oneof(fc.constantFrom(...names), text), text), { maxLength: 12 });
    fc.assert(fc.property(anyAddress, (pairs) => {
      const once = readTypedFrom(sheet, new URLSearchParams(pairs));
      const twice = readTypedFrom(sheet, printTyped(sheet, once.typed));
      expect(twice).toEqual({ typed: once.typed, leftOut: [] });
      expect(['empty', 'missing', 'faulty', 'result']).toContain(answerOf(sheet, once.typed).state);
    }), { numRuns: 60 });
  });

  it.each([
    ['arrhenius', 'preExponential=1e13&pressure=5', ['pressure'], /no input of this calculator/],
    ['arrhenius', 'energy=1&energyUnit=cwt', ['energyUnit'], /no energy unit of the list/],
    ['arrhenius', 'energy=1&energy=2', ['energy'], /given twice/],
    ['kie', 'method=zero-point&kie=3', ['kie'], /not asked for by what is chosen/],
    ['kie', 'method=guess', ['method'], /"guess" is none of arrhenius-pair/],
    ['fit', `points=${'300+1_'.repeat(320)}300+1`, ['points'], /rows from the 301th on/],
    ['fit', 'points=300+1+2+4', ['points'], /cells of row 1 from the 4th on/],
    ['fit', `points=300+${'9'.repeat(201)}`, ['points'], /longer than 200 characters/],
    ['parse-value', `text=${'9'.repeat(201)}`, ['text'], /longer than 200 characters/],
  ])('names what it leaves out of %s: %s', (name, query, names, message) => {
    const { leftOut } = readTypedFrom(named(name), new URLSearchParams(query));
    expect(leftOut.map((one) => one.name)).toEqual(names);
    expect(leftOut[0]?.message).toMatch(message);
  });

  it('leaves the instrument of the header alone', () => {
    expect(readTypedFrom(named('arrhenius'), new URLSearchParams('T=500&unit=eV&temperatureK=600'))).toEqual({ typed: { values: { temperatureK: '600' }, tables: {} }, leftOut: [] });
    const taken = sheets.flatMap((sheet) => sheet.fields.flatMap((field) => [paramOf(field), unitParamOf(field) ?? '']));
    expect(taken.filter((param) => instrumentParams.includes(param))).toEqual([]);
  });

  it('is short for a table of points', () => {
    const printed = printTyped(named('fit'), { values: {}, tables: { points: [['300', '0.12', ''], ['', '', ''], ['350', '4.5e-3', '1e-4']] } });
    expect(printed.toString()).toBe('points=300+0.12+_++_350+4.5e-3+1e-4');
  });
});
