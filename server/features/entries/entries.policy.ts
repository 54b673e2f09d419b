import type { Actor } from '#server/actor.ts';
import type { EntryAction } from '#shared/contracts/entries.ts';
import { hasRole } from '#shared/domain/roles.ts';
import { everAcceptedStates, nextState, openStates, type State } from '#shared/domain/states.ts';

interface RevisionFacts {
  state: State;
  authorId: string;
  /** Who first contributed the entry. */
  contributorId: string;
  /** Whether it is the newest revision of its entry. */
  newest: boolean;
  /** Whether the entry has a revision on its way. */
  entryHasOpenRevision: boolean;
}

const everAccepted: readonly State[] = everAcceptedStates;
const open: readonly State[] = openStates;

/** Whether somebody may know that a revision exists: what was public once by all, the rest by its author and reviewers. */
export function maySee(actor: Actor, revision: Pick<RevisionFacts, 'state' | 'authorId'>): boolean {
  return everAccepted.includes(revision.state) || (actor.userId !== null && (actor.userId === revision.authorId || hasRole(actor.roles, 'reviewer')));
}

/** Whether somebody may decide on a revision: a reviewer who neither wrote it nor first contributed its entry. */
export function mayDecide(actor: Actor, revision: Pick<RevisionFacts, 'authorId' | 'contributorId'>): boolean {
  return hasRole(actor.roles, 'reviewer') && actor.userId !== revision.authorId && actor.userId !== revision.contributorId;
}

/** States from which a new draft revision can be copied, and by whom: its author, or any contributor for what is accepted. */
const revisable: Partial<Record<State, 'author' | 'contributor'>> = { accepted: 'contributor', returned: 'author', withdrawn: 'author' };

/** What the viewer may do with a revision. */
export function entryActions(actor: Actor, revision: RevisionFacts): EntryAction[] {
  const actions: EntryAction[] = [];
  const author = actor.userId !== null && actor.userId === revision.authorId && hasRole(actor.roles, 'contributor');
  if (author && revision.state === 'draft') actions.push('edit', 'submit');
  if (author && revision.newest && nextState(revision.state, 'withdraw')) actions.push('withdraw');
  const who = revisable[revision.state];
  const others = who === 'contributor' && hasRole(actor.roles, 'contributor');
  if (who && !revision.entryHasOpenRevision && (author || others) && (revision.newest || revision.state === 'accepted')) actions.push('revise');
  if ((revision.state === 'submitted' || revision.state === 'under-review') && mayDecide(actor, revision)) actions.push('claim', 'decide');
  if (revision.state === 'accepted' && hasRole(actor.roles, 'reviewer')) actions.push('retract');
  if (revision.state === 'accepted') actions.push('export');
  return actions;
}

export const isOpen = (state: State): boolean => open.includes(state);
