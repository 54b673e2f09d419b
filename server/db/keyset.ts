import { createHash } from 'node:crypto';
import { Refusal } from '#server/refusal.ts';

/** Where a page ended: the values of the sort columns of its last row. */
export type Position = (string | number | null)[];

/**
 * Page markers: opaque to clients and bound to the question they were given for, so that a marker of another search is refused,
 * and so is one whose position was changed. `question` is whatever the page depends on (filter, sort, temperature).
 */
export function writeCursor(position: Position, question: unknown): string {
  return Buffer.from(JSON.stringify([fingerprint([question, position]), ...position]), 'utf8').toString('base64url');
}

export function readCursor(cursor: string, question: unknown, columns: number): Position {
  let parts: unknown;
  try {
    parts = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    throw new Refusal('cursor-invalid');
  }
  if (!Array.isArray(parts) || parts.length !== columns + 1 || parts[0] !== fingerprint([question, parts.slice(1)])) throw new Refusal('cursor-invalid', 'The page marker does not belong to this search. Start again from the first page.');
  const position = parts.slice(1) as unknown[];
  if (!position.every((part) => part === null || typeof part === 'string' || (typeof part === 'number' && Number.isFinite(part)))) throw new Refusal('cursor-invalid');
  return position as Position;
}

function fingerprint(question: unknown): string {
  return createHash('sha256').update(JSON.stringify(question)).digest('base64url').slice(0, 12);
}
