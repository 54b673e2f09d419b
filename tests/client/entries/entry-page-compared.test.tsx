import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { EntryChanges, EntryDetail, ReverseConsistency } from '#shared/contracts/entries.ts';
import { Component as EntryPage } from '#client/routes/entry/entry-page.tsx';
import { entryDetail, relatedEntry } from './entry-detail.ts';
import { energy } from './entry-samples.ts';

const versions: EntryDetail['revisions'] = [
  { revision: 1, version: 1, state: 'superseded', at: '2026-01-02T10:00:00Z' }, { revision: 2, version: 2, state: 'accepted', at: '2026-03-14T10:00:00Z' },
  { revision: 3, version: null, state: 'draft', at: '2026-03-20T10:00:00Z' },
];

const changes: EntryChanges = {
  accession: '222-222-2', from: { revision: 1, version: 1, state: 'superseded', contributor: 'T. Adeyemi-Holt', at: '2026-01-02T10:00:00Z' },
  to: { revision: 2, version: 2, state: 'accepted', contributor: 'T. Adeyemi-Holt', at: '2026-03-14T10:00:00Z' },
  changes: [{ field: 'Where in the source', before: 'Table 2', after: 'Table 3' }],
  quantities: [{ symbol: 'energy', before: energy({ value: 186 }), after: energy({ value: 190 }) }],
};

/** The page in a browser whose server answers with this entry, and with these changes. */
function open(address: string, entry: EntryDetail, answer: unknown = changes, status = 200) {
  const fetched: string[] = [];
  vi.stubGlobal('fetch', vi.fn((url: string) => {
    fetched.push(url);
    const asked = url.includes('/changes') ? answer : url.includes('/entries/') ? entry : { demonstration: true };
    return Promise.resolve(new Response(JSON.stringify(asked), { status: url.includes('/changes') ? status : 200, headers: { 'Content-Type': 'application/json' } }));
  }));
  const router = createMemoryRouter([{ path: '/entries/:accession', Component: EntryPage }, { path: '/entries/:accession/v/:version', Component: EntryPage }], { initialEntries: [address] });
  render(<QueryClientProvider client={new QueryClient({ defaultOptions: { queries: { retry: false } } })}><RouterProvider router={router} /></QueryClientProvider>);
  return { fetched, router, user: userEvent.setup() };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('two versions side by side', () => {
  const entry = entryDetail({ version: 2, revision: 2, revisions: versions });

  it('the version before is one press away, and the choice is in the address', async () => {
    const { user, router, fetched } = open('/entries/222-222-2?T=650', entry);
    await user.click(await screen.findByRole('button', { name: 'Compare with the version before' }));
    expect(router.state.location.search).toBe('?T=650&from=1&to=2');
    expect(await screen.findByRole('columnheader', { name: 'version 1' })).toBeTruthy();
    const row = screen.getByRole('rowheader', { name: 'Where in the source' }).closest('tr') as HTMLElement;
    expect(within(row).getAllByRole('cell').map((cell) => cell.textContent)).toEqual(['Table 2', 'Table 3']);
    const converted = screen.getByRole('rowheader', { name: 'Activation energy, converted' }).closest('tr') as HTMLElement;
    expect(within(converted).getAllByRole('cell')[1]?.textContent).toMatch(/^190\.0\s±\s3\.0\skJ\/mol/);
    expect(fetched.filter((url) => url.includes('/changes'))).toEqual(['/api/v1/entries/222-222-2/changes?from=1&to=2']);
  });

  it('another pair is picked, a revision that is not public among them', async () => {
    const { user, router } = open('/entries/222-222-2?from=1&to=2', entry);
    await user.selectOptions(await screen.findByRole('combobox', { name: 'To' }), 'revision 3, draft, 20 Mar 2026');
    expect(router.state.location.search).toBe('?from=1&to=r3');
    await user.click(screen.getByRole('button', { name: 'Close' }));
    expect(router.state.location.search).toBe('');
  });

  it('the first version is set against the one after it', async () => {
    const { user, router } = open('/entries/222-222-2/v/1', entryDetail({ state: 'superseded', revisions: versions }));
    await user.click(await screen.findByRole('button', { name: 'Compare with the version after' }));
    expect(router.state.location.search).toBe('?from=1&to=2');
  });

  it('a revision withdrawn in between is passed over', async () => {
    const between = { revision: 2, version: null, state: 'withdrawn' as const, at: '2026-02-02T10:00:00Z' };
    const { user, router } = open('/entries/222-222-2', entryDetail({ version: 2, revision: 3, revisions: [...versions.slice(0, 1), between, { revision: 3, version: 2, state: 'accepted', at: '2026-03-14T10:00:00Z' }] }));
    await user.click(await screen.findByRole('button', { name: 'Compare with the version before' }));
    expect(router.state.location.search).toBe('?from=1&to=2');
  });

  it('takes the focus when it is opened, not when it is linked to', async () => {
    const { user } = open('/entries/222-222-2', entry);
    await user.click(await screen.findByRole('button', { name: 'Compare with the version before' }));
    expect(document.activeElement).toBe(screen.getByRole('heading', { name: 'Two versions side by side' }));
  });

  it('says that nothing differs', async () => {
    open('/entries/222-222-2?from=1&to=2', entry, { ...changes, changes: [], quantities: [] });
    expect(await screen.findByText(/^Nothing differs/)).toBeTruthy();
  });

  it('a link to a version that may not be seen says so in the words of the answer', async () => {
    open('/entries/222-222-2?from=1&to=r9', entry, { type: 'about:blank', title: 'There is nothing here', status: 404, detail: 'Revision 9 of entry 222-222-2 was not found.', code: 'not-found', requestId: 'r' }, 404);
    expect(await screen.findByText('Revision 9 of entry 222-222-2 was not found.')).toBeTruthy();
    expect(screen.getByRole<HTMLSelectElement>('combobox', { name: 'To' }).value).toBe('r9');
  });

  it('an entry with one version has nothing to compare', async () => {
    open('/entries/222-222-2', entryDetail());
    await screen.findByRole('heading', { level: 1, name: /Associative/ });
    expect(screen.queryByRole('button', { name: /Compare with/ })).toBeNull();
  });
});

describe('the reverse', () => {
  const figures = { energyType: 'electronic' as const, differenceKJPerMol: 30, uDifferenceKJPerMol: 5, derivation: [], assumption: null };
  const held = { accession: '222-224-6', label: 'Halvorsen 2003', valueKJPerMol: 60, uKJPerMol: 0.5 };
  const back = (consistency: ReverseConsistency) => entryDetail({ reverse: [{ ...relatedEntry({ accession: '222-225-3', label: 'Brandvold 2001', bound: '=' }), consistency }] });
  const notice = (words: RegExp) => screen.findByText((_, element) => element?.classList.contains('notice') === true && words.test((element.textContent ?? '').replace(/\s/g, ' ')));

  it('at odds with a reaction energy raises a check', async () => {
    open('/entries/222-222-2', back({ ...figures, status: 'inconsistent', reactionEnergy: held, closureErrorKJPerMol: -30, normalizedError: 2.985 }));
    expect(await notice(/^At odds beyond the uncertainties\..*30 ± 5 kJ\/mol.*electronic reaction energy of Halvorsen 2003 is 60.0 ± 0.5 kJ\/mol; the two differ by −30.*, En = 3.0 \(consistent up to 1/)).toBeTruthy();
    expect(await notice(/^At odds with the reverse\. With the reverse of Brandvold 2001, forward less reverse is 30 ± 5 kJ\/mol/)).toBeTruthy();
  });

  it.each<[string, ReverseConsistency, RegExp]>([
    ['consistent', { ...figures, status: 'consistent', reactionEnergy: { ...held, valueKJPerMol: 31 }, closureErrorKJPerMol: -1, normalizedError: 0.1 }, /^Consistent\./],
    ['undecided', { ...figures, uDifferenceKJPerMol: null, status: 'undecided', reactionEnergy: held, closureErrorKJPerMol: -30, normalizedError: null }, /^Not decided\..*an uncertainty is not reported, so that nothing follows/],
    ['without a reaction energy', { ...figures, status: 'no-reaction-energy', reactionEnergy: null, closureErrorKJPerMol: null, normalizedError: null }, /^Nothing to check against\..*No electronic reaction energy is held for this elementary step and surface\./],
  ])('%s is said, and raises no check', async (_, consistency, words) => {
    open('/entries/222-222-2', back(consistency));
    expect(await notice(words)).toBeTruthy();
    expect(screen.getByText(/^None was raised/)).toBeTruthy();
  });

  it('says why two are not compared', async () => {
    open('/entries/222-222-2', back({ status: 'not-compared', reason: 'A limit or a range is not compared with a value.' }));
    expect(await screen.findByText('Not compared with Brandvold 2001: a limit or a range is not compared with a value.')).toBeTruthy();
  });
});

describe('entries of the same step and surface', () => {
  const rate = { lnPreExponential: Math.log(1e13), exponent: 0, referenceTemperatureK: 1, unit: 's-1' };
  const others = [
    relatedEntry({ rate: null }), relatedEntry({ accession: '222-226-0', label: 'Quist 2005', bound: '=', rate }),
    relatedEntry({ accession: '222-227-7', label: 'Ranta 2011', bound: '=', alike: false, energyType: 'electronic', computed: true }),
    relatedEntry({ accession: '222-228-5', label: 'Sallow 2013', bound: '=', rate: { ...rate, unit: 'cm2 s-1' } }),
  ];

  it('stand on one scale with this one where they are of its kind', async () => {
    open('/entries/222-222-2', entryDetail({ sameStepAndSurface: others }));
    expect(await screen.findByRole('img', { name: '3 accepted values for the same step and This entry, Vantongeren 1994 on one scale; the table below has the figures' })).toBeTruthy();
    expect(screen.getAllByText(/^Sørlie 1999, upper limit/).length).toBeGreaterThan(0);
    expect(screen.getByText(/^One more entry is of another kind, scope or promoter and not drawn/)).toBeTruthy();
    const row = screen.getByRole('link', { name: 'Ranta 2011' }).closest('tr') as HTMLElement;
    expect(within(row).getByText('electronic energy barrier')).toBeTruthy();
  });

  it('are not looked for while it is a draft', async () => {
    open('/entries/222-222-2', entryDetail({ state: 'draft', version: null, conversion: null, sameStepAndSurface: [], actions: ['edit'] }));
    expect(await screen.findAllByText('Looked up when the revision is submitted.')).toHaveLength(2);
    expect(screen.getByText(/^Only its contributor, reviewers and curators see this revision/)).toBeTruthy();
  });

  it('are drawn beside k against temperature when asked for, where their k has the same unit', async () => {
    const { user } = open('/entries/222-222-2', entryDetail({ sameStepAndSurface: others }));
    const box = await screen.findByRole('checkbox', { name: /^Draw the other entry for this step and surface/ });
    expect(screen.getByText('One more has k in another unit.')).toBeTruthy();
    expect(screen.getByRole('img', { name: /^Rate constant against temperature/ })).toBeTruthy();
    await user.click(box);
    expect(screen.getByRole('img', { name: /^2 rate constants against temperature/ })).toBeTruthy();
  });
});

describe('citing', () => {
  const sentence = '186 ± 3 kJ/mol for 2N* -> N2 + 2* on Ru(0001), reported by Vantongeren 1994. Sillstone, entry 222-222-2, version 1 (accepted 2026-03-14). /entries/222-222-2/v/1';

  it('the entry: sentence and permalink name the version', async () => {
    const { user } = open('/entries/222-222-2', entryDetail());
    const text = await screen.findByText((words) => words.startsWith(sentence));
    expect(text.textContent).toBe(sentence);
    await user.click(screen.getByRole('button', { name: 'Copy permalink' }));
    expect(await navigator.clipboard.readText()).toBe('/entries/222-222-2/v/1');
    await user.click(screen.getByRole('button', { name: 'Copy citation' }));
    expect(await navigator.clipboard.readText()).toBe('Vantongeren, L. (1994). An invented paper. https://doi.org/10.5555/invented.1');
    expect(screen.getByRole('link', { name: 'Export' }).getAttribute('href')).toContain('accession=222-222-2');
  });

  it.each<[string, Partial<EntryDetail>, RegExp]>([
    ['retracted', { state: 'retracted', actions: [] }, /version 1 \(accepted 2026-03-14, retracted\)/],
    ['not public', { state: 'submitted', version: null, acceptedAt: null, actions: [] }, /This revision is not public: it has no version and cannot be cited yet\./],
  ])('a %s one says so', async (_, change, words) => {
    open('/entries/222-222-2', entryDetail(change));
    expect(await screen.findByText(words)).toBeTruthy();
  });

  it.each([['BibTeX', 'vantongeren1994.bib', '@article{vantongeren1994}'], ['RIS', 'vantongeren1994.ris', 'TY  - JOUR']])('the source as %s', async (button, name, content) => {
    const saved: { name: string; blob: Blob }[] = [];
    let last = new Blob();
    vi.stubGlobal('URL', Object.assign(URL, { createObjectURL: (blob: Blob) => { last = blob; return 'blob:made'; }, revokeObjectURL: () => undefined }));
    const click = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function click(this: HTMLAnchorElement) { saved.push({ name: this.download, blob: last }); });
    const { user } = open('/entries/222-222-2', entryDetail());
    await user.click(await screen.findByRole('button', { name: button }));
    click.mockRestore();
    expect(saved.map((one) => one.name)).toEqual([name]);
    expect(await saved[0]?.blob.text()).toBe(content);
  });
});
