import { useRef, useState, type KeyboardEvent } from 'react';
import { useOptionSearch } from './option-search.ts';
import { readRecent, rememberRecent } from './picker-recent.ts';
import type { PickerOption, PickerProps } from './picker.tsx';

const mostShown = 200;

interface PickerListProps<Value extends string> extends PickerProps<Value> {
  id: string;
  onDone: () => void;
}

/** The list of a picker with its search field, its sections and its foot. */
export function PickerList<Value extends string>({
  label, options, chosen, onChange, multiple = true, search = options.length > 8, placeholder, asTyped, onType, recent, empty = 'There is nothing to choose from.', clearLabel, footer, id, onDone,
}: PickerListProps<Value>) {
  const [typed, setTyped] = useState('');
  const field = useRef<HTMLInputElement>(null);
  // Read once, so that the list does not move under the hand that chooses from it.
  const [lately] = useState<readonly string[]>(() => (recent ? readRecent(recent) : []));
  const untyped = () => recentFirst(options, lately).filter(({ deep, value }) => !deep || chosen.includes(value) || lately.includes(value));
  const text = typed.trim();
  const found = useOptionSearch(options, text);
  const own = text && asTyped ? asTyped(text) : null;
  const listed = text ? withTyped(found, own) : untyped();
  const shown = listed.slice(0, mostShown);
  const [active, setActive] = useState(() => Math.max(0, untyped().findIndex(({ value }) => chosen.includes(value))));
  const at = Math.min(active, shown.length - 1);

  function move(to: number) {
    const next = Math.max(0, Math.min(shown.length - 1, to));
    setActive(next);
    document.getElementById(`${id}-${next}`)?.scrollIntoView({ block: 'nearest' });
  }

  function toggle(option: PickerOption<Value> | undefined) {
    if (!option) return;
    const adds = !chosen.includes(option.value);
    if (recent && adds) rememberRecent(recent, option.value);
    if (!multiple) {
      onChange([option.value], option.value);
      onDone();
      return;
    }
    onChange(adds ? [...chosen, option.value] : chosen.filter((value) => value !== option.value), option.value);
    // The next word typed begins a new search, without the old one having to be deleted.
    field.current?.select();
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
  const row = (option: PickerOption<Value>, index: number) => (
    <div
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
        {option.group && <>{' '}<span className="picker-group">{option.group}</span></>}
      </span>
      {option.count !== undefined && (
        <>{' '}<span className={`picker-count ${option.count === 0 ? 'opacity-60' : ''}`}>
          {option.count}<span className="sr-only">{option.count === 1 ? ' entry' : ' entries'}</span>
        </span></>
      )}
    </div>
  );
  return (
    <>
      {search && (
        <input
          className="control picker-search"
          ref={field}
          type="text"
          role="combobox"
          data-autofocus
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          aria-label={`Find in: ${label}`}
          aria-expanded="true"
          aria-controls={`${id}-list`}
          aria-activedescendant={activeId}
          placeholder={placeholder ?? `find in ${options.length}`}
          value={typed}
          onChange={(event) => {
            setTyped(event.target.value);
            setActive(0);
            onType?.(event.target.value.trim());
          }}
          onKeyDown={onKey}
        />
      )}
      <div
        id={`${id}-list`}
        role="listbox"
        aria-label={label}
        aria-multiselectable={multiple || undefined}
        className="picker-list"
        tabIndex={search ? -1 : 0}
        data-autofocus={search ? undefined : true}
        aria-activedescendant={search ? undefined : activeId}
        onKeyDown={search ? undefined : onKey}
      >
        {text ? shown.map(row) : sectionsOf(shown).map(({ name, from, options: some }) => (name === undefined
          ? some.map((option, index) => row(option, from + index))
          : (
            <div key={`section ${name}`} role="group" aria-label={name}>
              <span className="picker-section" aria-hidden="true">{name}</span>
              {some.map((option, index) => row(option, from + index))}
            </div>
          )))}
      </div>
      {shown.length === 0 && <p className="picker-note" role="status">{text && options.length > 0 ? `Nothing here is spelled like “${text}”.` : empty}</p>}
      {listed.length > shown.length && <p className="picker-note">{`${listed.length - shown.length} more; type to find them.`}</p>}
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

/** What is found in the list, and what is offered for the text itself. */
function withTyped<Value extends string>(found: readonly PickerOption<Value>[], own: { option: PickerOption<Value>; first: boolean } | null): readonly PickerOption<Value>[] {
  if (!own) return found;
  const others = found.filter(({ value }) => value !== own.option.value);
  return own.first ? [own.option, ...others] : [...others, own.option];
}

/** The last choices before the others, each once. */
function recentFirst<Value extends string>(options: readonly PickerOption<Value>[], lately: readonly string[]): readonly PickerOption<Value>[] {
  const recents = lately.flatMap((value) => options.find((option) => option.value === value) ?? []).map((option) => ({ ...option, section: 'recent' }));
  if (recents.length === 0) return options;
  const sectioned = options.some(({ section }) => section !== undefined);
  const rest = options.filter(({ value }) => !lately.includes(value));
  return [...recents, ...(sectioned ? rest : rest.map((option) => ({ ...option, section: 'all' })))];
}

interface Section<Value extends string> {
  name: string | undefined;
  from: number;
  options: PickerOption<Value>[];
}

/** The options that follow one another under one heading. */
function sectionsOf<Value extends string>(options: readonly PickerOption<Value>[]): Section<Value>[] {
  const sections: Section<Value>[] = [];
  options.forEach((option, index) => {
    const last = sections.at(-1);
    if (last && last.name === option.section) last.options.push(option);
    else sections.push({ name: option.section, from: index, options: [option] });
  });
  return sections;
}
