import type { DataColumn, TableSort } from './table-model.ts';

interface TableHeadProps<T> {
  column: DataColumn<T>;
  sort: TableSort | null;
  onSort?: (() => void) | undefined;
}

/** The head of a column: its name, its unit, and a button where it can be sorted. */
export function TableHead<T>({ column, sort, onSort }: TableHeadProps<T>) {
  const sortable = column.sortKey !== undefined && onSort !== undefined;
  const sorted = sortable && sort?.key === column.sortKey ? (sort?.descending ? 'descending' : 'ascending') : undefined;
  const name = (
    <>
      {column.headerText
        ? <><span className="sr-only">{column.headerText}</span><span className="block" aria-hidden="true">{column.header}</span></>
        : <span className="block">{column.header}</span>}
      {' '}
      {column.unit && <span className="table-unit">{column.unit}</span>}
    </>
  );
  return (
    <th scope="col" className={`${column.numeric ? 'numeric' : ''} ${column.className ?? ''}`} aria-sort={sorted}>
      {sortable ? (
        <button type="button" className="sort-button" onClick={onSort}>
          <span>{name}</span>
          <SortSign sorted={sorted} />
        </button>
      ) : name}
    </th>
  );
}

/** A small step up or down; quiet until the column is the one sorted by. */
function SortSign({ sorted }: { sorted: 'ascending' | 'descending' | undefined }) {
  return (
    <svg className={`sort-sign ${sorted ? 'sort-sign-set' : ''}`} width="9" height="12" viewBox="0 0 9 12" aria-hidden="true">
      {sorted !== 'descending' && <path d="M1 5L4.500 1.500L8 5" fill="none" stroke="currentColor" strokeWidth="1.600" />}
      {sorted !== 'ascending' && <path d="M1 7L4.500 10.500L8 7" fill="none" stroke="currentColor" strokeWidth="1.600" />}
    </svg>
  );
}
