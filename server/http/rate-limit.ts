import type { Request, RequestHandler, Response } from 'express';
import { ipKeyGenerator, rateLimit, type Store } from 'express-rate-limit';
import type pg from 'pg';
import { Refusal } from '#server/refusal.ts';
import { sendProblem } from './problem.ts';

/** Counts in PostgreSQL, so that a limit holds however many processes answer. */
class DatabaseStore implements Store {
  private windowMs = 60_000;
  readonly prefix: string;
  private readonly pool: pg.Pool;

  constructor(pool: pg.Pool, prefix: string) {
    this.pool = pool;
    this.prefix = prefix;
  }

  init(options: { windowMs: number }): void {
    this.windowMs = options.windowMs;
  }

  async increment(key: string): Promise<{ totalHits: number; resetTime: Date }> {
    const { rows } = await this.pool.query<{ hits: number; window_ends_at: Date }>(
      `insert into rate_counters as c (key, hits, window_ends_at) values ($1, 1, now() + $2 * interval '1 millisecond')
       on conflict (key) do update set
         hits = case when c.window_ends_at < now() then 1 else c.hits + 1 end,
         window_ends_at = case when c.window_ends_at < now() then excluded.window_ends_at else c.window_ends_at end
       returning hits, window_ends_at`,
      [`${this.prefix}:${key}`, this.windowMs],
    );
    const row = rows[0];
    return { totalHits: row?.hits ?? 1, resetTime: row?.window_ends_at ?? new Date() };
  }

  async decrement(key: string): Promise<void> {
    await this.pool.query('update rate_counters set hits = greatest(hits - 1, 0) where key = $1', [`${this.prefix}:${key}`]);
  }

  async resetKey(key: string): Promise<void> {
    await this.pool.query('delete from rate_counters where key = $1', [`${this.prefix}:${key}`]);
  }
}

export interface Limit {
  perWindow: number;
  windowS: number;
}

/** Refuses what comes too often from one address, and says when to come back. */
export function limit(pool: pg.Pool, name: string, { perWindow, windowS }: Limit, options: { failuresOnly?: boolean } = {}): RequestHandler {
  return rateLimit({
    windowMs: windowS * 1000,
    limit: perWindow,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    skipSuccessfulRequests: options.failuresOnly ?? false,
    store: new DatabaseStore(pool, name),
    passOnStoreError: true,
    keyGenerator: (req: Request) => ipKeyGenerator(req.ip ?? '0.0.0.0'),
    handler: (_req: Request, res: Response) => {
      sendProblem(res, new Refusal('too-many-requests', `Too many requests from this address. Try again in ${Math.ceil(windowS / 60)} min.`, { retryAfterS: windowS }));
    },
  });
}
