import type { EntityManager } from 'typeorm';
import type { ProjectRole } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { ApiError } from '../http/api-error.ts';
import { MembershipEntity } from '../projects/membership-entity.ts';

/** Whether something may be done to the library, and if not, why. */
export interface PartPermission {
  readonly allowed: boolean;
  readonly reason: string | null;
}

const ALLOWED: PartPermission = { allowed: true, reason: null };

/** Designers of any project and administrators keep the library. */
export async function mayKeepLibrary(
  manager: EntityManager,
  actor: Actor,
): Promise<PartPermission> {
  if (actor.administrator || (await hasRole(manager, actor, 'designer'))) return ALLOWED;
  return denied('Only a designer of some project or an administrator can do this.');
}

/** Whoever verifies is a checker of some project or an administrator, and did not enter the data. */
export async function mayVerify(
  manager: EntityManager,
  actor: Actor,
  revision: { readonly authorId: string | null; readonly verified: boolean },
): Promise<PartPermission> {
  if (!actor.administrator && !(await hasRole(manager, actor, 'checker'))) {
    return denied('Only a checker of some project or an administrator can do this.');
  }
  if (revision.authorId === actor.id) {
    return denied('You entered these data; another person verifies them.');
  }
  return revision.verified ? denied('These data are verified already.') : ALLOWED;
}

/** @throws {ApiError} not-permitted with the reason */
export function requirePermission({ allowed, reason }: PartPermission, rule: string): void {
  if (!allowed) throw new ApiError('not-permitted', reason ?? '', { rule });
}

async function hasRole(manager: EntityManager, actor: Actor, role: ProjectRole): Promise<boolean> {
  const memberships = await manager.findBy(MembershipEntity, { personId: actor.id });
  return memberships.some(({ roles }) => roles.includes(role));
}

function denied(reason: string): PartPermission {
  return { allowed: false, reason };
}
