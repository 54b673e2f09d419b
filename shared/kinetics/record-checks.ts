import {
  checkAgainstReactionEnergy, checkEnergy, checkKie, checkNotNegative, checkPreExponential, checkRateConstant, checkStickingCoefficient, checkTemperature,
  checkUncertainty, checkValidRange, factorKindOf, type Check,
} from './plausibility.ts';
import type { QuantitySymbol } from './quantity-symbols.ts';
import type { UncertaintyKind } from './uncertainty.ts';
import { findUnit, scaleBetween } from './units.ts';

/** The fields of a converted quantity that the checks look at. */
export interface CheckedQuantity {
  symbol: QuantitySymbol;
  energyType?: string | null;
  value: number | null;
  low?: number | null;
  high?: number | null;
  unit: string;
  siteValue?: number | null;
  siteUnit?: string;
  bound?: string;
  standardUncertainty: number | null;
  reportedUncertainty: number | null;
  uncertaintyKind: UncertaintyKind;
  uncertaintyScale: 'linear' | 'ln';
  printed?: { value: number | null };
  /** Place among the entry's quantities; the index in the list when absent. */
  position?: number;
}

/** What a record says, as far as it is known. */
export interface RecordFacts {
  quantities: readonly CheckedQuantity[];
  scope: string | null;
  stepClass: string | null;
  gasOrder?: number | null;
  surfaceOrder?: number | null;
  methodClass: string | null;
  validRange: { min?: number | null; max?: number | null } | null;
  endStateReference?: string | null;
  temperatureK?: number | null;
  /** Largest semiclassical isotope effect, where the bond is known. */
  semiclassicalLimit?: number | null;
  /** True for a 13C, 15N or 18O isotope effect. */
  heavyAtomIsotope?: boolean;
}

/** A check with the place in the record that raised it. */
export interface RecordCheck extends Check {
  path: string;
}

const barrierTypes: ReadonlySet<string> = new Set(['electronic', 'zero-point-corrected', 'enthalpy', 'gibbs']);
const squareCentimetre = 'cm2 molecule-1 s-1';

/** The printed basis as the checks on A know it: s-1 as it is, areal second order in cm2 per molecule. */
function factorFor(quantity: CheckedQuantity, stepClass: string): Check[] {
  if (quantity.value === null) return [];
  const areal = quantity.unit === 'm2 mol-1 s-1';
  const unit = areal ? squareCentimetre : quantity.unit;
  const kind = factorKindOf(stepClass, unit);
  if (kind === null) return [];
  const from = findUnit(quantity.unit);
  const to = findUnit(unit);
  return from && to ? checkPreExponential(kind, scaleBetween(quantity.value, from, to)) : [];
}

function checksOf(quantity: CheckedQuantity, facts: RecordFacts): Check[] {
  const value = quantity.value ?? quantity.low ?? quantity.high ?? null;
  const checks: Check[] = [...checkUncertainty(quantity)];
  if (value === null) return checks;
  switch (quantity.symbol) {
    case 'energy': {
      checks.push(...checkEnergy(value, facts.scope ?? ''));
      const reaction = facts.quantities.find(({ symbol, energyType }) => symbol === 'reactionEnergy' && energyType != null && energyType === quantity.energyType);
      if (reaction?.value != null) {
        const u = Math.hypot(quantity.standardUncertainty ?? 0, reaction.standardUncertainty ?? 0);
        checks.push(...checkAgainstReactionEnergy(value, reaction.value, facts.temperatureK ?? undefined, u));
      }
      break;
    }
    case 'preExponential':
      checks.push(...checkNotNegative('the pre-exponential factor', value));
      if (facts.stepClass !== null && facts.scope !== 'apparent') checks.push(...factorFor(quantity, facts.stepClass));
      break;
    case 'rateConstant':
      checks.push(...checkNotNegative('the rate constant', value), ...checkRateConstant(value, quantity.unit));
      break;
    case 'kie':
      checks.push(...checkNotNegative('the kinetic isotope effect', value));
      checks.push(...checkKie(value, { semiclassicalLimit: facts.semiclassicalLimit ?? undefined, heavyAtom: facts.heavyAtomIsotope }));
      break;
    case 'stickingCoefficient':
      checks.push(...[quantity.value, quantity.low, quantity.high].filter((number) => number != null).slice(0, 2).flatMap(checkStickingCoefficient).slice(0, 1));
      break;
    case 'referenceTemperature':
      checks.push(...checkTemperature(value, 'T0'));
      break;
    default:
  }
  return checks;
}

/**
 * Every check that a record raises by itself, with its place: units and balance are refused earlier, neighbours are compared elsewhere.
 *
 * Source of the limits: common practice, as each check says.
 */
export function recordChecks(facts: RecordFacts): RecordCheck[] {
  const checks: RecordCheck[] = facts.quantities.flatMap((quantity, index) =>
    checksOf(quantity, facts).map((check) => ({ ...check, path: `quantities.${quantity.position ?? index}.asPrinted` })),
  );
  const energy = facts.quantities.find(({ symbol }) => symbol === 'energy');
  if (facts.validRange) {
    const fitted = facts.methodClass === 'measured' && energy?.energyType === 'arrhenius';
    checks.push(...checkValidRange(facts.validRange, fitted).map((check) => ({ ...check, path: 'validRange' })));
  }
  if (facts.temperatureK != null) checks.push(...checkTemperature(facts.temperatureK).map((check) => ({ ...check, path: 'conditions.temperatureK' })));
  if (facts.methodClass === 'computed' && energy && barrierTypes.has(energy.energyType ?? '') && !facts.endStateReference && facts.stepClass !== 'adsorption' && facts.stepClass !== 'desorption') {
    checks.push({
      code: 'end-state-reference-missing',
      severity: 'note',
      message: 'a computed barrier without its end-state reference: gas, isolated or co-adsorbed',
      path: 'conditions.endStateReference',
    });
  }
  return checks;
}
