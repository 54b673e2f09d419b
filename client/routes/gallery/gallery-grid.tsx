import { useState } from 'react';
import { DataGrid, type GridColumn } from '#client/features/workbench/components/data-grid.tsx';
import { readTypedNumber } from '#client/features/workbench/typed-number.ts';

const columns: GridColumn[] = [
  { id: 't', label: 'T', unit: 'K' },
  { id: 'k', label: 'k', unit: 's-1' },
  { id: 'u', label: 'u(k)', unit: 's-1', optional: true, hint: 'one standard deviation' },
];

/** The table that is typed or pasted into, with faults at their cells. */
export function GalleryGrid() {
  const [rows, setRows] = useState([['450', '0.0045', ''], ['480', '0.04', '0.004'], ['51O', '1,234', '']]);
  const faults = rows.flatMap((cells, row) => cells.flatMap((cell, column) => {
    const read = cell.trim() === '' ? null : readTypedNumber(cell);
    return read && 'fault' in read ? [{ row, column, message: read.fault }] : [];
  }));
  return (
    <section className="section-line grid gap-10 wide:grid-cols-2">
      <div><h2 className="pb-2">Typed or pasted</h2><DataGrid label="Rate constants against temperature" columns={columns} rows={rows} onChange={setRows} faults={faults} minRows={5} /></div>
    </section>
  );
}
