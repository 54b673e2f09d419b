/** `npm run admin -- create-user EMAIL "NAME" ROLE`: accounts, by hand, as the application's role. */
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
    const { DATABASE_OWNER_URL: _owner, ...env } = childEnvironment({ SESSION_SECRET: 'not used by this command, but asked for', ...settings });
    const args = ['--enable-source-maps', inCheckout('dist', 'server', 'admin.js'), ...process.argv.slice(2)];
    const { code } = await run(process.execPath, args, { cwd: checkout, env, show: true, finish: true });
    return code;
  });
});
