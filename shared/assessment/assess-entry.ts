import type { Check, EntryInput, Fault } from '../contracts/entries.ts';
import { primarySymbol, symbolWords } from '../domain/kinds.ts';
import { describeSurface, SurfaceError, type Surface } from '../domain/surface.ts';
import { molarMass } from '../kinetics/atomic-weights.ts';
import { isotopeLimits, type IsotopeLimits } from '../kinetics/isotope-limits.ts';
import { KineticsError } from '../kinetics/kinetics-error.ts';
import { convertQuantity, type ConvertedQuantity } from '../kinetics/quantity.ts';
import type { QuantityContext } from '../kinetics/quantity-symbols.ts';
import { recordChecks } from '../kinetics/record-checks.ts';
import { readStep, StepError, type ElementaryStep } from '../steps/parse-step.ts';

/** What an entry amounts to, from what was typed alone: no store is asked. */
export interface Assessment {
  step: ElementaryStep | null;
  surface: Surface | null;
  /** One for each quantity that can be read, with its place in the input. */
  quantities: (ConvertedQuantity & { position: number })[];
  /** What deserves a second look; none of it stands in the way. */
  checks: Check[];
  /** What stands in the way of submitting, each with its place in the input. */
  faults: Fault[];
}

const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1) + (/[.?]$/.test(text) ? '' : '.');

function assessStep(input: EntryInput, faults: Fault[]): ElementaryStep | null {
  const equation = input.step?.equation.trim();
  if (!equation) {
    faults.push({ path: 'step.equation', message: 'Write the elementary step, such as N* + N* -> N2 + 2*.' });
    return null;
  }
  try {
    return readStep(equation);
  } catch (error) {
    if (!(error instanceof StepError)) throw error;
    faults.push({ path: 'step.equation', message: error.message, code: error.code, ...(error.suggestion ? { suggestion: error.suggestion } : {}) });
    return null;
  }
}

function assessSurface(input: EntryInput, faults: Fault[]): Surface | null {
  try {
    return describeSurface(input.surface ?? {});
  } catch (error) {
    if (!(error instanceof SurfaceError)) throw error;
    faults.push({ path: `surface.${error.field}`, message: error.message, code: error.code });
    return null;
  }
}

/** T0 as printed, for the rates that depend on it; null when none is printed or it cannot be read. */
function referenceTemperature(input: EntryInput): number | null {
  const printed = input.quantities?.find(({ symbol }) => symbol === 'referenceTemperature');
  const value = printed ? Number(printed.asPrinted.trim()) : NaN;
  return Number.isFinite(value) && value > 0 ? value : null;
}

/** Whether the two surface species of a step are of one kind, free sites among them; null where the step has not two. */
function isLikePair(step: ElementaryStep): boolean | null {
  if (step.surfaceOrder !== 2) return null;
  const kinds = step.reactants.filter(({ species }) => species.phase !== 'gas' && species.formula !== 'e').map(({ species }) => `${species.spelling} ${species.siteType ?? ''}`);
  return new Set(kinds).size === 1;
}

/** What the conversion of a rate needs to know of the rest of the entry. */
function quantityContext(input: EntryInput, step: ElementaryStep | null): QuantityContext {
  const { rateOf, conditions = {} } = input;
  const consumed = typeof rateOf === 'object' ? rateOf.consumptionOf : null;
  const coefficient = consumed && step
    ? step.reactants.filter((term) => term.species.formula === consumed.replaceAll('*', '')).reduce((sum, term) => sum + term.coefficient, 0)
    : 0;
  return {
    gasOrder: step?.gasOrder ?? null,
    surfaceOrder: step?.surfaceOrder ?? null,
    kineticOrders: input.kineticOrders,
    rateOf: consumed ? { consumption: consumed, coefficient: coefficient || 1 } : rateOf === 'event' ? 'event' : 'unknown',
    temperatureK: conditions.temperatureK,
    referenceTemperatureK: referenceTemperature(input),
    siteDensityPerM2: conditions.siteDensityPerM2,
    siteDensitySource: conditions.siteDensitySource,
    coverageDefinition: conditions.coverageDefinition,
    perPair: conditions.perPair,
    nearestNeighbours: conditions.nearestNeighbours,
    likePair: step && isLikePair(step),
  };
}

function assessQuantities(input: EntryInput, step: ElementaryStep | null, faults: Fault[]): Assessment['quantities'] {
  const context = quantityContext(input, step);
  return (input.quantities ?? []).flatMap((quantity, position) => {
    if (!quantity.asPrinted.trim()) {
      faults.push({ path: `quantities.${position}.asPrinted`, message: `Type the ${symbolWords[quantity.symbol]} as the source prints it.` });
      return [];
    }
    try {
      return [{ ...convertQuantity(quantity, context), position }];
    } catch (error) {
      if (!(error instanceof KineticsError)) throw error;
      const field = /unit/i.test(error.path) ? 'unitAsPrinted' : error.path in quantity ? error.path : 'asPrinted';
      faults.push({ path: `quantities.${position}.${field}`, message: error.message, code: error.code });
      return [];
    }
  });
}

/** Adds a fault for everything that must be said before a reviewer is asked. */
function requireParts(input: EntryInput, faults: Fault[]): void {
  const need = (missing: boolean, path: string, message: string): void => {
    if (missing) faults.push({ path, message });
  };
  need(!input.kind, 'kind', 'Say which kind of value this is.');
  need(!input.scope, 'scope', 'Say whether the value is for one elementary step, several lumped into one, or apparent.');
  need(!input.provenance, 'provenance', 'Say how the source came by the value.');
  need(!input.method?.class, 'method.class', 'Say whether the value was measured or computed.');
  need(!input.locator?.trim(), 'locator', 'Say where in the source: page, table, figure or equation.');
  const wanted = input.kind ? primarySymbol[input.kind] : null;
  const quantities = input.quantities ?? [];
  need(quantities.length === 0, 'quantities', 'Type at least one quantity as printed.');
  if (wanted && quantities.length > 0 && !quantities.some(({ symbol }) => symbol === wanted)) {
    faults.push({ path: 'quantities', message: `An entry of this kind must hold the ${symbolWords[wanted]}.` });
  }
  quantities.forEach((quantity, position) => {
    need(quantity.symbol === 'energy' && !quantity.energyType, `quantities.${position}.energyType`, 'Say what kind of energy this is: an Arrhenius activation energy, an electronic barrier, …');
    if (quantities.findIndex((other) => other.symbol === quantity.symbol && other.energyType === quantity.energyType) !== position) {
      faults.push({ path: `quantities.${position}.symbol`, message: `The ${symbolWords[quantity.symbol]} is given twice. Enter the second value as an entry of its own.` });
    }
  });
  if (input.kind === 'activation-energy' || input.kind === 'barrier') {
    const energy = quantities.findIndex(({ symbol }) => symbol === 'energy');
    const type = quantities[energy]?.energyType;
    if (type && (input.kind === 'activation-energy') !== (type === 'arrhenius')) {
      faults.push({ path: `quantities.${energy}.energyType`, message: 'An activation energy is an Arrhenius energy; a computed barrier is one of the other types.' });
    }
  }
}

/** The limits of an isotope effect: by the isotopes named, else by the labels of the step. */
function isotopesOf(input: EntryInput, step: ElementaryStep | null): IsotopeLimits {
  const species = [...(step?.reactants ?? []), ...(step?.products ?? [])].map((term) => term.species);
  return isotopeLimits({
    isotopes: input.conditions?.isotopes, labels: [...new Set(species.flatMap(({ isotopes = {} }) => Object.keys(isotopes)))],
    bond: step?.bond.broken ?? step?.bond.formed, temperatureK: input.conditions?.temperatureK, validRange: input.validRange,
  });
}

/** Molar mass [g mol-1] of the one gas molecule that a step takes up; null for none, for several, or where an atom has no standard weight. */
function gasMolarMass(step: ElementaryStep): number | null {
  const gases = step.reactants.filter(({ species }) => species.phase === 'gas' && species.formula !== 'e');
  const [gas] = gases;
  if (!gas || gases.length > 1 || gas.coefficient !== 1) return null;
  try {
    return molarMass(gas.species.composition, gas.species.isotopes);
  } catch (error) {
    if (error instanceof KineticsError) return null;
    throw error;
  }
}

/**
 * Reads, balances, converts and checks what a contributor typed.
 * @param input everything typed so far; all of it may be missing.
 * @returns what could be read, the checks it raises, and the faults that stand in the way of submitting. Nothing is thrown for bad input.
 */
export function assessEntry(input: EntryInput): Assessment {
  const faults: Fault[] = [];
  const step = assessStep(input, faults);
  const surface = assessSurface(input, faults);
  const quantities = assessQuantities(input, step, faults);
  requireParts(input, faults);
  const raised = recordChecks({
    quantities, scope: input.scope ?? null, stepClass: step?.class ?? null, gasOrder: step?.gasOrder, surfaceOrder: step?.surfaceOrder,
    methodClass: input.method?.class ?? null, validRange: input.validRange ?? null, endStateReference: input.conditions?.endStateReference,
    temperatureK: input.conditions?.temperatureK, kieDirection: input.conditions?.kieDirection, ...isotopesOf(input, step),
    siteDensityPerM2: input.conditions?.siteDensityPerM2, gasMolarMassGPerMol: step && gasMolarMass(step),
  }).map((check) => ({ ...check, message: sentence(check.message) }));
  for (const { code, message, path } of raised.filter(({ severity }) => severity === 'blocking')) faults.push({ path, message, code });
  const checks: Check[] = raised.filter(({ severity }) => severity !== 'blocking').map(({ code, severity, message }) => ({ code, severity, message }));
  if (step && input.step?.sitesAdded) {
    checks.push({ code: 'free-sites-added', severity: 'note', message: 'The source leaves the free sites out; they were added so that the equation balances.' });
  }
  if (input.provenance === 'quoted') checks.push({ code: 'quoted-elsewhere', severity: 'warning', message: 'The value is quoted from elsewhere. Enter the primary source if it can be had.' });
  return { step, surface, quantities, checks, faults };
}
