import {
  columnVisibilityFeature, createColumnHelper, rowSelectionFeature, rowSortingFeature, tableFeatures, useTable, type Row,
} from '@tanstack/react-table';
import { useMemo, type ReactNode } from 'react';

/** A column of a table of records. */
export interface DataColumn<T> {
  id: string;
  /** The name in the head, in sentence case. */
  header: ReactNode;
  /** The name as text, where the head is more than text or empty. */
  headerText?: string;
  /** The unit, in the head and not in each cell. */
  unit?: ReactNode;
  cell: (row: T) => ReactNode;
  /** Numbers at the right edge; align them on the decimal point with `Aligned`. */
  numeric?: boolean;
  /** The key by which the server sorts; without it the head is no button. */
  sortKey?: string;
  /** The first press sorts from the largest. */
  firstDescending?: boolean;
  /** As printed: mono and quiet. */
  printed?: boolean;
  /** The cell names its row, for those who listen. */
  rowHeader?: boolean;
  className?: string;
}

/** By which key a list is sorted, and in which sense. */
export interface TableSort {
  key: string;
  descending: boolean;
}

/** What the rows are put together under. */
export interface RowGroup {
  key: string;
  label: ReactNode;
}

const features = tableFeatures({ columnVisibilityFeature, rowSelectionFeature, rowSortingFeature });
export type DataRow<T extends object> = Row<typeof features, T>;

interface ModelInput<T extends object> {
  columns: readonly DataColumn<T>[];
  rows: readonly T[];
  rowId: (row: T) => string;
  hidden: ReadonlySet<string>;
  chosen: ReadonlySet<string>;
  onChosen?: ((chosen: Set<string>) => void) | undefined;
  sort: TableSort | null;
  onSort?: ((sort: TableSort | null) => void) | undefined;
}

/** The state of a table whose rows the server sorts and filters: visible columns, order, chosen rows. */
export function useTableModel<T extends object>({ columns, rows, rowId, hidden, chosen, onChosen, sort, onSort }: ModelInput<T>) {
  const definitions = useMemo(() => {
    const helper = createColumnHelper<typeof features, T>();
    return columns.map((column) => helper.display({
      id: column.id,
      cell: ({ row }) => column.cell(row.original),
      enableSorting: column.sortKey !== undefined,
      sortDescFirst: column.firstDescending ?? false,
    }));
  }, [columns]);
  const data = useMemo(() => [...rows], [rows]);
  const sorted = columns.find((column) => column.sortKey !== undefined && column.sortKey === sort?.key);
  const sorting = useMemo(() => (sorted && sort ? [{ id: sorted.id, desc: sort.descending }] : []), [sorted, sort]);
  const rowSelection = useMemo(() => Object.fromEntries([...chosen].map((id) => [id, true as const])), [chosen]);
  const columnVisibility = useMemo(() => Object.fromEntries([...hidden].map((id) => [id, false])), [hidden]);
  return useTable({
    features,
    columns: definitions,
    data,
    getRowId: rowId,
    manualSorting: true,
    state: { sorting, rowSelection, columnVisibility },
    onSortingChange: (updater) => {
      const [next] = typeof updater === 'function' ? updater(sorting) : updater;
      const key = next && columns.find((column) => column.id === next.id)?.sortKey;
      onSort?.(next && key ? { key, descending: next.desc } : null);
    },
    onRowSelectionChange: (updater) => {
      const next = typeof updater === 'function' ? updater(rowSelection) : updater;
      onChosen?.(new Set(Object.keys(next)));
    },
  });
}
