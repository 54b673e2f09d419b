import { R } from './constants.ts';
import type { UncertaintyKind } from './uncertainty.ts';

/** Checks that a record raises by itself, without other entries: a closed list. */
export const checkCodes = [
  'temperature-out-of-range',
  'valid-range-reversed',
  'sticking-out-of-range',
  'negative-value',
  'facet-impossible',
  'unit-contradicts-orders',
  'step-unbalanced',
  'pre-exponential-unusual',
  'negative-energy',
  'energy-below-reaction-energy',
  'rate-above-limit',
  'kie-unusual',
  'uncertainty-larger-than-value',
  'uncertainty-unknown',
  'valid-range-narrow',
  'outlier',
  'locator-missing',
  'end-state-reference-missing',
  'reverse-inconsistent',
  'kie-disagrees-with-rates',
] as const;

/** One of `checkCodes`. */
export type CheckCode = (typeof checkCodes)[number];

/** What a check says: blocking ones keep a draft from being submitted. */
export interface Check {
  code: CheckCode;
  severity: 'blocking' | 'warning' | 'note';
  message: string;
}

function check(code: CheckCode, severity: Check['severity'], message: string): Check {
  return { code, severity, message };
}

/** Lowest and highest temperature that an entry may give [K]. */
export const temperatureLimitsK = { min: 1, max: 5000 } as const;

/** Refuses a temperature [K] outside 1 to 5000 K. */
export function checkTemperature(temperatureK: number, label = 'T'): Check[] {
  if (temperatureK >= temperatureLimitsK.min && temperatureK <= temperatureLimitsK.max) return [];
  return [check('temperature-out-of-range', 'blocking', `${label} = ${temperatureK} K is outside ${temperatureLimitsK.min} to ${temperatureLimitsK.max} K`)];
}

/** Checks a valid range [K]: its ends, their order, and, for a fitted energy, a width of at least 30 K. */
export function checkValidRange(range: { min?: number | null; max?: number | null }, fittedEnergy = false): Check[] {
  const checks: Check[] = [];
  if (range.min != null) checks.push(...checkTemperature(range.min, 'the lower end of the valid range'));
  if (range.max != null) checks.push(...checkTemperature(range.max, 'the upper end of the valid range'));
  if (range.min != null && range.max != null) {
    if (range.min > range.max) checks.push(check('valid-range-reversed', 'blocking', `the valid range runs from ${range.min} K down to ${range.max} K`));
    else if (fittedEnergy && range.max - range.min < 30) checks.push(check('valid-range-narrow', 'warning', `the energy is fitted over ${range.max - range.min} K, less than 30 K`));
  }
  return checks;
}

/** Refuses a sticking coefficient outside 0 to 1. */
export function checkStickingCoefficient(value: number): Check[] {
  return value >= 0 && value <= 1 ? [] : [check('sticking-out-of-range', 'blocking', `the sticking coefficient ${value} is outside 0 to 1`)];
}

/** Refuses a negative pre-exponential factor, rate constant or kinetic isotope effect; `what` names it. */
export function checkNotNegative(what: string, value: number): Check[] {
  return value < 0 ? [check('negative-value', 'blocking', `${what} is negative: ${value}`)] : [];
}

const usualFactors: Record<string, { low: number; high: number; unit: string; what: string }> = {
  'surface-first-order': { low: 1e8, high: 1e16, unit: 's-1', what: 'a surface reaction or hop' },
  desorption: { low: 1e11, high: 1e20, unit: 's-1', what: 'desorption' },
  'second-order-desorption': { low: 1e-7, high: 1e2, unit: 'cm2 molecule-1 s-1', what: 'second-order desorption' },
};

/** Rate law that the usual size of a pre-exponential factor is known for. */
export type FactorKind = 'surface-first-order' | 'desorption' | 'second-order-desorption';

/**
 * Notes a pre-exponential factor outside what is usual for the kind of elementary step.
 *
 * Surface reaction or hop 1e8 to 1e16 s-1, desorption 1e11 to 1e20 s-1, second-order desorption 1e-7 to 1e2 cm2 s-1 per molecule. Source: common practice.
 */
export function checkPreExponential(kind: FactorKind, value: number): Check[] {
  const usual = usualFactors[kind] as { low: number; high: number; unit: string; what: string };
  if (value <= 0 || (value >= usual.low && value <= usual.high)) return [];
  return [check('pre-exponential-unusual', 'warning', `A = ${value.toExponential(2)} ${usual.unit} is outside ${usual.low.toExponential()} to ${usual.high.toExponential()} ${usual.unit}, usual for ${usual.what}`)];
}

/** The kind of factor to judge by, from the class of the elementary step and its unit; null where none applies. */
export function factorKindOf(stepClass: string, unit: string): FactorKind | null {
  if (unit === 's-1') {
    if (stepClass === 'desorption' || stepClass === 'associative-desorption') return 'desorption';
    return ['dissociation', 'association', 'hydrogenation', 'dehydrogenation', 'disproportionation', 'diffusion', 'isomerisation'].includes(stepClass) ? 'surface-first-order' : null;
  }
  return unit === 'cm2 molecule-1 s-1' && stepClass === 'associative-desorption' ? 'second-order-desorption' : null;
}

/** Warns of a negative energy of an elementary surface step. */
export function checkEnergy(energyKJPerMol: number, scope: string): Check[] {
  if (energyKJPerMol >= 0 || scope !== 'elementary') return [];
  return [check('negative-energy', 'warning', `the energy of an elementary surface step is negative: ${energyKJPerMol} kJ/mol`)];
}

/** Warns where a barrier lies below the reaction energy of the same type by more than RT + u [kJ mol-1]. */
export function checkAgainstReactionEnergy(energyKJPerMol: number, reactionEnergyKJPerMol: number, temperatureK = 298.15, uKJPerMol = 0): Check[] {
  const allowance = (R * temperatureK) / 1000 + uKJPerMol;
  const gap = Math.max(0, reactionEnergyKJPerMol) - energyKJPerMol;
  if (gap <= allowance || reactionEnergyKJPerMol <= 0) return [];
  return [check('energy-below-reaction-energy', 'warning', `E = ${energyKJPerMol} kJ/mol lies ${gap.toFixed(1)} kJ/mol below the reaction energy ${reactionEnergyKJPerMol} kJ/mol; RT + u is ${allowance.toFixed(1)} kJ/mol`)];
}

/** Warns of a first-order rate constant above 1e16 s-1, or an adsorption constant above the collision limit [Pa-1 s-1] given. */
export function checkRateConstant(value: number, unit: string, collisionLimit?: number): Check[] {
  if (unit === 's-1' && value > 1e16) return [check('rate-above-limit', 'warning', `k = ${value.toExponential(2)} s-1 is above 1e16 s-1`)];
  if (collisionLimit !== undefined && value > collisionLimit) return [check('rate-above-limit', 'warning', `k = ${value.toExponential(2)} ${unit} is above the collision limit ${collisionLimit.toExponential(2)} ${unit}`)];
  return [];
}

/** Warns where the standard (or else the reported) uncertainty is larger than the value, and notes a bare ± left unknown. */
export function checkUncertainty(quantity: {
  value: number | null;
  standardUncertainty: number | null;
  reportedUncertainty: number | null;
  uncertaintyKind: UncertaintyKind;
  uncertaintyScale: 'linear' | 'ln';
  printed?: { value: number | null };
}): Check[] {
  const checks: Check[] = [];
  const { value, standardUncertainty: u, reportedUncertainty: reported } = quantity;
  if (quantity.uncertaintyScale === 'linear' && value !== null) {
    const size = Math.abs(value);
    const printedSize = Math.abs(quantity.printed?.value ?? value);
    if (u !== null ? u > size : reported !== null && reported > printedSize) {
      checks.push(check('uncertainty-larger-than-value', 'warning', u !== null ? `the standard uncertainty ${u} is larger than the value ${value}` : `the reported uncertainty ${reported} is larger than the value`));
    }
  }
  if (quantity.uncertaintyKind === 'unknown') checks.push(check('uncertainty-unknown', 'note', 'the printed uncertainty has no stated kind, so no standard uncertainty is known'));
  return checks;
}

/** The limits that an isotope effect is judged by. */
export interface KieLimits {
  /** Largest hydrogen isotope effect of zero-point energies alone, at the temperature of the value. */
  semiclassicalLimit?: number;
  /** The stretch and temperature behind that limit, in words. */
  semiclassicalLimitWords?: string;
  /** True for 13C, 15N and 18O against the common isotope. */
  heavyAtom?: boolean;
}

/**
 * Warns of a kinetic isotope effect k_light/k_heavy beyond the semiclassical limit given, either way, or outside 0.9 to 1.15 for a heavy-atom isotope.
 *
 * Source: zero-point factor of Bigeleisen and Mayer, J. Chem. Phys. 15 (1947) 261; the range of heavy atoms is common practice.
 */
export function checkKie(value: number, limits: KieLimits): Check[] {
  if (limits.heavyAtom) {
    return value < 0.9 || value > 1.15 ? [check('kie-unusual', 'warning', `the heavy-atom isotope effect ${value} is outside 0.9 to 1.15`)] : [];
  }
  const { semiclassicalLimit: limit, semiclassicalLimitWords: words } = limits;
  if (limit === undefined) return [];
  const why = words === undefined ? '' : ` (${words})`;
  if (value > limit) return [check('kie-unusual', 'warning', `the isotope effect ${value} is above the semiclassical limit ${limit.toFixed(1)}${why}: tunnelling, or several bonds at once, would explain it`)];
  if (value < 1 / limit) return [check('kie-unusual', 'warning', `the isotope effect ${value} is inverse beyond the semiclassical limit 1/${limit.toFixed(1)}${why}: is it printed as heavy over light?`)];
  return [];
}

export { outlierCheck } from './outlier.ts';
