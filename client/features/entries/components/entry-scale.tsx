import { useId } from 'react';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { EntryDetail, RelatedEntry } from '#shared/contracts/entries.ts';
import { energyTypeWords } from '#shared/domain/kinds.ts';
import { NeighbourScale } from '#client/ui/neighbour-scale.tsx';
import { RelatedEntries } from './related-entries.tsx';

/** A limit has no dot of its own kind on the scale, so that its name says what it is. */
function boundWords(bound: RelatedEntry['bound']): string {
  if (bound === '<' || bound === '≤') return ', upper limit';
  if (bound === '>' || bound === '≥') return ', lower limit';
  return bound === 'range' ? ', middle of a range' : '';
}

/** Accepted entries for the same elementary step on the same surface: those of the same kind on one scale with this one, all of them in a table. */
export function EntryScale({ entry, unit }: { entry: EntryDetail; unit: EnergyUnit }) {
  const heading = useId();
  const { sameStepAndSurface: all, quantities, version, accession } = entry;
  const energy = quantities.find(({ symbol }) => symbol === 'energy');
  const at = energy?.value ?? energy?.high ?? energy?.low ?? null;
  const alike = all.flatMap((one) => (one.alike && one.energyKJPerMol !== null
    ? [{ accession: one.accession, label: `${one.label}${boundWords(one.bound)}`, energyKJPerMol: one.energyKJPerMol, computed: one.computed, sameSurface: true }] : []));
  const others = all.length - alike.length;
  const drawn = energy && at !== null && alike.length > 0;
  return (
    <section aria-labelledby={heading}>
      <h2 id={heading} className="pb-2">The same elementary step and surface</h2>
      {drawn && (
        <div className="pb-4">
          <p className="pb-1 text-second">{[energy.energyType ? energyTypeWords[energy.energyType].replace(/^./, (first) => first.toUpperCase()) : 'Energy', entry.scope].filter(Boolean).join(', ')}, on one scale.</p>
          <NeighbourScale
            neighbours={alike} own={{ energyKJPerMol: at, label: `This entry, ${entry.source?.label ?? accession}${version === null ? ', not public' : ''}${boundWords(energy.bound)}` }}
            energyUnit={unit} most={12}
          />
          {others > 0 && <p className="text-fine text-second">{`${others === 1 ? 'One more entry is' : `${others} more entries are`} of another kind, scope or promoter and not drawn: unlike is not set on one scale.`}</p>}
        </div>
      )}
      <RelatedEntries label="Entries for the same elementary step and surface" entries={all} ownType={energy?.energyType ?? null} unit={unit} none={entry.conversion === null ? 'Looked up when the revision is submitted.' : 'No other accepted entry for this elementary step on this surface.'} />
    </section>
  );
}
