import { useState } from 'react';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';

/** Copies a text; says whether it did. */
export function CopyButton({ text, label, copied }: { text: string; label: string; copied: string }) {
  const [state, setState] = useState<'idle' | 'done' | 'failed'>('idle');
  async function copy() {
    try {
      await navigator.clipboard.writeText(text);
      setState('done');
      announce(copied);
    } catch {
      setState('failed');
      announce('The browser did not allow the copy. Select the text and copy it by hand.');
    }
  }
  return (
    <Button onClick={() => void copy()} onBlur={() => setState('idle')}>
      {state === 'done' ? copied.replace(/\.$/, '') : state === 'failed' ? 'Not copied: select by hand' : label}
    </Button>
  );
}
