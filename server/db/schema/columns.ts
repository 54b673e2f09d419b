import { customType, doublePrecision, text, timestamp, uuid } from 'drizzle-orm/pg-core';

/** Instants are kept with their zone and read as Date. */
export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date' });

/** Text compared byte by byte whatever the database's own collation is, so that codes and keys sort the same everywhere. */
export const code = customType<{ data: string }>({ dataType: () => 'text collate "C"' });

export const id = () => uuid('id').primaryKey().defaultRandom();
export const real = (name: string) => doublePrecision(name);
export { text };

/** A full-text document, written by the repository and never read back. */
export const tsvector = customType<{ data: string }>({ dataType: () => 'tsvector' });
