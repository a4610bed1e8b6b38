import type { EntityManager } from 'typeorm';
import type { PartStanding } from '../../shared/contract/revision.ts';
import type { PartKind, PartRecord } from '../../shared/parts/part-record.ts';
import { PartRevisionEntity } from '../parts/part-revision-entity.ts';
import { RevisionPartEntity } from './revision-part-entity.ts';

/** Library data a submitted revision was filled from. */
export interface PartSnapshot {
  readonly role: PartStanding['role'];
  readonly partRevisionId: string;
  readonly choice: Readonly<Record<string, string>>;
  readonly kind: PartKind;
  readonly partNumber: string;
  readonly revision: number;
  readonly record: PartRecord;
}

/** Takes a copy of the library data behind the links of a revision. */
export async function snapshotParts(
  manager: EntityManager,
  revisionId: string,
): Promise<PartSnapshot[]> {
  const links = await manager.find(RevisionPartEntity, {
    where: { revisionId },
    order: { role: 'ASC' },
  });
  const snapshot: PartSnapshot[] = [];
  for (const { role, partRevisionId, choice } of links) {
    const { number, record } = await manager.findOneByOrFail(PartRevisionEntity, {
      id: partRevisionId,
    });
    const { kind, partNumber } = record;
    snapshot.push({ role, partRevisionId, choice, kind, partNumber, revision: number, record });
  }
  return snapshot;
}
