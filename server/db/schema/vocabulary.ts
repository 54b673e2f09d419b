import { sql } from 'drizzle-orm';
import { check, integer, jsonb, pgTable, primaryKey, text, uuid, index, unique, type AnyPgColumn } from 'drizzle-orm/pg-core';
import { arrangements, sampleTypes, siteTypes, structures } from '../../../shared/domain/kinds.ts';
import { oneOf } from './checks.ts';
import { code, id, instant, real } from './columns.ts';

export const termLists = ['metal', 'facet', 'technique', 'support', 'step-class', 'species', 'alloy', 'site'] as const;

export const vocabularyTerms = pgTable('vocabulary_terms', {
  list: code('list').notNull(),
  code: code('code').notNull(),
  label: text('label').notNull(),
  synonyms: jsonb('synonyms').$type<string[]>().notNull(),
  data: jsonb('data').$type<Record<string, unknown>>().notNull(),
  position: integer('position').notNull(),
}, (t) => [primaryKey({ columns: [t.list, t.code] }), check('vocabulary_terms_list_check', oneOf(t.list, termLists))]);

/** Elementary steps as read by one version of the reader; a better reader adds a row and redirects the old one. */
export const elementarySteps = pgTable('elementary_steps', {
  id: id(),
  key: code('key').notNull(),
  variantKey: code('variant_key').notNull(),
  direction: integer('direction').notNull(),
  equation: text('equation').notNull(),
  stepClass: code('step_class').notNull(),
  bond: code('bond'),
  gasOrder: real('gas_order').notNull(),
  surfaceOrder: real('surface_order').notNull(),
  parserVersion: code('parser_version').notNull(),
  mergedInto: uuid('merged_into').references((): AnyPgColumn => elementarySteps.id),
}, (t) => [
  unique('elementary_steps_variant_key').on(t.variantKey, t.direction, t.equation, t.parserVersion),
  index('elementary_steps_key_idx').on(t.key),
  check('elementary_steps_direction_check', sql`${t.direction} in (-1, 1)`),
]);

/** Surfaces, one row for each distinct description; `key` is the description in canonical order. */
export const surfaces = pgTable('surfaces', {
  id: id(),
  key: code('key').notNull(),
  /** Symbol of a pure metal; null for an alloy. */
  metal: code('metal'),
  formula: code('formula').notNull(),
  elements: jsonb('elements').$type<string[]>().notNull(),
  /** Bulk of a near-surface or single-atom alloy, the metal in or on its first layer, and where that is. */
  host: code('host'),
  guest: code('guest'),
  arrangement: code('arrangement'),
  guestMonolayers: real('guest_monolayers'),
  structure: code('structure'),
  facet: code('facet'),
  reconstruction: text('reconstruction'),
  site: code('site'),
  sampleType: code('sample_type'),
  support: text('support'),
  particleSizeNm: real('particle_size_nm'),
  dispersion: real('dispersion'),
  strainPercent: real('strain_percent'),
  stepFraction: real('step_fraction'),
  label: text('label').notNull(),
  mergedInto: uuid('merged_into').references((): AnyPgColumn => surfaces.id),
  createdAt: instant('created_at').notNull().defaultNow(),
}, (t) => [
  unique('surfaces_key_key').on(t.key),
  check('surfaces_structure_check', oneOf(t.structure, structures)),
  check('surfaces_arrangement_check', oneOf(t.arrangement, arrangements)),
  check('surfaces_site_check', oneOf(t.site, siteTypes)),
  check('surfaces_sample_type_check', oneOf(t.sampleType, sampleTypes)),
]);
