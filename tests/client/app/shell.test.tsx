import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, Link, RouterProvider } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Me } from '#shared/contracts/accounts.ts';
import { makeQueryClient } from '#client/app/query-client.ts';
import { Shell } from '#client/app/shell.tsx';
import { instrumentSetting, setInstrument } from '#client/lib/instrument.ts';
import { PageHead } from '#client/ui/page-head.tsx';
import { readStored } from '#client/lib/local-storage.ts';
import { columnsKey, rowsKey } from '#client/lib/table-setting.ts';

const visitor: Me = { user: null, preferences: null, reviewsWaiting: null, demonstration: true, version: '0.1.0' };
const reviewer: Me = { ...visitor, user: { id: 'u1', name: 'I. Okonjo-Vale', roles: ['reviewer'] }, reviewsWaiting: 7, preferences: { energyUnit: 'eV', temperatureK: 550, theme: 'system', hiddenColumns: ['barrier', 'rate'], rows: 'dense' } };

/** The browser as wide as a desk's, and the server answering who is there. */
function stubBrowser(me: Me) {
  vi.spyOn(window, 'matchMedia').mockImplementation((query) => ({
    matches: query.includes('min-width'), media: query, onchange: null,
    addEventListener: () => undefined, removeEventListener: () => undefined, addListener: () => undefined, removeListener: () => undefined, dispatchEvent: () => false,
  }));
  vi.stubGlobal('fetch', vi.fn((url: string) => Promise.resolve(new Response(JSON.stringify(
    url.endsWith('/auth/csrf') ? { token: 't' } : url.endsWith('/auth/preferences') ? reviewer.preferences : me,
  )))));
}

function open(address: string, me: Me = visitor) {
  stubBrowser(me);
  const page = (title: string) => <><PageHead title={title} /><Link to="/other">other page</Link></>;
  const router = createMemoryRouter([{
    element: <Shell />,
    children: [
      { path: '/search', element: page('Search'), handle: { instrument: true } },
      { path: '/other', element: page('Other') },
    ],
  }], { initialEntries: [address] });
  render(<QueryClientProvider client={makeQueryClient()}><RouterProvider router={router} /></QueryClientProvider>);
  return router;
}

const searchOf = (router: ReturnType<typeof open>) => Object.fromEntries(new URLSearchParams(router.state.location.search));
const temperature = () => screen.getByRole<HTMLInputElement>('textbox', { name: /temperature of interest/ });

beforeEach(() => setInstrument({ temperatureK: 700, unit: 'kJ/mol' }));
afterEach(() => vi.unstubAllGlobals());

describe('shell', () => {
  it('offers a visitor reading and signing in, and says that the data are invented', async () => {
    open('/search');
    const signIn = await screen.findByRole('link', { name: 'Sign in' });
    expect(signIn.getAttribute('href')).toBe('/sign-in?next=%2Fsearch');
    expect(screen.getByText(/Demonstration data: every entry, author and journal here is invented/)).toBeTruthy();
    expect(screen.queryByRole('link', { name: /Review/ })).toBeNull();
    expect(screen.getByRole('link', { name: 'Search' }).getAttribute('aria-current')).toBe('page');
  });

  it('shows a reviewer how many submissions wait', async () => {
    open('/search', reviewer);
    const nav = await screen.findByRole('navigation', { name: 'Contribute and review' });
    await waitFor(() => expect(within(nav).getByRole('link', { name: /Review.*7 waiting/ })).toBeTruthy());
  });

  it('shows no banner outside demonstration mode', async () => {
    open('/search', { ...visitor, demonstration: false });
    await screen.findByRole('link', { name: 'Sign in' });
    expect(screen.queryByText(/Demonstration data/)).toBeNull();
  });

  it('obeys an address that names a temperature and a unit, without remembering them', async () => {
    open('/search?T=450&unit=eV');
    await waitFor(() => expect(temperature().value).toBe('450'));
    expect(instrumentSetting()).toEqual({ temperatureK: 450, unit: 'eV' });
    expect(window.localStorage.getItem('sillstone.instrument')).toBe('700 kJ/mol');
  });

  it('writes a change to the address where it changes what is shown, and keeps the rest of the query', async () => {
    const user = userEvent.setup();
    const router = open('/search?metal=Ru');
    expect(searchOf(router)).toEqual({ metal: 'Ru' });
    await user.clear(temperature());
    await user.type(temperature(), '650{Enter}');
    await waitFor(() => expect(searchOf(router)).toEqual({ metal: 'Ru', T: '650', unit: 'kJ/mol' }));
  });

  it('leaves other addresses alone', async () => {
    const user = userEvent.setup();
    const router = open('/other');
    await user.clear(temperature());
    await user.type(temperature(), '650{Enter}');
    expect(searchOf(router)).toEqual({});
  });

  it('ignores a temperature in the address that is none', async () => {
    open('/search?T=9999');
    expect(temperature().value).toBe('700');
  });

  it('takes over the preferences of an account when its holder is known', async () => {
    open('/other', reviewer);
    await waitFor(() => expect(temperature().value).toBe('550'));
    expect([readStored(columnsKey), readStored(rowsKey)]).toEqual(['barrier rate', 'dense']);
  });

  it('moves the focus to the heading of the next page', async () => {
    const user = userEvent.setup();
    open('/search');
    await user.click(screen.getByRole('link', { name: 'other page' }));
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Other' })));
    expect(document.title).toBe('Other · Sillstone');
  });

  it('has a skip link to the content first', async () => {
    const user = userEvent.setup();
    open('/search');
    await user.tab();
    expect(document.activeElement?.getAttribute('href')).toBe('#content');
    expect(screen.getByRole('main').id).toBe('content');
  });
});
