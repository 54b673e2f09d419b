import { hasRole, type Role } from '#shared/domain/roles.ts';
import { Refusal } from './refusal.ts';

/** Who asks: a signed-in person or a visitor. Every service call takes one. */
export interface Actor {
  readonly userId: string | null;
  readonly name: string;
  readonly roles: readonly Role[];
}

export interface SignedIn extends Actor {
  readonly userId: string;
}

export const visitor: Actor = { userId: null, name: 'visitor', roles: [] };

/** The actor as a signed-in person with at least the role needed. */
export function requireRole(actor: Actor, role: Role): SignedIn {
  if (actor.userId === null) throw new Refusal('sign-in-required');
  if (!hasRole(actor.roles, role)) throw new Refusal('forbidden', `This is open to a ${role} or a higher role.`);
  return actor as SignedIn;
}
