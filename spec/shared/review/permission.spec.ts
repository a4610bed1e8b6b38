import { describe, expect, it } from 'vitest';
import {
  actionRefusal,
  type ReviewAction,
  type Situation,
} from '../../../shared/review/permission.ts';
import { PROJECT_ROLES } from '../../../shared/review/revision-state.ts';

const DRAFT: Situation = {
  state: 'draft',
  superseded: false,
  current: true,
  personId: 'designer',
  roles: ['designer'],
  people: { authors: ['designer'], checkers: [] },
  resistorChosen: true,
  openFindings: 0,
  missing: [],
  lockBlock: null,
};

const rule = (action: ReviewAction, on: Partial<Situation>) =>
  actionRefusal(action, { ...DRAFT, ...on })?.rule ?? null;

describe('what a person may do with a revision', () => {
  it('lets the designer save and submit a draft', () => {
    expect(rule('save', {})).toBeNull();
    expect(rule('submit', {})).toBeNull();
  });

  it('keeps a draft without a chosen base resistor from being submitted', () => {
    expect(rule('submit', { resistorChosen: false })).toBe('incomplete');
  });

  it('keeps whoever checked a revision from editing it, whatever roles he was given since', () => {
    const people = { authors: ['designer'], checkers: ['turncoat'] };
    const on = { personId: 'turncoat', roles: PROJECT_ROLES, people };
    expect(rule('save', on)).toBe('own-check');
    expect(rule('answer', { ...on, openFindings: 1 })).toBe('own-check');
    expect(rule('submit', on)).toBe('own-check');
  });

  it('keeps an author from recording a check and from closing findings', () => {
    const on = { state: 'in-check', roles: PROJECT_ROLES } as const;
    expect(rule('check', on)).toBe('own-work');
    expect(rule('close', on)).toBe('own-work');
  });

  it('allows a pass once nothing is missing', () => {
    const on = { state: 'in-check', personId: 'checker', roles: ['checker'] } as const;
    expect(rule('pass', on)).toBeNull();
    expect(rule('pass', { ...on, missing: ['Close finding 2.'] })).toBe('incomplete');
  });

  it('blocks a lock for the reason the project gives', () => {
    const on = {
      state: 'checked',
      personId: 'approver',
      roles: ['approver'],
      people: { authors: ['designer'], checkers: ['checker'] },
    } as const;
    expect(rule('lock', on)).toBeNull();
    expect(rule('lock', { ...on, lockBlock: 'Part data of 2N3904 is not verified.' })).toBe(
      'incomplete',
    );
  });

  it('starts a next revision from the current locked or withdrawn one only', () => {
    expect(rule('revise', { state: 'locked' })).toBeNull();
    expect(rule('revise', { state: 'withdrawn' })).toBeNull();
    expect(rule('revise', { state: 'locked', current: false })).toBe('state');
    expect(rule('revise', { state: 'checked' })).toBe('state');
  });

  it('calls a superseded revision superseded', () => {
    const refusal = actionRefusal('save', { ...DRAFT, state: 'locked', superseded: true });
    expect(refusal?.reason).toBe('The revision is superseded.');
  });
});
