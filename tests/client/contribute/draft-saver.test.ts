import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { EntryForEditing, EntryInput } from '#shared/contracts/entries.ts';
import { ApiError } from '#client/lib/api-error.ts';
import { DraftSaver, type DraftStore, type HeldDraft } from '#client/features/contribute/draft-saver.ts';

const held = (input: EntryInput, lock: number, accession = 'K7Q-4MD-2'): HeldDraft =>
  ({ draft: { accession, input, lock } as EntryForEditing, etag: `"1.${lock}"` });
const refused = (code: 'stale-version' | 'network') => new ApiError({ status: code === 'network' ? 0 : 412, code, title: 'T', detail: 'D' });

/** A server in memory, with one draft and its lock. */
function memoryStore() {
  let input: EntryInput = {};
  let lock = 0;
  const calls: unknown[][] = [];
  const store: DraftStore = {
    create: (first) => {
      calls.push(['create', first]);
      [input, lock] = [first, 1];
      return Promise.resolve(held(input, lock));
    },
    patch: (accession, patch, etag) => {
      calls.push(['patch', patch, etag]);
      if (etag !== `"1.${lock}"`) return Promise.reject(refused('stale-version'));
      input = Object.fromEntries(Object.entries({ ...input, ...patch }).filter(([, value]) => value !== null));
      lock += 1;
      return Promise.resolve(held(input, lock, accession));
    },
    load: () => Promise.resolve(held(input, lock)),
  };
  return { store, calls, edit: (next: EntryInput) => { input = next; lock += 1; }, now: () => input };
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());
const pause = () => vi.advanceTimersByTimeAsync(1000);

describe('the draft saver', () => {
  it('makes the draft at the first thing worth keeping, then sends what changed on top of what it saw', async () => {
    const { store, calls } = memoryStore();
    const saver = new DraftSaver(store, null);
    saver.change({ kind: 'kie' });
    await pause();
    expect(calls).toEqual([]);
    saver.change({ kind: 'kie', locator: 'T' });
    saver.change({ kind: 'kie', locator: 'Table 2' });
    await pause();
    saver.change({ locator: 'Table 2', note: 'n' });
    await pause();
    expect(calls).toEqual([['create', { kind: 'kie', locator: 'Table 2' }], ['patch', { kind: null, note: 'n' }, '"1.1"']]);
    expect(saver.snapshot()).toMatchObject({ accession: 'K7Q-4MD-2', etag: '"1.2"', state: { kind: 'saved' } });
    expect(saver.isBehind()).toBe(false);
  });

  it('keeps one request on its way; what is typed meanwhile goes with the next', async () => {
    const { store, calls } = memoryStore();
    let answer: () => void = () => undefined;
    const create = store.create;
    store.create = (input) => new Promise((resolve) => { answer = () => resolve(create(input)); });
    const saver = new DraftSaver(store, null);
    saver.change({ locator: 'a' });
    await pause();
    saver.change({ locator: 'ab' });
    await pause();
    expect(saver.snapshot().state.kind).toBe('saving');
    answer();
    await pause();
    expect(calls).toEqual([['create', { locator: 'a' }], ['patch', { locator: 'ab' }, '"1.1"']]);
  });

  it('does not count a form as changed by being opened', async () => {
    const { store, calls } = memoryStore();
    const saver = new DraftSaver(store, held({ note: 'n' }, 1), { note: 'n' });
    saver.change({ note: 'n' });
    await pause();
    expect(calls).toEqual([]);
  });

  it('says when saving failed, and saves with the next change or on request', async () => {
    const { store, now } = memoryStore();
    const create = store.create;
    store.create = () => Promise.reject(refused('network'));
    const saver = new DraftSaver(store, null);
    saver.change({ note: 'n' });
    await pause();
    expect(saver.snapshot().state.kind).toBe('failed');
    store.create = create;
    expect(await saver.save()).toBe(true);
    expect(now()).toEqual({ note: 'n' });
  });

  describe('when the draft was changed elsewhere', () => {
    async function conflict() {
      const memory = memoryStore();
      const saver = new DraftSaver(memory.store, null);
      saver.change({ locator: 'Table 9' });
      await pause();
      memory.edit({ locator: 'Table 10' });
      saver.change({ locator: 'Table 9', note: 'mine' });
      await pause();
      return { ...memory, saver };
    }

    it('shows their version, writes nothing over it, and rests', async () => {
      const { saver, calls, now } = await conflict();
      expect(saver.snapshot().state).toMatchObject({ kind: 'conflict', theirs: { draft: { input: { locator: 'Table 10' } } } });
      saver.change({ locator: 'Table 9', note: 'mine still' });
      await pause();
      expect(await saver.save()).toBe(false);
      expect(calls).toHaveLength(2);
      expect(now()).toEqual({ locator: 'Table 10' });
    });

    it('keeps mine over it when asked', async () => {
      const { saver, now } = await conflict();
      expect(await saver.keepMine()).toBe(true);
      expect(now()).toEqual({ locator: 'Table 9', note: 'mine' });
    });

    it('takes theirs when asked, and goes on from there', async () => {
      const { saver, now } = await conflict();
      saver.takeTheirs({ locator: 'Table 10' });
      expect(saver.isBehind()).toBe(false);
      saver.change({ locator: 'Table 10', note: 'after' });
      await pause();
      expect(now()).toEqual({ locator: 'Table 10', note: 'after' });
    });
  });
});
