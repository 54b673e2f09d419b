import { convertQuantity, type ConvertedQuantity } from '#shared/kinetics/quantity.ts';
import { readStep, type ElementaryStep } from '#shared/steps/parse-step.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { readDemoEntries, type DemoEntry } from '#seeds/demo/read-demo.ts';

/** A demonstration entry with its step and its quantities as the computing core reads them. */
export type ReadEntry = DemoEntry & { step: ElementaryStep; quantities: ConvertedQuantity[] };

function convert(input: EntryInput, step: ElementaryStep): ConvertedQuantity[] {
  const { rateOf, conditions = {} } = input;
  const consumed = typeof rateOf === 'object' ? rateOf.consumptionOf : null;
  const coefficient = step.reactants.filter(({ species }) => species.formula === consumed).reduce((sum, term) => sum + term.coefficient, 0);
  return (input.quantities ?? []).map((quantity) => convertQuantity(quantity, {
    gasOrder: step.gasOrder, surfaceOrder: step.surfaceOrder, kineticOrders: input.kineticOrders,
    rateOf: consumed === null ? (rateOf as 'event' | 'unknown' | undefined) : { consumption: consumed, coefficient },
    temperatureK: conditions.temperatureK, siteDensityPerM2: conditions.siteDensityPerM2, siteDensitySource: conditions.siteDensitySource,
    coverageDefinition: conditions.coverageDefinition,
  }));
}

/** Every row but the deliberately unbalanced draft, read and converted; throws at the first that cannot be. */
export function readAllEntries(): ReadEntry[] {
  return readDemoEntries().filter(({ script }) => script.mark !== 'unbalanced').map((entry) => {
    try {
      const step = readStep(entry.input.step?.equation ?? '');
      return { ...entry, step, quantities: convert(entry.input, step) };
    } catch (error) {
      throw new Error(`row ${entry.row}: ${(error as Error).message}`, { cause: error });
    }
  });
}

/** What a family of energies has in common. */
export type Family = {
  equation: string; metal?: string; site?: string; promoter?: string | null; scope?: string; computed?: boolean; energyType?: string; support?: string;
};

/** Energies [kJ/mol] of accepted entries without a bound that belong to a family, on clean surfaces unless a promoter is named. */
export function energiesOf(entries: readonly ReadEntry[], family: Family): number[] {
  const { key, direction } = readStep(family.equation);
  return entries.flatMap(({ input, script, step, quantities }) => {
    const energy = quantities.find(({ symbol }) => symbol === 'energy');
    const matches = script.outcome === 'accepted' && step.key === key && step.direction === direction && energy?.bound === '='
      && (family.metal === undefined || input.surface?.metal === family.metal)
      && (family.site === undefined || input.surface?.site === family.site)
      && (family.support === undefined || input.surface?.support === family.support)
      && (family.scope ?? 'elementary') === input.scope
      && (family.energyType === undefined || energy.energyType === family.energyType)
      && (family.computed === undefined || family.computed === (input.method?.class === 'computed'))
      && (family.promoter === undefined ? input.conditions?.promoter === undefined : family.promoter === null || input.conditions?.promoter === family.promoter);
    return matches && energy.value !== null ? [energy.value] : [];
  });
}

/** The median; NaN of nothing, so that a comparison with it fails. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  if (sorted.length === 0) return Number.NaN;
  return sorted.length % 2 === 1 ? (sorted[middle] as number) : ((sorted[middle - 1] as number) + (sorted[middle] as number)) / 2;
}
