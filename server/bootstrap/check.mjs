/** `npm run check`: types, lint and guards, side by side, with one line for each. */
import { fileURLToPath } from 'node:url';
import { checkout, inCheckout } from './checkout.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { run } from './processes.mjs';
import { main, say } from './say.mjs';

const tool = (/** @type {string[]} */ ...parts) => inCheckout('node_modules', ...parts);

/**
 * The checks that are not written as tests.
 * @type {Record<string, string[]>}
 */
export const checks = {
  'types of the product': [tool('typescript', 'bin', 'tsc'), '--noEmit', '-p', '.'],
  'types of the start-up programs': [tool('typescript', 'bin', 'tsc'), '--noEmit', '-p', 'server/bootstrap'],
  'lint and import zones': [tool('eslint', 'bin', 'eslint.js'), '.', '--max-warnings', '0'],
};

const guards = { guards: [tool('vitest', 'vitest.mjs'), 'run', '--project', 'unit', 'tests/guards', '--reporter', 'dot'] };

/**
 * Runs checks two at a time (the machines this is meant for have two cores); what fails is shown in full.
 * @param {Record<string, string[]>} which
 * @returns {Promise<{ passed: number, failed: number }>}
 */
export async function runChecks(which = checks) {
  const waiting = Object.entries(which);
  const counts = { passed: 0, failed: 0 };
  const worker = async () => {
    for (let next = waiting.shift(); next; next = waiting.shift()) {
      const [name, args] = next;
      const began = Date.now();
      const { code, stdout, stderr } = await run(process.execPath, args, { cwd: checkout });
      const took = `${((Date.now() - began) / 1000).toFixed(1)} s`;
      counts[code === 0 ? 'passed' : 'failed'] += 1;
      if (code !== 0) say(`${`${stdout}\n${stderr}`.trim()}\n`);
      say(`${code === 0 ? 'passed' : 'FAILED'}  ${name} (${took})`);
    }
  };
  await Promise.all([worker(), worker()]);
  return counts;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await main(async () => {
    checkNodeVersion();
    await ensurePackages();
    const { passed, failed } = await runChecks({ ...checks, ...guards });
    say(failed === 0 ? `All ${passed} checks passed.` : `${failed} of ${passed + failed} checks failed.`);
    return failed === 0 ? 0 : 1;
  });
}
