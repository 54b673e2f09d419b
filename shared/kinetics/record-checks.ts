import {
  checkAgainstReactionEnergy, checkEnergy, checkKie, checkNotNegative, checkPreExponential, checkRateConstant, checkStickingCoefficient, checkTemperature,
  checkUncertainty, checkValidRange, factorKindOf, type Check,
} from './plausibility.ts';
import type { QuantitySymbol } from './quantity-symbols.ts';
import { collisionLimit } from './sticking.ts';
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
  /** Largest semiclassical isotope effect, from `isotopeLimits`. */
  semiclassicalLimit?: number | null;
  /** The stretch and temperature behind it, in words. */
  semiclassicalLimitWords?: string;
  /** True for a 13C, 15N or 18O isotope effect. */
  heavyAtomIsotope?: boolean;
  /** How the isotope effect is printed; light over heavy when absent. */
  kieDirection?: 'light/heavy' | 'heavy/light' | null;
  /** Γ [m-2], for the collision limit of an adsorption constant. */
  siteDensityPerM2?: number | null;
  /** Molar mass of the one gas molecule that the step takes up [g mol-1]; null for none or several. */
  gasMolarMassGPerMol?: number | null;
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

const perSiteAndPressure = 'Pa-1 s-1';

/** The collision limit at the temperature of the gas [Pa-1 s-1]; undefined where something it needs is not known. */
function collisionLimitOf({ siteDensityPerM2, gasMolarMassGPerMol: molarMassGPerMol, temperatureK, validRange }: RecordFacts): number | undefined {
  // The limit falls with temperature: where only a range is known its lower end gives the largest.
  const T = temperatureK ?? validRange?.min;
  if (!siteDensityPerM2 || !molarMassGPerMol || !T || T < 0) return undefined;
  return collisionLimit({ molarMassGPerMol, temperatureK: T, siteDensityPerM2 });
}

/** A first-order constant against its ceiling, an adsorption constant per site and pressure against the collision limit. */
function rateChecks(quantity: CheckedQuantity, value: number, facts: RecordFacts): Check[] {
  if (quantity.siteUnit === perSiteAndPressure && quantity.siteValue != null) return checkRateConstant(quantity.siteValue, perSiteAndPressure, collisionLimitOf(facts));
  return checkRateConstant(value, quantity.unit, quantity.unit === perSiteAndPressure ? collisionLimitOf(facts) : undefined);
}

/** An isotope effect, turned to light over heavy, against its limits. */
function kieChecks(value: number, facts: RecordFacts): Check[] {
  return checkKie(facts.kieDirection === 'heavy/light' ? 1 / value : value, {
    semiclassicalLimit: facts.semiclassicalLimit ?? undefined, semiclassicalLimitWords: facts.semiclassicalLimitWords, heavyAtom: facts.heavyAtomIsotope,
  });
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
      checks.push(...checkNotNegative('the rate constant', value), ...rateChecks(quantity, value, facts));
      break;
    case 'kie':
      checks.push(...checkNotNegative('the kinetic isotope effect', value));
      if (value > 0) checks.push(...kieChecks(value, facts));
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
