import { useWindowVirtualizer } from '@tanstack/react-virtual';
import { useCallback, useLayoutEffect, useRef, useState, type KeyboardEvent } from 'react';
import { Checkbox } from './choice.tsx';
import type { DataColumn, DataRow, RowGroup } from './table-model.ts';

/** A line of the table: the heading of a group, or a row. */
export type TableLine<T extends object> = { heading: RowGroup; row?: undefined } | { row: DataRow<T>; heading?: undefined };

interface TableRowsProps<T extends object> {
  lines: readonly TableLine<T>[];
  columns: readonly DataColumn<T>[];
  choosable: boolean;
  chosen: ReadonlySet<string>;
  rowLabel: (row: T) => string;
  activeId: string | null;
  onActive: (id: string | null) => void;
  onRowKey: (event: KeyboardEvent, row: DataRow<T>) => void;
  onOpen?: ((row: T) => void) | undefined;
}

/** From here on only the rows in sight are drawn. */
const manyLines = 150;

/** The body of a table: all rows when they are few, those in sight when they are many. */
export function TableRows<T extends object>(props: TableRowsProps<T>) {
  const { lines, activeId } = props;
  const known = activeId !== null && lines.some((line) => line.row?.id === activeId);
  const all = { ...props, tabbableId: known ? activeId : lines.find((line) => line.row)?.row?.id ?? null };
  if (lines.length > manyLines) return <RowsInSight {...all} />;
  return <tbody>{lines.map((line) => <Line key={keyOf(line)} line={line} {...all} />)}</tbody>;
}

/** With the one row that the tabulator stops at: from there the arrows move on. */
interface BodyProps<T extends object> extends TableRowsProps<T> {
  tabbableId: string | null;
}

function keyOf<T extends object>(line: TableLine<T>): string {
  return line.heading ? `group ${line.heading.key}` : line.row.id;
}

function RowsInSight<T extends object>(props: BodyProps<T>) {
  const { lines, columns, choosable } = props;
  const body = useRef<HTMLTableSectionElement>(null);
  const [top, setTop] = useState(0);
  useLayoutEffect(() => {
    if (body.current) setTop(body.current.getBoundingClientRect().top + window.scrollY);
  }, []);
  const virtual = useWindowVirtualizer<HTMLTableRowElement>({
    count: lines.length,
    estimateSize: (index) => (lines[index]?.heading ? 50 : 47),
    overscan: 20,
    scrollMargin: top,
    getItemKey: (index) => keyOf(lines[index] as TableLine<T>),
  });
  const { measureElement } = virtual;
  // A row without height is not laid out (a hidden page): measuring it would have all rows drawn.
  const measure = useCallback((element: HTMLTableRowElement | null) => {
    if (element && element.getBoundingClientRect().height > 0) measureElement(element);
  }, [measureElement]);
  const items = virtual.getVirtualItems();
  const before = (items[0]?.start ?? top) - top;
  const after = virtual.getTotalSize() - ((items.at(-1)?.end ?? top) - top);
  const span = columns.length + (choosable ? 1 : 0);
  return (
    <tbody ref={body}>
      {before > 0 && <tr aria-hidden="true"><td className="table-space" colSpan={span} style={{ height: before }} /></tr>}
      {items.map((item) => {
        const line = lines[item.index];
        return line && <Line key={item.key} line={line} index={item.index} measure={measure} {...props} />;
      })}
      {after > 0 && <tr aria-hidden="true"><td className="table-space" colSpan={span} style={{ height: after }} /></tr>}
    </tbody>
  );
}

interface LineProps<T extends object> extends BodyProps<T> {
  line: TableLine<T>;
  index?: number;
  measure?: (element: HTMLTableRowElement | null) => void;
}

function Line<T extends object>({ line, index, measure, columns, choosable, chosen, rowLabel, activeId, tabbableId, onActive, onRowKey, onOpen }: LineProps<T>) {
  if (line.heading) {
    return (
      <tr className="table-group" ref={measure} data-index={index}>
        <th scope="rowgroup" colSpan={columns.length + (choosable ? 1 : 0)}>{line.heading.label}</th>
      </tr>
    );
  }
  const { row } = line;
  const isChosen = chosen.has(row.id);
  return (
    <tr
      ref={measure}
      data-index={index}
      data-row={row.id}
      className={`table-row ${isChosen ? 'table-row-chosen' : ''} ${row.id === activeId ? 'table-row-active' : ''}`}
      tabIndex={row.id === tabbableId ? 0 : -1}
      onKeyDown={(event) => onRowKey(event, row)}
      onFocus={() => onActive(row.id)}
      onPointerEnter={() => onActive(row.id)}
      onPointerLeave={() => onActive(null)}
      onDoubleClick={onOpen && (() => onOpen(row.original))}
    >
      {choosable && (
        <td className="table-choose">
          <Checkbox label={`Choose ${rowLabel(row.original)}`} hideLabel checked={isChosen} onChange={() => row.toggleSelected()} />
        </td>
      )}
      {columns.map((column) => {
        const look = `${column.numeric ? 'numeric' : ''} ${column.printed ? 'printed' : ''} ${column.className ?? ''}`;
        return column.rowHeader
          ? <th key={column.id} scope="row" className={look}>{column.cell(row.original)}</th>
          : <td key={column.id} className={look}>{column.cell(row.original)}</td>;
      })}
    </tr>
  );
}
