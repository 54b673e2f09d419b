import { h, k_B, R } from './constants.ts';
import { operationLine, type DerivationLine } from './derivation.ts';
import type { EnergyProfile, ProfileState } from './energy-profile.ts';
import { requireTemperature } from './kinetics-error.ts';

/** What the energies of a profile are. */
export const profileQuantities = ['gibbs', 'enthalpy', 'electronic'] as const;

/** One of `profileQuantities`. */
export type ProfileQuantity = (typeof profileQuantities)[number];

const reference = 'Kozuch and Shaik, Acc. Chem. Res. 44 (2011) 101';

/** The part of a profile that a cycle is judged by. */
export type CycleProfile = Pick<EnergyProfile, 'states' | 'reactionEnergyKJPerMol'>;

/** The energetic span of a cycle, with the two states that set it. */
export interface EnergeticSpan {
  /** δE [kJ mol-1]. */
  spanKJPerMol: number;
  /** The transition state that determines the turnover (TDTS). */
  transitionState: ProfileState;
  /** The intermediate that determines it (TDI). */
  intermediate: ProfileState;
  /** True when the transition state follows the intermediate within the cycle as written. */
  follows: boolean;
  derivation: DerivationLine[];
}

/** Every pair of transition state and intermediate with T - I, plus the energy of one cycle where the transition state comes first. */
function* pairs(profile: CycleProfile): Generator<{ transitionState: ProfileState; intermediate: ProfileState; follows: boolean; energy: number }> {
  // The end is the start of the next cycle, so it is no state of its own.
  for (let i = 0; i < profile.states.length; i += 1) {
    const transitionState = profile.states[i] as ProfileState;
    if (transitionState.kind !== 'transition-state') continue;
    for (let j = 0; j < profile.states.length; j += 1) {
      const intermediate = profile.states[j] as ProfileState;
      if (intermediate.kind === 'transition-state' || intermediate.kind === 'end') continue;
      const follows = i > j;
      yield { transitionState, intermediate, follows, energy: transitionState.energyKJPerMol - intermediate.energyKJPerMol + (follows ? 0 : profile.reactionEnergyKJPerMol) };
    }
  }
}

/**
 * Energetic span of a catalytic cycle: the greatest T - I over all pairs, plus the energy of the cycle where the transition state precedes.
 *
 * δE = T_TDTS - I_TDI if the TDTS follows the TDI, T_TDTS - I_TDI + ΔG_r if it precedes. Of equal spans the first counts.
 * Source: Kozuch and Shaik, Acc. Chem. Res. 44 (2011) 101.
 * @param profile of one whole cycle, from `energyProfile`
 * @example energeticSpan({ states: [{ name: 'start', kind: 'start', step: null, run: null, energyKJPerMol: 0 }, { name: 'TS1', kind: 'transition-state', step: 1, run: 1, energyKJPerMol: 80 }, { name: 'end', kind: 'end', step: 1, run: 1, energyKJPerMol: -40 }], reactionEnergyKJPerMol: -40 }).spanKJPerMol // 80
 */
export function energeticSpan(profile: CycleProfile): EnergeticSpan {
  let best: { transitionState: ProfileState; intermediate: ProfileState; follows: boolean; energy: number } | null = null;
  for (const pair of pairs(profile)) if (best === null || pair.energy > best.energy) best = pair;
  // A profile always has its start and a transition state.
  const { transitionState, intermediate, follows, energy } = best as NonNullable<typeof best>;
  const words = follows
    ? `Energetic span: ${transitionState.name} less ${intermediate.name}, which it follows`
    : `Energetic span: ${transitionState.name} less ${intermediate.name}, which it precedes, plus the energy of one cycle`;
  return {
    spanKJPerMol: energy,
    transitionState,
    intermediate,
    follows,
    derivation: [
      operationLine(words, { value: transitionState.energyKJPerMol, unit: 'kJ/mol' }, { value: energy, unit: 'kJ/mol' }, reference, {
        constant: `${intermediate.name} at ${intermediate.energyKJPerMol} kJ/mol, one cycle ${profile.reactionEnergyKJPerMol} kJ/mol`,
      }),
    ],
  };
}

/** A turnover frequency, or why there is none. */
export interface SpanTurnover {
  /** (k_B T/h) exp(-δE/RT) [s-1]; null where it is refused. */
  turnoverPerS: number | null;
  /** The same model with every state counted [s-1]; lower where several states share the control. Null where refused. */
  turnoverAllStatesPerS: number | null;
  /** Why it is refused, as a sentence; null when it is not. */
  refusal: string | null;
  derivation: DerivationLine[];
}

function refusalOf(profile: CycleProfile, quantity: ProfileQuantity, temperatureK: number | null | undefined): string | null {
  if (quantity !== 'gibbs') {
    const words = quantity === 'enthalpy' ? 'enthalpies' : 'electronic energies';
    return `No turnover from ${words}: they leave out the entropy. Give Gibbs energies at one temperature and pressure.`;
  }
  if (temperatureK == null) return 'No turnover without the temperature that the Gibbs energies hold at: give temperatureK.';
  if (profile.reactionEnergyKJPerMol >= 0) return 'No turnover: the cycle as written does not run forward, its Gibbs energy of reaction is not below 0.';
  return null;
}

/** ln of Σ exp[(T - I + δG)/RT] over all pairs, with the greatest taken out. */
function lnControlSum(profile: CycleProfile, greatest: number, RT: number): number {
  let sum = 0;
  for (const { energy } of pairs(profile)) sum += Math.exp((energy - greatest) / RT);
  return greatest / RT + Math.log(sum);
}

/**
 * Turnover frequency of a cycle from its energetic span: (k_B T/h) exp(-δE/RT), only from Gibbs energies at T.
 *
 * Refused, with the reason, on electronic energies and enthalpies, without T, and for a cycle whose ΔG_r is not below 0. With every
 * state counted: (k_B T/h) [1 - exp(ΔG_r/RT)]/Σ exp[(T_i - I_j + δG_ij)/RT], δG_ij = 0 if T_i follows I_j and ΔG_r if it precedes.
 * Source: Kozuch and Shaik, Acc. Chem. Res. 44 (2011) 101; the form with every state from memory, checked against the steady state of the cycle.
 * @param temperatureK temperature of the Gibbs energies [K]
 * @throws KineticsError on a temperature not above 0 K.
 * @example spanTurnover({ states: [], reactionEnergyKJPerMol: -40 }, 'gibbs').refusal // 'No turnover without the temperature that the Gibbs energies hold at: give temperatureK.'
 */
export function spanTurnover(profile: CycleProfile, quantity: ProfileQuantity, temperatureK?: number | null): SpanTurnover {
  const T = temperatureK == null ? null : requireTemperature('temperatureK', temperatureK);
  const refusal = refusalOf(profile, quantity, T);
  const none = { turnoverPerS: null, turnoverAllStatesPerS: null, derivation: [] };
  if (refusal !== null || T === null) return { ...none, refusal };
  const { spanKJPerMol } = energeticSpan(profile);
  const RT = (R * T) / 1000;
  const lnAttempt = Math.log((k_B * T) / h);
  const turnoverPerS = Math.exp(lnAttempt - spanKJPerMol / RT);
  const all = Math.exp(lnAttempt + Math.log(-Math.expm1(profile.reactionEnergyKJPerMol / RT)) - lnControlSum(profile, spanKJPerMol, RT));
  if (!(turnoverPerS > 0) || !Number.isFinite(turnoverPerS) || !(all > 0)) return { ...none, refusal: 'The turnover leaves the range of double precision.' };
  return {
    turnoverPerS,
    turnoverAllStatesPerS: all,
    refusal: null,
    derivation: [
      operationLine('Turnover = (k_B T/h) exp(-δE/RT)', { value: spanKJPerMol, unit: 'kJ/mol' }, { value: turnoverPerS, unit: 's-1' }, reference, {
        constant: `k_B/h = ${k_B / h} K-1 s-1, R = ${R} J mol-1 K-1`,
        assumption: `Gibbs energies at T = ${T} K and the pressures of the reaction; transmission coefficient 1`,
      }),
    ],
  };
}
