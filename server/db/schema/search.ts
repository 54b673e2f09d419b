import { sql } from 'drizzle-orm';
import { boolean, check, index, integer, jsonb, pgTable, text, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core';
import { states } from '../../../shared/domain/states.ts';
import { oneOf } from './checks.ts';
import { code, instant, real, tsvector } from './columns.ts';
import { revisions } from './entries.ts';

const trigrams = (column: AnyPgColumn) => sql`${column} gin_trgm_ops`;

/**
 * What Search, Survey and exports filter by: one narrow row for each revision from its submission on, made in the transaction that submits it.
 * What the revision and its source say of state, people and publication is filled in by the database and follows them by triggers; the rest
 * never changes. A row made by an older maker is made anew.
 */
export const searchRows = pgTable('search_rows', {
  revisionId: uuid('revision_id').primaryKey().references(() => revisions.id),
  /** The state of the revision, kept in step by a trigger. */
  state: code('state').notNull(),
  /** Whether everybody finds it. */
  listed: boolean('listed').notNull().generatedAlwaysAs(sql`state = 'accepted'`),
  /** Version of the maker of rows, so that a better one can make them anew. */
  madeBy: integer('made_by').notNull(),
  authorId: uuid('author_id').notNull(),
  /** The contributor's public name without accents and case. */
  contributorKey: code('contributor_key').notNull(),
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
  cleavage: code('cleavage'),
  /** Formulas of the species in the equation. */
  species: text('species').array().notNull(),
  metal: code('metal'),
  formula: code('formula').notNull(),
  elements: text('elements').array().notNull(),
  facet: code('facet'),
  site: code('site'),
  sampleType: code('sample_type'),
  support: code('support'),
  /** Symbols or words of the promoters; empty for a clean surface. */
  promoters: text('promoters').array().notNull(),
  surfaceLabel: code('surface_label').notNull(),
  methodClass: code('method_class').notNull(),
  technique: code('technique'),
  sourceId: uuid('source_id').notNull(),
  sourceLabel: code('source_label').notNull(),
  /** Family names of the authors without accents and case. */
  authorKeys: text('author_keys').array().notNull(),
  doi: code('doi'),
  year: integer('year'),
  validMinK: real('valid_min_k'),
  validMaxK: real('valid_max_k'),
  /** Energy of the step: value, or the limit of a bound, or the middle of a range, to sort and draw by [kJ/mol]. */
  energyKJPerMol: real('energy_kj_per_mol'),
  energyBound: code('energy_bound'),
  uEnergyKJPerMol: real('u_energy_kj_per_mol'),
  /** Whether the standard uncertainty of the entry's own quantity is known. */
  hasUncertainty: boolean('has_uncertainty').notNull(),
  /** ln of the pre-exponential factor in `rateUnit`, and what else k(T) = A (T/T0)^n exp(-E/RT) needs; null where k cannot be had. */
  lnPreExponential: real('ln_pre_exponential'),
  exponent: real('exponent'),
  referenceTemperatureK: real('reference_temperature_k'),
  rateUnit: code('rate_unit'),
  /** ln of the pre-exponential factor in `factorUnit`, energy or not, to sort by. */
  lnFactor: real('ln_factor'),
  factorUnit: code('factor_unit'),
  /** Canonical value by kind, for filters on a value. */
  values: jsonb('values').$type<Record<string, number>>().notNull(),
  /** The entry's own words and, after a separator, those of its source, which the database puts there. */
  searchText: text('search_text').notNull(),
  document: tsvector('document').notNull(),
  acceptedAt: instant('accepted_at'),
}, (t) => [
  check('search_rows_state_check', oneOf(t.state, states)),
  index('search_rows_step_idx').on(t.stepKey, t.stepDirection.desc(), t.surfaceLabel, t.accession).where(sql`${t.listed}`),
  index('search_rows_metal_idx').on(t.metal, t.stepKey, t.stepDirection.desc(), t.surfaceLabel, t.accession).where(sql`${t.listed}`),
  index('search_rows_energy_idx').on(t.energyKJPerMol, t.accession).where(sql`${t.listed}`),
  index('search_rows_energy_falling_idx').on(t.energyKJPerMol.desc().nullsLast(), t.accession).where(sql`${t.listed}`),
  index('search_rows_accession_idx').on(t.accession).where(sql`${t.listed}`),
  index('search_rows_year_idx').on(t.year.desc().nullsLast(), t.accession).where(sql`${t.listed}`),
  index('search_rows_formula_idx').on(t.formula).where(sql`${t.listed}`),
  index('search_rows_technique_idx').on(t.technique).where(sql`${t.listed}`),
  index('search_rows_source_idx').on(t.sourceId),
  index('search_rows_unlisted_idx').on(t.state, t.authorId).where(sql`not ${t.listed}`),
  index('search_rows_species_idx').using('gin', t.species).where(sql`${t.listed}`),
  index('search_rows_elements_idx').using('gin', t.elements).where(sql`${t.listed}`),
  index('search_rows_author_idx').using('gin', t.authorKeys).where(sql`${t.listed}`),
  index('search_rows_document_idx').using('gin', t.document).where(sql`${t.listed}`),
  index('search_rows_text_idx').using('gin', trigrams(t.searchText)).where(sql`${t.listed}`),
]);

/** The words of everything ever listed, for near spellings: letters only, without accents and case. Filled by a trigger. */
export const searchWords = pgTable('search_words', {
  word: code('word').primaryKey(),
}, (t) => [index('search_words_text_idx').using('gin', trigrams(t.word))]);
