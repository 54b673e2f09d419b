import { useCallback, useEffect, useId, useState } from 'react';
import { useLocation, useNavigationType, useSearchParams } from 'react-router-dom';
import { useDebounced } from '#client/lib/use-debounced.ts';
import { instrumentParams, longestAddress, ownAddress, printTyped, readTypedFrom, type LeftOut } from './address.ts';
import type { Sheet } from './sheet.ts';
import type { Typed } from './typed.ts';

export interface TypedState {
  typed: Typed;
  /** Parts of the address that made no sense when it was opened. */
  leftOut: readonly LeftOut[];
  /** The address of what is typed is longer than a link can be: it is not written. */
  tooLong: boolean;
  onValue: (param: string, text: string) => void;
  onRows: (param: string, rows: string[][]) => void;
  /** A choice: it adds to the history, so that Back undoes it. */
  onChoice: (param: string, value: string) => void;
  /** The whole form at once. */
  onAll: (typed: Typed) => void;
}

/** The name in the history's state that says which page wrote an address. */
const writtenBy = 'workbench';

/** The form as it is typed, kept in the address: the address is written once typing rests, and read when it changes from outside. */
export function useTyped(sheet: Sheet): TypedState {
  const [params, setParams] = useSearchParams();
  const location = useLocation();
  const kind = useNavigationType();
  const page = useId();
  const own = ownAddress(params);
  const [state, setState] = useState(() => ({ ...readTypedFrom(sheet, params), own, key: location.key }));
  if (own !== state.own || location.key !== state.key) {
    const mine = kind !== 'POP' && (location.state as Record<string, unknown> | null)?.[writtenBy] === page;
    setState({ ...state, ...(own === state.own || mine ? {} : readTypedFrom(sheet, params)), own, key: location.key });
  }

  const { typed, leftOut } = state;
  const tooLong = printTyped(sheet, typed).toString().length > longestAddress;
  const setTyped = useCallback((make: (typed: Typed) => Typed) => setState((before) => ({ ...before, typed: make(before.typed) })), []);

  const write = useCallback((next: Typed, replace: boolean) => {
    const printed = printTyped(sheet, next);
    if (printed.toString().length > longestAddress || ownAddress(printed) === own) return;
    for (const name of instrumentParams) {
      const value = params.get(name);
      if (value !== null) printed.set(name, value);
    }
    setParams(printed, { replace, preventScrollReset: true, state: { [writtenBy]: page } });
  }, [sheet, own, params, setParams, page]);

  const settled = useDebounced(typed, 300);
  useEffect(() => {
    if (settled === typed) write(settled, true);
  }, [settled, typed, write]);

  const onValue = useCallback((param: string, text: string) => {
    setTyped((before) => ({ ...before, values: { ...before.values, [param]: text } }));
  }, [setTyped]);
  const onRows = useCallback((param: string, rows: string[][]) => {
    setTyped((before) => ({ ...before, tables: { ...before.tables, [param]: rows } }));
  }, [setTyped]);
  const onChoice = (param: string, value: string) => {
    const next = { ...typed, values: { ...typed.values, [param]: value } };
    setTyped(() => next);
    write(next, false);
  };
  const onAll = (next: Typed) => {
    setTyped(() => next);
    write(next, false);
  };
  return { typed, leftOut, tooLong, onValue, onRows, onChoice, onAll };
}
