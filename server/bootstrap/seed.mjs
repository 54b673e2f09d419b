/** `npm run seed`: brings the database up to date and loads the vocabulary and, in demonstration mode, the invented data. */
import { buildWhatIsStale } from './build.mjs';
import { checkNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { forgetPreparation, prepareDatabase } from './preparation.mjs';
import { main } from './say.mjs';
import { prepareRunningFolder } from './running-copy.mjs';
import { childEnvironment } from './server-process.mjs';
import { withDatabase } from './with-database.mjs';

await main(async () => {
  checkNodeVersion();
  await ensurePackages();
  await buildWhatIsStale();
  await withDatabase(async ({ settings, database }) => {
    const place = await prepareRunningFolder();
    if (database) forgetPreparation(database.cluster.directory);
    await prepareDatabase(place, childEnvironment(settings), database?.cluster.directory ?? null);
  });
});
