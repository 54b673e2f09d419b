import { and, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { DbOrTx } from '#server/db/pool.ts';
import { searchRows as rows } from '#server/db/schema/search.ts';
import { sources } from '#server/db/schema/sources.ts';
import { vocabularyTerms } from '#server/db/schema/vocabulary.ts';
import { filterConditions, visibleRows, whereOf } from './search-conditions.repository.ts';
import { countedFilters, type Ask, type Counted, type CountedFilter, type Counts, type FilterName } from './search-engine.ts';

const mostValues = 200;

/** Filters whose conditions stand and fall with another's: the limits of a value say nothing without its kind. */
const together: Partial<Record<CountedFilter, readonly FilterName[]>> = { kind: ['kind', 'valueMin', 'valueMax'] };

/**
 * The columns counted, in sets that take few different values together: so rows are gathered into some hundreds of groups in one walk, in memory,
 * and the counts of every column are made from those.
 */
const sets = {
  step: { step: rows.stepKey, stepClass: rows.stepClass, bond: rows.bond, cleavage: rows.cleavage, species: rows.species },
  material: { metal: rows.metal, formula: rows.formula, contains: rows.elements },
  face: { facet: rows.facet, site: rows.site, sampleType: rows.sampleType },
  dress: { support: rows.support, promoter: rows.promoters },
  method: { method: rows.technique, methodClass: rows.methodClass },
  nature: { scope: rows.scope, provenance: rows.provenance, energyType: rows.energyType, hasUncertainty: rows.hasUncertainty },
  kind: { kind: rows.kindsHeld },
  source: { source: rows.sourceId },
} as const;
const lists: readonly CountedFilter[] = ['species', 'contains', 'promoter', 'kind'];

const name = (text: string): SQL => sql.raw(`"${text}"`);
const quoted = (text: string): SQL => sql.raw(`'${text}'`);

/** Families of techniques under every spelling of theirs. */
const families = sql`(select distinct on (spelling) lower(spelling) as spelling, ${vocabularyTerms.data} ->> 'family' as family
  from ${vocabularyTerms}, lateral (select ${vocabularyTerms.code} union all select jsonb_array_elements_text(${vocabularyTerms.synonyms})) as s (spelling)
  where ${vocabularyTerms.list} = 'technique' and ${vocabularyTerms.data} ? 'family' order by spelling)`;

/**
 * Counts of every list filter in one walk over the rows. A filter's own condition must be left aside in its own counts: so a row is kept when it
 * fails at most one of the conditions of counted filters, marked with the one that it fails, and counts for that filter alone.
 */
export async function countValues(db: DbOrTx, ask: Ask): Promise<Counts> {
  const conditions = filterConditions(ask.filter);
  const own = new Map<CountedFilter, SQL>();
  const taken = new Set<FilterName>();
  for (const filter of countedFilters) {
    if (!conditions.has(filter)) continue;
    const names = together[filter] ?? [filter];
    own.set(filter, sql`coalesce(${and(...names.flatMap((one) => conditions.get(one) ?? []))}, false)`);
    for (const one of names) taken.add(one);
  }
  const active = [...own.keys()];
  const base = [...conditions].filter(([one]) => !taken.has(one)).map(([, condition]) => condition);
  const fails = sql.join(active.map((filter) => sql`(not ${own.get(filter)})::int`), sql` + `);
  const missed = active.length === 0 ? sql`0` : sql`case ${sql.join(active.map((filter, i) => sql`when not ${own.get(filter)} then ${sql.raw(String(i + 1))}`), sql` `)} else 0 end`;
  /** How many entries a group stands for in the counts of a filter. */
  const entries = (filter: CountedFilter) => sql.raw(`sum(n) filter (where missed in (0, ${active.indexOf(filter) + 1}))`);
  const all = Object.values(sets).flatMap((set) => Object.entries(set));
  const branch = (filter: CountedFilter, set: string) => {
    const from = sql`from gathered${lists.includes(filter) ? sql` cross join unnest(${name(filter)}) as one` : sql``}`;
    const value = lists.includes(filter) ? sql`one` : sql`${name(filter)}::text`;
    return sql`select ${quoted(filter)} as facet, ${value} collate "C" as value, ${entries(filter)} as n ${from} where part = ${quoted(set)} group by 2`;
  };
  const branches = [
    ...Object.entries(sets).flatMap(([set, columns]) => Object.keys(columns).map((filter) => branch(filter as CountedFilter, set))),
    sql`select 'promoter', case when cardinality(promoter) = 0 then 'none' else 'any' end, ${entries('promoter')} from gathered where part = 'dress' group by 2`,
    sql`select 'methodFamily', families.family, ${entries('methodFamily')} from gathered join ${families} as families on families.spelling = lower(gathered.method) where part = 'method' group by 2`,
  ];
  const chosen = Object.values(ask.filter).flatMap((value) => (Array.isArray(value) ? value.filter((one): one is string => typeof one === 'string') : []));
  const found = await inMemory(db, sql`
    with gathered as materialized (
      select case ${sql.join(Object.entries(sets).map(([set, columns]) => sql`when grouping(${name(Object.keys(columns)[0] ?? '')}) = 0 then ${quoted(set)}`), sql` `)} end as part,
        ${sql.join(all.map(([filter]) => name(filter)), sql`, `)}, missed, count(*) as n
      from (
        select ${sql.join(all.map(([filter, column]) => sql`${column} as ${name(filter)}`), sql`, `)}, ${missed} as missed from ${rows}
        where ${and(visibleRows(ask.visible), ...base, active.length > 1 ? sql`${fails} <= 1` : undefined)}
      ) found
      group by grouping sets (${sql.join(Object.values(sets).map((columns) => sql`(missed, ${sql.join(Object.keys(columns).map(name), sql`, `)})`), sql`, `)})
    ), placed as (
      select facet, value, n, row_number() over (partition by facet order by n desc, value) as place from (${sql.join(branches, sql` union all `)}) tallied where value is not null and n > 0
    )
    select facet, value, n::int from placed where place <= ${mostValues} or value = any(${sql.param(chosen)}::text[]) order by facet, n desc, value`);
  const counts = Object.fromEntries(countedFilters.map((filter) => [filter, []])) as unknown as Counts;
  for (const { facet, value, n } of found) counts[facet].push({ value, count: n, label: null });
  await Promise.all([labelSteps(db, counts.step), labelSources(db, counts), labelMethods(db, counts.method)]);
  return counts;
}

/**
 * Runs a statement that gathers many rows into few groups. The planner cannot know how few, and would sort on disk what needs a megabyte:
 * a high limit, held to this transaction, lets it hash.
 */
async function inMemory(db: DbOrTx, statement: SQL): Promise<{ facet: CountedFilter; value: string; n: number }[]> {
  return db.transaction(async (tx) => {
    await tx.execute(sql`select set_config('work_mem', '128MB', true), set_config('jit', 'off', true)`);
    return (await tx.execute<{ facet: CountedFilter; value: string; n: number }>(statement)).rows;
  });
}

/** One equation of each key, forward where there is one. */
async function labelSteps(db: DbOrTx, counted: Counts['step']): Promise<void> {
  if (counted.length === 0) return;
  const { rows: found } = await db.execute<{ key: string; equation: string | null }>(sql`
    select k as key, (select ${rows.equation} from ${rows} where ${rows.listed} and ${rows.stepKey} = k order by ${rows.stepDirection} desc nulls last, ${rows.surfaceLabel}, ${rows.accession} limit 1) as equation
    from unnest(${sql.param(counted.map(({ value }) => value))}::text[]) k`);
  const equations = new Map(found.map(({ key, equation }) => [key, equation]));
  for (const one of counted) one.label = equations.get(one.value) ?? one.value;
}

/** Sources by their DOI, which is what the filter takes, or by their id where they have none. */
async function labelSources(db: DbOrTx, counts: Counts): Promise<void> {
  if (counts.source.length === 0) return;
  const found = await db.select({ id: sources.id, doi: sources.doi, label: sources.label }).from(sources).where(inArray(sources.id, counts.source.map(({ value }) => value)));
  const byId = new Map(found.map((source) => [source.id, source]));
  counts.source = counts.source.map(({ value, count }) => ({ value: byId.get(value)?.doi ?? value, count, label: byId.get(value)?.label ?? null }));
}

async function labelMethods(db: DbOrTx, counted: Counts['method']): Promise<void> {
  if (counted.length === 0) return;
  const terms = await db.select({ code: vocabularyTerms.code, label: vocabularyTerms.label }).from(vocabularyTerms)
    .where(and(eq(vocabularyTerms.list, 'technique'), inArray(vocabularyTerms.code, counted.map(({ value }) => value))));
  const labels = new Map(terms.map(({ code, label }) => [code, label]));
  for (const one of counted) one.label = labels.get(one.value) ?? null;
}

const n = sql<number>`count(*)::int`;

export async function total(db: DbOrTx, ask: Ask, without: readonly FilterName[] = []): Promise<number> {
  const [row] = await db.select({ n }).from(rows).where(whereOf(ask, without));
  return row?.n ?? 0;
}

export async function totalWithoutRange(db: DbOrTx, ask: Ask): Promise<number> {
  const [row] = await db.select({ n }).from(rows).where(and(
    whereOf(ask, ['validAt', 'validFrom', 'validTo']), sql`${rows.validMinK} is null and ${rows.validMaxK} is null and ${rows.methodClass} <> 'computed'`,
  ));
  return row?.n ?? 0;
}

/**
 * What would be found without each filter, in two walks: one with the free text, which has an index, whose rows fail at most one other filter,
 * and one without it.
 */
export async function totalsWithoutEach(db: DbOrTx, ask: Ask): Promise<{ filter: FilterName; total: number }[]> {
  const conditions = filterConditions(ask.filter);
  const others = [...conditions].filter(([filter]) => filter !== 'q').map(([filter, condition]) => ({ filter, condition: sql`coalesce(${condition}, false)` }));
  const result: { filter: FilterName; total: number }[] = [];
  if (conditions.has('q')) result.push({ filter: 'q', total: await total(db, ask, ['q']) });
  if (others.length > 0) {
    const fails = sql.join(others.map(({ condition }) => sql`(not ${condition})::int`), sql` + `);
    const missed = sql`case ${sql.join(others.map(({ condition }, i) => sql`when not ${condition} then ${sql.raw(String(i))}`), sql` `)} end`;
    const found = await db.select({ missed: sql<number | null>`${missed}`, n }).from(rows).where(and(visibleRows(ask.visible), conditions.get('q'), sql`${fails} <= 1`)).groupBy(sql`1`);
    for (const { missed: at, n: count } of found) {
      const one = at === null ? undefined : others[at];
      if (one) result.push({ filter: one.filter, total: count });
    }
  }
  const order = [...conditions.keys()];
  return result.filter((one) => one.total > 0).sort((a, b) => order.indexOf(a.filter) - order.indexOf(b.filter));
}

export async function countsByState(db: DbOrTx, ask: Ask): Promise<Counted[]> {
  return db.select({ value: sql<string>`${rows.state}`, count: n }).from(rows).where(whereOf(ask)).groupBy(rows.state).orderBy(sql`2 desc`, rows.state);
}

export async function facets(db: DbOrTx, ask: Ask, most: number): Promise<Counted[]> {
  return db.select({ value: sql<string>`${rows.facet}`, count: n }).from(rows).where(and(whereOf(ask), sql`${rows.facet} is not null`)).groupBy(rows.facet).orderBy(sql`2 desc`, rows.facet).limit(most);
}
