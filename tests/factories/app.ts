import { once } from 'node:events';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import pg from 'pg';
import pino from 'pino';
import { afterAll, beforeAll } from 'vitest';
import { createApp, type HttpSettings } from '#server/app.ts';
import type { Context } from '#server/context.ts';
import { openPools, type Pools } from '#server/db/pool.ts';
import { createServices, type Services } from '#server/services.ts';
import { startFakeDoiServer, type FakeDoiRecord, type FakeDoiServer } from '#server/services/doi/fake-doi-server.ts';
import { createDoiClient } from '#server/services/doi/resolver-client.ts';
import type { Actor } from '#server/actor.ts';
import type { Role } from '#shared/domain/roles.ts';
import { useDatabase, type TestDatabase } from '#tests/setup/database.ts';
import { Client } from './client.ts';
import { testSources } from './entry-input.ts';

/** Password of every account a test makes. */
export const testPassword = 'a long enough test password';

const generous: HttpSettings['limits'] = {
  signInFailures: { perWindow: 100_000, windowS: 60 }, calculators: { perWindow: 100_000, windowS: 60 }, exports: { perWindow: 100_000, windowS: 60 },
};

export interface Person {
  actor: Actor & { userId: string };
  email: string;
  client: Client;
}

/** The time of a test: it stands still unless it is moved. */
export class TestClock {
  private time = new Date('2026-03-02T09:00:00.000Z').getTime();
  readonly now = (): Date => new Date(this.time);
  advance(hours: number): void {
    this.time += hours * 3_600_000;
  }
}

export interface AppOptions {
  demonstration?: boolean;
  limits?: Partial<HttpSettings['limits']>;
  /** Further sources that the stand-in DOI service knows. */
  doiRecords?: () => Promise<readonly FakeDoiRecord[]>;
}

/** The product on a database of the test file's own, answering over HTTP. */
export class TestApp {
  database: TestDatabase | undefined;
  readonly clock = new TestClock();
  /** Switch off to have the DOI service refuse connections. */
  doiIsUp = true;
  /** What the server logged as unforeseen: must stay empty. */
  readonly unforeseen: string[] = [];
  private parts: { server: Server; url: string; pools: Pools; services: Services; fake: FakeDoiServer; owner: pg.Pool; context: Context } | undefined;
  private made = 0;

  private get known() {
    if (!this.parts) throw new Error('The application is started before the first test: use it inside a test or a hook.');
    return this.parts;
  }
  get url(): string { return this.known.url; }
  get services(): Services { return this.known.services; }
  get context(): Context { return this.known.context; }
  get pools(): Pools { return this.known.pools; }

  async start(database: TestDatabase, options: AppOptions): Promise<void> {
    this.database = database;
    const pools = openPools(database.appUrl, () => undefined);
    const fake = await startFakeDoiServer({ records: [...testSources, ...(await options.doiRecords?.() ?? [])], slowMs: 20_000 });
    const working = createDoiClient({ resolverUrl: fake.url, timeoutMs: 400, maxConcurrent: 50 });
    const dead = createDoiClient({ resolverUrl: 'http://127.0.0.1:9', timeoutMs: 400 });
    const log = pino({ level: 'error' }, { write: (line: string) => this.unforeseen.push(line) });
    const context: Context = {
      db: pools.db, exportPool: pools.exportPool, clock: this.clock.now, doi: { lookup: (doi) => (this.doiIsUp ? working : dead).lookup(doi) },
      demonstration: options.demonstration ?? false, publicUrl: 'http://sillstone.test', version: '0.0.0-test', log,
    };
    const services = createServices(context);
    const app = createApp(context, services, { sessionSecret: 'a long text that is only ever used in tests 0123456789', secureCookies: false, clientDir: 'tests/no-client', limits: { ...generous, ...options.limits } });
    const server = app.listen(0, '127.0.0.1');
    await once(server, 'listening');
    const owner = new pg.Pool({ connectionString: database.ownerUrl, max: 2 });
    // Dropping the database ends connections that are still closing; that is no fault of a test.
    owner.on('error', () => undefined);
    this.parts = { server, url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`, pools, services, fake, context, owner };
  }

  async stop(): Promise<void> {
    if (!this.parts) return;
    const { server, pools, fake, owner } = this.parts;
    server.closeAllConnections();
    await new Promise((resolve) => server.close(resolve));
    await Promise.all([pools.close(), fake.close(), owner.end()]);
    if (this.unforeseen.length > 0) throw new Error(`The server met what it did not foresee:\n${this.unforeseen.slice(0, 5).join('\n')}`);
  }

  /** Asks the database as its owner: for looking, and for what no interface offers. */
  async sql<Row extends pg.QueryResultRow>(text: string, values: unknown[] = []): Promise<Row[]> {
    return (await this.known.owner.query<Row>(text, values)).rows;
  }

  /** A browser in which nobody is signed in. */
  async visitor(): Promise<Client> {
    const client = new Client(this.url, 'visitor');
    await client.fetchToken();
    return client;
  }

  /** A person of a role, signed in through the real flow. */
  async person(role: Exclude<Role, 'visitor'>, name = `${role} ${String((this.made += 1))}`): Promise<Person> {
    const email = `${name.toLowerCase().replace(/[^a-z0-9]+/g, '.')}@people.example`;
    const userId = await this.services.accounts.create({ email, name, password: testPassword, role });
    const client = new Client(this.url, name);
    const answer = await client.signIn(email, testPassword);
    if (answer.status !== 200) throw new Error(`Signing in failed: ${answer.text}`);
    return { actor: { userId, name, roles: [role] }, email, client };
  }
}

/** Starts the product for a test file. @example const app = useApp(); it('…', async () => { const { client } = await app.person('reader'); }); */
export function useApp(options: AppOptions = {}): TestApp {
  const database = useDatabase();
  const app = new TestApp();
  beforeAll(() => app.start(database, options));
  afterAll(() => app.stop());
  return app;
}
