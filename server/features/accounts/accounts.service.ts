import { hash, verify } from '@node-rs/argon2';
import { requireRole, type Actor } from '#server/actor.ts';
import type { Context } from '#server/context.ts';
import { appendEvents } from '#server/db/event-log.ts';
import { Refusal } from '#server/refusal.ts';
import { defaultPreferences, type Preferences } from '#shared/contracts/accounts.ts';
import { roles as roleOrder, type Role } from '#shared/domain/roles.ts';
import * as repository from './accounts.repository.ts';

/** The password of every demonstration account; shown on the sign-in page in demonstration mode, refused outside it. */
export const demonstrationPassword = 'stepping-stone';
export const demonstrationDomain = '@demo.sillstone.example';

/** Argon2id with the parameters of OWASP's password storage advice (19 MiB, two passes, one lane). */
const argon2 = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

export const hashPassword = (password: string) => hash(password, argon2);

export function createAccountsService({ db, clock, demonstration }: Context) {
  // Verified when no account has the address, so that the answer takes as long either way.
  const decoy = hashPassword('no account has this password');

  return {
    async signIn(email: string, password: string): Promise<Actor & { userId: string }> {
      const address = email.toLowerCase();
      const account = demonstration || !address.endsWith(demonstrationDomain) ? await repository.findAccountByEmail(db, address) : null;
      const right = await verify(account?.passwordHash ?? await decoy, password);
      if (!account || !right) throw new Refusal('sign-in-failed', 'E-mail or password is not right. Both are needed exactly as set; the password minds capitals.');
      return { userId: account.id, name: account.name, roles: account.roles };
    },

    async findActor(userId: string): Promise<Actor | null> {
      const account = await repository.findAccountById(db, userId);
      return account ? { userId: account.id, name: account.name, roles: account.roles } : null;
    },

    async preferences(actor: Actor): Promise<Preferences | null> {
      if (!actor.userId) return null;
      return (await repository.findPreferences(db, actor.userId)) ?? defaultPreferences;
    },

    async changePreferences(actor: Actor, change: Partial<Preferences>): Promise<Preferences> {
      const { userId } = requireRole(actor, 'reader');
      const next = { ...(await repository.findPreferences(db, userId)) ?? defaultPreferences, ...change };
      await repository.savePreferences(db, userId, next);
      return next;
    },

    /** Makes an account with a role; used by commands and the demonstration data. */
    async create(person: { email: string; name: string; password: string; role: Exclude<Role, 'visitor'> }): Promise<string> {
      const passwordHash = await hashPassword(person.password);
      return db.transaction(async (tx) => {
        const id = await repository.insertAccount(tx, { email: person.email.toLowerCase(), name: person.name, passwordHash, roles: [person.role], createdAt: clock() });
        await appendEvents(tx, [{ at: clock(), actorId: null, action: 'user.created', subjectType: 'user', subjectId: id, payload: { role: person.role } }]);
        return id;
      });
    },

    /** The demonstration accounts, one a role and the second reviewer; empty outside demonstration mode. */
    async demonstrationAccounts(): Promise<{ email: string; name: string; role: 'reader' | 'contributor' | 'reviewer' | 'curator' }[]> {
      if (!demonstration) return [];
      const shown = ['reader', 'contributor', 'reviewer', 'second.reviewer', 'curator'].map((name) => name + demonstrationDomain);
      const accounts = await repository.listAccounts(db);
      return accounts
        .filter(({ email }) => shown.includes(email))
        .map(({ email, name, role }) => ({ email, name, role: role as 'reader' | 'contributor' | 'reviewer' | 'curator' }))
        .sort((a, b) => roleOrder.indexOf(a.role) - roleOrder.indexOf(b.role) || shown.indexOf(a.email) - shown.indexOf(b.email));
    },
  };
}
export type AccountsService = ReturnType<typeof createAccountsService>;
