import { useRef } from 'react';

interface RowChoice {
  /** Chooses a row or lets it go; with Shift all rows from the last one pressed to this. */
  press: (id: string, extend: boolean) => void;
  /** Chooses from one row to another, as Shift and an arrow do. */
  extendTo: (from: string, to: string) => void;
}

/** How rows are chosen: one by one, or a run of them from where the last was pressed. */
export function useRowChoice(ids: readonly string[], chosen: ReadonlySet<string>, onChosen: ((chosen: Set<string>) => void) | undefined): RowChoice {
  const anchor = useRef<string | null>(null);

  function put(some: readonly string[], chooses: boolean) {
    const next = new Set(chosen);
    for (const id of some) {
      if (chooses) next.add(id);
      else next.delete(id);
    }
    onChosen?.(next);
  }

  return {
    press: (id, extend) => {
      const chooses = !chosen.has(id);
      const run = extend && anchor.current !== null ? between(ids, anchor.current, id) : [];
      put(run.length > 0 ? run : [id], chooses);
      anchor.current = id;
    },
    extendTo: (from, to) => {
      put([from, to], true);
      anchor.current = to;
    },
  };
}

/** The rows from one to another, both included, whichever comes first; none when one of them is not in the list. */
function between(ids: readonly string[], one: string, other: string): readonly string[] {
  const [from, to] = [ids.indexOf(one), ids.indexOf(other)].sort((a, b) => a - b);
  return from === undefined || to === undefined || from < 0 ? [] : ids.slice(from, to + 1);
}
