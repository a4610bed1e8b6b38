import {
  MOVES,
  moveRefusal,
  STATE_WORDS,
  wrongRole,
  type Move,
  type MoveRefusal,
  type ProjectRole,
  type RevisionPeople,
  type RevisionState,
  type StoredState,
} from './revision-state.ts';

/** Everything the rules need to know about a revision and the person asking. */
export interface Situation {
  /** As stored; `superseded` says whether a later revision of the stage is locked. */
  readonly state: StoredState;
  readonly superseded: boolean;
  /** Whether this is the stage's current revision and no other one is under way. */
  readonly current: boolean;
  readonly personId: string;
  readonly roles: readonly ProjectRole[];
  readonly people: RevisionPeople;
  /** Whether a base resistor value is chosen. */
  readonly resistorChosen: boolean;
  readonly openFindings: number;
  /** What is missing before the check can pass, as sentences. */
  readonly missing: readonly string[];
  /** Why the project's setting on unverified part data, or an overloaded port, forbids a lock, else null. */
  readonly lockBlock: string | null;
}

export type ReviewAction = Move | 'save' | 'check' | 'close' | 'revise' | 'answer';

export interface Refusal {
  readonly rule: MoveRefusal['rule'] | 'incomplete';
  readonly reason: string;
}

/**
 * Whether a person may act on a revision: the one rule behind the buttons and behind the server's door.
 *
 * @returns null when allowed, else the first rule that forbids it with a sentence for the screen
 */
export function actionRefusal(action: ReviewAction, on: Situation): Refusal | null {
  if (action in MOVES) return refuseMove(action as Move, on);
  switch (action) {
    case 'save':
      return refuseDesignWork(on, ['draft'], 'edits it');
    case 'answer':
      return (
        refuseDesignWork(on, ['draft', 'in-check'], 'answers') ??
        (on.openFindings === 0 ? incomplete('No finding waits for an answer.') : null)
      );
    case 'revise':
      return refuseNext(on);
    case 'close':
      return refuseCheckWork(on, ['draft', 'in-check']);
    default:
      return refuseCheckWork(on, ['in-check']);
  }
}

function refuseMove(move: Move, on: Situation): Refusal | null {
  const refusal = moveRefusal(move, on.state, on.personId, on.roles, on.people);
  if (refusal !== null) {
    return refusal.rule === 'state' ? wrongState(on) : refusal;
  }
  if (move === 'submit' && !on.resistorChosen) return incomplete('Choose a base resistor first.');
  if (move === 'pass' && on.missing.length > 0) return incomplete(on.missing.join(' '));
  if (move === 'lock' && on.lockBlock !== null) return incomplete(on.lockBlock);
  return null;
}

/** Separation of duties seen from the designer's side: whoever checked a revision leaves it alone. */
function refuseDesignWork(
  on: Situation,
  states: readonly StoredState[],
  does: string,
): Refusal | null {
  if (!states.includes(on.state)) return wrongState(on);
  if (!on.roles.includes('designer')) return wrongRole('designer');
  if (!on.people.checkers.includes(on.personId)) return null;
  return { rule: 'own-check', reason: `You checked this revision; another person ${does}.` };
}

function refuseCheckWork(on: Situation, states: readonly StoredState[]): Refusal | null {
  if (!states.includes(on.state)) return wrongState(on);
  if (!on.roles.includes('checker')) return wrongRole('checker');
  if (!on.people.authors.includes(on.personId)) return null;
  return { rule: 'own-work', reason: 'You worked on this revision; another person checks it.' };
}

function refuseNext(on: Situation): Refusal | null {
  if (on.state !== 'locked' && on.state !== 'withdrawn') return wrongState(on);
  if (!on.current) {
    return { rule: 'state', reason: 'A later revision of this stage exists.' };
  }
  return on.roles.includes('designer') ? null : wrongRole('designer');
}

function wrongState(on: Situation): Refusal {
  const state: RevisionState = on.superseded ? 'superseded' : on.state;
  return { rule: 'state', reason: `The revision is ${STATE_WORDS[state].toLowerCase()}.` };
}

function incomplete(reason: string): Refusal {
  return { rule: 'incomplete', reason };
}
