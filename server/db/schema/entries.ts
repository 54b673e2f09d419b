import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { EntryInput } from '../../../shared/contracts/entries.ts';
import { bounds, energyTypes, kinds, methodClasses, provenances, quantitySymbols, scopes, uncertaintyKinds } from '../../../shared/domain/kinds.ts';
import { openStates, states } from '../../../shared/domain/states.ts';
import { users } from './accounts.ts';
import { oneOf } from './checks.ts';
import { code, id, instant, real } from './columns.ts';
import { sources } from './sources.ts';
import { elementarySteps, surfaces } from './vocabulary.ts';

/** An entry: the permanent name under which revisions of one reported parameter follow one another. */
export const entries = pgTable('entries', {
  id: id(),
  accession: code('accession').notNull(),
  contributorId: uuid('contributor_id').notNull().references(() => users.id),
  createdAt: instant('created_at').notNull().defaultNow(),
}, (t) => [unique('entries_accession_key').on(t.accession)]);

/** One state of an entry's content. Editable as a draft, frozen from the moment it is submitted. */
export const revisions = pgTable('revisions', {
  id: id(),
  entryId: uuid('entry_id').notNull().references(() => entries.id),
  /** Counts all revisions of the entry, public or not. */
  number: integer('number').notNull(),
  /** Public version number, given at acceptance. */
  version: integer('version'),
  state: code('state').notNull().default('draft'),
  /** Rises with every change; what If-Match is held against. */
  lock: integer('lock').notNull().default(1),
  authorId: uuid('author_id').notNull().references(() => users.id),
  /** The contributor's name as chosen at submission. */
  authorName: text('author_name').notNull(),
  /** What was typed, whole and unaltered. */
  input: jsonb('input').$type<EntryInput>().notNull(),
  inputHash: code('input_hash').notNull(),
  kind: code('kind'),
  scope: code('scope'),
  provenance: code('provenance'),
  stepId: uuid('step_id').references(() => elementarySteps.id),
  surfaceId: uuid('surface_id').references(() => surfaces.id),
  sourceId: uuid('source_id').references(() => sources.id),
  methodClass: code('method_class'),
  technique: code('technique'),
  validMinK: real('valid_min_k'),
  validMaxK: real('valid_max_k'),
  reviseReason: text('revise_reason'),
  createdAt: instant('created_at').notNull().defaultNow(),
  changedAt: instant('changed_at').notNull().defaultNow(),
  acceptedAt: instant('accepted_at'),
  endedAt: instant('ended_at'),
  /** Public words on a retracted version. */
  notice: text('notice'),
}, (t) => [
  unique('revisions_entry_number_key').on(t.entryId, t.number),
  unique('revisions_entry_version_key').on(t.entryId, t.version),
  uniqueIndex('revisions_one_open_per_entry').on(t.entryId).where(oneOf(t.state, openStates)),
  uniqueIndex('revisions_one_accepted_per_entry').on(t.entryId).where(sql`${t.state} = 'accepted'`),
  index('revisions_author_idx').on(t.authorId, t.changedAt),
  index('revisions_source_idx').on(t.sourceId),
  check('revisions_state_check', oneOf(t.state, states)),
  check('revisions_kind_check', oneOf(t.kind, kinds)),
  check('revisions_scope_check', oneOf(t.scope, scopes)),
  check('revisions_provenance_check', oneOf(t.provenance, provenances)),
  check('revisions_method_class_check', oneOf(t.methodClass, methodClasses)),
  check('revisions_valid_range_check', sql`${t.validMinK} is null or ${t.validMaxK} is null or ${t.validMinK} <= ${t.validMaxK}`),
  check('revisions_version_check', sql`(${t.version} is not null) = (${t.state} in ('accepted', 'superseded', 'retracted'))`),
  check('revisions_complete_check', sql`${t.state} in ('draft', 'withdrawn') or (${t.kind} is not null and ${t.scope} is not null and ${t.provenance} is not null and ${t.stepId} is not null and ${t.surfaceId} is not null and ${t.sourceId} is not null and ${t.methodClass} is not null)`),
]);

/** The quantities of a frozen revision as printed and as read, in the printed unit. */
export const quantities = pgTable('quantities', {
  id: id(),
  revisionId: uuid('revision_id').notNull().references(() => revisions.id),
  position: integer('position').notNull(),
  symbol: code('symbol').notNull(),
  energyType: code('energy_type'),
  asPrinted: text('as_printed').notNull(),
  unitAsPrinted: text('unit_as_printed').notNull(),
  /** Registry id of the unit read. */
  unitId: code('unit_id'),
  multiplier: real('multiplier'),
  bound: code('bound').notNull(),
  value: real('value'),
  low: real('low'),
  high: real('high'),
  reportedUncertainty: real('reported_uncertainty'),
  reportedMinus: real('reported_minus'),
  reportedPlus: real('reported_plus'),
  uncertaintyKind: code('uncertainty_kind').notNull(),
  uncertaintyScale: code('uncertainty_scale').notNull(),
  standardUncertainty: real('standard_uncertainty'),
  significantDigits: integer('significant_digits'),
}, (t) => [
  unique('quantities_revision_position_key').on(t.revisionId, t.position),
  check('quantities_symbol_check', oneOf(t.symbol, quantitySymbols)),
  check('quantities_energy_type_check', oneOf(t.energyType, energyTypes)),
  check('quantities_bound_check', oneOf(t.bound, bounds)),
  check('quantities_uncertainty_kind_check', oneOf(t.uncertaintyKind, uncertaintyKinds)),
  check('quantities_uncertainty_scale_check', oneOf(t.uncertaintyScale, ['linear', 'ln'])),
  check('quantities_range_check', sql`${t.low} is null or ${t.high} is null or ${t.low} <= ${t.high}`),
  check('quantities_uncertainty_sign_check', sql`${t.standardUncertainty} is null or ${t.standardUncertainty} >= 0`),
]);

/** One run of the conversion over a frozen revision, stamped with what it was made with. Recomputing adds a row. */
export const conversions = pgTable('conversions', {
  id: id(),
  revisionId: uuid('revision_id').notNull().references(() => revisions.id),
  coreVersion: code('core_version').notNull(),
  constantsVersion: code('constants_version').notNull(),
  /** Pinned: the conversion the revision was accepted with. */
  createdAt: instant('created_at').notNull().defaultNow(),
}, (t) => [index('conversions_revision_idx').on(t.revisionId, t.createdAt)]);

export const convertedQuantities = pgTable('converted_quantities', {
  id: id(),
  conversionId: uuid('conversion_id').notNull().references(() => conversions.id),
  quantityId: uuid('quantity_id').notNull().references(() => quantities.id),
  value: real('value'),
  low: real('low'),
  high: real('high'),
  standardUncertainty: real('standard_uncertainty'),
  unit: code('unit').notNull(),
  siteValue: real('site_value'),
  siteUnit: code('site_unit'),
  siteExponentChange: real('site_exponent_change'),
  missing: jsonb('missing').$type<string[]>().notNull(),
  derivation: jsonb('derivation').$type<{ operation: string; from: string; to: string; constant?: string; assumption?: string; reference: string }[]>().notNull(),
}, (t) => [unique('converted_quantities_key').on(t.conversionId, t.quantityId)]);

/** The checks a revision raised when it was submitted or looked at again. */
export const raisedChecks = pgTable('raised_checks', {
  id: id(),
  conversionId: uuid('conversion_id').notNull().references(() => conversions.id),
  position: integer('position').notNull(),
  code: code('code').notNull(),
  severity: code('severity').notNull(),
  message: text('message').notNull(),
}, (t) => [unique('raised_checks_key').on(t.conversionId, t.position), check('raised_checks_severity_check', oneOf(t.severity, ['blocking', 'warning', 'note']))]);

/** Which conversion each accepted revision was accepted with. */
export const acceptedConversions = pgTable('accepted_conversions', {
  revisionId: uuid('revision_id').primaryKey().references(() => revisions.id),
  conversionId: uuid('conversion_id').notNull().references(() => conversions.id),
});
