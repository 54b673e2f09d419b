import type { ReactNode } from 'react';
import { UnitText } from './unit-text.tsx';

export interface PlotTableColumn {
  label: ReactNode;
  unit?: string;
  /** Aligned at the right; the first column is the name of the row and never is. */
  numeric?: boolean;
}

interface PlotTableProps {
  columns: readonly PlotTableColumn[];
  rows: readonly { id: string; cells: readonly ReactNode[] }[];
  summary?: string;
  open?: boolean;
}

/** The figures behind a plot, as a table to be opened under it. */
export function PlotTable({ columns, rows, summary = 'The plot as a table', open = false }: PlotTableProps) {
  return (
    <details className="plot-table" open={open}>
      <summary>{summary}</summary>
      <div className="table-frame" role="group" aria-label={summary} tabIndex={0}>
        <table className="data-table mt-2">
          <thead>
            <tr>
              {columns.map((column, index) => (
                <th key={index} scope="col" className={column.numeric ? 'numeric' : undefined}>
                  {column.label}{column.unit && <span className="table-unit"><UnitText unit={column.unit} /></span>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.id}>
                {row.cells.map((cell, index) => (index === 0
                  ? <th key={index} scope="row">{cell}</th>
                  : <td key={index} className={columns[index]?.numeric ? 'numeric' : undefined}>{cell}</td>))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}
