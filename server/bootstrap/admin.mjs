/** `npm run admin -- …`: accounts, before anybody can sign in to make them. */
import { buildWhatIsStale } from './build.mjs';
import { checkout, inCheckout } from './checkout.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { run } from './processes.mjs';
import { main } from './say.mjs';
import { childEnvironment } from './server-process.mjs';
import { withDatabase } from './with-database.mjs';

await main(async () => {
  checkNodeVersion();
  await ensurePackages();
  await buildWhatIsStale();
  return withDatabase(async ({ settings }) => {
    const env = childEnvironment({ SESSION_SECRET: 'not used by this command, but asked for', ...settings });
    const { code } = await run(process.execPath, ['--enable-source-maps', inCheckout('dist', 'server', 'admin.js'), ...process.argv.slice(2)], { cwd: checkout, env, show: true });
    return code;
  }, { asOwner: false });
});
