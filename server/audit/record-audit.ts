import type { EntityManager } from 'typeorm';
import type { Act } from './act.ts';
import { AuditHeadEntity } from './audit-head-entity.ts';
import { AuditLineEntity } from './audit-line-entity.ts';
import { chainHash } from './chain-hash.ts';

/** What was done to what; who and when come from the {@link Act}. */
export interface AuditEntry {
  /** For example `revision.submitted`. */
  readonly action: string;
  readonly objectKind: string;
  readonly objectId: string;
  /** What a reader calls the object. */
  readonly objectName: string;
  readonly projectId: string | null;
  /** A sentence for people, without the name in front. */
  readonly summary: string;
  /** Old and new values, reasons, hashes. Never a password, token or link. JSON values only. */
  readonly detail: Record<string, unknown>;
}

/** Adds one line to the trail, in the transaction of the change it tells of. */
export async function recordAudit(
  manager: EntityManager,
  act: Act,
  entry: AuditEntry,
): Promise<void> {
  const head = await manager.findOneByOrFail(AuditHeadEntity, { id: 1 });
  const line: Omit<AuditLineEntity, 'hash'> = {
    sequence: head.sequence + 1,
    atMs: act.atMs,
    whoId: act.actor?.id ?? null,
    who: act.actor?.name ?? null,
    ...entry,
    detail: asStored(entry.detail),
    requestId: act.requestId,
  };
  const hash = chainHash(head.hash, line);
  // detail is any JSON; TypeORM's deep-partial type cannot say so
  await manager.insert(AuditLineEntity, { ...line, hash } as object);
  await manager.update(AuditHeadEntity, { id: 1 }, { sequence: line.sequence, hash });
}

/** Undefined members vanish in the database: hash what will be read back. */
function asStored(detail: Record<string, unknown>): Record<string, unknown> {
  return JSON.parse(JSON.stringify(detail)) as Record<string, unknown>;
}
