import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { energyTypeWords, provenanceWords } from '#shared/domain/kinds.ts';
import type { Entry } from '#shared/contracts/entries.ts';
import type { SortKey } from '#shared/contracts/entry-search.ts';
import { formatDate } from '#client/lib/dates.ts';
import { Equation } from '#client/ui/equation.tsx';
import type { DataColumn } from '#client/ui/table.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { columnSort, columnWords, type ColumnName } from '../columns.ts';
import type { Grouping } from '../search-state.ts';
import { barrierOf } from '../row-figures.ts';
import type { EntryRow, RowView } from '../table-rows.ts';
import { SurfaceLabel } from '#client/ui/surface-label.tsx';
import { FoundIn } from './found-in.tsx';
import { BarrierCell, FactorCell, MethodCell, PrintedText, RangeCell, RateCell, SourceCell, StateTag, UncertaintyCell, ValueCell } from './row-cells.tsx';

interface Heading {
  node: ReactNode;
  text: string;
  /** The sort of what the column holds; nothing where the server has none. */
  sort: SortKey | null;
}

/** The columns of the table of entries; the one that names the row is whatever the groups do not say already. */
export function entryColumns(view: RowView, grouping: Grouping, value: Heading, searchedWords: boolean): DataColumn<EntryRow>[] {
  const naming: ColumnName = grouping === 'surface' ? 'step' : 'surface';
  const column = (id: ColumnName, rest: Partial<DataColumn<EntryRow>> & Pick<DataColumn<EntryRow>, 'cell'>): DataColumn<EntryRow> =>
    ({ id, header: columnWords[id], ...(columnSort[id] ? { sortKey: columnSort[id] } : {}), ...rest });
  const unit = (text: string | null) => (text && text !== '1' ? { unit: <UnitText unit={text} /> } : {});
  const named = (id: ColumnName, words: (entry: Entry) => ReactNode): Pick<DataColumn<EntryRow>, 'cell' | 'rowHeader'> => (id === naming
    ? { rowHeader: true, cell: ({ entry }) => <><Link to={`/entries/${entry.accession}`}>{words(entry)}</Link><StateTag state={entry.state} /></> }
    : { cell: ({ entry }) => words(entry) });
  const columns = [
    column('step', { className: 'min-w-[10rem]', ...named('step', (entry) => (entry.step ? <Equation equation={entry.step.equation} /> : 'not given yet')) }),
    column('surface', named('surface', (entry) => (entry.surface ? <SurfaceLabel label={entry.surface.label} /> : 'not given yet'))),
    column('barrier', { header: '', headerText: columnWords.barrier, cell: ({ entry }) => <BarrierCell entry={entry} view={view} /> }),
    column('value', { header: value.node, headerText: value.text, numeric: true, ...(value.sort ? { sortKey: value.sort } : {}), ...unit(view.valueUnit), cell: ({ figure }) => <ValueCell figure={figure} view={view} /> }),
    column('uncertainty', { header: <>standard<br />uncertainty</>, headerText: columnWords.uncertainty, className: 'text-second whitespace-nowrap', cell: ({ figure }) => <UncertaintyCell figure={figure} /> }),
    column('printed', { header: 'as printed', printed: true, className: 'whitespace-nowrap', cell: ({ figure }) => <PrintedText figure={figure} /> }),
    column('factor', { header: 'A', headerText: columnWords.factor, numeric: true, ...unit(view.factorUnit), cell: ({ entry }) => <FactorCell entry={entry} view={view} /> }),
    column('rate', { header: `k at ${view.temperatureK} K`, headerText: `k at ${view.temperatureK} K`, numeric: true, ...unit(view.kUnit), cell: ({ entry }) => <RateCell entry={entry} view={view} /> }),
    column('energyType', { cell: ({ entry }) => energyTypeOf(entry) }),
    column('scope', { cell: ({ entry }) => entry.scope ?? '' }),
    column('provenance', { cell: ({ entry }) => (entry.provenance ? provenanceWords[entry.provenance] : '') }),
    column('method', { cell: ({ entry }) => <MethodCell entry={entry} /> }),
    column('range', { header: 'valid range', unit: 'K', className: 'whitespace-nowrap', cell: ({ entry }) => <RangeCell entry={entry} /> }),
    column('found', { header: 'found in', cell: ({ entry }) => <FoundIn matches={entry.matches ?? []} /> }),
    column('source', { cell: ({ entry }) => <SourceCell entry={entry} /> }),
    column('year', { header: 'Year', headerText: columnWords.year, numeric: true, cell: ({ entry }) => entry.source?.year ?? '' }),
    column('conditions', { header: 'Coverage, promoter', cell: ({ entry: { conditions } }) => [conditions.coverage, conditions.promoter].filter(Boolean).join('; ') }),
    column('accession', { className: 'whitespace-nowrap', cell: ({ entry }) => entry.accession }),
    column('accepted', { className: 'whitespace-nowrap', cell: ({ entry }) => (entry.acceptedAt ? formatDate(entry.acceptedAt) : '') }),
  ];
  // What the group says already needs no column of its own; the step stands first unless the surface names the row.
  return columns.filter(({ id }) => (id !== 'found' || searchedWords) && !(grouping === 'step' && id === 'step') && !(grouping === 'surface' && id === 'surface') && !(grouping === 'source' && id === 'source'));
}

function energyTypeOf(entry: Entry): string {
  const type = barrierOf(entry)?.energyType;
  return type ? energyTypeWords[type] : '';
}
