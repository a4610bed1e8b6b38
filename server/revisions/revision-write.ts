import type { EntityManager } from 'typeorm';
import type { Move } from '../../shared/review/revision-state.ts';
import { MOVES } from '../../shared/review/revision-state.ts';
import type { Act, Actor } from '../audit/act.ts';
import type { RevisionContext } from './revision-context.ts';
import { RevisionEntity } from './revision-entity.ts';
import { RevisionMoveEntity } from './revision-move-entity.ts';
import { RevisionPersonEntity } from './revision-person-entity.ts';

/** Remembers that a person had a hand in a revision. */
export async function addHand(
  manager: EntityManager,
  revisionId: string,
  personId: string,
  hand: RevisionPersonEntity['hand'],
): Promise<void> {
  const key = { revisionId, personId, hand };
  if (!(await manager.existsBy(RevisionPersonEntity, key))) {
    await manager.insert(RevisionPersonEntity, key);
  }
}

/** Writes columns of a revision and moves its version on. */
export async function updateRevision(
  manager: EntityManager,
  { id, version }: RevisionEntity,
  columns: object = {},
): Promise<void> {
  await manager.update(RevisionEntity, { id }, { ...columns, version: version + 1 });
}

/** Makes a move of the review table: history first, since a final state lets nothing be added. */
export async function makeMove(
  manager: EntityManager,
  act: Act<Actor>,
  { moves, revision }: RevisionContext,
  move: Move,
  { reason = null, columns = {} }: { reason?: string | null; columns?: object } = {},
): Promise<void> {
  await manager.insert(RevisionMoveEntity, {
    ...{ revisionId: revision.id, sequence: moves.length + 1, move, reason },
    ...{ personId: act.actor.id, atMs: act.atMs },
  });
  await updateRevision(manager, revision, { ...columns, state: MOVES[move].to });
}
