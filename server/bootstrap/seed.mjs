/** `npm run seed`: brings the database up to date and loads the vocabulary and, in demonstration mode, the invented data. */
import { buildWhatIsStale } from './build.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { main } from './say.mjs';
import { prepareRunningFolder } from './running-copy.mjs';
import { childEnvironment, runCommand } from './server-process.mjs';
import { withDatabase } from './with-database.mjs';

await main(async () => {
  checkNodeVersion();
  await ensurePackages();
  await buildWhatIsStale();
  await withDatabase(async ({ settings }) => {
    const place = await prepareRunningFolder();
    await runCommand(place, 'migrate', childEnvironment(settings));
    await runCommand(place, 'seed', childEnvironment(settings));
  });
});
