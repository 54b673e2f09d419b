import type { Term } from '#shared/contracts/vocabulary.ts';

/** Metals that are asked for together under one name. */
export interface MetalGroup {
  code: string;
  /** In the plural, as the sentence says it. */
  name: string;
  also: string;
  metals: readonly string[];
}

/** Groups of the periodic table by their number, and names in use for some metals together (common practice). */
const named: readonly MetalGroup[] = [
  { code: 'noble', name: 'noble metals', also: 'precious', metals: ['Ru', 'Rh', 'Pd', 'Ag', 'Os', 'Ir', 'Pt', 'Au'] },
  { code: 'platinum', name: 'platinum-group metals', also: 'PGM platinum metals', metals: ['Ru', 'Rh', 'Pd', 'Os', 'Ir', 'Pt'] },
  { code: 'coinage', name: 'coinage metals', also: 'group 11 copper silver gold', metals: ['Cu', 'Ag', 'Au'] },
  { code: 'iron', name: 'iron, cobalt and nickel', also: 'iron group triad ferromagnetic base metals', metals: ['Fe', 'Co', 'Ni'] },
  { code: '4', name: 'metals of group 4', also: 'titanium group', metals: ['Ti', 'Zr', 'Hf'] },
  { code: '5', name: 'metals of group 5', also: 'vanadium group', metals: ['V', 'Nb', 'Ta'] },
  { code: '6', name: 'metals of group 6', also: 'chromium group', metals: ['Cr', 'Mo', 'W'] },
  { code: '8', name: 'metals of group 8', also: 'iron ruthenium osmium', metals: ['Fe', 'Ru', 'Os'] },
  { code: '9', name: 'metals of group 9', also: 'cobalt rhodium iridium', metals: ['Co', 'Rh', 'Ir'] },
  { code: '10', name: 'metals of group 10', also: 'nickel palladium platinum', metals: ['Ni', 'Pd', 'Pt'] },
];

/** The groups that can be chosen among the metals of the vocabulary: those of the table and those of one structure, where they have several members. */
export function metalGroups(metals: readonly Term[]): MetalGroup[] {
  const known = new Set(metals.map(({ code }) => code));
  const byStructure = ['fcc', 'hcp', 'bcc'].map((structure) => ({
    code: structure, name: `${structure} metals`, also: 'structure', metals: metals.filter(({ data }) => data['structure'] === structure).map(({ code }) => code),
  }));
  return [...named, ...byStructure].map((group) => ({ ...group, metals: group.metals.filter((metal) => known.has(metal)) })).filter((group) => group.metals.length > 1);
}

/** The group that these metals are, all of them and no other. */
export function groupOfExactly(metals: readonly string[], groups: readonly MetalGroup[]): MetalGroup | null {
  return groups.find((group) => group.metals.length === metals.length && group.metals.every((metal) => metals.includes(metal))) ?? null;
}
