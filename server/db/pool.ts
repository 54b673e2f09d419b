import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import type { PgTransaction } from 'drizzle-orm/pg-core';
import type { NodePgQueryResultHKT } from 'drizzle-orm/node-postgres';
import type { ExtractTablesWithRelations } from 'drizzle-orm';
import pg from 'pg';

type Schema = Record<string, never>;
export type Db = NodePgDatabase<Schema> & { $client: pg.Pool };
export type Tx = PgTransaction<NodePgQueryResultHKT, Schema, ExtractTablesWithRelations<Schema>>;
/** What repositories take: inside a transaction the outer handle is out of reach. */
export type DbOrTx = NodePgDatabase<Schema> | Tx;

export interface Pools {
  db: Db;
  /** A small pool of its own, so that long exports never starve the rest. */
  exportPool: pg.Pool;
  close(): Promise<void>;
}

/** Opens the pools of one process; a dropped idle connection is reported and replaced, never fatal. */
export function openPools(databaseUrl: string, onError: (error: Error) => void): Pools {
  const settings = { connectionString: databaseUrl, connectionTimeoutMillis: 5_000, idleTimeoutMillis: 30_000 };
  const pool = new pg.Pool({ ...settings, max: 12, statement_timeout: 30_000, idle_in_transaction_session_timeout: 30_000 });
  const exportPool = new pg.Pool({ ...settings, max: 3, statement_timeout: 600_000 });
  pool.on('error', onError);
  exportPool.on('error', onError);
  return {
    db: drizzle(pool) as Db,
    exportPool,
    close: async () => {
      await Promise.all([pool.end(), exportPool.end()]);
    },
  };
}
