import { useEffect, useState, useSyncExternalStore } from 'react';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { draftStore } from './api.ts';
import { forgetMirror, mirrorDraft, mirroredDraft } from './draft-mirror.ts';
import { DraftSaver, type HeldDraft, type SaverView } from './draft-saver.ts';
import { emptyForm, formOf, type EntryForm } from './entry-form.ts';
import { sameJson } from './merge-patch.ts';
import { readForm } from './read-form.ts';

export interface Opened {
  saver: DraftSaver;
  /** What the form starts with. */
  form: EntryForm;
  /** When what is in the form was typed here without having reached the server; null when the server has it all. */
  restoredFrom: string | null;
}

/** Opens a draft, or a new one: the server's version, or what was typed on this device and did not reach it. A new one may come filled in part. */
export function openDraft(start: HeldDraft | null, userId: string, prefill?: EntryInput): Opened {
  const form = start ? formOf(start.draft.input) : prefill ? formOf(prefill) : emptyForm();
  // What the form makes of the server's input is the base: a form must not count as changed by being opened.
  const base = start ? readForm(form).input : {};
  const mirrored = mirroredDraft(userId, start?.draft.accession ?? null);
  if (!mirrored || sameJson(readForm(mirrored.form).input, base)) return { saver: new DraftSaver(draftStore, start, base), form, restoredFrom: null };
  // Saved on top of the version the typing started from: when the draft has moved on since, the server says so and both are shown.
  const from = start ? { ...start, etag: mirrored.etag ?? start.etag } : null;
  return { saver: new DraftSaver(draftStore, from, base), form: { ...emptyForm(), ...mirrored.form }, restoredFrom: mirrored.at };
}

/** Keeps the draft saved while the form is typed in, and mirrored on this device until the server has it. */
export function useDraft(start: HeldDraft | null, userId: string, prefill?: EntryInput): Opened & { view: SaverView } {
  const [opened] = useState(() => openDraft(start, userId, prefill));
  const view = useSyncExternalStore(opened.saver.subscribe, opened.saver.snapshot);
  return { ...opened, view };
}

/** Follows the form: hands its input to the saver and keeps the form on this device while the server is behind. */
export function useKeeping(saver: DraftSaver, view: SaverView, form: EntryForm, input: EntryInput, userId: string): void {
  const { accession, state, etag } = view;
  useEffect(() => {
    const onHide = () => {
      if (document.visibilityState === 'hidden') void saver.save();
    };
    document.addEventListener('visibilitychange', onHide);
    return () => {
      document.removeEventListener('visibilitychange', onHide);
      saver.rest();
    };
  }, [saver]);

  useEffect(() => {
    saver.change(input);
  }, [saver, input]);

  // After the saver has taken the input, and again whenever it has moved.
  useEffect(() => {
    if (saver.isBehind()) mirrorDraft(userId, accession, { form, etag, at: new Date().toISOString() });
    else forgetMirror(userId, accession);
    if (accession !== null) forgetMirror(userId, null);
  }, [saver, form, accession, etag, userId, state]);
}
