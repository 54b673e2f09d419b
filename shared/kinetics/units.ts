import { N_A } from './constants.ts';
import { quantityText } from './derivation.ts';
import { readUnitFactors, type UnitFactor } from './unit-text.ts';
import { dimensionNames, findToken, type Dimension, type DimensionName, type UnitToken } from './unit-tokens.ts';

/** A unit as people print it, with its size in SI (m, mol, kg, Pa, ML, J, K, s). */
export interface Unit {
  /** Registry id: the same as the printed form. */
  id: string;
  /** The one printed form, ASCII: `cm3 molecule-1 s-1`, `kJ/mol`. */
  symbol: string;
  dimension: Dimension;
  /** Size in SI units of the same dimension. */
  toSi: number;
  /** The size as a fraction, so that decimal steps stay exact. */
  numerator: number;
  denominator: number;
  /** Net exponent of particle counts (molecule, atom): each is worth 1/N_A mol. */
  molecular: number;
  /** True where the unit is written per site. */
  perSite: boolean;
  factors: readonly UnitFactor[];
}

const printOrder: DimensionName[] = ['energy', 'length', 'amount', 'mass', 'pressure', 'coverage', 'temperature', 'time'];

function rank(token: UnitToken): number {
  if (token.site) return 2.5;
  return Math.min(...Object.keys(token.dimension).map((name) => printOrder.indexOf(name as DimensionName)));
}

function printExponent(exponent: number): string {
  return exponent === 1 ? '' : String(exponent);
}

function printFactors(factors: readonly UnitFactor[]): string {
  if (factors.length === 0) return '1';
  const sorted = [...factors].sort((a, b) => Number(a.exponent < 0) - Number(b.exponent < 0) || rank(a.token) - rank(b.token) || a.token.symbol.localeCompare(b.token.symbol));
  const [first, second] = sorted;
  if (sorted.length === 2 && first?.token.dimension.energy === 1 && first.exponent === 1 && second?.exponent === -1 && second.token.dimension.amount === 1) {
    return `${first.token.symbol}/${second.token.symbol}`;
  }
  return sorted.map(({ token, exponent }) => `${token.symbol}${printExponent(exponent)}`).join(' ');
}

/** `s-1 site-1`, a rate per site without the word molecule, has no amount in it. */
function dropBareSite(factors: readonly UnitFactor[]): { counted: readonly UnitFactor[]; perSite: boolean } {
  const site = factors.find(({ token }) => token.site);
  if (!site || site.exponent >= 0) return { counted: factors, perSite: false };
  const hasAmount = factors.some(({ token, exponent }) => !token.site && (token.dimension.amount ?? 0) * exponent > 0);
  return { counted: hasAmount ? factors : factors.filter((factor) => factor !== site), perSite: true };
}

/**
 * Builds a unit from its factors, such as `readUnitFactors` finds; a rate per site without a count of molecules drops the site.
 *
 * @example buildUnit([]).symbol // '1'
 */
export function buildUnit(all: readonly UnitFactor[]): Unit {
  const { counted, perSite } = dropBareSite(all);
  const dimension = Object.fromEntries(dimensionNames.map((name) => [name, 0])) as Record<DimensionName, number>;
  let numerator = 1;
  let denominator = 1;
  let molecular = 0;
  for (const { token, exponent } of counted) {
    for (const name of dimensionNames) dimension[name] = Number((dimension[name] + (token.dimension[name] ?? 0) * exponent).toPrecision(12));
    const power = Math.abs(exponent);
    numerator *= (exponent > 0 ? token.numerator : token.denominator) ** power;
    denominator *= (exponent > 0 ? token.denominator : token.numerator) ** power;
    if (token.particle) molecular += exponent;
  }
  const symbol = printFactors(counted);
  return { id: symbol, symbol, dimension, toSi: numerator / denominator, numerator, denominator, molecular, perSite, factors: counted };
}

const known = new Map<string, Unit | null>();

/**
 * Reads a unit in any of its spellings, or null when it is none.
 *
 * `s-1`, `s^-1`, `1/s`, `s⁻¹`; `cm^3 molecule^-1 s^-1`, `cm3/(molecule s)`; `L/mol/s`, `M-1 s-1`; `Torr-1 s-1`; `kcal·mol⁻¹`.
 * Fractional exponents are read: `mol g-1 s-1 bar-0.3`. Capitals matter. An empty text is the dimensionless unit `1`.
 * Source: SI Brochure, 9th edition, 5.3 and 5.4; NIST SP 811 (2008).
 * @example findUnit('cm³ molecule⁻¹ s⁻¹')?.symbol // 'cm3 molecule-1 s-1'
 */
export function findUnit(text: string): Unit | null {
  const cached = known.get(text);
  if (cached !== undefined) return cached;
  const factors = readUnitFactors(text);
  const built = factors === null ? null : buildUnit(factors);
  const unit = built !== null && Number.isFinite(built.toSi) && built.toSi > 0 ? built : null;
  if (known.size > 2000) known.clear();
  known.set(text, unit);
  return unit;
}

const siSymbols: Record<DimensionName, string> = { length: 'm', amount: 'mol', mass: 'kg', pressure: 'Pa', coverage: 'ML', energy: 'J', temperature: 'K', time: 's' };

const siUnits = new Map<string, Unit>();

/**
 * The SI unit of a dimension, in the one printed form.
 *
 * @example siUnit({ length: 3, amount: -1, time: -1 }).symbol // 'm3 mol-1 s-1'
 */
export function siUnit(dimension: Partial<Record<DimensionName, number>>): Unit {
  let key = '';
  for (const name of dimensionNames) key += `${dimension[name] ?? 0} `;
  const known = siUnits.get(key);
  if (known !== undefined) return known;
  const factors: UnitFactor[] = [];
  for (const name of dimensionNames) {
    const exponent = dimension[name] ?? 0;
    if (exponent !== 0) factors.push({ token: findToken(siSymbols[name]) as UnitToken, exponent });
  }
  const unit = buildUnit(factors);
  if (siUnits.size > 2000) siUnits.clear();
  siUnits.set(key, unit);
  return unit;
}

/**
 * True when two units differ by a number only.
 *
 * @example sameDimension(findUnit('cm2 s-1'), findUnit('m2 h-1')) // true
 */
export function sameDimension(a: Unit, b: Unit): boolean {
  return dimensionNames.every((name) => Math.abs(a.dimension[name] - b.dimension[name]) < 1e-9);
}

/**
 * Converts between units of one dimension; the caller has checked that they are.
 *
 * @example scaleBetween(2, findUnit('min'), findUnit('s')) // 120
 */
export function scaleBetween(value: number, from: Unit, to: Unit): number {
  if (from.symbol === to.symbol) return value;
  const scaled = (value * (from.numerator * to.denominator)) / (from.denominator * to.numerator);
  return Number.isFinite(scaled) && scaled !== 0 ? scaled : value * (from.toSi / to.toSi);
}

/**
 * Writes a dimension in words.
 *
 * @example dimensionText(findUnit('cm3 molecule-1 s-1').dimension) // 'length3 amount-1 time-1'
 */
export function dimensionText(dimension: Dimension): string {
  const parts = dimensionNames.filter((name) => dimension[name] !== 0).map((name) => `${name}${printExponent(dimension[name])}`);
  return parts.length === 0 ? 'dimensionless' : parts.join(' ');
}

const constantsOf = new WeakMap<Unit, string>();

function factorConstant({ token }: UnitFactor): string[] {
  if (token.particle || token.site) return [`N_A = ${quantityText(N_A)} mol-1`];
  if (token.numerator === token.denominator) return [];
  // A decimal fraction is written as a number, another one as the fraction it is.
  const decimal = /^10*$/.test(String(token.denominator));
  const size = decimal ? quantityText(token.numerator / token.denominator) : `${token.numerator}/${token.denominator}`;
  return [`1 ${token.symbol} = ${size} ${siUnit(token.dimension).symbol}`.replace(/ 1$/, '')];
}

/**
 * The sizes that lie between a unit and SI, as a derivation names them; undefined when there are none.
 *
 * @example unitConstants(findUnit('Torr-1 min-1')) // '1 Torr = 101325/760 Pa, 1 min = 60 s'
 */
export function unitConstants(unit: Unit): string | undefined {
  const known = constantsOf.get(unit);
  if (known !== undefined) return known || undefined;
  const text = [...new Set(unit.factors.flatMap(factorConstant))].join(', ');
  constantsOf.set(unit, text);
  return text || undefined;
}

/** Kinds of unit that a picker offers. `pressure` is that of a rate per pressure, `gas` that of a pressure itself. */
export const unitKinds = [
  'energy', 'energy-more', 'first-order', 'second-order-gas', 'second-order-surface', 'third-order-gas', 'pressure', 'areal-rate', 'mass-rate', 'diffusion', 'entropy', 'temperature', 'dimensionless',
  'gas', 'concentration', 'amount', 'mass', 'length', 'area', 'site-density', 'time', 'heating', 'exposure',
] as const;

/** One of `unitKinds`. */
export type UnitKind = (typeof unitKinds)[number];

const pickers: Record<UnitKind, readonly string[]> = {
  energy: ['kJ/mol', 'kcal/mol', 'eV', 'meV', 'J/mol', 'cal/mol', 'K', 'cm-1', 'hartree', 'rydberg'],
  'energy-more': ['Btu_IT/lbmol', 'Btu_th/lbmol'],
  'first-order': ['s-1', 'min-1', 'h-1', 'ms-1', 'ML-1 s-1'],
  'second-order-gas': ['m3 mol-1 s-1', 'cm3 mol-1 s-1', 'L mol-1 s-1', 'cm3 molecule-1 s-1', 'M-1 s-1'],
  'second-order-surface': ['m2 mol-1 s-1', 'cm2 mol-1 s-1', 'm2 molecule-1 s-1', 'cm2 molecule-1 s-1'],
  'third-order-gas': ['m6 mol-2 s-1', 'cm6 mol-2 s-1', 'L2 mol-2 s-1', 'cm6 molecule-2 s-1'],
  pressure: ['Pa-1 s-1', 'kPa-1 s-1', 'mbar-1 s-1', 'bar-1 s-1', 'atm-1 s-1', 'Torr-1 s-1'],
  'areal-rate': ['mol m-2 s-1', 'mol cm-2 s-1', 'molecule cm-2 s-1', 'molecule m-2 s-1'],
  'mass-rate': ['mol kg-1 s-1', 'mol g-1 s-1', 'umol g-1 s-1', 'mmol g-1 h-1'],
  diffusion: ['m2 s-1', 'cm2 s-1'],
  entropy: ['J mol-1 K-1', 'cal mol-1 K-1', 'eV K-1', 'eu', 'kB'],
  temperature: ['K'],
  dimensionless: ['1'],
  gas: ['Pa', 'kPa', 'hPa', 'mbar', 'bar', 'atm', 'Torr', 'mTorr', 'mmHg', 'psi', 'MPa'],
  concentration: ['mol m-3', 'mol L-1', 'M', 'mM', 'mol cm-3', 'molecule cm-3', 'molecule m-3'],
  amount: ['mol', 'mmol', 'umol', 'nmol', 'kmol', 'molecule', 'atom', 'site', 'ML'],
  mass: ['kg', 'g', 'mg', 'ug', 'lb'],
  length: ['m', 'cm', 'mm', 'um', 'nm', 'angstrom', 'pm'],
  area: ['m2', 'cm2', 'mm2', 'nm2', 'angstrom2'],
  'site-density': ['site m-2', 'site cm-2', 'site nm-2', 'atom cm-2', 'mol m-2', 'mol cm-2'],
  time: ['s', 'min', 'h', 'd', 'ms', 'us', 'ns', 'ps', 'fs'],
  heating: ['K s-1', 'K min-1'],
  exposure: ['langmuir', 'Torr s', 'Pa s', 'mbar s'],
};

/**
 * The units that a picker offers for a kind, in the order to show; Btu stands in a second-level kind.
 *
 * @example listUnits('heating').map(({ symbol }) => symbol) // ['K s-1', 'K min-1']
 */
export function listUnits(kind: UnitKind): Unit[] {
  return pickers[kind].map((text) => findUnit(text) as Unit);
}
