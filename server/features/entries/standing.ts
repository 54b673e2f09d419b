import type * as z from 'zod';
import type { EntryAction, myEntry } from '#shared/contracts/entries.ts';
import type { SourceSummary } from '#shared/contracts/sources.ts';
import type { State } from '#shared/domain/states.ts';
import { describeSurface, SurfaceError } from '#shared/domain/surface.ts';
import type { findLastSubmission, RevisionRow } from './entries.repository.ts';

/** Whose turn it is, in words. */
function standing(state: State, claimed: boolean): string {
  switch (state) {
    case 'draft': return 'With you: not submitted yet';
    case 'submitted': return 'Waiting for a reviewer';
    case 'under-review': return claimed ? 'A reviewer is checking it against the source' : 'Waiting for a reviewer';
    case 'returned': return 'With you: the reviewer asks for a change';
    case 'accepted': return 'Public';
    case 'rejected': return 'Rejected; the reason is given';
    case 'withdrawn': return 'Withdrawn by you; it can be taken up again';
    case 'superseded': return 'Replaced by a newer version';
    case 'retracted': return 'Retracted; the page says why';
  }
}

function surfaceLabel(revision: RevisionRow): string | null {
  if (!revision.input.surface) return null;
  try {
    return describeSurface(revision.input.surface).label;
  } catch (error) {
    if (error instanceof SurfaceError) return revision.input.surface.metal ?? revision.input.surface.formula ?? null;
    throw error;
  }
}

/** One line of a contributor's list: what it is, where it stands, what the reviewer said last. */
export function describeStanding({ accession, revision, actions, last, source }: {
  accession: string; revision: RevisionRow; actions: EntryAction[]; last: Awaited<ReturnType<typeof findLastSubmission>>; source: SourceSummary | null;
}): z.infer<typeof myEntry> {
  const { input } = revision;
  const primary = input.quantities?.[0];
  const state = revision.state as State;
  return {
    accession, revision: revision.number, version: revision.version, state, kind: input.kind ?? null,
    equation: input.step?.equation ?? null, surface: surfaceLabel(revision), asPrinted: primary?.asPrinted ?? null, unitAsPrinted: primary?.unitAsPrinted ?? null,
    sourceLabel: source?.label ?? input.source?.doi ?? null, changedAt: revision.changedAt.toISOString(),
    standing: standing(state, last?.submission.claimedBy !== null), lastComment: last?.decision?.comment || null, actions,
  };
}
