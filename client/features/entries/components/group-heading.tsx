import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import type { FoundEntry, GroupHead } from '#shared/contracts/entry-search.ts';
import { energyIn, fixed } from '#client/lib/numbers.ts';
import { Equation } from '#client/ui/equation.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { Tag } from '#client/ui/tag.tsx';
import { classWords } from '../entry-words.ts';
import type { Grouping } from '../search-state.ts';

const noMedianWords: Readonly<Record<Exclude<GroupHead['noMedian'], null>, string | null>> = {
  'no-energies': null,
  'several-steps': 'no median: several elementary steps',
  'both-directions': 'no median: both directions of the step',
  'several-scopes': 'no median: elementary and apparent values',
  'several-energy-types': 'no median: several types of energy',
  'several-states': 'no median: several states',
};

/** The energies of a group in words: its median with the range, or the range and why there is no median. */
export function groupEnergyWords({ energy, noMedian }: Pick<GroupHead, 'energy' | 'noMedian'>, unit: EnergyUnit): string | null {
  if (!energy) return null;
  const decimals = unit === 'kJ/mol' ? 0 : unit === 'kcal/mol' ? 1 : 2;
  const say = (value: number) => fixed(energyIn(unit, value), decimals);
  if (energy.count === 1) return `one energy, ${say(energy.low)} ${unit}`;
  const range = `${say(energy.low)} to ${say(energy.high)}`;
  if (energy.median !== null) return `median ${say(energy.median)} ${unit}, ${range}`;
  const why = noMedian === null ? null : noMedianWords[noMedian];
  return `${range} ${unit}${why ? `; ${why}` : ''}`;
}

/** How many entries a group has, and how they were found: "6 entries, 4 measured and 2 computed". */
export function groupCountWords({ count, measured, computed }: Pick<GroupHead, 'count' | 'measured' | 'computed'>): string {
  const how = measured === 0 ? 'computed' : computed === 0 ? 'measured' : `${measured} measured and ${computed} computed`;
  return `${count} ${count === 1 ? 'entry' : 'entries'}, ${how}`;
}

interface GroupHeadingProps {
  entry: FoundEntry;
  head: GroupHead | undefined;
  grouping: Exclude<Grouping, 'none'>;
  unit: EnergyUnit;
}

/** The head of a group of rows: what they share, how many there are and what their energies come to. */
export function GroupHeading({ entry, head, grouping, unit }: GroupHeadingProps) {
  const energies = head && groupEnergyWords(head, unit);
  return (
    <>
      {label(entry, grouping)}
      {head?.direction === -1 && <>{' '}<Tag>reverse direction</Tag></>}
      {head && (
        <span className="table-group-figures">
          <span>{groupCountWords(head)}</span>
          {energies && <span>{energies}</span>}
        </span>
      )}
    </>
  );
}

function label(entry: FoundEntry, grouping: Exclude<Grouping, 'none'>): ReactNode {
  const note = (words: string) => <span className="table-group-note">{words}</span>;
  switch (grouping) {
    case 'step': return entry.step ? <><Equation equation={entry.step.equation} display />{' '}{note(classWords(entry.step.class))}</> : 'no elementary step';
    case 'surface': return <SurfaceLabel label={entry.surface?.label ?? 'no surface'} />;
    case 'source': return entry.source ? <><Link to={`/sources/${entry.source.id}`}>{entry.source.label}</Link>{' '}{note(entry.source.title)}</> : 'no source';
  }
}
