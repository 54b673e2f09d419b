import { randomBytes } from 'node:crypto';
import pino from 'pino';
import * as z from 'zod';
import { openPools } from '#server/db/pool.ts';
import { environmentOrExit } from '#server/env.ts';
import { Refusal } from '#server/refusal.ts';
import { createServices } from '#server/services.ts';
import { refusalFromDatabase } from '#server/db/pg-errors.ts';
import { switchedOffDoiService } from '#server/services/doi/doi-service.ts';
import { grantableRoles } from '#shared/domain/roles.ts';
import packageJson from '../../package.json' with { type: 'json' };

const usage = `npm run admin -- create-user EMAIL "NAME" ROLE
  makes an account and prints its password, once; ROLE is ${grantableRoles.join(', ')}`;

/** Work on accounts that has to be possible before anybody can sign in. */
async function run([command, email, name, role]: string[]): Promise<number> {
  const asked = z.tuple([z.literal('create-user'), z.email(), z.string().trim().min(1), z.enum(grantableRoles)]).safeParse([command, email, name, role]);
  if (!asked.success) {
    process.stderr.write(`${usage}\n`);
    return 1;
  }
  const env = environmentOrExit();
  const pools = openPools(env.databaseUrl, () => undefined);
  try {
    const { accounts } = createServices({
      db: pools.db, exportPool: pools.exportPool, clock: () => new Date(), doi: switchedOffDoiService, demonstration: env.demonstration, publicUrl: '', version: packageJson.version,
      log: pino({ level: 'silent' }),
    });
    const password = randomBytes(15).toString('base64url');
    await accounts.create({ email: asked.data[1], name: asked.data[2], password, role: asked.data[3] });
    process.stdout.write(`${asked.data[1]} is a ${asked.data[3]} now. Password, shown this once: ${password}\n`);
    return 0;
  } catch (error) {
    const refusal = error instanceof Refusal ? error : refusalFromDatabase(error);
    if (!refusal) throw error;
    process.stderr.write(`${refusal.message}\n`);
    return 1;
  } finally {
    await pools.close();
  }
}

process.exitCode = await run(process.argv.slice(2));
