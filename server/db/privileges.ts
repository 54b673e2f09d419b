/**
 * What the application's database role may do, table by table: data that `npm run db` and every migration apply anew, and that a test
 * compares with what the database really grants. Nothing here allows DDL, TRUNCATE, or DELETE on a record.
 */
export const privileges: Readonly<Record<string, { select?: true; insert?: true; delete?: true; update?: readonly string[] | 'all' }>> = {
  users: { select: true, insert: true, update: ['email', 'name', 'password_hash', 'disabled_at'] },
  user_roles: { select: true, insert: true, delete: true },
  user_preferences: { select: true, insert: true, update: 'all' },
  sessions: { select: true, insert: true, update: 'all', delete: true },
  rate_counters: { select: true, insert: true, update: 'all', delete: true },
  vocabulary_terms: { select: true, insert: true, update: ['label', 'synonyms', 'data', 'position'] },
  elementary_steps: { select: true, insert: true, update: ['merged_into'] },
  surfaces: { select: true, insert: true, update: ['merged_into'] },
  sources: {
    select: true, insert: true,
    update: ['csl', 'title', 'authors', 'label', 'year', 'container', 'citation', 'bibtex', 'ris', 'status', 'notice', 'confirmed_at', 'looked_up_at'],
  },
  entries: { select: true, insert: true },
  revisions: {
    select: true, insert: true,
    update: [
      'state', 'lock', 'version', 'input', 'input_hash', 'author_name', 'kind', 'scope', 'provenance', 'step_id', 'surface_id', 'source_id', 'method_class',
      'technique', 'valid_min_k', 'valid_max_k', 'changed_at', 'accepted_at', 'ended_at', 'notice',
    ],
  },
  quantities: { select: true, insert: true },
  conversions: { select: true, insert: true },
  converted_quantities: { select: true, insert: true },
  raised_checks: { select: true, insert: true },
  accepted_conversions: { select: true, insert: true },
  submissions: { select: true, insert: true, update: ['claimed_by', 'claim_expires_at', 'checklist'] },
  decisions: { select: true, insert: true },
  review_comments: { select: true, insert: true },
  search_rows: { select: true, insert: true },
  search_words: { select: true },
  collections: { select: true, insert: true, update: ['name', 'description', 'changed_at', 'discarded_at'] },
  collection_entries: { select: true, insert: true, delete: true },
  events: { select: true, insert: true },
  outbox: { select: true, insert: true, update: ['state', 'attempts', 'next_attempt_at', 'last_error'] },
  milestones: { select: true, insert: true },
};

/** The statements that make the grants what the table says, and nothing more. */
export function privilegeStatements(role: string): string[] {
  const quoted = `"${role.replaceAll('"', '""')}"`;
  const statements = [
    'revoke all on schema public from public',
    `revoke all on all tables in schema public from ${quoted}`,
    `revoke all on all functions in schema public from public`,
    `grant usage on schema public to ${quoted}`,
    `grant execute on all functions in schema public to ${quoted}`,
  ];
  for (const [table, may] of Object.entries(privileges)) {
    const whole = [may.select && 'select', may.insert && 'insert', may.delete && 'delete', may.update === 'all' && 'update'].filter(Boolean);
    if (whole.length > 0) statements.push(`grant ${whole.join(', ')} on "${table}" to ${quoted}`);
    if (Array.isArray(may.update)) statements.push(`grant update (${may.update.map((column) => `"${column}"`).join(', ')}) on "${table}" to ${quoted}`);
  }
  return statements;
}
