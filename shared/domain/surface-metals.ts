import type { Structure } from './kinds.ts';

/** What is known of a metal: its name and its crystal structure at room temperature. */
interface Metal {
  name: string;
  structure: Structure;
}

const rows: readonly [string, string, Structure][] = [
  ['Li', 'lithium', 'bcc'], ['Na', 'sodium', 'bcc'], ['K', 'potassium', 'bcc'], ['Rb', 'rubidium', 'bcc'], ['Cs', 'caesium', 'bcc'],
  ['Be', 'beryllium', 'hcp'], ['Mg', 'magnesium', 'hcp'], ['Ca', 'calcium', 'fcc'], ['Sr', 'strontium', 'fcc'], ['Ba', 'barium', 'bcc'],
  ['Al', 'aluminium', 'fcc'], ['Ga', 'gallium', 'other'], ['In', 'indium', 'other'], ['Tl', 'thallium', 'hcp'], ['Ge', 'germanium', 'other'], ['Sn', 'tin', 'other'], ['Pb', 'lead', 'fcc'], ['Sb', 'antimony', 'other'], ['Bi', 'bismuth', 'other'],
  ['Sc', 'scandium', 'hcp'], ['Ti', 'titanium', 'hcp'], ['V', 'vanadium', 'bcc'], ['Cr', 'chromium', 'bcc'], ['Mn', 'manganese', 'other'], ['Fe', 'iron', 'bcc'], ['Co', 'cobalt', 'hcp'], ['Ni', 'nickel', 'fcc'], ['Cu', 'copper', 'fcc'], ['Zn', 'zinc', 'hcp'],
  ['Y', 'yttrium', 'hcp'], ['Zr', 'zirconium', 'hcp'], ['Nb', 'niobium', 'bcc'], ['Mo', 'molybdenum', 'bcc'], ['Tc', 'technetium', 'hcp'], ['Ru', 'ruthenium', 'hcp'], ['Rh', 'rhodium', 'fcc'], ['Pd', 'palladium', 'fcc'], ['Ag', 'silver', 'fcc'], ['Cd', 'cadmium', 'hcp'],
  ['La', 'lanthanum', 'other'], ['Ce', 'cerium', 'fcc'], ['Pr', 'praseodymium', 'other'], ['Nd', 'neodymium', 'other'], ['Sm', 'samarium', 'other'], ['Eu', 'europium', 'bcc'], ['Gd', 'gadolinium', 'hcp'], ['Tb', 'terbium', 'hcp'], ['Dy', 'dysprosium', 'hcp'],
  ['Ho', 'holmium', 'hcp'], ['Er', 'erbium', 'hcp'], ['Tm', 'thulium', 'hcp'], ['Yb', 'ytterbium', 'fcc'], ['Lu', 'lutetium', 'hcp'], ['Th', 'thorium', 'fcc'], ['U', 'uranium', 'other'],
  ['Hf', 'hafnium', 'hcp'], ['Ta', 'tantalum', 'bcc'], ['W', 'tungsten', 'bcc'], ['Re', 'rhenium', 'hcp'], ['Os', 'osmium', 'hcp'], ['Ir', 'iridium', 'fcc'], ['Pt', 'platinum', 'fcc'], ['Au', 'gold', 'fcc'], ['Hg', 'mercury', 'other'],
];

const metals: ReadonlyMap<string, Metal> = new Map(rows.map(([symbol, name, structure]) => [symbol, { name, structure }]));

/** Crystal structure of the pure metals at room temperature (common handbook knowledge; from memory). */
export const metalStructures: Readonly<Record<string, Structure>> = Object.fromEntries(rows.map(([symbol, , structure]) => [symbol, structure]));

/** True for the symbol of a metal that surfaces are made of. */
export function isMetal(symbol: string): boolean {
  return metals.has(symbol);
}

/** The name of a metal by its symbol. */
export function metalName(symbol: string): string {
  return metals.get(symbol)?.name ?? symbol;
}

const otherNames: Readonly<Record<string, string>> = { aluminum: 'Al', wolfram: 'W', cesium: 'Cs', columbium: 'Nb' };

/** The symbol of a metal by its name, in any case; null where there is none. */
export function metalByName(name: string): string | null {
  const plain = name.toLowerCase();
  return otherNames[plain] ?? rows.find(([, known]) => known === plain)?.[0] ?? null;
}
