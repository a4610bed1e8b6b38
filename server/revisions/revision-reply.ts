import { In, type EntityManager } from 'typeorm';
import type * as z from 'zod';
import type { Action, Revision } from '../../shared/contract/revision.ts';
import { ACTIONS } from '../../shared/contract/revision.ts';
import { actionRefusal, type ReviewAction } from '../../shared/review/permission.ts';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { checkReply, findingReplies } from '../checks/check-reply.ts';
import { FindingEventEntity } from '../checks/finding-event-entity.ts';
import type { Versioned } from '../http/versioned.ts';
import { namesOf } from '../projects/names-of.ts';
import { lockReply } from './lock-reply.ts';
import { asPartLinks } from './part-links.ts';
import { situationOf } from './permit.ts';
import { openRevision, ownLine, type RevisionContext } from './revision-context.ts';
import type { RevisionMoveEntity } from './revision-move-entity.ts';
import { RevisionPartEntity } from './revision-part-entity.ts';

export interface RevisionAnswer {
  readonly body: z.input<typeof Revision>;
  readonly etag: Versioned;
}

/** Reads a revision for one person, as every route that touches it answers. */
export async function answerRevision(
  manager: EntityManager,
  actor: Actor,
  revisionId: string,
): Promise<RevisionAnswer> {
  const context = await openRevision(manager, actor, revisionId);
  return { body: await revisionReply(manager, context), etag: context.revision };
}

async function revisionReply(
  manager: EntityManager,
  context: RevisionContext,
): Promise<z.input<typeof Revision>> {
  const { access, check, findings, lines, moves, people, revision, stage } = context;
  const events = await manager.find(FindingEventEntity, {
    where: { findingId: In(findings.map(({ id }) => id)) },
    order: { sequence: 'ASC' },
  });
  const named = await namesOf(manager, [
    ...[revision.designerId, ...people.authors, ...people.checkers],
    ...[...moves, ...events].map(({ personId }) => personId),
  ]);
  const last = lastMoves(context);
  const told = (move: RevisionMoveEntity | null) =>
    move && { by: named(move.personId), atMs: move.atMs, reason: move.reason ?? '' };
  const { definition, evaluation, designators, createdAtMs, savedAtMs } = revision;
  const previous = lines.find(({ id }) => id === revision.previousId);
  return {
    ...{ id: revision.id, stageId: stage.id, projectId: stage.projectId },
    ...{ projectCode: access.project.code, projectTitle: access.project.title },
    letter: revisionLetter(revision.number),
    state: ownLine(context).state,
    ...{ definition, evaluation, designators, createdAtMs, savedAtMs },
    parts: asPartLinks(await manager.findBy(RevisionPartEntity, { revisionId: revision.id })),
    partStanding: [...context.standing],
    port: context.port,
    policyVersion: context.policy.version,
    designer: named(revision.designerId),
    authors: people.authors.map(named),
    submittedAtMs: last.submit?.atMs ?? null,
    submittedBy: last.submit && named(last.submit.personId),
    checkedAtMs: last.pass?.atMs ?? null,
    checkedBy: last.pass && named(last.pass.personId),
    returned: told(last.returned),
    withdrawn: told(last.withdraw),
    check: check && checkReply(context, check, named),
    findings: findingReplies(findings, events, named),
    lock: await lockReply(manager, context),
    previous: previous ? { id: previous.id, letter: revisionLetter(previous.number) } : null,
    may: permissions(context),
  };
}

/** The moves that still hold: a return undoes the submission and the pass before it. */
function lastMoves({ moves }: RevisionContext) {
  const back = moves.findLastIndex(({ move }) => move === 'return' || move === 'send-back');
  const since = moves.slice(back + 1);
  const last = (wanted: RevisionMoveEntity['move']) =>
    since.findLast(({ move }) => move === wanted) ?? null;
  const submit = last('submit');
  const returned = submit === null ? (moves[back] ?? null) : null;
  return { submit, pass: last('pass'), withdraw: last('withdraw'), returned };
}

function permissions(context: RevisionContext): z.input<typeof Revision>['may'] {
  const situation = situationOf(context);
  const may = (action: ReviewAction) => {
    const refusal = actionRefusal(action, situation);
    return { allowed: refusal === null, reason: refusal?.reason ?? null };
  };
  return Object.fromEntries(ACTIONS.map((action) => [action, may(action)])) as Record<
    Action,
    ReturnType<typeof may>
  >;
}
