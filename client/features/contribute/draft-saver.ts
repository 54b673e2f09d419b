import type { EntryForEditing, EntryInput } from '#shared/contracts/entries.ts';
import { isApiError } from '#client/lib/api-error.ts';
import { mergePatch } from './merge-patch.ts';
import { isWorthSaving } from './read-form.ts';

/** A draft with the tag of what was seen. */
export interface HeldDraft {
  draft: EntryForEditing;
  etag: string | null;
}

/** What the saver needs of the server. */
export interface DraftStore {
  create: (input: EntryInput) => Promise<HeldDraft>;
  patch: (accession: string, patch: Record<string, unknown>, etag: string | null) => Promise<HeldDraft>;
  load: (accession: string) => Promise<HeldDraft>;
}

export type SaveState =
  | { kind: 'nothing' }
  | { kind: 'unsaved' }
  | { kind: 'saving' }
  | { kind: 'saved'; at: Date }
  | { kind: 'failed'; error: unknown }
  /** The draft was changed elsewhere since it was last seen here. */
  | { kind: 'conflict'; theirs: HeldDraft };

export interface SaverView {
  state: SaveState;
  accession: string | null;
  /** The server's last answer. */
  draft: EntryForEditing | null;
  etag: string | null;
}

const pauseMs = 1000;

/**
 * Keeps the draft on the server in step with the form: one request at a time, each on top of the version last seen.
 * What changes while a request is on its way goes with the next one.
 */
export class DraftSaver {
  private readonly listeners = new Set<() => void>();
  private view: SaverView;
  /** What the server is known to hold. */
  private base: EntryInput;
  private latest: EntryInput;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private running: Promise<boolean> | null = null;

  constructor(private readonly store: DraftStore, start: HeldDraft | null, base: EntryInput = {}) {
    this.base = base;
    this.latest = base;
    this.view = { state: { kind: 'nothing' }, accession: start?.draft.accession ?? null, draft: start?.draft ?? null, etag: start?.etag ?? null };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => {
      this.listeners.delete(listener);
    };
  };

  readonly snapshot = (): SaverView => this.view;

  private set(change: Partial<SaverView>): void {
    this.view = { ...this.view, ...change };
    for (const listener of this.listeners) listener();
  }

  /** Whether the form holds what the server does not. */
  isBehind(): boolean {
    if (this.view.accession === null) return isWorthSaving(this.latest);
    return Object.keys(mergePatch(this.base, this.latest)).length > 0;
  }

  /** Takes what the form now says; it is saved when the typing pauses. */
  change(input: EntryInput): void {
    this.latest = input;
    if (!this.isBehind() || this.view.state.kind === 'conflict') return;
    if (this.view.state.kind !== 'saving') this.set({ state: { kind: 'unsaved' } });
    this.stopTimer();
    this.timer = setTimeout(() => void this.save(), pauseMs);
  }

  /** Saves now what is not saved yet; gives whether the server holds all of it. */
  async save(): Promise<boolean> {
    this.stopTimer();
    if (this.running) await this.running;
    if (this.view.state.kind === 'conflict') return false;
    if (!this.isBehind()) return true;
    this.running = this.send();
    const done = await this.running;
    this.running = null;
    if (done && this.isBehind()) this.change(this.latest);
    return done && !this.isBehind();
  }

  private async send(): Promise<boolean> {
    const sent = this.latest;
    const { accession, etag } = this.view;
    this.set({ state: { kind: 'saving' } });
    try {
      const held = accession === null
        ? await this.store.create(sent)
        : await this.store.patch(accession, mergePatch(this.base, sent), etag);
      this.base = sent;
      this.set({ state: { kind: 'saved', at: new Date() }, accession: held.draft.accession, draft: held.draft, etag: held.etag });
      return true;
    } catch (error) {
      if (accession !== null && isApiError(error, 'stale-version', 'precondition-required')) await this.meetConflict(accession, error);
      else this.set({ state: { kind: 'failed', error } });
      return false;
    }
  }

  private async meetConflict(accession: string, error: unknown): Promise<void> {
    try {
      this.set({ state: { kind: 'conflict', theirs: await this.store.load(accession) } });
    } catch {
      this.set({ state: { kind: 'failed', error } });
    }
  }

  /** Goes on from the other version: what only this form held is given up. The form is filled anew by the caller with `base`. */
  takeTheirs(base: EntryInput): void {
    const { state } = this.view;
    if (state.kind !== 'conflict') return;
    this.base = base;
    this.latest = base;
    this.set({ state: { kind: 'saved', at: new Date() }, draft: state.theirs.draft, etag: state.theirs.etag });
  }

  /** Writes this form's version over the other one, which the person has seen. */
  async keepMine(): Promise<boolean> {
    const { state } = this.view;
    if (state.kind !== 'conflict') return false;
    this.base = state.theirs.draft.input;
    this.set({ state: { kind: 'unsaved' }, draft: state.theirs.draft, etag: state.theirs.etag });
    return this.save();
  }

  /** Goes on from the server's version as it was opened, what was kept on this device being given up. */
  restart(held: HeldDraft | null, base: EntryInput): void {
    this.stopTimer();
    this.base = base;
    this.latest = base;
    this.set({ state: { kind: 'nothing' }, draft: held?.draft ?? null, etag: held?.etag ?? null });
  }

  /** Saves nothing more by itself: the page is gone, and what was typed is kept on this device. */
  rest(): void {
    this.stopTimer();
  }

  private stopTimer(): void {
    if (this.timer !== null) clearTimeout(this.timer);
    this.timer = null;
  }
}
