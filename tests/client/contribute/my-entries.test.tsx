import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type * as z from 'zod';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { myEntry } from '#shared/contracts/entries.ts';
import { makeQueryClient } from '#client/app/query-client.ts';
import { Component as ContributionsPage } from '#client/routes/contributions/page.tsx';
import { contributor, json, refusal, standIn, type Asked } from '../accounts/account-server.ts';
import { draftOf } from './contribute-samples.ts';

vi.setConfig({ testTimeout: 20_000 });
afterEach(() => vi.unstubAllGlobals());

type MyEntry = z.infer<typeof myEntry>;
const one: MyEntry = {
  accession: 'K7Q-4MD-2', revision: 1, version: null, state: 'draft', kind: 'activation-energy', equation: 'N2 + 2* -> 2N*', surface: 'Ru(0001)', asPrinted: '1.25',
  unitAsPrinted: 'eV', sourceLabel: 'Sørlie 1999', changedAt: '2026-03-14T09:00:00Z', standing: 'With you', lastComment: null, actions: ['edit', 'submit', 'withdraw'],
};

function open(items: MyEntry[], answer: (asked: Asked) => Promise<Response> | undefined = () => undefined) {
  const log = standIn((asked) => answer(asked) ?? (asked.path.startsWith('/contributions')
    ? json({ items, total: items.length, totalIsExact: true, nextCursor: null, counts: { draft: 1, returned: 2 } }) : undefined), () => contributor);
  const router = createMemoryRouter([{ path: '/contributions', element: <ContributionsPage /> }, { path: '/contribute/:accession', element: <p>the form</p> }], { initialEntries: ['/contributions'] });
  render(<QueryClientProvider client={makeQueryClient()}><RouterProvider router={router} /></QueryClientProvider>);
  return { log, router };
}

describe('my submissions', () => {
  it.each<[string, Partial<MyEntry>, string[], string[]]>([
    ['a draft', {}, ['Continue editing', 'Discard'], ['Open', 'Revise']],
    ['one under review', { state: 'under-review', actions: ['withdraw'] }, ['Open', 'Withdraw'], ['Continue editing', 'Answer']],
    ['a returned one', { state: 'returned', actions: ['revise', 'withdraw'], lastComment: 'Which row?' }, ['Answer', 'Open', 'Withdraw'], ['Continue editing']],
    ['a public one', { state: 'accepted', version: 1, actions: ['revise', 'export'] }, ['Revise', 'Open'], ['Withdraw', 'Discard']],
  ])('offers for %s what may be done with it', async (_, change, offered, notOffered) => {
    open([{ ...one, ...change }]);
    const row = (await screen.findByText('With you')).closest('li') as HTMLElement;
    for (const name of offered) expect(within(row).getByText(name)).toBeTruthy();
    for (const name of notOffered) expect(within(row).queryByText(name)).toBeNull();
    if (change.lastComment) expect(within(row).getByText(change.lastComment)).toBeTruthy();
  });

  it('counts by state and filters by it', async () => {
    const { log, router } = open([one]);
    await userEvent.click(await screen.findByRole('link', { name: 'returned · 2' }));
    expect(router.state.location.search).toBe('?state=returned');
    await waitFor(() => expect(log.some((asked) => asked.path === '/contributions?state=returned')).toBe(true));
  });

  it('withdraws only after asking, and says when that is refused', async () => {
    const { log } = open([{ ...one, state: 'submitted', actions: ['withdraw'] }], (asked) => (asked.path.endsWith('/withdraw')
      ? refusal(409, 'state-conflict', 'The entry is not in a state that allows this', 'It was accepted a moment ago.') : undefined));
    await userEvent.click(await screen.findByText('Withdraw'));
    expect(log.some((asked) => asked.path.endsWith('/withdraw'))).toBe(false);
    await userEvent.click(within(screen.getByRole('dialog')).getByText('Withdraw it'));
    expect(await screen.findByText(/accepted a moment ago/)).toBeTruthy();
  });

  it('answers a reviewer in a new draft', async () => {
    const { log, router } = open([{ ...one, state: 'returned', actions: ['revise'], lastComment: 'Which row?' }], (asked) => (asked.path.endsWith('/revise') ? json(draftOf({})) : undefined));
    await userEvent.click(await screen.findByText('Answer'));
    await userEvent.click(within(screen.getByRole('dialog')).getByLabelText('Answer to the reviewer (optional)'));
    await userEvent.paste('Row 3.');
    await userEvent.click(screen.getByText('Open a new draft'));
    await waitFor(() => expect(router.state.location.pathname).toBe('/contribute/K7Q-4MD-2'));
    expect(log.find((asked) => asked.path.endsWith('/revise'))?.body).toEqual({ reason: 'Row 3.' });
  });

  it('says what to do when there is nothing yet', async () => {
    open([]);
    expect(await screen.findByText('You have entered nothing yet')).toBeTruthy();
  });
});
