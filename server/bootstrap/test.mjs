/**
 * `npm test`: installs what is missing, starts a throw-away PostgreSQL, runs the checks and every test.
 *
 * `npm test -- FILTER …` runs only the test files whose path holds one of the words. The last line is always
 * `N passed, N failed`; a run without a single test is a failure.
 */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildWhatIsStale } from './build.mjs';
import { runChecks } from './check.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { run } from './processes.mjs';
import { SetupError, say } from './say.mjs';
import { checkStop, isStopping, listenForStop } from './stopping.mjs';
import { ensureTestPrograms } from './test-programs.mjs';
import { countReport } from './test-report.mjs';
import { startThrowawayPostgres } from './throwaway-postgres.mjs';

const filters = process.argv.slice(2);
const counts = { passed: 0, failed: 0 };
listenForStop();
try {
  await runEverything();
} catch (error) {
  counts.failed += 1;
  if (!isStopping()) process.stderr.write(`${error instanceof SetupError ? error.message : error instanceof Error ? error.stack : String(error)}\n`);
}
if (isStopping()) say('The run was stopped before its end.');
if (counts.passed === 0 && counts.failed === 0) {
  say('Not one test ran.');
  counts.failed = 1;
}
process.exitCode = counts.failed === 0 ? 0 : 1;
say(`${counts.passed} passed, ${counts.failed} failed`);

async function runEverything() {
  checkNodeVersion();
  await ensurePackages();
  checkStop();
  await ensureTestPrograms();
  checkStop();
  const postgres = await startThrowawayPostgres();
  try {
    checkStop();
    if (filters.length === 0) add(await runChecks());
    checkStop();
    await countBuild();
    checkStop();
    add(await runVitest({ TEST_DATABASE_ADMIN_URL: postgres.adminUrl }));
  } finally {
    await postgres.stop();
  }
}

/** The browser tests use what is built; a build that fails is one failed test, and the others still run. */
async function countBuild() {
  try {
    await buildWhatIsStale();
    add({ passed: filters.length === 0 ? 1 : 0, failed: 0 });
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    say('FAILED  build');
    add({ passed: 0, failed: 1 });
  }
}

/**
 * Runs the test files and counts from the machine-readable report.
 * @param {Record<string, string>} extra
 */
async function runVitest(extra) {
  const folder = mkdtempSync(join(tmpdir(), 'sillstone-report-'));
  const report = join(folder, 'report.json');
  const args = [inCheckout('node_modules', 'vitest', 'vitest.mjs'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...filters];
  try {
    const { code } = await run(process.execPath, args, { cwd: checkout, show: true, env: { ...process.env, ...extra, NODE_ENV: 'test' } });
    return existsSync(report) ? countReport(JSON.parse(readFileSync(report, 'utf8')), code) : { passed: 0, failed: 1 };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** @param {{ passed: number, failed: number }} more */
function add(more) {
  counts.passed += more.passed;
  counts.failed += more.failed;
}
