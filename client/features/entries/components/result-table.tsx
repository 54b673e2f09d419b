import { useMemo } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import type { Kind } from '#shared/domain/kinds.ts';
import type { FoundEntry, GroupHead, SortKey } from '#shared/contracts/entry-search.ts';
import { useInstrument } from '#client/lib/instrument.ts';
import { Equation } from '#client/ui/equation.tsx';
import { DataTable } from '#client/ui/table.tsx';
import { setChosen, useChosen } from '../chosen.ts';
import { sortOf, tableSort, type ColumnName } from '../columns.ts';
import type { Grouping } from '../search-state.ts';
import { entryRows, groupKey, headsByKey, rowView, type EntryRow, type RowView } from '../table-rows.ts';
import { entryColumns } from './entry-columns.tsx';
import { FoundIn } from './found-in.tsx';
import { GroupHeading } from './group-heading.tsx';
import { BarrierCell, MethodCell, PrintedText, RateCell, SourceCell, StateTag, UncertaintyCell, ValueCell } from './row-cells.tsx';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { valueHeading } from './value-heading.tsx';

interface ResultTableProps {
  entries: readonly FoundEntry[];
  /** The heads of the groups that the entries belong to. */
  heads: readonly GroupHead[];
  /** Free words were looked for, and each row says where they stand. */
  searchedWords: boolean;
  dense: boolean;
  kinds: readonly Kind[] | undefined;
  grouping: Grouping;
  sort: SortKey;
  hidden: ReadonlySet<ColumnName>;
  activeId: string | null;
  stale: boolean;
  onActive: (accession: string | null) => void;
  onSort: (sort: SortKey) => void;
}

/** The entries found, as a table (stanzas where the page is narrow). */
export function ResultTable({ entries, heads, searchedWords, dense, kinds, grouping, sort, hidden, activeId, stale, onActive, onSort }: ResultTableProps) {
  const { unit, temperatureK } = useInstrument();
  const navigate = useNavigate();
  const chosen = useChosen();
  const rows = useMemo(() => entryRows(entries, kinds, unit), [entries, kinds, unit]);
  const view = useMemo(() => rowView(rows, unit, temperatureK), [rows, unit, temperatureK]);
  const columns = useMemo(() => entryColumns(view, grouping, valueHeading(rows, kinds), searchedWords), [view, grouping, rows, kinds, searchedWords]);
  const accessions = useMemo(() => new Set(chosen.keys()), [chosen]);
  const headOf = useMemo(() => headsByKey(heads), [heads]);
  const group = useMemo(() => (grouping === 'none' ? undefined : ({ entry }: EntryRow) => {
    const key = groupKey(entry, grouping);
    return { key, label: <GroupHeading entry={entry} head={headOf.get(key)} grouping={grouping} unit={unit} /> };
  }), [grouping, headOf, unit]);
  const kMixed = sort.endsWith('k') && view.kUnit === null && entries.some(({ kAtT }) => kAtT);
  return (
    <>
      {kMixed && <p className="py-1 text-second">Rate constants of different units cannot be compared: they are in order within each unit, one unit after another.</p>}
      <DataTable
        caption="Entries found"
        columns={columns}
        rows={rows}
        rowId={rowId}
        rowLabel={rowLabel}
        hidden={hidden}
        sort={sort === usualSort ? null : tableSort(sort)}
        onSort={(next) => onSort((next && sortOf(next)) ?? usualSort)}
        chosen={accessions}
        onChosen={(next) => setChosen(next, entries)}
        group={group}
        activeId={activeId}
        onActive={onActive}
        onOpen={({ entry }) => void navigate(`/entries/${entry.accession}`)}
        stanza={(row) => <Stanza row={row} view={{ ...view, valueUnit: null, valueDecimals: 0, valuePower: false, kUnit: null }} grouping={grouping} />}
        stale={stale}
        dense={dense}
        stanzaSort={false}
      />
    </>
  );
}

const usualSort: SortKey = 'step';
const rowId = ({ entry }: EntryRow) => entry.accession;
const rowLabel = ({ entry }: EntryRow) => `${entry.surface?.label ?? 'no surface'}, ${entry.source?.label ?? 'no source'}, ${entry.accession}`;

/** A row where the page is narrow: equation and surface, value with its glyph, as printed, source. */
function Stanza({ row, view, grouping }: { row: EntryRow; view: RowView; grouping: Grouping }) {
  const { entry, figure } = row;
  return (
    <>
        <p className="stanza-head">
          <Link to={`/entries/${entry.accession}`}>
            {grouping !== 'step' && entry.step && <><Equation equation={entry.step.equation} />{' on '}</>}
            {entry.surface ? <SurfaceLabel label={entry.surface.label} /> : 'no surface'}
          </Link>
        <StateTag state={entry.state} />
        </p>
        <div className="stanza-line">
          <BarrierCell entry={entry} view={view} />
          <span className="text-lead"><ValueCell figure={figure} view={view} /></span>
          <span className="text-second"><UncertaintyCell figure={figure} /></span>
        </div>
        <p className="printed"><PrintedText figure={figure} /></p>
        {entry.kAtT && <p className="stanza-quiet">k at {view.temperatureK} K: <RateCell entry={entry} view={view} /></p>}
        <p className="stanza-quiet"><MethodCell entry={entry} /></p>
        <p className="stanza-quiet"><SourceCell entry={entry} /></p>
        {entry.matches && entry.matches.length > 0 && <p className="stanza-quiet"><FoundIn matches={entry.matches} /></p>}
    </>
  );
}
