import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import type { AllFilterCounts, EntryFilter } from '#shared/contracts/entry-search.ts';
import { QuerySentence } from '#client/features/entries/components/query-sentence.tsx';
import { counts } from './search-server.ts';

function Sentence({ start = {}, given = counts, collections }: { start?: EntryFilter; given?: AllFilterCounts | null; collections?: { id: string; name: string }[] }) {
  const [filter, setFilter] = useState<EntryFilter>(start);
  return (
    <>
      <QuerySentence filter={filter} counts={given} vocabulary={undefined} collections={collections} onChange={(change) => setFilter((before) => ({ ...before, ...change }))} />
      <output>{JSON.stringify(filter)}</output>
    </>
  );
}

const asked = () => JSON.parse(screen.getByRole('status', { hidden: false }).textContent ?? '{}') as EntryFilter;
const further = async (user: ReturnType<typeof userEvent.setup>) => {
  await user.click(screen.getByRole('button', { name: /^Add to the question/ }));
  return screen.getAllByRole('option').map((option) => option.textContent);
};

describe('query sentence', () => {
  it('offers states and collections to those alone who have them', async () => {
    const user = userEvent.setup();
    const { unmount } = render(<Sentence />);
    expect(await further(user)).not.toContain('State');
    unmount();
    render(<Sentence given={{ ...counts, state: [{ value: 'submitted', label: 'submitted', count: 3 }] }} collections={[{ id: 'c1', name: 'My list' }]} />);
    expect(await further(user)).toEqual(expect.arrayContaining(['State', 'Your collection']));
  });

  it('says a collection by its name, and one that is not there without', () => {
    const { rerender } = render(<Sentence start={{ collection: ['c1'] }} collections={[{ id: 'c1', name: 'My list' }]} />);
    expect(screen.getByRole('button', { name: 'Your collection: My list' })).toBeTruthy();
    rerender(<Sentence start={{ collection: ['c1'] }} collections={[]} />);
    expect(screen.getByRole('button', { name: 'Your collection: a collection of yours' })).toBeTruthy();
  });

  it('takes a range of temperatures that must hold as a whole, and says what is wrong with it', async () => {
    const user = userEvent.setup();
    render(<Sentence />);
    await user.click(screen.getByRole('button', { name: 'Valid at: any temperature' }));
    await user.keyboard('{Tab}700{Tab}500{Enter}');
    expect(screen.getByText('The range ends below its beginning.')).toBeTruthy();
    await user.clear(screen.getByLabelText('from, K'));
    await user.type(screen.getByLabelText('from, K'), '400 K{Enter}');
    expect(asked()).toEqual({ validFrom: 400, validTo: 500 });
    expect(screen.getByRole('group').getAttribute('aria-label')).toContain('valid over 400 to 500 K');
  });

  it('takes names that no list has, and one answer about the uncertainty', async () => {
    const user = userEvent.setup();
    render(<Sentence given={{ ...counts, hasUncertainty: [{ value: 'true', label: '', count: 1 }, { value: 'false', label: '', count: 2 }] }} />);
    await further(user);
    await user.keyboard('author{Enter}');
    await user.keyboard('Tillinghast, Okafor{Enter}');
    await further(user);
    await user.keyboard('uncertainty{Enter}');
    await user.click(screen.getByRole('option', { name: /^a known/ }));
    await user.click(screen.getByRole('option', { name: /^no known/ }));
    expect(asked()).toEqual({ author: ['Tillinghast', 'Okafor'], hasUncertainty: false });
  });

  it('offers what finds nothing, so that it can be asked', async () => {
    const user = userEvent.setup();
    render(<Sentence />);
    await further(user);
    await user.keyboard('site{Enter}');
    await user.click(screen.getByRole('option', { name: /^step edge 0/ }));
    expect(asked()).toEqual({ site: ['step-edge'] });
  });

  it('waits for the list before words are taken as they are', async () => {
    const user = userEvent.setup();
    const { rerender } = render(<Sentence given={null} />);
    await user.click(screen.getByRole('button', { name: /^Elementary step/ }));
    await user.keyboard('nitrogen');
    expect(screen.queryAllByRole('option')).toEqual([]);
    rerender(<Sentence />);
    expect(screen.getAllByRole('option').map((option) => option.textContent)).toEqual(['“nitrogen” read as words']);
  });
});
