import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { Picker, type PickerOption } from '#client/ui/picker.tsx';

const metals: PickerOption[] = ['Ru', 'Ni', 'Co', 'Fe', 'Rh', 'Ir', 'Pt', 'Pd', 'Cu'].map((value, index) => ({
  value, label: value, also: value === 'Fe' ? 'iron' : '', count: 90 - index * 10,
}));

function Sentence({ multiple = true, options = metals }: { multiple?: boolean; options?: PickerOption[] }) {
  const [chosen, setChosen] = useState<string[]>([]);
  return <Picker label="Metal" summary={chosen.length ? chosen.join(', ') : 'any metal'} options={options} chosen={chosen} onChange={setChosen} multiple={multiple} clearLabel="Any metal" />;
}

const button = () => screen.getByRole('button', { name: /^Metal/ });
const chosenOptions = () => screen.queryAllByRole('option', { selected: true }).map((option) => option.textContent);

describe('picker', () => {
  it('opens with the keyboard, chooses several by arrows and Enter, and gives the focus back on Escape', async () => {
    const user = userEvent.setup();
    render(<Sentence />);
    await user.tab();
    expect(document.activeElement).toBe(button());
    await user.keyboard('{ArrowDown}');
    expect(document.activeElement).toBe(screen.getByRole('combobox'));
    await user.keyboard('{Enter}{ArrowDown}{ArrowDown}{Enter}');
    expect(chosenOptions()).toEqual(['Ru 90 entries', 'Co 70 entries']);
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('listbox')).toBeNull();
    expect(document.activeElement).toBe(button());
    expect(button().getAttribute('aria-label')).toBe('Metal: Ru, Co');
  });

  it('names the active option to those who listen', async () => {
    const user = userEvent.setup();
    render(<Sentence />);
    await user.click(button());
    await user.keyboard('{ArrowDown}');
    const active = screen.getByRole('combobox').getAttribute('aria-activedescendant');
    expect(document.getElementById(active ?? '')?.textContent).toBe('Ni 80 entries');
    await user.keyboard('{ArrowUp}{ArrowUp}{ArrowUp}');
    expect(document.getElementById(screen.getByRole('combobox').getAttribute('aria-activedescendant') ?? '')?.textContent).toBe('Ru 90 entries');
  });

  it.each([
    ['rh', ['Rh']],
    ['iron', ['Fe']],
    ['zzz', []],
  ])('finds by typing %s', async (typed, labels) => {
    const user = userEvent.setup();
    render(<Sentence />);
    await user.click(button());
    await user.keyboard(typed);
    const shown = screen.queryAllByRole('option').map((option) => option.textContent?.slice(0, 2));
    expect(shown.slice(0, 1)).toEqual(labels);
    expect(screen.queryByText(/Nothing here is spelled like/) !== null).toBe(labels.length === 0);
  });

  it('closes after one choice where only one can be made', async () => {
    const user = userEvent.setup();
    render(<Sentence multiple={false} />);
    await user.click(button());
    await user.keyboard('{ArrowDown}{Enter}');
    expect(screen.queryByRole('listbox')).toBeNull();
    expect(button().textContent).toBe('Ni');
    expect(document.activeElement).toBe(button());
  });

  it('has no search field over a short list, and is then moved through in the list itself', async () => {
    const user = userEvent.setup();
    render(<Sentence options={metals.slice(0, 3)} />);
    await user.click(button());
    expect(screen.queryByRole('combobox')).toBeNull();
    expect(document.activeElement).toBe(screen.getByRole('listbox'));
    await user.keyboard('{End} ');
    expect(chosenOptions()).toEqual(['Co 70 entries']);
  });

  it('takes back all choices by one button', async () => {
    const user = userEvent.setup();
    render(<Sentence />);
    await user.click(button());
    await user.keyboard('{Enter}');
    await user.click(screen.getByRole('button', { name: 'Any metal' }));
    expect(button().textContent).toBe('any metal');
  });

  it('closes when the focus or a press goes elsewhere', async () => {
    const user = userEvent.setup();
    render(<><Sentence /><button type="button">elsewhere</button></>);
    await user.click(button());
    await user.click(screen.getByText('elsewhere'));
    expect(screen.queryByRole('listbox')).toBeNull();
    await user.click(button());
    await user.tab();
    await user.tab();
    expect(screen.queryByRole('listbox')).toBeNull();
  });

  it('remembers the last choices on this device, five at most, and shows them first', async () => {
    const user = userEvent.setup();
    const Remembering = () => {
      const [chosen, setChosen] = useState<string[]>([]);
      return <Picker label="Metal" summary="any metal" recent="test" options={metals} chosen={chosen} onChange={setChosen} />;
    };
    const { unmount } = render(<Remembering />);
    await user.click(button());
    for (const name of ['Pt', 'Pd', 'Cu', 'Ir', 'Rh', 'Fe']) await user.click(screen.getByRole('option', { name: new RegExp(`^${name}`) }));
    unmount();
    render(<Remembering />);
    await user.click(button());
    const recent = within(screen.getByRole('group', { name: 'recent' })).getAllByRole('option').map((option) => option.textContent?.slice(0, 2));
    expect(recent).toEqual(['Fe', 'Rh', 'Ir', 'Cu', 'Pd']);
    expect(within(screen.getByRole('group', { name: 'all' })).getAllByRole('option')).toHaveLength(4);
  });

  it.each([
    ['all words in any order', 'nitrogen recombination', 'associative desorption of N2'],
    ['a slip of the key', 'recombinaton', 'associative desorption of N2'],
    ['small digits', 'N₂', 'associative desorption of N2'],
    ['a long dash', 'N–H', 'bond N-H'],
  ])('finds with %s', async (_, typed, label) => {
    const user = userEvent.setup();
    render(<Sentence options={[...metals, { value: 'b', label: 'bond N-H' }, { value: 'a', label: 'associative desorption of N2', also: 'recombination, dinitrogen, nitrogen' }]} />);
    await user.click(button());
    await user.keyboard(typed);
    await waitFor(() => expect(screen.getAllByRole('option')[0]?.textContent).toBe(label));
  });

  it('offers what is typed as it is, and shows rare options only to those who type', async () => {
    const user = userEvent.setup();
    const onChange = vi.fn();
    render(
      <Picker
        label="Metal" summary="any metal" search options={[...metals, { value: 'Os', label: 'Os', deep: true }]} chosen={[]} onChange={onChange}
        asTyped={(typed) => ({ option: { value: typed, label: `as typed: ${typed}` }, first: typed.includes('->') })}
      />,
    );
    await user.click(button());
    expect(screen.queryByRole('option', { name: /^Os/ })).toBeNull();
    await user.keyboard('os');
    expect(screen.getAllByRole('option').map((option) => option.textContent)).toEqual(['Os', 'as typed: os']);
    await user.keyboard('->');
    await user.keyboard('{Enter}');
    expect(onChange).toHaveBeenCalledWith(['os->'], 'os->');
  });
});
