import { spawn, type ChildProcess } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { createServer } from 'node:net';
import path from 'node:path';
import { build } from 'esbuild';
import { afterAll, beforeAll } from 'vitest';

/** A server in a process of its own, which can be killed. */
export interface ServerProcess {
  readonly url: string;
  /** SIGKILL: no chance to finish anything. */
  kill(): Promise<void>;
  /** SIGTERM; the exit code. */
  stop(): Promise<number | null>;
}

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

async function startProcess(program: string, databaseUrl: string, running: Set<ChildProcess>): Promise<ServerProcess> {
  const port = await freePort();
  const child = spawn(process.execPath, [program], {
    env: { NODE_ENV: 'test', HOST: '127.0.0.1', PORT: String(port), DATABASE_URL: databaseUrl, SILLSTONE_DEMO: '1', SESSION_SECRET: 'a long text that is only ever used in tests 0123456789', LOG_LEVEL: 'warn' },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  running.add(child);
  const ended = new Promise<number | null>((resolve) => child.once('exit', (code) => {
    running.delete(child);
    resolve(code);
  }));
  let said = '';
  await new Promise<void>((resolve, reject) => {
    const listen = (text: string): void => {
      said += text;
      if (said.includes('Sillstone is ready at')) resolve();
    };
    child.stdout.setEncoding('utf8').on('data', listen);
    child.stderr.setEncoding('utf8').on('data', listen);
    void ended.then((code) => reject(new Error(`The server ended with ${String(code)} before it answered:\n${said}`)));
  });
  const end = (signal: 'SIGKILL' | 'SIGTERM') => {
    child.kill(signal);
    return ended;
  };
  return { url: `http://127.0.0.1:${port}`, kill: async () => { await end('SIGKILL'); }, stop: () => end('SIGTERM') };
}

/**
 * Compiles the server as it is now, once for a test file, and starts it as often as a test wants; what still runs is ended afterwards.
 * @example const start = useServerProcess(); it('…', async () => { const server = await start(database.appUrl); await server.kill(); });
 */
export function useServerProcess(): (databaseUrl: string) => Promise<ServerProcess> {
  // Inside the checkout, so that packages are found.
  const folder = path.resolve('node_modules', '.cache', `server-${randomUUID()}`);
  const running = new Set<ChildProcess>();
  beforeAll(async () => {
    await build({
      entryPoints: ['server/index.ts'], outdir: folder, bundle: true, splitting: true, platform: 'node', format: 'esm', target: 'node20', packages: 'external', outExtension: { '.js': '.mjs' }, logLevel: 'silent',
      plugins: [{ name: 'own-aliases', setup: ({ onResolve }) => onResolve({ filter: /^#/ }, ({ path: name }) => ({ path: path.resolve(name.slice(1)) })) }],
    });
  });
  afterAll(async () => {
    for (const child of running) child.kill('SIGKILL');
    await rm(folder, { recursive: true, force: true });
  });
  return (databaseUrl) => startProcess(path.join(folder, 'index.mjs'), databaseUrl, running);
}
