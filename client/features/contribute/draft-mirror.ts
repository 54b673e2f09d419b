import type { EntryForm } from './entry-form.ts';

/**
 * What is typed and has not reached the server yet, kept on this device per person and draft, so that a closed window,
 * a lost connection or an ended session loses nothing.
 */
export interface Mirrored {
  form: EntryForm;
  /** The version the typing started from. */
  etag: string | null;
  at: string;
}

const keyOf = (userId: string, accession: string | null) => `sillstone.draft.${userId}.${accession ?? 'new'}`;

/** Keeps the form on this device; where the browser refuses, the form holds until the page is closed. */
export function mirrorDraft(userId: string, accession: string | null, mirrored: Mirrored): void {
  try {
    window.localStorage.setItem(keyOf(userId, accession), JSON.stringify(mirrored));
  } catch {
    // Refused or full.
  }
}

/** What was kept, if anything; a record that cannot be read is as none. */
export function mirroredDraft(userId: string, accession: string | null): Mirrored | null {
  try {
    const kept = window.localStorage.getItem(keyOf(userId, accession));
    const parsed = kept ? (JSON.parse(kept) as Partial<Mirrored>) : null;
    // A form kept by an older version of the page may lack fields that this one reads.
    return parsed?.form && Array.isArray(parsed.form.quantities) && parsed.form.source && parsed.form.conditions ? (parsed as Mirrored) : null;
  } catch {
    return null;
  }
}

/** Forgets what was kept: the server has it, or the person gave it up. */
export function forgetMirror(userId: string, accession: string | null): void {
  try {
    window.localStorage.removeItem(keyOf(userId, accession));
  } catch {
    // Nothing was kept then.
  }
}
