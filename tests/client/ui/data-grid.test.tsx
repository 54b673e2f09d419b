import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { DataGrid, type GridFault } from '#client/features/workbench/components/data-grid.tsx';

const columns = [{ id: 't', label: 'T', unit: 'K' }, { id: 'k', label: 'k', unit: 's-1' }, { id: 'u', label: 'u', optional: true, hint: 'one standard deviation' }];

let latest: string[][] = [];
function Page({ start = [['450', '1', '']], faults = [], mostRows }: { start?: string[][]; faults?: GridFault[]; mostRows?: number }) {
  const [rows, setRows] = useState(start);
  latest = rows;
  return <DataGrid label="Rate constants" columns={columns} rows={rows} onChange={setRows} faults={faults} minRows={3} mostRows={mostRows} />;
}
const filled = () => latest.filter((cells) => cells.some((cell) => cell !== ''));
const cell = (name: string) => screen.getByRole<HTMLInputElement>('textbox', { name });
const focused = () => document.activeElement?.getAttribute('aria-label');

describe('the data grid', () => {
  it('is a table with named columns, rows and cells', () => {
    render(<Page />);
    expect(screen.getByRole('table', { name: /^Rate constants\./ })).toBeTruthy();
    expect(screen.getAllByRole('columnheader').map((head) => head.textContent)).toEqual(['TK', 'ks\u22121', 'uoptionalone standard deviation']);
    expect(screen.getAllByRole('rowheader').map((head) => head.textContent)).toEqual(['Row 1', 'Row 2', 'Row 3']);
    expect(cell('T, K, row 1').value).toBe('450');
    expect(document.getElementById(cell('u, row 2').getAttribute('aria-describedby') ?? '')?.textContent).toBe('one standard deviation');
  });

  it('takes what is typed, also into a row that was only shown', async () => {
    render(<Page />);
    await userEvent.setup().type(cell('k, s-1, row 3'), '2e-3');
    expect(latest).toEqual([['450', '1', ''], ['', '', ''], ['', '2e-3', '']]);
  });

  it.each([
    ['{Enter}', 'k, s-1, row 2'], ['{ArrowDown}', 'k, s-1, row 2'], ['{ArrowRight}', 'u, row 1'], ['{ArrowLeft}', 'T, K, row 1'], ['{ArrowUp}', 'k, s-1, row 1'], ['{ArrowDown}{ArrowDown}{Shift>}{Enter}{/Shift}', 'k, s-1, row 2'],
  ])('moves by %s to %s', async (keys, to) => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(cell('k, s-1, row 1'));
    cell('k, s-1, row 1').select();
    await user.keyboard(keys);
    expect(focused()).toBe(to);
  });

  it('lets the arrows move inside a text before they leave it', async () => {
    const user = userEvent.setup();
    render(<Page start={[['450', '1', '']]} />);
    await user.click(cell('T, K, row 1'));
    cell('T, K, row 1').setSelectionRange(1, 1);
    await user.keyboard('{ArrowRight}');
    expect(focused()).toBe('T, K, row 1');
  });

  it('adds a row by Enter in the last one, and up to the most', async () => {
    const user = userEvent.setup();
    render(<Page mostRows={4} />);
    await user.click(cell('T, K, row 3'));
    await user.keyboard('{Enter}');
    await waitFor(() => expect(focused()).toBe('T, K, row 4'));
    await user.keyboard('{Enter}');
    expect(screen.getByRole('status').textContent).toBe('A table holds at most 4 rows.');
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Add a row' }).disabled).toBe(true);
  });

  it('removes a row and keeps the focus in the table', async () => {
    const user = userEvent.setup();
    render(<Page start={[['450', '1', ''], ['480', '2', ''], ['510', '3', '']]} />);
    await user.click(screen.getByRole('button', { name: 'Remove row 2' }));
    expect(filled()).toEqual([['450', '1', ''], ['510', '3', '']]);
    expect(screen.getByRole('status').textContent).toBe('Row 2 removed.');
    await waitFor(() => expect(focused()).toBe('T, K, row 2'));
  });

  it.each<[string, string, string, string[][], string]>([
    ['from the first cell', 'T, K, row 1', 'T\tk\tu\n450\t0,5\t0,1\n480\t1,5\t0,2', [['450', '0.5', '0.1'], ['480', '1.5', '0.2']], '2 rows, 3 columns read; header skipped; decimal commas written as points.'],
    ['from a cell inside', 'k, s-1, row 2', '1;2\n3;4', [['450', '1', ''], ['', '1', '2'], ['', '3', '4']], '2 rows, 2 columns read.'],
    ['too wide', 'u, row 1', '1\t2\n3\t4', [['450', '1', '1'], ['', '', '3']], '2 rows, 1 column read; 1 column left out, since there is no room to the right.'],
    ['too long', 'T, K, row 3', '1\n2\n3\n4', [['450', '1', ''], ['1', '', ''], ['2', '', '']], '2 rows, 1 column read; 2 rows left out, since a table holds at most 4.'],
  ])('fills from the cell that is pasted into: %s', async (_, into, text, rows, report) => {
    const user = userEvent.setup();
    render(<Page mostRows={4} />);
    await user.click(cell(into));
    await user.paste(text);
    expect(filled()).toEqual(rows);
    expect(screen.getByRole('status').textContent).toBe(report);
  });

  it('leaves the paste of one figure to the cell', async () => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(cell('T, K, row 2'));
    await user.paste('480');
    expect(filled()).toEqual([['450', '1', ''], ['480', '', '']]);
    expect(screen.queryByRole('button', { name: 'Undo the paste' })).toBeNull();
  });

  it.each(['button', 'keys'])('takes a paste back by its %s', async (way) => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(cell('T, K, row 1'));
    await user.paste('1\t2\n3\t4');
    if (way === 'button') await user.click(screen.getByRole('button', { name: 'Undo the paste' }));
    else await user.keyboard('{Control>}z{/Control}');
    expect(filled()).toEqual([['450', '1', '']]);
    expect(screen.getByRole('status').textContent).toBe('The paste is undone.');
    expect(screen.queryByRole('button', { name: 'Undo the paste' })).toBeNull();
  });

  it('offers no undo once the pasted cells are changed', async () => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(cell('T, K, row 1'));
    await user.paste('1\t2\n3\t4');
    await user.type(cell('T, K, row 1'), '9');
    expect(screen.queryByRole('button', { name: 'Undo the paste' })).toBeNull();
  });

  it('says what is wrong at its cell', () => {
    render(<Page start={[['51O', '1', '']]} faults={[{ row: 0, column: 0, message: '51O is not a number.' }]} />);
    const wrong = cell('T, K, row 1');
    expect(wrong.getAttribute('aria-invalid')).toBe('true');
    expect(document.getElementById(wrong.getAttribute('aria-describedby') ?? '')?.textContent).toBe('T: 51O is not a number.');
    expect(cell('k, s-1, row 1').getAttribute('aria-invalid')).toBeNull();
    expect(within(screen.getByRole('table')).getByText('T: 51O is not a number.')).toBeTruthy();
  });
});
