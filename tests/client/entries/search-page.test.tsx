import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { clearChosen } from '#client/features/entries/chosen.ts';
import { Component as SearchPage } from '#client/routes/search/search-page.tsx';
import { energy, sampleEntry } from './entry-samples.ts';
import { noFigures, searchServer } from './search-server.ts';

const ru = sampleEntry('222-222-2');
const ni = sampleEntry('222-223-9', {
  surface: { id: 'surface-2', metal: 'Ni', formula: 'Ni', structure: 'fcc', facet: '111', site: null, sampleType: 'single-crystal', support: null, label: 'Ni(111)' },
  quantities: [energy({ asPrinted: '23.4', unitAsPrinted: 'kcal/mol', value: 97.9056, reportedUncertainty: null, uncertaintyKind: 'none', standardUncertainty: null })],
});

function open(address = '/search') {
  const router = createMemoryRouter([
    { path: '/search', Component: SearchPage },
    { path: '/entries/:accession', element: <p>An entry page</p> },
  ], { initialEntries: [address] });
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return { user: userEvent.setup(), address: () => router.state.location.search, router };
}

afterEach(() => {
  act(() => clearChosen());
  vi.unstubAllGlobals();
});

describe('query sentence', () => {
  it.each([
    ['/search', 'Show all entries for any elementary step on any surface by any method, valid at any temperature.'],
    ['/search?kind=activation-energy&metal=Ru&metal=Ni&validAt=700', 'Show activation energies for any elementary step on Ru or Ni by any method, valid at 700 K.'],
    ['/search?method=TPD&scope=elementary', 'Show all entries for any elementary step on any surface by temperature-programmed desorption, valid at any temperature, of scope elementary.'],
  ])('reads aloud as a sentence at %s', async (address, sentence) => {
    searchServer(() => ({ entries: [ru, ni] }));
    open(address);
    expect(await screen.findByRole('group', { name: sentence })).toBeTruthy();
  });

  it('changes the address when a value is chosen, and asks the server for it', async () => {
    const server = searchServer(() => ({ entries: [ru, ni] }));
    const { user, address } = open('/search?unit=eV');
    await screen.findAllByRole('row');
    await user.click(screen.getByRole('button', { name: 'Metal: any surface' }));
    await user.click(await screen.findByRole('option', { name: /^Ru/ }));
    expect(address()).toBe('?metal=Ru&unit=eV');
    await waitFor(() => expect(server.rows().at(-1)?.getAll('metal')).toEqual(['Ru']));
    await user.click(screen.getByRole('option', { name: /^Ni/ }));
    expect(address()).toBe('?metal=Ru&metal=Ni&unit=eV');
    await user.keyboard('{Escape}');
    expect(screen.getByRole('button', { name: 'Metal: Ru, Ni' })).toBe(document.activeElement);
  });

  it('adds a further part on request and opens it', async () => {
    searchServer(() => ({ entries: [ru] }));
    const { user, address } = open();
    await user.click(await screen.findByRole('button', { name: 'Add to the question: a further filter' }));
    await user.click(screen.getByRole('option', { name: 'Scope' }));
    expect(screen.getByRole('button', { name: 'Scope: any scope' }).getAttribute('aria-expanded')).toBe('true');
    expect(screen.getByRole('listbox', { name: 'Scope' })).toBe(document.activeElement);
    await user.click(await screen.findByRole('option', { name: /elementary/ }));
    expect(address()).toBe('?scope=elementary');
  });

  it('takes limits of the value away with the kind they belong to', async () => {
    searchServer(() => ({ entries: [ru] }));
    const { user, address } = open('/search?kind=activation-energy&valueMin=50&valueMax=90');
    expect(await screen.findByRole('button', { name: 'Value: from 50.0 to 90.0 kJ/mol' })).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Kind of parameter: activation energies' }));
    await user.click(await screen.findByRole('option', { name: /isotope/ }));
    expect(address()).toBe('?kind=activation-energy&kind=kie');
  });

  it('builds a second change on the first even before the first is shown', async () => {
    searchServer(() => ({ entries: [ru, ni] }));
    const { address } = open('/search?metal=Ru&kind=kie');
    const header = await screen.findByRole('button', { name: 'Source' });
    const choice = screen.getByRole('button', { name: 'Method' });
    act(() => {
      header.click();
      choice.click();
    });
    expect(address()).toBe('?kind=kie&metal=Ru&sort=method');
    const group = screen.getByRole('button', { name: 'Group by: elementary step' });
    act(() => group.click());
    const none = screen.getByRole('option', { name: 'nothing' });
    act(() => {
      choice.click();
      none.click();
    });
    expect(address()).toBe('?kind=kie&metal=Ru&sort=-method&group=none');
  });

  it('opens a mangled link and says what it left out', async () => {
    searchServer(() => ({ entries: [ru] }));
    open('/search?metal=Ru&validAt=warm&sort=beauty');
    const note = await screen.findByText(/Parts of this address could not be read/);
    expect(note.parentElement?.textContent).toMatch(/validAt .*sort /);
    expect(screen.getByRole('button', { name: 'Metal: Ru' })).toBeTruthy();
  });
});

describe('free text', () => {
  it('is asked once the typing rests, and follows the address', async () => {
    const server = searchServer(() => ({ entries: [ru] }));
    const { user, address, router } = open();
    const box = await screen.findByRole<HTMLInputElement>('searchbox');
    await user.type(box, 'potassium');
    await waitFor(() => expect(address()).toBe('?q=potassium'));
    await waitFor(() => expect(server.rows().at(-1)?.get('q')).toBe('potassium'));
    expect(server.rows().filter((params) => params.has('q'))).toHaveLength(1);
    await act(() => router.navigate('/search'));
    expect(box.value).toBe('');
  });
});

describe('rows', () => {
  it('show the converted value, the uncertainty, the print, k and the source', async () => {
    searchServer(() => ({ entries: [ru, ni] }));
    open('/search?kind=activation-energy');
    const row = (await screen.findByRole('link', { name: 'Ru(0001)' })).closest('tr') as HTMLElement;
    expect(row.textContent).toContain('186');
    expect(row.textContent).toContain('± 3'.replace(' ', '\u2009'));
    expect(within(row).getByText('186 ± 3 kJ/mol')).toBeTruthy();
    expect(within(row).getByText('extrapolated')).toBeTruthy();
    expect(within(row).getByRole('link', { name: 'Vantongeren 1994' })).toBeTruthy();
    const other = screen.getByRole('link', { name: 'Ni(111)' }).closest('tr') as HTMLElement;
    expect(other.textContent).toContain('97.91');
    expect(within(other).getByText('not reported')).toBeTruthy();
  });

  it('say their state where they are not accepted', async () => {
    searchServer(() => ({ entries: [{ ...ru, state: 'returned' }, ni] }));
    open('/search?state=returned&state=accepted');
    const row = (await screen.findByRole('link', { name: 'Ru(0001)' })).closest('tr') as HTMLElement;
    expect(within(row).getByText('returned')).toBeTruthy();
    expect(screen.getByText('Entries that are not accepted are marked; they are not public.')).toBeTruthy();
  });

  it('keep their choice when the order and the filters change, until it is cleared', async () => {
    const server = searchServer((params) => ({ entries: params.get('sort') === 'energy' ? [ni, ru] : params.has('metal') ? [ni] : [ru, ni] }));
    const { user, address, router } = open();
    await user.click(await screen.findByRole('checkbox', { name: /Choose Ru\(0001\)/ }));
    expect(screen.getByText('1 entry chosen')).toBeTruthy();
    await user.click(screen.getByRole('button', { name: /^Activation energy/ }));
    expect(address()).toBe('?sort=energy');
    await waitFor(() => expect(server.rows().at(-1)?.get('sort')).toBe('energy'));
    expect(screen.getByRole<HTMLInputElement>('checkbox', { name: /Choose Ru\(0001\)/ }).checked).toBe(true);
    await act(() => router.navigate('/search?metal=Ni'));
    await waitFor(() => expect(screen.queryByRole('link', { name: 'Ru(0001)' })).toBeNull());
    await user.click(screen.getByRole('checkbox', { name: /Choose Ni\(111\)/ }));
    expect(screen.getByText('2 entries chosen')).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Export CSV + BibTeX' }).getAttribute('href')).toBe('/api/v1/entries/export?accession=222-222-2&accession=222-223-9&T=700&format=zip');
    await user.click(screen.getByRole('button', { name: 'Clear' }));
    expect(screen.queryByText(/chosen/)).toBeNull();
  });

  it('are moved through, chosen and opened by the keyboard', async () => {
    searchServer(() => ({ entries: [ru, ni] }));
    const { user, router } = open();
    const first = (await screen.findByRole('link', { name: 'Ru(0001)' })).closest('tr') as HTMLElement;
    act(() => first.focus());
    await user.keyboard(' {ArrowDown}');
    expect(screen.getByText('1 entry chosen')).toBeTruthy();
    expect(document.activeElement?.textContent).toContain('Ni(111)');
    await user.keyboard('{Enter}');
    expect(router.state.location.pathname).toBe('/entries/222-223-9');
  });

  it('come further by the cursor, and say how many there are', async () => {
    const server = searchServer((params) => (params.get('cursor') === 'next'
      ? { entries: [ni], page: { total: 2 } } : { entries: [ru], page: { total: 2, nextCursor: 'next' } }));
    const { user } = open();
    expect(await screen.findByText(/1 of 2 entries shown/)).toBeTruthy();
    await user.click(screen.getByRole('button', { name: /Show/ }));
    expect(await screen.findByText(/All 2 entries shown/)).toBeTruthy();
    expect(server.rows().at(-1)?.get('cursor')).toBe('next');
  });

  it('are grouped by what the reader asks', async () => {
    searchServer(() => ({ entries: [ru, ni] }));
    const { user, address } = open();
    await screen.findByRole('link', { name: 'Ru(0001)' });
    await user.click(screen.getByRole('button', { name: 'Group by: elementary step' }));
    await user.click(screen.getByRole('option', { name: 'surface' }));
    expect(address()).toBe('?groupBy=surface');
    expect(await screen.findByRole('rowheader', { name: 'Ni(111)' })).toBeTruthy();
  });
});

describe('figures', () => {
  it.each([
    [{ ...noFigures, energy: { count: 12, median: 98, low: 14, high: 186 } }, 'median 98 kJ/mol, 14 to 186'],
    [{ ...noFigures, alike: false, energy: { count: 12, median: 98, low: 14, high: 186 } }, 'energies 14 to 186 kJ/mol; no median, since elementary steps, types of energy or scopes are mixed'],
    [noFigures, 'no energies among them'],
  ])('give a median only over what is alike', async (summary, words) => {
    searchServer(() => ({ entries: [ru] }), summary);
    open();
    expect(await screen.findByText(words)).toBeTruthy();
  });
});

describe('nothing found', () => {
  it('says which filter emptied the list, and takes it away in one press', async () => {
    searchServer((params) => (params.has('metal')
      ? { entries: [], page: { emptiedBy: [{ filter: 'metal', totalWithout: 2 }, { filter: 'validAt', totalWithout: 0 }], withoutStatedRange: 3 } } : { entries: [ru] }));
    const { user, address } = open('/search?metal=Cu&validAt=700');
    expect(await screen.findByRole('heading', { name: 'No accepted entry answers this question' })).toBeTruthy();
    expect(screen.getByText(/3 measured entries are left out because the source states no valid range/)).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Take it away: 2 entries' }));
    expect(address()).toBe('?validAt=700');
    expect(await screen.findByRole('link', { name: 'Ru(0001)' })).toBeTruthy();
  });
});
