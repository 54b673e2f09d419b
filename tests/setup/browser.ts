import { spawn, type ChildProcess } from 'node:child_process';
import { createServer } from 'node:net';
import { chromium, type Browser } from 'playwright-core';
import { afterAll, beforeAll, inject } from 'vitest';
import { copyDatabase, dropDatabase, type TestDatabase } from './database.ts';
import { serverEnvironment } from './test-browser.ts';

/** The compiled server with the demonstration data, on a database of the test file's own. */
export interface TestSite {
  /** Such as `http://127.0.0.1:41234`, without a slash at the end. */
  readonly url: string;
  readonly database: TestDatabase;
  readonly browser: Browser;
}

/** A port that was free a moment ago. */
function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      probe.close(() => (address && typeof address === 'object' ? resolve(address.port) : reject(new Error('No port.'))));
    });
  });
}

/** Starts the compiled server and waits for the line that says it answers. */
export async function startServer(database: TestDatabase, extra: NodeJS.ProcessEnv = {}): Promise<{ url: string; process: ChildProcess; stop: () => Promise<void> }> {
  const env = { ...serverEnvironment(inject('adminUrl'), database.name), PORT: String(await freePort()), ...extra };
  const child = spawn(process.execPath, ['--enable-source-maps', 'dist/server/index.js'], { env, stdio: ['ignore', 'pipe', 'pipe'] });
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  let said = '';
  const url = await new Promise<string>((resolve, reject) => {
    const listen = (text: string): void => {
      said += text;
      const ready = /Sillstone is ready at (http:\/\/\S+)/.exec(said)?.[1];
      if (ready) resolve(ready.replace(/\/$/, ''));
    };
    child.stdout.setEncoding('utf8').on('data', listen);
    child.stderr.setEncoding('utf8').on('data', listen);
    child.once('error', reject);
    child.once('exit', (code) => reject(new Error(`The server ended with ${String(code)} before it answered:\n${said}`)));
  });
  return {
    url,
    process: child,
    stop: async () => {
      child.kill('SIGTERM');
      await ended;
    },
  };
}

/**
 * Gives the test file a running site and the browser of the run. Open a context per test and close it.
 * @example const site = useSite(); it('…', async () => { const page = await site.browser.newPage(); await page.goto(`${site.url}/search`); });
 */
export function useSite(extra: NodeJS.ProcessEnv = {}): TestSite {
  let database: TestDatabase | undefined;
  let server: Awaited<ReturnType<typeof startServer>> | undefined;
  let browser: Browser | undefined;
  const known = <T>(value: T | undefined): T => {
    if (value === undefined) throw new Error('The site is started before the first test: use it inside a test or a hook.');
    return value;
  };
  beforeAll(async () => {
    database = await copyDatabase(inject('demonstrationTemplate'));
    server = await startServer(database, extra);
    browser = await chromium.connect(inject('browserEndpoint'));
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
    if (database) await dropDatabase(database.name);
  });
  return {
    get url() {
      return known(server).url;
    },
    get database() {
      return known(database);
    },
    get browser() {
      return known(browser);
    },
  };
}
