import * as z from 'zod';
import { grantableRoles } from '../domain/roles.ts';
import { endpoint } from './endpoint.ts';

export const energyUnits = ['kJ/mol', 'kcal/mol', 'eV'] as const;
export type EnergyUnit = (typeof energyUnits)[number];

/** What a reader wants on every page. */
export const preferences = z.object({
  energyUnit: z.enum(energyUnits),
  temperatureK: z.number().min(1).max(5000),
  theme: z.enum(['system', 'light', 'dark']),
  /** Columns of the table of entries that are not shown; null for the usual choice. */
  hiddenColumns: z.array(z.string().regex(/^[A-Za-z]{1,30}$/)).max(40).nullable(),
  /** How close the rows of the table stand. */
  rows: z.enum(['comfortable', 'dense']),
});
export type Preferences = z.infer<typeof preferences>;
export const defaultPreferences: Preferences = { energyUnit: 'kJ/mol', temperatureK: 700, theme: 'system', hiddenColumns: null, rows: 'comfortable' };

export const me = z.object({
  user: z.object({ id: z.string(), name: z.string(), roles: z.array(z.enum(grantableRoles)) }).nullable(),
  /** Null for a visitor: the browser keeps theirs. */
  preferences: preferences.nullable(),
  /** Submissions waiting, for those who review; null for others. */
  reviewsWaiting: z.int().nullable(),
  demonstration: z.boolean(),
  version: z.string(),
});
export type Me = z.infer<typeof me>;

export const getMe = endpoint({ method: 'GET', path: '/auth/me', access: 'visitor', summary: 'Who is signed in, and their preferences', response: me });

export const getCsrf = endpoint({
  method: 'GET', path: '/auth/csrf', access: 'visitor', summary: 'A form token for the requests that change something',
  response: z.object({ token: z.string() }),
});

export const signIn = endpoint({
  method: 'POST', path: '/auth/sign-in', access: 'visitor', summary: 'Sign in by e-mail and password',
  body: z.object({ email: z.string().trim().min(3).max(254), password: z.string().min(1).max(200) }),
  response: me,
});

export const signOut = endpoint({ method: 'POST', path: '/auth/sign-out', access: 'visitor', summary: 'Sign out', response: me });

export const patchPreferences = endpoint({
  method: 'PATCH', path: '/auth/preferences', access: 'reader', summary: 'Change one or more preferences',
  body: preferences.partial(), response: preferences,
});

export const demoAccounts = endpoint({
  method: 'GET', path: '/auth/demo-accounts', access: 'visitor', summary: 'The demonstration accounts; empty outside demonstration mode',
  response: z.object({ accounts: z.array(z.object({ email: z.string(), name: z.string(), role: z.enum(grantableRoles) })), password: z.string().nullable() }),
});
