import { and, eq, isNull } from 'drizzle-orm';
import type { DbOrTx, Tx } from '#server/db/pool.ts';
import { userPreferences, userRoles, users } from '#server/db/schema/accounts.ts';
import type { Preferences } from '#shared/contracts/accounts.ts';
import type { Role } from '#shared/domain/roles.ts';

export interface Account {
  id: string;
  name: string;
  passwordHash: string;
  roles: Role[];
}

async function withRoles(db: DbOrTx, rows: { id: string; name: string; passwordHash: string }[]): Promise<Account | null> {
  const row = rows[0];
  if (!row) return null;
  const roles = await db.select({ role: userRoles.role }).from(userRoles).where(eq(userRoles.userId, row.id));
  return { ...row, roles: roles.map(({ role }) => role as Role) };
}

const accountColumns = { id: users.id, name: users.name, passwordHash: users.passwordHash };

export async function findAccountByEmail(db: DbOrTx, email: string): Promise<Account | null> {
  return withRoles(db, await db.select(accountColumns).from(users).where(and(eq(users.email, email), isNull(users.disabledAt))));
}

export async function findAccountById(db: DbOrTx, id: string): Promise<Account | null> {
  return withRoles(db, await db.select(accountColumns).from(users).where(and(eq(users.id, id), isNull(users.disabledAt))));
}

export async function insertAccount(tx: Tx, account: { email: string; name: string; passwordHash: string; roles: readonly string[]; createdAt: Date }): Promise<string> {
  const [row] = await tx.insert(users)
    .values({ email: account.email, name: account.name, passwordHash: account.passwordHash, createdAt: account.createdAt })
    .returning({ id: users.id });
  if (!row) throw new Error('The account was not stored.');
  for (const role of account.roles) await tx.insert(userRoles).values({ userId: row.id, role, grantedAt: account.createdAt });
  return row.id;
}

export async function findPreferences(db: DbOrTx, userId: string): Promise<Preferences | null> {
  const { energyUnit, temperatureK, theme, hiddenColumns, rows } = userPreferences;
  const [row] = await db.select({ energyUnit, temperatureK, theme, hiddenColumns, rows }).from(userPreferences).where(eq(userPreferences.userId, userId));
  return (row as Preferences | undefined) ?? null;
}

export async function savePreferences(db: DbOrTx, userId: string, preferences: Preferences): Promise<void> {
  await db.insert(userPreferences).values({ userId, ...preferences }).onConflictDoUpdate({ target: userPreferences.userId, set: preferences });
}

/** Emails of the accounts, in the order they were made; asked for in demonstration mode only. */
export async function listAccounts(db: DbOrTx): Promise<{ id: string; email: string; name: string; role: string }[]> {
  return db.select({ id: users.id, email: users.email, name: users.name, role: userRoles.role })
    .from(users).innerJoin(userRoles, eq(userRoles.userId, users.id)).orderBy(users.createdAt, users.email);
}
