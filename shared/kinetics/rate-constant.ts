import { N_A, R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requireNonNegative, requirePositive, requireTemperature } from './kinetics-error.ts';
import { basisScale, isAmbiguousArea, omissionCandidates, rateBasisOf, tidy, unitOfBasis, type RateBasis } from './rate-basis.ts';
import { dimensionText, findUnit, unitConstants, type Unit } from './units.ts';

/** Reads a unit or throws an error that names it. */
export function requireUnit(text: string, path: string): Unit {
  const unit = findUnit(text);
  if (unit === null) throw new KineticsError(path, `unknown unit ${JSON.stringify(text)}`, 'unknown-unit', text);
  return unit;
}

/** The error for `cm2 s-1`: a second-order surface constant and a diffusion coefficient look alike. */
export function ambiguousArea(unit: Unit, path: string): KineticsError {
  const written = unit.symbol.replace(' s-1', ' molecule-1 s-1');
  return new KineticsError(
    path,
    `${unit.symbol} may be a second-order surface rate constant or a diffusion coefficient: write ${written} for the first, or report the second as a diffusion coefficient`,
    'ambiguous-unit',
    unit.symbol,
  );
}

/** Input of a rate-constant conversion: one number at one temperature. */
export interface RateConstantInput {
  value: number;
  from: string;
  to: string;
  /** Temperature [K], needed between concentration and pressure. */
  temperatureK?: number | null;
  /** Site density [m-2], needed between areal and site basis. */
  siteDensityPerM2?: number | null;
  standardUncertainty?: number | null;
}

/** A converted rate constant with what it rests on. */
export interface ConvertedRateConstant {
  value: number;
  unit: string;
  standardUncertainty: number | null;
  assumptions: string[];
  derivation: DerivationLine[];
}

/** The constants between a rate unit and SI, with the molecule it leaves out; undefined when there are none. */
export function siConstants(unit: Unit, omittedMolecule: number): string | undefined {
  const sizes = unitConstants(unit);
  const count = omittedMolecule === 0 ? undefined : `N_A = ${quantityText(N_A)} mol-1`;
  return [sizes, count].filter((part) => part !== undefined).join(', ') || undefined;
}

function order(basis: RateBasis): number {
  return tidy(basis.gasConcentration + basis.gasPressure);
}

function compatible(a: RateBasis, b: RateBasis): boolean {
  return Math.abs(order(a) - order(b)) < 1e-9 && a.perMass === b.perMass && Math.abs(a.coverage - b.coverage) < 1e-9 && a.time === b.time;
}

function readBasis(unit: Unit, path: string): RateBasis {
  const basis = rateBasisOf(unit);
  if (basis === null || basis.time !== -1) {
    throw new KineticsError(path, `${unit.symbol} is not the unit of a rate constant: it has dimension ${dimensionText(unit.dimension)}, expected time-1`, 'incompatible-units', unit.symbol);
  }
  return basis;
}

/** Pairs of readings to try when a unit leaves out its molecule; the plain readings come first. */
function matchBases(from: Unit, to: Unit): { from: RateBasis; to: RateBasis } | null {
  for (const a of omissionCandidates(from)) {
    for (const b of omissionCandidates(to)) {
      const first = rateBasisOf(from, a) as RateBasis;
      const second = rateBasisOf(to, b) as RateBasis;
      if (compatible(first, second)) return { from: first, to: second };
    }
  }
  return null;
}

/**
 * Converts one rate constant at one temperature between units of the same rate law.
 *
 * Concentration and pressure: k_p = k_c/(RT)^g, exact for ideal gases. Areal and site basis: k_site = k Γ^(q-a), q the surface
 * factors taken as areal concentrations, a = 1 for a rate per area. No factor of 2 is applied for A + A.
 * Sources: SI Brochure, 9th edition; NIST SP 811 (2008); IUPAC glossary of terms used in chemical kinetics, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on unknown or contradicting units, or when the temperature or site density that is needed is missing.
 * @example convertRateConstant({ value: 1, from: 'm3 mol-1 s-1', to: 'Pa-1 s-1', temperatureK: 298.15 }).value // 4.033954554510349e-4
 */
export function convertRateConstant(input: RateConstantInput): ConvertedRateConstant {
  const value = requireFinite('value', input.value);
  const u = input.standardUncertainty ?? null;
  if (u !== null) requireNonNegative('standardUncertainty', u);
  const from = requireUnit(input.from, 'from');
  const to = requireUnit(input.to, 'to');
  readBasis(from, 'from');
  readBasis(to, 'to');
  if (isAmbiguousArea(from) !== isAmbiguousArea(to)) throw isAmbiguousArea(from) ? ambiguousArea(from, 'from') : ambiguousArea(to, 'to');
  const bases = matchBases(from, to);
  if (bases === null) {
    throw new KineticsError('to', `${from.symbol} and ${to.symbol} belong to different rate laws: ${dimensionText(from.dimension)} against ${dimensionText(to.dimension)}`, 'incompatible-units', input.to);
  }
  return walk(input, value, u, from, to, bases);
}

function walk(input: RateConstantInput, value: number, u: number | null, from: Unit, to: Unit, bases: { from: RateBasis; to: RateBasis }): ConvertedRateConstant {
  const derivation: DerivationLine[] = [];
  const assumptions: string[] = [];
  const source = basisScale(from, bases.from.omittedMolecule);
  const target = basisScale(to, bases.to.omittedMolecule);
  let numerator = source.numerator * target.denominator;
  let denominator = source.denominator * target.numerator;
  for (const [unit, basis] of [[from, bases.from], [to, bases.to]] as const) {
    if (basis.omittedMolecule !== 0) assumptions.push(`${unit.symbol} counts molecules: molecule${basis.omittedMolecule === 1 ? '' : basis.omittedMolecule} is understood`);
  }
  let current = { value: (value * source.numerator) / source.denominator, unit: unitOfBasis(bases.from).symbol };
  derivation.push(
    operationLine(`SI unit of ${from.symbol}`, { value, unit: from.symbol }, current, references.sp811, { constant: siConstants(from, bases.from.omittedMolecule) }),
  );
  const toConcentration = tidy(bases.to.gasConcentration - bases.from.gasConcentration);
  if (toConcentration !== 0) {
    if (input.temperatureK == null) {
      throw new KineticsError('temperatureK', `temperatureK is needed to convert ${from.symbol} to ${to.symbol}: k_c = k_p (RT)^g`, 'missing-input');
    }
    const T = requireTemperature('temperatureK', input.temperatureK);
    const factor = (R * T) ** Math.abs(toConcentration);
    if (toConcentration > 0) numerator *= factor;
    else denominator *= factor;
    const middle = { ...bases.from, gasConcentration: bases.to.gasConcentration, gasPressure: bases.to.gasPressure };
    const next = { value: toConcentration > 0 ? current.value * factor : current.value / factor, unit: unitOfBasis(middle).symbol };
    assumptions.push(`ideal gas at ${T} K`);
    derivation.push(
      operationLine(`${toConcentration > 0 ? 'Multiply' : 'Divide'} by (RT)^${Math.abs(toConcentration)}`, current, next, references.idealGas, {
        constant: `R = ${R} J mol-1 K-1`,
        assumption: `ideal gas at T = ${T} K`,
      }),
    );
    current = next;
  }
  const toSite = tidy(bases.from.areal - bases.to.areal);
  if (toSite !== 0) {
    if (input.siteDensityPerM2 == null) {
      throw new KineticsError('siteDensityPerM2', `siteDensityPerM2 is needed to convert ${from.symbol} to ${to.symbol}`, 'missing-input');
    }
    const density = requirePositive('siteDensityPerM2', input.siteDensityPerM2, 'site density', 'm-2');
    const factor = density ** Math.abs(toSite);
    const perMole = N_A ** Math.abs(toSite);
    if (toSite > 0) {
      numerator *= factor;
      denominator *= perMole;
    } else {
      numerator *= perMole;
      denominator *= factor;
    }
    const gamma = (density / N_A) ** Math.abs(toSite);
    const next = { value: toSite > 0 ? current.value * gamma : current.value / gamma, unit: unitOfBasis({ ...bases.to, omittedMolecule: 0 }).symbol };
    assumptions.push(`site density ${quantityText(density)} m-2`);
    derivation.push(
      operationLine(`${toSite > 0 ? 'Multiply' : 'Divide'} by the site density^${Math.abs(toSite)}`, current, next, references.siteBalance, {
        constant: `N_A = ${quantityText(N_A)} mol-1`,
        assumption: `site density ${quantityText(density)} m-2, the same amount unit on both sides`,
      }),
    );
    current = next;
  }
  const direct = from.symbol === to.symbol ? value : scaled(value, numerator, denominator);
  const last = derivation.at(-1) as DerivationLine;
  // One product of all factors rounds less than one at a time: where the last line ends in the unit asked for, it states that.
  if (current.unit === to.symbol) last.to = quantityText(direct, to.symbol);
  else derivation.push(operationLine(`Unit ${to.symbol}`, current, { value: direct, unit: to.symbol }, references.sp811, { constant: siConstants(to, bases.to.omittedMolecule) }));
  return { value: direct, unit: to.symbol, standardUncertainty: u === null ? null : from.symbol === to.symbol ? u : scaled(u, numerator, denominator), assumptions, derivation };
}

/** value × numerator / denominator without needless overflow. */
function scaled(value: number, numerator: number, denominator: number): number {
  const direct = (value * numerator) / denominator;
  return Number.isFinite(direct) && (direct !== 0 || value === 0) ? direct : value * (numerator / denominator);
}
