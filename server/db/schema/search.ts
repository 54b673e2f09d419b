import { sql } from 'drizzle-orm';
import { boolean, index, integer, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { code, instant, real, tsvector } from './columns.ts';
import { revisions } from './entries.ts';

/**
 * What Search, Survey and exports filter by: one narrow row for each revision that was ever accepted, made from the revision and its pinned
 * conversion in the transaction that accepts it. Only `listed` ever changes, when the revision is superseded or retracted.
 */
export const searchRows = pgTable('search_rows', {
  revisionId: uuid('revision_id').primaryKey().references(() => revisions.id),
  listed: boolean('listed').notNull().default(true),
  accession: code('accession').notNull(),
  kind: code('kind').notNull(),
  kindsHeld: text('kinds_held').array().notNull(),
  scope: code('scope').notNull(),
  provenance: code('provenance').notNull(),
  energyType: code('energy_type'),
  stepKey: code('step_key').notNull(),
  stepDirection: integer('step_direction').notNull(),
  equation: code('equation').notNull(),
  stepClass: code('step_class').notNull(),
  bond: code('bond'),
  metal: code('metal'),
  formula: code('formula').notNull(),
  elements: text('elements').array().notNull(),
  facet: code('facet'),
  site: code('site'),
  sampleType: code('sample_type'),
  surfaceLabel: code('surface_label').notNull(),
  methodClass: code('method_class').notNull(),
  technique: code('technique'),
  sourceId: uuid('source_id').notNull(),
  sourceLabel: code('source_label').notNull(),
  doi: code('doi'),
  year: integer('year'),
  validMinK: real('valid_min_k'),
  validMaxK: real('valid_max_k'),
  /** Energy of the step: value, or the limit of a bound, or the middle of a range, to sort and draw by [kJ/mol]. */
  energyKJPerMol: real('energy_kj_per_mol'),
  energyBound: code('energy_bound'),
  uEnergyKJPerMol: real('u_energy_kj_per_mol'),
  /** ln of the pre-exponential factor in `rateUnit`, and what else k(T) = A (T/T0)^n exp(-E/RT) needs; null where k cannot be had. */
  lnPreExponential: real('ln_pre_exponential'),
  exponent: real('exponent'),
  referenceTemperatureK: real('reference_temperature_k'),
  rateUnit: code('rate_unit'),
  /** Canonical value by kind, for filters on a value. */
  values: jsonb('values').$type<Record<string, number>>().notNull(),
  searchText: text('search_text').notNull(),
  document: tsvector('document').notNull(),
  acceptedAt: instant('accepted_at').notNull(),
}, (t) => [
  index('search_rows_step_idx').on(t.stepKey, t.metal).where(sql`${t.listed}`),
  index('search_rows_metal_idx').on(t.metal).where(sql`${t.listed}`),
  index('search_rows_energy_idx').on(t.energyKJPerMol, t.accession).where(sql`${t.listed}`),
  index('search_rows_source_idx').on(t.sourceId).where(sql`${t.listed}`),
  index('search_rows_document_idx').using('gin', t.document),
  index('search_rows_text_idx').using('gin', sql`${t.searchText} gin_trgm_ops`),
]);
