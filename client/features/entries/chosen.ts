import { useSyncExternalStore } from 'react';
import type { Entry } from '#shared/contracts/entries.ts';

/** A chosen row: enough to act on when its page of rows is no longer shown. */
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

/**
 * Takes over which accessions are chosen now. They stay chosen over pages, filters, sorting and other screens;
 * `shown` are the rows among which newly chosen ones are found.
 */
export function setChosen(accessions: ReadonlySet<string>, shown: readonly Entry[]): void {
  const next = new Map([...chosen].filter(([accession]) => accessions.has(accession)));
  for (const { accession, source } of shown) {
    if (accessions.has(accession) && !next.has(accession)) next.set(accession, { accession, sourceId: source?.id ?? null });
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
