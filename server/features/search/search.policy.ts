import type { Actor } from '#server/actor.ts';
import { hasRole } from '#shared/domain/roles.ts';
import { states, type State } from '#shared/domain/states.ts';
import type { Visibility } from './search-engine.ts';

/** States in which a revision has a search row: a draft has none. */
export const frozenStates: readonly State[] = states.filter((state) => state !== 'draft');

/** Whose rows somebody may find besides accepted ones: reviewers everybody's, contributors their own, others nobody's. */
function unacceptedOf(actor: Actor): Visibility['unaccepted'] {
  if (actor.userId === null || !hasRole(actor.roles, 'contributor')) return 'nobody';
  return hasRole(actor.roles, 'reviewer') ? 'everybody' : { of: actor.userId };
}

/** What a search by somebody may find: accepted rows unless other states are asked for, and of those only what they may know of. */
export function visibilityOf(actor: Actor, asked: readonly State[] | undefined): Visibility {
  return { states: asked && asked.length > 0 ? asked : ['accepted'], unaccepted: unacceptedOf(actor) };
}

/** What everybody may find. */
export const publicRows: Visibility = { states: ['accepted'], unaccepted: 'nobody' };

/** Everything that somebody may find, or null when that is the accepted rows alone. */
export function widestVisibility(actor: Actor): Visibility | null {
  const unaccepted = unacceptedOf(actor);
  return unaccepted === 'nobody' ? null : { states: frozenStates, unaccepted };
}
