import { useId, useLayoutEffect, useMemo, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { useNarrow } from '#client/lib/use-media-query.ts';
import { Checkbox } from './choice.tsx';
import { useRowChoice } from './table-choice.ts';
import { TableHead } from './table-head.tsx';
import { useTableModel, type DataColumn, type DataRow, type RowGroup, type TableSort } from './table-model.ts';
import { TableRows, type TableLine } from './table-rows.tsx';
import { StanzaList } from './table-stanzas.tsx';

export type { DataColumn, RowGroup, TableSort } from './table-model.ts';

export interface DataTableProps<T extends object> {
  /** What the table holds; heard, and seen only with `showCaption`. */
  caption: string;
  showCaption?: boolean;
  columns: readonly DataColumn<T>[];
  rows: readonly T[];
  rowId: (row: T) => string;
  /** A row in words, for its check box: "Ru(0001), Vantongeren 1994". */
  rowLabel: (row: T) => string;
  hidden?: ReadonlySet<string>;
  sort?: TableSort | null;
  onSort?: (sort: TableSort | null) => void;
  chosen?: ReadonlySet<string>;
  /** Rows can be chosen. */
  onChosen?: (chosen: Set<string>) => void;
  /** Rows with the same key, which follow one another, stand under one heading. */
  group?: (row: T) => RowGroup;
  activeId?: string | null;
  onActive?: (id: string | null) => void;
  onOpen?: (row: T) => void;
  /** A row where the page is narrow; without it the columns become pairs of a name and a value. */
  stanza?: (row: T) => ReactNode;
  /** What stands under the table instead of rows. */
  empty?: ReactNode;
  /** New rows are on their way; the old ones stay, quieter. */
  stale?: boolean;
  /** Rows close together. */
  dense?: boolean;
  /** Whether the list of orders stands over the stanzas of a narrow page; not where the page offers one itself. */
  stanzaSort?: boolean;
}

const none: ReadonlySet<string> = new Set();

/**
 * A table of records: a head that stays in sight, sorting by the server, chosen rows (with Shift a run of them), groups, movement by the
 * keyboard (arrows or j and k, Enter opens, space chooses), stanzas where the page is narrow, only the rows in sight drawn when there are many.
 */
export function DataTable<T extends object>(props: DataTableProps<T>) {
  const { caption, showCaption = false, columns, rows, rowId, rowLabel, hidden = none, sort = null, onSort, chosen = none, onChosen, group, onOpen, empty, stale = false, dense = false } = props;
  const narrow = useNarrow();
  const model = useTableModel({ columns, rows, rowId, hidden, chosen, onChosen, sort, onSort });
  const [ownActive, setOwnActive] = useState<string | null>(null);
  const activeId = props.activeId !== undefined ? props.activeId : ownActive;
  const setActive = (id: string | null) => {
    setOwnActive(id);
    props.onActive?.(id);
  };
  const table = useRef<HTMLTableElement>(null);
  const [frame, wider] = useWiderThanFrame();
  const hintId = useId();
  const visible = columns.filter((column) => !hidden.has(column.id));
  const modelRows = model.getRowModel().rows;
  const lines = useMemo(() => linesOf(modelRows, group), [modelRows, group]);
  const ids = modelRows.map((row) => row.id);
  const choice = useRowChoice(ids, chosen, onChosen);

  if (narrow) {
    return <StanzaList {...props} columns={visible} lines={lines} chosen={chosen} onToggle={(row) => choice.press(row.id, false)} />;
  }

  /** Moves the focus from row to row; the rows next to those in sight are drawn already. */
  function focusRow(index: number) {
    const id = ids[Math.max(0, Math.min(ids.length - 1, index))];
    if (id === undefined) return;
    setActive(id);
    const element = [...(table.current?.querySelectorAll<HTMLElement>('tr[data-row]') ?? [])].find((row) => row.dataset.row === id);
    element?.focus();
    element?.scrollIntoView({ block: 'nearest' });
  }

  function onRowKey(event: KeyboardEvent, row: DataRow<T>) {
    if (event.target !== event.currentTarget) return;
    const index = ids.indexOf(row.id);
    const moves: Record<string, number> = {
      ArrowDown: index + 1, j: index + 1, ArrowUp: index - 1, k: index - 1, Home: 0, End: modelRows.length - 1, PageDown: index + 10, PageUp: index - 10,
    };
    const to = moves[event.key];
    if (to !== undefined) {
      event.preventDefault();
      const next = ids[to];
      if (event.shiftKey && event.key.startsWith('Arrow') && onChosen && next !== undefined) choice.extendTo(row.id, next);
      focusRow(to);
    } else if (event.key === 'Enter' && onOpen) onOpen(row.original);
    else if ((event.key === ' ' || event.key === 'x') && onChosen) {
      event.preventDefault();
      choice.press(row.id, event.shiftKey);
    }
  }

  const all = model.getIsAllRowsSelected();
  return (
    <div className={`table-frame ${wider ? 'table-frame-wider' : ''}`} ref={frame}>
      <p className="sr-only" id={hintId}>
        {`Arrow keys move from row to row${onOpen ? ', Enter opens one' : ''}${onChosen ? ', space chooses one, Shift with an arrow or a press chooses several' : ''}.`}
      </p>
      <table className={`data-table ${dense ? 'data-table-dense' : ''} ${stale ? 'data-table-stale' : ''}`} ref={table} aria-busy={stale || undefined} aria-describedby={onOpen || onChosen ? hintId : undefined}>
        <caption className={showCaption ? 'table-caption' : 'sr-only'}>{caption}</caption>
        <thead>
          <tr>
            {onChosen && (
              <th scope="col" className="table-choose">
                <Checkbox label="Choose all rows shown" hideLabel checked={all} indeterminate={!all && model.getIsSomeRowsSelected()} onChange={() => model.toggleAllRowsSelected()} />
              </th>
            )}
            {visible.map((column) => (
              <TableHead
                key={column.id}
                column={column}
                sort={sort}
                onSort={onSort && (() => model.getColumn(column.id)?.toggleSorting())}
              />
            ))}
          </tr>
        </thead>
        <TableRows
          lines={lines}
          columns={visible}
          choosable={onChosen !== undefined}
          chosen={chosen}
          rowLabel={rowLabel}
          activeId={activeId}
          onActive={setActive}
          onRowKey={onRowKey}
          onPress={choice.press}
          onOpen={onOpen}
        />
      </table>
      {rows.length === 0 && empty}
    </div>
  );
}

/** Whether the table is wider than its frame: only then does the frame scroll, since in a frame that scrolls the head cannot stay in sight. */
function useWiderThanFrame() {
  const frame = useRef<HTMLDivElement>(null);
  const [wider, setWider] = useState(false);
  useLayoutEffect(() => {
    const element = frame.current;
    const table = element?.querySelector('table');
    if (!element || !table || typeof ResizeObserver === 'undefined') return;
    const measure = () => setWider(table.offsetWidth > element.clientWidth + 1);
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    observer.observe(table);
    return () => observer.disconnect();
  }, []);
  return [frame, wider] as const;
}

/** The rows with the headings of their groups between them. */
function linesOf<T extends object>(rows: readonly DataRow<T>[], group: ((row: T) => RowGroup) | undefined): TableLine<T>[] {
  const lines: TableLine<T>[] = [];
  let last: string | null = null;
  for (const row of rows) {
    const heading = group?.(row.original);
    if (heading && heading.key !== last) lines.push({ heading });
    last = heading?.key ?? null;
    lines.push({ row });
  }
  return lines;
}
