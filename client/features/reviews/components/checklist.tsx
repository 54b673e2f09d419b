import { useRef, type KeyboardEvent } from 'react';
import type { Checklist } from '#shared/contracts/reviews.ts';
import { checklistPoints, checklistWords, type ChecklistAnswer, type ChecklistPoint } from '#shared/domain/review.ts';
import { useHotkeys } from '#client/lib/use-hotkeys.ts';
import { neighbourPoint } from '../checklist-state.ts';

const answers: readonly { value: ChecklistAnswer; label: string; spoken: string }[] = [
  { value: 'yes', label: 'yes', spoken: 'yes' },
  { value: 'no', label: 'no', spoken: 'no' },
  { value: 'not-applicable', label: 'n/a', spoken: 'not applicable' },
];

interface ChecklistFieldsProps {
  checklist: Checklist;
  onAnswer: (point: ChecklistPoint, answer: ChecklistAnswer) => void;
  disabled: boolean;
}

/** The eight points held against the paper, each answered yes, no or not applicable; by pointer, by arrows, or by single keys. */
export function ChecklistFields({ checklist, onAnswer, disabled }: ChecklistFieldsProps) {
  const list = useRef<HTMLOListElement>(null);

  function current(): ChecklistPoint | null {
    const row = document.activeElement?.closest<HTMLElement>('[data-point]');
    return checklistPoints.find((point) => point === row?.dataset.point) ?? null;
  }
  function go(to: ChecklistPoint) {
    const row = list.current?.querySelector<HTMLElement>(`[data-point="${to}"]`);
    row?.focus();
    row?.scrollIntoView({ block: 'nearest' });
  }
  function answer(value: ChecklistAnswer) {
    const point = current() ?? checklistPoints.find((one) => checklist[one] === undefined);
    if (!point || disabled) return;
    onAnswer(point, value);
    go(neighbourPoint(point, 1));
  }
  const keys: Readonly<Record<string, () => void>> = {
    j: () => go(neighbourPoint(current(), 1)),
    k: () => go(neighbourPoint(current(), -1)),
    y: () => answer('yes'),
    n: () => answer('no'),
    a: () => answer('not-applicable'),
  };
  useHotkeys(keys);

  /** The page's single keys rest while a field has the focus; an answer just pressed is such a field, and here they go on. */
  function onKey(event: KeyboardEvent) {
    if (!(event.target instanceof HTMLInputElement) || event.ctrlKey || event.metaKey || event.altKey) return;
    const act = keys[event.key];
    if (!act) return;
    event.preventDefault();
    act();
  }

  return (
    <ol ref={list} className="border-t border-hairline" onKeyDown={onKey}>
      {checklistPoints.map((point) => (
        <li
          key={point} data-point={point} tabIndex={-1}
          className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-hairline py-1.5 focus:bg-lichen-tint"
        >
          <span id={`point-${point}`} className="min-w-0">{checklistWords[point]}</span>
          <span role="radiogroup" aria-labelledby={`point-${point}`} className="segments">
            {answers.map(({ value, label, spoken }) => (
              <label key={value} className={value === 'no' && checklist[point] === 'no' ? '!bg-rust-tint !text-rust' : ''}>
                <input
                  type="radio" className="sr-only" name={`point-${point}`} value={value} checked={checklist[point] === value} disabled={disabled}
                  onChange={() => onAnswer(point, value)} aria-label={spoken}
                />
                {label}
              </label>
            ))}
          </span>
        </li>
      ))}
    </ol>
  );
}

/** The single keys, shown where they act. */
export function ChecklistKeys() {
  return (
    <p className="pt-2 text-fine text-second">
      Keys: <kbd>j</kbd> and <kbd>k</kbd> move between the points, <kbd>y</kbd> yes, <kbd>n</kbd> no, <kbd>a</kbd> not applicable.
    </p>
  );
}
