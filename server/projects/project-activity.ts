import { In, type EntityManager } from 'typeorm';
import type { Activity } from '../../shared/contract/audit.ts';
import { AuditLineEntity } from '../audit/audit-line-entity.ts';

/** The newest audit lines of some projects, without their details. */
export async function recentActivity(
  manager: EntityManager,
  projectIds: readonly string[],
  limit: number,
): Promise<Activity[]> {
  return manager.find(AuditLineEntity, {
    select: {
      sequence: true,
      atMs: true,
      who: true,
      whoId: true,
      action: true,
      objectKind: true,
      objectId: true,
      objectName: true,
      summary: true,
    },
    where: { projectId: In([...projectIds]) },
    order: { sequence: 'DESC' },
    take: limit,
  });
}
