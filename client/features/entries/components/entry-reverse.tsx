import { useId, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { Check, EntryDetail, ReverseConsistency } from '#shared/contracts/entries.ts';
import type { EnergyType } from '#shared/domain/kinds.ts';
import { energyIn, setNumber } from '#client/lib/numbers.ts';
import { Notice, type NoticeKind } from '#client/ui/notice.tsx';
import { Value, valueText } from '#client/ui/value.tsx';
import { RelatedEntries } from './related-entries.tsx';

type Reverse = EntryDetail['reverse'][number];
type Compared = Exclude<ReverseConsistency, { status: 'not-compared' }>;

/** What E_f - E_r of two energies of a type equals. */
const reactionWords: Readonly<Record<EnergyType, string>> = {
  'arrhenius': 'standard reaction enthalpy', 'enthalpy': 'standard reaction enthalpy', 'electronic': 'electronic reaction energy', 'zero-point-corrected': 'zero-point-corrected reaction energy', 'gibbs': 'Gibbs energy of reaction',
};

const bothWords: Readonly<Record<EnergyType, string>> = {
  'arrhenius': 'Arrhenius activation energies', 'enthalpy': 'enthalpies of activation', 'electronic': 'electronic energy barriers', 'zero-point-corrected': 'zero-point-corrected barriers', 'gibbs': 'Gibbs energies of activation',
};

/** The value string of an energy with its uncertainty, in the reader's unit. */
function energyText(unit: EnergyUnit, value: number, u: number | null): string {
  return valueText(energyProps(unit, value, u));
}

function energyProps(unit: EnergyUnit, value: number, u: number | null) {
  return { value: energyIn(unit, value), u: u === null ? null : energyIn(unit, u), unit, uDigits: 1, ...(u === null ? { digits: 3 } : {}), scientific: false };
}

/** The entries of the reverse, and what E_f - E_r says of each pair. */
export function EntryReverse({ entry, unit }: { entry: EntryDetail; unit: EnergyUnit }) {
  const heading = useId();
  const { reverse } = entry;
  const compared = reverse.flatMap(({ consistency, ...one }) => (consistency.status === 'not-compared' ? [] : [{ one, consistency }]));
  const reasons = groupReasons(reverse);
  const assumptions = [...new Set(compared.flatMap(({ consistency: { assumption } }) => assumption ?? []))];
  return (
    <section aria-labelledby={heading}>
      <h2 id={heading} className="pb-2">The reverse elementary step</h2>
      <RelatedEntries label="Entries for the reverse elementary step" entries={reverse} ownType={entry.quantities.find(({ symbol }) => symbol === 'energy')?.energyType ?? null} unit={unit} none={entry.conversion === null ? 'Looked up when the revision is submitted.' : 'No accepted entry for the reverse on this surface, so that the two directions cannot be set against each other.'} />
      {reverse.length > 0 && (
        <>
          <h3 className="pt-4 pb-2">Consistency of both directions</h3>
          <ul className="flex flex-col gap-2">
            {compared.map(({ one, consistency }) => (
              <li key={one.accession}>
                <Pair consistency={consistency} other={<Link to={`/entries/${one.accession}`}>{one.label}</Link>} unit={unit} />
              </li>
            ))}
            {reasons.map(([reason, labels]) => (
              <li key={reason} className="text-second">{`Not compared with ${labels.join('; ')}: ${reason.replace(/^./, (first) => first.toLowerCase())}`}</li>
            ))}
          </ul>
          {assumptions.map((words) => <p key={words} className="pt-2 text-fine text-second">{words}</p>)}
        </>
      )}
    </section>
  );
}

/** Why entries are not compared, each reason once with the entries it holds for. */
function groupReasons(reverse: readonly Reverse[]): [string, string[]][] {
  const reasons = new Map<string, string[]>();
  for (const { consistency, label } of reverse) if (consistency.status === 'not-compared') reasons.set(consistency.reason, [...new Set([...(reasons.get(consistency.reason) ?? []), label])]);
  return [...reasons];
}

const looks: Readonly<Record<Compared['status'], { kind: NoticeKind; title: string }>> = {
  'consistent': { kind: 'result', title: 'Consistent.' },
  'inconsistent': { kind: 'doubt', title: 'At odds beyond the uncertainties.' },
  'undecided': { kind: 'quotation', title: 'Not decided.' },
  'no-reaction-energy': { kind: 'quotation', title: 'Nothing to check against.' },
};

function Pair({ consistency, other, unit }: { consistency: Compared; other: ReactNode; unit: EnergyUnit }) {
  const { status, energyType, differenceKJPerMol, uDifferenceKJPerMol, reactionEnergy, closureErrorKJPerMol, normalizedError } = consistency;
  const { kind, title } = looks[status];
  return (
    <Notice kind={kind} title={title}>
      E<sub>f</sub> − E<sub>r</sub> with {other}, both {bothWords[energyType]}: <b className="font-semibold"><Value {...energyProps(unit, differenceKJPerMol, uDifferenceKJPerMol)} /></b>.{' '}
      {reactionEnergy === null || closureErrorKJPerMol === null
        ? `No ${reactionWords[energyType]} is held for this elementary step and surface.`
        : (
          <>
            The {reactionWords[energyType]} of <Link to={`/entries/${reactionEnergy.accession}`}>{reactionEnergy.label}</Link> is <Value {...energyProps(unit, reactionEnergy.valueKJPerMol, reactionEnergy.uKJPerMol)} />; the two differ by{' '}
            <Value {...energyProps(unit, closureErrorKJPerMol, null)} />
            {normalizedError === null
              ? status === 'undecided' ? ', and an uncertainty is not reported, so that nothing follows.' : '.'
              : <>, E<sub>n</sub> = {setNumber(normalizedError, { digits: 2 }).text} (consistent up to 1; ISO 13528:2022).</>}
          </>
        )}
    </Notice>
  );
}

/** The checks that the reverse raises: pairs that are at odds beyond their uncertainties. */
export function reverseChecks({ reverse }: EntryDetail, unit: EnergyUnit): Check[] {
  return reverse.flatMap(({ consistency, label }) => {
    if (consistency.status !== 'inconsistent' || !consistency.reactionEnergy) return [];
    const { energyType, differenceKJPerMol, uDifferenceKJPerMol, reactionEnergy: { label: from, valueKJPerMol, uKJPerMol } } = consistency;
    return [{
      code: 'reverse-inconsistent', severity: 'warning',
      message: `With the reverse of ${label}, forward less reverse is ${energyText(unit, differenceKJPerMol, uDifferenceKJPerMol)}; the ${reactionWords[energyType]} of ${from} is ${energyText(unit, valueKJPerMol, uKJPerMol)}.`,
    }];
  });
}
