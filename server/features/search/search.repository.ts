import { and, asc, count, desc, eq, inArray, isNull, not, or, sql, type SQL } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import type { Position } from '#server/db/keyset.ts';
import { searchRows as rows } from '#server/db/schema/search.ts';
import { vocabularyTerms } from '#server/db/schema/vocabulary.ts';
import type { EntryFilter, SortKey } from '#shared/contracts/entry-search.ts';
import { R } from '#shared/kinetics/constants.ts';

/** A filter whose steps have been brought to keys already. */
export interface SearchFilter extends Omit<EntryFilter, 'step'> {
  stepKeys?: string[] | undefined;
  accession?: string[] | undefined;
}

export type FilterName = keyof SearchFilter;

const escapeLike = (text: string) => text.replace(/[%_\\]/g, '\\$&');

/** Finds a word in the full text, by its beginning, inside an equation, or misspelt. */
function matchesWord(word: string): SQL {
  const plain = word.toLowerCase();
  const parts = plain.split(/[^\p{L}\p{N}]+/u).filter(Boolean);
  const whole = sql`${rows.searchText} like ${`%${escapeLike(plain)}%`}`;
  if (parts.length === 0) return whole;
  // Each part in quotes: taking accents off can bring brackets and apostrophes with it, as ⑴ becomes (1).
  const quoted = parts.map((part) => sql`'''' || translate(unaccent(${part}), '''\\', '  ') || ''':*'`);
  const full = sql`${rows.document} @@ to_tsquery('simple', ${sql.join(quoted, sql` || ' & ' || `)})`;
  // Trigrams of a word under five letters find too much to be of use; a DOI, an accession or a figure is typed right or not at all.
  return plain.length < 5 || !/^\p{L}+$/u.test(plain) ? sql`(${full} or ${whole})` : sql`(${full} or ${whole} or ${plain} <% ${rows.searchText})`;
}

/** One condition a filter in force; different names are joined with AND, repeated values with OR. */
export function filterConditions(filter: SearchFilter): Map<FilterName, SQL> {
  const conditions = new Map<FilterName, SQL>();
  const put = (name: FilterName, condition: SQL | undefined) => {
    if (condition) conditions.set(name, condition);
  };
  const some = <T>(values: T[] | undefined): T[] | null => (values && values.length > 0 ? values : null);
  const anyOf = (name: FilterName, column: Parameters<typeof inArray>[0], values: string[] | undefined) => {
    if (some(values)) put(name, inArray(column, values as string[]));
  };
  if (filter.q) put('q', and(...filter.q.split(/\s+/).filter(Boolean).slice(0, 12).map(matchesWord)));
  if (some(filter.kind)) put('kind', sql`${rows.kindsHeld} && ${sql.param(filter.kind)}::text[]`);
  anyOf('energyType', rows.energyType, filter.energyType);
  anyOf('metal', rows.metal, filter.metal);
  if (some(filter.contains)) put('contains', sql`${rows.elements} && ${sql.param(filter.contains)}::text[]`);
  anyOf('facet', rows.facet, filter.facet);
  anyOf('site', rows.site, filter.site);
  anyOf('stepKeys', rows.stepKey, filter.stepKeys);
  anyOf('stepClass', rows.stepClass, filter.stepClass);
  anyOf('bond', rows.bond, filter.bond);
  if (some(filter.method)) put('method', or(inArray(rows.technique, filter.method ?? []), inArray(rows.methodClass, filter.method ?? [])));
  anyOf('methodClass', rows.methodClass, filter.methodClass);
  anyOf('provenance', rows.provenance, filter.provenance);
  anyOf('scope', rows.scope, filter.scope);
  anyOf('sampleType', rows.sampleType, filter.sampleType);
  anyOf('accession', rows.accession, filter.accession);
  if (some(filter.source)) {
    const ids = (filter.source ?? []).filter((text) => /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text));
    put('source', or(inArray(rows.doi, (filter.source ?? []).map((text) => text.toLowerCase())), ids.length > 0 ? inArray(rows.sourceId, ids) : undefined));
  }
  if (filter.yearFrom !== undefined) put('yearFrom', sql`${rows.year} >= ${filter.yearFrom}`);
  if (filter.yearTo !== undefined) put('yearTo', sql`${rows.year} <= ${filter.yearTo}`);
  const [kind] = filter.kind ?? [];
  if (filter.valueMin !== undefined) put('valueMin', sql`(${rows.values} ->> ${kind ?? ''})::float8 >= ${filter.valueMin}`);
  if (filter.valueMax !== undefined) put('valueMax', sql`(${rows.values} ->> ${kind ?? ''})::float8 <= ${filter.valueMax}`);
  if (filter.validAt !== undefined) {
    put('validAt', sql`coalesce(${rows.validMinK}, '-infinity') <= ${filter.validAt} and coalesce(${rows.validMaxK}, 'infinity') >= ${filter.validAt}
      and (${rows.validMinK} is not null or ${rows.validMaxK} is not null or ${rows.methodClass} = 'computed')`);
  }
  return conditions;
}

function whereOf(conditions: ReadonlyMap<FilterName, SQL>, except: readonly FilterName[] = []): SQL | undefined {
  return and(eq(rows.listed, true), ...[...conditions].filter(([name]) => !except.includes(name)).map(([, condition]) => condition));
}

interface SortColumn {
  expression: SQL;
  descending: boolean;
  cast: 'float8' | 'text' | 'timestamptz';
}

/** ln k at a temperature, in SQL: the same formula as `lnRateAt` of the computing core. */
const lnKAt = (temperatureK: number) => sql`(${rows.lnPreExponential} + ${rows.exponent} * (ln(${temperatureK}::float8) - ln(${rows.referenceTemperatureK})) - ${rows.energyKJPerMol} * 1000 / (${R}::float8 * ${temperatureK}::float8))`;

/** The columns of a sort, ending in the accession, which nothing shares. */
function sortColumns(sort: SortKey, temperatureK: number | undefined): SortColumn[] {
  const descending = sort.startsWith('-');
  const number = (expression: SQL): SortColumn => ({ expression, descending, cast: 'float8' });
  const word = (expression: SQL): SortColumn => ({ expression, descending, cast: 'text' });
  const last: SortColumn = { expression: sql`${rows.accession}`, descending: false, cast: 'text' };
  const byStep: SortColumn[] = [word(sql`${rows.stepKey}`), { expression: sql`${rows.stepDirection}::float8`, descending: true, cast: 'float8' }, { expression: sql`${rows.surfaceLabel}`, descending: false, cast: 'text' }];
  switch (sort.replace('-', '')) {
    case 'energy': return [number(sql`${rows.energyKJPerMol}`), last];
    case 'uncertainty': return [number(sql`${rows.uEnergyKJPerMol}`), last];
    case 'k': return [{ expression: sql`case when ${lnKAt(temperatureK ?? 700)} is not null then ${rows.rateUnit} end`, descending: false, cast: 'text' }, number(lnKAt(temperatureK ?? 700)), last];
    case 'year': return [number(sql`${rows.year}::float8`), last];
    case 'metal': return [word(sql`coalesce(${rows.metal}, ${rows.formula})`), { expression: sql`${rows.surfaceLabel}`, descending: false, cast: 'text' }, last];
    case 'source': return [word(sql`${rows.sourceLabel}`), last];
    case 'method': return [word(sql`coalesce(${rows.technique}, ${rows.methodClass})`), last];
    case 'validFrom': return [number(sql`${rows.validMinK}`), last];
    case 'accepted': return [number(sql`extract(epoch from ${rows.acceptedAt})::float8`), last];
    default: return [...byStep, last];
  }
}

/** Everything after a position, for columns in which nulls come last. */
function afterPosition(columns: readonly SortColumn[], position: Position): SQL | undefined {
  const steps = columns.map((column, i) => {
    const same = columns.slice(0, i).map((earlier, j) => sql`${earlier.expression} is not distinct from ${position[j] ?? null}::${sql.raw(earlier.cast)}`);
    const at = position[i] ?? null;
    const beyond = at === null ? sql`false` : sql`(${column.expression} ${sql.raw(column.descending ? '<' : '>')} ${at}::${sql.raw(column.cast)} or ${column.expression} is null)`;
    return and(...same, beyond);
  });
  return or(...steps);
}

export async function searchPage(
  db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>,
  { sort, temperatureK, limit, position }: { sort: SortKey; temperatureK: number | undefined; limit: number; position: Position | null },
): Promise<{ revisionIds: string[]; next: Position | null }> {
  const columns = sortColumns(sort, temperatureK);
  const keys = sql`json_build_array(${sql.join(columns.map(({ expression }) => expression), sql`, `)})`;
  const found = await db.select({ revisionId: rows.revisionId, position: sql<Position>`${keys}` }).from(rows)
    .where(and(whereOf(conditions), position ? afterPosition(columns, position) : undefined))
    .orderBy(...columns.map(({ expression, descending }) => sql`${expression} ${sql.raw(descending ? 'desc' : 'asc')} nulls last`)).limit(limit + 1);
  const page = found.slice(0, limit);
  return { revisionIds: page.map(({ revisionId }) => revisionId), next: found.length > limit ? (page.at(-1)?.position ?? null) : null };
}

export const sortWidth = (sort: SortKey): number => sortColumns(sort, 300).length;

export async function countRows(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>, except: readonly FilterName[] = []): Promise<number> {
  const [row] = await db.select({ n: count() }).from(rows).where(whereOf(conditions, except));
  return row?.n ?? 0;
}

/** Measured entries that only the lack of a stated range keeps out of a search by `validAt`. */
export async function countWithoutRange(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>): Promise<number> {
  const [row] = await db.select({ n: count() }).from(rows)
    .where(and(whereOf(conditions, ['validAt']), isNull(rows.validMinK), isNull(rows.validMaxK), not(eq(rows.methodClass, 'computed'))));
  return row?.n ?? 0;
}

type CountColumn = 'metal' | 'stepClass' | 'methodClass' | 'facet' | 'site' | 'scope' | 'provenance' | 'energyType' | 'sampleType';
export interface Counted { value: string; label: string; count: number }

/** How many rows each value of a plain column has, the filter on that column left aside. */
export async function countByColumn(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>, name: CountColumn): Promise<Counted[]> {
  const column = rows[name];
  const found = await db.select({ value: sql<string>`${column}`, n: count() }).from(rows)
    .where(and(whereOf(conditions, [name]), sql`${column} is not null`)).groupBy(column).orderBy(desc(count()), asc(column)).limit(200);
  return found.map(({ value, n }) => ({ value, label: value, count: n }));
}

export async function countByKind(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>): Promise<Counted[]> {
  const found = await db.select({ value: sql<string>`held`, n: count() }).from(sql`${rows} cross join unnest(${rows.kindsHeld}) as held`)
    .where(whereOf(conditions, ['kind', 'valueMin', 'valueMax'])).groupBy(sql`held`).orderBy(desc(count()));
  return found.map(({ value, n }) => ({ value, label: value, count: n }));
}

export async function countByStep(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>): Promise<Counted[]> {
  const label = sql<string>`coalesce(mode() within group (order by ${rows.equation}) filter (where ${rows.stepDirection} = 1), min(${rows.equation}))`;
  const found = await db.select({ value: rows.stepKey, label, n: count() }).from(rows)
    .where(whereOf(conditions, ['stepKeys'])).groupBy(rows.stepKey).orderBy(desc(count()), asc(rows.stepKey)).limit(200);
  return found.map(({ value, label: equation, n }) => ({ value, label: equation, count: n }));
}

export async function countByMethod(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>): Promise<Counted[]> {
  const found = await db.select({ value: sql<string>`${rows.technique}`, label: sql<string>`coalesce(${vocabularyTerms.label}, ${rows.technique})`, n: count() }).from(rows)
    .leftJoin(vocabularyTerms, and(eq(vocabularyTerms.list, 'technique'), eq(vocabularyTerms.code, rows.technique)))
    .where(and(whereOf(conditions, ['method']), sql`${rows.technique} is not null`)).groupBy(rows.technique, vocabularyTerms.label).orderBy(desc(count()), asc(rows.technique)).limit(200);
  return found.map(({ value, label, n }) => ({ value, label, count: n }));
}

export async function summaryFigures(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>) {
  const exact = sql`filter (where ${rows.energyBound} = '=')`;
  const [row] = await db.select({
    sources: sql<number>`count(distinct ${rows.sourceId})::int`,
    measured: sql<number>`(count(*) filter (where ${rows.methodClass} = 'measured'))::int`,
    computed: sql<number>`(count(*) filter (where ${rows.methodClass} = 'computed'))::int`,
    energies: sql<number>`(count(${rows.energyKJPerMol}) ${exact})::int`,
    median: sql<number | null>`percentile_cont(0.5) within group (order by ${rows.energyKJPerMol}) ${exact}`,
    low: sql<number | null>`min(${rows.energyKJPerMol}) ${exact}`,
    high: sql<number | null>`max(${rows.energyKJPerMol}) ${exact}`,
    unlike: sql<number>`count(distinct (${rows.scope}, ${rows.energyType}, ${rows.stepKey}, ${rows.stepDirection})) filter (where ${rows.energyKJPerMol} is not null)::int`,
    drawn: sql<number>`count(${rows.energyKJPerMol})::int`,
  }).from(rows).where(whereOf(conditions));
  return row ?? null;
}

export async function summaryPoints(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>, limit: number) {
  return db.select({
    accession: rows.accession, value: sql<number>`${rows.energyKJPerMol}`, bound: sql<string>`${rows.energyBound}`, methodClass: rows.methodClass,
    label: sql<string>`${rows.surfaceLabel} || ', ' || ${rows.sourceLabel}`,
  }).from(rows).where(and(whereOf(conditions), sql`${rows.energyKJPerMol} is not null`)).orderBy(asc(rows.energyKJPerMol), asc(rows.accession)).limit(limit);
}

export async function summaryHistogram(db: DbOrTx, conditions: ReadonlyMap<FilterName, SQL>, low: number, high: number, bins: number): Promise<number[]> {
  const bucket = sql<number>`width_bucket(${rows.energyKJPerMol}, ${low}::float8, ${high}::float8, ${bins}::int)`;
  const found = await db.select({ bucket, n: count() }).from(rows).where(and(whereOf(conditions), sql`${rows.energyKJPerMol} is not null`)).groupBy(sql`1`);
  const counts = new Array<number>(bins).fill(0);
  for (const { bucket: at, n } of found) {
    const index = Math.min(bins, Math.max(1, at)) - 1;
    counts[index] = (counts[index] ?? 0) + n;
  }
  return counts;
}

/** Revisions of everything found, in the order of accessions: what an export walks through. */
export function exportOrder(conditions: ReadonlyMap<FilterName, SQL>, after: string | null): SQL | undefined {
  return and(whereOf(conditions), after === null ? undefined : sql`${rows.accession} > ${after}`);
}
