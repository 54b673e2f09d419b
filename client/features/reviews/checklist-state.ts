import type { Checklist } from '#shared/contracts/reviews.ts';
import { checklistPoints, type ChecklistPoint } from '#shared/domain/review.ts';

/** How far the eight points are answered. */
export interface ChecklistStanding {
  answered: number;
  open: ChecklistPoint[];
  refused: ChecklistPoint[];
  /** All answered, none with no: the submission may be accepted. */
  complete: boolean;
}

/** Counts the answers of a checklist. */
export function standingOf(checklist: Checklist): ChecklistStanding {
  const open = checklistPoints.filter((point) => checklist[point] === undefined);
  const refused = checklistPoints.filter((point) => checklist[point] === 'no');
  return { answered: checklistPoints.length - open.length, open, refused, complete: open.length === 0 && refused.length === 0 };
}

/** Why accepting is not open, in words; null when it is. */
export function whyNotAccept({ open, refused }: ChecklistStanding): string | null {
  if (open.length > 0) return `Accept is open once all eight are answered, none with no: ${open.length === 1 ? 'one is' : `${open.length} are`} not answered yet.`;
  if (refused.length > 0) return `Accept is closed: ${refused.length === 1 ? 'one point is' : `${refused.length} points are`} answered no. Return it to the contributor, or reject it.`;
  return null;
}

/** The point after or before another, staying at the ends. */
export function neighbourPoint(point: ChecklistPoint | null, by: 1 | -1): ChecklistPoint {
  if (point === null) return by === 1 ? checklistPoints[0] : checklistPoints[checklistPoints.length - 1] as ChecklistPoint;
  const index = Math.max(0, Math.min(checklistPoints.length - 1, checklistPoints.indexOf(point) + by));
  return checklistPoints[index] as ChecklistPoint;
}
