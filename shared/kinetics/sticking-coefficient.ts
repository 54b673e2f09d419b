import { KineticsError, requireFinite } from './kinetics-error.ts';

/**
 * Returns a sticking coefficient, or throws where it lies outside 0 to 1.
 *
 * @throws KineticsError naming `path`.
 * @example requireSticking('sticking', 0.8) // 0.8
 */
export function requireSticking(path: string, sticking: number): number {
  requireFinite(path, sticking);
  if (sticking < 0 || sticking > 1) throw new KineticsError(path, `the sticking coefficient must lie from 0 to 1, got ${sticking}`, 'out-of-range', sticking);
  return sticking;
}

/** Whether a computed sticking coefficient is above 1, in a flag and in words. */
export interface StickingFlag {
  /** True where more molecules would stick than strike. */
  aboveOne: boolean;
  warnings: string[];
}

/**
 * Flags a computed sticking coefficient above 1, which is not refused: it tells of a slip in what it was computed from.
 *
 * @example flagAboveOne(0.8) // { aboveOne: false, warnings: [] }
 */
export function flagAboveOne(sticking: number): StickingFlag {
  return sticking > 1
    ? { aboveOne: true, warnings: [`The sticking coefficient is ${sticking.toPrecision(4)}, above 1: more molecules would stick than strike. Look at the unit, the site density and the molar mass.`] }
    : { aboveOne: false, warnings: [] };
}
