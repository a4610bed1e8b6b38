import type { EntityManager } from 'typeorm';
import type { NoteSource } from '../../shared/report/bom-note-source.ts';
import { revisionLetter, STATE_WORDS } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { namesOf } from '../projects/names-of.ts';
import { lockReply } from '../revisions/lock-reply.ts';
import { openRevision, ownLine, type RevisionContext } from '../revisions/revision-context.ts';

/**
 * A revision as a note takes it. The hash of its lock is made again: one that no longer fits counts as not
 * locked, so nothing can be issued of it.
 */
export async function noteSource(
  manager: EntityManager,
  actor: Actor,
  revisionId: string,
): Promise<NoteSource> {
  const context = await openRevision(manager, actor, revisionId);
  const { moves, revision, stage, standing } = context;
  const lock = await lockReply(manager, context);
  const pass = moves.findLast(({ move }) => move === 'pass' || move === 'return');
  const checkerId = pass?.move === 'pass' ? pass.personId : null;
  const named = await namesOf(manager, [revision.designerId, ...(checkerId ? [checkerId] : [])]);
  const state = STATE_WORDS[ownLine(context).state];
  return {
    revisionId,
    stageId: stage.id,
    letter: revisionLetter(revision.number),
    stateWord: lock?.intact === false ? `${state}, changed since` : state,
    definition: revision.definition,
    designators: revision.designators,
    evaluation: revision.evaluation,
    parts: standing,
    designer: named(revision.designerId).name,
    checker: checkerId === null ? null : named(checkerId).name,
    lock: lock?.intact === true ? { ...lock, approver: lock.approver.name } : null,
    successor: successorOf(context),
  };
}

function successorOf({ lines, revision }: RevisionContext): NoteSource['successor'] {
  const next = lines.find(({ number, state }) => number > revision.number && state !== 'withdrawn');
  return next ? { letter: revisionLetter(next.number), stateWord: STATE_WORDS[next.state] } : null;
}
