import { type EntityManager, MoreThan } from 'typeorm';
import { AuditHeadEntity } from './audit-head-entity.ts';
import { AuditLineEntity } from './audit-line-entity.ts';
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
    const page = await manager.find(AuditLineEntity, {
      where: { sequence: MoreThan(sequence) },
      order: { sequence: 'ASC' },
      take: PAGE,
    });
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
