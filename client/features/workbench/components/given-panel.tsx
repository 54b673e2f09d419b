import { UnitText } from '#client/ui/unit-text.tsx';
import { columnUnit, inputLines } from '../report.ts';
import type { Sheet } from '../sheet.ts';
import type { Typed } from '../typed.ts';
import { FieldLabel } from './field-label.tsx';

/** What was given, on paper in the place of the form. */
export function GivenPanel({ sheet, typed }: { sheet: Sheet; typed: Typed }) {
  return (
    <section className="given" aria-label="Given">
      <h2>Given</h2>
      {inputLines(sheet, typed).map((line) => ('table' in line ? (
        <table key={line.label} className="given-table">
          <caption>{line.label}</caption>
          <thead><tr>{line.table.columns.map((column) => <th key={column.id} scope="col">{column.label}{columnUnit(column, line.energyUnit) && <>{' / '}<UnitText unit={columnUnit(column, line.energyUnit)} /></>}</th>)}</tr></thead>
          <tbody>{line.rows.map((cells, row) => <tr key={row}>{cells.map((cell, at) => <td key={at}>{cell}</td>)}</tr>)}</tbody>
        </table>
      ) : (
        <p key={line.label}><span className="text-second"><FieldLabel label={line.label} symbol={line.symbol} />: </span><samp>{line.text}</samp>{line.unit && <>{' '}<UnitText unit={line.unit} /></>}</p>
      )))}
    </section>
  );
}
