import type { EntryInput } from '#shared/contracts/entries.ts';
import { symbolWords } from '#shared/domain/kinds.ts';

const partWords: Readonly<Partial<Record<keyof EntryInput, string>>> = {
  kind: 'Kind', scope: 'Scope', provenance: 'Provenance', step: 'Elementary step', surface: 'Surface', source: 'Source', locator: 'Where in the source',
  method: 'Method', correlation: 'Correlation', rateOf: 'What the rate counts', kineticOrders: 'Reported orders', conditions: 'Conditions', validRange: 'Valid range', note: 'Note',
};

function show(value: unknown): string {
  if (value === undefined || value === null || value === '') return 'not reported';
  if (typeof value !== 'object') return String(value);
  return Object.entries(value).filter(([, part]) => part !== undefined).map(([name, part]) => `${name}: ${typeof part === 'object' ? JSON.stringify(part) : String(part)}`).join('; ') || 'not reported';
}

const showQuantity = (quantity: NonNullable<EntryInput['quantities']>[number] | undefined): string =>
  quantity ? `${quantity.asPrinted} ${quantity.unitAsPrinted}${quantity.uncertaintyKind ? ` (${quantity.uncertaintyKind})` : ''}`.trim() : 'not given';

/** What differs between two revisions, part by part, as printed. */
export function listChanges(before: EntryInput, after: EntryInput): { field: string; before: string; after: string }[] {
  const changes: { field: string; before: string; after: string }[] = [];
  for (const [part, field] of Object.entries(partWords) as [keyof EntryInput, string][]) {
    const [was, is] = [show(before[part]), show(after[part])];
    if (was !== is) changes.push({ field, before: was, after: is });
  }
  const symbols = new Set([...(before.quantities ?? []), ...(after.quantities ?? [])].map(({ symbol }) => symbol));
  for (const symbol of symbols) {
    const find = (input: EntryInput) => input.quantities?.find((quantity) => quantity.symbol === symbol);
    const [was, is] = [showQuantity(find(before)), showQuantity(find(after))];
    if (was !== is) changes.push({ field: symbolWords[symbol], before: was, after: is });
  }
  return changes;
}
