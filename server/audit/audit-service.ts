import { Brackets, type EntityManager } from 'typeorm';
import type { AuditLine } from '../../shared/contract/audit.ts';
import type { Database } from '../persistence/database.ts';
import { AuditLineEntity } from './audit-line-entity.ts';
import { type ChainVerification, verifyChain } from './verify-chain.ts';

export interface AuditQuery {
  /** Only lines older than this sequence number. */
  readonly before?: number | undefined;
  readonly limit: number;
  readonly search?: string | undefined;
}

/** Reads the trail; nothing here can write it. */
export class AuditService {
  constructor(private readonly database: Database) {}

  /** Newest first; `total` counts all lines that match, on whatever page. */
  list(query: AuditQuery): Promise<{ lines: AuditLine[]; total: number }> {
    return this.database.read(async (manager) => {
      const total = await matching(manager, query.search).getCount();
      const page = matching(manager, query.search)
        .orderBy('line.sequence', 'DESC')
        .take(query.limit);
      if (query.before !== undefined)
        page.andWhere('line.sequence < :before', { before: query.before });
      return { lines: (await page.getMany()).map(toLine), total };
    });
  }

  verify(): Promise<ChainVerification> {
    return this.database.read(verifyChain);
  }
}

function matching(manager: EntityManager, search: string | undefined) {
  const lines = manager.createQueryBuilder(AuditLineEntity, 'line').where('1 = 1');
  const text = search?.trim();
  if (!text) return lines;
  const like = `%${text.replace(/[\\%_]/g, '\\$&')}%`;
  const columns = ['who', 'action', 'object_name', 'summary'];
  return lines.andWhere(
    new Brackets((either) => {
      for (const column of columns)
        either.orWhere(`line.${column} LIKE :like ESCAPE '\\'`, { like });
    }),
  );
}

function toLine(line: AuditLineEntity): AuditLine {
  const { sequence, atMs, who, whoId, action, objectKind, objectId, objectName } = line;
  const { projectId, summary, detail, hash } = line;
  return {
    ...{ sequence, atMs, who, whoId, action, objectKind, objectId, objectName },
    ...{ projectId, summary, detail, hash },
  };
}
