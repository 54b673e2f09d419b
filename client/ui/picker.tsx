import { useId, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';
import { useOptionSearch } from './option-search.ts';
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
  group?: string;
}

interface PickerProps<Value extends string> {
  /** What is chosen: "Metal". */
  label: string;
  /** The words in the sentence: "Ru, Ni", or "any surface" while nothing is chosen. */
  summary: ReactNode;
  /** The same as text, for those who listen, where the words are more than text. */
  summaryText?: string;
  options: readonly PickerOption<Value>[];
  chosen: readonly Value[];
  onChange: (chosen: Value[]) => void;
  multiple?: boolean;
  /** A field to search in; by default when there are more than eight. */
  search?: boolean;
  /** The words that take back all choices: "Any metal". */
  clearLabel?: string;
  buttonClassName?: string;
  footer?: ReactNode;
}

const mostShown = 200;

/** A button in a sentence that opens a list to choose from: searched by typing, moved through by arrows, left by Escape. */
export function Picker<Value extends string>(props: PickerProps<Value>) {
  const { label, summary, summaryText, options, chosen, multiple = true, buttonClassName } = props;
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
        <div className="floating floating-panel picker-panel left-0" ref={panel}>
          <PickerList {...props} multiple={multiple} options={options} id={id} onDone={hide} />
        </div>
      )}
    </span>
  );
}

interface PickerListProps<Value extends string> extends PickerProps<Value> {
  id: string;
  onDone: () => void;
}

function PickerList<Value extends string>(
  { label, options, chosen, onChange, multiple = true, search = options.length > 8, clearLabel, footer, id, onDone }: PickerListProps<Value>,
) {
  const [typed, setTyped] = useState('');
  const list = useRef<HTMLUListElement>(null);
  const found = useOptionSearch(options, typed.trim());
  const shown = found.slice(0, mostShown);
  const [active, setActive] = useState(() => Math.max(0, options.findIndex((option) => chosen.includes(option.value))));
  const at = Math.min(active, shown.length - 1);

  function move(to: number) {
    const next = Math.max(0, Math.min(shown.length - 1, to));
    setActive(next);
    list.current?.children[next]?.scrollIntoView({ block: 'nearest' });
  }

  function toggle(option: PickerOption<Value> | undefined) {
    if (!option) return;
    if (!multiple) {
      onChange([option.value]);
      onDone();
      return;
    }
    onChange(chosen.includes(option.value) ? chosen.filter((value) => value !== option.value) : [...chosen, option.value]);
  }

  function onKey(event: KeyboardEvent) {
    const moves: Record<string, number> = {
      ArrowDown: at + 1, ArrowUp: at - 1, PageDown: at + 8, PageUp: at - 8, ...(search ? {} : { Home: 0, End: shown.length - 1 }),
    };
    const to = moves[event.key];
    if (to !== undefined) {
      event.preventDefault();
      move(to);
    } else if (event.key === 'Enter' || (event.key === ' ' && !search)) {
      event.preventDefault();
      toggle(shown[at]);
    }
  }

  const activeId = shown[at] ? `${id}-${at}` : undefined;
  return (
    <>
      {search && (
        <input
          className="control picker-search"
          type="text"
          role="combobox"
          data-autofocus
          autoComplete="off"
          spellCheck={false}
          aria-label={`Find in: ${label}`}
          aria-expanded="true"
          aria-controls={`${id}-list`}
          aria-activedescendant={activeId}
          placeholder={`find in ${options.length}`}
          value={typed}
          onChange={(event) => {
            setTyped(event.target.value);
            setActive(0);
          }}
          onKeyDown={onKey}
        />
      )}
      <ul
        id={`${id}-list`}
        ref={list}
        role="listbox"
        aria-label={label}
        aria-multiselectable={multiple || undefined}
        className="picker-list"
        tabIndex={search ? -1 : 0}
        data-autofocus={search ? undefined : true}
        aria-activedescendant={search ? undefined : activeId}
        onKeyDown={search ? undefined : onKey}
      >
        {shown.map((option, index) => (
          <li
            key={option.value}
            id={`${id}-${index}`}
            role="option"
            aria-selected={chosen.includes(option.value)}
            className={`picker-option ${index === at ? 'picker-active' : ''}`}
            onPointerMove={() => setActive(index)}
            onPointerDown={(event) => event.preventDefault()}
            onClick={() => toggle(option)}
          >
            <span className="picker-tick" aria-hidden="true" />
            <span className="min-w-0 flex-1">
              {option.display ?? option.label}
              {option.group && <span className="picker-group">{option.group}</span>}
            </span>
            {option.count !== undefined && (
              <span className={`picker-count ${option.count === 0 ? 'opacity-60' : ''}`}>
                {option.count}<span className="sr-only">{option.count === 1 ? ' entry' : ' entries'}</span>
              </span>
            )}
          </li>
        ))}
      </ul>
      {shown.length === 0 && <p className="picker-note" role="status">Nothing here is spelled like “{typed.trim()}”.</p>}
      {found.length > shown.length && <p className="picker-note">{`${found.length - shown.length} more; type to find them.`}</p>}
      {(footer || (clearLabel && chosen.length > 0)) && (
        <div className="picker-foot">
          {footer}
          {clearLabel && chosen.length > 0 && (
            <button type="button" className="link-button" onClick={() => { onChange([]); onDone(); }}>{clearLabel}</button>
          )}
        </div>
      )}
    </>
  );
}
