import { spawn } from 'node:child_process';
import path from 'node:path';
import { BackupError } from './db-manifest.ts';

/**
 * Runs one of PostgreSQL's own programs against a database and waits for its end.
 * The password goes through the environment: a command line can be read by everybody on the machine.
 * @param programs folder of PostgreSQL's programs
 * @throws BackupError with what the program said
 */
export async function runDatabaseProgram(programs: string, name: 'pg_dump' | 'pg_restore', databaseUrl: string, args: readonly string[]): Promise<void> {
  const url = new URL(databaseUrl);
  const password = decodeURIComponent(url.password);
  url.password = '';
  const child = spawn(path.join(programs, name), [...args, '--no-password', `--dbname=${url.href}`], {
    env: { PGPASSWORD: password, LC_ALL: 'C' },
    stdio: ['ignore', 'ignore', 'pipe'],
  });
  let said = '';
  child.stderr.setEncoding('utf8').on('data', (text: string) => {
    said = (said + text).slice(-4000);
  });
  const code = await new Promise<number>((resolve, reject) => {
    child.on('error', reject);
    child.on('close', (status) => resolve(status ?? 1));
  });
  if (code !== 0) throw new BackupError(`${name} ended with ${code}:\n${said.trim()}`);
}
