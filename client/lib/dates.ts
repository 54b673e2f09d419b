const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

/** A date as the pages write it: "14 Mar 2026", in the reader's time zone; "not a date" text is given back as it is. */
export function formatDate(iso: string): string {
  const date = parseIso(iso);
  if (!date) return iso;
  return `${date.getDate()} ${months[date.getMonth()]} ${date.getFullYear()}`;
}

/** A date with the time of day: "14 Mar 2026, 09:05". */
export function formatDateTime(iso: string): string {
  const date = parseIso(iso);
  if (!date) return iso;
  const two = (n: number) => String(n).padStart(2, '0');
  return `${formatDate(iso)}, ${two(date.getHours())}:${two(date.getMinutes())}`;
}

/** How long ago, in the largest whole unit: "just now", "40 min", "5 h", "3 days". */
export function formatAge(iso: string, now: Date = new Date()): string {
  const date = parseIso(iso);
  if (!date) return iso;
  const minutes = Math.floor((now.getTime() - date.getTime()) / 60_000);
  if (minutes < 1) return 'just now';
  if (minutes < 60) return `${minutes} min`;
  const hours = Math.floor(minutes / 60);
  if (hours < 48) return `${hours} h`;
  return `${Math.floor(hours / 24)} days`;
}

function parseIso(iso: string): Date | null {
  // A bare date is a day, not an instant: read as UTC it would slip a day west of Greenwich.
  const date = /^\d{4}-\d{2}-\d{2}$/.test(iso) ? new Date(`${iso}T00:00:00`) : new Date(iso);
  return Number.isNaN(date.getTime()) ? null : date;
}
