import pg from 'pg';
import type { Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { migrateDatabase } from '#server/db/migrate.ts';
import { demonstrationDomain, demonstrationPassword } from '#server/features/accounts/accounts.service.ts';
import { createServices, type Services } from '#server/services.ts';
import { checklistPoints, type DecisionReason } from '#shared/domain/review.ts';
import { readDemoEntries, readDemoPeople, type DemoEntry } from './demo/read-demo.ts';
import { readVocabulary } from './vocabulary/read-vocabulary.ts';

/** Where the demonstration files lie, from the folder the programs run in. */
export const demonstrationFolder = 'seeds/demo';

const begun = 'demonstration-begun';
const loaded = 'demonstration-loaded';

/** Loads the vocabulary, and makes search rows anew where an older version of the product made them; running it again changes nothing. */
export async function loadVocabulary(services: Services): Promise<void> {
  await services.vocabulary.load(readVocabulary().map(({ kind, code, label, synonyms, data }) => ({ list: kind, code, label, synonyms, data: data as Record<string, unknown> })));
  await services.search.renew();
}

/** Whether the demonstration data is in the database; `broken` when a load was cut off. */
export async function demonstrationState(ownerUrl: string): Promise<'absent' | 'loaded' | 'broken'> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ name: string }>('select name from milestones where name = any($1)', [[begun, loaded]]);
    const names = rows.map(({ name }) => name);
    return names.includes(loaded) ? 'loaded' : names.includes(begun) ? 'broken' : 'absent';
  } finally {
    await client.end();
  }
}

/** Empties a database in which loading the demonstration was cut off. Refuses when anybody else's account is in it. */
export async function resetBrokenDemonstration(ownerUrl: string, appRole: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    const { rows } = await client.query<{ n: string }>('select count(*) as n from users where email not like $1', [`%${demonstrationDomain}`]);
    if (rows[0]?.n !== '0') throw new Error('Loading the demonstration was cut off, and there are other accounts in the database: it is left as it is.');
    const { rows: tables } = await client.query<{ name: string }>("select quote_ident(tablename) as name from pg_tables where schemaname = 'public'");
    await client.query(`drop table ${tables.map(({ name }) => name).join(', ')} cascade`);
    const { rows: functions } = await client.query<{ name: string }>(
      `select p.oid::regprocedure::text as name from pg_proc p join pg_namespace n on n.oid = p.pronamespace
       where n.nspname = 'public' and not exists (select 1 from pg_depend d where d.objid = p.oid and d.deptype = 'e')`,
    );
    for (const { name } of functions) await client.query(`drop function ${name} cascade`);
    await client.query('drop schema if exists drizzle cascade');
  } finally {
    await client.end();
  }
  await migrateDatabase({ ownerUrl, appRole });
}

interface Step {
  at: Date;
  run: () => Promise<void>;
}

/** Plays the demonstration's script through the same services that people use, each step at its own time. */
export async function loadDemonstration(base: Context, say: (line: string) => void): Promise<void> {
  let now = new Date();
  const clock = () => now;
  const services = createServices({ ...base, clock });
  const mark = async (name: string) => base.db.$client.query('insert into milestones (name) values ($1)', [name]);
  await mark(begun);

  const people = new Map<string, Actor>();
  now = new Date('2025-09-01T08:00:00Z');
  for (const { email, name, role, signsIn } of readDemoPeople(demonstrationFolder)) {
    const password = signsIn ? demonstrationPassword : crypto.randomUUID();
    const userId = await services.accounts.create({ email, name, password, role });
    people.set(email, { userId, name, roles: [role] });
  }
  const person = (email: string | null | undefined): Actor => {
    const found = email ? people.get(email) : undefined;
    if (!found) throw new Error(`people.csv has no ${email ?? 'name'}`);
    return found;
  };

  const accessions = new Map<string, string>();
  /** By row: the submission and the tag of the revision handed in. */
  const submissions = new Map<string, { id: string; tag: string }>();
  const steps: Step[] = readDemoEntries(demonstrationFolder).flatMap((entry) => script(entry));
  steps.sort((a, b) => a.at.getTime() - b.at.getTime());

  function script({ row, input, script: told }: DemoEntry): Step[] {
    const latest = new Date();
    const contributor = person(told.contributor);
    const accessionOf = (name: string): string => {
      const accession = accessions.get(name);
      if (!accession) throw new Error(`entries.csv, row ${row}: row ${name} comes later`);
      return accession;
    };
    const submissionOf = (name: string) => {
      const submission = submissions.get(name);
      if (!submission) throw new Error(`entries.csv, row ${row}: nothing was handed in for it`);
      return submission;
    };
    const list: Step[] = [];
    const submittedAt = told.submittedAt ? new Date(told.submittedAt) : latest;
    list.push({
      at: submittedAt,
      run: async () => {
        let draft = told.revises
          ? await services.entries.revise(contributor, accessionOf(told.revises), told.revisionReason ?? 'The source was read again.')
          : await services.entries.create(contributor, input);
        accessions.set(row, draft.accession);
        if (told.revises) draft = await services.entries.patch(contributor, draft.accession, { quantities: null, conditions: null, validRange: null, ...input }, `${draft.revision}.${draft.lock}`);
        if (told.outcome === 'draft') return;
        const submitted = await services.entries.submit(contributor, draft.accession, null);
        if (submitted.submission) submissions.set(row, { id: submitted.submission, tag: `${submitted.revision}.${submitted.lock}` });
      },
    });
    const decidedAt = told.decidedAt ? new Date(told.decidedAt) : latest;
    const decide = (decision: 'accept' | 'return' | 'reject') => async () => {
      const { id, tag: seen } = submissionOf(row);
      await services.reviews.decide(person(told.reviewer), id, {
        decision, seen, reason: decision === 'accept' ? undefined : (told.reason as DecisionReason | undefined) ?? 'other', comment: told.comment ?? '',
        checklist: Object.fromEntries(checklistPoints.map((point) => [point, 'yes' as const])),
      });
    };
    switch (told.outcome) {
      case 'accepted': case 'superseded': case 'retracted': list.push({ at: decidedAt, run: decide('accept') }); break;
      case 'returned': list.push({ at: decidedAt, run: decide('return') }); break;
      case 'rejected': list.push({ at: decidedAt, run: decide('reject') }); break;
      case 'withdrawn': list.push({ at: decidedAt, run: async () => { await services.entries.withdraw(contributor, accessionOf(row)); } }); break;
      // A claim lasts three days, so it is taken when the demonstration is loaded.
      case 'under-review': list.push({ at: latest, run: async () => { await services.reviews.claim(person(told.reviewer), submissionOf(row).id); } }); break;
      default: break;
    }
    if (told.outcome === 'retracted') {
      list.push({ at: told.retractedAt ? new Date(told.retractedAt) : latest, run: async () => { await services.entries.retract(person(told.retractedBy), accessionOf(row), told.retractionReason ?? 'Retracted.'); } });
    }
    return list;
  }

  const started = Date.now();
  for (const [index, step] of steps.entries()) {
    now = step.at;
    await step.run();
    if ((index + 1) % 200 === 0) say(`  ${index + 1} of ${steps.length} steps of the demonstration`);
  }
  await mark(loaded);
  say(`Loaded the demonstration: ${accessions.size} revisions, ${steps.length} steps, ${((Date.now() - started) / 1000).toFixed(1)} s. All of it is invented.`);
}
