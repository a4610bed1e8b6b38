import type { EntityManager } from 'typeorm';
import { AuditHeadEntity } from './audit-head-entity.ts';
import type { AuditLineEntity } from './audit-line-entity.ts';
import { CHAIN_START, chainHash } from './chain-hash.ts';

const PAGE = 2000;
const MOST_FAULTS = 100;

export interface ChainVerification {
  readonly whole: boolean;
  readonly lines: number;
  readonly head: string;
  readonly faults: readonly { readonly sequence: number; readonly problem: string }[];
}

/** Recomputes every hash of the trail and compares the end with the stored head. */
export async function verifyChain(manager: EntityManager): Promise<ChainVerification> {
  const faults: { sequence: number; problem: string }[] = [];
  let lines = 0;
  let sequence = 0;
  let previousHash = CHAIN_START;
  for (;;) {
    const page = await linesAfter(manager, sequence);
    for (const line of page) {
      if (line.sequence !== sequence + 1) {
        faults.push({ sequence: sequence + 1, problem: `no line before ${line.sequence}` });
      }
      if (chainHash(previousHash, line) !== line.hash) {
        faults.push({ sequence: line.sequence, problem: 'the hash does not fit the line' });
      }
      ({ sequence, hash: previousHash } = line);
    }
    lines += page.length;
    if (page.length < PAGE) break;
  }
  const head = await manager.findOneByOrFail(AuditHeadEntity, { id: 1 });
  if (head.sequence !== sequence || head.hash !== previousHash) {
    faults.push({ sequence: head.sequence, problem: 'the trail does not end at its stored head' });
  }
  return {
    ...{ whole: faults.length === 0, lines, head: head.hash },
    faults: faults.slice(0, MOST_FAULTS),
  };
}

/** A line as a plain row: filling entities would take most of the time. */
type AuditRow = Pick<AuditLineEntity, keyof AuditLineEntity>;

async function linesAfter(manager: EntityManager, sequence: number): Promise<AuditRow[]> {
  type Stored = Omit<AuditRow, 'detail'> & { detail: string };
  const rows: Stored[] = await manager.query(
    `SELECT sequence, at_ms AS "atMs", who_id AS "whoId", who, action, object_kind AS "objectKind",
            object_id AS "objectId", object_name AS "objectName", project_id AS "projectId",
            summary, detail, request_id AS "requestId", hash
     FROM audit_line WHERE sequence > ? ORDER BY sequence LIMIT ?`,
    [sequence, PAGE],
  );
  return rows.map((row) => ({
    ...row,
    detail: JSON.parse(row.detail) as AuditRow['detail'],
  }));
}
