import { requireCoverage } from './coverage-energy.ts';
import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { KineticsError, requireNonNegative, requirePositive } from './kinetics-error.ts';
import { requireSticking } from './sticking-coefficient.ts';

/** A sticking coefficient at a coverage. */
export interface StickingAtCoverage {
  /** s(θ), 0 to 1. */
  sticking: number;
  derivation: DerivationLine[];
}

interface StickingCoverageInput {
  /** s0, at zero coverage. */
  sticking: number;
  /** θ, 0 to 1, relative to the sites that adsorption needs. */
  theta: number;
  /** Coverages that the relation was found over. */
  range?: { min: number; max: number };
}

/**
 * Sticking coefficient at a coverage by Langmuir's blocking of sites: s(θ) = s0 (1 - θ)^n.
 *
 * n is 1 for one free site and 2 for two independent ones; other orders are empirical.
 * Source: Langmuir, J. Am. Chem. Soc. 40 (1918) 1361.
 * @throws KineticsError on s0 or θ outside 0 to 1, θ outside the stated range, or n not above 0.
 * @example langmuirSticking({ sticking: 0.8, theta: 0.5, order: 2 }).sticking // 0.2
 */
export function langmuirSticking({ sticking, theta, order = 1, range }: StickingCoverageInput & { order?: number }): StickingAtCoverage {
  const s0 = requireSticking('sticking', sticking);
  const n = requirePositive('order', order);
  const result = s0 * (1 - requireCoverage('theta', theta, range)) ** n;
  return {
    sticking: result,
    derivation: [operationLine(`s(θ) = s0 (1 - θ)^n, θ = ${quantityText(theta)}, n = ${quantityText(n)}`, { value: s0 }, { value: result }, 'Langmuir, J. Am. Chem. Soc. 40 (1918) 1361')],
  };
}

const kisliukSources = {
  1: 'Kisliuk, J. Phys. Chem. Solids 3 (1957) 95',
  2: 'Kisliuk, J. Phys. Chem. Solids 5 (1958) 78',
} as const;

/**
 * Sticking coefficient at a coverage through a mobile precursor: s(θ) = s0/(1 + K (1/f - 1)), with f = 1 - θ or, for two sites, (1 - θ)².
 *
 * K is the precursor parameter: 1 is Langmuir's blocking of sites, below 1 the precursor finds free sites and s falls late, above 1 it falls early.
 * For K = 0 every trapped molecule finds a site while there is one. Sources: Kisliuk, J. Phys. Chem. Solids 3 (1957) 95 (one site); 5 (1958) 78 (two sites, at random).
 * @throws KineticsError on s0 or θ outside 0 to 1, θ outside the stated range, K below 0, or a count of sites other than 1 or 2.
 * @example kisliukSticking({ sticking: 0.8, theta: 0.5, precursorParameter: 0.25 }).sticking // 0.64
 */
export function kisliukSticking({ sticking, theta, precursorParameter, sites = 1, range }: StickingCoverageInput & { precursorParameter: number; sites?: 1 | 2 }): StickingAtCoverage {
  const s0 = requireSticking('sticking', sticking);
  const K = requireNonNegative('precursorParameter', precursorParameter, 'K');
  if (sites !== 1 && sites !== 2) throw new KineticsError('sites', `adsorption takes 1 or 2 sites here, got ${String(sites)}`, 'out-of-range', sites);
  const free = (1 - requireCoverage('theta', theta, range)) ** sites;
  // Multiplied out, so that a full surface gives 0 and not a division by zero.
  const result = free === 0 ? 0 : (s0 * free) / (free + K * (1 - free));
  return {
    sticking: result,
    derivation: [operationLine(`s(θ) = s0/(1 + K (1/f - 1)), f = ${sites === 1 ? '1 - θ' : '(1 - θ)²'}, θ = ${quantityText(theta)}, K = ${quantityText(K)}`, { value: s0 }, { value: result }, kisliukSources[sites])],
  };
}
