import { In, type EntityManager } from 'typeorm';
import type { ProjectRole } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { CheckRecordEntity } from '../checks/check-record-entity.ts';
import { FindingEntity } from '../checks/finding-entity.ts';
import { FindingEventEntity } from '../checks/finding-event-entity.ts';
import { MembershipEntity } from '../projects/membership-entity.ts';
import { ProjectEntity } from '../projects/project-entity.ts';
import { standingInProjects, type RevisionPartStanding } from '../revisions/part-standing.ts';
import { revisionLines, type RevisionLine } from '../revisions/revision-line.ts';
import { RevisionMoveEntity } from '../revisions/revision-move-entity.ts';
import { RevisionPersonEntity } from '../revisions/revision-person-entity.ts';

/** Everything of a person's own projects that may wait for somebody. */
export interface DeskMaterial {
  readonly actor: Actor;
  readonly projects: ReadonlyMap<string, ProjectEntity>;
  readonly roles: ReadonlyMap<string, readonly ProjectRole[]>;
  /** Current revisions. */
  readonly lines: readonly RevisionLine[];
  // of the current revisions that are neither locked nor withdrawn, oldest first:
  readonly hands: readonly RevisionPersonEntity[];
  readonly moves: readonly RevisionMoveEntity[];
  readonly checks: readonly CheckRecordEntity[];
  /** Not closed. */
  readonly findings: readonly FindingEntity[];
  readonly events: readonly FindingEventEntity[];
  readonly standing: readonly RevisionPartStanding[];
}

const UNDER_WAY = ['draft', 'in-check', 'checked'];

export async function deskMaterial(manager: EntityManager, actor: Actor): Promise<DeskMaterial> {
  const memberships = await manager.findBy(MembershipEntity, { personId: actor.id });
  const projectIds = memberships.map(({ projectId }) => projectId);
  const projects = await manager.findBy(ProjectEntity, { id: In(projectIds) });
  const lines = (await revisionLines(manager, projectIds)).filter(({ current }) => current);
  const revisionId = In(lines.filter(({ state }) => UNDER_WAY.includes(state)).map(({ id }) => id));
  const findings = await manager.find(FindingEntity, {
    where: { revisionId, state: In(['open', 'answered']) },
    order: { number: 'ASC' },
  });
  const order = { sequence: 'ASC' } as const;
  const findingId = In(findings.map(({ id }) => id));
  return {
    ...{ actor, lines, findings },
    projects: new Map(projects.map((project) => [project.id, project])),
    roles: new Map(memberships.map(({ projectId, roles }) => [projectId, roles])),
    hands: await manager.findBy(RevisionPersonEntity, { revisionId }),
    moves: await manager.find(RevisionMoveEntity, { where: { revisionId }, order }),
    checks: await manager.findBy(CheckRecordEntity, { revisionId }),
    events: await manager.find(FindingEventEntity, { where: { findingId }, order }),
    standing: await standingInProjects(manager, projectIds),
  };
}
