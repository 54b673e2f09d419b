import { and, or, sql, type SQL } from 'drizzle-orm';
import type { Position } from '#server/db/keyset.ts';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchRows as rows } from '#server/db/schema/search.ts';
import type { GroupBy, SortKey } from '#shared/contracts/entry-search.ts';
import { R } from '#shared/kinetics/constants.ts';
import { whereOf } from './search-conditions.repository.ts';
import type { Ask, FoundPage, GroupName, PageRequest } from './search-engine.ts';

interface SortColumn {
  expression: SQL;
  descending: boolean;
  cast: 'float8' | 'text' | 'timestamptz' | 'int';
  /** Whether it may lack a value; a column that never does can be entered by its index. */
  nullable: boolean;
}

/** ln k at a temperature, in SQL: the same formula as `lnRateAt` of the computing core. */
const lnKAt = (temperatureK: number) => sql`(${rows.lnPreExponential} + ${rows.exponent} * (ln(${temperatureK}::float8) - ln(${rows.referenceTemperatureK})) - ${rows.energyKJPerMol} * 1000 / (${R}::float8 * ${temperatureK}::float8))`;

const word = (expression: SQL, descending = false, nullable = false): SortColumn => ({ expression, descending, cast: 'text', nullable });
const number = (expression: SQL, descending = false): SortColumn => ({ expression, descending, cast: 'float8', nullable: true });
const accession = (descending = false) => word(sql`${rows.accession}`, descending);
const surface = (descending = false) => word(sql`${rows.surfaceLabel}`, descending);
const direction = (descending = true): SortColumn => ({ expression: sql`${rows.stepDirection}`, descending, cast: 'int', nullable: false });

function ownColumns(sort: SortKey, temperatureK: number): SortColumn[] {
  const down = sort.startsWith('-');
  switch (sort.replace('-', '')) {
    case 'energy': return [number(sql`${rows.energyKJPerMol}`, down)];
    case 'preExponential': return [word(sql`${rows.factorUnit}`, false, true), number(sql`${rows.lnFactor}`, down)];
    case 'k': return [word(sql`case when ${lnKAt(temperatureK)} is not null then ${rows.rateUnit} end`, false, true), number(lnKAt(temperatureK), down)];
    case 'uncertainty': return [number(sql`${rows.uEnergyKJPerMol}`, down)];
    case 'year': return [{ expression: sql`${rows.year}`, descending: down, cast: 'int', nullable: true }];
    case 'metal': return [word(sql`${rows.formula}`, down), surface()];
    case 'surface': return [surface(down)];
    case 'source': return [word(sql`${rows.sourceLabel}`, down)];
    case 'method': return [word(sql`coalesce(${rows.technique}, ${rows.methodClass})`, down)];
    case 'validFrom': return [number(sql`${rows.validMinK}`, down)];
    case 'validTo': return [number(sql`${rows.validMaxK}`, down)];
    case 'accepted': return [{ expression: sql`${rows.acceptedAt}`, descending: down, cast: 'timestamptz', nullable: true }];
    case 'scope': return [word(sql`${rows.scope}`, down)];
    case 'provenance': return [word(sql`${rows.provenance}`, down)];
    case 'energyType': return [word(sql`${rows.energyType}`, down, true)];
    case 'accession': return [accession(down)];
    default: return [word(sql`${rows.stepKey}`, down), direction(), surface()];
  }
}

const groupColumns: Readonly<Record<GroupBy, () => SortColumn[]>> = {
  step: () => [word(sql`${rows.stepKey}`), direction()],
  surface: () => [surface()],
  source: () => [word(sql`${rows.sourceLabel}`), word(sql`${rows.sourceId}::text`)],
};

/** The columns of a sort, those of the grouping first, ending in the accession and the revision, which nothing shares. */
function sortColumns(sort: SortKey, groupBy: GroupBy | undefined, temperatureK: number): SortColumn[] {
  const own = ownColumns(sort, temperatureK);
  return [...(groupBy ? groupColumns[groupBy]() : []), ...own, ...(sort.endsWith('accession') ? [] : [accession()]), word(sql`${rows.revisionId}::text`)];
}

export const positionWidth = (sort: SortKey, groupBy: GroupBy | undefined): number => sortColumns(sort, groupBy, 300).length;

/** Everything after a position, for columns in which nulls come last. */
function afterPosition(columns: readonly SortColumn[], position: Position): SQL | undefined {
  const compare = ({ expression, descending, cast }: SortColumn, at: string | number, alsoEqual = '') => sql`${expression} ${sql.raw((descending ? '<' : '>') + alsoEqual)} ${at}::${sql.raw(cast)}`;
  const beyond = (column: SortColumn, at: string | number | null): SQL =>
    at === null ? sql`false` : column.nullable ? sql`(${compare(column, at)} or ${column.expression} is null)` : compare(column, at);
  const same = (column: SortColumn, at: string | number | null): SQL =>
    column.nullable ? sql`${column.expression} is not distinct from ${at}::${sql.raw(column.cast)}` : sql`${column.expression} = ${at}::${sql.raw(column.cast)}`;
  const steps = columns.map((column, i) => and(...columns.slice(0, i).map((earlier, j) => same(earlier, position[j] ?? null)), beyond(column, position[i] ?? null)));
  const [first] = columns;
  const [at] = position;
  // Says nothing new, but lets an index be entered where the page begins.
  const bound = first && !first.nullable && at !== null && at !== undefined ? compare(first, at, '=') : undefined;
  return and(bound, or(...steps));
}

const groupNames: Readonly<Record<GroupBy, { key: SQL; direction: SQL }>> = {
  step: { key: sql`${rows.stepKey}`, direction: sql`${rows.stepDirection}` },
  surface: { key: sql`${rows.surfaceLabel}`, direction: sql`null::int` },
  source: { key: sql`${rows.sourceId}::text`, direction: sql`null::int` },
};

export async function searchPage(db: DbOrTx, ask: Ask, { sort, groupBy, temperatureK, limit, position }: PageRequest): Promise<FoundPage> {
  const columns = sortColumns(sort, groupBy, temperatureK ?? 300);
  const group = groupNames[groupBy ?? 'step'];
  const found = await db.select({
    revisionId: rows.revisionId, position: sql<Position>`json_build_array(${sql.join(columns.map(({ expression }) => expression), sql`, `)})`,
    key: sql<string>`${group.key}`, direction: sql<number | null>`${group.direction}`,
  }).from(rows)
    .where(and(whereOf(ask), position ? afterPosition(columns, position) : undefined))
    .orderBy(...columns.map(({ expression, descending }) => sql`${expression} ${sql.raw(descending ? 'desc' : 'asc')} nulls last`)).limit(limit + 1);
  const page = found.slice(0, limit);
  const groups = new Map<string, GroupName>(groupBy ? page.map(({ key, direction: sense }) => [`${sense ?? ''} ${key}`, { key, direction: sense }]) : []);
  return { revisionIds: page.map(({ revisionId }) => revisionId), groups: [...groups.values()], next: found.length > limit ? (page.at(-1)?.position ?? null) : null };
}
