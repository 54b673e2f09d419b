import type { Account } from './accounts.mjs';

/** One PostgreSQL server on loopback, by its files. */
export interface Cluster {
  /** Folder of PostgreSQL's programs. */
  programs: string;
  /** The data directory. */
  directory: string;
  /** Whom it runs as; null for the present account. */
  account: Account | null;
  /** Of the superuser `postgres`. */
  password: string;
  /** What this server needs beyond the usual. */
  settings?: Record<string, string>;
}

/** A server that answers; `adopted` when it ran before it was looked for. */
export type RunningCluster = Cluster & { port: number; adopted: boolean };

/** Makes the data directory unless it is there. */
export function ensureCluster(cluster: Cluster): Promise<void>;
/** Starts the server, or takes over the one that still runs. */
export function startCluster(cluster: Cluster): Promise<RunningCluster>;
/** Stops the server. */
export function stopCluster(cluster: Cluster): Promise<void>;
/** The server that runs on this data directory; null when none does. */
export function findRunning(cluster: Cluster): Promise<RunningCluster | null>;
