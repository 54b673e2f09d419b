import type { DbOrTx } from '#server/db/pool.ts';
import { rateParameters } from '#shared/assessment/rate-at-temperature.ts';
import type { EntryDetail, RelatedEntry } from '#shared/contracts/entries.ts';
import type { EnergyType, Scope } from '#shared/domain/kinds.ts';
import { readStep, StepError, type ElementaryStep } from '#shared/steps/parse-step.ts';
import { presentQuantity } from './entries.present.ts';
import { loadRecords, type EntryRecord } from './entries.repository.ts';
import { listReactionEnergyHolders, listRelated, type Related } from './neighbours.repository.ts';
import { readPromoters } from './promoters.ts';
import { consistencyWithReverse, type Direction, type HeldReactionEnergy } from './reverse-consistency.ts';

/** A step as today's reader takes it; null where it no longer reads what an older one read. */
function readAgain(equation: string): ElementaryStep | null {
  try {
    return readStep(equation);
  } catch (error) {
    if (!(error instanceof StepError)) throw error;
    return null;
  }
}

function gasMoleChangeOf(step: ElementaryStep | null): number {
  const count = (terms: ElementaryStep['reactants']) => terms.filter(({ species }) => species.phase === 'gas').reduce((sum, { coefficient }) => sum + coefficient, 0);
  return step ? count(step.products) - count(step.reactants) : 0;
}

const promotersOf = ({ revision }: EntryRecord) => readPromoters(revision.input.conditions?.promoter);

function directionOf(record: EntryRecord): Direction {
  const quantities = record.quantities.map(presentQuantity);
  const energy = quantities.find(({ symbol }) => symbol === 'energy');
  return {
    energyKJPerMol: energy?.value ?? null, uEnergyKJPerMol: energy?.standardUncertainty ?? null, bound: energy?.bound ?? null, energyType: energy?.energyType ?? null,
    scope: record.revision.scope as Scope | null, exponent: rateParameters(quantities)?.exponent ?? 0, variantKey: readAgain(record.step.equation)?.variantKey ?? null,
    site: record.surface.site, promoters: promotersOf(record),
  };
}

const reversed = ({ equation, rate, ...row }: Related): Direction => ({ ...row, exponent: rate?.exponent ?? 0, variantKey: readAgain(equation)?.variantKey ?? null });

/** The reaction energies held for the step on the surface, turned into the direction of the entry shown; those of the entry itself first. */
async function heldReactionEnergies(db: DbOrTx, record: EntryRecord): Promise<HeldReactionEnergy[]> {
  const ids = await listReactionEnergyHolders(db, { stepKey: record.step.key, surfaceLabel: record.surface.label });
  const others = await loadRecords(db, ids.filter((id) => id !== record.revision.id));
  return [record, ...others.filter(({ accession }) => accession !== record.accession)].flatMap((holder) => holder.quantities.flatMap(({ printed, converted }) => {
    if (printed.symbol !== 'reactionEnergy' || converted.value === null || converted.unit !== 'kJ/mol' || (printed.bound !== '=' && printed.bound !== '≈')) return [];
    return [{
      accession: holder.accession, label: holder.source.label, valueKJPerMol: holder.step.direction === record.step.direction ? converted.value : -converted.value,
      uKJPerMol: converted.standardUncertainty, energyType: printed.energyType as EnergyType | null, variantKey: readAgain(holder.step.equation)?.variantKey ?? null, promoters: promotersOf(holder),
    }];
  }));
}

/** Other accepted entries for the step on the surface and for its reverse, each reverse with what E_f - E_r says. */
export async function relatedTo(db: DbOrTx, record: EntryRecord, temperatureK: number | null): Promise<Pick<EntryDetail, 'sameStepAndSurface' | 'reverse'>> {
  const family = { stepKey: record.step.key, surfaceLabel: record.surface.label, accession: record.accession };
  const [same, back] = await Promise.all([
    listRelated(db, { ...family, direction: record.step.direction }), listRelated(db, { ...family, direction: -record.step.direction }),
  ]);
  const own = directionOf(record);
  const present = ({ site: _site, equation: _equation, ...row }: Related): RelatedEntry => ({
    ...row, alike: row.energyType === own.energyType && row.scope === own.scope && row.promoters.join() === own.promoters.join(),
  });
  const held = back.length > 0 ? await heldReactionEnergies(db, record) : [];
  const gasMoleChange = gasMoleChangeOf(readAgain(record.step.equation));
  return {
    sameStepAndSurface: same.map(present),
    reverse: back.map((row) => {
      // A reaction energy that one of the two entries holds itself goes before those of other sources.
      const theirs = ({ accession }: HeldReactionEnergy) => accession === record.accession || accession === row.accession;
      const ordered = [...held.filter(theirs), ...held.filter((one) => !theirs(one))];
      return { ...present(row), consistency: consistencyWithReverse({ own, reverse: reversed(row), held: ordered, gasMoleChange, temperatureK }) };
    }),
  };
}
