import { normaliseDoi } from './doi.ts';

/** What a notice says of a source. */
export type NoticeKind = 'retraction' | 'withdrawal' | 'correction' | 'expression-of-concern';

/** A notice about a source, with where we read it. */
export type Notice = {
  kind: NoticeKind;
  /** DOI of the notice itself, where given. */
  doi: string | null;
  /** ISO 8601 date of the notice as far as given. */
  date: string | null;
  /** The words of the service, for instance "Erratum". */
  label: string | null;
  /** Which field said so. */
  basis: 'updated-by' | 'title';
};

/** Whether a source stands: `current`, `corrected`, or `retracted` (also for removed and withdrawn works). */
export type SourceStanding = { status: 'current' | 'corrected' | 'retracted'; notice?: Notice };

const kinds: Readonly<Record<string, NoticeKind>> = {
  retraction: 'retraction', 'partial-retraction': 'correction', removal: 'withdrawal', withdrawal: 'withdrawal',
  correction: 'correction', corrigendum: 'correction', erratum: 'correction', addendum: 'correction', clarification: 'correction',
  'expression-of-concern': 'expression-of-concern', concern: 'expression-of-concern',
};

const gravity: readonly NoticeKind[] = ['correction', 'expression-of-concern', 'withdrawal', 'retraction'];

function dateOf(updated: unknown): string | null {
  if (typeof updated !== 'object' || updated === null) return null;
  const parts: unknown = (updated as Record<string, unknown>)['date-parts'];
  const first: unknown = Array.isArray(parts) ? parts[0] : undefined;
  if (!Array.isArray(first)) return null;
  const [year, month, day] = first.slice(0, 3).map(Number);
  if (year === undefined || !Number.isInteger(year) || year < 1000 || year > 9999) return null;
  const pieces = [String(year)];
  for (const part of [month, day]) {
    if (part === undefined || !Number.isInteger(part) || part < 1 || part > 31) break;
    pieces.push(String(part).padStart(2, '0'));
  }
  return pieces.join('-');
}

function noticeFrom(update: unknown): Notice | null {
  if (typeof update !== 'object' || update === null) return null;
  const record = update as Record<string, unknown>;
  if (typeof record['type'] !== 'string') return null;
  const kind = kinds[record['type'].toLowerCase().replace(/[\s_]+/g, '-')];
  if (kind === undefined) return null;
  return {
    kind,
    doi: typeof record['DOI'] === 'string' ? normaliseDoi(record['DOI']) : null,
    date: dateOf(record['updated']),
    label: typeof record['label'] === 'string' ? record['label'].replace(/[\s\p{Cc}]+/gu, ' ').trim().slice(0, 100) || null : null,
    basis: 'updated-by',
  };
}

function noticeFromTitle(value: unknown): Notice | null {
  const title: unknown = Array.isArray(value) ? value[0] : value;
  if (typeof title !== 'string') return null;
  const match = /^\s*[[(]?\s*(retracted|withdrawn)(?:\s+(?:article|paper|chapter))?\s*[\])]?\s*[:.]/i.exec(title)
    ?? /^\s*[[(](retracted|withdrawn)(?:\s+(?:article|paper|chapter))?[\])]/i.exec(title);
  if (match === null) return null;
  return { kind: match[1]?.toLowerCase() === 'withdrawn' ? 'withdrawal' : 'retraction', doi: null, date: null, label: null, basis: 'title' };
}

/**
 * Reads from a DOI service's CSL-JSON answer whether the source was corrected or retracted.
 *
 * The Crossref Metadata API JSON Format documents `update-to` (on the notice: `updated`, `DOI`, `type` such as `retraction` or
 * `correction`, `label`) and the mirror of it on the work itself is `updated-by` with the same members (from memory). Only
 * `updated-by` speaks of the source asked for: a record with `update-to` is itself a notice about another work. Where no field
 * says so, a title beginning "RETRACTED:" does (common practice). The gravest notice wins; an expression of concern is shown
 * but leaves the status as it is.
 *
 * @example readNotice({ 'updated-by': [{ type: 'retraction', DOI: '10.5555/n.1' }] }).status === 'retracted'
 */
export function readNotice(answer: unknown): SourceStanding {
  if (typeof answer !== 'object' || answer === null) return { status: 'current' };
  const record = answer as Record<string, unknown>;
  const updates = Array.isArray(record['updated-by']) ? record['updated-by'].slice(0, 100) : [];
  const notices = updates.map(noticeFrom).filter((notice) => notice !== null);
  const titled = noticeFromTitle(record['title']);
  if (titled !== null) notices.push(titled);
  let gravest: Notice | undefined;
  for (const notice of notices) {
    if (gravest === undefined || gravity.indexOf(notice.kind) > gravity.indexOf(gravest.kind)) gravest = notice;
  }
  if (gravest === undefined) return { status: 'current' };
  const corrected = notices.some((notice) => notice.kind === 'correction');
  const status = gravest.kind === 'retraction' || gravest.kind === 'withdrawal' ? 'retracted' : corrected ? 'corrected' : 'current';
  return { status, notice: gravest };
}

const sentences: Readonly<Record<NoticeKind, string>> = {
  retraction: 'This source was retracted',
  withdrawal: 'This source was withdrawn by its publisher',
  correction: 'A correction to this source was published',
  'expression-of-concern': 'An expression of concern about this source was published',
};

/**
 * Says a notice in one sentence.
 *
 * @example noticeSentence({ kind: 'retraction', doi: '10.5555/n.1', date: '2009-03', label: null, basis: 'updated-by' }) === 'This source was retracted (2009-03), see 10.5555/n.1.'
 */
export function noticeSentence(notice: Notice): string {
  const date = notice.date === null ? '' : ` (${notice.date})`;
  const where = notice.doi !== null ? `, see ${notice.doi}` : notice.basis === 'title' ? ', as its title says' : '';
  return `${sentences[notice.kind]}${date}${where}.`;
}
