import type { EntityManager } from 'typeorm';
import { revisionLetter } from '../../shared/review/revision-state.ts';
import type { Act, Actor } from '../audit/act.ts';
import { recordAudit } from '../audit/record-audit.ts';
import type { StageEntity } from '../stages/stage-entity.ts';
import type { RevisionEntity } from './revision-entity.ts';

/** What the trail calls a revision by. */
interface Named {
  readonly revision: Pick<RevisionEntity, 'id' | 'number' | 'version'>;
  readonly stage: Pick<StageEntity, 'projectId' | 'reference'>;
}

/** `Q12 B` */
export function revisionName({ revision, stage }: Named): string {
  return `${stage.reference} ${revisionLetter(revision.number)}`;
}

/**
 * Records what was done to a revision, in the transaction that does it.
 *
 * @param tell the sentence, given the revision's name
 */
export async function auditRevision(
  manager: EntityManager,
  act: Act<Actor>,
  context: Named,
  action: string,
  tell: (name: string) => string,
  detail: Record<string, unknown> = {},
): Promise<void> {
  const name = revisionName(context);
  await recordAudit(manager, act, {
    action,
    objectKind: 'revision',
    objectId: context.revision.id,
    objectName: name,
    projectId: context.stage.projectId,
    summary: tell(name),
    detail: { version: context.revision.version, ...detail },
  });
}
