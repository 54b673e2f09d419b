import pino from 'pino';
import { readDoiRecords } from '#seeds/demo/doi-records.ts';
import { demonstrationFolder, demonstrationState, loadDemonstration, loadVocabulary, resetBrokenDemonstration } from '#seeds/run.ts';
import type { Context } from '#server/context.ts';
import { openPools } from '#server/db/pool.ts';
import { environmentOrExit } from '#server/env.ts';
import { createServices } from '#server/services.ts';
import { demonstrationDoiService } from '#server/services/doi/demonstration-doi.ts';
import packageJson from '../../package.json' with { type: 'json' };

/** Loads the vocabulary, and in demonstration mode the invented data, once. */
const env = environmentOrExit();
const say = (line: string) => process.stdout.write(`${line}\n`);
const state = env.demonstration && env.databaseOwnerUrl ? await demonstrationState(env.databaseOwnerUrl) : 'loaded';
if (state === 'broken' && env.databaseOwnerUrl) {
  say('Loading the demonstration was cut off last time: beginning again.');
  await resetBrokenDemonstration(env.databaseOwnerUrl, decodeURIComponent(new URL(env.databaseUrl).username));
}
const pools = openPools(env.databaseUrl, (error) => say(`database: ${error.message}`));
const doi = demonstrationDoiService(() => readDoiRecords(demonstrationFolder));
const context: Context = {
  db: pools.db, exportPool: pools.exportPool, clock: () => new Date(), doi, demonstration: env.demonstration,
  publicUrl: env.publicUrl ?? `http://${env.host}:${env.port}`, version: packageJson.version, log: pino({ level: env.logLevel }),
};
try {
  await loadVocabulary(createServices(context));
  if (state !== 'loaded') {
    say('Loading the demonstration data, once.');
    await loadDemonstration(context, say);
  }
} finally {
  await doi.close();
  await pools.close();
}
