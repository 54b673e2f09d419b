import { useId, type ReactNode } from 'react';
import { PickerList } from './picker-list.tsx';
import { useFloating } from './popover.tsx';

export interface PickerOption<Value extends string = string> {
  value: Value;
  /** What is searched and, without `display`, shown. */
  label: string;
  display?: ReactNode;
  /** Entries that would be found with it. */
  count?: number;
  /** Other spellings that find it. */
  also?: string;
  /** A quiet word beside it: the name of a symbol, the class of a step. */
  group?: string;
  /** Found by typing only (or when chosen), so that the list itself stays short. */
  deep?: boolean;
  /** The heading under which it stands while nothing is typed; options of one section follow one another. */
  section?: string;
}

/** What is offered for a text that need not be in the list. */
export interface TypedOption<Value extends string = string> {
  option: PickerOption<Value>;
  /** Before those found in the list, since it is the likelier meaning. */
  first: boolean;
}

export interface PickerProps<Value extends string> {
  /** What is chosen: "Metal". */
  label: string;
  /** The words in the sentence: "Ru, Ni", or "any surface" while nothing is chosen. */
  summary: ReactNode;
  /** The same as text, for those who listen, where the words are more than text. */
  summaryText?: string;
  options: readonly PickerOption<Value>[];
  chosen: readonly Value[];
  /** With the one value whose choice changed, when it was one. */
  onChange: (chosen: Value[], toggled?: Value) => void;
  multiple?: boolean;
  /** A field to search in; by default when there are more than eight. */
  search?: boolean;
  /** What the field says it takes: "equation, species, class or bond". */
  placeholder?: string;
  /** Accepts what is typed as it is. */
  asTyped?: (typed: string) => TypedOption<Value> | null;
  /** Hears each change of what is typed, to fetch what reading it needs. */
  onType?: (typed: string) => void;
  /** A name under which the last choices are remembered on this device and shown first. */
  recent?: string;
  /** What is said in the place of an empty list. */
  empty?: string;
  /** The words that take back all choices: "Any metal". */
  clearLabel?: string;
  buttonClassName?: string;
  footer?: ReactNode;
}

/** A button in a sentence that opens a list to choose from: searched by typing, moved through by arrows, left by Escape. */
export function Picker<Value extends string>(props: PickerProps<Value>) {
  const { label, summary, summaryText, chosen, multiple = true, buttonClassName } = props;
  const { open, show, hide, root, button, panel } = useFloating();
  const id = useId();
  const words = summaryText ?? (typeof summary === 'string' ? summary : `${chosen.length} chosen`);
  const look = buttonClassName ?? `sentence-button ${chosen.length > 0 ? 'sentence-set' : 'sentence-unset'}`;
  return (
    <span className="picker" ref={root}>
      <button
        ref={button}
        type="button"
        className={look}
        aria-haspopup="listbox"
        aria-expanded={open}
        aria-controls={open ? `${id}-list` : undefined}
        aria-label={`${label}: ${words}`}
        onClick={() => (open ? hide() : show())}
        onKeyDown={(event) => {
          if (open || (event.key !== 'ArrowDown' && event.key !== 'ArrowUp')) return;
          event.preventDefault();
          show();
        }}
      >
        {summary}
      </button>
      {open && (
        <div className="floating floating-panel picker-panel left-0" ref={panel} tabIndex={-1}>
          <PickerList {...props} multiple={multiple} id={id} onDone={hide} />
        </div>
      )}
    </span>
  );
}
