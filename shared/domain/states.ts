/** The states of a revision, in the order in which most of them are met. */
export const states = [
  'draft', 'submitted', 'under-review', 'returned', 'accepted', 'rejected', 'withdrawn', 'superseded', 'retracted',
] as const;
export type State = (typeof states)[number];

/** What can be done to a revision. */
export const revisionActions = [
  'edit', 'submit', 'claim', 'release', 'accept', 'return', 'reject', 'withdraw', 'supersede', 'retract',
] as const;
export type RevisionAction = (typeof revisionActions)[number];

/**
 * The state machine as data: `transitions[state][action]` is the state that follows; an action that is not listed is refused.
 * `edit` keeps the state. `supersede` is done by the acceptance of the next version, never by a person directly.
 * The database holds the same table in a trigger, and a test compares the two.
 */
export const transitions: Readonly<Record<State, Partial<Record<RevisionAction, State>>>> = {
  'draft': { edit: 'draft', submit: 'submitted', withdraw: 'withdrawn' },
  'submitted': { claim: 'under-review', accept: 'accepted', return: 'returned', reject: 'rejected', withdraw: 'withdrawn' },
  'under-review': {
    claim: 'under-review', release: 'submitted', accept: 'accepted', return: 'returned', reject: 'rejected', withdraw: 'withdrawn',
  },
  'returned': { withdraw: 'withdrawn' },
  'accepted': { supersede: 'superseded', retract: 'retracted' },
  'rejected': {},
  'withdrawn': {},
  'superseded': {},
  'retracted': {},
};

/** States that everybody may read: they were public once and stay so, with their notice. */
export const everAcceptedStates = ['accepted', 'superseded', 'retracted'] as const satisfies readonly State[];

/** States in which an entry has a revision on its way, so that no second one may be opened. A returned one is answered by the next revision. */
export const openStates = ['draft', 'submitted', 'under-review'] as const satisfies readonly State[];

/** The state that `action` leads to from `state`, or null when it is not allowed. */
export function nextState(state: State, action: RevisionAction): State | null {
  return transitions[state][action] ?? null;
}

/** The states in words, as the screens show them. */
export const stateWords: Readonly<Record<State, string>> = {
  'draft': 'draft',
  'submitted': 'submitted',
  'under-review': 'under review',
  'returned': 'returned',
  'accepted': 'accepted',
  'rejected': 'rejected',
  'withdrawn': 'withdrawn',
  'superseded': 'superseded',
  'retracted': 'retracted',
};
