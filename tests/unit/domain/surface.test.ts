import { describe, expect, it } from 'vitest';
import type { SurfaceInput } from '#shared/contracts/entries.ts';
import { describeSurface, SurfaceError } from '#shared/domain/surface.ts';

describe('describing a surface', () => {
  it.each<[SurfaceInput, string]>([
    [{ metal: 'Ru', facet: '(0001)' }, 'Ru(0001)'],
    [{ metal: 'Ru', facet: '0001', site: 'terrace' }, 'Ru(0001)'],
    [{ metal: 'Ru', facet: '0001', site: 'step-edge' }, 'Ru(0001), step edge'],
    [{ metal: 'Ni', facet: '{111}' }, 'Ni(111)'],
    [{ metal: 'Ru', facet: '(1 0 -1 0)' }, 'Ru(10-10)'],
    [{ metal: 'Ru', support: 'MgO', sampleType: 'supported-particles', particleSizeNm: 2.1 }, 'Ru/MgO, 2.1 nm'],
    [{ metal: 'Fe', sampleType: 'foil' }, 'Fe, foil'],
    [{ formula: 'Ni3Fe', facet: '111', structure: 'fcc' }, 'Ni3Fe(111)'],
  ])('%j is %s', (input, label) => {
    expect(describeSurface(input).label).toBe(label);
  });

  it('fills in the structure of a pure metal and nothing else', () => {
    expect(describeSurface({ metal: 'Ru' })).toMatchObject({ metal: 'Ru', structure: 'hcp', facet: null, site: null, sampleType: null, support: null });
    expect(describeSurface({ formula: 'CoMo' })).toMatchObject({ metal: null, structure: null, elements: ['Co', 'Mo'] });
  });

  it('is one surface however it is written', () => {
    expect(describeSurface({ metal: 'Ni', facet: '(111)' }).key).toBe(describeSurface({ metal: 'Ni', structure: 'fcc', facet: '1 1 1' }).key);
    expect(describeSurface({ metal: 'Ni', facet: '111' }).key).not.toBe(describeSurface({ metal: 'Ni', facet: '111', site: 'step-edge' }).key);
  });

  it.each<[SurfaceInput, string, RegExp]>([
    [{}, 'metal', /symbol/],
    [{ metal: 'Ni', formula: 'Ni3Fe' }, 'formula', /not both/],
    [{ metal: 'nickel' }, 'metal', /symbol/],
    [{ metal: 'Xx' }, 'metal', /vocabulary/],
    [{ formula: '3NiFe' }, 'formula', /formula/],
    [{ metal: 'Ni', facet: 'abc' }, 'facet', /Miller/],
    [{ metal: 'Ni', facet: '0001' }, 'facet', /does not exist/],
    [{ metal: 'Ru', facet: '111' }, 'facet', /does not exist/],
    [{ metal: 'Ru', facet: '1100' }, 'facet', /does not exist/],
  ])('%j is refused at %s', (input, field, message) => {
    const refuse = () => describeSurface(input);
    expect(refuse).toThrow(SurfaceError);
    try {
      refuse();
    } catch (error) {
      expect((error as SurfaceError).field).toBe(field);
      expect((error as SurfaceError).message).toMatch(message);
    }
  });
});
