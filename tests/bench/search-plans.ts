import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { drizzle } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import type { DbOrTx } from '#server/db/pool.ts';
import { readFilter } from '#server/features/search/read-filter.ts';
import { createPostgresSearch } from '#server/features/search/search.repository.ts';
import { publicRows } from '#server/features/search/search.policy.ts';
import type { SearchEngine, Ask } from '#server/features/search/search-engine.ts';
import { readVocabularyNames } from '#server/features/search/search-vocabulary.repository.ts';
import { entryFilter, type SortKey } from '#shared/contracts/entry-search.ts';

/*
 * Explains the statements of the commonest searches on a database filled by generate.ts, and writes what it saw beside this file.
 *   DATABASE_URL=… node search-plans.mjs
 */

const url = process.env.DATABASE_URL;
if (!url) throw new Error('Usage: DATABASE_URL=… node search-plans.mjs');
const client = new pg.Client({ connectionString: url });
await client.connect();

interface Statement {
  text: string;
  values: unknown[];
}
const seen: Statement[] = [];
const db = drizzle(client, { logger: { logQuery: (text, values) => seen.push({ text, values }) } }) as unknown as DbOrTx;
const engine = createPostgresSearch(db);
const names = await readVocabularyNames(db);

interface PlanNode {
  'Node Type': string;
  'Index Name'?: string;
  'Relation Name'?: string;
  Plans?: PlanNode[];
}
const nodes = (plan: PlanNode): PlanNode[] => [plan, ...(plan.Plans ?? []).flatMap(nodes)];

async function explain(statement: Statement, settings: readonly Statement[]): Promise<{ ms: number; scans: string }> {
  const times: number[] = [];
  let scans = '';
  for (let round = 0; round < 5; round += 1) {
    await client.query('begin');
    for (const setting of settings) await client.query(setting.text, setting.values);
    const { rows } = await client.query<{ 'QUERY PLAN': [{ Plan: PlanNode; 'Execution Time': number; 'Planning Time': number }] }>(`explain (analyze, format json) ${statement.text}`, statement.values);
    await client.query('rollback');
    const [plan] = rows[0]?.['QUERY PLAN'] ?? [];
    if (!plan) throw new Error('No plan came back.');
    times.push(plan['Execution Time'] + plan['Planning Time']);
    scans = [...new Set(nodes(plan.Plan).filter((node) => node['Index Name'] ?? node['Relation Name']?.startsWith('search_')).map((node) => node['Index Name'] ?? `${node['Node Type'].toLowerCase()} of ${node['Relation Name']}`))].join(', ');
  }
  times.sort((a, b) => a - b);
  return { ms: times[2] ?? NaN, scans };
}

const page = (sort: SortKey, extra: { groupBy?: 'step'; temperatureK?: number } = {}) => (one: SearchEngine, ask: Ask) => one.page(ask, { sort, groupBy: extra.groupBy, temperatureK: extra.temperatureK, limit: 50, position: null });
const total = (one: SearchEngine, ask: Ask) => one.total(ask);
const counts = (one: SearchEngine, ask: Ask) => one.counts(ask);
const figures = (one: SearchEngine, ask: Ask) => one.figures(ask);
type Work = (one: SearchEngine, ask: Ask) => Promise<unknown>;
const searches: [string, Record<string, string>, [string, Work][]][] = [
  ['everything, by elementary step', {}, [['page', page('step')], ['total', total], ['counts', counts], ['summary', figures]]],
  ['one metal', { metal: 'Ni' }, [['page', page('step')], ['page by falling energy', page('-energy')], ['total', total], ['counts', counts], ['summary', figures]]],
  ['one elementary step on one metal', { step: 'N* + N* -> N2 + 2*', metal: 'Ru' }, [['page', page('energy')], ['total', total], ['counts', counts], ['summary', figures]]],
  ['words', { q: 'ammonia terraces' }, [['page', page('step')], ['total', total], ['counts', counts]]],
  ['activation energies valid at 700 K, by k', { kind: 'activation-energy', validAt: '700' }, [['page', page('-k', { temperatureK: 700 })], ['total', total], ['counts', counts]]],
  ['an author', { author: 'Lintor' }, [['page', page('-year')], ['total', total]]],
  ['a species on an alloy', { species: 'NH2', formula: 'Ni3Fe' }, [['page', page('step')], ['total', total]]],
  ['groups of steps', {}, [['page with groups', page('energy', { groupBy: 'step' })], ['heads of all groups', (one, ask) => one.groups(ask, 'step', { limit: 50, position: null })]]],
  ['a slip of the pen', { q: 'ruthenuim' }, [['near words', (one) => one.nearWords(['ruthenuim'])]]],
];

const lines: string[] = [];
for (const [name, query, parts] of searches) {
  const { filter } = readFilter(entryFilter.parse(query), names);
  const ask = { filter, visible: publicRows };
  const found = await engine.total(ask);
  for (const [what, work] of parts) {
    seen.length = 0;
    await work(engine, ask);
    const explained = [];
    // What an answer sets for its own transaction is set for its plan, too.
    const asked = [...seen];
    const settings = asked.filter(({ text }) => text.includes('set_config'));
    for (const statement of asked) if (/^\s*(?:select|with)/.test(statement.text) && !settings.includes(statement)) explained.push(await explain(statement, settings));
    const ms = explained.reduce((sum, one) => sum + one.ms, 0);
    lines.push(`| ${name} | ${found} | ${what} | ${ms < 10 ? ms.toFixed(1) : ms.toFixed(0)} | ${[...new Set(explained.flatMap(({ scans }) => scans.split(', ')))].filter(Boolean).join(', ')} |`);
    process.stdout.write(`${lines.at(-1)}\n`);
  }
}
const { rows: [about] } = await client.query<{ version: string; n: number; size: string }>("select split_part(version(), ' ', 2) as version, (select count(*)::int from search_rows) as n, pg_size_pretty(pg_total_relation_size('search_rows')) as size");
writeFileSync('tests/bench/RESULTS-search.md', `# Searches, last measured

Measured ${execFileSync('date', ['-u', '+%Y-%m-%d']).toString().trim()}, ${cpus().length} cores (${(cpus()[0]?.model ?? 'unknown').replace(/\s+/g, ' ').trim()}), PostgreSQL ${about?.version}, ${about?.n} search rows (${about?.size} with their indexes), filled by \`generate.ts\` with seed 1.
Each time is what PostgreSQL says of planning and running the statements of one part of the answer, the median of five runs with a warm cache, on a machine with other work on it. By \`search-plans.ts\`.

| search | found | part | ms | read by |
| --- | --- | --- | --- | --- |
${lines.join('\n')}
`);
await client.end();
