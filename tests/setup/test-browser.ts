import { spawn } from 'node:child_process';
import { chromium } from 'playwright-core';
import type { TestProject } from 'vitest/node';
import { findBrowser } from '#server/bootstrap/test-programs.mjs';
import { buildWhatIsStale } from '#server/bootstrap/build.mjs';
import { createEmptyDatabase, databaseUrl } from './test-server.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Where the one browser of the run takes orders. */
    browserEndpoint: string;
    /** The database with vocabulary and demonstration data that browser tests copy. */
    demonstrationTemplate: string;
  }
}

/** What the compiled programs of the server are told about a test database. */
export function serverEnvironment(adminUrl: string, database: string): NodeJS.ProcessEnv {
  return {
    PATH: process.env.PATH,
    NODE_ENV: 'test',
    HOST: '127.0.0.1',
    DATABASE_URL: databaseUrl(adminUrl, database, 'application'),
    SILLSTONE_DEMO: '1',
    SESSION_SECRET: 'a long text that is only ever used in tests 0123456789',
    LOG_LEVEL: 'warn',
  };
}

/** Runs a compiled command as the owner; what it printed is the error when it fails. */
function runCommand(name: 'migrate' | 'seed', adminUrl: string, database: string): Promise<void> {
  const env = { ...serverEnvironment(adminUrl, database), DATABASE_OWNER_URL: databaseUrl(adminUrl, database, 'owner') };
  const child = spawn(process.execPath, ['--enable-source-maps', `dist/server/${name}.js`], { env, stdio: ['ignore', 'pipe', 'pipe'] });
  let said = '';
  for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', (text: string) => (said += text));
  return new Promise((resolve, reject) => {
    child.on('error', reject);
    child.on('close', (code) => (code === 0 ? resolve() : reject(new Error(`${name} ended with ${String(code)}:\n${said}`))));
  });
}

/** Once for the browser tests: a fresh build, a database with the demonstration data to copy, one browser. */
export default async function prepare(project: TestProject): Promise<() => Promise<void>> {
  await buildWhatIsStale();
  const adminUrl = project.getProvidedContext().adminUrl;
  const template = 'template_demonstration';
  await createEmptyDatabase(adminUrl, template);
  await runCommand('migrate', adminUrl, template);
  await runCommand('seed', adminUrl, template);
  const executablePath = findBrowser();
  if (!executablePath) throw new Error('The browser tests need Chromium; npm test installs it.');
  const browser = await chromium.launchServer({ executablePath, host: '127.0.0.1', args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu'] });
  project.provide('browserEndpoint', browser.wsEndpoint());
  project.provide('demonstrationTemplate', template);
  return async () => {
    await browser.close();
  };
}
