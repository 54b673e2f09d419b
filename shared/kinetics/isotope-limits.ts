import { readIsotopePair, type IsotopePair } from './isotope-pair.ts';
import { semiclassicalLimit } from './isotope-stretches.ts';

/** What a record says about an isotope effect. */
export interface IsotopeFacts {
  /** The isotopes compared, as the source names them. */
  isotopes?: string | null;
  /** Labelled atoms of the elementary step, such as `2H`. */
  labels?: readonly string[];
  /** The bond that breaks or forms, such as `C-H`. */
  bond?: string | null;
  /** Temperature of the value [K]. */
  temperatureK?: number | null;
  validRange?: { min?: number | null; max?: number | null } | null;
}

/** The limits that the checks judge an isotope effect by. */
export interface IsotopeLimits {
  /** Largest semiclassical hydrogen isotope effect; none where the isotopes or the temperature are not known. */
  semiclassicalLimit?: number;
  /** Where it comes from, in words. */
  semiclassicalLimitWords?: string;
  /** True for 13C, 15N and 18O against the common isotope. */
  heavyAtomIsotope: boolean;
}

/** Labels whose isotope effect is small: C, N and O by one or two mass units. */
const heavyAtoms: ReadonlySet<string> = new Set(['13C', '15N', '18O']);

function pairOf({ isotopes, labels = [] }: IsotopeFacts): IsotopePair | null {
  return (isotopes ? readIsotopePair(isotopes) : null) ?? readIsotopePair(labels.join(' '));
}

/**
 * The limits of an isotope effect, from what a record says: a semiclassical one for hydrogen, or that of a heavy atom.
 *
 * Without a temperature the lower end of the valid range is taken, where the limit is the largest.
 * Source: as for `semiclassicalLimit`; 0.9 to 1.15 for heavy atoms is common practice.
 * @example isotopeLimits({ isotopes: '14N/15N' }) // { heavyAtomIsotope: true }
 */
export function isotopeLimits(facts: IsotopeFacts): IsotopeLimits {
  const pair = pairOf(facts);
  if (pair === null) return { heavyAtomIsotope: false };
  if (pair.element !== 'H') return { heavyAtomIsotope: heavyAtoms.has(`${pair.heavy}${pair.element}`) };
  const temperatureK = facts.temperatureK ?? facts.validRange?.min ?? null;
  const limit = temperatureK !== null && temperatureK > 0 ? semiclassicalLimit({ bond: facts.bond ?? null, temperatureK, pair }) : null;
  return limit === null ? { heavyAtomIsotope: false } : { semiclassicalLimit: limit.limit, semiclassicalLimitWords: limit.words, heavyAtomIsotope: false };
}
