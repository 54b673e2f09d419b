import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import type { EntryFilter, SearchSummary } from '#shared/contracts/entry-search.ts';
import type { EnergyUnit } from '#shared/contracts/accounts.ts';
import { energyIn, energyToKJPerMol } from '#client/lib/numbers.ts';
import { Strip } from '#client/ui/strip.tsx';
import { isEnergyKind } from '../filter-words.ts';

interface ResultStripProps {
  summary: SearchSummary;
  filter: EntryFilter;
  unit: EnergyUnit;
  activeId: string | null;
  chosen: ReadonlySet<string>;
  onActive: (accession: string | null) => void;
  onFilter: (change: Partial<EntryFilter>) => void;
}

/** All energies found on one axis, linked to the rows; a range of it becomes a filter when one kind alone is asked for. */
export function ResultStrip({ summary, filter, unit, activeId, chosen, onActive, onFilter }: ResultStripProps) {
  const navigate = useNavigate();
  const points = useMemo(() => (summary.points ?? []).map(({ accession, value, ...rest }) => ({ id: accession, value: energyIn(unit, value), ...rest })), [summary.points, unit]);
  const histogram = useMemo(() => summary.histogram && { ...summary.histogram, edges: summary.histogram.edges.map((edge) => energyIn(unit, edge)) }, [summary.histogram, unit]);
  if (points.length === 0 && !histogram) return null;

  const [kind] = filter.kind ?? [];
  const limits = filter.kind?.length === 1 && kind !== undefined && isEnergyKind(kind);
  const inUnit = (value: number | undefined) => (value === undefined ? null : Number(energyIn(unit, value).toPrecision(6)));
  const canonical = (value: number | null) => (value === null ? undefined : Number(energyToKJPerMol(unit, value).toPrecision(12)));
  return (
    <Strip
      points={points}
      histogram={histogram}
      unit={unit}
      what="Energies"
      activeId={activeId}
      onActive={onActive}
      onOpen={(accession) => void navigate(`/entries/${accession}`)}
      chosen={chosen}
      {...(limits ? {
        range: { min: inUnit(filter.valueMin), max: inUnit(filter.valueMax) },
        onRange: ({ min, max }: { min: number | null; max: number | null }) => onFilter({ valueMin: canonical(min), valueMax: canonical(max) }),
      } : {})}
    />
  );
}
