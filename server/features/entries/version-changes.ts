import type { DbOrTx } from '#server/db/pool.ts';
import { notFound } from '#server/refusal.ts';
import { assessEntry } from '#shared/assessment/assess-entry.ts';
import type { EntryChanges } from '#shared/contracts/entries.ts';
import type { Quantity } from '#shared/contracts/quantities.ts';
import type { State } from '#shared/domain/states.ts';
import { listChanges, pairQuantities } from './changes.service.ts';
import { presentAssessed, presentQuantity } from './entries.present.ts';
import { loadRecord, type RevisionRow } from './entries.repository.ts';

/**
 * The revision that "2" (version 2) or "r3" (revision 3) names among those that the viewer may see.
 * @throws Refusal when none of them has the name
 */
export function findNamed(name: string, visible: readonly RevisionRow[], accession: string): RevisionRow {
  const byRevision = name.startsWith('r');
  const wanted = Number(name.replace('r', ''));
  const named = visible.find(({ version, number }) => (byRevision ? number : version) === wanted);
  if (!named) throw notFound(`${byRevision ? 'Revision' : 'Version'} ${wanted} of entry ${accession}`);
  return named;
}

/** The quantities of a revision as they were accepted, or as they would be read now while it is not frozen. */
async function quantitiesOf(db: DbOrTx, revision: RevisionRow): Promise<Quantity[]> {
  const record = await loadRecord(db, revision.id);
  return record ? record.quantities.map(presentQuantity) : presentAssessed(assessEntry(revision.input));
}

const figures = (quantity: Quantity | null): string =>
  JSON.stringify(quantity && [quantity.bound, quantity.value, quantity.low, quantity.high, quantity.unit, quantity.siteValue ?? null, quantity.standardUncertainty, quantity.uncertaintyKind]);

const presentSide = (revision: RevisionRow): EntryChanges['from'] => ({
  revision: revision.number, version: revision.version, state: revision.state as State, contributor: revision.authorName,
  at: (revision.acceptedAt ?? revision.changedAt).toISOString(),
});

/** What differs between two revisions of one entry: what was typed, and what it became. */
export async function compareRevisions(db: DbOrTx, accession: string, from: RevisionRow, to: RevisionRow): Promise<EntryChanges> {
  const [before, after] = await Promise.all([quantitiesOf(db, from), quantitiesOf(db, to)]);
  return {
    accession, from: presentSide(from), to: presentSide(to), changes: listChanges(from.input, to.input),
    quantities: pairQuantities(before, after).filter((pair) => figures(pair.before) !== figures(pair.after)),
  };
}
