import { and, asc, sql, type SQL } from 'drizzle-orm';
import type { Position } from '#server/db/keyset.ts';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchRows as rows } from '#server/db/schema/search.ts';
import type { GroupBy, GroupHead } from '#shared/contracts/entry-search.ts';
import { whereOf } from './search-conditions.repository.ts';
import type { Ask, GroupName, SummaryFigures, SummaryPoint } from './search-engine.ts';

const exact = sql`filter (where ${rows.energyBound} = '=' and ${rows.energyKJPerMol} is not null)`;
const some = sql`filter (where ${rows.energyKJPerMol} is not null)`;
/** Whether a column takes more than one value; the ends tell it without sorting all. */
const differs = (column: SQL, only: SQL) => sql<boolean>`coalesce(min(${column}) ${only} <> max(${column}) ${only}, false)`;

export async function summaryFigures(db: DbOrTx, ask: Ask): Promise<SummaryFigures> {
  const [row] = await db.select({
    sources: sql<number>`count(distinct ${rows.sourceId})::int`,
    measured: sql<number>`(count(*) filter (where ${rows.methodClass} = 'measured'))::int`,
    computed: sql<number>`(count(*) filter (where ${rows.methodClass} = 'computed'))::int`,
    energies: sql<number>`(count(${rows.energyKJPerMol}) ${exact})::int`,
    median: sql<number | null>`percentile_cont(0.5) within group (order by ${rows.energyKJPerMol}) ${exact}`,
    low: sql<number | null>`min(${rows.energyKJPerMol}) ${exact}`,
    high: sql<number | null>`max(${rows.energyKJPerMol}) ${exact}`,
    unlike: sql<boolean>`(${sql.join([rows.scope, rows.energyType, rows.stepKey, rows.stepDirection, rows.state].map((column) => differs(sql`${column}`, some)), sql` or `)})`,
    drawn: sql<number>`count(${rows.energyKJPerMol})::int`,
  }).from(rows).where(whereOf(ask));
  return row ?? { sources: 0, measured: 0, computed: 0, energies: 0, median: null, low: null, high: null, unlike: false, drawn: 0 };
}

export async function summaryPoints(db: DbOrTx, ask: Ask, most: number): Promise<SummaryPoint[]> {
  return db.select({
    accession: rows.accession, value: sql<number>`${rows.energyKJPerMol}`, bound: sql<string>`${rows.energyBound}`, methodClass: rows.methodClass,
    label: sql<string>`${rows.surfaceLabel} || ', ' || ${rows.sourceLabel}`,
  }).from(rows).where(and(whereOf(ask), sql`${rows.energyKJPerMol} is not null`)).orderBy(asc(rows.energyKJPerMol), asc(rows.accession)).limit(most);
}

export async function summaryHistogram(db: DbOrTx, ask: Ask, low: number, high: number, bins: number): Promise<number[]> {
  const bucket = sql<number>`width_bucket(${rows.energyKJPerMol}, ${low}::float8, ${high}::float8, ${bins}::int)`;
  const found = await db.select({ bucket, n: sql<number>`count(*)::int` }).from(rows).where(and(whereOf(ask), sql`${rows.energyKJPerMol} is not null`)).groupBy(sql`1`);
  const counts = new Array<number>(bins).fill(0);
  for (const { bucket: at, n } of found) {
    const index = Math.min(bins, Math.max(1, at)) - 1;
    counts[index] = (counts[index] ?? 0) + n;
  }
  return counts;
}

/** What a grouping gathers by, and what its heads are called. */
const grouped: Readonly<Record<GroupBy, { by: SQL[]; key: SQL; direction: SQL; label: SQL }>> = {
  step: { by: [sql`${rows.stepKey}`, sql`${rows.stepDirection}`], key: sql`${rows.stepKey}`, direction: sql`${rows.stepDirection}`, label: sql`min(${rows.equation})` },
  surface: { by: [sql`${rows.surfaceLabel}`], key: sql`${rows.surfaceLabel}`, direction: sql`null::int`, label: sql`${rows.surfaceLabel}` },
  source: { by: [sql`${rows.sourceId}`], key: sql`${rows.sourceId}::text`, direction: sql`null::int`, label: sql`min(${rows.sourceLabel})` },
};

const figures = {
  count: sql<number>`count(*)::int`,
  measured: sql<number>`(count(*) filter (where ${rows.methodClass} = 'measured'))::int`,
  computed: sql<number>`(count(*) filter (where ${rows.methodClass} = 'computed'))::int`,
  energies: sql<number>`(count(${rows.energyKJPerMol}) ${exact})::int`,
  median: sql<number | null>`percentile_cont(0.5) within group (order by ${rows.energyKJPerMol}) ${exact}`,
  low: sql<number | null>`min(${rows.energyKJPerMol}) ${exact}`,
  high: sql<number | null>`max(${rows.energyKJPerMol}) ${exact}`,
  steps: differs(sql`${rows.stepKey}`, exact), directions: differs(sql`${rows.stepDirection}`, exact), scopes: differs(sql`${rows.scope}`, exact),
  energyTypes: differs(sql`${rows.energyType}`, exact), states: differs(sql`${rows.state}`, exact),
};

interface HeadRow { key: string; direction: number | null; label: string; count: number; measured: number; computed: number; energies: number; median: number | null; low: number | null; high: number | null; steps: boolean; directions: boolean; scopes: boolean; energyTypes: boolean; states: boolean }

function headOf(by: GroupBy, row: HeadRow): GroupHead {
  const { key, label, count: entries, measured, computed, energies, median, low, high } = row;
  const why: GroupHead['noMedian'] = energies === 0 ? 'no-energies' : row.steps ? 'several-steps' : row.directions ? 'both-directions' : row.scopes ? 'several-scopes'
    : row.energyTypes ? 'several-energy-types' : row.states ? 'several-states' : null;
  return {
    by, key, label, direction: row.direction === null ? null : row.direction > 0 ? 1 : -1, count: entries, measured, computed,
    energy: low === null || high === null ? null : { count: energies, median: why === null ? median : null, low, high }, noMedian: why,
  };
}

const selectHeads = (db: DbOrTx, by: GroupBy, where: SQL | undefined) => {
  const { key, direction, label, by: columns } = grouped[by];
  return db.select({ key: sql<string>`${key}`.as('key'), direction: sql<number | null>`${direction}`.as('direction'), label: sql<string>`${label}`.as('label'), ...figures }).from(rows).where(where).groupBy(...columns);
};

export async function groupHeads(db: DbOrTx, ask: Ask, by: GroupBy, names: readonly GroupName[]): Promise<GroupHead[]> {
  if (names.length === 0) return [];
  const { key } = grouped[by];
  const keys = sql`${key} = any(${sql.param([...new Set(names.map((name) => name.key))])}::text[])`;
  const found = await selectHeads(db, by, and(whereOf(ask), keys));
  const heads = new Map(found.map((row) => [`${row.direction ?? ''} ${row.key}`, headOf(by, row)]));
  return names.flatMap((name) => heads.get(`${name.direction ?? ''} ${name.key}`) ?? []);
}

/** Groups from the largest on; a position is the count, key and direction of the last. */
export async function listGroups(db: DbOrTx, ask: Ask, by: GroupBy, { limit, position }: { limit: number; position: Position | null }): Promise<{ heads: GroupHead[]; total: number; next: Position | null }> {
  const { key, direction, by: columns } = grouped[by];
  const [n, last, sense] = position ?? [];
  const query = selectHeads(db, by, whereOf(ask));
  const after = position ? query.having(sql`(-count(*), ${key} collate "C", coalesce(${direction}, 0)) > (${-Number(n)}::bigint, ${last}::text collate "C", ${Number(sense)}::int)`) : query;
  const found = await after.orderBy(sql`count(*) desc`, sql`${key} collate "C"`, sql`coalesce(${direction}, 0)`).limit(limit + 1);
  const each = db.select({ one: sql`1`.as('one') }).from(rows).where(whereOf(ask)).groupBy(...columns).as('each');
  const [counted] = await db.select({ n: sql<number>`count(*)::int` }).from(each);
  const page = found.slice(0, limit);
  const end = page.at(-1);
  return { heads: page.map((row) => headOf(by, row)), total: counted?.n ?? 0, next: found.length > limit && end ? [end.count, end.key, end.direction ?? 0] : null };
}
