import type { ReactNode } from 'react';
import type { SearchSummary } from '#shared/contracts/entry-search.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, fixed } from '#client/lib/numbers.ts';

interface SummaryLineProps {
  total: number;
  totalIsExact: boolean;
  summary: SearchSummary | undefined;
  unit: EnergyUnit;
  /** Grouping, columns, export. */
  children: ReactNode;
}

/** What was found, in figures: entries, sources, the median where the values are alike, measured and computed. */
export function SummaryLine({ total, totalIsExact, summary, unit, children }: SummaryLineProps) {
  return (
    <div className="section-line flex flex-wrap items-baseline gap-x-7 gap-y-2">
      <h2>{`${totalIsExact ? '' : 'about '}${total} ${total === 1 ? 'entry' : 'entries'}`}</h2>
      {summary && (
        <>
          <p className="text-second">{`${summary.sources} ${summary.sources === 1 ? 'source' : 'sources'}`}</p>
          <p className="text-second">{energyWords(summary, unit)}</p>
          <p className="flex items-baseline gap-3 text-second">
            <span>{summary.measured} measured <Dot filled /></span>
            <span>{summary.computed} computed <Dot filled={false} /></span>
          </p>
        </>
      )}
      <div className="ml-auto flex flex-wrap items-baseline gap-x-6 gap-y-1">{children}</div>
    </div>
  );
}

/** The median and range, or why there is no median. */
export function energyWords({ energy, alike }: SearchSummary, unit: EnergyUnit): string {
  if (!energy) return 'no energies among them';
  const decimals = unit === 'kJ/mol' ? 0 : unit === 'kcal/mol' ? 1 : 2;
  const say = (value: number) => fixed(energyIn(unit, value), decimals);
  const range = energy.low === energy.high ? `${say(energy.low)} ${unit}` : `${say(energy.low)} to ${say(energy.high)} ${unit}`;
  if (energy.count === 1) return `one energy, ${range}`;
  if (!alike) return `energies ${range}; no median, since elementary steps, types of energy or scopes are mixed`;
  return `median ${say(energy.median)} ${unit}, ${say(energy.low)} to ${say(energy.high)}`;
}

/** The mark of the strip: filled for a measured value, open for a computed one. */
function Dot({ filled }: { filled: boolean }) {
  return (
    <svg width="11" height="11" viewBox="0 0 11 11" className="inline-block align-[-1px]" aria-hidden="true">
      <circle cx="5.500" cy="5.500" r="4.400" fill={filled ? 'currentColor' : 'none'} stroke="currentColor" strokeWidth="1.500" />
    </svg>
  );
}
