import { DIFFERENCE_NEEDS_REASON } from '../../shared/contract/check.ts';
import { missingForPass } from '../../shared/review/pass-conditions.ts';
import {
  actionRefusal,
  type ReviewAction,
  type Situation,
} from '../../shared/review/permission.ts';
import { formatQuantity } from '../../shared/units/engineering-notation.ts';
import { ApiError } from '../http/api-error.ts';
import { expectVersion, type Versioned } from '../http/versioned.ts';
import { isUnverified } from './part-standing.ts';
import { ownLine, type RevisionContext } from './revision-context.ts';

/** What the rules of the review ask about a revision. */
export function situationOf(context: RevisionContext): Situation {
  const { access, actor, findings, people, revision } = context;
  const line = ownLine(context);
  return {
    state: revision.state,
    superseded: line.state === 'superseded',
    current: line.current,
    personId: actor.id,
    roles: access.roles,
    people,
    resistorChosen: revision.definition.baseResistor.valueOhm !== null,
    openFindings: findings.filter(({ state }) => state === 'open').length,
    missing: missingInCheck(context),
    lockBlock: unverifiedBlock(context) ?? portBlock(context),
  };
}

/** What is missing before the check can pass, seen from whoever asks. */
export function missingInCheck({ actor, check, findings, revision }: RevisionContext): string[] {
  const another = check !== null && check.checkerId !== actor.id;
  return [
    ...missingForPass(check, revision.evaluation, findings, DIFFERENCE_NEEDS_REASON),
    ...(another ? ['Another person saved this check last: save it in your own name.'] : []),
  ];
}

function unverifiedBlock({ access, revision, standing }: RevisionContext): string | null {
  if (!access.project.unverifiedBlocksLock) return null;
  if (!isUnverified(revision.topology, standing)) return null;
  const names = standing.filter(({ verified }) => !verified).map(({ partNumber }) => partNumber);
  const parts = names.length === 0 ? revision.transistor : [...new Set(names)].join(', ');
  return `The project locks verified part data only; not verified: ${parts}.`;
}

/** A stage that cannot work is not locked, nor is one with which its port cannot. */
function portBlock({ port }: RevisionContext): string | null {
  if (port?.criterion.status !== 'fail') return null;
  const amount = (currentA: number | null) => formatQuantity(currentA, 'A');
  const { value, limit } = port.criterion;
  return `The stages on port ${port.port} draw ${amount(value)} where ${amount(limit)} are allowed: relieve the port first.`;
}

/**
 * Lets an action through, or refuses it by the first rule that stands against it.
 *
 * @throws {ApiError} not-permitted by role or separation of duties; version-conflict; conflict or
 *   revision-locked by state; conflict while something is missing
 */
export function permit(context: RevisionContext, action: ReviewAction, ifMatch: Versioned): void {
  const refusal = actionRefusal(action, situationOf(context));
  if (refusal !== null && refusal.rule !== 'state' && refusal.rule !== 'incomplete') {
    throw new ApiError('not-permitted', refusal.reason, { rule: `${action}-${refusal.rule}` });
  }
  expectVersion(ifMatch, context.revision);
  if (refusal === null) return;
  const locked = context.revision.state === 'locked';
  throw new ApiError(locked ? 'revision-locked' : 'conflict', refusal.reason);
}
