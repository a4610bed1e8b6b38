import type { EntityManager } from 'typeorm';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import type { Actor } from '../audit/act.ts';
import type { Database } from '../persistence/database.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { accessProject } from '../projects/project-access.ts';
import { columnsOf, judge, type Judged } from './judge.ts';
import { RevisionEntity } from './revision-entity.ts';

/** Results under the new policy by revision, good for the version they were computed from. */
export type JudgedDrafts = ReadonlyMap<
  string,
  { readonly version: number; readonly judged: Judged }
>;

/**
 * Judges every draft of a project under the policy it is about to adopt, before the transaction.
 *
 * @returns empty where the policy stays or does not exist
 */
export async function judgeDrafts(
  database: Database,
  actor: Actor,
  projectId: string,
  policyId: string,
): Promise<JudgedDrafts> {
  const found = await database.read(async (manager) => {
    const { project } = await accessProject(manager, actor, projectId);
    const policy = await manager.findOneBy(PolicyEntity, { id: policyId });
    const drafts = project.policyId === policyId ? [] : await draftsOf(manager, projectId);
    return { policy, drafts };
  });
  const { policy, drafts } = found;
  if (policy === null) return new Map();
  return new Map(
    drafts.map(({ id, version, definition }) => [
      id,
      { version, judged: judge(definition, policy) },
    ]),
  );
}

/** Stores the results; a draft saved in the meantime is judged here and now. */
export async function storeJudgedDrafts(
  manager: EntityManager,
  projectId: string,
  policy: PolicyEntity,
  prepared: JudgedDrafts,
): Promise<void> {
  for (const { id, version, definition } of await draftsOf(manager, projectId)) {
    const ready = prepared.get(id);
    const judged = ready?.version === version ? ready.judged : judge(definition, policy);
    await manager.update(RevisionEntity, { id }, { ...columnsOf(judged), version: version + 1 });
  }
}

function draftsOf(
  manager: EntityManager,
  projectId: string,
): Promise<{ id: string; version: number; definition: StageInput }[]> {
  return manager.find(RevisionEntity, {
    select: { id: true, version: true, definition: true },
    where: { state: 'draft', stage: { projectId } },
  });
}
