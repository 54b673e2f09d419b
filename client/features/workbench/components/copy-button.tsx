import { useState } from 'react';
import { announce } from '#client/lib/announce.ts';
import { Button } from '#client/ui/button.tsx';

interface CopyButtonProps {
  label: string;
  /** What is said when it is done: "Link copied". */
  copied: string;
  text: () => string;
  disabled?: boolean;
}

/** Copies a text that is made when it is asked for; says whether it did. */
export function CopyButton({ label, copied, text, disabled }: CopyButtonProps) {
  const [state, setState] = useState<'idle' | 'done' | 'failed'>('idle');
  async function copy() {
    try {
      await navigator.clipboard.writeText(text());
      setState('done');
      announce(`${copied}.`);
    } catch {
      setState('failed');
      announce('The browser did not allow the copy.');
    }
  }
  return (
    <Button small disabled={disabled} onClick={() => void copy()} onBlur={() => setState('idle')}>
      {state === 'done' ? copied : state === 'failed' ? 'Not copied: the browser refused' : label}
    </Button>
  );
}
