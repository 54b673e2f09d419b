import { migrateDatabase } from '#server/db/migrate.ts';
import { environmentOrExit } from '#server/env.ts';

/** Brings the database of DATABASE_OWNER_URL to the newest schema, for the role named in DATABASE_URL. */
const { databaseUrl, databaseOwnerUrl } = environmentOrExit();
if (!databaseOwnerUrl) {
  console.error('DATABASE_OWNER_URL is not set: migrations run as the owner of the database.');
  process.exit(1);
}
await migrateDatabase({ ownerUrl: databaseOwnerUrl, appRole: decodeURIComponent(new URL(databaseUrl).username) });
