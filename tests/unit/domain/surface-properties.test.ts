import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { SurfaceInput } from '#shared/contracts/entries.ts';
import { arrangements, siteTypes, structures } from '#shared/domain/kinds.ts';
import { describeSurface, SurfaceError, type Surface } from '#shared/domain/surface.ts';
import * as composition from '#shared/domain/surface-composition.ts';
import * as facets from '#shared/domain/surface-facet.ts';
import * as material from '#shared/domain/surface-material.ts';
import * as surface from '#shared/domain/surface.ts';

/** A surface typed again from its own description. */
function again({ metal, formula, host, guest, arrangement, guestMonolayers, structure, facet, reconstruction, site, sampleType, support, particleSizeNm, dispersion, strainPercent, stepFraction }: Surface): SurfaceInput {
  const said = { formula: arrangement ? host : metal ? null : formula, metal, guest, arrangement, guestMonolayers, structure, facet, reconstruction, site, sampleType, support, particleSizeNm, dispersion, strainPercent, stepFraction };
  return Object.fromEntries(Object.entries(said).filter(([, value]) => value !== null)) as SurfaceInput;
}

const piece = fc.constantFrom('Ni', 'Pt', 'Ru', 'Fe', 'Sn', 'C', 'O', 'H', '1', '3', '0.5', '25', '/', '-', '@', '(111)', '(0001)', '(S)-[4(111)×(100)]', ' overlayer', ' subsurface', ' SAA', ' surface alloy', 'Al2O3', 'MgO', '2 ML ', '-(1×1)', '(', ')', '[', 'x', '₃', '%', ' on ', '\u0305');
const facet = fc.constantFrom('111', '001', '011', '0001', '10-10', '10 -1 0', '533', '10 8 7', '4(111)×(100)', '100-hex', '00.1', 'x', '000', '-', '9(111)x(111)');
const text = fc.oneof(fc.array(piece, { maxLength: 7 }).map((pieces) => pieces.join('')), fc.string({ maxLength: 40 }));
const input = fc.record(
  { formula: text, metal: fc.oneof(fc.constantFrom('Ni', 'Pt', 'Ru', 'Fe', 'Co'), text), facet: fc.oneof(facet, text), structure: fc.constantFrom(...structures), site: fc.constantFrom(...siteTypes), guest: fc.constantFrom('Ni', 'Sn', 'PtRu', 'Q', ''), arrangement: fc.constantFrom(...arrangements), support: fc.constantFrom('alumina', 'γ-Al2O3', 'MgO', ' '), guestMonolayers: fc.constantFrom(1, 2), strainPercent: fc.constantFrom(-2, 0, 1.5) },
  { requiredKeys: [] },
);
/** Much of it sound: a metal or a formula, and a facet that exists. */
const sound = fc.constantFrom('Ni', 'Pt', 'Ni3Fe', 'Pt1Cu', 'Ni/Pt(111) overlayer', 'Pt-Ni-Pt', 'Ni@Pt', 'Ru/MgO', 'RuO2', 'PdH0.6', 'Pd1/CeO2', 'Pt-Ru', 'Sn/Pt surface alloy');
const typedSurface = fc.tuple(input, fc.oneof(sound, text), fc.boolean()).map(([made, name, pure]) => ({ ...made, metal: pure ? name : undefined, formula: pure ? undefined : name }) as SurfaceInput);

describe('surfaces', () => {
  it('are described or refused by the part that is wrong, whatever is typed, and their description is itself again', () => {
    let described = 0;
    fc.assert(
      fc.property(typedSurface, (typed) => {
        try {
          const first = describeSurface(typed);
          described += 1;
          const second = describeSurface(again(first));
          expect([second.key, second.label]).toEqual([first.key, first.label]);
          expect(describeSurface({ formula: first.formula }).formula).toBe(first.formula);
          expect(first.elements.length).toBeGreaterThan(0);
        } catch (error) {
          if (!(error instanceof SurfaceError)) throw error;
          expect(['metal', 'formula', 'facet', 'site', 'guest', 'arrangement', 'support']).toContain(error.field);
          expect(error.message.length).toBeGreaterThan(10);
        }
      }),
      { numRuns: 3000 },
    );
    expect(described).toBeGreaterThan(200);
  });

  it('have one key for one composition in any order and scale', () => {
    const metals = fc.uniqueArray(fc.constantFrom('Ni', 'Fe', 'Pt', 'Ru', 'Co', 'Sn'), { minLength: 2, maxLength: 4 });
    fc.assert(
      fc.property(metals, fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 4, maxLength: 4 }), fc.constantFrom(1, 2, 10, 0.1, 0.25), fc.boolean(), (names, amounts, scale, turn) => {
        const write = (list: typeof names, times: number) => list.map((name) => `${name}${Number(((amounts[names.indexOf(name)] as number) * times).toFixed(4))}`).join('');
        const plain = names.length === 2 && amounts[0] === 1 ? `${names[1]}${amounts[1]}${names[0]}1` : write(names, 1);
        expect(describeSurface({ formula: write(turn ? [...names].reverse() : names, scale) }).key).toBe(describeSurface({ formula: plain }).key);
      }),
    );
  });

  it('does not hang on hostile text', () => {
    const start = performance.now();
    for (const typed of ['('.repeat(60), 'Ni'.repeat(30), '/'.repeat(60), 'Ni/'.repeat(20), 'Ni-'.repeat(20), '(111)'.repeat(12), '1'.repeat(60), '@'.repeat(60), ' ML '.repeat(15), '(S)-['.repeat(12), `${' '.repeat(50)}Ni`]) {
      for (const field of ['metal', 'formula', 'facet', 'support', 'guest'] as const) {
        try {
          describeSurface({ ...(field === 'metal' || field === 'formula' ? {} : { metal: 'Ni' }), arrangement: field === 'guest' ? 'overlayer' : undefined, [field]: typed });
        } catch (error) {
          expect(error).toBeInstanceOf(SurfaceError);
        }
      }
    }
    expect(performance.now() - start).toBeLessThan(2000);
  });
});

describe('examples in doc comments', () => {
  const examples = ['surface', 'surface-composition', 'surface-facet', 'surface-material'].flatMap((name) =>
    [...readFileSync(new URL(`../../../shared/domain/${name}.ts`, import.meta.url), 'utf8').matchAll(/@example (.+?) \/\/ (.+)$/gm)].map((match) => [match[1] as string, match[2] as string] as const));

  it.each(examples)('%s', (expression, expected) => {
    const scope: Record<string, unknown> = { ...surface, ...composition, ...facets, ...material };
    // The text comes from our own doc comments.
    const evaluate = (code: string): unknown => (new Function(...Object.keys(scope), `return (${code});`) as (...values: unknown[]) => unknown)(...Object.values(scope));
    expect(evaluate(expression)).toEqual(evaluate(expected));
  });
});
