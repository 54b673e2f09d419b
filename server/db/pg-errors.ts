import { Refusal } from '#server/refusal.ts';

interface PgFault {
  code: string;
  constraint?: string;
}

function pgFault(error: unknown): PgFault | null {
  for (let cause: unknown = error, depth = 0; cause && depth < 6; depth += 1) {
    if (typeof cause === 'object' && 'code' in cause && typeof cause.code === 'string' && /^[0-9A-Z]{5}$/.test(cause.code)) return cause as PgFault;
    cause = typeof cause === 'object' && 'cause' in cause ? cause.cause : null;
  }
  return null;
}

/** What a broken constraint means to the person whose request broke it. */
const byConstraint: Readonly<Record<string, () => Refusal>> = {
  revisions_one_open_per_entry: () => new Refusal('revision-open'),
  // Two requests that open, or hand in, the same revision at the same instant meet here.
  revisions_entry_number_key: () => new Refusal('revision-open'),
  quantities_revision_position_key: () => new Refusal('state-conflict', 'This revision has been submitted already.'),
  revisions_one_accepted_per_entry: () => new Refusal('state-conflict', 'Another version of this entry was accepted meanwhile.'),
  revisions_transition: () => new Refusal('state-conflict'),
  revisions_are_frozen: () => new Refusal('state-conflict', 'This revision has been submitted and is frozen.'),
  revisions_lock_rises: () => new Refusal('stale-version'),
  rows_are_permanent: () => new Refusal('state-conflict', 'This record is permanent.'),
  decisions_not_on_own: () => new Refusal('own-submission'),
  decisions_by_reviewers: () => new Refusal('forbidden'),
  decisions_submission_key: () => new Refusal('already-decided'),
  submissions_revision_round_key: () => new Refusal('state-conflict', 'This revision has been submitted already.'),
  submissions_entry_round_key: () => new Refusal('state-conflict', 'This entry has been submitted already.'),
  users_email_key: () => new Refusal('conflict', 'This e-mail address is taken.'),
};

/** Whether the error is the database's word that a unique value is taken, for the constraint named. */
export function isUniqueViolation(error: unknown, constraint: string): boolean {
  const fault = pgFault(error);
  return fault?.code === '23505' && fault.constraint === constraint;
}

/** An error of the database as a refusal by constraint name, walking the chain of causes; null when it is none that we know. */
export function refusalFromDatabase(error: unknown): Refusal | null {
  const fault = pgFault(error);
  if (!fault) {
    const text = error instanceof Error ? `${error.message} ${error.cause instanceof Error ? error.cause.message : ''}` : '';
    return /ECONNREFUSED|Connection terminated|timeout exceeded when trying to connect|ECONNRESET/.test(text) ? new Refusal('database-unavailable') : null;
  }
  const known = fault.constraint ? byConstraint[fault.constraint] : undefined;
  if (known) return known();
  if (fault.code === '40001' || fault.code === '40P01' || fault.code === '55P03') return new Refusal('conflict', 'Two changes met; please try again.');
  if (fault.code.startsWith('08') || fault.code.startsWith('57P')) return new Refusal('database-unavailable');
  if (fault.code === '22021' || fault.code === '22P02' || fault.code === '22P05') return new Refusal('bad-request', 'The text holds a character that cannot be stored.');
  return null;
}
