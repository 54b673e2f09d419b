import type { ReactNode } from 'react';
import { kindWord, type Kind } from '#shared/domain/kinds.ts';
import type { SortKey } from '#shared/contracts/entry-search.ts';
import type { EntryRow } from '../table-rows.ts';

const symbols: Partial<Record<Kind, ReactNode>> = {
  'activation-energy': <>E<sub>a</sub></>,
  'barrier': <>E<sub>a</sub></>,
  'rate-constant': 'k',
  'pre-exponential': 'A',
  'kie': 'KIE',
  'sticking': <>s<sub>0</sub></>,
  'reaction-energy': <>ΔE</>,
  'adsorption-energy': <>E<sub>ads</sub></>,
};

/** The sort of a quantity; the server sorts by no other. */
const sorts: Readonly<Record<string, SortKey>> = { energy: 'energy', preExponential: 'preExponential', rateConstant: 'k' };

/** The heading of the value column: the symbol when all rows hold the same quantity, else only "value", which is sorted by the energies in it. */
export function valueHeading(rows: readonly EntryRow[], kinds: readonly Kind[] | undefined): { node: ReactNode; text: string; sort: SortKey | null } {
  const held = new Set(rows.map(({ figure }) => figure?.shown.quantity.symbol));
  const [only] = held;
  const sort = held.size === 1 && only !== undefined ? sorts[only] ?? null : held.has('energy') || held.size === 0 ? 'energy' : null;
  const [kind] = kinds ?? [];
  if (held.size === 1 && held.has('energy')) return { node: symbols['activation-energy'], text: 'Activation energy', sort };
  if (held.size === 1 && kind && kinds?.length === 1) return { node: symbols[kind] ?? kindWord[kind], text: kindWord[kind].replace(/^./, (first) => first.toUpperCase()), sort };
  return { node: 'value', text: 'Converted value', sort };
}
