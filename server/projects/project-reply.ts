import { In, type EntityManager } from 'typeorm';
import type * as z from 'zod';
import { portVerdicts } from '../../shared/checks/port-current.ts';
import type { Project, ProjectSummary } from '../../shared/contract/project.ts';
import { REVISION_STATES } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { PolicyEntity } from '../policies/policy-entity.ts';
import { revisionLines, type RevisionLine } from '../revisions/revision-line.ts';
import { MembershipEntity } from './membership-entity.ts';
import type { ProjectAccess } from './project-access.ts';
import { ProjectEntity } from './project-entity.ts';

/** The whole project as one person sees it. */
export async function projectReply(
  manager: EntityManager,
  { project, roles, mayManage }: ProjectAccess,
): Promise<z.input<typeof Project>> {
  const lines = (await revisionLines(manager, [project.id])).filter(({ current }) => current);
  const policy = await manager.findOneByOrFail(PolicyEntity, { id: project.policyId });
  const { id, code, title, supplementaryTitle, legalOwner, department } = project;
  return {
    ...{ id, code, title, supplementaryTitle, legalOwner, department },
    policy,
    unverifiedBlocksLock: project.unverifiedBlocksLock,
    members: await membersOf(manager, project.id),
    counts: countStates(lines),
    ports: portVerdicts(
      lines.filter(({ state }) => state !== 'withdrawn'),
      policy.limits.marginalBand,
    ),
    ownRoles: [...roles],
    mayManage,
  };
}

export async function projectSummaries(
  manager: EntityManager,
  actor: Actor,
  projectIds: readonly string[],
): Promise<z.input<typeof ProjectSummary>[]> {
  const projects = await manager.find(ProjectEntity, {
    where: { id: In([...projectIds]) },
    relations: { policy: true },
    order: { code: 'ASC' },
  });
  const own = await manager.findBy(MembershipEntity, { personId: actor.id });
  const lines = (await revisionLines(manager, projectIds)).filter(({ current }) => current);
  return projects.map(({ id, code, title, policy }) => {
    const ofProject = lines.filter(({ projectId }) => projectId === id);
    return {
      ...{ id, code, title },
      counts: countStates(ofProject),
      ownRoles: own.find(({ projectId }) => projectId === id)?.roles ?? [],
      policyName: policy?.name ?? '',
      stages: ofProject.length,
    };
  });
}

async function membersOf(manager: EntityManager, projectId: string): Promise<Project['members']> {
  const members = await manager.find(MembershipEntity, {
    where: { projectId },
    relations: { person: true },
  });
  return members
    .map(({ personId, person, roles }) => ({
      person: { id: personId, name: person?.name ?? '' },
      roles,
    }))
    .sort((a, b) => a.person.name.localeCompare(b.person.name, 'en'));
}

function countStates(lines: readonly RevisionLine[]): Project['counts'] {
  const counts = Object.fromEntries(
    REVISION_STATES.map((state) => [state, 0]),
  ) as Project['counts'];
  for (const { state } of lines) counts[state] += 1;
  return counts;
}
