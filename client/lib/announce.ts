type Listener = (text: string) => void;

const listeners = new Set<Listener>();

/** Says a short sentence to people who listen to the page: results found, work finished, a page opened. */
export function announce(text: string): void {
  for (const listener of listeners) listener(text);
}

/** Hears what is announced; the live region of the shell does. */
export function onAnnounce(listener: Listener): () => void {
  listeners.add(listener);
  return () => {
    listeners.delete(listener);
  };
}
