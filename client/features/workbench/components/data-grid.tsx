import { useId, useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import { isTable, readPastedTable } from '#client/lib/pasted-table.ts';
import { Button, TextButton } from '#client/ui/button.tsx';
import { FieldError } from '#client/ui/field.tsx';
import { UnitText } from '#client/ui/unit-text.tsx';
import { cellOf, fillFrom, padRows, reportOf, sameRows, trimRows } from './grid-rows.ts';

export interface GridColumn {
  id: string;
  label: string;
  unit?: string;
  optional?: boolean;
  /** What belongs into the column, under its name. */
  hint?: string;
}

/** What is wrong with a cell, by its place. */
export interface GridFault {
  row: number;
  column: number;
  message: string;
}

interface DataGridProps {
  /** What the table holds: "Rate constants against temperature". */
  label: string;
  columns: readonly GridColumn[];
  rows: readonly (readonly string[])[];
  /** Gets every row shown, the empty ones too: they are for the page to pass over. */
  onChange: (rows: string[][]) => void;
  faults?: readonly GridFault[];
  minRows?: number;
  mostRows?: number;
}

/** A table of fields for figures: typed, moved through by Enter and the arrows, or pasted whole from a spreadsheet. */
export function DataGrid({ label, columns, rows, onChange, faults = [], minRows = 3, mostRows = 500 }: DataGridProps) {
  const id = useId();
  const body = useRef<HTMLTableSectionElement>(null);
  const [report, setReport] = useState('');
  const [pasted, setPasted] = useState<{ before: string[][]; after: string[][] } | null>(null);
  const shown = padRows(rows, columns.length, minRows);
  const canUndo = pasted !== null && sameRows(trimRows(shown), pasted.after);

  function change(next: string[][], words = '') {
    setReport(words);
    onChange(next);
  }

  function setCell(row: number, column: number, text: string) {
    change(shown.map((cells, index) => (index === row ? cells.map((cell, at) => (at === column ? text : cell)) : cells)));
  }

  function focusCell(row: number, column: number) {
    const cell = body.current?.querySelector<HTMLInputElement>(`[data-cell="${row}-${column}"]`);
    cell?.focus();
    cell?.select();
  }

  function addRow(column = 0) {
    if (shown.length >= mostRows) {
      setReport(`A table holds at most ${mostRows} rows.`);
      return;
    }
    onChange([...shown, columns.map(() => '')]);
    requestAnimationFrame(() => focusCell(shown.length, column));
  }

  function removeRow(row: number) {
    onChange(shown.filter((_, index) => index !== row));
    setReport(`Row ${row + 1} removed.`);
    requestAnimationFrame(() => focusCell(Math.max(0, Math.min(row, shown.length - 2)), 0));
  }

  function onPaste(event: ClipboardEvent<HTMLInputElement>, row: number, column: number) {
    const text = event.clipboardData.getData('text/plain');
    if (!isTable(text)) return;
    event.preventDefault();
    const table = readPastedTable(text);
    const filled = fillFrom(shown, table.rows, { row, column, columns: columns.length, mostRows });
    setPasted({ before: shown, after: trimRows(filled.rows) });
    change(filled.rows, reportOf(table, filled, mostRows));
  }

  function undo() {
    if (!pasted) return;
    change(pasted.before, 'The paste is undone.');
    setPasted(null);
  }

  function onKeyDown(event: KeyboardEvent<HTMLInputElement>, row: number, column: number) {
    const { key, currentTarget: cell } = event;
    if ((event.ctrlKey || event.metaKey) && key.toLowerCase() === 'z' && !event.shiftKey && canUndo) {
      event.preventDefault();
      undo();
      return;
    }
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const collapsed = cell.selectionStart === cell.selectionEnd;
    const whole = !collapsed && cell.selectionStart === 0 && cell.selectionEnd === cell.value.length;
    const atStart = whole || (collapsed && cell.selectionStart === 0);
    const atEnd = whole || (collapsed && cell.selectionEnd === cell.value.length);
    const to = key === 'ArrowUp' || (key === 'Enter' && event.shiftKey) ? [row - 1, column]
      : key === 'ArrowDown' || key === 'Enter' ? [row + 1, column]
        : key === 'ArrowLeft' && atStart && !event.shiftKey ? [row, column - 1]
          : key === 'ArrowRight' && atEnd && !event.shiftKey ? [row, column + 1]
            : null;
    if (!to) return;
    event.preventDefault();
    if (key === 'Enter' && !event.shiftKey && row + 1 === shown.length) addRow(column);
    else focusCell(to[0] as number, to[1] as number);
  }

  return (
    <div>
      <div className="table-frame">
        <table className="data-grid">
          <caption className="sr-only">{`${label}. A table copied from a spreadsheet can be pasted into any cell.`}</caption>
          <thead>
            <tr>
              <td />
              {columns.map((column) => (
                <th key={column.id} scope="col">
                  {column.label}
                  {column.unit && <span className="table-unit"><UnitText unit={column.unit} /></span>}
                  {column.optional && <span className="data-grid-hint block">optional</span>}
                  {column.hint && <span className="data-grid-hint block" id={`${id}-${column.id}`}>{column.hint}</span>}
                </th>
              ))}
              <td className="data-grid-remove" />
            </tr>
          </thead>
          <tbody ref={body}>
            {shown.map((cells, row) => {
              const wrong = faults.filter((fault) => fault.row === row);
              return [
                <tr key={row}>
                  <th scope="row" className="data-grid-number"><span className="sr-only">Row </span>{row + 1}</th>
                  {columns.map((column, at) => {
                    const fault = wrong.some((one) => one.column === at);
                    return (
                      <td key={column.id} className="data-grid-field">
                        <input
                          className="data-grid-cell" type="text" inputMode="text" spellCheck={false} autoComplete="off" autoCapitalize="off"
                          data-cell={`${row}-${at}`} aria-label={`${column.label}${column.unit ? `, ${column.unit}` : ''}, row ${row + 1}`}
                          aria-invalid={fault || undefined}
                          aria-describedby={[fault ? `${id}-fault-${row}-${at}` : '', column.hint ? `${id}-${column.id}` : ''].filter(Boolean).join(' ') || undefined}
                          value={cellOf(cells, at)}
                          onChange={(event) => setCell(row, at, event.target.value)}
                          onPaste={(event) => onPaste(event, row, at)}
                          onKeyDown={(event) => onKeyDown(event, row, at)}
                        />
                      </td>
                    );
                  })}
                  <td className="data-grid-remove">
                    {(row >= minRows || cells.some((cell) => cell !== '')) && (
                      <Button look="quiet" small aria-label={`Remove row ${row + 1}`} onClick={() => removeRow(row)}>Remove</Button>
                    )}
                  </td>
                </tr>,
                wrong.length > 0 && (
                  <tr key={`${row} faults`} className="data-grid-fault">
                    <td />
                    <td colSpan={columns.length + 1}>
                      {wrong.map((one) => (
                        <FieldError key={`${one.column} ${one.message}`} id={`${id}-fault-${row}-${one.column}`} error={`${columns[one.column]?.label ?? 'Row'}: ${one.message}`} />
                      ))}
                    </td>
                  </tr>
                ),
              ];
            })}
          </tbody>
        </table>
      </div>
      <div className="data-grid-foot">
        <Button small disabled={shown.length >= mostRows} onClick={() => addRow()}>Add a row</Button>
        <p className="data-grid-report" role="status">{report || 'Type, or paste a table into any cell.'}</p>
        {canUndo && <TextButton className="text-fine" onClick={undo}>Undo the paste</TextButton>}
      </div>
    </div>
  );
}
