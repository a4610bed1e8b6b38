import type { EntityManager } from 'typeorm';
import type { Designators } from '../../shared/contract/revision.ts';
import type { StageInput } from '../../shared/stage/stage-input.ts';
import { RevisionEntity } from '../revisions/revision-entity.ts';
import { allocateDesignators, type NamedDesignators } from './designators.ts';

/**
 * Designators for one stage of a project, free of those that its other stages use in any revision.
 *
 * @param stageId the stage itself, null for a new one
 */
export async function designatorsFor(
  manager: EntityManager,
  projectId: string,
  stageId: string | null,
  definition: StageInput,
  named: NamedDesignators,
): Promise<Designators> {
  const rows = await manager.find(RevisionEntity, {
    select: { stageId: true, port: true, designators: true, stage: { reference: true } },
    relations: { stage: true },
    where: { stage: { projectId } },
  });
  const others = rows.filter((row) => row.stageId !== stageId);
  const used = others.flatMap(({ designators, stage }) => [
    stage?.reference ?? '',
    ...Object.values(designators).filter((designator) => designator !== null),
  ]);
  const { port } = definition.drive;
  const neighbour = port === null ? undefined : others.find((row) => row.port === port);
  return allocateDesignators(
    definition,
    named,
    [...used, definition.reference],
    neighbour?.designators.drive ?? null,
  );
}
