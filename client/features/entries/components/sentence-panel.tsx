import { useState, type ReactNode } from 'react';
import { Button } from '#client/ui/button.tsx';
import { FieldError } from '#client/ui/field.tsx';
import { useFloating } from '#client/ui/popover.tsx';

interface SentencePanelProps {
  /** What is set: "Year of publication". */
  label: string;
  /** The words in the sentence; null while nothing is set. */
  words: string | null;
  unset: string;
  /** Called when the panel opens, to begin with what is set. */
  onOpen: () => void;
  /** Reads the fields and sets them; words in its answer say what is wrong. */
  onSet: () => string | null;
  onClear: () => void;
  /** The fields. */
  children: ReactNode;
  /** A value offered in one press. */
  offer?: { label: string; onTake: () => void } | undefined;
}

/** A button in the sentence that opens a few fields: set by Enter, left by Escape. */
export function SentencePanel({ label, words, unset, onOpen, onSet, onClear, children, offer }: SentencePanelProps) {
  const { open, show, hide, root, button, panel } = useFloating();
  const [error, setError] = useState<string | null>(null);
  const said = words ?? unset;
  return (
    <span className="picker" ref={root}>
      <button
        ref={button}
        type="button"
        className={`sentence-button ${words === null ? 'sentence-unset' : 'sentence-set'}`}
        aria-haspopup="dialog"
        aria-expanded={open}
        aria-label={`${label}: ${said}`}
        onClick={() => {
          setError(null);
          onOpen();
          if (open) hide();
          else show();
        }}
      >
        {said}
      </button>
      {open && (
        <div className="floating floating-panel picker-panel left-0 p-4" ref={panel} tabIndex={-1} role="dialog" aria-label={label}>
          <form
            className="flex flex-col gap-3"
            noValidate
            onSubmit={(event) => {
              event.preventDefault();
              const wrong = onSet();
              setError(wrong);
              if (wrong === null) hide();
            }}
          >
            {children}
            <FieldError id={`${label.replaceAll(' ', '-')}-error`} error={error} />
            <div className="flex flex-wrap gap-2">
              <Button type="submit" look="primary" small>Set</Button>
              {offer && <Button small onClick={() => { offer.onTake(); hide(); }}>{offer.label}</Button>}
              {words !== null && <Button small look="quiet" onClick={() => { onClear(); hide(); }}>{unset.replace(/^./, (first) => first.toUpperCase())}</Button>}
            </div>
          </form>
        </div>
      )}
    </span>
  );
}
