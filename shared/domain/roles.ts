/** The roles of people, weakest first; a higher role has all that a lower one has. */
export const roles = ['visitor', 'reader', 'contributor', 'reviewer', 'curator'] as const;
export type Role = (typeof roles)[number];

/** Roles that can be granted: everyone not signed in is a visitor without being told so. */
export const grantableRoles = ['reader', 'contributor', 'reviewer', 'curator'] as const satisfies readonly Role[];

/**
 * Tells whether a person holding `held` may do what asks for at least `needed`.
 * @example hasRole(['reviewer'], 'contributor') // true
 */
export function hasRole(held: readonly Role[], needed: Role): boolean {
  const rank = Math.max(0, ...held.map((role) => roles.indexOf(role)));
  return rank >= roles.indexOf(needed);
}

/** The strongest of the roles held; `visitor` when none is. */
export function strongestRole(held: readonly Role[]): Role {
  return roles[Math.max(0, ...held.map((role) => roles.indexOf(role)))] ?? 'visitor';
}
