import { describe, expect, it } from 'vitest';
import { siteTypes, type SiteType } from '#shared/domain/kinds.ts';
import { describeSurface, siteLabel } from '#shared/domain/surface.ts';
import { equivalentFacet, facetIsPossible, siteDensity } from '#shared/kinetics/surfaces.ts';
import { readMetals, readVocabulary, vocabularyKinds } from '#seeds/vocabulary/read-vocabulary.ts';

const words = readVocabulary();
const ofKind = (kind: string) => words.filter((word) => word.kind === kind);

describe('the vocabulary', () => {
  it.each(vocabularyKinds)('holds no code or synonym of %s twice', (kind) => {
    const seen = new Map<string, string>();
    for (const { code, synonyms, data } of ofKind(kind)) {
      const scopes = Array.isArray(data['structures']) ? (data['structures'] as string[]) : [''];
      for (const scope of scopes) {
        for (const name of new Set([code, ...synonyms].map((text) => `${scope} ${text.toLowerCase()}`))) {
          expect(seen.get(name) ?? code, `${name} stands for two words`).toBe(code);
          seen.set(name, code);
        }
      }
    }
    expect(seen.size).toBeGreaterThanOrEqual(10);
  });

  it('has the nine metals of the demonstration and the thirteen step classes', () => {
    expect(ofKind('metal').map(({ code }) => code)).toEqual(expect.arrayContaining(['Ru', 'Ni', 'Co', 'Fe', 'Rh', 'Ir', 'Pt', 'Pd', 'Cu']));
    expect(ofKind('step-class').map(({ code }) => code).sort()).toEqual([
      'adsorption', 'association', 'associative-desorption', 'dehydrogenation', 'desorption', 'diffusion', 'disproportionation', 'dissociation',
      'dissociative-adsorption', 'eley-rideal', 'hydrogenation', 'isomerisation', 'overall',
    ]);
  });

  it('finds temperature-programmed desorption under the short name of papers', () => {
    const found = ofKind('technique').find(({ code }) => code === 'TPD');
    expect(found).toMatchObject({ label: 'temperature-programmed desorption', data: { class: 'measured' } });
    expect(found?.synonyms).toContain('TDS');
  });

  it.each(ofKind('facet').map((word) => [word.code, word.data['structures'] as string[]]))('allows facet %s for %j only', (code, structures) => {
    for (const structure of ['fcc', 'bcc', 'hcp']) {
      if (structures.includes(structure)) expect(facetIsPossible(structure, code)).toBe(true);
    }
    expect(structures.includes('hcp')).toBe(code.replaceAll('-', '').length === 4);
    for (const structure of structures) expect(equivalentFacet(structure, code)).toBe(code);
  });

  it.each(ofKind('alloy').map(({ code, data }) => [code, data['elements']]))('names the alloy %s as the reader of surfaces does', (code, elements) => {
    expect(describeSurface({ formula: code as string })).toMatchObject({ formula: code, elements, metal: null });
  });

  it('has a word for every kind of site, and says it as surfaces do', () => {
    expect(ofKind('site').map(({ code }) => code)).toEqual([...siteTypes]);
    for (const { code, label } of ofKind('site')) expect(label).toBe(siteLabel(code as SiteType));
  });

  it('knows the structure of its metals as the reader of surfaces does, and the lattice constant where it is cubic or hexagonal', () => {
    for (const { code, data } of readMetals()) {
      expect(describeSurface({ metal: code }).structure).toBe(data.structure);
      expect(data.aAngstrom === undefined).toBe(data.structure === 'other');
    }
  });
});

/** Lattice constants [Å] of ASE 3.22.1, ase.data.reference_states: rounded, so held to 0.5 %. */
const published: [string, number][] = [
  ['Ni', 3.52], ['Pd', 3.89], ['Pt', 3.92], ['Rh', 3.8], ['Cu', 3.61], ['Ag', 4.09], ['Au', 4.08], ['Ir', 3.84], ['Fe', 2.87], ['W', 3.16],
  ['Mo', 3.15], ['Re', 2.76], ['Os', 2.74],
];

describe('the lattice constants', () => {
  const metals = new Map(readMetals().map((metal) => [metal.code, metal.data]));

  it.each(published)('of %s are near the published %s Å', (symbol, aAngstrom) => {
    const a = metals.get(symbol)?.aAngstrom ?? 0;
    expect(Math.abs(a / aAngstrom - 1)).toBeLessThan(0.005);
  });

  it('give a c/a near 1.6 for hexagonal metals, and no c for cubic ones', () => {
    for (const [symbol, { structure, aAngstrom, cAngstrom }] of metals) {
      if (structure !== 'hcp') expect(cAngstrom, symbol).toBeUndefined();
      else {
        // Zinc and cadmium are stretched along c (1.86, 1.89); the others lie between 1.57 and 1.63. From memory.
        expect((cAngstrom ?? 0) / (aAngstrom ?? 0), symbol).toBeGreaterThan(1.56);
        expect((cAngstrom ?? 0) / (aAngstrom ?? 0), symbol).toBeLessThan(['Zn', 'Cd'].includes(symbol) ? 1.89 : 1.64);
      }
    }
  });

  it.each([['Ru', '0001'], ['Ni', '111'], ['Fe', '110']])('of %s give a density of the (%s) plane between 1.4e19 and 1.9e19 atoms m-2', (symbol, facet) => {
    const { structure, aAngstrom } = metals.get(symbol) ?? { structure: 'other' };
    const { perM2 } = siteDensity({ structure, facet, aAngstrom: aAngstrom ?? 0 });
    expect(perM2).toBeGreaterThan(1.4e19);
    expect(perM2).toBeLessThan(1.9e19);
  });
});
