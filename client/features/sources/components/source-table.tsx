import { useNavigate, Link } from 'react-router-dom';
import type { ResponseOf } from '#shared/contracts/endpoint.ts';
import type { listSources } from '#shared/contracts/sources.ts';
import { DataTable, type DataColumn } from '#client/ui/table.tsx';
import { readSourceSort } from '../list-state.ts';
import type { SourceSort } from '../api.ts';
import { SourceStatus } from './source-status.tsx';

type SourceRow = ResponseOf<typeof listSources>['items'][number];

const columns: readonly DataColumn<SourceRow>[] = [
  { id: 'label', header: 'Source', sortKey: 'label', rowHeader: true, className: 'min-w-[12rem]', cell: (row) => <Link to={`/sources/${row.id}`}>{row.label}</Link> },
  { id: 'title', header: 'Title', cell: (row) => <>{row.title} <SourceStatus status={row.status} /></> },
  { id: 'container', header: 'Published in', cell: (row) => <i>{row.container}</i> },
  { id: 'year', header: 'Year', numeric: true, sortKey: 'year', firstDescending: true, cell: (row) => row.year ?? 'no year' },
  { id: 'entries', header: 'Accepted entries', numeric: true, sortKey: 'entries', firstDescending: true, cell: (row) => row.acceptedEntries },
];

interface SourceTableProps {
  sources: readonly SourceRow[];
  sort: SourceSort;
  stale: boolean;
  onSort: (sort: SourceSort) => void;
}

/** The bibliography as a table. */
export function SourceTable({ sources, sort, stale, onSort }: SourceTableProps) {
  const navigate = useNavigate();
  const descending = sort.startsWith('-');
  return (
    <DataTable
      caption="Sources"
      columns={columns}
      rows={sources}
      rowId={({ id }) => id}
      rowLabel={({ label }) => label}
      sort={{ key: sort.replace('-', ''), descending }}
      onSort={(next) => onSort(next ? readSourceSort(`${next.descending && next.key !== 'label' ? '-' : ''}${next.key}`) : 'label')}
      onOpen={({ id }) => void navigate(`/sources/${id}`)}
      stanza={(row) => (
        <>
          <p className="stanza-head"><Link to={`/sources/${row.id}`}>{row.label}</Link> <SourceStatus status={row.status} /></p>
          <p>{row.title}</p>
          <p className="stanza-quiet">{`${row.container ? `${row.container}; ` : ''}${row.acceptedEntries} accepted ${row.acceptedEntries === 1 ? 'entry' : 'entries'}`}</p>
        </>
      )}
      stale={stale}
    />
  );
}
