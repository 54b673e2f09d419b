import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, Link, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { EntryInput, Preview } from '#shared/contracts/entries.ts';
import { makeQueryClient } from '#client/app/query-client.ts';
import { mirrorDraft } from '#client/features/contribute/draft-mirror.ts';
import { formOf } from '#client/features/contribute/entry-form.ts';
import { Component as ContributePage } from '#client/routes/contribute/page.tsx';
import { mergePatch } from '#server/features/entries/merge-patch.ts';
import { contributor, json, refusal, standIn, type Asked } from '../accounts/account-server.ts';
import { draftOf, emptyPreview, energy } from './contribute-samples.ts';

// A whole page with its typing takes seconds on a busy machine.
vi.setConfig({ testTimeout: 20_000 });
afterEach(() => vi.unstubAllGlobals());

interface Server {
  draft?: EntryInput;
  lock?: number;
  preview?: (input: EntryInput) => Partial<Preview>;
  answer?: (asked: Asked) => Promise<Response> | undefined;
}

/** A stand-in that keeps one draft and its lock. */
function serve({ draft, lock = 1, preview = () => ({}), answer = () => undefined }: Server) {
  const kept = { input: draft ?? {}, lock };
  const send = () => json(draftOf(kept.input, { lock: kept.lock }), 200, { ETag: `"1.${kept.lock}"` });
  const log = standIn((asked) => {
    const own = answer(asked);
    if (own) return own;
    if (asked.path.startsWith('/entries/preview')) return json({ ...emptyPreview, ...preview(asked.body as EntryInput) });
    if (asked.path === '/entries' && asked.method === 'POST') {
      kept.input = asked.body as EntryInput;
      return send();
    }
    if (asked.path === '/entries/K7Q-4MD-2/draft') return send();
    if (asked.path === '/entries/K7Q-4MD-2' && asked.method === 'PATCH') {
      if (asked.headers['If-Match'] !== `"1.${kept.lock}"`) return refusal(412, 'stale-version', 'This was changed since you opened it', 'Look again.');
      kept.input = mergePatch(kept.input, asked.body) as EntryInput;
      kept.lock += 1;
      return send();
    }
    return undefined;
  }, () => contributor);
  return { log, kept };
}

function open(address: string) {
  const router = createMemoryRouter([
    { path: '/contribute', element: <><ContributePage /><Link to="/search">elsewhere</Link></> },
    { path: '/contribute/:accession', element: <><ContributePage /><Link to="/search">elsewhere</Link></> },
    { path: '/contributions', element: <p>my submissions</p> },
    { path: '/search', element: <p>the search</p> },
  ], { initialEntries: [address] });
  render(<QueryClientProvider client={makeQueryClient()}><RouterProvider router={router} /></QueryClientProvider>);
  return router;
}

async function type(label: string, text: string) {
  await userEvent.click(await screen.findByLabelText(label, { selector: 'input, textarea, select' }));
  await userEvent.paste(text);
}
const slow = { timeout: 4000 };

describe('the contribute form', () => {
  it('makes a draft by itself, takes its address, keeps the focus, and shows the conversion', async () => {
    const { kept } = serve({ preview: (input) => (input.quantities ? { quantities: [energy] } : {}) });
    const router = open('/contribute');
    await type('Where in the source', 'Table 2');
    await waitFor(() => expect(router.state.location.pathname).toBe('/contribute/K7Q-4MD-2'), slow);
    expect(document.activeElement).toBe(screen.getByLabelText('Where in the source'));
    await type('As printed', '21.4 ± 1.2');
    expect(await screen.findByLabelText('What the ± is')).toBeTruthy();
    await waitFor(() => expect(kept.input).toEqual({ locator: 'Table 2', quantities: [{ symbol: 'energy', asPrinted: '21.4 ± 1.2', unitAsPrinted: '' }] }), slow);
    const result = screen.getByRole('complementary', { name: 'What it becomes' });
    await waitFor(() => expect(within(result).getByText(/of unknown kind/)).toBeTruthy());
    expect(within(result).getByText('Thermochemical calorie, × 4.184 exactly', { exact: false })).toBeTruthy();
    expect(screen.getAllByText(/^Saved \d\d:\d\d$/).length).toBeGreaterThan(0);
  });

  it('offers the missing free site and takes it in one press', async () => {
    serve({
      preview: (input) => (input.step?.equation === 'NH3* -> NH2* + H*'
        ? { faults: [{ path: 'step.equation', message: 'not balanced: 1 site more on the right', suggestion: 'NH3* + * -> NH2* + H*' }] } : {}),
    });
    open('/contribute');
    await type('Equation', 'NH3* -> NH2* + H*');
    await userEvent.click(await screen.findByRole('button', { name: 'Add the free site' }));
    expect(screen.getByLabelText<HTMLInputElement>('Equation').value).toBe('NH3* + * -> NH2* + H*');
  });

  it('lists what stands in the way, says it at the fields once submitting was tried, and leads there', async () => {
    serve({ draft: { locator: 'p. 3' }, preview: () => ({ faults: [{ path: 'kind', message: 'Say which kind of value this is.' }] }) });
    open('/contribute/K7Q-4MD-2');
    await screen.findByText('What still stands in the way');
    await waitFor(() => expect(screen.getAllByText(/Say which kind/)).toHaveLength(1));
    await userEvent.click(screen.getAllByRole('button', { name: 'Submit for review' })[0] as HTMLElement);
    await waitFor(() => expect(screen.getByRole('alert').textContent).toContain('2 things stand in the way'));
    expect(screen.getByLabelText('Kind').getAttribute('aria-invalid')).toBe('true');
    await userEvent.click(within(screen.getByRole('alert')).getByRole('button', { name: 'Kind' }));
    expect(document.activeElement).toBe(screen.getByLabelText('Kind'));
  });

  it('submits after a last look, and goes to My submissions', async () => {
    const { log } = serve({
      draft: { locator: 'p. 3', source: { id: 's1' } },
      answer: (asked) => (asked.path === '/entries/K7Q-4MD-2/submit' ? json(draftOf({}, { state: 'submitted' })) : undefined),
    });
    const router = open('/contribute/K7Q-4MD-2');
    await screen.findByText('Ready to submit', {}, slow);
    await userEvent.click(screen.getAllByRole('button', { name: 'Submit for review' })[0] as HTMLElement);
    await userEvent.click(within(await screen.findByRole('dialog')).getByRole('button', { name: 'Submit' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/contributions'));
    expect(log.find((asked) => asked.path.endsWith('/submit'))?.headers['If-Match']).toBe('"1.1"');
  });

  it('meets a change from another window with both versions, and keeps mine over it when told so', async () => {
    const { kept } = serve({ draft: { locator: 'Table 9' } });
    open('/contribute/K7Q-4MD-2');
    await screen.findByLabelText('Note', { selector: 'textarea' });
    Object.assign(kept, { input: { locator: 'Table 10' }, lock: 5 });
    await type('Note', 'mine');
    const dialog = await screen.findByRole('dialog', { name: 'This draft was changed elsewhere' }, slow);
    expect(within(dialog).getByRole('row', { name: 'Where in the source Table 9 Table 10' })).toBeTruthy();
    await userEvent.click(within(dialog).getByRole('button', { name: 'Keep mine over it' }));
    await waitFor(() => expect(kept.input).toEqual({ locator: 'Table 9', note: 'mine' }), slow);
  });

  it('asks before it is left unsaved, keeps what was typed on this device, and brings it back', async () => {
    let down = true;
    const { kept } = serve({
      draft: { locator: 'Table 9' },
      answer: (asked) => (down && asked.method === 'PATCH' ? refusal(503, 'database-unavailable', 'The database does not answer', 'Later.') : undefined),
    });
    const router = open('/contribute/K7Q-4MD-2');
    await type('Note', 'typed in vain');
    await userEvent.click(screen.getByRole('link', { name: 'elsewhere' }));
    await userEvent.click(within(await screen.findByRole('dialog', { name: 'Leave without saving?' }, slow)).getByRole('button', { name: 'Leave' }));
    await screen.findByText('the search');
    down = false;
    await router.navigate('/contribute/K7Q-4MD-2');
    await screen.findByText('Brought back from this device.');
    expect(screen.getByLabelText<HTMLTextAreaElement>('Note', { selector: 'textarea' }).value).toBe('typed in vain');
    await waitFor(() => expect(kept.input.note).toBe('typed in vain'), slow);
    expect(window.localStorage.getItem('sillstone.draft.u2.K7Q-4MD-2')).toBeNull();
  });

  it('brings nothing back that another person typed on this device', async () => {
    mirrorDraft('somebody-else', null, { form: formOf({ note: 'not yours' }), etag: null, at: '2026-03-14T09:00:00Z' });
    serve({});
    open('/contribute');
    expect((await screen.findByLabelText<HTMLTextAreaElement>('Note', { selector: 'textarea' })).value).toBe('');
  });

  it('says that a submitted entry is frozen', async () => {
    serve({ answer: (asked) => (asked.path.endsWith('/draft') ? json(draftOf({}, { state: 'under-review', actions: ['withdraw'] })) : undefined) });
    open('/contribute/K7Q-4MD-2');
    expect(await screen.findByText('This entry is under review and cannot be edited')).toBeTruthy();
  });
});

describe('the source of an entry', () => {
  const found = {
    doi: '10.5555/aisk.1994.0412', source: null, title: 'T', authors: 'Vantongeren', year: 1994, container: 'J', citation: 'Vantongeren, L. (1994). T. J.',
    status: 'retracted', notice: 'Retracted on 15 June 2026.', entries: [{ accession: 'AAA-AAA-A', equation: 'N2 + 2* -> 2N*', surface: 'Ru(0001)', asPrinted: '1.25 eV', state: 'accepted' }],
  };
  it.each<[string, () => Promise<Response>, RegExp[]]>([
    ['found', () => json(found), [/Vantongeren, L\. \(1994\)/, /This source is retracted\./, /Already entered from this source: 1/]],
    ['not registered', () => refusal(404, 'doi-not-found', 'The DOI is not registered', 'No.'), [/This DOI is not registered\./]],
    ['not to be looked up now', () => refusal(503, 'doi-service-unavailable', 'The DOI service does not answer', 'It did not answer within ten seconds.'), [/could not be looked up now/, /Go on with the rest of the form/]],
  ])('by a DOI that is %s', async (_, answer, words) => {
    const { kept } = serve({ answer: (asked) => (asked.path.startsWith('/doi/') ? answer() : undefined) });
    open('/contribute');
    await type('DOI, BibTeX or RIS', 'https://doi.org/10.5555/AISK.1994.0412');
    for (const one of words) expect((await screen.findAllByText(one)).length).toBeGreaterThan(0);
    await waitFor(() => expect(kept.input.source).toEqual({ doi: '10.5555/aisk.1994.0412' }), slow);
  });

  it('is typed where there is no DOI', async () => {
    const { kept } = serve({});
    open('/contribute');
    await userEvent.click(await screen.findByRole('button', { name: 'Type the citation instead' }));
    await type('Title', 'On a ruthenium surface');
    await waitFor(() => expect(kept.input.source).toEqual({ csl: { type: 'article-journal', title: 'On a ruthenium surface' } }), slow);
  });

  it('that is none of the three is said to be so', async () => {
    serve({});
    open('/contribute');
    await type('DOI, BibTeX or RIS', 'Vantongeren 1994');
    await userEvent.click(screen.getByRole('button', { name: 'Look up' }));
    expect(screen.getByText(/This is no DOI, BibTeX entry or RIS record/)).toBeTruthy();
  });
});
