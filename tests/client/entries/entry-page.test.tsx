import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { EntryDetail } from '#shared/contracts/entries.ts';
import { Component as EntryPage } from '#client/routes/entry/entry-page.tsx';
import { entryDetail as detail } from './entry-detail.ts';
import { energy } from './entry-samples.ts';

function open(address: string, answer: unknown, status = 200) {
  const fetched = vi.fn((url: string, init?: RequestInit) => Promise.resolve(new Response(
    JSON.stringify(url.endsWith('/csrf') ? { token: 't' } : init?.method === 'POST' ? { accession: '222-222-2', state: 'retracted' } : answer),
    { status, headers: { 'Content-Type': 'application/json' } },
  )));
  vi.stubGlobal('fetch', fetched);
  const router = createMemoryRouter([
    { path: '/entries/:accession', Component: EntryPage }, { path: '/entries/:accession/v/:version', Component: EntryPage },
  ], { initialEntries: [address] });
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}><RouterProvider router={router} /></QueryClientProvider>,
  );
  return { fetched, user: userEvent.setup() };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('entry page', () => {
  it('sets what is printed beside what it became, and says how', async () => {
    open('/entries/222-222-2', detail());
    expect(await screen.findByRole('heading', { level: 1, name: 'Associative desorption of nitrogen from Ru(0001)' })).toBeTruthy();
    expect(screen.getByText('186 ± 3 kJ/mol')).toBeTruthy();
    expect(screen.getByText(/elementary; ± is one standard uncertainty, as reported/)).toBeTruthy();
    expect(screen.getByText('entry 222-222-2, version 1')).toBeTruthy();
    expect(screen.getByText('accepted 14 Mar 2026')).toBeTruthy();
    expect(screen.getAllByText('Read the printed value').length).toBeGreaterThan(0);
    expect(screen.getByText('the parameters hold at 700 K, outside the valid range', { exact: false })).toBeTruthy();
  });

  it('draws k against temperature, marks the extrapolation and tells the history with names', async () => {
    open('/entries/222-222-2', detail());
    expect(await screen.findByRole('img', { name: /Rate constant against temperature/ })).toBeTruthy();
    expect(screen.getByText('700 K lies outside the valid range.')).toBeTruthy();
    expect(screen.getByText('Version 1 accepted by I. Okonjo-Vale: figures agree')).toBeTruthy();
  });

  it('says why there is no rate constant', async () => {
    open('/entries/222-222-2', detail({ quantities: [energy()], kAtT: null }));
    expect(await screen.findByText('No pre-exponential factor is reported, so that the rate constant cannot be evaluated.')).toBeTruthy();
  });

  it('shows the limit of a neighbour as a limit', async () => {
    open('/entries/222-222-2', detail());
    const row = (await screen.findByRole('link', { name: 'Sørlie 1999' })).closest('tr') as HTMLElement;
    expect(within(row).getByText('126', { exact: false }).textContent).toContain('<');
  });

  it.each<[string, Partial<EntryDetail>, RegExp]>([
    ['superseded', { state: 'superseded', versions: [{ version: 1, state: 'superseded', acceptedAt: '2026-01-01T00:00:00Z' }, { version: 2, state: 'accepted', acceptedAt: '2026-03-14T10:00:00Z' }] }, /This version is superseded\. Version 2 stands in its place, accepted 14 Mar 2026/],
    ['retracted', { state: 'retracted', notice: 'The unit was misread.' }, /This version is retracted\. The unit was misread\. It is no longer searched/],
    ['not public', { state: 'under-review', version: null, actions: [] }, /Not public: under review\. Only its contributor, reviewers and curators/],
  ])('a %s version says so before its value', async (_, change, words) => {
    open('/entries/222-222-2/v/1', detail(change));
    await screen.findByRole('heading', { level: 1, name: /Associative/ });
    expect(screen.getByText((__, element) => element?.classList.contains('notice') === true && words.test(element.textContent ?? ''))).toBeTruthy();
  });

  it('asks for the version in the address, at the temperature of interest', async () => {
    const { fetched } = open('/entries/222-222-2/v/2', detail());
    await screen.findByRole('heading', { level: 1, name: /Associative/ });
    expect(fetched.mock.calls[0]?.[0]).toBe('/api/v1/entries/222-222-2/versions/2?T=700');
  });

  it('offers what the viewer may do, and no more', async () => {
    open('/entries/222-222-2', detail({ actions: ['decide', 'withdraw'], submission: 'abc', state: 'under-review', version: null }));
    expect((await screen.findByRole('link', { name: 'Review' })).getAttribute('href')).toBe('/review/abc');
    expect(screen.getByRole('button', { name: 'Withdraw' })).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Revise' })).toBeNull();
    expect(screen.queryByRole('link', { name: 'Export' })).toBeNull();
  });

  it('retracts only with a public reason', async () => {
    const { user, fetched } = open('/entries/222-222-2', detail({ actions: ['retract'] }));
    await user.click(await screen.findByRole('button', { name: 'Retract' }));
    const dialog = screen.getByRole('dialog');
    await user.click(within(dialog).getByRole('button', { name: 'Retract' }));
    expect(within(dialog).getByText('Say why: everybody who opens the entry reads it.')).toBeTruthy();
    await user.type(within(dialog).getByRole('textbox'), 'The unit was misread.');
    await user.click(within(dialog).getByRole('button', { name: 'Retract' }));
    await vi.waitFor(() => expect(fetched.mock.calls.find(([, init]) => init?.method === 'POST')?.[1]?.body).toBe('{"reason":"The unit was misread."}'));
  });

  it.each([['/entries/222-222-3', /is no accession/], ['/entries/222-222-2/v/two', /A version is a whole number/]])('%s is told apart from a missing entry', async (address, words) => {
    const { fetched } = open(address, {});
    expect(await screen.findByText(words)).toBeTruthy();
    expect(fetched).not.toHaveBeenCalled();
  });

  it('says that there is no such entry in the words of the answer', async () => {
    open('/entries/222-222-2', { type: 'about:blank', title: 'There is nothing here', status: 404, detail: 'No entry has this accession.', code: 'not-found', requestId: 'r' }, 404);
    expect(await screen.findByText('No entry has this accession.')).toBeTruthy();
  });
});
