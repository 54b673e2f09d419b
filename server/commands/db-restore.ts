import { environmentOrExit } from '#server/env.ts';
import { loadBackup } from './db-load-backup.ts';
import { BackupError } from './db-manifest.ts';

/** Loads a backup into the database of DATABASE_OWNER_URL. Arguments: folder of PostgreSQL's programs, the file, `--force` or nothing. */
const [programs = '', file = '', ...flags] = process.argv.slice(2);
try {
  const { databaseUrl, databaseOwnerUrl } = environmentOrExit();
  const appRole = decodeURIComponent(new URL(databaseUrl).username);
  const { madeAt, tables } = await loadBackup({ ownerUrl: databaseOwnerUrl ?? '', appRole, programs, file, force: flags.includes('--force') });
  const rows = Object.values(tables).reduce((sum, table) => sum + table.rows, 0);
  console.log(`Restored the backup of ${madeAt}: ${rows} rows in ${Object.keys(tables).length} tables, compared by checksum.`);
} catch (error) {
  if (!(error instanceof BackupError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
