import type { Logger } from 'pino';
import type pg from 'pg';
import type { Services } from '#server/services.ts';

const roundMs = 60_000;
/** Any number, the same in every process: one process at a time does a round. */
const jobsLock = 715_518;

/**
 * Starts the jobs of the service: claims that ran out go back to the queue, and sources whose DOI was not confirmed are looked up again.
 * Any number of processes may run them; each round is done by one.
 * @returns stops them and waits for the round under way.
 */
export function startJobs(pool: pg.Pool, { reviews, sources }: Services, log: Logger): () => Promise<void> {
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<void> = Promise.resolve();

  async function once(): Promise<void> {
    const client = await pool.connect();
    try {
      const { rows } = await client.query<{ mine: boolean }>('select pg_try_advisory_lock($1) as mine', [jobsLock]);
      if (!rows[0]?.mine) return;
      try {
        const released = await reviews.releaseExpired();
        const confirmed = await sources.confirmPending();
        if (released + confirmed > 0) log.info({ released, confirmed }, 'jobs done');
      } finally {
        await client.query('select pg_advisory_unlock($1)', [jobsLock]);
      }
    } finally {
      client.release();
    }
  }

  function next(): void {
    if (stopped) return;
    timer = setTimeout(() => {
      round = once().catch((error: unknown) => log.warn({ err: error }, 'a round of jobs failed; the next is tried in a minute')).finally(next);
    }, roundMs);
    timer.unref();
  }
  next();
  return async () => {
    stopped = true;
    clearTimeout(timer);
    await round;
  };
}
