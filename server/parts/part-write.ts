import { randomUUID } from 'node:crypto';
import type { EntityManager } from 'typeorm';
import { describePart } from '../../shared/parts/describe-part.ts';
import type { PartRecord } from '../../shared/parts/part-record.ts';
import { PartEntity } from './part-entity.ts';
import { PartRevisionEntity } from './part-revision-entity.ts';

/** Adds a part without data. */
export async function insertPart(manager: EntityManager, record: PartRecord): Promise<string> {
  const id = randomUUID();
  await manager.insert(PartEntity, { id, kind: record.kind, partNumber: record.partNumber });
  return id;
}

/** Adds the next revision of a part's data; lists show its one-line summary. */
export async function insertPartRevision(
  manager: EntityManager,
  partId: string,
  number: number,
  record: PartRecord,
  origin: { readonly authorId: string | null; readonly comment: string; readonly atMs: number },
): Promise<void> {
  const { authorId, comment, atMs } = origin;
  const words = [record.partNumber, ...record.aliases, record.description ?? ''];
  const summary = describePart(record);
  const row = {
    ...{ id: randomUUID(), partId, number, record, summary, comment, authorId },
    ...{ createdAtMs: atMs, search: [...words, summary].join(' ').toLowerCase() },
  };
  await manager.insert(PartRevisionEntity, row);
}
