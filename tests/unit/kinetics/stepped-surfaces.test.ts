import { describe, expect, it } from 'vitest';
import { millerOfTerraces, printTerraces, readTerraces, terracesOf } from '#shared/kinetics/stepped-surfaces.ts';
import { equivalentFacet, readFacet } from '#shared/kinetics/surfaces.ts';

/** Notation of Lang, Joyner & Somorjai, Surf. Sci. 30 (1972) 440; pairs as the literature of stepped platinum crystals has them, from memory. */
const pairs: [terraces: string, miller: string][] = [
  ['2(111)×(100)', '311'], ['3(111)×(100)', '211'], ['4(111)×(100)', '533'], ['5(111)×(100)', '322'], ['6(111)×(100)', '755'], ['7(111)×(100)', '433'], ['9(111)×(100)', '544'],
  ['2(111)×(111)', '110'], ['3(111)×(111)', '331'], ['4(111)×(111)', '221'], ['5(111)×(111)', '553'], ['6(111)×(111)', '332'], ['9(111)×(111)', '997'],
  ['2(111)×(110)', '331'], ['5(111)×(110)', '332'], ['8(111)×(110)', '997'],
  ['2(100)×(111)', '311'], ['3(100)×(111)', '511'], ['4(100)×(111)', '711'], ['5(100)×(111)', '911'],
  ['2(100)×(110)', '210'], ['3(100)×(110)', '310'], ['5(100)×(110)', '510'],
  ['2(110)×(111)', '331'], ['3(110)×(111)', '551'], ['2(110)×(100)', '210'], ['3(110)×(100)', '320'],
];

describe('stepped fcc surfaces', () => {
  it.each(pairs)('%s is (%s)', (typed, miller) => {
    const terraces = readTerraces(typed);
    expect(terraces && millerOfTerraces(terraces)).toBe(miller);
    if (miller !== '110') expect(terracesOf(miller)).toContainEqual(terraces);
  });

  it.each([
    ['(S)-[4(111)×(100)]', '4(111)×(100)'], ['(s)-[4(111)x(100)]', '4(111)×(100)'], ['4 (111) * (001)', '4(111)×(100)'], ['[3(111)×(11-1)]', '3(111)×(111)'], ['3(111)×(111\u0305)', '3(111)×(111)'],
  ])('reads %s', (typed, plain) => {
    expect(readTerraces(typed)).toEqual(readTerraces(plain));
  });

  it.each(['533', 'S', '(S)-[(111)×(100)]', '4(111)', '4(11)x(100)(111)', ''])('finds no terraces in %s', (typed) => {
    expect(readTerraces(typed)).toBeNull();
  });

  it.each(['111', '100', '110', '321', '10 8 7', '411', '0001', 'abc'])('names no terraces of (%s)', (facet) => {
    expect(terracesOf(facet)).toEqual([]);
  });

  it('has no rule for one row, or for kinked steps', () => {
    expect(millerOfTerraces({ rows: 1, terrace: '111', step: '100' })).toBeNull();
    expect(millerOfTerraces({ rows: 7, terrace: '111', step: '310' })).toBeNull();
  });

  it('writes the notation', () => {
    expect(terracesOf('331').map((terraces) => printTerraces(terraces, 'Pt'))).toEqual(['Pt(S)-[3(111)×(111)]', 'Pt(S)-[2(111)×(110)]', 'Pt(S)-[2(110)×(111)]']);
  });

  /**
   * The relations by the geometry of the fcc lattice: the height of a step over the tangent of the angle to the terrace is the width from edge to edge;
   * in rows of the terrace it is n less the part of a row by which the next terrace is set back under the edge.
   */
  const geometry: [terrace: string, step: string, height: number, row: number, setBack: number][] = [
    ['111', '100', 1 / Math.sqrt(3), Math.sqrt(6) / 4, 1 / 3], ['111', '111', 1 / Math.sqrt(3), Math.sqrt(6) / 4, 2 / 3],
    ['100', '111', 1 / 2, Math.SQRT1_2, 1 / 2], ['100', '110', 1 / 2, 1 / 2, 0], ['110', '111', Math.SQRT2 / 4, 1, 1 / 2], ['110', '100', Math.SQRT2 / 4, Math.SQRT1_2, 1 / 2],
  ];
  it.each(geometry)('(%s) terraces with (%s) steps are as wide as they are said to be', (terrace, step, height, row, setBack) => {
    for (let rows = 3; rows <= 20; rows += 1) {
      const surface = readFacet(millerOfTerraces({ rows, terrace, step }) as string) as number[];
      const flat = [...(readFacet(terrace) as number[])].sort((a, b) => b - a);
      const cosine = surface.reduce((sum, index, i) => sum + index * (flat[i] as number), 0) / Math.hypot(...surface) / Math.hypot(...flat);
      expect(height / Math.tan(Math.acos(cosine)) / row + setBack).toBeCloseTo(rows, 6);
    }
  });
});

describe('facets alike by symmetry', () => {
  it.each([
    ['fcc', '001', '100'], ['fcc', '0-10', '100'], ['bcc', '011', '110'], ['fcc', '1-1-1', '111'], ['fcc', '222', '111'], ['fcc', '557', '755'], ['fcc', '10 8 7', '10 8 7'], ['fcc', '-7 10 8', '10 8 7'],
    ['hcp', '000-1', '0001'], ['hcp', '0002', '0001'], ['hcp', '01-10', '10-10'], ['hcp', '-1010', '10-10'], ['hcp', '2-1-10', '11-20'], ['hcp', '-12-10', '11-20'], ['hcp', '01-1-1', '10-11'], ['hcp', '10.2', '10-12'], ['hcp', '12-30', '21-30'],
    ['hcp', '001', null], ['fcc', '0001', null], ['fcc', '000', null],
  ])('%s(%s) is %s', (structure, facet, name) => {
    expect(equivalentFacet(structure, facet)).toBe(name);
    if (name) expect(equivalentFacet(structure, name)).toBe(name);
  });

  it.each([['10 -1 0', [1, 0, -1, 0]], ['10 1̅ 0', [1, 0, -1, 0]], ['00.1', [0, 0, 0, 1]], ['(11·0)', [1, 1, -2, 0]], ['1\\bar{1}00', [1, -1, 0, 0]], ['10\\overline{1}0', [1, 0, -1, 0]], ['111', [1, 1, 1]]])('reads %s of an hcp metal', (text, indices) => {
    expect(readFacet(text, 'hcp')).toEqual(indices);
  });
});
