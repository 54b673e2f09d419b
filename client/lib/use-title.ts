import { useEffect } from 'react';

/** Names the page in the window's title: "Search · Sillstone". */
export function useTitle(title: string): void {
  useEffect(() => {
    document.title = title ? `${title} · Sillstone` : 'Sillstone';
  }, [title]);
}
