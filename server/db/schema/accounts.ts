import { check, jsonb, pgTable, primaryKey, text, unique, uuid, index } from 'drizzle-orm/pg-core';
import { grantableRoles } from '../../../shared/domain/roles.ts';
import { oneOf } from './checks.ts';
import { code, id, instant, real } from './columns.ts';

/** People. What names a person lives here only, so that it can be erased while the log keeps standing. */
export const users = pgTable('users', {
  id: id(),
  /** Lower case, as compared at sign-in. */
  email: code('email').notNull(),
  name: text('name').notNull(),
  passwordHash: text('password_hash').notNull(),
  createdAt: instant('created_at').notNull().defaultNow(),
  disabledAt: instant('disabled_at'),
}, (t) => [unique('users_email_key').on(t.email)]);

export const userRoles = pgTable('user_roles', {
  userId: uuid('user_id').notNull().references(() => users.id),
  role: code('role').notNull(),
  grantedBy: uuid('granted_by').references(() => users.id),
  reason: text('reason'),
  grantedAt: instant('granted_at').notNull().defaultNow(),
}, (t) => [primaryKey({ columns: [t.userId, t.role] }), check('user_roles_role_check', oneOf(t.role, grantableRoles))]);

export const userPreferences = pgTable('user_preferences', {
  userId: uuid('user_id').primaryKey().references(() => users.id),
  energyUnit: code('energy_unit').notNull(),
  temperatureK: real('temperature_k').notNull(),
  theme: code('theme').notNull(),
  hiddenColumns: text('hidden_columns').array(),
  rows: code('rows').notNull().default('comfortable'),
});

/** Sessions of the web client, in the form connect-pg-simple reads and writes. */
export const sessions = pgTable('sessions', {
  sid: code('sid').primaryKey(),
  sess: jsonb('sess').notNull(),
  expire: instant('expire').notNull(),
}, (t) => [index('sessions_expire_idx').on(t.expire)]);

/** How often something was tried by whom in the running window: limits that hold across processes. */
export const rateCounters = pgTable('rate_counters', {
  key: code('key').primaryKey(),
  hits: real('hits').notNull(),
  windowEndsAt: instant('window_ends_at').notNull(),
});
