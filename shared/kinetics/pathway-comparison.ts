import { operationLine, type DerivationLine } from './derivation.ts';
import { energyProfile, type ProfileStep } from './energy-profile.ts';
import { KineticsError } from './kinetics-error.ts';
import { normalCoverageFactor } from './normal.ts';
import { seededRandom } from './random.ts';

/** A step of a pathway whose uncertainty is known. */
export interface ComparedStep extends ProfileStep {
  /** The method behind the energies, in any words: values with the same text share an error. Absent: an error of their own. */
  method?: string | null;
  /** Names the value, such as the accession of its entry: the same value in both pathways is drawn once. */
  key?: string | null;
}

/** Two pathways to compare by sampling. */
export interface PathwayComparisonInput {
  first: readonly ComparedStep[];
  second: readonly ComparedStep[];
  /** Share of the variance of each value that is common to all values of its method, 0 to 1; stated, never taken for granted. */
  sharedVariance: number;
  /** What is compared: the highest transition state above the start, or the energetic span of a cycle. Highest when absent. */
  measure?: 'highest' | 'span';
  /** Number of draws, 20 000 when absent. */
  draws?: number;
  /** The seed that repeats the draws exactly, 1 when absent. */
  seed?: number;
}

/** Which of two pathways is lower, and how sure that is. */
export interface PathwayComparison {
  /** The measure of each pathway from the values themselves [kJ mol-1]. */
  firstKJPerMol: number;
  secondKJPerMol: number;
  /** First less second: from the values, then mean, standard deviation and 95 % interval over the draws [kJ mol-1]. */
  difference: { valueKJPerMol: number; meanKJPerMol: number; standardDeviationKJPerMol: number; intervalKJPerMol: [number, number] };
  /** Probability that the first is lower; equal draws count half. */
  probabilityFirstLower: number;
  /** Standard error of that probability from the number of draws. */
  samplingError: number;
  /** 95 % interval of that probability (Wilson), which is not empty at 0 and 1 either. */
  samplingInterval: [number, number];
  draws: number;
  seed: number;
  derivation: DerivationLine[];
}

/** A step ready to be drawn: where its random numbers stand. */
interface Plan {
  barrier: number | null;
  energy: number;
  u: number;
  times: number;
  own: number;
  method: number;
}

/**
 * Reads the steps; `slots` hands out one place in the list of random numbers for each value, and one for each method.
 * A value that stands in both pathways, or twice in one, has one place.
 */
function plan(steps: readonly ComparedStep[], name: string, methods: Map<string, number>, values: Map<string, { slot: number; step: ComparedStep }>, count: { slots: number }): Plan[] {
  return steps.map((step, index) => {
    const path = `${name}.${index}`;
    if (step.u == null) throw new KineticsError(`${path}.u`, `step ${index + 1} has no standard uncertainty: a missing one is never taken as 0, state one or leave the step out of the comparison`, 'missing-input');
    const known = step.key == null ? undefined : values.get(step.key);
    if (known && (known.step.barrierKJPerMol !== step.barrierKJPerMol || known.step.reactionEnergyKJPerMol !== step.reactionEnergyKJPerMol || known.step.u !== step.u || (known.step.method ?? null) !== (step.method ?? null))) {
      throw new KineticsError(`${path}.key`, `${JSON.stringify(step.key)} names two different values`, 'out-of-range', step.key);
    }
    const own = known?.slot ?? count.slots;
    if (!known) {
      count.slots += 2;
      if (step.key != null) values.set(step.key, { slot: own, step });
    }
    let method = -1;
    if (step.method != null) {
      method = methods.get(step.method) ?? methods.size;
      methods.set(step.method, method);
    }
    return { barrier: step.barrierKJPerMol, energy: step.reactionEnergyKJPerMol, u: step.u, times: step.times ?? 1, own, method };
  });
}

/** Highest transition state and energetic span of one draw, in one pass over the states. */
function walk(steps: readonly Plan[], span: boolean, own: Float64Array, shared: Float64Array, common: number, rest: number): number {
  let level = 0;
  let lowest = 0;
  let highest = -Infinity;
  let after = -Infinity;
  let before = -Infinity;
  for (let i = 0; i < steps.length; i += 1) {
    const { barrier, energy, u, times, own: slot, method } = steps[i] as Plan;
    const error = method < 0 ? 0 : common * (shared[method] as number);
    const weight = method < 0 ? 1 : rest;
    const deltaE = energy + u * (error + weight * (own[slot + 1] as number));
    for (let run = 0; run < times; run += 1) {
      if (barrier !== null) {
        const height = level + barrier + u * (error + weight * (own[slot] as number));
        if (height > highest) highest = height;
        if (height - lowest > after) after = height - lowest;
      }
      level += deltaE;
      if (i === steps.length - 1 && run === times - 1) break;
      if (level < lowest) lowest = level;
      if (highest - level > before) before = highest - level;
    }
  }
  return span ? Math.max(after, before + level) : highest;
}

/** Quantile of sorted numbers by linear interpolation. */
function quantile(sorted: Float64Array, probability: number): number {
  const place = probability * (sorted.length - 1);
  const low = Math.floor(place);
  const from = sorted[low] as number;
  const to = sorted[Math.min(low + 1, sorted.length - 1)] as number;
  return from + (place - low) * (to - from);
}

/** Wilson's interval of a proportion: Wilson, J. Am. Stat. Assoc. 22 (1927) 209. */
function wilson(proportion: number, count: number): [number, number] {
  const z = normalCoverageFactor(0.95);
  const scale = 1 + (z * z) / count;
  const centre = (proportion + (z * z) / (2 * count)) / scale;
  const half = (z * Math.sqrt((proportion * (1 - proportion)) / count + (z * z) / (4 * count * count))) / scale;
  return [Math.max(0, centre - half), Math.min(1, centre + half)];
}

function between(path: string, value: number, low: number, high: number, whole: boolean): number {
  if (!(value >= low && value <= high) || (whole && !Number.isInteger(value))) throw new KineticsError(path, `${path} must be ${whole ? 'a whole number ' : ''}from ${low} to ${high}, got ${value}`, 'out-of-range', value);
  return value;
}

/**
 * Probability that the first of two pathways is the lower, by drawing every energy from a normal distribution.
 *
 * Barrier and reaction energy of a step are drawn as x + u [√s z + √(1-s) e]: z common to all values of one method, e of each energy
 * alone, s the shared part of the variance (computed errors are correlated). The runs of a repeated step, and one value in both
 * pathways, have one error. The probability comes with its sampling error √(p(1-p)/N), the difference with its 95 % interval.
 * Sources: JCGM 101:2008 (GUM Supplement 1), propagation of distributions by Monte Carlo; Wilson, J. Am. Stat. Assoc. 22 (1927) 209;
 * the shared error term is common practice. Measures as in `energyProfile` and `energeticSpan`.
 * @param input energies and standard uncertainties [kJ mol-1]
 * @throws KineticsError on a step without u, one key for two values, a share outside 0 to 1, draws outside 1000 to 1 000 000, a bad seed, or as `energyProfile`.
 * @example comparePathways({ first: [{ barrierKJPerMol: 60, reactionEnergyKJPerMol: 0, u: 0 }], second: [{ barrierKJPerMol: 70, reactionEnergyKJPerMol: 0, u: 0 }], sharedVariance: 0 }).probabilityFirstLower // 1
 */
export function comparePathways(input: PathwayComparisonInput): PathwayComparison {
  const { measure = 'highest', draws = 20_000, seed = 1 } = input;
  const share = between('sharedVariance', input.sharedVariance, 0, 1, false);
  between('draws', draws, 1000, 1_000_000, true);
  for (const name of ['first', 'second'] as const) {
    try {
      energyProfile(input[name]);
    } catch (error) {
      throw error instanceof KineticsError ? new KineticsError(error.path.replace(/^steps/, name), error.message, error.code, error.value) : error;
    }
  }
  const methods = new Map<string, number>();
  const values = new Map<string, { slot: number; step: ComparedStep }>();
  const count = { slots: 0 };
  const first = plan(input.first, 'first', methods, values, count);
  const second = plan(input.second, 'second', methods, values, count);
  const own = new Float64Array(count.slots);
  const shared = new Float64Array(methods.size);
  const common = Math.sqrt(share);
  const rest = Math.sqrt(1 - share);
  const span = measure === 'span';
  const firstKJPerMol = walk(first, span, own, shared, common, rest);
  const secondKJPerMol = walk(second, span, own, shared, common, rest);

  const random = seededRandom(seed);
  const differences = new Float64Array(draws);
  let lower = 0;
  let mean = 0;
  let squares = 0;
  for (let draw = 0; draw < draws; draw += 1) {
    for (let i = 0; i < shared.length; i += 1) shared[i] = random.normal();
    for (let i = 0; i < own.length; i += 1) own[i] = random.normal();
    const difference = walk(first, span, own, shared, common, rest) - walk(second, span, own, shared, common, rest);
    differences[draw] = difference;
    lower += difference < 0 ? 1 : difference === 0 ? 0.5 : 0;
    const change = difference - mean;
    mean += change / (draw + 1);
    squares += change * (difference - mean);
  }
  differences.sort();
  const probability = lower / draws;
  const value = firstKJPerMol - secondKJPerMol;
  const words = span ? 'energetic span' : 'highest transition state';
  return {
    firstKJPerMol,
    secondKJPerMol,
    difference: { valueKJPerMol: value, meanKJPerMol: mean, standardDeviationKJPerMol: Math.sqrt(squares / (draws - 1)), intervalKJPerMol: [quantile(differences, 0.025), quantile(differences, 0.975)] },
    probabilityFirstLower: probability,
    samplingError: Math.sqrt((probability * (1 - probability)) / draws),
    samplingInterval: wilson(probability, draws),
    draws,
    seed,
    derivation: [
      operationLine(`Probability that the ${words} of the first pathway is the lower, ${draws} draws`, { value, unit: 'kJ/mol' }, { value: probability }, 'JCGM 101:2008 (GUM Supplement 1)', {
        constant: `seed ${seed}, xoshiro128**`,
        assumption: `normal errors; values of one method share ${share} of their variance`,
      }),
    ],
  };
}
