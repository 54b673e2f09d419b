import { useCallback, useSyncExternalStore } from 'react';

/** Reads a remembered value; the browser may refuse storage, which is the same as nothing remembered. */
export function readStored(key: string): string | null {
  try {
    return window.localStorage.getItem(key);
  } catch {
    return null;
  }
}

/** Remembers a value on this device, where the browser allows it. */
export function writeStored(key: string, value: string): void {
  try {
    window.localStorage.setItem(key, value);
  } catch {
    // Refused or full: the value holds until the page is closed.
  }
  for (const listener of listeners) listener();
}

const listeners = new Set<() => void>();

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  window.addEventListener('storage', listener);
  return () => {
    listeners.delete(listener);
    window.removeEventListener('storage', listener);
  };
}

/** A text remembered on this device under a key, with its setter. */
export function useLocalStorage(key: string, fallback: string): [string, (value: string) => void] {
  const value = useSyncExternalStore(subscribe, () => readStored(key) ?? fallback);
  const set = useCallback((next: string) => writeStored(key, next), [key]);
  return [value, set];
}
