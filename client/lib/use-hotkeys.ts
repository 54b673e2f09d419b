import { useEffect, useRef } from 'react';

/** Single keys that act on the page while nobody is typing and nothing is open above it. */
export function useHotkeys(keys: Readonly<Record<string, (event: KeyboardEvent) => void>>): void {
  const latest = useRef(keys);
  useEffect(() => {
    latest.current = keys;
  });
  useEffect(() => {
    function onKey(event: KeyboardEvent) {
      if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
      const target = event.target as HTMLElement | null;
      if (target?.closest('input, textarea, select, dialog, [contenteditable="true"], [role="listbox"], [role="dialog"]')) return;
      latest.current[event.key]?.(event);
    }
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, []);
}
