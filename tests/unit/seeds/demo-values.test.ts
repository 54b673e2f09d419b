import { describe, expect, it } from 'vitest';
import { readDemoEntries } from '#seeds/demo/read-demo.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import { describeSurface } from '#shared/domain/surface.ts';
import { readStep } from '#shared/steps/parse-step.ts';
import { readAllEntries } from './demo-energies.ts';

const entries = readAllEntries();
const quantities = entries.flatMap(({ row, input, quantities: converted }) => converted.map((quantity, position) => ({ row, input, quantity, printed: input.quantities?.[position] })));

describe('the demonstration values', () => {
  it('are read, balanced and converted in every row but the unbalanced draft', () => {
    expect(entries).toHaveLength(readDemoEntries().length - 1);
    const unbalanced = readDemoEntries().find(({ script }) => script.mark === 'unbalanced');
    expect(unbalanced?.script.outcome).toBe('draft');
    expect(() => readStep(unbalanced?.input.step?.equation ?? '')).toThrow(/balance/);
  });

  it('lack nothing a submission needs unless they are drafts, and raise no check but the kind of an uncertainty left unknown', () => {
    for (const { row, input, script } of entries) {
      const { faults, checks } = assessEntry(input);
      expect(faults.length > 0, `${row}: ${faults.map(({ message }) => message).join(' ')}`).toBe(script.outcome === 'draft');
      const raised = checks.map(({ code }) => code).filter((code) => code !== 'uncertainty-unknown');
      expect(raised, row).toEqual(script.mark === 'quoted' ? ['quoted-elsewhere'] : []);
    }
  });

  it('cover fourteen elementary steps and the overall reaction, over most step classes', () => {
    expect(new Set(entries.filter(({ step }) => step.class !== 'overall').map(({ step }) => step.key)).size).toBe(14);
    expect(new Set(entries.filter(({ step }) => step.class === 'overall').map(({ step }) => step.key)).size).toBe(1);
    expect([...new Set(entries.map(({ step }) => step.class))]).toEqual(expect.arrayContaining([
      'adsorption', 'dissociative-adsorption', 'desorption', 'associative-desorption', 'dissociation', 'hydrogenation', 'dehydrogenation',
      'disproportionation', 'diffusion', 'eley-rideal', 'overall',
    ]));
  });

  it('calls no overall reaction elementary', () => {
    for (const { row, step, input } of entries) if (step.class === 'overall') expect(input.scope, row).toBe('apparent');
  });

  it('stand on surfaces that exist', () => {
    for (const { row, input } of entries) expect(() => describeSurface(input.surface ?? {}), row).not.toThrow();
  });

  it.each(['kJ/mol', 'J/mol', 'kcal/mol', 'cal/mol', 'eV', 'meV', 'hartree', 'rydberg', 'K', 'cm-1'])('have energies printed in %s', (unit) => {
    expect(quantities.filter(({ quantity }) => quantity.unit === 'kJ/mol' && quantity.unitId === unit).length).toBeGreaterThan(0);
  });

  it.each(['s-1', 'min-1', 'cm2 molecule-1 s-1', 'ML-1 s-1', 'Torr-1 s-1', 'Pa-1 s-1', 'cm3 molecule-1 s-1'])('have pre-exponential factors printed in %s', (unit) => {
    expect(quantities.filter(({ quantity }) => quantity.symbol === 'preExponential' && quantity.unitId === unit).length).toBeGreaterThan(0);
  });

  it.each(['=', '≈', '<', '≤', '>', '≥', 'range'])('have values bounded by %s', (bound) => {
    expect(quantities.filter(({ quantity }) => quantity.bound === bound).length).toBeGreaterThan(0);
  });

  it.each(['none', 'unknown', 'standard', 'expanded', 'confidence', 'fit-standard-error', 'spread'])('have uncertainties of kind %s', (kind) => {
    expect(quantities.filter(({ quantity }) => quantity.uncertaintyKind === kind).length).toBeGreaterThan(0);
  });

  it.each([
    ['±', /^[\d.]+ ± [\d.]+$/], ['the concise form', /^[\d.]+\(\d+\)$/], ['a power of ten with its uncertainty', /^10\^[\d.]+±[\d.]+$/], ['log A', /^log A = /], ['ln A', /^ln A = /],
    ['superscript digits', /× 10[⁰¹²³⁴-⁹⁻]+/], ['E notation', /E\+\d/], ['D notation', /D\d/], ['an asymmetric uncertainty', /\+\S+\/-/], ['a bracketed mantissa', /^\(.* ± .*\) × 10\^/],
    ['a Unicode minus', /^−/], ['ca.', /^ca\. /], ['a tilde', /^~/],
  ])('are printed with %s', (_, pattern) => {
    expect(quantities.some(({ printed }) => pattern.test(printed?.asPrinted ?? ''))).toBe(true);
  });

  it('have columns headed with a power of ten, both ways', () => {
    const multipliers = quantities.flatMap(({ printed }) => printed?.multiplier ?? []);
    expect(multipliers.some((multiplier) => multiplier > 1)).toBe(true);
    expect(multipliers.some((multiplier) => multiplier < 1)).toBe(true);
  });

  it('state the kind of every printed uncertainty, and none where none is printed', () => {
    for (const { row, quantity, printed } of quantities) {
      const said = printed?.uncertaintyKind !== undefined && printed.uncertaintyKind !== 'none';
      expect(said, `${row}, ${quantity.symbol}: ${quantity.asPrinted}`).toBe(quantity.uncertaintyKind !== 'none');
    }
  });

  it('convert second-order desorption to the site basis where the site density is stated, and say what is missing where it is not', () => {
    const areal = quantities.filter(({ quantity }) => quantity.symbol === 'preExponential' && quantity.unitId === 'cm2 molecule-1 s-1');
    const withDensity = areal.filter(({ input }) => input.conditions?.siteDensityPerM2 !== undefined);
    const without = areal.filter(({ input }) => input.conditions?.siteDensityPerM2 === undefined);
    expect(withDensity.length).toBeGreaterThan(5);
    expect(without.length).toBeGreaterThan(1);
    for (const { row, quantity } of withDensity) {
      expect(quantity.siteUnit, row).toBe('s-1');
      expect(quantity.siteValue, row).toBeGreaterThan(1e11);
      expect(quantity.siteValue, row).toBeLessThan(1e15);
    }
    for (const { row, quantity } of without) expect(quantity.missing, row).toContain('site density');
  });
});
