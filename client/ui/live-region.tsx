import { useEffect, useState } from 'react';
import { onAnnounce } from '#client/lib/announce.ts';

/** Where announcements are heard; one on every page. */
export function LiveRegion() {
  const [text, setText] = useState('');
  useEffect(() => onAnnounce((next) => {
    // The same sentence twice is only heard twice when it differs: a no-break space makes it so.
    setText((before) => (before === next ? `${next}\u00a0` : next));
  }), []);
  return <p className="sr-only" role="status" aria-live="polite">{text}</p>;
}
