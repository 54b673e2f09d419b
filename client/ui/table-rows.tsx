import { lazy, Suspense, type ChangeEvent, type KeyboardEvent, type ReactElement } from 'react';
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
  /** A row's box is pressed; with Shift, all from the last one pressed. */
  onPress: (id: string, extend: boolean) => void;
  onOpen?: ((row: T) => void) | undefined;
}

/** From here on only the rows in sight are drawn. */
const manyLines = 150;

/** Loaded only for a table that has so many. `lazy` forgets the type of the rows; it is said again here. */
const RowsInSight = lazy(async () => ({ default: (await import('./table-rows-in-sight.tsx')).RowsInSight })) as unknown as
  <T extends object>(props: BodyProps<T>) => ReactElement;

/** The body of a table: all rows when they are few, those in sight when they are many. */
export function TableRows<T extends object>(props: TableRowsProps<T>) {
  const { lines, activeId } = props;
  const known = activeId !== null && lines.some((line) => line.row?.id === activeId);
  const all = { ...props, tabbableId: known ? activeId : lines.find((line) => line.row)?.row?.id ?? null };
  if (lines.length <= manyLines) return <AllRows {...all} />;
  return <Suspense fallback={<AllRows {...all} lines={lines.slice(0, manyLines)} />}><RowsInSight {...all} /></Suspense>;
}

/** With the one row that the tabulator stops at: from there the arrows move on. */
export interface BodyProps<T extends object> extends TableRowsProps<T> {
  tabbableId: string | null;
}

function AllRows<T extends object>(props: BodyProps<T>) {
  return <tbody>{props.lines.map((line) => <Line key={keyOf(line)} line={line} {...props} />)}</tbody>;
}

/** The key of a line among the others. */
export function keyOf<T extends object>(line: TableLine<T>): string {
  return line.heading ? `group ${line.heading.key}` : line.row.id;
}

/** Whether Shift was held: a box changes by a press of the mouse or of the space bar, and the browser makes a click of either. */
function heldShift({ nativeEvent }: ChangeEvent): boolean {
  return nativeEvent instanceof MouseEvent && nativeEvent.shiftKey;
}

interface LineProps<T extends object> extends BodyProps<T> {
  line: TableLine<T>;
  index?: number;
  measure?: (element: HTMLTableRowElement | null) => void;
}

/** One line: the heading of a group, or a row. */
export function Line<T extends object>({ line, index, measure, columns, choosable, chosen, rowLabel, activeId, tabbableId, onActive, onRowKey, onPress, onOpen }: LineProps<T>) {
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
          <Checkbox label={`Choose ${rowLabel(row.original)}`} hideLabel checked={isChosen} onChange={(event) => onPress(row.id, heldShift(event))} />
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
