import { describe, expect, it } from 'vitest';
import { kindsHeld } from '#shared/domain/kinds.ts';
import { hasRole, roles, strongestRole } from '#shared/domain/roles.ts';
import { everAcceptedStates, nextState, revisionActions, states, transitions } from '#shared/domain/states.ts';

describe('roles', () => {
  it('a higher one has all that a lower one has', () => {
    for (const [rank, held] of roles.entries()) for (const [needed, role] of roles.entries()) expect(hasRole([held], role)).toBe(rank >= needed);
    expect(hasRole([], 'visitor')).toBe(true);
    expect(hasRole([], 'reader')).toBe(false);
    expect([strongestRole([]), strongestRole(['reader', 'reviewer'])]).toEqual(['visitor', 'reviewer']);
  });
});

describe('the state machine', () => {
  it('leads from draft to every other state', () => {
    const reached = new Set<string>(['draft']);
    for (let grown = -1; grown !== reached.size;) {
      grown = reached.size;
      for (const state of states) if (reached.has(state)) for (const next of Object.values(transitions[state])) reached.add(next);
    }
    expect([...reached].sort()).toEqual([...states].sort());
  });

  it('never leads back from what was public', () => {
    for (const state of everAcceptedStates) for (const action of revisionActions) {
      const next = nextState(state, action);
      if (next) expect(everAcceptedStates).toContain(next);
    }
  });

  it('lets only a waiting revision be decided', () => {
    for (const state of states) expect(nextState(state, 'accept') !== null).toBe(state === 'submitted' || state === 'under-review');
  });
});

describe('the kinds an entry answers to', () => {
  it.each([
    [[{ symbol: 'energy', energyType: 'arrhenius' }, { symbol: 'preExponential' }], ['activation-energy', 'pre-exponential']],
    [[{ symbol: 'energy', energyType: 'electronic' }, { symbol: 'reactionEnergy' }], ['barrier', 'reaction-energy']],
    [[{ symbol: 'energy' }], ['activation-energy']],
    [[{ symbol: 'exponent' }], []],
    [[{ symbol: 'kie' }], ['kie']],
  ] as const)('%j', (quantities, kinds) => {
    expect(kindsHeld(quantities)).toEqual(kinds);
  });
});
