import type pg from 'pg';
import type { Logger } from 'pino';
import type { Db } from './db/pool.ts';
import type { DoiService } from './services/doi/doi-service.ts';

/** What services are given: the database, the clock, and what is outside. */
export interface Context {
  db: Db;
  exportPool: pg.Pool;
  clock: () => Date;
  doi: DoiService;
  demonstration: boolean;
  /** Address under which readers reach this service, for permalinks; no slash at the end. */
  publicUrl: string;
  version: string;
  log: Logger;
}
