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

/** Every factor that units are read from. Sources: SI Brochure, 9th edition; NIST SP 811 (2008), appendix B; CODATA 2022. */
export const unitTokens: readonly UnitToken[] = [
  token('m', length, 1, 1, ['metre', 'meter', 'metres', 'meters']),
  token('dm', length, 1, 10, ['decimetre', 'decimeter']),
  token('cm', length, 1, 100, ['centimetre', 'centimeter', 'centimetres', 'centimeters']),
  token('mm', length, 1, 1000, ['millimetre', 'millimeter']),
  token('um', length, 1, 1e6, ['micrometre', 'micrometer', 'micron', 'microns']),
  token('nm', length, 1, 1e9, ['nanometre', 'nanometer', 'nanometres', 'nanometers']),
  token('angstrom', length, 1, 1e10, ['Å', 'Ang', 'Angstrom', 'Angstroms', 'angstroms', 'ångström', 'Ångström', 'angström', 'Angström']),
  token('pm', length, 1, 1e12, ['picometre', 'picometer']),
  token('L', volume, 1, 1000, ['l', 'liter', 'litre', 'liters', 'litres', 'Liter', 'Litre', 'lit', 'ltr', 'ℓ']),
  token('mL', volume, 1, 1e6, ['ml', 'cc', 'ccm', 'milliliter', 'millilitre']),
  token('uL', volume, 1, 1e9, ['ul', 'microliter', 'microlitre']),
  token('s', time, 1, 1, ['sec', 'second', 'seconds', 'secs', 'Sec', 'Second', 'Seconds']),
  token('ms', time, 1, 1000, ['msec', 'millisecond', 'milliseconds']),
  token('us', time, 1, 1e6, ['usec', 'microsec', 'microsecond', 'microseconds']),
  token('ns', time, 1, 1e9, ['nsec', 'nanosecond', 'nanoseconds']),
  token('ps', time, 1, 1e12, ['psec', 'picosecond', 'picoseconds']),
  token('fs', time, 1, 1e15, ['fsec', 'femtosecond', 'femtoseconds']),
  token('min', time, 60, 1, ['minute', 'minutes', 'mins', 'Min']),
  token('h', time, 3600, 1, ['hr', 'hrs', 'hour', 'hours', 'Hr', 'Hour', 'Hours']),
  token('d', time, 86400, 1, ['day', 'days']),
  token('week', time, 604800, 1, ['weeks', 'wk']),
  // A frequency stands for a rate per second: attempt frequencies are printed so.
  token('Hz', { time: -1 }, 1, 1, ['hertz', 'Hertz']),
  token('kHz', { time: -1 }, 1e3),
  token('MHz', { time: -1 }, 1e6),
  token('GHz', { time: -1 }, 1e9),
  token('THz', { time: -1 }, 1e12, 1, ['terahertz']),
  token('mol', amount, 1, 1, ['mole', 'moles', 'Mol', 'Mole', 'gmol', 'gmole', 'gmoles', 'mols']),
  token('mmol', amount, 1, 1000, ['mmole', 'mmoles', 'millimole', 'millimoles', 'mmols']),
  token('umol', amount, 1, 1e6, ['umole', 'umoles', 'micromol', 'micromole', 'micromoles', 'umols']),
  token('nmol', amount, 1, 1e9, ['nmole', 'nmoles', 'nanomole', 'nanomoles']),
  token('pmol', amount, 1, 1e12, ['pmole', 'picomole', 'picomoles']),
  token('kmol', amount, 1000, 1, ['kmole', 'kmoles', 'kgmol', 'kgmole', 'kilomole', 'kilomoles']),
  token('lbmol', amount, 453.59237, 1, ['lbmole', 'lbmoles', 'lb_mol']),
  { ...token('molecule', amount, 1, N_A, ['molecules', 'Molecule', 'Molecules', 'molec', 'molecs', 'mlc', 'mcl', 'molecul', 'particle', 'particles', 'part', 'ion', 'ions', 'radical', 'radicals']), particle: true },
  { ...token('atom', amount, 1, N_A, ['atoms', 'Atom', 'Atoms', 'at', 'adatom', 'adatoms']), particle: true },
  { ...token('site', amount, 1, N_A, ['sites', 'Site', 'Sites']), site: true },
  token('M', { amount: 1, length: -3 }, 1000, 1, ['molar']),
  token('mM', { amount: 1, length: -3 }, 1, 1, ['millimolar']),
  token('uM', { amount: 1, length: -3 }, 1, 1000, ['micromolar']),
  token('nM', { amount: 1, length: -3 }, 1, 1e6, ['nanomolar']),
  token('kg', mass, 1, 1, ['kilogram', 'kilograms']),
  token('g', mass, 1, 1000, ['gram', 'grams', 'gm', 'gms', 'gramme', 'grammes']),
  token('mg', mass, 1, 1e6, ['milligram', 'milligrams']),
  token('ug', mass, 1, 1e9, ['microgram', 'micrograms']),
  token('ng', mass, 1, 1e12, ['nanogram', 'nanograms']),
  token('lb', mass, pound, 1, ['lbs', 'lbm', 'pound', 'pounds']),
  token('Pa', pressure, 1, 1, ['pascal', 'pascals', 'Pascal', 'Pascals']),
  token('hPa', pressure, 100, 1, ['hectopascal', 'hectopascals']),
  token('kPa', pressure, 1000, 1, ['KPa', 'kpa', 'kilopascal', 'kilopascals']),
  token('MPa', pressure, 1e6, 1, ['megapascal', 'megapascals']),
  token('GPa', pressure, 1e9, 1, ['gigapascal', 'gigapascals']),
  token('bar', pressure, 1e5, 1, ['Bar', 'bars', 'BAR']),
  token('kbar', pressure, 1e8, 1, ['kilobar', 'kilobars']),
  token('mbar', pressure, 100, 1, ['millibar', 'millibars', 'mBar']),
  token('ubar', pressure, 1, 10, ['microbar', 'microbars']),
  token('atm', pressure, atm, 1, ['Atm', 'ATM', 'atms', 'atmosphere', 'atmospheres']),
  token('Torr', pressure, 101325, 760, ['torr', 'TORR', 'torrs', 'Torrs']),
  token('mTorr', pressure, 101325, 760000, ['mtorr', 'millitorr', 'milliTorr']),
  // NIST SP 811, appendix B.8: the conventional millimetre of mercury, 133.3224 Pa.
  token('mmHg', pressure, 133.322387415, 1, ['mm_Hg', 'mmhg', 'mmHG']),
  token('psi', pressure, 6894.757293168361, 1, ['psia', 'PSI', 'PSIA']),
  // A force: `dyn cm-2` is a pressure of 0.1 Pa.
  token('dyn', { pressure: 1, length: 2 }, 1, 1e5, ['dyne', 'dynes']),
  // An exposure: 1e-6 Torr s. A bare L is a litre.
  token('langmuir', { pressure: 1, time: 1 }, 101325, 760e6, ['Langmuir', 'langmuirs', 'Langmuirs']),
  token('ML', { coverage: 1 }, 1, 1, ['monolayer', 'monolayers', 'Monolayer', 'Monolayers']),
  token('J', energy, 1, 1, ['joule', 'joules', 'Joule', 'Joules']),
  token('kJ', energy, 1000, 1, ['KJ', 'Kj', 'kj', 'kilojoule', 'kilojoules']),
  token('MJ', energy, 1e6, 1, ['megajoule', 'megajoules']),
  token('erg', energy, 1, 1e7, ['ergs']),
  token('cal', energy, 4184, 1000, ['cal_th', 'calth', 'cals', 'calorie', 'calories', 'gcal']),
  token('kcal', energy, 4184, 1, ['Kcal', 'KCal', 'kCal', 'KCAL', 'kcals', 'Kcals', 'kcalth', 'kcal_th', 'kilocalorie', 'kilocalories']),
  token('cal_IT', energy, 41868, 10000, ['calIT']),
  token('kcal_IT', energy, 41868, 10, ['kcalIT']),
  token('eV', energy, e, 1, ['ev', 'EV', 'electronvolt', 'electronvolts']),
  token('meV', energy, e, 1000, ['mev', 'millielectronvolt', 'millielectronvolts']),
  token('hartree', energy, E_h, 1, ['Hartree', 'hartrees', 'Hartrees', 'Ha', 'Eh', 'E_h']),
  token('mhartree', energy, E_h, 1000, ['mHartree', 'millihartree', 'mHa', 'mEh']),
  token('rydberg', energy, E_h, 2, ['Rydberg', 'Ry', 'Ryd', 'rydbergs', 'Rydbergs']),
  token('mrydberg', energy, E_h, 2000, ['mRydberg', 'mRy', 'mRyd']),
  token('kB', { energy: 1, temperature: -1 }, k_B, 1, ['k_B']),
  token('eu', { energy: 1, amount: -1, temperature: -1 }, 4184, 1000, ['EU']),
  token('Btu_IT', energy, btuInternationalTable, 1, ['BTU_IT', 'BtuIT']),
  token('Btu_th', energy, btuThermochemical, 1, ['BTU_th', 'Btuth']),
  // `deg` stands for the kelvin of older entropies, `cal mol-1 deg-1`.
  token('K', { temperature: 1 }, 1, 1, ['kelvin', 'Kelvin', 'kelvins', 'deg', 'degK', 'deg_K']),
  token('%', {}, 1, 100, ['percent', 'pct']),
  token('ppm', {}, 1, 1e6),
  token('ppb', {}, 1, 1e9),
];

/** Energy of one particle [J] for a wavenumber of 1 cm-1: h c × 100 m-1. */
export const wavenumberEnergy = h * c * 100;

const bySpelling = new Map<string, UnitToken>();
for (const entry of unitTokens) {
  for (const spelling of [entry.symbol, ...entry.spellings]) bySpelling.set(spelling, entry);
}

/**
 * The factor with exactly this spelling, or null. Capitals matter: `M` is mol/L, `m` metre, `ML` monolayer, `mL` millilitre.
 *
 * @example findToken('torr').symbol // 'Torr'
 */
export function findToken(spelling: string): UnitToken | null {
  return bySpelling.get(spelling) ?? null;
}

/**
 * The spellings that two factors claim, each with both: a test keeps the list empty.
 *
 * @example spellingCollisions() // []
 */
export function spellingCollisions(tokens: readonly UnitToken[] = unitTokens): string[] {
  const seen = new Map<string, string>();
  const twice: string[] = [];
  for (const entry of tokens) {
    for (const spelling of [entry.symbol, ...entry.spellings]) {
      const other = seen.get(spelling);
      if (other !== undefined) twice.push(`${spelling}: ${other}, ${entry.symbol}`);
      seen.set(spelling, entry.symbol);
    }
  }
  return twice;
}
