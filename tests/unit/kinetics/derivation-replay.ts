import type { DerivationLine } from '#shared/kinetics/derivation.ts';

// Everything here is written anew from the published definitions: nothing of the computing core is used but the type of a line.

/** BIPM SI Brochure, 9th edition (exact), and CODATA 2022 for the hartree. */
const avogadro = 6.02214076e23;
const boltzmann = 1.380649e-23;
const planck = 6.62607015e-34;
const light = 299792458;
const charge = 1.602176634e-19;
const hartree = 4.359744722206e-18;
const gas = avogadro * boltzmann;

/** Sizes in SI, molecules counted in mol. NIST SP 811 (2008), appendix B. */
const sizes: Readonly<Record<string, number>> = {
  m: 1, dm: 0.1, cm: 1e-2, mm: 1e-3, um: 1e-6, nm: 1e-9, angstrom: 1e-10, L: 1e-3, mL: 1e-6,
  s: 1, ms: 1e-3, us: 1e-6, ns: 1e-9, ps: 1e-12, fs: 1e-15, min: 60, h: 3600, d: 86400,
  mol: 1, mmol: 1e-3, umol: 1e-6, nmol: 1e-9, kmol: 1e3, lbmol: 453.59237, molecule: 1 / avogadro, atom: 1 / avogadro, site: 1 / avogadro, M: 1e3, mM: 1,
  kg: 1, g: 1e-3, mg: 1e-6, lb: 0.45359237,
  Pa: 1, hPa: 100, kPa: 1e3, MPa: 1e6, GPa: 1e9, bar: 1e5, mbar: 100, atm: 101325, Torr: 101325 / 760, mTorr: 0.101325 / 760, mmHg: 133.322387415, psi: 6894.757293168361,
  ML: 1, K: 1, '%': 0.01, J: 1, kJ: 1e3, MJ: 1e6, cal: 4.184, kcal: 4184, eu: 4.184,
  Btu_IT: 1055.05585262, Btu_th: (4184 * 0.45359237 * 5) / 9, eV: charge, meV: charge / 1e3, hartree, rydberg: hartree / 2, kB: boltzmann,
};

/** Energies that stand for an energy per mole without saying so [J mol-1]. */
const molarEnergies: Readonly<Record<string, number>> = {
  eV: charge * avogadro, meV: (charge * avogadro) / 1e3, hartree: hartree * avogadro, rydberg: (hartree * avogadro) / 2, K: gas, 'cm-1': avogadro * planck * light * 100,
};

/** A unit in the one printed form (`cm2 molecule-1 s-1`, `kcal/mol`) in SI. */
function unitSize(unit: string): number {
  const [above, ...below] = unit.split('/');
  const part = (text: string): number =>
    text.split(' ').filter((factor) => factor !== '').reduce((product, factor) => {
      const [, name = '', exponent = '1'] = /^([A-Za-z_%]+)(-?[\d.]+)?$/.exec(factor) ?? [];
      const size = sizes[name];
      if (size === undefined) throw new Error(`the table has no "${factor}" of "${unit}"`);
      return product * size ** Number(exponent);
    }, 1);
  return below.reduce((product, text) => product / part(text), unit === '' || unit === '1' ? 1 : part(above ?? ''));
}

/** One or two figures of a line with what stands before and behind them. */
export interface Figure {
  bound: string;
  numbers: number[];
  unit: string;
}

/** Reads `≥ 22.1 kcal/mol` or `16.2 to 17.6 kcal/mol`; each number must stand there at full precision. */
export function readFigure(text: string): Figure {
  const found = /^(?:([<>≤≥≈]) )?(-?[\d.]+(?:e-?\d+)?)(?: to (-?[\d.]+(?:e-?\d+)?))?(?: (.+))?$/.exec(text);
  if (!found) throw new Error(`"${text}" is no figure`);
  const [, bound = '=', low = '', high, unit = ''] = found;
  return { bound: high === undefined ? bound : 'range', numbers: (high === undefined ? [low] : [low, high]).map(Number), unit };
}

const assumed = (line: DerivationLine, pattern: RegExp): number => {
  const found = pattern.exec(line.assumption ?? '')?.[1];
  if (found === undefined) throw new Error(`"${line.operation}" does not say ${String(pattern)}: ${line.assumption ?? 'it assumes nothing'}`);
  return Number(found);
};

const number = String.raw`(-?[\d.]+(?:e[+-]?\d+)?)`;
const temperature = new RegExp(`T0? = ${number} K`);
const density = new RegExp(`site density ${number} m-2`);

/** Operations that turn one unit into another. */
const unitChange = /^(SI unit|Thermochemical calorie|Temperature equivalent|Wavenumber|Electronvolt|Millielectronvolt|Hartree|Rydberg|Unit |Factor of|Inverse of: |Canonical unit kept|Energy)/;

/** What an operation multiplies by, from its words and the table above. */
function factorOf(line: DerivationLine, from: string, to: string): number {
  const { operation } = line;
  const power = (pattern: RegExp): number | null => {
    const found = pattern.exec(operation)?.[1];
    return found === undefined ? null : Number(found);
  };
  let g: number | null;
  if (/^(Multiplier of the column heading|Power of ten printed with the unit)$/.test(operation)) return assumed(line, new RegExp(`the printed figure times ${number} is the value`));
  if (/^(Rate convention not stated|Read 1 ML as one per site|Factor of a sticking coefficient kept)$/.test(operation)) return 1;
  if ((g = power(/divide the consumption rate by ([\d.]+)$/)) !== null) return 1 / g;
  if ((g = power(/^Divide by \(RT\)\^(-?[\d.]+)$/)) !== null) return (gas * assumed(line, temperature)) ** -g;
  if ((g = power(/^Multiply by \(RT\)\^(-?[\d.]+)$/)) !== null) return (gas * assumed(line, temperature)) ** g;
  if ((g = power(/^A_p = A_c\/\(R T0\)\^(-?[\d.]+);/)) !== null) return (gas * assumed(line, temperature)) ** -g;
  if ((g = power(/^Multiply by the site density(?: to the power |\^)(-?[\d.]+)$/)) !== null) return (assumed(line, density) / avogadro) ** g;
  if ((g = power(/^Divide by the site density\^(-?[\d.]+)$/)) !== null) return (assumed(line, density) / avogadro) ** -g;
  if (operation === 'Divide by the sites per mass') return avogadro / assumed(line, new RegExp(`^${number} sites per kg`));
  if ((g = power(/^k_site = k_rel θ_sat\^(-?[\d.]+)$/)) !== null) return assumed(line, new RegExp(`saturation at ${number} per site`)) ** g;
  if (/multiply by (half )?the nearest neighbours$/.test(operation)) return assumed(line, new RegExp(`${number} nearest neighbours`)) / (operation.includes('half') ? 2 : 1);
  if (!unitChange.test(operation)) throw new Error(`"${operation}" is no operation that can be re-run`);
  const molecules = (line.assumption ?? '').match(/molecule(-?\d*) is understood/);
  const understood = molecules ? (1 / avogadro) ** Number(molecules[1] || 1) : 1;
  const molar = to.endsWith('/mol') || from.endsWith('/mol') || to.endsWith('/lbmol') || from.endsWith('/lbmol');
  const perMole = (unit: string): number => (molar ? molarEnergies[unit] : undefined) ?? unitSize(unit);
  const particles = /^J mol-1 K-1$/.test(to) && !/mol|eu/.test(from) ? avogadro : 1;
  return ((perMole(from) * understood) / perMole(to)) * particles;
}

/** Runs a line again: the numbers its operation gives, beside those that it states. */
export function replay(line: DerivationLine): { given: number[]; stated: number[] } {
  const from = readFigure(line.from);
  const to = readFigure(line.to);
  if (from.bound !== to.bound) throw new Error(`"${line.from}" becomes "${line.to}"`);
  const factor = factorOf(line, from.unit, to.unit);
  return { given: from.numbers.map((value) => value * factor), stated: to.numbers };
}

const raised: Readonly<Record<string, string>> = { '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁵': '5', '⁶': '6', '⁷': '7', '⁸': '8', '⁹': '9', '⁻': '-' };

/** A second, plain reader of printed values: the figures only, without their uncertainty. */
export function readPlainly(printed: string): number[] {
  const text = printed
    .replace(/[⁰¹²³⁴-⁹⁻]+/g, (run) => `^${[...run].map((sign) => raised[sign]).join('')}`)
    .replace(/−/g, '-').replace(/–/g, ' to ').replace(/(?<=\d)[dD](?=[+-]?\d)/g, 'e')
    .replace(/^\s*(?:≈|~|ca\.|<=|>=|[<>≤≥])\s*/, '')
    .replace(/^\((-?[\d.]+) ± [\d.]+\)/, '$1').replace(/\s*\+[\d.]+\/-[\d.]+/, '').replace(/\s*±\s*[\d.]+/g, '').replace(/\(\d+\)/g, '').trim();
  return text.split(' to ').map((part) => {
    const logarithm = /^(log|ln) A = ([\d.]+)/.exec(part);
    if (logarithm) return logarithm[1] === 'ln' ? Math.exp(Number(logarithm[2])) : 10 ** Number(logarithm[2]);
    const power = /^10\^(-?[\d.]+)/.exec(part);
    if (power) return 10 ** Number(power[1]);
    const scientific = /^(-?[\d.]+)\s*[x×·]\s*10\^(-?\d+)/.exec(part);
    if (scientific) return Number(`${scientific[1]}e${scientific[2]}`);
    const plain = /^-?[\d.]+(?:[eE][+-]?\d+)?/.exec(part);
    if (!plain) throw new Error(`"${printed}" cannot be read plainly`);
    return Number(plain[0]);
  });
}
