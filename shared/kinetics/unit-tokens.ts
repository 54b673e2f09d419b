import { N_A, atm, btuInternationalTable, btuThermochemical, c, E_h, e, h, k_B, pound } from './constants.ts';

/** Kinds of factor a unit is made of. Energy, pressure and amount stay factors of their own: units are compared as chemists write them. */
export const dimensionNames = ['length', 'amount', 'mass', 'pressure', 'coverage', 'energy', 'temperature', 'time'] as const;

/** One of `dimensionNames`. */
export type DimensionName = (typeof dimensionNames)[number];

/** Exponent of each factor. */
export type Dimension = Readonly<Record<DimensionName, number>>;

/** A factor of a unit: its size in SI as a fraction, so that decimal steps stay exact. */
export interface UnitToken {
  /** The one printed form. */
  symbol: string;
  /** Other spellings, read exactly as they stand. */
  spellings: readonly string[];
  dimension: Partial<Record<DimensionName, number>>;
  /** Size in SI units: numerator / denominator. */
  numerator: number;
  denominator: number;
  /** True for a count of particles (molecule, atom). */
  particle?: true;
  /** True for a count of sites. */
  site?: true;
}

function token(symbol: string, dimension: UnitToken['dimension'], numerator: number, denominator = 1, spellings: readonly string[] = []): UnitToken {
  return { symbol, spellings, dimension, numerator, denominator };
}

const length = { length: 1 };
const volume = { length: 3 };
const time = { time: 1 };
const amount = { amount: 1 };
const mass = { mass: 1 };
const pressure = { pressure: 1 };
const energy = { energy: 1 };

/** Every factor that units are read from. Sources: SI Brochure, 9th edition; NIST SP 811 (2008); CODATA 2022. */
export const unitTokens: readonly UnitToken[] = [
  token('m', length, 1, 1, ['metre', 'meter', 'metres', 'meters']),
  token('dm', length, 1, 10),
  token('cm', length, 1, 100, ['centimetre', 'centimeter']),
  token('mm', length, 1, 1000),
  token('um', length, 1, 1e6),
  token('nm', length, 1, 1e9),
  token('angstrom', length, 1, 1e10, ['Å', 'Ang', 'Angstrom', 'ångström', 'Ångström']),
  token('L', volume, 1, 1000, ['l', 'liter', 'litre', 'liters', 'litres', 'ℓ']),
  token('mL', volume, 1, 1e6, ['ml', 'cc', 'ccm']),
  token('s', time, 1, 1, ['sec', 'second', 'seconds', 'secs']),
  token('ms', time, 1, 1000, ['msec']),
  token('us', time, 1, 1e6, ['microsecond', 'microseconds']),
  token('ns', time, 1, 1e9),
  token('ps', time, 1, 1e12),
  token('fs', time, 1, 1e15),
  token('min', time, 60, 1, ['minute', 'minutes', 'mins']),
  token('h', time, 3600, 1, ['hr', 'hrs', 'hour', 'hours']),
  token('d', time, 86400, 1, ['day', 'days']),
  token('mol', amount, 1, 1, ['mole', 'moles', 'Mol', 'gmol', 'gmole', 'mols']),
  token('mmol', amount, 1, 1000),
  token('umol', amount, 1, 1e6, ['micromol']),
  token('nmol', amount, 1, 1e9),
  token('kmol', amount, 1000, 1, ['kgmol']),
  { ...token('molecule', amount, 1, N_A, ['molecules', 'molec', 'mlc', 'mcl', 'molecul', 'particle', 'particles', 'part', 'ion', 'ions']), particle: true },
  { ...token('atom', amount, 1, N_A, ['atoms', 'at']), particle: true },
  { ...token('site', amount, 1, N_A, ['sites']), site: true },
  token('M', { amount: 1, length: -3 }, 1000, 1, ['molar']),
  token('mM', { amount: 1, length: -3 }, 1),
  token('kg', mass, 1, 1),
  token('g', mass, 1, 1000, ['gram', 'grams']),
  token('mg', mass, 1, 1e6),
  token('lb', mass, pound),
  token('Pa', pressure, 1, 1, ['pascal']),
  token('hPa', pressure, 100),
  token('kPa', pressure, 1000),
  token('MPa', pressure, 1e6),
  token('GPa', pressure, 1e9),
  token('bar', pressure, 1e5, 1, ['Bar', 'bars']),
  token('mbar', pressure, 100, 1, ['millibar']),
  token('atm', pressure, atm, 1, ['Atm', 'atmosphere', 'atmospheres']),
  token('Torr', pressure, 101325, 760, ['torr', 'TORR']),
  token('mTorr', pressure, 101325, 760000, ['mtorr', 'millitorr']),
  // NIST SP 811, appendix B.8: the conventional millimetre of mercury, 133.3224 Pa.
  token('mmHg', pressure, 133.322387415, 1, ['mm_Hg']),
  token('psi', pressure, 6894.757293168361, 1, ['psia']),
  token('ML', { coverage: 1 }, 1, 1, ['monolayer', 'monolayers']),
  token('J', energy, 1, 1, ['joule', 'joules', 'Joule']),
  token('kJ', energy, 1000, 1, ['KJ', 'kj', 'kilojoule', 'kilojoules']),
  token('MJ', energy, 1e6),
  token('cal', energy, 4184, 1000, ['cal_th', 'calth', 'calorie', 'calories', 'gcal']),
  token('kcal', energy, 4184, 1, ['Kcal', 'KCal', 'kCal', 'kcalth', 'kcal_th', 'kilocalorie', 'kilocalories']),
  token('eV', energy, e, 1, ['ev', 'electronvolt', 'electronvolts']),
  token('meV', energy, e, 1000, ['mev']),
  token('hartree', energy, E_h, 1, ['Hartree', 'hartrees', 'Ha', 'Eh', 'E_h']),
  token('rydberg', energy, E_h, 2, ['Rydberg', 'Ry', 'Ryd', 'rydbergs']),
  token('kB', { energy: 1, temperature: -1 }, k_B, 1, ['k_B']),
  token('eu', { energy: 1, amount: -1, temperature: -1 }, 4184, 1000, ['EU']),
  token('K', { temperature: 1 }, 1, 1, ['kelvin', 'Kelvin']),
  token('%', {}, 1, 100, ['percent']),
  token('Btu_IT', energy, btuInternationalTable, 1, ['BTU_IT', 'BtuIT']),
  token('Btu_th', energy, btuThermochemical, 1, ['BTU_th', 'Btuth']),
  token('lbmol', amount, 453.59237, 1, ['lbmole', 'lb_mol']),
];

/** Energy of one particle [J] for a wavenumber of 1 cm-1: h c × 100 m-1. */
export const wavenumberEnergy = h * c * 100;

const bySpelling = new Map<string, UnitToken>();
for (const entry of unitTokens) {
  for (const spelling of [entry.symbol, ...entry.spellings]) bySpelling.set(spelling, entry);
}

/** The factor with exactly this spelling, or null. Capitals matter: `M` is mol/L, `m` metre, `ML` monolayer, `mL` millilitre. */
export function findToken(spelling: string): UnitToken | null {
  return bySpelling.get(spelling) ?? null;
}

/** How many spellings are registered, and how many are claimed twice: a test keeps the second at zero. */
export function spellingCollisions(): string[] {
  const seen = new Map<string, string>();
  const twice: string[] = [];
  for (const entry of unitTokens) {
    for (const spelling of [entry.symbol, ...entry.spellings]) {
      const other = seen.get(spelling);
      if (other !== undefined) twice.push(`${spelling}: ${other}, ${entry.symbol}`);
      seen.set(spelling, entry.symbol);
    }
  }
  return twice;
}
