import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Me } from '#shared/contracts/accounts.ts';
import type { QueueItem, ReviewView } from '#shared/contracts/reviews.ts';
import { makeQueryClient } from '#client/app/query-client.ts';
import { Component as QueuePage } from '#client/routes/review/queue-page.tsx';
import { Component as SubmissionPage } from '#client/routes/review/submission-page.tsx';
import { contributor, json, refusal, standIn, type Asked } from '../accounts/account-server.ts';
import { draftOf, energy } from '../contribute/contribute-samples.ts';

// A whole page with its typing takes seconds on a busy machine.
vi.setConfig({ testTimeout: 20_000 });
afterEach(() => vi.unstubAllGlobals());

const reviewer: Me = { ...contributor, user: { id: 'u3', name: 'I. Okonjo-Vale', roles: ['reviewer'] }, reviewsWaiting: 7 };
const id = '45154deb-27da-4047-af18-062b8c087a9e';

const base: ReviewView = {
  submission: id, round: 1, state: 'submitted', contributor: 'T. Adeyemi-Holt', submittedAt: '2026-03-11T09:00:00Z', own: false,
  entry: draftOf({ kind: 'activation-energy' }, {
    state: 'submitted', quantities: [energy], checks: [{ code: 'outlier', severity: 'warning', message: 'Far from the median.' }],
    step: { key: 'k', variantKey: 'k', equation: 'N2 + 2* -> 2N*', class: 'dissociative-adsorption', direction: 1 },
  }),
  claim: null, checklist: {}, seen: '1.3', changes: [{ field: 'Unit', before: 'kJ/mol', after: 'kcal/mol' }],
  neighbours: [{ accession: 'AAA-AAA-A', label: 'Sørlie 1999', energyKJPerMol: 121, computed: false, sameSurface: true }],
  comments: [], decision: null, earlier: [{ round: 0, decision: 'return', comment: 'Which row?', by: 'P. Brisebois', at: '2026-03-01T09:00:00Z' }],
  actions: ['comment', 'claim', 'checklist', 'decide'], whyNot: null, next: null,
};

function open(view: Partial<ReviewView> = {}, answer: (asked: Asked) => Promise<Response> | undefined = () => undefined) {
  const log = standIn((asked) => {
    const given = answer(asked);
    if (given) return given;
    if (asked.path === `/reviews/${id}`) return json({ ...base, ...view });
    if (asked.path === `/reviews/${id}/checklist`) return json({ ...base, ...view, checklist: (asked.body as { checklist: object }).checklist, claim: { by: 'I. Okonjo-Vale', mine: true, until: '2026-03-17T09:00:00Z' } });
    return undefined;
  }, () => reviewer);
  const router = createMemoryRouter([{ path: '/review', element: <QueuePage /> }, { path: '/review/:submission', element: <SubmissionPage /> }], { initialEntries: [`/review/${id}`] });
  render(<QueryClientProvider client={makeQueryClient()}><RouterProvider router={router} /></QueryClientProvider>);
  return { log, router };
}

const answers = () => Array.from(document.querySelectorAll<HTMLInputElement>('[data-point] input:checked')).map((input) => `${input.name.replace('point-', '')} ${input.value}`);
const decisions = (log: Asked[]) => log.filter((asked) => asked.path.endsWith('/decision'));

describe('the review page', () => {
  it('shows the submission, its neighbours, its checks, what changed and what was said before', async () => {
    open();
    for (const words of ['21.4 ± 1.2 kcal/mol', 'Far from the median.', 'Which row?', 'Sørlie 1999']) expect((await screen.findAllByText(words)).length).toBeGreaterThan(0);
    expect(screen.getByRole('row', { name: 'Unit kJ/mol kcal/mol' })).toBeTruthy();
  });

  it('is answered by single keys, also after a press with the pointer, and saves what was answered', async () => {
    const { log } = open();
    await screen.findByText('The DOI is this paper');
    await userEvent.keyboard('jyyn');
    expect(answers()).toEqual(['source yes', 'value yes', 'unit no']);
    await userEvent.keyboard('ka');
    expect(answers()).toEqual(['source yes', 'value yes', 'unit not-applicable']);
    await userEvent.click(document.querySelector('[name="point-primary"][value="yes"]') as Element);
    await userEvent.keyboard('kn');
    expect(answers()).toEqual(['source yes', 'value yes', 'unit not-applicable', 'range no', 'primary yes']);
    await waitFor(() => expect(log.filter((asked) => asked.path.endsWith('/checklist')).at(-1)?.body).toEqual({
      checklist: { source: 'yes', value: 'yes', unit: 'not-applicable', range: 'no', primary: 'yes' },
    }), { timeout: 4000 });
  });

  it('opens Accept only when all eight are answered and none with no', async () => {
    const { log } = open({}, (asked) => (asked.path.endsWith('/decision')
      ? json({ ...base, state: 'accepted', actions: [], decision: { decision: 'accept', reason: null, comment: '', by: 'I. Okonjo-Vale', at: '2026-03-14T09:00:00Z' }, next: id }) : undefined));
    const accept = await screen.findByRole('button', { name: 'Accept' });
    expect(accept.getAttribute('aria-disabled')).toBe('true');
    await userEvent.click(accept);
    expect(screen.queryByRole('dialog')).toBeNull();
    await userEvent.keyboard('jyyyyyyyy');
    expect(accept.getAttribute('aria-disabled')).toBeNull();
    await userEvent.click(accept);
    await userEvent.click(within(await screen.findByRole('dialog')).getByRole('button', { name: 'Accept' }));
    expect(await screen.findByRole('link', { name: 'Next in the queue' })).toBeTruthy();
    expect(decisions(log)[0]?.body).toMatchObject({ decision: 'accept', seen: '1.3', checklist: { source: 'yes', primary: 'yes' } });
  });

  it('asks for the reason and the comment before returning', async () => {
    const { log } = open();
    await userEvent.click(await screen.findByRole('button', { name: 'Return' }));
    expect(document.activeElement).toBe(screen.getByLabelText('Reason, to return or reject'));
    await userEvent.selectOptions(screen.getByLabelText('Reason, to return or reject'), 'unit-differs-from-source');
    await userEvent.click(screen.getByRole('button', { name: 'Return' }));
    expect(document.activeElement).toBe(screen.getByLabelText('To the contributor'));
    await userEvent.paste('Table 4 heads this column kJ/mol.');
    await userEvent.click(screen.getByRole('button', { name: 'Return' }));
    await userEvent.click(within(await screen.findByRole('dialog')).getByRole('button', { name: 'Return' }));
    await waitFor(() => expect(decisions(log)[0]?.body).toMatchObject({ decision: 'return', reason: 'unit-differs-from-source', comment: 'Table 4 heads this column kJ/mol.' }));
  });

  it('shows who decided meanwhile, and keeps the comment', async () => {
    let decided = false;
    const their = { decision: 'reject' as const, reason: 'duplicate', comment: 'Twice.', by: 'P. Brisebois', at: '2026-03-14T09:00:00Z' };
    open({}, (asked) => {
      if (asked.path === `/reviews/${id}` && decided) return json({ ...base, state: 'rejected', decision: their, actions: [] });
      if (!asked.path.endsWith('/decision')) return undefined;
      decided = true;
      return refusal(409, 'already-decided', 'This submission has been decided', 'Decided.', { context: { by: 'P. Brisebois', decision: 'reject', at: their.at } });
    });
    await userEvent.selectOptions(await screen.findByLabelText('Reason, to return or reject'), 'other');
    await userEvent.click(screen.getByLabelText('To the contributor'));
    await userEvent.paste('mine');
    await userEvent.click(screen.getByRole('button', { name: 'Reject' }));
    await userEvent.click(within(await screen.findByRole('dialog')).getByRole('button', { name: 'Reject' }));
    expect(await screen.findByText(/Rejected by P\. Brisebois/)).toBeTruthy();
    expect(screen.getByText('P. Brisebois has rejected it', { exact: false })).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Accept' })).toBeNull();
  });

  it.each<[string, Partial<ReviewView>, RegExp]>([
    ['own', { own: true, actions: ['comment'], whyNot: 'You contributed this value; another reviewer decides on it.' }, /This is yours\./],
    ['held by another', { actions: ['comment'], claim: { by: 'P. Brisebois', mine: false, until: '2026-03-17T09:00:00Z' }, whyNot: 'P. Brisebois holds this submission.' }, /Not open to you now\./],
  ])('lets nobody decide on a submission that is %s', async (_, view, words) => {
    open(view);
    expect(await screen.findByText(words)).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Accept' })).toBeNull();
    await userEvent.keyboard('jy');
    expect(answers()).toEqual([]);
  });
});

describe('the review queue', () => {
  const item: QueueItem = {
    submission: id, accession: 'K7Q-4MD-2', round: 2, state: 'under-review', equation: 'N2 + 2* -> 2N*', surface: 'Co(0001)', asPrinted: '152', unitAsPrinted: 'kcal/mol',
    sourceLabel: 'Achterberg 2001', contributor: 'T. Adeyemi-Holt', submittedAt: '2026-03-11T09:00:00Z', checks: [{ code: 'outlier', severity: 'warning', message: 'calorie for joule would explain it (factor 0.239)' }],
    claim: { by: 'P. Brisebois', mine: false, until: '2026-03-17T09:00:00Z' }, own: false,
  };
  const page = (items: QueueItem[]) => ({ items, total: items.length, totalIsExact: true, nextCursor: null, counts: { waiting: items.length, submitted: 0, underReview: 0, mine: 0, decided: 5 } });

  async function openQueue(items: QueueItem[]) {
    const opened = open({}, (asked) => (asked.path.startsWith('/reviews?') ? json(page(items)) : undefined));
    await opened.router.navigate('/review');
    return opened;
  }

  it('says what waits, by whom, with which doubts, who holds it, and which are one\'s own', async () => {
    await openQueue([item, { ...item, submission: '55154deb-27da-4047-af18-062b8c087a9e', own: true, claim: null, checks: [] }]);
    const [first, second] = await waitFor(() => {
      const rows = screen.getAllByRole('listitem').filter((row) => row.textContent.includes('Achterberg'));
      expect(rows).toHaveLength(2);
      return rows as [HTMLElement, HTMLElement];
    });
    expect(first.textContent).toMatch(/152 kcal\/mol.*round 2.*slip of unit\?.*claimed by P\. Brisebois/s);
    expect(second.textContent).toContain('yours: another reviewer decides');
    expect(within(first).getByRole('link', { name: /^Review K7Q-4MD-2/ }).getAttribute('href')).toBe(`/review/${id}`);
    expect(screen.getByRole('link', { name: /decided · 5/ })).toBeTruthy();
  });

  it('says when nothing waits', async () => {
    await openQueue([]);
    expect(await screen.findByText('Nothing waits for review')).toBeTruthy();
  });
});
