import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requirePositive } from './kinetics-error.ts';
import { coverageDefinitions, type CoverageDefinition } from './quantity-symbols.ts';

/** How the parameters of a rate constant change with the coverage of one species. */
export interface CoverageTerm {
  /** The adsorbed species whose coverage counts, as the source writes it. */
  species: string;
  /** What the coverage is counted against. */
  definition: CoverageDefinition;
  /** α of the energy, per unit of coverage as defined [kJ mol-1]. */
  slopeKJPerMol: number;
  /** How the source prints it: 1 for E0 + αθ, which is taken when absent; -1 for E0 - αθ. */
  sign?: 1 | -1;
  /** Change of ln A per unit of coverage, always added; none when absent. */
  lnPreExponentialSlope?: number;
  /** Coverages that the slope was found over; 0 to 1 when absent. */
  range?: { min: number; max: number };
}

/** A coverage with what it is counted against. */
export interface Coverage {
  species: string;
  definition: CoverageDefinition;
  /** θ, 0 to 1. */
  theta: number;
}

/** Parameters at zero coverage, the terms, and the coverages to evaluate at. */
export interface CoverageInput {
  /** E0 [kJ mol-1]. */
  energyKJPerMol: number;
  /** A at zero coverage, in any unit; none when absent. */
  preExponential?: number;
  terms: readonly CoverageTerm[];
  coverages: readonly Coverage[];
}

/** The parameters at the coverages given. */
export interface AtCoverage {
  /** E(θ) [kJ mol-1]. */
  energyKJPerMol: number;
  /** ln A(θ); null without A. */
  lnPreExponential: number | null;
  /** A(θ), in the unit of A; null without A. */
  preExponential: number | null;
  derivation: DerivationLine[];
}

/**
 * Returns a coverage θ, or throws where it lies outside 0 to 1 or outside a stated range.
 *
 * @param path of the input, for the error
 * @param range the coverages that a relation was found over
 * @throws KineticsError naming the limits.
 * @example requireCoverage('theta', 0.25, { min: 0, max: 0.5 }) // 0.25
 */
export function requireCoverage(path: string, theta: number, range?: { min: number; max: number }): number {
  requireFinite(path, theta);
  if (theta < 0 || theta > 1) throw new KineticsError(path, `a coverage must lie from 0 to 1, got ${theta}`, 'out-of-range', theta);
  if (range && (theta < range.min || theta > range.max)) {
    throw new KineticsError(path, `θ = ${theta} is outside the coverages ${range.min} to ${range.max} that the relation holds for`, 'out-of-range', theta);
  }
  return theta;
}

function checkRange(path: string, range: { min: number; max: number } | undefined): void {
  if (!range) return;
  requireCoverage(`${path}.min`, range.min);
  requireCoverage(`${path}.max`, range.max);
  if (range.min > range.max) throw new KineticsError(path, `the range of coverages runs from ${range.min} down to ${range.max}`, 'out-of-range', range);
}

/** The coverage that a term needs, counted as the term counts it. */
function coverageFor(term: CoverageTerm, coverages: readonly Coverage[]): number {
  const index = coverages.findIndex(({ species }) => species === term.species);
  const found = coverages[index];
  if (!found) throw new KineticsError('coverages', `the coverage of ${term.species} is needed`, 'missing-input');
  if (found.definition !== term.definition) {
    throw new KineticsError(`coverages.${index}.definition`, `the coverage of ${term.species} is counted ${found.definition}, the slope ${term.definition}: bring them to one count`, 'incompatible-units', found.definition);
  }
  return requireCoverage(`coverages.${index}.theta`, found.theta, term.range);
}

function checkTerm(term: CoverageTerm, index: number, terms: readonly CoverageTerm[]): void {
  const path = `terms.${index}`;
  requireFinite(`${path}.slopeKJPerMol`, term.slopeKJPerMol);
  if (term.lnPreExponentialSlope !== undefined) requireFinite(`${path}.lnPreExponentialSlope`, term.lnPreExponentialSlope);
  if (!coverageDefinitions.includes(term.definition)) throw new KineticsError(`${path}.definition`, `unknown count of coverage ${JSON.stringify(term.definition)}`, 'unsupported', term.definition);
  if (terms.findIndex(({ species }) => species === term.species) !== index) throw new KineticsError(`${path}.species`, `${term.species} has two terms`, 'out-of-range', term.species);
  checkRange(`${path}.range`, term.range);
}

/**
 * Activation energy and pre-exponential factor at given coverages: E(θ) = E0 + Σ α_j θ_j and ln A(θ) = ln A0 + Σ β_j θ_j.
 *
 * The slope goes with the species, the sign as printed, the count of the coverage and the range it was found over; none is guessed.
 * The result serves `rateAt` as it is. Source: linear dependence on coverage, common practice of microkinetic models.
 * @throws KineticsError on a coverage outside 0 to 1 or the stated range, a missing coverage, one counted otherwise, two terms for one species, or A not above 0.
 * @example parametersAtCoverage({ energyKJPerMol: 120, terms: [{ species: 'CO*', definition: 'per-adsorption-site', slopeKJPerMol: 40, sign: -1 }], coverages: [{ species: 'CO*', definition: 'per-adsorption-site', theta: 0.5 }] }).energyKJPerMol // 100
 */
export function parametersAtCoverage(input: CoverageInput): AtCoverage {
  let energy = requireFinite('energyKJPerMol', input.energyKJPerMol);
  let lnA = input.preExponential === undefined ? null : Math.log(requirePositive('preExponential', input.preExponential, 'A'));
  const derivation: DerivationLine[] = [];
  input.terms.forEach((term, index) => {
    checkTerm(term, index, input.terms);
    const theta = coverageFor(term, input.coverages);
    const slope = (term.sign ?? 1) * term.slopeKJPerMol;
    const reference = 'linear dependence on coverage (common practice)';
    const range = term.range ? `, found over θ = ${term.range.min} to ${term.range.max}` : '';
    const assumption = `coverage counted ${term.definition}${range}`;
    const next = energy + slope * theta;
    derivation.push(operationLine(`E + αθ of ${term.species}, α = ${quantityText(slope)} kJ/mol, θ = ${quantityText(theta)}`, { value: energy, unit: 'kJ/mol' }, { value: next, unit: 'kJ/mol' }, reference, { assumption }));
    energy = next;
    if (lnA === null || term.lnPreExponentialSlope === undefined) return;
    const nextLnA = lnA + term.lnPreExponentialSlope * theta;
    derivation.push(operationLine(`ln A + βθ of ${term.species}, β = ${quantityText(term.lnPreExponentialSlope)}, θ = ${quantityText(theta)}`, { value: lnA }, { value: nextLnA }, reference, { assumption }));
    lnA = nextLnA;
  });
  if (derivation.length === 0) derivation.push(operationLine('No term of coverage: E kept', { value: energy, unit: 'kJ/mol' }, { value: energy, unit: 'kJ/mol' }, references.glossary));
  const preExponential = lnA === null ? null : Math.exp(lnA);
  if (preExponential !== null && !(preExponential > 0 && preExponential < Infinity)) throw new KineticsError('terms', `A leaves the range of double precision: ln A = ${lnA}`, 'out-of-range', lnA);
  return { energyKJPerMol: energy, lnPreExponential: lnA, preExponential, derivation };
}
