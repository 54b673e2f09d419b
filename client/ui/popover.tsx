import { useCallback, useEffect, useId, useLayoutEffect, useRef, useState, type ReactNode, type RefObject } from 'react';

interface Floating {
  open: boolean;
  show: () => void;
  /** Closes; the focus goes back to the button unless it has gone elsewhere by itself. */
  hide: (returnFocus?: boolean) => void;
  root: RefObject<HTMLDivElement | null>;
  button: RefObject<HTMLButtonElement | null>;
  panel: RefObject<HTMLDivElement | null>;
}

/** The behaviour of a panel that a button opens: Escape, a press outside, the focus leaving, and staying inside the window. */
export function useFloating(): Floating {
  const [open, setOpen] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  const panel = useRef<HTMLDivElement>(null);

  const show = useCallback(() => setOpen(true), []);
  const hide = useCallback((returnFocus = true) => {
    setOpen(false);
    if (returnFocus) button.current?.focus();
  }, []);

  useEffect(() => {
    if (!open) return;
    function onPointer(event: PointerEvent) {
      if (!root.current?.contains(event.target as Node)) hide(false);
    }
    function onKey(event: KeyboardEvent) {
      if (event.key !== 'Escape') return;
      event.preventDefault();
      event.stopPropagation();
      hide();
    }
    function onFocusOut(event: FocusEvent) {
      const next = event.relatedTarget as Node | null;
      if (next && !root.current?.contains(next)) hide(false);
    }
    const element = root.current;
    document.addEventListener('pointerdown', onPointer);
    element?.addEventListener('keydown', onKey);
    element?.addEventListener('focusout', onFocusOut);
    return () => {
      document.removeEventListener('pointerdown', onPointer);
      element?.removeEventListener('keydown', onKey);
      element?.removeEventListener('focusout', onFocusOut);
    };
  }, [open, hide]);

  useLayoutEffect(() => {
    const element = panel.current;
    if (!open || !element) return;
    element.style.translate = '0';
    const box = element.getBoundingClientRect();
    const room = document.documentElement.clientWidth;
    const margin = 12;
    const over = box.right - (room - margin);
    const shift = over > 0 ? -Math.min(over, box.left - margin) : box.left < margin ? margin - box.left : 0;
    element.style.translate = `${shift}px`;
    // Only now, since focusing a panel that still hangs over the edge would scroll the page sideways.
    element.querySelector<HTMLElement>('[data-autofocus]')?.focus({ preventScroll: true });
    element.scrollIntoView({ block: 'nearest', inline: 'nearest' });
  }, [open]);

  return { open, show, hide, root, button, panel };
}

interface PopoverProps {
  label: ReactNode;
  /** For a button whose words alone do not say what it opens. */
  ariaLabel?: string;
  buttonClassName?: string;
  panelClassName?: string;
  children: (close: () => void) => ReactNode;
  align?: 'start' | 'end';
}

/** A button that opens a panel below it: a menu of links, a few settings. */
export function Popover({ label, ariaLabel, buttonClassName = 'button', panelClassName = '', children, align = 'start' }: PopoverProps) {
  const { open, show, hide, root, button, panel } = useFloating();
  const id = useId();
  return (
    <div className="relative inline-flex" ref={root}>
      <button
        ref={button}
        type="button"
        className={buttonClassName}
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        aria-label={ariaLabel}
        onClick={() => (open ? hide() : show())}
      >
        {label}
      </button>
      {open && (
        // It can hold the focus, so that a press on its words does not take the focus elsewhere and close it.
        <div id={id} ref={panel} tabIndex={-1} className={`floating floating-panel ${align === 'end' ? 'right-0' : 'left-0'} ${panelClassName}`}>
          {children(() => hide())}
        </div>
      )}
    </div>
  );
}
