import type { EntityManager } from 'typeorm';
import type { ProjectRole } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { ApiError, notFound } from '../http/api-error.ts';
import { MembershipEntity } from './membership-entity.ts';
import { ProjectEntity } from './project-entity.ts';

/** A project as far as one person may see it. */
export interface ProjectAccess {
  readonly project: ProjectEntity;
  /** Own roles; an administrator who is no member has none. */
  readonly roles: readonly ProjectRole[];
  readonly mayManage: boolean;
}

/**
 * Opens a project to one of its members or to an administrator.
 *
 * @throws {ApiError} not-found, alike for a foreign project and for none
 */
export async function accessProject(
  manager: EntityManager,
  actor: Actor,
  projectId: string,
): Promise<ProjectAccess> {
  const project = await manager.findOneBy(ProjectEntity, { id: projectId });
  const member = await manager.findOneBy(MembershipEntity, { projectId, personId: actor.id });
  if (project === null || (member === null && !actor.administrator)) throw notFound();
  return {
    project,
    roles: member?.roles ?? [],
    mayManage: actor.administrator || project.managerId === actor.id,
  };
}

/** @throws {ApiError} not-permitted for a member who does not manage the project */
export function requireManager({ mayManage }: ProjectAccess): void {
  if (mayManage) return;
  throw new ApiError('not-permitted', 'Only who created the project or an administrator can.', {
    rule: 'project-manager',
  });
}

/** @throws {ApiError} not-permitted for a member without the role */
export function requireRole({ roles }: ProjectAccess, role: ProjectRole): void {
  if (roles.includes(role)) return;
  throw new ApiError('not-permitted', `Only a ${role} of the project can do this.`, {
    rule: `role-${role}`,
  });
}

/** Ids of the projects a person is on; of all projects for an administrator when asked so. */
export async function projectIdsOf(
  manager: EntityManager,
  actor: Actor,
  scope: 'own' | 'visible',
): Promise<string[]> {
  if (scope === 'visible' && actor.administrator) {
    const all = await manager.find(ProjectEntity, { select: { id: true } });
    return all.map(({ id }) => id);
  }
  const own = await manager.findBy(MembershipEntity, { personId: actor.id });
  return own.map(({ projectId }) => projectId);
}
