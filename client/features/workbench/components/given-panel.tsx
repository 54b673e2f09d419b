import { UnitText } from '#client/ui/unit-text.tsx';
import { inputLines } from '../report.ts';
import type { Sheet } from '../sheet.ts';
import type { Typed } from '../typed.ts';
import { FieldLabel } from './field-label.tsx';

/** What was given, on paper in the place of the form. */
export function GivenPanel({ sheet, typed }: { sheet: Sheet; typed: Typed }) {
  return (
    <section className="given" aria-label="Given">
      <h2>Given</h2>
      {inputLines(sheet, typed).map((line, index) => ('table' in line ? (
        <table key={index} className="given-table">
          <caption>{line.label}</caption>
          <thead><tr>{line.table.columns.map((column, at) => <th key={column.id} scope="col">{column.label}{line.units[at] && <>{' / '}<UnitText unit={line.units[at]} /></>}</th>)}</tr></thead>
          <tbody>{line.rows.map((cells, row) => <tr key={row}>{cells.map((cell, at) => <td key={at}>{cell}</td>)}</tr>)}</tbody>
        </table>
      ) : (
        <p key={index}><span className="text-second"><FieldLabel label={line.label} symbol={line.symbol} />: </span><samp>{line.text}</samp>{line.unit && <>{' '}<UnitText unit={line.unit} /></>}</p>
      )))}
    </section>
  );
}
