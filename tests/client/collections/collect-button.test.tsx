import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { CollectionDetail, CollectionSummary } from '#shared/contracts/collections.ts';
import { CollectButton } from '#client/features/collections/components/collect-button.tsx';

const held: CollectionSummary = { id: 'list-1', name: 'Ammonia on Ru', description: '', entries: 4, changedAt: '2026-03-02T09:00:00.000Z' };
const detail = (summary: CollectionSummary): CollectionDetail => ({ ...summary, createdAt: summary.changedAt, items: [] });

/** A stand-in for the server that holds the lists given and keeps what it was sent. */
function open(lists: readonly CollectionSummary[], { signedIn = true, added = 1, refuse = false } = {}) {
  const sent: { path: string; body: unknown }[] = [];
  vi.stubGlobal('fetch', vi.fn((address: string, init?: RequestInit) => {
    const path = address.replace('/api/v1', '');
    const json = (body: unknown, status = 200) => Promise.resolve(new Response(JSON.stringify(body), { status, headers: { 'Content-Type': 'application/json' } }));
    if (path === '/auth/csrf') return json({ token: 't' });
    if (init?.method !== 'POST') return json({ items: lists, total: lists.length, totalIsExact: true, nextCursor: null });
    sent.push({ path, body: JSON.parse(String(init.body)) as unknown });
    if (refuse) return json({ type: 'about:blank', title: 'Some of the input is not right', status: 422, detail: 'A collection holds at most 5000 entries.', code: 'invalid-input', requestId: 'r' }, 422);
    if (path === '/collections') return json(detail({ ...held, id: 'list-2', name: 'Base case' }), 201);
    return json({ added, already: 2 - added, collection: detail(held) });
  }));
  render(
    <QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}>
      <MemoryRouter><CollectButton accessions={['222-222-2', '333-333-3']} signedIn={signedIn} returnTo="/search?metal=Ru" /></MemoryRouter>
    </QueryClientProvider>,
  );
  return { sent, user: userEvent.setup() };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('adding to a collection', () => {
  it('offers the list changed last, adds to it and links to it', async () => {
    const { user, sent } = open([held]);
    await user.click(screen.getByRole('button', { name: 'Add to collection' }));
    const dialog = await screen.findByRole('dialog', { name: 'Add 2 entries to a collection' });
    expect((await within(dialog).findByRole('radio', { name: /Ammonia on Ru/ }) as HTMLInputElement).checked).toBe(true);
    await user.click(within(dialog).getByRole('button', { name: 'Add' }));
    expect((await screen.findByRole('status')).textContent).toBe('1 entry added, 1 already in Ammonia on Ru.');
    expect(screen.getByRole('link', { name: 'Ammonia on Ru' }).getAttribute('href')).toBe('/collections/list-1');
    expect(sent).toEqual([{ path: '/collections/list-1/entries', body: { accessions: ['222-222-2', '333-333-3'] } }]);
  });

  it('starts a new one, once it has a name', async () => {
    const { user, sent } = open([]);
    await user.click(screen.getByRole('button', { name: 'Add to collection' }));
    const dialog = await screen.findByRole('dialog');
    const name = await within(dialog).findByLabelText('Name');
    await user.click(within(dialog).getByRole('button', { name: 'Add' }));
    expect(within(dialog).getByText('Give the collection a name.')).toBeTruthy();
    expect(sent).toEqual([]);
    await user.type(name, 'Base case');
    await user.click(within(dialog).getByRole('button', { name: 'Add' }));
    expect((await screen.findByRole('status')).textContent).toBe('2 entries added to Base case.');
    expect(sent).toEqual([{ path: '/collections', body: { name: 'Base case', accessions: ['222-222-2', '333-333-3'] } }]);
  });

  it('stays open and says why when it is refused', async () => {
    const { user } = open([held], { refuse: true });
    await user.click(screen.getByRole('button', { name: 'Add to collection' }));
    const dialog = await screen.findByRole('dialog');
    await within(dialog).findByRole('radio', { name: /Ammonia on Ru/ });
    await user.click(within(dialog).getByRole('button', { name: 'Add' }));
    expect((await within(dialog).findByRole('alert')).textContent).toBe('Some of the input is not right. A collection holds at most 5000 entries.');
  });

  it('leads a visitor to the sign-in and back', () => {
    open([], { signedIn: false });
    expect(screen.getByRole('link', { name: 'Sign in to collect' }).getAttribute('href')).toBe('/sign-in?next=%2Fsearch%3Fmetal%3DRu');
  });
});
