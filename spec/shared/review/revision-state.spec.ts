import { describe, expect, it } from 'vitest';
import {
  MOVES,
  moveRefusal,
  PROJECT_ROLES,
  revisionLetter,
  STORED_STATES,
  type Move,
  type StoredState,
} from '../../../shared/review/revision-state.ts';

const NOBODY = { authors: [], checkers: [] };

describe('table of moves', () => {
  it('reaches every stored state from draft', () => {
    const reached = new Set<StoredState>(['draft']);
    while (reached.size < STORED_STATES.length) {
      const before = reached.size;
      for (const { from, to } of Object.values(MOVES)) {
        if (from.some((state) => reached.has(state))) reached.add(to);
      }
      if (reached.size === before) break;
    }
    expect([...reached].sort()).toEqual([...STORED_STATES].sort());
  });

  it('leads nowhere from locked and from withdrawn', () => {
    for (const move of Object.keys(MOVES) as Move[]) {
      for (const state of ['locked', 'withdrawn'] as const) {
        expect(moveRefusal(move, state, 'a', PROJECT_ROLES, NOBODY)?.rule).toBe('state');
      }
    }
  });

  it.each(Object.entries(MOVES))('lets only its own role make the move %s', (name, rule) => {
    for (const role of PROJECT_ROLES) {
      const refusal = moveRefusal(name as Move, rule.from[0], 'a', [role], NOBODY);
      expect(refusal?.rule ?? null).toBe(role === rule.role ? null : 'role');
    }
  });
});

describe('separation of duties', () => {
  const all = PROJECT_ROLES;

  it('keeps an author from checking, returning and locking the own work', () => {
    const people = { authors: ['a'], checkers: [] };
    expect(moveRefusal('pass', 'in-check', 'a', all, people)?.rule).toBe('own-work');
    expect(moveRefusal('return', 'in-check', 'a', all, people)?.rule).toBe('own-work');
    expect(moveRefusal('lock', 'checked', 'a', all, people)?.rule).toBe('own-work');
    expect(moveRefusal('send-back', 'checked', 'a', all, people)?.rule).toBe('own-work');
  });

  it('keeps a checker from locking and from submitting what he checked', () => {
    const people = { authors: ['a'], checkers: ['c'] };
    expect(moveRefusal('lock', 'checked', 'c', all, people)?.rule).toBe('own-check');
    expect(moveRefusal('submit', 'draft', 'c', all, people)?.rule).toBe('own-check');
  });

  it('lets a third person with the role lock', () => {
    const people = { authors: ['a'], checkers: ['c'] };
    expect(moveRefusal('lock', 'checked', 'p', ['approver'], people)).toBeNull();
  });
});

describe('revision letters', () => {
  // Drawing practice (ASME Y14.35): I, O, Q, S, X and Z are not used; after Y comes AA.
  it('leave out I, O, Q, S, X and Z', () => {
    const letters = Array.from({ length: 20 }, (_, index) => revisionLetter(index)).join('');
    expect(letters).toBe('ABCDEFGHJKLMNPRTUVWY');
  });

  it('go on with AA and AB after Y', () => {
    expect([revisionLetter(20), revisionLetter(21), revisionLetter(40)]).toEqual([
      'AA',
      'AB',
      'BA',
    ]);
  });

  it.each([-1, 0.5])('do not exist at %d', (index) => {
    expect(() => revisionLetter(index)).toThrow(RangeError);
  });
});
