import { isApiError } from '#client/lib/api-error.ts';
import { formatDateTime } from '#client/lib/dates.ts';

export interface RefusalWords {
  title: string;
  text: string;
}

const text = (value: unknown): string | null => (typeof value === 'string' && value ? value : null);
const done: Readonly<Record<string, string>> = { accept: 'accepted it', return: 'returned it', reject: 'rejected it' };

/** What a refused claim or decision means, with who and until when, and what to do. */
export function refusalWords(error: unknown): RefusalWords {
  if (!isApiError(error)) return { title: 'That did not succeed.', text: 'Try again in a moment; nothing was changed.' };
  const by = text(error.context.by);
  if (error.code === 'claimed-by-another') {
    const until = text(error.context.until);
    return {
      title: `${by ?? 'Another reviewer'} holds this submission${until ? ` until ${formatDateTime(until)}` : ''}.`,
      text: 'Your answers and comment are kept here. It comes back to the queue when they release it or the time runs out.',
    };
  }
  if (error.code === 'already-decided') {
    const decision = text(error.context.decision);
    const at = text(error.context.at);
    return {
      title: `${by ?? 'Another reviewer'} has ${done[decision ?? ''] ?? 'decided'}${at ? `, ${formatDateTime(at)}` : ''}.`,
      text: 'That decision stands; yours was not recorded. The page now shows it as it is.',
    };
  }
  if (error.code === 'stale-version') {
    return { title: 'This submission changed since you opened it.', text: 'Nothing was decided. The page now shows it as it is: look at it again, then decide.' };
  }
  if (error.code === 'own-submission') return { title: 'You contributed this value.', text: 'Another reviewer decides on it.' };
  const [first] = error.errors;
  return { title: `${error.title}.`, text: first ? first.message : error.detail };
}
