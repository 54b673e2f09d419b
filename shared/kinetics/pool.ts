import { operationLine, quantityText, references, type DerivationLine } from './derivation.ts';
import { betweenVariance, centre, weigh, type PoolModel, type UncertainValue } from './heterogeneity.ts';
import { KineticsError, requireFinite, requirePositive } from './kinetics-error.ts';
import { normalCoverageFactor } from './normal.ts';
import { groupValues, type PoolMember } from './pool-groups.ts';
import { studentCoverageFactor } from './student-t.ts';

/** Kinds of interval about a pooled mean; `hartung-knapp-ad-hoc` never lets the scatter shrink the standard error. */
export const poolIntervals = ['hartung-knapp', 'normal', 'hartung-knapp-ad-hoc'] as const;

/** One of `poolIntervals`. */
export type PoolInterval = (typeof poolIntervals)[number];

/** A value to be pooled. */
export interface PoolValue extends UncertainValue {
  /** What the value shares with others that are not independent of it, such as its source. */
  group?: string | null;
}

/** What is pooled how; restricted maximum likelihood with a Hartung–Knapp interval unless said. */
export interface PoolOptions {
  model?: PoolModel;
  interval?: PoolInterval;
}

/** A pooled mean with what shows its worth. */
export interface PooledMean {
  mean: number;
  /** Standard error of the mean that the interval rests on. */
  standardError: number;
  /** 1/√Σw, not scaled by the scatter. */
  modelStandardError: number;
  /** Variance between the values beyond their uncertainties; null for a single value. */
  tau2: number | null;
  /** Σ (x - mean)²/u² about the fixed-effect mean, k - 1 expected. */
  q: number;
  /** Share of the scatter beyond the uncertainties, from Q [%]; null for a single value. */
  i2Percent: number | null;
  /** The same share from τ² [%]: 100 τ²/(τ² + typical u²); null for a single value. */
  i2Tau2Percent: number | null;
  /** √(Q/(k - 1)); null for a single value. */
  birgeRatio: number | null;
  /** 95 % interval of the mean; null for a single value. */
  interval: [number, number] | null;
  /** 95 % interval of one further value without uncertainty of its own; null under three values and in the fixed-effect model. */
  predictionInterval: [number, number] | null;
}

/** The mean without one value, or without one group. */
export interface LeaveOneOut {
  /** Indices of the values left out. */
  indices: number[];
  group: string | null;
  mean: number;
  standardError: number;
  interval: [number, number] | null;
  tau2: number | null;
}

/** What pooling warns of. */
export interface PoolWarning {
  code: 'one-value' | 'few-values' | 'grouped' | 'narrowed';
  message: string;
}

/** A pooled mean, each value's part in it, and how it came about. */
export interface PoolResult extends PooledMean {
  model: PoolModel;
  intervalKind: PoolInterval;
  /** Number of independent values: groups count once. */
  k: number;
  /** What was pooled, with its share of the weight [%]. */
  members: (PoolMember & { weightPercent: number })[];
  /** Without each value in turn; empty for a single value. */
  leaveOneOut: LeaveOneOut[];
  warnings: PoolWarning[];
  derivation: DerivationLine[];
}

interface Pooled extends PooledMean {
  weights: number[];
  /** Σ w (x - mean)²/(k - 1) under the weights of the model: scales the variance by Hartung and Knapp; null for a single value. */
  scatter: number | null;
}

const level = 0.95;

function poolIndependent(values: readonly UncertainValue[], model: PoolModel, kind: PoolInterval): Pooled {
  const data = centre(values);
  const k = values.length;
  if (k === 1) {
    const { value, u } = values[0] as UncertainValue;
    return { mean: value, standardError: u, modelStandardError: u, tau2: null, q: 0, i2Percent: null, i2Tau2Percent: null, birgeRatio: null, interval: null, predictionInterval: null, weights: [1], scatter: null };
  }
  const tau2 = betweenVariance(data, model);
  const fixed = weigh(data, 0);
  const pooled = weigh(data, tau2);
  const mean = data.centre + data.scale * pooled.mean;
  const modelStandardError = data.scale / Math.sqrt(pooled.sumWeights);
  const scatter = pooled.q / (k - 1);
  const scaledBy = kind === 'normal' ? 1 : Math.sqrt(kind === 'hartung-knapp' ? scatter : Math.max(1, scatter));
  const standardError = modelStandardError * scaledBy;
  const factor = kind === 'normal' ? normalCoverageFactor(level) : studentCoverageFactor(level, k - 1);
  const about = (half: number): [number, number] => [mean - half, mean + half];
  const typical = (k - 1) / fixed.spreadOfWeights;
  return {
    mean,
    standardError,
    modelStandardError,
    tau2: tau2 * data.scale ** 2,
    q: fixed.q,
    i2Percent: fixed.q > k - 1 ? (100 * (fixed.q - (k - 1))) / fixed.q : 0,
    i2Tau2Percent: (100 * tau2) / (tau2 + typical),
    birgeRatio: Math.sqrt(fixed.q / (k - 1)),
    interval: about(factor * standardError),
    predictionInterval: k < 3 || model === 'fixed' ? null : about(studentCoverageFactor(level, k - 2) * Math.hypot(Math.sqrt(tau2) * data.scale, modelStandardError)),
    weights: data.variances.map((v) => 1 / (v + tau2) / pooled.sumWeights),
    scatter,
  };
}

function warningsOf(given: number, members: readonly PoolMember[], kind: PoolInterval, { scatter }: Pooled): PoolWarning[] {
  const warnings: PoolWarning[] = [];
  const k = members.length;
  if (k < given) {
    const names = members.filter(({ indices }) => indices.length > 1).map(({ group, indices }) => `${JSON.stringify(group)} (${indices.length} values)`);
    warnings.push({ code: 'grouped', message: `values of one group are not independent and were made one value each before pooling: ${names.join(', ')}` });
  }
  if (k === 1) warnings.push({ code: 'one-value', message: 'one independent value: the mean is that value with its own uncertainty; there is no interval and nothing to say about scatter' });
  if (k === 2) warnings.push({ code: 'few-values', message: 'two independent values: τ² is hardly determined, and there is no prediction interval' });
  if (kind === 'hartung-knapp' && scatter !== null && scatter < 1) {
    warnings.push({ code: 'narrowed', message: `the values agree better than their uncertainties let expect (scatter ${scatter.toPrecision(3)} of 1): the Hartung–Knapp standard error is smaller than the uncertainties alone would give` });
  }
  return warnings;
}

const sources: Record<PoolModel, [words: string, reference: string]> = {
  reml: ['τ² by restricted maximum likelihood', 'Viechtbauer, J. Educ. Behav. Stat. 30 (2005) 261'],
  'dersimonian-laird': ['τ² = max(0, (Q - k + 1)/(Σw - Σw²/Σw))', 'DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177'],
  'paule-mandel': ['τ² at which Q(τ²) = k - 1', 'Paule and Mandel, J. Res. Natl. Bur. Stand. 87 (1982) 377'],
  fixed: ['τ² = 0: fixed effect', references.gum],
};

const listed = (values: readonly UncertainValue[]): string => values.map(({ value, u }) => `${quantityText(value)} (u ${quantityText(u)})`).join(', ');

function linesOf(given: readonly UncertainValue[], members: readonly PoolMember[], model: PoolModel, kind: PoolInterval, pooled: Pooled): DerivationLine[] {
  const lines = members.filter(({ indices }) => indices.length > 1).map(({ group, indices, value, u }) =>
    operationLine(`One value of the group ${JSON.stringify(group)}, weights 1/u²: ${listed(indices.map((i) => given[i] as UncertainValue))}`, { value: indices.length, unit: 'values' }, { value }, references.gum, {
      assumption: `uncertainties fully correlated, scatter inside the group added: u = ${quantityText(u)}`,
    }),
  );
  const k = members.length;
  const count = { value: k, unit: k === 1 ? 'value' : 'values' };
  const { mean, standardError, modelStandardError, tau2, interval } = pooled;
  if (tau2 === null || interval === null) {
    return [...lines, operationLine('Single value kept', count, { value: mean }, references.gum, { assumption: `its own standard uncertainty ${quantityText(standardError)}; no interval` })];
  }
  const [words, reference] = sources[model];
  const figures = listed(members);
  lines.push(
    operationLine(`${words}: ${figures}`, count, { value: tau2 }, reference),
    operationLine(`Mean with weights 1/(u² + τ²), τ² = ${quantityText(tau2)}: ${figures}`, count, { value: mean }, reference, { assumption: 'the values are independent of each other' }),
    kind === 'normal'
      ? operationLine('Standard error 1/√Σw', count, { value: standardError }, references.gum)
      : operationLine(`Standard error √(Σ w (x - mean)²/(k - 1)/Σw), 1/√Σw = ${quantityText(modelStandardError)}`, count, { value: standardError }, 'Hartung and Knapp, Stat. Med. 20 (2001) 3875', {
          assumption: kind === 'hartung-knapp' ? undefined : 'the scatter is not let below 1 (Knapp and Hartung, Stat. Med. 22 (2003) 2693)',
        }),
    operationLine(`95 % interval, ${kind === 'normal' ? 'normal distribution' : `Student t with ${k - 1} degrees of freedom`}: half-width from the standard error`, { value: standardError }, { value: (interval[1] - interval[0]) / 2 }, references.gum),
  );
  return lines;
}

/**
 * Pools values of one quantity in one unit: energies in kJ/mol, rate constants as ln k at one temperature.
 *
 * Weights 1/(u² + τ²); 95 % throughout. Values that share a `group` are made one first, with a warning (see `groupValues`).
 * The prediction interval is mean ± t(k - 2) √(τ² + 1/Σw). A single value is returned as it is, without interval; a second one is pooled with a warning.
 * Sources: as for `betweenVariance`; Hartung and Knapp, Stat. Med. 20 (2001) 3875 (interval); Higgins and Thompson, Stat. Med. 21 (2002) 1539 (I²);
 * Higgins, Thompson and Spiegelhalter, J. R. Stat. Soc. A 172 (2009) 137 (prediction interval). Checked against metafor 3.8-1.
 * @throws KineticsError on an empty list, a value that is not finite, or u not above 0, naming `values.<index>.value` or `.u`.
 * @example poolValues([{ value: 41.8, u: 1.3 }, { value: 46, u: 1.6 }, { value: 39.7, u: 2.2 }]).mean // 42.66615262081941
 */
export function poolValues(values: readonly PoolValue[], options: PoolOptions = {}): PoolResult {
  if (values.length === 0) throw new KineticsError('values', 'there is nothing to pool: give at least one value with its standard uncertainty', 'missing-input', values);
  values.forEach(({ value, u }, i) => {
    requireFinite(`values.${i}.value`, value);
    requirePositive(`values.${i}.u`, u, `u of value ${i + 1}`);
  });
  const model = options.model ?? 'reml';
  const intervalKind = options.interval ?? 'hartung-knapp';
  const members = groupValues(values);
  const pooled = poolIndependent(members, model, intervalKind);
  const { weights, scatter: _scatter, ...mean } = pooled;
  const leaveOneOut = members.length === 1 ? [] : members.map(({ indices, group }, left): LeaveOneOut => {
    const rest = poolIndependent(members.filter((_, i) => i !== left), model, intervalKind);
    return { indices, group, mean: rest.mean, standardError: rest.standardError, interval: rest.interval, tau2: rest.tau2 };
  });
  return {
    ...mean,
    model,
    intervalKind,
    k: members.length,
    members: members.map((member, i) => ({ ...member, weightPercent: 100 * (weights[i] as number) })),
    leaveOneOut,
    warnings: warningsOf(values.length, members, intervalKind, pooled),
    derivation: linesOf(values, members, model, intervalKind, pooled),
  };
}
