import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { SourceDetail } from '#shared/contracts/sources.ts';
import { readSourceSort } from '#client/features/sources/list-state.ts';
import { Component as SourcePage } from '#client/routes/sources/source-page.tsx';
import { Component as SourcesPage } from '#client/routes/sources/sources-page.tsx';

const source: SourceDetail = {
  id: 'source-1', doi: '10.5555/invented.1', key: 'vantongeren1994', title: 'An invented paper', authors: 'Vantongeren', label: 'Vantongeren 1994', year: 1994,
  container: 'Journal of Invented Surfaces', status: 'retracted', notice: 'Retracted on 15 June 2026.', citation: 'Vantongeren, L. (1994). An invented paper.',
  bibtex: '@article{vantongeren1994}', ris: 'TY  - JOUR', confirmed: true, acceptedEntries: 3,
};

function open(address: string) {
  const asked: string[] = [];
  vi.stubGlobal('fetch', vi.fn((url: string) => {
    asked.push(url);
    const params = new URL(url, 'http://sillstone.test').searchParams;
    const empty = { items: [], total: 0, totalIsExact: true, nextCursor: null };
    const body = url.startsWith('/api/v1/sources/') ? source
      : url.startsWith('/api/v1/sources') ? (params.get('q') === 'nobody' ? empty : { ...empty, items: [source], total: 1 })
        : { ...empty, all: 9, counts: null, emptiedBy: null, withoutStatedRange: null };
    return Promise.resolve(new Response(JSON.stringify(body), { status: 200, headers: { 'Content-Type': 'application/json' } }));
  }));
  const router = createMemoryRouter([{ path: '/sources', Component: SourcesPage }, { path: '/sources/:id', Component: SourcePage }], { initialEntries: [address] });
  render(<QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}><RouterProvider router={router} /></QueryClientProvider>);
  return { asked, user: userEvent.setup(), address: () => router.state.location.search };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('bibliography', () => {
  it('lists sources with their entries and notices, and sorts them by the server', async () => {
    const { user, address, asked } = open('/sources');
    const row = (await screen.findByRole('link', { name: 'Vantongeren 1994' })).closest('tr') as HTMLElement;
    expect(row.textContent).toMatch(/An invented paper.*retracted.*1994.*3/);
    await user.click(screen.getByRole('button', { name: 'Year' }));
    expect(address()).toBe('?sort=-year');
    await waitFor(() => expect(asked.at(-1)).toContain('sort=-year'));
  });

  it('says what was not found and shows all again', async () => {
    const { user, address } = open('/sources?q=nobody');
    expect(await screen.findByText(/Nothing was found for "nobody"/)).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Show all sources' }));
    expect(address()).toBe('');
    expect(await screen.findByRole('link', { name: 'Vantongeren 1994' })).toBeTruthy();
  });

  it.each([['-year', '-year'], ['beauty', 'label'], [null, 'label']])('reads the sort %s', (text, sort) => {
    expect(readSourceSort(text)).toBe(sort);
  });
});

describe('one source', () => {
  it('gives its citation, its notice and its entries', async () => {
    const { asked, user } = open('/sources/source-1');
    expect(await screen.findByRole('heading', { level: 1, name: 'An invented paper' })).toBeTruthy();
    expect(screen.getByText('Vantongeren, L. (1994). An invented paper.')).toBeTruthy();
    expect(screen.getByText(/Retracted on 15 June 2026/)).toBeTruthy();
    expect(await screen.findByText('None: the source is retracted.')).toBeTruthy();
    expect(asked.at(-1)).toContain('source=10.5555%2Finvented.1');
    await user.click(screen.getByRole('button', { name: 'Copy BibTeX' }));
    expect(await navigator.clipboard.readText()).toBe('@article{vantongeren1994}');
    expect(screen.getByText('BibTeX copied.')).toBeTruthy();
  });
});
