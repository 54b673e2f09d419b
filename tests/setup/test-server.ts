import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { startThrowawayPostgres } from '#server/bootstrap/throwaway-postgres.mjs';
import { migrateDatabase } from '#server/db/migrate.ts';

/** Roles and passwords of the throw-away server; it listens on loopback for one run. */
export const testRoles = { owner: 'sillstone_owner', application: 'sillstone_app', password: 'throwaway' } as const;

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the superuser's connection to the throw-away server. */
    adminUrl: string;
    /** The migrated database that test databases are copied from. */
    template: string;
  }
}

/** The address of another database on the same server. */
export function databaseUrl(adminUrl: string, database: string, role?: 'owner' | 'application'): string {
  const url = new URL(adminUrl);
  url.pathname = `/${database}`;
  if (role) {
    url.username = testRoles[role];
    url.password = testRoles.password;
  }
  return url.href;
}

/** Runs statements as the superuser, each by itself. */
export async function asSuperuser(url: string, statements: readonly string[]): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    for (const statement of statements) await client.query(statement);
  } finally {
    await client.end();
  }
}

/** Makes an empty database owned by the owner's role, as the start-up programs make it. */
export async function createEmptyDatabase(adminUrl: string, name: string): Promise<void> {
  await asSuperuser(adminUrl, [
    `create database ${name} owner ${testRoles.owner} template template0 encoding utf8`,
    `revoke all on database ${name} from public`,
    `grant connect on database ${name} to ${testRoles.application}`,
  ]);
  await asSuperuser(databaseUrl(adminUrl, name), ['pg_trgm', 'unaccent', 'btree_gin'].map((extension) => `create extension if not exists ${extension}`));
}

/** Makes the two roles when they are not there; the same rights as in a real installation. */
async function createRoles(adminUrl: string): Promise<void> {
  for (const role of [testRoles.owner, testRoles.application]) {
    await asSuperuser(adminUrl, [
      `do $$ begin create role ${role} login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password '${testRoles.password}';
       exception when duplicate_object or unique_violation then null; end $$`,
    ]);
  }
}

/**
 * Once per run and project: the server of `npm test`, or one of its own when a project is run by hand; the roles; and one
 * database brought up to date by the product's own migrations, from which every test file gets its copy.
 */
export default async function prepare(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env.TEST_DATABASE_ADMIN_URL;
  const own = given ? null : await startThrowawayPostgres();
  const adminUrl = given ?? own?.adminUrl ?? '';
  const template = `template_${project.name}`;
  await createRoles(adminUrl);
  await createEmptyDatabase(adminUrl, template);
  await migrateDatabase({ ownerUrl: databaseUrl(adminUrl, template, 'owner'), appRole: testRoles.application });
  project.provide('adminUrl', adminUrl);
  project.provide('template', template);
  return async () => {
    await own?.stop();
  };
}
