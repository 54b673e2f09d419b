import { describe, expect, it } from 'vitest';
import type { SurfaceInput } from '#shared/contracts/entries.ts';
import { arrangements, siteTypes } from '#shared/domain/kinds.ts';
import { describeSurface, siteLabel, SurfaceError } from '#shared/domain/surface.ts';

function refusal(input: SurfaceInput): SurfaceError {
  try {
    describeSurface(input);
  } catch (error) {
    if (error instanceof SurfaceError) return error;
    throw error;
  }
  throw new Error(`${JSON.stringify(input)} was taken`);
}

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
    [{ metal: 'Ni(111)' }, 'Ni(111)'],
    [{ formula: 'Ru/Al2O3' }, 'Ru/Al2O3'],
    [{ metal: 'Ni/SiO2', facet: '111' }, 'Ni/SiO2, (111)'],
    [{ formula: 'RuO2', facet: '110' }, 'RuO2(110)'],
    [{ formula: 'PdH0.6' }, 'PdH0.6'],
    [{ metal: 'Pt', facet: '100-hex' }, 'Pt(100)-hex'],
    [{ metal: 'Pt', facet: '(100)-(1x1)' }, 'Pt(100)-(1×1)'],
    [{ metal: 'Au', facet: '111-(22×√3)' }, 'Au(111)-(22×√3)'],
    [{ metal: 'Pt', facet: '110', reconstruction: '1×2' }, 'Pt(110)-(1×2)'],
    [{ formula: 'Ni/Pt(111) overlayer' }, 'Ni/Pt(111), overlayer'],
    [{ formula: '2 ML Co/Ru(0001)' }, 'Co/Ru(0001), overlayer of 2 ML'],
    [{ metal: 'Pt', guest: 'Ni', arrangement: 'subsurface', facet: '111' }, 'Ni/Pt(111), subsurface layer'],
    [{ formula: 'Pt1Cu(111)' }, 'Pt1Cu(111), single atoms'],
    [{ formula: 'PtSn/Pt(111) single-atom' }, 'PtSn/Pt(111), single atoms'],
    [{ formula: 'Sn/Pt(111) surface alloy' }, 'Sn/Pt(111), surface alloy'],
    [{ formula: 'Ni@Pt/Al2O3', particleSizeNm: 5 }, 'Ni@Pt/Al2O3, 5 nm'],
    [{ formula: 'Pd1/CeO2' }, 'Pd/CeO2, single atoms'],
    [{ metal: 'Ru', support: 'MgO', dispersion: 0.3 }, 'Ru/MgO, dispersion 0.3'],
    [{ metal: 'Ni', facet: '111', strainPercent: -2 }, 'Ni(111), strain −2 %'],
    [{ metal: 'Ni', facet: '111', strainPercent: 1.5, stepFraction: 0.02 }, 'Ni(111), strain +1.5 %, steps 0.02'],
    [{ metal: 'Ni', facet: '111', site: 'fcc-hollow' }, 'Ni(111), fcc hollow'],
    [{ metal: 'Ru', site: 'interface', support: 'CeO2' }, 'Ru/CeO2, metal–support interface'],
  ])('%j is %s', (input, label) => {
    expect(describeSurface(input).label).toBe(label);
  });

  it('fills in the structure of a pure metal and nothing else', () => {
    expect(describeSurface({ metal: 'Ru' })).toMatchObject({ metal: 'Ru', structure: 'hcp', facet: null, site: null, sampleType: null, support: null, host: null, guest: null, stepped: [] });
    expect(describeSurface({ formula: 'CoMo' })).toMatchObject({ metal: null, structure: null, elements: ['Co', 'Mo'] });
    expect(describeSurface({ formula: 'Pd1/CeO2' })).toMatchObject({ metal: null, structure: null, arrangement: 'single-atom', guest: null });
  });

  it('keeps the second metal of a near-surface alloy apart from the bulk', () => {
    expect(describeSurface({ formula: 'Pt/Ni/Pt(111)' })).toMatchObject({ metal: null, host: 'Pt', guest: 'Ni', arrangement: 'subsurface', elements: ['Pt', 'Ni'], structure: 'fcc', formula: 'Ni/Pt subsurface' });
    expect(describeSurface({ formula: '2 ML Co/Ru(0001)' })).toMatchObject({ guestMonolayers: 2, host: 'Ru', guest: 'Co', arrangement: 'overlayer' });
  });

  it('has the key of a plain description where nothing rare is said', () => {
    expect(describeSurface({ metal: 'Ru', facet: '0001', site: 'terrace', sampleType: 'slab-model' }).key).toBe('["Ru","hcp","0001","terrace","slab-model",null,null]');
    expect(describeSurface({ metal: 'Ni', facet: '111', strainPercent: 0 }).key).toBe(describeSurface({ metal: 'Ni', facet: '111' }).key);
  });

  it.each(arrangements)('reads the name of a material with an arrangement again: %s', (arrangement) => {
    for (const guest of ['Ni', 'NiCo']) {
      const { formula } = describeSurface({ metal: 'Pt', guest, arrangement });
      expect(describeSurface({ formula })).toMatchObject({ formula, host: 'Pt', arrangement });
    }
  });

  it('says every site in words', () => {
    for (const site of siteTypes) expect(siteLabel(site).length).toBeGreaterThan(2);
  });
});

describe('one surface however it is written', () => {
  it.each<SurfaceInput[]>([
    [{ metal: 'Ni', facet: '(111)' }, { metal: 'Ni', structure: 'fcc', facet: '1 1 1' }, { formula: 'Ni', facet: '-1-11' }, { metal: 'Ni(111)' }, { metal: 'Ni', facet: 'Ni(222)' }],
    [{ metal: 'Ni', facet: '100' }, { metal: 'Ni', facet: '001' }, { metal: 'Ni', facet: '0 -1 0' }, { metal: 'Ni', facet: '200' }],
    [{ metal: 'Fe', facet: '110' }, { metal: 'Fe', facet: '011' }, { metal: 'Fe', facet: '(1 1̅ 0)' }],
    [{ metal: 'Ru', facet: '0001' }, { metal: 'Ru', facet: '(00.1)' }, { metal: 'Ru', facet: '000-1' }, { metal: 'Ru', facet: '0002' }, { metal: 'Ru(0001)' }],
    [{ metal: 'Ru', facet: '10-10' }, { metal: 'Ru', facet: '(10 1̅ 0)' }, { metal: 'Ru', facet: '10 -1 0' }, { metal: 'Ru', facet: '1 -1 0 0' }, { metal: 'Ru', facet: '01-10' }, { metal: 'Ru', facet: '10.0' }, { metal: 'Ru', facet: '1\\bar{1}00' }],
    [{ metal: 'Ru', facet: '11-20' }, { metal: 'Ru', facet: '2-1-10' }, { metal: 'Ru', facet: '11.0' }],
    [{ metal: 'Pt', facet: '533' }, { metal: 'Pt', facet: '335' }, { metal: 'Pt', facet: '(S)-[4(111)×(100)]' }, { formula: 'Pt(S)-[4(111)×(100)]' }, { metal: 'Pt', facet: 'Pt(S)-[4(111)x(100)]' }, { formula: 'Pt-4(111)×(100)' }],
    [{ metal: 'Pt', facet: '332' }, { metal: 'Pt', facet: '6(111)×(111)' }, { metal: 'Pt', facet: '5(111)×(110)' }],
    [{ formula: 'Ni3Fe' }, { formula: 'FeNi3' }, { formula: 'Ni0.75Fe0.25' }, { formula: 'Ni75Fe25' }, { formula: 'Ni₃Fe' }, { formula: 'Ni_{3}Fe' }, { formula: 'Ni 75 % Fe 25 %' }],
    [{ formula: 'PtRu' }, { formula: 'RuPt' }, { formula: 'Pt0.5Ru0.5' }, { formula: 'Pt50Ru50' }, { formula: 'Pt.5Ru.5' }, { formula: 'Pt1Ru1' }],
    [{ formula: 'Pt-Ru' }, { formula: 'Ru–Pt' }],
    [{ formula: 'Pt/Ni/Pt(111)' }, { formula: 'Pt-Ni-Pt(111)' }, { formula: 'Ni/Pt(111), subsurface' }, { metal: 'Pt', guest: 'Ni', arrangement: 'subsurface', facet: '111' }],
    [{ formula: 'Ni-Pt-Pt(111)' }, { formula: 'Ni/Pt(111) overlayer' }, { formula: 'Ni on Pt(111) overlayer' }, { formula: 'Ni/Pt overlayer', facet: '111' }],
    [{ formula: 'Pt1Cu(111)' }, { formula: 'Pt1/Cu(111)' }, { formula: 'Pt/Cu(111) SAA' }, { metal: 'Cu', guest: 'Pt', arrangement: 'single-atom', facet: '111' }],
    [{ metal: 'Ru', support: 'Al2O3' }, { metal: 'Ru', support: 'alumina' }, { metal: 'Ru', support: 'Al₂O₃' }, { formula: 'Ru/Al2O3' }, { metal: 'Ru/Al2O3', support: 'aluminium oxide' }],
    [{ metal: 'Ru', support: 'γ-Al2O3' }, { metal: 'Ru', support: 'gamma-alumina' }, { metal: 'Ru', support: 'gamma Al2O3' }],
    [{ metal: 'Pt', facet: '110-(1x2)' }, { metal: 'Pt', facet: '110', reconstruction: '1×2' }, { formula: 'Pt(110)-(1×2)', facet: '110' }],
  ])('%j', (...inputs) => {
    const first = describeSurface(inputs[0] as SurfaceInput);
    for (const input of inputs) {
      expect(describeSurface(input).key, JSON.stringify(input)).toBe(first.key);
      expect(describeSurface(input).label).toBe(first.label);
    }
  });

  it('keeps apart what differs', () => {
    const keys = ([
      { metal: 'Ni', facet: '111' }, { metal: 'Ni', facet: '111', site: 'step-edge' }, { formula: 'Ni/Pt(111) overlayer' }, { formula: 'Ni/Pt(111) subsurface' }, { metal: 'Pt', facet: '111' }, { formula: 'NiPt', facet: '111' },
      { formula: 'NiPt', facet: '111', structure: 'fcc' }, { formula: 'Ni-Pt', facet: '111' }, { formula: 'Ni1Pt(111)' }, { metal: 'Ni', support: 'γ-Al2O3' }, { metal: 'Ni', support: 'Al2O3' }, { metal: 'Pt', facet: '100-hex' }, { metal: 'Pt', facet: '100-(1x1)' }, { metal: 'Pt', facet: '100' },
      { formula: 'Ni3Fe', facet: '001' }, { formula: 'Ni3Fe', facet: '100' }, { formula: '2 ML Ni/Pt(111)' }, { metal: 'Ni', facet: '111', strainPercent: 2 }, { metal: 'Ru', support: 'MgO', dispersion: 0.2 }, { metal: 'Ru', support: 'MgO', dispersion: 0.3 },
    ] satisfies SurfaceInput[]).map((input) => describeSurface(input).key);
    expect(new Set(keys).size).toBe(keys.length);
  });
});

describe('what is no surface', () => {
  it.each<[SurfaceInput, string, RegExp]>([
    [{}, 'metal', /symbol/],
    [{ metal: 'Ni', formula: 'Ni3Fe' }, 'formula', /not both/],
    [{ metal: 'nickel' }, 'metal', /symbol: write Ni/],
    [{ metal: 'Aluminum' }, 'metal', /write Al/],
    [{ metal: 'steel' }, 'metal', /symbol/],
    [{ metal: 'Xx' }, 'metal', /vocabulary/],
    [{ metal: 'C' }, 'metal', /vocabulary/],
    [{ formula: 'NiXx' }, 'formula', /^Xx: not a metal/],
    [{ formula: '3NiFe' }, 'formula', /formula/],
    [{ formula: 'Ni1-xFex' }, 'formula', /shares by letters/],
    [{ formula: 'Ni0Fe' }, 'formula', /share of 0/],
    [{ formula: 'Ni-Ni' }, 'formula', /one metal twice/],
    [{ formula: 'Ni-Zz' }, 'formula', /Zz: not a metal/],
    [{ formula: 'Ni'.repeat(40) }, 'formula', /formula/],
    [{ metal: 'Ni', facet: 'abc' }, 'facet', /Miller/],
    [{ metal: 'Ni', facet: '0001' }, 'facet', /does not exist: an fcc structure takes three indices/],
    [{ metal: 'Fe', facet: '10-10' }, 'facet', /does not exist: a bcc structure/],
    [{ metal: 'Ni', facet: '000' }, 'facet', /differ from 0/],
    [{ metal: 'Ru', facet: '111' }, 'facet', /does not exist.*write 11-21/],
    [{ metal: 'Ru', facet: '001' }, 'facet', /does not exist.*write 0001/],
    [{ metal: 'Ru', facet: '1100' }, 'facet', /does not exist/],
    [{ formula: 'Co3Mo', facet: '1100' }, 'facet', /does not exist/],
    [{ metal: 'Ni(111)', facet: '100' }, 'facet', /names the facet 111, this field 100/],
    [{ metal: 'Fe', facet: '(S)-[4(111)×(100)]' }, 'facet', /read for fcc metals/],
    [{ metal: 'Pt', facet: '1(111)×(100)' }, 'facet', /two rows at least, not 1/],
    [{ metal: 'Pt', facet: '7(111)×(310)' }, 'facet', /no rule here/],
    [{ metal: 'Ni', facet: '100', site: 'fcc-hollow' }, 'site', /no fcc hollow: its hollows are fourfold/],
    [{ metal: 'Fe', facet: '100', site: 'threefold-hollow' }, 'site', /fourfold/],
    [{ metal: 'Ru', facet: '0001', site: 'fourfold-hollow' }, 'site', /threefold/],
    [{ formula: 'Ni/Pt(111)' }, 'formula', /layer of nickel on platinum or a layer of nickel under the first layer of platinum.*“Ni\/Pt overlayer” or “Ni\/Pt subsurface”/],
    [{ formula: 'Ni/Pt/SiO2' }, 'formula', /can be a layer/],
    [{ metal: 'Pt', guest: 'Ni' }, 'arrangement', /Say where Ni is/],
    [{ metal: 'Pt', arrangement: 'overlayer' }, 'guest', /Name the metal that makes the overlayer/],
    [{ metal: 'Pt', guest: 'Pt', arrangement: 'overlayer' }, 'guest', /leave the second metal out/],
    [{ metal: 'Pt', guest: 'Q', arrangement: 'overlayer' }, 'guest', /Q: not a metal/],
    [{ formula: 'MgO', guest: 'Ni', arrangement: 'single-atom' }, 'guest', /MgO is no metal.*under support/],
    [{ formula: 'Q@Pt' }, 'formula', /Q: not a metal/],
    [{ formula: 'Pt@Q' }, 'formula', /Q: not a metal/],
    [{ metal: 'Ru/MgO', support: 'Al2O3' }, 'support', /names MgO as its support, this field Al2O3/],
  ])('%j is refused at %s', (input, field, message) => {
    const error = refusal(input);
    expect(error.field).toBe(field);
    expect(error.message).toMatch(message);
  });
});
