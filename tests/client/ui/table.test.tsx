import { act, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { DataTable, type DataColumn, type TableSort } from '#client/ui/table.tsx';

interface Row {
  id: string;
  surface: string;
  step: string;
  energy: number;
}

const rows: Row[] = [
  { id: 'a', surface: 'Ru(0001)', step: 'one', energy: 186 },
  { id: 'b', surface: 'Ni(111)', step: 'one', energy: 98 },
  { id: 'c', surface: 'Fe(111)', step: 'two', energy: 14 },
];
const columns: DataColumn<Row>[] = [
  { id: 'surface', header: 'Surface', cell: (row) => row.surface, rowHeader: true, sortKey: 'metal' },
  { id: 'energy', header: <>E<sub>a</sub></>, headerText: 'Activation energy', unit: 'kJ/mol', cell: (row) => row.energy, numeric: true, sortKey: 'energy', firstDescending: true },
  { id: 'step', header: 'Step', cell: (row) => row.step },
];

function Page({ many, grouped = false, onOpen, hidden }: { many?: Row[]; grouped?: boolean; onOpen?: (row: Row) => void; hidden?: Set<string> }) {
  const [sort, setSort] = useState<TableSort | null>(null);
  const [chosen, setChosen] = useState(new Set<string>());
  return (
    <>
      <output>{sort ? `${sort.key} ${sort.descending ? 'down' : 'up'}` : 'usual'}</output>
      <DataTable
        caption="Entries" columns={columns} rows={many ?? rows} rowId={(row) => row.id} rowLabel={(row) => row.surface}
        sort={sort} onSort={setSort} chosen={chosen} onChosen={setChosen} onOpen={onOpen} hidden={hidden}
        group={grouped ? (row) => ({ key: row.step, label: `Step ${row.step}` }) : undefined}
      />
      <p data-testid="chosen">{[...chosen].sort().join(' ')}</p>
    </>
  );
}

const sortState = () => screen.getByRole('status').textContent;
const head = (name: RegExp) => screen.getByRole('columnheader', { name });

describe('table', () => {
  it('has a caption, column heads and row heads', () => {
    render(<Page />);
    expect(screen.getByRole('table', { name: 'Entries' })).toBeTruthy();
    expect(screen.getAllByRole('columnheader')).toHaveLength(4);
    expect(screen.getAllByRole('rowheader').map((cell) => cell.textContent)).toEqual(['Ru(0001)', 'Ni(111)', 'Fe(111)']);
  });

  it('says how it is sorted, and turns the order round by a second press', async () => {
    const user = userEvent.setup();
    render(<Page />);
    expect(head(/Activation energy/).hasAttribute('aria-sort')).toBe(false);
    await user.click(screen.getByRole('button', { name: /Activation energy/ }));
    expect(head(/Activation energy/).getAttribute('aria-sort')).toBe('descending');
    expect(sortState()).toBe('energy down');
    await user.click(screen.getByRole('button', { name: /Activation energy/ }));
    expect(head(/Activation energy/).getAttribute('aria-sort')).toBe('ascending');
    await user.click(screen.getByRole('button', { name: /Activation energy/ }));
    expect(sortState()).toBe('usual');
    await user.click(screen.getByRole('button', { name: 'Surface' }));
    expect(sortState()).toBe('metal up');
    expect(head(/Activation energy/).hasAttribute('aria-sort')).toBe(false);
  });

  it('offers no sorting where the server has no key for it', () => {
    render(<Page />);
    expect(within(head(/Step/)).queryByRole('button')).toBeNull();
  });

  it('moves from row to row by the keyboard, chooses by space and opens by Enter', async () => {
    const user = userEvent.setup();
    const onOpen = vi.fn();
    render(<Page onOpen={onOpen} />);
    const focused = () => document.activeElement?.getAttribute('data-row');
    screen.getByRole('row', { name: /Ru\(0001\)/ }).focus();
    await user.keyboard('{ArrowDown}');
    expect(focused()).toBe('b');
    await user.keyboard(' j');
    expect(focused()).toBe('c');
    await user.keyboard('x{ArrowDown}');
    expect(focused()).toBe('c');
    await user.keyboard('{Home}{Enter}');
    expect(screen.getByTestId('chosen').textContent).toBe('b c');
    expect(onOpen).toHaveBeenCalledWith(rows[0]);
  });

  it('is one stop for the tabulator, besides its check boxes and buttons', () => {
    const { container } = render(<Page />);
    expect(container.querySelectorAll('tr[tabindex="0"]')).toHaveLength(1);
  });

  it('chooses one row and all rows, and shows when it is some', async () => {
    const user = userEvent.setup();
    render(<Page />);
    const all = screen.getByRole<HTMLInputElement>('checkbox', { name: 'Choose all rows shown' });
    await user.click(screen.getByRole('checkbox', { name: 'Choose Ni(111)' }));
    expect(all.indeterminate).toBe(true);
    await user.click(all);
    expect(screen.getByTestId('chosen').textContent).toBe('a b c');
    expect(all.checked).toBe(true);
  });

  it('chooses a run of rows with Shift, by a press and by the arrows', async () => {
    const user = userEvent.setup();
    render(<Page />);
    await user.click(screen.getByRole('checkbox', { name: 'Choose Ru(0001)' }));
    await user.keyboard('{Shift>}');
    await user.click(screen.getByRole('checkbox', { name: 'Choose Fe(111)' }));
    await user.keyboard('{/Shift}');
    expect(screen.getByTestId('chosen').textContent).toBe('a b c');
    await user.click(screen.getByRole('checkbox', { name: 'Choose all rows shown' }));
    act(() => screen.getByRole('row', { name: /Ru\(0001\)/ }).focus());
    await user.keyboard('{Shift>}{ArrowDown}{/Shift}');
    expect(screen.getByTestId('chosen').textContent).toBe('a b');
    expect(document.activeElement?.getAttribute('data-row')).toBe('b');
  });

  it('puts rows that follow one another under the heading of their group', () => {
    render(<Page grouped />);
    const texts = screen.getAllByRole('row').slice(1).map((row) => row.textContent);
    expect(texts.map((text) => text?.startsWith('Step '))).toEqual([true, false, false, true, false]);
  });

  it('leaves out hidden columns', () => {
    render(<Page hidden={new Set(['step'])} />);
    expect(screen.queryByRole('columnheader', { name: 'Step' })).toBeNull();
  });

  it('becomes stanzas with a list of orders where the page is narrow', async () => {
    vi.spyOn(window, 'matchMedia').mockImplementation((query) => ({
      matches: query.includes('max-width: 700px'), media: query, onchange: null,
      addEventListener: () => undefined, removeEventListener: () => undefined, addListener: () => undefined, removeListener: () => undefined, dispatchEvent: () => false,
    }));
    const user = userEvent.setup();
    render(<Page grouped />);
    expect(screen.queryByRole('table')).toBeNull();
    expect(screen.getAllByRole('listitem')).toHaveLength(5);
    await user.selectOptions(screen.getByLabelText('Sort by'), 'Activation energy, largest first');
    expect(sortState()).toBe('energy down');
    await user.click(screen.getByRole('checkbox', { name: 'Choose Fe(111)' }));
    expect(screen.getByTestId('chosen').textContent).toBe('c');
  });

  it('draws only the rows in sight when there are many', async () => {
    const many = Array.from({ length: 10_000 }, (_, index) => ({ id: String(index), surface: `S${index}`, step: 'one', energy: index }));
    const { container } = render(<Page many={many} />);
    expect(container.querySelectorAll('tr[data-row]').length).toBeLessThan(200);
    await waitFor(() => expect(container.querySelector('.table-space')).toBeTruthy());
    expect(container.querySelectorAll('tr[data-row]').length).toBeLessThan(200);
  });
});
