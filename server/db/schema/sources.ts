import { check, integer, jsonb, pgTable, text, unique } from 'drizzle-orm/pg-core';
import { sourceStatuses } from '../../../shared/contracts/sources.ts';
import { oneOf } from './checks.ts';
import { code, id, instant } from './columns.ts';

export const sourceOrigins = ['doi', 'bibtex', 'ris', 'typed'] as const;

/** Publications. The rendered forms are made once, when the record is made or its DOI is confirmed. */
export const sources = pgTable('sources', {
  id: id(),
  /** Normalised, lower case; null for what has none. */
  doi: code('doi'),
  citationKey: code('citation_key').notNull(),
  csl: jsonb('csl').$type<Record<string, unknown>>().notNull(),
  title: text('title').notNull(),
  authors: text('authors').notNull(),
  label: text('label').notNull(),
  year: integer('year'),
  container: text('container'),
  citation: text('citation').notNull(),
  bibtex: text('bibtex').notNull(),
  ris: text('ris').notNull(),
  status: code('status').notNull().default('current'),
  notice: text('notice'),
  origin: code('origin').notNull(),
  /** When the DOI service confirmed the record; null while that is still to be done. */
  confirmedAt: instant('confirmed_at'),
  lookedUpAt: instant('looked_up_at'),
  createdAt: instant('created_at').notNull().defaultNow(),
}, (t) => [
  unique('sources_doi_key').on(t.doi),
  unique('sources_citation_key_key').on(t.citationKey),
  check('sources_status_check', oneOf(t.status, sourceStatuses)),
  check('sources_origin_check', oneOf(t.origin, sourceOrigins)),
]);
