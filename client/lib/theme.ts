import { useCallback } from 'react';
import { readStored, useLocalStorage } from './local-storage.ts';

export const themes = ['system', 'light', 'dark'] as const;
export type Theme = (typeof themes)[number];

const key = 'sillstone.theme';

function asTheme(text: string | null): Theme {
  return themes.find((theme) => theme === text) ?? 'system';
}

/** Sets the theme on the document; the system's own is the absence of a choice. */
export function applyTheme(theme: Theme = asTheme(readStored(key))): void {
  if (theme === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
}

/** The reader's theme and its setter; remembered on this device. */
export function useTheme(): [Theme, (theme: Theme) => void] {
  const [stored, store] = useLocalStorage(key, 'system');
  const set = useCallback((theme: Theme) => {
    applyTheme(theme);
    store(theme);
  }, [store]);
  return [asTheme(stored), set];
}
