import { and, asc, count, desc, eq, inArray, ne, sql } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { users } from '#server/db/schema/accounts.ts';
import { acceptedConversions, conversions, convertedQuantities, entries, quantities, raisedChecks, revisions } from '#server/db/schema/entries.ts';
import { decisions, submissions } from '#server/db/schema/reviews.ts';
import { sources } from '#server/db/schema/sources.ts';
import { elementarySteps, surfaces } from '#server/db/schema/vocabulary.ts';
import type { EntryInput } from '#shared/contracts/entries.ts';
import { openStates, type State } from '#shared/domain/states.ts';

export type RevisionRow = typeof revisions.$inferSelect;
export type QuantityRow = typeof quantities.$inferSelect;
export type ConvertedRow = typeof convertedQuantities.$inferSelect;

/** A frozen revision with all that an answer shows of it. */
export interface EntryRecord {
  accession: string;
  contributorId: string;
  revision: RevisionRow;
  step: typeof elementarySteps.$inferSelect;
  surface: typeof surfaces.$inferSelect;
  source: typeof sources.$inferSelect;
  conversion: { id: string; coreVersion: string; constantsVersion: string; createdAt: Date };
  quantities: { printed: QuantityRow; converted: ConvertedRow }[];
  checks: { code: string; severity: string; message: string }[];
}

export async function insertEntry(tx: Tx, row: { accession: string; contributorId: string; createdAt: Date }): Promise<string> {
  const [inserted] = await tx.insert(entries).values(row).returning({ id: entries.id });
  if (!inserted) throw new Error('The entry was not stored.');
  return inserted.id;
}

export async function insertRevision(tx: Tx, row: typeof revisions.$inferInsert): Promise<RevisionRow> {
  const [inserted] = await tx.insert(revisions).values(row).returning();
  if (!inserted) throw new Error('The revision was not stored.');
  return inserted;
}

/** Changes a revision that is still as it was seen; null when somebody else was faster. */
export async function updateRevision(tx: Tx, seen: { id: string; lock: number; state: string }, change: Partial<typeof revisions.$inferInsert>): Promise<RevisionRow | null> {
  const [row] = await tx.update(revisions).set({ ...change, lock: seen.lock + 1 })
    .where(and(eq(revisions.id, seen.id), eq(revisions.lock, seen.lock), eq(revisions.state, seen.state))).returning();
  return row ?? null;
}

export interface EntryHead {
  id: string;
  accession: string;
  contributorId: string;
}

export async function findEntry(db: DbOrTx, accession: string): Promise<EntryHead | null> {
  const [row] = await db.select({ id: entries.id, accession: entries.accession, contributorId: entries.contributorId }).from(entries).where(eq(entries.accession, accession));
  return row ?? null;
}

export async function listRevisions(db: DbOrTx, entryId: string): Promise<RevisionRow[]> {
  return db.select().from(revisions).where(eq(revisions.entryId, entryId)).orderBy(desc(revisions.number));
}

/** Revisions on their way, of any of the entries. */
export async function listOpenRevisions(db: DbOrTx, entryIds: string[]): Promise<RevisionRow[]> {
  return entryIds.length === 0 ? [] : db.select().from(revisions).where(and(inArray(revisions.entryId, entryIds), inArray(revisions.state, [...openStates])));
}

export async function findRevision(db: DbOrTx, id: string): Promise<RevisionRow | null> {
  const [row] = await db.select().from(revisions).where(eq(revisions.id, id));
  return row ?? null;
}

export async function findAcceptedRevision(db: DbOrTx, entryId: string): Promise<RevisionRow | null> {
  const [row] = await db.select().from(revisions).where(and(eq(revisions.entryId, entryId), eq(revisions.state, 'accepted')));
  return row ?? null;
}

export async function highestVersion(db: DbOrTx, entryId: string): Promise<number> {
  const [row] = await db.select({ version: sql<number | null>`max(${revisions.version})` }).from(revisions).where(eq(revisions.entryId, entryId));
  return row?.version ?? 0;
}

/** Frozen revisions with all their parts, in the order asked for. Each comes with the conversion it was accepted with, else the latest. */
export async function loadRecords(db: DbOrTx, revisionIds: readonly string[]): Promise<EntryRecord[]> {
  if (revisionIds.length === 0) return [];
  const ids = [...revisionIds];
  const heads = await db.select({ accession: entries.accession, contributorId: entries.contributorId, revision: revisions, step: elementarySteps, surface: surfaces, source: sources })
    .from(revisions)
    .innerJoin(entries, eq(entries.id, revisions.entryId))
    .innerJoin(elementarySteps, eq(elementarySteps.id, revisions.stepId))
    .innerJoin(surfaces, eq(surfaces.id, revisions.surfaceId))
    .innerJoin(sources, eq(sources.id, revisions.sourceId))
    .where(inArray(revisions.id, ids));
  const conversionRows = await db.select({
    id: conversions.id, revisionId: conversions.revisionId, coreVersion: conversions.coreVersion, constantsVersion: conversions.constantsVersion, createdAt: conversions.createdAt,
    pinned: sql<boolean>`${acceptedConversions.conversionId} is not null`,
  }).from(conversions)
    .leftJoin(acceptedConversions, and(eq(acceptedConversions.revisionId, conversions.revisionId), eq(acceptedConversions.conversionId, conversions.id)))
    .where(inArray(conversions.revisionId, ids)).orderBy(asc(conversions.createdAt));
  const chosen = new Map<string, (typeof conversionRows)[number]>();
  for (const row of conversionRows) if (!chosen.get(row.revisionId)?.pinned) chosen.set(row.revisionId, row);
  const conversionIds = [...chosen.values()].map((row) => row.id);
  if (conversionIds.length === 0) return [];
  const [values, checks] = await Promise.all([
    db.select({ printed: quantities, converted: convertedQuantities }).from(convertedQuantities)
      .innerJoin(quantities, eq(quantities.id, convertedQuantities.quantityId))
      .where(inArray(convertedQuantities.conversionId, conversionIds)).orderBy(asc(quantities.position)),
    db.select().from(raisedChecks).where(inArray(raisedChecks.conversionId, conversionIds)).orderBy(asc(raisedChecks.position)),
  ]);
  const byRevision = new Map(heads.map((head) => [head.revision.id, head]));
  return ids.flatMap((id) => {
    const head = byRevision.get(id);
    const conversion = chosen.get(id);
    if (!head || !conversion) return [];
    return [{
      ...head, conversion,
      quantities: values.filter((row) => row.converted.conversionId === conversion.id),
      checks: checks.filter((row) => row.conversionId === conversion.id).map(({ code, severity, message }) => ({ code, severity, message })),
    }];
  });
}

export async function loadRecord(db: DbOrTx, revisionId: string): Promise<EntryRecord | null> {
  return (await loadRecords(db, [revisionId]))[0] ?? null;
}

/** The elementary step as a row, made when it is new. */
export async function ensureStep(tx: Tx, step: Omit<typeof elementarySteps.$inferInsert, 'id'>): Promise<string> {
  await tx.insert(elementarySteps).values(step).onConflictDoNothing();
  const [row] = await tx.select({ id: elementarySteps.id }).from(elementarySteps).where(and(
    eq(elementarySteps.variantKey, step.variantKey), eq(elementarySteps.direction, step.direction), eq(elementarySteps.equation, step.equation), eq(elementarySteps.parserVersion, step.parserVersion),
  ));
  if (!row) throw new Error('The elementary step was not stored.');
  return row.id;
}

/** The surface as a row, made when it is new. */
export async function ensureSurface(tx: Tx, surface: Omit<typeof surfaces.$inferInsert, 'id'>): Promise<string> {
  await tx.insert(surfaces).values(surface).onConflictDoNothing();
  const [row] = await tx.select({ id: surfaces.id }).from(surfaces).where(eq(surfaces.key, surface.key));
  if (!row) throw new Error('The surface was not stored.');
  return row.id;
}

export async function insertQuantities(tx: Tx, rows: (typeof quantities.$inferInsert)[]): Promise<QuantityRow[]> {
  return rows.length === 0 ? [] : tx.insert(quantities).values(rows).returning();
}

export async function insertConversion(
  tx: Tx,
  conversion: typeof conversions.$inferInsert,
  values: Omit<typeof convertedQuantities.$inferInsert, 'conversionId'>[],
  checks: Omit<typeof raisedChecks.$inferInsert, 'conversionId'>[],
): Promise<string> {
  const [row] = await tx.insert(conversions).values(conversion).returning({ id: conversions.id });
  if (!row) throw new Error('The conversion was not stored.');
  if (values.length > 0) await tx.insert(convertedQuantities).values(values.map((value) => ({ ...value, conversionId: row.id })));
  if (checks.length > 0) await tx.insert(raisedChecks).values(checks.map((check) => ({ ...check, conversionId: row.id })));
  return row.id;
}

export async function pinConversion(tx: Tx, revisionId: string, conversionId: string): Promise<void> {
  await tx.insert(acceptedConversions).values({ revisionId, conversionId });
}

/** The last submission of an entry with its decision, if there is one. */
export async function findLastSubmission(db: DbOrTx, entryId: string) {
  const [row] = await db.select({ submission: submissions, decision: decisions }).from(submissions)
    .leftJoin(decisions, eq(decisions.submissionId, submissions.id))
    .where(eq(submissions.entryId, entryId)).orderBy(desc(submissions.round)).limit(1);
  return row ?? null;
}

export async function insertSubmission(tx: Tx, row: typeof submissions.$inferInsert): Promise<string> {
  const [inserted] = await tx.insert(submissions).values(row).returning({ id: submissions.id });
  if (!inserted) throw new Error('The submission was not stored.');
  return inserted.id;
}

/** What my list shows: the newest revision of each entry that I contributed or am revising. */
export async function listOwnRevisions(
  db: DbOrTx,
  { userId, state, limit, before }: { userId: string; state: State | undefined; limit: number; before: { changedAt: Date; id: string } | null },
): Promise<{ accession: string; contributorId: string; revision: RevisionRow }[]> {
  return db.select({ accession: entries.accession, contributorId: entries.contributorId, revision: revisions })
    .from(revisions).innerJoin(entries, eq(entries.id, revisions.entryId))
    .where(and(
      eq(revisions.authorId, userId),
      sql`${revisions.number} = (select max(number) from revisions newest where newest.entry_id = ${revisions.entryId})`,
      state ? eq(revisions.state, state) : undefined,
      before ? sql`(${revisions.changedAt}, ${revisions.id}) < (${before.changedAt.toISOString()}::timestamptz, ${before.id}::uuid)` : undefined,
    ))
    .orderBy(desc(revisions.changedAt), desc(revisions.id)).limit(limit);
}

export async function countOwnByState(db: DbOrTx, userId: string): Promise<Record<string, number>> {
  const rows = await db.select({ state: revisions.state, n: count() }).from(revisions)
    .where(and(eq(revisions.authorId, userId), sql`${revisions.number} = (select max(number) from revisions newest where newest.entry_id = ${revisions.entryId})`))
    .groupBy(revisions.state);
  return Object.fromEntries(rows.map((row) => [row.state, row.n]));
}

/** Frozen revisions taken from one source that are not out of the running, for the check on duplicates and for the form. */
export async function listBySource(db: DbOrTx, sourceId: string, exceptEntryId: string | null): Promise<{ accession: string; revision: RevisionRow; equation: string; stepKey: string; direction: number; surfaceId: string; surface: string; input: EntryInput }[]> {
  return db.select({
    accession: entries.accession, revision: revisions, equation: elementarySteps.equation, stepKey: elementarySteps.key, direction: elementarySteps.direction,
    surfaceId: surfaces.id, surface: surfaces.label, input: revisions.input,
  }).from(revisions)
    .innerJoin(entries, eq(entries.id, revisions.entryId))
    .innerJoin(elementarySteps, eq(elementarySteps.id, revisions.stepId))
    .innerJoin(surfaces, eq(surfaces.id, revisions.surfaceId))
    .where(and(eq(revisions.sourceId, sourceId), inArray(revisions.state, ['submitted', 'under-review', 'returned', 'accepted']), exceptEntryId ? ne(entries.id, exceptEntryId) : undefined))
    .orderBy(asc(entries.accession)).limit(200);
}

export async function userName(db: DbOrTx, userId: string): Promise<string> {
  const [row] = await db.select({ name: users.name }).from(users).where(eq(users.id, userId));
  return row?.name ?? 'a former member';
}
