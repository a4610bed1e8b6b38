import type { EntityManager } from 'typeorm';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import type { Act, Actor } from '../audit/act.ts';
import { ApiError } from '../http/api-error.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { requireRole } from '../projects/project-access.ts';
import { openStage, type OpenStage } from '../stages/stage-service.ts';
import { insertRevision } from './insert-revision.ts';
import { judge } from './judge.ts';
import { asPartLinks, storePartLinks } from './part-links.ts';
import { auditRevision } from './revision-audit.ts';
import { RevisionEntity } from './revision-entity.ts';
import { RevisionPartEntity } from './revision-part-entity.ts';
import { answerRevision, type RevisionAnswer } from './revision-reply.ts';

/** Copies the current revision of a stage into the next draft, judged under the project's policy. */
export async function startNextRevision(
  database: Database,
  act: Act<Actor>,
  stageId: string,
): Promise<RevisionAnswer> {
  const seen = await database.read(async (manager) => {
    const { source, open } = await readSource(manager, act, stageId);
    const { policyId } = open.access.project;
    return { source, policy: await manager.findOneByOrFail(PolicyEntity, { id: policyId }) };
  });
  const judged = judge(seen.source.definition, seen.policy);
  return database.transaction(async (manager) => {
    const { source, open } = await readSource(manager, act, stageId);
    if (source.id !== seen.source.id || open.access.project.policyId !== seen.policy.id) {
      throw new ApiError('version-conflict', 'The stage changed in this moment: try again.');
    }
    const revision = await insertRevision(manager, act, judged, {
      stageId,
      number: Math.max(...open.lines.map(({ number }) => number)) + 1,
      previousId: source.id,
      designators: source.designators,
    });
    const links = await manager.findBy(RevisionPartEntity, { revisionId: source.id });
    await storePartLinks(manager, revision.id, asPartLinks(links), judged.definition);
    await auditRevision(
      manager,
      act,
      { revision, stage: open.stage },
      'revision.started',
      (name) => `started ${name}`,
      { from: revisionLetter(source.number) },
    );
    return answerRevision(manager, act.actor, revision.id);
  });
}

async function readSource(
  manager: EntityManager,
  act: Act<Actor>,
  stageId: string,
): Promise<{ source: RevisionEntity; open: OpenStage }> {
  const open = await openStage(manager, act.actor, stageId);
  requireRole(open.access, 'designer');
  const current = open.lines.find((line) => line.current);
  if (current?.state !== 'locked' && current?.state !== 'withdrawn') {
    const letter = revisionLetter(current?.number ?? 0);
    throw new ApiError('conflict', `Revision ${letter} is under way; finish or withdraw it first.`);
  }
  return { open, source: await manager.findOneByOrFail(RevisionEntity, { id: current.id }) };
}
