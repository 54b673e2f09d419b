import type { DbOrTx } from '#server/db/pool.ts';
import type { Assessment } from '#shared/assessment/assess-entry.ts';
import type { Check, EntryInput } from '#shared/contracts/entries.ts';
import type { SourceSummary } from '#shared/contracts/sources.ts';
import { outlierCheck } from '#shared/kinetics/plausibility.ts';
import { listBySource } from './entries.repository.ts';
import { listNeighbours, type Neighbour } from './neighbours.repository.ts';

export interface StoreFindings {
  checks: Check[];
  /** Accepted energies of the same elementary step, of the same scope and energy type. */
  neighbours: Neighbour[];
}

/** The checks that need the store: neighbours, twins, and the standing of the source. */
export async function checkAgainstStore(
  db: DbOrTx, input: EntryInput, assessment: Assessment, source: SourceSummary | null, entryId: string | null,
): Promise<StoreFindings> {
  const checks: Check[] = [];
  const { step, surface } = assessment;
  const energy = assessment.quantities.find(({ symbol }) => symbol === 'energy');
  let neighbours: Neighbour[] = [];
  if (step && surface) {
    neighbours = await listNeighbours(db, { stepKey: step.key, direction: step.direction, energyType: energy?.energyType ?? null, scope: input.scope ?? null, exceptEntryId: entryId }, surface.label);
    const family = neighbours.filter((neighbour) => neighbour.bound === '=' && neighbour.metal === surface.metal && neighbour.facet === surface.facet && neighbour.site === surface.site);
    if (energy?.value !== null && energy?.value !== undefined) checks.push(...outlierCheck(energy.value, family.map(({ energyKJPerMol }) => energyKJPerMol)));
  }
  if (source?.status === 'retracted') checks.push({ code: 'source-retracted', severity: 'warning', message: source.notice ?? 'The source was retracted.' });
  if (source?.status === 'corrected') checks.push({ code: 'source-corrected', severity: 'note', message: source.notice ?? 'A correction to the source was published. Check that the value is the corrected one.' });
  if (source && step && surface) {
    const twins = (await listBySource(db, source.id, entryId)).filter((other) =>
      other.stepKey === step.key && other.direction === step.direction && other.surface === surface.label
      && (input.quantities ?? []).some(({ symbol }) => other.input.quantities?.some((quantity) => quantity.symbol === symbol)));
    const [twin] = twins;
    if (twin) checks.push({ code: 'same-source-same-value', severity: 'warning', message: `The same quantity from this source for this step and surface is already in the store: entry ${twin.accession} (${twin.revision.state.replace('-', ' ')}).` });
  }
  return { checks, neighbours };
}
