import { useEffect, useId, useRef, type ReactNode } from 'react';
import { createPortal } from 'react-dom';

interface DialogProps {
  open: boolean;
  title: ReactNode;
  onClose: () => void;
  children: ReactNode;
  /** The buttons at the foot, the one that acts first. */
  actions?: ReactNode;
}

/**
 * A question above the page, by the browser's own dialog: focus is kept inside, Escape closes, the focus returns to where it was.
 * It stands at the end of the document, so that it looks the same wherever it is asked.
 */
export function Dialog({ open, title, onClose, children, actions }: DialogProps) {
  const id = useId();
  const element = useRef<HTMLDialogElement>(null);
  const before = useRef<HTMLElement | null>(null);

  useEffect(() => {
    const dialog = element.current;
    if (!dialog) return;
    if (open && !dialog.open) {
      before.current = document.activeElement as HTMLElement | null;
      dialog.showModal();
    }
    if (!open && dialog.open) dialog.close();
    return () => {
      if (!open) return;
      if (dialog.open) dialog.close();
      before.current?.focus();
    };
  }, [open]);

  return createPortal(
    <dialog
      ref={element}
      className="dialog"
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || event.defaultPrevented) return;
        event.preventDefault();
        onClose();
      }}
    >
      {open && (
        <>
          <h2 id={id}>{title}</h2>
          <div className="pt-3">{children}</div>
          {actions && <div className="flex flex-wrap gap-3 pt-5">{actions}</div>}
        </>
      )}
    </dialog>,
    document.body,
  );
}
