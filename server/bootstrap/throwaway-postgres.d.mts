/** A PostgreSQL server for one test run, with an empty `postgres` database. */
export interface ThrowawayPostgres {
  /** Address of the superuser's connection. */
  adminUrl: string;
  port: number;
  /** Folder of PostgreSQL's own programs. */
  programs: string;
  /** The data directory. */
  directory: string;
  stop(): Promise<void>;
}

/**
 * Starts a server; everything about it is gone after `stop`.
 * @param options `settings` are added to postgresql.conf
 */
export function startThrowawayPostgres(options?: { settings?: Record<string, string> }): Promise<ThrowawayPostgres>;
