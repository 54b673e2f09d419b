import { and, eq, inArray, or, sql, type SQL } from 'drizzle-orm';
import { searchRows as rows } from '#server/db/schema/search.ts';
import { methodClasses } from '#shared/domain/kinds.ts';
import { wordsOf } from './free-words.ts';
import type { Ask, FilterName, SearchFilter, StepPattern, Visibility } from './search-engine.ts';

const escapeLike = (text: string) => text.replace(/[%_\\]/g, '\\$&');
const isId = (text: string): boolean => /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i.test(text);
const texts = (values: readonly string[]) => sql`${sql.param([...values])}::text[]`;
/** Words brought to the form that keys of people are kept in. */
const foldedTexts = (values: readonly string[]) => (values.length === 0 ? sql`'{}'::text[]` : sql`array[${sql.join(values.map((value) => sql`folded(${value})`), sql`, `)}]`);

/** Finds a word in the full text by its beginning, or anywhere inside the words. */
function matchesWord(word: string): SQL {
  const plain = word.toLowerCase();
  const parts = plain.split(/[^\p{L}\p{N}]+/u).filter(Boolean);
  const whole = sql`${rows.searchText} like ${`%${escapeLike(plain)}%`}`;
  if (parts.length === 0) return whole;
  // Each part in quotes: taking accents off can bring brackets and apostrophes with it, as ⑴ becomes (1).
  const quoted = parts.map((part) => sql`'''' || translate(unaccent(${part}), '''\\', '  ') || ''':*'`);
  const full = sql`${rows.document} @@ to_tsquery('simple', ${sql.join(quoted, sql` || ' & ' || `)})`;
  // One or two letters inside other words are no find, and no index knows them.
  return /^[\p{L}\p{N}]{1,2}$/u.test(plain) ? full : sql`(${full} or ${whole})`;
}

function matchesStep({ keys, classes, species }: StepPattern): SQL | undefined {
  return and(
    keys ? inArray(rows.stepKey, [...keys]) : undefined, classes ? inArray(rows.stepClass, [...classes]) : undefined,
    ...(species ?? []).map((some) => sql`${rows.species} && ${texts(some)}`),
  );
}

function matchesPromoter(values: readonly string[]): SQL | undefined {
  const named = values.filter((value) => value !== 'none' && value !== 'any');
  return or(
    values.includes('none') ? sql`cardinality(${rows.promoters}) = 0` : undefined, values.includes('any') ? sql`cardinality(${rows.promoters}) > 0` : undefined,
    named.length > 0 ? sql`${rows.promoters} && ${texts(named)}` : undefined,
  );
}

/** A valid range that holds a temperature; without a stated range a computed value does, a measured one does not. */
const holds = (temperatureK: number) => sql`(coalesce(${rows.validMinK}, '-infinity') <= ${temperatureK} and coalesce(${rows.validMaxK}, 'infinity') >= ${temperatureK}
  and (${rows.validMinK} is not null or ${rows.validMaxK} is not null or ${rows.methodClass} = 'computed'))`;

/** One condition a filter in force; different names are joined with AND, repeated values with OR. */
export function filterConditions(filter: SearchFilter): Map<FilterName, SQL> {
  const conditions = new Map<FilterName, SQL>();
  const put = (name: FilterName, condition: SQL | undefined) => {
    if (condition) conditions.set(name, condition);
  };
  const list = (name: FilterName, values: readonly string[] | undefined, condition: (values: string[]) => SQL | undefined) => {
    if (values) put(name, values.length === 0 ? sql`false` : condition([...values]));
  };
  const anyOf = (name: FilterName, column: Parameters<typeof inArray>[0], values: readonly string[] | undefined) => list(name, values, (some) => inArray(column, some));
  if (filter.q) put('q', and(...wordsOf(filter.q).map(matchesWord)));
  list('kind', filter.kind, (some) => sql`${rows.kindsHeld} && ${texts(some)}`);
  anyOf('energyType', rows.energyType, filter.energyType);
  anyOf('metal', rows.metal, filter.metal);
  list('contains', filter.contains, (some) => sql`${rows.elements} && ${texts(some)}`);
  anyOf('formula', rows.formula, filter.formula);
  anyOf('facet', rows.facet, filter.facet);
  anyOf('site', rows.site, filter.site);
  anyOf('support', rows.support, filter.support);
  list('promoter', filter.promoter, matchesPromoter);
  if (filter.step) put('step', or(...filter.step.map(matchesStep)) ?? sql`false`);
  anyOf('stepClass', rows.stepClass, filter.stepClass);
  list('species', filter.species, (some) => sql`${rows.species} && ${texts(some)}`);
  anyOf('bond', rows.bond, filter.bond);
  anyOf('cleavage', rows.cleavage, filter.cleavage);
  list('method', filter.method, (some) => {
    const classes = some.filter((one) => (methodClasses as readonly string[]).includes(one));
    const techniques = some.filter((one) => !classes.includes(one));
    return or(techniques.length > 0 ? inArray(rows.technique, techniques) : undefined, classes.length > 0 ? inArray(rows.methodClass, classes) : undefined);
  });
  anyOf('methodClass', rows.methodClass, filter.methodClass);
  list('methodFamily', filter.methodFamily, (some) => inArray(sql`lower(${rows.technique})`, some));
  anyOf('provenance', rows.provenance, filter.provenance);
  anyOf('scope', rows.scope, filter.scope);
  anyOf('sampleType', rows.sampleType, filter.sampleType);
  anyOf('accession', rows.accession, filter.accession);
  anyOf('collection', rows.accession, filter.collection);
  list('source', filter.source, (some) => {
    const ids = some.filter(isId);
    return or(inArray(rows.doi, some.map((text) => text.toLowerCase())), ids.length > 0 ? inArray(rows.sourceId, ids) : undefined);
  });
  list('author', filter.author, (some) => sql`${rows.authorKeys} && ${foldedTexts(some)}`);
  list('contributor', filter.contributor, (some) => sql`${rows.contributorKey} = any(${foldedTexts(some)})`);
  if (filter.hasUncertainty !== undefined) put('hasUncertainty', eq(rows.hasUncertainty, filter.hasUncertainty));
  if (filter.yearFrom !== undefined) put('yearFrom', sql`${rows.year} >= ${filter.yearFrom}`);
  if (filter.yearTo !== undefined) put('yearTo', sql`${rows.year} <= ${filter.yearTo}`);
  const [kind] = filter.kind ?? [];
  if (filter.valueMin !== undefined) put('valueMin', sql`(${rows.values} ->> ${kind ?? ''})::float8 >= ${filter.valueMin}`);
  if (filter.valueMax !== undefined) put('valueMax', sql`(${rows.values} ->> ${kind ?? ''})::float8 <= ${filter.valueMax}`);
  if (filter.validAt !== undefined) put('validAt', holds(filter.validAt));
  if (filter.validFrom !== undefined) put('validFrom', holds(filter.validFrom));
  if (filter.validTo !== undefined) put('validTo', holds(filter.validTo));
  return conditions;
}

/** The rows that may be seen at all. Accepted ones alone are the rows that every index is made for. */
export function visibleRows({ states, unaccepted }: Visibility): SQL {
  const accepted = states.includes('accepted') ? sql`${rows.listed}` : undefined;
  const others = states.filter((state) => state !== 'accepted');
  if (others.length === 0 || unaccepted === 'nobody') return accepted ?? sql`false`;
  const rest = and(sql`not ${rows.listed}`, inArray(rows.state, others), unaccepted === 'everybody' ? undefined : eq(rows.authorId, unaccepted.of));
  return or(accepted, rest) ?? sql`false`;
}

/** Everything a question finds, the filters named left aside. Visibility stands first. */
export function whereOf({ filter, visible }: Ask, except: readonly FilterName[] = []): SQL | undefined {
  return and(visibleRows(visible), ...[...filterConditions(filter)].filter(([name]) => !except.includes(name)).map(([, condition]) => condition));
}

/** Everything accepted that a filter finds, from an accession on: what an export walks through. */
export function exportOrder(conditions: ReadonlyMap<FilterName, SQL>, after: string | null): SQL | undefined {
  return and(eq(rows.listed, true), ...conditions.values(), after === null ? undefined : sql`${rows.accession} > ${after}`);
}
