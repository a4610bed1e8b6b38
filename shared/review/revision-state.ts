/**
 * The life of a revision as a table of moves. Superseded is derived (a later revision of the stage is
 * locked), never stored, so that nothing ever has to write to a locked revision.
 */

export const STORED_STATES = ['draft', 'in-check', 'checked', 'locked', 'withdrawn'] as const;
export type StoredState = (typeof STORED_STATES)[number];

export const REVISION_STATES = [...STORED_STATES, 'superseded'] as const;
export type RevisionState = (typeof REVISION_STATES)[number];

export const STATE_WORDS: Record<RevisionState, string> = {
  draft: 'Draft',
  'in-check': 'In check',
  checked: 'Checked',
  locked: 'Locked',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
};

export const PROJECT_ROLES = ['designer', 'checker', 'approver', 'exporter'] as const;
export type ProjectRole = (typeof PROJECT_ROLES)[number];

export const MOVES = {
  submit: { from: ['draft'], to: 'in-check', role: 'designer' },
  pass: { from: ['in-check'], to: 'checked', role: 'checker' },
  return: { from: ['in-check'], to: 'draft', role: 'checker' },
  'send-back': { from: ['checked'], to: 'draft', role: 'approver' },
  lock: { from: ['checked'], to: 'locked', role: 'approver' },
  withdraw: { from: ['draft', 'in-check', 'checked'], to: 'withdrawn', role: 'designer' },
} as const satisfies Record<
  string,
  { from: readonly StoredState[]; to: StoredState; role: ProjectRole }
>;
export type Move = keyof typeof MOVES;

/** What separation of duties needs to know about a revision. Ids of people. */
export interface RevisionPeople {
  /** Everybody who ever changed the definition of this revision. */
  readonly authors: readonly string[];
  /** Everybody who ever recorded or passed a check on it. */
  readonly checkers: readonly string[];
}

/** Why a move is refused: a rule id for the log and a sentence for the screen. */
export interface MoveRefusal {
  readonly rule: 'state' | 'role' | 'own-work' | 'own-check';
  readonly reason: string;
}

/**
 * Whether a person may make a move, by state, role and separation of duties.
 *
 * @returns null when allowed, else the first rule that forbids it
 */
export function moveRefusal(
  move: Move,
  state: StoredState,
  personId: string,
  roles: readonly ProjectRole[],
  people: RevisionPeople,
): MoveRefusal | null {
  const rule = MOVES[move];
  if (!(rule.from as readonly StoredState[]).includes(state)) {
    return { rule: 'state', reason: `The revision is ${STATE_WORDS[state].toLowerCase()}.` };
  }
  if (!roles.includes(rule.role)) return wrongRole(rule.role);
  if (rule.role === 'designer') {
    if (move === 'withdraw' || !people.checkers.includes(personId)) return null;
    return { rule: 'own-check', reason: 'You checked this revision; another person submits it.' };
  }
  if (people.authors.includes(personId)) {
    return { rule: 'own-work', reason: 'You worked on this revision; another person decides.' };
  }
  if (rule.role === 'approver' && people.checkers.includes(personId)) {
    return { rule: 'own-check', reason: 'You checked this revision; another person locks it.' };
  }
  return null;
}

/** The refusal of somebody who lacks a role, with its sentence. */
export function wrongRole(role: ProjectRole): MoveRefusal {
  const article = role === 'designer' || role === 'checker' ? 'a' : 'an';
  return { rule: 'role', reason: `Only ${article} ${role} of the project can do this.` };
}

const LETTERS = 'ABCDEFGHJKLMNPRTUVWY';

/**
 * Revision letter by position, drawing practice: A, B, C … without I, O, Q, S, X, Z; then AA, AB …
 *
 * @param index 0 for the first revision
 * @throws {RangeError} if index is negative or not whole
 */
export function revisionLetter(index: number): string {
  if (!Number.isInteger(index) || index < 0) throw new RangeError(`no revision ${index}`);
  const last = LETTERS.charAt(index % LETTERS.length);
  const rest = Math.floor(index / LETTERS.length);
  return rest === 0 ? last : revisionLetter(rest - 1) + last;
}
