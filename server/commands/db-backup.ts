import { environmentOrExit } from '#server/env.ts';
import { BackupError } from './db-manifest.ts';
import { writeBackup } from './db-write-backup.ts';

/** Backs up the database of DATABASE_OWNER_URL. Arguments: folder of PostgreSQL's programs, the file. */
const [programs = '', file = ''] = process.argv.slice(2);
try {
  const { tables, bytes, sha256, eventLogHead } = await writeBackup({ ownerUrl: environmentOrExit().databaseOwnerUrl ?? '', programs, file });
  const rows = Object.values(tables).reduce((sum, table) => sum + table.rows, 0);
  console.log(`Wrote ${file}: ${bytes} bytes, ${rows} rows in ${Object.keys(tables).length} tables, SHA-256 ${sha256}.`);
  if (eventLogHead) console.log(`The event log ends at ${eventLogHead.seq} (${eventLogHead.hash}).`);
} catch (error) {
  if (!(error instanceof BackupError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
