import { randomBytes } from 'node:crypto';
import { afterAll, beforeAll, inject } from 'vitest';
import { asSuperuser, databaseUrl } from './test-server.ts';

/** A database of one test file's own. Tests connect as the application's role; the owner's address is for preparing only. */
export interface TestDatabase {
  readonly name: string;
  readonly appUrl: string;
  readonly ownerUrl: string;
  /** Superuser, for what a test does to the server rather than to the product. */
  readonly adminUrl: string;
}

/** Copies a database; the original must have no connections. */
export async function copyDatabase(from: string): Promise<TestDatabase> {
  const adminUrl = inject('adminUrl');
  const name = `test_${randomBytes(6).toString('hex')}`;
  await asSuperuser(adminUrl, [
    `create database ${name} template ${from} owner sillstone_owner`,
    `revoke all on database ${name} from public`,
    `grant connect on database ${name} to sillstone_app`,
  ]);
  return {
    name,
    appUrl: databaseUrl(adminUrl, name, 'application'),
    ownerUrl: databaseUrl(adminUrl, name, 'owner'),
    adminUrl: databaseUrl(adminUrl, name),
  };
}

/** Removes a database, whoever is still connected. */
export async function dropDatabase(name: string): Promise<void> {
  await asSuperuser(inject('adminUrl'), [`drop database if exists ${name} with (force)`]);
}

/**
 * Gives the test file a database of its own, migrated and empty, for as long as its tests run.
 * Read the addresses inside tests or hooks: they are known once the copy is made.
 * @example const database = useDatabase(); beforeAll(() => { pools = openPools(database.appUrl, onError); });
 */
export function useDatabase(): TestDatabase {
  let made: TestDatabase | undefined;
  const known = (): TestDatabase => {
    if (!made) throw new Error('The test database is made before the first test: read its address inside a test or a hook.');
    return made;
  };
  beforeAll(async () => {
    made = await copyDatabase(inject('template'));
  });
  afterAll(async () => {
    if (made) await dropDatabase(made.name);
  });
  return {
    get name() {
      return known().name;
    },
    get appUrl() {
      return known().appUrl;
    },
    get ownerUrl() {
      return known().ownerUrl;
    },
    get adminUrl() {
      return known().adminUrl;
    },
  };
}
