import { describe, expect, it } from 'vitest';
import { facetIsPossible, readFacet, siteDensity } from '#shared/kinetics/surfaces.ts';
import { expectClose, referenceCases } from './reference.ts';

describe('site density', () => {
  // Surface cells of ASE 3.22.1, outermost layer of the (1x1) cell.
  it.each(referenceCases('site_density'))('$id', ({ input, expected }) => {
    const result = siteDensity({ structure: input.structure as string, facet: input.face as string, aAngstrom: Number(input.a_A) });
    expectClose(result.perM2, expected.sites_per_m2 as number, 1e-12);
    expectClose(result.perCm2, expected.sites_per_cm2 as number, 1e-12);
    expectClose(result.molPerM2, expected.mol_per_m2 as number, 1e-12);
    expect(result.derivation[0]?.assumption).toContain('one site per outermost atom');
  });

  it('knows equivalent facets', () => {
    const density = (facet: string) => siteDensity({ structure: 'fcc', facet, aAngstrom: 3.52 }).perM2;
    expect(density('(010)')).toBe(density('100'));
    expect(density('1 -1 1')).toBe(density('111'));
  });

  it.each([
    ['hcp', '111', 'facet-impossible'], ['fcc', '0001', 'facet-impossible'], ['fcc', '000', 'facet-impossible'], ['fcc', 'abc', 'facet-impossible'],
    ['fcc', '211', 'unsupported'], ['hcp', '10-10', 'unsupported'], ['sc', '100', 'unsupported'],
  ])('refuses %s(%s)', (structure, facet, code) => {
    expect(() => siteDensity({ structure, facet, aAngstrom: 3 })).toThrow(expect.objectContaining({ code, path: 'facet' }));
  });

  it('refuses a lattice constant of 0', () => {
    expect(() => siteDensity({ structure: 'fcc', facet: '111', aAngstrom: 0 })).toThrow('a must be above 0 angstrom, got 0');
  });
});

describe('facets', () => {
  it.each([
    ['111', [1, 1, 1]], ['(111)', [1, 1, 1]], ['0001', [0, 0, 0, 1]], ['10-10', [1, 0, -1, 0]], ['1 0 -1 0', [1, 0, -1, 0]], ['101\u03050', [1, 0, -1, 0]], ['11−20', [1, 1, -2, 0]],
    ['10 -1 1', [10, -1, 1]], ['{100}', [1, 0, 0]], ['12', null], ['abc', null], ['11111', null], ['', null], ['1'.repeat(50), null],
  ])('reads %s', (text, indices) => {
    expect(readFacet(text)).toEqual(indices);
  });

  it.each([
    ['fcc', '111', true], ['fcc', '211', true], ['bcc', '110', true], ['hcp', '0001', true], ['hcp', '10-10', true], ['hcp', '10-11', true], ['hcp', '1111', false], ['hcp', '0000', false], ['hcp', '001', false], ['fcc', '0001', false], ['amorphous', '111', false],
  ])('%s(%s)', (structure, facet, possible) => {
    expect(facetIsPossible(structure, facet)).toBe(possible);
  });
});
