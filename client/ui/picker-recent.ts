import { readStored, writeStored } from '#client/lib/local-storage.ts';

/** How many choices of a list are remembered. */
const mostRecent = 5;

const keyOf = (name: string): string => `sillstone.recent.${name}`;

/** What was last chosen in a list on this device, the newest first. */
export function readRecent(name: string): string[] {
  try {
    const stored: unknown = JSON.parse(readStored(keyOf(name)) ?? '[]');
    return Array.isArray(stored) ? stored.filter((one): one is string => typeof one === 'string').slice(0, mostRecent) : [];
  } catch {
    // Somebody else's text under our name: the same as nothing remembered.
    return [];
  }
}

/** Remembers a choice on this device. */
export function rememberRecent(name: string, value: string): void {
  writeStored(keyOf(name), JSON.stringify([value, ...readRecent(name).filter((one) => one !== value)].slice(0, mostRecent)));
}
