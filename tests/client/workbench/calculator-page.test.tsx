import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider, useLocation } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { onAnnounce } from '#client/lib/announce.ts';
import { setInstrument } from '#client/lib/instrument.ts';
import { Component as CalculatorPage } from '#client/routes/workbench/calculator-page.tsx';
import { Component as ListPage } from '#client/routes/workbench/list-page.tsx';

function Handed() {
  return <p data-testid="handed">{JSON.stringify(useLocation().state)}</p>;
}

function open(address: string, roles: string[] = []) {
  vi.stubGlobal('fetch', vi.fn(() => Promise.resolve(new Response(JSON.stringify({
    user: roles.length > 0 ? { id: 'u', name: 'Ida Example', roles } : null, preferences: null, reviewsWaiting: null, demonstration: false, version: '1',
  }), { status: 200, headers: { 'Content-Type': 'application/json' } }))));
  const router = createMemoryRouter([
    { path: '/workbench', Component: ListPage }, { path: '/workbench/:name', Component: CalculatorPage }, { path: '/contribute', Component: Handed },
  ], { initialEntries: [address] });
  render(<QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}><RouterProvider router={router} /></QueryClientProvider>);
  return { router, user: userEvent.setup(), query: () => new URLSearchParams(router.state.location.search) };
}

const result = () => screen.getByRole('region', { name: 'Result' });
const field = (name: RegExp) => screen.getByRole('textbox', { name });

/** The text of an element without the plain spelling that is there for copies. */
const words = (element: HTMLElement) => element.textContent?.replace(/\s+/g, ' ') ?? '';

afterEach(() => {
  vi.unstubAllGlobals();
  setInstrument({ temperatureK: 700, unit: 'kJ/mol' });
});

describe('the list', () => {
  it('has every calculator under its purpose', async () => {
    const { user, router } = open('/workbench');
    const group = await screen.findByRole('region', { name: 'Temperature dependence' });
    expect(within(group).getAllByRole('heading', { level: 3 }).map(words)).toEqual(['Rate constant at a temperature', 'A and E from two temperatures', 'Fit A and E', 'Eyring and Arrhenius parameters']);
    await user.click(within(group).getByRole('link', { name: 'Fit A and E' }));
    expect(router.state.location.pathname).toBe('/workbench/fit');
    expect(await screen.findByRole('heading', { level: 1, name: 'Fit A and E' })).toBeTruthy();
    expect(document.title).toBe('Fit A and E · Sillstone');
  });

  it('says that there is no such calculator', async () => {
    open('/workbench/alchemy');
    expect(await screen.findByText(/has no calculator named alchemy/)).toBeTruthy();
  });
});

describe('a calculator', () => {
  it('says what to give, then what is still to give, then the result, as it is typed', async () => {
    const { user, query } = open('/workbench/arrhenius');
    expect(words(await screen.findByRole('region', { name: 'Result' }))).toContain('Give A, E and T.');
    await user.type(field(/^Pre-exponential factor A/), '10^13');
    expect(words(result())).toMatch(/Still to give:.*activation energy E.*temperature T/);
    await user.type(field(/^Activation energy E/), '100');
    await user.click(screen.getByRole('button', { name: 'Use 700 K' }));
    expect(words(result())).toMatch(/Rate constant at 700 K k/);
    // 1e13 exp(-100000/(R 700)) by the C library's exp: 345186
    expect(words(result())).toContain('3.452 × 10^5 s−1');
    await waitFor(() => expect(Object.fromEntries(query())).toEqual({ preExponential: '10^13', energy: '100', temperatureK: '700' }));
    expect(screen.getByRole('heading', { name: 'The derivation' })).toBeTruthy();
    expect(words(screen.getByRole('region', { name: 'The formula and where it holds' }))).toMatch(/k = A \(T\/T_0\).*IUPAC Gold Book/);
  });

  it('shows a fault beside its field once typing rests, with the bound and the value, and takes it away', async () => {
    const { user } = open('/workbench/arrhenius?preExponential=1e13&energy=100&temperatureK=500');
    const input = await screen.findByRole('textbox', { name: /^Temperature T/ });
    await user.clear(input);
    await user.type(input, '-5');
    await waitFor(() => expect(input.getAttribute('aria-invalid')).toBe('true'));
    expect(words(document.getElementById(input.getAttribute('aria-describedby')?.split(' ').at(-1) ?? '') as HTMLElement)).toBe('T must be above 0 K, got -5.');
    expect(words(result())).toMatch(/No result\..*T must be above 0 K/);
    await user.clear(input);
    await user.type(input, '400');
    await waitFor(() => expect(input.getAttribute('aria-invalid')).toBeNull());
    expect(words(result())).toMatch(/Rate constant at 400 K/);
  });

  it('restores a calculation from its link, units and choices too, and names what it left out', async () => {
    open('/workbench/reverse?energyForward=24&energyForwardUnit=kcal%2Fmol&reactionEnthalpy=30&basis=concentration&colour=red');
    expect(((await screen.findByRole('textbox', { name: /^Activation energy, forward/ })) as HTMLInputElement).value).toBe('24');
    expect((screen.getByRole('combobox', { name: 'Unit of activation energy, forward' }) as HTMLSelectElement).value).toBe('kcal/mol');
    expect((screen.getByRole('radio', { name: 'concentrations' }) as HTMLInputElement).checked).toBe(true);
    expect(words(document.getElementById(field(/^Activation energy, forward/).getAttribute('aria-describedby') ?? '') as HTMLElement)).toBe('is 100.416 kJ/mol');
    expect(screen.getByText(/colour \(no input of this calculator\)/)).toBeTruthy();
    expect(words(result())).toContain('70.416 kJ/mol');
  });

  it('shows energies in the unit of the header', async () => {
    setInstrument({ unit: 'eV' });
    open('/workbench/two-temperature?temperature1K=400&k1=0.87&temperature2K=500&k2=358');
    expect(words(await screen.findByRole('region', { name: 'Result' }))).toMatch(/Activation energy E ?1\.03\d eV/);
  });

  it('keeps nothing hidden: what a choice takes away leaves the address, and Back brings the choice back', async () => {
    const { user, query, router } = open('/workbench/tunnelling?model=bell-1935&imaginaryPerCm=1000&temperatureK=500&energy=80');
    await screen.findByRole('textbox', { name: /^Barrier/ });
    await user.click(screen.getByRole('radio', { name: 'Wigner' }));
    expect(screen.queryByRole('textbox', { name: /^Barrier/ })).toBeNull();
    await waitFor(() => expect(Object.fromEntries(query())).toEqual({ imaginaryPerCm: '1000', temperatureK: '500' }));
    await act(() => router.navigate(-1));
    await waitFor(() => expect((screen.getByRole('radio', { name: 'Bell 1935' }) as HTMLInputElement).checked).toBe(true));
    expect((field(/^Barrier/) as HTMLInputElement).value).toBe('80');
  });

  it('fills the example, clears it, and follows a link to the same calculator', async () => {
    const { user, router, query } = open('/workbench/uncertainty');
    await user.click(await screen.findByRole('button', { name: 'Example' }));
    expect(words(result())).toMatch(/Standard uncertainty u ?1\.500 kJ\/mol/);
    await user.click(screen.getByRole('button', { name: 'Clear' }));
    expect(words(result())).toContain('Choose what the source states');
    await waitFor(() => expect(query().toString()).toBe(''));
    await act(() => router.navigate('/workbench/uncertainty?value=4&coverageFactor=2'));
    expect(words(result())).toMatch(/2\.000/);
  });

  it('takes points pasted into the table and marks a cell that is wrong', async () => {
    const { user } = open('/workbench/fit');
    const cell = await screen.findByRole('textbox', { name: 'T, K, row 1' });
    await user.click(cell);
    await user.paste('T / K\tk / s-1\n300\t0.0012\n325\t0.0091\n350\t0.045\n375\t0.19\n');
    // Least squares written out in Python: slope -7571.0 K, E = 62.949 kJ/mol.
    expect(words(result())).toMatch(/Activation energy E ?62.9\d* ± ?\d/);
    const wrong = screen.getByRole('textbox', { name: 'k, s-1, row 2' });
    fireEvent.change(wrong, { target: { value: '-1' } });
    await waitFor(() => expect(wrong.getAttribute('aria-invalid')).toBe('true'));
    expect(screen.getByText('k: k must be above 0, got -1.')).toBeTruthy();
  });

  it('says the result to those who listen', async () => {
    const said: string[] = [];
    const stop = onAnnounce((text) => said.push(text));
    open('/workbench/site-density?aAngstrom=4');
    await screen.findByRole('region', { name: 'Result' });
    await waitFor(() => expect(said).toEqual(['Result: Surface atoms Γ 1.4434 × 10^19 m-2']));
    stop();
  });

  it('copies the link, the text and the CSV', async () => {
    const { user } = open('/workbench/energy?value=24');
    await user.click(await screen.findByRole('button', { name: 'Copy link' }));
    expect(await navigator.clipboard.readText()).toBe(`${window.location.origin}/workbench/energy?value=24`);
    await user.click(screen.getByRole('button', { name: 'Copy as text' }));
    expect(await navigator.clipboard.readText()).toMatch(/Convert an energy[^]*Converted: 100\.416 kJ\/mol[^]*4\.184/);
    await user.click(screen.getByRole('button', { name: 'Copy as CSV' }));
    expect(await navigator.clipboard.readText()).toContain('result,Converted,,,100.416,,,,,kJ/mol\r\n');
  });

  it('writes a missing free site when asked to', async () => {
    const { user } = open('/workbench/parse-step?equation=NH3*+->+NH2*+%2B+H*');
    await user.click(await screen.findByRole('button', { name: /^Write NH3\* \+ \* ->/ }));
    expect((field(/^Equation/) as HTMLInputElement).value).toMatch(/^NH3\* \+ \* -> /);
    expect(words(result())).toMatch(/Class ?dehydrogenation/);
  });

  it('hands its figures to a new entry for those who may contribute, and to nobody else', async () => {
    const { user } = open('/workbench/energy?value=24', ['contributor']);
    await user.click(await screen.findByRole('link', { name: 'Use in a new entry' }));
    expect(JSON.parse(screen.getByTestId('handed').textContent ?? '')).toEqual({ prefill: { kind: 'activation-energy', quantities: [{ symbol: 'energy', asPrinted: '24', unitAsPrinted: 'kcal/mol' }] } });
  });

  it('offers no entry to a visitor', async () => {
    open('/workbench/energy?value=24');
    await screen.findByRole('button', { name: 'Copy as text' });
    expect(screen.queryByRole('link', { name: 'Use in a new entry' })).toBeNull();
  });
});
