import { QueryClientProvider, useQuery } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { patchPreferences, type Me } from '#shared/contracts/accounts.ts';
import { makeQueryClient } from '#client/app/query-client.ts';
import { sessionOptions } from '#client/app/session.ts';
import { call } from '#client/lib/api-client.ts';
import { Button } from '#client/ui/button.tsx';
import { Component as SignInPage } from '#client/routes/sign-in/page.tsx';
import { RequireRole } from '#client/routes/sign-in/require-role.tsx';
import { SessionGuard } from '#client/routes/sign-in/session-guard.tsx';
import { contributor, json, refusal, standIn, visitor, type Asked } from './account-server.ts';

// A whole page with its typing takes seconds on a busy machine.
vi.setConfig({ testTimeout: 20_000 });
afterEach(() => vi.unstubAllGlobals());

function open(address: string, extra: Parameters<typeof createMemoryRouter>[0] = []) {
  const router = createMemoryRouter([
    { path: '/sign-in', element: <SignInPage /> }, { path: '/review', element: <p>the queue</p> }, { path: '/search', element: <p>the search</p> }, ...extra,
  ], { initialEntries: [address] });
  render(<QueryClientProvider client={makeQueryClient()}><RouterProvider router={router} /></QueryClientProvider>);
  return router;
}

const signInOf = (log: Asked[]) => log.filter((asked) => asked.path === '/auth/sign-in');

describe('the sign-in page', () => {
  it('fills the form from a demonstration account, signs in and goes back', async () => {
    const log = standIn((asked) => (asked.path === '/auth/sign-in' ? json(contributor) : undefined));
    const router = open('/sign-in?next=%2Freview');
    await userEvent.click(await screen.findByRole('button', { name: /T\. Adeyemi-Holt/ }));
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('contributor@demo.sillstone.example');
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/review'));
    expect(signInOf(log)[0]?.body).toEqual({ email: 'contributor@demo.sillstone.example', password: 'stepping-stone' });
  });

  it('says what is wrong in place and keeps what was typed', async () => {
    const log = standIn((asked) => (asked.path === '/auth/sign-in' ? refusal(401, 'sign-in-failed', 'E-mail or password is not right', 'No.') : undefined));
    open('/sign-in');
    await userEvent.click(await screen.findByRole('button', { name: 'Sign in' }));
    expect(screen.getByText('Type the e-mail address of your account.')).toBeTruthy();
    expect(document.activeElement).toBe(screen.getByLabelText('E-mail'));
    expect(signInOf(log)).toHaveLength(0);
    await userEvent.click(screen.getByLabelText('E-mail'));
    await userEvent.paste('reader@demo.sillstone.example');
    await userEvent.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect((await screen.findByRole('alert')).textContent).toContain('E-mail or password is not right.');
    expect(screen.getByLabelText<HTMLInputElement>('E-mail').value).toBe('reader@demo.sillstone.example');
  });

  it('shows no demonstration accounts outside demonstration mode', async () => {
    const log = standIn(() => undefined, () => ({ ...visitor, demonstration: false }));
    open('/sign-in');
    await screen.findByRole('button', { name: 'Sign in' });
    expect(log.some((asked) => asked.path === '/auth/demo-accounts')).toBe(false);
    expect(screen.queryByText('Demonstration accounts')).toBeNull();
  });
});

describe('a page for a role', () => {
  it.each<[string, Me, RegExp]>([
    ['a visitor', visitor, /Sign in to do this/],
    ['a contributor', contributor, /Your role does not allow this/],
    ['a reviewer', { ...contributor, user: { id: 'u3', name: 'I. Okonjo-Vale', roles: ['reviewer'] } }, /for I\. Okonjo-Vale/],
  ])('tells %s where they stand', async (_, me, words) => {
    standIn(() => undefined, () => me);
    open('/page', [{ path: '/page', element: <RequireRole role="reviewer" title="Review">{(user) => <p>for {user.name}</p>}</RequireRole> }]);
    expect(await screen.findByText(words)).toBeTruthy();
  });
});

describe('a session that ended', () => {
  function Page() {
    const { data: me } = useQuery(sessionOptions);
    return (
      <>
        <SessionGuard />
        <p>{me?.user?.name ?? 'nobody'}</p>
        <label>Note<input defaultValue="typed before" /></label>
        <Button onClick={() => void call(patchPreferences, { body: { temperatureK: 500 } }).catch(() => undefined)}>Save</Button>
      </>
    );
  }

  it.each<[string, Me, number]>([
    ['the same person: the refused request is repeated', contributor, 2],
    ['another person: it is not', { ...contributor, user: { id: 'u9', name: 'Somebody Else', roles: ['reader'] } }, 1],
  ])('is taken up again in place, by %s', async (_, back, saves) => {
    let signedIn = false;
    const log = standIn((asked) => {
      if (asked.path === '/auth/sign-in') {
        signedIn = true;
        return json(back);
      }
      if (asked.path !== '/auth/preferences') return undefined;
      return signedIn ? json(contributor.preferences) : refusal(401, 'sign-in-required', 'Sign in to do this', 'No session.');
    }, () => (signedIn ? back : contributor));
    open('/page', [{ path: '/page', element: <Page /> }]);
    await screen.findByText('T. Adeyemi-Holt');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    const dialog = await screen.findByRole('dialog');
    expect(within(dialog).getByText(/Sign in again as T\. Adeyemi-Holt/)).toBeTruthy();
    await userEvent.click(within(dialog).getByLabelText('E-mail'));
    await userEvent.paste('contributor@demo.sillstone.example');
    await userEvent.click(within(dialog).getByLabelText('Password'));
    await userEvent.paste('stepping-stone');
    await userEvent.keyboard('{Enter}');
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    await screen.findByText(back.user?.name ?? '');
    expect(log.filter((asked) => asked.path === '/auth/preferences')).toHaveLength(saves);
    expect(screen.getByLabelText<HTMLInputElement>('Note').value).toBe('typed before');
  });
});
