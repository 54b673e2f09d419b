import { R } from './constants.ts';
import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import type { GasBasis } from './arrhenius.ts';
import { KineticsError, requireFinite, requireNonNegative, requireTemperature } from './kinetics-error.ts';

/** Sum of numbers; 0 where it is no more than the rounding of decimal figures. */
function sumOf(terms: readonly number[]): number {
  const sum = terms.reduce((total, one) => total + one, 0);
  const size = terms.reduce((total, one) => total + Math.abs(one), 0);
  return Math.abs(sum) <= terms.length * Number.EPSILON * size ? 0 : sum;
}

/** How far a gas basis moves E_f - E_r from ΔH° [kJ mol-1]: 0 on pressures, -ΔνRT on concentrations. */
function basisShift({ basis = 'pressure', gasMoleChange = 0, temperatureK }: { basis?: GasBasis; gasMoleChange?: number; temperatureK?: number }): number {
  if (basis === 'pressure' || requireFinite('gasMoleChange', gasMoleChange) === 0) return 0;
  if (temperatureK === undefined) throw new KineticsError('temperatureK', 'T is missing: on concentrations E_f - E_r = ΔH° - ΔνRT', 'missing-input');
  return (-gasMoleChange * R * requireTemperature('temperatureK', temperatureK)) / 1000;
}

/**
 * Reaction enthalpy from the local energies of both directions [kJ mol-1]: E_f - E_r on pressures, E_f - E_r + ΔνRT on concentrations.
 *
 * Source: detailed balance; IUPAC glossary, Pure Appl. Chem. 68 (1996) 149.
 * @throws KineticsError on a number that is not finite, or T missing where a concentration basis needs it.
 * @example enthalpyFromBarriers({ energyForwardKJPerMol: 72.5, energyReverseKJPerMol: 97.5 }) // -25
 */
export function enthalpyFromBarriers(input: { energyForwardKJPerMol: number; energyReverseKJPerMol: number; basis?: GasBasis; gasMoleChange?: number; temperatureK?: number }): number {
  return sumOf([requireFinite('energyForwardKJPerMol', input.energyForwardKJPerMol), -requireFinite('energyReverseKJPerMol', input.energyReverseKJPerMol), -basisShift(input)]);
}

/**
 * Reaction energy ΔU = ΔH - ΔνRT of a step with ideal gases [kJ mol-1]; it is the difference of the local energies on concentrations.
 *
 * Source: IUPAC Green Book, 3rd edition, 2.11.
 * @throws KineticsError on T not above 0, or a number that is not finite.
 * @example internalEnergy({ reactionEnthalpyKJPerMol: -45, gasMoleChange: -1, temperatureK: 700 }) // -39.17987616729273
 */
export function internalEnergy({ reactionEnthalpyKJPerMol, gasMoleChange, temperatureK }: { reactionEnthalpyKJPerMol: number; gasMoleChange: number; temperatureK: number }): number {
  return requireFinite('reactionEnthalpyKJPerMol', reactionEnthalpyKJPerMol) + basisShift({ basis: 'concentration', gasMoleChange, temperatureK });
}

/** Forward, reverse and reaction enthalpy, of one energy type and one basis. */
export interface ConsistencyInput {
  /** Local energy forward [kJ mol-1]. */
  energyForwardKJPerMol: number;
  energyReverseKJPerMol: number;
  reactionEnthalpyKJPerMol: number;
  /** Standard uncertainties [kJ mol-1]; a missing one is never taken as 0. */
  uEnergyForwardKJPerMol?: number | null;
  uEnergyReverseKJPerMol?: number | null;
  uReactionEnthalpyKJPerMol?: number | null;
  basis?: GasBasis;
  gasMoleChange?: number;
  /** Needed for concentrations with Δν other than 0 [K]. */
  temperatureK?: number;
}

/** How well a forward, a reverse and a reaction enthalpy agree. */
export interface Consistency {
  /** E_f - E_r minus what the enthalpy asks for [kJ mol-1]. */
  closureErrorKJPerMol: number;
  /** Its standard uncertainty [kJ mol-1]; null where one of the three is missing. */
  uClosureKJPerMol: number | null;
  /** |closure error|/(2u) [1]; null without uncertainties, or where all are 0. */
  normalizedError: number | null;
  /** True up to a normalised error of 1; null where nothing can be said. */
  consistent: boolean | null;
  derivation: DerivationLine[];
}

function verdict(closure: number, u: number | null, normalizedError: number | null): boolean | null {
  if (normalizedError !== null) return normalizedError <= 1;
  if (closure === 0) return true;
  return u === null ? null : false;
}

/**
 * Compares E_f - E_r with the reaction enthalpy: E_n = |E_f - E_r - ΔH°|/(2u), consistent up to 1.
 *
 * The three are taken as uncorrelated: u² = u²(E_f) + u²(E_r) + u²(ΔH°) [kJ mol-1]. On concentrations ΔH° - ΔνRT stands for ΔH°.
 * Sources: ISO 13528:2022, E_n score with coverage factor 2; JCGM 100:2008 (GUM) 5.1.2; detailed balance.
 * @throws KineticsError on a negative uncertainty, a number that is not finite, or T missing where a concentration basis needs it.
 * @example checkConsistency({ energyForwardKJPerMol: 50, energyReverseKJPerMol: 10, reactionEnthalpyKJPerMol: 30, uEnergyForwardKJPerMol: 3, uEnergyReverseKJPerMol: 4, uReactionEnthalpyKJPerMol: 0 }).normalizedError // 1
 */
export function checkConsistency(input: ConsistencyInput): Consistency {
  const forward = requireFinite('energyForwardKJPerMol', input.energyForwardKJPerMol);
  const reverse = requireFinite('energyReverseKJPerMol', input.energyReverseKJPerMol);
  const dH = requireFinite('reactionEnthalpyKJPerMol', input.reactionEnthalpyKJPerMol);
  const names = ['uEnergyForwardKJPerMol', 'uEnergyReverseKJPerMol', 'uReactionEnthalpyKJPerMol'] as const;
  const known = names.flatMap((name) => (input[name] == null ? [] : [requireNonNegative(name, input[name], name, 'kJ/mol')]));
  const shift = basisShift(input);
  const closure = sumOf([forward, -reverse, -dH, -shift]);
  const u = known.length === names.length ? Math.hypot(...known) : null;
  const normalizedError = u === null || u === 0 ? null : Math.abs(closure) / (2 * u);
  const wanted = shift === 0 ? `ΔH° = ${quantityText(dH)} kJ/mol` : `ΔH° - ΔνRT = ${quantityText(dH + shift)} kJ/mol`;
  return {
    closureErrorKJPerMol: closure,
    uClosureKJPerMol: u,
    normalizedError,
    consistent: verdict(closure, u, normalizedError),
    derivation: [
      operationLine(`E_f - E_r - reaction enthalpy, E_r = ${quantityText(reverse)} kJ/mol, ${wanted}`, { value: forward, unit: 'kJ/mol' }, { value: closure, unit: 'kJ/mol' }, 'detailed balance'),
      ...(normalizedError === null ? [] : [operationLine(`E_n = |difference|/(2u), u = ${quantityText(u as number)} kJ/mol`, { value: closure, unit: 'kJ/mol' }, { value: normalizedError }, 'ISO 13528:2022', { assumption: 'the three values are uncorrelated' })]),
    ],
  };
}

/** One step of a cycle, with its sign as the cycle runs through it. */
export interface CycleStep {
  /** Signed reaction enthalpy, or E_f - E_r [kJ mol-1]. */
  enthalpyKJPerMol: number;
  /** Standard uncertainty [kJ mol-1]; a missing one is never taken as 0. */
  u?: number | null;
}

/** The sum around a cycle, which must vanish. */
export interface CycleClosure {
  /** [kJ mol-1] */
  sumKJPerMol: number;
  /** True when nothing is left over but the rounding of the sum. */
  closedExactly: boolean;
  /** Standard uncertainty of the sum [kJ mol-1]; null where one is missing. */
  uSumKJPerMol: number | null;
  /** |sum|/(2u) [1]; null without uncertainties, or where all are 0. */
  normalizedError: number | null;
  derivation: DerivationLine[];
}

/**
 * Sums the signed enthalpies around a closed cycle of steps, which must vanish [kJ mol-1].
 *
 * Uncertainties are taken as uncorrelated. Sources: first law (Hess); ISO 13528:2022 for |sum|/(2u); JCGM 100:2008 (GUM) 5.1.2.
 * @throws KineticsError on an empty cycle, a number that is not finite, or a negative uncertainty.
 * @example cycleClosure([{ enthalpyKJPerMol: -25 }, { enthalpyKJPerMol: 40.2 }, { enthalpyKJPerMol: -15.2 }]).sumKJPerMol // 0
 */
export function cycleClosure(steps: readonly CycleStep[]): CycleClosure {
  if (steps.length === 0) throw new KineticsError('steps', 'the cycle is empty: list the signed enthalpies of its steps', 'missing-input', steps);
  const terms = steps.map(({ enthalpyKJPerMol }, i) => requireFinite(`steps.${i}.enthalpyKJPerMol`, enthalpyKJPerMol));
  const known = steps.flatMap(({ u }, i) => (u == null ? [] : [requireNonNegative(`steps.${i}.u`, u, 'u', 'kJ/mol')]));
  const sum = sumOf(terms);
  const u = known.length === steps.length ? Math.hypot(...known) : null;
  return {
    sumKJPerMol: sum,
    closedExactly: sum === 0,
    uSumKJPerMol: u,
    normalizedError: u === null || u === 0 ? null : Math.abs(sum) / (2 * u),
    derivation: [operationLine(`Sum around the cycle: ${terms.map((one) => quantityText(one)).join(', ')} kJ/mol`, { value: steps.length, unit: 'steps' }, { value: sum, unit: 'kJ/mol' }, references.greenBook)],
  };
}
