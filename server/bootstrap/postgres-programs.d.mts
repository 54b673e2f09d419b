/** The folder with PostgreSQL's programs, the newest first, or null. */
export function findPostgresPrograms(major?: number | null): string | null;
/** The folder with PostgreSQL's programs; installs PostgreSQL when there is none. */
export function ensurePostgresPrograms(dataDirectory?: string | null): Promise<string>;
/** The major version that made a data directory, or null when it holds nothing yet. */
export function majorOf(dataDirectory: string): number | null;
