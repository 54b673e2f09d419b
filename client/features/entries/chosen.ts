import { useSyncExternalStore } from 'react';
import type { Entry } from '#shared/contracts/entries.ts';

/** A chosen row: enough to say what it is when its page of rows is no longer shown. */
export interface ChosenEntry {
  accession: string;
  sourceId: string | null;
}

type Chosen = ReadonlyMap<string, ChosenEntry>;

let chosen: Chosen = new Map();
const listeners = new Set<() => void>();

function put(next: Chosen): void {
  chosen = next;
  for (const listener of listeners) listener();
}

/** Chooses entries or lets them go. They stay chosen over pages, filters, sorting and other screens. */
export function choose(entries: readonly Entry[], on: boolean): void {
  const next = new Map(chosen);
  for (const { accession, source } of entries) {
    if (on) next.set(accession, { accession, sourceId: source?.id ?? null });
    else next.delete(accession);
  }
  put(next);
}

/** Lets all chosen entries go. */
export function clearChosen(): void {
  put(new Map());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
}

/** The chosen entries, in the order they were chosen. */
export function useChosen(): Chosen {
  return useSyncExternalStore(subscribe, () => chosen);
}
