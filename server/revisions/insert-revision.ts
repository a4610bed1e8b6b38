import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import type { Designators } from '../../shared/contract/revision.ts';
import type { Act, Actor } from '../audit/act.ts';
import type { Judged } from './judge.ts';
import { RevisionEntity } from './revision-entity.ts';
import { addHand } from './revision-write.ts';

/** Adds a revision as a draft of whoever acts. */
export async function insertRevision(
  manager: EntityManager,
  act: Act<Actor>,
  judged: Judged,
  place: {
    readonly stageId: string;
    readonly number: number;
    readonly previousId: string | null;
    readonly designators: Designators;
  },
): Promise<Pick<RevisionEntity, 'id' | 'number' | 'version'>> {
  const revision = {
    ...judged,
    ...place,
    ...{ id: randomUUID(), state: 'draft', partSnapshot: null, version: 1 },
    ...{ designerId: act.actor.id, createdAtMs: act.atMs, savedAtMs: act.atMs },
  };
  // definition and evaluation are whole JSON documents; TypeORM's deep-partial type cannot say so
  await manager.insert(RevisionEntity, revision as object);
  await addHand(manager, revision.id, act.actor.id, 'author');
  return revision;
}
