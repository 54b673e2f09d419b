import { sql } from 'drizzle-orm';
import type { Db } from './pool.ts';

/** Whether the database answers within two seconds. */
export async function databaseAnswers(db: Db): Promise<boolean> {
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<false>((resolve) => {
    timer = setTimeout(() => resolve(false), 2000);
  });
  try {
    return await Promise.race([db.execute(sql`select 1`).then(() => true), tooLate]);
  } catch {
    return false;
  } finally {
    clearTimeout(timer);
  }
}
