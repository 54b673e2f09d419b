import type { EntryInput } from '#shared/contracts/entries.ts';
import { sameJson } from './merge-patch.ts';

/** The parts of an entry's input in words, in the order of the form. */
const partNames: Readonly<Record<keyof EntryInput, string>> = {
  source: 'Source', locator: 'Where in the source', step: 'Elementary step', surface: 'Surface', kind: 'Kind', provenance: 'How the source came by it',
  scope: 'Stands for', method: 'Method', quantities: 'Quantities', correlation: 'Correlation', rateOf: 'What the rate counts',
  kineticOrders: 'Orders', conditions: 'Conditions', validRange: 'Valid range', note: 'Note',
};

/** What differs between two versions of a draft, part by part, as text. */
export function differingParts(mine: EntryInput, theirs: EntryInput): { name: string; mine: string; theirs: string }[] {
  return (Object.keys(partNames) as (keyof EntryInput)[])
    .filter((part) => !sameJson(mine[part], theirs[part]))
    .map((part) => ({ name: partNames[part], mine: inWords(mine[part]), theirs: inWords(theirs[part]) }));
}

/** Any part of the input as a line of text. */
export function inWords(value: unknown): string {
  if (value === undefined || value === null || value === '') return 'empty';
  if (Array.isArray(value)) return value.length === 0 ? 'empty' : value.map(inWords).join(' | ');
  if (typeof value === 'object') {
    const members = Object.entries(value).filter(([, one]) => one !== undefined && one !== null && one !== '');
    return members.length === 0 ? 'empty' : members.map(([name, one]) => `${wordsOfName(name)}${inWords(one)}`).join(', ');
  }
  return String(value);
}

const silent = new Set(['equation', 'asPrinted', 'unitAsPrinted', 'symbol', 'metal', 'formula', 'doi', 'class', 'technique']);

function wordsOfName(name: string): string {
  if (silent.has(name)) return '';
  // The unit at the end of a name belongs to programs.
  return `${name.replace(/(KPerS|PerM2|Langmuir|K|Nm)$/, '').replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase()} `;
}
