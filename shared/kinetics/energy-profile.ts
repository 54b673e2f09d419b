import { operationLine, quantityText, type DerivationLine } from './derivation.ts';
import { KineticsError, requireFinite, requireNonNegative } from './kinetics-error.ts';

/** One elementary step of a pathway, as written, run `times` times in a row. */
export interface ProfileStep {
  /** Barrier above the state before the step [kJ mol-1]; null where there is no transition state: an adsorption without a barrier, a pairing energy. */
  barrierKJPerMol: number | null;
  /** Energy of the step's products less that of its reactants [kJ mol-1]. */
  reactionEnergyKJPerMol: number;
  /** Standard uncertainty of either energy of the step [kJ mol-1]; a missing one is never taken as 0. */
  u?: number | null;
  /** Stoichiometric number: how often the step runs in the pathway, 1 when absent. */
  times?: number;
}

/** A state of a profile, in the order in which it is passed. */
export interface ProfileState {
  /** `start`, `TS2`, `I2` or `end`; a repeated step adds the run, as `TS2.1`, `I2.1`. */
  name: string;
  kind: 'start' | 'transition-state' | 'intermediate' | 'end';
  /** Number of the step, from 1, that the state belongs to or ends; null for the start. */
  step: number | null;
  /** Which run of the step, from 1; null for the start. */
  run: number | null;
  /** Energy above the start [kJ mol-1]. */
  energyKJPerMol: number;
}

/** What a profile warns of. */
export interface ProfileWarning {
  code: 'below-product' | 'below-reactant';
  /** Number of the step, from 1. */
  step: number;
  message: string;
}

/** The states of a pathway on one scale, with the highest transition state. */
export interface EnergyProfile {
  states: ProfileState[];
  /** Energy of the highest transition state above the start [kJ mol-1]. */
  highestKJPerMol: number;
  /** Number of the step, from 1, that holds it. */
  highestStep: number;
  /** Which run of that step, from 1. */
  highestRun: number;
  /** Energy of the end above the start [kJ mol-1]. */
  reactionEnergyKJPerMol: number;
  /** Standard uncertainty of the highest transition state [kJ mol-1] if the errors are independent, and if they are fully correlated; null where one is missing. */
  uHighestKJPerMol: { independent: number; correlated: number } | null;
  warnings: ProfileWarning[];
  derivation: DerivationLine[];
}

/** Most runs of one step, and most steps of a pathway. */
const mostRuns = 100;
const mostSteps = 200;

const source = 'highest transition state above the start = max over i of (Σ ΔE_j for j < i) + E_i (common practice)';

function checkStep(step: ProfileStep, index: number): void {
  const path = `steps.${index}`;
  if (step.barrierKJPerMol !== null) requireFinite(`${path}.barrierKJPerMol`, step.barrierKJPerMol);
  requireFinite(`${path}.reactionEnergyKJPerMol`, step.reactionEnergyKJPerMol);
  if (step.u != null) requireNonNegative(`${path}.u`, step.u, 'standard uncertainty', 'kJ/mol');
  const times = step.times ?? 1;
  if (!Number.isInteger(times) || times < 1 || times > mostRuns) {
    throw new KineticsError(`${path}.times`, `times must be a whole number from 1 to ${mostRuns}, got ${times}: multiply the whole pathway until every step runs a whole number of times`, 'out-of-range', times);
  }
}

function warningsOf(step: ProfileStep, number: number): ProfileWarning[] {
  const { barrierKJPerMol: barrier, reactionEnergyKJPerMol: energy } = step;
  if (barrier === null) return [];
  const warnings: ProfileWarning[] = [];
  if (barrier < energy) {
    warnings.push({ code: 'below-product', step: number, message: `step ${number}: the barrier of ${quantityText(barrier, 'kJ/mol')} is below the reaction energy of ${quantityText(energy, 'kJ/mol')}, so the transition state lies below its own product` });
  }
  if (barrier < 0) warnings.push({ code: 'below-reactant', step: number, message: `step ${number}: the barrier of ${quantityText(barrier, 'kJ/mol')} is negative, so the transition state lies below its own reactant` });
  return warnings;
}

/** Index of the first of the highest transition states, or -1. */
function highestIndex(states: readonly ProfileState[]): number {
  let best = -1;
  states.forEach(({ kind, energyKJPerMol }, i) => {
    if (kind === 'transition-state' && (best < 0 || energyKJPerMol > (states[best] as ProfileState).energyKJPerMol)) best = i;
  });
  return best;
}

/**
 * u of the highest transition state: each earlier step enters with its number of runs, the highest step with the runs before this one and
 * its barrier. The runs of one step share its error, so their u add.
 */
function uncertaintyOf(steps: readonly ProfileStep[], highest: ProfileState): EnergyProfile['uHighestKJPerMol'] {
  const last = (highest.step as number) - 1;
  let squares = 0;
  let sum = 0;
  for (let i = 0; i <= last; i += 1) {
    const { u, times = 1 } = steps[i] as ProfileStep;
    if (u == null) return null;
    const parts = i < last ? [times * u] : [((highest.run as number) - 1) * u, u];
    for (const part of parts) {
      squares += part * part;
      sum += part;
    }
  }
  return { independent: Math.sqrt(squares), correlated: sum };
}

/**
 * Puts the steps of a pathway on one energy scale and finds its highest transition state above the start.
 *
 * highest = max over i of (Σ ΔE_j for j < i) + E_i. A step run n times adds n ΔE to the profile, and its transition state is met in
 * each run: for ΔE above 0 the last run is the highest, for ΔE below 0 the first. Of equal heights the first counts. A barrier below
 * ΔE, or below 0, is kept and warned of. All energies must be of one type and on one reference; which, is the caller's to know.
 * Source: common practice; the sum of the reaction energies is Hess's law.
 * @param steps in the order of the pathway [kJ mol-1]
 * @throws KineticsError on no step, no transition state, more than 200 steps, `times` that is no whole number from 1 to 100, a negative u.
 * @example energyProfile([{ barrierKJPerMol: 50, reactionEnergyKJPerMol: 50 }, { barrierKJPerMol: 17, reactionEnergyKJPerMol: -20 }]).highestKJPerMol // 67
 */
export function energyProfile(steps: readonly ProfileStep[]): EnergyProfile {
  if (steps.length === 0 || steps.length > mostSteps) throw new KineticsError('steps', `a pathway has 1 to ${mostSteps} steps, got ${steps.length}`, 'missing-input', steps.length);
  steps.forEach(checkStep);
  const states: ProfileState[] = [{ name: 'start', kind: 'start', step: null, run: null, energyKJPerMol: 0 }];
  let level = 0;
  steps.forEach((step, index) => {
    const { barrierKJPerMol: barrier, reactionEnergyKJPerMol: energy, times = 1 } = step;
    const before = level;
    for (let run = 1; run <= times; run += 1) {
      const label = times === 1 ? String(index + 1) : `${index + 1}.${run}`;
      // From the level before the step, so that many runs gather no rounding.
      const here = before + (run - 1) * energy;
      if (barrier !== null) states.push({ name: `TS${label}`, kind: 'transition-state', step: index + 1, run, energyKJPerMol: here + barrier });
      level = before + run * energy;
      const end = index === steps.length - 1 && run === times;
      states.push({ name: end ? 'end' : `I${label}`, kind: end ? 'end' : 'intermediate', step: index + 1, run, energyKJPerMol: level });
    }
  });
  const highest = states[highestIndex(states)];
  if (highest === undefined) throw new KineticsError('steps', 'no step has a barrier: a profile needs at least one transition state', 'missing-input');
  for (const { energyKJPerMol } of states) requireFinite('steps', energyKJPerMol);
  const step = steps[(highest.step as number) - 1] as ProfileStep & { barrierKJPerMol: number };
  const run = highest.run as number;
  return {
    states,
    highestKJPerMol: highest.energyKJPerMol,
    highestStep: highest.step as number,
    highestRun: run,
    reactionEnergyKJPerMol: level,
    uHighestKJPerMol: uncertaintyOf(steps, highest),
    warnings: steps.flatMap((one, index) => warningsOf(one, index + 1)),
    derivation: [
      operationLine(
        `Highest transition state, step ${highest.step}${(step.times ?? 1) === 1 ? '' : `, run ${run} of ${step.times}`}: the energy before it plus its barrier of ${quantityText(step.barrierKJPerMol, 'kJ/mol')}`,
        { value: highest.energyKJPerMol - step.barrierKJPerMol, unit: 'kJ/mol' },
        { value: highest.energyKJPerMol, unit: 'kJ/mol' },
        source,
        { assumption: 'every energy is of one type and on one reference' },
      ),
    ],
  };
}
